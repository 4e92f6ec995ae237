package compose

import (
	"math"
	"reflect"
	"strings"
	"testing"

	"epure/eval/scene"
	"epure/geom/vec"
	"epure/render/drawing"
)

func find(s *drawing.Sheet, view, thing, feature string) []drawing.Mark {
	var out []drawing.Mark
	for _, m := range s.Marks {
		if m.Key.View == view && m.Key.Thing == thing && strings.HasPrefix(m.Key.Feature, feature) {
			out = append(out, m)
		}
	}
	return out
}

func composed(t *testing.T, b *scene.Block) *drawing.Sheet {
	t.Helper()
	s, problems := Compose(&scene.Scene{}, b)
	for _, p := range problems {
		t.Error(p)
	}
	if s == nil {
		t.Fatal("no sheet")
	}
	return s
}

// TestParabolaIsExact: the cut edge is a straight line in the elevation and one
// parabola arc in the plan, through the points of the construction: the ends of
// the chord at x = 35 and the vertex at x = 77.5 (half way between the plane's
// foot and the right-hand edge, since the plane is parallel to the left-hand generator).
func TestParabolaIsExact(t *testing.T) {
	b, _ := frontAndPlan(t, false)
	s := composed(t, b)
	j, a := trial(t, b)
	_ = j
	edges := find(s, "top", "B", "edge/K.side,P")
	if len(edges) != 1 {
		t.Fatalf("%d pieces of the cut edge in the plan", len(edges))
	}
	q, ok := edges[0].Shape.(drawing.Quad)
	if !ok {
		t.Fatalf("the cut edge in the plan is a %T", edges[0].Shape)
	}
	if edges[0].Role != drawing.VisibleEdge {
		t.Errorf("role %v", edges[0].Role)
	}
	y := math.Sqrt(120*120 - 35*35)
	vertex := a.onPaper(1, vec.V3{X: 77.5})
	if d := q.At(0.5).Dist(vertex); d > paperTie {
		t.Errorf("the vertex is %g mm off", d)
	}
	for _, end := range []vec.V2{q.P0, q.P2} {
		d := min(end.Dist(a.onPaper(1, vec.V3{X: 35, Y: y})), end.Dist(a.onPaper(1, vec.V3{X: 35, Y: -y})))
		if d > paperTie {
			t.Errorf("an end is %g mm off", d)
		}
	}
	front := find(s, "front", "B", "edge/K.side,P")
	if len(front) != 1 {
		t.Fatalf("%d pieces of the cut edge in the elevation", len(front))
	}
	if _, ok := front[0].Shape.(drawing.Line); !ok {
		t.Errorf("the cut edge in the elevation is a %T", front[0].Shape)
	}
}

func TestHiddenAndFormerLines(t *testing.T) {
	b, _ := frontAndPlan(t, false)
	s := composed(t, b)
	if m := find(s, "top", "B", "edge/K.base,P"); len(m) != 1 || m[0].Role != drawing.HiddenEdge {
		t.Errorf("the foot of the cut in the plan: %v", m)
	}
	faint := find(s, "front", "K", "faint/")
	if len(faint) != 2 {
		t.Errorf("%d pieces of the uncut cone, want the rest of its right side and of its base", len(faint))
	}
	for _, m := range faint {
		if m.Role != drawing.FormerShape || m.Pen.Type != drawing.LongDashTwoDot {
			t.Errorf("%v drawn as %v with %v", m.Key, m.Role, m.Pen)
		}
	}
	b.Views[1].Show["hidden"] = false
	if m := find(composed(t, b), "top", "B", "edge/K.base,P"); len(m) != 0 {
		t.Errorf("hidden lines taken away, but there is %v", m)
	}
}

// TestAxesOvershoot: the axis of the upright cone runs from 3 mm under its base to
// 3 mm over its apex on paper, and stands in line with the cross of the plan.
func TestAxesOvershoot(t *testing.T) {
	b, _ := frontAndPlan(t, false)
	s := composed(t, b)
	_, a := trial(t, b)
	l := find(s, "front", "K", "axis")[0].Shape.(drawing.Line)
	lo, hi := a.onPaper(0, vec.V3{}), a.onPaper(0, vec.V3{Z: 260})
	if math.Abs(min(l.A.Y, l.B.Y)-(lo.Y-centreOvershoot)) > paperTie || math.Abs(max(l.A.Y, l.B.Y)-(hi.Y+centreOvershoot)) > paperTie {
		t.Errorf("axis %v for %v to %v", l, lo, hi)
	}
	u := find(s, "top", "K", "centre/upright")[0].Shape.(drawing.Line)
	if math.Abs(u.A.X-l.A.X) > paperTie || u.A.X != u.B.X {
		t.Errorf("axis at %v, cross at %v", l.A.X, u.A.X)
	}
}

func TestKeysAreUniqueAndMarksTheSame(t *testing.T) {
	b, h := frontAndPlan(t, true)
	b.Views = append(b.Views, pattern("flat", h.D, "generators", "numbers"), pattern("flat", h.D))
	b.Views[0].Show["generators"], b.Views[0].Show["numbers"], b.Views[0].Show["projectors"] = true, true, true
	s := composed(t, b)
	seen := map[drawing.Key]bool{}
	for _, m := range s.Marks {
		if seen[m.Key] {
			t.Errorf("%v twice", m.Key)
		}
		seen[m.Key] = true
	}
	if again := composed(t, b); !reflect.DeepEqual(s, again) {
		t.Error("the same block gave another sheet")
	}
}

// TestProjectorsAreStraight: projectors run exactly along the line between the views.
func TestProjectorsAreStraight(t *testing.T) {
	b, _ := frontAndPlan(t, false)
	b.Views[1].Show["projectors"] = true
	n := 0
	for _, m := range composed(t, b).Marks {
		if m.Role == drawing.Projector {
			n++
			if l := m.Shape.(drawing.Line); math.Abs(l.A.X-l.B.X) > paperTie {
				t.Errorf("%v leans by %g mm", m.Key, l.A.X-l.B.X)
			}
		}
	}
	if n < 3 {
		t.Errorf("%d projectors; the corners at -120 or the apex, 35 and 77.5 need at least three", n)
	}
}

// TestLetteringIsNeverMirroredOrUpsideDown: every text of a pattern with the
// inside up reads from below or from the right, and says so.
func TestLetteringReadsFromBelowOrTheRight(t *testing.T) {
	h := rainHood(t)
	d := patternOf(t, "D", h.B, math.Pi, 12, true)
	b := &scene.Block{Form: "sheet", Name: "in", Title: "Inside up", Size: "A3", Titles: &scene.Titles{}, Views: []*scene.View{pattern("flat", d, "generators", "numbers")}}
	s, words := composed(t, b), map[string]int{}
	for _, m := range s.Marks {
		if x, ok := m.Shape.(drawing.Text); ok && m.Key.View == "flat" {
			words[x.String]++
			if c := math.Cos(x.Angle); c < -1e-9 || c < 1e-9 && math.Sin(x.Angle) < 0 {
				t.Errorf("%q stands at %v rad", x.String, x.Angle)
			}
		}
	}
	if words["INSIDE UP"] != 1 || words["seam"] != 2 || words["1"] != 2 || words["Pattern of B, inside up"] != 1 {
		t.Errorf("words of the pattern: %v", words)
	}
}

func TestFullSizePatternHasBarsOfHundred(t *testing.T) {
	c := frustumAt("C", vec.V3{}, vec.V3{Z: 1}, 20, 20, 50)
	b := &scene.Block{Form: "sheet", Name: "full", Title: "Full size", Size: "A3", Scale: 1, Titles: &scene.Titles{},
		Views: []*scene.View{pattern("flat", patternOf(t, "D", c, 0, 12, false), "generators")}}
	s := composed(t, b)
	for _, name := range []string{"level", "upright"} {
		l := find(s, "flat", "bar", name)[0].Shape.(drawing.Line)
		if math.Abs(l.A.Dist(l.B)-100) > paperTie {
			t.Errorf("the %s bar is %v mm", name, l.A.Dist(l.B))
		}
	}
	b.Scale = 0.5
	if len(find(composed(t, b), "flat", "bar", "level")) > 0 {
		t.Error("a bar on a pattern that is not full size")
	}
}

// TestDimensionLines: first line 10 mm outside the outline, the next 8 mm further,
// the shorter nearer (ISO 129-1 practice, standards.md section 6).
func TestDimensionLines(t *testing.T) {
	c := coneAt("K", 50, 80)
	front := elevation("front", subjects("K", c))
	b := &scene.Block{Form: "sheet", Name: "dims", Title: "Dimensions", Size: "A3", Scale: 1, Titles: &scene.Titles{}, Views: []*scene.View{front},
		Dimensions: []*scene.Dimension{
			{Name: "foot", On: front, Anchor: scene.Diameter{Circle: scene.Circle{F: vec.World, R: 50}}, Text: "100"},
			{Name: "half", On: front, Anchor: scene.Linear{B: vec.V3{X: 50}}, Text: "50"},
		}}
	s := composed(t, b)
	_, a := trial(t, b)
	base := a.onPaper(0, vec.V3{}).Y
	for name, want := range map[string]float64{"half": 10, "foot": 18} {
		l := find(s, "front", name, "dimension/line")[0].Shape.(drawing.Line)
		if l.A.Y != l.B.Y || math.Abs(base-l.A.Y-want) > paperTie {
			t.Errorf("%s stands %v mm under the base, want %v", name, base-l.A.Y, want)
		}
	}
	if x := find(s, "front", "foot", "dimension/text")[0].Shape.(drawing.Text); x.String != "⌀100" {
		t.Errorf("the diameter reads %q", x.String)
	}
}

func TestProblems(t *testing.T) {
	b, _ := frontAndPlan(t, false)
	b.Dimensions = []*scene.Dimension{{Name: "K.height", On: b.Views[1], Anchor: scene.Linear{B: vec.V3{Z: 260}}, Text: "260"}}
	b.Views = append(b.Views, &scene.View{Form: "view", Name: "odd", Along: vec.V3{X: 1, Y: 1, Z: -1}, From: b.Views[0], Of: b.Views[0].Of, Show: shown()})
	s, problems := Compose(&scene.Scene{}, b)
	if s == nil {
		t.Error("no sheet")
	}
	want := []Problem{{Code: CannotFold}, {Code: NotTrue, Reason: "it is seen true on front"}}
	if len(problems) != len(want) {
		t.Fatalf("problems %v", problems)
	}
	for i, w := range want {
		if problems[i].Code != w.Code || w.Reason != "" && problems[i].Reason != w.Reason {
			t.Errorf("problem %v, want %v", problems[i], w)
		}
	}
	b, _ = frontAndPlan(t, false)
	b.Scale = 1
	s, problems = Compose(&scene.Scene{}, b)
	if s != nil || len(problems) != 1 || problems[0].Code != SheetFull || problems[0].Reason != "the largest scale that fits is 1:2; the smallest sheet for 1:1 is A1" {
		t.Errorf("sheet %v, problems %v", s != nil, problems)
	}
}

func TestSymbolOnlyWithSeveralViews(t *testing.T) {
	b, _ := frontAndPlan(t, false)
	if len(find(composed(t, b), "furniture", "projection symbol", "")) == 0 {
		t.Error("no projection symbol on a sheet with two views")
	}
	b.Views = b.Views[:1]
	if len(find(composed(t, b), "furniture", "projection symbol", "")) > 0 {
		t.Error("a projection symbol on a sheet with one view")
	}
}

func TestNotIssued(t *testing.T) {
	b, _ := frontAndPlan(t, false)
	said := func(s *drawing.Sheet) bool {
		for _, m := range s.Marks {
			if x, ok := m.Shape.(drawing.Text); ok && x.String == notIssued {
				return true
			}
		}
		return false
	}
	if !said(composed(t, b)) {
		t.Error("a sheet without a status does not say so")
	}
	b.Titles = &scene.Titles{Status: "Released"}
	if said(composed(t, b)) {
		t.Error("a released sheet says that it is not issued")
	}
}
