package build

import (
	"errors"
	"strings"
	"testing"

	"epure/cmd/internal/host/hosttest"
)

// twoOutputs are new contents for two files that are there already.
func twoOutputs() ([]Artefact, map[string]string) {
	return []Artefact{{Name: "a.svg", Bytes: []byte("new a")}, {Name: "b.pdf", Bytes: []byte("new b, longer")}},
		map[string]string{"out/a.svg": "old a", "out/b.pdf": "old b", "out/c.svg": "another"}
}

func TestPutReplacesAll(t *testing.T) {
	artefacts, files := twoOutputs()
	d := hosttest.New(files).Disk
	outcomes, err := Put(d, "out", artefacts)
	if err != nil {
		t.Fatal(err)
	}
	if got := outcomes[0]; got != (Outcome{Path: "out/a.svg", Changed: true}) {
		t.Errorf("outcome %v", got)
	}
	if d.Files["out/a.svg"] != "new a" || d.Files["out/b.pdf"] != "new b, longer" || d.Files["out/c.svg"] != "another" {
		t.Errorf("files are %v", d.Files)
	}
}

func TestPutLeavesEqualFilesAlone(t *testing.T) {
	d := hosttest.New(map[string]string{"out/a.svg": "same"}).Disk
	outcomes, err := Put(d, "out", []Artefact{{Name: "a.svg", Bytes: []byte("same")}})
	if err != nil || outcomes[0].Changed || d.Steps != 0 {
		t.Errorf("outcome %v, error %v, steps %q", outcomes, err, d.Done)
	}
	// a longer file that begins alike is not equal
	d.Files["out/a.svg"] = "same and more"
	if outcomes, _ = Put(d, "out", []Artefact{{Name: "a.svg", Bytes: []byte("same")}}); !outcomes[0].Changed {
		t.Error("a file that only begins alike was taken for equal")
	}
}

// TestPutIsWholeOrAbsent lets every step fail in turn. Whatever fails, each file
// is old or new, never a piece, and no temporary file stays.
func TestPutIsWholeOrAbsent(t *testing.T) {
	failures := 0
	for n := 1; ; n++ {
		artefacts, files := twoOutputs()
		d := hosttest.New(files).Disk
		d.FailAt = n
		_, err := Put(d, "out", artefacts)
		if err == nil {
			break
		}
		failures++
		var w *WriteError
		if !errors.As(err, &w) || !errors.Is(err, hosttest.ErrBroken) || !strings.HasPrefix(err.Error(), "cannot write out") {
			t.Errorf("step %d: error %v", n, err)
		}
		for _, a := range artefacts {
			if got := d.Files["out/"+a.Name]; got != string(a.Bytes) && got != files["out/"+a.Name] {
				t.Errorf("step %d (%s): %s holds %q", n, d.Done[n-1], a.Name, got)
			}
		}
		if len(d.Names()) != len(files) {
			t.Errorf("step %d: files %q", n, d.Names())
		}
	}
	// two files: the folder, four steps each to write, one to rename, the folder again
	if failures != 1+2*4+2+1 {
		t.Errorf("%d steps could fail", failures)
	}
}

func TestNothingIsRenamedBeforeAllIsWritten(t *testing.T) {
	artefacts, files := twoOutputs()
	d := hosttest.New(files).Disk
	if _, err := Put(d, "out", artefacts); err != nil {
		t.Fatal(err)
	}
	renamed := false
	for _, step := range d.Done {
		renamed = renamed || strings.HasPrefix(step, "rename")
		if renamed && (strings.HasPrefix(step, "write") || strings.HasPrefix(step, "sync out/.")) {
			t.Errorf("%q comes after a rename", step)
		}
	}
}

func TestCauseIsTheSystemsWord(t *testing.T) {
	_, err := hosttest.New(nil).Disk.Read("x", 1)
	if got := Cause(err); got != "file does not exist" {
		t.Errorf("cause %q", got)
	}
}
