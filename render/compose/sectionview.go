package compose

import (
	"epure/eval/scene"
	"epure/geom/vec"
	"epure/render/drawing"
)

// Section views: the cut faces are hatched, and on the view that the section is
// folded from its plane is drawn with the same name at both ends and arrows in the direction of
// sight, their points on the plane (the reference notes of ISO 128-3).

// drawCutFaces hatches the cut faces of a section view, neighbours the opposite way.
func (p *picture) drawCutFaces() {
	if !p.shows("hatching") {
		return
	}
	turn := 1.0
	for _, s := range p.view.Cut {
		h := hatched{key: p.key(s.Name, "hatching"), turn: turn}
		for _, loop := range s.Value.(*scene.Section).Loops {
			outline := stroke{key: h.key, role: drawing.Hatching, closed: true}
			for _, piece := range loop {
				a := piece.Arc.Project(p.frame)
				outline.pieces = append(outline.pieces, track{a.Curve2, a.T0, a.T1})
			}
			h.outlines = append(h.outlines, outline)
		}
		p.hatched = append(p.hatched, h)
		turn = -turn
	}
}

// drawSightedPlane draws the plane of a section view on the view that it is folded from.
func (p *picture) drawSightedPlane(s sighting) {
	pl := s.view.view.By
	n := vec.V2{X: pl.F.Z.Dot(p.frame.X), Y: pl.F.Z.Dot(p.frame.Y)}
	d := ahead(snapped(n).Left())
	a, b := p.planeEnds(pl, p.flatten(pl.F.O), d, nil)
	p.drawMiddle(pl.Name, a, b)
	for i, ends := range [][2]vec.V2{{b, a}, {a, b}} {
		end := p.straight(p.key(pl.Name, ordinal("plane/end", i+1)), drawing.CuttingPlane, ends[0], ends[1])
		end.tip = vec.V2{X: cutInside, Y: cutOutside}
		away := ends[0].Sub(ends[1]).Unit()
		p.points = append(p.points, pointer{p.key(pl.Name, ordinal("sight", i+1)), ends[0], away, s.from, cutOutside})
		p.tags = append(p.tags, tag{key: p.key(pl.Name, ordinal("name", i+1)), at: ends[0], away: away, text: pl.Name, past: cutOutside})
	}
}

// drawPointers draws the arrows at the ends of cutting planes.
func (d *draft) drawPointers() {
	h := d.ink.text
	for _, q := range d.p.points {
		tip := d.at(q.at).Along(q.away, q.past)
		arrow := drawing.ArrowMark(q.key, tip, q.from.Scale(-1), sightHead*h)
		arrow.Key.Feature += "/arrow"
		d.add(arrow)
		line := drawing.Line{A: tip.Along(q.from, sightHead*h), B: tip.Along(q.from, sightShaft*h)}
		d.stroke(drawing.Key{View: q.key.View, Thing: q.key.Thing, Feature: q.key.Feature + "/line"}, drawing.Dimension, line)
	}
}
