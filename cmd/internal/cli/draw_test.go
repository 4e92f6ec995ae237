package cli

import (
	"strings"
	"testing"

	"epure/cmd/internal/host/hosttest"
)

func TestDrawWritesAndLeavesAlone(t *testing.T) {
	w, status := run(map[string]string{"a.epure": plate}, "draw", "a.epure")
	if status != Done || w.Out.String() != "drawings/view.svg\ndrawings/view.pdf\n" {
		t.Fatalf("status %d, output %q, words %q", status, w.Out, w.Err)
	}
	if !strings.HasPrefix(w.Disk.Files["drawings/view.pdf"], "%PDF-") || !strings.Contains(w.Disk.Files["drawings/view.svg"], "<svg") {
		t.Error("the files are not what their names say")
	}
	says(t, w, "1 drawing: 2 files written\n")

	again, status := run(w.Disk.Files, "draw", "a.epure", "--as", "svg")
	if status != Done || again.Disk.Steps != 0 {
		t.Errorf("status %d, steps %q", status, again.Disk.Done)
	}
	says(t, again, "0 files written, 1 file unchanged")
}

// TestDrawOnBrokenDisks lets every step of the disk fail in turn, under the whole
// command. Each time the status is 3, the words name the output, every output is
// old or new, and nothing else is left.
func TestDrawOnBrokenDisks(t *testing.T) {
	good, _ := run(map[string]string{"a.epure": plate}, "draw", "a.epure")
	old := map[string]string{"a.epure": plate, "drawings/view.svg": "old svg", "drawings/view.pdf": "old pdf"}
	for n := 1; ; n++ {
		w := hosttest.New(old, "draw", "a.epure")
		w.Disk.FailAt = n
		status := Run(&w.Host)
		if status == Done {
			if n < 10 {
				t.Errorf("only %d steps could fail", n-1)
			}
			return
		}
		if status != Failed {
			t.Errorf("step %d (%s): status %d", n, w.Disk.Done[n-1], status)
		}
		says(t, w, "epure: cannot write drawings")
		for name, text := range w.Disk.Files {
			if text != old[name] && text != good.Disk.Files[name] {
				t.Errorf("step %d (%s): %s holds %d bytes that are neither old nor new", n, w.Disk.Done[n-1], name, len(text))
			}
		}
		if len(w.Disk.Files) != len(old) {
			t.Errorf("step %d: files %q", n, w.Disk.Names())
		}
	}
}

func TestWrongFilesWriteNothing(t *testing.T) {
	for name, source := range map[string]string{
		"a verify that fails": strings.Replace(plate, "> 10 mm", "< 10 mm", 1),
		"an error":            plate + "x = y + 1 mm\n",
	} {
		files := map[string]string{"a.epure": source, "b.epure": strings.Replace(plate, "view =", "other =", 1), "drawings/view.svg": "old"}
		w, status := run(files, "draw", "a.epure", "b.epure")
		if status != Wrong || w.Disk.Files["drawings/view.svg"] != "old" || w.Disk.Files["drawings/view.pdf"] != "" {
			t.Errorf("%s: status %d, files %q", name, status, w.Disk.Names())
		}
		if w.Out.String() != "drawings/other.svg\ndrawings/other.pdf\n" {
			t.Errorf("%s: the right file was not drawn: %q", name, w.Out)
		}
		says(t, w, "nothing drawn of 1 file with errors")
	}
}

func TestOneNameForTwoDrawings(t *testing.T) {
	files := map[string]string{"a.epure": plate, "b.epure": strings.Replace(plate, "view =", "VIEW =", 1)}
	w, status := run(files, "draw", "a.epure", "b.epure")
	if status != Wrong || w.Out.String() != "drawings/view.svg\ndrawings/view.pdf\n" {
		t.Errorf("status %d, output %q", status, w.Out)
	}
	says(t, w, "[same-output]")
	says(t, w, "a.epure:4:")

	twice := plate + strings.Replace(plate[strings.Index(plate, "view ="):], "view =", "View =", 1)
	if w, status = run(map[string]string{"a.epure": twice}, "check", "a.epure"); status != Wrong {
		t.Errorf("check: status %d", status)
	}
	says(t, w, "[same-output]")
}

func TestSameBytesEveryRun(t *testing.T) {
	first, _ := run(map[string]string{"a.epure": plate}, "draw", "a.epure")
	for range 20 {
		w, _ := run(map[string]string{"a.epure": plate}, "draw", "a.epure", "-o", "elsewhere")
		for _, name := range []string{"view.svg", "view.pdf"} {
			if w.Disk.Files["elsewhere/"+name] != first.Disk.Files["drawings/"+name] {
				t.Fatalf("%s differs from run to run", name)
			}
		}
	}
}

func TestDateComesFromTheEnvironmentOrNowhere(t *testing.T) {
	draw := func(epoch string) string {
		w := hosttest.New(map[string]string{"a.epure": plate}, "draw", "a.epure")
		w.Env["SOURCE_DATE_EPOCH"] = epoch
		Run(&w.Host)
		return w.Disk.Files["drawings/view.pdf"]
	}
	// 1 700 000 000 s is 14 November 2023, 22:13:20 UTC
	if got := draw("1700000000"); !strings.Contains(got, "20231114") {
		t.Error("the date of SOURCE_DATE_EPOCH is not in the PDF")
	}
	if draw("") != draw("not a number") {
		t.Error("an epoch that is no number changes the PDF")
	}
}
