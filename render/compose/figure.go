package compose

import (
	"fmt"
	"math"

	"epure/geom/vec"
	"epure/render/drawing"
	"epure/render/furniture"
)

// Figures: no frame and no title block, cropped round what is drawn, for a page
// of a manual. The width on that page decides the scale when none is stated.

const (
	figureMargin = 5.0   // round the content, paper mm
	figureWidest = 190.0 // of a figure without a width: what a page of A4 holds
	figureTall   = 250.0 // its height, at most, while its scale is open
)

// figurePage is the largest page of a figure: 5 m either way, what a reader of
// PDF can still show (14400 units of 1/72 inch).
func figurePage() drawing.Box { return drawing.BoxAt(vec.V2{}, 5000, 5000) }

// figure composes a figure.
func (j *job) figure() *drawing.Sheet {
	j.ink = inkFor(drawing.Group05())
	sets := j.sets()
	width := j.block.Width
	a := j.figureAttempt(sets, width)
	if a == nil {
		text := "the figure has no scale at which its views fit"
		if s := j.block.Scale; s > 0 {
			text = "the figure is too large at " + scaleText(s) + j.tooLarge(sets[0], s, figurePage())
		}
		j.report(Problem{Span: j.block.Span, Code: SheetFull, Text: text, Fatal: true})
		return nil
	}
	j.compact(a)
	b := a.content().Grow(figureMargin)
	if width > 0 && b.Width() > width+slack {
		j.report(Problem{Span: j.block.Span, Code: SheetFull, Fatal: true,
			Text:   fmt.Sprintf("the figure is %.1f mm wide at %s, %.1f mm more than its width of %.1f mm", b.Width(), scaleText(a.scale), b.Width()-width, width),
			Reason: "state the width or the scale, not both, or make one of them fit the other"})
		return nil
	}
	page := b.Width()
	if width > 0 {
		page = width
	}
	shift := vec.V2{X: (page-b.Width())/2 - b.Min.X, Y: 0 - b.Min.Y}
	return j.finish(movedMarks(j.placedMarks(a), shift), page, b.Height(), a.scale)
}

// figureAttempt places the figure at its scale, at the scale that fills its width, or
// at the largest scale of ISO 5455 that a page holds.
func (j *job) figureAttempt(sets [][]*picture, width float64) *attempt {
	switch {
	case j.block.Scale > 0:
		room := width
		if room == 0 {
			room = math.Inf(1)
		}
		if !j.mayFit(sets[0], j.block.Scale, figurePage()) {
			return nil
		}
		if a := j.figureAt(sets, j.block.Scale, room, math.Inf(1)); a != nil {
			return a
		}
		return j.figureAt(sets, j.block.Scale, math.Inf(1), math.Inf(1))
	case width > 0:
		return j.figureFilling(sets, width)
	}
	for _, s := range furniture.Scales() {
		if a := j.figureAt(sets, s.Value(), figureWidest, figureTall); a != nil {
			return a
		}
	}
	return nil
}

// fillingSteps halves the interval of the scale: after 12 the content is within
// 1/4000 of the widest, under the width of a line on any page.
const fillingSteps = 12

// figureFilling finds the largest scale at which the content is no wider than width.
// Lettering does not grow with the scale, so the width is not proportional to it.
func (j *job) figureFilling(sets [][]*picture, width float64) *attempt {
	widest := 0.0
	for _, p := range sets[0] {
		widest = max(widest, p.size.X, p.size.Y*width/figureTall)
	}
	if widest == 0 {
		return nil
	}
	lo, hi := 0.0, (width-2*figureMargin)/widest
	var best *attempt
	for range fillingSteps {
		mid := (lo + hi) / 2
		if a := j.figureAt(sets, mid, width, figureTall); a != nil {
			best, lo = a, mid
		} else {
			hi = mid
		}
	}
	return best
}

// figureAt drafts and places at a scale within width and height, as low as it can.
func (j *job) figureAt(sets [][]*picture, scale, width, height float64) *attempt {
	for _, set := range sets {
		a := &attempt{scale: scale, drafts: j.drafts(set, scale), extras: j.extras(scale, noteWidths()[1])}
		full := 0.0
		for _, d := range a.drafts {
			full += d.room.box().Width() + d.room.box().Height() + 2*leastGap
		}
		for _, e := range a.extras {
			full += e.room.box().Width() + e.room.box().Height() + 2*leastGap
		}
		w := min(width-2*figureMargin, full)
		for _, share := range []float64{0.25, 0.35, 0.5, 0.7, 1, 1.4, 2, 3, 6} {
			h := min(w*share, height-2*figureMargin)
			a.layout = j.layoutOf(a, drawing.BoxAt(vec.V2{}, w, h).Grow(leastEdge), nil)
			a.layout.tight = true
			if a.layout.arrange() {
				return a
			}
			if h < w*share {
				break
			}
		}
	}
	return nil
}

// compactSteps halves the height that a figure does not need: after five it is
// within a thirtieth of the least.
const compactSteps = 5

// compact arranges the figure in the least height in which it goes.
func (j *job) compact(a *attempt) {
	space := a.layout.space
	lo, hi := 0.0, space.Height()
	for range compactSteps {
		h := (lo + hi) / 2
		l := j.layoutOf(a, drawing.BoxAt(space.Min, space.Width(), h), nil)
		if l.tight = true; l.arrange() {
			a.layout, hi = l, h
		} else {
			lo = h
		}
	}
}

// content is the box of everything placed.
func (a *attempt) content() drawing.Box {
	e := nothing()
	for _, t := range a.layout.items {
		e = e.union(t.here())
	}
	return e.box()
}
