package compose

import (
	"epure/geom/vec"
	"epure/render/drawing"
)

// Hatching lies under everything and stops short of lettering, so it is drawn
// first but worked out last.

// drawHatching hatches the outlines that ask for it.
func (d *draft) drawHatching() {
	var marks []drawing.Mark
	for _, h := range d.p.hatched {
		var paths []drawing.Path
		box := drawing.EmptyBox()
		for _, o := range h.outlines {
			if path, ok := o.shape(d.scale).(drawing.Path); ok {
				paths = append(paths, path)
				box = box.Union(shapeExtent(path).box())
			}
		}
		if len(paths) == 0 {
			continue
		}
		n := 0
		for _, l := range drawing.Hatch(paths, h.turn*drawing.HatchAngle, drawing.PitchFor(box)) {
			for _, part := range d.betweenWords(line{l.A, l.B}) {
				n++
				k := h.key
				k.Feature = ordinal(k.Feature, n)
				marks = append(marks, drawing.Mark{Key: k, Role: drawing.Hatching, Pen: d.ink.pens.Pen(drawing.Hatching), Shape: drawing.Line{A: part.a, B: part.b}})
			}
		}
	}
	d.marks = append(marks, d.marks...)
}

// shortestHatch is the length in mm on paper under which a piece of hatching is
// left out: it would look like a speck.
const shortestHatch = 0.8

// betweenWords is what of a line no lettering lies on.
func (d *draft) betweenWords(l line) []line {
	length := l.a.Dist(l.b)
	free := [][2]float64{{0, 1}}
	for _, w := range d.field.words {
		if lo, hi, ok := w.grown(lettersClear).inside(l); ok {
			free = without(free, lo, hi, shortestHatch/length)
		}
	}
	var out []line
	at := func(t float64) vec.V2 { return drawing.Line{A: l.a, B: l.b}.At(t) }
	for _, f := range free {
		out = append(out, line{at(f[0]), at(f[1])})
	}
	return out
}
