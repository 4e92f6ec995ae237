package view

import (
	"fmt"
	"math"
	"slices"
	"strings"
	"testing"

	"epure/geom/body"
	"epure/geom/curve"
	"epure/geom/surface"
	"epure/geom/vec"
)

// Every expected number in this file is worked out by hand from right triangles; the figures show
// what is drawn, each line as its owner, verdict, kind and ends.

var (
	front = vec.ViewFrame(vec.V3{Y: 1})
	back  = vec.ViewFrame(vec.V3{Y: -1})
	left  = vec.ViewFrame(vec.V3{X: 1})
	plan  = vec.ViewFrame(vec.V3{Z: -1})
	below = vec.ViewFrame(vec.V3{Z: 1})
)

func frustum(o vec.V3, r0, r1, h float64) *body.Body {
	f := vec.World.At(o)
	return body.Frustum("K", f, f, r0, r1, h)
}

func cut(t *testing.T, b *body.Body, o, n vec.V3) *body.Body {
	t.Helper()
	c, err := b.Cut(surface.Plane{F: vec.PlaneFrame(o, n)}, fmt.Sprintf("P%d", len(b.Faces)))
	if err != nil {
		t.Fatal(err)
	}
	return c
}

// words tells what a piece looks like. Ends come in the order left to right, then upward.
func words(p Piece) string {
	num := func(v float64) string {
		return strings.TrimSuffix(strings.TrimRight(fmt.Sprintf("%.4f", math.Round(v*1e4)/1e4+0), "0"), ".")
	}
	at := func(q vec.V2) string { return "(" + num(q.X) + "," + num(q.Y) + ")" }
	verdict := "hidden"
	if p.Visible {
		verdict = "visible"
	}
	form := map[curve.Form]string{curve.Line: "line", curve.Ellipse: "ellipse", curve.Parabola: "parabola", curve.Hyperbola: "hyperbola"}[p.Image.Form]
	a, b := p.Image.Start(), p.Image.End()
	if p.Image.Form == curve.Ellipse && p.Image.T1-p.Image.T0 == 2*math.Pi {
		return fmt.Sprintf("%d %s whole %s %s", p.Body, verdict, form, at(p.Image.C))
	}
	if num(a.X) == num(b.X) && a.Y > b.Y || num(a.X) != num(b.X) && a.X > b.X {
		a, b = b, a
	}
	return fmt.Sprintf("%d %s %s %s %s", p.Body, verdict, form, at(a), at(b))
}

func check(t *testing.T, name string, pieces []Piece, want ...string) {
	t.Helper()
	var got []string
	for _, p := range pieces {
		got = append(got, words(p))
	}
	slices.Sort(got)
	slices.Sort(want)
	if !slices.Equal(got, want) {
		t.Errorf("%s:\n got  %s\n want %s", name, strings.Join(got, "\n      "), strings.Join(want, "\n      "))
	}
}

func lines(f vec.Frame, bodies ...*body.Body) []Piece { return Lines(bodies, f) }

func TestUpright(t *testing.T) {
	cone, trunk, can := frustum(vec.V3{}, 50, 0, 120), frustum(vec.V3{}, 50, 20, 60), frustum(vec.V3{}, 40, 40, 100)
	for _, f := range []vec.Frame{front, back, left} {
		check(t, "cone", lines(f, cone), "0 visible line (-50,0) (50,0)", "0 visible line (-50,0) (0,120)", "0 visible line (0,120) (50,0)")
		check(t, "frustum", lines(f, trunk), "0 visible line (-50,0) (50,0)", "0 visible line (-20,60) (20,60)",
			"0 visible line (-50,0) (-20,60)", "0 visible line (20,60) (50,0)")
		check(t, "cylinder", lines(f, can), "0 visible line (-40,0) (40,0)", "0 visible line (-40,100) (40,100)",
			"0 visible line (-40,0) (-40,100)", "0 visible line (40,0) (40,100)")
	}
	whole := "0 visible whole ellipse (0,0)"
	check(t, "cone from above", lines(plan, cone), whole)
	check(t, "cone from below", lines(below, cone), whole)
	check(t, "frustum from above", lines(plan, trunk), whole, whole)
	check(t, "frustum from below", lines(below, trunk), whole, "0 hidden whole ellipse (0,0)")
	check(t, "cylinder from below", lines(below, can), whole)
	p := lines(plan, can)
	check(t, "cylinder from above", p, whole)
	if z := p[0].Space.C.Z; z != 100 {
		t.Errorf("the circle drawn is the one at %g, not the nearer one", z)
	}
}

// The apex falls on the base circle's image; the whole side is seen from above and none of it from below.
func TestAlongAGenerator(t *testing.T) {
	cone := frustum(vec.V3{}, 50, 0, 120)
	for k := range 12 {
		sin, cos := math.Sincos(float64(k) * math.Pi / 6)
		down := vec.V3{X: 50 * cos, Y: 50 * sin, Z: -120}.Unit()
		check(t, fmt.Sprint("down generator ", k), lines(vec.ViewFrame(down), cone), "0 visible whole ellipse (0,0)")
		check(t, fmt.Sprint("up generator ", k), lines(vec.ViewFrame(down.Neg()), cone), "0 visible whole ellipse (0,0)")
		trunk := lines(vec.ViewFrame(down.Neg()), frustum(vec.V3{}, 50, 25, 60))
		// seen against the generator the top lies behind the base: hidden, touching it inside
		if len(trunk) != 2 || !trunk[0].Visible || trunk[1].Visible {
			t.Errorf("frustum up generator %d: %v", k, trunk)
		}
	}
}

// parabola gives the two parts of a cone cut parallel to its left generator: the plane starts at x = 10
// in the base and meets the right generator at (30, 0, 48).
func parabola(t *testing.T) (above, under *body.Body) {
	cone := frustum(vec.V3{}, 50, 0, 120)
	n := vec.V3{X: 120, Z: -50}.Unit()
	return cut(t, cone, vec.V3{X: 10}, n), cut(t, cone, vec.V3{X: 10}, n.Neg())
}

const chord = "48.9898" // √(50² - 10²)

func TestParabola(t *testing.T) {
	above, under := parabola(t)
	check(t, "upper part, elevation", lines(front, above), "0 visible line (-50,0) (10,0)", "0 visible line (10,0) (30,48)",
		"0 visible line (0,120) (30,48)", "0 visible line (-50,0) (0,120)")
	check(t, "lower part, elevation", lines(front, under), "0 visible line (10,0) (50,0)", "0 visible line (10,0) (30,48)", "0 visible line (30,48) (50,0)")
	check(t, "upper part, plan", lines(plan, above), "0 visible ellipse (10,-"+chord+") (10,"+chord+")",
		"0 visible parabola (10,-"+chord+") (10,"+chord+")", "0 hidden line (10,-"+chord+") (10,"+chord+")")
	check(t, "lower part, plan", lines(plan, under), "0 visible ellipse (10,-"+chord+") (10,"+chord+")",
		"0 visible parabola (10,-"+chord+") (10,"+chord+")", "0 visible line (10,-"+chord+") (10,"+chord+")")
	check(t, "both, elevation", lines(front, above, under), "0 visible line (-50,0) (10,0)", "1 visible line (10,0) (50,0)",
		"0 visible line (10,0) (30,48)", "0 visible line (0,120) (30,48)", "1 visible line (30,48) (50,0)", "0 visible line (-50,0) (0,120)")
	// the base circle's two arcs share their ends; the chord lies under the upper part
	check(t, "both, plan", lines(plan, above, under), "0 visible ellipse (10,-"+chord+") (10,"+chord+")",
		"1 visible ellipse (10,-"+chord+") (10,"+chord+")", "0 visible parabola (10,-"+chord+") (10,"+chord+")",
		"0 hidden line (10,-"+chord+") (10,"+chord+")")
}

// A plane that climbs to the back, z = 60 + 0.75·y, meets the side generators at (±25, 0, 60).
func TestSectionFromBehind(t *testing.T) {
	b := cut(t, frustum(vec.V3{}, 50, 0, 120), vec.V3{Z: 60}, vec.V3{Y: -0.6, Z: 0.8})
	sides := []string{"0 visible line (-50,0) (50,0)", "0 visible line (-50,0) (-25,60)", "0 visible line (25,60) (50,0)"}
	// the ellipse's ends in the plane of symmetry: 50(1-z/120) = ±y, z = 60+0.75y gives
	// y = 19.0476, z = 74.2857 behind and y = -36.3636, z = 32.7273 before; its centre lies between
	check(t, "from the front", lines(front, b), append(sides, "0 visible whole ellipse (0,53.5065)")...)
	check(t, "from behind", lines(back, b), append(sides, "0 visible ellipse (-25,60) (25,60)", "0 hidden ellipse (-25,60) (25,60)")...)
	for _, p := range lines(back, b) {
		if p.Image.Form != curve.Ellipse {
			continue
		}
		if top := p.Image.Mid().Y; p.Visible && math.Abs(top-74.2857142857142857) > 1e-9 || !p.Visible && math.Abs(top-32.7272727272727273) > 1e-9 {
			t.Errorf("middle of the arc (visible %v) at %v", p.Visible, top)
		}
	}
	// edge-on from the left: z = 60 + 0.75·y, with the paper's x = -y
	check(t, "edge-on", lines(left, b), "0 visible line (-50,0) (50,0)", "0 visible line (-19.0476,74.2857) (36.3636,32.7273)",
		"0 visible line (-50,0) (-19.0476,74.2857)", "0 visible line (36.3636,32.7273) (50,0)")
}

func TestOneBehindTheOther(t *testing.T) {
	near, far := frustum(vec.V3{Y: -100}, 40, 40, 100), frustum(vec.V3{Y: 100}, 40, 40, 150)
	for i, bodies := range [][]*body.Body{{near, far}, {far, near}} {
		n, f := fmt.Sprint(i), fmt.Sprint(1-i)
		check(t, "cylinders", lines(front, bodies...), n+" visible line (-40,0) (40,0)", n+" visible line (-40,100) (40,100)",
			n+" visible line (-40,0) (-40,100)", n+" visible line (40,0) (40,100)",
			f+" visible line (-40,100) (-40,150)", f+" visible line (40,100) (40,150)", f+" visible line (-40,150) (40,150)")
	}
	// at z = 100 the cone is 50·20/120 wide on either side, and it meets the top line there
	cone, can := frustum(vec.V3{Y: -100}, 50, 0, 120), frustum(vec.V3{Y: 100}, 60, 60, 100)
	check(t, "cone before cylinder", lines(front, cone, can), "0 visible line (-50,0) (50,0)", "0 visible line (-50,0) (0,120)", "0 visible line (0,120) (50,0)",
		"1 visible line (-60,0) (-50,0)", "1 visible line (50,0) (60,0)", "1 visible line (-60,0) (-60,100)", "1 visible line (60,0) (60,100)",
		"1 visible line (-60,100) (-8.3333,100)", "1 hidden line (-8.3333,100) (8.3333,100)", "1 visible line (8.3333,100) (60,100)")
	check(t, "from above", lines(plan, cone, can), "0 visible whole ellipse (0,-100)", "1 visible whole ellipse (0,100)")
}

func TestInside(t *testing.T) {
	inner, outer := frustum(vec.V3{Z: 10}, 50, 0, 120), frustum(vec.V3{}, 100, 100, 200)
	p := lines(front, inner, outer)
	check(t, "inside", p, "0 hidden line (-50,10) (50,10)", "0 hidden line (-50,10) (0,130)", "0 hidden line (0,130) (50,10)",
		"1 visible line (-100,0) (100,0)", "1 visible line (-100,200) (100,200)", "1 visible line (-100,0) (-100,200)", "1 visible line (100,0) (100,200)")
	check(t, "inside, plan", lines(plan, inner, outer), "0 hidden whole ellipse (0,0)", "1 visible whole ellipse (0,0)")
}

// Two cylinders on each other show their joint once; two that lie flush on a plane that is seen edge-on too.
func TestTouching(t *testing.T) {
	a, b := frustum(vec.V3{}, 40, 40, 50), frustum(vec.V3{Z: 50}, 40, 40, 70)
	check(t, "stacked", lines(front, a, b), "0 visible line (-40,0) (40,0)", "0 visible line (-40,50) (40,50)", "1 visible line (-40,120) (40,120)",
		"0 visible line (-40,0) (-40,50)", "0 visible line (40,0) (40,50)", "1 visible line (-40,50) (-40,120)", "1 visible line (40,50) (40,120)")
	check(t, "stacked, plan", lines(plan, a, b), "1 visible whole ellipse (0,0)")
	can := frustum(vec.V3{}, 40, 40, 100)
	l, r := cut(t, can, vec.V3{}, vec.V3{X: 1}), cut(t, can, vec.V3{}, vec.V3{X: -1})
	check(t, "halves", lines(front, l, r), "0 visible line (-40,0) (0,0)", "1 visible line (0,0) (40,0)", "0 visible line (-40,100) (0,100)", "1 visible line (0,100) (40,100)",
		"0 visible line (-40,0) (-40,100)", "1 visible line (40,0) (40,100)", "0 visible line (0,0) (0,100)")
	check(t, "halves, plan", lines(plan, l, r), "0 visible ellipse (0,-40) (0,40)", "1 visible ellipse (0,-40) (0,40)", "0 visible line (0,-40) (0,40)")
}

// A cut through the axis puts edges on what were contours, and through the apex.
func TestHalves(t *testing.T) {
	half := cut(t, frustum(vec.V3{}, 50, 0, 120), vec.V3{}, vec.V3{Y: -1})
	outline := []string{"0 visible line (-50,0) (50,0)", "0 visible line (-50,0) (0,120)", "0 visible line (0,120) (50,0)"}
	check(t, "half cone on its cut", lines(front, half), outline...)
	check(t, "half cone from behind", lines(back, half), outline...)
	check(t, "half cone from the left", lines(left, half), "0 visible line (-50,0) (0,0)", "0 visible line (-50,0) (0,120)", "0 visible line (0,0) (0,120)")
	check(t, "half cone, plan", lines(plan, half), "0 visible ellipse (-50,0) (50,0)", "0 visible line (-50,0) (0,0)", "0 visible line (0,0) (50,0)")
	lying := vec.PlaneFrame(vec.V3{}, vec.V3{Y: 1})
	can := body.Frustum("C", lying, lying, 40, 40, 100)
	check(t, "lying, along its axis", lines(front, can), "0 visible whole ellipse (0,0)")
	check(t, "lying, from above", lines(plan, can), "0 visible line (-40,0) (40,0)", "0 visible line (-40,100) (40,100)",
		"0 visible line (-40,0) (-40,100)", "0 visible line (40,0) (40,100)")
}

// SpaceAt leads from a straight image to the conic that is seen edge-on.
func TestEdgeOnParameter(t *testing.T) {
	above, _ := parabola(t)
	for _, p := range lines(front, above) {
		for k := range 11 {
			at := p.Image.T0 + (p.Image.T1-p.Image.T0)*float64(k)/10
			if d := front.Flat(p.Space.At(p.SpaceAt(at))).Dist(p.Image.At(at)); d > 1e-12*120 { // a hundred roundings of the size
				t.Errorf("%s at %g: off by %g", words(p), at, d)
			}
		}
	}
}
