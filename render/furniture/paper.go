// Package furniture draws what stands on a sheet besides its views: the frame
// and grid of ISO 5457, the title block of ISO 7200, the projection symbol,
// tables, and dimensions to ISO 129-1; and it knows the paper sizes and the
// scales of ISO 5455. Its functions return marks in paper millimetres; where
// they stand and what they say is the composer's business.
//
// Values come from the reference notes of the team (sections 1 to 6); where those
// mark a value as taken from memory, so does the comment here.
package furniture

import (
	"epure/geom/vec"
	"epure/render/drawing"
)

// Paper is a sheet size as it lies: the trimmed sheet, mm.
type Paper struct {
	Name          string // "A3"
	Width, Height float64
}

// Papers returns the sizes of ISO 5457 from the smallest up, the way they lie: A4
// upright, the others on their long side.
func Papers() []Paper {
	return []Paper{{"A4", 210, 297}, {"A3", 420, 297}, {"A2", 594, 420}, {"A1", 841, 594}, {"A0", 1189, 841}}
}

// PaperNamed returns the size of the given name.
func PaperNamed(name string) (Paper, bool) {
	for _, p := range Papers() {
		if p.Name == name {
			return p, true
		}
	}
	return Paper{}, false
}

// Turned returns the paper on its other side. ISO 5457 with its amendment of 2010
// has A4 either way.
func (p Paper) Turned() Paper { return Paper{p.Name, p.Height, p.Width} }

// Group returns the line group for the paper.
func (p Paper) Group() drawing.Group { return drawing.GroupFor(p.Width, p.Height) }

// The borders of ISO 5457: the filing edge at the left, the other three sides,
// and the strip of the grid outside the frame.
const (
	FilingEdge = 20.0
	Border     = 10.0
	gridStrip  = 5.0
)

// Space returns the drawing space: what the frame encloses.
func (p Paper) Space() drawing.Box {
	return drawing.Box{Min: vec.V2{X: FilingEdge, Y: Border}, Max: vec.V2{X: p.Width - Border, Y: p.Height - Border}}
}

// Untrimmed returns the size of the sheet before it is cut, by name and side.
func (p Paper) Untrimmed() (width, height float64) {
	long := map[string]float64{"A4": 330, "A3": 450, "A2": 625, "A1": 880, "A0": 1230}[p.Name]
	short := map[string]float64{"A4": 240, "A3": 330, "A2": 450, "A1": 625, "A0": 880}[p.Name]
	if p.Width > p.Height {
		return long, short
	}
	return short, long
}

// named is the key of a piece of furniture.
func named(thing, feature string) drawing.Key {
	return drawing.Key{View: "furniture", Thing: thing, Feature: feature}
}

func line(k drawing.Key, pen drawing.Pen, a, b vec.V2) drawing.Mark {
	return drawing.Mark{Key: k, Role: drawing.Furniture, Pen: pen, Shape: drawing.Line{A: a, B: b}}
}

func label(k drawing.Key, t drawing.Text) drawing.Mark {
	return drawing.Mark{Key: k, Role: drawing.Lettering, Shape: t}
}
