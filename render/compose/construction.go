package compose

import (
	"math"

	"epure/eval/scene"
	"epure/geom/curve"
	"epure/geom/cut"
	"epure/geom/vec"
	"epure/render/drawing"
)

// Construction on views: focal spheres with the circles in which they touch the
// solid, and foci.

// sectionsOf lists the sections that concern the view: those it is of, then
// those of the file that were made of its solids, each once.
func (p *picture) sectionsOf(s *scene.Scene) []*scene.Section {
	var out []*scene.Section
	add := func(v scene.Value) {
		sec, ok := v.(*scene.Section)
		if !ok || sec.Section == nil {
			return
		}
		for _, o := range out {
			if o == sec {
				return
			}
		}
		out = append(out, sec)
	}
	for _, of := range p.view.Of {
		add(of.Value)
	}
	if s == nil {
		return out
	}
	for _, t := range s.Things {
		if sec, ok := t.Value.(*scene.Section); ok && sec.Of != nil && p.drawsWhole(sec.Of.Whole) {
			add(sec)
		}
	}
	return out
}

// drawsWhole reports whether the view draws the solid or a part of it.
func (p *picture) drawsWhole(whole *scene.Solid) bool {
	for _, s := range p.solids {
		if s.value.Whole == whole {
			return true
		}
	}
	return false
}

// drawConstruction draws the spheres and foci that were asked for.
func (p *picture) drawConstruction(s *scene.Scene) {
	if !p.shows("focal_spheres") && !p.shows("focus") {
		return
	}
	for _, sec := range p.sectionsOf(s) {
		if p.shows("focal_spheres") {
			for i, f := range sec.FocalSpheres() {
				if !touches(sec.Of, f) {
					continue
				}
				p.drawSphere(ordinal(sec.Name+".sphere", i+1), f)
			}
		}
		if p.shows("focus") && sec.Conic != nil {
			p.markFoci(sec)
		}
	}
}

// touches reports whether the circle of contact of a focal sphere lies on the
// solid: the second sphere of a hyperbola lies in the nappe that is not there.
func touches(s *scene.Solid, f cut.FocalSphere) bool {
	lo, hi := s.Whole.Body.Bounds(s.Root.Base)
	z := s.Root.Base.Local(f.Ring.O).Z
	return lo.Z <= z && z <= hi.Z
}

// drawSphere draws the outline of a focal sphere, the circle in which it touches
// the solid, its centre, and the point in which it touches the plane.
func (p *picture) drawSphere(name string, f cut.FocalSphere) {
	turn := func(c curve.Curve) curve.Arc { return curve.Arc{Curve: c, T1: 2 * math.Pi} }
	outline := curve.Circle(p.frame.At(f.Centre), f.Radius)
	p.draw(p.key(name, "outline"), drawing.Construction, turn(outline).Project(p.frame))
	p.draw(p.key(name, "contact"), drawing.Construction, turn(curve.Circle(f.Ring, f.RingR)).Project(p.frame))
	p.spots = append(p.spots,
		spot{key: p.key(name, "centre"), at: p.flatten(f.Centre), cross: true},
		spot{key: p.key(name, "touch"), at: p.flatten(f.Touch)})
	p.links = append(p.links, f.Centre, f.Touch)
}

// markFoci marks the foci of a section with dots and their names.
func (p *picture) markFoci(sec *scene.Section) {
	foci := sec.Conic.Foci()
	box := p.drawnBox(outlineRole)
	for i, f := range foci {
		if !within(box, p.flatten(f), sameLine) {
			continue
		}
		p.spots = append(p.spots, spot{key: p.key(sec.Name, ordinal("focus", i+1)), at: p.flatten(f), text: numbered("F", i, len(foci))})
		p.links = append(p.links, f)
	}
}

// numbered is a letter with a number when there are several.
func numbered(letter string, i, n int) string {
	if n < 2 {
		return letter
	}
	return letter + itoa(i+1)
}

// within reports whether q lies no farther from the box than share times its size.
func within(b drawing.Box, q vec.V2, share float64) bool {
	return b.Grow(share * max(b.Width(), b.Height())).Holds(drawing.Box{Min: q, Max: q})
}
