package flat

import (
	"math"

	"epure/geom/vec"
)

// Area is the area of the pattern, mm²: on a cylinder radius times the
// integral of the length over the angle, in closed form; on a cone half the
// sine of the half angle times the integral of hi² - lo².
func (p *Pattern) Area() float64 {
	sum := 0.0
	for _, q := range p.panels {
		for _, b := range q.spans {
			sum += p.under(b.hi, q) - p.under(b.lo, q)
		}
	}
	return sum
}

// under is the area between u = 0 and the rim j within the panel.
func (p *Pattern) under(j int, q panel) float64 {
	if j == apex {
		return 0
	}
	m := p.rims[j]
	switch {
	case !p.roll.cone:
		sa, ca := math.Sincos(q.a)
		sb, cb := math.Sincos(q.b)
		return p.roll.r * (float64(m.k*(q.b-q.a)) + float64(m.c*(sb-sa)) - float64(m.s*(cb-ca)))
	case m.square():
		u := m.u(q.a)
		return p.roll.sin / 2 * u * u * (q.b - q.a)
	}
	return p.roll.sin / 2 * integral(func(phi float64) float64 { u := m.u(phi); return u * u }, q.a, q.b)
}

// CutLength is the length of the whole outline, both edges of the seam counted, mm.
func (p *Pattern) CutLength() float64 {
	sum := 0.0
	for _, l := range p.Loops {
		for _, q := range l {
			sum += q.Length()
		}
	}
	return sum
}

// Turn is the part of the turn that the pattern covers, from its first
// generator after the seam to its last before the seam again, radians about the axis.
func (p *Pattern) Turn() float64 {
	first, last := turn, 0.0
	for _, q := range p.panels {
		if len(q.spans) > 0 {
			first, last = min(first, q.a), max(last, q.b)
		}
	}
	return max(0, last-first)
}

// Sector is a cone's angle at the apex between the first and the last
// generator of the pattern, radians; false on a cylinder.
func (p *Pattern) Sector() (float64, bool) {
	if !p.roll.cone {
		return 0, false
	}
	return p.roll.sin * p.Turn(), true
}

// OuterRadius is the greatest distance of a cone's pattern from the apex, mm; false on a cylinder.
func (p *Pattern) OuterRadius() (float64, bool) {
	_, hi := p.reach()
	return hi, p.roll.cone
}

// InnerRadius is the least distance of a cone's pattern from the apex, mm,
// zero when the apex belongs to the part; false on a cylinder.
func (p *Pattern) InnerRadius() (float64, bool) {
	lo, _ := p.reach()
	return lo, p.roll.cone
}

// reach is the least and the greatest u of the pattern.
func (p *Pattern) reach() (lo, hi float64) {
	lo, hi = math.Inf(1), math.Inf(-1)
	for _, q := range p.panels {
		for _, b := range q.spans {
			a, _ := p.extent(b.lo, q)
			_, z := p.extent(b.hi, q)
			lo, hi = min(lo, a), max(hi, z)
		}
	}
	return lo, hi
}

// extent is the least and the greatest u of the rim j within the panel.
func (p *Pattern) extent(j int, q panel) (lo, hi float64) {
	lo, hi = p.u(j, q.a), p.u(j, q.b)
	if lo > hi {
		lo, hi = hi, lo
	}
	if j != apex {
		for _, t := range within(p.rims[j].profile.turns(), q.a, q.b) {
			u := p.u(j, t)
			lo, hi = min(lo, u), max(hi, u)
		}
	}
	return lo, hi
}

// girthRadius is the radius about the axis of the circle that Girth measures.
func (p *Pattern) girthRadius() float64 {
	_, hi := p.reach()
	return p.roll.radius(hi)
}

// Girth is the arc of the girth circle over the turn that the pattern covers,
// mm: on a cylinder the circle of its radius (whole turn: 2πr), on a cone the
// one at OuterRadius (OuterRadius times Sector).
func (p *Pattern) Girth() float64 { return p.girthRadius() * p.Turn() }

// SteppedGirth is what comes out when n equal chords of the girth circle are
// stepped off where its arc is meant, mm: always short of Girth. n below 1
// counts as 1.
func (p *Pattern) SteppedGirth(n int) float64 {
	m := float64(max(1, n))
	return m * 2 * p.girthRadius() * math.Sin(p.Turn()/(2*m))
}

// Bounds are the corners of the exact box round the pattern: ends of the
// pieces and the points at which x or y is extreme.
func (p *Pattern) Bounds() (lo, hi vec.V2) {
	lo = vec.V2{X: math.Inf(1), Y: math.Inf(1)}
	hi = vec.V2{X: math.Inf(-1), Y: math.Inf(-1)}
	for _, l := range p.Loops {
		for _, q := range l {
			for _, t := range append(q.extremes(), q.T0, q.T1) {
				at := q.Path.At(t)
				lo = vec.V2{X: min(lo.X, at.X), Y: min(lo.Y, at.Y)}
				hi = vec.V2{X: max(hi.X, at.X), Y: max(hi.Y, at.Y)}
			}
		}
	}
	return lo, hi
}

// Width is the extent of the pattern along x, mm.
func (p *Pattern) Width() float64 { lo, hi := p.Bounds(); return hi.X - lo.X }

// Height is the extent of the pattern along y, mm.
func (p *Pattern) Height() float64 { lo, hi := p.Bounds(); return hi.Y - lo.Y }
