package compose

import (
	"math"
	"strings"
	"unicode"

	"epure/geom/vec"
	"epure/render/drawing"
	"epure/render/font"
)

// The field of a view is what lettering must keep clear of: the lines drawn, as
// short chords, and the room of lettering already placed.

// line is a straight piece of something drawn, on paper.
type line struct{ a, b vec.V2 }

// field gathers lines and lettering in the order in which they are placed.
type field struct {
	lines []line
	words []quadrangle
}

// chordsPerTurn is the number of chords that stand for a full turn of an arc: at
// a radius of 100 mm they lie 0.12 mm off it, less than the clearance of lettering.
const chordsPerTurn = 64

// add puts a shape into the field.
func (f *field) add(s drawing.Shape) {
	switch s := s.(type) {
	case drawing.Line:
		f.lines = append(f.lines, line{s.A, s.B})
	case drawing.EllipseArc:
		n := max(1, int(math.Ceil(math.Abs(s.To-s.From)/(2*math.Pi)*chordsPerTurn)))
		f.chords(s.From, s.To, n, s.At)
	case drawing.Quad:
		f.chords(0, 1, chordsPerTurn/4, s.At)
	case drawing.Spline:
		for _, c := range s.Cubics() {
			f.chords(0, 1, chordsPerTurn/16, c.At)
		}
	case drawing.Path:
		for _, p := range s.Pieces {
			f.add(p)
		}
	case drawing.Text:
		f.words = append(f.words, textRoom(s))
	}
}

func (f *field) chords(t0, t1 float64, n int, at func(float64) vec.V2) {
	a := at(t0)
	for i := 1; i <= n; i++ {
		b := at(t0 + (t1-t0)*float64(i)/float64(n))
		f.lines = append(f.lines, line{a, b})
		a = b
	}
}

// addMarks puts marks into the field.
func (f *field) addMarks(marks []drawing.Mark) {
	for _, m := range marks {
		f.add(m.Shape)
	}
}

// Room of lettering below the baseline and above the height of capitals, over
// that height: tails, and marks over capitals (c3 and f of ISO 3098, type B).
const (
	tailRoom   = 0.3
	accentRoom = 0.35
)

// textRoom is the rectangle that a line of lettering covers: from the baseline
// to the height of capitals, with tails and accents where the text has any.
func textRoom(t drawing.Text) quadrangle {
	at, width := font.Start(t)
	low, high := 0.0, t.Height
	if strings.ContainsAny(t.String, "gjpqyQ,;()[]{}|/@$_") {
		low = -tailRoom * t.Height
	}
	for _, r := range t.String {
		if r > unicode.MaxLatin1 && unicode.IsLetter(r) || unicode.IsUpper(r) && r > unicode.MaxASCII {
			low, high = -tailRoom*t.Height, t.Height*(1+accentRoom)
		}
	}
	u := drawing.Dir(t.Angle)
	return quadrangle{at.Along(u.Left(), low), u.Scale(width), u.Left().Scale(high - low)}
}

// wordsClear is the least distance of two words more than that of a word and a
// line, paper mm: without it two numbers in a row read as one.
const wordsClear = 0.8

// count tells what a rectangle would lie on: the number of lines and of words.
func (f *field) count(q quadrangle) (lines, words int) {
	e := nothing()
	for _, c := range q.corners() {
		e = e.with(c)
	}
	box := e.box()
	for _, l := range f.lines {
		if max(l.a.X, l.b.X) < box.Min.X || min(l.a.X, l.b.X) > box.Max.X || max(l.a.Y, l.b.Y) < box.Min.Y || min(l.a.Y, l.b.Y) > box.Max.Y {
			continue
		}
		if q.meets(l) {
			lines++
		}
	}
	wide := q.grown(wordsClear)
	for _, w := range f.words {
		if wide.overlaps(w) {
			words++
		}
	}
	return lines, words
}

// meets reports whether a line has a point in the rectangle.
func (q quadrangle) meets(l line) bool {
	_, _, ok := q.inside(l)
	return ok
}

// inside is the part of a line within the rectangle, as shares of the line; false
// when there is none.
func (q quadrangle) inside(l line) (lo, hi float64, ok bool) {
	lo, hi = 0, 1
	d := l.b.Sub(l.a)
	for _, side := range [2]vec.V2{q.u, q.v} {
		n := side.Unit()
		o, r, w := l.a.Sub(q.at).Dot(n), d.Dot(n), side.Len()
		if r == 0 {
			if o < 0 || o > w {
				return 0, 0, false
			}
			continue
		}
		a, b := (0-o)/r, (w-o)/r
		lo, hi = max(lo, min(a, b)), min(hi, max(a, b))
	}
	return lo, hi, lo <= hi
}

// overlaps reports whether two rectangles share a point, by the four directions
// of their sides.
func (q quadrangle) overlaps(o quadrangle) bool {
	for _, n := range [4]vec.V2{q.u, q.v, o.u, o.v} {
		a, b := q.span(n)
		c, d := o.span(n)
		if b < c || d < a {
			return false
		}
	}
	return true
}

func (q quadrangle) span(n vec.V2) (lo, hi float64) {
	lo, hi = math.Inf(1), math.Inf(-1)
	for _, c := range q.corners() {
		t := c.Dot(n)
		lo, hi = min(lo, t), max(hi, t)
	}
	return lo, hi
}
