package quantity

import (
	"math"
	"math/big"
	"testing"
)

func TestTrigExact(t *testing.T) {
	tests := []struct {
		f       func(Value) (Value, error)
		x, want string
	}{
		{Sin, "0°", "0"}, {Sin, "30°", "0.5"}, {Sin, "90°", "1"}, {Sin, "150°", "0.5"}, {Sin, "180°", "0"},
		{Sin, "210°", "-0.5"}, {Sin, "270°", "-1"}, {Sin, "330°", "-0.5"}, {Sin, "360°", "0"}, {Sin, "-30°", "-0.5"},
		{Sin, "3630°", "0.5"}, {Sin, "0", "0"}, {Sin, "45°", "0.7071067812~"}, {Sin, "60°", "0.8660254038~"},
		{Cos, "0°", "1"}, {Cos, "60°", "0.5"}, {Cos, "90°", "0"}, {Cos, "120°", "-0.5"}, {Cos, "180°", "-1"},
		{Cos, "240°", "-0.5"}, {Cos, "270°", "0"}, {Cos, "300°", "0.5"}, {Cos, "-60°", "0.5"}, {Cos, "30°", "0.8660254038~"},
		{Tan, "0°", "0"}, {Tan, "45°", "1"}, {Tan, "135°", "-1"}, {Tan, "180°", "0"}, {Tan, "225°", "1"}, {Tan, "-45°", "-1"},
		{Tan, "90°", "`tan` of 90° has no value"}, {Tan, "-90°", "`tan` of -90° has no value"}, {Tan, "60°", "1.732050808~"},
		{Sin, "1", "`sin` takes an angle, not a plain number"}, {Cos, "1 mm", "`cos` takes an angle, not a length"},
		{Asin, "0", "0°"}, {Asin, "1/2", "30°"}, {Asin, "-0.5", "-30°"}, {Asin, "1", "90°"}, {Asin, "-1", "-90°"}, {Asin, "0.1", "5.739170477°~"},
		{Asin, "1.1", "`asin` of 1.1 has no value"}, {Asin, "50 %", "30°"},
		{Acos, "0", "90°"}, {Acos, "0.5", "60°"}, {Acos, "-0.5", "120°"}, {Acos, "1", "0°"}, {Acos, "-1", "180°"}, {Acos, "-2", "`acos` of -2 has no value"},
		{Atan, "0", "0°"}, {Atan, "1", "45°"}, {Atan, "-1", "-45°"}, {Atan, "1:1", "45°"}, {Atan, "2", "63.43494882°~"},
		{Atan, "1 mm", "`atan` takes a plain number, not a length"},
	}
	for _, tt := range tests {
		x := FromRat(Number, big.NewRat(1, 2))
		if tt.x != "1/2" {
			x = q(t, tt.x)
		}
		if got := show(tt.f(x)); got != tt.want {
			t.Errorf("of %s: got %s, want %s", tt.x, got, tt.want)
		}
	}
}

func TestAtan2(t *testing.T) {
	tests := []struct{ rise, run, want string }{
		{"0", "1", "0°"}, {"1", "0", "90°"}, {"0", "-1", "180°"}, {"-1", "0", "-90°"},
		{"1 mm", "1 mm", "45°"}, {"1 mm", "-1 mm", "135°"}, {"-1 mm", "-1 mm", "-135°"}, {"-1 mm", "1 mm", "-45°"},
		{"1 mm", "2 mm", "26.56505118°~"}, {"1 mm", "0", "90°"}, {"0", "0", "the direction (0, 0) has no angle"},
		{"1 mm", "1", "a length and a plain number cannot be used together in `atan2`"},
	}
	for _, tt := range tests {
		if got := show(Atan2(q(t, tt.rise), q(t, tt.run))); got != tt.want {
			t.Errorf("atan2(%s, %s) = %s, want %s", tt.rise, tt.run, got, tt.want)
		}
	}
}

// taylor returns the sine of a rational angle in degrees by its power series in
// 200 bits with an own value of π (the digits are those of any table): a second
// route that shares nothing with the package.
func taylor(degrees *big.Rat) float64 {
	const precision = 200
	pi, _, _ := big.ParseFloat("3.14159265358979323846264338327950288419716939937510582097494459230781640628620899", 10, precision, big.ToNearestEven)
	x := new(big.Float).SetPrec(precision).SetRat(degrees)
	x.Mul(x, pi).Quo(x, big.NewFloat(180))
	square := new(big.Float).SetPrec(precision).Mul(x, x)
	term, sum := new(big.Float).Copy(x), new(big.Float).Copy(x)
	for n := int64(1); n < 60; n++ {
		term.Mul(term, square).Quo(term, new(big.Float).SetPrec(precision).SetInt64(-(2*n)*(2*n+1)))
		sum.Add(sum, term)
	}
	f, _ := sum.Float64()
	return f
}

// TestSinAgainstSeries: within 2 units in the last place (one of the library's
// sine, the halves of rounding the angle and the result) at every sixth of a
// degree of a turn, and as near to 180° as one part in 10^18, where a reduction in
// radians has no digit left.
func TestSinAgainstSeries(t *testing.T) {
	check := func(degrees *big.Rat) {
		t.Helper()
		v, err := Sin(FromRat(Angle, degrees))
		if err != nil {
			t.Fatal(err)
		}
		want := taylor(degrees)
		unit := math.Nextafter(math.Abs(want), 2) - math.Abs(want)
		if diff := math.Abs(v.Float() - want); diff > 2*unit {
			t.Errorf("sin %v° = %.17g, want %.17g", degrees.FloatString(6), v.Float(), want)
		}
	}
	for n := int64(-2160); n <= 2160; n++ {
		if n%1080 != 0 {
			check(big.NewRat(n, 6))
		}
	}
	for _, n := range []int64{1, -1} {
		tiny := new(big.Rat).SetFrac(big.NewInt(n), new(big.Int).Exp(big.NewInt(10), big.NewInt(18), nil))
		check(tiny)
		check(new(big.Rat).Add(big.NewRat(180, 1), tiny))
	}
}

// TestIdentities: on angles that are not exact as well.
func TestIdentities(t *testing.T) {
	for i := range 2000 {
		x := FromFloat(Angle, -1000+float64(i)*1.01)
		s, _ := Sin(x)
		c, _ := Cos(x)
		m, _ := Sin(Neg(x))
		if one := s.Float()*s.Float() + c.Float()*c.Float(); math.Abs(one-1) > 4*0x1p-53 {
			t.Errorf("sin² + cos² of %v = %v", x, one)
		}
		if m.Float() != -s.Float() {
			t.Errorf("sin of %v and its negative: %v, %v", x, s.Float(), m.Float())
		}
		// Another route: the library's own sine, whose reduction in radians errs
		// by the angle's own rounding there, 1000·π/180 radians times 2^-53.
		if want := math.Sin(x.Float() * math.Pi / 180); math.Abs(s.Float()-want) > 20*0x1p-52 {
			t.Errorf("sin of %v = %v, want %v", x, s.Float(), want)
		}
	}
}
