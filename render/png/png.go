// Package png writes a sheet as an image: shades of grey on white, with its
// resolution stated so that it prints at true size.
//
// Curves are lowered to the same cubics as in the PDF, dashed by the same arrays,
// and flattened to a twentieth of a pixel. A line is filled as one outline round
// it, not as a row of overlapping pieces, so that its edges are evenly soft.
package png

import (
	"bytes"
	"encoding/binary"
	"errors"
	"fmt"
	"hash/crc32"
	"image"
	"image/png"
	"math"

	"golang.org/x/image/vector"

	"epure/geom/vec"
	"epure/render/drawing"
	"epure/render/font"
)

// ErrTooLarge says that an image would have no or too many pixels.
var ErrTooLarge = errors.New("image is too large")

// mostPixels bounds an image: A0 at 400 dots an inch takes 248 million.
const mostPixels = 1 << 28

// Write returns the image at dpi dots an inch. The same sheet gives the same
// bytes. The errors are a mark with a coordinate that is not finite, and a size
// that is nothing or over 2^28 pixels.
func Write(s drawing.Sheet, dpi float64) ([]byte, error) {
	if err := drawing.Check(s); err != nil {
		return nil, fmt.Errorf("png: %w", err)
	}
	scale := dpi / 25.4
	w, h := math.Round(s.Width*scale), math.Round(s.Height*scale)
	if !(w >= 1 && h >= 1 && w*h <= mostPixels) {
		return nil, fmt.Errorf("png: %v by %v mm at %v dpi: %w", s.Width, s.Height, dpi, ErrTooLarge)
	}
	c := &canvas{img: image.NewGray(image.Rect(0, 0, int(w), int(h))), scale: scale, height: s.Height}
	for i := range c.img.Pix {
		c.img.Pix[i] = 255
	}
	for _, m := range s.Marks {
		c.mark(m)
	}
	var b bytes.Buffer
	if err := png.Encode(&b, c.img); err != nil {
		return nil, fmt.Errorf("png: %w", err)
	}
	return withResolution(b.Bytes(), dpi), nil
}

// withResolution puts the pHYs chunk (pixels a metre) behind the header, which
// takes 8 + 25 bytes in every PNG.
func withResolution(data []byte, dpi float64) []byte {
	const header = 33
	perMetre := uint32(math.Round(dpi / 0.0254))
	body := []byte("pHYs")
	body = binary.BigEndian.AppendUint32(body, perMetre)
	body = binary.BigEndian.AppendUint32(body, perMetre)
	body = append(body, 1) // the unit is the metre
	chunk := binary.BigEndian.AppendUint32(nil, uint32(len(body)-4))
	chunk = append(chunk, body...)
	chunk = binary.BigEndian.AppendUint32(chunk, crc32.ChecksumIEEE(body))
	return append(append(append([]byte{}, data[:header]...), chunk...), data[header:]...)
}

type canvas struct {
	img    *image.Gray
	scale  float64 // pixels a mm
	height float64 // of the sheet, mm
}

// pixel turns a paper point into pixels, y down.
func (c *canvas) pixel(p vec.V2) vec.V2 {
	return vec.V2{X: p.X * c.scale, Y: (c.height - p.Y) * c.scale}
}

func (c *canvas) mark(m drawing.Mark) {
	if t, ok := m.Shape.(drawing.Text); ok {
		c.text(t)
		return
	}
	line := c.flatten(drawing.Lowered(m.Shape))
	if m.Fill.On {
		c.fill([][]vec.V2{line}, m.Fill.Grey)
	}
	if m.Pen.Width > 0 {
		c.stroke(line, m)
	}
}

// stroke draws a line with its pen: round ends for continuous lines, butt ends
// for dashes, like every writer.
func (c *canvas) stroke(line []vec.V2, m drawing.Mark) {
	half := m.Pen.Width * c.scale / 2
	closed := drawing.Closed(m.Shape)
	dashes := drawing.DashesFor(m.Pen, m.Shape)
	if dashes == nil {
		c.fill(outline(line, half, closed, true), 0)
		return
	}
	if closed && len(line) > 0 {
		line = append(line, line[0])
	}
	for i := range dashes {
		dashes[i] *= c.scale
	}
	for _, d := range cut(line, dashes) {
		c.fill(outline(d, half, false, false), 0)
	}
}

// text fills the outlines of a line of lettering.
func (c *canvas) text(t drawing.Text) {
	f := font.Of(t.Bold)
	size := f.Size(t.Height)
	at, _ := font.Start(t)
	x := drawing.Dir(t.Angle)
	y := x.Left()
	for _, r := range font.Clean(t.String) {
		var loops [][]vec.V2
		for _, p := range f.Outline(r) {
			place := func(q vec.V2) vec.V2 { return at.Along(x, q.X*size).Along(y, q.Y*size) }
			strokes := drawing.Lowered(p)
			for i := range strokes {
				for j := range strokes[i].C {
					strokes[i].C[j] = place(strokes[i].C[j])
				}
			}
			loops = append(loops, c.flatten(strokes))
		}
		c.fill(loops, 0)
		at = at.Along(x, f.Advance(r)*size)
	}
}

// fill paints closed polygons in pixels with a grey. Loops inside one another
// must turn opposite ways to leave a hole.
func (c *canvas) fill(loops [][]vec.V2, grey float64) {
	b := drawing.EmptyBox()
	for _, l := range loops {
		for _, p := range l {
			b = b.With(p)
		}
	}
	page := c.img.Bounds()
	area := image.Rect(clamp(b.Min.X-1, page.Max.X), clamp(b.Min.Y-1, page.Max.Y), clamp(b.Max.X+2, page.Max.X), clamp(b.Max.Y+2, page.Max.Y))
	if b.Empty() || area.Empty() {
		return
	}
	r := vector.NewRasterizer(area.Dx(), area.Dy())
	at := func(p vec.V2) (x, y float32) {
		return float32(p.X - float64(area.Min.X)), float32(p.Y - float64(area.Min.Y))
	}
	for _, l := range loops {
		for i, p := range l {
			if i == 0 {
				r.MoveTo(at(p))
			} else {
				r.LineTo(at(p))
			}
		}
		r.ClosePath()
	}
	mask := image.NewAlpha(image.Rect(0, 0, area.Dx(), area.Dy()))
	r.Draw(mask, mask.Bounds(), image.Opaque, image.Point{})
	c.ink(mask, area.Min, grey)
}

func clamp(x float64, most int) int { return int(math.Max(0, math.Min(float64(most), math.Floor(x)))) }

// ink lays a grey over the image through a mask.
func (c *canvas) ink(mask *image.Alpha, at image.Point, grey float64) {
	ink := int(math.Round(255 * math.Max(0, math.Min(1, grey))))
	for y := range mask.Rect.Dy() {
		row := c.img.Pix[c.img.PixOffset(at.X, at.Y+y):]
		for x, a := range mask.Pix[y*mask.Stride : y*mask.Stride+mask.Rect.Dx()] {
			if a != 0 {
				row[x] = uint8((int(row[x])*(255-int(a)) + ink*int(a) + 127) / 255)
			}
		}
	}
}
