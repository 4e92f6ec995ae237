package view

import (
	"math"
	"slices"

	"epure/geom/curve"
)

// Where two images coincide, the curve nearer the viewer is the one that is drawn: whatever
// hides it hides the other too. So a curve is trimmed, before anything
// else is asked of it, by every curve with the same image that is nearer all
// along. Rows of like bodies, whose images fall on each other, cost no
// more than the first of them. Curves whose depths overlap are left to merge.

// span is the stretch a <= t <= b of a candidate in space.
type span struct{ a, b float64 }

// trim returns what is left of the candidates, in their order.
func trim(cands []cand) []cand {
	boxes := make([]box, len(cands))
	order := make([]int, len(cands)) // nearest first
	for i := range cands {
		boxes[i], order[i] = cands[i].box.grown(cands[i].err), i
	}
	slices.SortStableFunc(order, func(i, j int) int {
		switch a, b := cands[i].z0, cands[j].z0; {
		case a > b:
			return -1
		case a < b:
			return 1
		}
		return 0
	})
	where := newTree(boxes)
	left := make([][]span, len(cands))
	var found []int
	for _, i := range order {
		found = where.find(found[:0], boxes[i])
		left[i] = trimOne(cands, i, found, left)
	}
	var out []cand
	for i := range cands {
		for _, s := range left[i] {
			out = append(out, cands[i].cutTo(s))
		}
	}
	return out
}

// trimOne is what is left of the candidate i under those of found that are nearer; left holds
// what is left of these. One that has vanished hides nothing that those before it do not.
func trimOne(cands []cand, i int, found []int, left [][]span) []span {
	c := &cands[i]
	var gone []span
	for _, j := range found {
		o := &cands[j]
		if len(left[j]) > 0 && o.nearer(c, j < i) && coincide(c, o) {
			gone = append(gone, c.under(o)...)
		}
	}
	if len(gone) == 0 {
		return []span{{c.t0, c.t1}}
	}
	return c.remain(gone)
}

// nearer tells whether o is nearer the viewer than c all along; of two at one and the same depth, the first.
func (o *cand) nearer(c *cand, first bool) bool {
	return o.z0 > c.z1 || o.z0 == c.z1 && (first || c.z0 < o.z1)
}

// under are the stretches of c whose image lies on that of o, which is on the same curve.
func (c *cand) under(o *cand) []span {
	ts := []float64{c.t0, c.t1}
	for _, t := range [2]float64{o.t0, o.t1} {
		if t, ok := c.locate(o, t); ok {
			ts = append(ts, t)
		}
	}
	slices.Sort(ts)
	var out []span
	for k := 1; k < len(ts); k++ {
		if _, ok := o.locate(c, (ts[k-1]+ts[k])/2); ok && ts[k] > ts[k-1] {
			out = append(out, span{ts[k-1], ts[k]})
		}
	}
	return out
}

// remain are the stretches of c outside of all of gone, without those whose image has no length.
func (c *cand) remain(gone []span) []span {
	slices.SortFunc(gone, func(p, q span) int {
		switch {
		case p.a < q.a:
			return -1
		case p.a > q.a:
			return 1
		}
		return 0
	})
	var out []span
	from := c.t0
	for _, g := range append(gone, span{c.t1, c.t1}) {
		if g.a > from && !c.tiny(span{from, g.a}) {
			out = append(out, span{from, g.a})
		}
		from = max(from, g.b)
	}
	if n := len(out); n > 1 && c.whole() && out[0].a == c.t0 && out[n-1].b == c.t1 {
		out[n-1].b = out[0].b + 2*math.Pi
		out = out[1:]
	}
	return out
}

// tiny tells whether the image of the stretch is no longer than its error.
func (c *cand) tiny(s span) bool {
	p := c.point(s.a)
	return p.Dist(c.point(s.b)) <= 2*c.err && p.Dist(c.point((s.a+s.b)/2)) <= 2*c.err
}

// whole tells whether c is a whole ellipse.
func (c *cand) whole() bool {
	return c.image.Form.Periodic() && c.t1-c.t0 > math.Pi && c.arc.At(c.t0).Dist(c.arc.At(c.t1)) <= c.err
}

// cutTo is the candidate of the stretch s of c.
func (c *cand) cutTo(s span) cand {
	d := *c
	if s == (span{c.t0, c.t1}) {
		return d
	}
	d.image, d.t0, d.t1 = c.part(s.a, s.b), s.a, s.b
	d.box = boxOf(d.image)
	return d
}

// inSpace is the part of the space curve that c stands for.
func (c *cand) inSpace() curve.Arc { return curve.Arc{Curve: c.arc.Curve, T0: c.t0, T1: c.t1} }
