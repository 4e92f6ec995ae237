// Package font knows the lettering: DejaVu Sans Condensed, regular and bold, the
// one openly licensed face at hand with every sign a drawing needs (⌀ ° ± × ′ ″
// ∠ ⊥ ∥ □, Greek, accented Latin).
//
// Sizes follow ISO 3098: the height of a text is the height h of its capitals in
// mm. Text is set plainly, one glyph a character by its advance width, with no
// kerning and no ligatures, so that every writer and every reader of a file
// keeps the same room and text can be searched.
//
// The file is read by a small reader of its own (truetype.go, subset.go): general
// font libraries parse shaping tables that are not used here, which costs ten
// times the start-up, and the one tried damages a face when it subsets it.
package font

import (
	"strings"
	"sync"
	"unicode"

	"codeberg.org/go-fonts/dejavu/dejavusanscondensed"
	"codeberg.org/go-fonts/dejavu/dejavusanscondensedbold"

	"epure/geom/vec"
	"epure/render/drawing"
)

// Face is one weight of the lettering.
type Face struct {
	*truetype
	Name string  // PostScript name
	em   float64 // font size over height of capitals
}

// Regular returns the face for all ordinary lettering. It is read once.
func Regular() *Face { return regular() }

// Bold returns the face for emphasis. It is read once.
func Bold() *Face { return bold() }

// Of returns Bold or Regular.
func Of(b bool) *Face {
	if b {
		return Bold()
	}
	return Regular()
}

var regular = sync.OnceValue(func() *Face { return load("DejaVuSansCondensed", dejavusanscondensed.TTF) })
var bold = sync.OnceValue(func() *Face { return load("DejaVuSansCondensed-Bold", dejavusanscondensedbold.TTF) })

// load measures the capitals by the letter H: the version of the font's OS/2
// table is too old to state their height.
func load(name string, data []byte) *Face {
	t := parse(data)
	_, _, _, top := t.box(t.glyph('H'))
	return &Face{t, name, t.unitsPerEm / float64(top)}
}

// Size returns the font size (the em, mm) at which capitals are height mm high.
func (f *Face) Size(height float64) float64 { return f.em * height }

// CapHeight returns the height of capitals over the font size.
func (f *Face) CapHeight() float64 { return 1 / f.em }

// Ascent returns the room above the baseline that any accented letter needs, over
// the font size.
func (f *Face) Ascent() float64 { return f.ascender / f.unitsPerEm }

// Descent returns the room below the baseline, positive, over the font size.
func (f *Face) Descent() float64 { return -f.descender / f.unitsPerEm }

// Box returns the box that holds every glyph of the face, over the font size.
func (f *Face) Box() drawing.Box {
	at := func(x, y float64) vec.V2 { return vec.V2{X: x / f.unitsPerEm, Y: y / f.unitsPerEm} }
	return drawing.Box{Min: at(f.xMin, f.yMin), Max: at(f.xMax, f.yMax)}
}

// Has reports whether the face has the character.
func (f *Face) Has(r rune) bool { return f.glyph(r) != 0 }

// Advance returns the advance width of a character over the font size.
func (f *Face) Advance(r rune) float64 { return f.advance(f.glyph(r)) / f.unitsPerEm }

// Width returns the width in mm of a line of text whose capitals are height mm
// high: the sum of its advance widths.
func Width(s string, height float64, bold bool) float64 {
	f := Of(bold)
	w := 0.0
	for _, r := range Clean(s) {
		w += f.advance(f.glyph(r))
	}
	return w / f.unitsPerEm * f.Size(height)
}

// Ascent returns the room in mm above the baseline of text of the given height.
func Ascent(height float64) float64 { return Regular().Ascent() * Regular().Size(height) }

// Descent returns the room in mm, positive, below the baseline.
func Descent(height float64) float64 { return Regular().Descent() * Regular().Size(height) }

// Clean returns the text as it is drawn: tabs and line ends become spaces; other
// control characters, marks of direction and broken bytes are dropped.
func Clean(s string) string {
	return strings.Map(func(r rune) rune {
		switch {
		case r == '\t' || r == '\n' || r == '\r':
			return ' '
		case unicode.IsControl(r) || unicode.Is(unicode.Cf, r) || r == unicode.ReplacementChar:
			return -1
		case r >= 0xFDD0 && r <= 0xFDEF || r&0xFFFE == 0xFFFE: // not characters; not allowed in XML
			return -1
		}
		return r
	}, s)
}

// Start returns the place of the left end of a text's baseline, and its width
// in mm.
func Start(t drawing.Text) (vec.V2, float64) {
	w := Width(t.String, t.Height, t.Bold)
	along := 0.0
	switch t.Anchor {
	case drawing.Middle:
		along = -w / 2
	case drawing.End:
		along = -w
	}
	return t.At.Along(drawing.Dir(t.Angle), along), w
}

// Corners returns the corners of the room of a text, anticlockwise from the
// start of its line, with room for accents above and tails below.
func Corners(t drawing.Text) [4]vec.V2 {
	p, w := Start(t)
	x := drawing.Dir(t.Angle)
	y := x.Left()
	lo, hi := p.Along(y, -Descent(t.Height)), p.Along(y, Ascent(t.Height))
	return [4]vec.V2{lo, lo.Along(x, w), hi.Along(x, w), hi}
}

// Bounds is drawing.Bounds for any shape, text included.
func Bounds(s drawing.Shape) drawing.Box {
	t, ok := s.(drawing.Text)
	if !ok {
		return drawing.Bounds(s)
	}
	b := drawing.EmptyBox()
	for _, c := range Corners(t) {
		b = b.With(c)
	}
	return b
}

// MarksBounds is the box of all the marks' shapes.
func MarksBounds(marks []drawing.Mark) drawing.Box {
	b := drawing.EmptyBox()
	for _, m := range marks {
		b = b.Union(Bounds(m.Shape))
	}
	return b
}
