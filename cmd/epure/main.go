// Command epure draws technical geometry from text. See `epure --help`.
package main

import (
	"context"
	"os"
	"os/signal"
	"runtime/debug"
	"syscall"
	"time"

	"github.com/mattn/go-isatty"

	"epure/cmd/internal/cli"
	"epure/cmd/internal/host"
)

func main() {
	// A run is short and small: collecting at a quarter of the usual rate saves a
	// tenth of it. The environment's GOGC still decides when it is set.
	if os.Getenv("GOGC") == "" {
		debug.SetGCPercent(400)
	}
	os.Exit(cli.Run(world()))
}

// world is the real one.
func world() *host.Host {
	return &host.Host{
		Args: os.Args[1:],
		In:   os.Stdin, Out: os.Stdout, Err: os.Stderr,
		Disk:        host.OS{},
		Getenv:      os.Getenv,
		Now:         time.Now,
		TerminalErr: isatty.IsTerminal(os.Stderr.Fd()),
		Interruptible: func() (context.Context, func()) {
			return signal.NotifyContext(context.Background(), os.Interrupt, syscall.SIGTERM)
		},
		After: func(d time.Duration, f func()) func() {
			timer := time.AfterFunc(d, f)
			return func() { timer.Stop() }
		},
	}
}
