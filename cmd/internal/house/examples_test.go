package house

import (
	"fmt"
	"path"
	"regexp"
	"slices"
	"strings"
	"testing"

	"epure/cmd/internal/build"
	"epure/cmd/internal/host/hosttest"
	"epure/lang/catalogue"
	"epure/lang/diag"
)

// whole takes a source through the whole pipeline, as `check` does, and returns
// what it found.
func whole(source string) *build.Unit {
	w := hosttest.New(map[string]string{"example.epure": source})
	u := build.Load(&w.Host, "example.epure")
	u.Run(build.Job{All: true, Compose: true, Formats: []string{"svg", "pdf"}}, &w.Host)
	return u
}

// right fails the test when a source has anything wrong, with the diagnostics.
func right(t *testing.T, what, source string) *build.Unit {
	t.Helper()
	u := whole(source)
	var said strings.Builder
	if u.Failed() || u.Fault != nil {
		_ = diag.WriteText(&said, u.Bag.Sorted(), diag.Style{})
		if u.Fault != nil {
			fmt.Fprintf(&said, "%v\n", u.Fault)
		}
		t.Errorf("the example of %s is wrong:\n%s", what, said.String())
	}
	return u
}

// owner is a form or a feature with its example.
type owner struct {
	name, example, subject string
	measures               []catalogue.Measure
}

func owners() []owner {
	var out []owner
	for _, f := range catalogue.Forms {
		out = append(out, owner{f.Word, f.Example, f.Subject, f.Measures})
	}
	for _, y := range catalogue.Types {
		out = append(out, owner{y.Name, y.Example, y.Subject, y.Measures})
	}
	return out
}

func TestExamplesOfForms(t *testing.T) {
	for i := range catalogue.Forms {
		f := &catalogue.Forms[i]
		u := right(t, f.Word, f.Example)
		if f.Block && len(u.Sheets) == 0 {
			t.Errorf("the example of %s draws nothing", f.Word)
		}
	}
	for i := range catalogue.Statements {
		right(t, catalogue.Statements[i].Word, catalogue.Statements[i].Example)
	}
}

// TestEveryClauseIsShown wants each clause, and each word that it takes, in the
// example of its form, in a statement of that form.
func TestEveryClauseIsShown(t *testing.T) {
	for i := range catalogue.Forms {
		f := &catalogue.Forms[i]
		text := strings.Join(statementsOf(f.Word, f.Example), "\n")
		for _, c := range f.Clauses {
			if !regexp.MustCompile(`\b` + c.Word + `\b`).MatchString(text) {
				t.Errorf("the example of %s does not show its clause %s", f.Word, c.Word)
			}
		}
	}
}

// statementsOf returns the statements of a form in a source, continuation lines joined.
func statementsOf(form, source string) []string {
	var out []string
	pattern := regexp.MustCompile(`^\s*(\w+ = )?` + form + `\b`)
	taken := false
	for _, line := range strings.Split(source, "\n") {
		switch {
		case pattern.MatchString(line):
			out, taken = append(out, line), true
		case taken && strings.HasPrefix(line, "    ") && !strings.HasSuffix(out[len(out)-1], "{") && !strings.Contains(line, "="):
			out[len(out)-1] += line
		default:
			taken = false
		}
	}
	return out
}

// TestExamplesOfMeasures asks for every measure of every form and feature, as
// one more line of its example.
func TestExamplesOfMeasures(t *testing.T) {
	for _, o := range owners() {
		source := o.example
		for i, m := range o.measures {
			source += fmt.Sprintf("measure_%d = %s\n", i, measured(o, m))
		}
		if len(o.measures) == 0 {
			continue
		}
		u := right(t, "the measures of "+o.name, source)
		if len(u.Scenes) == 0 || u.Failed() {
			continue
		}
		for i, m := range o.measures {
			name := fmt.Sprintf("measure_%d", i)
			if !slices.ContainsFunc(u.Names(), func(n string) bool { return n == name }) {
				t.Errorf("%s.%s has no value", o.name, m.Name)
			}
		}
	}
}

// measured is the expression that shows a measure.
func measured(o owner, m catalogue.Measure) string {
	if m.Example == "" {
		return o.subject + "." + m.Name
	}
	return strings.ReplaceAll(m.Example, "$", o.subject)
}

func TestExamplesOfFunctions(t *testing.T) {
	source := ""
	for i, f := range catalogue.Functions {
		source += fmt.Sprintf("example_%d = %s\n", i, f.Example)
	}
	for i, b := range catalogue.Builtins {
		if b.Kind.Class == catalogue.Plane {
			source += fmt.Sprintf("tilt_%d = %s.tilt\n", i, b.Name)
			continue
		}
		source += fmt.Sprintf("name_%d = %s\n", i, b.Name)
	}
	right(t, "the functions and names", source)
}

// TestExamplesOfMessages wants each source to give rise to the message that it is
// an example of.
func TestExamplesOfMessages(t *testing.T) {
	for _, e := range diag.Codes() {
		if e.Example == "" {
			continue
		}
		u := whole(e.Example)
		if u.Fault != nil {
			t.Errorf("the example of %s: %v", e.Code, u.Fault)
		}
		if !slices.ContainsFunc(u.Bag.Sorted(), func(d diag.Diagnostic) bool { return d.Code == e.Code }) {
			var said strings.Builder
			_ = diag.WriteText(&said, u.Bag.Sorted(), diag.Style{Plain: true})
			t.Errorf("the example of %s gives rise to:\n%s", e.Code, said.String())
		}
	}
}

// TestExampleFiles takes the files of the examples folder through the pipeline.
func TestExampleFiles(t *testing.T) {
	texts, err := Texts(top(t))
	if err != nil {
		t.Fatal(err)
	}
	found := 0
	for name, text := range texts {
		if path.Dir(name) == "examples" && path.Ext(name) == build.Extension {
			found++
			if u := right(t, name, string(text)); len(u.Artefacts) == 0 {
				t.Errorf("%s draws nothing", name)
			}
		}
	}
	if found < 6 {
		t.Errorf("only %d example files", found)
	}
}
