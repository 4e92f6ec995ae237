package house

import (
	"bytes"
	"go/ast"
	"go/format"
	"go/token"
	"strings"
	"testing"
)

const (
	maxFunction = 60  // lines of a function
	maxFile     = 400 // lines of a file that is not a test
)

// flat are functions that may be longer, with the reason: one table or one
// switch, read from top to bottom, of which a half would tell nothing.
var flat = map[string]string{
	"lang/diag.laterCodes":  "a table, one row a code",
	"lang/diag.syntaxCodes": "a table, one row a code",
}

func TestFormatted(t *testing.T) {
	for _, s := range sources(t) {
		want, err := format.Source(s.Text)
		if err != nil {
			t.Errorf("%s: %v", s.Path, err)
		} else if !bytes.Equal(want, s.Text) {
			t.Errorf("%s is not formatted as gofmt does", s.Path)
		}
	}
}

func TestOneScreen(t *testing.T) {
	for _, s := range sources(t) {
		if n := bytes.Count(s.Text, []byte("\n")); n > maxFile && !s.Test && !tables(s) {
			t.Errorf("%s has %d lines; a file has %d at most, and one noun", s.Path, n, maxFile)
		}
		for _, d := range s.Tree.Decls {
			f, ok := d.(*ast.FuncDecl)
			if !ok || f.Body == nil || s.Test {
				continue
			}
			n := s.Line(f.End()) - s.Line(f.Pos()) + 1
			name := s.Folder + "." + f.Name.Name
			if n > maxFunction && flat[name] == "" {
				t.Errorf("%s:%d: %s has %d lines; a function has %d at most", s.Path, s.Line(f.Pos()), f.Name.Name, n, maxFunction)
			}
		}
	}
}

// tables tells files that hold one table: the catalogue is one.
func tables(s Source) bool { return s.Folder == "lang/catalogue" }

func TestNoInit(t *testing.T) {
	for _, s := range sources(t) {
		for _, d := range s.Tree.Decls {
			if f, ok := d.(*ast.FuncDecl); ok && f.Recv == nil && f.Name.Name == "init" {
				t.Errorf("%s:%d: nothing happens before main", s.Path, s.Line(f.Pos()))
			}
		}
	}
}

// TestPackageVariablesStay looks for assignments to variables of a package. What
// the parser has resolved inside the file says for itself where it is declared; a
// name that it has not resolved is the package's if the package declares it.
func TestPackageVariablesStay(t *testing.T) {
	declared := map[string]map[string]bool{}
	for _, s := range sources(t) {
		for _, name := range packageVariables(s) {
			if declared[s.Folder] == nil {
				declared[s.Folder] = map[string]bool{}
			}
			declared[s.Folder][name] = true
		}
	}
	for _, s := range sources(t) {
		if s.Test {
			continue
		}
		ast.Inspect(s.Tree, func(n ast.Node) bool {
			for _, target := range targets(n) {
				if id := root(target); id != nil && id.Name != "_" && declared[s.Folder][id.Name] && !local(s, id) {
					t.Errorf("%s:%d: %s is a variable of the package and is changed", s.Path, s.Line(id.Pos()), id.Name)
				}
			}
			return true
		})
	}
}

func packageVariables(s Source) []string {
	var out []string
	for _, d := range s.Tree.Decls {
		g, ok := d.(*ast.GenDecl)
		if !ok || g.Tok != token.VAR {
			continue
		}
		for _, spec := range g.Specs {
			for _, id := range spec.(*ast.ValueSpec).Names {
				out = append(out, id.Name)
			}
		}
	}
	return out
}

// targets are the expressions that a statement changes.
func targets(n ast.Node) []ast.Expr {
	switch n := n.(type) {
	case *ast.AssignStmt:
		if n.Tok != token.DEFINE {
			return n.Lhs
		}
	case *ast.IncDecStmt:
		return []ast.Expr{n.X}
	}
	return nil
}

// root is the variable that an expression such as x.a[i] is a part of.
func root(e ast.Expr) *ast.Ident {
	for {
		switch x := e.(type) {
		case *ast.Ident:
			return x
		case *ast.SelectorExpr:
			e = x.X
		case *ast.IndexExpr:
			e = x.X
		case *ast.ParenExpr:
			e = x.X
		default:
			return nil
		}
	}
}

// local says whether a name stands for something declared inside a function.
func local(s Source, id *ast.Ident) bool {
	if id.Obj == nil {
		return false
	}
	at := id.Obj.Pos()
	for _, d := range s.Tree.Decls {
		if f, ok := d.(*ast.FuncDecl); ok && f.Pos() <= at && at < f.End() {
			return true
		}
	}
	return false
}

// TestExportedNamesAreDocumented wants a comment on every exported name, which
// begins with the name where it is a function, a method or a type.
func TestExportedNamesAreDocumented(t *testing.T) {
	for _, s := range sources(t) {
		if s.Test || s.Tree.Name.Name == "main" {
			continue
		}
		var row *ast.FuncDecl
		for _, d := range s.Tree.Decls {
			switch d := d.(type) {
			case *ast.FuncDecl:
				if d.Name.IsExported() && exportedReceiver(d) && !follows(s, d, row) {
					documented(t, s, d.Name, d.Doc)
				}
				row = d
			case *ast.GenDecl:
				documentedGroup(t, s, d)
			}
		}
	}
}

// follows says whether a method stands in a row of methods of one name, a line
// each, over which there is one comment.
func follows(s Source, f, before *ast.FuncDecl) bool {
	return before != nil && f.Doc == nil && before.Name.Name == f.Name.Name && s.Line(f.Pos()) == s.Line(before.End())+1
}

func documented(t *testing.T, s Source, name *ast.Ident, doc *ast.CommentGroup) {
	if text := doc.Text(); !strings.HasPrefix(text, name.Name+" ") && !strings.HasPrefix(text, name.Name+",") {
		t.Errorf("%s:%d: the comment of %s begins with its name", s.Path, s.Line(name.Pos()), name.Name)
	}
}

func exportedReceiver(f *ast.FuncDecl) bool {
	if f.Recv == nil {
		return true
	}
	e := f.Recv.List[0].Type
	if star, ok := e.(*ast.StarExpr); ok {
		e = star.X
	}
	id, ok := e.(*ast.Ident)
	return ok && id.IsExported()
}

// documentedGroup looks at a declaration of types, constants or variables. One
// comment over a group of values speaks for all of them.
func documentedGroup(t *testing.T, s Source, d *ast.GenDecl) {
	for _, spec := range d.Specs {
		switch spec := spec.(type) {
		case *ast.TypeSpec:
			doc := spec.Doc
			if doc == nil {
				doc = d.Doc
			}
			if spec.Name.IsExported() {
				documented(t, s, spec.Name, doc)
			}
		case *ast.ValueSpec:
			for _, name := range spec.Names {
				if name.IsExported() && d.Doc == nil && spec.Doc == nil && spec.Comment == nil {
					t.Errorf("%s:%d: %s has no comment", s.Path, s.Line(name.Pos()), name.Name)
				}
			}
		}
	}
}
