// Package curve holds the curves that carry their own equation: lines and
// conics of space and of a plane, and arcs of them.
//
// All four forms are written with one centre and two vectors, so that a
// parallel projection of a curve is the curve of the projected vectors, with
// the same parameter. A conic never turns into points before a writer asks.
package curve

import (
	"math"

	"epure/geom/vec"
)

// Form is the kind of parametrisation.
type Form uint8

// The forms. C is the centre (a parabola's vertex or any point of it, a line's
// origin); U and W are vectors in mm.
const (
	Line      Form = iota + 1 // C + t·U
	Ellipse                   // C + cos t·U + sin t·W; circles too
	Parabola                  // C + t·U + t²·W
	Hyperbola                 // C + cosh t·U + sinh t·W, one branch

	// A conic whose centre lies very far off is held by its vertex C, so that no
	// digits are lost: an ellipse with the centre C + U, a branch with C - U.
	EllipseEnd   // C + (1 - cos t)·U + sin t·W
	HyperbolaEnd // C + (cosh t - 1)·U + sinh t·W
)

// Curve is an unbounded curve of space. For a Line, U is a unit vector and t
// is mm.
type Curve struct {
	Form    Form
	C, U, W vec.V3
}

// Curve2 is an unbounded curve of a plane. Projected lines need not have a
// unit U.
type Curve2 struct {
	Form    Form
	C, U, W vec.V2
}

// Arc is the part T0 <= t <= T1 of a curve. A whole ellipse has T1 = T0 + 2π.
// The zero Form holds only the point C.
type Arc struct {
	Curve
	T0, T1 float64
}

// Arc2 is the part T0 <= t <= T1 of a plane curve.
type Arc2 struct {
	Curve2
	T0, T1 float64
}

// weights returns the factors of U and W at t, or of their n-th derivatives.
func (f Form) weights(t float64, n int) (u, w float64) {
	switch f {
	case Line:
		switch n {
		case 0:
			return t, 0
		case 1:
			return 1, 0
		}
		return 0, 0
	case Ellipse:
		s, c := math.Sincos(t)
		switch n % 4 {
		case 0:
			return c, s
		case 1:
			return -s, c
		case 2:
			return -c, -s
		}
		return s, -c
	case Parabola:
		switch n {
		case 0:
			return t, float64(t * t)
		case 1:
			return 1, 2 * t
		case 2:
			return 0, 2
		}
		return 0, 0
	case Hyperbola:
		c, s := math.Cosh(t), math.Sinh(t)
		if n%2 == 0 {
			return c, s
		}
		return s, c
	case EllipseEnd:
		if n == 0 {
			h := math.Sin(t / 2)
			return 2 * h * h, math.Sin(t)
		}
		c, s := Ellipse.weights(t, n)
		return -c, s
	case HyperbolaEnd:
		if n == 0 {
			h := math.Sinh(t / 2)
			return 2 * h * h, math.Sinh(t)
		}
		return Hyperbola.weights(t, n)
	}
	return 0, 0
}

// Periodic tells whether the parameter comes round after 2π.
func (f Form) Periodic() bool { return f == Ellipse || f == EllipseEnd }

// At returns the point at t.
func (c Curve) At(t float64) vec.V3 {
	u, w := c.Form.weights(t, 0)
	return c.C.Along(c.U, u).Along(c.W, w)
}

// Deriv returns the n-th derivative at t, n > 0.
func (c Curve) Deriv(t float64, n int) vec.V3 {
	u, w := c.Form.weights(t, n)
	return c.U.Scale(u).Along(c.W, w)
}

// At returns the point at t.
func (c Curve2) At(t float64) vec.V2 {
	u, w := c.Form.weights(t, 0)
	return c.C.Along(c.U, u).Along(c.W, w)
}

// Deriv returns the n-th derivative at t, n > 0.
func (c Curve2) Deriv(t float64, n int) vec.V2 {
	u, w := c.Form.weights(t, n)
	return c.U.Scale(u).Along(c.W, w)
}

// Project drops the curve along f.Z on to the plane of f, with the same parameter.
func (c Curve) Project(f vec.Frame) Curve2 {
	u, w := f.Dir(c.U), f.Dir(c.W)
	return Curve2{c.Form, f.Flat(c.C), vec.V2{X: u.X, Y: u.Y}, vec.V2{X: w.X, Y: w.Y}}
}

// Project drops the arc along f.Z on to the plane of f, with the same parameter.
func (a Arc) Project(f vec.Frame) Arc2 { return Arc2{a.Curve.Project(f), a.T0, a.T1} }

// Lift places a curve of the plane of f in space.
func (c Curve2) Lift(f vec.Frame) Curve {
	up := func(v vec.V2) vec.V3 { return f.X.Scale(v.X).Along(f.Y, v.Y) }
	return Curve{c.Form, f.Lift(c.C), up(c.U), up(c.W)}
}

// Start, End and Mid are the points at T0, T1 and halfway between in parameter.
func (a Arc) Start() vec.V3 { return a.At(a.T0) }

// End is the point at T1.
func (a Arc) End() vec.V3 { return a.At(a.T1) }

// Mid is the point halfway in parameter.
func (a Arc) Mid() vec.V3 { return a.At((a.T0 + a.T1) / 2) }

// Start is the point at T0.
func (a Arc2) Start() vec.V2 { return a.At(a.T0) }

// End is the point at T1.
func (a Arc2) End() vec.V2 { return a.At(a.T1) }

// Mid is the point halfway in parameter.
func (a Arc2) Mid() vec.V2 { return a.At((a.T0 + a.T1) / 2) }

// Segment returns the arc of the straight line from p to q (p not q).
func Segment(p, q vec.V3) Arc {
	d := q.Sub(p)
	return Arc{Curve{Form: Line, C: p, U: d.Unit()}, 0, d.Len()}
}

// Segment2 returns the arc of the straight line from p to q (p not q).
func Segment2(p, q vec.V2) Arc2 {
	d := q.Sub(p)
	return Arc2{Curve2{Form: Line, C: p, U: d.Unit()}, 0, d.Len()}
}

// Circle returns the circle of radius r about f.O in the plane of f, starting
// along f.X, anticlockwise looking against f.Z.
func Circle(f vec.Frame, r float64) Curve {
	return Curve{Ellipse, f.O, f.X.Scale(r), f.Y.Scale(r)}
}
