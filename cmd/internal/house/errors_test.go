package house

import (
	"os"
	"path/filepath"
	"testing"

	"epure/lang/diag/diagtest"
)

// TestDrawnErrors runs the annotated sources whose mistakes come out when sheets are composed.
func TestDrawnErrors(t *testing.T) {
	files, _ := filepath.Glob(filepath.Join(top(t), "testdata/errors/drawn-*.epure"))
	if len(files) == 0 {
		t.Fatal("there are none")
	}
	for _, file := range files {
		text, err := os.ReadFile(file)
		if err != nil {
			t.Fatal(err)
		}
		u := whole(string(text))
		diagtest.Check(t, u.File, u.Bag.Sorted())
	}
}
