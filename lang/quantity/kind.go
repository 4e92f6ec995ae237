// Package quantity computes with lengths, angles, ratios and plain numbers.
//
// They are different kinds, so that a length added to an angle is an error where
// it is written and not a wrong drawing. A value stays an exact rational number
// until the first irrational step and records that loss: the geometry may then
// decide "is this exactly zero" from the numbers of the file, instead of from
// rounded ones. Lengths are in mm, angles in degrees (a whole degree is rational,
// a radian of it is not).
package quantity

import "fmt"

// Kind says what a value measures: a plain number, a ratio, a length to a power
// from -9 to 9, an angle, a length to a power times an angle, or the literal
// zero, which goes for any of them. Kinds are compared with ==.
type Kind int16

// The kinds that have a name. LengthTo gives the others.
const (
	Number Kind = 0
	Length Kind = 1
	Area   Kind = 2
	Volume Kind = 3
	Angle  Kind = angleStep
	Ratio  Kind = 1000 // 20 % or 1:2
	Zero   Kind = 1001 // 0 without a unit
)

// angleStep is what a power of an angle adds to a Kind; the powers of a length,
// -maxPower to maxPower, lie well inside half of it.
const angleStep = 32

// maxPower is the greatest power of a length, either way.
const maxPower = 9

// LengthTo returns the kind of a length to a power; ok is false outside -9..9.
func LengthTo(power int) (k Kind, ok bool) { return compose(power, 0) }

// compose makes a kind of a power of length and of angle.
func compose(length, angle int) (Kind, bool) {
	ok := -maxPower <= length && length <= maxPower && 0 <= angle && angle <= 1
	if !ok {
		return Number, false
	}
	return Kind(length + angleStep*angle), true
}

// Powers returns the powers of length and of angle in k; both are 0 for plain
// numbers, ratios and zero.
func (k Kind) Powers() (length, angle int) {
	if k.isScalar() {
		return 0, 0
	}
	angle = int(k+angleStep/2) / angleStep
	return int(k) - angleStep*angle, angle
}

// isScalar says whether k multiplies like a plain number.
func (k Kind) isScalar() bool { return k == Number || k == Ratio || k == Zero }

// String returns the kind in words with its article: "a length".
func (k Kind) String() string {
	switch k {
	case Number:
		return "a plain number"
	case Ratio:
		return "a ratio"
	case Zero:
		return "zero"
	case Length:
		return "a length"
	case Area:
		return "an area"
	case Volume:
		return "a volume"
	case Angle:
		return "an angle"
	}
	length, angle := k.Powers()
	if angle == 0 {
		return fmt.Sprintf("a length to the power %d", length)
	}
	rest, _ := LengthTo(length)
	return rest.String() + " times an angle"
}

// Unify returns the kind that sums, comparisons, min and max of a and b have: the
// common one, where zero goes with any. ok is false when they do not go together.
func Unify(a, b Kind) (k Kind, ok bool) {
	switch {
	case a == Zero:
		return b, true
	case b == Zero || a == b:
		return a, true
	}
	return Number, false
}

// Comparable says whether values of a and b may be compared: like Unify, and a
// ratio may be compared with a plain number, since both have one size.
func Comparable(a, b Kind) bool {
	_, ok := Unify(a, b)
	return ok || a.isScalar() && b.isScalar()
}

// Times returns the kind of a product. A ratio counts as a plain number beside
// anything with a unit; twice a ratio is a ratio.
func Times(a, b Kind) (k Kind, ok bool) {
	if a.isScalar() && b.isScalar() {
		if a == Ratio || b == Ratio {
			return Ratio, true
		}
		return Number, true
	}
	al, aa := a.Powers()
	bl, ba := b.Powers()
	return compose(al+bl, aa+ba)
}

// Over returns the kind of a quotient. A ratio over a plain number is a ratio;
// anything over its own kind is a plain number.
func Over(a, b Kind) (k Kind, ok bool) {
	if a == Ratio && (b == Number || b == Zero) {
		return Ratio, true
	}
	al, aa := a.Powers()
	bl, ba := b.Powers()
	return compose(al-bl, aa-ba)
}

// Power returns the kind of a value of kind k to the power num/den (den > 0).
// Lengths need a whole power as the result, angles the power 0 or 1.
func Power(k Kind, num, den int) (Kind, bool) {
	length, angle := k.Powers()
	if den <= 0 || length*num%den != 0 || angle*num%den != 0 {
		return Number, false
	}
	return compose(length*num/den, angle*num/den)
}
