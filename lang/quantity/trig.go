package quantity

import (
	"math"
	"math/big"
)

// Sin returns the sine of an angle. It is exact at the multiples of 30° where
// the value is rational, and right to the last place or two everywhere: the angle
// is brought to within 45° of an axis in degrees, where that is exact.
func Sin(v Value) (Value, error) {
	if err := wantAngle("sin", v); err != nil {
		return Value{}, err
	}
	a := axial(v)
	return a.value(a.sin()), nil
}

// Cos returns the cosine of an angle; exactness as for Sin.
func Cos(v Value) (Value, error) {
	if err := wantAngle("cos", v); err != nil {
		return Value{}, err
	}
	a := axial(v)
	a.quarter++
	return a.value(a.sin()), nil
}

// Tan returns the tangent of an angle, exact at the multiples of 45°. At 90° and
// 270° it is a Failure.
func Tan(v Value) (Value, error) {
	if err := wantAngle("tan", v); err != nil {
		return Value{}, err
	}
	a := axial(v)
	sin, cos := a.sin(), 0.0
	a.quarter++
	cos = a.sin()
	switch {
	case cos == 0:
		return Value{}, fail("tan", Domain, v, Value{})
	case math.Abs(a.rest) == 45:
		return a.value(math.Copysign(1, sin) * math.Copysign(1, cos)), nil
	}
	return a.value(sin / cos), nil
}

func wantAngle(op string, v Value) error {
	if v.kind == Angle || v.kind == Zero {
		return nil
	}
	return &Failure{Op: op, Cause: WrongKind, Left: v, Want: Angle}
}

// axialAngle is an angle told from the nearest axis: quarter·90° + rest, with
// rest from -45 to 45 degrees.
type axialAngle struct {
	quarter int
	rest    float64
	exact   bool // the angle is known exactly, and rest holds it
}

// axial brings an angle to the nearest axis, without rounding before the end.
func axial(v Value) axialAngle {
	if v.rat == nil {
		rest := math.Remainder(v.f, 90) // exact, as the Mod below is
		return axialAngle{quarter: int(math.Round((math.Mod(v.f, 360) - rest) / 90)), rest: rest}
	}
	quarters := roundRat(new(big.Rat).Quo(v.rat, big.NewRat(90, 1)))
	near := new(big.Rat).SetInt(new(big.Int).Mul(quarters, big.NewInt(90)))
	rest, held := near.Sub(v.rat, near).Float64()
	quarter := new(big.Int).Mod(quarters, big.NewInt(4)).Int64()
	return axialAngle{quarter: int(quarter), rest: rest, exact: held}
}

// sin returns the sine of a; that of a quarter more is the cosine.
func (a axialAngle) sin() float64 {
	sin, cos := octant(a.rest)
	switch a.quarter & 3 {
	case 0:
		return sin
	case 1:
		return cos
	case 2:
		return -sin
	}
	return -cos
}

// value makes the value of a function of a: exact when the angle was and the
// value is one of the rational ones (Niven: no rational angle has other rational
// sines than 0, ±1/2, ±1, nor other rational tangents than 0, ±1).
func (a axialAngle) value(f float64) Value {
	if twice := 2 * f; a.exact && math.Mod(a.rest, 15) == 0 && twice == math.Trunc(twice) {
		return fromOwnRat(Number, big.NewRat(int64(twice), 2))
	}
	return Value{kind: Number, f: f}
}

// degreeTail is what π/180 exceeds its float64 by, from π to 40 digits.
const degreeTail = 2.9486522708701687e-19

// octant returns sine and cosine of q in [-45, 45] degrees. The radians are
// carried to twice the precision, so that their rounding adds nothing.
func octant(q float64) (sin, cos float64) {
	switch math.Abs(q) {
	case 45:
		return math.Copysign(math.Sqrt2/2, q), math.Sqrt2 / 2
	case 30:
		return math.Copysign(0.5, q), math.Sqrt(3) / 2
	}
	const unit = math.Pi / 180
	hi := q * float64(unit)
	lo := math.FMA(q, float64(unit), -hi) + float64(q*degreeTail)
	s, c := math.Sincos(hi)
	return math.FMA(lo, c, s), math.FMA(-lo, s, c)
}

// Asin returns the angle from -90° to 90° with a sine; exact for 0, ±1/2, ±1.
func Asin(v Value) (Value, error) {
	if err := wantNumber("asin", v); err != nil {
		return Value{}, err
	}
	if math.Abs(v.f) > 1 {
		return Value{}, fail("asin", Domain, v, Value{})
	}
	return angleValue(v, math.Asin, [3]int64{0, 30, 90}), nil
}

// Acos returns the angle from 0° to 180° with a cosine; exact for 0, ±1/2, ±1.
func Acos(v Value) (Value, error) {
	if err := wantNumber("acos", v); err != nil {
		return Value{}, err
	}
	if math.Abs(v.f) > 1 {
		return Value{}, fail("acos", Domain, v, Value{})
	}
	if degrees, ok := tabled(v.f, [3]int64{90, 60, 0}, [3]int64{90, 120, 180}); ok {
		return angleOf(degrees, v.Exact()), nil
	}
	return FromRadians(math.Acos(v.f)), nil
}

// Atan returns the angle from -90° to 90° with a tangent; exact for 0, ±1.
func Atan(v Value) (Value, error) {
	if err := wantNumber("atan", v); err != nil {
		return Value{}, err
	}
	switch v.f {
	case 0, 1, -1:
		return angleOf(45*int64(v.f), v.Exact()), nil
	}
	return FromRadians(math.Atan(v.f)), nil
}

// Atan2 returns the angle, above -180° up to 180°, of the direction with the
// given rise and run, which must be of one kind; exact along the axes and the
// diagonals. Of (0, 0) it is a Failure.
func Atan2(rise, run Value) (Value, error) {
	if _, ok := Unify(rise.kind, run.kind); !ok {
		return Value{}, fail("atan2", Mismatch, rise, run)
	}
	y, x := rise.Sign(), run.Sign()
	exact := rise.Exact() && run.Exact()
	switch {
	case x == 0 && y == 0:
		return Value{}, fail("atan2", Domain, Whole(Number, 0), Value{})
	case y == 0:
		return angleOf(int64(90-90*x), exact), nil
	case x == 0:
		return angleOf(int64(90*y), exact), nil
	}
	if order, _ := Compare(Abs(rise), Abs(run)); order == 0 {
		return angleOf(int64(y*(90-45*x)), exact), nil
	}
	return FromRadians(math.Atan2(rise.f, run.f)), nil
}

func wantNumber(op string, v Value) error {
	if v.kind.isScalar() {
		return nil
	}
	return &Failure{Op: op, Cause: WrongKind, Left: v, Want: Number}
}

// angleValue is an odd inverse function with a table of its values at 0, 1/2, 1.
func angleValue(v Value, f func(float64) float64, at [3]int64) Value {
	if degrees, ok := tabled(v.f, at, [3]int64{0, -at[1], -at[2]}); ok {
		return angleOf(degrees, v.Exact())
	}
	return FromRadians(f(v.f))
}

// tabled looks f up among 0, 1/2, 1 and, in the second table, 0, -1/2, -1.
func tabled(f float64, up, down [3]int64) (int64, bool) {
	twice := 2 * f
	if twice != math.Trunc(twice) {
		return 0, false
	}
	if twice < 0 {
		return down[int(-twice)], true
	}
	return up[int(twice)], true
}

func angleOf(degrees int64, exact bool) Value {
	v := Whole(Angle, degrees)
	if !exact {
		v.rat = nil
	}
	return v
}
