// Package check finds out what every word of a file means: which statement a
// name belongs to, what kind every expression is, which clause of which form
// every value belongs to, and in which order things depend on each other. It
// computes nothing, so that every mistake of a file comes out in one run
// whether or not the geometry can be made.
//
// What it finds goes into side tables beside the tree. A mistake is reported
// once, where it is; what depends on it gets the unknown kind, which fits
// everything and makes no further messages.
package check

import (
	"epure/lang/catalogue"
	"epure/lang/source"
	"epure/lang/syntax"
)

// Model is a checked file. It is partial when there were errors: symbols that
// are Bad must not be evaluated.
type Model struct {
	File     *source.File
	Symbols  []*Symbol // in file order, the members of a block after their block
	Order    []*Symbol // each after all that it needs; members of blocks follow the order of the file
	Verifies []*Verify

	refs  map[*syntax.Name]*Symbol
	kinds map[syntax.Expr]catalogue.Kind
}

// Symbol is one statement that makes something: a given, a value, a thing, a
// block, or a member of a block.
type Symbol struct {
	Name     string      // "" when it has none
	NameSpan source.Span // of the name, or of the form when it has no name
	Span     source.Span // of the whole statement
	Kind     catalogue.Kind
	Form     *catalogue.Form // nil for values and givens
	FormSpan source.Span
	Given    *syntax.Given   // for a given
	Expr     syntax.Expr     // for a value and a given
	Text     *syntax.TextLit // the text after a form, or nil
	Clauses  map[string]*Bound
	Parent   *Symbol   // the block that it stands in
	Members  []*Symbol // of a block
	Bad      bool      // something in it is wrong

	sentence          *syntax.Sentence
	meant             map[string]bool // clause words that unknown ones were probably meant to be
	misplaced, ringed bool
	state             state
}

// Bound is a clause of a form with its values; words and expressions of a
// repeated clause are joined.
type Bound struct {
	Clause *catalogue.Clause
	Span   source.Span // of the clause word
	Values []syntax.Expr
	Words  []Word
}

// Word is a word that stands as a value, as A3 in `size A3`.
type Word struct {
	Text string
	Span source.Span
}

// Verify is one verify line.
type Verify struct {
	*syntax.Verify
	Bad bool
}

// Ref returns what a name stands for, nil for a built-in name.
func (m *Model) Ref(n *syntax.Name) *Symbol { return m.refs[n] }

// Kind returns the kind of an expression, the zero Kind when it is unknown.
func (m *Model) Kind(e syntax.Expr) catalogue.Kind { return m.kinds[e] }

type state uint8

const (
	untouched state = iota
	working
	done
)
