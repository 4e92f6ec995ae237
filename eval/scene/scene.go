// Package scene holds the hand-off between evaluation and everything that uses
// its results: the things of a file with their exact geometry and measures,
// the verdicts of the verify lines, and the output blocks that were asked for.
// It holds types only.
package scene

import (
	"epure/geom/vec"
	"epure/lang/quantity"
	"epure/lang/source"
)

// Scene is one file evaluated with one set of givens. It is partial when there
// were errors: what could not be evaluated is left out.
type Scene struct {
	File   *source.File
	Case   string   // name of the case, or ""
	Things []*Thing // in file order; values and givens too
	Verify []Verify
	Blocks []*Block
}

// Thing is one named statement.
type Thing struct {
	Name  string
	Form  string // "cone", "section" ..., "value" for values and givens
	Text  string // the words behind it, if any
	Span  source.Span
	Value Value
	// Measures are those that exist, in the order of the catalogue; numbered ones as
	// "focus(1)". Values and givens have the one measure "value".
	Measures []Measure
}

// Measure is one measure of a thing.
type Measure struct {
	Name  string
	Value Value
}

// Verify is the outcome of one verify line.
type Verify struct {
	Span               source.Span
	Source             string // the line as written, for reports
	Text               string // its words, if any
	Op                 string // "=", "<", "<=", ">", ">="
	Left, Right        Value
	Within, Difference *quantity.Value // nil where they mean nothing
	Holds              bool
	Corner             string // the corner of the tolerances at which it fails, "" at the nominal
}

// Value is what an expression stands for: one of the types below.
type Value interface{ value() }

// Quantity is a number with a kind.
type Quantity struct{ quantity.Value }

// Text is a text with its holes filled.
type Text string

// YesNo is yes or no.
type YesNo bool

// Triple is a point or displacement (Of quantity.Length, mm), a direction (quantity.Number), or
// (0, 0, 0), which goes for both (quantity.Zero).
type Triple struct {
	V  vec.V3
	Of quantity.Kind
}

// Pair is a point of a plane or of the paper (mm) or a direction in it.
type Pair struct {
	V  vec.V2
	Of quantity.Kind
}

// Unknown is the value of what could not be evaluated; it makes no further errors.
type Unknown struct{}

func (Quantity) value()     {}
func (Text) value()         {}
func (YesNo) value()        {}
func (Triple) value()       {}
func (Pair) value()         {}
func (Unknown) value()      {}
func (*Line) value()        {}
func (*Plane) value()       {}
func (*Face) value()        {}
func (*Edge) value()        {}
func (*Outline) value()     {}
func (*Solid) value()       {}
func (*Group) value()       {}
func (*Section) value()     {}
func (*Sphere) value()      {}
func (*Development) value() {}
func (*Titles) value()      {}
func (*Block) value()       {}
func (*View) value()        {}
