package flat

import (
	"errors"
	"math"
	"slices"
	"testing"

	"epure/geom/body"
	"epure/geom/num"
	"epure/geom/surface"
	"epure/geom/vec"

	"pgregory.net/rapid"
)

// Random parts: frusta, cones (either way up) and cylinders anywhere, of any
// size over six decades, cut by up to three planes, of which many are of the
// awkward kinds: square to the axis, along it, through the apex, along a
// generator. Places and directions come from coarse grids, so that planes often
// meet in one line or point exactly, and otherwise keep off each other: an edge
// that passes the apex by 1e-7 of the size has nine digits as a function of the
// angle, and TestNearApex looks at that. rapid prints the seed of a failure.

// piece is a random part and what is needed to make it again.
type part struct {
	f         vec.Frame
	r0, r1, h float64
	cuts      []surface.Plane
}

func (p part) body(t *rapid.T) *body.Body {
	b := body.Frustum("K", p.f, vec.AxisFrame(p.f.O, p.f.Z), p.r0, p.r1, p.h)
	for i, c := range p.cuts {
		if d, err := b.Cut(c, string(rune('P'+i))); err == nil {
			b = d
		}
	}
	return b
}

func (p part) scaled(k float64) part {
	q := part{p.f.At(p.f.O.Scale(k)), p.r0 * k, p.r1 * k, p.h * k, nil}
	for _, c := range p.cuts {
		q.cuts = append(q.cuts, surface.Plane{F: c.F.At(c.F.O.Scale(k))})
	}
	return q
}

// grid draws one of the n+1 numbers that divide lo to hi evenly.
func grid(t *rapid.T, name string, lo, hi float64, n int) float64 {
	return lo + (hi-lo)*float64(rapid.IntRange(0, n).Draw(t, name))/float64(n)
}

func unit(t *rapid.T, name string) vec.V3 {
	z := grid(t, name+" z", -1, 1, 14)
	s, c := math.Sincos(grid(t, name+" angle", 0, turn, 40))
	r := math.Sqrt(1 - z*z)
	return vec.V3{X: r * c, Y: r * s, Z: z}
}

func drawPart(t *rapid.T) part {
	axis := rapid.SampledFrom([]vec.V3{{Z: 1}, {Z: -1}, {X: 1}, {Y: -1}, unit(t, "axis")}).Draw(t, "axis")
	size := math.Pow(10, grid(t, "decade", -1, 5, 17))
	at := unit(t, "at").Scale(size * grid(t, "off", 0, 3, 7))
	p := part{
		f:  vec.AxisFrame(at, axis),
		r0: size * rapid.SampledFrom([]float64{0, 0.4, 0.5, 0.9, 1}).Draw(t, "r0"),
		r1: size * rapid.SampledFrom([]float64{0, 0.5, 0.5, 0.7, 1}).Draw(t, "r1"),
		h:  size * grid(t, "h", 0.3, 2, 17),
	}
	p.f.Z = axis
	if p.f.X.Cross(p.f.Y).Dot(axis) < 0 {
		p.f.Y = p.f.Y.Neg()
	}
	if p.r0 == 0 && p.r1 == 0 {
		p.r0 = size
	}
	for range rapid.IntRange(0, 3).Draw(t, "cuts") {
		p.cuts = append(p.cuts, p.drawCut(t))
	}
	return p
}

func (p part) drawCut(t *rapid.T) surface.Plane {
	z := p.h * grid(t, "z", 0.05, 0.95, 18)
	r := p.r0 + (p.r1-p.r0)*z/p.h
	k := grid(t, "k", -0.9, 0.9, 18)
	s, c := math.Sincos(grid(t, "about", 0, turn, 36))
	out := p.f.X.Scale(c).Along(p.f.Y, s)
	o := p.f.O.Along(p.f.Z, z).Along(out, k*r)
	n := p.f.Z
	switch rapid.IntRange(0, 4).Draw(t, "kind") {
	case 0:
		n = unit(t, "n")
	case 1: // along the axis
		n = out
	case 2: // square to it
	case 3: // along a generator: a parabola on a cone
		if p.r0 != p.r1 {
			g := p.f.Z.Scale(p.h).Along(out, p.r1-p.r0)
			n = g.Cross(p.f.Z.Cross(out)).Unit()
		}
	case 4: // through the apex
		if p.r0 != p.r1 {
			o = p.f.O.Along(p.f.Z, p.h*p.r0/(p.r0-p.r1))
			n = out.Along(p.f.Z, k).Unit()
		}
	}
	if rapid.Bool().Draw(t, "flip") {
		n = n.Neg()
	}
	return surface.Plane{F: vec.PlaneFrame(o, n)}
}

func drawOptions(t *rapid.T) Options {
	return Options{
		Seam:      rapid.SampledFrom([]float64{0, math.Pi / 2, math.Pi, grid(t, "any seam", 0, turn, 47)}).Draw(t, "seam"),
		Divisions: rapid.IntRange(3, 24).Draw(t, "divisions"),
		Inside:    rapid.Bool().Draw(t, "inside"),
	}
}

func unroll(t *rapid.T, b *body.Body, o Options) *Pattern {
	t.Helper()
	for _, f := range b.Faces {
		t.Logf("%s %+v", f.Label, f.Surface)
	}
	t.Logf("%+v", o)
	p, err := Of(b, 0, o)
	if e := (*FaceError)(nil); errors.As(err, &e) && e.Reason == "nothing of it is left" {
		for k := range 720 {
			if r := b.Rulings(0, float64(k)*degree/2); len(r) > 0 {
				t.Fatalf("%v, but the generator at %g° is %v", err, float64(k)/2, r)
			}
		}
		t.SkipNow()
	}
	if err != nil {
		t.Fatalf("%v", err)
	}
	return p
}

// same fails when a and b differ by more than tol of the size given.
func same(t *rapid.T, what string, a, b, tol float64) {
	t.Helper()
	if !(math.Abs(a-b) <= tol) {
		t.Fatalf("%s: %.17g and %.17g differ by %g, allowed %g", what, a, b, a-b, tol)
	}
}

// rounding is the share of the size by which two routes to one length may
// differ: how far off the body lets its corners be.
const rounding = num.OnSurface

// allowed is the difference allowed between two routes to one length, mm:
// rounding, and what the rounding of an angle makes of the steepest edge.
func (p *Pattern) allowed() float64 {
	slope := 0.0
	for _, m := range p.rims {
		for _, phi := range []float64{m.from, m.to} {
			slope = max(slope, math.Abs(m.derivs(phi, 1)[1]))
		}
	}
	return rounding*p.size + angleError*slope
}

// Area and edge lengths flat are those in space; what is folded back lies on the solid.
func TestProof(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		b := drawPart(t).body(t)
		p := unroll(t, b, drawOptions(t))
		pr, size := p.Proof(), b.Size()
		same(t, "area by panels and by outline", p.Area(), pr.AreaFlat, p.allowed()*size)
		same(t, "area in space", p.Area(), pr.AreaSpace, p.allowed()*size)
		for _, e := range pr.Edges {
			same(t, "edge "+e.Label, e.Flat, e.Space, p.allowed())
		}
		same(t, "deviation", pr.Deviation, 0, p.allowed())
	})
}

// The pieces of generators are those that the body finds by lines against its surfaces.
func TestRulings(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		b := drawPart(t).body(t)
		p := unroll(t, b, drawOptions(t))
		theta := grid(t, "theta", 0, turn, 1009)
		want := 0.0
		for _, r := range b.Rulings(0, theta) {
			want += r.B - r.A
		}
		same(t, "true length", p.TrueLength(theta), want, p.allowed())
		for _, s := range p.Stations {
			if s.Number == 0 || s.Why != "" {
				continue // at a corner or along an edge either side may count
			}
			want := b.Rulings(0, s.Theta)
			if len(want) != len(s.Spans) {
				t.Fatalf("station %d: %v, want %v", s.Number, s.Spans, want)
			}
			for i, r := range want {
				same(t, "lo", s.Spans[i].Lo, r.A, p.allowed())
				same(t, "hi", s.Spans[i].Hi, r.B, p.allowed())
			}
		}
	})
}

// Outlines are closed, anticlockwise and within their bounds, which they touch.
func TestOutline(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		b := drawPart(t).body(t)
		p := unroll(t, b, drawOptions(t))
		lo, hi := p.Bounds()
		box := [4]float64{math.Inf(1), math.Inf(1), math.Inf(-1), math.Inf(-1)}
		for _, l := range p.Loops {
			for i, q := range l {
				if d := q.End().Dist(l[(i+1)%len(l)].Start()); d > p.allowed() {
					t.Fatalf("a gap of %g mm after piece %d", d, i)
				}
				for k := range 200 {
					x := q.Path.At(q.T0 + (q.T1-q.T0)*float64(k)/199)
					box = [4]float64{min(box[0], x.X), min(box[1], x.Y), max(box[2], x.X), max(box[3], x.Y)}
				}
			}
		}
		if p.Area() < 0 || p.areaFlat() < -p.allowed()*b.Size() {
			t.Fatalf("area %g, %g", p.Area(), p.areaFlat())
		}
		if len(p.Loops) == 0 {
			return
		}
		for i, d := range []float64{box[0] - lo.X, box[1] - lo.Y, hi.X - box[2], hi.Y - box[3]} {
			// 199 steps on a turn miss an extreme by less than half the square of a step: (turn/398)²/2 of 8 sizes.
			if d < -p.allowed() || d > 1e-3*8*max(b.Size(), hi.X-lo.X) {
				t.Fatalf("bounds are %g mm off the outline on side %d", d, i)
			}
		}
	})
}

// The inside up is the exact mirror of the outside up, bit for bit.
func TestMirror(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		b := drawPart(t).body(t)
		o := drawOptions(t)
		o.Inside = false
		out := unroll(t, b, o)
		o.Inside = true
		in := unroll(t, b, o)
		mirror := func(v vec.V2) vec.V2 {
			if out.roll.cone {
				return vec.V2{X: v.X, Y: 0 - v.Y}
			}
			return vec.V2{X: 0 - v.X, Y: v.Y}
		}
		for i, s := range out.Stations {
			r := in.Stations[i]
			if s.Number != r.Number || s.Theta != r.Theta || s.Why != r.Why || len(s.Spans) != len(r.Spans) {
				t.Fatalf("stations %v, %v", s, r)
			}
			for k, x := range s.Spans {
				if y := r.Spans[k]; mirror(x.Low) != y.Low || mirror(x.High) != y.High || x.Lo != y.Lo || x.Hi != y.Hi {
					t.Fatalf("spans %v, %v", x, y)
				}
			}
		}
		for i, l := range out.Loops {
			m := slices.Clone(in.Loops[i])
			slices.Reverse(m)
			for k, q := range l {
				if q.T0 != m[k].T1 || q.T1 != m[k].T0 || q.Face != m[k].Face {
					t.Fatalf("pieces %v, %v", q, m[k])
				}
				for _, s := range []float64{q.T0, q.T1, (q.T0 + q.T1) / 2} {
					if mirror(q.Path.At(s)) != m[k].Path.At(s) || mirror(q.Path.Deriv(s, 1)) != m[k].Path.Deriv(s, 1) {
						t.Fatalf("piece %d is not mirrored at %g", k, s)
					}
				}
			}
		}
		if out.Area() != in.Area() {
			t.Fatal("the area changed")
		}
	})
}

// Where the seam is changes neither area nor the lengths of edges.
func TestSeamMoves(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		b := drawPart(t).body(t)
		o := drawOptions(t)
		p := unroll(t, b, o)
		o.Seam = grid(t, "other seam", -turn, turn, 101)
		q := unroll(t, b, o)
		size := b.Size()
		same(t, "area", p.Area(), q.Area(), p.allowed()*size)
		pe, qe := p.edgeProofs(), q.edgeProofs()
		if len(pe) != len(qe) {
			t.Fatalf("edges %v, %v", pe, qe)
		}
		for i := range pe {
			same(t, pe[i].Label, pe[i].Flat, qe[i].Flat, p.allowed())
		}
	})
}

// A part a thousand times as big has a pattern a thousand times as big.
func TestScale(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		d := drawPart(t)
		o := drawOptions(t)
		k := rapid.SampledFrom([]float64{1e-3, 1e3}).Draw(t, "k")
		p, q := unroll(t, d.body(t), o), unroll(t, d.scaled(k).body(t), o)
		size := q.size
		if len(p.Stations) != len(q.Stations) || len(p.Loops) != len(q.Loops) {
			t.Fatalf("%d stations and %d loops, scaled %d and %d", len(p.Stations), len(p.Loops), len(q.Stations), len(q.Loops))
		}
		same(t, "area", p.Area()*k*k, q.Area(), q.allowed()*size)
		same(t, "cut length", p.CutLength()*k, q.CutLength(), q.allowed())
		same(t, "width", p.Width()*k, q.Width(), q.allowed())
		same(t, "height", p.Height()*k, q.Height(), q.allowed())
		for i, s := range p.Stations {
			r := q.Stations[i]
			if s.Number != r.Number || s.Why != r.Why {
				t.Fatalf("station %+v, scaled %+v", s, r)
			}
			same(t, "length", s.Length()*k, r.Length(), q.allowed())
		}
	})
}

// A point of the face goes to the pattern and back; a point off it is refused with its distance.
func TestFlatAndFold(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		b := drawPart(t).body(t)
		p := unroll(t, b, drawOptions(t))
		s := rapid.SampledFrom(p.Stations).Draw(t, "station")
		for _, x := range s.Spans {
			u := x.Lo + (x.Hi-x.Lo)*rapid.Float64Range(0, 1).Draw(t, "u")
			q := p.roll.space(s.Theta-p.opts.Seam, u)
			v, err := p.Flat(q)
			if err != nil {
				t.Fatal(err)
			}
			same(t, "back in space", p.Fold(v).Dist(q), 0, onFace*b.Size())
			off := b.Size() * 1e-3
			n := b.Faces[0].Surface.Normal(q)
			if u < 2*off {
				continue // next to the apex the foot is on another generator
			}
			e, ok := errOf(p.Flat(q.Along(n, off))).(*OffError)
			if !ok || e.OnSurface {
				t.Fatalf("no error off the surface: %v", e)
			}
			same(t, "distance", e.Distance, off, p.allowed())
		}
	})
}

func errOf(_ vec.V2, err error) error { return err }
