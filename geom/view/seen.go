package view

import (
	"math"
	"slices"

	"epure/geom/body"
	"epure/geom/num"
	"epure/geom/surface"
	"epure/geom/vec"
)

// Seen tells whether nothing lies between the point p of space and the viewer.
// A point on a surface that faces the viewer, on a contour, or on the near edge of a face seen edge-on is
// seen; one on the far edge of such a face is not, though nothing covers it but that face.
func Seen(bodies []*body.Body, f vec.Frame, p vec.V3) bool {
	s := newScene(bodies, f)
	s.grow(p)
	if s.covers(p, s.err) > 0 {
		return false
	}
	q := s.f.Flat(p)
	for _, k := range s.at(box{q, q}, s.f.Local(p).Z, math.Inf(1), s.err) {
		if s.behindEdgeOn(bodies[k], p) {
			return false
		}
	}
	return true
}

// behindEdgeOn tells whether the ray from p to the viewer runs for a length
// within a plane face, or a cylinder, that is seen edge-on. A generator
// of a cone seen end-on covers nothing: it is a line and no face.
func (s *scene) behindEdgeOn(b *body.Body, p vec.V3) bool {
	gap := float64(num.OnSurface*b.Size()) + 2*s.err
	if !slices.ContainsFunc(b.Faces, func(f body.Face) bool {
		return edgeOnFace(f.Surface, s.f.Z) && math.Abs(f.Surface.Value(p)) <= gap
	}) {
		return false
	}
	ts := []float64{0}
	for _, f := range b.Faces {
		ts = append(ts, f.Surface.Roots(p, s.f.Z)...)
	}
	slices.Sort(ts)
	// A ray that touches another face at p seems to run in it for the blur of a contact.
	least := 2 * math.Sqrt(2*gap*b.Size())
	for k := 1; k < len(ts); k++ {
		if a := ts[k-1]; a >= 0 && ts[k]-a > least && b.Depth(p.Along(s.f.Z, (a+ts[k])/2)) <= gap {
			return true
		}
	}
	return false
}

// edgeOnFace tells whether sight along d runs within the surface wherever it meets it.
func edgeOnFace(s surface.Surface, d vec.V3) bool {
	switch s := s.(type) {
	case surface.Plane:
		return math.Abs(s.F.Z.Dot(d)) <= num.Direction
	case surface.Cylinder:
		return s.F.Z.Cross(d).Len() <= num.Direction
	}
	return false
}
