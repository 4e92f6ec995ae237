package curve

import (
	"math"

	"epure/geom/num"
	"epure/geom/vec"
)

// Cross returns the parameters in [T0, T1] at which the arc meets the plane
// through o with the unit normal n, ascending. A curve that comes within gap mm of the plane
// at a point of tangency gives that parameter once. None for an arc that lies in the plane.
func (a Arc) Cross(o, n vec.V3, gap float64) []float64 {
	return a.Form.inside(a.Form.zeros(a.C.Sub(o).Dot(n), a.U.Dot(n), a.W.Dot(n), gap), a.T0, a.T1)
}

// Cross returns the parameters in [T0, T1] at which the arc meets the line
// through o with the unit normal n, see Arc.Cross.
func (a Arc2) Cross(o, n vec.V2, gap float64) []float64 {
	return a.Form.inside(a.Form.zeros(a.C.Sub(o).Dot(n), a.U.Dot(n), a.W.Dot(n), gap), a.T0, a.T1)
}

// Extreme returns the parameters in [T0, T1] at which the arc runs square to n:
// where its distance along n is greatest or least, ends not counted.
func (a Arc) Extreme(n vec.V3) []float64 {
	return a.Form.inside(a.Form.level(a.U.Dot(n), a.W.Dot(n)), a.T0, a.T1)
}

// Extreme returns the parameters in [T0, T1] at which the arc runs square to n.
func (a Arc2) Extreme(n vec.V2) []float64 {
	return a.Form.inside(a.Form.level(a.U.Dot(n), a.W.Dot(n)), a.T0, a.T1)
}

// zeros solves c + u·p + w·q = 0 for the weights u, w of the form, ascending. For a periodic
// form in no particular turn.
func (f Form) zeros(c, p, q, gap float64) []float64 {
	if math.Abs(c) <= gap && math.Abs(p) <= gap && math.Abs(q) <= gap && f != Line {
		return nil
	}
	switch f {
	case Line:
		if math.Abs(p) <= num.Direction { // |U| = 1 in space
			return nil
		}
		return []float64{-c / p}
	case Ellipse:
		return ellipseZeros(c, p, q, gap)
	case Parabola:
		if t := -p / (2 * q); q != 0 && math.Abs(c+float64(float64(t*p)/2)) <= gap {
			return []float64{t}
		}
		return num.Quadratic(q, p/2, c)
	case Hyperbola:
		return hyperbolaZeros(c, p, q, gap)
	case EllipseEnd, HyperbolaEnd:
		return f.endZeros(c, p, q, gap)
	}
	return nil
}

// ellipseZeros solves c + p·cos t + q·sin t = 0.
func ellipseZeros(c, p, q, gap float64) []float64 {
	r, phi := math.Hypot(p, q), math.Atan2(q, p)
	switch num.SignOf(r-math.Abs(c), gap) {
	case num.Negative:
		return nil
	case num.Zero:
		if c > 0 {
			phi += math.Pi
		}
		return []float64{phi}
	}
	half := math.Atan2(math.Sqrt((r-c)*(r+c)), -c)
	return []float64{phi - half, phi + half}
}

// hyperbolaZeros solves c + p·cosh t + q·sinh t = 0 as a quadratic in exp t.
func hyperbolaZeros(c, p, q, gap float64) []float64 {
	if math.Abs(p) > math.Abs(q) {
		low := math.Copysign(math.Sqrt((p-q)*(p+q)), p)
		if math.Abs(c+low) <= gap {
			return []float64{math.Atanh(-q / p)}
		}
	}
	var ts []float64
	for _, e := range num.Quadratic((p+q)/2, c/2, (p-q)/2) {
		if e > 0 && !math.IsInf(e, 1) {
			ts = append(ts, math.Log(e))
		}
	}
	return ts
}

// endZeros solves the forms at a vertex in k = tan t/2 or tanh t/2, in which
// both are c·(1 ± k²) + 2·p·k² + 2·q·k = 0.
func (f Form) endZeros(c, p, q, gap float64) []float64 {
	a := 2*p + c
	if f == HyperbolaEnd {
		a = 2*p - c
	}
	for _, t := range f.level(p, q) {
		if u, w := f.weights(t, 0); math.Abs(c+float64(u*p)+float64(w*q)) <= gap {
			return []float64{t}
		}
	}
	var ts []float64
	for _, k := range num.Quadratic(a, q, c) {
		switch {
		case f == EllipseEnd:
			ts = append(ts, 2*math.Atan(k))
		case math.Abs(k) < 1:
			ts = append(ts, 2*math.Atanh(k))
		}
	}
	return ts
}

// level solves u′·p + w′·q = 0 for the first derivatives of the weights.
func (f Form) level(p, q float64) []float64 {
	if p == 0 && q == 0 {
		return nil
	}
	switch f {
	case Ellipse:
		phi := math.Atan2(q, p)
		return []float64{phi, phi + math.Pi}
	case EllipseEnd:
		phi := math.Atan2(-q, p)
		return []float64{phi, phi + math.Pi}
	case Parabola:
		if q != 0 {
			return []float64{-p / (2 * q)}
		}
	case Hyperbola, HyperbolaEnd:
		if math.Abs(q) < math.Abs(p) {
			return []float64{math.Atanh(-q / p)}
		}
	}
	return nil
}

// inside keeps the parameters in [lo, hi], ascending, turning those of a
// periodic form into that range.
func (f Form) inside(ts []float64, lo, hi float64) []float64 {
	var out []float64
	for _, t := range ts {
		if f.Periodic() {
			t = num.Turn(t, lo)
		}
		if t >= lo && t <= hi {
			out = append(out, t)
		}
	}
	for i := 1; i < len(out); i++ { // at most four
		for j := i; j > 0 && out[j] < out[j-1]; j-- {
			out[j], out[j-1] = out[j-1], out[j]
		}
	}
	return out
}

// Reverse returns the same points run through the other way.
func (a Arc) Reverse() Arc {
	if a.Form == Line || a.Form == Parabola {
		a.U = a.U.Neg()
	} else {
		a.W = a.W.Neg()
	}
	a.T0, a.T1 = 0-a.T1, 0-a.T0
	return a
}

// Reverse returns the same points run through the other way.
func (a Arc2) Reverse() Arc2 {
	if a.Form == Line || a.Form == Parabola {
		a.U = a.U.Scale(-1)
	} else {
		a.W = a.W.Scale(-1)
	}
	a.T0, a.T1 = 0-a.T1, 0-a.T0
	return a
}
