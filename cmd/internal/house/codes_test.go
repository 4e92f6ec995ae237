package house

import (
	"go/ast"
	"go/token"
	"regexp"
	"slices"
	"strconv"
	"strings"
	"testing"

	"epure/lang/diag"
)

// speaking are the folders whose string literals are looked through for codes.
var speaking = []string{"lang/syntax", "lang/check", "eval", "eval/forms", "render/compose", "cmd/internal/build", "cmd/internal/cli"}

// kebab is what the code of a message looks like when it has more than one word.
var kebab = regexp.MustCompile(`^[a-z]+[0-9]*(-[a-z0-9]+)+$`)

// noCodes are literals that look like codes and are none.
var noCodes = []string{"first-angle", "third-angle", "semi-major", "semi-minor", "utf-8"}

// literals calls f for every string literal of the folders that speak.
func literals(t *testing.T, f func(s Source, at token.Pos, text string)) {
	for _, s := range sources(t) {
		if s.Test || !slices.Contains(speaking, s.Folder) {
			continue
		}
		ast.Inspect(s.Tree, func(n ast.Node) bool {
			if lit, ok := n.(*ast.BasicLit); ok && lit.Kind == token.STRING {
				if text, err := strconv.Unquote(lit.Value); err == nil {
					f(s, lit.Pos(), text)
				}
			}
			return true
		})
	}
}

func TestCodesInUseAreInTheTable(t *testing.T) {
	literals(t, func(s Source, at token.Pos, text string) {
		if !kebab.MatchString(text) || slices.Contains(noCodes, text) {
			return
		}
		if _, ok := diag.Lookup(diag.Code(text)); !ok {
			t.Errorf("%s:%d: the code %q is not in the table of lang/diag", s.Path, s.Line(at), text)
		}
	})
}

func TestCodesInTheTableAreInUse(t *testing.T) {
	used := map[string]bool{}
	literals(t, func(_ Source, _ token.Pos, text string) { used[text] = true })
	for _, e := range diag.Codes() {
		if !used[string(e.Code)] {
			t.Errorf("nothing in the program reports %q", e.Code)
		}
	}
}

// TestEveryCodeIsShown wants a source for every code: an annotated one in
// testdata/errors, or for what is no fault of a source a script.
func TestEveryCodeIsShown(t *testing.T) {
	texts, err := Texts(top(t))
	if err != nil {
		t.Fatal(err)
	}
	annotation := regexp.MustCompile(`(?m)^\s*#!.*[\s^~]([a-z][a-z0-9-]*)\s+"`)
	shown := map[string]bool{}
	for path, text := range texts {
		switch {
		case strings.HasPrefix(path, "testdata/errors/"):
			for _, m := range annotation.FindAllSubmatch(text, -1) {
				code := string(m[1])
				shown[code] = true
				if _, ok := diag.Lookup(diag.Code(code)); !ok {
					t.Errorf("%s expects the code %q, which is not in the table", path, code)
				}
			}
		case strings.HasPrefix(path, "testdata/script/"):
			for _, e := range diag.Examples(diag.StageBuild) {
				shown[string(e.Code)] = shown[string(e.Code)] || strings.Contains(string(text), string(e.Code))
			}
		}
	}
	for _, e := range diag.Codes() {
		if !shown[string(e.Code)] {
			t.Errorf("no source in testdata/errors shows %q", e.Code)
		}
	}
}
