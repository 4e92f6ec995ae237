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
	if s.covered(p, s.err) {
		return false
	}
	for _, k := range s.before(p, s.err) {
		if s.behindEdgeOn(bodies[k], p) {
			return false
		}
	}
	return true
}

// Layers counts the layers of material between the point p of space and the viewer. A
// body that p's ray leaves and enters again counts twice; one that it only grazes does not count.
func Layers(bodies []*body.Body, f vec.Frame, p vec.V3) int {
	s := newScene(bodies, f)
	s.grow(p)
	n := 0
	for _, k := range s.before(p, s.err) {
		n += s.coverOf(k, p, s.err)
	}
	return n
}

// behindEdgeOn tells whether the ray from p to the viewer runs for a length
// within a plane face, or a cylinder, that is seen edge-on. A generator
// of a cone seen end-on covers nothing: it is a line and no face.
func (s *scene) behindEdgeOn(b *body.Body, p vec.V3) bool {
	gap := float64(num.OnSurface*b.Size()) + 2*s.err
	return slices.ContainsFunc(b.Faces, func(f body.Face) bool {
		return edgeOnFace(f.Surface, s.f.Z) && math.Abs(f.Surface.Value(p)) <= gap
	}) && s.reaches(b, p, s.err)
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
