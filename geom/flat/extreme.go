package flat

import (
	"math"
	"slices"

	"epure/geom/curve"
)

// extremes returns parameters of the piece, among them all inside it at which x
// or y of the path is extreme.
func (p Piece) extremes() []float64 {
	a, b := min(p.T0, p.T1), max(p.T0, p.T1)
	switch q := p.Path.(type) {
	case Wave:
		return within(q.turns(), a, b)
	case Polar:
		return q.extremes(a, b)
	case curve.Curve2:
		if q.Form == curve.Ellipse { // a circle with its axes along x and y
			return within([]float64{0, math.Pi / 2, math.Pi, 3 * math.Pi / 2}, a, b)
		}
	}
	return nil
}

// extremes returns parameters in [a, b], among them all at which x or y is extreme.
//
// With the polar angle r·t, x = cos(r·t)/w has its extremes at the roots of
// h = w'·cos(r·t) + r·w·sin(r·t), and since h' = (w" + r²w)·cos(r·t), h is
// monotone between the roots of that product, which are known in closed form:
// w" + r²w = r²k - (1-r²)(c·cos t + s·sin t). Likewise y, with
// g = r·w·cos(r·t) - w'·sin(r·t) and g' = -(w" + r²w)·sin(r·t). So every root
// is bracketed and none is missed.
func (p Polar) extremes(a, b float64) []float64 {
	r := p.rate
	h := func(t float64) float64 {
		s, c := math.Sincos(r * t)
		return float64(p.w(t, 1)*c) + float64(float64(r*p.w(t, 0))*s)
	}
	g := func(t float64) float64 {
		s, c := math.Sincos(r * t)
		return float64(float64(r*p.w(t, 0))*c) - float64(p.w(t, 1)*s)
	}
	cuts := append(p.inflections(a, b), a, b)
	for q := math.Ceil(r * a / (math.Pi / 2)); float64(q*(math.Pi/2)) < r*b; q++ {
		cuts = append(cuts, min(b, max(a, q*(math.Pi/2)/r)))
	}
	slices.Sort(cuts)
	out := slices.Clone(cuts) // a root at a cut may be lost to rounding on both its sides
	for i := 1; i < len(cuts); i++ {
		for _, f := range []func(float64) float64{h, g} {
			if t, ok := bracket(f, cuts[i-1], cuts[i]); ok {
				out = append(out, t)
			}
		}
	}
	return out
}

// inflections returns the angles in (a, b) at which w" + r²w vanishes: there
// the edge changes the side to which it curves.
func (p Polar) inflections(a, b float64) []float64 {
	amp := (1 - float64(p.rate*p.rate)) * math.Hypot(p.c, p.s)
	ratio := float64(p.rate*p.rate) * p.k / amp
	if amp == 0 || math.Abs(ratio) > 1 {
		return nil
	}
	mid, off := math.Atan2(p.s, p.c), math.Acos(ratio)
	return within([]float64{wrap(mid + off), wrap(mid - off)}, a, b)
}
