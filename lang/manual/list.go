package manual

import (
	"strings"

	"epure/lang/catalogue"
	"epure/lang/diag"
)

// group is a heading with the words under it.
type group struct {
	heading string
	words   []string
}

// groups is every word that has an entry, in the order of the manual; a word
// may stand in several groups.
func groups() []group {
	var out []group
	add := func(heading, word string) {
		if n := len(out); n == 0 || out[n-1].heading != heading {
			out = append(out, group{heading: heading})
		}
		g := &out[len(out)-1]
		for _, w := range g.words {
			if w == word {
				return
			}
		}
		g.words = append(g.words, word)
	}
	for _, c := range catalogue.Commands {
		add("Commands", c.Name)
	}
	for _, s := range catalogue.Statements {
		add("Statements", s.Word)
	}
	for _, f := range catalogue.Forms {
		add("Forms: "+f.Chapter, f.Word)
	}
	for _, t := range catalogue.Types {
		add("Parts of things", t.Name)
	}
	for _, f := range catalogue.Functions {
		add("Functions", f.Name)
	}
	for _, b := range catalogue.Builtins {
		add("Built-in names", b.Name)
	}
	for _, w := range catalogue.ShowWords {
		add("Words of show and without", w.Name)
	}
	for _, f := range catalogue.Forms {
		for _, c := range f.Clauses {
			add("Clauses", c.Word)
		}
	}
	for _, ms := range allMeasures() {
		for _, m := range ms {
			add("Measures", m.Name)
		}
	}
	for _, e := range diag.Codes() {
		add("Messages", string(e.Code))
	}
	return out
}

func allMeasures() [][]catalogue.Measure {
	var out [][]catalogue.Measure
	for _, f := range catalogue.Forms {
		out = append(out, f.Measures)
	}
	for _, t := range catalogue.Types {
		out = append(out, t.Measures)
	}
	return out
}

// Words returns every word that has an entry, those of the language before the
// messages; some stand there more than once.
func Words() []string {
	var out []string
	for _, g := range groups() {
		out = append(out, g.words...)
	}
	return out
}

// listWidth is the width of the list, in columns: what the narrowest usual terminal has.
const listWidth = 80

// List returns all words with an entry under their headings, for a terminal.
func List() string {
	var b strings.Builder
	for i, g := range groups() {
		if i > 0 {
			b.WriteByte('\n')
		}
		b.WriteString(g.heading + "\n")
		line := " "
		for _, w := range g.words {
			if len(line)+1+len(w) > listWidth {
				b.WriteString(line + "\n")
				line = " "
			}
			line += " " + w
		}
		b.WriteString(line + "\n")
	}
	return b.String()
}
