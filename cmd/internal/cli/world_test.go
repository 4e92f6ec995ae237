package cli

import (
	"strings"
	"testing"

	"epure/cmd/internal/host/hosttest"
)

// plate is a source with one figure.
const plate = `given foot = 40 mm
K = cone diameter foot height 50 mm
verify K.slant > 10 mm
view = figure "Plate" scale 1:1 {
    front = elevation of K
}
`

// run runs a command in a world with these files.
func run(files map[string]string, args ...string) (*hosttest.World, int) {
	w := hosttest.New(files, args...)
	return w, Run(&w.Host)
}

// says fails the test unless the words on standard error hold a text.
func says(t *testing.T, w *hosttest.World, want string) {
	t.Helper()
	if !strings.Contains(w.Err.String(), want) {
		t.Errorf("standard error says %q, want %q", w.Err, want)
	}
}
