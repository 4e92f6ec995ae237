package compose

import (
	"math"

	"epure/geom/vec"
)

// Evening out. Every free cluster is moved to the middle of the room that it
// has to either side, every view in projection along its projectors likewise,
// again and again until nothing moves much. Notes stay in their corner.

// evenRounds bounds the rounds; each halves what is uneven, so that after thirty nothing
// is left to see.
const evenRounds = 30

// even evens out the distances of the arrangement.
func (l *layout) even(all []cluster) {
	for range evenRounds {
		moved := 0.0
		for i := range all {
			moved += l.evenCluster(&all[i])
		}
		if moved < 0.01 { // a hundredth of a millimetre over the whole sheet cannot be seen
			return
		}
	}
}

func (l *layout) evenCluster(c *cluster) float64 {
	moved := 0.0
	if c.kind == noteItem {
		return 0
	}
	for _, m := range c.members[1:] {
		moved += l.evenChild(m)
	}
	if c.fixed {
		return moved
	}
	for _, u := range []vec.V2{{X: 1}, {Y: 1}} {
		by := (l.travel(c.members, u) - l.travel(c.members, u.Scale(-1))) / 2
		l.shift(c.members, u.Scale(by))
		moved += math.Abs(by)
	}
	return moved
}

// evenChild moves a view in projection, with what hangs on it, along its
// projectors to the middle of its room, but no farther from its parent than bestGap.
func (l *layout) evenChild(m int) float64 {
	t := l.items[m]
	members := l.clusterOf(m)
	out, back := l.travel(members, t.toward), l.travel(members, t.toward.Scale(-1))
	now := t.here().gap(l.items[t.parent].here())
	by := max(-back, min((out-back)/2, bestGap-now))
	l.shift(members, t.toward.Scale(by))
	return math.Abs(by)
}

// travel is how far the members can go along u (unit) before they come within leastGap of
// anything else, or within leastEdge of the border.
func (l *layout) travel(members []int, u vec.V2) float64 {
	inside := make([]bool, len(l.items))
	for _, m := range members {
		inside[m] = true
	}
	far := math.Inf(1)
	for _, m := range members {
		e := l.items[m].here()
		far = min(far, l.toBorder(e, u))
		for _, o := range l.blocked {
			far = min(far, until(e, o, u))
		}
		for i, t := range l.items {
			if !inside[i] {
				far = min(far, until(e, t.here(), u))
			}
		}
	}
	return max(0, far)
}

// toBorder is how far e can go along u inside the space.
func (l *layout) toBorder(e extent, u vec.V2) float64 {
	b, s, far := e.box(), l.space.Grow(-leastEdge), math.Inf(1)
	for _, w := range [4][2]float64{{u.X, s.Max.X - b.Max.X}, {-u.X, b.Min.X - s.Min.X}, {u.Y, s.Max.Y - b.Max.Y}, {-u.Y, b.Min.Y - s.Min.Y}} {
		if w[0] > slack {
			far = min(far, w[1]/w[0])
		}
	}
	return far
}

// until is how far e can go along u before it comes within leastGap of o:
// for ever when one direction of the compass keeps them apart.
func until(e, o extent, u vec.V2) float64 {
	far := math.Inf(-1)
	for i, d := range compass() {
		c := d.Dot(u)
		for _, side := range [2][2]float64{{e.lo[i] - o.hi[i], c}, {o.lo[i] - e.hi[i], -c}} {
			switch clear := side[0] - leastGap; {
			case clear < -slack:
			case side[1] >= -slack:
				return math.Inf(1)
			default:
				far = max(far, clear/-side[1])
			}
		}
	}
	return max(0, far)
}
