package compose

import (
	"math"
	"strings"
	"testing"

	"epure/eval/scene"
	"epure/geom/curve"
	"epure/geom/surface"
	"epure/geom/vec"
	"epure/render/drawing"
)

// TestTrueShapeIsTrue: distances on the true shape are those of space, whichever
// way it lies; the parabola is exact; focus and directrix are where they belong.
func TestTrueShapeIsTrue(t *testing.T) {
	h := rainHood(t)
	for _, third := range []bool{false, true} {
		front := elevation("front", subjects("B", h.B))
		b := &scene.Block{Form: "sheet", Name: "true", Title: "True shape", Size: "A3", Scale: 0.5, ThirdAngle: third, Titles: &scene.Titles{},
			Views: []*scene.View{front, trueShape("cut", h.S, front, "focus", "axis", "directrix", "projectors", "hatching")}}
		s := composed(t, b)
		_, a := trial(t, b)
		y := math.Sqrt(120*120 - 35*35)
		pts := []vec.V3{{X: 35, Y: y}, {X: 35, Y: -y}, {X: 77.5, Z: (120 - 77.5) * 260 / 120}}
		for i, p := range pts {
			q := pts[(i+1)%3]
			if d := a.onPaper(1, p).Dist(a.onPaper(1, q)) - p.Dist(q)/2; math.Abs(d) > paperTie {
				t.Errorf("third %v: a distance is out by %g mm", third, d)
			}
		}
		edge := find(s, "cut", "S", "outline/")
		if len(edge) != 1 {
			t.Fatalf("%d curved pieces", len(edge))
		}
		if _, ok := edge[0].Shape.(drawing.Quad); !ok {
			t.Errorf("the parabola is a %T", edge[0].Shape)
		}
		checkDirectrix(t, s, a.onPaper(1, pts[2]))
		checkProjectors(t, s, a)
		checkHatching(t, s)
	}
}

// checkDirectrix: the vertex is half way between focus and directrix.
func checkDirectrix(t *testing.T, s *drawing.Sheet, vertex vec.V2) {
	t.Helper()
	focus := find(s, "cut", "S", "focus/1")[0].Shape.(drawing.EllipseArc).C
	d := find(s, "cut", "S", "directrix/1")[0].Shape.(drawing.Line)
	n := d.B.Sub(d.A).Unit().Left()
	off := math.Abs(n.Dot(vertex.Sub(d.A)))
	if math.Abs(off-vertex.Dist(focus)) > paperTie || off < 1 {
		t.Errorf("vertex %v mm from the focus and %v mm from the directrix", vertex.Dist(focus), off)
	}
	if c := focus.Sub(vertex).Unit().Cross(n); math.Abs(c) > 1e-9 {
		t.Errorf("the axis leans %g against the directrix", c)
	}
}

// checkProjectors: they run square to the edge view of the plane.
func checkProjectors(t *testing.T, s *drawing.Sheet, a *attempt) {
	t.Helper()
	edge := a.onPaper(0, vec.V3{X: 77.5, Z: 260 * 42.5 / 120}).Sub(a.onPaper(0, vec.V3{X: 35})).Unit()
	n := 0
	for _, m := range s.Marks {
		if m.Role == drawing.Projector {
			n++
			l := m.Shape.(drawing.Line)
			if c := l.B.Sub(l.A).Dot(edge); math.Abs(c) > paperTie {
				t.Errorf("projector %v leans by %g mm", m.Key, c)
			}
		}
	}
	if n < 3 {
		t.Errorf("%d projectors, want those of chord, vertex and focus", n)
	}
}

// checkHatching: lines at 45 degrees, none through lettering.
func checkHatching(t *testing.T, s *drawing.Sheet) {
	t.Helper()
	var words []quadrangle
	n := 0
	for _, m := range s.Marks {
		if x, ok := m.Shape.(drawing.Text); ok && m.Key.View == "cut" {
			words = append(words, textRoom(x))
		}
	}
	for _, m := range s.Marks {
		if m.Role != drawing.Hatching {
			continue
		}
		n++
		l := m.Shape.(drawing.Line)
		if d := l.B.Sub(l.A); math.Abs(math.Abs(d.X)-math.Abs(d.Y)) > paperTie {
			t.Errorf("hatching along %v", d)
		}
		for _, w := range words {
			if w.meets(line{l.A, l.B}) {
				t.Errorf("hatching runs through lettering at %v", w.at)
			}
		}
	}
	if n < 10 {
		t.Errorf("%d lines of hatching", n)
	}
}

// TestEllipseKeepsItsAxes: a cylinder of radius 50 cut at 30 degrees to its base
// shows an ellipse of semi-axes 50 and 50/cos 30 (standards.md section 9).
func TestEllipseKeepsItsAxes(t *testing.T) {
	c := frustumAt("C", vec.V3{}, vec.V3{Z: 1}, 50, 50, 200)
	p := planeAlong("P", vec.V3{Z: 100}, vec.V3{X: math.Cos(math.Pi / 6), Z: math.Sin(math.Pi / 6)}, vec.V3{Y: 1})
	s := sectionOf(t, "S", c, p)
	b := &scene.Block{Form: "sheet", Name: "oval", Title: "Oval", Size: "A3", Scale: 1, Titles: &scene.Titles{}, Views: []*scene.View{trueShape("cut", s, nil, "focus")}}
	sheet := composed(t, b)
	e, ok := find(sheet, "cut", "S", "outline/1")[0].Shape.(drawing.EllipseArc)
	if !ok || math.Abs(e.RX-50/math.Cos(math.Pi/6)) > paperTie || math.Abs(e.RY-50) > paperTie {
		t.Errorf("ellipse %v", e)
	}
	for i, want := range []float64{1, -1} { // the foci lie r tan 30 from the centre, up the slope first
		f := find(sheet, "cut", "S", ordinal("focus", i+1))[0].Shape.(drawing.EllipseArc).C
		if d := f.Sub(e.C).Dist(vec.V2{Y: want * 50 * math.Tan(math.Pi/6)}); d > paperTie {
			t.Errorf("focus %d is %g mm off", i+1, d)
		}
	}
}

// TestGeneratorsBearTheNumbersOfThePattern: what is numbered n on the pattern folds
// back on to the generator that is numbered n on the view.
func TestGeneratorsBearTheNumbersOfThePattern(t *testing.T) {
	h := rainHood(t)
	front := elevation("front", subjects("B", h.B), "generators", "numbers")
	b := &scene.Block{Form: "sheet", Name: "gens", Title: "Generators", Size: "A2", Titles: &scene.Titles{},
		Views: []*scene.View{front, pattern("flat", h.D, "generators", "numbers")}}
	s := composed(t, b)
	_, a := trial(t, b)
	checked := 0
	for _, st := range h.D.Stations {
		if st.Number < 2 || len(st.Spans) == 0 {
			continue
		}
		marks := find(s, "front", "B", ordinal("generator", st.Number))
		if len(marks) == 0 || marks[0].Key.Feature != ordinal("generator", st.Number) {
			continue // it lies on another line of the view
		}
		l := marks[0].Shape.(drawing.Line)
		for _, q := range []vec.V2{st.Spans[0].Low, st.Spans[0].High} {
			p := a.onPaper(0, h.D.Fold(q))
			if d := min(p.Dist(l.A), p.Dist(l.B)); d > 1e-6 { // folding back is proved to 1e-9 of the size elsewhere
				t.Errorf("generator %d is %g mm off", st.Number, d)
			}
		}
		checked++
	}
	if checked < 3 {
		t.Errorf("only %d generators compared", checked)
	}
}

// TestFocalSphereTouches: in the elevation the outline of the sphere is tangent to the
// contour of the cone and to the edge view of the plane, in the focus.
func TestFocalSphereTouches(t *testing.T) {
	h := rainHood(t)
	front := elevation("front", subjects("K", h.K, "P", h.P), "focal_spheres", "focus")
	b := &scene.Block{Form: "sheet", Name: "ball", Title: "Focal sphere", Size: "A3", Scale: 0.5, Titles: &scene.Titles{}, Views: []*scene.View{front}}
	sheet, problems := Compose(&scene.Scene{Things: []*scene.Thing{{Name: "S", Value: h.S}}}, b)
	if len(problems) > 0 {
		t.Fatal(problems)
	}
	_, a := trial(t, b)
	ball := find(sheet, "front", "S.sphere/1", "outline")[0].Shape.(drawing.EllipseArc)
	for _, side := range []float64{-1, 1} {
		foot, apex := a.onPaper(0, vec.V3{X: side * 120}), a.onPaper(0, vec.V3{Z: 260})
		if d := math.Abs(apex.Sub(foot).Unit().Cross(ball.C.Sub(foot))); math.Abs(d-ball.RX) > paperTie {
			t.Errorf("the sphere of radius %v is %v from a side", ball.RX, d)
		}
	}
	focus := find(sheet, "front", "S", "focus/1")[0].Shape.(drawing.EllipseArc).C
	if d := focus.Dist(ball.C); math.Abs(d-ball.RX) > paperTie {
		t.Errorf("the focus is %v from the centre of a sphere of radius %v", d, ball.RX)
	}
}

// TestCuttingPlaneLine: the line of a plane seen edge-on has wide ends that reach
// past the outline, and its name.
func TestCuttingPlaneLine(t *testing.T) {
	h := rainHood(t)
	front := elevation("front", subjects("B", h.B), "cutting_planes")
	b := &scene.Block{Form: "sheet", Name: "plane", Title: "Plane", Size: "A3", Scale: 0.5, Titles: &scene.Titles{}, Views: []*scene.View{front}}
	s := composed(t, b)
	ends := find(s, "front", "P", "plane/end")
	if len(ends) != 2 {
		t.Fatalf("%d ends", len(ends))
	}
	for _, m := range ends {
		l := m.Shape.(drawing.Line)
		if m.Pen.Width != 0.5 || math.Abs(l.A.Dist(l.B)-cutInside-cutOutside) > paperTie {
			t.Errorf("end %v with the pen %v", l, m.Pen)
		}
	}
	if m := find(s, "front", "P", "name"); len(m) != 1 || m[0].Shape.(drawing.Text).String != "P" {
		t.Errorf("name %v", m)
	}
	// Its middle lies on the cut edge of the part, which is drawn already.
	for _, m := range find(s, "front", "P", "plane/") {
		if !strings.HasPrefix(m.Key.Feature, "plane/end") {
			t.Errorf("%v lies on the cut edge", m.Key)
		}
	}
}

// TestLeaningCylinder: in a plan and an elevation every visible line ends at the
// end of another or on a closed ellipse.
func TestLeaningCylinder(t *testing.T) {
	c := frustumAt("C", vec.V3{X: 40, Y: -30, Z: 10}, vec.V3{X: 1, Y: 0.5, Z: 0.7}, 35, 35, 160)
	front := elevation("front", subjects("C", c))
	b := &scene.Block{Form: "sheet", Name: "lean", Title: "Leaning", Size: "A3", Titles: &scene.Titles{}, Views: []*scene.View{front, plan("top", front.Of, front)}}
	s := composed(t, b)
	keep(t, s)
	for _, v := range []string{"front", "top"} {
		var ends []vec.V2
		var ovals []drawing.EllipseArc
		for _, m := range find(s, v, "C", "") {
			if o, ok := m.Shape.(drawing.EllipseArc); ok && o.Full() {
				ovals = append(ovals, o)
			}
			if a, e, ok := drawing.Ends(m.Shape); ok && m.Role == drawing.VisibleEdge && !drawing.Closed(m.Shape) {
				ends = append(ends, a, e)
			}
		}
		if len(ends) == 0 {
			t.Errorf("nothing drawn in %s", v)
		}
		for i, p := range ends {
			near := math.Inf(1)
			for _, o := range ovals {
				u, d := drawing.Dir(o.Rot), p.Sub(o.C)
				near = min(near, o.RY*math.Abs(math.Hypot(d.Dot(u)/o.RX, d.Dot(u.Left())/o.RY)-1))
			}
			for k, q := range ends {
				if k != i {
					near = min(near, p.Dist(q))
				}
			}
			if near > 1e-6 {
				t.Errorf("%s: an end at %v lies %g mm from the next", v, p, near)
			}
		}
	}
	if _, ok := c.Body.Faces[0].Surface.(surface.Ruled); !ok || c.Body.Edges()[0].Arc.Form != curve.Ellipse {
		t.Error("the scene is not what the test thinks")
	}
}
