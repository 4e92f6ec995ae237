package manual

import (
	"fmt"
	"strings"

	"epure/lang/catalogue"
	"epure/lang/diag"
)

// markdown is the manual being written.
type markdown struct{ b strings.Builder }

// Page returns the whole manual, MANUAL.md.
func Page() string {
	m := &markdown{}
	m.text("# Manual of epure",
		"This page is made from the catalogue of the language and the table of messages. Change those, not this page: "+
			"`go test ./cmd/internal/house -run Manual -update` writes it again. Every example on it is run by a test.")
	m.basics()
	m.statements()
	m.forms()
	m.features()
	m.functions()
	m.names()
	m.commands()
	m.messages()
	return m.b.String()
}

// text writes paragraphs.
func (m *markdown) text(paragraphs ...string) {
	for _, p := range paragraphs {
		if m.b.Len() > 0 {
			m.b.WriteByte('\n')
		}
		m.b.WriteString(p + "\n")
	}
}

// code writes a source as a block.
func (m *markdown) code(source string) {
	m.text("```\n" + strings.TrimRight(source, "\n") + "\n```")
}

// table writes rows under their headings, nothing for no rows.
func (m *markdown) table(head []string, rows [][]string) {
	if len(rows) == 0 {
		return
	}
	lines := []string{"| " + strings.Join(head, " | ") + " |", "|" + strings.Repeat(" --- |", len(head))}
	for _, r := range rows {
		var cells []string
		for _, c := range r {
			cells = append(cells, strings.ReplaceAll(c, "|", `\|`))
		}
		lines = append(lines, "| "+strings.Join(cells, " | ")+" |")
	}
	m.text(strings.Join(lines, "\n"))
}

// basics is what no table says: the shape of the language.
func (m *markdown) basics() {
	m.text("## The language in short",
		"A file is a list of statements in any order; a name may be used above the line that defines it. "+
			"A statement is `name = form \"text\" clause value clause value …`: a clause is one word and one value or a list with commas. "+
			"It takes one line and goes on over the next one if that is indented deeper or a round bracket is open. `#` begins a comment.",
		"A quantity is a number with its unit: `60 mm`, `1 3/8 in`, `5 ft 3 1/2 in`, `35.5°`, `35°30′15″`, `20 %`, `1:2` (rise to run, or a scale). "+
			"Lengths, areas, volumes, angles, ratios and plain numbers are different kinds and are not mixed; `0` needs no unit. "+
			"Units are `mm cm m in ft` (and `mm² mm³` and so on), `° deg rad` and `%`; fractions go with `in` and `ft` only, and decimals have a point.",
		"`+ - * / ^` work as usual, with brackets; the minus is greedy, so `radius r -3 mm` is `r - 3 mm`. Sums need one kind. A product or quotient has the kind that follows: length times length is an area, length over length a number. "+
			"A ratio multiplies like a number; it is compared with numbers but not added to them. `50 mm^2` is `(50 mm)^2`; an area is `50 mm²`.",
		"Points are `(x, y, z)` with lengths, directions with plain numbers; on paper and on patterns `(x, y)`. x runs to the right, y back, z up. An angle about a vertical axis starts rightward, anticlockwise seen from above; about any other axis it starts at its top line, anticlockwise looking against the axis. "+
			"In a plane x is level, to the right for someone who looks against the normal, and y climbs.",
		"Every named thing has measures, `K.slant`, that other statements use. In a text, `{K.slant nearest 0.1 mm}` is replaced by the value; the step fixes unit, decimals and fractions.")
}

func (m *markdown) statements() {
	m.text("## Statements")
	for i := range catalogue.Statements {
		s := &catalogue.Statements[i]
		m.text("### " + s.Word)
		m.text(notes(s)...)
		m.code(s.Example)
	}
}

func (m *markdown) forms() {
	chapter := ""
	for i := range catalogue.Forms {
		f := &catalogue.Forms[i]
		if f.Chapter != chapter {
			chapter = f.Chapter
			m.text("## " + chapter)
		}
		m.text("### " + f.Word)
		m.text(strings.Join(notes(f), " "))
		m.table([]string{"clause", "takes", "when absent", "meaning"}, clauseCells(f))
		m.table([]string{"measure", "kind", "meaning"}, measureCells(f.Measures))
		m.code(f.Example)
	}
}

func clauseCells(f *catalogue.Form) [][]string {
	var rows [][]string
	for _, c := range f.Clauses {
		rows = append(rows, []string{"`" + c.Word + "`", takes(c), unless(c), c.Help})
	}
	return rows
}

func measureCells(ms []catalogue.Measure) [][]string {
	var rows [][]string
	for _, m := range ms {
		rows = append(rows, []string{"`" + signature(m) + "`", kindName(m.Kind), m.Help})
	}
	return rows
}

func (m *markdown) features() {
	m.text("## Parts of things", "What a measure gives can have measures of its own, as `K.base.diameter`.")
	for _, t := range catalogue.Types {
		m.text("### " + t.Name)
		m.text(t.Help)
		m.table([]string{"measure", "kind", "meaning"}, measureCells(t.Measures))
	}
}

func (m *markdown) functions() {
	var rows [][]string
	for _, f := range catalogue.Functions {
		rows = append(rows, []string{"`" + call(f) + "`", params(f), result(f), f.Help, "`" + f.Example + "`"})
	}
	m.text("## Functions")
	m.table([]string{"function", "takes", "gives", "meaning", "example"}, rows)
}

func (m *markdown) names() {
	m.text("## Built-in names")
	m.table([]string{"name", "kind", "meaning"}, builtinCells(catalogue.Builtins, true))
	m.text("These words cannot be names: " + join(ticked(catalogue.Reserved), "and") + ".")
	m.text("## Words of show and without")
	m.table([]string{"word", "draws"}, builtinCells(catalogue.ShowWords, false))
}

func builtinCells(bs []catalogue.Builtin, kinds bool) [][]string {
	var rows [][]string
	for _, b := range bs {
		if kinds {
			rows = append(rows, []string{"`" + b.Name + "`", kindName(b.Kind), b.Help})
		} else {
			rows = append(rows, []string{"`" + b.Name + "`", b.Help})
		}
	}
	return rows
}

func (m *markdown) commands() {
	m.text("## Commands")
	var rows [][]string
	for _, c := range catalogue.Commands {
		rows = append(rows, []string{"`epure " + c.Name + " " + c.Args + "`", c.Help})
	}
	m.table([]string{"command", "does"}, rows)
	rows = nil
	for _, o := range catalogue.Options {
		rows = append(rows, []string{"`" + o.Name + "`", o.Help, strings.Join(o.Verbs, ", ")})
	}
	m.table([]string{"option", "meaning", "of"}, rows)
	rows = nil
	for _, e := range ExitStatuses() {
		rows = append(rows, []string{fmt.Sprint(e.Status), e.Help})
	}
	m.text("Options may stand after the files. A file named `-` is standard input. Data goes to standard output, words go to standard error.")
	m.table([]string{"exit status", "meaning"}, rows)
}

// messages lists the codes with their meanings and, where it can be printed in
// a line or two, a source that gives rise to each.
func (m *markdown) messages() {
	m.text("## Messages",
		"A message is `file:line:column: error: what is wrong [code]`, the line of the file with a mark under the place, the reason with its values, and what to write. `epure explain CODE` shows a source that gives rise to it.")
	var rows [][]string
	for _, e := range diag.Codes() {
		rows = append(rows, []string{"`" + string(e.Code) + "`", e.Meaning})
	}
	m.table([]string{"code", "meaning"}, rows)
}
