package svg

import (
	"math"
	"strings"

	"epure/geom/vec"
	"epure/render/drawing"
	"epure/render/font"
)

// mark writes one mark, with its own words as a title inside.
func (w *writer) mark(m drawing.Mark, style []attr) {
	name, geometry, content := w.element(m.Shape)
	if name == "" {
		return
	}
	own := []attr{{"data-feature", m.Key.Feature}}
	if m.Key.Feature != "" {
		own = append(own, attr{"id", w.ids.named(m.Key.View, m.Key.Thing, m.Key.Feature)})
	}
	w.b.WriteString(tag(name, append(append(own, style...), geometry...)))
	if m.Title != "" {
		content = "<title>" + escape(m.Title) + "</title>" + content
	}
	if content == "" {
		w.line("/>")
		return
	}
	w.line(">", content, "</", name, ">")
}

// element returns the name, the attributes and the content of a shape's element;
// no name for a shape that draws nothing.
func (w *writer) element(s drawing.Shape) (name string, geometry []attr, content string) {
	switch s := s.(type) {
	case drawing.Text:
		return w.text(s)
	case drawing.EllipseArc:
		if s.Full() && num(s.RX) != "0" && num(s.RY) != "0" {
			return w.whole(s)
		}
	}
	d := w.path(s)
	if d == "" {
		return "", nil, ""
	}
	return "path", []attr{{"d", d}}, ""
}

// whole writes a full circle or ellipse by its own element.
func (w *writer) whole(e drawing.EllipseArc) (string, []attr, string) {
	at := []attr{{"cx", num(e.C.X)}, {"cy", num(w.height - e.C.Y)}}
	if e.RX == e.RY {
		return "circle", append(at, attr{"r", num(e.RX)}), ""
	}
	at = append(at, attr{"rx", num(e.RX)}, attr{"ry", num(e.RY)})
	if r := degrees(e.Rot); r != "0" {
		at = append(at, attr{"transform", "rotate(" + r + " " + w.point(e.C) + ")"})
	}
	return "ellipse", at, ""
}

// text writes a line of lettering. Its length is stated so that a reader's own
// font takes the same room.
func (w *writer) text(t drawing.Text) (string, []attr, string) {
	s := font.Clean(t.String)
	if strings.TrimSpace(s) == "" {
		return "", nil, ""
	}
	anchor := [...]string{"", "middle", "end"}[min(t.Anchor, drawing.End)]
	a := []attr{
		{"x", num(t.At.X)}, {"y", num(w.height - t.At.Y)}, {"text-anchor", anchor},
		{"textLength", num(font.Width(s, t.Height, t.Bold))}, {"lengthAdjust", "spacingAndGlyphs"},
	}
	if r := degrees(t.Angle); r != "0" {
		a = append(a, attr{"transform", "rotate(" + r + " " + w.point(t.At) + ")"})
	}
	return "text", a, escape(s)
}

// degrees writes an angle (radians anticlockwise) the way SVG turns: clockwise.
func degrees(angle float64) string { return num(0 - angle*180/math.Pi) }

func (w *writer) point(p vec.V2) string { return num(p.X) + " " + num(w.height-p.Y) }

// path writes a shape as path data.
func (w *writer) path(s drawing.Shape) string {
	from, _, ok := drawing.Ends(s)
	if !ok {
		return ""
	}
	var b strings.Builder
	b.WriteString("M" + w.point(from))
	w.pieces(&b, s)
	if drawing.Closed(s) {
		b.WriteByte('Z')
	}
	return b.String()
}

func (w *writer) pieces(b *strings.Builder, s drawing.Shape) {
	switch s := s.(type) {
	case drawing.Line:
		b.WriteString("L" + w.point(s.B))
	case drawing.EllipseArc:
		w.arc(b, s)
	case drawing.Quad:
		b.WriteString("Q" + w.point(s.P1) + " " + w.point(s.P2))
	case drawing.Spline:
		for _, c := range s.Cubics() {
			b.WriteString("C" + w.point(c[1]) + " " + w.point(c[2]) + " " + w.point(c[3]))
		}
	case drawing.Path:
		for _, p := range s.Pieces {
			w.pieces(b, p)
		}
	}
}

// quarterSlack keeps rounding from cutting a quarter turn in two; a piece that is
// longer by this part of a quarter is placed no worse.
const quarterSlack = 1e-9

// arc writes an arc in pieces of a quarter turn at most: an arc given by its ends
// is the worse placed by their rounding the nearer it is to half a turn. An
// ellipse that rounds to a line is written as the line that it covers.
func (w *writer) arc(b *strings.Builder, e drawing.EllipseArc) {
	if num(e.RX) == "0" || num(e.RY) == "0" {
		for _, t := range append(e.Turns(), e.To) {
			b.WriteString("L" + w.point(e.At(t)))
		}
		return
	}
	n := math.Max(1, math.Ceil(math.Abs(e.To-e.From)/(math.Pi/2)-quarterSlack))
	sweep := " 0 0 "
	if e.To < e.From {
		sweep = " 0 1 "
	}
	for i := 1.0; i <= n; i++ {
		t := e.From + (e.To-e.From)*i/n
		b.WriteString("A" + num(e.RX) + " " + num(e.RY) + " " + degrees(e.Rot) + sweep + w.point(e.At(t)))
	}
}
