package flat

import (
	"fmt"
	"math"
	"slices"
	"strings"
	"testing"

	"epure/geom/body"
	"epure/geom/surface"
	"epure/geom/vec"
)

// Shapes whose patterns are known by hand: the degenerate cases, which are the
// normal ones on the bench.

// outline names the pieces of all loops in their order.
func outline(p *Pattern) string {
	var loops []string
	for _, l := range p.Loops {
		var names []string
		for _, q := range l {
			kind := "curve"
			switch {
			case q.IsArc():
				kind = "arc"
			case q.IsLine():
				kind = "line"
			}
			if q.Face == Seam {
				kind = "seam"
			}
			names = append(names, strings.TrimSpace(kind+" "+q.Label))
		}
		loops = append(loops, strings.Join(names, ", "))
	}
	return strings.Join(loops, " | ")
}

// why lists what the stations of a pattern tell, with their angles in degrees from the seam.
func why(p *Pattern) string {
	var out []string
	for _, s := range p.Stations {
		if s.Why != "" {
			out = append(out, fmt.Sprintf("%.4g %s", (s.Theta-p.opts.Seam)/degree, s.Why))
		}
	}
	return strings.Join(out, "; ")
}

func expect(t *testing.T, what, got, want string) {
	t.Helper()
	if got != want {
		t.Errorf("%s:\n got %s\nwant %s", what, got, want)
	}
}

func TestOutlines(t *testing.T) {
	cylinder, cone, frustum := upright(50, 50, 80), upright(60, 0, 80), upright(60, 30, 80)
	apex := vec.V3{Z: 80}
	for _, c := range []struct {
		name    string
		b       *body.Body
		seam    float64
		outline string
		why     string
	}{
		{"cylinder", cylinder, 0, "seam, line K.base, seam, line K.top", ""},
		{"frustum", frustum, 0, "arc K.base, seam, arc K.top, seam", ""},
		{"frustum, apex below", upright(30, 60, 80), 0, "seam, arc K.base, seam, arc K.top", ""},
		{"cone", cone, 0, "arc K.base, seam, seam", ""},
		{"cylinder cut aslant", cutOff(t, cylinder, vec.V3{Z: 40}, vec.V3{X: 1, Z: 2}, "P"), 0,
			"seam, line K.base, seam, curve P", "0 shortest, turn; 180 longest, turn; 360 shortest, turn"},
		{"cylinder cut aslant into the top", cutOff(t, cylinder, apex, vec.V3{X: 1, Z: 1}, "P"), 0,
			"seam, line K.base, seam, curve P, line K.top, curve P", "0 shortest, turn; 90 corner, longest; 270 corner, longest; 360 shortest, turn"},
		{"cylinder cut along its axis, seam cut away", cutOff(t, cylinder, vec.V3{X: 25}, vec.V3{X: 1}, "P"), 0,
			"line P, line K.base, line P, line K.top", "60 edge; 300 edge"},
		{"cylinder cut along its axis, seam in the middle", cutOff(t, cylinder, vec.V3{X: 25}, vec.V3{X: 1}, "P"), math.Pi,
			"seam, line K.base, line P, line K.top | line P, line K.base, seam, line K.top", "120 edge; 240 edge"},
		{"cylinder halved along the seam", cutOff(t, cylinder, vec.V3{}, vec.V3{Y: -1}, "P"), 0,
			"line P, line K.base, line P, line K.top", "0 edge; 180 edge; 360 edge"},
		{"cone cut through the apex, seam cut away", cutOff(t, cone, apex, vec.V3{X: 1}, "P"), 0,
			"arc K.base, line P, line P", "90 edge; 270 edge"},
		{"cone cut through the apex, seam in the middle", cutOff(t, cone, apex, vec.V3{X: 1}, "P"), math.Pi,
			"arc K.base, line P, seam | arc K.base, seam, line P", "90 edge; 270 edge"},
		{"cone cut beside the apex", cutOff(t, cone, vec.V3{X: 30}, vec.V3{X: 1}, "P"), 0,
			"curve P, arc K.base, curve P, seam, seam", "0 shortest, turn; 60 corner, longest; 300 corner, longest; 360 shortest, turn"},
		{"cylinder under a ridge", cutOff(t, cutOff(t, cylinder, apex, vec.V3{X: 1, Z: 1}, "P"), apex, vec.V3{X: -1, Z: 1}, "Q"), 0,
			"seam, line K.base, seam, curve P, curve Q, curve P",
			"0 shortest, turn; 90 corner, longest; 180 shortest, turn; 270 corner, longest; 360 shortest, turn"},
		{"cone cut along a generator", cutOff(t, cone, vec.V3{}, vec.V3{X: 4, Z: -3}, "P"), math.Pi,
			"arc K.base, curve P, arc K.base, seam, seam", "90 corner, longest; 180 shortest, turn; 270 corner, longest"},
	} {
		p := side(t, c.b, c.seam, 12)
		expect(t, c.name, outline(p), c.outline)
		expect(t, c.name, why(p), c.why)
		if pr := p.Proof(); pr.Worst() > 1e-12 || pr.Deviation > 1e-12*p.size {
			t.Errorf("%s: proof %+v", c.name, pr)
		}
	}
}

// Patterns outside up are seen from outside: x, y and the outward normal are right-handed,
// and the folding keeps lengths. This uses neither formula nor sign of the isometry.
func TestSeenFromOutside(t *testing.T) {
	level := vec.AxisFrame(vec.V3{X: 3}, vec.V3{Y: 1})
	leftward := vec.AxisFrame(vec.V3{X: 3}, vec.V3{X: -1})
	down := vec.Frame{X: vec.V3{X: 1}, Y: vec.V3{Y: -1}, Z: vec.V3{Z: -1}}
	for name, b := range map[string]*body.Body{
		"cylinder":           upright(50, 50, 80),
		"cone":               upright(50, 0, 80),
		"cone, apex below":   upright(0, 50, 80),
		"frustum, level":     body.Frustum("K", level, level, 50, 30, 80),
		"frustum, leftward":  body.Frustum("K", leftward, leftward, 30, 50, 80),
		"cylinder, level":    body.Frustum("K", level, level, 50, 50, 80),
		"frustum, downward":  body.Frustum("K", down, vec.World, 50, 30, 80),
		"cylinder, downward": body.Frustum("K", down, vec.World, 50, 50, 80),
	} {
		for _, inside := range []bool{false, true} {
			p, err := Of(b, 0, Options{Seam: 1, Divisions: 12, Inside: inside})
			if err != nil {
				t.Fatal(err)
			}
			for _, s := range p.Stations[1:12] {
				q := s.Spans[0].Low.Add(s.Spans[0].High).Scale(0.5)
				const d = 1e-4
				dx := p.Fold(q.Add(vec.V2{X: d})).Sub(p.Fold(q.Sub(vec.V2{X: d}))).Scale(0.5 / d)
				dy := p.Fold(q.Add(vec.V2{Y: d})).Sub(p.Fold(q.Sub(vec.V2{Y: d}))).Scale(0.5 / d)
				n := dx.Cross(dy)
				if inside {
					n = n.Neg()
				}
				// The difference quotient errs by d²/6 over the least radius squared, 1e-12, and by rounding over d, 1e-10.
				if off := n.Dist(b.Faces[0].Surface.Normal(p.Fold(q))); off > 1e-9 || math.Abs(dx.Dot(dy)) > 1e-9 {
					t.Fatalf("%s, inside %v: x × y is off the normal by %g", name, inside, off)
				}
			}
		}
	}
}

// The seam lies along +x on a cone and at x = 0 on a cylinder, either side up.
func TestSeamPlace(t *testing.T) {
	for _, inside := range []bool{false, true} {
		for _, b := range []*body.Body{upright(50, 30, 80), upright(30, 50, 80)} {
			p, _ := Of(b, 0, Options{Seam: 2, Divisions: 12, Inside: inside})
			if s := p.Stations[0].Spans[0]; s.Low.Y != 0 || s.High.Y != 0 || s.Low.X <= 0 || s.High.X <= s.Low.X {
				t.Errorf("seam %+v", s)
			}
		}
		p, _ := Of(upright(50, 50, 80), 0, Options{Seam: 2, Divisions: 12, Inside: inside})
		if s := p.Stations[0].Spans[0]; s.Low != (vec.V2{}) || s.High != (vec.V2{Y: 80}) {
			t.Errorf("seam %+v", s)
		}
	}
}

// The numbers run from the seam and come back to it.
func TestNumbers(t *testing.T) {
	p := side(t, cutOff(t, upright(50, 50, 80), vec.V3{Z: 50}, vec.V3{X: 1, Y: 0.3, Z: 2}, "P"), 0.1, 8)
	var got []string
	for _, s := range p.Stations {
		got = append(got, fmt.Sprint(s.Number))
	}
	expect(t, "numbers", strings.Join(got, " "), "1 0 2 3 4 5 0 6 7 8 1")
	first, last := p.Stations[0], p.Stations[10]
	exact(t, "girth", last.Spans[0].Low.X-first.Spans[0].Low.X, 100*math.Pi)
	exact(t, "seam", last.Length(), first.Length())
	for n := 1; n <= 8; n++ {
		l, _ := p.TrueLengthAt(n)
		want := p.TrueLength(0.1 + turn*float64(n-1)/8)
		exact(t, "true length", l, want)
	}
}

// Closed measures of partial patterns.
func TestPartialMeasures(t *testing.T) {
	p := side(t, cutOff(t, upright(50, 50, 80), vec.V3{X: 25}, vec.V3{X: 1}, "P"), 0, 12)
	exact(t, "turn", p.Turn(), 240*degree)
	exact(t, "area", p.Area(), 50*80*240*degree)
	exact(t, "width", p.Width(), 50*240*degree)
	exact(t, "height", p.Height(), 80)
	exact(t, "cut length", p.CutLength(), 2*(50*240*degree+80))
	exact(t, "no generator", p.TrueLength(0), 0)
	exact(t, "edge generator", p.TrueLength(60*degree), 80)
	exact(t, "girth", p.Girth(), 50*240*degree)

	p = side(t, cutOff(t, upright(60, 0, 80), vec.V3{Z: 80}, vec.V3{X: 1}, "P"), 0, 12)
	exact(t, "sector", measure(p.Sector), math.Pi*0.6)
	exact(t, "area", p.Area(), 0.5*100*100*math.Pi*0.6)
	exact(t, "cut length", p.CutLength(), 200+100*math.Pi*0.6)
	exact(t, "outer radius", measure(p.OuterRadius), 100)
	exact(t, "inner radius", measure(p.InnerRadius), 0)
	if v, err := p.Flat(vec.V3{Z: 80}); err != nil || v != (vec.V2{}) {
		t.Errorf("apex at %v, %v", v, err)
	}
}

// The box is exact: the sector of a full cone from its formula.
func TestBounds(t *testing.T) {
	p := side(t, upright(60, 0, 80), 0, 12) // R 100, sector 216°
	lo, hi := p.Bounds()
	exact(t, "left", lo.X, -100)
	exact(t, "right", hi.X, 100)
	exact(t, "top", hi.Y, 100)
	exact(t, "bottom", lo.Y, 100*math.Sin(216*degree))
	// A cut cone: no point of the edge, sampled a million times finer than the box is asked for, passes it.
	p = side(t, cutOff(t, upright(60, 0, 80), vec.V3{Z: 30}, vec.V3{X: 1, Y: 0.4, Z: 2}, "P"), 1, 12)
	lo, hi = p.Bounds()
	var l, h vec.V2
	for _, q := range slices.Concat(p.Loops...) {
		const n = 200000
		for k := range n + 1 {
			x := q.Path.At(q.T0 + (q.T1-q.T0)*float64(k)/n)
			l = vec.V2{X: min(l.X, x.X), Y: min(l.Y, x.Y)}
			h = vec.V2{X: max(h.X, x.X), Y: max(h.Y, x.Y)}
		}
	}
	// A step of turn/n misses an extreme by less than its square times the size.
	if d := max(math.Abs(l.X-lo.X), math.Abs(l.Y-lo.Y), math.Abs(h.X-hi.X), math.Abs(h.Y-hi.Y)); d > 1e-9*100 {
		t.Errorf("bounds %v %v, sampled %v %v", lo, hi, l, h)
	}
}

// Every derivative is that of the one before, by differences.
func TestDerivatives(t *testing.T) {
	for _, path := range []Path2{
		Wave{profile{false, 3, 1.5, -0.7}, 2, 1}, Wave{profile{false, 3, 1.5, -0.7}, 2, -1},
		Polar{profile{true, 0.9, 0.3, -0.2}, 0.4, 1}, Polar{profile{true, 0.9, 0.3, -0.2}, 0.4, -1},
	} {
		for n := 1; n <= 4; n++ {
			f := func(x float64) vec.V2 {
				if n == 1 {
					return path.At(x)
				}
				return path.Deriv(x, n-1)
			}
			for _, x := range []float64{0, 0.7, 2, 4, 6} {
				const d = 1e-3 // the five-point rule errs by d⁴ times a derivative, and by rounding over d
				num := f(x - 2*d).Sub(f(x + 2*d)).Add(f(x + d).Sub(f(x - d)).Scale(8)).Scale(1 / (12 * d))
				if got := path.Deriv(x, n); got.Dist(num) > 1e-10*(1+got.Len()) {
					t.Errorf("%T derivative %d at %g is %v, by differences %v", path, n, x, got, num)
				}
			}
		}
	}
}

// An edge that passes the apex closely is steep as a function of the angle;
// the outline still closes, and the loss is what the rounding of the angle makes of it.
func TestNearApex(t *testing.T) {
	for _, miss := range []float64{1e-2, 1e-4, 1e-6, 1e-8, 1e-10, 1e-12} {
		for _, n := range []vec.V3{{X: 1}, {X: 1, Z: 0.3}, {X: 1, Z: -0.3}, {X: -1, Z: 0.1}} {
			b := upright(60, 0, 80)
			pl := surface.Plane{F: vec.PlaneFrame(vec.V3{X: 80 * miss, Z: 80}, n.Unit())}
			c, err := b.Cut(pl, "P")
			if err != nil {
				t.Fatal(err)
			}
			p := side(t, c, 0.3, 12)
			pr := p.Proof()
			if off := math.Abs(pr.AreaFlat - pr.AreaSpace); off > p.allowed()*p.size {
				t.Errorf("miss %g, normal %v: areas differ by %g, allowed %g", miss, n, off, p.allowed()*p.size)
			}
			if pr.Deviation > p.allowed() {
				t.Errorf("miss %g, normal %v: deviation %g, allowed %g", miss, n, pr.Deviation, p.allowed())
			}
		}
	}
}

// Needles and discs: cones from 0.01° to 89.99° of half angle keep area and place.
func TestExtremeCones(t *testing.T) {
	for _, half := range []float64{0.01, 1, 45, 89, 89.99} {
		sin, cos := math.Sincos(half * degree)
		b := cutOff(t, upright(100*sin, 0, 100*cos), vec.V3{Z: 60 * cos}, vec.V3{X: cos, Z: 2 * sin}, "P")
		p := side(t, b, 0.7, 12)
		pr := p.Proof()
		if pr.Worst() > 1e-10 || pr.Deviation > rounding*p.size { // the goal for quadratures
			t.Errorf("half angle %g°: %+v", half, pr)
		}
		for _, s := range p.Stations {
			for _, x := range s.Spans {
				q, err := p.Flat(p.Fold(x.High))
				if err != nil || q.Dist(x.High) > rounding*p.size && s.Number != 1 {
					t.Errorf("half angle %g°: %v comes back as %v, %v", half, x.High, q, err)
				}
			}
		}
	}
}

func BenchmarkOf(b *testing.B) {
	k := cutOff(b, upright(120, 0, 260), vec.V3{X: 35}, vec.V3{X: 260, Z: 120}, "P")
	for b.Loop() {
		p := side(b, k, math.Pi, 12)
		p.Proof()
	}
}
