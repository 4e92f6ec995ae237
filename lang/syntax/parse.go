package syntax

import (
	"strings"
	"unicode/utf8"

	"epure/lang/diag"
	"epure/lang/source"
)

// maxTokens bounds one statement: an outline of five thousand corners fits.
const maxTokens = 1 << 15

const tooLongRule = "a statement has at most 32768 words and signs"

// maxDepth bounds how deep brackets and powers are nested in a statement, since
// what walks the tree calls itself once for each.
const maxDepth = 200

// Parse reads a file. What is wrong goes into bag; the tree holds everything that
// could be read, and Bad statements for the rest.
func Parse(f *source.File, bag *diag.Bag) *File {
	p := newParser(f)
	defer p.flush(bag)
	if !p.isText() {
		return p.file
	}
	p.lexed = lex(p.reporter, p.start(), len(p.src))
	p.file.Comments = p.comments
	l := layout{parser: p}
	p.file.Statements = l.statements()
	return p.file
}

// ParseExpr reads a text that is one expression, such as a value given on the
// command line. It returns nil when it is none.
func ParseExpr(f *source.File, bag *diag.Bag) Expr {
	p := newParser(f)
	defer p.flush(bag)
	if !p.isText() {
		return nil
	}
	p.lexed = lex(p.reporter, p.start(), len(p.src))
	c, ok := p.ready(p.tokens, "expression")
	if !ok {
		return nil
	}
	row, failed := parseRow(theGrammar().expr, p.tokens)
	if failed >= 0 {
		c.explain(failed)
		return nil
	}
	return c.expr(row)
}

// parser is the state of reading one file.
type parser struct {
	*reporter
	lexed
	file *File
}

func newParser(f *source.File) *parser {
	return &parser{reporter: &reporter{file: f, src: string(f.Text)}, file: &File{Source: f}}
}

// start returns where the text begins, after a BOM.
func (p *parser) start() int {
	if strings.HasPrefix(p.src, source.BOM) {
		return len(source.BOM)
	}
	return 0
}

// sample is how much of a file is looked at to tell whether it is a text.
const sample = 1 << 16

// isText reports files that are surely no text, or none in UTF-8: a single strange
// byte is told where it stands, a file full of them once.
func (p *parser) isText() bool {
	if strings.HasPrefix(p.src, "\xff\xfe") || strings.HasPrefix(p.src, "\xfe\xff") {
		p.add(p.error("not-utf-8", 0, 2, "the file is in UTF-16").Because("save it as UTF-8"))
		return false
	}
	if n := strings.IndexByte(p.src, 0); n >= 0 {
		p.add(p.error("not-text", n, n+1, "the file is not a text").Because("a byte 0 stands here, which no text has"))
		return false
	}
	head := p.src[:min(len(p.src), sample)]
	hidden, strange := strangeBytes(head)
	switch {
	case hidden > 2 && hidden > len(head)/100:
		p.add(p.error("not-text", 0, 0, "the file is not a text").Because("it is full of bytes that no text has"))
		return false
	case strange > 2 && strange > len(head)/20:
		p.checkUTF8(0, len(head))
		return false
	}
	return true
}

// strangeBytes counts the control characters of a text and the bytes that are no
// UTF-8.
func strangeBytes(text string) (hidden, strange int) {
	for i, r := range text {
		switch {
		case r < ' ' && r != '\t' && r != '\n' && r != '\r' && r != '\f' || r == 0x7f:
			hidden++
		case r == utf8.RuneError && !strings.HasPrefix(text[i:], "\uFFFD"):
			strange++
		}
	}
	return hidden, strange
}

// statement reads the tokens of one logical line, its brace not among them. There
// is at least one token.
func (p *parser) statement(tokens []token) Statement {
	if c, ok := p.ready(tokens, "statement"); ok {
		row, failed := parseRow(theGrammar().line, tokens)
		if failed < 0 {
			return c.line(row)
		}
		c.explain(failed)
	}
	return p.badStatement(tokens)
}

// badStatement makes the statement for a line that could not be read.
func (p *parser) badStatement(tokens []token) *Bad {
	bad := &Bad{At: p.cover(tokens)}
	at := 0
	if tokens[0].kind == kindKeyword {
		at = 1
	}
	defines := at < len(tokens) && tokens[at].kind == kindName &&
		(tokens[0].is("given") || tokens[0].is("take") || at+1 < len(tokens) && tokens[at+1].is("="))
	if defines {
		bad.Names = []*Ident{{Text: tokens[at].text, At: p.span(tokens[at].start, tokens[at].end)}}
	}
	return bad
}

// cover returns the span from the first to the last of tokens.
func (p *parser) cover(tokens []token) source.Span {
	if len(tokens) == 0 {
		return p.span(p.start(), p.start())
	}
	return p.span(tokens[0].start, tokens[len(tokens)-1].end)
}

// ready says whether tokens may be parsed: nothing in them has been reported, the
// brackets match and are not too deep. It reports what is wrong.
func (p *parser) ready(tokens []token, what string) (*converter, bool) {
	c := &converter{parser: p, row: tokens, what: what}
	for _, t := range tokens {
		if t.kind == kindBad {
			return c, false
		}
	}
	if len(tokens) > maxTokens {
		at := tokens[maxTokens]
		p.add(p.error("too-long", at.start, at.end, "this statement is too long").
			Because(tooLongRule))
		return c, false
	}
	return c, c.brackets()
}

// brackets reports brackets that do not match and those that are too deep.
func (c *converter) brackets() bool {
	var open []int     // indices of open brackets
	powers := []int{0} // how many ^ are waiting inside each
	level := 0
	for i, t := range c.row {
		switch {
		case t.is("("):
			open, powers, level = append(open, i), append(powers, 0), level+1
		case t.is(")") && len(open) == 0:
			c.add(c.error("stray-bracket", t.start, t.end, "this bracket closes nothing").WithFix(c.span(t.start, t.end), ""))
			return false
		case t.is(")"):
			level -= 1 + powers[len(open)]
			open, powers = open[:len(open)-1], powers[:len(open)]
		case t.is("^"):
			powers[len(open)]++
			level++
		case t.is("+") || t.is("*") || t.is("/") || t.is(","):
			level -= powers[len(open)]
			powers[len(open)] = 0
		}
		if level > maxDepth {
			c.add(c.error("too-deep", t.start, t.end, "brackets and powers are nested more than %d deep", maxDepth).
				Because("give the inner parts names of their own"))
			return false
		}
	}
	if len(open) > 0 {
		c.bracketNotClosed(c.row[open[len(open)-1]])
		return false
	}
	return true
}

func (c *converter) bracketNotClosed(t token) {
	end := c.row[len(c.row)-1].end
	c.add(c.error("bracket-not-closed", t.start, t.end, "this bracket is not closed").
		WithLabelledFix(c.span(end, end), ")", "write `)` where it closes"))
}
