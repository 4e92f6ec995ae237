package view

import (
	"slices"

	"epure/geom/curve"
)

// piece is a part of a candidate between two stops.
type piece struct {
	cand    int
	t0, t1  float64 // space parameters
	visible bool
	near    float64 // depth of its middle
	group   int     // pieces of one group share an image; the lowest index of them
	dropped bool
}

// pair is two candidates whose images lie on one curve.
type pair struct{ i, j int }

// drawing is one run of Lines or SplitBy.
type drawing struct {
	*scene
	cands  []cand
	active int // the candidates before this index are split and drawn, the others only split them
	pairs  []pair
	pieces []piece
	first  []int // of pieces, by candidate, with one more at the end
}

// draw splits the first active candidates, decides each piece and joins what is alike.
func (s *scene) draw(cands []cand, active int) []Piece {
	d := &drawing{scene: s, cands: cands, active: active}
	d.cross()
	d.share()
	d.cut()
	d.decide()
	d.merge()
	return d.join()
}

// cross stops the active candidates where images meet.
func (d *drawing) cross() {
	boxes := make([]box, len(d.cands))
	for i := range d.cands {
		boxes[i] = d.cands[i].box.grown(d.cands[i].err)
	}
	where := newTree(boxes)
	var found []int
	for i := range d.cands[:d.active] {
		found = where.find(found[:0], boxes[i])
		slices.Sort(found) // an order that the bodies' places have no part in
		for _, j := range found {
			if j > i {
				d.crossTwo(i, j)
			}
		}
	}
}

// crossTwo stops the candidates i < j where their images meet, or takes note that they lie on one curve.
func (d *drawing) crossTwo(i, j int) {
	a, b := &d.cands[i], &d.cands[j]
	if coincide(a, b) {
		a.stopEnds(b)
		b.stopEnds(a)
		if j < d.active {
			d.pairs = append(d.pairs, pair{i, j})
		}
		return
	}
	if a.hidden || b.hidden {
		return
	}
	pts, _ := curve.Meet(a.image, b.image, a.err+b.err)
	for _, x := range pts {
		s, t := a.space(x.TA), b.space(x.TB)
		// Only what lies before a curve can hide it. Where both lie at one depth, within the
		// blur of a crossing, either may.
		ahead := b.arc.At(t).Sub(a.arc.At(s)).Dot(d.f.Z)
		slack := a.blur(d.sizeOf(a), d.gap).closest + b.blur(d.sizeOf(b), d.gap).closest
		if ahead > -slack {
			a.stopAt(atCrossing, b, s)
		}
		if ahead < slack {
			b.stopAt(atCrossing, a, t)
		}
	}
}

// share gives candidates with one image the same stops, so that what is
// merged later has the same ends on all of them.
func (d *drawing) share() {
	own := make([]int, len(d.cands))
	for i := range d.cands {
		own[i] = len(d.cands[i].stops)
	}
	for _, p := range d.pairs {
		d.give(p.i, p.j, own[p.i])
		d.give(p.j, p.i, own[p.j])
	}
}

// give stops the candidate j at the first n stops of i.
func (d *drawing) give(i, j, n int) {
	a, b := &d.cands[i], &d.cands[j]
	for _, s := range a.stops[:n] {
		if t, ok := b.locate(a, s.t); ok {
			b.stopAt(atShared, s.with, t)
		}
	}
}

// sizeOf is the size of the candidate's body, mm; zero for a wire.
func (d *drawing) sizeOf(c *cand) float64 {
	if c.body == Wire {
		return 0
	}
	return d.bodies[c.body].Size()
}

// cut makes the pieces of every active candidate.
func (d *drawing) cut() {
	for i := range d.cands[:d.active] {
		c := &d.cands[i]
		d.first = append(d.first, len(d.pieces))
		ts := c.clean(c.blur(d.sizeOf(c), d.gap))
		for k := 1; k < len(ts); k++ {
			d.pieces = append(d.pieces, piece{cand: i, t0: ts[k-1], t1: ts[k], group: len(d.pieces)})
		}
	}
	d.first = append(d.first, len(d.pieces))
}

// decide sends a ray from the middle of every piece.
func (d *drawing) decide() {
	for k := range d.pieces {
		p := &d.pieces[k]
		c := &d.cands[p.cand]
		m := c.arc.At((p.t0 + p.t1) / 2)
		// A curve in one shadow needs no ray, and its middle may be where it touches the border.
		p.visible = !c.hidden && !d.covered(m, c.err)
		p.near = d.f.Local(m).Z
	}
}

// coincide tells whether the images of a and b lie on one curve where both
// are: five points of one lie on the other, within the errors of both. Five
// points make a conic.
func coincide(a, b *cand) bool {
	if (a.image.Form == curve.Line) != (b.image.Form == curve.Line) {
		return false
	}
	return lies(a, b) || lies(b, a)
}

// probes is the number of points compared, less one.
const probes = 4

// lies tells whether the image of a lies on the unbounded curve of b's image.
func lies(a, b *cand) bool {
	w := unbounded(b.image)
	for k := range probes + 1 {
		p := a.image.At(a.image.T0 + (a.image.T1-a.image.T0)*float64(k)/probes)
		if _, ok := w.Param(p, a.err+b.err); !ok {
			return false
		}
	}
	return true
}
