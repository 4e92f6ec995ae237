package png

import (
	"fmt"
	"image"
	"image/color"
	"math"

	"github.com/tdewolff/canvas"
	"github.com/tdewolff/canvas/renderers/rasterizer"

	"epure/render/drawing"
	"epure/render/font"
)

// Paths on the image, in drawing order.

// coat is a path whose inside is painted with a grey, 0 black to 255 white.
type coat struct {
	path   *canvas.Path
	bounds canvas.Rect
	grey   uint8
}

// coats returns what the marks paint, in order. The error is a mark that reaches
// further than mostReach.
func (g page) coats(marks []drawing.Mark) ([]coat, error) {
	var out []coat
	add := func(p *canvas.Path, grey float64) {
		if !g.paintable(p) {
			p = p.And(g.around(1).ToPath())
		}
		if !p.Empty() {
			out = append(out, coat{p, p.FastBounds(), uint8(math.Round(255 * max(0, min(1, grey))))})
		}
	}
	for _, m := range marks {
		if b := font.Bounds(m.Shape).Grow(max(0, m.Pen.Width)); !b.Empty() && max(-b.Min.X, -b.Min.Y, b.Max.X, b.Max.Y)*g.scale > mostReach {
			return nil, fmt.Errorf("mark %q %q %q: %w", m.Key.View, m.Key.Thing, m.Key.Feature, ErrTooLarge)
		}
		if t, ok := m.Shape.(drawing.Text); ok {
			add(g.letters(t), 0)
			continue
		}
		if m.Fill.On {
			add(g.inside(m.Shape), m.Fill.Grey)
		}
		if m.Pen.Width > 0 {
			add(g.line(m.Shape, m.Pen), 0)
		}
	}
	return out, nil
}

// mostReach is how far off, in pixels, a mark may reach. Further out the library,
// which works to 1e-8 pixel, has no digits left to cut with.
const mostReach = 1e8

// paintable reports whether the library's painter takes the path: its coordinates,
// 26 bits with 6 for the fraction, are multiplied by 64, which leaves 2^19 pixels
// from one point to another.
func (g page) paintable(p *canvas.Path) bool { return g.around(mostSide).Contains(p.FastBounds()) }

// around is the page and a border of so many pixels.
func (g page) around(border float64) canvas.Rect {
	return canvas.Rect{X0: -border, Y0: -border, X1: g.w + border, Y1: g.h + border}
}

// bandPixels bounds what is painted at once: the library paints in colour, four
// bytes a pixel, of which one is kept.
const bandPixels = 1 << 24

// margin is what the library paints wrongly along the upper and the left edge,
// pixels: it takes what lies up to a pixel outside them as lying inside.
const margin = 1

// paint paints the image white and the coats onto it, band by band.
func paint(img *image.Gray, coats []coat) {
	w, h := img.Rect.Dx(), img.Rect.Dy()
	rows := max(1, min(h, bandPixels/w))
	band := image.NewRGBA(image.Rect(0, 0, margin+w, margin+rows))
	for top := 0; top < h; top += rows {
		for i := range band.Pix {
			band.Pix[i] = 255
		}
		paintBand(band, float64(h-top-rows), coats)
		for y := range min(rows, h-top) {
			row := band.Pix[band.PixOffset(margin, margin+y):]
			for x := range w {
				img.Pix[img.PixOffset(x, top+y)] = row[4*x]
			}
		}
	}
}

// paintBand paints the part of the coats in the band whose lower edge is at foot.
func paintBand(band *image.RGBA, foot float64, coats []coat) {
	r := rasterizer.FromImage(band, canvas.DPMM(1), canvas.LinearColorSpace{})
	w, h := r.Size()
	seen := canvas.Rect{X0: -margin, Y0: foot, X1: w - margin, Y1: foot + h}
	for _, k := range coats {
		if k.bounds.Touches(seen) {
			style := canvas.Style{Fill: canvas.Paint{Color: color.RGBA{k.grey, k.grey, k.grey, 255}}}
			r.RenderPath(k.path, style, canvas.Identity.Translate(margin, -foot))
		}
	}
}
