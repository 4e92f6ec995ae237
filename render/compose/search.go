package compose

import (
	"sort"

	"epure/geom/vec"
)

// The search for an arrangement. The first cluster of views, which the sheet is
// about, and the one after it are tried in every corner; for the rest the first
// choice that leads anywhere will do. A cluster that finds no place at all ends
// its branch at once, since no corner can help it.

// corner is a corner of the space.
type corner uint8

const (
	topLeft corner = iota
	topRight
	bottomLeft
	bottomRight
)

// corners are those that a kind of cluster seeks, the best first.
func (k kind) corners() []corner {
	if k == noteItem { // beside the title block
		return []corner{bottomRight, bottomLeft, topRight, topLeft}
	}
	return []corner{topRight, topLeft, bottomLeft, bottomRight}
}

// order says in which order clusters are placed, after the main one.
type order uint8

const (
	viewsByArea order = iota // views, then tables, then notes; the largest first
	allByArea                // all mixed, the largest first
	allByHeight              // all mixed, the tallest first
	viewsInFile              // views as in the file, then tables, then notes
)

// searchBudget bounds the clusters dropped in one search: some milliseconds.
const searchBudget = 600

// search is the state of a search: the clusters, in the order in which they are
// placed; the shift of each; and what lies on the sheet.
type search struct {
	l      *layout
	all    []cluster
	order  []int
	shifts []vec.V2
	lying  []extent
	left   int
}

// search returns the shifts of the clusters in up to enoughTries arrangements.
func (l *layout) search(all []cluster) [][]vec.V2 {
	var found [][]vec.V2
	s := &search{l: l, all: all, left: searchBudget}
	for _, o := range []order{viewsByArea, allByArea, allByHeight, viewsInFile} {
		s.begin(o)
		first := 0
		for first < len(s.order) && all[s.order[first]].fixed {
			first++
		}
		s.branch(first, []corner{topLeft, topRight, bottomLeft}, func() bool {
			return s.branchAll(first+1, func() bool {
				if s.rest(first + 2) {
					found = append(found, append([]vec.V2(nil), s.shifts...))
				}
				return len(found) >= enoughTries
			})
		})
		if len(found) >= enoughTries {
			break
		}
	}
	return found
}

// begin puts the clusters into an order and what is fixed on the sheet.
func (s *search) begin(o order) {
	s.order = s.order[:0]
	for i := range s.all {
		s.order = append(s.order, i)
	}
	rank, size := s.ranks(o)
	sort.SliceStable(s.order, func(i, j int) bool {
		a, b := s.order[i], s.order[j]
		if rank[a] != rank[b] {
			return rank[a] < rank[b]
		}
		return size[a] > size[b]
	})
	s.shifts = make([]vec.V2, len(s.all))
	s.lying = append(s.lying[:0], s.l.blocked...)
	for _, c := range s.all {
		if c.fixed {
			s.lying = append(s.lying, c.rooms...)
		}
	}
}

// ranks are what an order sorts by: first the fixed clusters, then the main one.
func (s *search) ranks(o order) (rank []int, size []float64) {
	rank, size = make([]int, len(s.all)), make([]float64, len(s.all))
	mainSeen := false
	for i, c := range s.all {
		switch {
		case c.fixed:
		case c.kind == viewItem && !mainSeen:
			rank[i], mainSeen = 1, true
		case o == allByArea || o == allByHeight:
			rank[i] = 2
		default:
			rank[i] = 2 + int(c.kind)
		}
		switch o {
		case viewsByArea, allByArea:
			size[i] = c.area
		case allByHeight:
			size[i] = c.box.Height()
		}
	}
	return rank, size
}

// branchAll is branch over the corners of the n-th cluster's kind.
func (s *search) branchAll(n int, then func() bool) bool {
	if n >= len(s.order) {
		return then()
	}
	return s.branch(n, s.all[s.order[n]].kind.corners(), then)
}

// branch places the n-th cluster in one corner after the other and goes on with
// then, until that reports true.
func (s *search) branch(n int, corners []corner, then func() bool) bool {
	if n >= len(s.order) {
		return then()
	}
	c := &s.all[s.order[n]]
	var tried []vec.V2
	for _, k := range corners {
		d, ok := s.drop(c, k)
		if !ok {
			return false
		}
		if seen(tried, d) {
			continue
		}
		tried = append(tried, d)
		mark := len(s.lying)
		for _, e := range c.rooms {
			s.lying = append(s.lying, e.moved(d))
		}
		s.shifts[s.order[n]] = d
		done := then()
		s.lying = s.lying[:mark]
		if done {
			return true
		}
	}
	return false
}

// rest places the clusters from the n-th on, however they go.
func (s *search) rest(n int) bool {
	return s.branchAll(n, func() bool { return n >= len(s.order) || s.rest(n+1) })
}

func seen(tried []vec.V2, d vec.V2) bool {
	for _, t := range tried {
		if t == d {
			return true
		}
	}
	return false
}
