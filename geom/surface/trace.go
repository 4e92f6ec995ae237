package surface

import (
	"math"

	"epure/geom/curve"
	"epure/geom/num"
	"epure/geom/vec"
)

// Shape is what a plane and a curved surface have in common.
type Shape uint8

// The shapes. Nothing means that the plane passes the surface, or meets only
// the nappe of a cone that is not there.
const (
	Nothing Shape = iota
	PointOnly
	OneLine
	TwoLines
	Circle
	Ellipse
	Parabola
	Hyperbola
)

// Trace is the whole curve that a plane has in common with a cone or cylinder,
// worked out in the plane of symmetry from the distance of the apex and two
// cosines, so that no form of conic loses digits near another.
type Trace struct {
	Shape Shape
	// Sure is true when the shape does not rest on a bound of rounding.
	Sure bool
	// F has the centre (a parabola's vertex) as O, the major axis as X (toward
	// the focus of a parabola, toward the surface's own branch of a hyperbola)
	// and the plane's normal as Z.
	F vec.Frame
	// A and B are the semi-axes, mm; a parabola has its focal length in A, zero in B.
	A, B float64
	// Ecc is the eccentricity and L half the latus rectum, mm.
	Ecc, L float64
	// Near is the vertex nearest to a cone's apex (on a cylinder, the lower end
	// of X), U its slant distance from the apex, mm.
	Near vec.V3
	U    float64
	// Lines are the generators of OneLine and TwoLines.
	Lines []Ruling
}

// LongConic is the |1 - e²| under which a conic is held by its vertex: over it
// the centre lies within 2^10 latus recta, so that three digits at most are lost.
const LongConic = 0x1p-10

// arcs are the curves of the trace, each whole: the branch on the surface for a Hyperbola.
func (t Trace) arcs() []curve.Arc {
	var out []curve.Arc
	for _, r := range t.Lines {
		out = append(out, curve.Arc{Curve: r.Curve(), T0: math.Inf(-1), T1: math.Inf(1)})
	}
	c, ok := t.Conic()
	switch {
	case !ok:
	case c.Form.Periodic():
		out = append(out, curve.Arc{Curve: c, T0: 0, T1: 2 * math.Pi})
	default:
		out = append(out, curve.Arc{Curve: c, T0: math.Inf(-1), T1: math.Inf(1)})
	}
	return out
}

// Conic is the curve of a circle, ellipse, parabola or hyperbola (its branch on the
// surface), held by its vertex when it is long.
func (t Trace) Conic() (curve.Curve, bool) {
	long := math.Abs(1-t.Ecc*t.Ecc) < LongConic
	u, w := t.F.X.Scale(t.A), t.F.Y.Scale(t.B)
	switch {
	case t.Shape == Circle, t.Shape == Ellipse && !long:
		return curve.Curve{Form: curve.Ellipse, C: t.F.O, U: u, W: w}, true
	case t.Shape == Ellipse:
		return curve.Curve{Form: curve.EllipseEnd, C: t.Near, U: u, W: w}, true
	case t.Shape == Parabola: // y² = 4·f·x with y = t
		return curve.Curve{Form: curve.Parabola, C: t.F.O, U: t.F.Y, W: t.F.X.Scale(1 / (4 * t.A))}, true
	case t.Shape == Hyperbola && !long:
		return curve.Curve{Form: curve.Hyperbola, C: t.F.O, U: u, W: w}, true
	case t.Shape == Hyperbola:
		return curve.Curve{Form: curve.HyperbolaEnd, C: t.Near, U: u, W: w}, true
	}
	return curve.Curve{}, false
}

// Arcs are the curves in which p meets the nappe, see Met.
func (s Cone) Arcs(p Plane, gap float64, _ vec.V3, _ float64) []curve.Arc {
	return s.Trace(p, gap).arcs()
}

// Arcs are the curves in which p meets the cylinder, see Met. A plane so nearly along the axis that both
// vertices are far off gives the two sides of its ellipse apart, each held by
// its point at the level of at.
func (s Cylinder) Arcs(p Plane, gap float64, at vec.V3, size float64) []curve.Arc {
	t := s.Trace(p, gap)
	if t.Shape != Ellipse || 1-t.Ecc*t.Ecc >= LongConic {
		return t.arcs()
	}
	n := p.F.Z
	cb := n.Dot(s.F.Z)
	r := n.Along(s.F.Z, -cb).Unit()
	m := s.F.O.Along(s.F.Z, at.Sub(s.F.O).Dot(s.F.Z))
	q := p.F.O.Sub(m).Dot(n)
	rise := s.R * t.Ecc / cb // along the axis for a step of R towards r
	if near := math.Abs(math.Abs(q/cb) - math.Abs(rise)); near < size/LongConic {
		end := math.Copysign(1, q) // the vertex nearest to the level of at
		v := m.Along(r, s.R*end).Along(s.F.Z, q/cb-end*rise)
		return []curve.Arc{{Curve: s.side(v, r, rise, end, 0), T0: 0, T1: 2 * math.Pi}}
	}
	d := q / t.Ecc
	if math.Abs(d) >= s.R {
		return nil
	}
	half := math.Atan2(math.Sqrt((s.R-d)*(s.R+d)), d)
	sin, cos := math.Sincos(half)
	y := s.F.Z.Cross(r)
	o1, o2 := m.Along(r, d).Along(y, s.R*sin), m.Along(r, d).Along(y, -s.R*sin)
	return []curve.Arc{
		{Curve: s.side(o1, r, rise, cos, sin), T0: -half, T1: math.Pi - half},
		{Curve: s.side(o2, r, rise, cos, -sin), T0: half - math.Pi, T1: half},
	}
}

// side is the ellipse through its point o at the angle (cos, sin) about the axis from r.
func (s Cylinder) side(o, r vec.V3, rise, cos, sin float64) curve.Curve {
	y := s.F.Z.Cross(r)
	return curve.Curve{
		Form: curve.EllipseEnd, C: o,
		U: r.Scale(-s.R*cos).Along(y, -s.R*sin).Along(s.F.Z, rise*cos),
		W: r.Scale(-s.R*sin).Along(y, s.R*cos).Along(s.F.Z, rise*sin),
	}
}

// Trace returns what p has in common with the cylinder; a plane along the axis
// that passes it at R within gap mm touches it.
func (s Cylinder) Trace(p Plane, gap float64) Trace {
	n := p.F.Z
	cb, w := n.Dot(s.F.Z), n.Cross(s.F.Z)
	sb := w.Len()
	q := p.F.O.Sub(s.F.O).Dot(n)
	if math.Abs(cb) <= num.Direction {
		return s.parallel(n, q, gap, cb == 0)
	}
	t := Trace{Shape: Ellipse, Sure: true, Ecc: sb, A: s.R / math.Abs(cb), B: s.R}
	centre := s.F.O.Along(s.F.Z, q/cb)
	t.L = t.B * math.Abs(cb)
	x := p.F.X
	if sb <= num.Direction {
		t.Shape, t.Sure, t.Ecc, t.A, t.L = Circle, sb == 0, 0, s.R, s.R
	} else {
		x = w.Cross(n).Unit()
	}
	t.F = vec.Frame{O: centre, X: x, Y: n.Cross(x), Z: n}
	t.Near = centre.Along(x, -t.A)
	return t
}

// parallel is the trace of a plane along the axis, q from it.
func (s Cylinder) parallel(n vec.V3, q, gap float64, sure bool) Trace {
	phi := math.Atan2(n.Dot(s.F.Y), n.Dot(s.F.X))
	if q < 0 {
		q, phi = -q, phi+math.Pi
	}
	switch num.SignOf(s.R-q, gap) {
	case num.Negative:
		return Trace{Sure: true}
	case num.Zero:
		return Trace{Shape: OneLine, Lines: []Ruling{s.Ruling(phi)}}
	}
	half := math.Atan2(math.Sqrt((s.R-q)*(s.R+q)), q)
	return Trace{Shape: TwoLines, Sure: sure, Lines: []Ruling{s.Ruling(phi - half), s.Ruling(phi + half)}}
}

// Trace returns what p has in common with the nappe, see Tilt.
func (s Cone) Trace(p Plane, gap float64) Trace { return s.TraceAt(p, gap, s.Tilt(p)) }

// Tilt holds the angles between a plane and a cone: with the tilt b of the plane
// from square to the axis and the half angle a, the cosine and sine of b, and
// the cosines of b - a and b + a, whose signs are the kind of conic.
type Tilt struct {
	Cos, Sin, Minus, Plus float64
	// Sure is true when the sign of Plus does not rest on a bound of rounding.
	Sure bool
	flip bool
}

// Tilt returns the angles of p, its normal turned so that the apex lies behind
// it. Plus is exactly zero when it is zero within the rounding of both inputs.
func (s Cone) Tilt(p Plane) Tilt {
	m, n := s.Opens(), p.F.Z
	cb, sb := n.Dot(m), n.Cross(m).Len()
	q := p.F.O.Sub(s.F.O).Dot(n)
	t := Tilt{Sin: sb, flip: q < 0 || q == 0 && cb < 0}
	if t.flip {
		cb = -cb
	}
	t.Cos = cb
	t.Minus = float64(s.Cos*cb) + float64(s.Sin*sb)
	t.Plus = float64(s.Cos*cb) - float64(s.Sin*sb)
	t.Sure = math.Abs(t.Plus) > num.Direction
	if !t.Sure {
		t.Plus = 0
	}
	return t
}

// TraceAt is Trace for a tilt that is known better than p's normal tells it. A
// plane that passes the apex within gap mm goes through it.
func (s Cone) TraceAt(p Plane, gap float64, b Tilt) Trace {
	n, m := p.F.Z, s.Opens()
	q := math.Abs(p.F.O.Sub(s.F.O).Dot(n))
	if b.flip {
		n = n.Neg()
	}
	if q <= gap {
		if b.Cos < 0 {
			n, b.Cos = n.Neg(), -b.Cos
			b.Minus, b.Plus = -b.Plus, -b.Minus
		}
		return s.throughApex(n, b)
	}
	if b.Minus <= num.Direction {
		return Trace{Sure: true}
	}
	x := n.Cross(m).Cross(n).Unit()
	if b.Sin <= num.Direction {
		x = p.F.X
		b = Tilt{Cos: 1, Minus: s.Cos, Plus: s.Cos, Sure: b.Sin == 0}
	}
	t := Trace{Sure: b.Sure, L: q * s.Sin / s.Cos, U: q / b.Minus}
	foot := s.F.O.Along(n, q)
	t.Near = foot.Along(x, q*(float64(b.Sin*s.Cos)-float64(b.Cos*s.Sin))/b.Minus)
	t.F = vec.Frame{O: t.Near, X: x, Y: p.F.Z.Cross(x), Z: p.F.Z}
	s.axes(&t, q, b)
	return t
}

// axes fills in the shape, eccentricity, semi-axes and centre of a trace at the
// distance q from the apex.
func (s Cone) axes(t *Trace, q float64, b Tilt) {
	k := b.Minus * math.Abs(b.Plus) // |1 - e²|·cos²a
	t.Ecc = b.Sin / s.Cos
	if b.Plus == 0 {
		t.Shape, t.Ecc, t.A = Parabola, 1, t.L/2
		return
	}
	t.A, t.B = q*s.Sin*s.Cos/k, q*s.Sin/math.Sqrt(k)
	switch {
	case b.Sin == 0:
		t.Shape, t.Ecc, t.A, t.B = Circle, 0, t.L, t.L
		t.F.O = s.F.O.Along(t.F.Z, t.F.O.Sub(s.F.O).Dot(t.F.Z))
		t.Near = t.F.O.Along(t.F.X, -t.A)
	case b.Plus > 0:
		t.Shape, t.F.O = Ellipse, t.Near.Along(t.F.X, t.A)
	default:
		t.Shape, t.F.O = Hyperbola, t.Near.Along(t.F.X, -t.A)
	}
}

// throughApex is the trace of a plane through the apex with the normal n.
func (s Cone) throughApex(n vec.V3, b Tilt) Trace {
	t := Trace{Shape: PointOnly, Sure: b.Sure, Near: s.F.O}
	if b.Plus > 0 {
		return t
	}
	phi := math.Atan2(n.Dot(s.F.Y), n.Dot(s.F.X))
	if b.Plus == 0 {
		t.Shape, t.Lines = OneLine, []Ruling{s.Ruling(phi + math.Pi)}
		return t
	}
	half := math.Atan2(math.Sqrt(-b.Plus*b.Minus), -s.Cos*b.Cos)
	t.Shape = TwoLines
	t.Lines = []Ruling{s.Ruling(phi - half), s.Ruling(phi + half)}
	return t
}

// Traced is a surface that knows its trace in a plane.
type Traced interface {
	Ruled
	Met
	// Trace is what p has in common with the surface; gap is the distance, mm,
	// within which it passes an apex or touches.
	Trace(p Plane, gap float64) Trace
}

// Met is a curved surface that knows the curves in which planes meet it.
type Met interface {
	Surface
	// Arcs are the curves of the trace, whole but for parts that lie very far
	// from the sphere of the radius size about at, where they are wanted to the last digits.
	Arcs(p Plane, gap float64, at vec.V3, size float64) []curve.Arc
}

var _, _ Traced = Cylinder{}, Cone{}
