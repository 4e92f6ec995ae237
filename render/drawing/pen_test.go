package drawing

import (
	"math"
	"testing"

	"epure/geom/vec"
)

func at(x, y float64) vec.V2 { return vec.V2{X: x, Y: y} }

// TestGroups holds the line groups of ISO 128-2 in the reference notes, section 2
// (S8): wide, narrow, text; 0.5 preferred for A4 to A2, 0.7 for larger sheets.
func TestGroups(t *testing.T) {
	for _, c := range []struct {
		w, h float64
		want Group
	}{
		{210, 297, Group{0.5, 0.25, 0.35}}, {420, 297, Group{0.5, 0.25, 0.35}}, {594, 420, Group{0.5, 0.25, 0.35}},
		{594, 841, Group{0.7, 0.35, 0.5}}, {1189, 841, Group{0.7, 0.35, 0.5}},
	} {
		if got := GroupFor(c.w, c.h); got != c.want {
			t.Errorf("%v by %v: %v, want %v", c.w, c.h, got, c.want)
		}
	}
}

// TestPens holds the uses of lines in the reference notes, section 2 (numbering
// from memory of ISO 128-24; uses S11).
func TestPens(t *testing.T) {
	g := Group05()
	for role, want := range map[Role]Pen{
		VisibleEdge: {0.5, 1}, PatternEdge: {0.5, 1}, HiddenEdge: {0.25, 2}, SoftLine: {0.25, 1}, CentreLine: {0.25, 4},
		CuttingPlane: {0.5, 4}, FormerShape: {0.25, 5}, Projector: {0.25, 1}, Generator: {0.25, 1}, Construction: {0.25, 1},
		FoldLine: {0.25, 1}, Dimension: {0.25, 1}, Hatching: {0.25, 1}, Furniture: {0.35, 1}, Lettering: {},
	} {
		if got := g.Pen(role); got != want {
			t.Errorf("%s: %v, want %v", role, got, want)
		}
	}
}

// TestDashesEndOnADash walks each pattern along its line, for many lengths, and
// checks the table of fits in the reference notes, section 2: repeats 15, 30.5 and
// 34 d, shortest lines 27, 54.5 and 58 d, gaps 3 d, dots 0.5 d.
func TestDashesEndOnADash(t *testing.T) {
	const d = 0.25
	for _, c := range []struct {
		kind                  LineType
		shortest, dash, fixed float64
		parts                 int
	}{{Dashed, 27, 12, 3, 2}, {LongDashDot, 54.5, 24, 6.5, 4}, {LongDashTwoDot, 58, 24, 10, 6}} {
		if a := Dashes(c.kind, d, 0.999*c.shortest*d); a != nil {
			t.Errorf("type %d: a line too short gets dashes %v", c.kind, a)
		}
		if a := Dashes(c.kind, d, c.shortest*d); len(a) != c.parts || math.Abs(a[0]-c.dash*d) > 1e-12 {
			t.Errorf("type %d: the shortest line gets %v", c.kind, a)
		}
		for l := c.shortest * d; l < 300; l *= 1.037 {
			a := Dashes(c.kind, d, l)
			period, black := sum(a), a[0]
			n := math.Round((l - black) / period)
			if end := n*period + black; math.Abs(end-l) > 1e-9 { // rounding of some hundred repeats
				t.Errorf("type %d, %v mm: ends at %v", c.kind, l, end)
			}
			if math.Abs(period-black-c.fixed*d) > 1e-12 || black > c.dash*d*1.001 || black < c.dash*d/2 {
				t.Errorf("type %d, %v mm: dash %v, rest %v", c.kind, l, black, period-black)
			}
		}
	}
	for _, bad := range []float64{0, -1, math.NaN(), math.Inf(1)} {
		if a := Dashes(Dashed, d, bad); len(a) > 0 && !(a[0] > 0) || bad < 1 && a != nil {
			t.Errorf("length %v: dashes %v", bad, a)
		}
	}
	if Dashes(Continuous, d, 100) != nil {
		t.Error("a continuous line has dashes")
	}
}

func TestClosedLinesJoinWithoutASeam(t *testing.T) {
	e := EllipseArc{RX: 20, RY: 10, To: 2 * math.Pi}
	a := DashesFor(Pen{0.25, Dashed}, e)
	n := Length(e) / sum(a)
	if math.Abs(n-math.Round(n)) > 1e-9 {
		t.Errorf("%v repeats", n)
	}
}

// TestArrowhead: 15° and the length asked for (ISO 129-1, S19).
func TestArrowhead(t *testing.T) {
	p := Arrowhead(at(3, 4), at(0, -2), 3.5)
	a, b := p.Pieces[0].(Line).B, p.Pieces[1].(Line).B
	u, v := a.Sub(at(3, 4)), b.Sub(at(3, 4))
	angle := math.Acos(u.Dot(v) / u.Len() / v.Len())
	if math.Abs(angle*180/math.Pi-15) > 1e-9 || math.Abs(a.Y-7.5) > 1e-12 || a.Y != b.Y {
		t.Errorf("angle %v°, base at %v and %v", angle*180/math.Pi, a, b)
	}
}
