package compose

import (
	"math"
	"strconv"

	"epure/eval/scene"
	"epure/geom/curve"
	"epure/geom/cut"
	"epure/geom/vec"
	"epure/render/drawing"
)

// The true shape of a section: its outline seen square to the plane, with what
// makes the conic what it is.

// nearShare is how far, as a share of the section's size, a directrix or focus
// may lie outside it and still be drawn. Farther ones would make the section small; they are
// told in words.
const nearShare = 0.4

// drawTruth draws a true shape.
func (p *picture) drawTruth(name string, s *scene.Section) {
	box := drawing.EmptyBox()
	n := 0
	for _, loop := range s.Loops {
		outline := stroke{key: p.key(name, "hatching"), role: drawing.Hatching, closed: true}
		for _, piece := range loop {
			n++
			a := piece.Arc.Project(p.frame)
			stem := "outline"
			if piece.Chord {
				stem = "chord"
			}
			p.draw(p.key(name, ordinal(stem, n)), drawing.VisibleEdge, a)
			outline.pieces = append(outline.pieces, track{a.Curve2, a.T0, a.T1})
			p.links = append(p.links, piece.Arc.Start())
		}
		box = box.Union(shapeExtent(outline.shape(1)).box())
		if p.shows("hatching") {
			p.hatched = append(p.hatched, hatched{outline.key, []stroke{outline}, 1})
		}
	}
	if s.Conic != nil && !box.Empty() {
		p.drawConic(name, s, box)
	}
	if box.Empty() {
		p.drawDegenerate(name, s)
	}
}

// drawDegenerate draws a section without area: a point or lines.
func (p *picture) drawDegenerate(name string, s *scene.Section) {
	if s.Apex != nil {
		p.spots = append(p.spots, spot{key: p.key(name, "point"), at: p.flatten(*s.Apex), cross: true})
	}
	for i, l := range s.Lines {
		for _, piece := range s.Of.Body.Intervals(l.C, l.U) {
			p.draw(p.key(name, ordinal("line", i+1)), drawing.VisibleEdge, curve.Arc{Curve: l, T0: piece.A, T1: piece.B}.Project(p.frame))
		}
	}
}

// drawConic draws axes, foci, vertices and directrices.
func (p *picture) drawConic(name string, s *scene.Section, box drawing.Box) {
	c := s.Conic
	o, x := p.flatten(c.F.O), p.flatten(c.F.O.Add(c.F.X)).Sub(p.flatten(c.F.O)).Unit()
	if p.shows("axis") || p.shows("centres") {
		p.drawConicAxis(name, "axis", s, o, x)
		if c.Kind == cut.Ellipse || c.Kind == cut.Circle {
			p.drawConicAxis(name, "axis/minor", s, o, x.Left())
		}
	}
	for _, v := range c.Vertices() {
		if within(box, p.flatten(v), sameLine) {
			p.links = append(p.links, v)
		}
	}
	if p.shows("focus") {
		p.markConicPoints(name, "focus", "F", c.Foci(), box, func(vec.V2) vec.V2 { return x.Left() })
	}
	if p.shows("focus") || p.shows("directrix") {
		p.markConicPoints(name, "vertex", "V", c.Vertices(), box, func(q vec.V2) vec.V2 { return q.Sub(box.Centre()).Unit() })
	}
	if p.shows("directrix") {
		p.drawDirectrices(name, c, box, o, x)
	}
}

func (p *picture) drawConicAxis(name, feature string, s *scene.Section, o, d vec.V2) {
	lo, hi := math.Inf(1), math.Inf(-1)
	for _, loop := range s.Loops {
		for _, piece := range loop {
			l, h := reachAlong(piece.Arc.Project(p.frame), o, d)
			lo, hi = min(lo, l), max(hi, h)
		}
	}
	p.straight(p.key(name, feature), drawing.CentreLine, o.Along(d, lo), o.Along(d, hi)).over = centreOvershoot
}

// markConicPoints marks those points of a conic that lie on or near what is drawn;
// away is the side for their names.
func (p *picture) markConicPoints(name, feature, letter string, pts []vec.V3, box drawing.Box, away func(vec.V2) vec.V2) {
	for i, q := range pts {
		at := p.flatten(q)
		if !within(box, at, nearShare) {
			continue
		}
		p.spots = append(p.spots, spot{key: p.key(name, ordinal(feature, i+1)), at: at, away: away(at), text: numbered(letter, i, len(pts))})
		p.links = append(p.links, q)
	}
}

// drawDirectrices draws each directrix that is near, and tells of the others.
func (p *picture) drawDirectrices(name string, c *cut.Conic, box drawing.Box, o, x vec.V2) {
	all, vertices := c.Directrices(), c.Vertices()
	for i, d := range all {
		foot := o.Along(x, p.flatten(d.C).Sub(o).Dot(x))
		letter := numbered("d", i, len(all))
		if !within(box, foot, nearShare) {
			if i < len(vertices) && within(box, p.flatten(vertices[i]), sameLine) {
				far := p.flatten(vertices[i]).Dist(foot)
				p.caption = append(p.caption, "Directrix "+letter+" lies "+length(far)+" from "+numbered("V", i, len(vertices))+".")
			}
			continue
		}
		e := boxExtentAlong(box, foot, x.Left())
		a, b := foot.Along(x.Left(), e[0]), foot.Along(x.Left(), e[1])
		p.straight(p.key(name, ordinal("directrix", i+1)), drawing.Construction, a, b)
		p.tags = append(p.tags, tag{key: p.key(name, ordinal("directrix/name", i+1)), at: b, away: x.Left(), text: letter})
	}
}

// length writes a length to a tenth of a millimetre.
func length(mm float64) string { return strconv.FormatFloat(mm, 'f', 1, 64) + " mm" }
