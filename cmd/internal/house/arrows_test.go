package house

import (
	"slices"
	"strings"
	"testing"
)

// lattice is the one order of the packages: `a b < c d` lets c and d import a and b
// and whatever those may import. What is not allowed is forbidden. Before adding
// a line, ask whether the thing that is missing does not belong lower down.
const lattice = `
	# the language; spell and quantity know nothing of files
	source < diag
	diag quantity spell < syntax
	quantity < catalogue
	syntax catalogue spell < check
	catalogue diag < manual

	# the geometry, which knows neither language nor paper
	num < vec < curve < surface < body < cut flat view

	# from the language to values
	quantity source cut flat < scene
	catalogue diag scene < forms
	check forms < eval

	# paper
	vec curve < drawing < font < svg pdf png furniture
	scene view furniture < compose

	# the program
	source < host < watch < build
	eval compose svg pdf png < build
	build manual spell < cli < epure
	build manual < house
`

// homes gives each short name its folder.
var homes = map[string]string{
	"source": "lang/source", "diag": "lang/diag", "quantity": "lang/quantity", "spell": "lang/spell", "syntax": "lang/syntax",
	"catalogue": "lang/catalogue", "check": "lang/check", "manual": "lang/manual",
	"num": "geom/num", "vec": "geom/vec", "curve": "geom/curve", "surface": "geom/surface", "body": "geom/body", "cut": "geom/cut", "flat": "geom/flat", "view": "geom/view",
	"scene": "eval/scene", "forms": "eval/forms", "eval": "eval",
	"drawing": "render/drawing", "font": "render/font", "svg": "render/svg", "pdf": "render/pdf", "png": "render/png", "furniture": "render/furniture", "compose": "render/compose",
	"host": "cmd/internal/host", "watch": "cmd/internal/watch", "build": "cmd/internal/build", "cli": "cmd/internal/cli", "epure": "cmd/epure", "house": "cmd/internal/house",
}

// testOnly are folders that tests alone may import, from anywhere.
var testOnly = []string{"lang/diag/diagtest", "cmd/internal/host/hosttest"}

// below returns for each folder the set of folders that it may import.
func below(t *testing.T) map[string]map[string]bool {
	direct := map[string][]string{}
	for _, line := range strings.Split(lattice, "\n") {
		line, _, _ = strings.Cut(line, "#")
		steps := strings.Split(line, "<")
		for i := 1; i < len(steps); i++ {
			for _, upper := range strings.Fields(steps[i]) {
				for _, lower := range strings.Fields(steps[i-1]) {
					if homes[upper] == "" || homes[lower] == "" {
						t.Fatalf("the lattice speaks of %q or %q, which have no folder", upper, lower)
					}
					direct[homes[upper]] = append(direct[homes[upper]], homes[lower])
				}
			}
		}
	}
	closed := map[string]map[string]bool{}
	for _, folder := range homes {
		closed[folder] = map[string]bool{}
		reach(direct, folder, closed[folder])
	}
	return closed
}

func reach(direct map[string][]string, from string, seen map[string]bool) {
	for _, next := range direct[from] {
		if !seen[next] {
			seen[next] = true
			reach(direct, next, seen)
		}
	}
}

func TestLatticeHasNoRing(t *testing.T) {
	for folder, lower := range below(t) {
		if lower[folder] {
			t.Errorf("%s stands below itself", folder)
		}
	}
}

func TestArrowsRunOneWay(t *testing.T) {
	allowed := below(t)
	for _, s := range sources(t) {
		if slices.Contains(testOnly, s.Folder) {
			continue
		}
		if allowed[s.Folder] == nil {
			t.Errorf("%s: the folder stands nowhere in the lattice", s.Path)
			continue
		}
		for _, path := range s.Imports() {
			lower, ours := strings.CutPrefix(path, Module+"/")
			switch {
			case !ours:
			case s.Test && (lower == s.Folder || slices.Contains(testOnly, lower)):
			case s.Test && !strings.HasPrefix(lower, "cmd"):
				// a test may look at what stands above, to check against it
			case !allowed[s.Folder][lower]:
				t.Errorf("%s imports %s: the lattice does not allow it", s.Path, lower)
			}
		}
	}
}

// worldly are the packages through which a result could depend on the world.
var worldly = []string{"os", "os/signal", "os/exec", "time", "flag", "net", "net/http", "log", "math/rand", "math/rand/v2", "crypto/rand", "syscall", "path/filepath"}

func TestOnlyTheProgramTouchesTheWorld(t *testing.T) {
	for _, s := range sources(t) {
		if s.Test || strings.HasPrefix(s.Folder, "cmd/") || s.Folder == "lang/diag/diagtest" {
			continue
		}
		for _, path := range s.Imports() {
			if slices.Contains(worldly, path) {
				t.Errorf("%s imports %s: the world comes in through cmd alone", s.Path, path)
			}
		}
	}
}
