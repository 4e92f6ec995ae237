package main

import (
	"os"
	"os/exec"
	"path/filepath"
	"testing"
	"time"
)

// kills is how many times the program is killed, each time a little later:
// from before it has begun to after it has ended.
const kills = 40

// TestKilledAnywhere kills the real program while it draws over old outputs.
// Whenever that happens, each output is old or new and never a piece.
func TestKilledAnywhere(t *testing.T) {
	program := named(t)
	folder := t.TempDir()
	source := filepath.Join(folder, "a.epure")
	write(t, source, "K = cone diameter 40 mm height 50 mm\nP = plane through (0, 0, 20 mm) tilt 30° facing 0°\nB = part of K below P\nD = development of B\n"+
		"view = sheet \"Plate\" {\n    front = elevation of B\n    plan of B from front\n    pattern of D\n}\n")
	outputs := []string{filepath.Join(folder, "out", "view.svg"), filepath.Join(folder, "out", "view.pdf")}
	draw := func() *exec.Cmd { return exec.Command(program, "draw", source, "-o", filepath.Join(folder, "out")) }

	start := time.Now()
	if err := draw().Run(); err != nil {
		t.Fatal(err)
	}
	whole := time.Since(start)
	fresh := []string{read(t, outputs[0]), read(t, outputs[1])}

	killed, replaced := 0, 0
	for k := range kills {
		for _, path := range outputs {
			write(t, path, "old")
		}
		cmd := draw()
		if err := cmd.Start(); err != nil {
			t.Fatal(err)
		}
		time.Sleep(whole * time.Duration(k) / (kills * 2 / 3))
		_ = cmd.Process.Kill()
		if cmd.Wait() != nil {
			killed++
		}
		for i, path := range outputs {
			switch read(t, path) {
			case "old":
			case fresh[i]:
				replaced++
			default:
				t.Fatalf("killed after %v: %s is neither old nor new", whole*time.Duration(k)/kills, filepath.Base(path))
			}
		}
	}
	if killed == 0 || replaced == 0 {
		t.Errorf("killed %d times, %d outputs replaced: the times of killing were no test", killed, replaced)
	}
}

// named returns the program: the test binary, which is the program when it is
// called by the program's name.
func named(t *testing.T) string {
	t.Helper()
	self, err := os.Executable()
	if err != nil {
		t.Fatal(err)
	}
	link := filepath.Join(t.TempDir(), "epure")
	if err := os.Symlink(self, link); err != nil {
		t.Skip("no links here")
	}
	return link
}

func write(t *testing.T, path, text string) {
	t.Helper()
	if err := os.WriteFile(path, []byte(text), 0o666); err != nil {
		t.Fatal(err)
	}
}

func read(t *testing.T, path string) string {
	t.Helper()
	text, err := os.ReadFile(path)
	if err != nil {
		t.Fatal(err)
	}
	return string(text)
}
