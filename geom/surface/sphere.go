package surface

import (
	"math"

	"epure/geom/curve"
	"epure/geom/num"
	"epure/geom/vec"
)

// Sphere is the sphere of radius R (mm, > 0) about O; its material lies inside.
type Sphere struct {
	O vec.V3
	R float64
}

var _ Met = Sphere{}

// Value is the signed distance from p to the sphere in mm, negative inside.
func (s Sphere) Value(p vec.V3) float64 { return p.Sub(s.O).Len() - s.R }

// Normal is the direction from the centre to p; at the centre it is up.
func (s Sphere) Normal(p vec.V3) vec.V3 {
	if p == s.O {
		return vec.V3{Z: 1}
	}
	return p.Sub(s.O).Unit()
}

// Roots are where the line o + t·d meets the sphere; a line that passes the centre at the
// radius within rounding touches it once.
func (s Sphere) Roots(o, d vec.V3) []float64 {
	p := o.Sub(s.O)
	foot := -p.Dot(d)
	return chord(foot, p.Along(d, foot).Len(), s.R, num.Place*(p.Len()+s.R), 1)
}

// Contour is empty: a sphere has no straight generators; see Outline.
func (s Sphere) Contour(vec.V3) []Ruling { return nil }

// Outline is the great circle along which sight along d (unit) touches the sphere.
func (s Sphere) Outline(d vec.V3) curve.Arc {
	return curve.Arc{Curve: curve.Circle(vec.PlaneFrame(s.O, d), s.R), T0: 0, T1: 2 * math.Pi}
}

// Circle is the circle in which p meets the sphere: its frame (the normal of p as Z) and its radius; false when
// the plane passes the sphere, or touches it within gap mm.
func (s Sphere) Circle(p Plane, gap float64) (vec.Frame, float64, bool) {
	h := p.Value(s.O)
	if math.Abs(h) >= s.R-gap {
		return vec.Frame{}, 0, false
	}
	return p.F.At(s.O.Along(p.F.Z, -h)), math.Sqrt((s.R - h) * (s.R + h)), true
}

// Arcs are the circle in which p meets the sphere, see Met.
func (s Sphere) Arcs(p Plane, gap float64, _ vec.V3, _ float64) []curve.Arc {
	f, r, ok := s.Circle(p, gap)
	if !ok {
		return nil
	}
	return []curve.Arc{{Curve: curve.Circle(f, r), T0: 0, T1: 2 * math.Pi}}
}
