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
// every writer without arcs draws. Curves are made polygons before they are
// dashed or outlined: the library's length of a curve is off by up to a
// hundredth, and its outline of one cuts the tips of narrow ellipses.

// flatness is the largest distance in pixels of a polygon from its curve: too
// little to change a grey by more than a twentieth.
const flatness = 0.05

// coarse is flatness as a part of a path's own size where that is more, which
// bounds the number of its corners. It takes a path of fifty million pixels.
const coarse = 1e-9

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

// polygon returns the shape's line.
func (g page) polygon(s drawing.Shape) *canvas.Path {
	p := &canvas.Path{}
	add(p, drawing.Lowered(s), g.pixel)
	if drawing.Closed(s) {
		p.Close()
	}
	return flat(p)
}

// add adds a chain of strokes to a path, as a part of its own.
func add(p *canvas.Path, chain []drawing.Stroke, place func(vec.V2) vec.V2) {
	for i, s := range chain {
		a, b, c, d := place(s.C[0]), place(s.C[1]), place(s.C[2]), place(s.C[3])
		if i == 0 {
			p.MoveTo(a.X, a.Y)
		}
		if s.Straight {
			p.LineTo(d.X, d.Y)
		} else {
			p.CubeTo(b.X, b.Y, c.X, c.Y, d.X, d.Y)
		}
	}
}

func flat(p *canvas.Path) *canvas.Path {
	b := p.FastBounds()
	return p.Flatten(max(flatness, coarse*max(b.W(), b.H())))
}

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
	return flat(p)
}

// unsettled makes the library leave outlines as they come, to be painted wherever
// they wind. Its other way, uniting them first, loses ink where lines cross.
var unsettled = sync.OnceFunc(func() { canvas.FastStroke = true })

// mostDashes bounds the dashes of one line. One with more runs far off any
// sheet, and is drawn continuous.
const mostDashes = 1 << 16

// line returns the outline of the shape's line as the pen draws it: round ends
// for a continuous line, butt ends for dashes, like every writer.
func (g page) line(s drawing.Shape, pen drawing.Pen) *canvas.Path {
	unsettled()
	width := pen.Width * g.scale
	p := g.polygon(s)
	dashes := drawing.DashesFor(pen, s)
	if dashes != nil && drawing.Length(s) < mostDashes*pen.Width {
		for i := range dashes {
			dashes[i] *= g.scale
		}
		return g.seen(p.Dash(0, dashes...), width).Stroke(width, canvas.ButtCap, canvas.RoundJoin, flatness)
	}
	if from, _, ok := drawing.Ends(s); ok && p.Empty() {
		at := g.pixel(from)
		return canvas.Circle(width/2).Translate(at.X, at.Y)
	}
	return g.seen(p, width).Stroke(width, canvas.RoundCap, canvas.RoundJoin, flatness)
}

// farthest is the largest coordinate in pixels that is left to the library's painter, which takes 2^25 at most.
const farthest = 1 << 24

// seen cuts off what is outside the page where a path runs so far off it that the painter
// could not take it. Cutting joins dashes that lie on one line, so it is not done for nothing.
func (g page) seen(p *canvas.Path, width float64) *canvas.Path {
	if b := p.FastBounds(); min(b.X0, b.Y0) > -farthest && max(b.X1, b.Y1) < farthest {
		return p
	}
	far := math.Ceil(width) + 1
	return p.Clip(-far, -far, g.w+far, g.h+far)
}
