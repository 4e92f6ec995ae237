package body

import (
	"fmt"
	"math"

	"epure/geom/num"
	"epure/geom/surface"
	"epure/geom/vec"
)

// OutlineError says why a polygon bounds no solid.
type OutlineError struct {
	// Corner is the index of the corner to blame.
	Corner int
	Why    string
}

// Error says which corner is wrong and why.
func (e *OutlineError) Error() string { return fmt.Sprintf("corner %d: %s", e.Corner+1, e.Why) }

// Prism returns the solid between a simple polygon in the plane of f (corners anticlockwise
// looking against f.Z, mm) and its copy moved by along, which must leave the plane toward f.Z.
// Its faces are name+".base", name+".top" and for each side name+".side(n)", n from 1, the side that starts at corner n.
func Prism(name string, f vec.Frame, outline []vec.V2, along vec.V3) (*Body, error) {
	lift := func(q vec.V2) vec.V3 { return f.Lift(q).Add(along) }
	return polyhedron(name, f, outline, along.Dot(f.Z), func(vec.V2) vec.V3 { return along }, lift)
}

// Pyramid returns the solid between a simple polygon in the plane of f and the apex, which must
// lie on the side of f.Z; with 0 < top < 1 the frustum that ends at that share of the height. The faces are
// named as those of Prism; a pyramid with an apex has no top.
func Pyramid(name string, f vec.Frame, outline []vec.V2, apex vec.V3, top float64) (*Body, error) {
	toward := func(q vec.V2) vec.V3 { return apex.Sub(f.Lift(q)) }
	high := f.Local(apex).Z
	if top <= 0 {
		return polyhedron(name, f, outline, 0, toward, func(vec.V2) vec.V3 { return apex })
	}
	lift := func(q vec.V2) vec.V3 { return f.Lift(q).Along(toward(q), top) }
	return polyhedron(name, f, outline, top*high, toward, lift)
}

// polyhedron makes the body over an outline whose corners go up along rise and end at lift; high
// is the level of the top in f, 0 for none.
func polyhedron(name string, f vec.Frame, outline []vec.V2, high float64, rise func(vec.V2) vec.V3, lift func(vec.V2) vec.V3) (*Body, error) {
	corners, first, err := simple(outline)
	if err != nil {
		return nil, err
	}
	b := &Body{}
	var all []vec.V3
	for _, q := range corners {
		all = append(all, f.Lift(q), lift(q))
	}
	b.middle, b.size = bubble(all)
	b.Faces = append(b.Faces, Face{surface.Plane{F: vec.Frame{O: f.O, X: f.X, Y: f.Y.Neg(), Z: f.Z.Neg()}}, name + ".base"})
	t := tree{op: and, kids: []tree{{face: 0}}}
	if high > 0 {
		b.Faces = append(b.Faces, Face{surface.Plane{F: f.At(lift(corners[0]))}, name + ".top"})
		t.kids = append(t.kids, tree{face: 1})
	}
	sides := make([]int, len(corners))
	for i, q := range corners {
		along := f.X.Scale(corners[(i+1)%len(corners)].Sub(q).X).Along(f.Y, corners[(i+1)%len(corners)].Sub(q).Y)
		p := surface.Plane{F: vec.PlaneFrame(f.Lift(q), along.Cross(rise(q)))}
		label := fmt.Sprintf("%s.side(%d)", name, first[i]+1)
		if k := b.coincident(p); k >= 0 { // two sides in one plane are one face
			sides[i] = k
			b.alias = append(b.alias, alias{label, k})
			continue
		}
		sides[i] = len(b.Faces)
		b.Faces = append(b.Faces, Face{p, label})
	}
	t.kids = append(t.kids, within(corners, sides))
	b.tree = t
	b.edges = b.allEdges()
	return b, nil
}

// bubble is the middle of the box round points and the radius of the sphere about it that holds them.
func bubble(ps []vec.V3) (middle vec.V3, radius float64) {
	lo, hi := ps[0], ps[0]
	for _, p := range ps {
		lo = vec.V3{X: min(lo.X, p.X), Y: min(lo.Y, p.Y), Z: min(lo.Z, p.Z)}
		hi = vec.V3{X: max(hi.X, p.X), Y: max(hi.Y, p.Y), Z: max(hi.Z, p.Z)}
	}
	middle = lo.Add(hi).Scale(0.5)
	for _, p := range ps {
		radius = max(radius, p.Dist(middle))
	}
	return middle, radius
}

// CheckOutline tells whether a polygon bounds an area that a solid can stand on; the error is an *OutlineError.
func CheckOutline(outline []vec.V2) error {
	_, _, err := simple(outline)
	return err
}

// simple is the outline anticlockwise without corners at which it runs straight on, with the index
// in the outline of each corner that is left; an error when it crosses or touches itself.
func simple(outline []vec.V2) (corners []vec.V2, first []int, err error) {
	n := len(outline)
	clockwise := Shoelace(outline) < 0
	order := make([]int, n)
	for i := range order {
		order[i] = i
		if i > 0 && clockwise {
			order[i] = n - i
		}
	}
	for k, i := range order {
		p, q, r := outline[order[(k+n-1)%n]], outline[i], outline[order[(k+1)%n]]
		if q == r {
			return nil, nil, &OutlineError{i, "it stands twice"}
		}
		u, v := q.Sub(p).Unit(), r.Sub(q).Unit()
		switch turn := u.Cross(v); {
		case math.Abs(turn) <= num.Place && u.Dot(v) < 0:
			return nil, nil, &OutlineError{i, "the outline turns back on itself there"}
		case math.Abs(turn) > num.Place:
			corners, first = append(corners, q), append(first, i)
		}
	}
	if len(corners) < 3 {
		return nil, nil, &OutlineError{0, "the corners lie in one line"}
	}
	for i := range corners {
		for j := i + 2; j < len(corners); j++ {
			if i == 0 && j == len(corners)-1 {
				continue
			}
			if touching(corners[i], corners[i+1], corners[j], corners[(j+1)%len(corners)]) {
				return nil, nil, &OutlineError{first[j], "the side that starts there meets another side"}
			}
		}
	}
	return corners, first, nil
}

// touching tells whether the segments ab and cd have a point in common.
func touching(a, b, c, d vec.V2) bool {
	side := func(p, q, r vec.V2) num.Sign {
		u, v := q.Sub(p), r.Sub(p)
		return num.SignOf(u.Cross(v), num.Place*u.Len()*max(u.Len(), v.Len()))
	}
	s, t := side(a, b, c)*side(a, b, d), side(c, d, a)*side(c, d, b)
	if s == num.Zero && t == num.Zero { // in one line, or corner on corner
		u := b.Sub(a).Unit()
		lo, hi := min(c.Sub(a).Dot(u), d.Sub(a).Dot(u)), max(c.Sub(a).Dot(u), d.Sub(a).Dot(u))
		return hi >= 0 && lo <= b.Dist(a)
	}
	return s <= num.Zero && t <= num.Zero
}

// Shoelace is the area inside a polygon, mm², positive when its corners run anticlockwise.
func Shoelace(corners []vec.V2) float64 {
	sum := 0.0
	for i, p := range corners {
		sum += p.Sub(corners[0]).Cross(corners[(i+1)%len(corners)].Sub(corners[0]))
	}
	return sum / 2
}

// within is the tree of the half-planes of a simple polygon's sides, each once: sides that meet at
// a corner of the hull of their chain are joined by and where the corner juts out, by or
// where it goes in (D. Dobkin, L. Guibas, J. Hershberger, J. Snoeyink, An efficient algorithm for finding the CSG
// representation of a simple polygon, 1988; from memory).
func within(corners []vec.V2, sides []int) tree {
	n := len(corners)
	lo, hi := 0, 0
	before := func(a, b vec.V2) bool { return a.X < b.X || a.X == b.X && a.Y < b.Y }
	for i, p := range corners {
		if before(p, corners[lo]) {
			lo = i
		}
		if before(corners[hi], p) {
			hi = i
		}
	}
	c := chainer{corners, sides}
	return tree{op: and, kids: []tree{c.chain(lo, (hi-lo+n)%n), c.chain(hi, (lo-hi+n)%n)}}
}

type chainer struct {
	corners []vec.V2
	sides   []int
}

func (c chainer) at(i int) vec.V2 { return c.corners[i%len(c.corners)] }

// chain is the tree of the count sides that start at corner i, the first and the last of them
// running on without end.
func (c chainer) chain(i, count int) tree {
	if count == 1 {
		return tree{face: c.sides[i%len(c.sides)]}
	}
	in := c.at(i + 1).Sub(c.at(i)).Unit()
	out := c.at(i + count).Sub(c.at(i + count - 1)).Unit()
	away := in.Sub(out) // both endless sides run the other way
	if away.Len() <= num.Place {
		away = in.Left()
	}
	k, far := 1, math.Inf(-1)
	for j := 1; j < count; j++ {
		if v := c.at(i + j).Sub(c.at(i)).Dot(away); v > far {
			k, far = j, v
		}
	}
	op := or
	if c.at(i+k).Sub(c.at(i+k-1)).Cross(c.at(i+k+1).Sub(c.at(i+k))) > 0 {
		op = and
	}
	return tree{op: op, kids: []tree{c.chain(i, k), c.chain(i+k, count-k)}}
}
