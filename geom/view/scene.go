package view

import (
	"math"

	"epure/geom/body"
	"epure/geom/curve"
	"epure/geom/num"
	"epure/geom/surface"
	"epure/geom/vec"
)

// Grain is the rounding error that a point of an edge or its image is allowed,
// relative to the largest length that went into it (the reach of the scene
// plus that of the curve's own vectors). A point costs some twenty roundings
// and an edge's vectors some hundred, each of 2^-53, in plane, conic, frame
// and projection together; 2^-44 (5.7e-14) holds 512 of them. At 1 m it is
// 6e-11 mm, a hundred-thousandth of what a drawing can show.
const Grain = 1.0 / (1 << 44)

// scene is the bodies of a view with what every question needs of them.
type scene struct {
	f       vec.Frame
	bodies  []*body.Body
	lo, hi  []vec.V3          // corners of the bodies' boxes in f
	where   *tree             // of their images
	reach   float64           // largest length that goes into a coordinate, mm
	err     float64           // Grain·reach, mm
	gap     float64           // the largest bound for a point on a body's surface, mm
	contact [][]surface.Plane // planes of contact of their curved faces
}

func newScene(bodies []*body.Body, f vec.Frame) *scene {
	s := &scene{f: f, bodies: bodies, reach: f.O.Len()}
	boxes := make([]box, len(bodies))
	for i, b := range bodies {
		lo, hi := b.Bounds(f)
		s.lo, s.hi = append(s.lo, lo), append(s.hi, hi)
		s.reach = max(s.reach, lo.Len(), hi.Len())
		s.gap = max(s.gap, num.OnSurface*b.Size())
		boxes[i] = box{vec.V2{X: lo.X, Y: lo.Y}, vec.V2{X: hi.X, Y: hi.Y}}
		s.contact = append(s.contact, contactPlanes(b, f.Z))
	}
	s.err = Grain * s.reach
	s.where = newTree(boxes)
	return s
}

// grow takes the lengths of p into the reach.
func (s *scene) grow(p vec.V3) {
	s.reach = max(s.reach, p.Len(), s.f.Local(p).Len())
	s.err = Grain * s.reach
}

// at returns the bodies whose boxes, grown by e, hold a part of b between the depths lo and hi.
func (s *scene) at(b box, lo, hi, e float64) []int {
	var found []int
	for _, k := range s.where.find(nil, b.grown(e)) {
		if s.hi[k].Z+e >= lo && s.lo[k].Z-e <= hi {
			found = append(found, k)
		}
	}
	return found
}

// reachOf is the largest length that goes into a point of the arc, mm.
func reachOf(a curve.Arc) float64 {
	u, w := weightBounds(a.Form, a.T0, a.T1)
	return a.C.Len() + float64(u*a.U.Len()) + float64(w*a.W.Len())
}

// weightBounds are the largest factors of U and W between t0 and t1.
func weightBounds(f curve.Form, t0, t1 float64) (u, w float64) {
	t := max(math.Abs(t0), math.Abs(t1))
	switch f {
	case curve.Line:
		return t, 0
	case curve.Ellipse:
		return 1, 1
	case curve.EllipseEnd:
		half := func(t float64) float64 { return math.Floor((t - math.Pi) / (2 * math.Pi)) }
		if half(t0) != half(t1) {
			return 2, 1
		}
		h := max(math.Abs(math.Sin(t0/2)), math.Abs(math.Sin(t1/2)))
		return 2 * h * h, 1
	case curve.Parabola:
		return t, float64(t * t)
	case curve.HyperbolaEnd:
		return math.Cosh(t) - 1, math.Sinh(t)
	}
	return math.Cosh(t), math.Sinh(t)
}
