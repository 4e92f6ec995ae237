package quantity

import (
	"math"
	"math/big"
)

// tieSlack is how near to a half a quotient of inexact sizes may be, relative to
// itself, to count as a half: 64 units in the last place of float64, which is
// more than the few dozen rounded steps behind a measure gather and far less than
// any step that is asked for. So 12.499999999999998 mm, which is 12.5 mm on
// another processor, rounds the same way there.
const tieSlack = 64.0 / (1 << 52)

// Round returns v rounded to the nearest multiple of step, halves away from zero.
// Both must be of one kind and the step above zero. The decision is exact when
// both are; the result is exact then too.
func Round(v, step Value) (Value, error) {
	n, kind, err := steps(v, step)
	if err != nil {
		return Value{}, err
	}
	if step.rat == nil {
		f, _ := new(big.Float).SetInt(n).Float64()
		r := Value{kind: kind, f: f * step.f}
		return r, finite("round", r, v, step)
	}
	r := fromOwnRat(kind, new(big.Rat).Mul(new(big.Rat).SetInt(n), step.rat))
	if v.rat == nil {
		r.rat = nil
	}
	return r, nil
}

// steps returns how many steps are nearest to v, and the kind of both.
func steps(v, step Value) (*big.Int, Kind, error) {
	kind, ok := Unify(v.kind, step.kind)
	switch {
	case !ok:
		return nil, kind, fail("round", Mismatch, v, step)
	case step.Sign() <= 0:
		return nil, kind, fail("round", Domain, step, v)
	case v.rat != nil && step.rat != nil:
		return roundRat(new(big.Rat).Quo(v.rat, step.rat)), kind, nil
	}
	q := v.f / step.f
	if math.IsInf(q, 0) || math.IsNaN(q) {
		return nil, kind, fail("round", TooLarge, v, step)
	}
	n := math.Trunc(q)
	if math.Abs(q-n) >= 0.5-math.Abs(q)*tieSlack {
		n += math.Copysign(1, q)
	}
	whole, _ := new(big.Float).SetFloat64(n).Int(nil)
	return whole, kind, nil
}

// roundRat returns the whole number nearest to r, halves away from zero.
func roundRat(r *big.Rat) *big.Int {
	num := new(big.Int).Abs(r.Num())
	num.Lsh(num, 1).Add(num, r.Denom())
	n := num.Quo(num, new(big.Int).Lsh(r.Denom(), 1))
	if r.Sign() < 0 {
		n.Neg(n)
	}
	return n
}
