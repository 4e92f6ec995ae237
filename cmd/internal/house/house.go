// Package house holds the rules of the house as tests: which package may import
// which, what may not be called where, how long a function may be, and that what
// is made from tables is made from the tables as they are now. A rule that only
// stands in a text is forgotten; here it fails.
//
// What this file has is the reading of the source tree that the tests share.
package house

import (
	"go/ast"
	"go/parser"
	"go/token"
	"io/fs"
	"os"
	"path/filepath"
	"sort"
	"strings"
)

// Module is the name of the module, which begins all its import paths.
const Module = "epure"

// Source is one Go file of the house, parsed.
type Source struct {
	Path   string // from the top of the repository, with slashes
	Folder string // the folder part of Path
	Test   bool
	Text   []byte
	Tree   *ast.File
	Set    *token.FileSet
}

// Top returns the top folder of the repository: the nearest one upward that holds go.mod.
func Top() (string, error) {
	folder, err := filepath.Abs(".")
	if err != nil {
		return "", err
	}
	for {
		if _, err := os.Stat(filepath.Join(folder, "go.mod")); err == nil {
			return folder, nil
		}
		up := filepath.Dir(folder)
		if up == folder {
			return "", fs.ErrNotExist
		}
		folder = up
	}
}

// Texts returns the text files of the house, by their path from the top. Folders
// whose names begin with a dot are skipped, except the one of the build's
// script; so are drawings.
func Texts(top string) (map[string][]byte, error) {
	texts := map[string][]byte{}
	err := filepath.WalkDir(top, func(path string, d fs.DirEntry, err error) error {
		if err != nil {
			return err
		}
		rel, _ := filepath.Rel(top, path)
		if d.IsDir() {
			if hiddenFolder(d.Name()) && path != top {
				return filepath.SkipDir
			}
			return nil
		}
		if !textName(d.Name()) {
			return nil
		}
		texts[filepath.ToSlash(rel)], err = os.ReadFile(path)
		return err
	})
	return texts, err
}

func hiddenFolder(name string) bool {
	return strings.HasPrefix(name, ".") && name != ".ci" || name == "drawings"
}

// textName tells files that people write from those that programs write.
func textName(name string) bool {
	switch filepath.Ext(name) {
	case ".go", ".md", ".epure", ".txtar", ".txt", ".mod", "":
		return true
	}
	return false
}

// Sources parses the Go files of the house, in the order of their paths.
func Sources(top string) ([]Source, error) {
	texts, err := Texts(top)
	if err != nil {
		return nil, err
	}
	var out []Source
	set := token.NewFileSet()
	for path, text := range texts {
		if !strings.HasSuffix(path, ".go") || strings.Contains(path, "testdata/") {
			continue
		}
		tree, err := parser.ParseFile(set, path, text, parser.ParseComments)
		if err != nil {
			return nil, err
		}
		out = append(out, Source{path, filepath.ToSlash(filepath.Dir(path)), strings.HasSuffix(path, "_test.go"), text, tree, set})
	}
	sort.Slice(out, func(i, j int) bool { return out[i].Path < out[j].Path })
	return out, nil
}

// Imports returns the import paths of a file.
func (s Source) Imports() []string {
	var out []string
	for _, i := range s.Tree.Imports {
		out = append(out, strings.Trim(i.Path.Value, `"`))
	}
	return out
}

// Line returns the line of a place.
func (s Source) Line(p token.Pos) int { return s.Set.Position(p).Line }
