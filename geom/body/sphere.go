package body

import (
	"math"

	"epure/geom/curve"
	"epure/geom/num"
	"epure/geom/surface"
	"epure/geom/vec"
)

// Spheres. What is measured on one is worked out round its edges, like everything else.

// Ball returns the solid sphere of radius r (mm, > 0) about o. Its one face is name+".side".
func Ball(name string, o vec.V3, r float64) *Body {
	b := &Body{middle: o, size: r, tree: tree{op: and, kids: []tree{{face: 0}}}}
	b.Faces = []Face{{surface.Sphere{O: o, R: r}, name + ".side"}}
	return b
}

// sphereArea is the area of the spherical face i, in closed form. Its edges are arcs of circles; the face
// is made of what lies between each arc and a fixed pole of the sphere, with signs: the triangle pole, start, end, and the segment between
// the arc and the great circle through its ends, which is the arc's sector about the centre of its own cap less the triangle
// there. Triangles are known but for whole spheres, and so is the sum.
func (b *Body) sphereArea(s surface.Sphere, i int) float64 {
	arcs := b.shortArcs(i)
	pole := clearPole(s, arcs)
	sum := 0.0
	for _, a := range arcs {
		m := a.U.Cross(a.W).Unit()
		start, end := a.Start().Sub(s.O).Unit(), a.End().Sub(s.O).Unit()
		share := 1 - a.C.Sub(s.O).Dot(m)/s.R
		sum += float64((a.T1-a.T0)*share) - corner(m, start, end) + corner(pole, start, end)
	}
	sum = num.Turn(sum/2, 0) * 2
	if len(arcs) == 0 || sum <= num.Join*num.Join {
		sum = 4 * math.Pi
	}
	return sum * s.R * s.R
}

// shortArcs are the edges round face i in pieces of two radians at most, so that no two ends are opposite.
func (b *Body) shortArcs(i int) []curve.Arc {
	var out []curve.Arc
	for _, loop := range b.FaceEdges(i) {
		for _, e := range loop {
			n := math.Ceil((e.Arc.T1 - e.Arc.T0) / 2)
			step := (e.Arc.T1 - e.Arc.T0) / n
			for k := range int(n) {
				t := e.Arc.T0 + float64(step*float64(k))
				out = append(out, curve.Arc{Curve: e.Arc.Curve, T0: t, T1: t + step})
			}
		}
	}
	return out
}

// corner is the solid angle of the spherical triangle abc, positive when it runs anticlockwise seen from
// outside, known but for 4π (A. van Oosterom, J. Strackee, The solid angle of a plane triangle, 1983).
func corner(a, b, c vec.V3) float64 {
	return 2 * math.Atan2(a.Dot(b.Cross(c)), 1+a.Dot(b)+b.Dot(c)+c.Dot(a))
}

// clearPole is the direction, of a few, that is farthest from opposite any end of an edge: a
// triangle with opposite corners has no area that could be told.
func clearPole(s surface.Sphere, arcs []curve.Arc) vec.V3 {
	best, far := vec.V3{Z: 1}, -1.0
	for _, d := range []vec.V3{{Z: 1}, {X: 1}, {Y: 1}, {X: 1, Y: 1, Z: 1}, {X: 1, Y: -1, Z: 1}, {X: -1, Y: 1, Z: 1}, {X: -1, Y: -1, Z: 1}, {X: 2, Y: 1, Z: 3}, {X: -3, Y: 2, Z: 1}} {
		d = d.Unit()
		near := math.Inf(1)
		for _, a := range arcs {
			near = min(near, a.Start().Sub(s.O).Unit().Add(d).Len())
		}
		if near > far {
			best, far = d, near
		}
	}
	return best
}

// fromCentre adds up the pyramids from the centre of the sphere to the plane faces, and the
// sectors under the spherical face: a third of R times the area; their first moment is R²/4 times the vector of
// the face's area, which is that of the surface spanned by its edges.
func (b *Body) fromCentre(s surface.Sphere) (float64, vec.V3) {
	vol, sum := 0.0, vec.V3{}
	for i, f := range b.Faces {
		if _, ok := f.Surface.(surface.Sphere); ok {
			vol += float64(b.sphereArea(s, i) * s.R / 3)
			for _, loop := range b.FaceEdges(i) {
				for _, e := range loop {
					sum = sum.Along(e.Arc.Sweep(s.O), s.R*s.R/4)
				}
			}
		}
	}
	if flat, c := b.fromPole(s.O); flat != 0 {
		vol += flat
		sum = sum.Along(c.Sub(s.O), flat)
	}
	return vol, s.O.Add(sum.Scale(1 / vol))
}
