package body

import (
	"math"
	"sort"

	"epure/geom/num"
	"epure/geom/vec"
)

// sheet is one face that leaves a piece of curve: the boundary of the material
// goes off in the direction Dir, square to the curve and along the face.
type sheet struct {
	face int
	dir  vec.V3
}

// around answers which faces really meet along a short piece of curve.
//
// at are points of the piece (its middle first, then two more), along its
// direction. The surfaces through all of the points cut the space round the
// curve into sectors. In each, the signs of these surfaces are forced to
// what they are there, the signs of all others are what they are at the point furthest from each;
// a face is boundary where membership changes from one sector to the next. No
// point is ever moved off a surface to ask, so nothing depends on a distance.
func (b *Body) around(at []vec.V3, along vec.V3) []sheet {
	signs := make([]num.Sign, len(b.Faces))
	var rays []ray
	for i := range b.Faces {
		v := b.furthest(i, at)
		signs[i] = num.SignOf(v, b.gap())
		if signs[i] != num.Zero {
			continue
		}
		n := b.Faces[i].Surface.Normal(at[0])
		if d := along.Cross(n); d.Len() > num.Join { // else the surface is crossed, not followed
			rays = append(rays, ray{sheet{i, d.Unit()}, n, 0}, ray{sheet{i, d.Unit().Neg()}, n, 0})
		}
	}
	if len(rays) == 0 {
		return nil
	}
	return b.changes(rays, along, signs)
}

// ray is a candidate sheet with its surface's normal and its angle about the curve.
type ray struct {
	sheet
	normal vec.V3
	angle  float64
}

// changes keeps the rays across which membership changes, in order of angle.
func (b *Body) changes(rays []ray, along vec.V3, signs []num.Sign) []sheet {
	x := rays[0].dir
	y := along.Cross(x)
	for i := range rays {
		rays[i].angle = num.Turn(math.Atan2(rays[i].dir.Dot(y), rays[i].dir.Dot(x)), 0)
	}
	sort.SliceStable(rays, func(i, j int) bool { return rays[i].angle < rays[j].angle })
	in := make([]bool, len(rays)) // in[i]: the sector after ray i
	for i, r := range rays {
		next := rays[(i+1)%len(rays)].angle
		if i+1 == len(rays) {
			next += 2 * math.Pi
		}
		sin, cos := math.Sincos((r.angle + next) / 2)
		in[i] = b.sector(x.Scale(cos).Along(y, sin), rays, signs)
	}
	var out []sheet
	for i, r := range rays {
		if in[i] != in[(i+len(rays)-1)%len(rays)] {
			out = append(out, r.sheet)
		}
	}
	return out
}

// sector tells whether the material fills the sector in the direction d.
func (b *Body) sector(d vec.V3, rays []ray, signs []num.Sign) bool {
	forced := append([]num.Sign(nil), signs...)
	for _, r := range rays {
		forced[r.face] = num.SignOf(d.Dot(r.normal), 0)
	}
	return b.tree.sign(forced) == num.Negative
}

// furthest is the value of face i at the point of at that lies furthest from it.
func (b *Body) furthest(i int, at []vec.V3) float64 {
	v := 0.0
	for _, p := range at {
		if w := b.Faces[i].Surface.Value(p); math.Abs(w) > math.Abs(v) {
			v = w
		}
	}
	return v
}

// Side tells whether p is inside (Negative), on (Zero, within the bound
// num.OnSurface·Size) or outside (Positive) the body.
func (b *Body) Side(p vec.V3) num.Sign { return b.sideOf([]vec.V3{p}) }

// sideOf is Side for a short piece that no surface crosses between the points.
func (b *Body) sideOf(at []vec.V3) num.Sign {
	signs := make([]num.Sign, len(b.Faces))
	for i := range b.Faces {
		signs[i] = num.SignOf(b.furthest(i, at), b.gap())
	}
	return b.tree.sign(signs)
}
