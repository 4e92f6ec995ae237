package furniture

import (
	"fmt"
	"math"

	"epure/geom/vec"
	"epure/render/drawing"
)

// Widths of the frame and of the grid, and the size of its letters, whatever the
// sheet (frame and letters from memory of ISO 5457).
const (
	frameWidth = 0.7
	gridWidth  = 0.35
	gridLetter = 3.5
	fieldSide  = 50.0 // of a grid field
	markInside = 10.0 // how far a centring mark enters the drawing space
)

// Frame returns the frame, the centring marks and the grid of a sheet, in the
// coordinates of the trimmed sheet.
func Frame(p Paper) []drawing.Mark {
	pen := drawing.Pen{Width: frameWidth, Type: drawing.Continuous}
	out := []drawing.Mark{{Key: named("frame", "border"), Role: drawing.Furniture, Pen: pen, Shape: p.Space().Outline()}}
	return append(append(out, p.grid()...), p.centring(pen)...)
}

// centring returns the four marks on the sheet's axes, from the outside of the
// grid to 10 mm inside the frame; where the title block lies, only to the frame.
func (p Paper) centring(pen drawing.Pen) []drawing.Mark {
	s, o := p.Space(), p.Space().Grow(gridStrip)
	x, y := p.Width/2, p.Height/2
	bottom := markInside
	if x > s.Max.X-BlockWidth-markInside {
		bottom = 0
	}
	at := func(x, y float64) vec.V2 { return vec.V2{X: x, Y: y} }
	k := func(side string) drawing.Key { return named("frame", "centring/"+side) }
	return []drawing.Mark{
		line(k("left"), pen, at(o.Min.X, y), at(s.Min.X+markInside, y)),
		line(k("right"), pen, at(o.Max.X, y), at(s.Max.X-markInside, y)),
		line(k("bottom"), pen, at(x, o.Min.Y), at(x, s.Min.Y+bottom)),
		line(k("top"), pen, at(x, o.Max.Y), at(x, s.Max.Y-markInside)),
	}
}

// fields returns the limits of the grid fields along one side: 50 mm each from
// the centring mark outward, what is left over to the corner fields.
func fields(side, lo, hi float64) []float64 {
	half := int(math.Round(side / 2 / fieldSide))
	out := []float64{lo}
	for i := 1 - half; i < half; i++ {
		out = append(out, side/2+fieldSide*float64(i))
	}
	return append(out, hi)
}

// gridLetters are the capitals in use: no I, no O. After Z they are doubled.
const gridLetters = "ABCDEFGHJKLMNPQRSTUVWXYZ"

func gridName(i int) string {
	name := ""
	for range i/len(gridLetters) + 1 {
		name += gridLetters[i%len(gridLetters) : i%len(gridLetters)+1]
	}
	return name
}

// grid returns the reference grid: numerals from left to right at top and bottom,
// letters from the top down at left and right. A4 has them at the top and the
// right only (from memory; a second-hand source says top and left).
func (p Paper) grid() []drawing.Mark {
	s, o := p.Space(), p.Space().Grow(gridStrip)
	pen := drawing.Pen{Width: gridWidth, Type: drawing.Continuous}
	out := []drawing.Mark{{Key: named("frame", "grid"), Role: drawing.Furniture, Pen: pen, Shape: o.Outline()}}
	xs := fields(p.Width, s.Min.X, s.Max.X)
	ys := fields(p.Height, s.Min.Y, s.Max.Y)
	rows := len(ys) - 1
	column := func(i int) string { return fmt.Sprint(i + 1) }
	row := func(i int) string { return gridName(rows - 1 - i) }
	out = append(out, strip("top", pen, xs, s.Max.Y, false, column)...)
	out = append(out, strip("right", pen, ys, s.Max.X, true, row)...)
	if p.Name != "A4" {
		out = append(out, strip("bottom", pen, xs, o.Min.Y, false, column)...)
		out = append(out, strip("left", pen, ys, o.Min.X, true, row)...)
	}
	return out
}

// strip returns the divisions and the letters of one side of the grid. The strip
// lies from at to at+gridStrip, along y when upright; the division at the
// centring mark is left to that.
func strip(side string, pen drawing.Pen, limits []float64, at float64, upright bool, name func(int) string) []drawing.Mark {
	var out []drawing.Mark
	place := func(along, across float64) vec.V2 {
		if upright {
			return vec.V2{X: across, Y: along}
		}
		return vec.V2{X: along, Y: across}
	}
	for i := range len(limits) - 1 {
		k := named("frame", fmt.Sprintf("grid/%s/%s", side, name(i)))
		if i > 0 && i != (len(limits)-1)/2 {
			out = append(out, line(k, pen, place(limits[i], at), place(limits[i], at+gridStrip)))
		}
		c := place((limits[i]+limits[i+1])/2, at+gridStrip/2)
		c.Y -= gridLetter / 2
		out = append(out, label(k, drawing.Text{At: c, Height: gridLetter, Anchor: drawing.Middle, String: name(i)}))
	}
	return out
}

// The two rectangles of a trimming mark: 10 by 5 (from memory of ISO 5457).
const (
	trimLong  = 10.0
	trimShort = 5.0
)

// TrimmingMarks returns the marks at the four corners for a sheet that is cut
// from the untrimmed size: two filled rectangles each that lie outside the
// corner, in the coordinates of the trimmed sheet (so partly negative).
func TrimmingMarks(p Paper) []drawing.Mark {
	var out []drawing.Mark
	for i, c := range []vec.V2{{}, {X: p.Width}, {X: p.Width, Y: p.Height}, {Y: p.Height}} {
		in := vec.V2{X: math.Copysign(1, p.Width/2-c.X), Y: math.Copysign(1, p.Height/2-c.Y)}
		for j, size := range []vec.V2{{X: trimLong, Y: trimShort}, {X: trimShort, Y: trimLong}} {
			a := vec.V2{X: c.X - in.X*trimShort, Y: c.Y - in.Y*trimShort}
			b := vec.V2{X: a.X + in.X*size.X, Y: a.Y + in.Y*size.Y}
			out = append(out, drawing.Mark{Key: named("frame", fmt.Sprintf("trim/%d/%d", i+1, j+1)), Role: drawing.Furniture,
				Fill: drawing.Fill{On: true}, Shape: drawing.EmptyBox().With(a).With(b).Outline()})
		}
	}
	return out
}
