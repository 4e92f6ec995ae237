package cli

import (
	"bytes"
	"context"
	"os"
	"path/filepath"
	"strings"
	"sync"
	"testing"
	"time"

	"epure/cmd/internal/host"
	"epure/cmd/internal/host/hosttest"
)

// stream keeps what is written, for a reader that runs beside the writer.
type stream struct {
	mu sync.Mutex
	b  bytes.Buffer
}

func (s *stream) Write(p []byte) (int, error) {
	s.mu.Lock()
	defer s.mu.Unlock()
	return s.b.Write(p)
}

// take waits until a text was written, and returns all up to now, once.
func (s *stream) take(t *testing.T, want string) string {
	t.Helper()
	for end := time.Now().Add(5 * time.Second); time.Now().Before(end); time.Sleep(time.Millisecond) {
		s.mu.Lock()
		if text := s.b.String(); strings.Contains(text, want) {
			s.b.Reset()
			s.mu.Unlock()
			return text
		}
		s.mu.Unlock()
	}
	t.Fatalf("nothing says %q", want)
	return ""
}

// TestWatch goes through a morning's work: draw, a good save by rename, a save
// with a mistake, the mistake mended, the end.
func TestWatch(t *testing.T) {
	folder := t.TempDir()
	path, out := filepath.Join(folder, "a.epure"), filepath.Join(folder, "out")
	save := func(text string) {
		t.Helper()
		fresh := filepath.Join(folder, ".a.epure.swp")
		if err := os.WriteFile(fresh, []byte(text), 0o666); err != nil {
			t.Fatal(err)
		}
		if err := os.Rename(fresh, path); err != nil {
			t.Fatal(err)
		}
	}
	drawing := func() string {
		text, _ := os.ReadFile(filepath.Join(out, "view.svg"))
		return string(text)
	}
	save(plate)

	ctx, interrupt := context.WithCancel(context.Background())
	words := &stream{}
	w := hosttest.New(nil, "watch", path, "-o", out)
	w.Host.Disk, w.Host.Err, w.Host.Now = host.OS{}, words, time.Now
	w.Host.Interruptible = func() (context.Context, func()) { return ctx, func() {} }
	ended := make(chan int)
	go func() { ended <- Run(&w.Host) }()

	words.take(t, "redrawn in")
	first := drawing()
	save(strings.Replace(plate, "40 mm", "60 mm", 1))
	words.take(t, "redrawn in")
	second := drawing()
	if first == "" || second == "" || first == second {
		t.Error("a save by rename was not drawn")
	}
	save(plate + "x = y\n")
	if said := words.take(t, "redrawn in"); !strings.Contains(said, "[unknown-name]") {
		t.Errorf("a mistake was not told: %q", said)
	}
	if drawing() != second {
		t.Error("a mistake did not leave the last good drawing alone")
	}
	save(plate)
	words.take(t, "1 drawing: 2 files written; redrawn in")
	if drawing() != first {
		t.Error("the mended file was not drawn as at first")
	}
	interrupt()
	if status := <-ended; status != Done {
		t.Errorf("an interrupt ends with status %d", status)
	}
}

func TestWatchStopsAtAWrongCommandLine(t *testing.T) {
	w, status := run(map[string]string{"a.epure": plate}, "watch", "a.epure", "--given", "foott=1mm")
	if status != Usage {
		t.Errorf("status %d", status)
	}
	says(t, w, "write `foot`")
}
