package cli

import (
	"fmt"

	"epure/eval/scene"
)

// A development proves itself: the area and the edges of the drawn pattern are
// integrated in the plane, those of the solid in space, by another formula over
// another parameter, and points of the pattern are folded back to the solid.

// developments are the patterns of a scene, in file order.
func developments(sc *scene.Scene) []*scene.Development {
	var out []*scene.Development
	for _, t := range sc.Things {
		if d, ok := t.Value.(*scene.Development); ok && d.Pattern != nil {
			out = append(out, d)
		}
	}
	return out
}

// proofs writes the numbers for people.
func proofs(sc *scene.Scene) []string {
	var out []string
	for _, d := range developments(sc) {
		p := d.Proof()
		out = append(out, fmt.Sprintf("development %s: area %s mm² flat, %s mm² in space; areas and edges agree to %.1e; folded back to within %.1e mm",
			d.Name, decimal(p.AreaFlat), decimal(p.AreaSpace), p.Worst(), p.Deviation))
	}
	return out
}

// jsonProofs are the same numbers as data.
func jsonProofs(sc *scene.Scene) []object {
	out := []object{}
	for _, d := range developments(sc) {
		p := d.Proof()
		edges := []object{}
		for _, e := range p.Edges {
			edges = append(edges, object{{"face", e.Label}, {"flat", e.Flat}, {"space", e.Space}})
		}
		out = append(out, object{{"name", d.Name}, {"area_flat", p.AreaFlat}, {"area_space", p.AreaSpace}, {"edges", edges}, {"deviation", p.Deviation}})
	}
	return out
}
