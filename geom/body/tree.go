package body

import "epure/geom/num"

// op joins the answers of a tree's branches.
type op uint8

const (
	leaf op = iota // inside the half-space of one face
	and
	or
	not
)

// tree is the boolean tree of a body over the half-spaces of its faces.
type tree struct {
	op   op
	face int
	kids []tree
}

// allOf is the intersection of the half-spaces of the faces 0 … n-1.
func allOf(n int) tree {
	t := tree{op: and}
	for i := range n {
		t.kids = append(t.kids, tree{face: i})
	}
	return t
}

// sign evaluates the tree over the signs of the faces' values: inside is
// Negative. A point on a face is on the body unless another face decides.
func (t tree) sign(of []num.Sign) num.Sign {
	switch t.op {
	case leaf:
		return of[t.face]
	case not:
		return -t.kids[0].sign(of)
	case and:
		s := num.Negative
		for _, k := range t.kids {
			s = max(s, k.sign(of))
		}
		return s
	}
	s := num.Positive
	for _, k := range t.kids {
		s = min(s, k.sign(of))
	}
	return s
}

// value evaluates the tree over signed distances from the faces.
func (t tree) value(of func(face int) float64) float64 {
	switch t.op {
	case leaf:
		return of(t.face)
	case not:
		return -t.kids[0].value(of)
	}
	v := t.kids[0].value(of)
	for _, k := range t.kids[1:] {
		if t.op == and {
			v = max(v, k.value(of))
		} else {
			v = min(v, k.value(of))
		}
	}
	return v
}

// convex tells whether the tree is an intersection.
func (t tree) convex() bool {
	if t.op != leaf && t.op != and {
		return false
	}
	for _, k := range t.kids {
		if !k.convex() {
			return false
		}
	}
	return true
}
