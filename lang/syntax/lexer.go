package syntax

import (
	"strings"
	"unicode"
	"unicode/utf8"

	"golang.org/x/text/unicode/norm"

	"epure/lang/quantity"
)

// scanner cuts a stretch of a file into tokens. It never stops at a fault: a sign
// that was surely meant for another is reported and taken as that, anything else
// becomes a kindBad token, which keeps its line from being parsed.
type scanner struct {
	*reporter
	pos   int
	end   int // where the stretch ends
	depth int // open round brackets, for telling a decimal comma from a list
	out   lexed

	first  bool // the next token is the first of its line
	column int
	count  int // tokens in this line
	eol    int // where the line of pos ends, once it has been looked for
}

// tabStop is how far a tab indents. Any width serves a file that is consistent.
const tabStop = 8

// lex cuts the stretch of the file from start to end.
func lex(r *reporter, start, end int) lexed {
	l := &scanner{reporter: r, pos: start, end: end, first: true}
	l.out.tokens = make([]token, 0, (end-start)/5+2)
	l.indent()
	for l.pos < l.end {
		l.next()
	}
	return l.out
}

// next reads one token, comment, blank or line end.
func (l *scanner) next() {
	b := l.src[l.pos]
	switch {
	case l.count > maxTokens:
		l.tooLong()
	case b == ' ' || b == '\t':
		l.pos++
	case b == '\n' || b == '\r':
		l.pos++
		l.indent()
	case b == '#':
		l.comment()
	case isNameByte(b):
		l.word()
	case '0' <= b && b <= '9':
		l.quantity()
	case b == '"':
		l.text("\"", "\"")
	case b < utf8.RuneSelf:
		l.sign(b)
	default:
		l.rune()
	}
}

// isNameByte says whether an ASCII byte begins a name.
func isNameByte(b byte) bool { return 'a' <= b && b <= 'z' || 'A' <= b && b <= 'Z' || b == '_' }

// indent measures the blanks at the start of a line.
func (l *scanner) indent() {
	l.first, l.column, l.count = true, 0, 0
	for ; l.pos < l.end; l.pos++ {
		switch l.src[l.pos] {
		case ' ':
			l.column++
		case '\t':
			l.column += tabStop - l.column%tabStop
		default:
			return
		}
	}
}

// put adds a token that ends at pos.
func (l *scanner) put(k kind, text string, start int) *token {
	l.out.tokens = append(l.out.tokens, token{kind: k, text: text, start: start, end: l.pos, first: l.first, column: l.column})
	l.first = false
	l.count++
	return &l.out.tokens[len(l.out.tokens)-1]
}

// tooLong reports a line of more tokens than a statement has and leaves the rest
// of it out.
func (l *scanner) tooLong() {
	start := l.pos
	l.pos = l.lineEnd()
	l.add(l.error("too-long", start, start+1, "this statement is too long").Because(tooLongRule))
	l.count = 0
	l.bad(start)
}

// bad adds a token for what has been reported.
func (l *scanner) bad(start int) { l.put(kindBad, l.src[start:l.pos], start) }

// lineEnd returns where the line of pos ends. It is looked for once a line, since
// a line may have megabytes.
func (l *scanner) lineEnd() int {
	if l.eol > l.pos {
		return l.eol
	}
	l.eol = l.end
	if n := strings.IndexAny(l.src[l.pos:l.end], "\r\n"); n >= 0 {
		l.eol = l.pos + n
	}
	return l.eol
}

func (l *scanner) comment() {
	start := l.pos
	l.pos = l.lineEnd()
	l.checkUTF8(start, l.pos)
	l.out.comments = append(l.out.comments, Comment{At: l.span(start, l.pos), OwnLine: l.first})
}

// word reads a name or a word of the language.
func (l *scanner) word() {
	start, ascii := l.pos, true
	for l.pos < l.end {
		r, size := rune(l.src[l.pos]), 1
		if r >= utf8.RuneSelf {
			ascii = false
			r, size = utf8.DecodeRuneInString(l.src[l.pos:l.end])
		}
		if r != '_' && !unicode.IsLetter(r) && !unicode.IsDigit(r) && (l.pos == start || !unicode.Is(unicode.M, r)) {
			break
		}
		l.pos += size
	}
	word := l.src[start:l.pos]
	if !ascii {
		word = norm.NFC.String(word)
	}
	if word[0] == '_' {
		l.add(l.error("bad-name", start, l.pos, "the name `%s` does not begin with a letter", word))
		l.bad(start)
		return
	}
	l.put(wordKind(word), word, start)
}

// maxLiteral is how many bytes of a line are looked at for a literal: several
// times the longest one that has a meaning.
const maxLiteral = 512

// quantity reads a literal.
func (l *scanner) quantity() {
	start := l.pos
	rest := l.src[l.pos:min(l.lineEnd(), l.pos+maxLiteral)]
	lit, n, err := quantity.ScanComma(rest)
	if n == 0 || l.isList(lit, rest, n) {
		lit, n, err = quantity.Scan(rest)
	}
	l.pos += n
	if err != nil {
		l.literalError(start, err)
		if err.Write == "" {
			l.restOfWord()
			l.bad(start)
			return
		}
	}
	l.putLiteral(lit, start)
}

// isList says whether the comma in 12,5 separates values, as one does without a
// blank in a longer list, and inside brackets unless what follows has a unit and
// what precedes has none.
func (l *scanner) isList(lit quantity.Literal, rest string, n int) bool {
	follows := n+1 < len(rest) && rest[n] == ',' && '0' <= rest[n+1] && rest[n+1] <= '9'
	precedes := l.pos > 0 && l.src[l.pos-1] == ','
	return follows || precedes || l.depth > 0 && (lit.Unit == quantity.NoUnit || strings.HasPrefix(rest, "0,"))
}

// restOfWord goes past digits and letters that belong to what has been reported.
func (l *scanner) restOfWord() {
	for l.pos < l.end && (isNameByte(l.src[l.pos]) || '0' <= l.src[l.pos] && l.src[l.pos] <= '9') {
		l.pos++
	}
}

func (l *scanner) putLiteral(lit quantity.Literal, start int) {
	l.out.literals = append(l.out.literals, lit)
	l.put(kindQuantity, l.src[start:l.pos], start).literal = len(l.out.literals) - 1
}

// literalError reports what is wrong with a literal that begins at start.
func (l *scanner) literalError(start int, err *quantity.LiteralError) {
	d := l.error(literalCode(err.Problem), start+err.Start, start+err.End, "%s", err.Text).Because(err.Reason)
	if err.Write != "" {
		d = d.WithFix(d.Span, err.Write)
	}
	l.add(d)
}

// text reads a text from an opening to a closing quote in the same line.
func (l *scanner) text(open, shut string) {
	start, end := l.pos, l.lineEnd()
	for l.pos += len(open); l.pos < end; l.pos++ {
		switch {
		case l.src[l.pos] == '\\' && l.pos+1 < end:
			l.pos++
		case strings.HasPrefix(l.src[l.pos:end], shut):
			l.pos += len(shut)
			l.closedText(start, open, shut)
			return
		}
	}
	l.pos = end
	l.checkUTF8(start, l.pos)
	l.openText(start)
	l.bad(start)
}

// closedText adds a text and reports quotes that only look like the right ones.
func (l *scanner) closedText(start int, open, shut string) {
	l.checkUTF8(start, l.pos)
	if open != "\"" {
		inner := l.src[start+len(open) : l.pos-len(shut)]
		l.add(l.error("look-alike", start, l.pos, "texts stand between straight double quotes").
			WithFix(l.span(start, l.pos), "\""+inner+"\""))
	}
	t := l.put(kindText, l.src[start:l.pos], start)
	t.open, t.shut = len(open), len(shut)
}

// openText reports a text without a closing quote.
func (l *scanner) openText(start int) {
	d := l.error("text-not-closed", start, l.pos, "this text has no closing quote").
		Because("a text ends in its line; `\\n` in it begins a new line")
	if n := len(l.out.tokens); n > 0 && l.out.tokens[n-1].kind == kindQuantity && l.out.tokens[n-1].end == start {
		number := l.out.tokens[n-1].text
		l.add(l.error("unknown-unit", start, start+1, "`\"` is not a unit").
			Because("inches are written `" + number + " in`; seconds follow degrees and minutes and have the mark ″"))
		return
	}
	l.add(d.WithLabelledFix(l.span(l.pos, l.pos), "\"", "write `\"` at the end of the text"))
}
