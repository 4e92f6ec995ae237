package main

import (
	"bytes"
	"errors"
	"os"
	"os/exec"
	"strconv"
	"strings"
	"testing"
	"time"

	"github.com/rogpeppe/go-internal/testscript"
)

func TestMain(m *testing.M) {
	testscript.Main(m, map[string]func(){"epure": main})
}

// TestScripts runs the archives of testdata/script: the real program, in a
// folder of its own, on a real disk. Besides the usual commands there are
//
//	exits STATUS ARGS…  runs epure and wants exactly this exit status
//	junk KIND FILE      writes a file that no sane person would
func TestScripts(t *testing.T) {
	testscript.Run(t, testscript.Params{
		Deadline:            time.Now().Add(longest),
		Dir:                 "../../testdata/script",
		RequireExplicitExec: true,
		RequireUniqueNames:  true,
		Cmds: map[string]func(*testscript.TestScript, bool, []string){
			"exits": exits,
			"junk":  junk,
		},
	})
}

// longest is how long a script may take: it takes a second, and a busy machine
// is many times slower; what takes longer grows with a square.
const longest = time.Minute

func exits(ts *testscript.TestScript, neg bool, args []string) {
	if neg || len(args) < 2 {
		ts.Fatalf("usage: exits STATUS ARGS…")
	}
	want, err := strconv.Atoi(args[0])
	ts.Check(err)
	err = ts.Exec("epure", args[1:]...)
	got := 0
	var exit *exec.ExitError
	switch {
	case errors.As(err, &exit):
		got = exit.ExitCode()
	case err != nil:
		ts.Fatalf("epure could not be run: %v", err)
	}
	if got != want {
		ts.Fatalf("exit status %d, want %d", got, want)
	}
}

// junk makes what the parser must survive: each in a time that grows with the
// length of the file and not with its square.
func junk(ts *testscript.TestScript, neg bool, args []string) {
	if neg || len(args) != 2 {
		ts.Fatalf("usage: junk KIND FILE")
	}
	ts.Check(os.WriteFile(ts.MkAbs(args[1]), junkOf(ts, args[0]), 0o666))
}

func junkOf(ts *testscript.TestScript, kind string) []byte {
	switch kind {
	case "brackets":
		return []byte("a = " + strings.Repeat("(", 100_000) + "1" + strings.Repeat(")", 100_000) + "\n")
	case "open-brackets":
		return []byte("a = " + strings.Repeat("(", 100_000) + "\n")
	case "blocks":
		return []byte(strings.Repeat("s = sheet \"S\" {\n", 20_000))
	case "minuses":
		return []byte("a = " + strings.Repeat("-", 100_000) + "1\n")
	case "powers":
		return []byte("a = 2" + strings.Repeat("^2", 100_000) + "\n")
	case "line":
		return []byte("a = 1" + strings.Repeat(" + 1", 5<<20/4) + "\n")
	case "binary":
		return binary(1 << 20)
	case "names":
		return []byte(strings.Repeat("a = b\n", 3_000))
	case "quotes":
		return bytes.Repeat([]byte{'"'}, 1<<20)
	}
	ts.Fatalf("there is no junk %q", kind)
	return nil
}

// binary returns n bytes from a linear congruential generator (constants of
// Knuth's MMIX): every byte value, in no order that means anything, always the same.
func binary(n int) []byte {
	out := make([]byte, n)
	x := uint64(1)
	for i := range out {
		x = x*6364136223846793005 + 1442695040888963407
		out[i] = byte(x >> 56)
	}
	return out
}
