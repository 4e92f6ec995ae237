// Package drawing holds the hand-off between composition and the writers: a
// sheet of marks in paper millimetres, y up, origin at the sheet's lower left,
// in drawing order. Besides the types it holds what every writer and every
// composer needs and must do alike: pens, dash patterns fitted to a length,
// arrowheads, hatching, and the lowering of exact curves to shapes.
//
// Shapes stay as exact as paper formats allow: a conic keeps its equation until
// a writer that lacks it asks for cubics.
package drawing

import "epure/geom/vec"

// Sheet is one finished page.
type Sheet struct {
	Name          string // file name stem, from the block's name
	Title         string
	Desc          string  // one or two sentences that say what is drawn, for readers who cannot see it
	Width, Height float64 // paper, mm
	Marks         []Mark
	Date          string // ISO 8601 date for document metadata, or ""
	Creator       string
}

// Key names a mark: "front", "K", "generator/3". It comes from names, never
// from order or pointers, and becomes the SVG id.
type Key struct{ View, Thing, Feature string }

// Role says what a mark stands for.
type Role string

// The roles.
const (
	VisibleEdge  Role = "visible"      // visible edges and outlines
	HiddenEdge   Role = "hidden"       // hidden edges and outlines
	SoftLine     Role = "soft"         // imaginary lines of intersection, construction
	CentreLine   Role = "centre"       // centre lines and axes of symmetry
	CuttingPlane Role = "cuttingplane" // position of a cutting plane
	FormerShape  Role = "former"       // the uncut solid, drawn faintly
	Projector    Role = "projector"    // projection lines between views
	Generator    Role = "generator"    // generators on views and patterns
	Construction Role = "construction" // focal spheres, directrix, foci
	PatternEdge  Role = "pattern"      // the outline of a pattern
	FoldLine     Role = "fold"
	Dimension    Role = "dimension"
	Lettering    Role = "text"
	Hatching     Role = "hatch"
	Furniture    Role = "frame" // frame, title block, symbols, tables
)

// LineType is the number of a basic line type of ISO 128-2.
type LineType uint8

// The line types in use.
const (
	Continuous     LineType = 1
	Dashed         LineType = 2
	LongDashDot    LineType = 4
	LongDashTwoDot LineType = 5
)

// Pen draws a line of Width mm, continuous with round ends, or dashed with butt
// ends (see DashesFor). Width 0 draws no line.
type Pen struct {
	Width float64
	Type  LineType
}

// Fill paints the inside of a closed shape, even-odd, when On.
type Fill struct {
	On   bool
	Grey float64 // 0 black to 1 white
}

// Mark is one thing drawn.
type Mark struct {
	Key   Key
	Role  Role
	Pen   Pen
	Fill  Fill
	Shape Shape
	Title string // words for this mark (tooltip, reader), may be empty
}

// Shape is one of Line, EllipseArc, Quad, Spline, Path and Text.
type Shape interface{ shape() }

// Line is a straight line.
type Line struct{ A, B vec.V2 }

// EllipseArc is an arc of an ellipse or a circle (RX == RY): the points
// C + R(Rot)·(RX cos t, RY sin t) for t from From to To (radians). It runs
// anticlockwise when From < To and clockwise when To < From, so that arcs chain
// in a Path; |To-From| is at most 2π, and a full turn is closed.
type EllipseArc struct {
	C        vec.V2
	RX, RY   float64
	Rot      float64
	From, To float64
}

// Quad is a quadratic Bézier curve: an arc of a parabola, exactly.
type Quad struct{ P0, P1, P2 vec.V2 }

// Spline is a chain of cubic Bézier curves: Points has 3n+1 members.
// Err is the largest distance from the exact curve, mm on paper.
type Spline struct {
	Points []vec.V2
	Err    float64
}

// Path is a chain of Line, EllipseArc, Quad and Spline, each starting where the one
// before ended; closed when Closed. It joins without gaps and can be filled.
type Path struct {
	Pieces []Shape
	Closed bool
}

// Anchor says which point of a text stands at its place.
type Anchor uint8

// The anchors, horizontally; vertically the baseline.
const (
	Start Anchor = iota
	Middle
	End
)

// Text is one line of lettering. Height is the height of capitals h of ISO 3098 in mm.
type Text struct {
	At     vec.V2
	Height float64
	Anchor Anchor
	Angle  float64 // radians anticlockwise from rightward
	String string
	Bold   bool
}

func (Line) shape()       {}
func (EllipseArc) shape() {}
func (Quad) shape()       {}
func (Spline) shape()     {}
func (Path) shape()       {}
func (Text) shape()       {}
