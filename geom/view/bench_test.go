package view

import (
	"fmt"
	"math"
	"math/rand/v2"
	"testing"

	"epure/geom/body"
	"epure/geom/surface"
	"epure/geom/vec"
)

// cells is a square field of n cells 150 mm apart, each with a cone (r 50, h 120) cut at 20° to 70° and a
// cylinder (r 40, h 110) beside it, cut at 15° to 50° and turned about its axis.
func cells(n int) []*body.Body {
	r := rand.New(rand.NewPCG(seed, 4))
	side := int(math.Ceil(math.Sqrt(float64(n))))
	slope := func(lo, hi float64) vec.V3 {
		tilt, turn := (lo+(hi-lo)*r.Float64())*math.Pi/180, 2*math.Pi*r.Float64()
		return vec.V3{X: math.Sin(tilt) * math.Cos(turn), Y: math.Sin(tilt) * math.Sin(turn), Z: math.Cos(tilt)}
	}
	var out []*body.Body
	add := func(b *body.Body, o, n vec.V3) {
		if c, err := b.Cut(surface.Plane{F: vec.PlaneFrame(o, n)}, "P"); err == nil {
			out = append(out, c)
		}
	}
	for k := range n {
		o := vec.V3{X: float64(k%side) * 150, Y: float64(k/side) * 150}
		add(frustum(o, 50, 0, 120), o.Add(vec.V3{Z: 60}), slope(20, 70))
		o = o.Add(vec.V3{X: 75, Y: 75})
		add(frustum(o, 40, 40, 110), o.Add(vec.V3{Z: 60}), slope(15, 50))
	}
	return out
}

// BenchmarkCells is cutting, and front, top and left views, of n cells.
func BenchmarkCells(b *testing.B) {
	for _, n := range []int{100, 500, 2000} {
		b.Run(fmt.Sprint("cut/", n), func(b *testing.B) {
			for b.Loop() {
				cells(n)
			}
		})
		bodies := cells(n)
		for _, v := range []struct {
			name string
			f    vec.Frame
		}{{"front", front}, {"top", plan}, {"left", left}} {
			b.Run(fmt.Sprint(v.name, "/", n), func(b *testing.B) {
				var p []Piece
				for b.Loop() {
					p = Lines(bodies, v.f)
				}
				b.ReportMetric(float64(len(p)), "pieces")
			})
		}
	}
}
