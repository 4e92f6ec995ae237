package flat

import (
	"math"
	"slices"

	"epure/geom/num"
)

// The body cuts every edge to length apart from its neighbours, so the ends
// that make one corner differ by rounding, and by the square root of it where
// edges touch instead of crossing. Here they become one angle again: that of a
// generator edge, or the root of the difference of two profiles, which is once
// more a + b·cos + c·sin and has its roots in closed form.
//
// Ends are one corner when they lie within a tolerance of each other in angle and
// in space; not by the angle alone, since the edge of a plane that passes close
// by the apex runs along all but one generator.

// finest and num.Join are the tolerances tried in turn, as share of the size
// and in radians, until the outline closes. Two edges that cross under 1e-5 rad
// place their common corner to some 1e-10; num.Join is for corners that the
// body found only to the square root of what it can tell apart. Going straight
// to num.Join would swallow short edges.
const finest = 1e-9

// end is one end of the rim or wall with the index of.
type end struct {
	phi, u float64
	of     int
	is     endKind
}

type endKind uint8

const (
	rimFrom endKind = iota
	rimTo
	wallEnd
)

// settle gives the ends of one corner one angle, drops rims that are no longer
// than a corner, and returns the angles that cut the turn: 0, those in between, turn.
func (p *Pattern) settle() []float64 {
	groups := p.groups()
	at := make([]float64, len(groups))
	for i, g := range groups {
		at[i] = p.corner(g)
		for _, earlier := range at[:i] { // another corner on the same generator
			if gap(earlier, at[i]) < angleError {
				at[i] = earlier
				break
			}
		}
		for _, e := range g {
			p.put(e, at[i])
		}
	}
	p.rims = slices.DeleteFunc(p.rims, func(m rim) bool { return m.to <= m.from })
	at = append(at, 0)
	slices.Sort(at)
	return append(slices.Compact(at), turn)
}

// groups returns the ends in groups of one corner each, in the order of the
// angle; those at a generator edge come first, since its angle is the surest.
func (p *Pattern) groups() [][]end {
	var all []end
	for j, w := range p.walls {
		all = append(all, end{w.phi, w.lo, j, wallEnd}, end{w.phi, w.hi, j, wallEnd})
	}
	for j, m := range p.rims {
		if m.to-m.from < turn {
			all = append(all, end{m.from, m.u(m.from), j, rimFrom}, end{wrap(m.to), m.u(m.to), j, rimTo})
		}
	}
	var out [][]end
	for _, e := range all {
		i := slices.IndexFunc(out, func(g []end) bool { return p.together(g[0], e) })
		if i < 0 {
			out = append(out, []end{e})
			continue
		}
		out[i] = append(out[i], e)
	}
	return out
}

// together tells whether two ends are one corner. A wall's two ends never are.
func (p *Pattern) together(a, b end) bool {
	if a.is == wallEnd && b.is == wallEnd {
		return false
	}
	apart := p.roll.space(a.phi, a.u).Dist(p.roll.space(b.phi, b.u))
	return gap(a.phi, b.phi) < p.join && apart < p.join*p.size
}

// corner is the angle of a group, in [0, turn), that of the seam when it is next to it.
func (p *Pattern) corner(group []end) float64 {
	phi := group[0].phi
	if group[0].is == wallEnd {
		return snap(phi, sameAngle)
	}
	first := p.rims[group[0].of]
	for _, e := range group[1:] {
		if other := p.rims[e.of]; other.face != first.face {
			if met := first.meets(other.profile, phi); gap(met, phi) < p.join {
				phi = met
			}
			return snap(phi, angleError)
		}
	}
	return snap(phi, angleError)
}

// put sets one end to the angle phi in [0, turn). A rim that began and ended
// in one corner is left with no length, if it did not go all the way round.
func (p *Pattern) put(e end, phi float64) {
	switch e.is {
	case wallEnd:
		p.walls[e.of].phi = phi
		return
	case rimFrom:
		m := &p.rims[e.of]
		m.to -= float64(turn * math.Round((m.from-phi)/turn))
		m.from = phi
		return
	}
	m := &p.rims[e.of]
	m.to = phi + float64(turn*math.Round((m.to-phi)/turn))
}

// meets is the angle next to phi at which p and q have the same u. Profiles
// that only touch, within rounding, meet where their difference is extreme.
func (p profile) meets(q profile, phi float64) float64 {
	k, c, s := p.k-q.k, p.c-q.c, p.s-q.s
	amp := math.Hypot(c, s)
	if amp == 0 {
		return phi
	}
	mid := math.Atan2(s, c)
	ratio := 0 - k/amp
	if math.Abs(ratio) > 1-touching {
		off := 0.0
		if ratio < 0 {
			off = math.Pi
		}
		return wrap(mid + off)
	}
	off := math.Acos(ratio)
	a, b := wrap(mid+off), wrap(mid-off)
	if gap(a, phi) <= gap(b, phi) {
		return a
	}
	return b
}

// touching is how near the cosine of half the angle between the two places
// where two edges meet may come to 1 before they count as one place: num.Join
// squared, halved, the cosine of the angle under which ends are one corner.
const touching = num.Join * num.Join / 2

// gap is the angle between two angles.
func gap(a, b float64) float64 {
	d := wrap(a - b)
	return min(d, turn-d)
}

// snap moves an angle within tol of the seam on to it.
func snap(phi, tol float64) float64 {
	if phi < tol || phi > turn-tol {
		return 0
	}
	return phi
}
