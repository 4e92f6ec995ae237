package compose

import (
	"math"

	"epure/geom/vec"
	"epure/render/drawing"
)

// Placing one cluster: among the places that touch something already placed or
// the border, line up with it, or lie on a grid, the free one nearest to the
// corner that the strategy gives it.

// corner is a corner of the space, or the place beside the title block.
type corner uint8

const (
	topLeft corner = iota
	topRight
	bottomLeft
	bottomRight
)

// strategy says which corner each kind of cluster seeks.
type strategy struct {
	main, views, tables corner
	fileOrder           bool
}

func strategies() []strategy {
	var out []strategy
	for _, fileOrder := range []bool{false, true} {
		for _, main := range []corner{topLeft, topRight, bottomLeft} {
			for _, views := range []corner{topRight, topLeft, bottomLeft, bottomRight} {
				tables := topRight
				if main == topRight {
					tables = topLeft
				}
				out = append(out, strategy{main, views, tables, fileOrder}, strategy{main, views, views, fileOrder})
			}
		}
	}
	return out
}

// gridStep is the distance of the places tried besides those that touch
// something, paper mm.
const gridStep = 10

// drop puts a cluster at the free place nearest to a corner.
func (l *layout) drop(members []int, c corner) bool {
	e := nothing()
	for _, m := range members {
		e = e.union(l.items[m].here())
	}
	b, s := e.box(), l.space.Grow(-leastEdge)
	xs := l.stops(b.Min.X, b.Max.X, s.Min.X, s.Max.X, func(o drawing.Box) (float64, float64) { return o.Min.X, o.Max.X })
	ys := l.stops(b.Min.Y, b.Max.Y, s.Min.Y, s.Max.Y, func(o drawing.Box) (float64, float64) { return o.Min.Y, o.Max.Y })
	mine, others := l.rooms(members)
	best, bestScore := vec.V2{}, math.Inf(1)
	for _, y := range ys {
		for _, x := range xs {
			d := vec.V2{X: x, Y: y}
			if score := c.distance(b, d, s); score < bestScore-slack && free(mine, others, d) {
				best, bestScore = d, score
			}
		}
	}
	if math.IsInf(bestScore, 1) {
		return false
	}
	for _, m := range members {
		l.items[m].at = l.items[m].at.Add(best)
	}
	return true
}

// distance is how far a box moved by d lies from the corner of the space, both
// ways together.
func (c corner) distance(b drawing.Box, d vec.V2, s drawing.Box) float64 {
	x, y := b.Min.X+d.X-s.Min.X, b.Min.Y+d.Y-s.Min.Y
	if c == topRight || c == bottomRight {
		x = s.Max.X - b.Max.X - d.X
	}
	if c == topLeft || c == topRight {
		y = s.Max.Y - b.Max.Y - d.Y
	}
	return x + y
}

// stops lists shifts of an interval lo..hi to try within least..most: against the
// borders, against everything placed, in line with it, and on a grid.
func (l *layout) stops(lo, hi, least, most float64, side func(drawing.Box) (float64, float64)) []float64 {
	out := []float64{least - lo, most - hi}
	add := func(e extent) {
		a, b := side(e.box())
		out = append(out, b+leastGap-lo, a-leastGap-hi, a-lo, b-hi)
	}
	for _, e := range l.blocked {
		add(e)
	}
	for i, t := range l.items {
		if l.placed[i] {
			add(t.here())
		}
	}
	for x := least - lo; x <= most-hi; x += gridStep {
		out = append(out, x)
	}
	kept := out[:0]
	for _, x := range out {
		if x >= least-lo-slack && x <= most-hi+slack {
			kept = append(kept, x)
		}
	}
	return kept
}

// rooms are the rooms of the members, and of all that they must keep clear of.
func (l *layout) rooms(members []int) (mine, others []extent) {
	for _, m := range members {
		mine = append(mine, l.items[m].here())
	}
	others = append(others, l.blocked...)
	for i, t := range l.items {
		if l.placed[i] {
			others = append(others, t.here())
		}
	}
	return mine, others
}

// free reports whether rooms, moved by d, are clear of others.
func free(mine, others []extent, d vec.V2) bool {
	for _, m := range mine {
		e := m.moved(d)
		for i := range others {
			if !e.clears(&others[i], leastGap-slack) {
				return false
			}
		}
	}
	return true
}
