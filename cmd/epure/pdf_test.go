package main

import (
	"os/exec"
	"path/filepath"
	"regexp"
	"strings"
	"testing"
)

// TestPDFByAnotherProgram draws an example and has a program that knows nothing
// of ours say what the PDF holds: one page of A3 (ISO 216: 420 mm by 297 mm, in
// points of 1/72 inch), its lettering as text in an embedded font.
func TestPDFByAnotherProgram(t *testing.T) {
	for _, tool := range []string{"pdfinfo", "pdffonts", "pdftotext"} {
		if _, err := exec.LookPath(tool); err != nil {
			t.Skipf("%s is not installed (Debian: poppler-utils)", tool)
		}
	}
	folder := t.TempDir()
	ask(t, named(t), "draw", "../../examples/rain-hood.epure", "-o", folder, "--as", "pdf")
	pdf := filepath.Join(folder, "hood.pdf")

	info := ask(t, "pdfinfo", pdf)
	// 420/25.4·72 = 1190.55, 297/25.4·72 = 841.89
	for _, want := range []string{`(?m)^Pages: +1$`, `(?m)^Page size: +1190\.55 x 841\.89 pts`, `(?m)^Title: +Rain hood$`} {
		if !regexp.MustCompile(want).MatchString(info) {
			t.Errorf("pdfinfo does not say %s:\n%s", want, info)
		}
	}
	text := ask(t, "pdftotext", "-layout", pdf, "-")
	for _, want := range []string{"Rain hood", "⌀240", "260", "EP-001", "Slant 286.4 mm"} {
		if !strings.Contains(text, want) {
			t.Errorf("a search does not find %q", want)
		}
	}
	fonts := strings.Split(strings.TrimSpace(ask(t, "pdffonts", pdf)), "\n")[2:]
	embedded := regexp.MustCompile(` yes +yes +yes +\d+ +\d+$`) // embedded, a subset, with its characters known
	for _, f := range fonts {
		if !embedded.MatchString(strings.TrimSpace(f)) {
			t.Errorf("font not embedded, not a subset or not searchable: %s", f)
		}
	}
	if len(fonts) == 0 {
		t.Error("no fonts: the lettering is not text")
	}
}

// ask runs a program and returns what it prints.
func ask(t *testing.T, name string, args ...string) string {
	t.Helper()
	out, err := exec.Command(name, args...).Output()
	if err != nil {
		t.Fatalf("%s: %v", filepath.Base(name), err)
	}
	return string(out)
}
