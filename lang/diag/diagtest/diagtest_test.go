package diagtest

import (
	"fmt"
	"strings"
	"testing"

	"epure/lang/diag"
	"epure/lang/source"
)

// log keeps what Check reports.
type log []string

func (l *log) Helper() {}
func (l *log) Errorf(format string, args ...any) {
	*l = append(*l, fmt.Sprintf(format, args...))
}

const text = `K = conne radius 3 mm
#!  ^~~~~ unknown-form "no form"
#! @1+1 unknown-name
x = 3
`

func TestCheck(t *testing.T) {
	f := source.New("a.epure", []byte(text))
	form := diag.New("unknown-form", f.Span(4, 9), "there is no form `conne`")
	name := diag.New("unknown-name", f.Span(0, 1), "any text")
	shifted, other, wording := form, form, form
	shifted.Span = f.Span(4, 8)
	other.Code = "unknown-name"
	wording.Text = "what is this"
	tests := []struct {
		got  []diag.Diagnostic
		want int // complaints
	}{
		{[]diag.Diagnostic{form, name}, 0},
		{[]diag.Diagnostic{name, form}, 0},
		{[]diag.Diagnostic{form}, 1},
		{[]diag.Diagnostic{form, name, name}, 1},
		{[]diag.Diagnostic{shifted, name}, 2},
		{[]diag.Diagnostic{other, name}, 2},
		{[]diag.Diagnostic{wording, name}, 2},
		{nil, 2},
	}
	for i, tt := range tests {
		var l log
		Check(&l, f, tt.got)
		if len(l) != tt.want {
			t.Errorf("case %d: %d complaints, want %d:\n%s", i, len(l), tt.want, strings.Join(l, "\n"))
		}
	}
}

func TestReadRefuses(t *testing.T) {
	for _, text := range []string{"x = 1\n#! unknown-name\n", "x\n#! ^\n", "#! ^ unknown-name\n", "x\n#! ^~ Unknown\n"} {
		if wants, err := Read(source.New("a.epure", []byte(text))); err == nil {
			t.Errorf("%q: read as %v", text, wants)
		}
	}
}
