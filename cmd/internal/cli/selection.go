package cli

import (
	"slices"
	"strings"

	"epure/eval/scene"
	"epure/lang/spell"
)

// selection is what `measure` was asked for: things (`S`) and measures
// (`S.focus`, which takes `focus(1)` and `focus(2)` too). Empty, it is all.
type selection []string

// measure says whether a measure of a thing was asked for.
func (s selection) measure(thing, name string) bool {
	if len(s) == 0 {
		return true
	}
	full := thing + "." + name
	return slices.ContainsFunc(s, func(want string) bool {
		return want == thing || want == full || strings.HasPrefix(full, want+"(")
	})
}

// thing says whether something of a thing was asked for.
func (s selection) thing(name string) bool {
	return len(s) == 0 || slices.ContainsFunc(s, func(want string) bool {
		return want == name || strings.HasPrefix(want, name+".")
	})
}

// things returns the names of the things that it speaks of.
func (s selection) things() []string {
	var out []string
	for _, want := range s {
		name, _, _ := strings.Cut(want, ".")
		out = append(out, name)
	}
	return out
}

// unknown returns the first name that is not among the known ones, with the
// nearest that is.
func (s selection) unknown(known []string) (name, near string, found bool) {
	for _, want := range s {
		if !slices.Contains(known, want) {
			near, _ = spell.Nearest(want, known)
			return want, near, true
		}
	}
	return "", "", false
}

// measureNames returns all that a selection could name in a scene: `S.focus(1)` and
// `S.focus`.
func measureNames(sc *scene.Scene) []string {
	var known []string
	for _, t := range sc.Things {
		for _, m := range t.Measures {
			full := t.Name + "." + m.Name
			bare, _, _ := strings.Cut(full, "(")
			known = append(known, full, bare)
		}
	}
	return known
}
