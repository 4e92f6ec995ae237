// Package png writes a sheet as an image: shades of grey on white, with its
// resolution stated so that it prints at true size.
//
// Curves are lowered to the same cubics as in the PDF and dashed by the same
// arrays; a general drawing library outlines and paints them, within a tenth of a
// pixel. What it gets wrong is kept from it: see path.go and paint.go.
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

	"epure/render/drawing"
)

// ErrTooLarge says that an image would have no or too many pixels, or a mark
// reaches too many pixels off it.
var ErrTooLarge = errors.New("image is too large")

// mostPixels bounds an image: A0 at 400 dots an inch takes 248 million.
const mostPixels = 1 << 28

// mostSide bounds its sides: at 400 dots an inch, eight metres.
const mostSide = 1 << 17

// Write returns the image at dpi dots an inch. The same sheet gives the same
// bytes. The errors are a mark with a coordinate that is not finite, and with
// ErrTooLarge a size that is nothing, over 2^28 pixels or over 2^17 a side, or a
// mark that reaches over 1e8 pixels off.
func Write(s drawing.Sheet, dpi float64) ([]byte, error) {
	if err := drawing.Check(s); err != nil {
		return nil, fmt.Errorf("png: %w", err)
	}
	scale := dpi / 25.4
	w, h := math.Round(s.Width*scale), math.Round(s.Height*scale)
	if !(w >= 1 && h >= 1 && w <= mostSide && h <= mostSide && w*h <= mostPixels) {
		return nil, fmt.Errorf("png: %v by %v mm at %v dpi: %w", s.Width, s.Height, dpi, ErrTooLarge)
	}
	coats, err := page{scale: scale, w: w, h: h, height: s.Height}.coats(s.Marks)
	if err != nil {
		return nil, fmt.Errorf("png: %w", err)
	}
	img := image.NewGray(image.Rect(0, 0, int(w), int(h)))
	paint(img, coats)
	var b bytes.Buffer
	if err := png.Encode(&b, img); err != nil {
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
