package body

import (
	"fmt"
	"math"
	"testing"

	"epure/geom/surface"
	"epure/geom/vec"
)

func TestSmoke(t *testing.T) {
	f := vec.World
	k := Frustum("K", f, vec.AxisFrame(f.O, f.Z), 120, 0, 260)
	g := k.Faces[0].Surface.(surface.Ruled).Ruling(math.Pi)
	n := g.D.Cross(vec.V3{Y: 1}).Unit()
	p := surface.Plane{F: vec.PlaneFrame(vec.V3{X: 35}, n)}
	for _, pl := range []surface.Plane{p, p.Flip()} {
		b, err := k.Cut(pl, "P")
		fmt.Println(err)
		for _, e := range b.Edges() {
			fmt.Println(b.Faces[e.A].Label, b.Faces[e.B].Label, e.Arc.Form, e.Arc.T0, e.Arc.T1, e.Arc.Start(), e.Arc.End())
		}
		fmt.Println(b.Bounds(vec.World))
		fmt.Println(b.Contour(vec.V3{Y: 1}))
		fmt.Println(b.Rulings(0, math.Pi/2), b.Intervals(vec.V3{X: 50, Y: 0, Z: 0}, vec.V3{Z: 1}))
		fmt.Println(b.Side(vec.V3{Z: 260}), b.Side(vec.V3{Z: 100}), b.Side(vec.V3{Z: 300}))
		c, err := b.Cut(surface.Plane{F: vec.PlaneFrame(vec.V3{}, vec.V3{Y: 1})}, "Q")
		fmt.Println(err)
		for _, e := range c.Edges() {
			fmt.Println(c.Faces[e.A].Label, c.Faces[e.B].Label, e.Arc.Form, e.Arc.T0, e.Arc.T1, e.Arc.Start(), e.Arc.End())
		}
	}
	_, err := k.Cut(surface.Plane{F: vec.PlaneFrame(vec.V3{Z: 300}, vec.V3{Z: 1})}, "Q")
	fmt.Println(err)
	_, err = k.Cut(surface.Plane{F: vec.PlaneFrame(vec.V3{Z: 0}, vec.V3{Z: -1})}, "Q")
	fmt.Println(err)
	_, err = k.Cut(surface.Plane{F: vec.PlaneFrame(vec.V3{Z: 0}, vec.V3{Z: 1})}, "Q")
	fmt.Println(err)
}
