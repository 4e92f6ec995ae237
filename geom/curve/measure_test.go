package curve

import (
	"math"
	"testing"

	"epure/geom/num"
	"epure/geom/vec"
	"gonum.org/v1/gonum/mathext"
	"pgregory.net/rapid"
)

// Perimeters to ten decimals: the reference collection, section 9 (computed there with mpmath), and gonum's E(m).
func TestEllipsePerimeters(t *testing.T) {
	for _, c := range []struct{ a, b, perimeter float64 }{
		{10, 9, 59.7316043252}, {10, 8, 56.7233357779}, {10, 6, 51.0539977268}, {10, 5, 48.4422411027},
		{10, 3, 43.8591006957}, {10, 1, 40.6397418010}, {5, 3, 25.5269988634}, {10, 0, 40},
	} {
		// the same ellipse by a conjugate pair, turned in space
		for _, turn := range []float64{0, 0.3, 2, math.Pi / 2} {
			s, k := math.Sincos(turn)
			u, w := vec.V3{X: c.a * k, Z: c.b * s}, vec.V3{X: -c.a * s, Z: c.b * k}
			got := Arc{Curve{Ellipse, vec.V3{Y: 7}, u, w}, turn, turn + 2*math.Pi}.Length()
			if math.Abs(got-c.perimeter) > 0.5000001e-10 {
				t.Errorf("axes %v, %v turned %v: %.11f, want %v", c.a, c.b, turn, got, c.perimeter)
			}
			if g := 4 * c.a * mathext.CompleteE(1-c.b*c.b/c.a/c.a); math.Abs(got-g) > 1e-14*g {
				t.Errorf("axes %v, %v turned %v: off by %g from gonum", c.a, c.b, turn, got-g)
			}
		}
	}
}

// Parabolic arches and the half latus rectum: the reference collection, section 9 (mpmath).
func TestParabolaLengths(t *testing.T) {
	arch := func(c, h float64) float64 {
		return Arc2{Curve2{Parabola, vec.V2{}, vec.V2{X: c / 2}, vec.V2{Y: h}}, -1, 1}.Length()
	}
	if v := arch(100, 40); math.Abs(v-133.3705403) > 0.5000001e-7 {
		t.Errorf("chord 100 rise 40: %v", v)
	}
	if v := arch(10, 2); math.Abs(v-10.9823008) > 0.5000001e-7 {
		t.Errorf("chord 10 rise 2: %v", v)
	}
	// y = x²/4f from the vertex to x = 2f, f = 1
	if v := (Arc2{Curve2{Parabola, vec.V2{}, vec.V2{X: 1}, vec.V2{Y: 0.25}}, 0, 2}).Length(); math.Abs(v-2.2955871494) > 0.5000001e-10 {
		t.Errorf("vertex to end of latus rectum: %v", v)
	}
}

// drawArc draws an arc of any form.
func drawArc(t *rapid.T) Arc {
	f := []Form{Line, Ellipse, Parabola, Hyperbola, EllipseEnd, HyperbolaEnd}[rapid.IntRange(0, 5).Draw(t, "form")]
	v := func(s string) vec.V3 {
		r := rapid.Float64Range(-1, 1)
		return vec.V3{X: r.Draw(t, s+"x"), Y: r.Draw(t, s+"y"), Z: r.Draw(t, s+"z")}
	}
	lo := rapid.Float64Range(-3, 3).Draw(t, "from")
	a := Arc{Curve{f, v("C"), v("U"), v("W")}, lo, lo + rapid.Float64Range(0.01, 3).Draw(t, "range")}
	if f == Line {
		a.U = a.U.Add(vec.V3{Z: 2}).Unit()
	} else if l := max(a.U.Len(), a.W.Len()); a.U.Cross(a.W).Len() <= 0.005*l*l {
		t.Skip("so nearly straight that plain quadrature, the second route, cannot see where it turns")
	}
	return a
}

// Lengths and swept areas by quadrature of their definitions, the second route; reversed, turned and
// projected arcs keep their points.
func TestMeasuresAgainstQuadrature(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		a := drawArc(t)
		l := num.Integrate(func(t float64) float64 { return a.Deriv(t, 1).Len() }, a.T0, a.T1)
		if d := math.Abs(a.Length() - l); d > 1e-10*(l+1) { // the goal for quadratures
			t.Fatalf("length %v, quadrature %v", a.Length(), l)
		}
		o := vec.V3{X: 0.3, Y: -0.2, Z: 0.1}
		n := vec.V3{X: 0.6, Z: 0.8}
		s := num.Integrate(func(t float64) float64 { return a.At(t).Sub(o).Cross(a.Deriv(t, 1)).Dot(n) / 2 }, a.T0, a.T1)
		scale := 1 + a.Start().Len()*a.End().Len() + l*l
		if d := math.Abs(a.Sweep(o).Dot(n) - s); d > 1e-12*scale {
			t.Fatalf("sweep %v, quadrature %v", a.Sweep(o).Dot(n), s)
		}
		r := a.Reverse()
		if d := r.Start().Dist(a.End()) + r.End().Dist(a.Start()); d > num.Place*scale {
			t.Fatalf("reversed ends off by %g", d)
		}
		if d := r.Sweep(o).Add(a.Sweep(o)).Len(); d > num.Place*scale {
			t.Fatalf("reversed sweep off by %g", d)
		}
		f := vec.PlaneFrame(o, vec.V3{X: 1, Y: 2, Z: 3})
		if d := a.Project(f).Mid().Dist(f.Flat(a.Mid())); d > num.Place*scale {
			t.Fatalf("projected middle off by %g", d)
		}
	})
}

// Every crossing lies on the plane, and no change of sign between dense samples is without one.
func TestCrossFindsEverySignChange(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		a := drawArc(t)
		at := a.At(rapid.Float64Range(a.T0, a.T1).Draw(t, "through"))
		n := vec.V3{X: rapid.Float64Range(-1, 1).Draw(t, "nx"), Y: rapid.Float64Range(-1, 1).Draw(t, "ny"), Z: 0.5}.Unit()
		scale := 1 + a.Start().Len() + a.End().Len() + a.U.Len() + a.W.Len()
		gap := num.Place * 16 * scale
		ts := a.Cross(at, n, gap)
		value := func(t float64) float64 { return a.At(t).Sub(at).Dot(n) }
		for _, x := range ts {
			if v := math.Abs(value(x)); v > gap {
				t.Fatalf("crossing at %v is off by %g", x, v)
			}
		}
		for _, x := range a.Extreme(n) {
			if v := math.Abs(a.Deriv(x, 1).Dot(n)); v > num.Place*scale*math.Cosh(a.T1) {
				t.Fatalf("extreme at %v runs off by %g", x, v)
			}
		}
		const steps = 200
		for i := range steps {
			lo := a.T0 + (a.T1-a.T0)*float64(i)/steps
			hi := a.T0 + (a.T1-a.T0)*float64(i+1)/steps
			v, w := value(lo), value(hi)
			if math.Min(math.Abs(v), math.Abs(w)) <= gap || v*w > 0 {
				continue
			}
			found := false
			for _, x := range ts {
				found = found || x >= lo && x <= hi
			}
			if !found {
				t.Fatalf("no crossing between %v and %v: %v", lo, hi, ts)
			}
		}
	})
}

// A nearly parabolic ellipse held by its vertex keeps its digits: its centre is 1e12 away, and y² = 2·l·x to 1e-12.
func TestLongConicKeepsItsDigits(t *testing.T) {
	a := Curve{EllipseEnd, vec.V3{}, vec.V3{X: 1e12}, vec.V3{Y: 1e6}} // l = B²/A = 1
	for _, x := range []float64{-2e-6, 1e-7, 1e-6} {
		p := a.At(x)
		if d := p.Y*p.Y - 2*p.X + p.X*p.X/1e12; math.Abs(d) > num.Place*p.Y*p.Y {
			t.Errorf("at %v: off the equation by %g", x, d)
		}
	}
	got := Arc{a, 0, 1e-6}.Length()
	want := Arc{Curve{Parabola, vec.V3{}, vec.V3{Y: 1}, vec.V3{X: 0.5}}, 0, 1}.Length()
	if math.Abs(got-want) > 3e-12 { // the two curves themselves differ by 1e-12
		t.Errorf("length %v, of the parabola %v", got, want)
	}
}
