package flat

import (
	"math"

	"epure/geom/surface"
)

// profile is an edge in natural coordinates. With w = k + c·cos phi + s·sin phi
// the edge has u = w on a cylinder (recip false) and u = 1/w on a cone (recip
// true): the generator of direction D meets the plane n·x = d at u = d/(n·D).
type profile struct {
	recip   bool
	k, c, s float64
}

// squareSine is the sine of the angle between a plane's normal and the axis
// under which the cut counts as square, so that its edge is a circle: 1e-14 is
// some fifty units in the last place of a unit vector, the rounding of a few
// frame changes; taking the circle moves the edge by no more than that share
// of the radius.
const squareSine = 1e-14

// profileOf returns the profile that a plane cuts; false when the plane holds
// generators (it runs through a cone's apex or along a cylinder's axis).
func (r roll) profileOf(p surface.Plane) (profile, bool) {
	n := r.f.Dir(p.F.Z)
	d := 0 - r.f.O.Sub(p.F.O).Dot(p.F.Z) // n·x = d in the frame's own coordinates
	if math.Hypot(n.X, n.Y) < squareSine {
		n.X, n.Y = 0, 0
	}
	sin, cos := math.Sincos(r.seam)
	c := float64(n.X*cos) + float64(n.Y*sin)
	s := float64(n.Y*cos) - float64(n.X*sin)
	if r.cone {
		if d == 0 {
			return profile{}, false
		}
		return profile{true, float64(r.side*r.cos) * n.Z / d, r.sin * c / d, r.sin * s / d}, true
	}
	if n.Z == 0 {
		return profile{}, false
	}
	return profile{false, d / n.Z, 0 - r.r*c/n.Z, 0 - r.r*s/n.Z}, true
}

// square tells whether the edge is a circle about the axis.
func (p profile) square() bool { return p.c == 0 && p.s == 0 }

// w returns the n-th derivative of w.
func (p profile) w(phi float64, n int) float64 {
	sin, cos := math.Sincos(phi)
	switch n % 4 {
	case 1:
		sin, cos = cos, -sin
	case 2:
		sin, cos = -sin, -cos
	case 3:
		sin, cos = -cos, sin
	}
	v := float64(p.c*cos) + float64(p.s*sin)
	if n == 0 {
		v += p.k
	}
	return v
}

// u returns u at phi.
func (p profile) u(phi float64) float64 {
	if p.recip {
		return 1 / p.w(phi, 0)
	}
	return p.w(phi, 0)
}

// derivs returns u and its derivatives up to order n. On a cone they follow
// from u·w = 1, differentiated by the rule of the product.
func (p profile) derivs(phi float64, n int) []float64 {
	d := make([]float64, n+1)
	for m := range d {
		if !p.recip {
			d[m] = p.w(phi, m)
			continue
		}
		sum, binom := 0.0, 1.0
		for j := 1; j <= m; j++ {
			binom = binom * float64(m-j+1) / float64(j)
			sum += float64(binom*p.w(phi, j)) * d[m-j]
		}
		if m == 0 {
			sum = -1
		}
		d[m] = 0 - sum/p.w(phi, 0)
	}
	return d
}

// turns returns the two angles in [0, turn) at which u is extreme; none for a square edge.
func (p profile) turns() []float64 {
	if p.square() {
		return nil
	}
	a := math.Atan2(p.s, p.c)
	return []float64{wrap(a), wrap(a + math.Pi)}
}

// within returns those of the angles, moved by whole turns, that lie in [a, b].
func within(angles []float64, a, b float64) []float64 {
	var in []float64
	for _, t := range angles {
		t += turn * math.Ceil((a-t)/turn)
		for ; t <= b; t += turn {
			in = append(in, t)
		}
	}
	return in
}
