package furniture

import (
	"math"
	"strings"
	"testing"

	"pgregory.net/rapid"

	"epure/geom/vec"
	"epure/render/drawing"
	"epure/render/font"
)

var key = drawing.Key{View: "front", Thing: "K", Feature: "width"}

func pick(t *testing.T, marks []drawing.Mark, feature string) drawing.Shape {
	t.Helper()
	for _, m := range marks {
		if m.Key.Feature == feature {
			return m.Shape
		}
	}
	t.Fatalf("no mark %q", feature)
	return nil
}

// TestLinearDimension holds the rules in the reference notes, section 6: extension
// lines touch the outline and reach 8 line widths (2 mm) past, arrows as long as
// the figures, figures 1 mm above the line (S19, S20).
func TestLinearDimension(t *testing.T) {
	s := DimStyleFor(drawing.Group05())
	if s.Height != 3.5 || s.Pen != (drawing.Pen{Width: 0.25, Type: drawing.Continuous}) {
		t.Errorf("style %v", s)
	}
	if s := DimStyleFor(drawing.Group07()); s.Height != 5 {
		t.Errorf("style of large sheets %v", s)
	}
	m := Linear{From: at(0, 0), To: at(80, 5), Dir: at(1, 0), Offset: -FirstOffset, Text: "240"}.Marks(key, s)
	if l := pick(t, m, "width/line"); l != (drawing.Line{A: at(0, -10), B: at(80, -10)}) {
		t.Errorf("dimension line %v", l)
	}
	if l := pick(t, m, "width/extension/1"); l != (drawing.Line{A: at(0, 0), B: at(0, -12)}) {
		t.Errorf("extension line %v", l)
	}
	if l := pick(t, m, "width/extension/2"); l != (drawing.Line{A: at(80, 5), B: at(80, -12)}) {
		t.Errorf("extension line %v", l)
	}
	if b := drawing.Bounds(pick(t, m, "width/arrow/1")); b.Min.X != 0 || b.Max.X != 3.5 {
		t.Errorf("arrow %v", b)
	}
	x := pick(t, m, "width/text").(drawing.Text)
	if x.At != at(40, -10+1+0.125) || x.Angle != 0 || x.Anchor != drawing.Middle || x.Height != 3.5 {
		t.Errorf("text %+v", x)
	}
}

// TestArrowsOutside: under 2.5 arrow lengths of room they stand outside and point
// at each other (S19, S20).
func TestArrowsOutside(t *testing.T) {
	s := DimStyleFor(drawing.Group05())
	for length, outside := range map[float64]bool{8.7: true, 8.8: false, 3: true, 100: false} {
		m := Linear{From: at(0, 0), To: at(length, 0), Offset: 10, Text: "9"}.Marks(key, s)
		b := drawing.Bounds(pick(t, m, "width/arrow/1"))
		if got := b.Min.X < 0; got != outside {
			t.Errorf("%v mm: arrow %v", length, b)
		}
	}
}

// TestFiguresAreReadable turns a dimension all the way round: figures are read
// from the bottom or the right, stand 1 mm clear of the unbroken line and do not
// cross any line of their own dimension.
func TestFiguresAreReadable(t *testing.T) {
	s := DimStyleFor(drawing.Group05())
	rapid.Check(t, func(t *rapid.T) {
		angle := float64(rapid.IntRange(0, 23).Draw(t, "step")) * math.Pi / 12
		length := rapid.Float64Range(2, 60).Draw(t, "length")
		text := rapid.SampledFrom([]string{"4", "286.4", "⌀ 1200 ± 0.5"}).Draw(t, "text")
		offset := rapid.SampledFrom([]float64{-10, -18, 10}).Draw(t, "offset")
		u := drawing.Dir(angle)
		m := Linear{From: at(100, 100), To: at(100, 100).Along(u, length), Offset: offset, Text: text}.Marks(key, s)
		var x drawing.Text
		for _, k := range m {
			if v, ok := k.Shape.(drawing.Text); ok {
				x = v
			}
		}
		if x.Angle <= -math.Pi/2+1e-6 || x.Angle > math.Pi/2+1e-6 {
			t.Fatalf("figures at %v°", x.Angle*180/math.Pi)
		}
		for _, k := range m {
			if l, ok := k.Shape.(drawing.Line); ok {
				clearOf(t, x, l, strings.HasSuffix(k.Key.Feature, "line"))
			}
		}
	})
}

// clearOf checks, in the text's own frame, that a line stays out of its figures.
func clearOf(t *rapid.T, x drawing.Text, l drawing.Line, own bool) {
	p, w := font.Start(x)
	u := drawing.Dir(x.Angle)
	local := func(q vec.V2) vec.V2 { d := q.Sub(p); return at(d.Dot(u), d.Dot(u.Left())) }
	a, b := local(l.A), local(l.B)
	if own {
		if math.Abs(a.Y+1.125) > 1e-9 || math.Abs(b.Y+1.125) > 1e-9 { // 1 mm and half of 0.25; rounding
			t.Fatalf("figures %v and %v above their line", -a.Y, -b.Y)
		}
		if min(a.X, b.X) > 1e-9 || max(a.X, b.X) < w-1e-9 {
			t.Fatalf("figures from 0 to %v over a line from %v to %v", w, a.X, b.X)
		}
		return
	}
	for i := range 101 {
		q := drawing.Line{A: a, B: b}.At(float64(i) / 100)
		if q.X > 0.1 && q.X < w-0.1 && q.Y > 0 && q.Y < x.Height {
			t.Fatalf("%q is crossed at %v", x.String, q)
		}
	}
}

func TestUprightIsReadFromTheRight(t *testing.T) {
	s := DimStyleFor(drawing.Group05())
	for _, to := range []vec.V2{at(0, 50), at(0, -50), at(1e-9, 50), at(-1e-9, 50), at(1e-9, -50)} {
		m := Linear{From: at(0, 0), To: to, Offset: 10, Text: "50"}.Marks(key, s)
		if x := pick(t, m, "width/text").(drawing.Text); math.Abs(x.Angle-math.Pi/2) > 1e-9 {
			t.Errorf("to %v: figures at %v°", to, x.Angle*180/math.Pi)
		}
	}
}

func TestDegenerateDimensions(t *testing.T) {
	s := DimStyleFor(drawing.Group05())
	if m := (Linear{From: at(1, 1), To: at(1, 1), Text: "0"}).Marks(key, s); m != nil {
		t.Errorf("marks %v", m)
	}
	for _, m := range [][]drawing.Mark{
		Diameter{Text: "⌀ 0"}.Marks(key, s), Radius{Text: "R 0"}.Marks(key, s), Leader{Text: "x"}.Marks(key, s), Leader{End: EndDot}.Marks(key, s),
		Angle{Radius: 10, Text: "360°"}.Marks(key, s), Angle{Radius: 10, To: 1e-9}.Marks(key, s),
	} {
		for _, k := range m {
			if !drawing.Finite(k.Shape) {
				t.Errorf("%v is not finite", k.Key)
			}
		}
	}
}

// TestAngleArrowsLieOnTheArc: each arrow's foot is within a sixth of a line's
// width of the arc that it ends.
func TestAngleArrowsLieOnTheArc(t *testing.T) {
	s := DimStyleFor(drawing.Group05())
	for _, to := range []float64{1.2, 0.2} { // inside, outside
		m := Angle{From: 0.1, To: to, Radius: 25, Text: "1"}.Marks(key, s)
		for _, name := range []string{"width/arrow/1", "width/arrow/2"} {
			p := pick(t, m, name).(drawing.Path)
			base := p.Pieces[1].(drawing.Line).At(0.5)
			// the chord of an arrow on the arc leaves it by nothing at its foot
			if d := math.Abs(base.Len() - 25); d > 0.05 {
				t.Errorf("%s: foot %v off the arc", name, d)
			}
			if tip := p.Pieces[0].(drawing.Line).A; math.Abs(tip.Len()-25) > 1e-12*25 {
				t.Errorf("%s: tip at %v", name, tip)
			}
		}
	}
}

// TestSymbolTellsTheMethods: the circles (the view from the left, the small end
// in front) stand at the right of the elevation in first angle and at its left in
// third angle (reference notes, section 4: S21).
func TestSymbolTellsTheMethods(t *testing.T) {
	place := func(p Projection) (frustum, circle drawing.Box) {
		m := Symbol(p, at(0, 0), 3, drawing.Group05())
		return drawing.Bounds(pick(t, m, "frustum")), drawing.Bounds(pick(t, m, "circle/large"))
	}
	f, c := place(FirstAngle)
	if !(f.Max.X < c.Min.X) || math.Abs(f.Width()-6) > 1e-12 || math.Abs(f.Height()-6) > 1e-12 || math.Abs(c.Width()-6) > 1e-12 {
		t.Errorf("first angle: frustum %v, circles %v", f, c)
	}
	if f, c := place(ThirdAngle); !(c.Max.X < f.Min.X) {
		t.Errorf("third angle: frustum %v, circles %v", f, c)
	}
	if Symbol(NoProjection, at(0, 0), 3, drawing.Group05()) != nil {
		t.Error("a symbol for no method")
	}
}
