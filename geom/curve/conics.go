package curve

import (
	"math"

	"epure/geom/num"
	"epure/geom/vec"
)

// meetConics is Meet for two arcs that are both really curved. a is run through
// as rational quadratics and put into the equation of b, which gives polynomials
// of the fourth degree; a contact is where the polynomial turns at zero. The rounder of the two
// gives the equation, since squares of the coordinates along a thin one's
// short axis would drown what is sought.
func meetConics(a, b Arc2, tol float64) ([]Crossing, bool) {
	e, ea := b.equation(), a.equation()
	if ea.roundness() > e.roundness() {
		pts, same := meetConics2(b, a, ea, tol)
		for i, p := range pts {
			pts[i] = Crossing{p.TB, p.TA}
		}
		return pts, same
	}
	return meetConics2(a, b, e, tol)
}

// meetConics2 is meetConics with the equation e of b.
func meetConics2(a, b Arc2, e equation, tol float64) ([]Crossing, bool) {
	on := func(t float64) bool {
		p := a.At(t)
		return e.whole.At(e.param(p)).Dist(p) <= tol
	}
	if same(a, on) {
		return shared(a, b, e, tol)
	}
	var out []Crossing
	for _, c := range a.Form.chunks(a.T0, a.T1) {
		q := e.value(c, a.At(c.m), a.Deriv(c.m, 1), a.Deriv(c.m, 2))
		for _, t := range c.zerosOf(q, on) {
			tb := e.param(a.At(t))
			ta, tb := polish(a.Curve2, b.Curve2, t, tb)
			if a.At(ta).Dist(b.At(tb)) > 8*tol { // another branch, or nothing there
				continue
			}
			ta, oka := a.clamp(ta, tol)
			tb, okb := b.clamp(tb, tol)
			if oka && okb {
				out = append(out, Crossing{ta, tb})
			}
		}
	}
	return out, false
}

// same tells whether five points of a lie on the other conic: two conics that are not one have four in common.
func same(a Arc2, on func(t float64) bool) bool {
	for i := range 5 {
		if !on(a.T0 + float64((a.T1-a.T0)*(0.1+float64(0.2*float64(i))))) {
			return false
		}
	}
	return true
}

// shared is the crossings of two arcs of one conic, and whether they share more than points.
func shared(a, b Arc2, e equation, tol float64) ([]Crossing, bool) {
	ea := a.equation()
	var out []Crossing
	ends := func(x Arc2) []float64 {
		if x.Form.Periodic() && near(x, x.T0, x.T1, tol) {
			return nil // whole
		}
		return []float64{x.T0, x.T1}
	}
	for _, t := range ends(a) {
		if tb, ok := b.clamp(e.param(a.At(t)), tol); ok {
			out = append(out, Crossing{t, tb})
		}
	}
	for _, t := range ends(b) {
		if ta, ok := a.clamp(ea.param(b.At(t)), tol); ok {
			out = append(out, Crossing{ta, t})
		}
	}
	out = tidy(a, b, out, tol)
	cuts := []float64{a.T0}
	for _, c := range out {
		cuts = append(cuts, c.TA)
	}
	cuts = append(cuts, a.T1)
	for i := 1; i < len(cuts); i++ {
		m := (cuts[i-1] + cuts[i]) / 2
		if near(a, cuts[i-1], cuts[i], tol) && !(a.Form.Periodic() && cuts[i]-cuts[i-1] > math.Pi) {
			continue
		}
		if _, ok := b.clamp(e.param(a.At(m)), tol); ok {
			return out, true
		}
	}
	return out, false
}

// polish brings a common point of two curves to full precision; a point of
// contact, where both run alike, stays as it is.
func polish(a, b Curve2, ta, tb float64) (float64, float64) {
	gap := a.At(ta).Dist(b.At(tb))
	for range 4 {
		r := b.At(tb).Sub(a.At(ta))
		da, db := a.Deriv(ta, 1), b.Deriv(tb, 1)
		k := da.Cross(db)
		if math.Abs(k) <= num.Join*da.Len()*db.Len() {
			break
		}
		na, nb := ta+r.Cross(db)/k, tb+r.Cross(da)/k
		if g := a.At(na).Dist(b.At(nb)); g < gap {
			ta, tb, gap = na, nb, g
		} else {
			break
		}
	}
	return ta, tb
}

// equation is the equation of a conic in the coordinates of its own axes.
type equation struct {
	whole Curve2  // the curve as given
	c     Curve2  // the same with U square to W where the form allows it
	shift float64 // parameter of whole = parameter of c + shift
	det   float64
}

// equation returns the equation of the arc's whole curve. Square axes keep the
// coordinates exact for a thin ellipse, whose given pair may be nearly parallel.
func (a Arc2) equation() equation {
	c, s := a.Curve2, 0.0
	uu, uw, ww := c.U.Dot(c.U), c.U.Dot(c.W), c.W.Dot(c.W)
	switch c.Form {
	case Ellipse:
		s = math.Atan2(2*uw, uu-ww) / 2
		c.U, c.W = a.At(s).Sub(a.C), a.Deriv(s, 1)
	case Hyperbola:
		s = -math.Atanh(2*uw/(uu+ww)) / 2
		c.U, c.W = a.At(s).Sub(a.C), a.Deriv(s, 1)
	case Parabola:
		s = -uw / (2 * ww)
		c.C, c.U = a.At(s), a.Deriv(s, 1)
	}
	return equation{a.Curve2, c, s, c.U.Cross(c.W)}
}

// roundness is the short axis over the long one, for square axes.
func (e equation) roundness() float64 {
	l := max(e.c.U.Len(), e.c.W.Len())
	return math.Abs(e.det) / (l * l)
}

// local are the coordinates of the vector d in U and W.
func (e equation) local(d vec.V2) (x, y float64) {
	return d.Cross(e.c.W) / e.det, e.c.U.Cross(d) / e.det
}

// value is the left side of the equation over a chunk with the given point and
// derivatives at its middle: zero on the conic.
func (e equation) value(c chunk, p, d1, d2 vec.V2) num.Poly {
	px, py := e.local(p.Sub(e.c.C))
	ax, ay := e.local(d1)
	bx, by := e.local(d2)
	x, y, w := c.numerator(px, ax, bx), c.numerator(py, ay, by), c.weight()
	xx, yy, ww := x.Mul(x), y.Mul(y), w.Mul(w)
	switch e.c.Form {
	case Ellipse:
		return xx.Plus(1, yy).Plus(-1, ww)
	case Hyperbola:
		return xx.Plus(-1, yy).Plus(-1, ww)
	case EllipseEnd:
		return xx.Plus(1, yy).Plus(-2, x.Mul(w))
	case HyperbolaEnd:
		return xx.Plus(-1, yy).Plus(2, x.Mul(w))
	}
	return y.Mul(w).Plus(-1, xx) // parabola: y = x²
}

// param is the parameter of the point of the conic at p, or near it.
func (e equation) param(p vec.V2) float64 {
	x, y := e.local(p.Sub(e.c.C))
	switch e.c.Form {
	case Ellipse:
		return math.Atan2(y, x) + e.shift
	case EllipseEnd:
		return math.Atan2(y, 1-x)
	case Parabola:
		return x + e.shift
	}
	return math.Asinh(y) + e.shift
}

// Param returns the parameter of the point of the arc's curve at p (or near p), shifted
// into the arc, and whether that point is on the arc and within tol mm of p.
func (a Arc2) Param(p vec.V2, tol float64) (float64, bool) {
	t := 0.0
	if a.Form == Line {
		t = p.Sub(a.C).Dot(a.U) / a.U.Dot(a.U)
	} else {
		t = a.equation().param(p)
	}
	t, ok := a.clamp(t, tol)
	return t, ok && a.At(t).Dist(p) <= tol
}
