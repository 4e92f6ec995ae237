package body

import (
	"math"
	"sort"

	"epure/geom/curve"
	"epure/geom/num"
	"epure/geom/surface"
	"epure/geom/vec"
)

// FaceEdges are the edges round face i, oriented anticlockwise for someone who looks against the
// outward normal, so that the face lies to the left, and chained into loops. A
// closed curve is a loop of its own. A face's loops end where it has no more
// edges: the side of a whole cone has one loop (its apex bounds nothing).
func (b *Body) FaceEdges(i int) [][]Edge {
	var arcs []Edge
	for _, e := range b.edges {
		if e.A == i || e.B == i {
			arcs = append(arcs, b.oriented(e, i)...)
		}
	}
	return b.chain(arcs)
}

// oriented is the edge turned to keep face i on its left. A curve along which
// the face lies on both sides comes once each way.
func (b *Body) oriented(e Edge, i int) []Edge {
	at, along := probe(e.Arc)
	left := b.Faces[i].Surface.Normal(at[0]).Cross(along)
	var out []Edge
	for _, s := range b.around(at, along) {
		switch {
		case s.face != i:
		case s.dir.Dot(left) > 0:
			out = append(out, e)
		default:
			out = append(out, Edge{e.Arc.Reverse(), e.A, e.B})
		}
	}
	return out
}

// chain joins edges end to end.
func (b *Body) chain(arcs []Edge) [][]Edge {
	var loops [][]Edge
	used := make([]bool, len(arcs))
	for k := range arcs {
		if used[k] {
			continue
		}
		used[k] = true
		loop := []Edge{arcs[k]}
		first := arcs[k].Arc.Start()
		for {
			end := loop[len(loop)-1].Arc.End()
			next := nearest(arcs, used, end)
			if end.Dist(first) <= num.Join*b.size && (next < 0 || arcs[next].Arc.Start().Dist(end) >= end.Dist(first)) {
				break
			}
			if next < 0 || arcs[next].Arc.Start().Dist(end) > num.Join*b.size {
				break
			}
			used[next] = true
			loop = append(loop, arcs[next])
		}
		loops = append(loops, loop)
	}
	return loops
}

// nearest is the unused arc that starts nearest to p, or -1.
func nearest(arcs []Edge, used []bool, p vec.V3) int {
	best, dist := -1, math.Inf(1)
	for i, e := range arcs {
		if d := e.Arc.Start().Dist(p); !used[i] && d < dist {
			best, dist = i, d
		}
	}
	return best
}

// Breaks are the angles in [0, 2π), ascending, at which the pieces of generators of the
// curved face i change: corners, and generators along edges.
func (b *Body) Breaks(i int) []float64 {
	s, ok := b.Faces[i].Surface.(surface.Ruled)
	if !ok {
		return nil
	}
	var out []float64
	add := func(p vec.V3) {
		if c, ok := s.(surface.Cone); ok && p.Dist(c.F.O) <= num.Join*b.size {
			return // every generator passes the apex
		}
		out = append(out, s.Theta(p))
	}
	for _, e := range b.edges {
		switch {
		case e.A != i && e.B != i:
		case e.Arc.Form == curve.Line:
			add(e.Arc.Mid())
		case e.Arc.Start().Dist(e.Arc.End()) > num.Join*b.size: // else it is closed, or a contact
			add(e.Arc.Start())
			add(e.Arc.End())
		}
	}
	sort.Float64s(out)
	return distinct(out)
}

// distinct drops angles within num.Join of the one before, round the turn too.
func distinct(ts []float64) []float64 {
	var out []float64
	for _, t := range ts {
		if len(out) == 0 || t-out[len(out)-1] > num.Join {
			out = append(out, t)
		}
	}
	if n := len(out); n > 1 && out[0]+2*math.Pi-out[n-1] <= num.Join {
		out = out[:n-1]
	}
	return out
}

// Depth is how far p lies within the body's half-spaces, mm, negative inside: the tree over the
// distances from the faces. Near a face it is the distance from the body.
func (b *Body) Depth(p vec.V3) float64 {
	return b.tree.value(func(i int) float64 { return b.Faces[i].Surface.Value(p) })
}
