package drawing

import (
	"math"
	"testing"

	"gonum.org/v1/gonum/mathext"
	"pgregory.net/rapid"

	"epure/geom/vec"
)

// near compares to 1e-12 of the size: the promise of Length.
func near(t *testing.T, what string, got, want float64) {
	t.Helper()
	if math.Abs(got-want) > 1e-12*math.Max(1, math.Abs(want)) {
		t.Errorf("%s: %.15g, want %.15g", what, got, want)
	}
}

func TestLengths(t *testing.T) {
	near(t, "line", Length(Line{at(1, 2), at(4, 6)}), 5)
	near(t, "circle", Length(EllipseArc{RX: 10, RY: 10, From: 1, To: 1 + 2*math.Pi}), 20*math.Pi)
	near(t, "quarter", Length(EllipseArc{RX: 10, RY: 10, From: 3, To: 3 - math.Pi/2}), 5*math.Pi)
	// An arc from vertex to the end of the latus rectum of a parabola of focal
	// length 1: sqrt 2 + asinh 1 = 2.2955871494 (reference notes, section 9).
	near(t, "parabola", Length(Quad{at(0, 0), at(1, 0), at(2, 1)}), math.Sqrt2+math.Asinh(1))
	near(t, "ellipse seen on edge", Length(EllipseArc{RX: 10, From: 0, To: 2 * math.Pi}), 40)
	box := BoxAt(at(0, 0), 3, 4).Outline()
	near(t, "box", Length(box), 14)
	open := Path{Pieces: box.Pieces[:3], Closed: true}
	near(t, "box that lacks a side", Length(open), 14)
	if Length(Text{String: "x"}) != 0 || Length(Spline{}) != 0 {
		t.Error("length out of nothing")
	}
}

// TestEllipsesAgainstGonum: 4·A·E(m), m = 1 - B²/A², by gonum's own elliptic
// integral.
func TestEllipsesAgainstGonum(t *testing.T) {
	for _, q := range []float64{0.999999, 0.9, 0.5, 0.1, 0.01, 1e-4, 1e-8} {
		want := 4 * 50 * mathext.CompleteE(1-q*q)
		near(t, "ellipse", Length(EllipseArc{RX: 50, RY: 50 * q, Rot: 0.3, To: 2 * math.Pi}), want)
		near(t, "ellipse", Length(EllipseArc{RX: 50 * q, RY: 50, From: 0.7, To: 0.7 - 2*math.Pi}), want)
	}
}

// TestPerimetersOfTheNotes holds the table of perimeters in the reference notes,
// section 9, given to ten decimals.
func TestPerimetersOfTheNotes(t *testing.T) {
	for _, c := range [][3]float64{
		{10, 9, 59.7316043252}, {10, 8, 56.7233357779}, {10, 6, 51.0539977268}, {10, 5, 48.4422411027},
		{10, 3, 43.8591006957}, {10, 1, 40.6397418010}, {5, 3, 25.5269988634}, {10, 0, 40},
	} {
		if got := Length(EllipseArc{RX: c[0], RY: c[1], To: 2 * math.Pi}); math.Abs(got-c[2]) > 0.6e-10 {
			t.Errorf("%v by %v: %.12f, want %.10f", c[0], c[1], got, c[2])
		}
	}
}

// TestSplineIsItsQuad: a parabola raised to cubics has the same length.
func TestSplineIsItsQuad(t *testing.T) {
	q := Quad{at(0, 0), at(10, 40), at(50, 5)}
	c := Lowered(q)[0].C
	near(t, "raised parabola", Length(Spline{Points: c[:]}), Length(q))
}

func TestBoundsHoldTheShape(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		num := rapid.Float64Range(-100, 100)
		e := EllipseArc{C: at(num.Draw(t, "x"), num.Draw(t, "y")), RX: math.Abs(num.Draw(t, "rx")), RY: math.Abs(num.Draw(t, "ry")),
			Rot: num.Draw(t, "rot"), From: num.Draw(t, "from")}
		e.To = e.From + rapid.Float64Range(-2*math.Pi, 2*math.Pi).Draw(t, "turn")
		b := Bounds(e)
		tight := EmptyBox()
		const n = 2000
		for i := range n + 1 {
			p := e.At(e.From + (e.To-e.From)*float64(i)/n)
			if tight = tight.With(p); !b.Grow(1e-12 * 1000).Holds(tight) { // rounding at this size
				t.Fatalf("%v lies outside %v", p, b)
			}
		}
		// 2000 steps of at most π/1000 miss an extreme by r·(π/2000)²/2 at most
		if !tight.Grow(200 * math.Pi * math.Pi / 8e6).Holds(b) {
			t.Fatalf("box %v, points %v", b, tight)
		}
	})
}

func TestMovedMovesAll(t *testing.T) {
	d := at(3, -4)
	for _, s := range []Shape{
		Line{at(0, 0), at(1, 1)}, EllipseArc{C: at(5, 5), RX: 2, RY: 1, To: 3}, Quad{at(0, 0), at(1, 1), at(2, 0)},
		Spline{Points: []vec.V2{at(0, 0), at(1, 1), at(2, 1), at(3, 0)}}, Text{At: at(1, 1)}, BoxAt(at(0, 0), 2, 2).Outline(),
	} {
		a, b := Bounds(s), Bounds(Moved(s, d))
		if b.Min.Dist(a.Min.Add(d)) > 1e-12 || b.Max.Dist(a.Max.Add(d)) > 1e-12 {
			t.Errorf("%T: %v became %v", s, a, b)
		}
	}
}

func TestDirOfQuarters(t *testing.T) {
	for i, want := range []vec.V2{at(1, 0), at(0, 1), at(-1, 0), at(0, -1)} {
		if got := Dir(float64(i) * math.Pi / 2); got != want {
			t.Errorf("quarter %d: %v", i, got)
		}
	}
}
