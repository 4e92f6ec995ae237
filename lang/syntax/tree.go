// Package syntax reads a file into a tree of statements.
//
// The work has four stages, each of which keeps going after an error, so that one
// run tells everything that is wrong with a file and nothing twice:
//
//	lexer   bytes -> tokens; a slip of the pen becomes the token that was meant
//	layout  tokens -> logical lines, by indentation, brackets and braces
//	grammar logical line -> rows of the participle grammar, each line alone
//	convert rows -> the tree below, with a span on every node
//
// A parser for a whole file would stop at the first error and put the blame where
// the next statement begins. Cutting the lines first keeps an error in its line.
package syntax

import (
	"epure/lang/quantity"
	"epure/lang/source"
)

// File is the tree of a source file. It is never changed once made.
type File struct {
	Source     *source.File
	Statements []Statement
	Comments   []Comment // in order of their places
}

// Comment is a comment with its #, without the line end.
type Comment struct {
	At source.Span
	// OwnLine says that nothing but blanks stands before it in its line.
	OwnLine bool
}

// Node is a part of the tree. Its span is the text that it was made of.
type Node interface{ Span() source.Span }

// Statement is one of Given, Verify, Take, Case, Sentence, Bad.
type Statement interface {
	Node
	statement()
}

// Expr is one of Quantity, TextLit, Name, Member, Call, Tuple, Paren, Unary, Binary.
type Expr interface {
	Node
	expr()
}

// Ident is a name or a word. Text is in the composed form of Unicode, so that two
// spellings that look the same are the same.
type Ident struct {
	Text string
	At   source.Span
}

// Span returns the place of the word.
func (i *Ident) Span() source.Span { return i.At }

// Given is `given NAME = EXPR "text" CLAUSES`.
type Given struct {
	At      source.Span
	Name    *Ident
	Expr    Expr
	Text    *TextLit // nil when there is none
	Clauses []Clause // from, to, tolerance
}

// Verify is `verify LEFT OP RIGHT within EXPR "text"`.
type Verify struct {
	At          source.Span
	Left, Right Expr
	Op          string // "=", "<", "<=", ">" or ">="
	OpAt        source.Span
	Within      Expr     // nil when there is none
	Text        *TextLit // nil when there is none
}

// Take is `take NAME from "path"`. The path has no holes.
type Take struct {
	At   source.Span
	Name *Ident
	Path *TextLit
}

// Case is `case NAME CLAUSES`, `case "text" CLAUSES` or `case from "path"`. Path is
// nil in the first two; in the third Name is nil and there are no clauses. Neither
// text has holes.
type Case struct {
	At      source.Span
	Name    *TextLit // a NAME becomes a TextLit of that word
	Clauses []Clause
	Path    *TextLit
}

// Sentence is `NAME = THING`, `NAME = EXPR` or `THING`, and may open a block.
// Exactly one of Thing and Expr is not nil.
type Sentence struct {
	At       source.Span // of the sentence without its block
	Name     *Ident      // nil when the thing has no name
	Thing    *Thing
	Expr     Expr
	HasBlock bool
	Block    []Statement
	BlockAt  source.Span // from { to }; to the last statement when there is no }
}

// Bad is a logical line that could not be read; a diagnostic says why. Names are
// those that the line would have defined, so that nobody calls them unknown.
type Bad struct {
	At       source.Span
	Names    []*Ident
	HasBlock bool
	Block    []Statement
	BlockAt  source.Span
}

// Thing is `FORM "text" CLAUSES`: at least a text or one clause.
type Thing struct {
	At      source.Span
	Form    *Ident
	Text    *TextLit // nil when there is none
	Clauses []Clause
}

// Clause is `WORD VALUE, VALUE …` with at least one value.
type Clause struct {
	At     source.Span
	Word   *Ident
	Values []Expr
}

// Span returns the place of the clause with its values.
func (c Clause) Span() source.Span { return c.At }

// Quantity is a literal; its value is in Literal.Value.
type Quantity struct {
	At      source.Span
	Literal quantity.Literal
}

// TextLit is a text in double quotes, its holes in place.
type TextLit struct {
	At    source.Span
	Parts []Part
}

// Part is a stretch of a text: either a hole, or Literal with its escapes undone.
type Part struct {
	At      source.Span
	Literal string
	Hole    *Hole
}

// Hole is `{EXPR nearest NEAREST}`. Nearest is nil when there is none.
type Hole struct {
	At            source.Span // with the braces
	Expr, Nearest Expr
}

// Plain returns the text when it has no holes; ok is false when it has.
func (t *TextLit) Plain() (text string, ok bool) {
	if t == nil {
		return "", true
	}
	for _, p := range t.Parts {
		if p.Hole != nil {
			return "", false
		}
		text += p.Literal
	}
	return text, true
}

// Name is the use of a name.
type Name struct{ Ident }

// Member is `X.NAME`.
type Member struct {
	At   source.Span
	X    Expr
	Name *Ident
}

// Call is `X(ARGS)`: X is a Name or a Member, and there is at least one of Args.
type Call struct {
	At   source.Span
	X    Expr
	Args []Expr
}

// Tuple is `(A, B)` or `(A, B, C)` or longer: two items at least.
type Tuple struct {
	At    source.Span
	Items []Expr
}

// Paren is an expression in brackets.
type Paren struct {
	At source.Span
	X  Expr
}

// Unary is `-X`.
type Unary struct {
	At   source.Span
	OpAt source.Span
	X    Expr
}

// Binary is `LEFT OP RIGHT`.
type Binary struct {
	At    source.Span
	Left  Expr
	Op    string // "+", "-", "*", "/" or "^"
	OpAt  source.Span
	Right Expr
}

// Span returns the place of the statement or expression, a block not counted.
func (n *Given) Span() source.Span    { return n.At }
func (n *Verify) Span() source.Span   { return n.At }
func (n *Take) Span() source.Span     { return n.At }
func (n *Case) Span() source.Span     { return n.At }
func (n *Sentence) Span() source.Span { return n.At }
func (n *Bad) Span() source.Span      { return n.At }
func (n *Thing) Span() source.Span    { return n.At }
func (n *Quantity) Span() source.Span { return n.At }
func (n *TextLit) Span() source.Span  { return n.At }
func (n *Member) Span() source.Span   { return n.At }
func (n *Call) Span() source.Span     { return n.At }
func (n *Tuple) Span() source.Span    { return n.At }
func (n *Paren) Span() source.Span    { return n.At }
func (n *Unary) Span() source.Span    { return n.At }
func (n *Binary) Span() source.Span   { return n.At }

func (*Given) statement()    {}
func (*Verify) statement()   {}
func (*Take) statement()     {}
func (*Case) statement()     {}
func (*Sentence) statement() {}
func (*Bad) statement()      {}

func (*Quantity) expr() {}
func (*TextLit) expr()  {}
func (*Name) expr()     {}
func (*Member) expr()   {}
func (*Call) expr()     {}
func (*Tuple) expr()    {}
func (*Paren) expr()    {}
func (*Unary) expr()    {}
func (*Binary) expr()   {}
