package eval

import (
	"math"
	"os"
	"path/filepath"
	"strings"
	"testing"

	"epure/eval/forms"
	"epure/eval/scene"
	"epure/lang/catalogue"
	"epure/lang/check"
	"epure/lang/diag"
	"epure/lang/quantity"
	"epure/lang/source"
	"epure/lang/syntax"
)

// worked parses, checks and evaluates everything of a text.
func worked(name, text string, givens map[string]quantity.Value) (*scene.Scene, []diag.Diagnostic) {
	var bag diag.Bag
	m := check.Check(syntax.Parse(source.New(name, []byte(text)), &bag), &bag)
	s := Evaluate(m, Input{All: true, Givens: givens}, &bag)
	return s, bag.Sorted()
}

// clean works a text out that must have no message.
func clean(t *testing.T, name, text string) *scene.Scene {
	t.Helper()
	s, ds := worked(name, text, nil)
	for _, d := range ds {
		line, _ := d.Span.Position()
		t.Errorf("%s:%d: %s: %s (%s) %v [%s]", name, line, d.Text, d.Span.Text(), d.Reason, d.Notes, d.Code)
	}
	return s
}

// value finds a measure of a thing by name.
func value(t *testing.T, s *scene.Scene, name string) scene.Value {
	t.Helper()
	thing, measure, _ := strings.Cut(name, ".")
	if measure == "" {
		measure = "value"
	}
	for _, th := range s.Things {
		for _, m := range th.Measures {
			if th.Name == thing && m.Name == measure {
				return m.Value
			}
		}
	}
	t.Fatalf("there is no %s", name)
	return nil
}

func TestEveryExampleOfTheCatalogueIsWorkedOut(t *testing.T) {
	for _, f := range append(append([]catalogue.Form(nil), catalogue.Forms...), catalogue.Statements...) {
		clean(t, f.Word, f.Example)
	}
}

func TestEveryExampleFileIsWorkedOut(t *testing.T) {
	files, _ := filepath.Glob("../examples/*.epure")
	if len(files) < 6 {
		t.Fatal("there are fewer than six examples")
	}
	for _, file := range files {
		text, err := os.ReadFile(file)
		if err != nil {
			t.Fatal(err)
		}
		clean(t, filepath.Base(file), string(text))
	}
}

func TestEveryCodeIsProvoked(t *testing.T) {
	for _, e := range diag.Examples(diag.StageEval) {
		_, ds := worked(string(e.Code), e.Example, nil)
		if len(ds) != 1 || ds[0].Code != e.Code {
			t.Errorf("%s: the example gives %v\n%s", e.Code, ds, e.Example)
		}
	}
}

// TestEveryMeasureOfTheCatalogueIsWorkedOut adds a line for each measure to the
// example of its form, and for each function a line of its own.
func TestEveryMeasureOfTheCatalogueIsWorkedOut(t *testing.T) {
	one := func(word, file, subject string, m catalogue.Measure) {
		x := strings.ReplaceAll(m.Example, "$", subject)
		if x == "" {
			x = subject + "." + m.Name
		}
		s := clean(t, word+"."+m.Name, file+"measured = "+x+"\n")
		for _, th := range s.Things {
			if th.Name == "measured" {
				return
			}
		}
		t.Errorf("%s.%s: no value", word, m.Name)
	}
	for _, f := range catalogue.Forms {
		for _, m := range f.Measures {
			one(f.Word, f.Example, f.Subject, m)
		}
	}
	for _, ty := range catalogue.Types {
		for _, m := range ty.Measures {
			one(ty.Name, ty.Example, ty.Subject, m)
		}
	}
	for _, fn := range catalogue.Functions {
		clean(t, fn.Name, "measured = "+fn.Example+"\n")
	}
}

// TestFormsAndConstructorsAgree: each form has one constructor or is made by
// the blocks, each measure one function, and the reverse.
func TestFormsAndConstructorsAgree(t *testing.T) {
	made := forms.Constructors()
	for _, f := range catalogue.Forms {
		drawn := f.Block || f.Kind.Class == catalogue.View || f.Kind.Class == catalogue.Mark
		if _, ok := made[f.Word]; ok == drawn {
			t.Errorf("%s: constructor %v, drawn %v", f.Word, ok, drawn)
		}
		delete(made, f.Word)
		agree(t, f.Word, f.Measures)
	}
	for word := range made {
		t.Errorf("the constructor of %s has no form", word)
	}
	for _, ty := range catalogue.Types {
		agree(t, ty.Name, ty.Measures)
	}
}

func agree(t *testing.T, typ string, ms []catalogue.Measure) {
	t.Helper()
	fs := forms.MeasureFuncs(typ)
	for _, m := range ms {
		if fs[m.Name] == nil {
			t.Errorf("%s.%s has no function", typ, m.Name)
		}
		delete(fs, m.Name)
	}
	for name := range fs {
		t.Errorf("%s.%s is not in the catalogue", typ, name)
	}
}

func close(t *testing.T, what string, got, want, rel float64) {
	t.Helper()
	if math.Abs(got-want) > rel*math.Abs(want) {
		t.Errorf("%s is %.12g, and %.12g was expected", what, got, want)
	}
}
