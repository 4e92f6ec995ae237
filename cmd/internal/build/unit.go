// Package build spells the pipeline, once: read, parse, check, evaluate,
// compose, write. The commands differ only in how far they go and in what they
// print of the result.
//
// A mistake in a file is a diagnostic in the unit's bag. Go's errors are for the
// world. A panic is a broken promise of the program itself: it becomes a Fault
// that names the file, so that whoever reports it can say what was being read.
package build

import (
	"errors"
	"fmt"
	"io/fs"
	"runtime/debug"

	"epure/cmd/internal/host"
	"epure/cmd/internal/watch"
	"epure/eval/scene"
	"epure/lang/diag"
	"epure/lang/source"
)

// Stdin is the name that stands for standard input.
const Stdin = "-"

// maxSource is the greatest length of a source file, bytes: a hundred times what
// a year's work of a drawing office would fill, and small enough that a device
// without an end does no harm.
const maxSource = 64 << 20

// Unit is one source file on its way through the pipeline.
type Unit struct {
	Name      string       // as it is printed
	File      *source.File // nil when it could not be read
	Givens    []Given      // that the file has
	Scenes    []*scene.Scene
	Sheets    []Sheet
	Artefacts []Artefact
	Bag       diag.Bag
	Read      []watch.Input // the files that were read, or that were looked for in vain
	Fault     *Fault        // set when the program itself failed

	front front
}

// Fault is a panic, caught.
type Fault struct {
	Name  string // of the file that was being worked on
	Value string
	Stack []byte
}

// Error names the file and what went wrong.
func (f *Fault) Error() string { return fmt.Sprintf("internal fault at %s: %s", f.Name, f.Value) }

// Failed says whether the file is wrong: it has errors, or a verify does not hold.
func (u *Unit) Failed() bool {
	if u.Bag.HasErrors() {
		return true
	}
	for _, s := range u.Scenes {
		for _, v := range s.Verify {
			if !v.Holds {
				return true
			}
		}
	}
	return false
}

// Broken says whether the file has errors besides a verify that does not hold:
// then its things are not all known.
func (u *Unit) Broken() bool {
	if u.Fault != nil {
		return true
	}
	for _, d := range u.Bag.Sorted() {
		if d.Severity == diag.Error && d.Code != verifyFails {
			return true
		}
	}
	return false
}

// Load reads a file, parses and checks it. What is wrong is in the unit's bag.
func Load(h *host.Host, name string) *Unit {
	u := &Unit{Name: host.DisplayName(name)}
	u.guard(func() { u.open(h, name) })
	if u.File != nil {
		u.guard(u.parse)
	}
	return u
}

// open reads the file.
func (u *Unit) open(h *host.Host, name string) {
	text, err := read(h, name)
	if name != Stdin {
		u.Read = []watch.Input{input(name, text, err)}
	}
	if err != nil {
		u.Bag.Add(unreadable(u.Name, err))
		return
	}
	u.File = source.New(u.Name, text)
}

func read(h *host.Host, name string) ([]byte, error) {
	if name == Stdin {
		return host.ReadAll(h.In, maxSource)
	}
	return h.Disk.Read(name, maxSource)
}

func input(name string, text []byte, err error) watch.Input {
	if err != nil {
		return watch.Input{Name: name}
	}
	return watch.Input{Name: name, Sum: watch.SumOf(text)}
}

// unreadable says why a file could not be read.
func unreadable(name string, err error) diag.Diagnostic {
	text := "this file cannot be read"
	switch {
	case errors.Is(err, fs.ErrNotExist):
		text = "there is no such file"
	case errors.Is(err, host.ErrTooLong):
		text = fmt.Sprintf("this file is longer than %d MB", maxSource>>20)
	}
	d := diag.New("cannot-read", source.New(name, nil).Span(0, 0), text)
	if !errors.Is(err, fs.ErrNotExist) && !errors.Is(err, host.ErrTooLong) {
		d = d.Because("the system says: " + Cause(err))
	}
	return d
}

// guard runs one stage and turns a panic into the unit's fault.
func (u *Unit) guard(stage func()) {
	if u.Fault != nil {
		return
	}
	defer func() {
		if p := recover(); p != nil {
			u.Fault = &Fault{Name: u.Name, Value: fmt.Sprint(p), Stack: debug.Stack()}
		}
	}()
	stage()
}

// verifyFails is the code of a verify that does not hold.
const verifyFails diag.Code = "verify-fails"
