package house

import (
	"flag"
	"os"
	"path/filepath"
	"testing"

	"epure/lang/manual"
)

var update = flag.Bool("update", false, "write the generated pages again")

func TestManualIsTheCatalogue(t *testing.T) {
	path := filepath.Join(top(t), "lang", "manual", "MANUAL.md")
	want := manual.Page()
	if *update {
		if err := os.WriteFile(path, []byte(want), 0o666); err != nil {
			t.Fatal(err)
		}
	}
	have, err := os.ReadFile(path)
	if err != nil {
		t.Fatal(err)
	}
	if string(have) != want {
		t.Error("MANUAL.md is not what the catalogue says; go test ./cmd/internal/house -run Manual -update writes it")
	}
}

// TestEveryWordHasAnEntry asks for each word of the list, as a reader would.
func TestEveryWordHasAnEntry(t *testing.T) {
	for _, w := range manual.Words() {
		if text, ok := manual.Entry(w); !ok || len(text) < 10 {
			t.Errorf("`explain %s` says %q", w, text)
		}
	}
}
