package flat

import (
	"errors"
	"math"
	"testing"

	"epure/geom/body"
	"epure/geom/surface"
	"epure/geom/vec"
)

// Values from outside. "standards" is reference/standards.md of the project,
// whose section 10 lists computed cross-checks and worked examples of printed
// books with our recomputation; "needs" is design/needs.md, computed with 25
// digits apart from this program. Each is compared within half a unit of its
// last printed digit.

const degree = math.Pi / 180

// upright is a frustum on the ground about the z axis.
func upright(r0, r1, h float64) *body.Body {
	return body.Frustum("K", vec.World, vec.World, r0, r1, h)
}

// side unrolls the curved face with the seam at the given angle.
func side(t testing.TB, b *body.Body, seam float64, n int) *Pattern {
	t.Helper()
	p, err := Of(b, 0, Options{Seam: seam, Divisions: n})
	if err != nil {
		t.Fatal(err)
	}
	return p
}

// cutOff removes what lies on the side of the normal.
func cutOff(t testing.TB, b *body.Body, through, normal vec.V3, label string) *body.Body {
	t.Helper()
	c, err := b.Cut(surface.Plane{F: vec.PlaneFrame(through, normal.Unit())}, label)
	if err != nil {
		t.Fatal(err)
	}
	return c
}

// near checks a value against a printed one, half a unit of the last digit either way.
func near(t *testing.T, what string, got, want, unit float64) {
	t.Helper()
	if !(math.Abs(got-want) <= unit/2*(1+1e-6)) { // the printed decimal is itself rounded to a float64
		t.Errorf("%s is %.10g, printed %.10g", what, got, want)
	}
}

// exact checks two values that are equal but for rounding: 1e-12 is the goal for closed forms.
func exact(t *testing.T, what string, got, want float64) {
	t.Helper()
	if !(math.Abs(got-want) <= 1e-12*max(math.Abs(want), math.Abs(got))) {
		t.Errorf("%s is %.17g, want %.17g", what, got, want)
	}
}

func measure(f func() (float64, bool)) float64 {
	v, ok := f()
	if !ok {
		return math.NaN()
	}
	return v
}

func TestFrusta(t *testing.T) {
	for _, c := range []struct {
		name                         string
		d0, d1, h                    float64
		outer, inner, sector, chord  float64
		unitR, unitSector, unitChord float64
	}{
		{"standards §10, computed", 100, 50, 80, 167.6305, 83.8153, 107.3790, 270.1600, 1e-4, 1e-4, 1e-4},
		{"standards §10, computed", 300, 150, 200, 427.2002, 213.6001, 126.4044, 762.6406, 1e-4, 1e-4, 1e-4},
		{"standards §10, computed", 1000, 600, 500, 1346.2912, 807.7747, 133.7006, 0, 1e-4, 1e-4, 0},
		{"standards §10, computed", 50, 0, 60, 65, 0, 138.4615, 0, 1e-4, 1e-4, 0},
		{"standards §10, computed", 48, 0, 55, 60.0083, 0, 143.9800, 0, 1e-4, 1e-4, 0},
		// needs prints 309.5077: a slip, since 360° · 160/186.078 is 309.548.
		{"needs §3, scenario 1, hat", 320, 0, 95, 186.078, 0, 309.5477, 0, 1e-3, 1e-4, 0},
		{"needs §3, scenario 10, cyclone", 400, 160, 800, 1348.250, 539.300, 53.4026, 0, 1e-3, 1e-4, 0},
		{"needs §2, row 8", 3000, 2950, 400, 24046.83, 0, 22.4562, 9364.570, 1e-2, 1e-4, 1e-3},
		{"standards §10, example 5 (Atkins): dia 3, slant 2", 3, 0, math.Sqrt(4 - 2.25), 2, 0, 270, 0, 1e-9, 1e-9, 0},
		{"standards §10, example 33: apex 90", 2, 0, 1, math.Sqrt2, 0, 254.5584, 0, 1e-12, 1e-4, 0},
	} {
		for _, up := range []bool{true, false} { // the wide end below, then above
			b := upright(c.d0/2, c.d1/2, c.h)
			if !up {
				b = upright(c.d1/2, c.d0/2, c.h)
			}
			p := side(t, b, 0, 12)
			near(t, c.name+": outer radius", measure(p.OuterRadius), c.outer, c.unitR)
			if c.inner > 0 {
				near(t, c.name+": inner radius", measure(p.InnerRadius), c.inner, c.unitR)
			} else if c.d1 == 0 && measure(p.InnerRadius) != 0 {
				t.Errorf("%s: inner radius is %g", c.name, measure(p.InnerRadius))
			}
			near(t, c.name+": sector", measure(p.Sector)/degree, c.sector, c.unitSector)
			exact(t, c.name+": girth", p.Girth(), math.Pi*c.d0)
			if c.unitChord > 0 {
				n := len(p.Stations) - 1
				chord := p.Stations[0].Spans[0].High.Dist(p.Stations[n].Spans[0].High)
				near(t, c.name+": long chord", chord, c.chord, c.unitChord)
			}
		}
	}
}

func TestLateralAreas(t *testing.T) {
	ft := 12.0
	for _, c := range []struct {
		name            string
		d0, d1, h       float64
		area, per, unit float64
	}{
		{"standards §10, example 1 (Longfield): dia 5, slant 12", 5, 0, math.Sqrt(144 - 6.25), 94.2478, 1, 1e-4},
		{"standards §10, example 3 (Longfield), computed", 6, 3, 3, 47.4175, 1, 1e-4},
		{"standards §10, example 28", 20, 12, 30, 1521.3096, 1, 1e-4},
		{"standards §10, example 29: slant 10 ft 6", 5*ft + 4, 8*ft + 3, math.Sqrt(126*126 - 17.5*17.5), 224.035, 144, 1e-3},
		{"standards §10, example 30", 15*ft + 4, 26*ft + 8, 23*ft + 9, 1610.852, 144, 1e-3},
		{"standards §10, example 31", 19*ft + 2, 0, 21 * ft, 694.968, 144, 1e-3},
	} {
		near(t, c.name, side(t, upright(c.d0/2, c.d1/2, c.h), 1, 12).Area()/c.per, c.area, c.unit)
	}
	// standards §10, example 32: a 3-4-5 triangle turned about its hypotenuse: two cones on the radius 12/5.
	both := side(t, upright(2.4, 0, 1.8), 0, 12).Area() + side(t, upright(2.4, 0, 3.2), 0, 12).Area()
	near(t, "standards §10, example 32", both, 52.7788, 1e-4)
	// standards §10, example 7: shell of mean diameter 640.
	near(t, "standards §10, example 7", side(t, upright(320, 320, 100), 0, 12).Girth(), 2010.619, 1e-3)
	near(t, "needs §2, row 7: girth of Ø250", side(t, upright(125, 125, 100), 0, 12).Girth(), 785.398, 1e-3)
}

// elbowEnd is the end piece of a segmented elbow: a pipe about z with its
// throat to the left, cut by the mitre plane through the elbow's centre.
func elbowEnd(t testing.TB, d, r, cut float64) *body.Body {
	s, c := math.Sincos(cut)
	b := upright(d/2, d/2, 2*(r+d/2)*math.Tan(cut))
	return cutOff(t, b, vec.V3{X: -r}, vec.V3{X: -s, Z: c}, "mitre")
}

func TestElbowOrdinates(t *testing.T) {
	// needs §3, scenario 5: half-piece ordinates each 30° from the throat.
	p := side(t, elbowEnd(t, 300, 450, 15*degree), math.Pi, 12)
	for i, want := range []float64{80.385, 85.770, 100.481, 120.577, 140.673, 155.385, 160.770} {
		for _, n := range []int{i + 1, 13 - i} {
			got, ok := p.TrueLengthAt((n-1)%12 + 1)
			if !ok {
				t.Fatalf("no division %d", n)
			}
			near(t, "ordinate", got, want, 1e-3)
		}
	}
	near(t, "needs §3, scenario 5: blank", p.Width(), 942.478, 1e-3)
	// standards §10, computed: back and throat of the end piece, half of those of a whole piece.
	for _, c := range []struct{ d, r, pieces, back, throat float64 }{
		{100, 150, 3, 165.6854, 82.8427},
		{100, 150, 4, 107.1797, 53.5898},
		{100, 150, 5, 79.5649, 39.7825},
		{100, 150, 7, 52.6610, 26.3305},
		{114.3, 152.4, 4, 112.2975, 51.0443},
	} {
		cut := 90 * degree / (2 * (c.pieces - 1))
		p := side(t, elbowEnd(t, c.d, c.r, cut), math.Pi, 16)
		near(t, "back", 2*p.TrueLength(0), c.back, 1e-4)
		near(t, "throat", 2*p.TrueLength(math.Pi), c.throat, 1e-4)
		for _, s := range p.Stations { // standards §10: y = (R + (D/2) cos t) tan c
			exact(t, "ordinate", s.Length(), (c.r+c.d/2*math.Cos(s.Theta))*math.Tan(cut))
		}
		if w := p.Stations[0].Why; w != "shortest, turn" {
			t.Errorf("the throat is %q", w)
		}
		if w := p.Stations[8].Why; w != "longest, turn" {
			t.Errorf("the back is %q", w)
		}
	}
	near(t, "standards §10: rise", side(t, elbowEnd(t, 114.3, 152.4, 15*degree), 0, 4).Height()-51.0443/2, 30.6266, 2e-4)
}

// standards §10, step-off error, computed, per cent. For 8 chords it prints
// -2.551, a slip: 8 sin(π/8)/π - 1 is -0.0255046.
func TestSteppedGirth(t *testing.T) {
	for _, b := range []*body.Body{upright(150, 150, 40), upright(150, 70, 40), upright(0, 150, 90)} {
		p := side(t, b, 1, 12)
		for n, short := range map[int]float64{6: -4.507, 8: -2.550, 12: -1.138, 16: -0.641, 24: -0.285, 32: -0.161,
			36: -0.127, 48: -0.071, 72: -0.032, 96: -0.018} {
			near(t, "step-off error", 100*(p.SteppedGirth(n)/p.Girth()-1), short, 1e-3)
		}
		near(t, "a 12-chord girth of dia 300 is short by", p.Girth()-p.SteppedGirth(12), 10.7, 0.1)
	}
}

// needs §2 row 1 and §3 scenario 1: the skirt of a vent through a 35° roof.
func TestVentSkirt(t *testing.T) {
	tan := math.Tan(15 * degree)
	b := body.Frustum("K", vec.World.At(vec.V3{Z: -400}), vec.World, 80+660*tan, 80, 660)
	b = cutOff(t, b, vec.V3{}, vec.V3{X: math.Sin(35 * degree), Z: -math.Cos(35 * degree)}, "roof")
	p := side(t, b, 0, 12)
	near(t, "R", measure(p.InnerRadius), 309.0963, 1e-4)
	near(t, "sector", measure(p.Sector)/degree, 93.17486, 1e-5)
	near(t, "area", p.Area(), 209228.1, 0.1)
	near(t, "uphill generator", p.TrueLength(0), 177.8171, 1e-4)
	near(t, "lee generator", p.TrueLength(math.Pi), 402.7235, 1e-4)
	for _, e := range p.Proof().Edges {
		if e.Label == "roof" {
			near(t, "foot, flat", e.Flat, 1076.783, 1e-3)
		}
	}
	if w := p.Stations[0].Why + "/" + p.Stations[6].Why; w != "shortest, turn/longest, turn" {
		t.Errorf("extremes are %q", w)
	}
	// standards §9: polar radius of the edge z0/(cos a - sin a tan b cos t); uphill is at t = 180°.
	z0 := 260 + 80/tan
	s, c := math.Sincos(15 * degree)
	for _, st := range p.Stations {
		exact(t, "edge", st.Spans[0].Hi, z0/(c+s*math.Tan(35*degree)*math.Cos(st.Theta)))
	}
}

// standards §9, table of conics, computed: perimeter, and area of the cut-off
// cone pi A B cos b / sin a, found again on the pattern.
func TestCutOffCones(t *testing.T) {
	for _, c := range []struct{ tan, z0, tilt, a, b, perimeter float64 }{
		{0.4, 60, 30, 29.27410, 24.66679, 169.76953},
		{math.Tan(20 * degree), 100, 45, 59.33330, 39.07731, 312.44941},
		{math.Tan(30 * degree), 50, 30, 37.5, 30.61862, 214.54729},
		{math.Tan(30 * degree), 50, 45, 61.23724, 35.35534, 308.92620},
	} {
		h := 1000.0
		b := upright(h*c.tan, 0, h)
		s, k := math.Sincos(c.tilt * degree)
		b = cutOff(t, b, vec.V3{Z: h - c.z0}, vec.V3{X: -s, Z: -k}, "P")
		p := side(t, b, 2, 12)
		near(t, "perimeter", p.Proof().Edges[0].Flat, c.perimeter, 1e-5)
		want := math.Pi * c.a * c.b * k * math.Hypot(1, 1/c.tan) // 1/sin a
		// A and B are printed with 5 decimals: the area is known to π(A + B)/sin a times half of 1e-5.
		if d := math.Abs(p.Area() - want); d > math.Pi*(c.a+c.b)*math.Hypot(1, 1/c.tan)*0.5e-5 {
			t.Errorf("area %.9g, want %.9g", p.Area(), want)
		}
	}
	for tilt, perimeter := range map[float64]float64{30: 169.44794, 45: 191.00989, 60: 242.21121} { // cylinder dia 50
		b := cutOff(t, upright(25, 25, 100), vec.V3{Z: 50}, vec.V3{X: math.Sin(tilt * degree), Z: math.Cos(tilt * degree)}, "P")
		p := side(t, b, 2, 12)
		near(t, "perimeter", p.Proof().Edges[1].Flat, perimeter, 1e-5)
		// standards §9: the developed edge is a sine wave of amplitude r tan b
		lo, hi := p.TrueLength(0), p.TrueLength(math.Pi)
		exact(t, "amplitude", (hi-lo)/2, 25*math.Tan(tilt*degree))
	}
}

func TestErrors(t *testing.T) {
	b := upright(50, 30, 40)
	var d *DivisionsError
	if _, err := Of(b, 0, Options{Divisions: 2}); !errors.As(err, &d) || d.Divisions != 2 || err.Error() != "2 divisions; there must be at least 3" {
		t.Errorf("two divisions: %v", err)
	}
	var f *FaceError
	if _, err := Of(b, 1, Options{Divisions: 12}); !errors.As(err, &f) || f.Face != "K.base" {
		t.Errorf("a plane face: %v", err)
	}
	if _, err := Of(b, 7, Options{Divisions: 12}); !errors.As(err, &f) || f.Face != "face 7" {
		t.Errorf("no face: %v", err)
	}
	box := upright(50, 50, 40)
	for i, n := range []vec.V3{{X: 1}, {X: -1}, {Y: 1}, {Y: -1}} {
		box = cutOff(t, box, n.Scale(20), n, string(rune('P'+i)))
	}
	if _, err := Of(box, 0, Options{Divisions: 12}); !errors.As(err, &f) || err.Error() != "K.side cannot be unrolled: nothing of it is left" {
		t.Errorf("a box: %v", err)
	}
	p := side(t, b, 0, 12)
	var off *OffError
	if _, err := p.Flat(vec.V3{X: 60}); !errors.As(err, &off) || off.OnSurface {
		t.Errorf("outside: %v", err)
	} else {
		exact(t, "distance", off.Distance, 10*math.Cos(math.Atan(0.5)))
	}
	if _, err := p.Flat(vec.V3{X: 20, Z: 60}); !errors.As(err, &off) || !off.OnSurface {
		t.Errorf("above: %v", err)
	} else {
		exact(t, "distance", off.Distance, math.Hypot(10, 20))
	}
	if _, ok := p.TrueLengthAt(13); ok {
		t.Error("division 13 of 12")
	}
	if _, ok := side(t, upright(5, 5, 5), 0, 3).Sector(); ok {
		t.Error("a cylinder has a sector")
	}
}
