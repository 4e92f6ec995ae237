package syntax

import (
	"errors"
	"io"
	"sync"

	"github.com/alecthomas/participle/v2"
	"github.com/alecthomas/participle/v2/lexer"
)

// The grammar of one logical line, as the manual has it, with two differences
// that the tree does not show. An expression is a flat row of operands and
// operators; convert.go puts them in order of precedence, which is quicker than a
// rule for every level and keeps the depth of the recursion to that of the
// brackets. And the opening brace is taken off by the layout.
//
// It is parsed with no lookahead beyond what is written as (?= … ), so that an
// error is always at the first token that fits nothing.

type rowLine struct {
	Given    *rowGiven    `parser:"  @@"`
	Verify   *rowVerify   `parser:"| @@"`
	Take     *rowTake     `parser:"| @@"`
	Case     *rowCase     `parser:"| @@"`
	Sentence *rowSentence `parser:"| @@"`
}

type rowGiven struct {
	Word    lexer.Token  `parser:"@'given'"`
	Name    lexer.Token  `parser:"@Name '='"`
	Expr    *rowExpr     `parser:"@@"`
	Text    *lexer.Token `parser:"@Text?"`
	Clauses []*rowClause `parser:"@@*"`
}

type rowVerify struct {
	Word   lexer.Token  `parser:"@'verify'"`
	Left   *rowExpr     `parser:"@@"`
	Op     lexer.Token  `parser:"@( '=' | '<=' | '<' | '>=' | '>' )"`
	Right  *rowExpr     `parser:"@@"`
	Within *rowExpr     `parser:"( 'within' @@ )?"`
	Text   *lexer.Token `parser:"@Text?"`
}

type rowTake struct {
	Word lexer.Token `parser:"@'take'"`
	Name lexer.Token `parser:"@Name 'from'"`
	Path lexer.Token `parser:"@Text"`
}

type rowCase struct {
	Word    lexer.Token  `parser:"@'case'"`
	Path    *lexer.Token `parser:"( 'from' @Text"`
	Name    *lexer.Token `parser:"| @( Name | Text )"`
	Clauses []*rowClause `parser:"  @@+ )"`
}

type rowSentence struct {
	Name  *lexer.Token `parser:"( (?= Name '=' ) @Name '=' )?"`
	Thing *rowThing    `parser:"( (?= Name ( Text | Name | Word ) ) @@"`
	Expr  *rowExpr     `parser:"| @@ )"`
}

type rowThing struct {
	Form    lexer.Token  `parser:"@Name"`
	Text    *lexer.Token `parser:"@Text?"`
	Clauses []*rowClause `parser:"@@*"`
}

type rowClause struct {
	Word  lexer.Token `parser:"@( Name | Word )"`
	Exprs []*rowExpr  `parser:"@@ ( ',' @@ )*"`
}

type rowExpr struct {
	First *rowOperand   `parser:"@@"`
	Rest  []*rowFurther `parser:"@@*"`
}

type rowFurther struct {
	Op      lexer.Token `parser:"@( '+' | '-' | '*' | '/' | '^' )"`
	Operand *rowOperand `parser:"@@"`
}

type rowOperand struct {
	Minus    *lexer.Token `parser:"@'-'?"`
	Leaf     *lexer.Token `parser:"( @( Quantity | Name | Text )"`
	Args     *rowArgs     `parser:"| @@ )"`
	Suffixes []*rowSuffix `parser:"@@*"`
}

type rowSuffix struct {
	Name *lexer.Token `parser:"  '.' @Name"`
	Args *rowArgs     `parser:"| @@"`
}

type rowArgs struct {
	Open  lexer.Token `parser:"@'('"`
	Exprs []*rowExpr  `parser:"@@ ( ',' @@ )*"`
	Close lexer.Token `parser:"@')'"`
}

type rowHole struct {
	Expr    *rowExpr `parser:"@@"`
	Nearest *rowExpr `parser:"( 'nearest' @@ )?"`
}

// rowAny is the root of the grammar: the three things that are parsed alone.
type rowAny struct {
	Line *rowLine `parser:"  @@"`
	Hole *rowHole `parser:"| @@"`
	Expr *rowExpr `parser:"| @@"`
}

// grammar holds the parsers of the three.
type grammar struct {
	line *participle.Parser[rowLine]
	hole *participle.Parser[rowHole]
	expr *participle.Parser[rowExpr]
}

// theGrammar makes the parsers at the first use, since that takes a millisecond;
// they never change.
var theGrammar = sync.OnceValue(newGrammar)

func newGrammar() grammar {
	all := participle.MustBuild[rowAny](participle.Lexer(symbols{}), participle.UseLookahead(0))
	return grammar{line: production[rowLine](all), hole: production[rowHole](all), expr: production[rowExpr](all)}
}

// production returns the parser of one of the fields of rowAny, which has it.
func production[T any](all *participle.Parser[rowAny]) *participle.Parser[T] {
	p, err := participle.ParserForProduction[T](all)
	if err != nil {
		panic(err)
	}
	return p
}

// symbols tells participle the names of the kinds of tokens. It does not lex:
// every line is handed over as tokens.
type symbols struct{}

// Symbols implements lexer.Definition.
func (symbols) Symbols() map[string]lexer.TokenType {
	return map[string]lexer.TokenType{
		"EOF": kindEnd, "Name": kindName, "Word": kindWord, "Keyword": kindKeyword,
		"Quantity": kindQuantity, "Text": kindText, "Sign": kindSign,
	}
}

// Lex implements lexer.Definition; it is never called.
func (symbols) Lex(string, io.Reader) (lexer.Lexer, error) {
	return nil, errors.New("lines are parsed from tokens")
}

// row hands the tokens of one line to participle. A position carries the offset
// in bytes and, as its line, the index of the token.
type row struct {
	tokens []token
	next   int
}

// Next implements lexer.Lexer.
func (r *row) Next() (lexer.Token, error) {
	if r.next >= len(r.tokens) {
		return lexer.EOFToken(lexer.Position{Line: len(r.tokens)}), nil
	}
	t := r.tokens[r.next]
	r.next++
	return lexer.Token{Type: t.kind, Value: t.text, Pos: lexer.Position{Offset: t.start, Line: r.next - 1}}, nil
}

// parseRow parses tokens with one of the parsers. failed is the index of the first
// token that fits nothing, their number when the line stops too early, -1 when
// all is well.
func parseRow[T any](p *participle.Parser[T], tokens []token) (tree *T, failed int) {
	peeking, err := lexer.Upgrade(&row{tokens: tokens})
	if err == nil {
		tree, err = p.ParseFromLexer(peeking)
	}
	if err == nil {
		return tree, -1
	}
	if at, ok := err.(participle.Error); ok {
		return nil, min(at.Position().Line, len(tokens))
	}
	return nil, len(tokens)
}
