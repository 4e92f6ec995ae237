package body

import (
	"math"
	"sort"

	"epure/geom/curve"
	"epure/geom/num"
	"epure/geom/surface"
	"epure/geom/vec"
)

// allEdges works out the edges: the curve of every pair of faces, split where it
// meets any other face, kept where the two faces really meet, joined again.
func (b *Body) allEdges() []Edge {
	var out []Edge
	for i := range b.Faces {
		for j := i + 1; j < len(b.Faces); j++ {
			for _, c := range b.meeting(i, j) {
				for _, a := range b.kept(c, i, j) {
					out = append(out, Edge{a, i, j})
				}
			}
		}
	}
	return out
}

// meeting is the curves in which the surfaces of the faces i and j meet. Two
// curved faces have none here: a body has one.
func (b *Body) meeting(i, j int) []curve.Arc {
	p, isPlane := b.Faces[i].Surface.(surface.Plane)
	q, other := b.Faces[j].Surface.(surface.Plane)
	switch {
	case isPlane && other:
		return twoPlanes(p, q, b.middle)
	case isPlane:
		return b.trace(p, j)
	case other:
		return b.trace(q, i)
	}
	return nil
}

// trace is the curves of the plane p on the curved face i. A plane that passes an apex within the gap goes
// through it here: a branch whose vertex cannot be told from the apex has no edge there.
func (b *Body) trace(p surface.Plane, i int) []curve.Arc {
	s, ok := b.Faces[i].Surface.(surface.Met)
	if !ok {
		return nil
	}
	return s.Arcs(p, b.gap(), b.middle, b.size)
}

// twoPlanes is the line in which two planes meet, with its origin near p; none
// when they are parallel within the rounding of their normals.
func twoPlanes(a, b surface.Plane, p vec.V3) []curve.Arc {
	d := a.F.Z.Cross(b.F.Z)
	if d.Len() <= num.Direction {
		return nil
	}
	u := d.Unit()
	o := p.Along(a.F.Z, -a.Value(p))
	in := u.Cross(a.F.Z) // along plane a, square to the line
	o = o.Along(in, -b.Value(o)/in.Dot(b.F.Z))
	line := curve.Curve{Form: curve.Line, C: o, U: u}
	return []curve.Arc{{Curve: line, T0: math.Inf(-1), T1: math.Inf(1)}}
}

// kept is the arcs of the curve c that are edges between the faces i and j.
func (b *Body) kept(c curve.Arc, i, j int) []curve.Arc {
	ts := b.splits(c, i, j)
	var out []curve.Arc
	for k, a := range spans(c, ts) {
		if !b.isEdge(a, i, j) {
			continue
		}
		if n := len(out); n > 0 && k > 0 && out[n-1].T1 == a.T0 {
			out[n-1].T1 = a.T1
		} else {
			out = append(out, a)
		}
	}
	return closeUp(out)
}

// closeUp joins the last arc of a periodic curve to the first across the start;
// a curve that is whole starts at 0.
func closeUp(arcs []curve.Arc) []curve.Arc {
	n := len(arcs)
	if n == 0 || !arcs[0].Form.Periodic() {
		return arcs
	}
	turn := 2 * math.Pi
	if n == 1 && arcs[0].T1-arcs[0].T0 == turn {
		arcs[0].T0, arcs[0].T1 = 0, turn
		return arcs
	}
	if n > 1 && arcs[n-1].T1 == arcs[0].T0+turn {
		arcs[n-1].T1 = arcs[0].T1 + turn
		return arcs[1:]
	}
	return arcs
}

// splits are the parameters at which c meets the faces other than i and j,
// ascending; of those within rounding of each other only one.
func (b *Body) splits(c curve.Arc, i, j int) []float64 {
	var ts []float64
	for k := range b.Faces {
		if k != i && k != j {
			ts = append(ts, b.crossings(c, k)...)
		}
	}
	for _, k := range []int{i, j} {
		if cone, ok := b.Faces[k].Surface.(surface.Cone); ok && c.Form == curve.Line {
			if p := cone.F.O; c.C.Along(c.U, p.Sub(c.C).Dot(c.U)).Dist(p) <= b.gap() {
				ts = append(ts, p.Sub(c.C).Dot(c.U)) // a generator ends at the apex
			}
		}
	}
	sort.Float64s(ts)
	var out []float64
	for _, t := range ts {
		if len(out) == 0 || c.At(t).Dist(c.At(out[len(out)-1])) > b.gap() {
			out = append(out, t)
		}
	}
	if n := len(out); n > 1 && whole(c) && c.At(out[0]).Dist(c.At(out[n-1])) <= b.gap() {
		out = out[:n-1]
	}
	return out
}

// crossings are the parameters at which c meets face k.
func (b *Body) crossings(c curve.Arc, k int) []float64 {
	s := b.Faces[k].Surface
	if p, ok := s.(surface.Plane); ok {
		return c.Cross(p.F.O, p.F.Z, b.gap())
	}
	if c.Form == curve.Line {
		return s.Roots(c.C, c.U)
	}
	return nil
}

// spans are the arcs between neighbouring splits; the whole of a closed curve
// that has none. Ends that run to infinity or very far away are left out.
func spans(c curve.Arc, ts []float64) []curve.Arc {
	if whole(c) {
		if len(ts) == 0 {
			return []curve.Arc{c}
		}
		ts = append(ts, ts[0]+2*math.Pi)
	}
	var out []curve.Arc
	for k := 1; k < len(ts); k++ {
		out = append(out, curve.Arc{Curve: c.Curve, T0: ts[k-1], T1: ts[k]})
	}
	return out
}

// whole tells whether c is a closed curve.
func whole(c curve.Arc) bool { return c.Form.Periodic() && c.T1-c.T0 == 2*math.Pi }

// isEdge tells whether the boundary of the body along a is made of the faces i and j.
func (b *Body) isEdge(a curve.Arc, i, j int) bool {
	at, along := probe(a)
	sheets := b.around(at, along)
	hasI, hasJ := false, false
	for _, s := range sheets {
		hasI = hasI || s.face == i
		hasJ = hasJ || s.face == j
	}
	return hasI && hasJ
}

// probe is the points at which a piece is asked about, and its direction at the first.
func probe(a curve.Arc) ([]vec.V3, vec.V3) {
	m, w := (a.T0+a.T1)/2, a.T1-a.T0
	return []vec.V3{a.At(m), a.At(m - w/4), a.At(m + w/4)}, a.Deriv(m, 1).Unit()
}
