package manual

import (
	"strings"
	"unicode/utf8"

	"epure/lang/catalogue"
	"epure/lang/diag"
)

// Entry returns everything that the manual says of a word, as text for a
// terminal. A word can be several things at once, as `angle` is a function and a
// measure; ok is false when it is none.
func Entry(word string) (text string, ok bool) {
	var p page
	for _, find := range []func(*page, string){statement, form, feature, clauses, measures, function, builtin, shown, command, message} {
		find(&p, word)
	}
	return p.b.String(), p.b.Len() > 0
}

// page is text for a terminal being written.
type page struct{ b strings.Builder }

// head begins an entry.
func (p *page) head(word, what string) {
	if p.b.Len() > 0 {
		p.b.WriteByte('\n')
	}
	p.lines(word + ": " + what)
}

func (p *page) lines(lines ...string) {
	for _, l := range lines {
		p.b.WriteString(l + "\n")
	}
}

// table writes rows with aligned columns under a heading, nothing for no rows.
func (p *page) table(heading string, rows [][]string) {
	if len(rows) == 0 {
		return
	}
	p.lines("", heading)
	wide := make([]int, len(rows[0]))
	for _, r := range rows {
		for i, c := range r {
			wide[i] = max(wide[i], utf8.RuneCountInString(c))
		}
	}
	for _, r := range rows {
		line := " "
		for i, c := range r {
			line += " " + c + strings.Repeat(" ", wide[i]-utf8.RuneCountInString(c)+1)
		}
		p.lines(strings.TrimRight(line, " "))
	}
}

// example writes a source, indented.
func (p *page) example(source string) {
	if source == "" {
		return
	}
	p.lines("", "Example")
	for _, l := range strings.Split(strings.TrimRight(source, "\n"), "\n") {
		p.lines(strings.TrimRight("  "+l, " "))
	}
}

func statement(p *page, word string) {
	for i := range catalogue.Statements {
		if s := &catalogue.Statements[i]; s.Word == word {
			p.head(word, "statement")
			p.lines(notes(s)...)
			p.example(s.Example)
		}
	}
}

func form(p *page, word string) {
	f, ok := catalogue.FormNamed(word)
	if !ok {
		return
	}
	p.head(word, "form, "+f.Chapter)
	p.lines(notes(f)...)
	p.table("Clauses", clauseRows(f))
	p.table("Measures", measureRows(f.Measures))
	p.example(f.Example)
}

func clauseRows(f *catalogue.Form) [][]string {
	var rows [][]string
	for _, c := range f.Clauses {
		help := c.Help
		if u := unless(c); u != "" {
			help += " (" + u + ")"
		}
		rows = append(rows, []string{c.Word, takes(c), help})
	}
	return rows
}

func measureRows(ms []catalogue.Measure) [][]string {
	var rows [][]string
	for _, m := range ms {
		rows = append(rows, []string{signature(m), kindName(m.Kind), m.Help})
	}
	return rows
}

func feature(p *page, word string) {
	for _, t := range catalogue.Types {
		if t.Name == word {
			p.head(word, "part of a thing")
			p.lines(t.Help)
			p.table("Measures", measureRows(t.Measures))
			p.example(t.Example + "x = " + t.Subject + "." + t.Measures[0].Name + "\n")
		}
	}
}

// clauses lists every form that takes a clause of this word.
func clauses(p *page, word string) {
	var rows [][]string
	for i := range catalogue.Forms {
		f := &catalogue.Forms[i]
		if c, ok := f.ClauseNamed(word); ok {
			rows = append(rows, []string{f.Word, takes(*c), c.Help})
		}
	}
	if len(rows) > 0 {
		p.head(word, "clause")
		p.table("In the forms", rows)
	}
}

// measures lists everything that has a measure of this name.
func measures(p *page, word string) {
	var rows [][]string
	add := func(owner string, ms []catalogue.Measure) {
		for _, m := range ms {
			if m.Name == word {
				rows = append(rows, []string{owner, signature(m), kindName(m.Kind), m.Help})
			}
		}
	}
	for _, f := range catalogue.Forms {
		add(f.Word, f.Measures)
	}
	for _, t := range catalogue.Types {
		add(t.Name, t.Measures)
	}
	if len(rows) > 0 {
		p.head(word, "measure")
		p.table("Of the forms and their parts", rows)
	}
}

func function(p *page, word string) {
	if f, ok := catalogue.FunctionNamed(word); ok {
		p.head(call(*f), "function")
		p.lines(f.Help, "Takes "+params(*f)+". Gives "+result(*f)+".")
		p.example("x = " + f.Example)
	}
}

func builtin(p *page, word string) {
	if b, ok := catalogue.BuiltinNamed(word); ok {
		p.head(word, "built-in name, "+kindName(b.Kind))
		p.lines(b.Help)
	}
}

func shown(p *page, word string) {
	for _, w := range catalogue.ShowWords {
		if w.Name == word {
			p.head(word, "word of `show` and `without`")
			p.lines(capital(w.Help) + ".")
		}
	}
}

// capital makes the first letter large.
func capital(s string) string {
	_, size := utf8.DecodeRuneInString(s)
	return strings.ToUpper(s[:size]) + s[size:]
}

func command(p *page, word string) {
	for _, c := range catalogue.Commands {
		if c.Name == word {
			p.head("epure "+c.Name+" "+c.Args, "command")
			p.lines(c.Help)
			p.table("Options", optionRows(c.Name))
		}
	}
}

func optionRows(verb string) [][]string {
	var rows [][]string
	for _, o := range catalogue.Options {
		for _, v := range o.Verbs {
			if v == verb {
				rows = append(rows, []string{o.Name, o.Help})
			}
		}
	}
	return rows
}

func message(p *page, word string) {
	if e, ok := diag.Lookup(diag.Code(word)); ok {
		p.head(word, "message")
		p.lines(e.Meaning)
		p.example(printable(e.Example))
	}
}

// shownBytes is the longest example of a message that is printed; longer ones,
// whose fault is their length, tell nothing more.
const shownBytes = 400

// printable returns a source that can be printed as it is, or "".
func printable(source string) string {
	if len(source) > shownBytes || !utf8.ValidString(source) || strings.ContainsFunc(source, hidden) {
		return ""
	}
	return source
}

// hidden tells runes that nobody would see.
func hidden(r rune) bool {
	return r < ' ' && r != '\n' || r == 0x7f || r == '\u200b' || r == '\uFEFF' || r == utf8.RuneError
}
