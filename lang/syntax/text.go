package syntax

import (
	"strings"

	"github.com/alecthomas/participle/v2/lexer"
)

// Texts are cut into parts here, after the line around them has been parsed. The
// expression in a hole is a stretch of the same file, so its spans are right by
// themselves.

func (c *converter) textOrNil(t *lexer.Token) *TextLit {
	if t == nil {
		return nil
	}
	return c.text(*t)
}

// plain converts a text that may not have holes.
func (c *converter) plain(t *lexer.Token) *TextLit {
	text := c.text(*t)
	for _, p := range text.Parts {
		if p.Hole != nil {
			c.add(c.error("not-plain-text", p.At.Start, p.At.End, "this text has no holes").
				Because("the name of a file or a case is known before anything is computed; `\\{` stands for a brace"))
		}
	}
	return text
}

// text converts a text with its holes.
func (c *converter) text(t lexer.Token) *TextLit {
	own := c.row[t.Pos.Line]
	out := &TextLit{At: c.at(t)}
	start, end := own.start+own.open, own.end-own.shut
	var literal strings.Builder
	from := start
	flush := func(to int) {
		if literal.Len() > 0 {
			out.Parts = append(out.Parts, Part{At: c.span(from, to), Literal: literal.String()})
			literal.Reset()
		}
	}
	for i := start; i < end; {
		switch c.src[i] {
		case '\\':
			i = c.escape(&literal, i, end)
		case '{':
			flush(i)
			hole, next := c.hole(i, end)
			out.Parts = append(out.Parts, Part{At: c.span(i, next), Hole: hole})
			if hole == nil {
				out.Parts = out.Parts[:len(out.Parts)-1]
			}
			i, from = next, next
		default:
			literal.WriteByte(c.src[i])
			i++
		}
	}
	flush(end)
	return out
}

// escape reads a backslash and what it stands for.
func (c *converter) escape(b *strings.Builder, i, end int) int {
	next := i + 1
	if next >= end {
		b.WriteByte('\\')
		return next
	}
	switch c.src[next] {
	case '"', '\\', '{':
		b.WriteByte(c.src[next])
	case 'n':
		b.WriteByte('\n')
	default:
		c.add(c.error("bad-escape", i, next+1, "`\\` stands only before `\"`, `\\`, `{` and `n`").
			WithLabelledFix(c.span(i, next), "\\\\", "write `\\\\` for a backslash"))
		b.WriteByte('\\')
		return next
	}
	return next + 1
}

// hole reads the hole that begins at i and returns where the text goes on. The
// hole is nil when it could not be read.
func (c *converter) hole(i, end int) (*Hole, int) {
	n := strings.IndexByte(c.src[i:end], '}')
	if n < 0 {
		c.holeNotClosed(i)
		return nil, end
	}
	shut := i + n
	at := c.span(i, shut+1)
	inner := *c.parser
	inner.lexed = lex(c.reporter, i+1, shut)
	if len(inner.tokens) == 0 {
		c.add(c.error("bad-hole", i, shut+1, "this hole is empty").Because("`\\{` stands for a brace"))
		return nil, shut + 1
	}
	h, ok := inner.ready(inner.tokens, "hole")
	if !ok {
		return nil, shut + 1
	}
	row, failed := parseRow(theGrammar().hole, inner.tokens)
	if failed >= 0 {
		h.explain(failed)
		return nil, shut + 1
	}
	hole := &Hole{At: at, Expr: h.expr(row.Expr)}
	if row.Nearest != nil {
		hole.Nearest = h.expr(row.Nearest)
	}
	return hole, shut + 1
}

func (c *converter) holeNotClosed(at int) {
	c.add(c.error("bad-hole", at, at+1, "this hole is not closed").
		Because("an expression stands between `{` and `}` and has no quotes in it; `\\{` stands for a brace"))
}
