package cli

import (
	"errors"
	"slices"
	"strings"
	"testing"
	"time"

	"epure/cmd/internal/host"
	"epure/cmd/internal/host/hosttest"
	"epure/lang/catalogue"
)

// deaf is a stream that takes nothing.
type deaf struct{}

func (deaf) Write([]byte) (int, error) { return 0, errors.New("no space left") }

func TestOutputThatCannotBeWritten(t *testing.T) {
	for _, args := range [][]string{{"explain", "cone"}, {"--help"}, {"measure", "a.epure"}, {"check", "a.epure"}, {"draw", "a.epure"}, {"measure", "--csv", "a.epure"}, {"measure", "--json", "a.epure"}} {
		w := hosttest.New(map[string]string{"a.epure": plate}, args...)
		w.Host.Out = deaf{}
		if status := Run(&w.Host); status != Failed {
			t.Errorf("%q: status %d", args, status)
		}
		says(t, w, "epure: cannot write to standard output: no space left\n")
	}
}

// mine is a disk that blows up when it is read.
type mine struct{ *hosttest.Disk }

func (mine) Read(string, int64) ([]byte, error) { panic("boom") }

func TestPanicIsAnInternalFault(t *testing.T) {
	for _, trace := range []string{"", "1"} {
		w := hosttest.New(nil, "check", "./a.epure")
		w.Host.Disk = mine{w.Disk}
		w.Env["EPURE_TRACE"] = trace
		if status := Run(&w.Host); status != Failed {
			t.Errorf("status %d", status)
		}
		says(t, w, "epure: internal fault at a.epure: boom\n")
		if strings.Contains(w.Err.String(), "goroutine") != (trace == "1") {
			t.Errorf("EPURE_TRACE=%q: %q", trace, w.Err)
		}
	}
}

func TestEveryOptionIsRead(t *testing.T) {
	values := map[string]string{"--given": "foot=50mm", "-o": "x", "--as": "svg"}
	for _, o := range catalogue.Options {
		name, _, takes := strings.Cut(o.Name, " ")
		for _, verb := range o.Verbs {
			args := []string{verb, "a.epure", name}
			if takes {
				args = append(args, values[name])
			}
			if _, err := parse(args, func(string) bool { return false }); err != nil {
				t.Errorf("%q: %v", args, err)
			}
		}
	}
}

func TestEveryCommandIsKnown(t *testing.T) {
	for _, c := range catalogue.Commands {
		w, status := run(nil, c.Name, "--help")
		if status != Done || !strings.Contains(w.Out.String(), c.Help) {
			t.Errorf("%s --help: status %d, %q", c.Name, status, w.Out)
		}
	}
}

func TestFormatsKeepTheirOrder(t *testing.T) {
	c, err := parse([]string{"draw", "a.epure", "--as", "pdf,svg,pdf"}, func(string) bool { return false })
	if err != nil || !slices.Equal(c.Formats, []string{"svg", "pdf"}) {
		t.Errorf("formats %q, error %v", c.Formats, err)
	}
}

func TestFilesAndNames(t *testing.T) {
	isFile := func(name string) bool { return name == "plates/list" }
	c, err := parse([]string{"measure", "S.focus", "a.epure", "plates/list", "--", "-", "K", "a.epure"}, isFile)
	if err != nil || !slices.Equal(c.Files, []string{"a.epure", "plates/list", "-"}) || !slices.Equal(c.Names, []string{"S.focus", "K"}) {
		t.Errorf("files %q, names %q, error %v", c.Files, c.Names, err)
	}
}

func TestColourOnlyOnATerminal(t *testing.T) {
	for _, c := range []struct {
		terminal bool
		env      map[string]string
		want     bool
	}{
		{false, nil, false},
		{true, nil, true},
		{true, map[string]string{"NO_COLOR": "1"}, false},
		{true, map[string]string{"TERM": "dumb"}, false},
	} {
		w := hosttest.New(map[string]string{"a.epure": "x = y\n"}, "check", "a.epure")
		w.TerminalErr = c.terminal
		w.Env = c.env
		Run(&w.Host)
		if got := strings.Contains(w.Err.String(), "\x1b["); got != c.want {
			t.Errorf("terminal %v, %v: colour %v", c.terminal, c.env, got)
		}
	}
}

// TestProgressOnATerminal lets the time run out at once, or never.
func TestProgressOnATerminal(t *testing.T) {
	for _, slow := range []bool{false, true} {
		w := hosttest.New(map[string]string{"a.epure": plate}, "check", "a.epure")
		w.TerminalErr = true
		w.After = func(d time.Duration, f func()) func() {
			if d != patience {
				t.Errorf("waited %v", d)
			}
			if slow {
				f()
			}
			return func() {}
		}
		Run(&w.Host)
		want := ""
		if slow {
			want = "check a.epure …\r\x1b[K"
		}
		if w.Err.String() != want {
			t.Errorf("slow %v: %q", slow, w.Err)
		}
	}
}

func TestDisplayName(t *testing.T) {
	for name, want := range map[string]string{"./a.epure": "a.epure", ".//./b/a.epure": "b/a.epure", "../a.epure": "../a.epure", "-": "-", "./": "./", "a/./b": "a/./b"} {
		if got := host.DisplayName(name); got != want {
			t.Errorf("%q is shown as %q, want %q", name, got, want)
		}
	}
}
