package syntax

import (
	"fmt"
	"strings"
	"unicode"
	"unicode/utf8"

	"epure/lang/diag"
	"epure/lang/quantity"
)

// Signs, and what people write for them. Only what can mean one thing is taken as
// that thing.

// literalCode returns the code of a problem with a literal.
func literalCode(p quantity.Problem) diag.Code {
	switch p {
	case quantity.DecimalComma:
		return "decimal-comma"
	case quantity.UnknownUnit:
		return "unknown-unit"
	case quantity.BadFraction:
		return "bad-fraction"
	case quantity.BadAngle:
		return "bad-angle"
	case quantity.LookAlike:
		return "look-alike"
	}
	return "bad-number"
}

// sign reads a token that begins with an ASCII byte that is neither letter nor
// digit.
func (l *scanner) sign(b byte) {
	start := l.pos
	if l.slips() || b == '.' && l.bareDecimal() {
		return
	}
	l.pos++
	switch b {
	case '(':
		l.depth++
		l.put(kindSign, "(", start)
	case ')':
		l.depth = max(0, l.depth-1)
		l.put(kindSign, ")", start)
	case '+', '-', '*', '/', '^', ',', '.', '=':
		l.put(kindSign, l.src[start:l.pos], start)
	case '<', '>':
		if l.pos < l.end && l.src[l.pos] == '=' {
			l.pos++
		}
		l.put(kindSign, l.src[start:l.pos], start)
	case '{':
		l.depth = 0
		l.put(kindOpen, "{", start)
	case '}':
		l.depth = 0
		l.put(kindClose, "}", start)
	default:
		l.stray(start, rune(b))
	}
}

// slips reads a spelling of a sign that other notations have, if one stands here.
func (l *scanner) slips() bool {
	if l.pos+1 >= l.end {
		return false
	}
	switch wrong := l.src[l.pos : l.pos+2]; wrong {
	case "==":
		l.mean(wrong, "=", "double-equals", "values are compared with one `=`")
	case ":=":
		l.mean(wrong, "=", "double-equals", "a name is defined with `=`")
	case "=<":
		l.mean(wrong, "<=", "look-alike", "`=<` is not a comparison")
	case "=>":
		l.mean(wrong, ">=", "look-alike", "`=>` is not a comparison")
	case "**":
		l.mean(wrong, "^", "look-alike", "a power is written with `^`")
	case "//":
		start := l.pos
		l.comment()
		l.add(l.error("stray-character", start, start+2, "a comment begins with `#`").WithFix(l.span(start, start+2), "#"))
	default:
		return false
	}
	return true
}

// bareDecimal reads .5, unless the dot follows a name or a bracket.
func (l *scanner) bareDecimal() bool {
	digit := l.pos+1 < l.end && '0' <= l.src[l.pos+1] && l.src[l.pos+1] <= '9'
	if n := len(l.out.tokens); !digit || n > 0 && l.out.tokens[n-1].end == l.pos && (l.out.tokens[n-1].kind == kindName || l.out.tokens[n-1].is(")")) {
		return false
	}
	start := l.pos
	lit, n, err := quantity.Scan("0" + l.src[l.pos:min(l.lineEnd(), l.pos+maxLiteral)])
	l.pos += n - 1
	l.add(l.error("bad-number", start, l.pos, "a digit is missing before the point").WithFix(l.span(start, l.pos), "0"+l.src[start:l.pos]))
	if err != nil {
		l.bad(start)
		return true
	}
	l.putLiteral(lit, start)
	return true
}

// mean reads a wrong spelling, reports it and puts the right one.
func (l *scanner) mean(wrong, right string, code diag.Code, text string) {
	start := l.pos
	l.pos += len(wrong)
	l.add(l.error(code, start, l.pos, "%s", text).WithFix(l.span(start, l.pos), right))
	l.put(kindSign, right, start)
}

// stray reports a character that means nothing.
func (l *scanner) stray(start int, r rune) {
	if r == '\'' {
		if n := strings.IndexByte(l.src[l.pos:l.lineEnd()], '\''); n >= 0 {
			l.pos = start
			l.text("'", "'")
			return
		}
	}
	code := diag.Code("stray-character")
	text := fmt.Sprintf("`%c` means nothing here", r)
	if r < ' ' || r == 0x7f || unicode.In(r, unicode.Cf, unicode.Co, unicode.Cs) {
		code, text = "hidden-character", fmt.Sprintf("a character that cannot be seen stands here, U+%04X", r)
	}
	d := l.error(code, start, l.pos, "%s", text).Because(strayReason(r))
	if code == "hidden-character" {
		d = d.WithLabelledFix(d.Span, "", "leave it out")
	}
	if r == ';' && strings.TrimLeft(l.src[l.pos:l.lineEnd()], " \t") == "" {
		l.add(d.WithFix(d.Span, "")) // nothing is lost without it
		return
	}
	l.add(d)
	l.bad(start)
}

// strayReason says what to write instead of a character that means nothing.
func strayReason(r rune) string {
	switch r {
	case ';':
		return "a statement ends with its line"
	case ':':
		return "a ratio is two plain numbers without blanks, `1:2`; other values are divided with `/`"
	case '[', ']':
		return "points stand in round brackets, `(x, y, z)`; lists have none"
	case '\'':
		return "texts stand between double quotes; minutes follow degrees, `35°30′`"
	case '%', '°':
		return "a unit stands only right after a number"
	case '&', '|', '!':
		return "conditions are written as `verify` lines"
	}
	return ""
}

// rune reads a token that begins with a rune beyond ASCII, or a byte that is none.
func (l *scanner) rune() {
	start := l.pos
	r, size := utf8.DecodeRuneInString(l.src[l.pos:l.end])
	switch {
	case r == utf8.RuneError && size == 1:
		l.junk(start)
	case unicode.IsSpace(r) || unicode.Is(unicode.Zs, r):
		l.pos += size
	case unicode.IsLetter(r):
		l.word()
	case l.lookAlike(r, size):
	default:
		l.pos += size
		l.stray(start, r)
	}
}

// junk reads a run of bytes that are no UTF-8.
func (l *scanner) junk(start int) {
	for l.pos < l.end {
		r, size := utf8.DecodeRuneInString(l.src[l.pos:l.end])
		if r != utf8.RuneError || size != 1 {
			break
		}
		l.pos++
	}
	l.checkUTF8(start, l.pos)
	l.bad(start)
}

// lookAlike reads a rune that stands for a sign of the language.
func (l *scanner) lookAlike(r rune, size int) bool {
	if right := alike(r); right != "" {
		l.mean(l.src[l.pos:l.pos+size], right, "look-alike", fmt.Sprintf("`%c` is not a sign of the language", r))
		switch right {
		case "(":
			l.depth++
		case ")":
			l.depth = max(0, l.depth-1)
		}
		return true
	}
	start := l.pos
	switch r {
	case '“', '”', '„', '«', '»', '‘', '’', '‚', '＂':
		l.curly(size)
	case '²', '³':
		l.raised(r, size)
	case 'º', '˚', '°':
		l.pos += size
		l.add(l.error("stray-character", start, l.pos, "a degree sign stands only right after a number").
			Because("an expression is turned into an angle by a product, `x * 1°`"))
		l.bad(start)
	default:
		return false
	}
	return true
}

// alike returns the sign that a rune looks like or stands for, "" for none.
func alike(r rune) string {
	switch r {
	case '−', '–', '—', '‐', '‑', '－', '⁻':
		return "-"
	case '×', '·', '∙', '⋅', '∗', '＊':
		return "*"
	case '÷', '∕', '⁄', '／':
		return "/"
	case '＋':
		return "+"
	case '＝':
		return "="
	case '≤', '⩽', '≦':
		return "<="
	case '≥', '⩾', '≧':
		return ">="
	case '（':
		return "("
	case '）':
		return ")"
	case '，', '、':
		return ","
	}
	return ""
}

// curly reads a text between quotes that are not the straight ones.
func (l *scanner) curly(size int) {
	open, shut := l.src[l.pos:l.pos+size], "\""
	rest := l.src[l.pos+size : l.lineEnd()]
	if n := strings.IndexAny(rest, quoteMarks); n >= 0 {
		_, size := utf8.DecodeRuneInString(rest[n:])
		shut = rest[n : n+size]
	}
	l.text(open, shut)
}

// quoteMarks is what people's programs put in the place of straight quotes.
const quoteMarks = "\"'“”„«»‘’‚＂"

// raised reads ² or ³ after an operand and takes it as a power.
func (l *scanner) raised(r rune, size int) {
	start, n := l.pos, int64(2)
	if r == '³' {
		n = 3
	}
	l.pos += size
	right := fmt.Sprintf("^%d", n)
	l.add(l.error("look-alike", start, l.pos, "a power is written with `^`").WithFix(l.span(start, l.pos), right))
	l.put(kindSign, "^", start)
	l.putLiteral(quantity.Literal{Value: quantity.Whole(quantity.Number, n), Power: 1, Parts: 1}, start)
}
