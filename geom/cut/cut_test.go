package cut

import (
	"errors"
	"math"
	"testing"

	"epure/geom/body"
	"epure/geom/num"
	"epure/geom/surface"
	"epure/geom/vec"
	"gonum.org/v1/gonum/mathext"
)

const deg = math.Pi / 180

func plane(o, n vec.V3) surface.Plane { return surface.Plane{F: vec.PlaneFrame(o, n)} }

// cone is an upright cone of the half angle a with its apex at the origin, opening downward to the depth h.
func cone(a, h float64) *body.Body {
	o := vec.V3{Z: -h}
	return body.Frustum("K", vec.World.At(o), vec.AxisFrame(o, vec.V3{Z: 1}), h*math.Tan(a), 0, h)
}

// tilted is the plane that meets the axis at z0 under the apex, tilted by b from level, climbing to the right.
func tilted(z0, b float64) surface.Plane {
	return plane(vec.V3{Z: -z0}, vec.V3{X: -math.Sin(b), Z: math.Cos(b)})
}

func rel(got, want float64) float64 { return math.Abs(got-want) / math.Abs(want) }

// printed is half a unit in the last place of a table that prints d decimals.
func printed(d int) float64 { return 0.5000001 * math.Pow(10, -float64(d)) }

func must(t *testing.T, b *body.Body, p surface.Plane, along ...vec.V3) *Section {
	t.Helper()
	s, err := Of(b, p, along)
	if err != nil {
		t.Fatal(err)
	}
	return s
}

// The table "cone | cut" of the reference collection, section 9 (computed there with mpmath from the
// classical formulas, five decimals).
func TestConeTable(t *testing.T) {
	for _, c := range []struct {
		half, z0, tilt                    float64
		kind                              Kind
		e, a, b, lin, l, perimeter, r, ex float64
	}{
		{math.Atan(0.4), 60, 30, Ellipse, 0.53852, 29.27410, 24.66679, 15.76458, 20.78461, 169.76953, 15.59542, 39.01470},
		{20 * deg, 100, 45, Ellipse, 0.75249, 59.33330, 39.07731, 44.64756, 25.73658, 312.44941, 23.05200, 66.24312},
		{30 * deg, 50, 30, Ellipse, 0.57735, 37.5, 30.61862, 21.65064, 25, 214.54729, 15.84936, 59.15064},
		{30 * deg, 50, 45, Ellipse, 0.81650, 61.23724, 35.35534, 50, 20.41241, 308.92620, 14.64466, 85.35534},
		{30 * deg, 50, 75, Hyperbola, 1.11536, 30.61862, 15.12501, 34.15064, 7.47146, 0, 0, 0},
	} {
		s := must(t, cone(c.half, 400), tilted(c.z0, c.tilt*deg))
		k := s.Conic
		if s.Kind != c.kind || s.Ground != ByValue {
			t.Errorf("tilt %v: %s %s, want %s", c.tilt, s.Kind, s.Ground, c.kind)
			continue
		}
		lin, _ := k.LinearEccentricity()
		for _, v := range [][2]float64{{k.Eccentricity, c.e}, {k.A, c.a}, {k.B, c.b}, {lin, c.lin}, {k.LatusRectum() / 2, c.l}} {
			if math.Abs(v[0]-v[1]) > printed(5) {
				t.Errorf("half angle %v tilt %v: %v, want %v", c.half/deg, c.tilt, v[0], v[1])
			}
		}
		if c.kind != Ellipse {
			continue
		}
		if math.Abs(s.Perimeter-c.perimeter) > printed(5) || s.Length != s.Perimeter {
			t.Errorf("perimeter %v, want %v", s.Perimeter, c.perimeter)
		}
		f := s.FocalSpheres()
		if len(f) != 2 || math.Abs(f[0].Radius-c.r) > printed(5) || math.Abs(f[1].Radius-c.ex) > printed(5) {
			t.Errorf("focal spheres %v, want %v and %v", f, c.r, c.ex)
		}
		if e := rel(s.Area, math.Pi*k.A*k.B); e > 1e-12 {
			t.Errorf("area is off by %g", e)
		}
		// volume π·A·B·p/3 and side π·A·B·cos b/sin a of the cut-off cone, same section
		top, err := cone(c.half, 400).Cut(tilted(c.z0, c.tilt*deg).Flip(), "P")
		if err != nil {
			t.Fatal(err)
		}
		p := c.z0 * math.Cos(c.tilt*deg)
		if e := rel(top.Volume(), s.Area*p/3); e > 1e-12 {
			t.Errorf("volume is off by %g", e)
		}
		if e := rel(top.FaceArea(0), s.Area*math.Cos(c.tilt*deg)/math.Sin(c.half)); e > 1e-12 {
			t.Errorf("side is off by %g", e)
		}
	}
}

// The last row of the same table: half angle 30°, vertex 50 down the slant: f = d·sin², focal sphere d·sin·cos.
func TestParabola(t *testing.T) {
	k := cone(30*deg, 200)
	g := k.Faces[0].Surface.(surface.Ruled).Ruling(math.Pi)
	at := k.Faces[0].Surface.(surface.Ruled).Ruling(0)
	p := plane(at.O.Along(at.D, 50), g.D.Cross(vec.V3{Y: 1}))
	for _, c := range []struct {
		along  []vec.V3
		ground Ground
	}{{nil, ByBound}, {[]vec.V3{g.D, {Y: 1}}, ByConstruction}} {
		s := must(t, k, p, c.along...)
		if s.Kind != Parabola || s.Ground != c.ground || s.Conic.Eccentricity != 1 {
			t.Fatalf("%s %s %v", s.Kind, s.Ground, s.Conic)
		}
		f, _ := s.Conic.FocalLength()
		b := s.FocalSpheres()
		if rel(f, 12.5) > 4*num.Eps || rel(s.Conic.LatusRectum(), 50) > 4*num.Eps || len(b) != 1 || math.Abs(b[0].Radius-21.65064) > printed(5) {
			t.Errorf("focal length %v, spheres %v", f, b)
		}
		if d := s.Conic.Vertices()[0].Dist(at.O.Along(at.D, 50)); d > num.Place*200 {
			t.Errorf("vertex off by %g", d)
		}
		// common practice, no source: the centre of the focal sphere lies on the bisector between the plane and the side
		side := k.Faces[0].Surface.Normal(at.O.Along(at.D, 50))
		if x := math.Abs(p.Value(b[0].Centre)) - math.Abs(b[0].Centre.Sub(at.O.Along(at.D, 50)).Dot(side)); math.Abs(x) > num.Place*200 {
			t.Errorf("centre off the bisector by %g", x)
		}
	}
	// Leaning away from the tangent plane by 1e-9: the discriminant has lost it, the construction has not.
	n := g.D.Cross(vec.V3{Y: 1}).Along(vec.V3{Y: 1}, 1e-9).Unit()
	s := must(t, k, plane(at.O.Along(at.D, 50), n), g.D)
	if s.Kind != Hyperbola || s.Ground != ByConstruction || !(s.Conic.Eccentricity >= 1) {
		t.Errorf("%s %s, e - 1 = %g", s.Kind, s.Ground, s.Conic.Eccentricity-1)
	}
}

// Cylinder of diameter 50, same section of the reference collection; perimeters besides by gonum's E(m).
func TestCylinderTable(t *testing.T) {
	for _, z := range []vec.V3{{Z: 1}, {X: 1, Y: 0.5, Z: 0.25}} {
		f := vec.PlaneFrame(vec.V3{X: 3}, z)
		b := body.Frustum("C", f, vec.AxisFrame(f.O, z), 25, 25, 300)
		for _, c := range []struct{ tilt, a, lin, perimeter float64 }{
			{30, 28.8675, 14.4338, 169.44794}, {45, 35.3553, 25, 191.00989}, {60, 50, 43.3013, 242.21121},
		} {
			n := f.Z.Scale(math.Cos(c.tilt*deg)).Along(f.X, math.Sin(c.tilt*deg))
			s := must(t, b, plane(f.O.Along(f.Z, 150), n))
			lin, _ := s.Conic.LinearEccentricity()
			if s.Kind != Ellipse || math.Abs(s.Conic.A-c.a) > printed(4) || math.Abs(lin-c.lin) > printed(4) || rel(s.Conic.B, 25) > num.Place {
				t.Errorf("tilt %v: %v", c.tilt, s.Conic)
			}
			if math.Abs(s.Perimeter-c.perimeter) > printed(5) {
				t.Errorf("tilt %v: perimeter %v, want %v", c.tilt, s.Perimeter, c.perimeter)
			}
			m := math.Pow(math.Sin(c.tilt*deg), 2)
			if e := rel(s.Perimeter, 4*s.Conic.A*mathext.CompleteE(m)); e > 1e-13 {
				t.Errorf("tilt %v: perimeter is off by %g from gonum", c.tilt, e)
			}
		}
	}
}

// Example 24 of the reference collection (worked example found in print there): half angle 20°, apex at the
// origin, plane 3x + 4y + 5z = 500: the semi-axes add up to 98.41.
func TestPrintedExample24(t *testing.T) {
	o := vec.V3{}
	k := body.Frustum("K", vec.World.At(o), vec.AxisFrame(o, vec.V3{Z: 1}), 0, 400*math.Tan(20*deg), 400)
	n := vec.V3{X: 3, Y: 4, Z: 5}
	s := must(t, k, plane(n.Unit().Scale(500/n.Len()), n))
	if sum := s.Conic.A + s.Conic.B; s.Kind != Ellipse || math.Abs(sum-98.41) > printed(2) || math.Abs(sum-98.41062) > printed(5) {
		t.Errorf("%s, A + B = %v", s.Kind, sum)
	}
}

func TestDegenerateKinds(t *testing.T) {
	k := cone(30*deg, 100)
	c := body.Frustum("C", vec.World, vec.World, 10, 10, 50)
	for _, x := range []struct {
		name   string
		b      *body.Body
		p      surface.Plane
		kind   Kind
		ground Ground
		lines  int
		loops  int
	}{
		{"level through a cone", k, tilted(40, 0), Circle, ByConstruction, 0, 1},
		{"the base itself", k, tilted(100, 0), Circle, ByConstruction, 0, 1},
		{"the base from below", k, tilted(100, 0).Flip(), Circle, ByConstruction, 0, 1},
		{"touching the apex", k, tilted(0, 0), Point, ByConstruction, 0, 0},
		{"through the axis", k, plane(vec.V3{}, vec.V3{X: 1}), TwoLines, ByConstruction, 2, 1},
		{"through the apex, steep", k, plane(vec.V3{}, vec.V3{X: 3, Y: 1, Z: 0.2}), TwoLines, ByConstruction, 2, 1},
		{"tangent to a cone", k, plane(vec.V3{}, vec.V3{X: math.Cos(30 * deg), Z: math.Sin(30 * deg)}), Line, ByConstruction, 1, 0},
		{"along the axis of a cylinder", c, plane(vec.V3{X: 4}, vec.V3{X: 1}), TwoLines, ByBound, 2, 1},
		{"tangent to a cylinder", c, plane(vec.V3{X: 10}, vec.V3{X: 1}), Line, ByBound, 1, 0},
		{"square across a cylinder", c, plane(vec.V3{Z: 20}, vec.V3{Z: 1}), Circle, ByConstruction, 0, 1},
		{"upright beside the axis", k, plane(vec.V3{X: 20}, vec.V3{X: 1}), Hyperbola, ByValue, 0, 1},
	} {
		s := must(t, x.b, x.p)
		if s.Kind != x.kind || s.Ground != x.ground || len(s.Lines) != x.lines || len(s.Loops) != x.loops {
			t.Errorf("%s: %s %s, %d lines, %d loops", x.name, s.Kind, s.Ground, len(s.Lines), len(s.Loops))
		}
		if x.loops > 0 {
			v := vec.V3{}
			for _, loop := range s.Loops {
				for _, p := range loop {
					v = v.Add(p.Arc.Sweep(s.Centroid))
				}
			}
			if d := v.Dist(s.Plane.Z.Scale(s.Area)); d > 1e-12*s.Area {
				t.Errorf("%s: loops sweep %v, area %v", x.name, v, s.Area)
			}
		}
	}
	s := must(t, k, plane(vec.V3{}, vec.V3{X: 1}))
	if a, ok := s.Angle(); !ok || math.Abs(a-60*deg) > num.Place {
		t.Errorf("angle of the lines through the axis %v", a/deg)
	}
	var miss *MissError
	if _, err := Of(k, plane(vec.V3{Z: 3.2}, vec.V3{Z: 1}), nil); !errors.As(err, &miss) || rel(miss.Miss, 3.2) > num.Place {
		t.Errorf("miss: %v", err)
	}
}

// A triangle through the axis, and a rectangle: school formulas.
func TestPolygons(t *testing.T) {
	s := must(t, cone(30*deg, 100), plane(vec.V3{}, vec.V3{Y: 1}))
	r, l := 100*math.Tan(30*deg), 100/math.Cos(30*deg)
	if rel(s.Area, r*100) > 1e-13 || rel(s.Perimeter, 2*r+2*l) > 1e-13 || rel(s.Length, 2*l) > 1e-13 || math.Abs(s.Centroid.Z+200./3) > 1e-12*100 {
		t.Errorf("triangle: %v %v %v %v", s.Area, s.Perimeter, s.Length, s.Centroid)
	}
	c := body.Frustum("C", vec.World, vec.World, 10, 10, 50)
	s = must(t, c, plane(vec.V3{X: 6}, vec.V3{X: 1}))
	if rel(s.Area, 16*50) > 1e-13 || rel(s.Perimeter, 132) > 1e-13 || rel(s.Length, 100) > 1e-13 {
		t.Errorf("rectangle: %v %v %v", s.Area, s.Perimeter, s.Length)
	}
}

// The parabolic arch of the reference collection: chord 100, rise 40 gives 133.3705403. A cone of 90° whose
// section parallel to a generator is such an arch: f = c²/16h = 15.625, so the vertex is 31.25 down the
// slant, and the chord of the base is 100 where the rise is 40.
func TestParabolicArch(t *testing.T) {
	d := 31.25
	h := (d + 40) * math.Sqrt2 / 2 // the cutting plane runs at 45°: 40 along it beyond the vertex
	k := cone(45*deg, h)
	g := k.Faces[0].Surface.(surface.Ruled).Ruling(math.Pi)
	at := k.Faces[0].Surface.(surface.Ruled).Ruling(0)
	s := must(t, k, plane(at.O.Along(at.D, d), g.D.Cross(vec.V3{Y: 1})), g.D, vec.V3{Y: 1})
	if math.Abs(s.Length-133.3705403) > printed(7) || rel(s.Perimeter-s.Length, 100) > 1e-13 || rel(s.Area, 2./3*100*40) > 1e-13 {
		t.Errorf("arc %v, chord %v, area %v", s.Length, s.Perimeter-s.Length, s.Area)
	}
	// the centre of a parabolic arch is at 3/5 of the rise from its vertex
	v := s.Conic.Vertices()[0]
	if x := s.Centroid.Sub(v).Dot(s.Conic.F.X); rel(x, 24) > 1e-12 {
		t.Errorf("centre at %v of the rise", x)
	}
}
