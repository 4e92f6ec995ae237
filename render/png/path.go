package png

import (
	"math"
	"sync"

	"github.com/tdewolff/canvas"

	"epure/geom/vec"
	"epure/render/drawing"
	"epure/render/font"
)

// Shapes as the drawing library's paths, in pixels, y up. They are made of the
// cubics that every writer without arcs draws, never of the library's own arcs.

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

// cubics returns the shape's line in pixels.
func (g page) cubics(s drawing.Shape) []drawing.Cubic {
	var out []drawing.Cubic
	for _, s := range drawing.Lowered(s) {
		for i, p := range s.C {
			s.C[i] = g.pixel(p)
		}
		out = append(out, s.C)
	}
	return out
}

// inside returns the path whose inside the shape's fill paints, even-odd, as one
// that covers the same when all that it winds round is painted.
func (g page) inside(s drawing.Shape) *canvas.Path {
	p := add(&canvas.Path{}, g.cubics(s))
	p.Close()
	return p.Flatten(canvas.PixelTolerance).Settle(canvas.EvenOdd)
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
	p := &canvas.Path{}
	for _, r := range font.Clean(t.String) {
		for _, loop := range f.Outline(r) {
			var c []drawing.Cubic
			for _, s := range drawing.Lowered(loop) {
				for i, q := range s.C {
					s.C[i] = g.pixel(at.Along(x, q.X*size).Along(y, q.Y*size))
				}
				c = append(c, s.C)
			}
			p = add(p, c)
			p.Close()
		}
		at = at.Along(x, f.Advance(r)*size)
	}
	return p
}

// add adds a chain of cubics to a path as a part of its own. The library makes a
// line of a cubic that is straight.
func add(p *canvas.Path, chain []drawing.Cubic) *canvas.Path {
	for i, c := range chain {
		if i == 0 {
			p.MoveTo(c[0].X, c[0].Y)
		}
		p.CubeTo(c[1].X, c[1].Y, c[2].X, c[2].Y, c[3].X, c[3].Y)
	}
	return p
}

// unsettled makes the library leave outlines as they come, to be painted wherever
// they wind. Its other way, uniting them first, loses ink where lines cross.
var unsettled = sync.OnceFunc(func() { canvas.FastStroke = true })

// line returns the outline of the shape's line as the pen draws it: round ends
// for a continuous line, butt ends for dashes, like every writer.
func (g page) line(s drawing.Shape, pen drawing.Pen) *canvas.Path {
	unsettled()
	width := pen.Width * g.scale
	dashes := drawing.DashesFor(pen, s)
	for i := range dashes {
		dashes[i] *= g.scale * (1 + dashSlack)
	}
	var ends canvas.Capper = canvas.RoundCap
	if dashes != nil {
		ends = canvas.ButtCap
	}
	chain := g.cubics(s)
	closed := drawing.Closed(s)
	out := &canvas.Path{}
	if closed && dashes == nil && narrow(chain, width) {
		return around(chain, width)
	}
	near := g.near(chain, width)
	for _, n := range near {
		p := add(&canvas.Path{}, n.chain)
		switch {
		case p.Empty() && dashes == nil:
			out = out.Append(canvas.Circle(width/2).Translate(n.chain[0][0].X, n.chain[0][0].Y))
			continue
		case closed && len(near) == 1 && n.whole:
			p.Close()
		}
		if dashes != nil {
			p = p.Dash(math.Mod(n.before, period(dashes)), dashes...)
		}
		out = out.Append(p.Stroke(width, ends, canvas.RoundJoin, canvas.PixelTolerance))
	}
	return out
}

// around returns the outer edge alone of a closed line that leaves no paper
// inside: its inner edge, turned inside out, would be a hole.
func around(chain []drawing.Cubic, width float64) *canvas.Path {
	p := add(&canvas.Path{}, chain)
	p.Close()
	if !p.CCW() {
		width = -width
	}
	return p.Offset(width/2, canvas.PixelTolerance)
}

// dashSlack stretches a dash pattern so that the line surely ends within its last
// dash: the library drops a last dash that ends before the line does by its own
// count, whose error is smaller for curves cut by straightEnough.
const dashSlack = 1e-6

func period(dashes []float64) float64 {
	sum := 0.0
	for _, d := range dashes {
		sum += d
	}
	return sum
}
