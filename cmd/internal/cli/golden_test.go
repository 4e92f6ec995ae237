package cli

import (
	"bytes"
	"flag"
	"os"
	"path/filepath"
	"strings"
	"testing"

	"epure/cmd/internal/host/hosttest"
)

var update = flag.Bool("update", false, "write testdata/golden again")

const golden = "../../../testdata/golden"

// drawn draws a file in a world of its own and returns what it wrote.
func drawn(t *testing.T, name string, text []byte) map[string]string {
	t.Helper()
	w := hosttest.New(map[string]string{name: string(text)}, "draw", name, "-o", "out")
	if status := Run(&w.Host); status != 0 {
		t.Fatalf("%s: exit status %d: %s", name, status, w.Err.String())
	}
	out := map[string]string{}
	for _, f := range w.Disk.Names() {
		if strings.HasPrefix(f, "out/") {
			out[strings.TrimPrefix(f, "out/")] = string(w.Disk.Files[f])
		}
	}
	return out
}

// TestGolden draws every example twice: both times the same bytes, and those of
// testdata/golden/<example>. A golden file that nobody draws fails too.
func TestGolden(t *testing.T) {
	files, _ := filepath.Glob("../../../examples/*.epure")
	if len(files) < 6 {
		t.Fatal("there are fewer than six examples")
	}
	known := map[string]bool{}
	for _, file := range files {
		name := filepath.Base(file)
		text, err := os.ReadFile(file)
		if err != nil {
			t.Fatal(err)
		}
		first, second := drawn(t, name, text), drawn(t, name, text)
		if len(first) == 0 {
			t.Errorf("%s draws nothing", name)
		}
		for out, content := range first {
			if second[out] != content {
				t.Errorf("%s: %s differs from run to run", name, out)
			}
			path := filepath.Join(golden, strings.TrimSuffix(name, ".epure"), out)
			known[filepath.ToSlash(path)] = true
			compareGolden(t, path, []byte(content))
		}
	}
	orphans(t, known)
}

func compareGolden(t *testing.T, path string, content []byte) {
	t.Helper()
	if *update {
		if err := os.MkdirAll(filepath.Dir(path), 0o777); err != nil {
			t.Fatal(err)
		}
		if err := os.WriteFile(path, content, 0o666); err != nil {
			t.Fatal(err)
		}
	}
	want, err := os.ReadFile(path)
	if err != nil {
		t.Errorf("%v (go test ./cmd/internal/cli -run Golden -update writes it)", err)
		return
	}
	if !bytes.Equal(want, content) {
		t.Errorf("%s is not what is drawn now; look at both, then write it again with -update", path)
	}
}

func orphans(t *testing.T, known map[string]bool) {
	t.Helper()
	files, _ := filepath.Glob(golden + "/*/*")
	for _, f := range files {
		if known[filepath.ToSlash(f)] {
			continue
		}
		if *update {
			_ = os.Remove(f)
			continue
		}
		t.Errorf("%s is drawn by no example", f)
	}
}
