package syntax

import (
	"github.com/alecthomas/participle/v2/lexer"

	"epure/lang/quantity"
)

// kind is what a token is. The numbers are those that the grammar sees.
type kind = lexer.TokenType

const (
	kindEnd      kind = lexer.EOF
	kindName     kind = iota // a name, a form or a clause word
	kindWord                 // a word that is never a name: of, by, at …
	kindKeyword              // given, verify, take, case
	kindQuantity             // a literal
	kindText                 // a text in quotes
	kindSign                 // brackets, operators, comma, dot, comparisons
	kindOpen                 // {
	kindClose                // }
	kindBad                  // what has been reported already
)

// token is one token of a file. Where the source has a slip of the pen, text is
// what was meant and start and end tell what is there.
type token struct {
	kind       kind
	text       string
	start, end int
	first      bool // the first of its line
	column     int  // for the first of a line: how far it is indented
	literal    int  // of a quantity: its index in lexed.literals
	open       int  // of a text: bytes of the opening quote
	shut       int  // of a text: bytes of the closing quote
}

// is says whether t is a sign, word or brace with a spelling.
func (t token) is(text string) bool {
	return t.text == text && t.kind != kindText && t.kind != kindQuantity
}

// lexed is a file cut into tokens.
type lexed struct {
	tokens   []token
	literals []quantity.Literal
	comments []Comment
}

// wordKind returns the kind of a word.
func wordKind(word string) kind {
	switch word {
	case "given", "verify", "take", "case":
		return kindKeyword
	case "of", "by", "at", "on", "to", "from", "through", "along", "about", "above", "below", "within", "nearest", "show":
		return kindWord
	}
	return kindName
}
