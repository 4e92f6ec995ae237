package syntax

import (
	"os"
	"path/filepath"
	"testing"

	"epure/lang/diag"
	"epure/lang/diag/diagtest"
	"epure/lang/source"
)

// TestErrors reads the annotated sources of syntax errors.
func TestErrors(t *testing.T) {
	paths, err := filepath.Glob("../../testdata/errors/syntax-*.epure")
	if err != nil || len(paths) == 0 {
		t.Fatalf("no sources: %v", err)
	}
	for _, path := range paths {
		text, err := os.ReadFile(path)
		if err != nil {
			t.Fatal(err)
		}
		f := source.New(filepath.Base(path), text)
		var bag diag.Bag
		checkSpans(t, Parse(f, &bag))
		diagtest.Check(t, f, bag.Sorted())
	}
}
