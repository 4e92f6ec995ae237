package compose

import (
	"math"

	"epure/geom/vec"
	"epure/render/drawing"
)

// Room on paper. Views are placed by what they really cover, not by upright
// rectangles alone: a true shape laid off beside a sloping edge would need half
// a sheet if its upright rectangle had to stay clear. An extent is the tightest
// sixteen-sided figure with sides at every 22.5 degrees round a set of marks;
// two of them are clear of each other when one of the eight directions says so.

// compassSize is the number of directions of an extent.
const compassSize = 8

// compass returns the eight directions, 22.5 degrees apart, rightward first.
func compass() [compassSize]vec.V2 {
	const (
		r2   = math.Sqrt2 / 2
		c, s = 0.92387953251128675613, 0.38268343236508977173 // cos, sin 22.5°
	)
	return [compassSize]vec.V2{{X: 1}, {X: c, Y: s}, {X: r2, Y: r2}, {X: s, Y: c}, {Y: 1}, {X: -s, Y: c}, {X: -r2, Y: r2}, {X: -c, Y: s}}
}

// upright is the index of the upward direction of the compass.
const upright = compassSize / 2

// extent holds the least and the greatest distance along each direction of the
// compass, mm. The zero extent holds the point (0, 0); see nothing.
type extent struct{ lo, hi [compassSize]float64 }

// nothing returns the extent of no point.
func nothing() extent {
	var e extent
	for i := range e.lo {
		e.lo[i], e.hi[i] = math.Inf(1), math.Inf(-1)
	}
	return e
}

// with returns e grown to hold p.
func (e extent) with(p vec.V2) extent {
	for i, d := range compass() {
		t := d.Dot(p)
		e.lo[i], e.hi[i] = min(e.lo[i], t), max(e.hi[i], t)
	}
	return e
}

// union returns the extent that holds both.
func (e extent) union(o extent) extent {
	for i := range e.lo {
		e.lo[i], e.hi[i] = min(e.lo[i], o.lo[i]), max(e.hi[i], o.hi[i])
	}
	return e
}

// empty reports whether e holds no point.
func (e extent) empty() bool { return !(e.lo[0] <= e.hi[0]) }

// moved returns e moved by d.
func (e extent) moved(d vec.V2) extent {
	for i, u := range compass() {
		t := u.Dot(d)
		e.lo[i], e.hi[i] = e.lo[i]+t, e.hi[i]+t
	}
	return e
}

// grown returns e with every side moved out by m mm.
func (e extent) grown(m float64) extent {
	for i := range e.lo {
		e.lo[i], e.hi[i] = e.lo[i]-m, e.hi[i]+m
	}
	return e
}

// gap is the clear distance between two extents along the best of the eight
// directions: never more than the true one; negative when they overlap.
func (e extent) gap(o extent) float64 {
	g := math.Inf(-1)
	for i := range e.lo {
		g = max(g, e.lo[i]-o.hi[i], o.lo[i]-e.hi[i])
	}
	return g
}

// area is the area of the sixteen-sided figure, mm², from its support distances.
func (e extent) area() float64 {
	const n = 2 * compassSize
	h := func(i int) float64 {
		if i %= n; i < compassSize {
			return e.hi[i]
		}
		return -e.lo[i-compassSize]
	}
	s, c := math.Sincos(2 * math.Pi / n)
	sum := 0.0
	for i := range n {
		sum += h(i) * (h(i+n-1) + h(i+1) - 2*c*h(i)) / s
	}
	return max(0, sum/2)
}

// box is the upright rectangle round e.
func (e extent) box() drawing.Box {
	return drawing.Box{Min: vec.V2{X: e.lo[0], Y: e.lo[upright]}, Max: vec.V2{X: e.hi[0], Y: e.hi[upright]}}
}

// boxExtent is the extent of an upright rectangle.
func boxExtent(b drawing.Box) extent {
	return nothing().with(b.Min).with(b.Max).with(vec.V2{X: b.Min.X, Y: b.Max.Y}).with(vec.V2{X: b.Max.X, Y: b.Min.Y})
}

// shapeExtent is the extent of a shape without the width of its line, and the room
// of a text. It is exact: control points, which lie off their curve, do not count.
func shapeExtent(s drawing.Shape) extent {
	e := nothing()
	switch s := s.(type) {
	case drawing.Line:
		return e.with(s.A).with(s.B)
	case drawing.EllipseArc:
		return arcExtent(s)
	case drawing.Quad:
		return curveExtent(s.At, func(d vec.V2) []float64 { // Q' = 2(a + t(b - a))
			a, b := s.P1.Sub(s.P0).Dot(d), s.P2.Sub(s.P1).Dot(d)
			return []float64{a / (a - b)}
		})
	case drawing.Spline:
		for _, c := range s.Cubics() {
			e = e.union(curveExtent(c.At, func(d vec.V2) []float64 { // C' = 3(a(1-t)² + 2bt(1-t) + ct²)
				a, b, c := c[1].Sub(c[0]).Dot(d), c[2].Sub(c[1]).Dot(d), c[3].Sub(c[2]).Dot(d)
				return quadraticRoots(a-2*b+c, 2*(b-a), a)
			}))
		}
	case drawing.Path:
		for _, p := range s.Pieces {
			e = e.union(shapeExtent(p))
		}
	case drawing.Text:
		for _, p := range textRoom(s).corners() {
			e = e.with(p)
		}
	}
	return e
}

// curveExtent is the extent of a curve over 0 <= t <= 1; turns gives the
// parameters where it may run square to a direction.
func curveExtent(at func(float64) vec.V2, turns func(vec.V2) []float64) extent {
	e := nothing().with(at(0)).with(at(1))
	for _, d := range compass() {
		for _, t := range turns(d) {
			if t > 0 && t < 1 {
				e = e.with(at(t))
			}
		}
	}
	return e
}

// quadraticRoots are the real roots of a t² + b t + c, NaN or Inf among them when
// the equation is of lower degree.
func quadraticRoots(a, b, c float64) []float64 {
	disc := b*b - 4*a*c
	if disc < 0 {
		return nil
	}
	q := -(b + math.Copysign(math.Sqrt(disc), b)) / 2
	return []float64{q / a, c / q}
}

// arcExtent adds to the ends of an arc its farthest points in each direction.
func arcExtent(a drawing.EllipseArc) extent {
	e := nothing().with(a.At(a.From)).with(a.At(a.To))
	s, c := math.Sincos(a.Rot)
	lo, hi := min(a.From, a.To), max(a.From, a.To)
	for _, d := range compass() {
		x := a.RX * (float64(d.X*c) + float64(d.Y*s))
		y := a.RY * (float64(d.Y*c) - float64(d.X*s))
		t := math.Atan2(y, x)
		for t += math.Pi * math.Ceil((lo-t)/math.Pi); t <= hi; t += math.Pi {
			e = e.with(a.At(t))
		}
	}
	return e
}

// marksExtent is the extent of all marks.
func marksExtent(marks []drawing.Mark) extent {
	e := nothing()
	for _, m := range marks {
		e = e.union(shapeExtent(m.Shape))
	}
	return e
}

// quad is a rectangle in any position: the room of a line of lettering.
type quadrangle struct {
	at   vec.V2 // lower left as read
	u, v vec.V2 // the sides: along the text, and up
}

// corners are the four corners, anticlockwise.
func (q quadrangle) corners() [4]vec.V2 {
	return [4]vec.V2{q.at, q.at.Add(q.u), q.at.Add(q.u).Add(q.v), q.at.Add(q.v)}
}

// grown returns q with every side moved out by m mm.
func (q quadrangle) grown(m float64) quadrangle {
	u, v := q.u.Unit().Scale(m), q.v.Unit().Scale(m)
	return quadrangle{q.at.Sub(u).Sub(v), q.u.Along(u, 2), q.v.Along(v, 2)}
}
