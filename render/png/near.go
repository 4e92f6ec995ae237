package png

import (
	"epure/geom/vec"
	"epure/render/drawing"
)

// Which parts of a line can be seen, cut small enough for the library.

// stretch is a part of a line that may touch the page.
type stretch struct {
	chain  []drawing.Cubic
	before float64 // length of the line before it, pixels
	whole  bool    // it is all of the line
}

// straightEnough is the length of a cubic's handles over that of its chord up to
// which the library is trusted with its length and its offset. Its five-point
// Gauss sum is then right to 1e-7 of the length (tested).
const straightEnough = 1.02

// mostCuts bounds the halvings of one cubic: a cusp never gets straight, and is
// under a pixel long after as many.
const mostCuts = 24

// near cuts a line into pieces that are nearly straight and no longer than the
// page, and keeps those that a pen of the width can draw onto it.
func (g page) near(line []drawing.Cubic, width float64) []stretch {
	paper := drawing.Box{}
	paper.Max.X, paper.Max.Y = g.w, g.h
	paper = paper.Grow(width)
	most := g.w + g.h
	var out []stretch
	run := 0.0
	joined, dropped := false, false
	var walk func(c drawing.Cubic, cuts int)
	walk = func(c drawing.Cubic, cuts int) {
		switch hull := hull(c); {
		case !hull.Overlaps(paper):
			run += drawing.Length(drawing.Spline{Points: c[:]})
			joined, dropped = false, true
			return
		case cuts < mostCuts && (max(hull.Width(), hull.Height()) > most || bent(c)):
			a, b := halves(c)
			walk(a, cuts+1)
			walk(b, cuts+1)
			return
		}
		if !joined {
			out = append(out, stretch{before: run})
			joined = true
		}
		s := &out[len(out)-1]
		s.chain = append(s.chain, c)
		run += drawing.Length(drawing.Spline{Points: c[:]})
	}
	for _, c := range line {
		walk(c, 0)
	}
	for i := range out {
		out[i].whole = !dropped
	}
	return out
}

func hull(c drawing.Cubic) drawing.Box {
	return drawing.EmptyBox().With(c[0]).With(c[1]).With(c[2]).With(c[3])
}

// bent reports whether a cubic's handles are longer than straightEnough allows.
func bent(c drawing.Cubic) bool {
	return c[0].Dist(c[1])+c[1].Dist(c[2])+c[2].Dist(c[3]) > straightEnough*c[0].Dist(c[3])
}

// halves cuts a cubic at its middle (de Casteljau).
func halves(c drawing.Cubic) (a, b drawing.Cubic) {
	mid := drawing.Line{A: c[1], B: c[2]}.At(0.5)
	a[0], b[3] = c[0], c[3]
	a[1], b[2] = drawing.Line{A: c[0], B: c[1]}.At(0.5), drawing.Line{A: c[2], B: c[3]}.At(0.5)
	a[2], b[1] = drawing.Line{A: a[1], B: mid}.At(0.5), drawing.Line{A: mid, B: b[2]}.At(0.5)
	a[3] = drawing.Line{A: a[2], B: b[1]}.At(0.5)
	b[0] = a[3]
	return a, b
}

// narrow reports whether a closed line leaves no paper inside: no point of a strip
// as wide as the pen is further than half the pen from both its edges. The strip
// tried is the one along the line's longest chord from its start.
func narrow(closed []drawing.Cubic, width float64) bool {
	if len(closed) == 0 {
		return false
	}
	start := closed[0][0]
	var chord vec.V2
	for _, c := range closed {
		if d := c[3].Sub(start); d.Len() > chord.Len() {
			chord = d
		}
	}
	across, least, most := chord.Unit().Left(), 0.0, 0.0
	for _, c := range closed {
		for _, p := range c {
			d := p.Sub(start).Dot(across)
			least, most = min(least, d), max(most, d)
		}
	}
	return most-least <= width
}
