package cli

import (
	"errors"
	"fmt"
	"strings"
	"sync"
	"time"

	"epure/cmd/internal/build"
	"epure/lang/diag"
	"epure/lang/spell"
)

// load reads and checks all files of the call, and hands each the settings that
// it has a given for. A setting that no file has, or whose kind is another, is a
// wrong command line; when a file could not be read whole, its givens are not
// all known and nothing is said of them.
func (s *session) load() ([]*build.Unit, error) {
	var units []*build.Unit
	for _, name := range s.call.Files {
		units = append(units, build.Load(s.Host, name))
	}
	for _, setting := range s.call.Settings {
		if err := apply(setting, units); err != nil {
			return units, err
		}
	}
	return units, nil
}

// apply gives a setting to the files that have a given of its name.
func apply(setting build.Setting, units []*build.Unit) error {
	used, doubtful := false, false
	var known []string
	for _, u := range units {
		found, err := u.Set(setting)
		if err != nil {
			return usage("--given: %s", err)
		}
		used = used || found
		doubtful = doubtful || u.Broken()
		for _, g := range u.Givens {
			known = append(known, g.Name)
		}
	}
	switch near, ok := spell.Nearest(setting.Name, known); {
	case used || doubtful:
		return nil
	case ok:
		return usage("--given: there is no given `%s`: write `%s`", setting.Name, near)
	case len(known) == 0:
		return usage("--given: there is no given `%s`: %s has none", setting.Name, units[0].Name)
	}
	return usage("--given: there is no given `%s`: there are %s", setting.Name, strings.Join(known, ", "))
}

// report prints the diagnostics of the units, and a fault when there is one. It
// returns the exit status that they ask for.
func (s *session) report(units []*build.Unit, out diagWriter) (int, error) {
	status := Done
	for _, u := range units {
		ds := u.Bag.Sorted()
		if err := out(ds[:min(len(ds), maxShown)]); err != nil {
			return Failed, err
		}
		if len(ds) > maxShown {
			s.say("%s: %d more are not shown", u.Name, len(ds)-maxShown)
		}
		if u.Failed() {
			status = max(status, Wrong)
		}
	}
	for _, u := range units {
		if u.Fault != nil {
			return s.fault(u.Fault), nil
		}
	}
	return status, nil
}

// maxShown is how many diagnostics of one file are printed: more than anybody
// mends at once.
const maxShown = 100

// diagWriter prints diagnostics.
type diagWriter func([]diag.Diagnostic) error

// words prints diagnostics where words go: on standard error, as JSON when the
// call asks for data.
func (s *session) words(ds []diag.Diagnostic) error {
	if s.call.JSON {
		return diag.WriteJSON(s.Err, ds)
	}
	return diag.WriteText(s.Err, ds, diag.Style{Colour: s.Colour()})
}

// patience is how long work goes on in silence: what a person takes for at once
// is a tenth of that, what makes one wonder is twice as much. Common practice, no source.
const patience = 500 * time.Millisecond

// busy prints a line on a terminal when work takes longer than a person waits
// without wondering. The function it returns takes the line away.
func (s *session) busy(what string) (done func()) {
	if !s.TerminalErr {
		return func() {}
	}
	var mu sync.Mutex
	shown, ended := false, false
	cancel := s.After(patience, func() {
		mu.Lock()
		defer mu.Unlock()
		if !ended {
			shown = true
			fmt.Fprintf(s.Err, "%s …", what)
		}
	})
	return func() {
		cancel()
		mu.Lock()
		defer mu.Unlock()
		if ended = true; shown {
			fmt.Fprintf(s.Err, "\r\x1b[K")
		}
	}
}

// run takes each unit through the pipeline.
func (s *session) run(units []*build.Unit, job build.Job) {
	for _, u := range units {
		done := s.busy(s.call.Verb + " " + u.Name)
		u.Run(job, s.Host)
		done()
	}
}

// writing turns the error of printing data into the one that is reported.
func writing(err error) error {
	var already *build.WriteError
	if err == nil || errors.As(err, &already) {
		return err
	}
	return &build.WriteError{Path: "to standard output", Err: err}
}

// count writes "1 file", "2 files".
func count(n int, noun string) string {
	if n == 1 {
		return "1 " + noun
	}
	return fmt.Sprintf("%d %ss", n, noun)
}
