package quantity

import (
	"math"
	"math/big"
)

// Add returns a + b, which must be of one kind; the literal 0 goes with any.
func Add(a, b Value) (Value, error) {
	return sum("+", a, b, (*big.Rat).Add, func(x, y float64) float64 { return x + y })
}

// Sub returns a - b, which must be of one kind; the literal 0 goes with any.
func Sub(a, b Value) (Value, error) {
	return sum("-", a, b, (*big.Rat).Sub, func(x, y float64) float64 { return x - y })
}

type ratOp func(z, x, y *big.Rat) *big.Rat
type floatOp func(x, y float64) float64

func sum(op string, a, b Value, exact ratOp, rounded floatOp) (Value, error) {
	kind, ok := Unify(a.kind, b.kind)
	if !ok {
		return Value{}, fail(op, Mismatch, a, b)
	}
	return compute(op, kind, a, b, exact, rounded)
}

// Mul returns a · b. Lengths multiply up to the power 9, an angle only with
// what has none.
func Mul(a, b Value) (Value, error) {
	kind, ok := Times(a.kind, b.kind)
	if !ok {
		return Value{}, fail("*", Mismatch, a, b)
	}
	return compute("*", kind, a, b, (*big.Rat).Mul, func(x, y float64) float64 { return x * y })
}

// Div returns a / b. Dividing by zero is a Failure.
func Div(a, b Value) (Value, error) {
	kind, ok := Over(a.kind, b.kind)
	if !ok {
		return Value{}, fail("/", Mismatch, a, b)
	}
	if b.Sign() == 0 {
		return Value{}, fail("/", ByZero, a, b)
	}
	return compute("/", kind, a, b, (*big.Rat).Quo, func(x, y float64) float64 { return x / y })
}

// compute does an operation exactly if it can, else in float64.
func compute(op string, kind Kind, a, b Value, exact ratOp, rounded floatOp) (Value, error) {
	if a.rat != nil && b.rat != nil {
		v := fromOwnRat(kind, exact(new(big.Rat), a.rat, b.rat))
		return v, finite(op, v, a, b)
	}
	v := Value{kind: kind, f: rounded(a.f, b.f)}
	return v, finite(op, v, a, b)
}

// finite returns the Failure of a result that float64 cannot hold.
func finite(op string, v, a, b Value) error {
	if math.IsInf(v.f, 0) || math.IsNaN(v.f) {
		return fail(op, TooLarge, a, b)
	}
	return nil
}

// Neg returns -v.
func Neg(v Value) Value {
	if v.rat != nil {
		return fromOwnRat(v.kind, new(big.Rat).Neg(v.rat))
	}
	return Value{kind: v.kind, f: -v.f}
}

// Abs returns v without its sign.
func Abs(v Value) Value {
	if v.Sign() < 0 {
		return Neg(v)
	}
	return v
}

// Compare returns -1, 0 or 1 as a is less than, equal to or greater than b. They
// must be of one kind, the literal 0 goes with any, and a ratio may be compared
// with a plain number. Exact values are compared exactly.
func Compare(a, b Value) (int, error) {
	if !Comparable(a.kind, b.kind) {
		return 0, fail("compare", Mismatch, a, b)
	}
	if a.rat != nil && b.rat != nil {
		return a.rat.Cmp(b.rat), nil
	}
	switch {
	case a.f < b.f:
		return -1, nil
	case a.f > b.f:
		return 1, nil
	}
	return 0, nil
}

// Min returns the least of one or more values of one kind, the first of equals.
func Min(vs ...Value) (Value, error) { return extreme("min", -1, vs) }

// Max returns the greatest of one or more values of one kind, the first of equals.
func Max(vs ...Value) (Value, error) { return extreme("max", 1, vs) }

func extreme(op string, want int, vs []Value) (Value, error) {
	if len(vs) == 0 {
		return Value{}, fail(op, Nothing, Value{}, Value{})
	}
	best := vs[0]
	for _, v := range vs[1:] {
		kind, ok := Unify(best.kind, v.kind)
		if !ok {
			return Value{}, fail(op, Mismatch, best, v)
		}
		if order, _ := Compare(v, best); order == want {
			best = v
		}
		best.kind = kind
	}
	return best, nil
}

// Sum returns the sum of values of one kind; of none it is the literal zero.
func Sum(vs ...Value) (Value, error) {
	total := Whole(Zero, 0)
	for _, v := range vs {
		kind, ok := Unify(total.kind, v.kind)
		if !ok {
			return Value{}, fail("sum", Mismatch, total, v)
		}
		next, err := compute("sum", kind, total, v, (*big.Rat).Add, func(x, y float64) float64 { return x + y })
		if err != nil {
			return Value{}, err
		}
		total = next
	}
	return total, nil
}

// maxExactPower is the greatest whole exponent that is worked out exactly; above
// it even 2 to the power leaves the 256 bits.
const maxExactPower = maxBits

// Pow returns a to the power b. The exponent must be a plain number, and for a
// length one that leaves a whole power of length: area^0.5 is a length. A whole
// power of an exact number is exact, and so is the half power of a square.
func Pow(a, b Value) (Value, error) {
	if b.kind != Number && b.kind != Zero {
		return Value{}, fail("^", Exponent, a, b)
	}
	kind, ok := powerKind(a.kind, b)
	switch {
	case !ok:
		return Value{}, fail("^", NoPower, a, b)
	case a.Sign() == 0 && b.Sign() < 0:
		return Value{}, fail("^", ByZero, a, b)
	}
	if v, ok := exactPower(kind, a, b); ok {
		return v, finite("^", v, a, b)
	}
	v := Value{kind: kind, f: math.Pow(a.f, b.f)}
	if math.IsNaN(v.f) {
		return Value{}, fail("^", Domain, a, b)
	}
	return v, finite("^", v, a, b)
}

// powerKind returns the kind of a power whose base has kind k.
func powerKind(k Kind, exponent Value) (Kind, bool) {
	if k.isScalar() {
		return Number, true
	}
	if exponent.rat == nil || !smallRat(exponent.rat) {
		return Number, false
	}
	return Power(k, int(exponent.rat.Num().Int64()), int(exponent.rat.Denom().Int64()))
}

// smallRat says whether r fits where a power of length is worked out.
func smallRat(r *big.Rat) bool { return r.Num().BitLen() < 16 && r.Denom().BitLen() < 16 }

// exactPower works out whole and half powers of exact values.
func exactPower(kind Kind, a, b Value) (Value, bool) {
	if a.rat == nil || b.rat == nil || !smallRat(b.rat) {
		return Value{}, false
	}
	base, n := a.rat, b.rat.Num().Int64()
	switch den := b.rat.Denom().Int64(); {
	case n > maxExactPower || n < -maxExactPower || den > 2:
		return Value{}, false
	case den == 2:
		root, ok := perfectRoot(base)
		if !ok {
			return Value{}, false
		}
		base = root
	}
	return wholePower(kind, base, int(n))
}

// wholePower returns base to the power n, unless the result is over long; base
// is not 0 when n < 0.
func wholePower(kind Kind, base *big.Rat, n int) (Value, bool) {
	num, den := new(big.Int).Set(base.Num()), new(big.Int).Set(base.Denom())
	if n < 0 {
		num, den, n = den, num, -n
	}
	if max(num.BitLen(), den.BitLen())*n > 4*maxBits {
		return Value{}, false
	}
	e := big.NewInt(int64(n))
	r := new(big.Rat).SetFrac(num.Exp(num, e, nil), den.Exp(den, e, nil))
	return fromOwnRat(kind, r), true
}

// perfectRoot returns the square root of r when it is rational.
func perfectRoot(r *big.Rat) (*big.Rat, bool) {
	if r.Sign() < 0 {
		return nil, false
	}
	num, den := new(big.Int).Sqrt(r.Num()), new(big.Int).Sqrt(r.Denom())
	square := func(root, of *big.Int) bool { return new(big.Int).Mul(root, root).Cmp(of) == 0 }
	if !square(num, r.Num()) || !square(den, r.Denom()) {
		return nil, false
	}
	return new(big.Rat).SetFrac(num, den), true
}

// Sqrt returns the square root of v: of a plain number or a ratio a plain number,
// of a length to an even power half that power. It is exact for perfect squares.
func Sqrt(v Value) (Value, error) {
	kind, ok := Power(v.kind, 1, 2)
	switch {
	case !ok:
		return Value{}, fail("sqrt", NoPower, v, Value{})
	case v.Sign() < 0:
		return Value{}, fail("sqrt", Domain, v, Value{})
	}
	if v.rat != nil {
		if root, ok := perfectRoot(v.rat); ok {
			return fromOwnRat(kind, root), nil
		}
	}
	return Value{kind: kind, f: math.Sqrt(v.f)}, nil
}
