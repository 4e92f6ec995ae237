package quantity

import (
	"errors"
	"math"
	"math/big"
	"testing"

	"pgregory.net/rapid"
)

// q reads a literal that is known to be right; a minus may stand in front.
func q(t testing.TB, text string) Value {
	t.Helper()
	lit, err := Parse(text)
	if err != nil {
		t.Fatalf("%q: %v", text, err)
	}
	return lit.Value
}

// show prints a value with ~ when it is not exact, or the text of an error.
func show(v Value, err error) string {
	switch {
	case err != nil:
		return err.Error()
	case !v.Exact():
		return Format(v) + "~"
	}
	return Format(v)
}

func TestOperations(t *testing.T) {
	tests := []struct {
		a    string
		op   func(a, b Value) (Value, error)
		b    string
		want string
	}{
		{"1 mm", Add, "1 cm", "11 mm"},
		{"0.1", Add, "0.2", "0.3"},
		{"1 in", Sub, "25.4 mm", "0 mm"},
		{"0", Add, "35°", "35°"},
		{"35°", Sub, "0", "35°"},
		{"0", Add, "0", "0"},
		{"60 mm", Add, "35°", "a length and an angle cannot be added"},
		{"60 mm", Sub, "1", "a plain number cannot be subtracted from a length"},
		{"20 %", Add, "1:2", "70 %"},
		{"20 %", Add, "1", "a ratio and a plain number cannot be added"},
		{"20 %", Mul, "60 mm", "12 mm"},
		{"60 mm", Div, "20 %", "300 mm"},
		{"2", Mul, "20 %", "40 %"},
		{"20 %", Div, "2", "10 %"},
		{"20 %", Div, "10 %", "2"},
		{"1", Div, "20 %", "5"},
		{"20 %", Mul, "50 %", "10 %"},
		{"3 mm", Mul, "4 mm", "12 mm²"},
		{"12 mm²", Div, "4 mm", "3 mm"},
		{"3 mm", Div, "4 mm", "0.75"},
		{"3 mm", Div, "4 mm³", "0.75 mm⁻²"},
		{"30°", Mul, "2", "60°"},
		{"30°", Div, "60°", "0.5"},
		{"30°", Mul, "30°", "an angle and an angle cannot be multiplied"},
		{"1", Div, "30°", "a plain number cannot be divided by an angle"},
		{"60 mm", Mul, "30°", "1800 mm·°"},
		{"60 mm", Div, "0 mm", "division by zero"},
		{"60 mm", Div, "0", "division by zero"},
		{"0", Mul, "60 mm", "0 mm"},
		{"2", Pow, "10", "1024"},
		{"2", Pow, "-2", "0.25"},
		{"2 mm", Pow, "3", "8 mm³"},
		{"4 mm²", Pow, "0.5", "2 mm"},
		{"2 mm²", Pow, "0.5", "1.414213562 mm~"},
		{"2 mm", Pow, "0.5", "a length cannot be raised to the power 0.5"},
		{"2 mm", Pow, "10", "a length cannot be raised to the power 10"},
		{"2 mm", Pow, "0", "1"},
		{"30°", Pow, "1", "30°"},
		{"30°", Pow, "2", "an angle cannot be raised to the power 2"},
		{"2", Pow, "1 mm", "an exponent is a plain number, not a length"},
		{"-8", Pow, "3", "-512"},
		{"-8", Pow, "0.5", "-8 to the power 0.5 has no value"},
		{"0", Pow, "-1", "division by zero"},
		{"9", Pow, "0.5", "3"},
		{"2", Pow, "0.5", "1.414213562~"},
		{"10", Pow, "300", "1e300~"},
		{"10", Pow, "309", "the result of `^` is too large"},
		{"10", Pow, "60", "1e60"},
	}
	for i, tt := range tests {
		v, err := tt.op(q(t, tt.a), q(t, tt.b))
		if got := show(v, err); got != tt.want {
			t.Errorf("%d: %s and %s: got %s, want %s", i, tt.a, tt.b, got, tt.want)
		}
	}
}

func TestFailureHasItsKinds(t *testing.T) {
	_, err := Add(q(t, "60 mm"), q(t, "35°"))
	var f *Failure
	if !errors.As(err, &f) || f.Cause != Mismatch || f.Left.Kind() != Length || f.Right.Kind() != Angle {
		t.Fatalf("%#v", err)
	}
	if want := "60 mm is a length, 35° is an angle"; f.Why() != want {
		t.Errorf("why: %q, want %q", f.Why(), want)
	}
}

func TestKinds(t *testing.T) {
	for power := -maxPower; power <= maxPower; power++ {
		for angle := 0; angle <= 1; angle++ {
			k, ok := compose(power, angle)
			if l, a := k.Powers(); !ok || l != power || a != angle {
				t.Errorf("%d, %d: %v, %v", power, angle, l, a)
			}
		}
	}
	for _, power := range []int{-10, 10} {
		if _, ok := LengthTo(power); ok {
			t.Errorf("length to the power %d", power)
		}
	}
	tests := []struct {
		kind Kind
		want string
	}{{Number, "a plain number"}, {Length, "a length"}, {Area, "an area"}, {Volume, "a volume"}, {Angle, "an angle"},
		{Ratio, "a ratio"}, {Zero, "zero"}, {-1, "a length to the power -1"}, {Length + Angle, "a length times an angle"}}
	for _, tt := range tests {
		if got := tt.kind.String(); got != tt.want {
			t.Errorf("%d: %q, want %q", tt.kind, got, tt.want)
		}
	}
}

// TestKindsAgreeWithValues checks the static rules against the operations.
func TestKindsAgreeWithValues(t *testing.T) {
	kinds := []Kind{Number, Ratio, Zero, Length, Area, Volume, -1, 9, -9, Angle, Length + Angle}
	for _, a := range kinds {
		for _, b := range kinds {
			x, y := Whole(a, 6), Whole(b, 3)
			checkKind(t, "+", a, b)(Add(x, y))(Unify(a, b))
			checkKind(t, "*", a, b)(Mul(x, y))(Times(a, b))
			checkKind(t, "/", a, b)(Div(x, y))(Over(a, b))
		}
	}
}

func checkKind(t *testing.T, op string, a, b Kind) func(Value, error) func(Kind, bool) {
	return func(v Value, err error) func(Kind, bool) {
		return func(k Kind, ok bool) {
			if ok != (err == nil) || ok && v.Kind() != k {
				t.Errorf("%v %s %v: %v, %v; but the rule says %v, %v", a, op, b, v.Kind(), err, k, ok)
			}
		}
	}
}

func TestCompareMinMaxSum(t *testing.T) {
	if order, err := Compare(q(t, "1 in"), q(t, "25.4 mm")); err != nil || order != 0 {
		t.Errorf("1 in and 25.4 mm: %d, %v", order, err)
	}
	if order, err := Compare(q(t, "20 %"), q(t, "0.25")); err != nil || order != -1 {
		t.Errorf("20 %% and 0.25: %d, %v", order, err)
	}
	if order, err := Compare(q(t, "-3 mm"), q(t, "0")); err != nil || order != -1 {
		t.Errorf("-3 mm and 0: %d, %v", order, err)
	}
	if _, err := Compare(q(t, "1 mm"), q(t, "1")); err == nil {
		t.Error("a length compares with a number")
	}
	vs := []Value{q(t, "3 mm"), q(t, "0"), q(t, "1 in"), q(t, "-2 mm")}
	for _, tt := range []struct {
		got, want string
	}{
		{show(Min(vs...)), "-2 mm"}, {show(Max(vs...)), "25.4 mm"}, {show(Sum(vs...)), "26.4 mm"},
		{show(Min(vs[:2]...)), "0 mm"}, {show(Sum()), "0"}, {show(Min()), "`min` needs at least one value"},
		{show(Max(vs[0], q(t, "1"))), "a length and a plain number cannot be used together in `max`"},
	} {
		if tt.got != tt.want {
			t.Errorf("got %s, want %s", tt.got, tt.want)
		}
	}
}

func TestSqrt(t *testing.T) {
	for _, tt := range []struct{ x, want string }{
		{"9", "3"}, {"2.25", "1.5"}, {"2", "1.414213562~"}, {"16 mm²", "4 mm"}, {"0", "0"}, {"25 %", "0.5"},
		{"4 mm", "a length has no square root"}, {"4°", "an angle has no square root"}, {"-4", "the square root of -4 has no value"},
	} {
		if got := show(Sqrt(q(t, tt.x))); got != tt.want {
			t.Errorf("sqrt %s: got %s, want %s", tt.x, got, tt.want)
		}
	}
}

// TestExactnessIsNeverRegained: what has once been rounded stays so.
func TestExactnessIsNeverRegained(t *testing.T) {
	root, _ := Sqrt(q(t, "2"))
	square, _ := Mul(root, root)
	sum, _ := Add(square, q(t, "1"))
	rounded, _ := Round(sum, q(t, "1"))
	diff, _ := Sub(root, root)
	for _, v := range []Value{root, square, sum, rounded, diff, Neg(root), Abs(Neg(root)), FromRadians(1)} {
		if v.Exact() || v.Rat() != nil {
			t.Errorf("%v is exact", v)
		}
	}
	if rounded.Float() != 3 {
		t.Errorf("rounded to %v", rounded.Float())
	}
}

// TestSizeIsCapped: a long computation falls to float64 instead of growing.
func TestSizeIsCapped(t *testing.T) {
	v, third := q(t, "1"), FromRat(Number, big.NewRat(1, 3))
	for range 1000 {
		next, err := Mul(v, third)
		if err != nil {
			t.Fatal(err)
		}
		v = next
	}
	// 3^-1000 is below the least float64, 5e-324; it has become zero on the way.
	if v.Exact() || v.Float() != 0 {
		t.Errorf("%v, exact %v", v.Float(), v.Exact())
	}
	if r := FromRat(Number, new(big.Rat).SetFrac(big.NewInt(1), new(big.Int).Lsh(big.NewInt(1), 256))); r.Exact() {
		t.Error("257 bits are exact")
	}
}

func TestValuesDoNotChange(t *testing.T) {
	r := big.NewRat(3, 2)
	v := FromRat(Length, r)
	r.SetInt64(7)
	v.Rat().SetInt64(9)
	if got := show(v, nil); got != "1.5 mm" {
		t.Errorf("changed to %s", got)
	}
	if _, err := Add(v, v); err != nil || show(v, nil) != "1.5 mm" {
		t.Errorf("changed by adding: %v", v)
	}
}

// TestFieldLaws: on exact values the laws hold exactly, on inexact ones the size
// of the float64 computation agrees with the exact one.
func TestFieldLaws(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		draw := func(name string) Value {
			n := rapid.Int64Range(-1e6, 1e6).Draw(t, name)
			d := rapid.Int64Range(1, 1e4).Draw(t, name+"/")
			return FromRat(Length, big.NewRat(n, d))
		}
		a, b, c := draw("a"), draw("b"), draw("c")
		ab, _ := Add(a, b)
		back, _ := Sub(ab, b)
		product, _ := Mul(a, c)
		sum, _ := Mul(ab, c)
		rest, _ := Mul(b, c)
		distributed, _ := Add(product, rest)
		if back.Rat().Cmp(a.Rat()) != 0 || sum.Rat().Cmp(distributed.Rat()) != 0 {
			t.Fatalf("a+b-b = %v, (a+b)c = %v, ac+bc = %v", back, sum, distributed)
		}
		if c.Sign() != 0 {
			quotient, err := Div(product, c)
			if err != nil || quotient.Rat().Cmp(a.Rat()) != 0 || quotient.Kind() != Length {
				t.Fatalf("ac/c = %v, %v", quotient, err)
			}
		}
		loose, _ := Mul(FromFloat(Length, a.Float()), c)
		if want := a.Float() * c.Float(); math.Abs(loose.Float()-want) > 0 || loose.Exact() {
			t.Fatalf("%v, want %v", loose.Float(), want)
		}
	})
}
