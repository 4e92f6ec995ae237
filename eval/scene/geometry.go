package scene

import (
	"epure/geom/body"
	"epure/geom/cut"
	"epure/geom/flat"
	"epure/geom/surface"
	"epure/geom/vec"
)

// Line is a straight line: through a point, along a unit vector, and with ends
// where it has them (To lies on the side of Along).
type Line struct {
	Name    string // the thing or feature: "L", "K.axis", "K.generator(180°)"
	Through vec.V3
	Along   vec.V3
	Ends    bool
	From    vec.V3
	To      vec.V3
	// Generator is the solid of which it is a generator, or nil; Theta its angle in the solid's Angles frame, radians.
	Generator *Solid
	Theta     float64
}

// Plane is a plane with its frame (see vec.PlaneFrame) and what is known of it by construction.
type Plane struct {
	Name  string // "P", or "ground", "frontal", "side"
	F     vec.Frame
	Along []vec.V3 // unit directions that it was laid along
}

// Surface is the plane as a boundary, outward along its normal.
func (p *Plane) Surface() surface.Plane { return surface.Plane{F: p.F} }

// Solid is a body with its origin.
type Solid struct {
	Name  string
	Body  *body.Body
	Root  *Primitive
	Cuts  []*Plane // the planes that cut it, in order; nil for the whole solid
	Whole *Solid   // the uncut solid; itself when it is uncut
}

// Group is several solids made alike: a ring or a row.
type Group struct {
	Name   string
	Solids []*Solid // named "R(1)", "R(2)" ...
}

// Primitive is a solid as it was declared: a right cone, frustum or cylinder, or with Outline set a
// prism or pyramid, of which only Base (at the centre of the base), Height, Apex and the labels hold; its sides are the faces
// whose labels begin with SideFace+"(".
type Primitive struct {
	Name         string
	Form         string // "cone", "cylinder", "prism", "pyramid", "sphere" (Base.O is then the centre)
	Cylinder     bool
	Outline      *Outline
	Base         vec.Frame // origin at the base's centre, Z along the axis toward the apex or top
	Angles       vec.Frame // angles about the axis: see vec.AxisFrame
	Radius       float64   // of the base, mm
	TopRadius    float64   // mm; 0 for a cone, Radius for a cylinder
	Height       float64   // mm
	Side         surface.Ruled
	SideFace     string // labels of the body's faces
	BaseFace     string
	TopFace      string
	Apex         vec.V3  // cones and frusta
	SlantOfWhole float64 // apex to base edge, mm; cones and frusta
}

// Outline is a polygon in a plane, its corners in the order of the source.
type Outline struct {
	Name    string
	F       vec.Frame
	Corners []vec.V2
	Even    bool // a rectangle or a regular polygon: the line over its centre is drawn as a centre line
}

// Centreline is the direction (unit) of the centre line through Base.O; ok is false for a solid without one.
func (p *Primitive) Centreline() (along vec.V3, ok bool) {
	switch {
	case p.Outline == nil:
		return p.Base.Z, true
	case p.Outline.Even:
		return p.Apex.Sub(p.Base.O).Unit(), true
	}
	return along, false
}

// Face is a face of a solid, by its label.
type Face struct {
	Name   string // "K.base", "B.face(P)"
	Solid  *Solid
	Label  string
	Circle *Circle // for the round ends of an uncut solid
}

// Circle is a circle of space.
type Circle struct {
	F      vec.Frame // centre and plane
	R      float64   // mm
	Sphere bool      // the outline of a sphere: it faces the viewer in every view
}

// Edge is an edge of a solid: the pieces where two faces meet.
type Edge struct {
	Name  string
	Solid *Solid
	Edges []body.Edge
}

// Section is a section of a solid by a plane.
type Section struct {
	Name string
	*cut.Section
	Of *Solid
	By *Plane
}

// Sphere is a focal sphere.
type Sphere struct {
	Name string
	cut.FocalSphere
	Of *Section
}

// Letter is the mark of the n-th station of a pattern that is not an even division, n from 1, on the
// drawing and in tables: a to z, then aa, ab and so on.
func Letter(n int) string {
	s := string(rune('a' + (n-1)%26))
	if n > 26 {
		return Letter((n-1)/26) + s
	}
	return s
}

// Development is the pattern of a curved face.
type Development struct {
	Name string
	*flat.Pattern
	Of        *Solid
	Face      int // index in Of.Body.Faces
	Seam      float64
	Divisions int
	InsideUp  bool
}
