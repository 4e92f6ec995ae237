// Package forms makes the things of the catalogue: one constructor for each
// form and one function for each measure, from values to values. It knows the
// geometry and no syntax; what cannot be made is a Fail that names the clause
// to blame, and the evaluator turns it into a diagnostic at the right place.
package forms

import (
	"fmt"

	"epure/eval/scene"
	"epure/lang/catalogue"
	"epure/lang/diag"
)

// Call is a form with the values of its clauses.
type Call struct {
	Name   string // of the thing, or the form when it has none
	Values map[string][]scene.Value
	Words  map[string][]string
}

// Has tells whether the clause is given.
func (c *Call) Has(clause string) bool { return len(c.Values[clause]) > 0 || len(c.Words[clause]) > 0 }

// Fail says why something cannot be made, in the user's words.
type Fail struct {
	Code   diag.Code
	Clause string // the clause to blame; "" for the form or the member itself
	Index  int    // which value of the clause or argument
	Text   string
	Reason string
	Way    string // the way out, may be empty
}

func fail(code diag.Code, clause, format string, args ...any) *Fail {
	return &Fail{Code: code, Clause: clause, Text: fmt.Sprintf(format, args...)}
}

// at blames the i-th value of the clause.
func (f *Fail) at(i int) *Fail { f.Index = i; return f }

// because adds the rule or the values that broke it.
func (f *Fail) because(format string, args ...any) *Fail {
	f.Reason = fmt.Sprintf(format, args...)
	return f
}

// way adds the way out.
func (f *Fail) way(format string, args ...any) *Fail { f.Way = fmt.Sprintf(format, args...); return f }

// Constructor makes the value of a form.
type Constructor func(c *Call) (scene.Value, *Fail)

// Constructors returns the constructor of every form that makes a thing of
// space or a pattern. Blocks and what stands in them are made by the evaluator,
// since they only choose and place.
func Constructors() map[string]Constructor {
	return map[string]Constructor{
		"line": line, "plane": plane, "rectangle": rectangle, "regular": regular, "outline": outline,
		"cone": cone, "cylinder": cylinder, "prism": prism, "pyramid": pyramid, "sphere": sphere, "part": part, "copy": copyOf, "ring": ring, "row": row,
		"section": section, "focal_sphere": focalSphere, "development": development, "titles": titles,
	}
}

// Measured is the value of a measure, and what a dimension of it would span (nil
// where it cannot be dimensioned).
type Measured struct {
	Value  scene.Value
	Anchor scene.Anchor
}

// MeasureFunc works out one measure of a value.
type MeasureFunc func(v scene.Value, args []scene.Value) (Measured, *Fail)

// MeasureFuncs returns the functions of the measures of a type of the
// catalogue (a form's word or a feature type), by name.
func MeasureFuncs(typ string) map[string]MeasureFunc {
	switch typ {
	case "line":
		return lineMeasures()
	case "plane":
		return planeMeasures()
	case "cone":
		return coneMeasures()
	case "cylinder":
		return cylinderMeasures()
	case "prism":
		return prismMeasures()
	case "pyramid":
		return pyramidMeasures()
	case "sphere":
		return sphereSolidMeasures()
	case "rectangle", "regular", "outline":
		return outlineMeasures()
	case "part":
		return partMeasures()
	case "ring", "row":
		return groupMeasures()
	case "circle":
		return circleMeasures()
	case "face":
		return faceMeasures()
	case "edge":
		return edgeMeasures()
	case "section":
		return sectionMeasures()
	case "focal_sphere":
		return sphereMeasures()
	case "development":
		return developmentMeasures()
	}
	return nil
}

// Type returns the catalogue type of a value whose members are asked for.
func Type(v scene.Value) string {
	switch v := v.(type) {
	case *scene.Line:
		return catalogue.KLine.Type
	case *scene.Plane:
		return catalogue.KPlane.Type
	case *scene.Solid:
		if v.Whole != v {
			return "part"
		}
		return v.Root.Form
	case *scene.Group:
		return "ring"
	case *scene.Outline:
		return catalogue.KOutline.Type
	case *scene.Face:
		if v.Circle != nil {
			return catalogue.KCircle.Type
		}
		return catalogue.KFace.Type
	case *scene.Edge:
		return catalogue.KEdge.Type
	case *scene.Section:
		return catalogue.KSection.Type
	case *scene.Sphere:
		return catalogue.KSphere.Type
	case *scene.Development:
		return catalogue.KPattern.Type
	}
	return ""
}

// Measure works out the member of a value.
func Measure(v scene.Value, name string, args []scene.Value) (Measured, *Fail) {
	f, ok := MeasureFuncs(Type(v))[name]
	if !ok {
		return Measured{}, fail("no-such-measure", "", "there is no %s here", name)
	}
	return f(v, args)
}

// List returns all measures that v has, in the order of the catalogue,
// numbered ones one by one. Faces and edges are left out: their own measures
// are asked for by name.
func List(v scene.Value, kind catalogue.Kind) []scene.Measure {
	var out []scene.Measure
	for _, m := range catalogue.MeasuresOf(kind) {
		if m.Kind.Class == catalogue.Face || m.Kind.Class == catalogue.Edge {
			continue
		}
		out = append(out, listOne(v, m)...)
	}
	return out
}

func listOne(v scene.Value, m catalogue.Measure) []scene.Measure {
	var out []scene.Measure
	if len(m.Args) == 0 || m.Args[0].Optional {
		if got, f := Measure(v, m.Name, nil); f == nil {
			out = append(out, scene.Measure{Name: m.Name, Value: got.Value})
		}
	}
	if len(m.Args) != 1 || m.Args[0].Takes[0] != catalogue.KNumber {
		return out
	}
	for n := 1; n <= countOf(v); n++ {
		if got, f := Measure(v, m.Name, []scene.Value{number(float64(n))}); f == nil {
			out = append(out, scene.Measure{Name: fmt.Sprintf("%s(%d)", m.Name, n), Value: got.Value})
		}
	}
	return out
}

// countOf is how many numbers a numbered measure may have.
func countOf(v scene.Value) int {
	if d, ok := v.(*scene.Development); ok {
		return d.Divisions
	}
	return 2
}
