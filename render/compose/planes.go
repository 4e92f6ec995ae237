package compose

import (
	"math"

	"epure/eval/scene"
	"epure/geom/curve"
	"epure/geom/cut"
	"epure/geom/vec"
	"epure/geom/view"
	"epure/render/drawing"
)

// Planes in views. One that is seen edge-on is a cutting-plane line: long dashes
// and dots, wide at the ends, with its name. Any other shows its trace on the
// plane through the origin square to the sight: on the ground in a plan, on the
// frontal plane in an elevation.

// The wide end of a cutting plane reaches cutOutside past the outline and
// cutInside into it, paper mm (the reference notes give about 3 for the latter).
const (
	cutOutside = 7
	cutInside  = 3
)

// drawCuttingPlanes draws the planes that cut the solids of the view, where
// they are seen edge-on.
func (p *picture) drawCuttingPlanes() {
	done := map[*scene.Plane]bool{}
	for _, s := range p.view.Of {
		if pl, ok := s.Value.(*scene.Plane); ok {
			done[pl] = true
		}
	}
	for _, s := range p.solids {
		for _, pl := range s.value.Cuts {
			if !done[pl] && p.edgeOn(pl) {
				done[pl] = true
				p.drawPlane(pl.Name, pl, s.value.Whole)
			}
		}
	}
}

// edgeOn reports whether the plane is seen as a line.
func (p *picture) edgeOn(pl *scene.Plane) bool {
	return math.Abs(pl.F.Z.Dot(p.frame.Z)) <= foldSine
}

// drawPlane draws a plane; whole is the solid that it cuts, if one is known.
func (p *picture) drawPlane(name string, pl *scene.Plane, whole *scene.Solid) {
	n := vec.V2{X: pl.F.Z.Dot(p.frame.X), Y: pl.F.Z.Dot(p.frame.Y)}
	if n.Len() <= foldSine {
		return // it faces the viewer: there is nothing to see of it
	}
	d := ahead(snapped(n).Left())
	if !p.edgeOn(pl) {
		p.drawTrace(name, pl, n, d)
		return
	}
	o := p.flatten(pl.F.O)
	a, b := p.planeEnds(pl, o, d, whole)
	p.drawMiddle(name, a, b)
	for i, ends := range [][2]vec.V2{{b, a}, {a, b}} {
		s := p.straight(p.key(name, ordinal("plane/end", i+1)), drawing.CuttingPlane, ends[0], ends[1])
		s.tip = vec.V2{X: cutInside, Y: cutOutside}
	}
	p.tags = append(p.tags, tag{key: p.key(name, "name"), at: b, away: d, text: name, past: cutOutside})
}

// ahead turns a direction so that it runs up, or rightward when level: names
// then stand at the upper or right end.
func ahead(d vec.V2) vec.V2 {
	if d.Y < 0 || d.Y == 0 && d.X < 0 {
		return vec.V2{X: 0 - d.X, Y: 0 - d.Y}
	}
	return d
}

// planeEnds are the ends of the line as which the plane is seen: round the
// section of the solids that it meets, else round the whole view.
func (p *picture) planeEnds(pl *scene.Plane, o, d vec.V2, whole *scene.Solid) (vec.V2, vec.V2) {
	solids := []*scene.Solid{whole}
	if whole == nil {
		solids = nil
		for _, s := range p.solids {
			solids = append(solids, s.value.Whole)
		}
	}
	lo, hi := math.Inf(1), math.Inf(-1)
	for _, s := range solids {
		if s == nil {
			continue
		}
		sec, err := cut.Of(s.Body, pl.Surface(), pl.Along)
		if err != nil {
			continue
		}
		for _, loop := range sec.Loops {
			for _, piece := range loop {
				l, h := reachAlong(piece.Arc.Project(p.frame), o, d)
				lo, hi = min(lo, l), max(hi, h)
			}
		}
	}
	if lo > hi {
		lo, hi = across(p.drawnBox(outlineRole), o, d)
	}
	return o.Along(d, lo), o.Along(d, hi)
}

// reachAlong is the least and greatest distance along d from o that an arc reaches.
func reachAlong(a curve.Arc2, o, d vec.V2) (lo, hi float64) {
	lo, hi = math.Inf(1), math.Inf(-1)
	ts := append([]float64{a.T0, a.T1}, a.Extreme(d)...)
	for _, t := range ts {
		s := a.At(t).Sub(o).Dot(d)
		lo, hi = min(lo, s), max(hi, s)
	}
	return lo, hi
}

// across is the interval of the line o + t·d (d unit) inside a box; where the
// line passes outside, as much of it as the box is wide along d.
func across(b drawing.Box, o, d vec.V2) (lo, hi float64) {
	if b.Empty() {
		return -defaultReach, defaultReach
	}
	lo, hi = math.Inf(-1), math.Inf(1)
	for _, axis := range [2][3]float64{{d.X, b.Min.X - o.X, b.Max.X - o.X}, {d.Y, b.Min.Y - o.Y, b.Max.Y - o.Y}} {
		if axis[0] == 0 {
			if axis[1] > 0 || axis[2] < 0 {
				lo, hi = 1, 0
			}
			continue
		}
		t, u := axis[1]/axis[0], axis[2]/axis[0]
		lo, hi = max(lo, min(t, u)), min(hi, max(t, u))
	}
	if lo < hi {
		return lo, hi
	}
	e := boxExtentAlong(b, o, d)
	return e[0], e[1]
}

func boxExtentAlong(b drawing.Box, o, d vec.V2) [2]float64 {
	lo, hi := math.Inf(1), math.Inf(-1)
	for _, c := range (quadrangle{b.Min, vec.V2{X: b.Width()}, vec.V2{Y: b.Height()}}).corners() {
		t := c.Sub(o).Dot(d)
		lo, hi = min(lo, t), max(hi, t)
	}
	return [2]float64{lo, hi}
}

// drawMiddle draws the narrow part of a cutting plane where no line of the view covers it.
func (p *picture) drawMiddle(name string, a, b vec.V2) {
	if a == b {
		return
	}
	line := view.Piece{Image: curve.Segment2(a, b), Space: curve.Segment(p.frame.Lift(a), p.frame.Lift(b)), Body: view.Wire, Visible: true}
	lines := append(p.pieces[:len(p.pieces):len(p.pieces)], p.wires...)
	for i, l := range view.Without([]view.Piece{line}, lines) {
		p.draw(p.key(name, ordinal("plane", i+1)), drawing.CuttingPlane, l.Image).pen = drawing.Group.Centre
	}
}

// drawTrace draws where the plane meets the plane through the origin square to the sight.
func (p *picture) drawTrace(name string, pl *scene.Plane, n, d vec.V2) {
	level := pl.F.Z.Dot(pl.F.O.Sub(p.frame.O))
	o := n.Scale(level / n.Dot(n))
	lo, hi := across(p.drawnBox(outlineRole), o, d)
	s := p.straight(p.key(name, "trace"), drawing.CuttingPlane, o.Along(d, lo), o.Along(d, hi))
	s.pen, s.over = drawing.Group.Thin, cutOutside
	p.tags = append(p.tags, tag{key: p.key(name, "name"), at: o.Along(d, hi), away: d, text: name, past: cutOutside})
}
