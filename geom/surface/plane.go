package surface

import (
	"math"

	"epure/geom/num"
	"epure/geom/vec"
)

var _ Surface = Plane{}

// Value is the signed distance from p to the plane in mm, negative inside.
func (s Plane) Value(p vec.V3) float64 { return p.Sub(s.F.O).Dot(s.F.Z) }

// Normal is F.Z.
func (s Plane) Normal(vec.V3) vec.V3 { return s.F.Z }

// Roots is where the line o + t·d meets the plane; none when it runs along it.
func (s Plane) Roots(o, d vec.V3) []float64 {
	k := d.Dot(s.F.Z)
	if math.Abs(k) <= num.Direction {
		return nil
	}
	return []float64{-s.Value(o) / k}
}

// Contour of a plane is empty: it has no contour but its edges.
func (s Plane) Contour(vec.V3) []Ruling { return nil }

// Flip returns the same plane with the material on its other side.
func (s Plane) Flip() Plane {
	f := s.F
	f.Z, f.Y = f.Z.Neg(), f.Y.Neg()
	return Plane{f}
}

// Near returns the frame of the plane with its origin at the foot of p, so that
// the coordinates of what lies near p stay small.
func (s Plane) Near(p vec.V3) vec.Frame { return s.F.At(p.Along(s.F.Z, -s.Value(p))) }

// Same tells whether the two planes coincide within the rounding of their
// normals, and within gap mm at the point p; same is false for planes that are
// back to back.
func (s Plane) Same(q Plane, p vec.V3, gap float64) (coincide, same bool) {
	k := s.F.Z.Dot(q.F.Z)
	if s.F.Z.Cross(q.F.Z).Len() > num.Place {
		return false, false
	}
	a, b := s.Value(p), math.Copysign(1, k)*q.Value(p)
	return math.Abs(a-b) <= gap, k > 0
}
