package quantity

import (
	"math"
	"testing"
)

func TestScan(t *testing.T) {
	tests := []struct {
		text  string
		n     int
		value string // Format, then ~ when not exact
	}{
		{"12", 2, "12"},
		{"1.2e3", 5, "1200"},
		{"1.5e-3 x", 6, "0.0015"},
		{"60 mm", 5, "60 mm"},
		{"60mm", 4, "60 mm"},
		{"2.5 cm", 6, "25 mm"},
		{"3m", 2, "3000 mm"},
		{"1 3/8 in", 8, "34.925 mm"},
		{"3/8 in", 6, "9.525 mm"},
		{"9 3/16in,", 8, "233.3625 mm"},
		{"1/2 ft", 6, "152.4 mm"},
		{"5 ft 3 1/2 in", 13, "1612.9 mm"},
		{"5 ft 3/4 in", 11, "1543.05 mm"},
		{"5ft3in", 6, "1600.2 mm"},
		{"5 ft 3.5 in", 11, "1612.9 mm"},
		{"5 ft", 4, "1524 mm"},
		{"5 ft - 3 in", 4, "1524 mm"},
		{"5 ft from", 4, "1524 mm"},
		{"35.5°", 6, "35.5°"},
		{"35 °", 5, "35°"},
		{"35°30′15″", 14, "35.50416667°"},
		{"35°30'", 7, "35.5°"},
		{"35° 30′", 10, "35.5°"},
		{"35°30.5′", 11, "35.50833333°"},
		{"35 deg", 6, "35°"},
		{"1 rad", 5, "57.29577951°~"},
		{"0 rad", 5, "0°"},
		{"20 %", 4, "20 %"},
		{"1:2", 3, "50 %"},
		{"1:2.5", 5, "40 %"},
		{"0", 1, "0"},
		{"50/3", 2, "50"},
		{"50/x", 2, "50"},
		{"50 / 3 mm", 2, "50"},
		{"6 first 30°", 1, "6"},
		{"12 M 30 mm", 2, "12"},
		{"250 mm²", 8, "250 mm²"},
		{"2 m²", 5, "2000000 mm²"},
		{"1 cm³", 6, "1000 mm³"},
		{"2 mm 3 mm", 4, "2 mm"},
	}
	for _, tt := range tests {
		lit, n, err := Scan(tt.text)
		got := Format(lit.Value)
		if !lit.Value.Exact() {
			got += "~"
		}
		if err != nil || n != tt.n || got != tt.value {
			t.Errorf("Scan(%q) = %s, %d, %v; want %s, %d", tt.text, got, n, err, tt.value, tt.n)
		}
	}
}

func TestScanErrors(t *testing.T) {
	tests := []struct {
		text       string
		n          int
		problem    Problem
		start, end int
		write      string
		value      string // what is meant, "1" when there is no telling
	}{
		{"12 MM", 5, UnknownUnit, 3, 5, "mm", "12 mm"},
		{"12MM", 4, UnknownUnit, 2, 4, "mm", "12 mm"},
		{"2 Ft 3 in", 4, UnknownUnit, 2, 4, "ft", "2"}, // a value follows: a clause word
		{"35 degrees", 10, UnknownUnit, 3, 10, "°", "35°"},
		{"12 inches", 9, UnknownUnit, 3, 9, "in", "304.8 mm"},
		{"60mm2", 5, UnknownUnit, 2, 5, "mm²", "60 mm²"},
		{"2x", 2, UnknownUnit, 1, 2, "", "1"},
		{"50/3 mm", 7, BadFraction, 0, 7, "50 mm / 3", "16.66666667 mm"},
		{"50/3°", 6, BadFraction, 0, 6, "50° / 3", "16.66666667°"},
		{"1 3/8 mm", 8, BadFraction, 0, 8, "11 mm / 8", "1.375 mm"},
		{"1 3/8", 5, BadFraction, 0, 5, "", "1"},
		{"1/0 in", 6, BadFraction, 0, 3, "", "1"},
		{"5 ft 13 in", 10, BadNumber, 0, 10, "", "1"},
		{"35°75′", 9, BadAngle, 0, 9, "", "1"},
		{"35.5°30′", 11, BadAngle, 0, 11, "", "1"},
		{"35°30.5′15″", 16, BadAngle, 0, 16, "", "1"},
		{"35º", 4, LookAlike, 2, 4, "°", "35°"},
		{"35°30’", 9, LookAlike, 6, 9, "′", "35.5°"},
		{"35°30′15\"", 12, LookAlike, 11, 12, "″", "35.50416667°"},
		{"5'", 2, BadAngle, 1, 2, "", "1"},
		{"5″", 4, BadAngle, 1, 4, "", "1"},
		{"1.2.3", 5, BadNumber, 0, 5, "", "1"},
		{"12.", 3, BadNumber, 0, 3, "12.0", "12"},
		{"1e76", 4, BadNumber, 0, 4, "", "1"},
		{"1e99999999999999999999", 22, BadNumber, 0, 22, "", "1"},
		{"1:0", 3, BadNumber, 0, 3, "", "1"},
		{"1:2mm", 5, UnknownUnit, 3, 5, "", "1"},
		{"1_000 mm", 8, BadNumber, 0, 5, "1000", "1000 mm"},
		{"1'000", 5, BadNumber, 0, 5, "1000", "1000"},
	}
	for _, tt := range tests {
		lit, n, err := Scan(tt.text)
		if tt.text == "2 Ft 3 in" {
			if err != nil || n != 1 {
				t.Errorf("Scan(%q) = %d, %v", tt.text, n, err)
			}
			continue
		}
		if err == nil {
			t.Errorf("Scan(%q) = %v", tt.text, lit)
			continue
		}
		got := LiteralError{Problem: err.Problem, Start: err.Start, End: err.End, Write: err.Write}
		want := LiteralError{Problem: tt.problem, Start: tt.start, End: tt.end, Write: tt.write}
		if n != tt.n || got != want || Format(lit.Value) != tt.value || err.Text == "" {
			t.Errorf("Scan(%q) = %v, %d, %+v; want %s, %d, %+v", tt.text, lit.Value, n, got, tt.value, tt.n, want)
		}
	}
}

func TestParse(t *testing.T) {
	tests := []struct{ text, want string }{
		{" 250mm ", "250 mm"}, {"-5.5 mm", "-5.5 mm"}, {"-1 3/8 in", "-34.925 mm"}, {"0", "0"},
		{"", "a quantity begins with a digit"}, {"x", "a quantity begins with a digit"}, {"-", "a quantity begins with a digit"},
		{"12 mm x", "` x` follows the quantity `12 mm`"}, {"12,5 mm", "decimals are written with a point"},
		{"12 MM", "`MM` is not a unit"},
	}
	for _, tt := range tests {
		lit, err := Parse(tt.text)
		got := Format(lit.Value)
		if err != nil {
			got = err.Text
			if err.Start < 0 || err.End > len(tt.text) || err.Start > err.End {
				t.Errorf("Parse(%q): at %d to %d", tt.text, err.Start, err.End)
			}
		}
		if got != tt.want {
			t.Errorf("Parse(%q) = %s, want %s", tt.text, got, tt.want)
		}
	}
}

func FuzzScan(f *testing.F) {
	for _, text := range []string{"12", "1 3/8 in", "5 ft 3 1/2 in", "35°30′15″", "1:2", "50/3 mm", "12,5 mm", "1e9", "1_000", "35º30'", "60mm2"} {
		f.Add(text)
	}
	f.Fuzz(func(t *testing.T, text string) {
		if text == "" || text[0] < '0' || text[0] > '9' {
			return
		}
		lit, n, err := Scan(text)
		checkScan(t, text, lit, n, err)
		if lit, n, err := ScanComma(text); n > 0 {
			checkScan(t, text, lit, n, err)
		}
		if lit, err := Parse(text); err != nil && (err.Start < 0 || err.Start > err.End || err.End > len(text)) {
			t.Errorf("%q: %v, %+v", text, lit.Value, err)
		}
		if err == nil && n == len(text) {
			// Read alone and read with more behind it, a literal is the same.
			if again, m, err := Scan(text + " "); err != nil || m != n || Format(again.Value) != Format(lit.Value) {
				t.Errorf("%q: %v and %v, %d, %v", text, lit.Value, again.Value, m, err)
			}
		}
	})
}

func checkScan(t *testing.T, text string, lit Literal, n int, err *LiteralError) {
	t.Helper()
	if n <= 0 || n > len(text) {
		t.Fatalf("%q: length %d", text, n)
	}
	if f := lit.Value.Float(); math.IsNaN(f) || math.IsInf(f, 0) || f < 0 {
		t.Fatalf("%q: size %v", text, f)
	}
	if err != nil && (err.Start < 0 || err.Start > err.End || err.End > n || err.Text == "") {
		t.Fatalf("%q: %d, %+v", text, n, err)
	}
	if Format(lit.Value) == "" {
		t.Fatalf("%q: no words", text)
	}
}
