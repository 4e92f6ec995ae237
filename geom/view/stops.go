package view

import (
	"math"
	"slices"

	"epure/geom/curve"
)

// stop is a space parameter at which a candidate is split.
type stop struct {
	t    float64
	rank uint8
	with *cand // the candidate whose image crosses or touches there, or nil
}

// The ranks of stops: where several fall together the most exact one stands for all.
const (
	atEnd      uint8 = iota // an end of the curve
	atTurn                  // where it crosses the plane of contact, or a surface
	atCrossing              // where its image crosses another's
	atShared                // taken over from a curve with the same image
)

// stopAt adds stops at those of the space parameters ts that lie within c.
func (c *cand) stopAt(rank uint8, with *cand, ts ...float64) {
	for _, t := range ts {
		if t > c.t0 && t < c.t1 {
			c.stops = append(c.stops, stop{t, rank, with})
		}
	}
}

// stopEnds stops a at the ends of b, whose image lies on the same curve.
func (a *cand) stopEnds(b *cand) {
	for _, t := range [2]float64{b.t0, b.t1} {
		if t, ok := a.locate(b, t); ok {
			a.stopAt(atCrossing, nil, t)
		}
	}
}

// blur is how far, in space, a stop may lie from where it should, mm.
//
// Where images touch, each wrong by err, they cross as far as √(2·err·R) from the point of contact, R
// being the radius of curvature, of the order of the size of the body or of
// the curve, whichever is larger. A ray that dips less than gap, the bound for
// points on a surface, into a body passes it by, so that near a contact no verdict holds within √(2·gap·R)
// to either side; gap is the larger, and contact is the whole width.
// Two conics may touch as closely as the fourth order (all curves of a cone do where a generator is
// seen end-on); their images then run along each other for the fourth root of err·R³.
type blur struct{ contact, closest float64 }

func (c *cand) blur(size, gap float64) blur {
	u, w := weightBounds(c.arc.Form, c.t0, c.t1)
	r := max(size, float64(u*c.arc.U.Len())+float64(w*c.arc.W.Len()))
	return blur{2 * math.Sqrt(2*max(gap, c.err)*r), 2 * math.Sqrt(math.Sqrt(c.err*r)*r)}
}

// clean returns the parameters of the stops in order. Of those that are one
// place within the blur only the most exact is kept; the ends always stay.
func (c *cand) clean(blur blur) []float64 {
	slices.SortStableFunc(c.stops, func(a, b stop) int {
		switch {
		case a.t < b.t:
			return -1
		case a.t > b.t:
			return 1
		}
		return int(a.rank) - int(b.rank)
	})
	from, kept := c.stops[0], c.stops[:1] // from is where the cluster begins
	for _, s := range c.stops[1:] {
		last := &kept[len(kept)-1]
		switch {
		case !c.together(from, s, blur) || s.t == c.t1 && last.t == c.t0:
			from, kept = s, append(kept, s)
		case s.rank < last.rank:
			*last = s
		}
	}
	ts := make([]float64, len(kept))
	for k, s := range kept {
		ts[k] = s.t
	}
	return ts
}

// together tells whether two stops are one place: nearer than the blur of a contact, or within that of
// the closest contact while c runs along a curve that it meets there.
func (c *cand) together(a, b stop, blur blur) bool {
	d := c.arc.At(a.t).Dist(c.arc.At(b.t))
	if d <= blur.contact {
		return true
	}
	return d <= blur.closest && (c.runsAlong(a.with, a.t, b.t) || c.runsAlong(b.with, a.t, b.t))
}

// runsAlong tells whether the image of c lies on that of o from t0 to t1.
func (c *cand) runsAlong(o *cand, t0, t1 float64) bool {
	if o == nil {
		return false
	}
	w := unbounded(o.image)
	for k := range probes + 1 {
		if _, ok := w.Param(c.point(t0+(t1-t0)*float64(k)/probes), 2*(c.err+o.err)); !ok {
			return false
		}
	}
	return true
}

// unbounded is the whole of the arc's curve.
func unbounded(a curve.Arc2) curve.Arc2 {
	if a.Form.Periodic() {
		a.T1 = a.T0 + 2*math.Pi
	} else {
		a.T0, a.T1 = math.Inf(-1), math.Inf(1)
	}
	return a
}
