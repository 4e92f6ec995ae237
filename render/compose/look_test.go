package compose

import (
	"testing"

	"epure/eval/scene"
)

func TestRainHood(t *testing.T) {
	h := rainHood(t)
	front := elevation("front", subjects("B", h.B))
	front.Faint = subjects("K", h.K)
	top := plan("top", subjects("B", h.B), front)
	b := &scene.Block{Form: "sheet", Name: "hood", Title: "Rain hood", Size: "A2", Titles: &scene.Titles{},
		Views: []*scene.View{front, top, pattern("flat", h.D, "generators", "numbers")},
		Notes: []*scene.Note{{Name: "note", Text: "Pattern seen from outside. Slant 286.4 mm."}}}
	sheet, problems := Compose(&scene.Scene{}, b)
	for _, p := range problems {
		t.Log(p)
	}
	keep(t, sheet)
}
