package drawing

import (
	"epure/geom/curve"
	"epure/geom/vec"
)

// Path2 is a smooth curve of a plane, mm: what a development's edges are. The
// n-th derivative is asked for n = 1 only.
type Path2 interface {
	At(t float64) vec.V2
	Deriv(t float64, n int) vec.V2
}

// PaperTolerance is the largest distance in mm on paper that a drawn curve may
// lie off the exact one: a fiftieth of the narrowest line in use.
const PaperTolerance = 0.005

// FromPath2 places the piece from t0 to t1 (either way) of a smooth path on
// paper, like FromArc. A plain conic or line goes to FromArc and stays exact.
// Any other path becomes a Spline of cubics that share point and tangent with
// it at their ends. Err is measured: the largest difference, at seven even
// parameters inside each cubic, between cubic and path at the same parameter.
// That difference is never less than the distance to the path there.
func FromPath2(p Path2, t0, t1, scale float64, at vec.V2, tol float64) Shape {
	if c, ok := p.(curve.Curve2); ok {
		return FromArc(curve.Arc2{Curve2: c, T0: t0, T1: t1}, scale, at, tol)
	}
	q := placed{p, scale, at}
	return hermite(q, t0, t1, tol, func(a, b float64, c Cubic) float64 { return deviation(q, a, b, c) })
}

// placed is a path on paper.
type placed struct {
	path  Path2
	scale float64
	at    vec.V2
}

func (p placed) At(t float64) vec.V2           { return p.at.Along(p.path.At(t), p.scale) }
func (p placed) Deriv(t float64, n int) vec.V2 { return p.path.Deriv(t, n).Scale(p.scale) }

func deviation(p Path2, a, b float64, c Cubic) float64 {
	const steps = 8
	worst := 0.0
	for i := 1; i < steps; i++ {
		s := float64(i) / steps
		worst = max(worst, c.At(s).Dist(p.At(a+(b-a)*s)))
	}
	return worst
}

// The first halvings are made whatever the bound says, lest a wave that happens
// to vanish at the places measured pass for a line; the last bound the work: 2^14
// cubics draw a curve a kilometre long within a micrometre.
const (
	leastHalvings = 2
	mostHalvings  = 14
)

// hermite joins cubics along p from t0 to t1, halving each until bound (mm) is
// within tol, and records the largest bound met.
func hermite(p Path2, t0, t1, tol float64, bound func(t0, t1 float64, c Cubic) float64) Spline {
	out := Spline{Points: []vec.V2{p.At(t0)}}
	var add func(a, b float64, depth int)
	add = func(a, b float64, depth int) {
		c := hermiteCubic(p, a, b)
		err := bound(a, b, c)
		if depth < leastHalvings || (err > tol && depth < mostHalvings) {
			m := (a + b) / 2
			add(a, m, depth+1)
			add(m, b, depth+1)
			return
		}
		out.Points = append(out.Points, c[1], c[2], c[3])
		out.Err = max(out.Err, err)
	}
	add(t0, t1, 0)
	return out
}

func hermiteCubic(p Path2, a, b float64) Cubic {
	h := (b - a) / 3
	return Cubic{p.At(a), p.At(a).Along(p.Deriv(a, 1), h), p.At(b).Along(p.Deriv(b, 1), -h), p.At(b)}
}
