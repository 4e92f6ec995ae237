package furniture

import (
	"math"

	"epure/geom/vec"
	"epure/render/drawing"
)

// Diameters, radii, angles and leaders.

// Diameter is the dimension of a circle seen as one.
type Diameter struct {
	Centre vec.V2
	Radius float64 // on paper, mm
	Angle  float64 // of the dimension line, radians
	Text   string  // with its sign: "⌀ 240"
}

// Marks returns the dimension: through the centre with two arrows where the text
// fits, else from outside with a level landing.
func (c Diameter) Marks(k drawing.Key, s DimStyle) []drawing.Mark {
	d := &dim{key: k, style: s}
	dir := drawing.Dir(c.Angle)
	w, h := d.width(c.Text), s.Height
	if !(c.Radius > drawing.FlatAxis) || w+2*h+sideClear > 2*c.Radius {
		return d.outside(c.Centre.Along(dir, c.Radius), dir, c.Text)
	}
	r := reading(dir)
	a, b := c.Centre.Along(r, -c.Radius), c.Centre.Along(r, c.Radius)
	d.arrow("arrow/1", a, r.Scale(-1))
	d.arrow("arrow/2", b, r)
	d.line("line", a, b)
	at := c.Centre
	if w+h+2*sideClear < c.Radius { // clear of the centre lines
		at = c.Centre.Along(r, (c.Radius-h)/2)
	}
	d.text(c.Text, at, r, drawing.Middle)
	return d.marks
}

// Radius is the dimension of an arc seen true.
type Radius struct {
	Centre vec.V2
	Radius float64 // on paper, mm
	Angle  float64 // toward the arrow, radians
	Text   string  // with its letter: "R 40"
}

// Marks returns the dimension: from the centre to an arrow on the arc where the
// text fits, else from outside with a level landing.
func (c Radius) Marks(k drawing.Key, s DimStyle) []drawing.Mark {
	d := &dim{key: k, style: s}
	dir := drawing.Dir(c.Angle)
	tip := c.Centre.Along(dir, c.Radius)
	if d.width(c.Text)+s.Height+2*sideClear > c.Radius {
		return d.outside(tip, dir, c.Text)
	}
	d.arrow("arrow/1", tip, dir)
	d.line("line", c.Centre, tip)
	d.text(c.Text, c.Centre.Along(dir, (c.Radius-s.Height)/2), reading(dir), drawing.Middle)
	return d.marks
}

// outsideStem is the length, in arrows, of the sloping part of a dimension that
// comes from outside.
const outsideStem = 2.5

// outside draws an arrow that touches tip from outside, dir pointing outward, and
// the text over a level landing.
func (d *dim) outside(tip, dir vec.V2, text string) []drawing.Mark {
	d.arrow("arrow/1", tip, dir.Scale(-1))
	d.landing(tip, tip.Along(dir, outsideStem*d.style.Height), text)
	return d.marks
}

// landing draws the line from tip to elbow and on, level, under the text.
func (d *dim) landing(tip, elbow vec.V2, text string) {
	d.line("line", tip, elbow)
	w := d.width(text)
	if text == "" {
		return
	}
	right, start := vec.V2{X: 1}, elbow.X+sideClear
	end := elbow.X + w + 2*sideClear
	if elbow.X < tip.X {
		start, end = elbow.X-w-sideClear, elbow.X-w-2*sideClear
	}
	d.line("landing", elbow, vec.V2{X: end, Y: elbow.Y})
	d.text(text, vec.V2{X: start, Y: elbow.Y}, right, drawing.Start)
}

// LeaderEnd is what a leader line ends with.
type LeaderEnd uint8

// The ends: an arrow on an edge, a dot inside a face, nothing on a line.
const (
	EndArrow LeaderEnd = iota
	EndDot
	EndNone
)

// dotWidths is the diameter of a leader's dot in line widths.
const dotWidths = 3

// Leader points at a place and says something about it.
type Leader struct {
	Tip   vec.V2 // what is pointed at
	Elbow vec.V2 // where the landing begins; the text stands away from the tip
	End   LeaderEnd
	Text  string
}

// Marks returns the leader line with its end, and the text over a level landing.
func (l Leader) Marks(k drawing.Key, s DimStyle) []drawing.Mark {
	d := &dim{key: k, style: s}
	switch l.End {
	case EndArrow:
		if l.Tip != l.Elbow {
			d.arrow("arrow/1", l.Tip, l.Tip.Sub(l.Elbow))
		}
	case EndDot:
		d.marks = append(d.marks, drawing.DotMark(d.feature("dot"), l.Tip, dotWidths*s.Pen.Width))
	}
	d.landing(l.Tip, l.Elbow, l.Text)
	return d.marks
}

// Angle is the dimension of an angle.
type Angle struct {
	Vertex   vec.V2
	From, To float64    // directions of the legs, radians; measured anticlockwise
	Radius   float64    // of the dimension arc, mm
	Legs     [2]float64 // how far from the vertex the legs are drawn already, mm
	Text     string
}

// Marks returns the dimension: extension lines where the legs are shorter than the
// arc's radius, the arc with its arrows, and the text above its middle.
func (a Angle) Marks(k drawing.Key, s DimStyle) []drawing.Mark {
	d := &dim{key: k, style: s}
	from, to := a.From, a.To
	for to <= from {
		to += 2 * math.Pi
	}
	for i, t := range []float64{from, to} {
		u := drawing.Dir(t)
		if a.Legs[i] < a.Radius {
			d.line([]string{"extension/1", "extension/2"}[i], a.Vertex.Along(u, a.Legs[i]), a.Vertex.Along(u, a.Radius+overshoot*s.Pen.Width))
		}
	}
	a.arc(d, from, to)
	m := (from + to) / 2
	a.place(d, m, (to-from)*a.Radius)
	return d.marks
}

// arc draws the arc and its arrows, outside where there is no room. An arrow is
// turned by half the angle that its length takes, to lie along the arc.
func (a Angle) arc(d *dim, from, to float64) {
	h := d.style.Height
	turn := h / a.Radius
	lo, hi, way := from, to, 1.0
	if (to-from)*a.Radius < leastSpace*h {
		lo, hi, way = from-2*turn, to+2*turn, -1
	}
	tip := func(t float64) vec.V2 { return a.Vertex.Along(drawing.Dir(t), a.Radius) }
	d.arrow("arrow/1", tip(from), drawing.Dir(from+way*turn/2).Left().Scale(-way))
	d.arrow("arrow/2", tip(to), drawing.Dir(to-way*turn/2).Left().Scale(way))
	d.shape("line", drawing.EllipseArc{C: a.Vertex, RX: a.Radius, RY: a.Radius, From: lo, To: hi})
}

// place sets the text outside the arc's middle along its tangent, or level beyond
// it where the arc is shorter than the text.
func (a Angle) place(d *dim, m, length float64) {
	out := drawing.Dir(m)
	r := reading(out.Left())
	w := d.width(a.Text)
	sag := a.Radius - math.Sqrt(max(0, a.Radius*a.Radius-w*w/4))
	lift := 0.0
	if r.Left().Dot(out) < 0 { // the text stands inside the arc: its corners must clear
		lift = sag
	}
	if w+sideClear <= length && w < a.Radius {
		d.text(a.Text, a.Vertex.Along(out, a.Radius).Along(r.Left(), lift), r, drawing.Middle)
		return
	}
	at := a.Vertex.Along(out, a.Radius+2*d.style.Height)
	anchor := drawing.Start
	if out.X < 0 {
		anchor = drawing.End
	}
	at.Y -= d.style.Height/2 + textClear
	d.text(a.Text, at, vec.V2{X: 1}, anchor)
}
