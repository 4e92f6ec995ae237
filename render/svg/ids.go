package svg

import (
	"fmt"
	"strings"
	"unicode"
)

// ids makes XML ids from names: sheet--view--thing--feature. The separator never
// occurs inside a part, so different names give different ids, also across the
// sheets of one page; names that still meet (a key used twice) get a number.
type ids struct {
	sheet string
	used  map[string]bool
}

func newIDs(sheet string) *ids { return &ids{prefix(sheet), map[string]bool{}} }

// prefix is part, made to start with a letter or an underscore as an id must.
func prefix(sheet string) string {
	p := part(sheet)
	if r := []rune(p); len(r) == 0 || !unicode.IsLetter(r[0]) && r[0] != '_' {
		return "_" + p
	}
	return p
}

// named returns the id for a chain of names. Empty names stand aside, except that
// a chain ending in an empty name has no id of its own.
func (d *ids) named(names ...string) string {
	if names[len(names)-1] == "" {
		return ""
	}
	parts := make([]string, 0, len(names))
	for _, n := range names {
		if n != "" {
			parts = append(parts, part(n))
		}
	}
	return d.unique(strings.Join(parts, "--"))
}

// unique returns the sheet's prefix and s, numbered when it is in use.
func (d *ids) unique(s string) string {
	id := d.sheet + "--" + s
	for n := 2; d.used[id]; n++ {
		id = fmt.Sprintf("%s--%s--%d", d.sheet, s, n)
	}
	d.used[id] = true
	return id
}

// part writes a name with the characters that an id may have: letters, digits and
// underscores stay, a hyphen does where it cannot be taken for the separator, a
// slash becomes a full stop, and the rest their code point between full stops.
func part(name string) string {
	var b strings.Builder
	rs := []rune(name)
	for i, r := range rs {
		switch {
		case r == '_' || r < 0x250 && (unicode.IsLetter(r) || unicode.IsDigit(r)) && r != 'ª' && r != 'µ' && r != 'º':
			b.WriteRune(r)
		case r == '-' && i > 0 && i < len(rs)-1 && rs[i-1] != '-':
			b.WriteRune(r)
		case r == '/':
			b.WriteByte('.')
		default:
			fmt.Fprintf(&b, ".%x.", r)
		}
	}
	return b.String()
}
