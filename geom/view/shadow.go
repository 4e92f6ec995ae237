package view

import (
	"math"
	"slices"

	"epure/geom/body"
	"epure/geom/curve"
	"epure/geom/num"
	"epure/geom/vec"
)

// The shadow of a body is the set of points that it covers. That of a convex
// body is convex, so a curve lies in it when the corners of a polygon round
// the curve do. Such a curve is hidden throughout; it is not split, and it splits
// no other, since whatever lies behind it is in the same shadow. In a crowded
// view most curves are of this kind, and the work no longer grows with the
// square of their number.

// coverOf counts the layers of the body k before p: its intervals of which what lies in front of p has
// a middle deeper than the body's bound for a point on its surface and the error e of p together.
func (s *scene) coverOf(k int, p vec.V3, e float64) int {
	b, n := s.bodies[k], 0
	for _, v := range b.Intervals(p, s.f.Z) {
		a := max(v.A, 0)
		if v.B > a && b.Depth(p.Along(s.f.Z, (a+v.B)/2)) < -float64(num.OnSurface*b.Size())-2*e {
			n++
		}
	}
	return n
}

// covered tells whether material lies between p and the viewer, e being the error of p, mm.
func (s *scene) covered(p vec.V3, e float64) bool {
	return slices.ContainsFunc(s.before(p, e), func(k int) bool { return s.coverOf(k, p, e) > 0 })
}

// before are the bodies that the ray from p to the viewer may meet.
func (s *scene) before(p vec.V3, e float64) []int {
	q := s.f.Local(p)
	at := vec.V2{X: q.X, Y: q.Y}
	return s.at(box{at, at}, q.Z, math.Inf(1), e)
}

// inShadow tells whether the arc lies in the shadow of one body: the corners round each
// stretch in the shadow or on its border, the middle of the stretch inside. Then all of the stretch
// but its ends is inside, since a plane that bounds the shadow and met it
// elsewhere would hold the whole stretch.
func (s *scene) inShadow(a curve.Arc, e float64) bool {
	round, middles := corners(a)
	for _, k := range s.before(middles[0], e) {
		if s.bodies[k].Convex() &&
			!slices.ContainsFunc(middles, func(p vec.V3) bool { return s.coverOf(k, p, e) == 0 }) &&
			!slices.ContainsFunc(round, func(p vec.V3) bool { return !s.reaches(s.bodies[k], p, e) }) {
			return true
		}
	}
	return false
}

// reaches tells whether the ray from p to the viewer runs for a length within b or its boundary.
func (s *scene) reaches(b *body.Body, p vec.V3, e float64) bool {
	gap := float64(num.OnSurface*b.Size()) + 2*e
	ts := []float64{0}
	for _, f := range b.Faces {
		ts = append(ts, f.Surface.Roots(p, s.f.Z)...)
	}
	slices.Sort(ts)
	// A ray that touches a face seems to run in it for the blur of a contact.
	least := 2 * math.Sqrt(2*gap*b.Size())
	for k := 1; k < len(ts); k++ {
		if a := ts[k-1]; a >= 0 && ts[k]-a > least && b.Depth(p.Along(s.f.Z, (a+ts[k])/2)) <= gap {
			return true
		}
	}
	return false
}

// corners are points whose convex hull holds the arc: its ends, and for a conic the meets of the tangents
// at the ends of stretches of a quarter turn at most; with the middles of the stretches.
func corners(a curve.Arc) (round, middles []vec.V3) {
	round = []vec.V3{a.Start(), a.End()}
	n, half := 1, a.T1-a.T0
	if a.Form.Periodic() {
		n = int(math.Ceil(half / (math.Pi / 2)))
	}
	half /= float64(2 * n)
	reach := half
	switch a.Form {
	case curve.Line:
		return round, []vec.V3{a.Mid()}
	case curve.Ellipse, curve.EllipseEnd:
		reach = math.Tan(half)
	case curve.Hyperbola, curve.HyperbolaEnd:
		reach = math.Tanh(half)
	}
	for k := range n {
		t := a.T0 + float64(float64(2*k)*half)
		p := a.At(t)
		if k > 0 {
			round = append(round, p)
		}
		round = append(round, p.Along(a.Deriv(t, 1), reach))
		middles = append(middles, a.At(t+half))
	}
	return round, middles
}
