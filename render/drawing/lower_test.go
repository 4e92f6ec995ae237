package drawing

import (
	"math"
	"testing"

	"pgregory.net/rapid"

	"epure/geom/curve"
	"epure/geom/vec"
)

// arcs draws a random arc of the given form in a view of some hundred mm.
func arcs(t *rapid.T, f curve.Form) curve.Arc2 {
	v := func(name string) vec.V2 {
		n := rapid.Float64Range(-100, 100)
		return at(n.Draw(t, name+"x"), n.Draw(t, name+"y"))
	}
	span := rapid.Float64Range(-3, 3)
	return curve.Arc2{Curve2: curve.Curve2{Form: f, C: v("c"), U: v("u"), W: v("w")}, T0: span.Draw(t, "t0"), T1: span.Draw(t, "t1")}
}

// placedAt is the paper point of the arc at t, worked out on its own.
func placedAt(a curve.Arc2, t, scale float64, o vec.V2) vec.V2 {
	p := a.At(t)
	return at(o.X+scale*p.X, o.Y+scale*p.Y)
}

// far is the rounding allowed at sizes of some hundred mm times cosh 3.
const far = 1e-10

func TestEllipseKeepsPlaceAndDirection(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		a := arcs(t, curve.Ellipse)
		s := FromArc(a, 0.5, at(200, 100), PaperTolerance)
		e, ok := s.(EllipseArc)
		if !ok {
			return // flat: see TestSeenOnEdge
		}
		if e.RX < e.RY {
			t.Fatalf("axes %v, %v", e.RX, e.RY)
		}
		for i := range 11 {
			f := float64(i) / 10
			got := e.At(e.From + (e.To-e.From)*f)
			want := placedAt(a, a.T0+(a.T1-a.T0)*f, 0.5, at(200, 100))
			// where the axes are nearly equal their direction, not the curve, is loose
			if got.Dist(want) > 1e-9 {
				t.Fatalf("at %v: %v, want %v", f, got, want)
			}
		}
	})
}

func TestParabolaIsExact(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		a := arcs(t, curve.Parabola)
		q, ok := FromArc(a, 2, at(1, 2), PaperTolerance).(Quad)
		if !ok {
			return
		}
		for i := range 11 {
			f := float64(i) / 10
			if got, want := q.At(f), placedAt(a, a.T0+(a.T1-a.T0)*f, 2, at(1, 2)); got.Dist(want) > far {
				t.Fatalf("at %v: %v, want %v", f, got, want)
			}
		}
	})
}

// offConic is the distance of p from the hyperbola's branch, to first order: its
// implicit equation over its gradient, in the axes of U and W.
func offConic(a curve.Arc2, p vec.V2) float64 {
	d := p.Sub(a.C)
	det := a.U.Cross(a.W)
	x, y := d.Cross(a.W)/det, a.U.Cross(d)/det
	gx := a.W.Left().Scale(-2 * x / det)
	gy := a.U.Left().Scale(-2 * y / det)
	return math.Abs(x*x-y*y-1) / gx.Add(gy).Len()
}

func TestHyperbolaKeepsItsBound(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		a := arcs(t, curve.Hyperbola)
		s, ok := FromArc(a, 1, vec.V2{}, PaperTolerance).(Spline)
		if !ok || a.T0 == a.T1 || math.Abs(a.U.Cross(a.W)) < 100 { // too flat for the first order
			return
		}
		if s.Err > PaperTolerance {
			t.Fatalf("bound %v", s.Err)
		}
		if s.Points[0].Dist(a.Start()) > far || s.Points[len(s.Points)-1].Dist(a.End()) > far {
			t.Fatal("the ends moved")
		}
		for _, c := range s.Cubics() {
			for i := range 9 {
				if d := offConic(a, c.At(float64(i)/8)); d > s.Err*1.01+far { // 1 %: the first order
					t.Fatalf("off by %v, bound %v", d, s.Err)
				}
			}
		}
		smooth(t, s)
	})
}

// smooth checks that neighbouring cubics share their tangent's direction.
func smooth(t *rapid.T, s Spline) {
	for i := 3; i+3 < len(s.Points); i += 3 {
		in, out := s.Points[i].Sub(s.Points[i-1]).Unit(), s.Points[i+1].Sub(s.Points[i]).Unit()
		if math.Abs(in.Cross(out)) > 1e-6 || in.Dot(out) < 0 { // handles of 1e-4 mm, rounded at 1e-12
			t.Fatalf("a corner at point %d", i)
		}
	}
}

// TestVertexIsSmooth: at the vertex the tangent is square to the axis, and the
// curve is drawn mirror-true.
func TestVertexIsSmooth(t *testing.T) {
	a := curve.Arc2{Curve2: curve.Curve2{Form: curve.Hyperbola, U: at(20, 0), W: at(0, 30)}, T0: -2, T1: 2}
	s := FromArc(a, 1, vec.V2{}, PaperTolerance).(Spline)
	n := len(s.Points)
	for i := range s.Points {
		if p, q := s.Points[i], s.Points[n-1-i]; math.Abs(p.X-q.X) > 1e-12*100 || math.Abs(p.Y+q.Y) > 1e-12*100 {
			t.Errorf("points %d are not mirror images: %v, %v", i, p, q)
		}
	}
	m := n / 2
	if s.Points[m] != at(20, 0) || s.Points[m+1].X != 20 || s.Points[m-1].X != 20 {
		t.Errorf("vertex %v between %v and %v", s.Points[m], s.Points[m-1], s.Points[m+1])
	}
}

// TestSeenOnEdge: a curve seen on edge is the line that it covers, however far it
// turns back.
func TestSeenOnEdge(t *testing.T) {
	for _, c := range []struct {
		name   string
		form   curve.Form
		u, w   vec.V2
		t0, t1 float64
		a, b   vec.V2
	}{
		{"half circle", curve.Ellipse, at(10, 0), at(0, 0), 0, math.Pi, at(10, 0), at(-10, 0)},
		{"whole circle", curve.Ellipse, at(10, 0), at(0, 0), 0, 2 * math.Pi, at(-10, 0), at(10, 0)},
		{"circle, slanting", curve.Ellipse, at(3, 4), at(3, 4), 0, 2 * math.Pi, at(-3*math.Sqrt2, -4*math.Sqrt2), at(3*math.Sqrt2, 4*math.Sqrt2)},
		{"quarter", curve.Ellipse, at(0, 0), at(0, 5), 0, math.Pi / 2, at(0, 0), at(0, 5)},
		{"parabola along its axis", curve.Parabola, at(0, 0), at(0, 2), -3, 2, at(0, 18), at(0, 0)},
		{"parabola across", curve.Parabola, at(4, 0), at(0, 0), -3, 2, at(-12, 0), at(8, 0)},
		{"hyperbola along its axis", curve.Hyperbola, at(5, 0), at(0, 0), -1, 1, at(5, 0), at(5*math.Cosh(1), 0)},
		{"hyperbola across", curve.Hyperbola, at(0, 0), at(0, 5), -1, 1, at(0, -5*math.Sinh(1)), at(0, 5*math.Sinh(1))},
	} {
		arc := curve.Arc2{Curve2: curve.Curve2{Form: c.form, U: c.u, W: c.w}, T0: c.t0, T1: c.t1}
		l, ok := FromArc(arc, 1, vec.V2{}, PaperTolerance).(Line)
		if !ok {
			t.Errorf("%s is not a line", c.name)
			continue
		}
		// a closed curve may be covered either way
		if arc.Start().Dist(arc.End()) < 1e-9 && l.A.Dist(c.b) < l.A.Dist(c.a) {
			l.A, l.B = l.B, l.A
		}
		if l.A.Dist(c.a) > 1e-12*20 || l.B.Dist(c.b) > 1e-12*20 { // rounding at 20 mm
			t.Errorf("%s: %v, want %v to %v", c.name, l, c.a, c.b)
		}
	}
}

func TestCircleStaysACircle(t *testing.T) {
	c := curve.Arc2{Curve2: curve.Curve2{Form: curve.Ellipse, U: at(0, 7), W: at(7, 1e-14)}, T0: 0, T1: 2 * math.Pi}
	e := FromArc(c, 1, vec.V2{}, PaperTolerance).(EllipseArc)
	if e.RX != e.RY || e.Rot != 0 || e.To > e.From || !e.Full() {
		t.Errorf("%+v", e)
	}
}

// wave is the developed edge of an obliquely cut cylinder: y = 40 cos(s/30).
type wave struct{}

func (wave) At(s float64) vec.V2 { return at(s, 40*math.Cos(s/30)) }
func (wave) Deriv(s float64, n int) vec.V2 {
	if n != 1 {
		panic("only the first derivative is promised")
	}
	return at(1, -40.0/30*math.Sin(s/30))
}

// TestPathKeepsItsTolerance measures the distance to the wave on its own: the
// nearest of many points round the same abscissa.
func TestPathKeepsItsTolerance(t *testing.T) {
	end := 60 * math.Pi
	s := FromPath2(wave{}, end, 0, 1, at(0, 0), PaperTolerance).(Spline)
	if s.Err > PaperTolerance || s.Err == 0 {
		t.Errorf("error %v", s.Err)
	}
	if s.Points[0] != (wave{}).At(end) || s.Points[len(s.Points)-1] != (wave{}).At(0) {
		t.Error("it does not run from t0 to t1")
	}
	for _, c := range s.Cubics() {
		for i := range 33 {
			p := c.At(float64(i) / 32)
			d := math.Inf(1)
			for j := -200; j <= 200; j++ {
				d = min(d, p.Dist(wave{}.At(p.X+float64(j)*1e-4)))
			}
			// between the measured places the deviation may be larger by a little: s²(1-s)² is flat
			// at its top, and eighths miss the top by none
			if d > s.Err*1.02+1e-4 { // 1e-4: the step of the search
				t.Errorf("off by %v, error stated %v", d, s.Err)
			}
		}
	}
	if n := len(s.Cubics()); n > 64 {
		t.Errorf("%d cubics for one wave", n)
	}
}

func TestPathOfConicStaysExact(t *testing.T) {
	c := curve.Curve2{Form: curve.Ellipse, U: at(10, 0), W: at(0, 10)}
	if _, ok := FromPath2(c, 0, 1, 1, vec.V2{}, PaperTolerance).(EllipseArc); !ok {
		t.Error("an arc became a spline")
	}
}

// TestArcsAsCubics: pieces of 22.5° keep within 7e-8 of the radius. The leading
// term of the error of the handle 4/3·tan(δ/4) is 2/27·sin⁶(δ/4)/cos²(δ/4).
func TestArcsAsCubics(t *testing.T) {
	strokes := Lowered(EllipseArc{C: at(5, 5), RX: 1000, RY: 1000, From: 0.3, To: 0.3 - 2*math.Pi})
	if len(strokes) != 16 || strokes[15].C[3] != strokes[0].C[0] {
		t.Errorf("%d pieces", len(strokes))
	}
	delta := math.Pi / 8
	want := 2.0 / 27 * math.Pow(math.Sin(delta/4), 6) / math.Pow(math.Cos(delta/4), 2)
	worst := 0.0
	for _, s := range strokes {
		for i := range 101 {
			worst = max(worst, math.Abs(s.C.At(float64(i)/100).Dist(at(5, 5))/1000-1))
		}
	}
	if worst > 7e-8 || math.Abs(worst/want-1) > 0.05 { // 5 %: the next term
		t.Errorf("error %v of the radius, theory %v", worst, want)
	}
}
