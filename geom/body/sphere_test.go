package body

import (
	"math"
	"testing"

	"epure/geom/surface"
	"epure/geom/vec"
)

// TestCaps: a sphere cut by one plane, against the closed forms of cap area 2πRh, volume πh²(3R - h)/3 and
// centroid 3(2R - h)²/(4(3R - h)) from the centre (Archimedes, On the Sphere and Cylinder; the formulas
// from memory), in any direction.
func TestCaps(t *testing.T) {
	const r = 50.0
	o := vec.V3{X: 10, Y: -20, Z: 30}
	for _, n := range []vec.V3{{Z: 1}, {X: 1}, {X: 1, Y: 2, Z: -3}, {X: -1e-9, Z: -1}} {
		for _, d := range []float64{-40, -1e-7, 0, 13, 45} {
			p := surface.Plane{F: vec.PlaneFrame(o.Along(n.Unit(), d), n)}
			b, err := Ball("S", o, r).Cut(p, "P")
			if err != nil {
				t.Fatal(err)
			}
			h := r + d
			same := func(what string, got, want float64) {
				t.Helper()
				if math.Abs(got-want) > 1e-11*r*r*r*math.Abs(want/(r*r*r)) && math.Abs(got-want) > 1e-12*math.Pow(r, 3) {
					t.Errorf("%s of the cap at %g along %v: %.15g, want %.15g", what, d, n, got, want)
				}
			}
			same("area", b.FaceArea(0), 2*math.Pi*r*h)
			same("volume", b.Volume(), math.Pi*h*h*(3*r-h)/3)
			z := 3 * (2*r - h) * (2*r - h) / (4 * (3*r - h))
			if got := b.Centroid().Sub(o).Dot(n.Unit()); math.Abs(got+z) > 1e-10 {
				t.Errorf("centroid at %.12g, want %.12g", got, -z)
			}
			lo, hi := b.Extent(n.Unit())
			if math.Abs(hi-lo-h) > 1e-11*r {
				t.Errorf("extent %g, want %g", hi-lo, h)
			}
		}
	}
	ball := Ball("S", o, r)
	if got, want := ball.Volume(), 4.0/3*math.Pi*r*r*r; math.Abs(got-want) > 1e-12*want {
		t.Errorf("volume %.15g, want %.15g", got, want)
	}
	if got, want := ball.FaceArea(0), 4*math.Pi*r*r; math.Abs(got-want) > 1e-12*want {
		t.Errorf("area %.15g, want %.15g", got, want)
	}
}

// TestWedges: a sphere cut by two planes through its centre: the lune has the share of the angle of area and volume.
func TestWedges(t *testing.T) {
	const r = 30.0
	for _, deg := range []float64{30, 90, 120} {
		s, c := math.Sincos(deg * math.Pi / 180)
		b, err := Ball("S", vec.V3{}, r).Cut(surface.Plane{F: vec.PlaneFrame(vec.V3{}, vec.V3{Y: -1})}, "P")
		if err != nil {
			t.Fatal(err)
		}
		if b, err = b.Cut(surface.Plane{F: vec.PlaneFrame(vec.V3{}, vec.V3{X: -s, Y: c})}, "Q"); err != nil {
			t.Fatal(err)
		}
		if got, want := b.FaceArea(0), 4*math.Pi*r*r*deg/360; math.Abs(got-want) > 1e-11*want {
			t.Errorf("lune of %g°: %.15g, want %.15g", deg, got, want)
		}
		if got, want := b.Volume(), 4.0/3*math.Pi*r*r*r*deg/360; math.Abs(got-want) > 1e-11*want {
			t.Errorf("wedge of %g°: %.15g, want %.15g", deg, got, want)
		}
		if got := len(b.Edges()); got != 3 {
			t.Errorf("wedge of %g° has %d edges, want 3", deg, got)
		}
	}
}
