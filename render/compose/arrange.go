package compose

import (
	"math"

	"epure/geom/vec"
	"epure/render/drawing"
)

// Arrangement. Views that stand in projection are one cluster: each child lies
// on the line of its projectors as near to its parent as the room of all
// members lets it. Clusters, tables and notes are then put into the space, one
// after the other, each as near to one of the corners as it can lie without
// touching. Several orders and corners are tried; of the first few that succeed
// the roomiest is kept, after its free distances have been evened out.
//
// There is no chance in it: the same views give the same sheet.

// Distances between the rooms of things, paper mm. Rooms hold overshoots,
// dimensions and captions already, so outlines stand 10 to 15 mm apart at least.
const (
	leastGap  = 6.0
	leastEdge = 3.0  // to the frame
	bestGap   = 30.0 // views in projection are not spread farther than this
)

// kind orders things by what they are.
type kind uint8

const (
	viewItem kind = iota
	tableItem
	noteItem
)

// item is one thing to be placed. Its room has its own origin at (0, 0).
type item struct {
	kind   kind
	room   extent
	parent int    // the item from which it is put along toward; -1: none
	toward vec.V2 // unit
	fixed  bool   // at is given
	at     vec.V2 // where its origin comes to lie
}

// here is the room of the item where it lies.
func (t item) here() extent { return t.room.moved(t.at) }

// layout is the space and what lies in it.
type layout struct {
	space   drawing.Box
	blocked []extent // title block and the like
	items   []item
	tight   bool // things stay where they were put: nothing is evened out
}

// clusterOf returns the root's cluster: the root, then its descendants in file order.
func (l *layout) clusterOf(root int) []int {
	members := []int{root}
	for i := 0; i < len(members); i++ {
		for j, t := range l.items {
			if t.parent == members[i] && !t.fixed {
				members = append(members, j)
			}
		}
	}
	return members
}

// pack gives every child its place beside its parent, the root lying at (0, 0) or where it is fixed.
func (l *layout) pack(members []int) {
	root := &l.items[members[0]]
	if !root.fixed {
		root.at = vec.V2{}
	}
	for n, m := range members[1:] {
		t := &l.items[m]
		parent := l.items[t.parent]
		k := apartAlong(parent.room.moved(parent.at), t.room.moved(parent.at), t.toward, leastGap)
		for again := true; again; {
			again = false
			t.at = parent.at.Along(t.toward, k)
			for _, o := range members[:n+1] {
				if need := apartAlong(l.items[o].here(), t.room.moved(parent.at), t.toward, leastGap); t.here().gap(l.items[o].here()) < leastGap-slack && need > k+slack {
					k, again = need, true
				}
			}
		}
	}
}

// slack is what sums of paper distances may miss by: 1e-9 mm is a thousand times the
// rounding of coordinates on the largest sheet, and nothing on paper.
const slack = 1e-9

// apartAlong is the least distance by which b must be moved along u so that it
// stands gap clear of a, on the side to which u points.
func apartAlong(a, b extent, u vec.V2, gap float64) float64 {
	best := math.Inf(1)
	for i, d := range compass() {
		switch c := d.Dot(u); {
		case c > slack:
			best = min(best, (gap+a.hi[i]-b.lo[i])/c)
		case c < -slack:
			best = min(best, (gap+b.hi[i]-a.lo[i])/-c)
		}
	}
	return best
}

// cluster is a group of items that keep their places among each other.
type cluster struct {
	members []int
	rooms   []extent // of the members, where they lie before the cluster is placed
	box     drawing.Box
	area    float64
	kind    kind
	fixed   bool
}

// clusters packs and lists the clusters, in file order of their roots.
func (l *layout) clusters() []cluster {
	var out []cluster
	for i, t := range l.items {
		if t.parent >= 0 && !t.fixed {
			continue
		}
		c := cluster{members: l.clusterOf(i), kind: t.kind, fixed: t.fixed}
		l.pack(c.members)
		all := nothing()
		for _, m := range c.members {
			e := l.items[m].here()
			c.rooms, c.area, all = append(c.rooms, e), c.area+e.area(), all.union(e)
		}
		c.box = all.box()
		out = append(out, c)
	}
	return out
}

// mostFilled is the share of a sheet that things may cover: with more it would be cramped however
// they lie, and looking for a way is what takes longest.
const mostFilled = 0.8

// mayFit weeds out what cannot fit: a cluster larger than the space, or more
// area than may be covered; a figure, which is cropped round its content, may be full.
func (l *layout) mayFit(all []cluster) bool {
	area, s := 0.0, l.space.Grow(-leastEdge)
	for _, c := range all {
		if c.box.Width() > s.Width() || c.box.Height() > s.Height() {
			return false
		}
		area += c.area
	}
	for _, e := range l.blocked {
		area += e.area()
	}
	free := s.Width() * s.Height()
	if !l.tight {
		free *= mostFilled
	}
	return area <= free
}

// enoughTries is the number of arrangements among which the roomiest is chosen.
const enoughTries = 4

// laterCost is what a later choice of corners must be roomier by, mm: the first
// ones are those that a draughtsman would try first.
const laterCost = 2

// arrange places all items. It reports whether they fit.
func (l *layout) arrange() bool {
	all := l.clusters()
	if !l.mayFit(all) {
		return false
	}
	start := append([]item(nil), l.items...)
	var best []item
	bestScore := math.Inf(-1)
	for i, shifts := range l.search(all) {
		copy(l.items, start)
		for c, d := range shifts {
			l.shift(all[c].members, d)
		}
		if !l.tight {
			l.even(all)
		}
		if score := l.airiness() - float64(i)*laterCost; score > bestScore+slack {
			bestScore, best = score, append([]item(nil), l.items...)
		}
	}
	if best == nil {
		return false
	}
	copy(l.items, best)
	return true
}

func (l *layout) shift(members []int, d vec.V2) {
	for _, m := range members {
		l.items[m].at = l.items[m].at.Add(d)
	}
}

// airiness is the least gap between any two things, up to bestGap; then the mean
// counts a little, so that of equally tight sheets the more even one is kept.
func (l *layout) airiness() float64 {
	least, sum, n := math.Inf(1), 0.0, 0
	for i, t := range l.items {
		for _, o := range l.items[i+1:] {
			g := min(bestGap, t.here().gap(o.here()))
			least, sum, n = min(least, g), sum+g, n+1
		}
		for _, o := range l.blocked {
			least = min(least, t.here().gap(o))
		}
	}
	if n == 0 {
		return 0
	}
	const little = 0.1
	return min(least, bestGap) + little*sum/float64(n)
}
