package furniture

import (
	"math"

	"epure/geom/vec"
	"epure/render/drawing"
	"epure/render/font"
)

// Dimensions after ISO 129-1:2018: narrow continuous lines, filled arrows of 15°
// as long as the figures are high, figures above the unbroken line and readable
// from the bottom or the right. Every function returns the marks of one
// dimension under one key; Feature is extended by "line", "arrow/1" and so on.

// DimStyle is how dimensions of a sheet are drawn.
type DimStyle struct {
	Height float64 // of figures, and the length of arrows, mm
	Pen    drawing.Pen
}

// DimStyleFor returns the style of a line group: figures ten times as high as
// their stroke (ISO 3098 type B), so 3.5 on sheets up to A2 and 5 above.
func DimStyleFor(g drawing.Group) DimStyle { return DimStyle{10 * g.Text, g.Thin()} }

// Distances of dimensions, mm.
const (
	FirstOffset = 10.0 // of the first dimension line from the outline
	NextOffset  = 8.0  // between parallel dimension lines
	textClear   = 1.0  // of figures above their line
	sideClear   = 1.0  // of figures beside an arrow or an extension line
)

// overshoot of an extension line past the dimension line, in line widths: 2 mm at
// 0.25.
const overshoot = 8

// leastSpace is the room for arrows inside, in arrow lengths; with less they
// stand outside.
const leastSpace = 2.5

// dim gathers the marks of one dimension.
type dim struct {
	key   drawing.Key
	style DimStyle
	marks []drawing.Mark
}

func (d *dim) feature(name string) drawing.Key {
	k := d.key
	if k.Feature != "" {
		name = k.Feature + "/" + name
	}
	k.Feature = name
	return k
}

func (d *dim) shape(name string, s drawing.Shape) {
	d.marks = append(d.marks, drawing.Mark{Key: d.feature(name), Role: drawing.Dimension, Pen: d.style.Pen, Shape: s})
}

func (d *dim) line(name string, a, b vec.V2) {
	if a.Dist(b) > drawing.FlatAxis {
		d.shape(name, drawing.Line{A: a, B: b})
	}
}

func (d *dim) arrow(name string, tip, dir vec.V2) {
	d.marks = append(d.marks, drawing.ArrowMark(d.feature(name), tip, dir, d.style.Height))
}

func (d *dim) width(s string) float64 { return font.Width(s, d.style.Height, false) }

// text sets figures above a line through at, along the reading direction r.
func (d *dim) text(s string, at, r vec.V2, a drawing.Anchor) {
	if s == "" {
		return
	}
	p := at.Along(r.Left(), textClear+d.style.Pen.Width/2)
	t := drawing.Text{At: p, Height: d.style.Height, Anchor: a, Angle: angleOf(r), String: s}
	m := label(d.feature("text"), t)
	m.Role = drawing.Dimension
	d.marks = append(d.marks, m)
}

// uprightSine is the cosine under which a line counts as upright, so that its
// figures are read from the right whatever rounding did to it: a thousandth of a
// degree, far less than anyone can see.
const uprightSine = 1.7e-5

// reading returns dir or its opposite: the one in which figures are read from the
// bottom or, on upright lines, from the right.
func reading(dir vec.V2) vec.V2 {
	u := dir.Unit()
	if u.X < -uprightSine || math.Abs(u.X) <= uprightSine && u.Y < 0 {
		return u.Scale(-1)
	}
	return u
}

// angleOf is the angle of a unit vector; whole quarters for level and upright
// ones.
func angleOf(u vec.V2) float64 { return math.Atan2(u.Y+0, u.X) }

// Linear is the distance of two points, measured along Dir.
type Linear struct {
	From, To vec.V2
	Dir      vec.V2  // the direction measured; zero: from From to To
	Offset   float64 // of the dimension line from the farther point on its side, mm, positive to the left of From -> To
	Text     string
}

// Marks returns the dimension: extension lines from the points, the dimension line
// with its arrows, and the text. Points that coincide along Dir give no marks.
func (l Linear) Marks(k drawing.Key, s DimStyle) []drawing.Mark {
	d := &dim{key: k, style: s}
	span := l.To.Sub(l.From)
	dir := l.Dir.Unit()
	if dir == (vec.V2{}) {
		dir = span.Unit()
	}
	length := span.Dot(dir)
	if length < 0 {
		dir, length = dir.Scale(-1), -length
	}
	if !(length > drawing.FlatAxis) {
		return nil
	}
	n := dir.Left()
	side := math.Copysign(1, l.Offset)
	out := max(side*l.From.Dot(n), side*l.To.Dot(n)) + math.Abs(l.Offset)
	a := l.From.Along(n, side*out-l.From.Dot(n))
	b := a.Along(dir, length)
	d.extension("extension/1", l.From, a, n.Scale(side))
	d.extension("extension/2", l.To, b, n.Scale(side))
	d.measured(a, b, l.Text)
	return d.marks
}

// extension draws an extension line from the outline at p to past the dimension
// line's end q; out points away from the outline.
func (d *dim) extension(name string, p, q, out vec.V2) {
	if p.Dist(q) > drawing.FlatAxis {
		d.line(name, p, q.Along(out, overshoot*d.style.Pen.Width))
	}
}

// measured draws the dimension line from a to b with arrows inside or outside,
// and the text above it, or beyond its reading end where it does not fit.
func (d *dim) measured(a, b vec.V2, text string) {
	r := reading(b.Sub(a))
	if r.Dot(b.Sub(a)) < 0 {
		a, b = b, a
	}
	length, w, h := a.Dist(b), d.width(text), d.style.Height
	outside := length < leastSpace*h
	from, to := a, b
	if outside {
		from, to = a.Along(r, -2*h), b.Along(r, 2*h)
		d.arrow("arrow/1", a, r)
		d.arrow("arrow/2", b, r.Scale(-1))
	} else {
		d.arrow("arrow/1", a, r.Scale(-1))
		d.arrow("arrow/2", b, r)
	}
	if w+sideClear <= length {
		d.text(text, drawing.Line{A: a, B: b}.At(0.5), r, drawing.Middle)
	} else {
		start := b.Along(r, sideClear)
		to = start.Along(r, w)
		if outside {
			to = to.Along(r, h)
			start = start.Along(r, h)
		}
		d.text(text, start, r, drawing.Start)
	}
	d.line("line", from, to)
}
