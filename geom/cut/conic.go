package cut

import (
	"math"

	"epure/geom/curve"
	"epure/geom/vec"
)

// Conic is a whole circle, ellipse, parabola or hyperbola. F.O is its centre
// (a parabola's vertex), F.X its major axis (for a parabola toward the focus,
// for a hyperbola toward the branch on the solid's nappe), F.Z the plane's normal.
//
// Foci, vertices and directrices are all laid off from the vertex nearest to the cone's apex,
// in terms of half the latus rectum, so that they keep their digits when the centre is
// far away.
type Conic struct {
	Kind Kind
	F    vec.Frame
	// A and B are the semi-axes in mm (circle: both the radius). A parabola has
	// its focal length in A and zero in B.
	A, B float64
	// Eccentricity is exactly 0 for a circle and exactly 1 for a parabola.
	Eccentricity float64

	half float64 // half the latus rectum, mm
	near vec.V3  // the vertex nearest to the apex
}

// before tells whether a stands before b: the higher first, then the one further right,
// then the one further back.
func before(a, b vec.V3) bool {
	d := a.Sub(b)
	l := vec.LevelSine * d.Len()
	switch {
	case math.Abs(d.Z) > l:
		return d.Z > 0
	case math.Abs(d.X) > l:
		return d.X > 0
	}
	return d.Y > 0
}

// farFirst tells whether what belongs to the vertex far from the apex comes first.
func (c *Conic) farFirst() bool {
	if c.Kind == Hyperbola {
		return before(vec.V3{}, c.F.X)
	}
	return before(c.F.X, vec.V3{})
}

// pair is the points at the distances near and far along the axis from the near vertex, in
// the order of numbering; a parabola has the near one only, a circle none.
func (c *Conic) pair(near, far float64) []vec.V3 {
	p, q := c.near.Along(c.F.X, near), c.near.Along(c.F.X, far)
	switch {
	case c.Kind == Circle:
		return nil
	case c.Kind == Parabola:
		return []vec.V3{p}
	case c.farFirst():
		return []vec.V3{q, p}
	}
	return []vec.V3{p, q}
}

// across is the signed distance from the near vertex to the far one.
func (c *Conic) across() float64 {
	if c.Kind == Hyperbola {
		return -2 * c.A
	}
	return 2 * c.A
}

// focal is the distance from a vertex to its focus: l/(1 + e).
func (c *Conic) focal() float64 { return c.half / (1 + c.Eccentricity) }

// Foci are the foci, the higher first (then the one further right); a circle has its centre.
func (c *Conic) Foci() []vec.V3 {
	if c.Kind == Circle {
		return []vec.V3{c.F.O}
	}
	return c.pair(c.focal(), c.across()-c.focal())
}

// Vertices are the ends of the major axis, in the order of Foci. A circle has none.
func (c *Conic) Vertices() []vec.V3 { return c.pair(0, c.across()) }

// Directrices are the directrices, as lines whose origin is on the axis and whose U points to the right for
// someone who looks against the plane's normal (up the plane if it is not to the right at all), in the order of Foci. A circle has none.
func (c *Conic) Directrices() []curve.Curve {
	d := c.focal() / c.Eccentricity
	u := c.F.Y
	p := vec.PlaneFrame(c.F.O, c.F.Z)
	if right := u.Dot(p.X); right < -vec.LevelSine || right <= vec.LevelSine && u.Dot(p.Y) < 0 {
		u = u.Neg()
	}
	var out []curve.Curve
	for _, o := range c.pair(-d, c.across()+d) {
		out = append(out, curve.Curve{Form: curve.Line, C: o, U: u})
	}
	return out
}

// Axis is the axis through the foci, as a line from the vertex nearest to the cone's apex along F.X; false for a circle.
func (c *Conic) Axis() (curve.Curve, bool) {
	return curve.Curve{Form: curve.Line, C: c.near, U: c.F.X}, c.Kind != Circle
}

// Centre is the centre; false for a parabola.
func (c *Conic) Centre() (vec.V3, bool) { return c.F.O, c.Kind != Parabola }

// SemiMajor is half the length between the vertices, mm; false for a parabola.
func (c *Conic) SemiMajor() (float64, bool) { return c.A, c.Kind != Parabola }

// SemiMinor is the other semi-axis, mm; false for a parabola.
func (c *Conic) SemiMinor() (float64, bool) { return c.B, c.Kind != Parabola }

// LinearEccentricity is the distance from the centre to a focus, mm; false for a parabola.
func (c *Conic) LinearEccentricity() (float64, bool) {
	return c.A * c.Eccentricity, c.Kind != Parabola
}

// FocalLength is the distance from a parabola's vertex to its focus, mm; false for the others.
func (c *Conic) FocalLength() (float64, bool) { return c.A, c.Kind == Parabola }

// LatusRectum is the whole chord through a focus square to the axis, mm; a circle's diameter.
func (c *Conic) LatusRectum() float64 { return 2 * c.half }

// AsymptoteAngle is the angle between a hyperbola's axis and an asymptote, radians; false for the others.
func (c *Conic) AsymptoteAngle() (float64, bool) {
	return math.Atan2(c.B, c.A), c.Kind == Hyperbola
}

// Radius is a circle's radius, mm; false for the others.
func (c *Conic) Radius() (float64, bool) { return c.A, c.Kind == Circle }
