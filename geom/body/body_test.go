package body

import (
	"errors"
	"math"
	"testing"

	"epure/geom/num"
	"epure/geom/surface"
	"epure/geom/vec"
	"pgregory.net/rapid"
)

// axis is a frame at o about the direction z, with X and Y square to it.
func axis(o, z vec.V3) vec.Frame { return vec.PlaneFrame(o, z) }

func solid(o, z vec.V3, r0, r1, h float64) *Body {
	return Frustum("K", axis(o, z), vec.AxisFrame(o, z), r0, r1, h)
}

func plane(o, n vec.V3) surface.Plane { return surface.Plane{F: vec.PlaneFrame(o, n)} }

// rel is the difference relative to the wanted value.
func rel(got, want float64) float64 { return math.Abs(got-want) / math.Abs(want) }

// closedForm is the bound for measures with a closed form, the goal of the geometry's design.
const closedForm = 1e-12

func TestWholeSolidsAgainstSchoolFormulas(t *testing.T) {
	for _, c := range []struct{ r0, r1, h float64 }{{120, 0, 260}, {0, 3, 4}, {50, 25, 80}, {25, 25, 60}, {20, 60, 1}} {
		for _, z := range []vec.V3{{Z: 1}, {Z: -1}, {X: 1}, {X: 1, Y: -2, Z: 0.5}} {
			b := solid(vec.V3{X: 10, Y: -20, Z: 5}, z, c.r0, c.r1, c.h)
			vol := math.Pi * c.h / 3 * (c.r0*c.r0 + c.r0*c.r1 + c.r1*c.r1)
			if e := rel(b.Volume(), vol); e > closedForm {
				t.Errorf("%v along %v: volume %v, want %v (%g)", c, z, b.Volume(), vol, e)
			}
			side := math.Pi * (c.r0 + c.r1) * math.Hypot(c.r0-c.r1, c.h)
			if e := rel(b.FaceArea(0), side); e > closedForm {
				t.Errorf("%v along %v: side %v, want %v", c, z, b.FaceArea(0), side)
			}
			up := c.h / 4 * (c.r0*c.r0 + 2*c.r0*c.r1 + 3*c.r1*c.r1) / (c.r0*c.r0 + c.r0*c.r1 + c.r1*c.r1)
			want := vec.V3{X: 10, Y: -20, Z: 5}.Along(z.Unit(), up)
			if d := b.Centroid().Dist(want); d > closedForm*b.Size() {
				t.Errorf("%v along %v: centroid off by %g", c, z, d)
			}
			if i := b.FaceIndex("K.base"); i >= 0 && rel(b.FaceArea(i), math.Pi*c.r0*c.r0) > closedForm {
				t.Errorf("base area %v", b.FaceArea(i))
			}
		}
	}
}

// slices integrates the area of the circle of radius r(z) that lies at x >= x0(z): the second route.
func slices(h float64, r, x0 func(z float64) float64) float64 {
	return num.Integrate(func(z float64) float64 {
		rr, x := r(z), x0(z)
		k := math.Max(-1, math.Min(1, x/rr))
		return rr * rr * (math.Acos(k) - k*math.Sqrt(1-k*k))
	}, 0, h)
}

func TestCutVolumesAgainstSlices(t *testing.T) {
	// An upright cone 120 by 260 cut parallel to its generator at 180°, as a rain hood is.
	k := solid(vec.V3{}, vec.V3{Z: 1}, 120, 0, 260)
	for _, c := range []struct{ x, slope float64 }{{35, 120. / 260}, {35, 0}, {10, 0.2}, {-50, 1}} {
		// the plane x = c.x + slope·z
		p := plane(vec.V3{X: c.x}, vec.V3{X: -1, Z: c.slope}) // material where x is larger
		b, err := k.Cut(p, "P")
		if err != nil {
			t.Fatal(err)
		}
		rest, err := k.Cut(p.Flip(), "P")
		if err != nil {
			t.Fatal(err)
		}
		r := func(z float64) float64 { return 120 * (1 - z/260) }
		x0 := func(z float64) float64 { return c.x + c.slope*z }
		// the slice's area turns on like the power 3/2 where the plane leaves the cone, so the quadrature
		// stops at its depth; 1e-10 is the goal for quadratures
		if e := rel(b.Volume(), slices(260, r, x0)); e > 1e-10 {
			t.Errorf("%v: volume %v, slices %v", c, b.Volume(), slices(260, r, x0))
		}
		if e := rel(b.Volume()+rest.Volume(), k.Volume()); e > closedForm {
			t.Errorf("%v: parts do not make the whole: %g", c, e)
		}
		if e := rel(b.FaceArea(0)+rest.FaceArea(0), k.FaceArea(0)); e > closedForm {
			t.Errorf("%v: side areas do not make the whole: %g", c, e)
		}
		if e := rel(b.FaceArea(b.FaceIndex("P")), rest.FaceArea(rest.FaceIndex("P"))); e > closedForm {
			t.Errorf("%v: the cut face differs on the two parts: %g", c, e)
		}
		m := b.Centroid().Scale(b.Volume()).Add(rest.Centroid().Scale(rest.Volume())).Scale(1 / k.Volume())
		if d := m.Dist(k.Centroid()); d > closedForm*k.Size() {
			t.Errorf("%v: centres do not balance: %g", c, d)
		}
	}
}

// lateral is the area of the curved face by quadrature over its generators, the second route.
func lateral(b *Body, i int, whole float64) float64 {
	whole /= 2 * math.Pi
	s := b.Faces[i].Surface.(surface.Ruled)
	f := func(theta float64) float64 {
		sum := 0.0
		for _, iv := range b.Rulings(i, theta) {
			switch s := s.(type) {
			case surface.Cone:
				sum += (iv.B - iv.A) * (iv.B + iv.A) / 2 * s.Sin
			case surface.Cylinder:
				sum += (iv.B - iv.A) * s.R
			}
		}
		return sum
	}
	br := append([]float64{0}, b.Breaks(i)...)
	br = append(br, 2*math.Pi)
	sum := 0.0
	for k := 1; k < len(br); k++ {
		if br[k] > br[k-1] { // the whole's share is added so that a sliver is measured relative to the whole
			sum += num.Integrate(func(x float64) float64 { return f(x) + whole }, br[k-1], br[k])
		}
	}
	return sum - 2*math.Pi*whole
}

func TestSideAreasAgainstGenerators(t *testing.T) {
	for _, r := range [][2]float64{{120, 0}, {120, 60}, {60, 120}, {100, 100}} {
		k := solid(vec.V3{X: 3}, vec.V3{X: 0.2, Y: -0.3, Z: 1}, r[0], r[1], 260)
		whole := k.FaceArea(0)
		for _, n := range []vec.V3{{Z: 1}, {X: 1}, {X: 1, Y: 1, Z: 1}, {X: 3, Z: 1}} {
			b, err := k.Cut(plane(k.Middle().Add(vec.V3{X: 7, Z: -20}), n), "P")
			if err != nil {
				t.Fatal(err)
			}
			b, err = b.Cut(plane(k.Middle().Add(vec.V3{Y: 11, Z: 35}), vec.V3{Y: 1, Z: 0.4}), "Q")
			if err != nil {
				t.Fatal(err)
			}
			// 1e-10 is the goal for quadratures
			if l := lateral(b, 0, whole); math.Abs(l-b.FaceArea(0)) > 1e-10*whole {
				t.Errorf("%v, %v: side %v, over generators %v", r, n, b.FaceArea(0), l)
			}
		}
	}
}

// coordinate draws from -1 to 1 in steps of 1/32, so that planes through the apex, along generators, square to
// the axis and through edges come up often, at times off by a little that is
// clearly under or clearly over the rounding bounds.
func coordinate(t *rapid.T, n string) float64 {
	off := rapid.SampledFrom([]float64{0, 0, 0, 1e-14, -1e-8, 1e-6, 0.011}).Draw(t, n+" off")
	return float64(rapid.IntRange(-32, 32).Draw(t, n))/32 + off
}

// direction draws a vector that is not too short to be one.
func direction(t *rapid.T, n string) vec.V3 {
	d := vec.V3{X: coordinate(t, n+"x"), Y: coordinate(t, n+"y"), Z: coordinate(t, n+"z")}
	if d.Len() < 0.1 {
		d.Z = 1
	}
	return d
}

// anySolid draws a cone, frustum or cylinder in any position and size.
func anySolid(t *rapid.T) *Body {
	size := math.Pow(10, rapid.Float64Range(-1, 5).Draw(t, "log size"))
	o := vec.V3{X: coordinate(t, "x"), Y: coordinate(t, "y"), Z: coordinate(t, "z")}.Scale(size)
	r := rapid.SampledFrom([][2]float64{{1, 0}, {0, 1}, {1, 0.5}, {0.4, 1}, {1, 1}}).Draw(t, "radii")
	h := float64(rapid.IntRange(1, 12).Draw(t, "height")) / 4
	return solid(o, direction(t, "axis"), r[0]*size, r[1]*size, h*size)
}

// anyPlane draws a plane that passes near the middle of b, often through its axis or apex or
// square to what is drawn before.
func anyPlane(t *rapid.T, b *Body, n string) surface.Plane {
	o := b.Middle()
	if a := b.Apexes(); len(a) > 0 && rapid.IntRange(0, 3).Draw(t, n+" apex") == 0 {
		o = a[0]
	} else if rapid.Bool().Draw(t, n+" off middle") {
		o = o.Add(vec.V3{X: coordinate(t, n+"x"), Y: coordinate(t, n+"y"), Z: coordinate(t, n+"z")}.Scale(b.Size() * 0.4))
	}
	d := direction(t, n)
	s, ok := b.Faces[0].Surface.(surface.Ruled)
	if ok && rapid.IntRange(0, 3).Draw(t, n+" along") == 0 { // along a generator
		d = s.Ruling(coordinate(t, n+"theta") * math.Pi).D.Cross(d)
		if d.Len() < 0.1 {
			d = vec.V3{X: 1}
		}
	}
	return plane(o, d)
}

func TestPartsMakeTheWhole(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		k := anySolid(t)
		p := anyPlane(t, k, "p")
		q := anyPlane(t, k, "q")
		// the four pieces of two cuts, in either order
		var vol, order, side float64
		for s := range 4 {
			pp, qq := p, q
			if s&1 != 0 {
				pp = p.Flip()
			}
			if s&2 != 0 {
				qq = q.Flip()
			}
			a := cutBoth(t, k, pp, qq)
			b := cutBoth(t, k, qq, pp)
			if a != nil {
				vol += a.Volume()
				side += a.FaceArea(0)
				euler(t, a)
			}
			if b != nil {
				order += b.Volume()
			}
		}
		// a plane within num.OnSurface·Size of an apex or an edge is taken as through it
		if e := rel(vol, k.Volume()); e > num.OnSurface {
			t.Fatalf("parts make %v, whole %v (%g)", vol, k.Volume(), e)
		}
		if e := rel(order, k.Volume()); e > num.OnSurface {
			t.Fatalf("in the other order %v, whole %v (%g)", order, k.Volume(), e)
		}
		if e := rel(side, k.FaceArea(0)); e > num.OnSurface {
			t.Fatalf("sides make %v, whole %v (%g)", side, k.FaceArea(0), e)
		}
	})
}

// euler checks that every face's edges close, and that the areas of all faces as
// vectors add up to nothing, as they do round any solid.
func euler(t *rapid.T, b *Body) {
	sum, all := vec.V3{}, 0.0
	for i := range b.Faces {
		for _, loop := range b.FaceEdges(i) {
			for k, e := range loop {
				if d := e.Arc.End().Dist(loop[(k+1)%len(loop)].Arc.Start()); d > num.Join*b.Size() {
					t.Fatalf("face %s: a loop is open by %g", b.Faces[i].Label, d)
				}
				v := e.Arc.Sweep(b.Middle())
				sum = sum.Add(v)
				all += v.Len()
			}
		}
	}
	if d := sum.Len(); d > num.OnSurface*all {
		t.Fatalf("the faces leave %g of %g open", d, all)
	}
}

func cutBoth(t *rapid.T, k *Body, p, q surface.Plane) *Body {
	a, err := k.Cut(p, "P")
	var ce *CutError
	if errors.As(err, &ce) {
		if ce.Nothing {
			return nil
		}
		a = k
	}
	b, err := a.Cut(q, "Q")
	if errors.As(err, &ce) {
		if ce.Nothing {
			return nil
		}
		return a
	}
	return b
}
