package svg

import (
	"bytes"
	"encoding/xml"
	"errors"
	"io"
	"math"
	"os"
	"regexp"
	"strings"
	"testing"

	"epure/geom/vec"
	"epure/render/drawing"
)

func sample() drawing.Sheet {
	g := drawing.Group05()
	p := func(x, y float64) vec.V2 { return vec.V2{X: x, Y: y} }
	k := func(v, t, f string) drawing.Key { return drawing.Key{View: v, Thing: t, Feature: f} }
	return drawing.Sheet{
		Name: "hood", Title: "Hood <1> & \"co\"", Desc: "A cone\x01 cut.", Width: 210, Height: 297,
		Marks: []drawing.Mark{
			{Key: k("front", "K", "edge"), Role: drawing.VisibleEdge, Pen: g.Visible(), Shape: drawing.Line{A: p(20, 50), B: p(120, 50)}},
			{Key: k("front", "K", "generator/3"), Role: drawing.HiddenEdge, Pen: g.Hidden(), Shape: drawing.Line{A: p(20, 50), B: p(70, 130)}, Title: "generator 3"},
			{Key: k("front", "K", "axis"), Role: drawing.CentreLine, Pen: g.Centre(), Shape: drawing.Line{A: p(70, 45), B: p(70, 135)}},
			{Key: k("top", "K", "base"), Role: drawing.VisibleEdge, Pen: g.Visible(), Shape: drawing.EllipseArc{C: p(70, 200), RX: 50, RY: 50, To: 2 * math.Pi}},
			{Key: k("top", "S", "cut"), Role: drawing.HiddenEdge, Pen: g.Hidden(), Shape: drawing.EllipseArc{C: p(70, 200), RX: 40, RY: 20, Rot: 0.5, To: 2 * math.Pi}},
			{Key: k("top", "S", "arc"), Role: drawing.VisibleEdge, Pen: g.Visible(), Shape: drawing.EllipseArc{C: p(150, 200), RX: 40, RY: 20, Rot: 0.5, From: 3, To: -2}},
			{Key: k("top", "S", "parabola"), Role: drawing.VisibleEdge, Pen: g.Visible(), Shape: drawing.Quad{P0: p(120, 100), P1: p(150, 180), P2: p(180, 100)}},
			{Key: k("", "note", ""), Role: drawing.Lettering, Shape: drawing.Text{At: p(30, 20), Height: 5, String: "⌀ 35.5° ± 0.2 <tag> Åé"}},
			{Key: k("", "note", "2"), Role: drawing.Lettering, Shape: drawing.Text{At: p(200, 20), Height: 3.5, Anchor: drawing.Middle, Angle: math.Pi / 2, Bold: true, String: "upright"}},
			drawing.ArrowMark(k("top", "a", ""), p(180, 60), p(1, 0), 3.5),
		},
	}
}

// elements decodes a document and returns the start of every element.
func elements(t *testing.T, data []byte) []xml.StartElement {
	t.Helper()
	d := xml.NewDecoder(bytes.NewReader(data))
	var out []xml.StartElement
	for {
		tok, err := d.Token()
		if err == io.EOF {
			return out
		}
		if err != nil {
			t.Fatal(err)
		}
		if s, ok := tok.(xml.StartElement); ok {
			out = append(out, s)
		}
	}
}

func TestDocumentIsValidAndSteady(t *testing.T) {
	a, err := Write(sample(), Options{})
	if err != nil {
		t.Fatal(err)
	}
	b, _ := Write(sample(), Options{})
	if !bytes.Equal(a, b) {
		t.Error("two runs differ")
	}
	if p := os.Getenv("EPURE_LOOK"); p != "" {
		if err := os.WriteFile(p, a, 0o644); err != nil {
			t.Fatal(err)
		}
	}
	es := elements(t, a)
	if es[1].Name.Local != "title" || es[2].Name.Local != "desc" {
		t.Error("title and desc do not come first")
	}
	seen := map[string]bool{}
	for _, e := range es {
		for _, at := range e.Attr {
			if at.Name.Local == "id" {
				if seen[at.Value] || !strings.HasPrefix(at.Value, "hood--") {
					t.Errorf("id %q is not unique, or without the sheet's name", at.Value)
				}
				seen[at.Value] = true
			}
		}
	}
	for _, id := range []string{"hood--front", "hood--front--K", "hood--front--K--generator.3", "hood--top--S--cut"} {
		if !seen[id] {
			t.Errorf("no id %q", id)
		}
	}
}

func TestTextIsXMLWhateverItHolds(t *testing.T) {
	s := sample()
	s.Name = "a b/\x00\"<--"
	for _, bad := range []string{"\x00\x1f", "]]>", "<script>", "\xff\xfe", "\ufffe\uffff", "&amp;", "--", "\u202e", strings.Repeat("x", 5000)} {
		s.Title, s.Desc = bad, bad
		for i := range s.Marks {
			s.Marks[i].Title = bad
			s.Marks[i].Key = drawing.Key{View: bad, Thing: bad, Feature: bad}
		}
		data, err := Write(s, Options{})
		if err != nil {
			t.Fatal(err)
		}
		elements(t, data)
	}
}

func TestNotFiniteIsAnError(t *testing.T) {
	for _, bad := range []float64{math.NaN(), math.Inf(1), math.Inf(-1)} {
		for _, s := range []drawing.Shape{
			drawing.Line{B: vec.V2{X: bad}}, drawing.EllipseArc{RX: bad}, drawing.Text{Angle: bad},
			drawing.Path{Pieces: []drawing.Shape{drawing.Quad{P1: vec.V2{Y: bad}}}}, drawing.Spline{Points: make([]vec.V2, 4), Err: 0},
		} {
			if _, isSpline := s.(drawing.Spline); isSpline {
				s.(drawing.Spline).Points[2].X = bad
			}
			_, err := Write(drawing.Sheet{Marks: []drawing.Mark{{Shape: s}}}, Options{})
			if !errors.Is(err, drawing.ErrNotFinite) {
				t.Errorf("%v: error %v", s, err)
			}
		}
	}
}

// A clockwise arc of the paper (y up) must keep its sense with y down: sweep 1.
// The points are re-worked here from the ellipse's equation, with SVG's own y.
func TestArcsKeepSenseAndPlace(t *testing.T) {
	w := &writer{height: 100}
	e := drawing.EllipseArc{C: vec.V2{X: 50, Y: 40}, RX: 20, RY: 10, Rot: math.Pi / 6, From: 2, To: 1}
	at := func(u float64) string {
		x, y := 20*math.Cos(u), 10*math.Sin(u)
		c, s := math.Cos(math.Pi/6), math.Sin(math.Pi/6)
		return num(50+x*c-y*s) + " " + num(60-(x*s+y*c))
	}
	if got, want := w.path(e), "M"+at(2)+"A20 10 -30 0 1 "+at(1); got != want {
		t.Errorf("got %s, want %s", got, want)
	}
}

func TestNumbers(t *testing.T) {
	for x, want := range map[float64]string{0: "0", -0.00001: "0", 1.5: "1.5", 100: "100", 0.25: "0.25", -3.14159: "-3.1416", 1e6: "1000000"} {
		if got := num(x); got != want {
			t.Errorf("num(%v) = %q, want %q", x, got, want)
		}
	}
	data, _ := Write(sample(), Options{})
	if m := regexp.MustCompile(`[" ]-0[" ]`).Find(data); m != nil {
		t.Errorf("a negative zero: %q", m)
	}
}

func TestTransparentHasNoPaper(t *testing.T) {
	with, _ := Write(sample(), Options{})
	without, _ := Write(sample(), Options{Transparent: true})
	if !bytes.Contains(with, []byte(`class="paper"`)) || bytes.Contains(without, []byte(`class="paper"`)) {
		t.Error("the paper is there when it should not be, or the reverse")
	}
}
