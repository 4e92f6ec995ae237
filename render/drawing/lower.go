package drawing

import (
	"math"

	"epure/geom/curve"
	"epure/geom/vec"
)

// Lowering: exact plane curves become shapes. Lines, ellipses and parabolas stay
// exact; a hyperbola becomes a chain of cubics with a proved bound. Every
// lowering keeps the direction of its curve, so that pieces chain.

// FlatAxis is the semi-axis (mm on paper) under which an ellipse or another
// conic seen on edge is drawn as the straight line that it covers. Writers round
// to 1e-4 mm, so half of that cannot be told from zero.
const FlatAxis = 0.5e-4

// roundTie is the relative difference of two conjugate semi-diameters (and their
// cosine) under which an ellipse is a circle. It is some thousand units in the
// last place, the rounding of a projection, and moves no point by more than
// 1e-12 of the radius.
const roundTie = 1e-12

// FromArc places a plane curve on paper: a is in mm of the view, scale is paper
// over view, at is the paper point of the view's origin, tol the largest
// distance in mm on paper that a hyperbola's cubics may lie off the curve. The
// result is a Line, an EllipseArc, a Quad (parabola) or a Spline (hyperbola),
// running from T0 to T1. A curve seen on edge becomes the Line that it covers.
func FromArc(a curve.Arc2, scale float64, at vec.V2, tol float64) Shape {
	a.C = at.Along(a.C, scale)
	a.U, a.W = a.U.Scale(scale), a.W.Scale(scale)
	switch p := (onPaper{a}); a.Form {
	case curve.Line:
		return Line{a.Start(), a.End()}
	case curve.Ellipse:
		return fromEllipse(p)
	case curve.Parabola:
		return fromParabola(p)
	case curve.Hyperbola:
		return fromHyperbola(p, tol)
	}
	return Path{}
}

// onPaper is an arc in paper mm.
type onPaper struct{ curve.Arc2 }

// fromEllipse turns the conjugate semi-diameters U, W into the axes P, Q. With
// U cos t + W sin t = P cos(t-t0) + Q sin(t-t0), P and Q are square to each
// other when tan 2t0 = 2U·W / (U² - W²); this t0 makes P the longer one.
func fromEllipse(a onPaper) Shape {
	uu, ww, uw := a.U.Dot(a.U), a.W.Dot(a.W), a.U.Dot(a.W)
	if math.Hypot(uu-ww, 2*uw) <= roundTie*(uu+ww) {
		return fromCircle(a)
	}
	t0 := math.Atan2(2*uw, uu-ww) / 2
	s, c := math.Sincos(t0)
	p := a.U.Scale(c).Along(a.W, s)
	// |Q| from the area: |U×W| = |P||Q|. From its vector it would lose digits when flat.
	area := a.U.Cross(a.W)
	rx := p.Len()
	ry := math.Abs(area) / rx
	if !(ry > FlatAxis) {
		return flat(a, p.Unit(), turns(t0, a.T0, a.T1))
	}
	from, to := a.T0-t0, a.T1-t0
	if area < 0 {
		from, to = -from, -to
	}
	return EllipseArc{C: a.C, RX: rx, RY: ry, Rot: math.Atan2(p.Y, p.X), From: from, To: to}
}

func fromCircle(a onPaper) Shape {
	r := a.U.Len()
	if !(r > FlatAxis) {
		return Line{a.Start(), a.End()}
	}
	t0 := math.Atan2(a.U.Y, a.U.X)
	if a.U.Cross(a.W) < 0 {
		return EllipseArc{C: a.C, RX: r, RY: r, From: t0 - a.T0, To: t0 - a.T1}
	}
	return EllipseArc{C: a.C, RX: r, RY: r, From: t0 + a.T0, To: t0 + a.T1}
}

// turns returns t0 + kπ strictly between a and b.
func turns(t0, a, b float64) []float64 {
	return EllipseArc{From: a, To: b}.inside(t0, math.Pi)
}

// fromParabola uses the blossom of C + tU + t²W: the middle control point is
// C + (T0+T1)/2·U + T0·T1·W, with no approximation.
func fromParabola(a onPaper) Shape {
	q := Quad{a.Start(), a.C.Along(a.U, (a.T0+a.T1)/2).Along(a.W, a.T0*a.T1), a.End()}
	d := longest(a.U, a.W).Unit()
	if a.off(d, q.P0) || a.off(d, q.P1) || a.off(d, q.P2) {
		return q
	}
	return flat(a, d, between(-a.U.Dot(d)/(2*a.W.Dot(d)), a.T0, a.T1))
}

// fromHyperbola joins Hermite cubics, halving the parameter until the bound
// h^4/384 max|P""| of cubic Hermite interpolation is within tol. The fourth
// derivative of cosh t·U + sinh t·W is the vector itself, whose length is convex
// in t, so that its maximum is at an end: the recorded Err is a proved bound.
func fromHyperbola(a onPaper, tol float64) Shape {
	d := longest(a.U, a.W).Unit()
	if !a.off(d, a.Start()) && !a.off(d, a.End()) && !a.off(d, a.C.Add(a.U)) {
		return flat(a, d, between(math.Atanh(-a.W.Dot(d)/a.U.Dot(d)), a.T0, a.T1))
	}
	bound := func(t0, t1 float64, _ Cubic) float64 {
		h := (t1 - t0) * (t1 - t0)
		return h * h / 384 * max(a.At(t0).Dist(a.C), a.At(t1).Dist(a.C))
	}
	return hermite(a.Curve2, a.T0, a.T1, tol, bound)
}

// off reports whether p can be told from the line through the centre along the
// unit vector d.
func (a onPaper) off(d, p vec.V2) bool { return math.Abs(p.Sub(a.C).Cross(d)) > FlatAxis }

// flat returns the line through the centre along the unit vector d that the arc
// covers, given the parameters inside it where it turns back. It runs the way
// from the arc's start to its end.
func flat(a onPaper, d vec.V2, turns []float64) Shape {
	from, to := a.Start().Sub(a.C).Dot(d), a.End().Sub(a.C).Dot(d)
	lo, hi := min(from, to), max(from, to)
	for _, t := range turns {
		s := a.At(t).Sub(a.C).Dot(d)
		lo, hi = min(lo, s), max(hi, s)
	}
	if from > to {
		lo, hi = hi, lo
	}
	return Line{a.C.Along(d, lo), a.C.Along(d, hi)}
}

// between returns t when it lies strictly between a and b.
func between(t, a, b float64) []float64 {
	if t > min(a, b) && t < max(a, b) {
		return []float64{t}
	}
	return nil
}

func longest(u, w vec.V2) vec.V2 {
	if u.Len() >= w.Len() {
		return u
	}
	return w
}
