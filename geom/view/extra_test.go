package view

import (
	"fmt"
	"math"
	"math/rand/v2"
	"slices"
	"testing"

	"epure/geom/body"
	"epure/geom/curve"
	"epure/geom/vec"
)

func TestGenerators(t *testing.T) {
	cone := frustum(vec.V3{}, 50, 0, 120)
	var wires []curve.Arc
	for k := range 12 {
		sin, cos := math.Sincos(float64(k) * math.Pi / 6)
		wires = append(wires, curve.Segment(vec.V3{X: 50 * cos, Y: 50 * sin}, vec.V3{Z: 120}))
	}
	// in the elevation those behind (Y > 0) coincide with those before and vanish, the outermost two stay
	p := SplitBy(wires, []*body.Body{cone}, front)
	var drawn []int
	for _, q := range p {
		if !q.Visible || q.Body != Wire || q.B != q.A {
			t.Errorf("elevation: %s", words(q))
		}
		drawn = append(drawn, q.A)
	}
	if want := []int{0, 6, 7, 8, 9, 10, 11}; !slices.Equal(drawn, want) {
		t.Errorf("elevation: generators %v, want %v", drawn, want)
	}
	for _, q := range SplitBy(wires, []*body.Body{cone}, plan) {
		if !q.Visible {
			t.Errorf("plan: %s", words(q))
		}
	}
	for _, q := range SplitBy(wires, []*body.Body{cone}, below) {
		if q.Visible {
			t.Errorf("from below: %s", words(q))
		}
	}
	// the axis is inside; a wire that runs on below the base is seen there
	axis := curve.Segment(vec.V3{Z: -30}, vec.V3{Z: 150})
	check(t, "axis", SplitBy([]curve.Arc{axis}, []*body.Body{cone}, front), "-1 visible line (0,-30) (0,0)", "-1 hidden line (0,0) (0,120)", "-1 visible line (0,120) (0,150)")
	// without bodies all is seen, and a closed wire stays one
	ring := curve.Arc{Curve: curve.Circle(vec.World, 30), T1: 2 * math.Pi}
	check(t, "no bodies", SplitBy([]curve.Arc{ring, axis}, nil, front), "-1 visible line (-30,0) (30,0)", "-1 visible line (0,-30) (0,150)")
	check(t, "no bodies, plan", SplitBy([]curve.Arc{ring, axis}, nil, plan), "-1 visible whole ellipse (0,0)")
}

// A ring round a cylinder, seen from 30° above: the half toward the viewer is visible.
func TestRing(t *testing.T) {
	can := frustum(vec.V3{}, 40, 40, 100)
	f := vec.ViewFrame(vec.V3{Y: math.Cos(math.Pi / 6), Z: -0.5})
	ring := curve.Arc{Curve: curve.Circle(vec.World.At(vec.V3{Z: 50}), 40), T1: 2 * math.Pi}
	y := 50 * math.Cos(math.Pi/6)
	for _, p := range SplitBy([]curve.Arc{ring}, []*body.Body{can}, f) {
		// contour generators stand at x = ±40, so the ring turns there, at its own parameters 0 and π
		want := map[bool]float64{true: y - 40*0.5, false: y + 40*0.5}[p.Visible]
		if got := p.Image.Mid().Y; math.Abs(got-want) > 1e-12*100 || math.Abs(p.Space.T1-p.Space.T0-math.Pi) > 1e-12 {
			t.Errorf("%s: middle at %v, want %v; %v", words(p), got, want, p.Space)
		}
	}
}

// Wires on and through random scenes agree with brute force at random points.
func TestRandomWires(t *testing.T) {
	n := 0
	for k := range *scenes / 2 {
		s := newRandom(k)
		r := rand.New(rand.NewPCG(seed+2, uint64(k)))
		var wires []curve.Arc
		for _, o := range s.solids {
			if o.ball {
				ring := curve.Circle(vec.PlaneFrame(o.f.O, anywhere(r)), o.r0)
				wires = append(wires, curve.Arc{Curve: ring, T1: 2 * math.Pi})
				continue
			}
			theta, z := 2*math.Pi*r.Float64(), o.h*r.Float64()
			rim := func(z float64) vec.V3 {
				rad := o.r0 + (o.r1-o.r0)*z/o.h
				return o.f.Point(vec.V3{X: rad * math.Cos(theta), Y: rad * math.Sin(theta), Z: z})
			}
			ring := curve.Circle(o.f.At(o.f.Point(vec.V3{Z: z})), o.r0+(o.r1-o.r0)*z/o.h)
			wires = append(wires, curve.Segment(rim(0), rim(o.h)), curve.Arc{Curve: ring, T1: 2 * math.Pi})
		}
		pieces := SplitBy(wires, s.bodies, s.f)
		for i, p := range pieces {
			for range 4 {
				n++
				at := p.Image.T0 + (p.Image.T1-p.Image.T0)*(0.02+0.96*r.Float64())
				q := p.Space.At(p.SpaceAt(at))
				where := fmt.Sprintf("%s wire piece %d %+v at %v", s.name, i, p, q)
				if d := s.f.Flat(q).Dist(p.Image.At(at)); d > dip*s.size {
					t.Fatalf("%s: image off by %g", where, d)
				}
				if v := s.deepest(q); p.Visible && v < -dip*s.size || !p.Visible && v > -graze*s.smallest() {
					t.Fatalf("%s: depth %g", where, v)
				}
				s.checkSingle(t, pieces, i, at, where)
			}
		}
		for i, w := range wires { // nothing of a wire is lost
			q := s.f.Flat(w.At(w.T0 + (w.T1-w.T0)*r.Float64()))
			best := math.Inf(1)
			for _, p := range pieces {
				_, d := nearest(p, q, 2*near*s.size)
				best = min(best, d)
			}
			if best > near*s.size {
				t.Fatalf("%s: wire %d is not drawn at %v", s.name, i, q)
			}
		}
	}
	t.Logf("%d points of wires", n)
}

func TestWithout(t *testing.T) {
	cone := lines(front, frustum(vec.V3{}, 50, 0, 120))
	above, under := parabola(t)
	check(t, "elevation", Without(cone, lines(front, above)), "0 visible line (10,0) (50,0)", "0 visible line (30,48) (50,0)")
	check(t, "elevation, other part", Without(cone, lines(front, under)), "0 visible line (-50,0) (10,0)", "0 visible line (-50,0) (0,120)", "0 visible line (0,120) (30,48)")
	check(t, "elevation, both", Without(cone, lines(front, above, under)))
	check(t, "all of the part but the cut", Without(lines(front, above), cone), "0 visible line (10,0) (30,48)")
	top := lines(plan, frustum(vec.V3{}, 50, 0, 120))
	check(t, "plan", Without(top, lines(plan, above)), "0 visible ellipse (10,-"+chord+") (10,"+chord+")")
	if p := Without(top, lines(plan, above))[0]; p.Image.Mid().X < 49 {
		t.Errorf("the arc left over is the wrong one: middle %v", p.Image.Mid())
	}
	check(t, "plan, nothing in common", Without(top, lines(plan, frustum(vec.V3{X: 100}, 50, 0, 120))), "0 visible whole ellipse (0,0)")
	check(t, "nothing to leave out", Without(top, nil), "0 visible whole ellipse (0,0)")
	// an edge-on circle, cut by a segment within it, keeps its way back to space
	for _, p := range Without(cone, SplitBy([]curve.Arc{curve.Segment(vec.V3{X: -10}, vec.V3{X: 20})}, nil, front)) {
		if p.Space.Form != curve.Ellipse {
			continue
		}
		for k := range 5 {
			at := p.Image.T0 + (p.Image.T1-p.Image.T0)*float64(k)/4
			if d := front.Flat(p.Space.At(p.SpaceAt(at))).Dist(p.Image.At(at)); d > 1e-12*100 {
				t.Errorf("%s: SpaceAt off by %g", words(p), d)
			}
		}
	}
}

// The box of an ellipse from its two conjugate half-diameters u and w reaches √(u² + w²) to each side.
func TestBox(t *testing.T) {
	if _, _, ok := Box(nil); ok {
		t.Error("the box of nothing")
	}
	r := rand.New(rand.NewPCG(seed, 3))
	for range 200 {
		c := curve.Curve2{Form: curve.Ellipse, C: vec.V2{X: r.NormFloat64(), Y: r.NormFloat64()}, U: vec.V2{X: r.NormFloat64(), Y: r.NormFloat64()}, W: vec.V2{X: r.NormFloat64(), Y: r.NormFloat64()}}
		lo, hi, _ := Box([]Piece{{Image: curve.Arc2{Curve2: c, T1: 2 * math.Pi}}})
		x, y := math.Hypot(c.U.X, c.W.X), math.Hypot(c.U.Y, c.W.Y)
		for _, d := range []float64{hi.X - c.C.X - x, lo.X - c.C.X + x, hi.Y - c.C.Y - y, lo.Y - c.C.Y + y} {
			if math.Abs(d) > 1e-14*8 { // a few roundings of numbers of the size 1 to 4
				t.Fatalf("seed %d: %v: box %v %v off by %g", seed, c, lo, hi, d)
			}
		}
	}
	// the parabola's vertex (30, 0) and its ends on x = 10
	_, under := parabola(t)
	lo, hi, _ := Box(lines(plan, under)[1:2])
	y := math.Sqrt(2400)
	if lo.Dist(vec.V2{X: 10, Y: -y}) > 1e-12*50 || hi.Dist(vec.V2{X: 30, Y: y}) > 1e-12*50 {
		t.Errorf("parabola: %v %v", lo, hi)
	}
}

func TestSeen(t *testing.T) {
	cone, can := frustum(vec.V3{Y: -100}, 50, 0, 120), frustum(vec.V3{Y: 100}, 60, 60, 100)
	bodies := []*body.Body{cone, can}
	for _, c := range []struct {
		p    vec.V3
		want bool
	}{
		{vec.V3{Y: -150}, true},                                              // frontmost of the cone's base
		{vec.V3{Y: -50}, false},                                              // rearmost, across the base seen edge-on
		{vec.V3{X: 50, Y: -100}, true},                                       // on the contour
		{vec.V3{Y: -100, Z: 120}, true},                                      // apex
		{vec.V3{Y: 40, Z: 50}, false},                                        // the cylinder behind the cone
		{vec.V3{Y: 40, X: 0.1, Z: 121}, true},                                // above both
		{vec.V3{X: 60, Y: 100, Z: 50}, true},                                 // the cylinder's contour
		{vec.V3{Y: -200}, true},                                              // in the air before both
		{vec.V3{Y: -100, Z: 10}, false},                                      // inside
		{vec.V3{X: 8.34, Y: 100 - math.Sqrt(3600-8.34*8.34), Z: 100}, true},  // just beside the cone's outline at that level, 8.3333
		{vec.V3{X: 8.33, Y: 100 - math.Sqrt(3600-8.33*8.33), Z: 100}, false}, // just within
	} {
		if got := Seen(bodies, front, c.p); got != c.want {
			t.Errorf("%v: seen %v", c.p, got)
		}
	}
	for z, want := range map[float64]bool{0: false, 50: false, 100: true} {
		if got := Seen(bodies, plan, vec.V3{X: 60, Y: 100, Z: z}); got != want {
			t.Errorf("the cylinder's side at %g from above: seen %v", z, got)
		}
	}
	for _, c := range []struct {
		p    vec.V3
		want int
	}{{vec.V3{Y: -170, Z: 50}, 0}, {vec.V3{Y: -100, Z: 50}, 1}, {vec.V3{Y: 30, Z: 50}, 1}, {vec.V3{Y: 300, Z: 50}, 2}, {vec.V3{X: 60, Y: 300, Z: 50}, 0}} {
		if got := Layers(bodies, front, c.p); got != c.want {
			t.Errorf("%v: %d layers, want %d", c.p, got, c.want)
		}
	}
	down := vec.V3{X: 50, Z: -120}.Unit()
	if !Seen(bodies, vec.ViewFrame(down), vec.V3{X: 50, Y: -100}) {
		t.Error("the foot of a generator seen end-on is hidden")
	}
}

// A scene drawn at another scale, or with its bodies in another order, is the same drawing.
func TestScaleAndOrder(t *testing.T) {
	for k := range *scenes / 2 {
		s := newRandom(k)
		want := Lines(s.bodies, s.f)
		for _, scale := range []float64{1e-3, 1e3} {
			var bodies []*body.Body
			for _, o := range s.solids {
				b, _ := o.scaled(scale).body()
				bodies = append(bodies, b)
			}
			sameDrawing(t, fmt.Sprintf("%s × %g", s.name, scale), want, Lines(bodies, s.f), scale, near*s.size)
		}
		turned := slices.Clone(s.bodies)
		slices.Reverse(turned)
		sameDrawing(t, s.name+" in reverse", want, Lines(turned, s.f), 1, near*s.size)
	}
}

func (s solid) scaled(k float64) solid {
	s.f.O = s.f.O.Scale(k)
	s.r0, s.r1, s.h = s.r0*k, s.r1*k, s.h*k
	s.cuts = slices.Clone(s.cuts)
	for i := range s.cuts {
		s.cuts[i].O = s.cuts[i].O.Scale(k)
	}
	return s
}

// sameDrawing: the middle of every piece of one drawing lies on a piece of the other with the same verdict.
func sameDrawing(t *testing.T, name string, a, b []Piece, scale, slack float64) {
	t.Helper()
	on := func(p Piece, q vec.V2, in []Piece, tol float64) bool {
		return slices.ContainsFunc(in, func(o Piece) bool {
			_, d := nearest(o, q, 2*tol)
			return o.Visible == p.Visible && d < tol
		})
	}
	for _, p := range a {
		if !on(p, p.Image.Mid().Scale(scale), b, slack*scale) {
			t.Fatalf("%s: missing %s", name, words(p))
		}
	}
	for _, p := range b {
		if !on(p, p.Image.Mid().Scale(1/scale), a, slack) {
			t.Fatalf("%s: too much %s", name, words(p))
		}
	}
}
