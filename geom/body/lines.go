package body

import (
	"math"
	"sort"

	"epure/geom/curve"
	"epure/geom/num"
	"epure/geom/surface"
	"epure/geom/vec"
)

// Intervals are the pieces of the line o + t·d (d unit) inside the body,
// ascending; t may be negative. A line that runs within a face is not inside.
func (b *Body) Intervals(o, d vec.V3) []Interval {
	ts := b.roots(o, d, -1)
	return b.pieces(ts, func(at []vec.V3) bool { return b.sideOf(at) == num.Negative }, o, d)
}

// roots are the parameters at which a line meets the faces other than skip,
// ascending, each place once.
func (b *Body) roots(o, d vec.V3, skip int) []float64 {
	var ts []float64
	for i, f := range b.Faces {
		if i != skip {
			ts = append(ts, f.Surface.Roots(o, d)...)
		}
	}
	sort.Float64s(ts)
	out := ts[:0]
	for _, t := range ts {
		if len(out) == 0 || t-out[len(out)-1] > b.gap() {
			out = append(out, t)
		}
	}
	return out
}

// pieces are the stretches between neighbouring roots for which keep holds,
// joined where they touch.
func (b *Body) pieces(ts []float64, keep func(at []vec.V3) bool, o, d vec.V3) []Interval {
	var out []Interval
	for k := 1; k < len(ts); k++ {
		m, w := (ts[k-1]+ts[k])/2, ts[k]-ts[k-1]
		at := []vec.V3{o.Along(d, m), o.Along(d, m-w/4), o.Along(d, m+w/4)}
		if !keep(at) {
			continue
		}
		if n := len(out); n > 0 && out[n-1].B == ts[k-1] {
			out[n-1].B = ts[k]
		} else {
			out = append(out, Interval{ts[k-1], ts[k]})
		}
	}
	return out
}

// Rulings are the pieces of the generator at theta of the curved face i that
// belong to the boundary, as intervals of the ruling's u, ascending. A face
// that is not ruled has none.
func (b *Body) Rulings(i int, theta float64) []Interval {
	s, ok := b.Faces[i].Surface.(surface.Ruled)
	if !ok {
		return nil
	}
	out, _ := b.along(i, s.Ruling(theta))
	return out
}

// along is the pieces of a generator of face i on the boundary, and whether any
// of them lies in another face too.
func (b *Body) along(i int, r surface.Ruling) (out []Interval, edge bool) {
	ts := b.roots(r.O, r.D, i)
	if !math.IsInf(r.Min, -1) {
		ts = append(ts, r.Min)
		sort.Float64s(ts)
		for len(ts) > 0 && ts[0] < r.Min {
			ts = ts[1:]
		}
		if len(ts) > 1 && ts[1]-ts[0] <= b.gap() {
			ts = append(ts[:1], ts[2:]...)
		}
	}
	out = b.pieces(ts, func(at []vec.V3) bool {
		on := false
		for _, s := range b.around(at, r.D) {
			on = on || s.face == i
			edge = edge || s.face != i
		}
		return on
	}, r.O, r.D)
	return out, edge
}

// Contour are the contour generators for sight along d (unit), clipped to the
// boundary. A generator that is an edge, and one that sight runs along so that
// its image is a point, are left out.
func (b *Body) Contour(d vec.V3) []Edge {
	var out []Edge
	for i, f := range b.Faces {
		if s, ok := f.Surface.(surface.Sphere); ok {
			for _, a := range b.kept(s.Outline(d), i, i) {
				if !b.onOther(a, i) {
					out = append(out, Edge{a, i, i})
				}
			}
		}
		for _, r := range f.Surface.Contour(d) {
			if r.D.Cross(d).Len() <= num.Direction {
				continue
			}
			pieces, edge := b.along(i, r)
			if edge {
				continue
			}
			for _, p := range pieces {
				out = append(out, Edge{curve.Arc{Curve: r.Curve(), T0: p.A, T1: p.B}, i, i})
			}
		}
	}
	return out
}

// onOther tells whether the piece of the outline of face i lies in another face too.
func (b *Body) onOther(a curve.Arc, i int) bool {
	at, along := probe(a)
	for _, s := range b.around(at, along) {
		if s.face != i {
			return true
		}
	}
	return false
}

// Extent is the least and the greatest distance along n (times its length) from
// Middle to the points of the body, mm: exact, since a body's extremes lie on
// its edges, at its apex and at the poles of its spheres.
func (b *Body) Extent(n vec.V3) (lo, hi float64) {
	lo, hi = math.Inf(1), math.Inf(-1)
	add := func(p vec.V3) {
		v := p.Sub(b.middle).Dot(n)
		lo, hi = min(lo, v), max(hi, v)
	}
	for _, e := range b.edges {
		add(e.Arc.Start())
		add(e.Arc.End())
		for _, t := range e.Arc.Extreme(n) {
			add(e.Arc.At(t))
		}
	}
	for _, p := range b.Apexes() {
		add(p)
	}
	for _, f := range b.Faces {
		if s, ok := f.Surface.(surface.Sphere); ok {
			u := n.Unit()
			for _, p := range [2]vec.V3{s.O.Along(u, s.R), s.O.Along(u, -s.R)} {
				if b.Side(p) == num.Zero {
					add(p)
				}
			}
		}
	}
	return lo, hi
}

// Apexes are the apexes of cones that are points of the body.
func (b *Body) Apexes() []vec.V3 {
	var out []vec.V3
	for _, f := range b.Faces {
		if c, ok := f.Surface.(surface.Cone); ok && b.Side(c.F.O) == num.Zero {
			out = append(out, c.F.O)
		}
	}
	return out
}

// Bounds are the exact corners of the box round the body in the frame f.
func (b *Body) Bounds(f vec.Frame) (lo, hi vec.V3) {
	m := f.Local(b.middle)
	var x, y, z [2]float64
	x[0], x[1] = b.Extent(f.X)
	y[0], y[1] = b.Extent(f.Y)
	z[0], z[1] = b.Extent(f.Z)
	return m.Add(vec.V3{X: x[0], Y: y[0], Z: z[0]}), m.Add(vec.V3{X: x[1], Y: y[1], Z: z[1]})
}
