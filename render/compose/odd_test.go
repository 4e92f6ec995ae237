package compose

import (
	"testing"

	"epure/eval/scene"
	"epure/geom/vec"
	"epure/render/drawing"
)

// TestOddBlocks: whatever is asked for, there is a sheet or a problem, and no fault.
func TestOddBlocks(t *testing.T) {
	h := rainHood(t)
	of := subjects("B", h.B)
	far := vec.V2{X: 5000, Y: -200}
	lone := &scene.View{Form: "view", Name: "v", Along: vec.V3{X: 1, Y: 2, Z: 3}.Unit(), Show: shown()}
	selfish := elevation("me", of)
	selfish.From = selfish
	a, b := elevation("a", of), plan("b", of, nil)
	a.From, b.From = b, a
	away := elevation("away", of)
	away.At = &far
	own := elevation("own", of)
	own.Scale = 0.1
	loose := trueShape("loose", h.S, nil, "focus", "axis", "directrix", "hatching")
	loose.Along = vec.V3{}
	everything := elevation("all", subjects("B", h.B, "P", h.P, "S", h.S, "p", scene.Triple{V: vec.V3{X: 1}}, "L", &scene.Line{Name: "L", Along: vec.V3{Y: 1}}, "M", &scene.Line{Name: "M", Along: vec.V3{X: 1}, Ends: true, To: vec.V3{X: 90}}),
		"projectors", "cutting_planes", "generators", "numbers", "focal_spheres", "focus", "axis", "directrix", "hatching")
	for name, views := range map[string][]*scene.View{
		"nothing": nil, "empty": {lone}, "self": {selfish}, "ring": {a, b}, "away": {away}, "own": {own}, "loose": {loose},
		"all": {everything, plan("top", everything.Of, everything, "generators", "numbers", "projectors")},
		"two": {elevation("same", of), elevation("same", of)},
	} {
		for _, form := range []string{"sheet", "figure"} {
			for _, scale := range []float64{0, 0.2, 1, 1e-9, 1e6} {
				block := &scene.Block{Form: form, Name: name, Title: "Odd", Size: "A3", Scale: scale, Views: views}
				s, problems := Compose(&scene.Scene{}, block)
				if s == nil && len(problems) == 0 {
					t.Errorf("%s %s at %v: no sheet and no problem", form, name, scale)
				}
				seen := map[drawing.Key]bool{}
				if s != nil {
					for _, m := range s.Marks {
						if seen[m.Key] {
							t.Errorf("%s %s: %v twice", form, name, m.Key)
						}
						seen[m.Key] = true
					}
					keep(t, s)
				}
			}
		}
	}
	block := &scene.Block{Form: "sheet", Name: "away", Size: "A3", Scale: 0.2, Views: []*scene.View{away}}
	if _, problems := Compose(nil, block); len(problems) != 1 || problems[0].Code != OffSheet {
		t.Errorf("a view off the sheet: %v", problems)
	}
}

// TestGivenPlaces: at puts the lower left of a view's outline where it says, paper
// mm from the lower left of the drawing space.
func TestGivenPlaces(t *testing.T) {
	b, _ := frontAndPlan(t, false)
	at := vec.V2{X: 200, Y: 100}
	b.Views[0].At = &at
	b.Scale = 0.2
	_, a := trial(t, b)
	got := a.drafts[0].core.Min.Add(a.layout.items[0].at).Sub(a.layout.space.Min)
	if got.Dist(at) > paperTie {
		t.Errorf("the view stands at %v, want %v", got, at)
	}
	if d := a.onPaper(0, vec.V3{}).X - a.onPaper(1, vec.V3{}).X; d > paperTie || d < -paperTie {
		t.Errorf("its plan is %g mm out of line", d)
	}
}
