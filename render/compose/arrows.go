package compose

import (
	"epure/geom/vec"
	"epure/render/drawing"
)

// Reference arrows: an auxiliary view is named, and an arrow on the view that it
// comes from shows with the same name from where it looks (ISO 128-3, reference
// arrow layout; arrow half as large again as that of a dimension).

// sighting is the direction of sight of another view, as seen on this one.
type sighting struct {
	view *picture
	from vec.V2 // unit, on paper, toward the viewer
}

// Sizes of a reference arrow, paper mm, over the height of lettering.
const (
	sightGap   = 1.5 // from what stands there to the tip
	sightHead  = 1.5
	sightShaft = 3.5 // head included
)

// drawSightings draws the arrows of the views that look at this one sideways.
func (d *draft) drawSightings() {
	h := d.ink.text
	for _, s := range d.p.sightings {
		c := d.core.Centre()
		tip := c.Along(s.from, d.stripReach(c, s.from, 2*h)+sightGap*h)
		tail := tip.Along(s.from, sightShaft*h)
		k := d.p.key(s.view.name, "sight")
		arrow := drawing.ArrowMark(k, tip, s.from.Scale(-1), sightHead*h)
		arrow.Key.Feature += "/arrow"
		d.add(arrow)
		d.stroke(d.p.key(s.view.name, "sight/line"), drawing.Dimension, drawing.Line{A: tip.Along(s.from, sightHead*h), B: tail})
		q := place{at: tail, prefer: s.from, height: h, text: s.view.name, steps: []float64{1, 2, 4}, turns: fan(0.4, 4)}
		d.write(d.p.key(s.view.name, "sight/name"), d.settle(q))
	}
}

// stripReach is how far what is drawn reaches from c along u within a strip of
// the given half width.
func (d *draft) stripReach(c, u vec.V2, half float64) float64 {
	far := 0.0
	strip := quadrangle{c.Along(u.Left(), -half), u.Scale(1e4), u.Left().Scale(2 * half)} // 10 m: longer than any sheet
	for _, l := range d.field.lines {
		if strip.meets(l) {
			far = max(far, strip.farthest(l, c, u))
		}
	}
	for _, w := range d.field.words {
		if w.overlaps(strip) {
			_, hi := w.span(u)
			far = max(far, hi-c.Dot(u))
		}
	}
	return far
}

// farthest is how far along u from c a line reaches inside the strip.
func (q quadrangle) farthest(l line, c, u vec.V2) float64 {
	n := u.Left()
	lo, hi := q.at.Dot(n), q.at.Add(q.v).Dot(n)
	a, b := l.a.Dot(n), l.b.Dot(n)
	t := func(x float64) float64 { // the place on the line at the offset x, within its ends
		if a == b {
			return 1
		}
		return max(0, min(1, (x-a)/(b-a)))
	}
	far := func(s float64) float64 { return l.a.Along(l.b.Sub(l.a), s).Sub(c).Dot(u) }
	if a == b {
		return max(far(0), far(1))
	}
	return max(far(t(lo)), far(t(hi)))
}
