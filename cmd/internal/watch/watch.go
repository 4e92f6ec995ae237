// Package watch tells when one of a few files has other contents than before.
//
// Editors do not simply write a file. Many write a new one and rename it over the
// old one, after which a watch on the file is silent for ever; some truncate it
// first, so that for a moment it is empty; some move the old one away, so that for
// a moment there is none. Therefore the folders are watched and not the files, a
// change is looked at only after a short quiet, contents are compared and not
// times, and a file that has just become empty or vanished gets a second chance.
// A slow look at all files catches what the system does not report, as on
// network disks.
package watch

import (
	"context"
	"crypto/sha256"
	"path/filepath"
	"time"

	"github.com/fsnotify/fsnotify"

	"epure/cmd/internal/host"
)

// The waits. Common practice, tried; no source.
const (
	quiet    = 50 * time.Millisecond  // after the last event, until a change is looked at
	atMost   = 500 * time.Millisecond // after the first event, however many follow
	recovery = 100 * time.Millisecond // for a file that has just become empty or vanished
	slowLook = time.Second            // between looks at all files
	blindly  = 200 * time.Millisecond // the same when the system reports nothing at all
)

// maxBytes is how much of a file is compared; more than any source file may have.
const maxBytes = 65 << 20

// Sum stands for the contents of a file; the zero Sum for a file that is not there.
type Sum [sha256.Size]byte

// SumOf returns the sum of contents that were read.
func SumOf(text []byte) Sum { return sha256.Sum256(text) }

// Input is a file that was read, with what was found in it.
type Input struct {
	Name string
	Sum  Sum
}

// Follower follows a set of files.
type Follower struct {
	disk    host.Disk
	notify  *fsnotify.Watcher // nil when the system has none to give
	inputs  []Input
	names   map[string]bool // absolute names whose events matter
	folders map[string]bool // absolute, to be watched
}

// New returns a Follower that follows nothing yet.
func New(d host.Disk) *Follower {
	w, err := fsnotify.NewWatcher()
	if err != nil {
		w = nil
	}
	return &Follower{disk: d, notify: w}
}

// Close ends the following.
func (f *Follower) Close() {
	if f.notify != nil {
		_ = f.notify.Close()
	}
}

// Set says which files to follow from now on, and what they held when they were
// read: a change between that reading and now is not lost.
func (f *Follower) Set(inputs []Input) {
	f.inputs = inputs
	old := f.folders
	f.names, f.folders = map[string]bool{}, map[string]bool{}
	for _, in := range inputs {
		f.add(in.Name)
	}
	if f.notify == nil {
		return
	}
	for folder := range old {
		if !f.folders[folder] {
			_ = f.notify.Remove(folder)
		}
	}
	f.renew()
}

// add notes the names under which events of a file come: that of the file
// itself, and when it is a link that of the link.
func (f *Follower) add(name string) {
	link := filepath.Join(f.disk.Resolve(filepath.Dir(name)), filepath.Base(name))
	for _, n := range []string{link, f.disk.Resolve(name)} {
		f.names[n] = true
		f.folders[filepath.Dir(n)] = true
	}
}

// renew watches the folders again: one that was removed and made anew has lost
// its watch. A folder that is not there has none until it is.
func (f *Follower) renew() {
	for folder := range f.folders {
		_ = f.notify.Add(folder)
	}
}

// Wait returns nil when a file has other contents than Set was told, or the
// error of ctx when that ends first.
func (f *Follower) Wait(ctx context.Context) error {
	look := time.NewTimer(0) // at once: something may have changed since it was read
	defer look.Stop()
	var first time.Time // of the events since the last look
	for {
		select {
		case <-ctx.Done():
			return ctx.Err()
		case e := <-f.events():
			if e.Op != fsnotify.Chmod && f.names[e.Name] {
				first = f.soon(look, first)
			}
		case <-f.failures():
			first = f.soon(look, first)
		case <-look.C:
			if f.changed(ctx) {
				return ctx.Err()
			}
			first = time.Time{}
			look.Reset(f.pause())
		}
	}
}

// soon sets the timer to the end of the quiet, and returns when the first event was.
func (f *Follower) soon(look *time.Timer, first time.Time) time.Time {
	now := time.Now()
	if first.IsZero() {
		first = now
	}
	look.Reset(max(0, min(quiet, atMost-now.Sub(first))))
	return first
}

// pause is how long it takes to the next look without an event.
func (f *Follower) pause() time.Duration {
	if f.notify == nil {
		return blindly
	}
	f.renew()
	return slowLook
}

func (f *Follower) events() <-chan fsnotify.Event {
	if f.notify == nil {
		return nil
	}
	return f.notify.Events
}

func (f *Follower) failures() <-chan error {
	if f.notify == nil {
		return nil
	}
	return f.notify.Errors
}

// changed compares all files. One that has just become empty or vanished is
// looked at again a little later.
func (f *Follower) changed(ctx context.Context) bool {
	changed, doubtful := f.compare()
	if changed || !doubtful {
		return changed
	}
	select {
	case <-ctx.Done():
	case <-time.After(recovery):
	}
	changed, doubtful = f.compare()
	return changed || doubtful
}

// compare says whether a file has other contents, and whether one of those is
// empty or gone, which may be the middle of a save.
func (f *Follower) compare() (changed, doubtful bool) {
	for _, in := range f.inputs {
		text, err := f.disk.Read(in.Name, maxBytes)
		var now Sum
		if err == nil {
			now = SumOf(text)
		}
		switch {
		case now == in.Sum:
		case len(text) == 0:
			doubtful = true
		default:
			changed = true
		}
	}
	return changed && !doubtful, doubtful
}
