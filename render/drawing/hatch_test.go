package drawing

import (
	"math"
	"testing"

	"pgregory.net/rapid"

	"epure/geom/vec"
)

func total(lines []Line) float64 {
	s := 0.0
	for _, l := range lines {
		s += Length(l)
	}
	return s
}

func loop(pieces ...Shape) Path { return Path{Pieces: pieces, Closed: true} }

// TestHatchEndsLieOnTheEllipse puts both ends of every line into the equation.
func TestHatchEndsLieOnTheEllipse(t *testing.T) {
	e := EllipseArc{C: at(60, 80), RX: 35, RY: 20, Rot: 0.3, To: 2 * math.Pi}
	lines := Hatch([]Path{loop(e)}, HatchAngle, 2)
	if len(lines) < 20 {
		t.Fatalf("%d lines", len(lines))
	}
	for _, l := range lines {
		for _, p := range []vec.V2{l.A, l.B} {
			d := p.Sub(e.C)
			s, c := math.Sincos(-e.Rot)
			x, y := (d.X*c-d.Y*s)/35, (d.X*s+d.Y*c)/20
			// rounding of some hundred mm over 20 mm; near a tangent the parameter
			// is loose but the point stays on the curve
			if math.Abs(math.Hypot(x, y)-1) > 1e-12 {
				t.Errorf("%v is off the ellipse by %v", p, math.Hypot(x, y)-1)
			}
		}
		if d := l.B.Sub(l.A).Unit(); d.Dist(Dir(HatchAngle)) > 1e-9 {
			t.Errorf("direction %v", d)
		}
	}
}

// TestHatchThroughCornersAndTangents uses a square whose corners lie on hatch
// lines, and a circle that hatch lines touch: known lengths, nothing doubled.
func TestHatchThroughCornersAndTangents(t *testing.T) {
	square := BoxAt(at(-10, -10), 20, 20).Outline()
	level := Hatch([]Path{square}, 0, 5) // y = -10 (an edge) … 10 (an edge)
	// edges themselves: one of the two counts by the half-open rule
	if len(level) != 4 || math.Abs(total(level)-80) > 1e-12 {
		t.Errorf("%d level lines, %v mm", len(level), total(level))
	}
	diagonal := loop(Line{at(10, 0), at(0, 10)}, Line{at(0, 10), at(-10, 0)}, Line{at(-10, 0), at(0, -10)}, Line{at(0, -10), at(10, 0)})
	got := Hatch([]Path{diagonal}, 0, 10) // through both side corners, and touching top and bottom
	if len(got) != 1 || math.Abs(got[0].A.X+10) > 1e-12 || math.Abs(got[0].B.X-10) > 1e-12 {
		t.Errorf("lines %v", got)
	}
	circle := loop(EllipseArc{RX: 10, RY: 10, To: 2 * math.Pi})
	if got := Hatch([]Path{circle}, 0, 10); len(got) != 1 || math.Abs(total(got)-20) > 1e-12 {
		t.Errorf("lines %v", got)
	}
}

// TestHatchLeavesHoles: the lengths times the pitch give the area between two
// curves by the trapezoid rule, which is exact to the pitch squared for smooth
// chords; area of the ellipse π·A·B less that of the parabola segment 2/3·w·h.
func TestHatchLeavesHoles(t *testing.T) {
	outer := loop(EllipseArc{RX: 35, RY: 20, Rot: 0.3, To: 2 * math.Pi})
	hole := loop(Quad{at(-8, -4), at(0, 16), at(8, -4)}, Line{at(8, -4), at(-8, -4)})
	const pitch = 0.01
	got := total(Hatch([]Path{outer, hole}, HatchAngle, pitch)) * pitch
	want := math.Pi*35*20 - 2.0/3*16*10
	if math.Abs(got-want) > 0.02 { // chords rise like a root at the ends: pitch^1.5 · sqrt(2r) · 8 places
		t.Errorf("area %v, want %v", got, want)
	}
}

// TestHatchIsEven: whatever the closed outline of lines, arcs and cubics, every
// line of hatching lies inside: its middle has an odd winding, counted by rays on
// a fine polygon of the outline (a second route).
func TestHatchIsEven(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		n := rapid.IntRange(3, 7).Draw(t, "n")
		grid := rapid.IntRange(-4, 4)
		pts := make([]vec.V2, n)
		for i := range pts {
			pts[i] = at(float64(grid.Draw(t, "x"))*5, float64(grid.Draw(t, "y"))*5)
		}
		p := Path{Closed: true}
		for i := range pts {
			a, b := pts[i], pts[(i+1)%n]
			m := at(float64(grid.Draw(t, "mx"))*5, float64(grid.Draw(t, "my"))*5)
			switch rapid.IntRange(0, 2).Draw(t, "kind") {
			case 0:
				p.Pieces = append(p.Pieces, Line{a, b})
			case 1:
				p.Pieces = append(p.Pieces, Quad{a, m, b})
			case 2:
				p.Pieces = append(p.Pieces, Spline{Points: []vec.V2{a, m, at(m.Y, -m.X), b}})
			}
		}
		poly := polygon(p)
		for _, l := range Hatch([]Path{p}, HatchAngle, 2.5) {
			m := Line{l.A, l.B}.At(0.37)
			if Length(l) > 0.1 && clear(poly, m) > 0.02 && !odd(poly, m) { // the polygon is off by under 0.02
				t.Fatalf("%v lies outside", l)
			}
		}
	})
}

func polygon(p Path) []vec.V2 {
	var out []vec.V2
	for _, s := range Lowered(p) {
		for i := range 60 {
			out = append(out, s.C.At(float64(i)/60))
		}
	}
	return out
}

func odd(poly []vec.V2, p vec.V2) bool {
	in := false
	for i, a := range poly {
		b := poly[(i+1)%len(poly)]
		if (a.Y <= p.Y) != (b.Y <= p.Y) && a.X+(p.Y-a.Y)/(b.Y-a.Y)*(b.X-a.X) > p.X {
			in = !in
		}
	}
	return in
}

// clear is the distance of p from the polygon.
func clear(poly []vec.V2, p vec.V2) float64 {
	d := math.Inf(1)
	for i, a := range poly {
		ab := poly[(i+1)%len(poly)].Sub(a)
		t := 0.0
		if l := ab.Dot(ab); l > 0 {
			t = min(1, max(0, p.Sub(a).Dot(ab)/l))
		}
		d = min(d, p.Dist(a.Along(ab, t)))
	}
	return d
}

func TestHatchOfNothing(t *testing.T) {
	square := BoxAt(at(0, 0), 10, 10).Outline()
	for _, pitch := range []float64{0, -1, math.NaN(), 1e-9} {
		if got := Hatch([]Path{square}, 0, pitch); len(got) != 0 {
			t.Errorf("pitch %v: %d lines", pitch, len(got))
		}
	}
	if Hatch(nil, 0, 1) != nil || Hatch([]Path{{}}, 0, 1) != nil {
		t.Error("lines out of nothing")
	}
}
