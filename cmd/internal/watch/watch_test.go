package watch

import (
	"context"
	"os"
	"path/filepath"
	"testing"
	"time"

	"epure/cmd/internal/host"
)

// patience is how long a test waits for what must come: many times what it takes,
// so that a busy machine does not fail it.
const patience = 3 * time.Second

// follow returns a Follower of a file with the contents "one".
func follow(t *testing.T) (f *Follower, path string) {
	t.Helper()
	path = filepath.Join(t.TempDir(), "a.epure")
	put(t, path, "one")
	f = New(host.OS{})
	t.Cleanup(f.Close)
	set(f, path)
	return f, path
}

func set(f *Follower, paths ...string) {
	var inputs []Input
	for _, p := range paths {
		in := Input{Name: p}
		if text, err := os.ReadFile(p); err == nil {
			in.Sum = SumOf(text)
		}
		inputs = append(inputs, in)
	}
	f.Set(inputs)
}

func put(t *testing.T, path, text string) {
	t.Helper()
	if err := os.WriteFile(path, []byte(text), 0o666); err != nil {
		t.Fatal(err)
	}
}

// wait says whether a change was told within a time.
func wait(f *Follower, limit time.Duration) bool {
	ctx, stop := context.WithTimeout(context.Background(), limit)
	defer stop()
	return f.Wait(ctx) == nil
}

// later does something a little after the following has begun.
func later(t *testing.T, do func()) {
	done := make(chan struct{})
	time.AfterFunc(20*time.Millisecond, func() { defer close(done); do() })
	t.Cleanup(func() { <-done })
}

func TestPlainSave(t *testing.T) {
	f, path := follow(t)
	later(t, func() { put(t, path, "two") })
	start := time.Now()
	if !wait(f, patience) {
		t.Fatal("a save was not told")
	}
	if took := time.Since(start); took > slowLook {
		t.Errorf("told after %v: by the slow look, not by the event", took)
	}
}

// TestFiftySavesByRename does what many editors do, on the same Follower.
func TestFiftySavesByRename(t *testing.T) {
	f, path := follow(t)
	for i := range 50 {
		fresh := path + ".new"
		put(t, fresh, "text "+string(rune('A'+i)))
		if err := os.Rename(fresh, path); err != nil {
			t.Fatal(err)
		}
		if !wait(f, patience) {
			t.Fatalf("save %d was not told", i)
		}
		set(f, path)
	}
}

func TestChangeBetweenReadingAndSet(t *testing.T) {
	f, path := follow(t)
	f.Set([]Input{{Name: path, Sum: SumOf([]byte("what was read before it changed"))}})
	if !wait(f, patience) {
		t.Fatal("a change that came before Set was lost")
	}
}

func TestTruncateAndWriteIsOneChange(t *testing.T) {
	f, path := follow(t)
	later(t, func() {
		put(t, path, "")
		time.Sleep(quiet + recovery/3) // the first look sees an empty file
		put(t, path, "two")
	})
	if !wait(f, patience) {
		t.Fatal("the save was not told")
	}
	if text, _ := os.ReadFile(path); string(text) != "two" {
		t.Errorf("told while the file held %q", text)
	}
}

func TestEqualContentsAreNoChange(t *testing.T) {
	f, path := follow(t)
	later(t, func() {
		put(t, path, "one")
		_ = os.Chmod(path, 0o600)
	})
	if wait(f, 3*quiet) {
		t.Error("a save of the same contents was told as a change")
	}
}

func TestNeighboursDoNotMatter(t *testing.T) {
	f, path := follow(t)
	later(t, func() { put(t, filepath.Join(filepath.Dir(path), "b.epure"), "new") })
	if wait(f, 3*quiet) {
		t.Error("another file was told as a change")
	}
}

func TestMissingFileAppears(t *testing.T) {
	f, path := follow(t)
	missing := filepath.Join(filepath.Dir(path), "later.epure")
	set(f, path, missing)
	later(t, func() { put(t, missing, "here") })
	if !wait(f, patience) {
		t.Fatal("a file that appeared was not told")
	}
}

func TestFileVanishes(t *testing.T) {
	f, path := follow(t)
	later(t, func() { _ = os.Remove(path) })
	if !wait(f, patience) {
		t.Fatal("a file that vanished was not told")
	}
}

func TestLinkFollowsItsTarget(t *testing.T) {
	f, path := follow(t)
	link := filepath.Join(t.TempDir(), "link.epure")
	if err := os.Symlink(path, link); err != nil {
		t.Skip("no links here")
	}
	set(f, link)
	later(t, func() { put(t, path, "two") })
	start := time.Now()
	if !wait(f, patience) || time.Since(start) > slowLook {
		t.Error("a save of the target was not told at once")
	}
}

func TestInterruptEndsTheWait(t *testing.T) {
	f, _ := follow(t)
	ctx, stop := context.WithCancel(context.Background())
	later(t, stop)
	if err := f.Wait(ctx); err != context.Canceled {
		t.Errorf("Wait ended with %v", err)
	}
}
