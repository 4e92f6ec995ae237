package furniture

import (
	"fmt"
	"strings"

	"epure/geom/vec"
	"epure/render/drawing"
	"epure/render/font"
)

// Table is a ruled table. Rows may be shorter than the head; the rest is empty.
type Table struct {
	Name   string // for keys: "table of D"
	Title  string // above the table, may be empty
	Head   []string
	Rows   [][]string
	Height float64 // of capitals, mm; 0 stands for 2.5
}

// The air of a table over the height of capitals: beside the text of a cell, and
// the height of a row.
const (
	cellAir   = 0.8
	rowHeight = 2.0
)

// Size returns the width and height of the table in mm, title included.
func (t Table) Size() (width, height float64) {
	for _, w := range t.widths() {
		width += w
	}
	return max(width, font.Width(t.Title, t.height(), true)), float64(t.lines()) * rowHeight * t.height()
}

func (t Table) height() float64 {
	if t.Height > 0 {
		return t.Height
	}
	return 2.5
}

// lines counts the lines of the table: title, head, rows.
func (t Table) lines() int {
	n := len(t.Rows)
	if t.Title != "" {
		n++
	}
	if len(t.Head) > 0 {
		n++
	}
	return n
}

// columns is the number of columns of the widest row.
func (t Table) columns() int {
	n := len(t.Head)
	for _, r := range t.Rows {
		n = max(n, len(r))
	}
	return n
}

// widths returns each column's width: its widest text and air.
func (t Table) widths() []float64 {
	out := make([]float64, t.columns())
	h := t.height()
	for i := range out {
		if i < len(t.Head) {
			out[i] = font.Width(t.Head[i], h, true)
		}
		for _, r := range t.Rows {
			if i < len(r) {
				out[i] = max(out[i], font.Width(r[i], h, false))
			}
		}
		out[i] += 2 * cellAir * h
	}
	return out
}

// numeric reports whether every cell of a column that is not empty or a dash begins with a
// figure or a sign, and one at least does: such columns are set to the right.
func (t Table) numeric(column int) bool {
	some := false
	for _, r := range t.Rows {
		if column < len(r) && r[column] != "" && r[column] != "–" {
			if !strings.ContainsAny(r[column][:1], "0123456789+-.") && !strings.HasPrefix(r[column], "−") {
				return false
			}
			some = true
		}
	}
	return some
}

// Marks returns the table with its upper left corner at corner. It is Size large.
func (t Table) Marks(corner vec.V2, g drawing.Group) []drawing.Mark {
	h, row := t.height(), rowHeight*t.height()
	base := (row - h) / 2
	y := corner.Y
	var out []drawing.Mark
	if t.Title != "" {
		y -= row
		at := vec.V2{X: corner.X, Y: y + base}
		out = append(out, label(t.key("title"), drawing.Text{At: at, Height: h, String: t.Title, Bold: true}))
	}
	top := y
	if len(t.Head) > 0 {
		y -= row
		out = append(out, t.row(t.Head, "head", vec.V2{X: corner.X, Y: y + base}, true)...)
	}
	under := y
	for i, r := range t.Rows {
		y -= row
		out = append(out, t.row(r, fmt.Sprintf("row/%d", i+1), vec.V2{X: corner.X, Y: y + base}, false)...)
	}
	return append(out, t.rules(corner.X, top, under, y, g)...)
}

func (t Table) key(feature string) drawing.Key { return named(t.Name, feature) }

// row sets the texts of one row from the left end of its baseline.
func (t Table) row(cells []string, name string, at vec.V2, bold bool) []drawing.Mark {
	var out []drawing.Mark
	for i, w := range t.widths() {
		if i < len(cells) && cells[i] != "" {
			x := drawing.Text{At: at.Add(vec.V2{X: cellAir * t.height()}), Height: t.height(), String: cells[i], Bold: bold}
			if t.numeric(i) {
				x.At, x.Anchor = at.Add(vec.V2{X: w - cellAir*t.height()}), drawing.End
			}
			out = append(out, label(t.key(fmt.Sprintf("%s/%d", name, i+1)), x))
		}
		at.X += w
	}
	return out
}

// rules draws the outline and the line under the head wide enough to stand out,
// the lines between rows and columns narrow.
func (t Table) rules(x, top, under, foot float64, g drawing.Group) []drawing.Mark {
	thin, wide := drawing.Pen{Width: g.Narrow, Type: drawing.Continuous}, g.Symbol()
	widths := t.widths()
	right := x
	for _, w := range widths {
		right += w
	}
	at := func(x, y float64) vec.V2 { return vec.V2{X: x, Y: y} }
	var out []drawing.Mark
	for i := 1; i < len(t.Rows); i++ {
		y := under - float64(i)*rowHeight*t.height()
		out = append(out, line(t.key(fmt.Sprintf("rule/%d", i)), thin, at(x, y), at(right, y)))
	}
	c := x
	for i := 0; i+1 < len(widths); i++ {
		c += widths[i]
		out = append(out, line(t.key(fmt.Sprintf("column/%d", i+1)), thin, at(c, top), at(c, foot)))
	}
	if len(t.Head) > 0 && len(t.Rows) > 0 {
		out = append(out, line(t.key("rule/head"), wide, at(x, under), at(right, under)))
	}
	box := drawing.Box{Min: at(x, foot), Max: at(right, top)}
	return append(out, drawing.Mark{Key: t.key("border"), Role: drawing.Furniture, Pen: wide, Shape: box.Outline()})
}
