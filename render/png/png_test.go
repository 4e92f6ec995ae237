package png

import (
	"bytes"
	"encoding/binary"
	"errors"
	"image"
	"image/png"
	"math"
	"testing"

	"epure/geom/vec"
	"epure/render/drawing"
	"epure/render/font"
)

func at(x, y float64) vec.V2 { return vec.V2{X: x, Y: y} }

const dpi = 254 // ten pixels a mm

func sheet(m ...drawing.Mark) drawing.Sheet { return drawing.Sheet{Width: 60, Height: 40, Marks: m} }

// ink returns the blackened area in mm².
func ink(t *testing.T, s drawing.Sheet) float64 {
	t.Helper()
	data, err := Write(s, dpi)
	if err != nil {
		t.Fatal(err)
	}
	img, err := png.Decode(bytes.NewReader(data))
	if err != nil {
		t.Fatal(err)
	}
	sum := 0.0
	for _, v := range img.(*image.Gray).Pix {
		sum += float64(255-v) / 255
	}
	return sum / 100
}

// TestInkCoversWhatTheLineDoes compares the blackened area with the area of the
// line by formula. Tolerance: each pixel along an edge is rounded to 1/255 and
// the flattening takes up to 0.05 pixel of a curve's edge, under one part in a
// hundred of these widths.
func TestInkCoversWhatTheLineDoes(t *testing.T) {
	wide := drawing.Pen{Width: 0.5, Type: drawing.Continuous}
	thin := drawing.Pen{Width: 0.25, Type: drawing.Dashed}
	chain := drawing.Pen{Width: 0.25, Type: drawing.LongDashDot}
	line := drawing.Line{A: at(5, 5), B: at(45, 35)}
	round := math.Pi * 0.25 * 0.25
	ring := drawing.EllipseArc{C: at(30, 20), RX: 15, RY: 15, To: 2 * math.Pi}
	for name, c := range map[string]struct {
		mark drawing.Mark
		want float64
	}{
		"line":     {drawing.Mark{Pen: wide, Shape: line}, 50*0.5 + round},
		"circle":   {drawing.Mark{Pen: wide, Shape: ring}, 2 * math.Pi * 15 * 0.5},
		"arc":      {drawing.Mark{Pen: wide, Shape: drawing.EllipseArc{C: at(30, 20), RX: 15, RY: 15, From: 2, To: 1}}, 15*0.5 + round},
		"dashed":   {drawing.Mark{Pen: thin, Shape: line}, inked(thin, line) * 0.25},
		"chain":    {drawing.Mark{Pen: chain, Shape: line}, inked(chain, line) * 0.25},
		"dashring": {drawing.Mark{Pen: thin, Shape: ring}, inked(thin, ring) * 0.25},
		"disc":     {drawing.Mark{Fill: drawing.Fill{On: true}, Shape: ring}, math.Pi * 225},
		"grey":     {drawing.Mark{Fill: drawing.Fill{On: true, Grey: 0.6}, Shape: ring}, 0.4 * math.Pi * 225},
		"box":      {drawing.Mark{Pen: wide, Shape: drawing.BoxAt(at(10, 10), 20, 10).Outline()}, 60*0.5 - 4*0.0625 + round},
	} {
		if got := ink(t, sheet(c.mark)); math.Abs(got-c.want) > 0.01*c.want {
			t.Errorf("%s: %.3f mm², want %.3f", name, got, c.want)
		}
	}
}

// inked is the length of a line's dashes: all of it less the gaps, which are 3
// line widths each (ISO 128-2), counted from the fitted array.
func inked(p drawing.Pen, s drawing.Shape) float64 {
	d := drawing.DashesFor(p, s)
	l := drawing.Length(s)
	period, black := 0.0, 0.0
	for i, x := range d {
		period += x
		if i%2 == 0 {
			black += x
		}
	}
	if drawing.Closed(s) {
		return l / period * black
	}
	n := math.Round((l - d[0]) / period)
	return n*black + d[0]
}

// TestTextCoversItsGlyphs: the area of each glyph by Green's theorem over its own
// outline, against the ink.
func TestTextCoversItsGlyphs(t *testing.T) {
	text := drawing.Text{At: at(5, 15), Height: 10, String: "HgÅ8"}
	want := 0.0
	for _, r := range text.String {
		for _, p := range font.Regular().Outline(r) {
			for _, s := range drawing.Lowered(p) {
				const n = 200
				for i := range n {
					a, b := s.C.At(float64(i)/n), s.C.At(float64(i+1)/n)
					want += a.Cross(b) / 2
				}
			}
		}
	}
	size := font.Regular().Size(10)
	want = math.Abs(want) * size * size
	got := ink(t, sheet(drawing.Mark{Shape: text}))
	if math.Abs(got-want) > 0.01*want {
		t.Errorf("%.3f mm² of ink, outlines have %.3f", got, want)
	}
}

func TestImageStatesItsResolution(t *testing.T) {
	s := sheet()
	data, err := Write(s, 300)
	if err != nil {
		t.Fatal(err)
	}
	i := bytes.Index(data, []byte("pHYs"))
	// 300 / 0.0254 = 11811.02 pixels a metre
	if i != 37 || binary.BigEndian.Uint32(data[i+4:]) != 11811 || data[i+12] != 1 {
		t.Errorf("pHYs at %d", i)
	}
	c, err := png.DecodeConfig(bytes.NewReader(data))
	if err != nil || c.Width != 709 || c.Height != 472 { // 60 and 40 mm at 300 dpi
		t.Errorf("%d by %d pixels (%v)", c.Width, c.Height, err)
	}
}

func TestErrors(t *testing.T) {
	if _, err := Write(sheet(drawing.Mark{Shape: drawing.Line{A: at(math.Inf(1), 0)}}), dpi); !errors.Is(err, drawing.ErrNotFinite) {
		t.Error(err)
	}
	for _, d := range []float64{0, -1, 1e9, math.NaN(), math.Inf(1)} {
		if _, err := Write(sheet(), d); !errors.Is(err, ErrTooLarge) {
			t.Error(d, err)
		}
	}
}

func TestMarksOffTheSheetDoNoHarm(t *testing.T) {
	pen := drawing.Pen{Width: 0.5, Type: drawing.Continuous}
	for _, s := range []drawing.Shape{
		drawing.Line{A: at(-500, -500), B: at(-400, -400)}, drawing.Line{A: at(-500, 20), B: at(500, 20)}, drawing.Line{A: at(5, 5), B: at(5, 5)},
		drawing.EllipseArc{C: at(1e6, 0), RX: 1e6, RY: 1e6, To: 2 * math.Pi}, drawing.Path{Closed: true}, drawing.Spline{},
	} {
		ink(t, sheet(drawing.Mark{Pen: pen, Shape: s}))
	}
}
