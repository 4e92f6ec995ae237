// Package hosttest is a world for tests: a disk in memory that fails when it is
// told to, streams that are kept, a clock that stands still.
package hosttest

import (
	"bytes"
	"context"
	"errors"
	"fmt"
	"io/fs"
	"maps"
	"path"
	"slices"
	"strings"
	"time"

	"epure/cmd/internal/host"
)

// World is a host whose every part can be looked at afterwards.
type World struct {
	host.Host
	Disk     *Disk
	Out, Err *bytes.Buffer
	Env      map[string]string
}

// New returns a world with these files.
func New(files map[string]string, args ...string) *World {
	w := &World{Disk: &Disk{Files: map[string]string{}}, Out: &bytes.Buffer{}, Err: &bytes.Buffer{}, Env: map[string]string{}}
	maps.Copy(w.Disk.Files, files)
	w.Host = host.Host{
		Args: args, In: strings.NewReader(""), Out: w.Out, Err: w.Err, Disk: w.Disk,
		Getenv:        func(name string) string { return w.Env[name] },
		Now:           func() time.Time { return time.Unix(0, 0) },
		Interruptible: func() (context.Context, func()) { return context.WithCancel(context.Background()) },
		After:         func(time.Duration, func()) func() { return func() {} },
	}
	return w
}

// ErrBroken is the error of a disk that fails because a test wants it.
var ErrBroken = errors.New("the disk is broken")

// Disk is a disk in memory. Every step that changes it is counted, and the
// FailAt-th fails (0: none). Removing never fails, so that a test sees what the
// program leaves of its own doing.
type Disk struct {
	Files  map[string]string
	FailAt int
	Steps  int
	Done   []string // the steps, in words
}

// step counts a change, and fails when it is its turn.
func (d *Disk) step(format string, args ...any) error {
	d.Steps++
	d.Done = append(d.Done, fmt.Sprintf(format, args...))
	if d.Steps == d.FailAt {
		return ErrBroken
	}
	return nil
}

// Read returns a file.
func (d *Disk) Read(name string, limit int64) ([]byte, error) {
	text, ok := d.Files[path.Clean(name)]
	if !ok {
		return nil, &fs.PathError{Op: "open", Path: name, Err: fs.ErrNotExist}
	}
	return host.ReadAll(strings.NewReader(text), limit)
}

// IsFile says whether a file is there.
func (d *Disk) IsFile(name string) bool {
	_, ok := d.Files[path.Clean(name)]
	return ok
}

// MakeFolder does nothing but count: a folder is there as soon as a file is.
func (d *Disk) MakeFolder(name string) error { return d.step("make folder %s", name) }

// CreateBeside makes an empty file.
func (d *Disk) CreateBeside(folder string) (host.File, error) {
	if err := d.step("create in %s", folder); err != nil {
		return nil, err
	}
	f := &file{disk: d, name: path.Join(folder, fmt.Sprintf(".epure-%d.part", d.Steps))}
	d.Files[f.name] = ""
	return f, nil
}

// Rename gives a file another name.
func (d *Disk) Rename(from, to string) error {
	if err := d.step("rename to %s", to); err != nil {
		return err
	}
	d.Files[path.Clean(to)] = d.Files[path.Clean(from)]
	delete(d.Files, path.Clean(from))
	return nil
}

// Remove removes a file.
func (d *Disk) Remove(name string) error {
	delete(d.Files, path.Clean(name))
	return nil
}

// SyncFolder counts.
func (d *Disk) SyncFolder(name string) error { return d.step("sync folder %s", name) }

// Resolve returns the name, made absolute.
func (d *Disk) Resolve(name string) string { return path.Join("/", name) }

// Names returns the names of all files, sorted.
func (d *Disk) Names() []string { return slices.Sorted(maps.Keys(d.Files)) }

// file is a file being written to a Disk.
type file struct {
	disk *Disk
	name string
}

// Name returns the name.
func (f *file) Name() string { return f.name }

// Write appends; when it fails, half has been written.
func (f *file) Write(p []byte) (int, error) {
	if err := f.disk.step("write %s", f.name); err != nil {
		f.disk.Files[f.name] += string(p[:len(p)/2])
		return len(p) / 2, err
	}
	f.disk.Files[f.name] += string(p)
	return len(p), nil
}

// Sync counts.
func (f *file) Sync() error { return f.disk.step("sync %s", f.name) }

// Close counts.
func (f *file) Close() error { return f.disk.step("close %s", f.name) }
