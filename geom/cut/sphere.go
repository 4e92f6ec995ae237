package cut

import (
	"math"

	"epure/geom/num"
	"epure/geom/surface"
	"epure/geom/vec"
)

// FocalSphere is a sphere that touches a cone or cylinder along a circle and the cutting plane in a focus.
type FocalSphere struct {
	Centre vec.V3
	Radius float64
	Touch  vec.V3    // the point of the plane, a focus of the section
	Ring   vec.Frame // centre and plane of the circle of contact with the surface
	RingR  float64
}

// FocalSpheres returns the focal spheres of s on the surface that it was cut from,
// the one with the higher centre first (then the one further right): two, but one for a parabola
// and none for lines and points. A hyperbola has one in each nappe, the second in the
// one that the solid lacks.
func (s *Section) FocalSpheres() []FocalSphere {
	if s.Conic == nil {
		return nil
	}
	var out []FocalSphere
	switch c := s.surface.(type) {
	case surface.Cone:
		out = s.inCone(c)
	case surface.Cylinder:
		out = s.inCylinder(c)
	}
	if len(out) == 2 && before(out[1].Centre, out[0].Centre) {
		out[0], out[1] = out[1], out[0]
	}
	return out
}

// inCone: a centre at h along the axis has the radius h·sin a, and the plane passes it at
// q - h·cos b; both are equal for h = q/(cos b + sin a) and h = q/(cos b - sin a). The
// difference in the second is taken from the product of the two, which the tilt knows.
func (s *Section) inCone(c surface.Cone) []FocalSphere {
	n := s.Plane.Z
	q := s.Plane.O.Sub(c.F.O).Dot(n)
	if q < 0 {
		q, n = -q, n.Neg()
	}
	sum := s.tilt.Cos + c.Sin
	out := []FocalSphere{ball(c, q/sum, 1, n)}
	if s.Conic.Kind == Parabola {
		return out
	}
	h := q * sum / (s.tilt.Plus * s.tilt.Minus)
	return append(out, ball(c, h, -math.Copysign(1, h), n))
}

// ball is the sphere in the cone with its centre at h along the axis (negative in the other nappe),
// which touches the plane on the side toward·n of its centre.
func ball(c surface.Cone, h, toward float64, n vec.V3) FocalSphere {
	m := c.Opens()
	r := math.Abs(h) * c.Sin
	centre := c.F.O.Along(m, h)
	return FocalSphere{
		Centre: centre, Radius: r, Touch: centre.Along(n, toward*r),
		Ring: c.F.At(c.F.O.Along(m, h*c.Cos*c.Cos)), RingR: r * c.Cos,
	}
}

func (s *Section) inCylinder(c surface.Cylinder) []FocalSphere {
	n := s.Plane.Z
	k := n.Dot(c.F.Z)
	if math.Abs(k) <= num.Direction {
		return nil
	}
	q := s.Plane.O.Sub(c.F.O).Dot(n)
	var out []FocalSphere
	for _, side := range []float64{1, -1} {
		centre := c.F.O.Along(c.F.Z, (q-side*c.R)/k)
		out = append(out, FocalSphere{
			Centre: centre, Radius: c.R, Touch: centre.Along(n, side*c.R),
			Ring: c.F.At(centre), RingR: c.R,
		})
	}
	return out
}
