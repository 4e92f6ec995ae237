package view

import (
	"math"

	"epure/geom/curve"
)

// merge keeps one piece of every group of pieces with one image.
func (d *drawing) merge() {
	for _, p := range d.pairs {
		for k := d.first[p.i]; k < d.first[p.i+1]; k++ {
			if l := d.over(k, p.j); l >= 0 {
				d.unite(k, l)
			}
		}
		for l := d.first[p.j]; l < d.first[p.j+1]; l++ {
			if k := d.over(l, p.i); k >= 0 {
				d.unite(k, l)
			}
		}
	}
	best := make([]int, len(d.pieces))
	for k := range best {
		best[k] = -1
	}
	for k := range d.pieces {
		g := d.root(k)
		if best[g] < 0 || d.before(k, best[g]) {
			best[g] = k
		}
	}
	for k := range d.pieces {
		d.pieces[k].dropped = best[d.root(k)] != k
	}
}

// over is the piece of the candidate j on whose image the middle of the piece k lies, or -1.
func (d *drawing) over(k, j int) int {
	p := d.pieces[k]
	t, ok := d.cands[j].locate(&d.cands[p.cand], (p.t0+p.t1)/2)
	if !ok {
		return -1
	}
	for l := d.first[j]; l < d.first[j+1]; l++ {
		if t <= d.pieces[l].t1 {
			return l
		}
	}
	return -1
}

// root is the lowest piece of the group of k.
func (d *drawing) root(k int) int {
	for d.pieces[k].group != k {
		d.pieces[k].group = d.pieces[d.pieces[k].group].group
		k = d.pieces[k].group
	}
	return k
}

// unite makes one group of those of k and l.
func (d *drawing) unite(k, l int) {
	k, l = d.root(k), d.root(l)
	d.pieces[max(k, l)].group = min(k, l)
}

// before tells whether the piece k is drawn rather than l, of one group: a visible one, then the nearer
// to the viewer, then the lower in the order of bodies and edges.
//
// Depths within the errors of both are alike. That is no strict order of three
// pieces whose depths differ by less than twice the error, but such pieces
// lie on one curve of space and any of them will do; the order of comparison is fixed.
func (d *drawing) before(k, l int) bool {
	p, q := &d.pieces[k], &d.pieces[l]
	if p.visible != q.visible {
		return p.visible
	}
	e := d.cands[p.cand].err + d.cands[q.cand].err
	if math.Abs(p.near-q.near) > 2*e {
		return p.near > q.near
	}
	return k < l
}

// join makes the pieces for the caller: neighbours of one candidate that are alike become one.
func (d *drawing) join() []Piece {
	var out []Piece
	for i := range d.cands[:d.active] {
		c := &d.cands[i]
		from := len(out)
		for k := d.first[i]; k < d.first[i+1]; k++ {
			p := &d.pieces[k]
			if p.dropped {
				continue
			}
			q := Piece{Body: c.body, A: c.a, B: c.b, Visible: p.visible}
			q.Space = curve.Arc{Curve: c.arc.Curve, T0: p.t0, T1: p.t1}
			if n := len(out); n > from && out[n-1].Space.T1 == p.t0 && out[n-1].Visible == q.Visible {
				out[n-1].Space.T1 = p.t1
				continue
			}
			out = append(out, q)
		}
		out = closeRing(out, from, c)
		for k := from; k < len(out); k++ {
			p := &out[k]
			p.Image = c.part(p.Space.T0, p.Space.T1)
			p.flat = c.flat
		}
	}
	return out
}

// closeRing joins the last piece of a whole ellipse to its first across the
// start of the parameter.
func closeRing(out []Piece, from int, c *cand) []Piece {
	last := len(out) - 1
	if !c.whole() || last <= from {
		return out
	}
	p, q := &out[from], &out[last]
	if p.Space.T0 != c.t0 || q.Space.T1 != c.t1 || p.Visible != q.Visible {
		return out
	}
	p.Space.T0, p.Space.T1 = q.Space.T0, p.Space.T1+2*math.Pi
	return out[:last]
}
