package check

import (
	"strings"

	"epure/lang/catalogue"
	"epure/lang/quantity"
)

// name returns a kind in words, with its article.
func name(k catalogue.Kind) string {
	switch k.Class {
	case catalogue.Quantity:
		return k.Of.String()
	case catalogue.Triple:
		return tripleName(k.Of)
	case catalogue.Pair:
		return "a place (x, y)"
	case catalogue.Group:
		return "a ring or row"
	case catalogue.Outline:
		return "an outline"
	case catalogue.Solid:
		return "a solid"
	case catalogue.Development:
		return "a development"
	case catalogue.Sphere:
		return "a focal sphere"
	}
	return classNames[k.Class]
}

var classNames = map[catalogue.Class]string{
	catalogue.Unknown: "something unknown", catalogue.Text: "a text", catalogue.YesNo: "yes or no",
	catalogue.Line: "a line", catalogue.Plane: "a plane", catalogue.Face: "a face", catalogue.Edge: "an edge",
	catalogue.Section: "a section", catalogue.Titles: "the fields of a title block", catalogue.Block: "an output block",
	catalogue.View: "a view", catalogue.Mark: "a mark on the drawing",
}

func tripleName(of quantity.Kind) string {
	switch of {
	case quantity.Length:
		return "a point"
	case quantity.Number, quantity.Zero:
		return "a direction"
	}
	return "a triple of " + of.String()
}

// names lists kinds in words: "a length or an angle". Kinds of one name are
// named once.
func names(ks []catalogue.Kind, words []string) string {
	var out []string
	seen := map[string]bool{}
	add := func(s string) {
		if !seen[s] {
			seen[s] = true
			out = append(out, s)
		}
	}
	for _, k := range ks {
		add(name(k))
	}
	for _, w := range words {
		add("`" + w + "`")
	}
	return list(out, "or")
}

// list joins phrases with commas and a last word.
func list(items []string, last string) string {
	switch len(items) {
	case 0:
		return ""
	case 1:
		return items[0]
	}
	return strings.Join(items[:len(items)-1], ", ") + " " + last + " " + items[len(items)-1]
}

// ticked puts each word in backquotes and lists them.
func ticked(words []string, last string) string {
	var out []string
	for _, w := range words {
		out = append(out, "`"+w+"`")
	}
	return list(out, last)
}

// a puts the article before a word of the catalogue.
func a(word string) string {
	if strings.ContainsRune("aeiou", rune(word[0])) {
		return "an " + word
	}
	return "a " + word
}

// fits tells whether a value of kind k may stand where one of the kinds is wanted.
func fits(k catalogue.Kind, takes []catalogue.Kind) bool {
	if k.Class == catalogue.Unknown {
		return true
	}
	for _, t := range takes {
		if t.Class != k.Class {
			continue
		}
		switch k.Class {
		case catalogue.Quantity, catalogue.Triple, catalogue.Pair:
			if k.Of == t.Of || k.Of == quantity.Zero {
				return true
			}
		default:
			return true
		}
	}
	return false
}
