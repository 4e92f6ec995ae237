// Package catalogue is the one table of the language: every form with its
// clauses and measures, every function and built-in name, every command. It is
// data only. Checking, suggestions, explain and the manual are all made from
// it, so that nothing is described twice.
package catalogue

import "epure/lang/quantity"

// Class is the family of a kind.
type Class uint8

// The classes of what an expression can stand for.
const (
	Unknown     Class = iota // what could not be worked out; fits everything, so that one mistake gives one message
	Quantity                 // number, ratio, length to a power, angle
	Text                     // "…"
	YesNo                    // yes, no
	Triple                   // (x, y, z): a point (lengths) or a direction (plain numbers)
	Pair                     // (x, y): a point of a plane, a pattern or the paper
	Line                     // a straight line
	Plane                    // a plane
	Face                     // a face of a solid
	Edge                     // an edge of a solid
	Outline                  // a closed outline in a plane
	Solid                    // a solid
	Group                    // a ring or row of solids
	Section                  // a plane section
	Sphere                   // a sphere
	Development              // a pattern
	Titles                   // the fields of a title block
	Block                    // a sheet or a figure
	View                     // a view in a block
	Mark                     // a dimension, label, note or table in a block
)

// Kind says what an expression stands for: its class, for quantities, triples
// and pairs what is measured, for things the type whose measures it has.
type Kind struct {
	Class Class
	Of    quantity.Kind
	Type  string // name of a form or of a feature type; "" where the class says it all
}

// The kinds of plain values.
var (
	KNumber    = Kind{Class: Quantity, Of: quantity.Number}
	KRatio     = Kind{Class: Quantity, Of: quantity.Ratio}
	KLength    = Kind{Class: Quantity, Of: quantity.Length}
	KArea      = Kind{Class: Quantity, Of: quantity.Area}
	KVolume    = Kind{Class: Quantity, Of: quantity.Volume}
	KAngle     = Kind{Class: Quantity, Of: quantity.Angle}
	KText      = Kind{Class: Text}
	KYesNo     = Kind{Class: YesNo}
	KPoint     = Kind{Class: Triple, Of: quantity.Length}
	KDirection = Kind{Class: Triple, Of: quantity.Number}
	KPlace     = Kind{Class: Pair, Of: quantity.Length}
	KLine      = Kind{Class: Line, Type: "line"}
	KPlane     = Kind{Class: Plane, Type: "plane"}
	KFace      = Kind{Class: Face, Type: "face"}
	KCircle    = Kind{Class: Face, Type: "circle"}
	KEdge      = Kind{Class: Edge, Type: "edge"}
	KOutline   = Kind{Class: Outline, Type: "outline"}
	KSolid     = Kind{Class: Solid}
	KGroup     = Kind{Class: Group, Type: "ring"}
	KSection   = Kind{Class: Section, Type: "section"}
	KSphere    = Kind{Class: Sphere, Type: "focal_sphere"}
	KPattern   = Kind{Class: Development, Type: "development"}
	KTitles    = Kind{Class: Titles, Type: "titles"}
	KView      = Kind{Class: View}
)

// Form is one word that makes a thing, with everything that is known of it.
type Form struct {
	Word     string
	Chapter  string // of the manual
	Help     string // one sentence
	More     string // further sentences for the manual, may be empty
	Text     Need   // whether a text in quotes follows the word
	Clauses  []Clause
	Choices  []Choice
	Kind     Kind
	KindOf   string // the clause whose value has the kind of the thing, and with it the measures
	Measures []Measure
	Block    bool     // opens a block with {
	Within   []string // the forms of the blocks in which it stands; empty: outside of blocks
	Example  string   // a complete file that names the thing X as Subject
	Subject  string   // the name in Example whose measures are shown
}

// Need says whether something must be there.
type Need uint8

// The needs.
const (
	Never Need = iota
	Maybe
	Must
)

// Clause is one word and its values.
type Clause struct {
	Word     string
	Takes    []Kind   // kinds of a value; any of them
	Words    []string // words that it takes besides
	Max      int      // most values in the list; 0: any number
	Needed   bool
	Repeat   bool   // may stand more than once; the values add up
	Measured bool   // takes a measure of a thing, as K.height
	Default  string // in words, for the manual
	Help     string // one sentence
}

// Choice is a set of words of which exactly one way must be present, whole; an
// empty way means that none may do. With Any, one or more ways may be present.
type Choice struct {
	Ways [][]string
	Any  bool
}

// Measure is one member of a thing.
type Measure struct {
	Name    string
	Kind    Kind
	Args    []Arg
	Help    string
	Example string // an expression on the form's Subject; "" for Subject.Name
}

// Arg is one argument of a measure.
type Arg struct {
	Name     string
	Takes    []Kind
	Optional bool
}

// Type is what a member expression can be besides the forms: a feature.
type Type struct {
	Name     string
	Help     string
	Measures []Measure
	Example  string // a complete file
	Subject  string // an expression that gives one
}

// Rule says how the kind of a function's result follows from its arguments.
type Rule uint8

// The rules.
const (
	Fixed     Rule = iota // always Function.Kind
	Same                  // as the first argument; all must be alike
	HalfPower             // lengths to half the power of the argument
	OfTriples             // the product of the dimensions of the two triples
	UnitOf                // a direction
)

// Function is a built-in function.
type Function struct {
	Name    string
	Params  []Param
	Many    bool // the last parameter may be given any number of times
	Rule    Rule
	Kind    Kind
	Help    string
	Example string // an expression
}

// Param is one parameter; no Takes means any quantity.
type Param struct {
	Name  string
	Takes []Kind
}

// Builtin is a name that every file has.
type Builtin struct {
	Name string
	Kind Kind
	Help string
}

// FormNamed returns the form with the word.
func FormNamed(word string) (*Form, bool) {
	for i := range Forms {
		if Forms[i].Word == word {
			return &Forms[i], true
		}
	}
	return nil, false
}

// ClauseNamed returns the clause of the form with the word.
func (f *Form) ClauseNamed(word string) (*Clause, bool) {
	for i := range f.Clauses {
		if f.Clauses[i].Word == word {
			return &f.Clauses[i], true
		}
	}
	return nil, false
}

// MeasuresOf returns the measures that a kind has.
func MeasuresOf(k Kind) []Measure {
	if f, ok := FormNamed(k.Type); ok {
		return f.Measures
	}
	for i := range Types {
		if Types[i].Name == k.Type {
			return Types[i].Measures
		}
	}
	return nil
}

// MeasureNamed returns the measure of the kind with the name.
func MeasureNamed(k Kind, name string) (*Measure, bool) {
	ms := MeasuresOf(k)
	for i := range ms {
		if ms[i].Name == name {
			return &ms[i], true
		}
	}
	return nil, false
}

// FunctionNamed returns the function with the name.
func FunctionNamed(name string) (*Function, bool) {
	for i := range Functions {
		if Functions[i].Name == name {
			return &Functions[i], true
		}
	}
	return nil, false
}

// BuiltinNamed returns the built-in name.
func BuiltinNamed(name string) (*Builtin, bool) {
	for i := range Builtins {
		if Builtins[i].Name == name {
			return &Builtins[i], true
		}
	}
	return nil, false
}
