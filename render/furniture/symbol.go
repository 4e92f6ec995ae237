package furniture

import (
	"math"

	"epure/geom/vec"
	"epure/render/drawing"
)

// Projection is the method that arranges the views.
type Projection uint8

// The methods of ISO 5456-2. NoProjection draws no symbol.
const (
	NoProjection Projection = iota
	FirstAngle
	ThirdAngle
)

// Symbol returns the symbol of a projection method about its centre: two views
// of a frustum with ends h and 2h and length 2h (proportions from memory). Its
// small end points left. The view from the left stands at the right in first
// angle and at the left in third angle. The box is 5h + 2o wide and 2h + 2o high
// with the overhang o of the centre lines; its stroke is h/10.
func Symbol(p Projection, centre vec.V2, h float64, g drawing.Group) []drawing.Mark {
	frustum, circles := centre.X-1.5*h, centre.X+1.5*h
	switch p {
	case NoProjection:
		return nil
	case ThirdAngle:
		frustum, circles = circles, frustum
	}
	at := func(x, dx, dy float64) vec.V2 { return vec.V2{X: x + dx*h, Y: centre.Y + dy*h} }
	k := func(f string) drawing.Key { return named("projection symbol", f) }
	c := [4]vec.V2{at(frustum, -1, -0.5), at(frustum, 1, -1), at(frustum, 1, 1), at(frustum, -1, 0.5)}
	outline := drawing.Path{Closed: true}
	for i := range c {
		outline.Pieces = append(outline.Pieces, drawing.Line{A: c[i], B: c[(i+1)%4]})
	}
	ring := func(r float64) drawing.Shape {
		return drawing.EllipseArc{C: at(circles, 0, 0), RX: r, RY: r, To: 2 * math.Pi}
	}
	o := 1 + SymbolOverhang
	pen := drawing.Pen{Width: h / 10, Type: drawing.Continuous}
	return []drawing.Mark{
		{Key: k("frustum"), Role: drawing.Furniture, Pen: pen, Shape: outline},
		{Key: k("circle/large"), Role: drawing.Furniture, Pen: pen, Shape: ring(h)},
		{Key: k("circle/small"), Role: drawing.Furniture, Pen: pen, Shape: ring(h / 2)},
		line(k("axis"), g.Centre(), at(frustum, -o, 0), at(frustum, o, 0)),
		line(k("centre/level"), g.Centre(), at(circles, -o, 0), at(circles, o, 0)),
		line(k("centre/upright"), g.Centre(), at(circles, 0, -o), at(circles, 0, o)),
	}
}

// SymbolOverhang is how far the symbol's centre lines reach past it, over h.
const SymbolOverhang = 0.35
