package flat

import (
	"math"
	"slices"
)

// The outline is chained in natural coordinates, phi to the right and u up,
// with the material on the left: lower rims run rightward, upper rims leftward,
// walls up where the material ends and down where it begins. What a cone's
// apex makes of u = 0 is kept as a link of its own until the loops are closed,
// so that regions which only touch in the apex stay apart.

// node is a place in natural coordinates.
type node struct{ phi, u float64 }

// link is a directed piece of the outline: a rim (rim >= 0), the apex, or a wall.
type link struct {
	rim      int // index of the rim, or apex, or none for a wall
	face     int
	from, to node
}

// none is the rim of a link along a generator.
const none = -2

// outline returns the closed loops, anticlockwise on the pattern as drawn.
func (p *Pattern) outline() ([][]Piece, error) {
	var loops [][]Piece
	for _, l := range p.chain(p.links()) {
		if !p.meets(l[len(l)-1], l[0]) {
			return nil, p.fail("its outline does not close")
		}
		loops = append(loops, p.pieces(l))
	}
	if len(loops) == 0 {
		return nil, p.fail("nothing of it is left")
	}
	return loops, nil
}

// links returns all directed pieces, panel by panel, each with the walls at its beginning first.
func (p *Pattern) links() []link {
	var out []link
	var left []band
	for _, q := range p.panels {
		out = append(out, p.wallLinks(q.a, left, q.spans)...)
		for _, b := range q.spans {
			out = append(out, p.rimLink(b.lo, q.a, q.b), p.rimLink(b.hi, q.b, q.a))
		}
		left = q.spans
	}
	return append(out, p.wallLinks(turn, left, nil)...)
}

func (p *Pattern) rimLink(j int, a, b float64) link {
	face := Seam
	if j != apex {
		face = p.rims[j].face
	}
	return link{j, face, node{a, p.u(j, a)}, node{b, p.u(j, b)}}
}

// wallLinks returns the outline along the generator at phi, where the
// material is that of left on one side and that of right on the other.
func (p *Pattern) wallLinks(phi float64, left, right []band) []link {
	var ends []float64
	for _, b := range slices.Concat(left, right) {
		ends = append(ends, p.u(b.lo, phi), p.u(b.hi, phi))
	}
	for _, w := range p.walls {
		if w.at(phi) {
			ends = append(ends, w.lo, w.hi)
		}
	}
	slices.Sort(ends)
	tol := p.blur(phi, slices.Concat(left, right))
	var up, down []link
	for i := 1; i < len(ends); i++ {
		lo, hi := ends[i-1], ends[i]
		if hi-lo <= tol {
			ends[i] = lo
			continue
		}
		mid := (lo + hi) / 2
		l, r := p.holds(left, phi, mid), p.holds(right, phi, mid)
		face := p.wallFace(phi, mid)
		switch {
		case face == Seam && phi != 0 && phi != turn: // two edges meet, but for rounding
		case l && !r:
			up = append(up, link{none, face, node{phi, lo}, node{phi, hi}})
		case r && !l:
			down = append(down, link{none, face, node{phi, hi}, node{phi, lo}})
		}
	}
	slices.Reverse(down)
	return append(up, down...)
}

// blur is the difference of u, mm, within which ends on the generator at phi
// are one: that of a corner, and what the rounding of the angle makes of a steep edge.
func (p *Pattern) blur(phi float64, bands []band) float64 {
	slope := 0.0
	for _, b := range bands {
		for _, j := range []int{b.lo, b.hi} {
			if j != apex {
				slope = max(slope, math.Abs(p.rims[j].derivs(phi, 1)[1]))
			}
		}
	}
	return p.join*p.size + float64(slope*angleError)
}

// at tells whether the wall lies on the generator at phi in [0, turn].
func (w wall) at(phi float64) bool {
	d := math.Abs(w.phi - phi)
	return d < sameAngle || d > turn-sameAngle
}

// holds tells whether one of the bands has u at phi.
func (p *Pattern) holds(bands []band, phi, u float64) bool {
	for _, b := range bands {
		if p.u(b.lo, phi) < u && u < p.u(b.hi, phi) {
			return true
		}
	}
	return false
}

// wallFace is the face of the wall at phi and u, or Seam.
func (p *Pattern) wallFace(phi, u float64) int {
	for _, w := range p.walls {
		if w.at(phi) && w.lo < u && u < w.hi {
			return w.face
		}
	}
	return Seam
}

// chain joins the links to closed loops. Where two loops touch, the one goes
// on along the edge it came on.
func (p *Pattern) chain(links []link) [][]link {
	var loops [][]link
	used := make([]bool, len(links))
	for i := range links {
		if used[i] {
			continue
		}
		loop := []link{links[i]}
		for used[i] = true; ; {
			j := p.next(links, used, loop[len(loop)-1])
			if j < 0 {
				break
			}
			used[j] = true
			loop = append(loop, links[j])
		}
		loops = append(loops, p.merge(loop))
	}
	return loops
}

// next is the index of the unused link that goes on from l, or -1.
func (p *Pattern) next(links []link, used []bool, l link) int {
	best := -1
	for j, c := range links {
		if used[j] || !p.meets(l, c) {
			continue
		}
		if best < 0 || l.joins(c) && !l.joins(links[best]) {
			best = j
		}
	}
	return best
}

// meets tells whether c begins where l ends.
func (p *Pattern) meets(l, c link) bool {
	if c.from.phi != l.to.phi {
		return false
	}
	return math.Abs(c.from.u-l.to.u) <= p.blur(l.to.phi, []band{{max(l.rim, apex), max(c.rim, apex)}})
}

// joins tells whether c is the same edge as l, in the same sense.
func (l link) joins(c link) bool {
	return l.face == c.face && (l.rim == none) == (c.rim == none) && (l.rim == apex) == (c.rim == apex) &&
		l.to.phi == c.from.phi && (l.to.phi > l.from.phi) == (c.to.phi > c.from.phi) &&
		(l.rim != none || (l.to.u > l.from.u) == (c.to.u > c.from.u))
}

// merge turns the loop so that it begins at a real corner and joins pieces of one edge.
func (p *Pattern) merge(loop []link) []link {
	n := len(loop)
	first := 0
	for i := range loop {
		if !loop[(i+n-1)%n].joins(loop[i]) {
			first = i
			break
		}
	}
	var out []link
	for i := range loop {
		l := loop[(first+i)%n]
		if k := len(out); k > 0 && out[k-1].joins(l) {
			out[k-1].to = l.to
			continue
		}
		out = append(out, l)
	}
	return out
}

// pieces draws a loop on the pattern, anticlockwise.
func (p *Pattern) pieces(loop []link) []Piece {
	var out []Piece
	for _, l := range loop {
		if l.rim != apex {
			out = append(out, p.piece(l))
		}
	}
	if p.roll.turned() {
		slices.Reverse(out)
		for i := range out {
			out[i].T0, out[i].T1 = out[i].T1, out[i].T0
		}
	}
	return out
}

func (p *Pattern) piece(l link) Piece {
	q := Piece{Face: l.face}
	if l.face != Seam {
		q.Label = p.body.Faces[l.face].Label
	}
	if l.rim == none {
		q.Path, q.T0, q.T1 = p.roll.wallPath(l.from.phi), l.from.u, l.to.u
		return q
	}
	q.Path, q.T0, q.T1 = p.rimPath(l.rim, l.from.phi, l.to.phi)
	return q
}
