package eval

import (
	"os"
	"path/filepath"
	"testing"

	"epure/lang/catalogue"
	"epure/lang/diag"
)

// FuzzEvaluate: no text makes the whole of reading, checking and evaluating
// panic, and every diagnostic lies inside the file.
func FuzzEvaluate(f *testing.F) {
	for _, form := range catalogue.Forms {
		f.Add(form.Example)
	}
	for _, e := range append(diag.Examples(diag.StageCheck), diag.Examples(diag.StageEval)...) {
		if e.Code != "too-many-tolerances" {
			f.Add(e.Example)
		}
	}
	files, _ := filepath.Glob("../examples/*.epure")
	for _, file := range files {
		if text, err := os.ReadFile(file); err == nil {
			f.Add(string(text))
		}
	}
	f.Fuzz(func(t *testing.T, text string) {
		_, ds := worked("fuzz", text, nil)
		for _, d := range ds {
			if d.Span.Start < 0 || d.Span.End < d.Span.Start || d.Span.End > len(text) {
				t.Errorf("%s: span %d..%d of %d", d.Code, d.Span.Start, d.Span.End, len(text))
			}
		}
	})
}
