package compose

import (
	"testing"

	"epure/eval/scene"
	"epure/geom/vec"
)

// BenchmarkHood composes a sheet like that of the language page: two views, a
// pattern, a table, a note, dimensions, at a scale that is chosen.
func BenchmarkHood(b *testing.B) {
	h := rainHood(b)
	front := elevation("front", subjects("B", h.B))
	front.Faint = subjects("K", h.K)
	top := plan("top", subjects("B", h.B), front)
	block := &scene.Block{Form: "sheet", Name: "hood", Title: "Rain hood", Size: "A3", Titles: &scene.Titles{},
		Views:      []*scene.View{front, top, pattern("flat", h.D, "generators", "numbers")},
		Notes:      []*scene.Note{{Name: "note", Text: "Pattern seen from outside."}},
		Tables:     []*scene.Table{{Name: "table", Rows: [][]string{{"No.", "mm"}, {"1", "286.4"}, {"2", "251.9"}}}},
		Dimensions: []*scene.Dimension{{Name: "K.height", On: front, Anchor: scene.Linear{B: vec.V3{Z: 260}}, Text: "260"}},
	}
	b.ReportAllocs()
	for b.Loop() {
		if s, _ := Compose(&scene.Scene{}, block); s == nil {
			b.Fatal("no sheet")
		}
	}
}
