// Package surface holds the natural surfaces that bound a solid: planes, right
// cylinders and right cones. Each answers its signed distance and outward
// normal, the roots of a line through it, its contour generators for a viewing
// direction, and its natural coordinates, in which it unrolls when it is
// developable.
package surface

import (
	"epure/geom/curve"
	"epure/geom/vec"
)

// Surface is a boundary: the material of a solid that it bounds lies where
// Value is negative.
type Surface interface {
	// Value is the signed distance from p to the surface in mm, negative inside.
	Value(p vec.V3) float64
	// Normal is the outward unit normal at the foot of p (at a cone's apex, the axis).
	Normal(p vec.V3) vec.V3
	// Roots are the parameters t at which o + t·d lies on the surface, ascending;
	// d is a unit vector and t is mm. A tangent line gives its double root once.
	// A line that lies in the surface gives none.
	Roots(o, d vec.V3) []float64
	// Contour is the set of straight generators along which a line of sight
	// along d (unit) touches the surface; none for a plane.
	Contour(d vec.V3) []Ruling
}

// Ruled is a curved surface made of straight generators.
type Ruled interface {
	Surface
	// Ruling is the generator at the angle theta about the surface's frame.
	Ruling(theta float64) Ruling
	// Theta is the angle of the generator through p, in [0, 2π).
	Theta(p vec.V3) float64
}

// Ruling is one straight generator: the points O + u·D with u >= Min. On a
// cone O is the apex, u the slant distance from it and Min = 0; on a cylinder
// O lies in the plane of the frame's origin, D is the axis and Min = -Inf.
type Ruling struct {
	Theta float64
	O, D  vec.V3
	Min   float64
}

// Curve is the generator as a line with u as its parameter.
func (r Ruling) Curve() curve.Curve { return curve.Curve{Form: curve.Line, C: r.O, U: r.D} }

// Plane is the boundary with its outward normal along F.Z.
type Plane struct{ F vec.Frame }

// Cylinder is the right circular cylinder of radius R (mm, > 0) about F.Z; its
// material lies inside. Angles are counted from F.X toward F.Y.
type Cylinder struct {
	F vec.Frame
	R float64
}

// Cone is one nappe of a right circular cone with its apex at F.O. The nappe
// opens toward Side·F.Z (Side is +1 or -1) with the half angle whose sine and
// cosine are Sin and Cos, both positive; its material lies inside. Angles are
// counted from F.X toward F.Y.
type Cone struct {
	F        vec.Frame
	Side     float64
	Sin, Cos float64
}
