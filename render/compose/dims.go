package compose

import (
	"fmt"
	"math"
	"strings"

	"epure/eval/scene"
	"epure/geom/vec"
	"epure/render/drawing"
	"epure/render/furniture"
)

// Dimensions. A length stands outside the view, on the side where its extension
// lines are short and no other view is near; the first line 10 mm from the
// outline, each further one 8 mm outside it, the shorter nearer. What is not
// seen true on its view is no dimension of it but a problem.

// Distances of dimension lines, paper mm (the reference notes, section 6).
const (
	firstDimension = furniture.FirstOffset
	nextDimension  = furniture.NextOffset
)

// trueSine is the sine of the angle out of the picture plane under which a length
// is seen true: 1e-6 shortens it by 5e-13 of itself, less than any figure shows.
const trueSine = 1e-6

// span is a length to be dimensioned, on paper, before its side is chosen.
type span struct {
	key  drawing.Key
	text string
	a, b vec.V2
	// off are the directions, square to the length measured, in which its
	// dimension line may stand; a and b belong to each.
	ways []way
}

// way is one choice of a dimension line: its two ends measured and its side.
type way struct {
	a, b vec.V2
	n    vec.V2 // unit, outward
}

// dimension draws the dimensions of the view.
func (d *draft) dimension() {
	var spans []span
	for _, m := range d.p.dims {
		switch a := m.Anchor.(type) {
		case scene.Linear, scene.Diameter, scene.FlatLinear:
			if s, ok := d.spanOf(m); ok {
				spans = append(spans, s)
			}
		case scene.Radius:
			d.radius(m, a)
		case scene.Angle:
			d.angle(m, a)
		case scene.FlatRadius:
			d.flatRadius(m, a)
		case scene.FlatAngle:
			d.flatAngle(m, a)
		}
	}
	d.chain(spans)
}

// dimKey names a part of a dimension.
func (d *draft) dimKey(m *scene.Dimension) drawing.Key { return d.p.key(m.Name, "dimension") }

// withSign puts a sign before a figure unless it is there.
func withSign(sign, text string) string {
	if strings.HasPrefix(text, sign) || strings.HasPrefix(text, "Ø") {
		return text
	}
	return sign + text
}

// diameterSign is U+2300.
const diameterSign = "\u2300"

// spanOf is the span of a length or a diameter.
func (d *draft) spanOf(m *scene.Dimension) (span, bool) {
	s := span{key: d.dimKey(m), text: m.Text}
	switch a := m.Anchor.(type) {
	case scene.Linear:
		s.addAligned(d.at(d.p.flatten(a.A)), d.at(d.p.flatten(a.B)))
	case scene.FlatLinear:
		s.addAligned(d.at(a.A), d.at(a.B))
	case scene.Diameter:
		s.text = withSign(sphereSign(a.Circle)+diameterSign, m.Text)
		d.addDiameter(&s, d.p.facing(a.Circle))
	}
	return s, len(s.ways) > 0
}

// sphereSign stands before the sign of a diameter or radius of a sphere (ISO 129-1).
func sphereSign(c scene.Circle) string {
	if c.Sphere {
		return "S"
	}
	return ""
}

// facing is the circle as the view sees it: the outline of a sphere faces the viewer.
func (p *picture) facing(c scene.Circle) scene.Circle {
	if c.Sphere {
		c.F = p.frame.At(c.F.O)
	}
	return c
}

// addAligned adds both sides of the length from a to b.
func (s *span) addAligned(a, b vec.V2) {
	if a == b {
		return
	}
	n := snapped(b.Sub(a)).Left()
	s.ways = append(s.ways, way{a, b, n.Scale(-1)}, way{a, b, n})
}

// addDiameter adds the ways of a diameter: along the line as which the circle is
// seen, or level and upright where it is seen round.
func (d *draft) addDiameter(s *span, c scene.Circle) {
	o := d.at(d.p.flatten(c.F.O))
	r := c.R * d.scale
	dirs := []vec.V2{{X: 1}, {Y: 1}}
	if n := (vec.V2{X: c.F.Z.Dot(d.p.frame.X), Y: c.F.Z.Dot(d.p.frame.Y)}); n.Len() > trueSine {
		dirs = []vec.V2{ahead(snapped(n).Left())}
	}
	for _, e := range dirs {
		s.addAligned(o.Along(e, -r), o.Along(e, r))
	}
}

// chain chooses sides and levels and draws the spans.
func (d *draft) chain(spans []span) {
	type laid struct {
		span
		way
	}
	var all []laid
	for _, s := range spans {
		all = append(all, laid{s, d.bestWay(s)})
	}
	for i := range all { // shorter ones nearer; a stable insertion keeps file order among equals
		for j := i; j > 0 && all[j].way.length() < all[j-1].way.length()-slack; j-- {
			all[j], all[j-1] = all[j-1], all[j]
		}
	}
	type row struct {
		n      vec.V2
		levels [][][2]float64
	}
	var rows []row
	for _, s := range all {
		r := -1
		for i := range rows {
			if rows[i].n.Dist(s.n) < slack {
				r = i
			}
		}
		if r < 0 {
			rows, r = append(rows, row{n: s.n}), len(rows)
		}
		lo, hi := s.way.interval()
		level := 0
		for ; level < len(rows[r].levels); level++ {
			if !taken(rows[r].levels[level], lo, hi) && !takenBeyond(rows[r].levels[level:], lo, hi) {
				break
			}
		}
		if level == len(rows[r].levels) {
			rows[r].levels = append(rows[r].levels, nil)
		}
		rows[r].levels[level] = append(rows[r].levels[level], [2]float64{lo, hi})
		at := d.reach(s.n) + firstDimension + float64(level)*nextDimension
		d.linear(s.key, d.start(s.way.a, s.n), d.start(s.way.b, s.n), s.n, at, s.text)
	}
}

// taken reports whether an interval overlaps one of a level by more than a touch.
func taken(level [][2]float64, lo, hi float64) bool {
	const touch = 0.01
	for _, t := range level {
		if lo < t[1]-touch && t[0] < hi-touch {
			return true
		}
	}
	return false
}

func takenBeyond(levels [][][2]float64, lo, hi float64) bool {
	for _, l := range levels[1:] {
		if taken(l, lo, hi) {
			return true
		}
	}
	return false
}

func (w way) length() float64 { return w.a.Dist(w.b) }

// interval is what the length covers along its own direction.
func (w way) interval() (lo, hi float64) {
	e := w.n.Left()
	lo, hi = w.a.Dot(e), w.b.Dot(e)
	return min(lo, hi), max(lo, hi)
}

// nearView is the cost in mm of standing between two views.
const nearView = 60

// bestWay is the way with the shortest extension lines, away from other views.
func (d *draft) bestWay(s span) way {
	best, bestCost := s.ways[0], math.Inf(1)
	for _, w := range s.ways {
		top := d.reach(w.n)
		cost := top - d.start(w.a, w.n).Dot(w.n) + top - d.start(w.b, w.n).Dot(w.n)
		for _, u := range d.p.beside {
			if u.Dot(w.n) > math.Sqrt2/2-slack {
				cost += nearView
			}
		}
		if cost < bestCost-slack {
			best, bestCost = w, cost
		}
	}
	return best
}

// reach is how far the outline reaches along n.
func (d *draft) reach(n vec.V2) float64 {
	r := math.Inf(-1)
	for _, l := range d.outline {
		r = max(r, l.a.Dot(n), l.b.Dot(n))
	}
	if math.IsInf(r, -1) {
		return max(d.core.Max.Dot(n), d.core.Min.Dot(n))
	}
	return r
}

// start is where the extension line of a point begins: at the outermost corner of the
// outline in line with it, else at the point.
func (d *draft) start(q, n vec.V2) vec.V2 {
	const inLine = 0.005 // half the finest step of a writer's rounding, tenfold
	best := q
	for _, l := range d.outline {
		for _, c := range [2]vec.V2{l.a, l.b} {
			if math.Abs(c.Sub(q).Dot(n.Left())) < inLine && c.Dot(n) > best.Dot(n) {
				best = q.Along(n, c.Sub(q).Dot(n))
			}
		}
	}
	return best
}

// checkDimensions reports the dimensions that are not seen true where they are
// asked for, and drops them.
func (j *job) checkDimensions(set []*picture) {
	for _, p := range set {
		kept := p.dims[:0:0]
		for _, m := range p.dims {
			if p.seenTrue(m.Anchor) {
				kept = append(kept, m)
				continue
			}
			j.report(Problem{Span: m.Span, Code: NotTrue, Text: m.Name + " is not seen true on " + p.name, Reason: trueElsewhere(m.Anchor, set)})
		}
		p.dims = kept
	}
}

// trueElsewhere names a view of the block where an anchor is seen true, or the
// direction of one that would show it.
func trueElsewhere(a scene.Anchor, set []*picture) string {
	for _, p := range set {
		if p.view.Form != "pattern" && p.seenTrue(a) {
			return "it is seen true on " + p.name
		}
	}
	if l, ok := a.(scene.Linear); ok {
		d := l.B.Sub(l.A).Unit()
		return fmt.Sprintf("a view along a direction square to (%.4g, %.4g, %.4g) would show it", d.X, d.Y, d.Z)
	}
	return "no view of the block shows it true"
}

// seenTrue reports whether an anchor is seen in its true size on the picture.
func (p *picture) seenTrue(a scene.Anchor) bool {
	level := func(v vec.V3) bool { return math.Abs(v.Unit().Dot(p.frame.Z)) <= trueSine }
	square := func(v vec.V3) bool { return math.Abs(math.Abs(v.Unit().Dot(p.frame.Z))-1) <= trueSine }
	if p.view.Form == "pictorial" {
		return false // lengths along the axes are to scale, but nothing is seen square on
	}
	pattern := p.view.Form == "pattern"
	switch a := a.(type) {
	case scene.Linear:
		return !pattern && a.A != a.B && level(a.B.Sub(a.A))
	case scene.Diameter:
		return !pattern && (a.Circle.Sphere || level(a.Circle.F.Z) || square(a.Circle.F.Z))
	case scene.Radius:
		return !pattern && (a.Circle.Sphere || square(a.Circle.F.Z))
	case scene.Angle:
		return !pattern && level(a.A) && level(a.B)
	}
	return pattern
}
