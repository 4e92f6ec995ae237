package curve

import (
	"math"
	"testing"

	"epure/geom/vec"
	"pgregory.net/rapid"
)

func circle2(x, y, r float64) Arc2 {
	return Arc2{Curve2{Ellipse, vec.V2{X: x, Y: y}, vec.V2{X: r}, vec.V2{Y: r}}, 0, 2 * math.Pi}
}

// tol of the tests below: 1e-11 of arcs of size about one, the bound that num.OnSurface sets.
const meetTol = 1e-11

func TestMeetCounts(t *testing.T) {
	flat := Arc2{Curve2{Ellipse, vec.V2{}, vec.V2{X: 1}, vec.V2{}}, 0, 2 * math.Pi}
	upper := circle2(0, 0, 1)
	upper.T1 = math.Pi
	left := circle2(0, 0, 1)
	left.T0, left.T1 = math.Pi/2, 3*math.Pi/2
	parabola := Arc2{Curve2{Parabola, vec.V2{Y: -1}, vec.V2{X: 1}, vec.V2{Y: 1}}, -2, 2}
	hyper := Arc2{Curve2{Hyperbola, vec.V2{}, vec.V2{X: 1}, vec.V2{Y: 1}}, -2, 2}
	line := func(x0, y0, x1, y1 float64) Arc2 { return Segment2(vec.V2{X: x0, Y: y0}, vec.V2{X: x1, Y: y1}) }
	ellipse := Arc2{Curve2{Ellipse, vec.V2{}, vec.V2{X: 2}, vec.V2{Y: 0.5}}, 0, 2 * math.Pi}
	for _, c := range []struct {
		name string
		a, b Arc2
		n    int
		same bool
	}{
		{"two circles", circle2(0, 0, 1), circle2(1, 0, 1), 2, false},
		{"circles touching outside", circle2(0, 0, 1), circle2(2, 0, 1), 1, false},
		{"circles touching inside, on the slant", circle2(0, 0, 1), circle2(0.3, 0.4, 0.5), 1, false},
		{"circles apart", circle2(0, 0, 1), circle2(2.1, 0, 1), 0, false},
		{"the same circle", circle2(0, 0, 1), circle2(0, 0, 1), 0, true},
		{"half circles over a quarter", upper, left, 2, true},
		{"circle and its upper half", circle2(0, 0, 1), upper, 2, true},
		{"ellipse and circle, four points", ellipse, circle2(0, 0, 1), 4, false},
		{"ellipse and circle, two contacts", ellipse, circle2(0, 0, 2), 2, false},
		{"parabola through two ends and the vertex of a circle", parabola, circle2(0, 0, 1), 3, false},
		{"circle touching the branch at its vertex", hyper, circle2(0, 0, 1), 1, false},
		{"the branch that is not there", hyper, circle2(-1.5, 0, 1), 0, false},
		{"line through a circle", line(-2, 0.5, 2, 0.5), circle2(0, 0, 1), 2, false},
		{"tangent line", line(-2, 1, 2, 1), circle2(0, 0, 1), 1, false},
		{"line that ends on the circle", line(0, 0, 0.6, 0.8), circle2(0, 0, 1), 1, false},
		{"crossing lines", line(0, 0, 1, 1), line(0, 1, 1, 0), 1, false},
		{"parallel lines", line(0, 0, 1, 0), line(0, 1, 1, 1), 0, false},
		{"overlapping lines", line(0, 0, 2, 0), line(1, 0, 3, 0), 2, true},
		{"lines end to end", line(0, 0, 1, 0), line(1, 0, 3, 0), 1, false},
		{"circle edge on crossed by a line: both passes", flat, line(0.5, -1, 0.5, 1), 2, false},
		{"circle edge on touched at its fold", flat, line(1, -1, 1, 1), 1, false},
		{"circle edge on with its diameter", flat, line(-1, 0, 1, 0), 2, true},
	} {
		for swap := range 2 {
			a, b := c.a, c.b
			if swap == 1 {
				a, b = b, a
			}
			pts, same := Meet(a, b, meetTol)
			if len(pts) != c.n || same != c.same {
				t.Errorf("%s (swapped %d): %d points, coincident %v: %v", c.name, swap, len(pts), same, pts)
			}
			for _, p := range pts {
				if d := a.At(p.TA).Dist(b.At(p.TB)); d > meetTol {
					t.Errorf("%s: off by %g", c.name, d)
				}
			}
		}
	}
}

// Two conics made to pass through a chosen point, in any position, must report it; every point
// reported lies on both. The second route is the construction itself.
func TestMeetFindsThePoint(t *testing.T) {
	conic := func(t *rapid.T, n string) Arc2 {
		f := []Form{Line, Ellipse, Parabola, Hyperbola, EllipseEnd, HyperbolaEnd}[rapid.IntRange(0, 5).Draw(t, n+"form")]
		v := func(s string) vec.V2 { // lengths over three decades, far over the tolerance
			l := math.Pow(10, rapid.Float64Range(-3, 0).Draw(t, n+s+" length"))
			sin, cos := math.Sincos(rapid.Float64Range(0, 2*math.Pi).Draw(t, n+s+" angle"))
			return vec.V2{X: l * cos, Y: l * sin}
		}
		a := Arc2{Curve2{f, v("C"), v("U"), v("W")}, -1.5, 1.5}
		if f == EllipseEnd || f == HyperbolaEnd {
			a.U, a.W = a.U.Scale(1e6), a.W.Scale(1e3) // half the latus rectum of order one
			a.T0, a.T1 = -1e-3, 1e-3
		}
		return a
	}
	rapid.Check(t, func(t *rapid.T) {
		a, b := conic(t, "a"), conic(t, "b")
		ta := rapid.Float64Range(0.9*a.T0, 0.9*a.T1).Draw(t, "ta")
		tb := rapid.Float64Range(0.9*b.T0, 0.9*b.T1).Draw(t, "tb")
		b.C = b.C.Add(a.At(ta).Sub(b.At(tb)))
		size := 1 + a.Deriv(a.T1, 1).Len()*(a.T1-a.T0) + b.Deriv(b.T1, 1).Len()*(b.T1-b.T0)
		tol := meetTol * size
		for _, x := range []Arc2{a, b} {
			if _, f := x.flat(1e3 * tol); f != curved && x.Form != Line {
				t.Skip("so thin that the tolerance may make one contact of its two sides")
			}
		}
		if da, db := a.Deriv(ta, 1).Unit(), b.Deriv(tb, 1).Unit(); math.Abs(da.Cross(db)) < 1e-6 {
			t.Skip("so nearly a contact that it may count as one, elsewhere")
		}
		pts, same := Meet(a, b, tol)
		found := same
		for _, p := range pts {
			if d := a.At(p.TA).Dist(b.At(p.TB)); d > 8*tol {
				t.Fatalf("off by %g", d)
			}
			// a crossing under a small angle is found to within tol over its sine
			da, db := a.Deriv(p.TA, 1).Unit(), b.Deriv(p.TB, 1).Unit()
			found = found || a.At(p.TA).Dist(a.At(ta)) <= 1e-6+8*tol/math.Abs(da.Cross(db))
		}
		if !found {
			t.Fatalf("point at %g, %g not among %v\n%+v\n%+v", ta, tb, pts, a, b)
		}
	})
}
