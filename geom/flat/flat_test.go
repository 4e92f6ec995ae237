package flat

import (
	"fmt"
	"math"
	"testing"

	"epure/geom/body"
	"epure/geom/surface"
	"epure/geom/vec"
)

func show(p *Pattern) {
	for _, l := range p.Loops {
		fmt.Println("loop")
		for _, q := range l {
			fmt.Printf("  %-10s %T %.4f..%.4f  %v -> %v len %.4f\n", q.Label, q.Path, q.T0, q.T1, q.Start(), q.End(), q.Length())
		}
	}
	for _, s := range p.Stations {
		fmt.Printf("  %2d θ %.4f° %v %s\n", s.Number, s.Theta*180/math.Pi, s.Spans, s.Why)
	}
	pr := p.Proof()
	fmt.Println(p.Area(), pr, pr.Worst())
}

func TestShow(t *testing.T) {
	// scenario 1 skirt
	tan := math.Tan(15 * math.Pi / 180)
	top := 80.0
	apexZ := 260 + top/tan
	h := apexZ + 400
	f := vec.World.At(vec.V3{Z: -400})
	b := body.Frustum("K", f, vec.World, h*tan, top, 260+400)
	b, err := b.Cut(surface.Plane{F: vec.PlaneFrame(vec.V3{}, vec.V3{X: math.Sin(35 * math.Pi / 180), Z: -math.Cos(35 * math.Pi / 180)})}, "P")
	if err != nil {
		t.Fatal(err)
	}
	p, err := Of(b, b.FaceIndex("K.side"), Options{Seam: math.Pi, Divisions: 12})
	if err != nil {
		t.Fatal(err)
	}
	show(p)
	r, _ := p.OuterRadius()
	s, _ := p.Sector()
	fmt.Println(r, s*180/math.Pi)
}
