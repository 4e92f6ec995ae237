package compose

import (
	"math"
	"testing"

	"epure/eval/scene"
	"epure/geom/vec"
	"epure/render/drawing"

	"pgregory.net/rapid"
)

// paperTie is what two numbers of paper mm that ought to be equal may differ by
// in these tests: 1e-9 mm, as the brief of the sheet asks of aligned views.
const paperTie = 1e-9

func TestExtentOfCircleIsItsRadius(t *testing.T) {
	e := shapeExtent(drawing.EllipseArc{C: vec.V2{X: 3, Y: -2}, RX: 7, RY: 7, To: 2 * math.Pi})
	for i, d := range compass() {
		c := vec.V2{X: 3, Y: -2}.Dot(d)
		if math.Abs(e.hi[i]-c-7) > paperTie || math.Abs(c-e.lo[i]-7) > paperTie {
			t.Errorf("direction %d: %v to %v, want %v ± 7", i, e.lo[i], e.hi[i], c)
		}
	}
	// The sixteen-sided figure round a circle of radius r has the area 16 r² tan(π/16).
	if got, want := e.area(), 16*49*math.Tan(math.Pi/16); math.Abs(got-want) > 1e-9 {
		t.Errorf("area %v, want %v", got, want)
	}
}

// TestExtentOfBeziersIsTheCurves: by sampling the curve at a thousand places.
func TestExtentOfBeziersIsTheCurves(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		f := rapid.Float64Range(-50, 50)
		var p [4]vec.V2
		for i := range p {
			p[i] = vec.V2{X: f.Draw(t, "x"), Y: f.Draw(t, "y")}
		}
		q := drawing.Quad{P0: p[0], P1: p[1], P2: p[2]}
		for _, c := range []struct {
			shape drawing.Shape
			at    func(float64) vec.V2
		}{{q, q.At}, {drawing.Spline{Points: p[:]}, drawing.Cubic(p).At}} {
			seen := nothing()
			for i := range 1001 {
				seen = seen.with(c.at(float64(i) / 1000))
			}
			got := shapeExtent(c.shape)
			for i := range got.lo {
				// A thousandth of the way past an extreme the curve has fallen off by
				// at most |C''|/2 · 0.0005² < 6·200/2 · 2.5e-7 mm.
				if d := got.hi[i] - seen.hi[i]; d < -paperTie || d > 2e-4 {
					t.Fatalf("%T direction %d: over by %v", c.shape, i, d)
				}
				if d := seen.lo[i] - got.lo[i]; d < -paperTie || d > 2e-4 {
					t.Fatalf("%T direction %d: under by %v", c.shape, i, d)
				}
			}
		}
	})
}

// TestGapNeverExceedsTheTruth compares the gap of two rectangles with their true distance.
func TestGapNeverExceedsTheTruth(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		f := rapid.Float64Range(-100, 100)
		s := rapid.Float64Range(1, 60)
		a := drawing.BoxAt(vec.V2{X: f.Draw(t, "ax"), Y: f.Draw(t, "ay")}, s.Draw(t, "aw"), s.Draw(t, "ah"))
		b := drawing.BoxAt(vec.V2{X: f.Draw(t, "bx"), Y: f.Draw(t, "by")}, s.Draw(t, "bw"), s.Draw(t, "bh"))
		dx := max(a.Min.X-b.Max.X, b.Min.X-a.Max.X)
		dy := max(a.Min.Y-b.Max.Y, b.Min.Y-a.Max.Y)
		gap := boxExtent(a).gap(boxExtent(b))
		if dx < 0 && dy < 0 {
			if gap > paperTie {
				t.Fatalf("boxes that overlap have the gap %v", gap)
			}
			return
		}
		if true := math.Hypot(max(dx, 0), max(dy, 0)); gap > true+paperTie || gap < max(dx, dy)-paperTie {
			t.Fatalf("gap %v, distance %v, best upright %v", gap, true, max(dx, dy))
		}
	})
}

// TestFoldKeepsProjectorsStraight: whatever the parent and the direction, both
// views agree in the coordinate square to the direction between them, the frame
// is right-handed and looks where it was told.
func TestFoldKeepsProjectorsStraight(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		f := rapid.Float64Range(-1, 1)
		v := func(n string) vec.V3 { return vec.V3{X: f.Draw(t, n+"x"), Y: f.Draw(t, n+"y"), Z: f.Draw(t, n+"z")} }
		sight := v("sight")
		if sight.Len() < 0.1 {
			t.Skip("no direction")
		}
		parent := vec.ViewFrame(sight)
		turn := rapid.Float64Range(-math.Pi, math.Pi).Draw(t, "turn")
		z := parent.X.Scale(math.Cos(turn)).Along(parent.Y, math.Sin(turn))
		frame, u, rel := fold(parent, z)
		if rel != folded {
			t.Fatalf("relation %v", rel)
		}
		p, w := v("p"), u.Left()
		if d := parent.Flat(p).Dot(w) - frame.Flat(p).Dot(w); math.Abs(d) > 1e-12 {
			t.Errorf("projector off by %v", d)
		}
		if d := frame.X.Cross(frame.Y).Dist(frame.Z) + frame.Z.Dist(z); d > 1e-12 {
			t.Errorf("frame off by %v", d)
		}
	})
}

func TestFoldOfPrincipalViews(t *testing.T) {
	front := vec.ViewFrame(vec.V3{Y: 1})
	for _, c := range []struct {
		name         string
		sight        vec.V3
		first, third vec.V2 // where it stands beside the front view: ISO 5456-2, standards.md section 4
	}{
		{"plan", vec.V3{Z: -1}, vec.V2{Y: -1}, vec.V2{Y: 1}},
		{"from below", vec.V3{Z: 1}, vec.V2{Y: 1}, vec.V2{Y: -1}},
		{"from the left", vec.V3{X: 1}, vec.V2{X: 1}, vec.V2{X: -1}},
		{"from the right", vec.V3{X: -1}, vec.V2{X: -1}, vec.V2{X: 1}},
	} {
		f, u, rel := fold(front, c.sight.Neg())
		if got := side(u, rel, false); got != c.first {
			t.Errorf("%s in first angle stands at %v, want %v", c.name, got, c.first)
		}
		if got := side(u, rel, true); got != c.third {
			t.Errorf("%s in third angle stands at %v, want %v", c.name, got, c.third)
		}
		// The four views that are folded straight from the front have the frames of
		// views that stand free, bit for bit.
		if want := vec.ViewFrame(c.sight); c.name != "from below" && f != want {
			t.Errorf("%s: frame %v, want %v", c.name, f, want)
		}
	}
}

// trial places a block at the largest scale, with the insides open to the test.
func trial(t *testing.T, b *scene.Block) (*job, *attempt) {
	t.Helper()
	j := &job{scene: &scene.Scene{}, block: b}
	p := j.sheetPaper(b.Size)
	j.ink = inkFor(p.Group())
	a := j.largest(p, j.sets())
	if b.Scale > 0 {
		a = j.tryScale(p, b.Scale, j.sets())
	}
	if a == nil {
		t.Fatalf("%s does not fit", b.Name)
	}
	return j, a
}

func frontAndPlan(t *testing.T, third bool) (*scene.Block, hood) {
	h := rainHood(t)
	front := elevation("front", subjects("B", h.B))
	front.Faint = subjects("K", h.K)
	top := plan("top", subjects("B", h.B), front)
	return &scene.Block{Form: "sheet", Name: "both", Title: "Both views", Size: "A3", ThirdAngle: third, Titles: &scene.Titles{},
		Views: []*scene.View{front, top}}, h
}

func TestPlanStandsBelowInFirstAngleAboveInThird(t *testing.T) {
	for _, third := range []bool{false, true} {
		b, _ := frontAndPlan(t, third)
		_, a := trial(t, b)
		front, top := a.layout.items[0], a.layout.items[1]
		if front.at.X != top.at.X {
			t.Errorf("third %v: the views are %g mm out of line", third, front.at.X-top.at.X)
		}
		if below := top.at.Y < front.at.Y; below == third {
			t.Errorf("third %v: plan at %v, front at %v", third, top.at, front.at)
		}
		for _, p := range []vec.V3{{X: 35, Y: 40}, {X: -120}, {Z: 260}} {
			if d := a.onPaper(0, p).X - a.onPaper(1, p).X; math.Abs(d) > paperTie {
				t.Errorf("%v stands %g mm out of line", p, d)
			}
		}
	}
}

// checkClear fails when two things overlap or leave the drawing space.
func checkClear(t *testing.T, name string, a *attempt) {
	t.Helper()
	l := a.layout
	for i, v := range l.items {
		if b := v.here().box(); !l.space.Grow(paperTie).Holds(b) {
			t.Errorf("%s: item %d leaves the drawing space: %v", name, i, b)
		}
		for k, o := range l.items[:i] {
			if g := v.here().gap(o.here()); g < leastGap-paperTie {
				t.Errorf("%s: items %d and %d are %.3f mm apart", name, k, i, g)
			}
		}
		for _, o := range l.blocked {
			if g := v.here().gap(o); g < leastGap-paperTie {
				t.Errorf("%s: item %d is %.3f mm from the title block", name, i, g)
			}
		}
	}
}

func TestNothingOverlapsOnAnySize(t *testing.T) {
	for _, size := range []string{"A4", "A3", "A2", "A1"} {
		for _, third := range []bool{false, true} {
			b, h := frontAndPlan(t, third)
			b.Size, b.Portrait = size, size == "A4"
			b.Views = append(b.Views, pattern("flat", h.D, "generators", "numbers"))
			b.Notes = []*scene.Note{{Name: "n", Text: "Made by hand for a test."}}
			b.Tables = []*scene.Table{{Name: "t", Rows: [][]string{{"No.", "mm"}, {"1", "286.4"}, {"2", "251.9"}}}}
			_, a := trial(t, b)
			checkClear(t, size, a)
		}
	}
}

// TestScaleAuto: front and plan of the hood are 260 + 240 mm high in all. A3 has
// 277 mm of height and A2 400, so 1:1 cannot fit and 1:2 (250 mm and overshoots)
// does; A1 has 574, enough for 1:1; on A4 upright the room over the title block is
// 277 - 36 mm, so it must be 1:5.
func TestScaleAuto(t *testing.T) {
	for _, c := range []struct {
		size  string
		scale float64
	}{{"A4", 0.2}, {"A3", 0.5}, {"A2", 0.5}, {"A1", 1}} {
		b, _ := frontAndPlan(t, false)
		b.Size, b.Portrait = c.size, c.size == "A4"
		_, a := trial(t, b)
		if a.scale != c.scale {
			t.Errorf("%s: scale %v, want %v", c.size, a.scale, c.scale)
		}
	}
}

func TestFigureHasItsWidth(t *testing.T) {
	b, _ := frontAndPlan(t, false)
	b.Form, b.Width = "figure", 100
	s, problems := Compose(&scene.Scene{}, b)
	if s == nil || len(problems) > 0 {
		t.Fatal(problems)
	}
	if s.Width != 100 {
		t.Errorf("width %v", s.Width)
	}
	e := marksExtent(s.Marks).box()
	if e.Min.X < figureMargin-0.01 || e.Max.X > 100-figureMargin+0.01 || e.Min.Y < figureMargin-paperTie || e.Max.Y > s.Height-figureMargin+paperTie {
		t.Errorf("content %v on %v by %v", e, s.Width, s.Height)
	}
	if e.Width() < 100-2*figureMargin-0.1 {
		t.Errorf("the content is only %.2f mm wide", e.Width())
	}
}
