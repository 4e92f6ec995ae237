package host

import (
	"errors"
	"fmt"
	"io/fs"
	"os"
	"path/filepath"
)

// OS is the disk of the operating system.
type OS struct{}

// Read returns the whole contents of a file of at most limit bytes.
func (OS) Read(name string, limit int64) ([]byte, error) {
	f, err := os.Open(name)
	if err != nil {
		return nil, err
	}
	defer f.Close()
	return ReadAll(f, limit)
}

// IsFile says whether name is there and is no folder.
func (OS) IsFile(name string) bool {
	info, err := os.Stat(name)
	return err == nil && !info.IsDir()
}

// MakeFolder makes a folder and those above it.
func (OS) MakeFolder(name string) error { return os.MkdirAll(name, 0o777) }

// CreateBeside makes a new, empty file in a folder, with the permissions of any
// file that the user makes: it is renamed to be the output.
func (OS) CreateBeside(folder string) (File, error) {
	for n := 0; ; n++ {
		name := filepath.Join(folder, fmt.Sprintf(".epure-%d-%d.part", os.Getpid(), n))
		f, err := os.OpenFile(name, os.O_WRONLY|os.O_CREATE|os.O_EXCL, 0o666)
		if err == nil {
			return f, nil
		}
		if !errors.Is(err, fs.ErrExist) || n == maxLeftOvers {
			return nil, err
		}
	}
}

// maxLeftOvers is how many files of a killed process with the same number are
// stepped over: more than any one run writes.
const maxLeftOvers = 1000

// Rename gives a file another name, in one step.
func (OS) Rename(from, to string) error { return os.Rename(from, to) }

// Remove removes a file.
func (OS) Remove(name string) error { return os.Remove(name) }

// SyncFolder makes renames in a folder survive a power cut. Some file systems
// cannot sync a folder; nothing is lost by that which was not at risk before.
func (OS) SyncFolder(name string) error {
	d, err := os.Open(name)
	if err != nil {
		return err
	}
	_ = d.Sync()
	return d.Close()
}

// Resolve returns the absolute name of a file with all links followed.
func (OS) Resolve(name string) string {
	abs, err := filepath.Abs(name)
	if err != nil {
		return name
	}
	if real, err := filepath.EvalSymlinks(abs); err == nil {
		return real
	}
	if folder, err := filepath.EvalSymlinks(filepath.Dir(abs)); err == nil {
		return filepath.Join(folder, filepath.Base(abs))
	}
	return abs
}
