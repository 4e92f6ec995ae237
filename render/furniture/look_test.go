package furniture

import (
	"math"
	"os"
	"testing"

	"epure/geom/vec"
	"epure/render/drawing"
	"epure/render/pdf"
	"epure/render/png"
	"epure/render/svg"
)

func at(x, y float64) vec.V2 { return vec.V2{X: x, Y: y} }

// demo is a sheet with every piece of furniture on it, for the eye: set
// EPURE_LOOK to a folder, run the tests and look at demo.svg and demo.pdf there.
func demo() drawing.Sheet {
	p, _ := PaperNamed("A3")
	g := p.Group()
	s := DimStyleFor(g)
	marks := Frame(p)
	block := TitleBlock{
		Owner: "Invented Works", Number: "EP-0042-07", Revision: "B", Date: "2024-02-29", Sheet: "1", Sheets: "3", Language: "en",
		Title: "Rain hood for a round vent", Supplement: "cut parallel to a generator, pattern seen from outside", Department: "Sheet shop",
		Reference: "A. Draughtsman", Approved: "B. Checker", Creator: "C. Maker", DocumentType: "Manufacturing drawing", Status: "For review",
		PaperSize: "A3", Scale: "1:5", Units: "mm", Tolerance: "ISO 2768-m", Projection: FirstAngle,
	}
	marks = append(marks, block.Marks(at(p.Space().Max.X, p.Space().Min.Y), g)...)
	k := func(f string) drawing.Key { return drawing.Key{View: "front", Thing: "K", Feature: f} }
	add := func(m ...drawing.Mark) { marks = append(marks, m...) }
	line := func(r drawing.Role, a, b vec.V2) {
		add(drawing.Mark{Key: k(""), Role: r, Pen: g.Pen(r), Shape: drawing.Line{A: a, B: b}})
	}
	line(drawing.VisibleEdge, at(60, 160), at(140, 160))
	line(drawing.VisibleEdge, at(60, 160), at(100, 240))
	line(drawing.VisibleEdge, at(140, 160), at(100, 240))
	line(drawing.CentreLine, at(100, 156), at(100, 244))
	line(drawing.HiddenEdge, at(80, 160), at(100, 240))
	add(Linear{From: at(60, 160), To: at(140, 160), Offset: -10, Text: "⌀ 240"}.Marks(k("a"), s)...)
	add(Linear{From: at(60, 160), To: at(80, 160), Offset: -18, Text: "60"}.Marks(k("b"), s)...)
	add(Linear{From: at(80, 160), To: at(86, 160), Offset: -18, Text: "18"}.Marks(k("c"), s)...)
	add(Linear{From: at(140, 160), To: at(100, 240), Dir: at(0, 1), Offset: -12, Text: "260 ± 2"}.Marks(k("d"), s)...)
	add(Linear{From: at(60, 160), To: at(100, 240), Offset: 8, Text: "286.4"}.Marks(k("e"), s)...)
	add(Linear{From: at(140, 160), To: at(140, 164), Dir: at(0, 1), Offset: -22, Text: "4.5"}.Marks(k("f"), s)...)
	add(Angle{Vertex: at(60, 160), From: 0, To: math.Atan2(80, 40), Radius: 22, Legs: [2]float64{80, 80}, Text: "63.4°"}.Marks(k("g"), s)...)
	add(Angle{Vertex: at(140, 160), From: math.Pi - math.Atan2(80, 40), To: math.Pi, Radius: 16, Legs: [2]float64{80, 80}, Text: "63.4°"}.Marks(k("h"), s)...)
	add(Leader{Tip: at(118, 204), Elbow: at(128, 222), Text: "generator 3"}.Marks(k("i"), s)...)
	add(Leader{Tip: at(95, 175), Elbow: at(84, 185), End: EndDot, Text: "t 0.7"}.Marks(k("j"), s)...)
	circle := func(c vec.V2, r float64) drawing.EllipseArc {
		return drawing.EllipseArc{C: c, RX: r, RY: r, To: 2 * math.Pi}
	}
	for _, r := range []float64{32, 12, 5} {
		add(drawing.Mark{Key: k(""), Role: drawing.VisibleEdge, Pen: g.Visible(), Shape: circle(at(230, 200), r)})
	}
	line(drawing.CentreLine, at(195, 200), at(265, 200))
	line(drawing.CentreLine, at(230, 165), at(230, 235))
	add(Diameter{Centre: at(230, 200), Radius: 32, Angle: 0.6, Text: "⌀ 64"}.Marks(k("k"), s)...)
	add(Diameter{Centre: at(230, 200), Radius: 12, Angle: 2.4, Text: "⌀ 24"}.Marks(k("l"), s)...)
	add(Radius{Centre: at(230, 200), Radius: 5, Angle: -0.8, Text: "R 5"}.Marks(k("m"), s)...)
	add(Radius{Centre: at(230, 200), Radius: 32, Angle: -2.4, Text: "R 32"}.Marks(k("n"), s)...)
	hatched := drawing.Path{Closed: true, Pieces: []drawing.Shape{
		drawing.EllipseArc{C: at(60, 80), RX: 35, RY: 20, Rot: 0.3, To: 2 * math.Pi},
	}}
	hole := drawing.Path{Closed: true, Pieces: []drawing.Shape{drawing.Quad{P0: at(50, 72), P1: at(60, 110), P2: at(72, 76)}, drawing.Line{A: at(72, 76), B: at(50, 72)}}}
	for _, l := range drawing.Hatch([]drawing.Path{hatched, hole}, drawing.HatchAngle, drawing.PitchFor(drawing.Bounds(hatched))) {
		add(drawing.Mark{Key: k(""), Role: drawing.Hatching, Pen: g.Thin(), Shape: l})
	}
	add(drawing.Mark{Role: drawing.VisibleEdge, Pen: g.Visible(), Shape: hatched}, drawing.Mark{Role: drawing.VisibleEdge, Pen: g.Visible(), Shape: hole})
	t := Table{Name: "table of D", Title: "True lengths", Head: []string{"No.", "Angle", "True length", "Note"},
		Rows: [][]string{{"1", "180°", "286.4", "seam"}, {"2", "210°", "1241.75", ""}, {"3", "240°", "98.1", "shortest"}}}
	add(t.Marks(at(310, 250), g)...)
	add(Symbol(ThirdAngle, at(330, 190), 8, g)...)
	add(Symbol(FirstAngle, at(380, 190), 5, g)...)
	for i, d := range []float64{0, 30, 60, 90, 120, 150, 180, 210, 240, 270, 300, 330} {
		c, u := at(330, 120), drawing.Dir(d*math.Pi/180)
		add(Linear{From: c.Along(u, 15), To: c.Along(u, 38), Offset: 0, Text: "23"}.Marks(drawing.Key{View: "rose", Thing: string(rune('a' + i))}, s)...)
	}
	for i, d := range []float64{0, 45, 90, 135, 180, 225, 270, 315} {
		a := Angle{Vertex: at(150, 75), From: d * math.Pi / 180, To: (d + 45) * math.Pi / 180, Radius: 24, Text: "45°"}
		add(a.Marks(drawing.Key{View: "angles", Thing: string(rune('a' + i))}, s)...)
	}
	return drawing.Sheet{Name: "demo", Title: "Demo", Desc: "Every piece of furniture.", Width: p.Width, Height: p.Height, Marks: marks}
}

func TestDemoIsWritten(t *testing.T) {
	s, err := svg.Write(demo(), svg.Options{})
	if err != nil {
		t.Fatal(err)
	}
	p, err := pdf.Write(demo())
	if err != nil {
		t.Fatal(err)
	}
	if dir := os.Getenv("EPURE_LOOK"); dir != "" {
		os.WriteFile(dir+"/demo.svg", s, 0o644)
		os.WriteFile(dir+"/demo.pdf", p, 0o644)
		if img, err := png.Write(demo(), 150); err == nil {
			os.WriteFile(dir+"/demo.png", img, 0o644)
		}
	}
}
