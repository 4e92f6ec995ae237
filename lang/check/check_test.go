package check

import (
	"os"
	"path/filepath"
	"testing"

	"epure/lang/catalogue"
	"epure/lang/diag"
	"epure/lang/source"
	"epure/lang/syntax"
)

// checked parses and checks a text.
func checked(name, text string) (*Model, []diag.Diagnostic) {
	var bag diag.Bag
	m := Check(syntax.Parse(source.New(name, []byte(text)), &bag), &bag)
	return m, bag.Sorted()
}

func TestEveryExampleOfTheCatalogueChecks(t *testing.T) {
	for _, f := range append(append([]catalogue.Form(nil), catalogue.Forms...), catalogue.Statements...) {
		if _, ds := checked(f.Word, f.Example); len(ds) > 0 {
			t.Errorf("%s: %s: %s (%s)\n%s", f.Word, ds[0].Text, ds[0].Span.Text(), ds[0].Reason, f.Example)
		}
	}
}

func TestEveryExampleFileChecks(t *testing.T) {
	files, _ := filepath.Glob("../../examples/*.epure")
	if len(files) == 0 {
		t.Fatal("there are no examples")
	}
	for _, file := range files {
		text, err := os.ReadFile(file)
		if err != nil {
			t.Fatal(err)
		}
		_, ds := checked(filepath.Base(file), string(text))
		for _, d := range ds {
			line, _ := d.Span.Position()
			t.Errorf("%s:%d: %s: %s (%s)", file, line, d.Text, d.Span.Text(), d.Reason)
		}
	}
}

func TestEveryCodeIsProvoked(t *testing.T) {
	for _, e := range diag.Examples(diag.StageCheck) {
		_, ds := checked(string(e.Code), e.Example)
		found := false
		for _, d := range ds {
			found = found || d.Code == e.Code
		}
		if !found {
			t.Errorf("%s: the example gives %v\n%s", e.Code, ds, e.Example)
		}
	}
}
