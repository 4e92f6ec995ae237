package surface

import (
	"math"

	"epure/geom/num"
	"epure/geom/vec"
)

var _ Ruled = Cone{}

// Opens is the unit vector along the axis into the nappe.
func (s Cone) Opens() vec.V3 {
	if s.Side < 0 {
		return s.F.Z.Neg()
	}
	return s.F.Z
}

// meridian is the height of p over the apex along Opens, its distance from the
// axis, and the vector of that distance.
func (s Cone) meridian(p vec.V3) (h, rho float64, out vec.V3) {
	along, out := radial(s.F, p.Sub(s.F.O))
	return float64(along * s.Side), out.Len(), out
}

// Value is the signed distance from p to the nappe in mm, negative inside.
// Behind the apex it is the distance from the apex.
func (s Cone) Value(p vec.V3) float64 {
	h, rho, _ := s.meridian(p)
	if float64(rho*s.Sin)+float64(h*s.Cos) < 0 {
		return math.Hypot(h, rho)
	}
	return float64(rho*s.Cos) - float64(h*s.Sin)
}

// Normal is the outward unit normal of the generator through p; at the apex, and
// anywhere on the axis, the axis pointing out of the nappe.
func (s Cone) Normal(p vec.V3) vec.V3 {
	_, rho, out := s.meridian(p)
	if rho == 0 {
		return s.Opens().Neg()
	}
	return out.Scale(s.Cos/rho).Along(s.Opens(), -s.Sin)
}

// Roots are where the line o + t·d meets the nappe.
//
// With the moment m = (o - apex) × d of the line, the discriminant of its
// quadratic is cos²·(sin²·|m|² - (m·axis)²): the line touches the cone when its
// plane through the apex does. This form needs no difference of large squares.
func (s Cone) Roots(o, d vec.V3) []float64 {
	p := o.Sub(s.F.O)
	foot := -p.Dot(d)
	q := p.Along(d, foot) // the point of the line nearest the apex
	bound := num.Place * (p.Len() + q.Len())
	if q.Len() <= bound {
		return s.apexRoot(foot, d)
	}
	m := q.Cross(d)
	ml, ma := m.Len(), math.Abs(m.Dot(s.F.Z))
	gap := num.SignOf(float64(s.Sin*ml)-ma, bound)
	if gap == num.Negative {
		return nil
	}
	var root float64
	if gap == num.Positive {
		root = s.Cos * math.Sqrt((s.Sin*ml-ma)*(s.Sin*ml+ma))
	}
	var ts []float64
	for _, t := range s.quadratic(q, d, root) {
		if h, _, _ := s.meridian(s.F.O.Add(q).Along(d, t)); h >= -bound {
			ts = append(ts, foot+t)
		}
	}
	return ts
}

// apexRoot is the root of a line through the apex: the apex, unless the line
// lies in the cone.
func (s Cone) apexRoot(foot float64, d vec.V3) []float64 {
	along, out := radial(s.F, d)
	if math.Abs(float64(out.Len()*s.Cos)-float64(math.Abs(along)*s.Sin)) <= num.Direction {
		return nil
	}
	return []float64{foot}
}

// quadratic solves |q + t·d|²·cos² = ((q + t·d)·axis)² for a q square to d, given
// the root of its discriminant.
func (s Cone) quadratic(q, d vec.V3, root float64) []float64 {
	dh, dout := radial(s.F, d)
	qh, qout := radial(s.F, q)
	dr, qr := dout.Len(), qout.Len()
	a := (float64(dr*s.Cos) - float64(math.Abs(dh)*s.Sin)) * (float64(dr*s.Cos) + float64(math.Abs(dh)*s.Sin))
	c := (float64(qr*s.Cos) - float64(math.Abs(qh)*s.Sin)) * (float64(qr*s.Cos) + float64(math.Abs(qh)*s.Sin))
	b := -float64(qh * dh) // q·d is zero
	flat := math.Abs(a) <= num.Direction
	switch {
	case flat && b == 0:
		return nil
	case flat:
		return []float64{-c / (2 * b)}
	case root == 0:
		return []float64{-b / a}
	}
	w := -(b + math.Copysign(root, b))
	x, y := w/a, c/w
	if x > y {
		x, y = y, x
	}
	return []float64{x, y}
}

// Contour is the two generators where sight along d touches the cone, one when d
// runs along a generator within rounding, none when it looks into the cone.
func (s Cone) Contour(d vec.V3) []Ruling {
	x, y := d.Dot(s.F.X), d.Dot(s.F.Y)
	out, in := math.Hypot(x, y)*s.Cos, d.Dot(s.F.Z)*s.Side*s.Sin
	phi := math.Atan2(y, x)
	switch num.SignOf(out-math.Abs(in), num.Direction) {
	case num.Negative:
		return nil
	case num.Zero:
		if in < 0 {
			phi += math.Pi
		}
		return []Ruling{s.Ruling(phi)}
	}
	half := math.Atan2(math.Sqrt((out-in)*(out+in)), in)
	return []Ruling{s.Ruling(phi - half), s.Ruling(phi + half)}
}

// Ruling is the generator at theta, with u the slant distance from the apex.
func (s Cone) Ruling(theta float64) Ruling {
	sin, cos := math.Sincos(theta)
	out := s.F.X.Scale(cos).Along(s.F.Y, sin)
	return Ruling{num.Turn(theta, 0), s.F.O, s.Opens().Scale(s.Cos).Along(out, s.Sin), 0}
}

// Theta is the angle of the generator through p, in [0, 2π); at the apex 0.
func (s Cone) Theta(p vec.V3) float64 { return theta(s.F, p) }
