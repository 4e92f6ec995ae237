package diag

import (
	"fmt"
	"io"
	"strings"
	"unicode"

	"golang.org/x/text/width"

	"epure/lang/source"
)

// Style says how WriteText prints.
type Style struct {
	Colour bool // terminal colours round the severity, the code and the marker
	Plain  bool // only the first line of each diagnostic
}

// tabWidth is how far a tab in a source line goes, in columns of output.
const tabWidth = 4

// maxColumns is the width to which a source line is cut round the marker.
const maxColumns = 110

// WriteText writes diagnostics for people, in the order given.
func WriteText(w io.Writer, ds []Diagnostic, style Style) error {
	var b strings.Builder
	for _, d := range ds {
		writeOne(&b, d, style)
	}
	_, err := io.WriteString(w, b.String())
	return err
}

func writeOne(b *strings.Builder, d Diagnostic, style Style) {
	p := paint{on: style.Colour}
	fmt.Fprintf(b, "%s%s %s %s\n", placeWords(d.Span), p.severity(d.Severity), d.Text, p.faint("["+string(d.Code)+"]"))
	if style.Plain {
		return
	}
	if line, marker := Excerpt(d.Span); line != "" {
		fmt.Fprintf(b, "    %s\n    %s\n", line, p.severityText(d.Severity, marker))
	}
	if d.Reason != "" {
		fmt.Fprintf(b, "  %s\n", d.Reason)
	}
	for _, n := range d.Notes {
		fmt.Fprintf(b, "  %s%s\n", placeWords(n.Span), n.Text)
	}
	for _, f := range d.Fixes {
		fmt.Fprintf(b, "  %s\n", fixWords(f))
	}
}

// placeWords returns "file:line:column: ", or "" for no place.
func placeWords(s source.Span) string {
	if s.IsZero() {
		return ""
	}
	line, column := s.Position()
	return fmt.Sprintf("%s:%d:%d: ", s.File.Name, line, column)
}

// fixWords says what a fix does.
func fixWords(f Fix) string {
	switch {
	case f.Label != "":
		return f.Label
	case f.Text == "":
		return "leave out " + source.Quote(f.Span.Text())
	}
	return "write " + source.Quote(f.Text)
}

// paint adds terminal colours, or does not.
type paint struct{ on bool }

func (p paint) wrap(code, text string) string {
	if !p.on || text == "" {
		return text
	}
	return "\x1b[" + code + "m" + text + "\x1b[0m"
}

func (p paint) severityText(s Severity, text string) string {
	if s == Error {
		return p.wrap("1;31", text)
	}
	return p.wrap("1;33", text)
}

func (p paint) severity(s Severity) string { return p.severityText(s, s.String()+":") }
func (p paint) faint(text string) string   { return p.wrap("2", text) }

// cell is one rune of a source line as it is printed.
type cell struct {
	text   string
	width  int
	marked bool
}

// Excerpt returns the source line of a span as it can be printed, and a marker
// line that fits below it: ^ at the start, ~ for the rest that lies in this line.
// Tabs become spaces, runes that a terminal shows double get double marks,
// combining ones none, and a long line is cut round the marker. Both are "" for
// no place and for an empty file.
func Excerpt(s source.Span) (line, marker string) {
	if s.IsZero() || len(s.File.Text) == 0 {
		return "", ""
	}
	number, _ := s.Position()
	start, end := s.File.LineStart(number), s.File.LineEnd(number)
	cells, first := cells(s, start, end)
	cells, first, before, after := window(cells, first)
	var text, marks strings.Builder
	text.WriteString(before)
	marks.WriteString(strings.Repeat(" ", len([]rune(before))))
	for i, c := range cells {
		text.WriteString(c.text)
		marks.WriteString(markOf(c, i == first))
	}
	if first >= len(cells) {
		marks.WriteString("^")
	}
	text.WriteString(after)
	return strings.TrimRight(text.String(), " "), strings.TrimRight(marks.String(), " ")
}

// markOf returns what stands below a cell.
func markOf(c cell, first bool) string {
	switch {
	case first:
		return "^" + mark(c.marked, c.width-1)
	default:
		return mark(c.marked, c.width)
	}
}

func mark(on bool, n int) string {
	if on {
		return strings.Repeat("~", max(n, 0))
	}
	return strings.Repeat(" ", max(n, 0))
}

// reach is how many bytes of a line to either side of the span are looked at: no
// more than that can be shown, and a line may have megabytes.
const reach = 4 * maxColumns

// cells cuts a line into printed runes and returns the index of the first one at
// or after the start of s, which is their number when s starts at the line's end.
func cells(s source.Span, start, end int) ([]cell, int) {
	from, to := start, min(end, max(s.Start, start)+reach)
	if s.Start-reach > start {
		from = runeStart(s.File.Text, s.Start-reach)
	}
	var out []cell
	first, column := -1, 0
	for i, r := range string(s.File.Text[from:to]) {
		at := from + i
		if first < 0 && at >= s.Start {
			first = len(out)
		}
		c := cellOf(r, column)
		c.marked = at >= s.Start && at < s.End
		column += c.width
		out = append(out, c)
	}
	if first < 0 {
		first = len(out)
	}
	return out, first
}

func runeStart(text []byte, i int) int {
	for n := 0; i > 0 && n < 4 && text[i]&0xC0 == 0x80; n++ {
		i--
	}
	return i
}

func cellOf(r rune, column int) cell {
	switch {
	case r == '\t':
		n := tabWidth - column%tabWidth
		return cell{text: strings.Repeat(" ", n), width: n}
	case r == unicode.ReplacementChar || !unicode.IsGraphic(r):
		return cell{text: "\uFFFD", width: 1}
	case unicode.In(r, unicode.Mn, unicode.Me):
		return cell{text: string(r)}
	}
	switch width.LookupRune(r).Kind() {
	case width.EastAsianWide, width.EastAsianFullwidth:
		return cell{text: string(r), width: 2}
	}
	return cell{text: string(r), width: 1}
}

// window cuts cells to at most maxColumns of them, a third of these before the
// marker, and returns what stands for the parts left out.
func window(cells []cell, first int) (out []cell, at int, before, after string) {
	from, to := 0, len(cells)
	if to > maxColumns {
		from = max(0, min(first-maxColumns/3, to-maxColumns))
		to = min(to, from+maxColumns)
	}
	if from > 0 {
		before = "… "
	}
	if to < len(cells) {
		after = " …"
	}
	return cells[from:to], first - from, before, after
}
