package compose

import (
	"math"
	"slices"

	"epure/eval/scene"
	"epure/geom/curve"
	"epure/geom/vec"
	"epure/render/drawing"
)

// Centre lines. A solid of revolution, and one on an even outline, has its axis where it is seen from the
// side and a cross where it is seen end-on. Parts of one solid share them, and
// so do the uncut solid drawn thin and the part drawn wide.

// centreOvershoot is how far centre lines run past the outline, paper mm: within the 2 to 5
// of the reference notes (common practice).
const centreOvershoot = 3

// turnedSolid gathers the parts of one primitive that a view draws.
type turnedSolid struct {
	root  *scene.Primitive
	parts []*scene.Solid
	names []string // in the view, of the parts
}

// turnedSolids lists the primitives of the view, in the order drawn.
func (p *picture) turnedSolids() []turnedSolid {
	all := p.solids
	for _, f := range p.view.Faint {
		if s, ok := f.Value.(*scene.Solid); ok {
			all = append(all[:len(all):len(all)], solid{f.Name, s})
		}
	}
	var out []turnedSolid
next:
	for _, s := range all {
		if s.value.Root == nil {
			continue
		}
		for i := range out {
			if out[i].root == s.value.Root {
				out[i].parts, out[i].names = append(out[i].parts, s.value), append(out[i].names, s.name)
				continue next
			}
		}
		out = append(out, turnedSolid{s.value.Root, []*scene.Solid{s.value}, []string{s.name}})
	}
	return out
}

// drawCentres draws the axes and crosses of the view.
func (p *picture) drawCentres() {
	var crosses []cross
	for _, t := range p.turnedSolids() {
		if t.root.Form == "sphere" {
			crosses = addCross(crosses, cross{t.root.Name, p.flatten(t.root.Base.O), p.partsBox(t)})
			continue
		}
		axis, ok := t.root.Centreline()
		if !ok {
			continue
		}
		if math.Hypot(axis.Dot(p.frame.X), axis.Dot(p.frame.Y)) <= foldSine {
			crosses = addCross(crosses, cross{t.root.Name, p.flatten(t.root.Base.O), p.partsBox(t)})
			continue
		}
		p.drawAxis(t, axis)
	}
	for _, c := range crosses {
		p.drawCross(c)
	}
}

// drawAxis draws the axis as far as the outline of the parts reaches along it. Axes
// that lie on one line are drawn as one.
func (p *picture) drawAxis(t turnedSolid, axis vec.V3) {
	o := p.flatten(t.root.Base.O)
	d := p.flatten(t.root.Base.O.Add(axis)).Sub(o).Unit()
	lo, hi := p.outlineAlong(t, o, d)
	if !(lo < hi) {
		lo, hi = p.boundsAlong(t, o, axis)
	}
	a, b := o.Along(d, lo), o.Along(d, hi)
	for i := range p.strokes {
		if s := &p.strokes[i]; s.role == drawing.CentreLine && s.along(a, b) {
			s.stretch(a, b)
			return
		}
	}
	p.straight(p.key(t.root.Name, "axis"), drawing.CentreLine, a, b).over = centreOvershoot
}

// outlineAlong is the first and the last place, mm along d from o, where the line
// through o along d meets the outline of the parts in the view.
func (p *picture) outlineAlong(t turnedSolid, o, d vec.V2) (lo, hi float64) {
	lo, hi = math.Inf(1), math.Inf(-1)
	for _, s := range p.strokes {
		if !outlineRole(s.role) || !slices.Contains(t.names, s.key.Thing) {
			continue
		}
		for _, piece := range s.pieces {
			c, ok := piece.path.(curve.Curve2)
			if !ok {
				continue
			}
			a := curve.Arc2{Curve2: c, T0: piece.t0, T1: piece.t1}
			ts := append([]float64{a.T0, a.T1}, a.Cross(o, d.Left(), sameLine*t.parts[0].Body.Size())...)
			for _, at := range ts {
				q := a.At(at).Sub(o)
				if math.Abs(q.Cross(d)) <= sameLine*t.parts[0].Body.Size() {
					lo, hi = min(lo, q.Dot(d)), max(hi, q.Dot(d))
				}
			}
		}
	}
	return lo, hi
}

// boundsAlong is the extent of the parts along their axis, as seen.
func (p *picture) boundsAlong(t turnedSolid, o vec.V2, axis vec.V3) (lo, hi float64) {
	lo, hi = math.Inf(1), math.Inf(-1)
	for _, s := range t.parts {
		a, b := s.Body.Bounds(t.root.Base)
		lo, hi = min(lo, a.Z), max(hi, b.Z)
	}
	seen := p.flatten(t.root.Base.O.Along(axis, 1/axis.Dot(t.root.Base.Z))).Sub(o).Len()
	return lo * seen, hi * seen
}

// sameLine is how far, as a share of its length, a centre line may lie beside
// another and be the same: the rounding of a projection times some thousands.
const sameLine = 1e-9

// along reports whether the stroke is a straight line on which a and b lie too.
func (s *stroke) along(a, b vec.V2) bool {
	if len(s.pieces) != 1 {
		return false
	}
	o, e := s.pieces[0].path.At(s.pieces[0].t0), s.pieces[0].path.At(s.pieces[0].t1)
	d := e.Sub(o)
	limit := sameLine * d.Len() * max(d.Len(), a.Dist(o), b.Dist(o))
	return math.Abs(d.Cross(a.Sub(o))) <= limit && math.Abs(d.Cross(b.Sub(o))) <= limit
}

// stretch lengthens a straight stroke so that it holds a and b.
func (s *stroke) stretch(a, b vec.V2) {
	o, e := s.pieces[0].path.At(s.pieces[0].t0), s.pieces[0].path.At(s.pieces[0].t1)
	d := e.Sub(o).Unit()
	lo, hi := o, e
	for _, q := range []vec.V2{a, b} {
		if q.Sub(lo).Dot(d) < 0 {
			lo = q
		}
		if q.Sub(hi).Dot(d) > 0 {
			hi = q
		}
	}
	s.pieces[0] = segment(lo, hi)
}

// cross is the centre cross of a round end.
type cross struct {
	name string
	at   vec.V2
	box  drawing.Box
}

// addCross unites crosses about one centre.
func addCross(list []cross, c cross) []cross {
	c.box = c.box.With(c.at)
	for i, o := range list {
		size := max(o.box.Width(), o.box.Height(), c.box.Width(), c.box.Height())
		if o.at.Dist(c.at) <= sameLine*size {
			list[i].box = o.box.Union(c.box)
			return list
		}
	}
	return append(list, c)
}

func (p *picture) drawCross(c cross) {
	if c.box.Width() > 0 {
		p.straight(p.key(c.name, "centre/level"), drawing.CentreLine, vec.V2{X: c.box.Min.X, Y: c.at.Y}, vec.V2{X: c.box.Max.X, Y: c.at.Y}).over = centreOvershoot
	}
	if c.box.Height() > 0 {
		p.straight(p.key(c.name, "centre/upright"), drawing.CentreLine, vec.V2{X: c.at.X, Y: c.box.Min.Y}, vec.V2{X: c.at.X, Y: c.box.Max.Y}).over = centreOvershoot
	}
}

// partsBox is the box of the parts in the view.
func (p *picture) partsBox(t turnedSolid) drawing.Box {
	b := drawing.EmptyBox()
	for _, s := range t.parts {
		lo, hi := s.Body.Bounds(p.frame)
		b = b.With(vec.V2{X: lo.X, Y: lo.Y}).With(vec.V2{X: hi.X, Y: hi.Y})
	}
	return b
}
