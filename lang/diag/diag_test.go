package diag

import (
	"bytes"
	"encoding/json"
	"regexp"
	"strings"
	"testing"

	"epure/lang/source"
)

var (
	file  = source.New("hood.epure", []byte("K = cone hieght 3 mm\n\tö = 日本 ≤ x\n"))
	other = source.New("a.epure", []byte("x = 1\n"))
)

// find returns the span of a piece of the text of file.
func find(t *testing.T, part string) source.Span {
	t.Helper()
	n := bytes.Index(file.Text, []byte(part))
	if n < 0 {
		t.Fatalf("no %q", part)
	}
	return file.Span(n, n+len(part))
}

func written(t *testing.T, style Style, ds ...Diagnostic) string {
	t.Helper()
	var b bytes.Buffer
	if err := WriteText(&b, ds, style); err != nil {
		t.Fatal(err)
	}
	return b.String()
}

func TestWriteText(t *testing.T) {
	d := New("unknown-clause", find(t, "hieght"), "`hieght` is no clause of cone").
		Because("cone has radius, diameter, height").
		WithNote(other.Span(0, 1), "`x` is defined here").
		WithFix(find(t, "hieght"), "height")
	want := "hood.epure:1:10: error: `hieght` is no clause of cone [unknown-clause]\n" +
		"    K = cone hieght 3 mm\n" +
		"             ^~~~~~\n" +
		"  cone has radius, diameter, height\n" +
		"  a.epure:1:1: `x` is defined here\n" +
		"  write `height`\n"
	if got := written(t, Style{}, d); got != want {
		t.Errorf("got\n%s\nwant\n%s", got, want)
	}
	if got, want := written(t, Style{Plain: true}, d), strings.SplitAfter(want, "\n")[0]; got != want {
		t.Errorf("plain: %q", got)
	}
	colour := written(t, Style{Colour: true}, d)
	if plain := regexp.MustCompile("\x1b\\[[0-9;]*m").ReplaceAllString(colour, ""); plain != want || colour == want {
		t.Errorf("colour changes the text:\n%s", colour)
	}
	if got := written(t, Style{}, Warn("x", source.Span{}, "nowhere")); got != "warning: nowhere [x]\n" {
		t.Errorf("without a place: %q", got)
	}
}

func TestFixWords(t *testing.T) {
	at := find(t, "hieght")
	for _, tt := range []struct {
		fix  Fix
		want string
	}{
		{Fix{at, "height", ""}, "write `height`"}, {Fix{at, "", ""}, "leave out `hieght`"}, {Fix{at, "x", "do this"}, "do this"},
	} {
		if got := fixWords(tt.fix); got != tt.want {
			t.Errorf("got %q, want %q", got, tt.want)
		}
	}
}

func TestExcerpt(t *testing.T) {
	long := source.New("l", []byte(strings.Repeat("abc ", 100)+"HERE"+strings.Repeat(" xyz", 100000)))
	junk := source.New("j", []byte("a\xffb\x01c"))
	tests := []struct {
		name         string
		span         source.Span
		line, marker string
	}{
		{"a tab, a wide rune", find(t, "日本"), "    ö = 日本 ≤ x", "        ^~~~"},
		{"after a wide rune", find(t, "≤"), "    ö = 日本 ≤ x", "             ^"},
		{"nothing, at the end of a line", file.Span(20, 20), "K = cone hieght 3 mm", "                    ^"},
		{"over two lines", file.Span(16, 30), "K = cone hieght 3 mm", "                ^~~~"},
		{"an empty last line", file.Span(len(file.Text), len(file.Text)), "", "^"},
		{"bytes that are none", junk.Span(2, 3), "a\uFFFDb\uFFFDc", "  ^"},
		{"no place", source.Span{}, "", ""},
	}
	for _, tt := range tests {
		if line, marker := Excerpt(tt.span); line != tt.line || marker != tt.marker {
			t.Errorf("%s:\n%q\n%q\nwant\n%q\n%q", tt.name, line, marker, tt.line, tt.marker)
		}
	}
	line, marker := Excerpt(long.Span(400, 404))
	if len([]rune(line)) > maxColumns+4 || !strings.HasPrefix(line, "… ") || !strings.HasSuffix(line, " …") {
		t.Errorf("a long line: %q", line)
	}
	if at := len([]rune(line[:strings.Index(line, "HERE")])); strings.Index(marker, "^~~~") != at {
		t.Errorf("a long line:\n%s\n%s", line, marker)
	}
}

func TestCombiningRunes(t *testing.T) {
	f := source.New("c", []byte("e\u0301 = x"))
	line, marker := Excerpt(f.Span(6, 7))
	if line != "e\u0301 = x" || marker != "    ^" {
		t.Errorf("%q\n%q", line, marker)
	}
}

func TestWriteJSON(t *testing.T) {
	d := New("unknown-clause", find(t, "hieght"), "a < b").WithFix(find(t, "hieght"), "height").WithNote(source.Span{}, "n")
	var b bytes.Buffer
	if err := WriteJSON(&b, []Diagnostic{d, Warn("x", source.Span{}, "nowhere")}); err != nil {
		t.Fatal(err)
	}
	want := `{"file":"hood.epure","line":1,"column":10,"endLine":1,"endColumn":16,"start":9,"end":15,"severity":"error",` +
		`"code":"unknown-clause","text":"a < b","notes":[{"text":"n"}],"fixes":[{"file":"hood.epure","line":1,"column":10,` +
		`"endLine":1,"endColumn":16,"start":9,"end":15,"text":"height","label":"write ` + "`height`" + `"}]}` + "\n" +
		`{"severity":"warning","code":"x","text":"nowhere"}` + "\n"
	if b.String() != want {
		t.Errorf("got\n%s\nwant\n%s", b.String(), want)
	}
	for _, line := range strings.SplitAfter(strings.TrimSpace(b.String()), "\n") {
		var any map[string]any
		if err := json.Unmarshal([]byte(line), &any); err != nil {
			t.Errorf("%s: %v", line, err)
		}
	}
}

func TestBag(t *testing.T) {
	var b Bag
	if b.HasErrors() || b.Len() != 0 {
		t.Error("an empty bag is not empty")
	}
	b.Add(Warn("z", file.Span(3, 4), "w"))
	if b.HasErrors() {
		t.Error("a warning is an error")
	}
	repeat := New("b", file.Span(3, 4), "same").WithNote(other.Span(0, 1), "note")
	b.Add(repeat, New("a", file.Span(3, 4), "a"), New("c", file.Span(1, 4), "first"), New("d", other.Span(5, 5), "other"),
		repeat, New("b", file.Span(3, 4), "same"), New("e", source.Span{}, "nowhere"))
	var order []string
	for _, d := range b.Sorted() {
		order = append(order, string(d.Code))
	}
	if got := strings.Join(order, " "); got != "e d c a b b z" {
		t.Errorf("order: %s", got)
	}
	if !b.HasErrors() || b.Len() != 8 {
		t.Errorf("%v, %d", b.HasErrors(), b.Len())
	}
}

// TestBuildersDoNotShare: two diagnostics made from one are apart.
func TestBuildersDoNotShare(t *testing.T) {
	base := New("a", source.Span{}, "x").WithNote(source.Span{}, "1")
	one, two := base.WithNote(source.Span{}, "2"), base.WithNote(source.Span{}, "3")
	if one.Notes[1].Text != "2" || two.Notes[1].Text != "3" || len(base.Notes) != 1 {
		t.Errorf("%v %v %v", base.Notes, one.Notes, two.Notes)
	}
}

func TestCodes(t *testing.T) {
	form := regexp.MustCompile(`^[a-z0-9]+(-[a-z0-9]+)*$`)
	seen := map[Code]bool{}
	for _, e := range Codes() {
		if !form.MatchString(string(e.Code)) {
			t.Errorf("%q is no code", e.Code)
		}
		if seen[e.Code] {
			t.Errorf("%s stands twice", e.Code)
		}
		seen[e.Code] = true
		if e.Stage < StageSyntax || e.Stage > StageBuild {
			t.Errorf("%s has no stage", e.Code)
		}
		if !strings.HasSuffix(e.Meaning, ".") || strings.Count(e.Meaning, ". ") > 0 || e.Meaning[:1] != strings.ToUpper(e.Meaning[:1]) {
			t.Errorf("%s: %q is not one sentence", e.Code, e.Meaning)
		}
		if e.Example == "" && e.Stage != StageBuild {
			t.Errorf("%s has no example", e.Code)
		}
		if got, ok := Lookup(e.Code); !ok || got.Meaning != e.Meaning {
			t.Errorf("%s is not found", e.Code)
		}
	}
	if _, ok := Lookup("no-such-code"); ok {
		t.Error("found what is not there")
	}
}
