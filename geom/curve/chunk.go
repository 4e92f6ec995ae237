package curve

import (
	"math"

	"epure/geom/num"
	"epure/geom/vec"
)

// chunk is a stretch of a parameter range, short enough that the curve over it
// is a well-behaved rational quadratic in x in [-1, 1]. About the middle m of the stretch
// every form is P + u·P″ + w·P′ with the weights of a conic at its vertex, so that all
// forms share one formula and no far-off centre enters.
type chunk struct {
	form Form
	m    float64 // the parameter at x = 0
	k    float64 // what x = 1 stands for: tan or tanh of a quarter of the stretch, or half of it
}

// The longest stretches: a quarter turn, and one unit of a hyperbola's parameter. Both keep the
// rational weight between 0.7 and 1.3.
const (
	longestTurn   = math.Pi / 2
	longestBranch = 1.0
)

// chunks cuts [lo, hi] into equal stretches.
func (f Form) chunks(lo, hi float64) []chunk {
	n := 1
	switch {
	case f.Periodic():
		n = int(math.Ceil((hi - lo) / longestTurn))
	case f == Hyperbola || f == HyperbolaEnd:
		n = int(math.Ceil((hi - lo) / longestBranch))
	}
	n = max(n, 1)
	out := make([]chunk, n)
	h := (hi - lo) / float64(2*n)
	for i := range out {
		out[i] = chunk{f, lo + float64(h*float64(2*i+1)), f.squeeze(h)}
	}
	return out
}

// squeeze is the parameter step s as the variable of the rational form.
func (f Form) squeeze(s float64) float64 {
	switch {
	case f.Periodic():
		return math.Tan(s / 2)
	case f == Hyperbola || f == HyperbolaEnd:
		return math.Tanh(s / 2)
	}
	return s
}

// param is the parameter at x.
func (c chunk) param(x float64) float64 {
	switch k := c.k * x; {
	case c.form.Periodic():
		return c.m + float64(2*math.Atan(k))
	case c.form == Hyperbola || c.form == HyperbolaEnd:
		return c.m + float64(2*math.Atanh(k))
	default:
		return c.m + k
	}
}

// numerator is the numerator of a coordinate that has the value p, the first
// derivative d1 and the second d2 at the middle.
func (c chunk) numerator(p, d1, d2 float64) num.Poly {
	k := c.k
	switch {
	case c.form.Periodic():
		return num.Poly{p, 2 * k * d1, k * k * (p + 2*d2)}
	case c.form == Hyperbola || c.form == HyperbolaEnd:
		return num.Poly{p, 2 * k * d1, k * k * (2*d2 - p)}
	}
	return num.Poly{p, k * d1, k * k * d2 / 2}
}

// weight is the common denominator.
func (c chunk) weight() num.Poly {
	switch {
	case c.form.Periodic():
		return num.Poly{1, 0, c.k * c.k}
	case c.form == Hyperbola || c.form == HyperbolaEnd:
		return num.Poly{1, 0, -c.k * c.k}
	}
	return num.Poly{1}
}

// edgeSlack widens [-1, 1] so that a zero at the end of a stretch is not lost to
// rounding, which two thin ellipses that meet at their tips raise to 1e-9; 2^-16 of a stretch is
// far over that, and what is found outside an arc is dropped or clamped by the caller.
const edgeSlack = 0x1p-16

// zerosOf returns the parameters at which poly vanishes over the chunk; on says whether
// the point at a parameter counts as lying on the other curve.
func (c chunk) zerosOf(poly num.Poly, on func(t float64) bool) []float64 {
	xs := poly.Zeros(-1-edgeSlack, 1+edgeSlack, func(x float64) bool { return on(c.param(x)) })
	for i, x := range xs {
		xs[i] = c.param(x)
	}
	return xs
}

// Vanish returns the parameters, ascending, at which a form of second degree in
// the coordinates of the frame f vanishes on the arc. quad gets the numerators
// of the coordinates over one stretch with their common denominator and returns
// the polynomial; on says whether the point at a parameter lies within tolerance, so that a contact counts once.
func (a Arc) Vanish(f vec.Frame, quad func(x, y, z, w num.Poly) num.Poly, on func(t float64) bool) []float64 {
	var out []float64
	for _, c := range a.Form.chunks(a.T0, a.T1) {
		p, d1, d2 := f.Local(a.At(c.m)), f.Dir(a.Deriv(c.m, 1)), f.Dir(a.Deriv(c.m, 2))
		x := c.numerator(p.X, d1.X, d2.X)
		y := c.numerator(p.Y, d1.Y, d2.Y)
		z := c.numerator(p.Z, d1.Z, d2.Z)
		out = append(out, c.zerosOf(quad(x, y, z, c.weight()), on)...)
	}
	return out
}
