package body

import (
	"math"
	"math/rand"
	"testing"

	"epure/geom/num"
	"epure/geom/vec"
)

// star is a simple polygon with corners at even angles and these radii.
func star(radii ...float64) []vec.V2 {
	var out []vec.V2
	for i, r := range radii {
		s, c := math.Sincos(2 * math.Pi * float64(i) / float64(len(radii)))
		out = append(out, vec.V2{X: r * c, Y: r * s})
	}
	return out
}

// insidePolygon counts crossings of a ray: another route than the tree.
func insidePolygon(q vec.V2, ps []vec.V2) bool {
	in := false
	for i, a := range ps {
		b := ps[(i+1)%len(ps)]
		if (a.Y > q.Y) != (b.Y > q.Y) && q.X < a.X+(q.Y-a.Y)*(b.X-a.X)/(b.Y-a.Y) {
			in = !in
		}
	}
	return in
}

// TestPrismsOfAnyOutline: membership against ray crossing, volume against the
// shoelace formula, Euler's formula for the edges, on random polygons, most of them not convex.
func TestPrismsOfAnyOutline(t *testing.T) {
	r := rand.New(rand.NewSource(7))
	for range 60 {
		n := 3 + r.Intn(9)
		radii := make([]float64, n)
		for i := range radii {
			radii[i] = 20 + 80*r.Float64()
		}
		outline := star(radii...)
		b, err := Prism("X", vec.World, outline, vec.V3{X: 10, Y: -5, Z: 40})
		if err != nil {
			t.Fatal(err)
		}
		want := Shoelace(outline) * 40
		if got := b.Volume(); math.Abs(got-want) > 1e-12*want { // sums of a dozen terms
			t.Errorf("volume %.15g, want %.15g (%v)", got, want, outline)
		}
		if got := len(b.Edges()); got != 3*n {
			t.Errorf("%d edges of a prism on %d corners (%v)", got, n, outline)
		}
		for range 50 {
			q := vec.V2{X: 200*r.Float64() - 100, Y: 200*r.Float64() - 100}
			in := b.Side(vec.V3{X: q.X + 5, Y: q.Y - 2.5, Z: 20}) == num.Negative
			if in != insidePolygon(q, outline) {
				t.Errorf("%v inside: %v (%v)", q, in, outline)
			}
		}
	}
}

// TestPyramids: a third of base times height; a frustum by similar figures.
func TestPyramids(t *testing.T) {
	outline := star(60, 25, 60, 25, 60, 25)
	area := Shoelace(outline)
	apex := vec.V3{X: 15, Y: 5, Z: 90}
	b, err := Pyramid("Y", vec.World, outline, apex, 0)
	if err != nil {
		t.Fatal(err)
	}
	if got, want := b.Volume(), area*90/3; math.Abs(got-want) > 1e-12*want {
		t.Errorf("volume %.15g, want %.15g", got, want)
	}
	if got := len(b.Edges()); got != 12 {
		t.Errorf("%d edges, want 12", got)
	}
	if c := b.Centroid(); math.Abs(c.Z-90.0/4) > 1e-11 { // a quarter of the height (Archimedes)
		t.Errorf("centroid at %v", c)
	}
	f, err := Pyramid("Z", vec.World, outline, apex, 0.6)
	if err != nil {
		t.Fatal(err)
	}
	if got, want := f.Volume(), area*90/3*(1-0.4*0.4*0.4); math.Abs(got-want) > 1e-12*want {
		t.Errorf("frustum %.15g, want %.15g", got, want)
	}
	if got := len(f.Edges()); got != 18 {
		t.Errorf("%d edges of the frustum, want 18", got)
	}
}

// TestOutlinesThatBoundNothing have an error at the corner to blame.
func TestOutlinesThatBoundNothing(t *testing.T) {
	for _, c := range []struct {
		what    string
		outline []vec.V2
	}{
		{"crossing", []vec.V2{{X: 0}, {X: 10}, {X: 0, Y: 10}, {X: 10, Y: 10}}},
		{"in line", []vec.V2{{X: 0}, {X: 10}, {X: 20}}},
		{"twice", []vec.V2{{X: 0}, {X: 10}, {X: 10}, {Y: 10}}},
		{"back", []vec.V2{{X: 0}, {X: 10}, {X: 5}, {X: 5, Y: 10}}},
		{"touching", []vec.V2{{X: 0}, {X: 20}, {X: 20, Y: 20}, {X: 10}, {X: 0, Y: 20}}},
	} {
		if _, err := Prism("X", vec.World, c.outline, vec.V3{Z: 5}); err == nil {
			t.Errorf("%s: no error", c.what)
		}
	}
}

// TestCoplanarSides: two sides in one plane are one face, with both names.
func TestCoplanarSides(t *testing.T) {
	// a channel: the two upper rims of its flanges lie in one plane
	u := []vec.V2{{}, {X: 30}, {X: 30, Y: 20}, {X: 20, Y: 20}, {X: 20, Y: 10}, {X: 10, Y: 10}, {X: 10, Y: 20}, {Y: 20}}
	b, err := Prism("U", vec.World, u, vec.V3{Z: 50})
	if err != nil {
		t.Fatal(err)
	}
	if got, want := b.Volume(), Shoelace(u)*50; math.Abs(got-want) > 1e-12*want {
		t.Errorf("volume %.15g, want %.15g", got, want)
	}
	if got := len(b.Edges()); got != 24 {
		t.Errorf("%d edges, want 24", got)
	}
	if b.FaceIndex("U.side(3)") != b.FaceIndex("U.side(7)") || b.FaceIndex("U.side(3)") < 0 {
		t.Error("the rims are not one face")
	}
	if got := b.FaceArea(b.FaceIndex("U.side(3)")); math.Abs(got-2*10*50) > 1e-10 {
		t.Errorf("area of the rims %g, want 1000", got)
	}
}
