package surface

import (
	"math"

	"epure/geom/num"
	"epure/geom/vec"
)

var _ Ruled = Cylinder{}

// radial splits the vector v into its part along the axis and the rest.
func radial(f vec.Frame, v vec.V3) (along float64, out vec.V3) {
	along = v.Dot(f.Z)
	return along, f.X.Scale(v.Dot(f.X)).Along(f.Y, v.Dot(f.Y))
}

// Value is the signed distance from p to the cylinder in mm, negative inside.
func (s Cylinder) Value(p vec.V3) float64 {
	_, out := radial(s.F, p.Sub(s.F.O))
	return out.Len() - s.R
}

// Normal is the direction from the axis to p; on the axis it is F.X.
func (s Cylinder) Normal(p vec.V3) vec.V3 {
	_, out := radial(s.F, p.Sub(s.F.O))
	if out == (vec.V3{}) {
		return s.F.X
	}
	return out.Unit()
}

// Roots are where the line o + t·d meets the cylinder; a line that passes the
// axis at the radius within rounding touches it once; a parallel gives none.
func (s Cylinder) Roots(o, d vec.V3) []float64 {
	p := o.Sub(s.F.O)
	_, po := radial(s.F, p)
	_, do := radial(s.F, d)
	k := do.Len()
	if k <= num.Direction {
		return nil
	}
	u := do.Scale(1 / k)
	foot := -po.Dot(u)
	dist := po.Along(u, foot).Len()
	return chord(foot/k, dist, s.R, num.Place*(po.Len()+s.R), k)
}

// chord is the pair of roots foot ± half chord of a circle of radius r passed
// at the distance dist, one root within bound of tangency.
func chord(foot, dist, r, bound, k float64) []float64 {
	switch num.SignOf(r-dist, bound) {
	case num.Negative:
		return nil
	case num.Zero:
		return []float64{foot}
	}
	h := math.Sqrt((r-dist)*(r+dist)) / k
	return []float64{foot - h, foot + h}
}

// Contour is the two generators where sight along d touches the cylinder; none
// for sight along the axis.
func (s Cylinder) Contour(d vec.V3) []Ruling {
	x, y := d.Dot(s.F.X), d.Dot(s.F.Y)
	if math.Hypot(x, y) <= num.Direction {
		return nil
	}
	phi := math.Atan2(y, x)
	return []Ruling{s.Ruling(phi - math.Pi/2), s.Ruling(phi + math.Pi/2)}
}

// Ruling is the generator at theta, with u counted along F.Z from the plane of F.
func (s Cylinder) Ruling(theta float64) Ruling {
	sin, cos := math.Sincos(theta)
	out := s.F.X.Scale(cos).Along(s.F.Y, sin)
	return Ruling{num.Turn(theta, 0), s.F.O.Along(out, s.R), s.F.Z, math.Inf(-1)}
}

// Theta is the angle of the generator through p, in [0, 2π).
func (s Cylinder) Theta(p vec.V3) float64 { return theta(s.F, p) }

func theta(f vec.Frame, p vec.V3) float64 {
	q := f.Flat(p)
	return num.Turn(math.Atan2(q.Y, q.X), 0)
}
