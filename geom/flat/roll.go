package flat

import (
	"math"

	"epure/geom/surface"
	"epure/geom/vec"
)

// turn is the whole turn in radians.
const turn = 2 * math.Pi

// roll is the isometry between the surface and the plane, with the natural
// coordinates (phi, u) in between: phi in [0, turn] is counted about the frame's
// Z from the seam, u is the slant distance from a cone's apex, or the height
// over the origin of a cylinder's frame.
type roll struct {
	f        vec.Frame
	cone     bool
	side     float64 // cone: the nappe opens toward side·f.Z
	sin, cos float64 // cone: of the half angle
	r        float64 // cylinder: radius
	seam     float64
	hand     float64 // +1 or -1: the flat angle (cone), x (cylinder) grows with phi or falls
}

// newRoll returns the isometry of a cone or cylinder.
//
// Hand of the cone: someone outside who sees F.Z up sees phi grow to the right.
// When the nappe opens downward (side -1) the material lies below the apex, and
// there "to the right" is anticlockwise about it; when it opens upward it is clockwise.
func newRoll(s surface.Surface, o Options) (roll, bool) {
	hand := 1.0
	if o.Inside {
		hand = -1
	}
	switch s := s.(type) {
	case surface.Cone:
		return roll{f: s.F, cone: true, side: s.Side, sin: s.Sin, cos: s.Cos, seam: o.Seam, hand: -s.Side * hand}, true
	case surface.Cylinder:
		return roll{f: s.F, r: s.R, seam: o.Seam, hand: hand}, true
	}
	return roll{}, false
}

// flat returns the point of the plane with the natural coordinates phi, u.
// Adding zero turns the mirror's -0 into 0.
func (r roll) flat(phi, u float64) vec.V2 {
	if !r.cone {
		return vec.V2{X: float64(r.hand*float64(r.r*phi)) + 0, Y: u}
	}
	s, c := math.Sincos(r.sin * phi)
	return vec.V2{X: float64(u*c) + 0, Y: float64(r.hand*float64(u*s)) + 0}
}

// unflat is the inverse of flat. The gap of a cone's pattern is shared out
// evenly, so that rounding at the seam does not throw a point a turn away.
func (r roll) unflat(q vec.V2) (phi, u float64) {
	if !r.cone {
		return float64(r.hand*q.X) / r.r, q.Y
	}
	psi := math.Atan2(float64(r.hand*q.Y), q.X)
	if psi < -math.Pi*(1-r.sin) {
		psi += turn
	}
	return psi / r.sin, q.Len()
}

// space returns the point of the surface with the natural coordinates phi, u.
func (r roll) space(phi, u float64) vec.V3 {
	s, c := math.Sincos(r.seam + phi)
	if !r.cone {
		return r.f.Point(vec.V3{X: r.r * c, Y: r.r * s, Z: u})
	}
	return r.f.Point(vec.V3{X: float64(u*r.sin) * c, Y: float64(u*r.sin) * s, Z: float64(u*r.cos) * r.side})
}

// coords returns the natural coordinates of the foot of p on the generator
// through p, phi in [0, turn).
func (r roll) coords(p vec.V3) (phi, u float64) {
	l := r.f.Local(p)
	phi = wrap(math.Atan2(l.Y, l.X) - r.seam)
	if !r.cone {
		return phi, l.Z
	}
	return phi, max(0, float64(math.Hypot(l.X, l.Y)*r.sin)+float64(l.Z*r.side)*r.cos)
}

// wrap brings an angle into [0, turn).
func wrap(a float64) float64 {
	a = math.Mod(a, turn)
	if a < 0 {
		a += turn
	}
	if a >= turn {
		return 0
	}
	return a
}

// turned tells whether the map (phi, u) to the plane changes the sense of a loop.
func (r roll) turned() bool {
	if r.cone {
		return r.hand > 0 // (phi, u) are polar angle and radius in this order
	}
	return r.hand < 0
}

// radius is the radius of the circle about the axis at u.
func (r roll) radius(u float64) float64 {
	if r.cone {
		return u * r.sin
	}
	return r.r
}

// scale is how many flat units of angle (cone) or mm (cylinder) a radian of phi makes.
func (r roll) scale() float64 {
	if r.cone {
		return r.sin
	}
	return r.r
}
