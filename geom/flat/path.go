package flat

import (
	"math"

	"epure/geom/curve"
	"epure/geom/vec"
)

// Path2 is a smooth curve of the flat plane: a curve.Curve2 (straight edges and
// circles), Wave or Polar. Deriv takes n >= 1.
type Path2 interface {
	At(t float64) vec.V2
	Deriv(t float64, n int) vec.V2
}

var (
	_ Path2 = curve.Curve2{}
	_ Path2 = Wave{}
	_ Path2 = Polar{}
)

// Wave is the edge of an unrolled cylinder cut aslant: x = hand·r·t, y a sine
// wave of t, the angle from the seam in radians.
type Wave struct {
	profile
	r, hand float64
}

// At returns the point at t.
func (w Wave) At(t float64) vec.V2 {
	return vec.V2{X: float64(w.hand*float64(w.r*t)) + 0, Y: w.u(t)}
}

// Deriv returns the n-th derivative at t.
func (w Wave) Deriv(t float64, n int) vec.V2 {
	d := vec.V2{Y: w.w(t, n)}
	if n == 1 {
		d.X = w.hand * w.r
	}
	return d
}

// Polar is the edge of an unrolled cone cut aslant: the polar radius is
// 1/(k + c·cos t + s·sin t) at the polar angle hand·rate·t; t is the angle about
// the axis from the seam in radians, rate the sine of the half angle.
type Polar struct {
	profile
	rate, hand float64
}

// At returns the point at t.
func (p Polar) At(t float64) vec.V2 {
	s, c := math.Sincos(p.rate * t)
	u := p.u(t)
	return vec.V2{X: float64(u*c) + 0, Y: float64(p.hand*float64(u*s)) + 0}
}

// Deriv returns the n-th derivative at t: the rule of the product on u(t)
// times (cos, sin) of the polar angle.
func (p Polar) Deriv(t float64, n int) vec.V2 {
	sin, cos := math.Sincos(p.rate * t)
	u := p.derivs(t, n)
	var d vec.V2
	binom, pow := 1.0, 1.0 // binom(n, j), rate^j for the j-th derivative of (cos, sin)
	c, s := cos, sin
	for j := 0; j <= n; j++ {
		k := float64(binom*pow) * u[n-j]
		d = d.Along(vec.V2{X: c, Y: s}, k)
		c, s = 0-s, c
		binom = binom * float64(n-j) / float64(j+1)
		pow *= p.rate
	}
	d.Y = float64(p.hand*d.Y) + 0
	return d
}

// Piece is a piece T0 <= t <= T1 (or backwards, T1 < T0) of a pattern's
// outline. Face is the index of the body's other face along this edge, or
// Seam; Label is that face's label, empty for the seam.
type Piece struct {
	Path   Path2
	T0, T1 float64
	Face   int
	Label  string
}

// Seam stands for the face of a piece that is one side of the seam.
const Seam = -1

// Start is the first point in the sense of the outline.
func (p Piece) Start() vec.V2 { return p.Path.At(p.T0) }

// End is the last point.
func (p Piece) End() vec.V2 { return p.Path.At(p.T1) }

// Arc2 returns the piece as an exact straight line or arc of a circle, in the
// sense of the outline; false for a Wave or Polar.
func (p Piece) Arc2() (curve.Arc2, bool) {
	c, ok := p.Path.(curve.Curve2)
	if !ok {
		return curve.Arc2{}, false
	}
	if p.T0 <= p.T1 {
		return curve.Arc2{Curve2: c, T0: p.T0, T1: p.T1}, true
	}
	if c.Form == curve.Line { // the sense turns with U, the parameter with it
		c.U = vec.V2{X: 0 - c.U.X, Y: 0 - c.U.Y}
	} else {
		c.W = vec.V2{X: 0 - c.W.X, Y: 0 - c.W.Y}
	}
	return curve.Arc2{Curve2: c, T0: 0 - p.T0, T1: 0 - p.T1}, true
}

// IsArc tells whether the piece is an exact arc of a circle.
func (p Piece) IsArc() bool {
	c, ok := p.Path.(curve.Curve2)
	return ok && c.Form == curve.Ellipse
}

// IsLine tells whether the piece is straight.
func (p Piece) IsLine() bool {
	c, ok := p.Path.(curve.Curve2)
	return ok && c.Form == curve.Line
}

// Length is the length of the piece, mm.
func (p Piece) Length() float64 {
	c, ok := p.Path.(curve.Curve2)
	switch {
	case !ok:
		lo, hi := min(p.T0, p.T1), max(p.T0, p.T1)
		return integral(func(t float64) float64 { return p.Path.Deriv(t, 1).Len() }, lo, hi)
	case c.Form == curve.Line:
		return math.Abs(p.T1 - p.T0)
	}
	return c.U.Len() * math.Abs(p.T1-p.T0)
}

// rimPath returns the path of the rim j from the angle a to the angle b.
func (p *Pattern) rimPath(j int, a, b float64) (path Path2, t0, t1 float64) {
	m, r := p.rims[j], p.roll
	switch {
	case !m.square() && r.cone:
		return Polar{m.profile, r.sin, r.hand}, a, b
	case !m.square():
		return Wave{m.profile, r.r, r.hand}, a, b
	case r.cone:
		u := m.u(0)
		c := curve.Curve2{Form: curve.Ellipse, U: vec.V2{X: u}, W: vec.V2{Y: r.hand * u}}
		return c, r.sin * a, r.sin * b
	}
	c := curve.Curve2{Form: curve.Line, C: vec.V2{Y: m.u(0)}, U: vec.V2{X: r.hand}}
	return c, r.r * a, r.r * b
}

// wallPath returns the generator at phi as a path whose parameter is u.
func (r roll) wallPath(phi float64) Path2 {
	if r.cone {
		return curve.Curve2{Form: curve.Line, U: r.flat(phi, 1)}
	}
	return curve.Curve2{Form: curve.Line, C: r.flat(phi, 0), U: vec.V2{Y: 1}}
}
