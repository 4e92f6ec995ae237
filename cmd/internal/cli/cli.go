// Package cli is the command line: one file a verb. A verb takes a Call, which
// is the arguments understood, and returns an exit status. Data goes to standard
// output, words go to standard error, and nothing is decided here that a file
// could decide.
package cli

import (
	"bufio"
	"errors"
	"fmt"
	"runtime/debug"

	"epure/cmd/internal/build"
	"epure/cmd/internal/host"
)

// The exit statuses. A caller can tell a wrong drawing from a wrong command from
// a broken machine.
const (
	Done   = 0 // what was asked for is done
	Wrong  = 1 // a file is wrong, or a verify failed
	Usage  = 2 // the command line is wrong
	Failed = 3 // the machine failed: a file cannot be written, or an internal fault
)

// session is one run: the world, the call, and the words said so far.
type session struct {
	*host.Host
	call Call
	data *bufio.Writer // standard output
}

// Run runs the command of h.Args and returns its exit status. It never panics.
func Run(h *host.Host) (status int) {
	s := &session{Host: h, data: bufio.NewWriter(h.Out)}
	defer func() {
		if p := recover(); p != nil {
			status = s.fault(&build.Fault{Name: "the command line", Value: fmt.Sprint(p), Stack: debug.Stack()})
		}
	}()
	call, err := parse(h.Args, h.Disk.IsFile)
	s.call = call
	if err == nil {
		status, err = s.dispatch()
	}
	if lost := s.data.Flush(); lost != nil && err == nil {
		err = &build.WriteError{Path: "to standard output", Err: lost}
	}
	if err != nil {
		return s.stop(err)
	}
	return status
}

// dispatch runs the verb.
func (s *session) dispatch() (int, error) {
	if s.call.Help {
		return Done, s.help()
	}
	switch s.call.Verb {
	case "draw":
		return s.draw()
	case "check":
		return s.check()
	case "measure":
		return s.measure()
	case "watch":
		return s.watch()
	default:
		return s.explain()
	}
}

// stop says why nothing more is done, and returns the status that goes with it.
func (s *session) stop(err error) int {
	var usage *usageError
	var fault *build.Fault
	switch {
	case errors.As(err, &usage):
		s.say("epure: %s", usage)
		return Usage
	case errors.As(err, &fault):
		return s.fault(fault)
	}
	s.say("epure: %s", err)
	return Failed
}

// fault reports a fault of the program itself. The stack is of use only to those
// who work on the program, and they can ask for it.
func (s *session) fault(f *build.Fault) int {
	s.say("epure: %s", f)
	s.say("This is a mistake of the program and not of the file. EPURE_TRACE=1 shows where.")
	if s.Getenv("EPURE_TRACE") == "1" {
		s.say("%s", f.Stack)
	}
	return Failed
}

// say prints one line on standard error. There is nobody left to tell when that fails.
func (s *session) say(format string, args ...any) {
	fmt.Fprintf(s.Err, format+"\n", args...)
}
