package compose

import (
	"math"
	"sort"
	"strings"

	"epure/eval/scene"
	"epure/geom/body"
	"epure/geom/curve"
	"epure/geom/surface"
	"epure/geom/vec"
	"epure/geom/view"
	"epure/render/drawing"
)

// Generators on views: the even divisions of the curved faces, with the numbers
// that they bear on the pattern of the same solid, so that a point can be
// followed from the plan through the elevation on to the flat.

// defaultDivisions is the number of generators of a solid that has no pattern
// on the sheet: the workshop's twelve.
const defaultDivisions = 12

// division says which generators of a solid are drawn.
type division struct {
	face  int
	seam  float64
	count int
}

// divisionOf takes seam and divisions from the pattern of the solid, or of one
// out of the same whole, on this sheet.
func divisionOf(b *scene.Block, s *scene.Solid) division {
	d := division{face: curvedFace(s.Body), count: defaultDivisions}
	for _, exact := range []bool{true, false} {
		for _, v := range b.Views {
			for _, of := range v.Of {
				dev, ok := of.Value.(*scene.Development)
				if !ok || dev.Of == nil || exact && dev.Of != s || !exact && dev.Of.Whole != s.Whole {
					continue
				}
				d.seam, d.count = dev.Seam, dev.Divisions
				if dev.Pattern != nil && len(dev.Stations) > 0 {
					d.seam = dev.Stations[0].Theta
				}
				return d
			}
		}
	}
	return d
}

// curvedFace is the index of the first ruled face, -1 when there is none.
func curvedFace(b *body.Body) int {
	for i, f := range b.Faces {
		if _, ok := f.Surface.(surface.Ruled); ok {
			return i
		}
	}
	return -1
}

// generator is one piece of a generator in space.
type generator struct {
	number int
	arc    curve.Arc
}

// generatorsOf lists the pieces of the even generators of a solid.
func generatorsOf(s *scene.Solid, d division) []generator {
	if d.face < 0 || d.count <= 0 {
		return nil
	}
	ruled := s.Body.Faces[d.face].Surface.(surface.Ruled)
	var out []generator
	for i := range d.count {
		theta := d.seam + 2*math.Pi*float64(i)/float64(d.count)
		c := ruled.Ruling(theta).Curve()
		for _, piece := range s.Body.Rulings(d.face, theta) {
			out = append(out, generator{i + 1, curve.Arc{Curve: c, T0: piece.A, T1: piece.B}})
		}
	}
	return out
}

// drawGenerators draws the generators of every solid of the view, and their
// numbers when these are wanted. Of two that fall together on paper one is drawn,
// the visible one first.
func (p *picture) drawGenerators(b *scene.Block) {
	bodies := p.bodies()
	for _, s := range p.solids {
		gens := generatorsOf(s.value, divisionOf(b, s.value))
		var arcs []curve.Arc
		for _, g := range gens {
			arcs = append(arcs, g.arc)
			p.links = append(p.links, g.arc.Start(), g.arc.End())
		}
		count := map[int]int{}
		for _, l := range view.Without(view.SplitBy(arcs, bodies, p.frame), p.pieces) {
			n := gens[l.A].number
			name := ordinal("generator", n)
			if count[n]++; count[n] > 1 {
				name = ordinal(name, count[n])
			}
			stroke := p.draw(p.key(s.name, name), drawing.Generator, l.Image)
			if !l.Visible {
				stroke.pen = drawing.Group.Hidden
			}
		}
		if p.shows("numbers") {
			p.numberGenerators(s, gens)
		}
	}
	p.clearCentres()
}

// clearCentres takes centre lines away where a generator lies on them: a
// continuous line and a dashed one on the same place look like neither.
func (p *picture) clearCentres() {
	var kept []stroke
	for _, c := range p.strokes {
		if c.role != drawing.CentreLine {
			kept = append(kept, c)
			continue
		}
		kept = append(kept, p.uncovered(c)...)
	}
	p.strokes = kept
}

// uncovered are the parts of a straight line that no generator lies on; its ends
// keep their overshoot.
func (p *picture) uncovered(c stroke) []stroke {
	a, e := c.pieces[0].path.At(c.pieces[0].t0), c.pieces[0].path.At(c.pieces[0].t1)
	d, whole := e.Sub(a).Unit(), a.Dist(e)
	free := [][2]float64{{0, whole}}
	for _, g := range p.strokes {
		if g.role != drawing.Generator || len(g.pieces) != 1 {
			continue
		}
		q, r := g.pieces[0].path.At(g.pieces[0].t0), g.pieces[0].path.At(g.pieces[0].t1)
		if c.along(q, r) {
			t, u := q.Sub(a).Dot(d), r.Sub(a).Dot(d)
			free = without(free, min(t, u), max(t, u), sameLine*whole)
		}
	}
	if len(free) == 1 && free[0] == [2]float64{0, whole} {
		return []stroke{c}
	}
	var out []stroke
	for _, f := range free {
		part := c
		part.over, part.pieces = 0, []track{segment(a.Along(d, f[0]), a.Along(d, f[1]))}
		out = append(out, part)
	}
	for _, ends := range [2][2]vec.V2{{e, a}, {a, e}} {
		stub := c
		stub.pieces, stub.tip = []track{segment(ends[0], ends[1])}, vec.V2{Y: c.over}
		out = append(out, stub)
	}
	return out
}

// without takes lo..hi out of intervals, dropping what is shorter than least.
func without(free [][2]float64, lo, hi, least float64) [][2]float64 {
	var out [][2]float64
	for _, f := range free {
		for _, g := range [2][2]float64{{f[0], min(f[1], lo)}, {max(f[0], hi), f[1]}} {
			if g[1]-g[0] > least {
				out = append(out, g)
			}
		}
	}
	return out
}

// numberGenerators writes the numbers at the wide ends, where the generators
// would run on. Ends that fall together on paper share one text: "3, 11".
func (p *picture) numberGenerators(s solid, gens []generator) {
	type end struct {
		at, away vec.V2
		nums     []int
	}
	var ends []end
	size := s.value.Body.Size()
next:
	for _, g := range gens {
		near, far := g.ends(s.value)
		at := p.flatten(far)
		for i := range ends {
			if ends[i].at.Dist(at) <= sameLine*size {
				ends[i].nums = append(ends[i].nums, g.number)
				continue next
			}
		}
		away := at.Sub(p.flatten(near))
		if away.Len() <= sameLine*size { // seen end-on: away from the axis
			away = at.Sub(p.flatten(s.value.Root.Base.O))
		}
		ends = append(ends, end{at, away.Unit(), []int{g.number}})
	}
	for _, e := range ends {
		sort.Ints(e.nums)
		var words []string
		for _, n := range e.nums {
			words = append(words, itoa(n))
		}
		p.tags = append(p.tags, tag{key: p.key(s.name, ordinal("number", e.nums[0])), at: e.at, away: e.away, text: strings.Join(words, ", "), small: true})
	}
}

// ends are the ends of a generator, the one with room for a number last: the one farther
// from the apex of a cone, the one nearer the base of a cylinder.
func (g generator) ends(s *scene.Solid) (near, far vec.V3) {
	near, far = g.arc.Start(), g.arc.End()
	if !s.Root.Cylinder {
		return near, far // a cone's generators run from its apex
	}
	if math.Abs(s.Root.Base.Local(near).Z) < math.Abs(s.Root.Base.Local(far).Z) {
		return far, near
	}
	return near, far
}
