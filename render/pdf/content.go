package pdf

import (
	"fmt"
	"math"
	"strings"

	"epure/geom/vec"
	"epure/render/drawing"
	"epure/render/font"
)

// page writes the content of a page. It keeps the graphics state that it has set
// and writes only what changes.
type page struct {
	b     strings.Builder
	fonts [2]*face
	state map[string]string // operator -> operands in force
}

// draw returns the content stream, in points, y up like the sheet.
func draw(s drawing.Sheet, fonts [2]*face) []byte {
	p := &page{fonts: fonts, state: map[string]string{"w": "1", "d": "[] 0", "J": "0", "g": "0", "G": "0"}}
	p.set("j", "1")
	for _, m := range s.Marks {
		if t, ok := m.Shape.(drawing.Text); ok {
			p.text(t)
			continue
		}
		p.shape(m)
	}
	return []byte(p.b.String())
}

// set writes an operator that sets the state, unless it is in force.
func (p *page) set(op, operands string) {
	if p.state[op] != operands {
		p.state[op] = operands
		p.b.WriteString(operands + " " + op + "\n")
	}
}

func (p *page) shape(m drawing.Mark) {
	strokes := drawing.Lowered(m.Shape)
	op := operator(m)
	if len(strokes) == 0 || op == "" {
		return
	}
	if m.Fill.On {
		p.set("g", num(m.Fill.Grey))
	}
	if m.Pen.Width > 0 {
		p.pen(m)
	}
	p.path(strokes, drawing.Closed(m.Shape))
	p.b.WriteString(op + "\n")
}

// operator is what paints the path: stroke, fill even-odd, or both.
func operator(m drawing.Mark) string {
	switch {
	case m.Fill.On && m.Pen.Width > 0:
		return "B*"
	case m.Fill.On:
		return "f*"
	case m.Pen.Width > 0:
		return "S"
	}
	return ""
}

// pen sets width, caps and dashes: round ends for continuous lines, butt ends for
// dashed ones, like every writer.
func (p *page) pen(m drawing.Mark) {
	p.set("w", num(m.Pen.Width*PointsPerMM))
	d := drawing.DashesFor(m.Pen, m.Shape)
	if d == nil {
		p.set("J", "1")
		p.set("d", "[] 0")
		return
	}
	var parts []string
	for _, x := range d {
		parts = append(parts, num(x*PointsPerMM))
	}
	p.set("J", "0")
	p.set("d", "["+strings.Join(parts, " ")+"] 0")
}

// path writes a chain of pieces; the last straight piece of a closed one is left
// to the closing operator, which also joins the corner.
func (p *page) path(strokes []drawing.Stroke, closed bool) {
	fmt.Fprintf(&p.b, "%s m\n", point(strokes[0].C[0]))
	for i, s := range strokes {
		if s.Straight {
			if last := i == len(strokes)-1; !(last && closed) {
				fmt.Fprintf(&p.b, "%s l\n", point(s.C[3]))
			}
			continue
		}
		fmt.Fprintf(&p.b, "%s %s %s c\n", point(s.C[1]), point(s.C[2]), point(s.C[3]))
	}
	if closed {
		p.b.WriteString("h\n")
	}
}

func point(q vec.V2) string { return num(q.X*PointsPerMM) + " " + num(q.Y*PointsPerMM) }

// text sets one line of lettering, anchored by its own width.
func (p *page) text(t drawing.Text) {
	s := font.Clean(t.String)
	f := p.fonts[0]
	if t.Bold {
		f = p.fonts[1]
	}
	if f == nil || s == "" || !(t.Height > 0) {
		return
	}
	p.set("g", "0")
	at, _ := font.Start(t)
	x := drawing.Dir(t.Angle)
	fmt.Fprintf(&p.b, "BT %s %s Tf %s %s %s %s %s Tm <", f.name, num(font.Of(t.Bold).Size(t.Height)*PointsPerMM),
		ratio(x.X), ratio(x.Y), ratio(-x.Y), ratio(x.X), point(at))
	for _, r := range s {
		fmt.Fprintf(&p.b, "%04X", f.subset.Glyph(r))
	}
	p.b.WriteString("> Tj ET\n")
}

// ratio writes a sine or cosine with eight decimals, so that the end of a line of
// a metre lies within 1e-5 mm.
func ratio(x float64) string {
	if x == math.Round(x) {
		return num(x)
	}
	return strings.TrimRight(fmt.Sprintf("%.8f", x), "0")
}
