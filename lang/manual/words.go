// Package manual makes the reference from the catalogue and the table of
// messages: the page MANUAL.md and the entries that `explain` prints. It adds
// only the words between the facts, so that what the manual says is what the
// program does.
package manual

import (
	"fmt"
	"strings"

	"epure/lang/catalogue"
	"epure/lang/quantity"
)

// kindName says what an expression stands for, without an article: "length", "point".
func kindName(k catalogue.Kind) string {
	switch k.Class {
	case catalogue.Unknown:
		return "anything"
	case catalogue.Quantity:
		return strings.TrimPrefix(bare(k.Of.String()), "plain ")
	case catalogue.Text:
		return "text"
	case catalogue.YesNo:
		return "yes or no"
	case catalogue.Triple:
		return tripleName(k.Of, "point", "direction")
	case catalogue.Pair:
		return "place (x, y)"
	case catalogue.Group:
		return "ring or row"
	case catalogue.Outline:
		return "outline"
	case catalogue.Solid:
		return "solid"
	case catalogue.Block:
		return "output block"
	case catalogue.View:
		return "view"
	case catalogue.Mark:
		return "mark in a block"
	case catalogue.Sphere:
		return "focal sphere"
	}
	return strings.ReplaceAll(k.Type, "_", " ")
}

func tripleName(of quantity.Kind, point, direction string) string {
	if of == quantity.Length {
		return point
	}
	return direction
}

// bare drops the article.
func bare(s string) string {
	return strings.TrimPrefix(strings.TrimPrefix(s, "a "), "an ")
}

// kindNames lists kinds and words: "length or `auto`". Kinds of one name are named once.
func kindNames(ks []catalogue.Kind, words []string) string {
	var out []string
	seen := map[string]bool{}
	for _, k := range ks {
		if n := kindName(k); !seen[n] {
			seen[n] = true
			out = append(out, n)
		}
	}
	for _, w := range words {
		out = append(out, "`"+w+"`")
	}
	if len(out) == 0 {
		return "quantity"
	}
	return join(out, "or")
}

// join lists phrases with commas and a last word.
func join(items []string, last string) string {
	if len(items) < 2 {
		return strings.Join(items, "")
	}
	return strings.Join(items[:len(items)-1], ", ") + " " + last + " " + items[len(items)-1]
}

// takes says what stands after a clause word, and how often.
func takes(c catalogue.Clause) string {
	text := kindNames(c.Takes, c.Words)
	if c.Measured {
		text = "measure of a thing (" + text + ")"
	}
	switch {
	case c.Max == 0:
		text += "; one or more"
	case c.Max > 1:
		text += fmt.Sprintf("; up to %d", c.Max)
	}
	if c.Repeat {
		text += "; may stand again"
	}
	return text
}

// unless says what holds when a clause is absent.
func unless(c catalogue.Clause) string {
	switch {
	case c.Needed:
		return "needed"
	case c.Default != "":
		return c.Default
	}
	return ""
}

// choices says in words which clauses need or exclude each other.
func choices(f *catalogue.Form) []string {
	var out []string
	for _, c := range f.Choices {
		var ways []string
		none := false
		for _, w := range c.Ways {
			if len(w) == 0 {
				none = true
				continue
			}
			ways = append(ways, join(ticked(w), "and"))
		}
		out = append(out, choiceWords(c.Any, none)+" "+strings.Join(ways, "; ")+".")
	}
	return out
}

func choiceWords(several, none bool) string {
	switch {
	case several && none:
		return "Any of:"
	case several:
		return "One or more of:"
	case none:
		return "At most one of:"
	}
	return "Exactly one of:"
}

func ticked(words []string) []string {
	var out []string
	for _, w := range words {
		out = append(out, "`"+w+"`")
	}
	return out
}

// signature writes a measure as it is called: focus(number), generator(angle).
// An argument that may be left out stands in square brackets.
func signature(m catalogue.Measure) string {
	if len(m.Args) == 0 {
		return m.Name
	}
	var args []string
	for _, a := range m.Args {
		arg := strings.ReplaceAll(strings.ReplaceAll(kindNames(a.Takes, nil), ", ", "/"), " or ", "/")
		if a.Optional {
			arg = "[" + arg + "]"
		}
		args = append(args, arg)
	}
	return m.Name + "(" + strings.Join(args, ", ") + ")"
}

// call writes a function as it is called: distance(a, b), min(x, …).
func call(f catalogue.Function) string {
	var names []string
	for _, p := range f.Params {
		names = append(names, p.Name)
	}
	if f.Many {
		names = append(names, "…")
	}
	return f.Name + "(" + strings.Join(names, ", ") + ")"
}

// result says what a function gives.
func result(f catalogue.Function) string {
	switch f.Rule {
	case catalogue.Same:
		return "as its argument"
	case catalogue.HalfPower:
		return "length to half the power, or number"
	case catalogue.OfTriples:
		return "number, length or area, by its arguments"
	}
	return kindName(f.Kind)
}

// params says what a function takes.
func params(f catalogue.Function) string {
	var out []string
	for _, p := range f.Params {
		out = append(out, p.Name+": "+kindNames(p.Takes, nil))
	}
	return strings.Join(out, "; ")
}

// textWords says whether a text follows the word of a form.
func textWords(f *catalogue.Form) string {
	switch f.Text {
	case catalogue.Must:
		return "A text in quotes follows the word."
	case catalogue.Maybe:
		return "A text in quotes may follow the word."
	}
	return ""
}

// placeWords says where the statement stands.
func placeWords(f *catalogue.Form) string {
	switch {
	case len(f.Within) > 0:
		return "It stands in the block of a " + join(ticked(f.Within), "or") + "."
	case f.Block:
		return "It opens a block with `{`, which `}` on a line of its own closes."
	}
	return ""
}

// notes are the sentences about a form, those that it has.
func notes(f *catalogue.Form) []string {
	var out []string
	for _, s := range append([]string{f.Help, f.More, textWords(f), placeWords(f)}, choices(f)...) {
		if s != "" {
			out = append(out, s)
		}
	}
	return out
}
