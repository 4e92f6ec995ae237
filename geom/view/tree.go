package view

import (
	"slices"

	"epure/geom/vec"
)

// box is a rectangle of the view plane, mm.
type box struct{ lo, hi vec.V2 }

func (a box) meets(b box) bool {
	return a.lo.X <= b.hi.X && b.lo.X <= a.hi.X && a.lo.Y <= b.hi.Y && b.lo.Y <= a.hi.Y
}

func (a box) with(b box) box {
	return box{vec.V2{X: min(a.lo.X, b.lo.X), Y: min(a.lo.Y, b.lo.Y)}, vec.V2{X: max(a.hi.X, b.hi.X), Y: max(a.hi.Y, b.hi.Y)}}
}

func (a box) grown(e float64) box {
	return box{vec.V2{X: a.lo.X - e, Y: a.lo.Y - e}, vec.V2{X: a.hi.X + e, Y: a.hi.Y + e}}
}

// tree finds the boxes that meet a given one. It is built once, by halving the
// boxes at the median of their middles across the longer side; it is never
// changed after. A question costs the logarithm of their number plus what it finds.
type tree struct {
	boxes []box
	order []int // indexes of boxes, those of one node side by side
	nodes []node
}

type node struct {
	box
	first, count int // of order
	right        int // the left child follows its parent; 0 for a leaf
}

// leafSize is the number of boxes under which halving no longer pays (measured: 4 to 16 are alike).
const leafSize = 8

func newTree(boxes []box) *tree {
	t := &tree{boxes: boxes, order: make([]int, len(boxes))}
	for i := range t.order {
		t.order[i] = i
	}
	if len(boxes) > 0 {
		t.build(0, len(boxes))
	}
	return t
}

func (t *tree) build(first, count int) {
	items := t.order[first : first+count]
	all := t.boxes[items[0]]
	for _, i := range items[1:] {
		all = all.with(t.boxes[i])
	}
	k := len(t.nodes)
	t.nodes = append(t.nodes, node{all, first, count, 0})
	if count <= leafSize {
		return
	}
	t.halve(items, all.hi.X-all.lo.X >= all.hi.Y-all.lo.Y)
	t.build(first, count/2)
	t.nodes[k].right = len(t.nodes)
	t.build(first+count/2, count-count/2)
}

// halve sorts the items by the middles of their boxes across x or y.
func (t *tree) halve(items []int, acrossX bool) {
	slices.SortFunc(items, func(i, j int) int {
		a, b := t.boxes[i], t.boxes[j]
		d := a.lo.X + a.hi.X - b.lo.X - b.hi.X
		if !acrossX {
			d = a.lo.Y + a.hi.Y - b.lo.Y - b.hi.Y
		}
		switch {
		case d < 0:
			return -1
		case d > 0:
			return 1
		}
		return i - j
	})
}

// find appends to found the indexes of the boxes that meet b.
func (t *tree) find(found []int, b box) []int {
	if len(t.nodes) == 0 {
		return found
	}
	return t.under(found, b, 0)
}

func (t *tree) under(found []int, b box, k int) []int {
	n := &t.nodes[k]
	if !n.meets(b) {
		return found
	}
	if n.right > 0 {
		return t.under(t.under(found, b, k+1), b, n.right)
	}
	for _, i := range t.order[n.first : n.first+n.count] {
		if t.boxes[i].meets(b) {
			found = append(found, i)
		}
	}
	return found
}
