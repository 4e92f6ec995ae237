package compose

import (
	"epure/geom/vec"
	"epure/render/drawing"
)

// Projectors: thin lines from the points of a view to the same points of the
// view that was folded from it.

// projectors are the lines between the i-th draft and its parent, when they are
// wanted and the view stands in projection at one scale with its parent.
func (j *job) projectors(a *attempt, i int) []drawing.Mark {
	p := a.drafts[i].p
	if p.rel != folded || a.layout.items[i].parent < 0 || !(p.shows("projectors") || p.parent.shows("projectors")) {
		return nil
	}
	up := a.layout.items[i].parent
	d, e := a.drafts[i], a.drafts[up]
	if d.scale != e.scale {
		return nil
	}
	var out []drawing.Mark
	across := p.toward.Left()
	var done []float64
	links := p.links
	if p.view.Form != "true_shape" { // a section has no other points than its own
		links = append(links[:len(links):len(links)], p.parent.links...)
	}
	for _, q := range links {
		if !e.shows(q) || !d.shows(q) {
			continue // a point of what only one of the views draws
		}
		from := a.layout.items[up].at.Add(e.at(e.p.flatten(q)))
		to := a.layout.items[i].at.Add(d.at(p.flatten(q)))
		if drawn(done, from.Dot(across)) || from.Dist(to) == 0 {
			continue
		}
		done = append(done, from.Dot(across))
		out = append(out, drawing.Mark{Key: p.key("projectors", ordinal("projector", len(done))), Role: drawing.Projector,
			Pen: j.ink.pens.Pen(drawing.Projector), Shape: drawing.Line{A: from, B: to}})
	}
	return out
}

// shows tells whether a point of space lies within what the view draws.
func (d *draft) shows(q vec.V3) bool {
	at, b := d.at(d.p.flatten(q)), d.core.Grow(projectorsApart)
	return b.Min.X <= at.X && at.X <= b.Max.X && b.Min.Y <= at.Y && at.Y <= b.Max.Y
}

// projectorsApart is the distance in mm on paper under which two projectors are
// one line: a tenth of the narrow pen.
const projectorsApart = 0.025

func drawn(done []float64, at float64) bool {
	for _, d := range done {
		if d-at < projectorsApart && at-d < projectorsApart {
			return true
		}
	}
	return false
}

// onPaper is where a point of space lies on the sheet in the i-th view.
func (a *attempt) onPaper(i int, q vec.V3) vec.V2 {
	return a.layout.items[i].at.Add(a.drafts[i].at(a.drafts[i].p.flatten(q)))
}
