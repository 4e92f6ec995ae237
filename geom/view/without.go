package view

import (
	"epure/geom/vec"
)

// Box is the exact box of the images, mm; ok is false when there are none.
func Box(pieces []Piece) (lo, hi vec.V2, ok bool) {
	if len(pieces) == 0 {
		return lo, hi, false
	}
	b := boxOf(pieces[0].Image)
	for _, p := range pieces[1:] {
		b = b.with(boxOf(p.Image))
	}
	return b.lo, b.hi, true
}

// Without returns the pieces, or parts of pieces, whose image does not coincide with one of
// others, in the order of pieces. Images coincide where they lie on one
// line or conic within rounding; crossing and touching does not count.
func Without(pieces, others []Piece) []Piece {
	rest := make([]cand, len(others))
	boxes := make([]box, len(others))
	for i, p := range others {
		rest[i] = p.cand()
		boxes[i] = rest[i].box.grown(rest[i].err)
	}
	where := newTree(boxes)
	var out []Piece
	for _, p := range pieces {
		c := p.cand()
		var same []*cand
		for _, j := range where.find(nil, c.box.grown(c.err)) {
			if o := &rest[j]; coincide(&c, o) {
				same = append(same, o)
			}
		}
		out = p.outside(out, &c, same)
	}
	return out
}

// cand is the candidate whose image is that of the whole piece.
func (p Piece) cand() cand {
	err := Grain * (reachOf(p.Space) + p.Image.C.Len() + float64(p.Image.U.Len()))
	k := track{p.Image, p.flat, p.Space.T0, p.Space.T1}
	return cand{track: k, arc: p.Space, err: err, box: boxOf(p.Image)}
}

// outside appends the parts of p, whose candidate is c, that are on none of
// the others, which lie on the same curve.
func (p Piece) outside(out []Piece, c *cand, others []*cand) []Piece {
	if len(others) == 0 {
		return append(out, p)
	}
	c.stops = []stop{{t: c.t0, rank: atEnd}, {t: c.t1, rank: atEnd}}
	for _, o := range others {
		c.stopEnds(o)
	}
	ts := c.clean(c.blur(0, 0))
	from := len(out)
	for k := 1; k < len(ts); k++ {
		if c.onAny(others, (ts[k-1]+ts[k])/2) {
			continue
		}
		if n := len(out); n > from && out[n-1].Space.T1 == ts[k-1] {
			out[n-1].Space.T1 = ts[k]
			continue
		}
		q := p
		q.Space.T0, q.Space.T1 = ts[k-1], ts[k]
		out = append(out, q)
	}
	out = closeRing(out, from, c)
	for k := from; k < len(out); k++ {
		out[k].Image = c.part(out[k].Space.T0, out[k].Space.T1)
	}
	return out
}

// onAny tells whether the image of the space parameter t lies on one of the others.
func (c *cand) onAny(others []*cand, t float64) bool {
	for _, o := range others {
		if _, ok := o.locate(c, t); ok {
			return true
		}
	}
	return false
}
