package compose

import (
	"math"
	"sort"

	"epure/geom/vec"
	"epure/render/drawing"
)

// Arrangement. Views that stand in projection are one cluster: each child lies
// on the line of its projectors as near to its parent as the room of all
// members lets it. Clusters, tables and notes are then put into the space, the
// largest first, each as near to its corner as it can lie without touching. A handful of
// choices of corners is tried; of those that succeed the roomiest is kept, and
// last the free distances are evened out.
//
// There is no chance in it: the same views give the same sheet.

// Distances between the rooms of things, paper mm. Rooms hold overshoots,
// dimensions and captions already, so outlines stand 10 to 15 mm apart at least.
const (
	leastGap  = 7.0
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
	order   []int // the roots of clusters as they are placed
	placed  []bool
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

// enoughTries is the number of arrangements among which the roomiest is chosen.
const enoughTries = 4

// laterCost is what a later choice of corners must be roomier by, mm: the first
// ones are those that a draughtsman would try first.
const laterCost = 2

// arrange places all items. It reports whether they fit.
func (l *layout) arrange() bool {
	roots := l.roots()
	if !l.mayFit(roots) {
		return false
	}
	var best []item
	bestScore, found := math.Inf(-1), 0
	start := append([]item(nil), l.items...)
	for _, s := range strategies() {
		copy(l.items, start)
		if !l.try(s, roots) {
			continue
		}
		if !l.tight {
			l.even()
		}
		if score := l.airiness() - float64(found)*laterCost; score > bestScore+slack {
			bestScore, best = score, append([]item(nil), l.items...)
		}
		if found++; found == enoughTries {
			break
		}
	}
	if best == nil {
		return false
	}
	copy(l.items, best)
	return true
}

// roots packs all clusters and lists their roots in file order.
func (l *layout) roots() []int {
	var roots []int
	for i, t := range l.items {
		if t.parent < 0 || t.fixed {
			l.pack(l.clusterOf(i))
			roots = append(roots, i)
		}
	}
	return roots
}

// clusterRoom is the extent of a cluster where it lies now.
func (l *layout) clusterRoom(root int) extent {
	e := nothing()
	for _, m := range l.clusterOf(root) {
		e = e.union(l.items[m].here())
	}
	return e
}

// mayFit weeds out what cannot fit: a cluster larger than the space, or more
// area than there is.
func (l *layout) mayFit(roots []int) bool {
	area := 0.0
	for _, r := range roots {
		b := l.clusterRoom(r).box()
		if b.Width() > l.space.Width()-2*leastEdge || b.Height() > l.space.Height()-2*leastEdge {
			return false
		}
		for _, m := range l.clusterOf(r) {
			area += l.items[m].room.area()
		}
	}
	for _, e := range l.blocked {
		area += e.area()
	}
	return area <= l.space.Width()*l.space.Height()
}

// try places every cluster by one strategy.
func (l *layout) try(s strategy, roots []int) bool {
	l.placed = make([]bool, len(l.items))
	for i, t := range l.items {
		l.placed[i] = t.fixed
	}
	l.order = l.sorted(s, roots)
	for _, r := range l.order {
		members := l.clusterOf(r)
		if !l.items[r].fixed && !l.drop(members, l.cornerFor(s, r, roots)) {
			return false
		}
		for _, m := range members {
			l.placed[m] = true
		}
	}
	return true
}

// mainRoot is the first cluster of views, the one that the sheet is about.
func (l *layout) mainRoot(roots []int) int {
	for _, r := range roots {
		if l.items[r].kind == viewItem {
			return r
		}
	}
	return -1
}

func (l *layout) cornerFor(s strategy, root int, roots []int) corner {
	switch {
	case root == l.mainRoot(roots):
		return s.main
	case l.items[root].kind == tableItem:
		return s.tables
	case l.items[root].kind == noteItem:
		return bottomRight
	}
	return s.views
}

// sorted orders clusters: fixed ones, the main one, views by area, tables, notes.
func (l *layout) sorted(s strategy, roots []int) []int {
	out := append([]int(nil), roots...)
	main := l.mainRoot(roots)
	rank := func(r int) int {
		switch {
		case l.items[r].fixed:
			return 0
		case r == main:
			return 1
		}
		return 2 + int(l.items[r].kind)
	}
	sort.SliceStable(out, func(i, j int) bool {
		a, b := out[i], out[j]
		if rank(a) != rank(b) {
			return rank(a) < rank(b)
		}
		return !s.fileOrder && l.clusterRoom(a).area() > l.clusterRoom(b).area()
	})
	return out
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
