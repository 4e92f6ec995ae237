// Package vec holds points, vectors and frames of space and of a plane.
//
// # Coordinate systems
//
// Every frame in epure is one of these, all right-handed; lengths are
// millimetres and angles radians unless a name says otherwise.
//
//   - model: X right, Y back (away from someone who looks at the front
//     elevation), Z up.
//   - section plane: x is level, to the right for someone who looks against
//     the plane's normal; y climbs. In a level plane x is rightward.
//   - view: a Frame whose X runs right on paper, Y up on paper and Z toward
//     the viewer, so that Frame.Local gives (x, y, depth).
//   - flat pattern: seen from outside unless asked otherwise. Cones have the
//     apex at the origin and the seam along +x; cylinders have the girth
//     along +x and the axis along +y.
//   - paper: millimetres, origin at the sheet's lower left, y up.
//   - SVG: millimetres, origin at the upper left, y down (the SVG writer flips).
//   - PDF: points of 1/72 inch, origin at the lower left, y up.
//
// Products that feed sums are rounded explicitly, float64(a*b) + c, so that no
// compiler fuses them and the same bits come out on every machine.
package vec

import "math"

// V3 is a point or a vector of space, in mm (directions are unit vectors).
type V3 struct{ X, Y, Z float64 }

// V2 is a point or a vector of a plane or of the paper, in mm.
type V2 struct{ X, Y float64 }

// Add returns a + b.
func (a V3) Add(b V3) V3 { return V3{a.X + b.X, a.Y + b.Y, a.Z + b.Z} }

// Sub returns a - b.
func (a V3) Sub(b V3) V3 { return V3{a.X - b.X, a.Y - b.Y, a.Z - b.Z} }

// Scale returns k·a.
func (a V3) Scale(k float64) V3 { return V3{float64(k * a.X), float64(k * a.Y), float64(k * a.Z)} }

// Along returns a + k·d.
func (a V3) Along(d V3, k float64) V3 {
	return V3{a.X + float64(k*d.X), a.Y + float64(k*d.Y), a.Z + float64(k*d.Z)}
}

// Neg returns -a, without negative zeros.
func (a V3) Neg() V3 { return V3{0 - a.X, 0 - a.Y, 0 - a.Z} }

// Dot returns the scalar product.
func (a V3) Dot(b V3) float64 {
	return float64(a.X*b.X) + float64(a.Y*b.Y) + float64(a.Z*b.Z)
}

// Cross returns the vector product.
func (a V3) Cross(b V3) V3 {
	return V3{
		float64(a.Y*b.Z) - float64(a.Z*b.Y),
		float64(a.Z*b.X) - float64(a.X*b.Z),
		float64(a.X*b.Y) - float64(a.Y*b.X),
	}
}

// Len returns the length of a, without overflow.
func (a V3) Len() float64 { return math.Hypot(math.Hypot(a.X, a.Y), a.Z) }

// Unit returns a divided by its length; the zero vector stays zero.
func (a V3) Unit() V3 {
	l := a.Len()
	if l == 0 {
		return V3{}
	}
	return V3{a.X / l, a.Y / l, a.Z / l}
}

// Dist returns the distance between two points.
func (a V3) Dist(b V3) float64 { return a.Sub(b).Len() }

// Add returns a + b.
func (a V2) Add(b V2) V2 { return V2{a.X + b.X, a.Y + b.Y} }

// Sub returns a - b.
func (a V2) Sub(b V2) V2 { return V2{a.X - b.X, a.Y - b.Y} }

// Scale returns k·a.
func (a V2) Scale(k float64) V2 { return V2{float64(k * a.X), float64(k * a.Y)} }

// Along returns a + k·d.
func (a V2) Along(d V2, k float64) V2 { return V2{a.X + float64(k*d.X), a.Y + float64(k*d.Y)} }

// Dot returns the scalar product.
func (a V2) Dot(b V2) float64 { return float64(a.X*b.X) + float64(a.Y*b.Y) }

// Cross returns the z of the vector product: positive when b lies anticlockwise of a.
func (a V2) Cross(b V2) float64 { return float64(a.X*b.Y) - float64(a.Y*b.X) }

// Left returns a turned a quarter anticlockwise.
func (a V2) Left() V2 { return V2{0 - a.Y, a.X} }

// Len returns the length of a.
func (a V2) Len() float64 { return math.Hypot(a.X, a.Y) }

// Unit returns a divided by its length; the zero vector stays zero.
func (a V2) Unit() V2 {
	l := a.Len()
	if l == 0 {
		return V2{}
	}
	return V2{a.X / l, a.Y / l}
}

// Dist returns the distance between two points.
func (a V2) Dist(b V2) float64 { return a.Sub(b).Len() }

// Frame is a right-handed frame: an origin and three unit vectors square to
// each other.
type Frame struct{ O, X, Y, Z V3 }

// World is the model frame.
var World = Frame{V3{}, V3{X: 1}, V3{Y: 1}, V3{Z: 1}}

// Local returns the coordinates of the point p in f.
func (f Frame) Local(p V3) V3 {
	d := p.Sub(f.O)
	return V3{d.Dot(f.X), d.Dot(f.Y), d.Dot(f.Z)}
}

// Dir returns the components of the vector d in f.
func (f Frame) Dir(d V3) V3 { return V3{d.Dot(f.X), d.Dot(f.Y), d.Dot(f.Z)} }

// Point returns the model point with the coordinates q in f.
func (f Frame) Point(q V3) V3 { return f.O.Along(f.X, q.X).Along(f.Y, q.Y).Along(f.Z, q.Z) }

// Flat returns the first two coordinates of p in f.
func (f Frame) Flat(p V3) V2 { d := p.Sub(f.O); return V2{d.Dot(f.X), d.Dot(f.Y)} }

// Lift returns the model point of the plane point q (third coordinate zero).
func (f Frame) Lift(q V2) V3 { return f.O.Along(f.X, q.X).Along(f.Y, q.Y) }

// At returns f moved to the origin o.
func (f Frame) At(o V3) Frame { f.O = o; return f }

// PlaneFrame returns the frame of a plane through o with normal n (not zero):
// x level and to the right for someone who looks against the normal, y
// climbing; in a level plane x is rightward, and looked at from below (n
// downward) y is frontward so that the frame stays right-handed.
func PlaneFrame(o, n V3) Frame {
	z := n.Unit()
	up := V3{Z: 1}
	x := up.Cross(z)
	if x.Len() < LevelSine {
		x = V3{X: 1}
		x = x.Along(z, -x.Dot(z))
	}
	x = x.Unit()
	return Frame{o, x, z.Cross(x).Unit(), z}
}

// LevelSine is the sine of the slope under which a plane counts as level and
// an axis as vertical: 1e-12 is a few thousand units in the last place of a
// unit vector, far under any angle that can be drawn, and over the rounding
// of a normal that was worked out from three points.
const LevelSine = 1e-12

// AxisFrame returns the frame in which angles about an axis are counted. About
// a vertical axis (either way) they start rightward, anticlockwise seen from
// above, so Z is up. About any other axis they start at its top line,
// anticlockwise looking against the axis, so Z is the axis.
func AxisFrame(o, axis V3) Frame {
	z := axis.Unit()
	if math.Hypot(z.X, z.Y) < LevelSine {
		return World.At(o)
	}
	y := z.Cross(V3{Z: 1}).Unit() // level, and exact however steep the axis is
	return Frame{o, y.Cross(z).Unit(), y, z}
}

// ViewFrame returns the frame of a view in which the eye looks along d (not
// zero): Z points back at the eye, Y up on paper is the climb where there is
// one. Looking down or up, X is rightward.
func ViewFrame(d V3) Frame { return PlaneFrame(V3{}, d.Neg()) }
