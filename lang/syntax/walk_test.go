package syntax

import (
	"testing"
	"unicode/utf8"
)

// checkSpans looks at every node of a tree: its span lies in the file and in that
// of its parent, on whole runes, and statements follow each other.
func checkSpans(t testing.TB, tree *File) {
	t.Helper()
	size := len(tree.Source.Text)
	inside := tree.Source.Span(0, size)
	var stack []Node
	for _, s := range tree.Statements {
		stack = append(stack, s)
	}
	inOrder(t, tree.Statements)
	for len(stack) > 0 {
		n := stack[len(stack)-1]
		stack = stack[:len(stack)-1]
		s := n.Span()
		if s.File != tree.Source || !inside.Contains(s) || s.Start > s.End {
			t.Fatalf("%T: span %d..%d of %d bytes", n, s.Start, s.End, size)
		}
		if s.Start < size && !utf8.RuneStart(tree.Source.Text[s.Start]) && utf8.Valid(tree.Source.Text) {
			t.Fatalf("%T: span %d..%d begins inside a rune", n, s.Start, s.End)
		}
		for _, child := range children(t, n) {
			if !s.Contains(child.Span()) {
				c := child.Span()
				t.Fatalf("%T %d..%d in %T %d..%d", child, c.Start, c.End, n, s.Start, s.End)
			}
			stack = append(stack, child)
		}
		stack = append(stack, inBlock(t, n)...)
	}
}

// inOrder checks that statements do not overlap, and that blocks lie between.
func inOrder(t testing.TB, list []Statement) {
	t.Helper()
	end := 0
	for _, s := range list {
		if s.Span().Start < end {
			t.Fatalf("statement at %d begins before %d", s.Span().Start, end)
		}
		end = s.Span().End
	}
}

// inBlock returns the statements in the block of a statement.
func inBlock(t testing.TB, n Node) (out []Node) {
	var list []Statement
	switch n := n.(type) {
	case *Sentence:
		list = n.Block
	case *Bad:
		list = n.Block
	}
	inOrder(t, list)
	for _, s := range list {
		out = append(out, s)
	}
	return out
}

// children returns the nodes directly inside a node.
func children(t testing.TB, n Node) (out []Node) {
	expr := func(es ...Expr) {
		for _, e := range es {
			if e != nil {
				out = append(out, e)
			}
		}
	}
	text := func(x *TextLit) {
		if x != nil {
			out = append(out, x)
		}
	}
	clauses := func(cs []Clause) {
		for _, c := range cs {
			out = append(out, c)
		}
	}
	switch n := n.(type) {
	case *Given:
		out = append(out, n.Name)
		expr(n.Expr)
		text(n.Text)
		clauses(n.Clauses)
	case *Verify:
		expr(n.Left, n.Right, n.Within)
		text(n.Text)
	case *Take:
		out = append(out, n.Name)
		text(n.Path)
	case *Case:
		text(n.Name)
		text(n.Path)
		clauses(n.Clauses)
	case *Sentence:
		if n.Name != nil {
			out = append(out, n.Name)
		}
		if n.Thing != nil {
			out = append(out, n.Thing)
		}
		expr(n.Expr)
	case *Bad:
		for _, name := range n.Names {
			out = append(out, name)
		}
	case *Thing:
		out = append(out, n.Form)
		text(n.Text)
		clauses(n.Clauses)
	case Clause:
		out = append(out, n.Word)
		expr(n.Values...)
	case *TextLit:
		for _, p := range n.Parts {
			if p.Hole != nil {
				expr(p.Hole.Expr, p.Hole.Nearest)
			}
		}
	case *Member:
		expr(n.X)
		out = append(out, n.Name)
	case *Call:
		expr(n.X)
		expr(n.Args...)
	case *Tuple:
		expr(n.Items...)
	case *Paren:
		expr(n.X)
	case *Unary:
		expr(n.X)
	case *Binary:
		expr(n.Left, n.Right)
	case *Quantity, *Name, *Ident:
	default:
		t.Fatalf("what is a %T?", n)
	}
	return out
}
