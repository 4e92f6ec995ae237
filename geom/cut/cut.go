// Package cut makes plane sections of solids: the whole conic in which the
// plane meets the curved surface, held by its kind and frame, and the outline
// of what lies inside the solid.
package cut

import (
	"epure/geom/body"
	"epure/geom/curve"
	"epure/geom/surface"
	"epure/geom/vec"
)

// Kind names what a plane and a curved surface have in common.
type Kind string

// The kinds of the contract.
const (
	Circle    Kind = "circle"
	Ellipse   Kind = "ellipse"
	Parabola  Kind = "parabola"
	Hyperbola Kind = "hyperbola"
	Point     Kind = "point"
	Line      Kind = "line"
	TwoLines  Kind = "two lines"
	Polygon   Kind = "polygon"
	Outline   Kind = "outline"
)

// Conic is a whole circle, ellipse, parabola or hyperbola. F.O is its centre
// (a parabola's vertex), F.X its major axis (for a parabola toward the focus,
// for a hyperbola toward the branch on the solid's nappe), F.Z the plane's normal.
type Conic struct {
	Kind Kind
	F    vec.Frame
	// A and B are the semi-axes in mm (circle: both the radius). A parabola has
	// its focal length in A and zero in B.
	A, B float64
	// Eccentricity is exactly 0 for a circle and exactly 1 for a parabola.
	Eccentricity float64
}

// Ground says why a Kind is what it is.
type Ground string

// The grounds.
const (
	ByConstruction Ground = "by construction" // the plane was laid along a generator, square to the axis ...
	ByBound        Ground = "within a bound"  // the discriminant is zero within the rounding of the inputs
	ByValue        Ground = "by value"        // the discriminant is not zero by more than its error
)

// Piece is a piece of a section's outline.
type Piece struct {
	Arc   curve.Arc
	Face  int  // index of the body's face that it lies on
	Chord bool // on a plane face: counted by the perimeter, not by the length
}

// Section is the section of a body by a plane.
type Section struct {
	Plane  vec.Frame
	Kind   Kind
	Ground Ground
	Conic  *Conic        // for circle, ellipse, parabola and hyperbola
	Lines  []curve.Curve // for line and two lines, each pointing away from a cone's apex or along a cylinder's axis
	Apex   *vec.V3       // for point, and for line and two lines of a cone
	Loops  [][]Piece     // closed outlines inside the solid, anticlockwise looking against the plane's normal
	// Area in mm², Length (curved outline only, mm) and Perimeter (with chords, mm) of what lies inside the solid.
	Area, Length, Perimeter float64
	Centroid                vec.V3 // of the area
}

// MissError says that the plane passes the body by Miss mm.
type MissError struct{ Miss float64 }

func (e *MissError) Error() string { return "" }

// Of returns the section of b by the plane p. along, which may be empty, holds directions
// that the plane was laid along (unit vectors), as ground for a parabola or for lines by construction.
func Of(b *body.Body, p surface.Plane, along []vec.V3) (*Section, error) { panic("todo") }

// FocalSphere is a sphere that touches a cone or cylinder along a circle and the cutting plane in a focus.
type FocalSphere struct {
	Centre vec.V3
	Radius float64
	Touch  vec.V3    // the point of the plane, a focus of the section
	Ring   vec.Frame // centre and plane of the circle of contact with the surface
	RingR  float64
}

// FocalSpheres returns the focal spheres of s on the surface that it was cut from,
// the one with the higher centre first (then the one further right).
func (s *Section) FocalSpheres() []FocalSphere { panic("todo") }

// Foci are the foci, the higher first (then the one further right); a circle has its centre.
func (c *Conic) Foci() []vec.V3 { panic("todo") }

// Vertices are the ends of the major axis, in the order of Foci. A circle has none.
func (c *Conic) Vertices() []vec.V3 { panic("todo") }

// Directrices are the directrices, as lines with U along the plane's level direction where there is one, in the order of Foci.
func (c *Conic) Directrices() []curve.Curve { panic("todo") }
