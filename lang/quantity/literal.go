package quantity

import (
	"math/big"
	"strings"
	"unicode"
	"unicode/utf8"
)

// Literal is a quantity as it was written.
type Literal struct {
	Value       Value
	Unit        Unit  // of the last part: inch in "5 ft 3 1/2 in"
	Power       int   // of a length unit: 2 in "250 mm²", else 1
	Decimals    int   // digits after the point of the last part
	Denominator int64 // of the fraction, 0 for none
	Parts       int   // 2 for degrees and minutes or feet and inches, 3 with seconds, else 1
}

// Style returns how FormatNearest writes when l is the step.
func (l Literal) Style() Style {
	s := Style{Unit: l.Unit, Power: l.Power, Decimals: l.Decimals, Denominator: l.Denominator}
	switch l.Unit {
	case Degree:
		s.Parts = l.Parts
	case Slope:
		return StyleOf(l.Value)
	}
	return s
}

// Problem says what is wrong with a literal.
type Problem int8

// The problems.
const (
	BadNumber    Problem = iota + 1 // the digits themselves
	DecimalComma                    // 12,5
	UnknownUnit                     // MM, degrees, 12x
	BadFraction                     // 50/3 mm
	BadAngle                        // 35°75′
	LookAlike                       // º for °
)

// LiteralError says what is wrong with a literal, where, and what to write.
type LiteralError struct {
	Problem    Problem
	Start, End int    // byte offsets in the text that was scanned
	Text       string // one sentence without a full stop
	Reason     string // the rule, may be ""
	Write      string // what the bytes from Start to End should be, "" when there is no telling
}

// Error returns the sentence.
func (e *LiteralError) Error() string { return e.Text }

// Scan reads the quantity that text begins with; text must begin with a digit.
// It returns the literal and its length in bytes. With an error, the length is
// that of what was meant to be the literal, and the literal is what was surely
// meant, or a plain 1 when there is no telling.
func Scan(text string) (Literal, int, *LiteralError) {
	s := scanner{text: text, lit: Literal{Power: 1, Parts: 1}}
	s.scan()
	if s.err != nil && s.err.Write == "" {
		s.lit.Value = Whole(Number, 1)
	}
	return s.lit, s.pos, s.err
}

// Parse reads a text that is one quantity and nothing else but blanks and a
// minus sign in front: a cell of a table, a value of the command line.
func Parse(text string) (Literal, *LiteralError) {
	body := strings.TrimRight(text, " \t")
	start := len(body) - len(strings.TrimLeft(body, " \t"))
	negative := strings.HasPrefix(body[start:], "-")
	if negative {
		start++
	}
	if start == len(body) || !isDigit(body[start]) {
		return Literal{}, &LiteralError{Problem: BadNumber, Start: start, End: len(body),
			Text: "a quantity begins with a digit", Reason: "for example 250 mm, 35.5° or 20 %"}
	}
	lit, n, err := ScanComma(body[start:])
	if n == 0 {
		lit, n, err = Scan(body[start:])
	}
	if err == nil && start+n < len(body) {
		err = &LiteralError{Problem: BadNumber, Start: n, End: len(body) - start,
			Text: "`" + body[start+n:] + "` follows the quantity `" + body[start:start+n] + "`"}
	}
	if err != nil {
		err.Start, err.End = err.Start+start, err.End+start
	}
	if negative {
		lit.Value = Neg(lit.Value)
	}
	return lit, err
}

// ScanComma reads a quantity that is written with a decimal comma, such as
// 12,5 mm. It returns the length 0 when text does not begin so. Where a comma
// separates values, the caller decides whether this was meant.
func ScanComma(text string) (Literal, int, *LiteralError) {
	n := digitRun(text)
	if n == 0 || n+1 >= len(text) || text[n] != ',' || !isDigit(text[n+1]) {
		return Literal{}, 0, nil
	}
	fixed := text[:n] + "." + text[n+1:]
	lit, m, err := Scan(fixed)
	if err != nil {
		return lit, m, err
	}
	end := n + 1 + digitRun(text[n+1:])
	return lit, m, &LiteralError{Problem: DecimalComma, Start: 0, End: end,
		Text:   "decimals are written with a point",
		Reason: "a comma separates values; two values need a blank after it: `" + text[:n] + ", " + text[n+1:end] + "`",
		Write:  fixed[:end]}
}

// scanner reads one literal.
type scanner struct {
	text string
	pos  int
	lit  Literal
	err  *LiteralError
}

// fail records the first problem only.
func (s *scanner) fail(p Problem, start, end int, text, reason, write string) {
	if s.err == nil {
		s.err = &LiteralError{Problem: p, Start: start, End: end, Text: text, Reason: reason, Write: write}
	}
}

func (s *scanner) scan() {
	size, whole := s.number()
	switch {
	case s.err != nil && s.err.Write == "":
		return
	case whole && s.at(':') && isDigit(s.peek(1)):
		s.slope(size)
		return
	case whole && s.fraction(size):
		return
	case whole && s.mixed(size):
		return
	}
	s.unit(size)
}

// at says whether the next byte is b; peek returns the one n further, 0 at the end.
func (s *scanner) at(b byte) bool { return s.peek(0) == b }
func (s *scanner) peek(n int) byte {
	if s.pos+n < len(s.text) {
		return s.text[s.pos+n]
	}
	return 0
}

func isDigit(b byte) bool { return '0' <= b && b <= '9' }

// digitRun returns how many digits text begins with.
func digitRun(text string) int {
	n := 0
	for n < len(text) && isDigit(text[n]) {
		n++
	}
	return n
}

// blanks returns how many bytes of blanks follow position i.
func (s *scanner) blanks(i int) int {
	n := 0
	for i+n < len(s.text) {
		size := blank(s.text[i+n:])
		if size == 0 {
			break
		}
		n += size
	}
	return n
}

// blank returns the length of the blank that text begins with, 0 for none. The
// blanks that do not break a line are common between a number and its unit.
func blank(text string) int {
	if text[0] == ' ' || text[0] == '\t' {
		return 1
	}
	if text[0] < utf8.RuneSelf {
		return 0
	}
	r, size := utf8.DecodeRuneInString(text)
	if unicode.Is(unicode.Zs, r) {
		return size
	}
	return 0
}

// maxFigures and maxExponent bound a number: more figures than anybody means,
// and a range that float64 still holds after a few squarings.
const (
	maxFigures  = 60
	maxExponent = 75
)

// number reads digits with a point and an exponent; whole says that it had
// neither.
func (s *scanner) number() (size *big.Rat, whole bool) {
	start := s.pos
	s.pos += digitRun(s.text[s.pos:])
	whole = true
	if s.groups(start) {
		size, _ := new(big.Rat).SetString(s.err.Write)
		return size, true
	}
	s.lit.Decimals = 0
	if s.at('.') {
		whole = false
		s.lit.Decimals = digitRun(s.text[s.pos+1:])
		s.pos += 1 + s.lit.Decimals
	}
	figures := s.pos - start
	exponent, ok := s.exponent()
	whole = whole && exponent == ""
	text := s.text[start:s.pos]
	switch {
	case !ok || figures > maxFigures:
		s.fail(BadNumber, start, s.pos, "this number is too long", "a number has at most 60 figures and an exponent from -75 to 75", "")
	case s.text[start+figures-1] == '.':
		s.fail(BadNumber, start, s.pos, "a digit is missing after the point of `"+text+"`", "", strings.Replace(text, ".", ".0", 1))
		text = strings.Replace(text, ".", ".0", 1)
	case !whole && s.at('.') && isDigit(s.peek(1)):
		for s.at('.') || isDigit(s.peek(0)) {
			s.pos++
		}
		s.fail(BadNumber, start, s.pos, "`"+s.text[start:s.pos]+"` has more than one point", "", "")
	}
	if s.err != nil && s.err.Write == "" {
		return new(big.Rat), whole
	}
	size, _ = new(big.Rat).SetString(text)
	return size, whole
}

// groups reports digits set in groups, as in 1_000 or 1'000.
func (s *scanner) groups(start int) bool {
	end := s.pos
	for end+1 < len(s.text) && (s.text[end] == '_' || s.text[end] == '\'' && digitRun(s.text[end+1:]) == 3) && isDigit(s.text[end+1]) {
		end += 1 + digitRun(s.text[end+1:])
	}
	if end == s.pos || end-start > maxFigures {
		return false
	}
	s.pos = end
	plain := strings.NewReplacer("_", "", "'", "").Replace(s.text[start:end])
	s.fail(BadNumber, start, end, "the digits of a number are written without groups", "", plain)
	return s.err.Write == plain
}

// exponent reads e, a sign and digits; ok is false when it is out of range.
func (s *scanner) exponent() (text string, ok bool) {
	if !s.at('e') && !s.at('E') {
		return "", true
	}
	n := 1
	if b := s.peek(1); b == '+' || b == '-' {
		n = 2
	}
	k := digitRun(s.text[min(len(s.text), s.pos+n):])
	if k == 0 {
		return "", true
	}
	figures := strings.TrimLeft(s.text[s.pos+n:s.pos+n+k], "0")
	value := 0
	for _, b := range figures[:min(3, len(figures))] {
		value = 10*value + int(b-'0')
	}
	text = s.text[s.pos : s.pos+n+k]
	s.pos += n + k
	if s.text[s.pos-k-1] == '-' {
		s.lit.Decimals += value
	} else {
		s.lit.Decimals = max(0, s.lit.Decimals-value)
	}
	return text, value <= maxExponent
}

// slope reads the rest of 1:2.
func (s *scanner) slope(rise *big.Rat) {
	start := 0
	s.pos++
	run, _ := s.number()
	if s.err != nil {
		return
	}
	if run.Sign() == 0 {
		s.fail(BadNumber, start, s.pos, "`"+s.text[:s.pos]+"` has no size", "the second number of a ratio must not be 0", "")
		return
	}
	s.lit.Unit = Slope
	s.lit.Value = fromOwnRat(Ratio, new(big.Rat).Quo(rise, run))
	at := s.pos + s.blanks(s.pos)
	if word, _, ok := s.unitAt(at); ok || word != "" && at == s.pos {
		s.pos = at + len(word)
		s.fail(UnknownUnit, at, s.pos, "a ratio has no unit", "`1:2` is two plain numbers", "")
	}
}

// word returns the letters and digits at position i, beginning with a letter.
func (s *scanner) word(i int) string {
	end := i
	for end < len(s.text) {
		r, size := utf8.DecodeRuneInString(s.text[end:])
		if !unicode.IsLetter(r) && (end == i || r != '_' && !unicode.IsDigit(r) && !unicode.Is(unicode.M, r)) {
			break
		}
		end += size
	}
	return s.text[i:end]
}

// finish sets the value of a literal from its size in a unit.
func (s *scanner) finish(size *big.Rat, unit Unit) {
	s.lit.Unit = unit
	if unit == Radian && size.Sign() != 0 {
		f, _ := size.Float64()
		s.lit.Value = FromRadians(f)
		return
	}
	exact := new(big.Rat).Set(size)
	for i := 0; i < s.lit.Power; i++ {
		exact.Mul(exact, unit.size())
	}
	kind := unit.kind()
	switch {
	case kind == Length:
		kind = Kind(s.lit.Power)
	case unit == NoUnit && size.Sign() == 0:
		kind = Zero
	}
	s.lit.Value = fromOwnRat(kind, exact)
}
