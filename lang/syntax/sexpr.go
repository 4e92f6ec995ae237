package syntax

import (
	"fmt"
	"strings"
)

// Sexpr writes a part of the tree in one line of nested brackets, for tests.
func Sexpr(n any) string {
	var b strings.Builder
	sexpr(&b, n)
	return b.String()
}

func sexpr(b *strings.Builder, n any) {
	switch n := n.(type) {
	case *File:
		list(b, "file", n.Statements)
	case Statement:
		sexprStatement(b, n)
	case Expr:
		sexprExpr(b, n)
	case *Thing:
		list(b, "thing", n.Form.Text, n.Text, n.Clauses)
	case Clause:
		list(b, n.Word.Text, n.Values)
	case *Ident:
		b.WriteString(n.Text)
	}
}

func sexprStatement(b *strings.Builder, s Statement) {
	switch s := s.(type) {
	case *Given:
		list(b, "given", s.Name.Text, s.Expr, s.Text, s.Clauses)
	case *Verify:
		list(b, "verify", s.Op, s.Left, s.Right, labelled("within", s.Within), s.Text)
	case *Take:
		list(b, "take", s.Name.Text, s.Path)
	case *Case:
		list(b, "case", s.Name, labelled("from", s.Path), s.Clauses)
	case *Sentence:
		var name any
		if s.Name != nil {
			name = s.Name.Text
		}
		list(b, "=", name, s.Thing, s.Expr, blockOf(s.HasBlock, s.Block))
	case *Bad:
		list(b, "bad", s.Names, blockOf(s.HasBlock, s.Block))
	}
}

func sexprExpr(b *strings.Builder, e Expr) {
	switch e := e.(type) {
	case *Quantity:
		b.WriteString(e.At.Text())
	case *TextLit:
		sexprText(b, e)
	case *Name:
		b.WriteString(e.Text)
	case *Member:
		list(b, ".", e.X, e.Name.Text)
	case *Call:
		list(b, "call", e.X, e.Args)
	case *Tuple:
		list(b, "tuple", e.Items)
	case *Paren:
		list(b, "paren", e.X)
	case *Unary:
		list(b, "-", e.X)
	case *Binary:
		list(b, e.Op, e.Left, e.Right)
	}
}

func sexprText(b *strings.Builder, t *TextLit) {
	b.WriteByte('"')
	for _, p := range t.Parts {
		if p.Hole == nil {
			b.WriteString(strings.ReplaceAll(p.Literal, "\n", "\\n"))
			continue
		}
		list(b, "hole", p.Hole.Expr, p.Hole.Nearest)
	}
	b.WriteByte('"')
}

// group is a labelled list, written only if it has something in it.
type group struct {
	label string
	items []any
}

func labelled(label string, item any) any {
	if isNil(item) {
		return nil
	}
	return group{label, []any{item}}
}

func blockOf(has bool, statements []Statement) any {
	if !has {
		return nil
	}
	g := group{label: "block"}
	for _, s := range statements {
		g.items = append(g.items, s)
	}
	return g
}

// list writes (label item …); nil items are left out and slices are spread.
func list(b *strings.Builder, label string, items ...any) {
	fmt.Fprintf(b, "(%s", label)
	for _, item := range items {
		for _, one := range spread(item) {
			b.WriteByte(' ')
			switch one := one.(type) {
			case string:
				b.WriteString(one)
			case group:
				list(b, one.label, one.items...)
			default:
				sexpr(b, one)
			}
		}
	}
	b.WriteByte(')')
}

// spread returns the items of a slice, nothing for nil, else the item itself.
func spread(item any) []any {
	switch item := item.(type) {
	case []Statement:
		return anys(item)
	case []Expr:
		return anys(item)
	case []Clause:
		return anys(item)
	case []*Ident:
		return anys(item)
	}
	if isNil(item) {
		return nil
	}
	return []any{item}
}

func anys[T any](items []T) []any {
	out := make([]any, len(items))
	for i, item := range items {
		out[i] = item
	}
	return out
}

// isNil says whether an item is nothing.
func isNil(item any) bool {
	switch item := item.(type) {
	case nil:
		return true
	case *TextLit:
		return item == nil
	case *Thing:
		return item == nil
	}
	return false
}
