package build

import (
	"bytes"
	"errors"
	"fmt"
	"path/filepath"

	"epure/cmd/internal/host"
)

// Artefact is one output, finished in memory.
type Artefact struct {
	Name      string // of the file, without a folder
	MediaType string
	Bytes     []byte
}

// Outcome says what became of an artefact.
type Outcome struct {
	Path    string // of the file, as it is printed
	Changed bool   // false: it was there already, with the same bytes, and was left alone
}

// WriteError is the error of an output that could not be written.
type WriteError struct {
	Path string
	Err  error
}

// Error gives the path and the cause in the words of the system.
func (e *WriteError) Error() string { return fmt.Sprintf("cannot write %s: %s", e.Path, Cause(e.Err)) }

// Unwrap returns the cause.
func (e *WriteError) Unwrap() error { return e.Err }

// Cause returns the words of a system's error without the name of the call and
// of the file, which is often a temporary one.
func Cause(err error) string {
	for {
		inner := errors.Unwrap(err)
		if inner == nil {
			return err.Error()
		}
		err = inner
	}
}

// Put writes artefacts into a folder, which it makes when it is not there. All
// are written under other names first; only when every one is safe on the disk
// are they renamed. So each file is old or new at every moment, never cut short,
// and when the disk fills up nothing has changed. Files that have the same bytes
// already are not touched. The error is a *WriteError.
func Put(d host.Disk, folder string, artefacts []Artefact) ([]Outcome, error) {
	outcomes := make([]Outcome, len(artefacts))
	var pending []part
	for i, a := range artefacts {
		path := filepath.Join(folder, a.Name)
		outcomes[i] = Outcome{Path: filepath.ToSlash(path), Changed: !same(d, path, a.Bytes)}
		if outcomes[i].Changed {
			pending = append(pending, part{path: path, bytes: a.Bytes})
		}
	}
	if len(pending) == 0 {
		return outcomes, nil
	}
	if err := d.MakeFolder(folder); err != nil {
		return nil, &WriteError{Path: folder, Err: err}
	}
	return outcomes, replace(d, folder, pending)
}

// same says whether a file has exactly these bytes.
func same(d host.Disk, path string, want []byte) bool {
	have, err := d.Read(path, int64(len(want)))
	return err == nil && bytes.Equal(have, want)
}

// part is one file on its way.
type part struct {
	path, temporary string
	bytes           []byte
}

// replace writes all parts, then renames them. Whatever happens, no temporary file stays.
func replace(d host.Disk, folder string, parts []part) error {
	defer func() {
		for _, p := range parts {
			if p.temporary != "" {
				_ = d.Remove(p.temporary)
			}
		}
	}()
	for i := range parts {
		if err := parts[i].write(d, folder); err != nil {
			return &WriteError{Path: parts[i].path, Err: err}
		}
	}
	for i := range parts {
		if err := d.Rename(parts[i].temporary, parts[i].path); err != nil {
			return &WriteError{Path: parts[i].path, Err: err}
		}
		parts[i].temporary = ""
	}
	if err := d.SyncFolder(folder); err != nil {
		return &WriteError{Path: folder, Err: err}
	}
	return nil
}

// write puts the bytes on the disk under a temporary name.
func (p *part) write(d host.Disk, folder string) error {
	f, err := d.CreateBeside(folder)
	if err != nil {
		return err
	}
	p.temporary = f.Name()
	_, err = f.Write(p.bytes)
	if err == nil {
		err = f.Sync()
	}
	if closing := f.Close(); err == nil {
		err = closing
	}
	return err
}
