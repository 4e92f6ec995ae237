package quantity

import (
	"math"
	"math/big"
)

// Value is a quantity: a kind and a size in mm, degrees or as a number. Values
// are immutable. The zero Value is the inexact plain number 0.
type Value struct {
	kind Kind
	rat  *big.Rat // the exact size, nil once it is lost
	f    float64  // the size, rounded once from rat if there is one
}

// maxBits bounds numerator and denominator of an exact size. A longer one falls
// to float64: sums of a few hundred inch fractions and decimals stay far below,
// and a tower of powers cannot eat the machine.
const maxBits = 256

// FromRat returns a value of an exact size (mm to the power, degrees or number).
// It copies r. A size of more than 256 bits above or below the line is rounded
// and no longer exact.
func FromRat(kind Kind, r *big.Rat) Value { return fromOwnRat(kind, new(big.Rat).Set(r)) }

// fromOwnRat is FromRat for a number that nobody else holds.
func fromOwnRat(kind Kind, r *big.Rat) Value {
	f, _ := r.Float64()
	if r.Num().BitLen() > maxBits || r.Denom().BitLen() > maxBits {
		return Value{kind: kind, f: f}
	}
	return Value{kind: kind, rat: r, f: f}
}

// FromFloat returns an inexact value of a size in mm to the power, degrees or as
// a number. The size must be finite.
func FromFloat(kind Kind, size float64) Value { return Value{kind: kind, f: size} }

// FromRadians returns the inexact angle of so many radians.
func FromRadians(size float64) Value { return Value{kind: Angle, f: size * (180 / math.Pi)} }

// Whole returns an exact value of a whole size.
func Whole(kind Kind, size int64) Value { return fromOwnRat(kind, new(big.Rat).SetInt64(size)) }

// Kind returns what v measures.
func (v Value) Kind() Kind { return v.kind }

// Exact says whether the size of v has been kept as a rational number.
func (v Value) Exact() bool { return v.rat != nil }

// Rat returns a copy of the exact size of v, or nil when it is lost.
func (v Value) Rat() *big.Rat {
	if v.rat == nil {
		return nil
	}
	return new(big.Rat).Set(v.rat)
}

// Float returns the size of v in mm (to the power of its kind), in degrees, or
// as a number: 20 % is 0.2.
func (v Value) Float() float64 { return v.f }

// Radians returns the size of an angle in radians.
func (v Value) Radians() float64 { return v.f * (math.Pi / 180) }

// Sign returns -1, 0 or 1.
func (v Value) Sign() int {
	switch {
	case v.rat != nil:
		return v.rat.Sign()
	case v.f < 0:
		return -1
	case v.f > 0:
		return 1
	}
	return 0
}

// As returns v as a value of the kind wanted: v itself, or the literal zero made
// into that kind. ok is false when v is of another kind.
func (v Value) As(want Kind) (w Value, ok bool) {
	if v.kind == want {
		return v, true
	}
	if v.kind != Zero {
		return v, false
	}
	v.kind = want
	return v, true
}

// String returns Format(v).
func (v Value) String() string { return Format(v) }
