package compose

import (
	"testing"

	"epure/eval/scene"
	"epure/geom/vec"
	"epure/render/drawing"
)

// Whole sheets, as a draughtsman would hand them over. They are kept for the eye
// on request; what a test can see of them is checked on every run.

// looked composes a block, keeps it, and fails when there is a problem, when two
// things lie too near each other, or when lettering lies on lettering.
func looked(t *testing.T, sc *scene.Scene, b *scene.Block) {
	t.Helper()
	if sc == nil {
		sc = &scene.Scene{}
	}
	sheet, problems := Compose(sc, b)
	for _, p := range problems {
		t.Errorf("%s: %v", b.Name, p)
	}
	if sheet == nil {
		t.Fatalf("%s: no sheet", b.Name)
	}
	keep(t, sheet)
	if b.Form == "sheet" {
		_, a := trial(t, b)
		checkClear(t, b.Name, a)
	}
	checkWords(t, sheet)
}

// checkWords fails when two texts share room.
func checkWords(t *testing.T, s *drawing.Sheet) {
	t.Helper()
	var texts []drawing.Text
	for _, m := range s.Marks {
		if x, ok := m.Shape.(drawing.Text); ok {
			texts = append(texts, x)
		}
	}
	for i, x := range texts {
		for _, y := range texts[:i] {
			if textRoom(x).grown(-0.05).overlaps(textRoom(y)) {
				t.Errorf("%s: %q at %.1f lies on %q at %.1f", s.Name, x.String, x.At, y.String, y.At)
			}
		}
	}
}

func TestRainHood(t *testing.T) {
	h := rainHood(t)
	front := elevation("front", subjects("B", h.B))
	front.Faint = subjects("K", h.K)
	top := plan("top", subjects("B", h.B), front)
	side := &scene.View{Form: "elevation", Name: "end", Along: vec.V3{X: -1}, Of: front.Of, From: front, Show: shown()}
	b := &scene.Block{Form: "sheet", Name: "hood", Title: "Rain hood", Size: "A2", Titles: &scene.Titles{},
		Views: []*scene.View{front, top, side, pattern("flat", h.D, "generators", "numbers")},
		Notes: []*scene.Note{{Name: "note", Text: "Pattern seen from outside. Slant 286.4 mm."}},
		Dimensions: []*scene.Dimension{
			{Name: "K.height", On: front, Anchor: scene.Linear{B: vec.V3{Z: 260}}, Text: "260"},
			{Name: "foot", On: front, Anchor: scene.Linear{A: vec.V3{X: -120}, B: vec.V3{X: 35}}, Text: "155"},
			{Name: "inset", On: front, Anchor: scene.Linear{A: vec.V3{X: 35}, B: vec.V3{X: 120}}, Text: "85"},
			{Name: "K.base.diameter", On: top, Anchor: scene.Diameter{Circle: scene.Circle{F: vec.World, R: 120}}, Text: "240"},
			{Name: "tilt", On: front, Anchor: scene.Angle{Apex: vec.V3{X: 35}, A: vec.V3{X: 1}, B: vec.V3{X: 120, Z: 260}.Unit()}, Text: "65.2°"},
			{Name: "wrong", On: top, Anchor: scene.Linear{B: vec.V3{Z: 260}}, Text: "260"},
		},
		Labels: []*scene.Label{{Name: "tip", Text: "apex", At: vec.V3{Z: 260}, On: []*scene.View{front, top}}, {Name: "eave", Text: "cut edge, a parabola", At: vec.V3{X: 56.25, Z: 46.04}, On: []*scene.View{front}}},
		Tables: []*scene.Table{{Name: "table", Title: "True lengths of D", Rows: [][]string{{"No.", "from seam", "true length mm"}, {"1", "0.00°", "286.4"}, {"2", "30.00°", "286.4"}, {"3", "60.00°", "286.4"}, {"a", "73.05°", "286.4"}, {"4", "90°", "251.9"}}}},
	}
	if _, problems := Compose(&scene.Scene{}, b); len(problems) != 1 || problems[0].Code != NotTrue {
		t.Errorf("problems %v, want that of the height on the plan", problems)
	}
	b.Dimensions = b.Dimensions[:len(b.Dimensions)-1]
	looked(t, nil, b)
	b.ThirdAngle, b.Name, b.Size = true, "hood3", "A3"
	looked(t, nil, b)
}

func TestGenerators(t *testing.T) {
	h := rainHood(t)
	front := elevation("front", subjects("B", h.B), "generators", "numbers", "projectors")
	top := plan("top", subjects("B", h.B), front, "generators", "numbers")
	b := &scene.Block{Form: "sheet", Name: "gens", Title: "Rain hood, the lines", Size: "A2", Titles: &scene.Titles{},
		Views: []*scene.View{front, top, pattern("flat", h.D, "generators", "numbers")}}
	looked(t, nil, b)
	pipe := frustumAt("C", vec.V3{}, vec.V3{Z: 1}, 75, 75, 300)
	roof := planeAlong("roof", vec.V3{Z: 120}, vec.V3{X: 1, Z: 0.7}, vec.V3{Y: 1})
	q := partOf(t, "Q", pipe, roof, false)
	front = elevation("front", subjects("Q", q), "generators", "numbers", "projectors")
	top = plan("top", subjects("Q", q), front, "generators", "numbers")
	b = &scene.Block{Form: "sheet", Name: "pipe", Title: "Pipe through a roof", Size: "A3", Titles: &scene.Titles{},
		Views: []*scene.View{front, top, pattern("flat", patternOf(t, "D", q, 0, 12, true), "generators", "numbers")}}
	looked(t, nil, b)
}

func TestAuxiliary(t *testing.T) {
	pipe := frustumAt("C", vec.V3{}, vec.V3{Z: 1}, 75, 75, 300)
	roof := planeAlong("roof", vec.V3{Z: 120}, vec.V3{X: 1, Z: 0.7}, vec.V3{Y: 1})
	q := partOf(t, "Q", pipe, roof, false)
	for _, third := range []bool{false, true} {
		front := elevation("front", subjects("Q", q))
		top := plan("top", subjects("Q", q), front)
		aux := &scene.View{Form: "view", Name: "A", Along: roof.F.Z.Neg(), Of: front.Of, From: front, Show: shown("projectors")}
		left := &scene.View{Form: "elevation", Name: "left", Along: vec.V3{X: 1}, Of: front.Of, From: front, Show: shown()}
		rear := &scene.View{Form: "elevation", Name: "rear", Along: vec.V3{Y: -1}, Of: front.Of, From: left, Show: shown()}
		b := &scene.Block{Form: "sheet", Name: "aux1", Title: "Auxiliary view", Size: "A2", Titles: &scene.Titles{}, ThirdAngle: third,
			Views: []*scene.View{front, top, aux, left, rear}}
		if third {
			b.Name = "aux3"
		}
		looked(t, nil, b)
		b.Form, b.Width, b.Name = "figure", 160, b.Name+"fig"
		looked(t, nil, b)
	}
}

func TestSmallPapers(t *testing.T) {
	h := rainHood(t)
	front := elevation("front", subjects("B", h.B), "generators", "numbers")
	front.Faint = subjects("K", h.K)
	top := plan("top", subjects("B", h.B), front)
	b := &scene.Block{Form: "sheet", Name: "a4", Title: "Rain hood", Size: "A4", Portrait: true, Titles: &scene.Titles{},
		Views: []*scene.View{front, top, pattern("flat", h.D, "generators", "numbers")},
		Notes: []*scene.Note{{Name: "note", Text: "Pattern seen from outside. Slant 286.4 mm."}},
		Dimensions: []*scene.Dimension{
			{Name: "K.height", On: front, Anchor: scene.Linear{B: vec.V3{Z: 260}}, Text: "260"},
			{Name: "K.base.diameter", On: top, Anchor: scene.Diameter{Circle: scene.Circle{F: vec.World, R: 120}}, Text: "240"},
			{Name: "R", On: nil, Anchor: scene.FlatRadius{R: 286.356, At: 2.3}, Text: "286.4"},
			{Name: "sector", On: nil, Anchor: scene.FlatAngle{To: 2.63305}, Text: "150.9°"},
		},
		Tables: []*scene.Table{{Name: "table", Title: "True lengths of D", Rows: [][]string{{"No.", "from seam", "true length mm"}, {"1", "0.00°", "286.4"}, {"2", "30.00°", "286.4"}, {"3", "60.00°", "286.4"}, {"a", "73.05°", "286.4"}, {"4", "90°", "251.9"}}}},
	}
	b.Dimensions[2].On, b.Dimensions[3].On = b.Views[2], b.Views[2]
	looked(t, nil, b)
	b.Form, b.Name = "figure", "fig"
	looked(t, nil, b)
}

func TestTrueShapes(t *testing.T) {
	h := rainHood(t)
	for _, third := range []bool{false, true} {
		front := elevation("front", subjects("B", h.B), "projectors", "cutting_planes", "focus")
		front.Faint = subjects("K", h.K)
		top := plan("top", subjects("B", h.B), front)
		b := &scene.Block{Form: "sheet", Name: "truth1", Title: "Rain hood", Size: "A2", Titles: &scene.Titles{}, ThirdAngle: third,
			Views: []*scene.View{front, top, trueShape("cut", h.S, front, "focus", "axis", "directrix"), pattern("flat", h.D, "generators", "numbers")},
			Notes: []*scene.Note{{Name: "note", Text: "Pattern seen from outside. Slant 286.4 mm."}},
			Dimensions: []*scene.Dimension{
				{Name: "K.height", On: front, Anchor: scene.Linear{B: vec.V3{Z: 260}}, Text: "260"},
				{Name: "K.base.diameter", On: top, Anchor: scene.Diameter{Circle: scene.Circle{F: vec.World, R: 120}}, Text: "240"},
			},
		}
		if third {
			b.Name = "truth3"
		}
		looked(t, nil, b)
	}
}

// TestFourCuts: one cone and four planes, each with its true shape.
func TestFourCuts(t *testing.T) {
	k := coneAt("K", 100, 220)
	slope := vec.V3{X: -100, Z: 220}.Unit()
	planes := []*scene.Plane{
		planeAlong("circle", vec.V3{Z: 150}, vec.V3{X: 1}, vec.V3{Y: 1}),
		planeAlong("ellipse", vec.V3{Z: 100}, vec.V3{X: 1, Z: 0.7}, vec.V3{Y: 1}),
		planeAlong("parabola", vec.V3{X: -40}, slope.Neg(), vec.V3{Y: 1}),
		planeAlong("hyperbola", vec.V3{X: 45}, vec.V3{Z: 1}, vec.V3{Y: 1}),
	}
	of := subjects("K", k)
	var views []*scene.View
	for _, p := range planes {
		of = append(of, scene.Subject{Name: p.Name, Value: p})
	}
	sc := &scene.Scene{}
	front := elevation("front", of, "focal_spheres", "focus")
	top := plan("top", subjects("K", k), front)
	views = append(views, front, top)
	for i, p := range planes {
		s := sectionOf(t, "S"+itoa(i+1), k, p)
		sc.Things = append(sc.Things, &scene.Thing{Name: s.Name, Value: s})
		from := front
		if i == 0 {
			from = nil
		}
		views = append(views, trueShape("true"+itoa(i+1), s, from, "focus", "axis", "directrix", "hatching"))
		top.Of = append(top.Of, scene.Subject{Name: s.Name, Value: s})
	}
	b := &scene.Block{Form: "sheet", Name: "four", Title: "A cone and four planes", Size: "A1", Titles: &scene.Titles{}, Views: views}
	looked(t, sc, b)
	b.Size, b.Name = "A3", "four3"
	looked(t, sc, b)
}
