package compose

import (
	"math"
	"sort"

	"epure/geom/vec"
)

// Dropping one cluster: on a number of level lines and of upright lines the
// nearest free place to the corner is worked out exactly. Extents are convex, so
// what one of them forbids another along a line is one interval, and the free
// places are what the intervals leave.

// drop is the shift that puts a cluster at the free place nearest to a corner,
// measured both ways together; false when there is none.
func (s *search) drop(c *cluster, k corner) (vec.V2, bool) {
	if s.left--; s.left < 0 {
		return vec.V2{}, false
	}
	space := s.l.space.Grow(-leastEdge)
	x := axis{vec.V2{X: 1}, space.Min.X - c.box.Min.X, space.Max.X - c.box.Max.X, k == topRight || k == bottomRight}
	y := axis{vec.V2{Y: 1}, space.Min.Y - c.box.Min.Y, space.Max.Y - c.box.Max.Y, k == topLeft || k == topRight}
	best, bestFar := vec.V2{}, math.Inf(1)
	for _, way := range [2][2]axis{{y, x}, {x, y}} {
		line, along := way[0], way[1]
		for _, at := range s.stops(c, line) {
			if line.far(at) >= bestFar-slack {
				break
			}
			base := line.u.Scale(at)
			if t, ok := s.slide(c, base, along); ok && line.far(at)+along.far(t) < bestFar-slack {
				best, bestFar = base.Along(along.u, t), line.far(at)+along.far(t)
			}
		}
	}
	return best, !math.IsInf(bestFar, 1)
}

// axis is one direction in which a cluster can be shifted, from least to most;
// the corner lies at most if high, else at least.
type axis struct {
	u           vec.V2
	least, most float64
	high        bool
}

// far is how far a shift leads from the corner.
func (a axis) far(t float64) float64 {
	if a.high {
		return a.most - t
	}
	return t - a.least
}

// gridStep is the distance of the lines tried besides those on which something
// touches or lines up, paper mm.
const gridStep = 5

// stops lists the shifts along an axis to try, the nearest to the corner first:
// against the border, against everything placed, in line with it, and on a grid.
func (s *search) stops(c *cluster, a axis) []float64 {
	i := 0
	if a.u.X == 0 {
		i = upright
	}
	lo, hi := c.box.Min.Dot(a.u), c.box.Max.Dot(a.u)
	at := []float64{a.least, a.most}
	for j := range s.lying {
		e := &s.lying[j]
		at = append(at, e.hi[i]+leastGap-lo, e.lo[i]-leastGap-hi, e.lo[i]-lo, e.hi[i]-hi)
	}
	for t := a.least; t <= a.most; t += gridStep {
		at = append(at, t)
	}
	kept := at[:0]
	for _, t := range at {
		if t >= a.least-slack && t <= a.most+slack {
			kept = append(kept, t)
		}
	}
	sort.Slice(kept, func(i, j int) bool { return a.far(kept[i]) < a.far(kept[j]) })
	return kept
}

// slide is the free shift along an axis nearest to the corner, after the cluster
// has been shifted by base; false when there is none.
func (s *search) slide(c *cluster, base vec.V2, a axis) (float64, bool) {
	var taken [][2]float64
	for i := range c.rooms {
		e := c.rooms[i].moved(base)
		for j := range s.lying {
			if lo, hi := forbidden(&e, &s.lying[j], a.u); lo < hi {
				taken = append(taken, [2]float64{lo, hi})
			}
		}
	}
	if a.high {
		sort.Slice(taken, func(i, j int) bool { return taken[i][1] > taken[j][1] })
		t := a.most
		for _, f := range taken {
			if f[1] > t+slack && f[0] < t-slack {
				t = f[0]
			}
		}
		return t, t >= a.least-slack
	}
	sort.Slice(taken, func(i, j int) bool { return taken[i][0] < taken[j][0] })
	t := a.least
	for _, f := range taken {
		if f[0] < t-slack && f[1] > t+slack {
			t = f[1]
		}
	}
	return t, t <= a.most+slack
}

// forbidden is the interval of shifts of e along u at which it lies within
// leastGap of o; empty (lo >= hi) when there is none.
func forbidden(e, o *extent, u vec.V2) (lo, hi float64) {
	const gap = leastGap
	lo, hi = math.Inf(-1), math.Inf(1)
	for i, d := range compass() {
		c := d.Dot(u)
		// Clear when e.lo + c·t >= o.hi + gap, or o.lo >= e.hi + c·t + gap.
		above, below := o.hi[i]+gap-e.lo[i], o.lo[i]-gap-e.hi[i]
		switch {
		case c > slack:
			hi, lo = min(hi, above/c), max(lo, below/c)
		case c < -slack:
			hi, lo = min(hi, below/c), max(lo, above/c)
		case above <= 0 || below >= 0:
			return 0, 0
		}
	}
	return lo, hi
}
