package scene

import (
	"epure/geom/vec"
	"epure/lang/source"
)

// Block is one output block: a sheet or a figure.
type Block struct {
	Form       string // "sheet" or "figure"
	Name       string // begins the file's name; from the title when the block has no name
	Title      string
	Span       source.Span
	Size       string  // "A4" ... "A0" for a sheet, "" for a figure
	Portrait   bool    // an upright sheet
	Scale      float64 // paper over model; 0: chosen out of ISO 5455
	ThirdAngle bool
	Width      float64 // of a figure, paper mm; 0: as large as the scale makes it
	Titles     *Titles // never nil
	Views      []*View // views, true shapes and patterns, in file order
	Dimensions []*Dimension
	Labels     []*Label
	Notes      []*Note
	Tables     []*Table
}

// View is one view, true shape or pattern in a block.
type View struct {
	Form  string // "elevation", "plan", "view", "section_view", "pictorial", "true_shape", "pattern"
	Name  string // from the source, or the form with a number when it has none
	Named bool   // the source names it
	Span  source.Span
	Along vec.V3 // direction of sight, unit; not for a pattern. For a true shape against the plane's normal
	// Image is the frame of a pictorial, nil for other views: its X and Y are the rows that take a point to the
	// paper and need not be unit vectors nor square to each other; Z points at the viewer.
	Image *vec.Frame
	// By is the cutting plane of a section view, Cut the cut faces, one for each solid that it cuts, and Of
	// then holds what lies behind the plane.
	By  *Plane
	Cut []Subject
	// Of are the things drawn: values *Solid, *Plane, *Line, *Section, *Sphere, Triple (points), *Development.
	Of    []Subject
	Faint []Subject // uncut solids, drawn thin
	From  *View     // the view that it is folded from or aligned with, or nil
	At    *vec.V2   // paper mm from the lower left of the drawing space to the view's lower left; nil: arranged
	Scale float64   // own scale; 0: the block's
	Title string    // words under the view, or ""
	Show  map[string]bool
}

// Subject is a thing with its name in the source.
type Subject struct {
	Name  string
	Value Value
}

// Dimension asks for one dimension on a view.
type Dimension struct {
	Name   string // of the statement, or the measure
	Span   source.Span
	On     *View
	Anchor Anchor
	Text   string // the figure, from the geometry, already rounded
}

// Anchor is what a dimension measures: one of Linear, Diameter, Radius, Angle, FlatLinear, FlatRadius.
type Anchor interface{ anchor() }

// Linear is a distance between two points of space.
type Linear struct{ A, B vec.V3 }

// Diameter is the diameter of a circle of space.
type Diameter struct{ Circle Circle }

// Radius is the radius of a circle of space.
type Radius struct{ Circle Circle }

// Angle is the angle at Apex between the unit directions A and B.
type Angle struct{ Apex, A, B vec.V3 }

// FlatLinear is a distance between two points of a pattern.
type FlatLinear struct{ A, B vec.V2 }

// FlatRadius is a radius about the pattern's origin, drawn at the polar angle At (radians).
type FlatRadius struct{ R, At float64 }

// FlatAngle is an angle about the pattern's origin, from one polar angle to another (radians).
type FlatAngle struct{ From, To float64 }

func (Linear) anchor()     {}
func (Diameter) anchor()   {}
func (Radius) anchor()     {}
func (Angle) anchor()      {}
func (FlatLinear) anchor() {}
func (FlatRadius) anchor() {}
func (FlatAngle) anchor()  {}

// Label puts a short text beside a point of a view.
type Label struct {
	Name string
	Span source.Span
	Text string
	At   vec.V3
	On   []*View
}

// Note is a text on the sheet.
type Note struct {
	Name string
	Span source.Span
	Text string
	At   *vec.V2 // as View.At; nil: arranged
}

// Table lists measures: for a development the true lengths of its stations, for other things their measures.
type Table struct {
	Name  string
	Span  source.Span
	Title string
	Of    []Subject
	Rows  [][]string // first row the header
	At    *vec.V2
}

// Titles fills the title block (ISO 7200). Empty fields stay empty.
type Titles struct {
	Owner, Number, Revision, Date, Department, Reference, Creator, Approval,
	DocumentType, Status, Supplement, Language, Material, Tolerance string
	Sheet, Sheets string
}
