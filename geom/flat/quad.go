package flat

import (
	"math"

	"epure/geom/num"
)

// integral returns the integral of the smooth function f over [a, b], a <= b.
// The 16-point rule on a stretch is compared with itself on the two halves,
// and halved until they agree. Unlike num.Integrate it may meet edges that run
// nearly to infinity, where f itself is rounded more coarsely than any
// agreement asked for; it notices that halving no longer helps, and stops.
func integral(f func(float64) float64, a, b float64) float64 {
	if a == b {
		return 0
	}
	var part [stretches]float64
	size := 0.0
	at := func(k int) float64 { return a + float64((b-a)*(float64(k)/stretches)) }
	for k := range part {
		part[k] = num.Panel(f, at(k), at(k+1))
		size += math.Abs(part[k])
	}
	q := quadrature{f, size / (b - a), leaves}
	sum := 0.0
	for k := range part {
		sum += q.halves(at(k), at(k+1), part[k], math.Inf(1), 0)
	}
	return sum
}

// stretches is the number of parts in which the size of f is judged, so that
// one which changes its sign is not taken for small.
const stretches = 4

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
	l, r := num.Panel(q.f, a, m), num.Panel(q.f, m, b)
	q.left--
	off := math.Abs(l+r-whole) / max(math.Abs(l)+math.Abs(r), q.mean*(b-a))
	switch {
	case !(off > agree), off <= stalled && off > last/4, level == depth, q.left <= 0:
		return l + r
	}
	return q.halves(a, m, l, off, level+1) + q.halves(m, b, r, off, level+1)
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
