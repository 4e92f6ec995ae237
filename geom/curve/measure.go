package curve

import (
	"math"

	"epure/geom/num"
	"epure/geom/vec"
)

// Length is the length of the arc, mm: closed forms for lines, parabolas and (by
// elliptic integrals) ellipses, quadrature to the last few digits for the rest.
func (a Arc) Length() float64 {
	return a.Form.length(a.U.Dot(a.U), a.U.Dot(a.W), a.W.Dot(a.W), a.T0, a.T1)
}

// Length is the length of the arc, mm, see Arc.Length.
func (a Arc2) Length() float64 {
	return a.Form.length(a.U.Dot(a.U), a.U.Dot(a.W), a.W.Dot(a.W), a.T0, a.T1)
}

// length is the integral of |u′·U + w′·W| for the scalar products of U and W.
func (f Form) length(uu, uw, ww, lo, hi float64) float64 {
	switch f {
	case Line:
		return math.Sqrt(uu) * (hi - lo)
	case Ellipse:
		return ellipseLength(uu, uw, ww, lo, hi)
	case Parabola:
		return parabolaLength(uu, uw, ww, lo, hi)
	}
	return f.pathLength(uu, uw, ww, lo, hi)
}

// pathLength is length by quadrature, split where the curve is slowest or fastest: an
// integrand with a narrow dip must have it at the end of a panel, not hidden beside one.
func (f Form) pathLength(uu, uw, ww, lo, hi float64) float64 {
	speed := func(t float64) float64 {
		u, w := f.weights(t, 1)
		return math.Sqrt(max(0, float64(u*u*uu)+float64(2*u*w*uw)+float64(w*w*ww)))
	}
	cuts := []float64{lo}
	for _, t := range f.turningSpeed(uu, uw, ww, lo, hi) {
		if t > cuts[len(cuts)-1] && t < hi {
			cuts = append(cuts, t)
		}
	}
	cuts = append(cuts, hi)
	sum := 0.0
	for i := 1; i < len(cuts); i++ {
		sum += num.Integrate(speed, cuts[i-1], cuts[i])
	}
	return sum
}

// turningSpeed is the parameters, ascending, at which the speed has an extreme; for a parabola, which comes
// here only far from its vertex, none.
func (f Form) turningSpeed(uu, uw, ww, lo, hi float64) []float64 {
	switch f {
	case Hyperbola, HyperbolaEnd:
		if uu+ww > 2*math.Abs(uw) {
			return []float64{math.Atanh(-2*uw/(uu+ww)) / 2}
		}
	case EllipseEnd:
		t := math.Atan2(-2*uw, uu-ww) / 2
		var out []float64
		for t -= math.Pi / 2 * math.Floor((t-lo)/(math.Pi/2)); t < hi; t += math.Pi / 2 {
			out = append(out, t)
		}
		return out
	}
	return nil
}

// ellipseLength turns the conjugate pair to the axes; from the end of the short
// axis the length is A·E(angle, e²).
func ellipseLength(uu, uw, ww, lo, hi float64) float64 {
	r := math.Hypot((uu-ww)/2, uw)
	long := (uu+ww)/2 + r
	if long == 0 {
		return 0
	}
	det := max(0, num.Det(uu, uw, uw, ww)) // (A·B)²
	shift := math.Atan2(2*uw, uu-ww) / 2
	m, mc := 2*r/long, det/(long*long)
	at := func(t float64) float64 { return num.EllipticE(t-shift-math.Pi/2, m, mc) }
	return math.Sqrt(long) * (at(hi) - at(lo))
}

// parabolaLength is the closed form about the vertex; for an arc so far from the vertex that
// the difference of two such lengths would lose digits, quadrature, which has an easy time there.
func parabolaLength(uu, uw, ww, lo, hi float64) float64 {
	if ww == 0 {
		return math.Sqrt(uu) * (hi - lo)
	}
	shift := -uw / (2 * ww)
	if min(math.Abs(lo-shift), math.Abs(hi-shift)) > hi-lo && (lo-shift)*(hi-shift) > 0 {
		return Parabola.pathLength(uu, uw, ww, lo, hi)
	}
	a := max(0, num.Det(uu, uw, uw, ww)/ww) // squared speed at the vertex
	w := math.Sqrt(ww)
	at := func(t float64) float64 {
		t -= shift
		v := math.Sqrt(a + float64(4*ww*t*t))
		s := t * v / 2
		if a > 0 {
			s += float64(a / (4 * w) * math.Asinh(2*w*t/math.Sqrt(a)))
		}
		return s
	}
	return at(hi) - at(lo)
}

// Sweep is half the integral of (P - o) × dP along the arc: the vector of the area
// that the line from o to the curve sweeps over, mm². Round a closed outline of
// a plane it is the area times the normal.
func (a Arc) Sweep(o vec.V3) vec.V3 {
	c := a.C.Sub(o)
	u0, w0 := a.Form.weights(a.T0, 0)
	u1, w1 := a.Form.weights(a.T1, 0)
	d := a.U.Scale(u1-u0).Along(a.W, w1-w0)
	return c.Cross(d).Along(a.U.Cross(a.W), a.Form.swept(a.T1)-a.Form.swept(a.T0)).Scale(0.5)
}

// Sweep is half the integral of (P - o) × dP along the arc, mm²: positive
// anticlockwise.
func (a Arc2) Sweep(o vec.V2) float64 {
	c := a.C.Sub(o)
	u0, w0 := a.Form.weights(a.T0, 0)
	u1, w1 := a.Form.weights(a.T1, 0)
	d := a.U.Scale(u1-u0).Along(a.W, w1-w0)
	return (c.Cross(d) + float64(a.U.Cross(a.W)*(a.Form.swept(a.T1)-a.Form.swept(a.T0)))) / 2
}

// swept is the integral of u·w′ - w·u′ from 0 to t.
func (f Form) swept(t float64) float64 {
	switch f {
	case Ellipse, Hyperbola:
		return t
	case Parabola:
		return t * t * t / 3
	case EllipseEnd:
		return -excess(t, -1)
	case HyperbolaEnd:
		return -excess(t, 1)
	}
	return 0
}

// excess is sinh t - t for sign 1 and t - sin t for sign -1, by the series where the
// difference would lose digits: under 1/2, eight terms leave 2^-60.
func excess(t, sign float64) float64 {
	if math.Abs(t) > 0.5 {
		if sign > 0 {
			return math.Sinh(t) - t
		}
		return t - math.Sin(t)
	}
	term, sum := t*t*t/6, 0.0
	for n := 5.0; n < 20; n += 2 {
		sum += term
		term *= sign * t * t / (n * (n - 1))
	}
	return sum
}

// Integrate is the integral of f over the parameter of the arc, by panels of at most a quarter turn. For a polynomial
// of the fourth degree in the coordinates and their derivatives it is right to rounding.
func (a Arc) Integrate(f func(t float64) float64) float64 {
	cs := a.Form.chunks(a.T0, a.T1)
	h := (a.T1 - a.T0) / float64(2*len(cs))
	sum := 0.0
	for _, c := range cs {
		sum += num.Panel(f, c.m-h, c.m+h)
	}
	return sum
}
