package eval

import (
	"os"
	"path/filepath"
	"strings"
	"testing"

	"epure/lang/check"
	"epure/lang/diag"
	"epure/lang/diag/diagtest"
	"epure/lang/source"
	"epure/lang/syntax"
)

// TestAnnotatedSources runs every file of testdata/errors whose mistakes reach
// beyond the syntax and compares codes, places and words.
func TestAnnotatedSources(t *testing.T) {
	files, _ := filepath.Glob("../testdata/errors/*.epure")
	seen := map[diag.Code]bool{}
	for _, file := range files {
		name := filepath.Base(file)
		if strings.HasPrefix(name, "syntax-") || strings.HasPrefix(name, "drawn-") {
			continue
		}
		text, err := os.ReadFile(file)
		if err != nil {
			t.Fatal(err)
		}
		t.Run(name, func(t *testing.T) {
			f := source.New(name, text)
			var bag diag.Bag
			m := check.Check(syntax.Parse(f, &bag), &bag)
			Evaluate(m, Input{All: true}, &bag)
			diagtest.Check(t, f, bag.Sorted())
			for _, d := range bag.Sorted() {
				seen[d.Code] = true
			}
		})
	}
	for _, e := range append(diag.Examples(diag.StageCheck), diag.Examples(diag.StageEval)...) {
		if !seen[e.Code] {
			t.Errorf("%s has no source in testdata/errors", e.Code)
		}
	}
}
