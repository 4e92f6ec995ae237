package compose

import (
	"fmt"
	"strings"

	"epure/geom/vec"
	"epure/render/drawing"
	"epure/render/furniture"
)

// Sheets: frame, title block, and everything placed in the drawing space.

// sheetPaper is the paper of a size, stood or laid as the block asks; A3 when
// the size is not known.
func (j *job) sheetPaper(name string) furniture.Paper {
	p, ok := furniture.PaperNamed(name)
	if !ok {
		p, _ = furniture.PaperNamed("A3")
	}
	if j.block.Portrait != (p.Height > p.Width) {
		return p.Turned()
	}
	return p
}

// attempt is one try: everything drafted at a scale and placed.
type attempt struct {
	scale  float64
	drafts []*draft // of the views, in file order
	extras []extra  // tables and notes
	layout *layout  // items of drafts, then of extras
}

// sheet composes a sheet.
func (j *job) sheet() *drawing.Sheet {
	p := j.sheetPaper(j.block.Size)
	j.ink = inkFor(p.Group())
	sets := j.sets()
	var a *attempt
	if j.block.Scale > 0 {
		a = j.tryScale(p, j.block.Scale, sets)
	} else {
		a = j.largest(p, sets)
	}
	if a == nil {
		j.reportFull(p, sets)
		return nil
	}
	j.checkPlaces(a)
	base := j.furnish(p, a)
	return j.finish(append(base, j.placedMarks(a)...), p.Width, p.Height, a.scale)
}

// sets are the ways in which the views may stand: folded, and where sloping
// folds occur, those upright.
func (j *job) sets() [][]*picture {
	first := j.pictures(false)
	sets := [][]*picture{first}
	for _, p := range first {
		if p.rel == folded && oblique(p.toward) {
			return append(sets, j.pictures(true))
		}
	}
	return sets
}

// largest tries the scales of ISO 5455 from the largest; nil when none fits.
func (j *job) largest(p furniture.Paper, sets [][]*picture) *attempt {
	for _, s := range furniture.Scales() {
		if a := j.tryScale(p, s.Value(), sets); a != nil {
			return a
		}
	}
	return nil
}

// tryScale drafts and places everything at one scale; nil when it does not fit.
func (j *job) tryScale(p furniture.Paper, scale float64, sets [][]*picture) *attempt {
	space := p.Space()
	for _, set := range sets {
		if !j.mayFit(set, scale, space) {
			continue
		}
		a := &attempt{scale: scale, drafts: j.drafts(set, scale)}
		for _, width := range noteWidths() {
			a.extras = j.extras(scale, width)
			a.layout = j.layoutOf(a, space, keepOut(p))
			if a.layout.arrange() {
				return a
			}
			if len(a.extras) == 0 {
				break
			}
		}
	}
	return nil
}

// mayFit weeds out scales at which some outline alone is larger than the space.
func (j *job) mayFit(set []*picture, scale float64, space drawing.Box) bool {
	for _, p := range set {
		s := j.scaleOf(p, scale)
		if p.size.X*s > space.Width() || p.size.Y*s > space.Height() {
			return false
		}
	}
	return true
}

// scaleOf is the view's own scale, or the block's.
func (j *job) scaleOf(p *picture, scale float64) float64 {
	if p.view.Scale > 0 {
		return p.view.Scale
	}
	return scale
}

// drafts drafts a set of pictures at a scale.
func (j *job) drafts(set []*picture, scale float64) []*draft {
	var out []*draft
	for _, p := range set {
		s, note := j.scaleOf(p, scale), ""
		if s != scale {
			note = "SCALE " + scaleText(s)
		}
		out = append(out, newDraft(p, s, j.ink, note))
	}
	return out
}

// layoutOf makes the items of an attempt.
func (j *job) layoutOf(a *attempt, space drawing.Box, blocked []extent) *layout {
	l := &layout{space: space, blocked: blocked}
	index := map[*picture]int{}
	for i, d := range a.drafts {
		index[d.p] = i
	}
	for _, d := range a.drafts {
		t := item{kind: viewItem, room: d.room, parent: -1}
		if d.p.toward != (vec.V2{}) && d.p.view.At == nil {
			t.parent, t.toward = index[d.p.parent], d.p.toward
		}
		if at := d.p.view.At; at != nil {
			t.fixed, t.at = true, space.Min.Add(*at).Sub(d.core.Min)
		}
		l.items = append(l.items, t)
	}
	for _, e := range a.extras {
		t := item{kind: e.kind, room: e.room, parent: -1}
		if e.at != nil {
			t.fixed, t.at = true, space.Min.Add(*e.at).Sub(e.room.box().Min)
		}
		l.items = append(l.items, t)
	}
	return l
}

// placedMarks are the marks of everything where it lies, and the projectors.
func (j *job) placedMarks(a *attempt) []drawing.Mark {
	var out []drawing.Mark
	for i, d := range a.drafts {
		out = append(out, j.projectors(a, i)...)
		out = append(out, movedMarks(d.marks, a.layout.items[i].at)...)
	}
	for i, e := range a.extras {
		out = append(out, movedMarks(e.marks, a.layout.items[len(a.drafts)+i].at)...)
	}
	return out
}

func movedMarks(marks []drawing.Mark, by vec.V2) []drawing.Mark {
	out := make([]drawing.Mark, len(marks))
	for i, m := range marks {
		m.Shape = drawing.Moved(m.Shape, by)
		out[i] = m
	}
	return out
}

// checkPlaces reports what was put off the drawing space by its at.
func (j *job) checkPlaces(a *attempt) {
	for i, d := range a.drafts {
		if d.p.view.At == nil {
			continue
		}
		b, s := a.layout.items[i].here().box(), a.layout.space
		if !s.Grow(slack).Holds(b) {
			off := max(s.Min.X-b.Min.X, s.Min.Y-b.Min.Y, b.Max.X-s.Max.X, b.Max.Y-s.Max.Y)
			j.report(Problem{Span: d.p.view.Span, Code: OffSheet,
				Text:   fmt.Sprintf("the view %s lies %.1f mm over the border of the drawing space", d.p.name, off),
				Reason: fmt.Sprintf("the drawing space is %.0f by %.0f mm; the view with all that belongs to it takes %.0f by %.0f mm", s.Width(), s.Height(), b.Width(), b.Height())})
		}
	}
}

// reportFull says what would fit: the largest scale on this sheet and the
// smallest sheet at this scale.
func (j *job) reportFull(p furniture.Paper, sets [][]*picture) {
	scale := j.block.Scale
	var would []string
	text := "the views do not fit the sheet " + p.Name
	if scale > 0 {
		text += " at " + scaleText(scale)
		if a := j.largest(p, sets); a != nil {
			would = append(would, "the largest scale that fits is "+scaleText(a.scale))
		}
		text += j.excess(p, scale, sets[0])
	} else {
		text += " at any scale of ISO 5455"
	}
	for _, q := range furniture.Papers() {
		q = j.sheetPaper(q.Name)
		if scale > 0 && q.Width*q.Height > p.Width*p.Height && j.tryScale(q, scale, sets) != nil {
			would = append(would, "the smallest sheet for "+scaleText(scale)+" is "+q.Name)
			break
		}
	}
	j.report(Problem{Span: j.block.Span, Code: SheetFull, Text: text, Reason: strings.Join(would, "; "), Fatal: true})
}

// tooLarge names the first view whose outline alone is larger than the space.
func (j *job) tooLarge(set []*picture, scale float64, space drawing.Box) string {
	for _, p := range set {
		w, h := p.size.X*j.scaleOf(p, scale), p.size.Y*j.scaleOf(p, scale)
		if over := max(w-space.Width(), h-space.Height()); over > 0 {
			return fmt.Sprintf(": the outline of %s alone is %.0f by %.0f mm, %.0f mm more than the drawing space of %.0f by %.0f mm",
				p.name, w, h, over, space.Width(), space.Height())
		}
	}
	return ""
}

// excess tells by how much: of the views that stand in projection and are too
// large together, or of the area of all.
func (j *job) excess(p furniture.Paper, scale float64, set []*picture) string {
	if !j.mayFit(set, scale, p.Space()) {
		return j.tooLarge(set, scale, p.Space())
	}
	a := &attempt{scale: scale, drafts: j.drafts(set, scale), extras: j.extras(scale, noteWidths()[0])}
	s, area := p.Space(), furniture.BlockWidth*furniture.BlockHeight
	l := j.layoutOf(a, s, nil)
	for _, c := range l.clusters() {
		area += c.area
		if c.kind != viewItem {
			continue
		}
		var names []string
		for _, m := range c.members {
			names = append(names, a.drafts[m].p.name)
		}
		if over := max(c.box.Width()-s.Width(), c.box.Height()-s.Height()) + 2*leastEdge; over > 0 {
			return fmt.Sprintf(": %s with all that belongs there needs %.0f by %.0f mm, %.0f mm more than the drawing space of %.0f by %.0f mm",
				listed(names), c.box.Width(), c.box.Height(), over, s.Width(), s.Height())
		}
	}
	return fmt.Sprintf(": their areas alone come to %.0f %% of the drawing space", 100*area/(s.Width()*s.Height()))
}
