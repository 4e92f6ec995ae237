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

// area is the area of the sixteen-sided figure, mm², from its support distances.
func (e extent) area() float64 {
	const n = 2 * compassSize
	h := func(i int) float64 {
		if i %= n; i < compassSize {
			return e.hi[i]
		}
		return -e.lo[i-compassSize]
	}
	s, c := math.Sincos(2 * math.Pi / n)
	sum := 0.0
	for i := range n {
		sum += h(i) * (h(i+n-1) + h(i+1) - 2*c*h(i)) / s
	}
	return max(0, sum/2)
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
