package view

import (
	"slices"

	"epure/geom/body"
	"epure/geom/curve"
	"epure/geom/surface"
	"epure/geom/vec"
)

// cand is a candidate: a part of an edge, contour or wire whose image has no turn.
type cand struct {
	track
	arc    curve.Arc // the whole edge
	body   int
	index  int // of the edge in its body, contours after edges; of a wire among wires
	a, b   int
	err    float64 // rounding error of a point of it or of its image, mm
	box    box
	z0, z1 float64 // depths
	hidden bool    // all of it lies in the shadow of one body
	stops  []stop
}

// candidates are those of every body, edges before contours, in that order.
func (s *scene) candidates() []cand {
	var out []cand
	for i, b := range s.bodies {
		for k, e := range append(slices.Clip(b.Edges()), b.Contour(s.f.Z)...) {
			out = s.image(out, e, i, k)
		}
	}
	return s.ready(out)
}

// wires are the candidates of extra curves.
func (s *scene) wires(arcs []curve.Arc) []cand {
	var out []cand
	for i, a := range arcs {
		out = s.image(out, body.Edge{Arc: a, A: i, B: i}, Wire, i)
	}
	return s.ready(out)
}

// image appends the candidates of one edge.
func (s *scene) image(out []cand, e body.Edge, owner, index int) []cand {
	err := Grain * (s.reach + reachOf(e.Arc))
	for _, k := range tracks(e.Arc, s.f, err) {
		c := cand{track: k, arc: e.Arc, body: owner, index: index, a: e.A, b: e.B, err: err, box: boxOf(k.image)}
		c.z0, c.z1 = depths(c.inSpace(), s.f)
		out = append(out, c)
	}
	return out
}

// ready trims the candidates and gives them their ends and the stops where they meet bodies.
func (s *scene) ready(cands []cand) []cand {
	cands = trim(cands)
	for i := range cands {
		c := &cands[i]
		c.stops = []stop{{t: c.t0, rank: atEnd}, {t: c.t1, rank: atEnd}}
		if c.hidden = s.inShadow(c.inSpace(), c.err); !c.hidden {
			s.meetBodies(c)
		}
	}
	return cands
}

// meetBodies stops c where its visibility may change without a crossing of
// images: where it crosses the plane of contact of a curved surface that it
// lies on (its image touches the contour's there), and where it pierces
// another body.
func (s *scene) meetBodies(c *cand) {
	for _, k := range s.at(c.box, c.z0, c.z1, c.err) {
		for _, p := range s.contact[k] {
			c.stopAt(atTurn, nil, c.inSpace().Cross(p.F.O, p.F.Z, c.err)...)
		}
		if k == c.body {
			continue
		}
		for _, face := range s.bodies[k].Faces {
			c.stopAt(atTurn, nil, surface.Cross(face.Surface, c.inSpace(), c.err)...)
		}
	}
}

// contactPlanes are the planes in which sight along d touches the curved
// faces: each holds the two contour generators, or the outline, of one. An edge on the surface
// crosses this plane at a good angle where it only touches the contour's image.
func contactPlanes(b *body.Body, d vec.V3) []surface.Plane {
	var out []surface.Plane
	for _, f := range b.Faces {
		if s, ok := f.Surface.(surface.Sphere); ok {
			out = append(out, surface.Plane{F: vec.PlaneFrame(s.O, d)})
		}
		r := f.Surface.Contour(d)
		if len(r) != 2 {
			continue
		}
		// The second generator's point must not fall on the first: on a cone both start at the apex.
		across := r[1].O.Along(r[1].D, b.Size()).Sub(r[0].O)
		if n := r[0].D.Cross(across); n.Len() > 0 {
			out = append(out, surface.Plane{F: vec.PlaneFrame(r[0].O, n)})
		}
	}
	return out
}

// locate is the space parameter of c at the image of o's space parameter t; false when
// that is not on c, ends included.
func (c *cand) locate(o *cand, t float64) (float64, bool) {
	s, ok := c.image.Param(o.point(t), 2*(c.err+o.err))
	return c.space(s), ok
}
