package surface

import (
	"math"

	"epure/geom/curve"
	"epure/geom/num"
	"epure/geom/vec"
)

// Cross returns the parameters in [T0, T1] at which the arc meets the surface,
// ascending. A contact within gap mm counts once; an arc that lies in the surface meets it nowhere.
func Cross(s Surface, a curve.Arc, gap float64) []float64 {
	on := func(t float64) bool { return math.Abs(s.Value(a.At(t))) <= gap }
	if within(a, on) {
		return nil
	}
	switch s := s.(type) {
	case Plane:
		return a.Cross(s.F.O, s.F.Z, gap)
	case Sphere:
		f := vec.World.At(s.O)
		return inRange(a, a.Vanish(f, func(x, y, z, w num.Poly) num.Poly {
			return x.Mul(x).Plus(1, y.Mul(y)).Plus(1, z.Mul(z)).Plus(-s.R*s.R, w.Mul(w))
		}, on), gap)
	case Cylinder:
		return inRange(a, a.Vanish(s.F, func(x, y, _, w num.Poly) num.Poly {
			return x.Mul(x).Plus(1, y.Mul(y)).Plus(-s.R*s.R, w.Mul(w))
		}, on), gap)
	case Cone:
		ts := a.Vanish(s.F, func(x, y, z, _ num.Poly) num.Poly {
			r := x.Mul(x).Plus(1, y.Mul(y))
			return num.Poly(nil).Plus(s.Cos*s.Cos, r).Plus(-s.Sin*s.Sin, z.Mul(z))
		}, on)
		var out []float64
		for _, t := range ts {
			if h, _, _ := s.meridian(a.At(t)); h >= -gap {
				out = append(out, t)
			}
		}
		return inRange(a, out, gap)
	}
	return nil
}

// within tells whether five points of the arc lie on the surface, one more than
// a conic has in common with a quadric that does not hold it.
func within(a curve.Arc, on func(t float64) bool) bool {
	for i := range 5 {
		if !on(a.T0 + float64((a.T1-a.T0)*(0.1+float64(0.2*float64(i))))) {
			return false
		}
	}
	return true
}

// inRange clamps what rounding put just outside the arc and drops repeats.
func inRange(a curve.Arc, ts []float64, gap float64) []float64 {
	var out []float64
	for _, t := range ts {
		c := min(max(t, a.T0), a.T1)
		if c != t && a.At(c).Dist(a.At(t)) > gap {
			continue
		}
		if n := len(out); n == 0 || a.At(c).Dist(a.At(out[n-1])) > gap {
			out = append(out, c)
		}
	}
	return out
}
