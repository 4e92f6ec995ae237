package drawing

import (
	"math"

	"epure/geom/vec"
)

// Box is an upright rectangle on paper, mm. An empty box has Min over Max.
type Box struct{ Min, Max vec.V2 }

// EmptyBox returns the box of nothing, to which points can be added.
func EmptyBox() Box {
	inf := math.Inf(1)
	return Box{vec.V2{X: inf, Y: inf}, vec.V2{X: -inf, Y: -inf}}
}

// BoxAt returns the box of the given width and height with its lower left at p.
func BoxAt(p vec.V2, width, height float64) Box {
	return Box{p, vec.V2{X: p.X + width, Y: p.Y + height}}
}

// Empty reports whether the box holds no point.
func (b Box) Empty() bool { return !(b.Min.X <= b.Max.X && b.Min.Y <= b.Max.Y) }

// Width is the extent rightward, mm.
func (b Box) Width() float64 { return b.Max.X - b.Min.X }

// Height is the extent upward, mm.
func (b Box) Height() float64 { return b.Max.Y - b.Min.Y }

// Centre is the middle of the box.
func (b Box) Centre() vec.V2 {
	return vec.V2{X: (b.Min.X + b.Max.X) / 2, Y: (b.Min.Y + b.Max.Y) / 2}
}

// With returns the box grown to hold p.
func (b Box) With(p vec.V2) Box {
	return Box{
		vec.V2{X: min(b.Min.X, p.X), Y: min(b.Min.Y, p.Y)},
		vec.V2{X: max(b.Max.X, p.X), Y: max(b.Max.Y, p.Y)},
	}
}

// Union returns the box that holds both.
func (b Box) Union(o Box) Box {
	if o.Empty() {
		return b
	}
	return b.With(o.Min).With(o.Max)
}

// Grow returns the box with every side moved out by m mm.
func (b Box) Grow(m float64) Box {
	return Box{vec.V2{X: b.Min.X - m, Y: b.Min.Y - m}, vec.V2{X: b.Max.X + m, Y: b.Max.Y + m}}
}

// Overlaps reports whether the two boxes share more than an edge.
func (b Box) Overlaps(o Box) bool {
	return b.Min.X < o.Max.X && o.Min.X < b.Max.X && b.Min.Y < o.Max.Y && o.Min.Y < b.Max.Y
}

// Holds reports whether the whole of o lies in b.
func (b Box) Holds(o Box) bool {
	return b.Min.X <= o.Min.X && o.Max.X <= b.Max.X && b.Min.Y <= o.Min.Y && o.Max.Y <= b.Max.Y
}

// Outline is the border of the box, closed, from the lower left anticlockwise.
func (b Box) Outline() Path {
	c := [4]vec.V2{b.Min, {X: b.Max.X, Y: b.Min.Y}, b.Max, {X: b.Min.X, Y: b.Max.Y}}
	p := Path{Closed: true}
	for i := range c {
		p.Pieces = append(p.Pieces, Line{c[i], c[(i+1)%4]})
	}
	return p
}

// Bounds returns the box of a shape's line, without its width: exact for lines
// and arcs, the box of the control points (never too small) for Quad and
// Spline. The box of a Text is only its place; font.Bounds knows its size.
func Bounds(s Shape) Box {
	b := EmptyBox()
	switch s := s.(type) {
	case Line:
		b = b.With(s.A).With(s.B)
	case EllipseArc:
		return s.bounds()
	case Quad:
		b = b.With(s.P0).With(s.P1).With(s.P2)
	case Spline:
		for _, p := range s.Points {
			b = b.With(p)
		}
	case Path:
		for _, p := range s.Pieces {
			b = b.Union(Bounds(p))
		}
	case Text:
		b = b.With(s.At)
	}
	return b
}

// bounds adds to the ends the points where the arc runs level or upright.
func (e EllipseArc) bounds() Box {
	b := EmptyBox().With(e.At(e.From)).With(e.At(e.To))
	for _, t := range e.across(vec.V2{X: 1}) {
		b = b.With(e.At(t))
	}
	for _, t := range e.across(vec.V2{Y: 1}) {
		b = b.With(e.At(t))
	}
	return b
}

// across returns the parameters inside the arc where its tangent is square to n,
// in the order of the arc.
func (e EllipseArc) across(n vec.V2) []float64 {
	s, c := math.Sincos(e.Rot)
	x := e.RX * (float64(n.X*c) + float64(n.Y*s)) // n·P(t) = x cos t + y sin t
	y := e.RY * (float64(n.Y*c) - float64(n.X*s))
	return e.inside(math.Atan2(y, x), math.Pi)
}

// inside returns the values t0 + k·step strictly inside the arc, in its order.
func (e EllipseArc) inside(t0, step float64) []float64 {
	lo, hi := min(e.From, e.To), max(e.From, e.To)
	var ts []float64
	for t := t0 + step*math.Ceil((lo-t0)/step); t < hi; t += step {
		if t > lo {
			ts = append(ts, t)
		}
	}
	if e.To < e.From {
		for i, j := 0, len(ts)-1; i < j; i, j = i+1, j-1 {
			ts[i], ts[j] = ts[j], ts[i]
		}
	}
	return ts
}

// Moved returns the shape moved by d mm.
func Moved(s Shape, d vec.V2) Shape {
	switch s := s.(type) {
	case Line:
		return Line{s.A.Add(d), s.B.Add(d)}
	case EllipseArc:
		s.C = s.C.Add(d)
		return s
	case Quad:
		return Quad{s.P0.Add(d), s.P1.Add(d), s.P2.Add(d)}
	case Spline:
		q := Spline{Err: s.Err}
		for _, p := range s.Points {
			q.Points = append(q.Points, p.Add(d))
		}
		return q
	case Path:
		q := Path{Closed: s.Closed}
		for _, p := range s.Pieces {
			q.Pieces = append(q.Pieces, Moved(p, d))
		}
		return q
	case Text:
		s.At = s.At.Add(d)
		return s
	}
	return s
}

// Texts returns the strings of the texts among the marks that are, or are not,
// bold.
func Texts(marks []Mark, bold bool) []string {
	var out []string
	for _, m := range marks {
		if t, ok := m.Shape.(Text); ok && t.Bold == bold {
			out = append(out, t.String)
		}
	}
	return out
}

// Turns returns the parameters inside the arc where it turns back along its
// longer axis, in its order: the ends of that axis.
func (e EllipseArc) Turns() []float64 {
	if e.RX >= e.RY {
		return e.inside(0, math.Pi)
	}
	return e.inside(math.Pi/2, math.Pi)
}
