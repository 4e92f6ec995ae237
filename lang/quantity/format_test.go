package quantity

import (
	"math"
	"math/big"
	"strings"
	"testing"

	"pgregory.net/rapid"
)

func TestFormat(t *testing.T) {
	tests := []struct {
		v    Value
		want string
	}{
		{q(t, "12.5 mm"), "12.5 mm"}, {q(t, "35.5°"), "35.5°"}, {q(t, "1.5"), "1.5"}, {q(t, "250 mm²"), "250 mm²"},
		{q(t, "20 %"), "20 %"}, {q(t, "1:3"), "33.33333333 %"}, {q(t, "0"), "0"}, {q(t, "0 mm"), "0 mm"}, {q(t, "-3 mm"), "-3 mm"},
		{FromRat(Length, big.NewRat(1, 3)), "0.3333333333 mm"}, {FromRat(Length, big.NewRat(2, 3)), "0.6666666667 mm"},
		{Whole(Volume, 1234567), "1234567 mm³"}, {Whole(Length, 100), "100 mm"}, {Whole(Length, 123456789012), "123456789000 mm"},
		{FromFloat(Number, 0.1+0.2), "0.3"}, {FromFloat(Length, 286.35), "286.35 mm"}, {FromFloat(Number, 1e-5), "0.00001"},
		{FromFloat(Number, 1.5e-9), "1.5e-9"}, {FromFloat(Number, 1e20), "1e20"}, {FromFloat(Number, -1.5e-9), "-1.5e-9"},
		{FromFloat(Number, math.Copysign(0, -1)), "0"}, {Whole(-1, 3), "3 mm⁻¹"}, {Whole(4, 3), "3 mm⁴"}, {Whole(Length+Angle, 3), "3 mm·°"},
	}
	for _, tt := range tests {
		if got := Format(tt.v); got != tt.want {
			t.Errorf("got %q, want %q", got, tt.want)
		}
	}
}

func TestFormatNearest(t *testing.T) {
	tests := []struct{ v, step, want string }{
		{"286.35 mm", "0.1 mm", "286.4 mm"}, // a half, away from zero, though 286.35 is below it in binary
		{"-286.35 mm", "0.1 mm", "-286.4 mm"},
		{"286.34 mm", "0.1 mm", "286.3 mm"},
		{"286.35 mm", "1 mm", "286 mm"},
		{"286.35 mm", "5 mm", "285 mm"},
		{"287.5 mm", "5 mm", "290 mm"},
		{"286.35 mm", "0.5 mm", "286.5 mm"},
		{"286 mm", "0.1 mm", "286.0 mm"},
		{"286.35 mm", "1 cm", "29 cm"},
		{"286.35 mm", "0.001 m", "0.286 m"},
		{"233.4 mm", "1/16 in", "9 3/16 in"}, // the table of capabilities of the trade
		{"228.6 mm", "1/16 in", "9 in"},
		{"5 mm", "1/16 in", "3/16 in"},
		{"1 mm", "1/8 in", "0 in"},
		{"-233.4 mm", "1/16 in", "-9 3/16 in"},
		{"233.4 mm", "1/32 in", "9 3/16 in"},
		{"233.4 mm", "0.01 in", "9.19 in"},
		{"1000 mm", "1/4 ft", "3 1/4 ft"},
		{"35.26°", "0.5°", "35.5°"},
		{"35.26°", "1°", "35°"},
		{"35.26°", "0°1′", "35°16′"},
		{"35.26°", "0°0′1″", "35°15′36″"},
		{"35.999°", "0°1′", "36°0′"},
		{"-35.26°", "0°1′", "-35°16′"},
		{"12.34 %", "0.1 %", "12.3 %"},
		{"1:3", "1 %", "33 %"},
		{"-0.04 mm", "0.1 mm", "0.0 mm"},
		{"1234.5 mm²", "10 mm²", "1230 mm²"},
		{"1234567 mm²", "0.1 m²", "1.2 m²"},
		{"2.5", "1", "3"},
		{"0", "0.1 mm", "0.0 mm"},
		{"180°", "0.01 rad", "3.14 rad"},
		{"60 mm", "0.1", "a length and a plain number cannot be used together in `round`"},
		{"60 mm", "0 mm", "0 mm is no step to round to"},
		{"60 mm", "-1 mm", "-1 mm is no step to round to"},
	}
	for _, tt := range tests {
		step, problem := Parse(tt.step)
		if problem != nil {
			t.Fatal(problem)
		}
		got, err := FormatNearest(q(t, tt.v), step.Value, step.Style())
		if err != nil {
			got = err.Error()
		}
		if got != tt.want {
			t.Errorf("%s nearest %s: got %q, want %q", tt.v, tt.step, got, tt.want)
		}
		style := step.Style()
		style.Bare = true
		if bare, _ := FormatNearest(q(t, tt.v), step.Value, style); err == nil && !strings.HasPrefix(got, bare) {
			t.Errorf("%s nearest %s: %q without its unit is %q", tt.v, tt.step, got, bare)
		}
	}
}

func TestStyleOfAComputedStep(t *testing.T) {
	for _, tt := range []struct{ v, step, want string }{
		{"286.35 mm", "0.1 mm", "286.4 mm"}, {"286.35 mm", "1 in", "279.4 mm"}, {"286.35 mm", "25 mm", "275 mm"},
		{"35.26°", "0.5°", "35.5°"}, {"1.25 %", "0.5 %", "1.5 %"}, {"1234 mm²", "100 mm²", "1200 mm²"},
	} {
		step := q(t, tt.step)
		if got, err := FormatNearest(q(t, tt.v), step, StyleOf(step)); err != nil || got != tt.want {
			t.Errorf("%s nearest %s: %q, %v, want %q", tt.v, tt.step, got, err, tt.want)
		}
	}
}

func TestRound(t *testing.T) {
	for _, tt := range []struct{ v, step, want string }{
		{"2.5", "1", "3"}, {"-2.5", "1", "-3"}, {"2.4999999999", "1", "2"}, {"7", "2", "8"}, {"1 in", "1 mm", "25 mm"},
		{"0.3", "0.1", "0.3"}, {"1e60", "1", "1e60"},
	} {
		if got := show(Round(q(t, tt.v), q(t, tt.step))); got != tt.want {
			t.Errorf("round(%s, %s) = %s, want %s", tt.v, tt.step, got, tt.want)
		}
	}
	// A computed half that float64 holds a little low is a half all the same; what
	// is lower by more than rounding is none.
	if got := show(Round(FromFloat(Length, math.Nextafter(12.5, 0)), q(t, "1 mm"))); got != "13 mm~" {
		t.Errorf("a low half: %s", got)
	}
	if got := show(Round(FromFloat(Length, 12.5*(1-1e-12)), q(t, "1 mm"))); got != "12 mm~" {
		t.Errorf("below a half: %s", got)
	}
}

// TestFormatReadsBack: what Format writes of a value with few digits is read as
// that value.
func TestFormatReadsBack(t *testing.T) {
	units := []string{"", " mm", "°", " %", " mm²", " mm³"}
	rapid.Check(t, func(t *rapid.T) {
		n := rapid.Int64Range(-999999999, 999999999).Draw(t, "n")
		places := rapid.IntRange(0, 6).Draw(t, "places")
		text := new(big.Rat).SetFrac(big.NewInt(n), new(big.Int).Exp(big.NewInt(10), big.NewInt(int64(places)), nil)).FloatString(places) +
			rapid.SampledFrom(units).Draw(t, "unit")
		lit, err := Parse(text)
		if err != nil {
			t.Fatalf("%q: %v", text, err)
		}
		back, err := Parse(Format(lit.Value))
		if err != nil || back.Value.Kind() != lit.Value.Kind() || back.Value.Rat().Cmp(lit.Value.Rat()) != 0 {
			t.Fatalf("%q is shown as %q, %v", text, Format(lit.Value), err)
		}
	})
}

// TestNearestIsNear: rounding moves a value by half a step at most, and lands on a
// multiple of the step.
func TestNearestIsNear(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		v := FromRat(Length, big.NewRat(rapid.Int64().Draw(t, "n"), rapid.Int64Range(1, 1e6).Draw(t, "d")))
		step := FromRat(Length, big.NewRat(rapid.Int64Range(1, 1e6).Draw(t, "sn"), rapid.Int64Range(1, 1e4).Draw(t, "sd")))
		r, err := Round(v, step)
		if err != nil {
			t.Fatal(err)
		}
		diff := new(big.Rat).Sub(r.Rat(), v.Rat())
		if diff.Abs(diff).Mul(diff, big.NewRat(2, 1)).Cmp(step.Rat()) > 0 {
			t.Fatalf("%v rounded by %v is %v", v, step, r)
		}
		if !new(big.Rat).Quo(r.Rat(), step.Rat()).IsInt() {
			t.Fatalf("%v is no multiple of %v", r, step)
		}
	})
}
