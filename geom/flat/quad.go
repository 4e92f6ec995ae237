package flat

import "math"

// integral returns the integral of the smooth function f over [a, b], a <= b.
// Gauss's rule with 16 points is compared with itself on the two halves, and
// halved until they agree. (The rule is written out here because its sums must
// be rounded alike on every machine.)
func integral(f func(float64) float64, a, b float64) float64 {
	if a == b {
		return 0
	}
	whole, size := gauss(f, a, b)
	q := quadrature{f, size / (b - a), leaves}
	return q.halves(a, b, whole, math.Inf(1), 0)
}

// agree is the share to which the rule and its halves must agree, of what lies
// under the stretch or of its share of the whole, whichever is more. Halving
// divides the error of a 16-point rule by 2^32 once it converges at all, so
// that halves which agree to 1e-11 err by far less than rounding.
const agree = 1e-11

// stalled is the share under which a rule that halving no longer mends, not even
// by a quarter, shows the rounding of f itself (an edge that runs nearly to
// infinity) and not its shape.
const stalled = 1e-9

// depth and leaves bound the halving whatever f is: a turn halved 24 times is 4e-7 rad.
const (
	depth  = 24
	leaves = 1 << 12
)

// quadrature is one integral at work: mean is the mean of |f|, left the number of halvings allowed.
type quadrature struct {
	f    func(float64) float64
	mean float64
	left int
}

// halves integrates over [a, b], where the rule gave whole; last is the share
// by which the level above disagreed.
func (q *quadrature) halves(a, b, whole, last float64, level int) float64 {
	m := (a + b) / 2
	l, sl := gauss(q.f, a, m)
	r, sr := gauss(q.f, m, b)
	q.left--
	off := math.Abs(l+r-whole) / max(sl+sr, q.mean*(b-a))
	switch {
	case !(off > agree), off <= stalled && off > last/4, level == depth, q.left <= 0:
		return l + r
	}
	return q.halves(a, m, l, off, level+1) + q.halves(m, b, r, off, level+1)
}

// gauss returns the Gauss-Legendre rule with 16 points for f and for |f|; nodes and weights are the
// roots of the Legendre polynomial, computed with 40 digits.
func gauss(f func(float64) float64, a, b float64) (sum, size float64) {
	rule := [...][2]float64{
		{0.98940093499164993260, 0.02715245941175409485},
		{0.94457502307323257608, 0.06225352393864789286},
		{0.86563120238783174388, 0.09515851168249278481},
		{0.75540440835500303390, 0.12462897125553387205},
		{0.61787624440264374845, 0.14959598881657673208},
		{0.45801677765722738634, 0.16915651939500253819},
		{0.28160355077925891323, 0.18260341504492358887},
		{0.09501250983763744019, 0.18945061045506849629},
	}
	mid, half := (a+b)/2, (b-a)/2
	for _, r := range rule {
		d := half * r[0]
		x, y := f(mid-d), f(mid+d)
		sum += float64(r[1] * (x + y))
		size += float64(r[1] * (math.Abs(x) + math.Abs(y)))
	}
	return half * sum, half * size
}

// bracket returns the root of f in [a, b] by halving down to neighbouring
// numbers; false when f has the same sign at both ends.
func bracket(f func(float64) float64, a, b float64) (float64, bool) {
	fa, fb := f(a), f(b)
	switch {
	case fa == 0:
		return a, true
	case fb == 0:
		return b, true
	case (fa > 0) == (fb > 0):
		return 0, false
	}
	for {
		m := a + (b-a)/2
		if m <= a || m >= b {
			return m, true
		}
		if fm := f(m); (fm > 0) == (fa > 0) && fm != 0 {
			a = m
		} else {
			b = m
		}
	}
}
