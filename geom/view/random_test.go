package view

import (
	"flag"
	"fmt"
	"math"
	"math/rand/v2"
	"testing"

	"epure/geom/body"
	"epure/geom/curve"
	"epure/geom/vec"
)

// A bigger count is run by hand: go test ./geom/view -run Random -scenes 100000 -timeout 0
var scenes = flag.Int("scenes", 120, "random scenes")

const seed = 20261

// The bounds of the comparison, relative to the largest solid.
//
// dip: a point whose ray dips this deep or less into a solid may be told
// either way; the package takes num.OnSurface = 1.5e-11 of its size in the middle of
// an interval, which is at most twice as deep somewhere else.
// near: a drawn piece may end this far from where it should, since images that touch cross there (see blur).
const (
	dip  = 4e-11
	near = 1e-5
	// graze: a hidden point is covered at least so deep, relative to the smallest solid; a ray that
	// only grazes a surface is about a hundredth of it deep.
	graze = 1e-12
	// double: images that lie this near each other over a stretch are one. Points err by a tenth of it;
	// an edge that touches a contour at its end stays a thousand times further off.
	double = 1e-12
)

type randomScene struct {
	name   string
	solids []solid
	bodies []*body.Body
	f      vec.Frame
	size   float64
}

func newRandom(k int) randomScene {
	r := rand.New(rand.NewPCG(seed, uint64(k)))
	s := randomScene{name: fmt.Sprintf("seed %d scene %d", seed, k), f: vec.ViewFrame(anywhere(r))}
	square := k%2 == 1
	if square || r.IntN(3) == 0 {
		s.f = vec.ViewFrame(along(r))
	}
	if r.IntN(4) == 0 { // an oblique pictorial
		s.f.X, s.f.Y = s.f.X.Scale(1.25).Along(s.f.Y, 0.4), s.f.Y.Scale(0.75)
	}
	for n := 1 + r.IntN(6); len(s.solids) < n; {
		one := random(r, square)
		if square && len(s.solids) > 0 && r.IntN(3) == 0 {
			one = beside(r, s.solids[len(s.solids)-1])
		}
		if b, ok := one.body(); ok {
			s.solids, s.bodies = append(s.solids, one), append(s.bodies, b)
			s.size = max(s.size, one.size())
		}
	}
	return s
}

// beside is a solid that touches s along a whole face: the other part of a cut, or a copy set on its end.
func beside(r *rand.Rand, s solid) solid {
	c := s
	if len(s.cuts) > 0 && r.IntN(2) == 0 {
		last := s.cuts[len(s.cuts)-1]
		c.cuts = append(append([]vec.Frame{}, s.cuts[:len(s.cuts)-1]...), vec.PlaneFrame(last.O, last.Z.Neg()))
		return c
	}
	c.f = s.f.At(s.f.Point(vec.V3{Z: s.h}))
	if s.ball { // the next one touches it in a point
		c.f = s.f.At(s.f.Point(vec.V3{Z: 2 * s.r0}))
	}
	c.cuts = nil
	return c
}

// deepest is how deep the ray from p to the viewer runs in any of the solids.
func (s randomScene) deepest(p vec.V3) float64 {
	v := math.Inf(1)
	for _, one := range s.solids {
		v = min(v, one.cover(p, s.f.Z))
	}
	return v
}

func TestRandomScenes(t *testing.T) {
	var points, rims int
	for k := range *scenes {
		s := newRandom(k)
		pieces := Lines(s.bodies, s.f)
		r := rand.New(rand.NewPCG(seed+1, uint64(k)))
		points += s.checkPieces(t, r, pieces)
		rims += s.checkRims(t, pieces)
	}
	t.Logf("%d scenes, %d points of pieces, %d points of edges and contours", *scenes, points, rims)
}

// checkPieces takes random points of every piece: they lie on the boundary of their solid, their
// image is the image of the space curve, they are as visible as the
// piece says, and no second piece runs through them.
func (s randomScene) checkPieces(t *testing.T, r *rand.Rand, pieces []Piece) (n int) {
	for i, p := range pieces {
		for range 4 {
			n++
			at := p.Image.T0 + (p.Image.T1-p.Image.T0)*(0.02+0.96*r.Float64())
			q := p.Space.At(p.SpaceAt(at))
			where := fmt.Sprintf("%s piece %d %+v at %v", s.name, i, p, q)
			if v := s.solids[p.Body].value(q); math.Abs(v) > dip*s.size {
				t.Fatalf("%s: off the boundary by %g", where, v)
			}
			if d := s.f.Flat(q).Dist(p.Image.At(at)); d > dip*s.size {
				t.Fatalf("%s: image off by %g", where, d)
			}
			v := s.deepest(q)
			if p.Visible && v < -dip*s.size || !p.Visible && v > -graze*s.smallest() {
				t.Fatalf("%s: depth %g", where, v)
			}
			s.checkSingle(t, pieces, i, at, where)
		}
	}
	return n
}

func (s randomScene) smallest() float64 {
	v := math.Inf(1)
	for _, b := range s.bodies {
		v = min(v, b.Size())
	}
	return v
}

// checkSingle: no other piece runs along with piece i about its parameter at.
// Two that touch there part again within a sixth of the piece.
func (s randomScene) checkSingle(t *testing.T, pieces []Piece, i int, at float64, where string) {
	p := pieces[i].Image
	for j, o := range pieces {
		along := j != i
		for k := -1.0; k <= 1 && along; k++ {
			u, d := nearest(o, p.At(at+k*(p.T1-p.T0)/12), 2*double*s.size)
			along = d < double*s.size && u > o.Image.T0 && u < o.Image.T1
		}
		if along {
			t.Fatalf("%s: drawn again by piece %d %+v", where, j, o)
		}
	}
}

// checkRims: every point of an edge or contour, worked out without the package,
// lies on a piece, and a visible one on a visible piece.
func (s randomScene) checkRims(t *testing.T, pieces []Piece) (n int) {
	for i, one := range s.solids {
		for _, q := range one.rim(s.f.Z, 24) {
			n++
			v := s.deepest(q)
			best, seen := math.Inf(1), math.Inf(1)
			for _, p := range pieces {
				if _, d := nearest(p, s.f.Flat(q), 2*near*s.size); p.Visible {
					seen = min(seen, d)
				} else {
					best = min(best, d)
				}
			}
			if min(best, seen) > near*s.size {
				t.Fatalf("%s solid %d: the edge point %v is not drawn: %g", s.name, i, q, best)
			}
			if v > -1e-12*s.size && seen > near*s.size {
				t.Fatalf("%s solid %d: the edge point %v is visible and drawn hidden: depth %g, distance %g", s.name, i, q, v, seen)
			}
		}
	}
	return n
}

// nearest is the parameter and distance of the point of the piece's image nearest q; far when it is
// further than that. No point of a stretch is further from its middle than half its
// greatest speed times its length, so stretches that cannot hold the nearest point are left.
func nearest(p Piece, q vec.V2, far float64) (u, d float64) {
	a := p.Image
	speed := func(t0, t1 float64) float64 {
		t := max(math.Abs(t0), math.Abs(t1))
		switch a.Form {
		case curve.Line:
			return a.U.Len()
		case curve.Parabola:
			return a.U.Len() + 2*t*a.W.Len()
		case curve.Hyperbola, curve.HyperbolaEnd:
			return math.Sinh(t)*a.U.Len() + math.Cosh(t)*a.W.Len()
		}
		return a.U.Len() + a.W.Len()
	}
	u, d = a.T0, far
	var search func(t0, t1 float64)
	search = func(t0, t1 float64) {
		m, v := (t0+t1)/2, speed(t0, t1)*(t1-t0)/2
		at := a.At(m).Dist(q)
		if at-v > d {
			return
		}
		if at < d {
			u, d = m, at
		}
		if v < 1e-2*far || m <= t0 || m >= t1 {
			return
		}
		left, right := a.At((t0+m)/2).Dist(q), a.At((m+t1)/2).Dist(q)
		if left < right {
			search(t0, m)
			search(m, t1)
		} else {
			search(m, t1)
			search(t0, m)
		}
	}
	search(a.T0, a.T1)
	return u, d
}
