// Package host is the world as the program sees it: arguments, streams, files,
// the clock, the environment. It is one struct, made in main and handed down, so
// that a test can put any other world in its place: a disk that fails on the
// third write, a terminal that is none, a clock that stands still.
package host

import (
	"context"
	"errors"
	"io"
	"strings"
	"time"
)

// Host is everything outside the program that a command may touch.
type Host struct {
	Args          []string // without the program's name
	In            io.Reader
	Out           io.Writer // data
	Err           io.Writer // words
	Disk          Disk
	Getenv        func(name string) string
	Now           func() time.Time
	TerminalErr   bool                                            // Err is a terminal
	Interruptible func() (ctx context.Context, stop func())       // from here on an interrupt ends ctx, not the program
	After         func(d time.Duration, f func()) (cancel func()) // runs f once, later, beside the rest
}

// Colour says whether words on Err may be coloured: only on a terminal that can,
// and not when NO_COLOR is set to anything.
func (h *Host) Colour() bool {
	return h.TerminalErr && h.Getenv("NO_COLOR") == "" && h.Getenv("TERM") != "dumb"
}

// Disk is the file system as far as it is used. Names are as the user gave them;
// relative ones start at the working folder.
type Disk interface {
	// Read returns the whole contents of a file of at most limit bytes; a longer one,
	// or a device that never ends, is ErrTooLong.
	Read(name string, limit int64) ([]byte, error)
	// IsFile says whether name is there and is no folder.
	IsFile(name string) bool
	// MakeFolder makes a folder and those above it; one that is there is no error.
	MakeFolder(name string) error
	// CreateBeside makes a new, empty file with a name of its own in a folder. The
	// name begins with a dot and ends with the extension ".part".
	CreateBeside(folder string) (File, error)
	// Rename gives a file another name, in one step, and replaces what had it.
	Rename(from, to string) error
	// Remove removes a file.
	Remove(name string) error
	// SyncFolder makes renames in a folder survive a power cut, where that can be asked for.
	SyncFolder(name string) error
	// Resolve returns the absolute name of a file with all links followed; as far
	// as that goes for one that is not there.
	Resolve(name string) string
}

// ErrTooLong is the error of reading more than the limit.
var ErrTooLong = errors.New("the file is too long")

// ReadAll reads r to its end, at most limit bytes; more are ErrTooLong.
func ReadAll(r io.Reader, limit int64) ([]byte, error) {
	text, err := io.ReadAll(io.LimitReader(r, limit+1))
	if err == nil && int64(len(text)) > limit {
		err = ErrTooLong
	}
	return text, err
}

// File is a file being written.
type File interface {
	io.Writer
	Name() string
	Sync() error
	Close() error
}

// DisplayName returns the name of a file as it is printed: as the user gave it,
// without a leading "./", which tools that read diagnostics stumble over.
func DisplayName(name string) string {
	for strings.HasPrefix(name, "./") && len(name) > len("./") {
		name = strings.TrimLeft(name[len("./"):], "/")
	}
	return name
}
