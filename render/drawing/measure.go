package drawing

import (
	"math"

	"epure/geom/vec"
)

// Points, tangents, lengths and bounds of shapes, on paper. Writers and
// composers need lengths for dashes and bounds for room; geometry never comes
// here to measure.

// At returns the point of the arc at the parameter t (radians).
func (e EllipseArc) At(t float64) vec.V2 {
	s, c := math.Sincos(t)
	return e.place(e.RX*c, e.RY*s)
}

// Tangent returns the derivative of At at t, mm per radian.
func (e EllipseArc) Tangent(t float64) vec.V2 {
	s, c := math.Sincos(t)
	return e.place(-e.RX*s, e.RY*c).Sub(e.C)
}

func (e EllipseArc) place(x, y float64) vec.V2 {
	s, c := math.Sincos(e.Rot)
	return vec.V2{X: e.C.X + float64(x*c) - float64(y*s), Y: e.C.Y + float64(x*s) + float64(y*c)}
}

// At returns the point at t, 0 to 1.
func (l Line) At(t float64) vec.V2 { return l.A.Along(l.B.Sub(l.A), t) }

// At returns the point at t, 0 to 1.
func (q Quad) At(t float64) vec.V2 {
	a := Line{q.P0, q.P1}.At(t)
	return a.Along(Line{q.P1, q.P2}.At(t).Sub(a), t)
}

// Tangent returns the derivative at t.
func (q Quad) Tangent(t float64) vec.V2 {
	return Line{q.P1.Sub(q.P0), q.P2.Sub(q.P1)}.At(t).Scale(2)
}

// Cubic is one cubic Bézier curve, a member of a Spline.
type Cubic [4]vec.V2

// At returns the point at t, 0 to 1.
func (c Cubic) At(t float64) vec.V2 {
	a := Quad{c[0], c[1], c[2]}.At(t)
	return a.Along(Quad{c[1], c[2], c[3]}.At(t).Sub(a), t)
}

// Tangent returns the derivative at t.
func (c Cubic) Tangent(t float64) vec.V2 {
	return Quad{c[1].Sub(c[0]), c[2].Sub(c[1]), c[3].Sub(c[2])}.At(t).Scale(3)
}

// Cubics returns the members of the spline; points left over are dropped.
func (s Spline) Cubics() []Cubic {
	var out []Cubic
	for i := 0; i+3 < len(s.Points); i += 3 {
		out = append(out, Cubic(s.Points[i:i+4]))
	}
	return out
}

// Ends returns the first and the last point of a shape; ok is false for a shape
// without points and for a Text.
func Ends(s Shape) (from, to vec.V2, ok bool) {
	switch s := s.(type) {
	case Line:
		return s.A, s.B, true
	case EllipseArc:
		return s.At(s.From), s.At(s.To), true
	case Quad:
		return s.P0, s.P2, true
	case Spline:
		if n := len(s.Points); n > 0 {
			return s.Points[0], s.Points[n-1], true
		}
	case Path:
		if n := len(s.Pieces); n > 0 {
			from, _, ok = Ends(s.Pieces[0])
			_, to, _ = Ends(s.Pieces[n-1])
			return from, to, ok
		}
	}
	return vec.V2{}, vec.V2{}, false
}

// Length returns the length of a shape in mm, to 1e-12 of itself or better for
// any shape without a cusp; a Text has none.
func Length(s Shape) float64 {
	switch s := s.(type) {
	case Line:
		return s.A.Dist(s.B)
	case EllipseArc:
		if s.RX == s.RY {
			return s.RX * math.Abs(s.To-s.From)
		}
		return math.Abs(arcLength(s.Tangent, s.From, s.To))
	case Quad:
		return arcLength(s.Tangent, 0, 1)
	case Spline:
		l := 0.0
		for _, c := range s.Cubics() {
			l += arcLength(c.Tangent, 0, 1)
		}
		return l
	case Path:
		l := 0.0
		for _, p := range s.Pieces {
			l += Length(p)
		}
		return l + s.gap()
	}
	return 0
}

// gap is the length of the line that closes a closed path: nothing when its
// last piece ends at the start.
func (p Path) gap() float64 {
	from, to, ok := Ends(p)
	if !ok || !p.Closed {
		return 0
	}
	return from.Dist(to)
}

// lengthAgree is the relative difference at which two estimates of an arc length
// are taken as equal. The finer of the two is some 2^20 times better than their
// difference (ten-point Gauss, error h^20), so the result is good to rounding.
const lengthAgree = 1e-11

// deepest bounds the halvings: at 2^-40 of a curve no length is left to find.
const deepest = 40

// arcLength integrates |d| from a to b by ten-point Gauss quadrature, halving
// until whole and halves agree.
func arcLength(d func(float64) vec.V2, a, b float64) float64 {
	whole := gauss(d, a, b)
	return refine(d, a, b, whole, math.Abs(whole)*lengthAgree, deepest)
}

func refine(d func(float64) vec.V2, a, b, whole, tol float64, depth int) float64 {
	m := (a + b) / 2
	l, r := gauss(d, a, m), gauss(d, m, b)
	if depth == 0 || !(math.Abs(l+r-whole) > tol) { // NaN stops here too
		return l + r
	}
	return refine(d, a, m, l, tol/2, depth-1) + refine(d, m, b, r, tol/2, depth-1)
}

// gauss is ten-point Gauss-Legendre quadrature (nodes and weights: Abramowitz
// and Stegun, table 25.4, n = 10).
func gauss(d func(float64) vec.V2, a, b float64) float64 {
	nodes := [5][2]float64{
		{0.148874338981631211, 0.295524224714752870},
		{0.433395394129247191, 0.269266719309996355},
		{0.679409568299024406, 0.219086362515982044},
		{0.865063366688984511, 0.149451349150580593},
		{0.973906528517171720, 0.066671344308688138},
	}
	m, h := (a+b)/2, (b-a)/2
	s := 0.0
	for _, n := range nodes {
		s += n[1] * (d(m-h*n[0]).Len() + d(m+h*n[0]).Len())
	}
	return s * h
}

// Dir returns the unit vector at the angle (radians anticlockwise from
// rightward). Whole quarter turns give whole components.
func Dir(angle float64) vec.V2 {
	s, c := math.Sincos(angle)
	if q := angle / (math.Pi / 2); q == math.Round(q) {
		s, c = math.Round(s), math.Round(c)
	}
	return vec.V2{X: c, Y: s}
}
