// Package diagtest compares diagnostics with those that an annotated source
// expects. A source file is the test case: the expectation stands in a comment
// below the line at fault, with a marker under the text at fault, as the program
// itself prints it.
//
//	K = cone diameter 3 mm hieght 4 mm
//	#!                     ^~~~~~ unknown-clause "no clause `hieght`"
//
// The marker gives the place exactly: ^ is where it begins, and ^ with its ~ is as
// long as the text at fault (an empty span has the marker ^ alone, like a span of
// one rune). Columns count runes, so tabs go under tabs. A marker that would lie
// under the #! is written as a column and a length, `#! @1+3 unknown-form`. Then
// comes the code and, if it matters, a piece of the text in quotes, in which there
// is no escape. Several such comments may follow one line; all speak of that line.
package diagtest

import (
	"fmt"
	"regexp"
	"slices"
	"strconv"
	"strings"
	"unicode/utf8"

	"epure/lang/diag"
	"epure/lang/source"
)

// Want is one diagnostic that a source expects. Line and Column count from 1,
// Length is in runes of that line and at least 1.
type Want struct {
	Line, Column, Length int
	Code                 diag.Code
	Part                 string // a piece of the text, "" for any text
}

// String returns the want as it would be written with a column.
func (w Want) String() string {
	s := fmt.Sprintf("%d: #! @%d+%d %s", w.Line, w.Column, w.Length, w.Code)
	if w.Part != "" {
		s += fmt.Sprintf(" %q", w.Part)
	}
	return s
}

// annotation is what stands after "#!".
const annotation = `^(?:\s*@(\d+)\+(\d+)|(\s*)(\^~*)) ([a-z0-9-]+)(?: "(.*)")?\s*$`

// Read returns what a source expects, and an error for an annotation that cannot
// be read.
func Read(f *source.File) ([]Want, error) {
	var out []Want
	form := regexp.MustCompile(annotation)
	about := 0
	for n := 1; n <= f.Lines(); n++ {
		line := f.Line(n)
		body, ok := strings.CutPrefix(strings.TrimLeft(line, " \t"), "#!")
		if !ok {
			about = n
			continue
		}
		w, err := parse(form, line, body)
		if err != nil || about == 0 {
			return nil, fmt.Errorf("%s:%d: %q is no annotation", f.Name, n, line)
		}
		w.Line = about
		out = append(out, w)
	}
	return out, nil
}

func parse(form *regexp.Regexp, line, body string) (Want, error) {
	m := form.FindStringSubmatch(body)
	if m == nil {
		return Want{}, fmt.Errorf("no match")
	}
	w := Want{Code: diag.Code(m[5]), Part: m[6]}
	if m[1] != "" {
		w.Column, _ = strconv.Atoi(m[1])
		w.Length, _ = strconv.Atoi(m[2])
		return w, nil
	}
	w.Column = 1 + utf8.RuneCountInString(line[:len(line)-len(body)]) + utf8.RuneCountInString(m[3])
	w.Length = len(m[4])
	return w, nil
}

// TB is what Check needs of a test.
type TB interface {
	Helper()
	Errorf(format string, args ...any)
}

// Check reports every diagnostic of f that its source does not expect and every
// one that it expects in vain. Diagnostics of other files are reported too.
func Check(t TB, f *source.File, got []diag.Diagnostic) {
	t.Helper()
	wants, err := Read(f)
	if err != nil {
		t.Errorf("%v", err)
		return
	}
	for _, d := range got {
		i := slices.IndexFunc(wants, func(w Want) bool { return w.matches(f, d) })
		if i < 0 {
			t.Errorf("%s: not expected:\n%s\twritten as %v", f.Name, printed(d), wantFor(d))
			continue
		}
		wants = slices.Delete(wants, i, i+1)
	}
	for _, w := range wants {
		t.Errorf("%s:%v did not come", f.Name, w)
	}
}

func (w Want) matches(f *source.File, d diag.Diagnostic) bool {
	is := wantFor(d)
	return d.Span.File == f && w.Line == is.Line && w.Column == is.Column && w.Length == is.Length &&
		w.Code == d.Code && strings.Contains(d.Text, w.Part)
}

// wantFor returns what would expect d, as far as the end of its first line.
func wantFor(d diag.Diagnostic) Want {
	w := Want{Code: d.Code, Part: d.Text}
	if d.Span.IsZero() {
		return w
	}
	w.Line, w.Column = d.Span.Position()
	end := min(d.Span.End, d.Span.File.LineEnd(w.Line))
	w.Length = max(1, utf8.RuneCount(d.Span.File.Text[d.Span.Start:max(end, d.Span.Start)]))
	return w
}

func printed(d diag.Diagnostic) string {
	var b strings.Builder
	if err := diag.WriteText(&b, []diag.Diagnostic{d}, diag.Style{}); err != nil {
		return err.Error()
	}
	return b.String()
}
