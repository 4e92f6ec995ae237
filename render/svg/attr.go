package svg

import (
	"fmt"
	"html"
	"math"
	"slices"
	"strconv"
	"strings"

	"epure/render/drawing"
	"epure/render/font"
)

// attr is one attribute; an empty value leaves it out.
type attr struct{ name, value string }

// tag returns the start of an element, without its closing bracket.
func tag(name string, attrs []attr) string {
	var b strings.Builder
	b.WriteString("<" + name)
	for _, a := range attrs {
		if a.value != "" {
			b.WriteString(" " + a.name + `="` + escape(a.value) + `"`)
		}
	}
	return b.String()
}

// shared returns the attributes that every list has, with the same value.
func shared(all [][]attr) []attr {
	var out []attr
	for _, a := range all[0] {
		if !slices.ContainsFunc(all, func(l []attr) bool { return !slices.Contains(l, a) }) {
			out = append(out, a)
		}
	}
	return out
}

func without(list, drop []attr) []attr {
	var out []attr
	for _, a := range list {
		if !slices.Contains(drop, a) {
			out = append(out, a)
		}
	}
	return out
}

// style returns how a mark is drawn: class, stroke and fill. Every mark states
// all of them, the root's defaults left empty, so that what a group states is
// true of every mark in it.
func (w *writer) style(m drawing.Mark) []attr {
	a := []attr{{"class", string(m.Role)}}
	if t, ok := m.Shape.(drawing.Text); ok {
		a = append(a, attr{"fill", "#000"}, attr{"stroke", "none"}, attr{"font-size", num(font.Of(t.Bold).Size(t.Height))})
		if t.Bold {
			a = append(a, attr{"font-weight", "700"})
		}
		return a
	}
	if m.Fill.On {
		a = append(a, attr{"fill", grey(m.Fill.Grey)}, attr{"fill-rule", "evenodd"})
	}
	if !(m.Pen.Width > 0) {
		return append(a, attr{"stroke", "none"})
	}
	a = append(a, attr{"stroke-width", num(m.Pen.Width)})
	if d := drawing.DashesFor(m.Pen, m.Shape); d != nil {
		a = append(a, attr{"stroke-linecap", "butt"}, attr{"stroke-dasharray", nums(d)})
	}
	return a
}

// grey returns the colour of a fill.
func grey(g float64) string {
	v := int(math.Round(255 * min(1, max(0, g))))
	if v%17 == 0 {
		return "#" + strings.Repeat(strconv.FormatInt(int64(v/17), 16), 3)
	}
	return "#" + strings.Repeat(fmt.Sprintf("%02x", v), 3)
}

// escape makes any text fit for XML: control characters out, markup escaped.
func escape(s string) string { return html.EscapeString(font.Clean(s)) }

// num writes a number of millimetres: a ten-thousandth is kept.
func num(x float64) string { return drawing.Decimal(x) }

func nums(a []float64) string {
	var b strings.Builder
	for i, x := range a {
		if i > 0 {
			b.WriteByte(' ')
		}
		b.WriteString(num(x))
	}
	return b.String()
}
