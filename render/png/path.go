package png

import (
	"math"
	"sync"

	"github.com/tdewolff/canvas"

	"epure/geom/vec"
	"epure/render/drawing"
	"epure/render/font"
)

// Shapes as the drawing library's paths, in pixels, y up, made of the cubics that
// every writer without arcs draws. The library is given polygons only: its own
// length of a curve is off by up to a hundredth, and its polygon and its outline
// of one cut off sharp turns, such as the tips of narrow ellipses.

// flatness is the largest distance in pixels of a polygon from its curve: too
// little to change a grey by more than a twentieth.
const flatness = 0.05

// mostSteps bounds the sides of one cubic; a million pixels across need fewer.
const mostSteps = 4096

// page maps paper to pixels: a box of w by h pixels with its origin at the lower
// left, the sheet's upper left corner in its own.
type page struct {
	scale  float64 // pixels a mm
	w, h   float64 // pixels
	height float64 // of the sheet, mm
}

func (g page) pixel(p vec.V2) vec.V2 {
	return vec.V2{X: p.X * g.scale, Y: g.h - (g.height-p.Y)*g.scale}
}

// polygon returns the shape's line. An ellipse seen on edge is opened by what
// nobody sees: the library loses a line that runs back upon itself.
func (g page) polygon(s drawing.Shape) *canvas.Path {
	if e, ok := s.(drawing.EllipseArc); ok {
		e.RX, e.RY = max(e.RX, 2*drawing.FlatAxis), max(e.RY, 2*drawing.FlatAxis)
		s = e
	}
	p := &canvas.Path{}
	add(p, drawing.Lowered(s), g.pixel)
	if drawing.Closed(s) {
		p.Close()
	}
	return p
}

// add adds a chain of strokes to a path, as a part of its own. A cubic in n even
// steps is off by at most 3/4·d/n², d being the larger second difference of its
// points.
func add(p *canvas.Path, chain []drawing.Stroke, place func(vec.V2) vec.V2) {
	for i, s := range chain {
		for j := range s.C {
			s.C[j] = place(s.C[j])
		}
		if i == 0 {
			p.MoveTo(s.C[0].X, s.C[0].Y)
		}
		n := 1.0
		if !s.Straight {
			d := max(bend(s.C[0], s.C[1], s.C[2]), bend(s.C[1], s.C[2], s.C[3]))
			n = max(1, min(mostSteps, math.Ceil(math.Sqrt(0.75*d/flatness))))
		}
		for j := 1.0; j < n; j++ {
			q := s.C.At(j / n)
			p.LineTo(q.X, q.Y)
		}
		p.LineTo(s.C[3].X, s.C[3].Y)
	}
}

func bend(a, b, c vec.V2) float64 { return a.Add(c).Along(b, -2).Len() }

// inside returns the path whose inside the shape's fill paints, even-odd, as one
// that covers the same when all that it winds round is painted.
func (g page) inside(s drawing.Shape) *canvas.Path {
	p := g.polygon(s)
	p.Close()
	return p.Settle(canvas.EvenOdd)
}

// letters returns the outlines of a line of lettering; inner outlines turn the
// other way. Its glyphs stand where their advance widths put them, as in every
// writer.
func (g page) letters(t drawing.Text) *canvas.Path {
	f := font.Of(t.Bold)
	size := f.Size(t.Height)
	at, _ := font.Start(t)
	x := drawing.Dir(t.Angle)
	y := x.Left()
	place := func(q vec.V2) vec.V2 { return g.pixel(at.Along(x, q.X*size).Along(y, q.Y*size)) }
	p := &canvas.Path{}
	for _, r := range font.Clean(t.String) {
		for _, loop := range f.Outline(r) {
			add(p, drawing.Lowered(loop), place)
			p.Close()
		}
		at = at.Along(x, f.Advance(r)*size)
	}
	return p
}

// unsettled makes the library leave outlines as they come, to be painted wherever
// they wind. Its other way, uniting them first, loses ink where lines cross.
var unsettled = sync.OnceFunc(func() { canvas.FastStroke = true })

// longestDashed is the longest line, in pen widths, that is drawn with dashes, so
// that their number is bounded. A longer one runs far off any sheet.
const longestDashed = 1 << 20

// line returns the outline of the shape's line as the pen draws it: round ends
// for a continuous line, butt ends for dashes, like every writer.
func (g page) line(s drawing.Shape, pen drawing.Pen) *canvas.Path {
	unsettled()
	width := pen.Width * g.scale
	p := g.polygon(s)
	if from, _, ok := drawing.Ends(s); ok && p.Empty() {
		at := g.pixel(from)
		return canvas.Circle(width/2).Translate(at.X, at.Y)
	}
	dashes := drawing.DashesFor(pen, s)
	switch {
	case dashes != nil && drawing.Length(s) < longestDashed*pen.Width:
		for i := range dashes {
			dashes[i] *= g.scale
		}
		return g.near(p.Dash(0, dashes...), width).Stroke(width, canvas.ButtCap, canvas.RoundJoin, flatness)
	case p.Closed() && narrow(p, width):
		return outer(p, width)
	}
	return g.near(p, width).Stroke(width, canvas.RoundCap, canvas.RoundJoin, flatness)
}

// near leaves out the sides of a line that runs far off, where the pen does not
// reach onto the page. (The library's own cutting joins what it should part.)
func (g page) near(p *canvas.Path, width float64) *canvas.Path {
	if g.paintable(p) {
		return p
	}
	reach := g.around(math.Ceil(width) + 1)
	out := &canvas.Path{}
	for _, part := range p.Split() {
		corners := part.Coords()
		joined := false
		for i, b := range corners[1:] {
			a := corners[i]
			side := canvas.Rect{X0: min(a.X, b.X), Y0: min(a.Y, b.Y), X1: max(a.X, b.X), Y1: max(a.Y, b.Y)}
			if !side.Touches(reach) {
				joined = false
				continue
			}
			if !joined {
				out.MoveTo(a.X, a.Y)
				joined = true
			}
			out.LineTo(b.X, b.Y)
		}
	}
	return out
}

// narrow reports whether a closed line leaves no paper inside: no point of a strip
// as wide as the pen is further than half the pen from both its edges. The strip
// tried is the one along the line's longest chord from its start.
func narrow(closed *canvas.Path, width float64) bool {
	corners := closed.Coords()
	var chord canvas.Point
	for _, c := range corners {
		if d := c.Sub(corners[0]); d.Length() > chord.Length() {
			chord = d
		}
	}
	across, least, most := chord.Norm(1), 0.0, 0.0
	for _, c := range corners {
		d := across.PerpDot(c.Sub(corners[0]))
		least, most = min(least, d), max(most, d)
	}
	return most-least <= width
}

// outer returns the outer edge alone of a closed line that leaves no paper
// inside: its inner edge, turned inside out, would be a hole.
func outer(p *canvas.Path, width float64) *canvas.Path {
	if !p.CCW() {
		width = -width
	}
	return p.Offset(width/2, flatness)
}
