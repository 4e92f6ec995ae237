package quantity

import (
	"math/big"
	"strings"
	"unicode/utf8"
)

// What may follow the digits of a literal: a unit, a fraction of inches or feet,
// inches after feet, minutes and seconds after degrees. A unit may be set off by
// a blank; a word that is no unit is left alone after a blank, unless it is a
// unit in all but spelling.

// unit reads the unit after a number, if there is one.
func (s *scanner) unit(size *big.Rat) {
	gap := s.blanks(s.pos)
	at := s.pos + gap
	word, unit, ok := s.unitAt(at)
	switch {
	case ok:
		s.pos = at + len(word)
		s.afterUnit(size, unit)
	case gap == 0 && s.lookAlikeDegree(at):
		s.afterUnit(size, Degree)
	case gap == 0 && s.isMinuteMark(at):
		s.bareMark(size)
	case word != "":
		s.strangeWord(size, word, at)
	default:
		s.finish(size, NoUnit)
	}
}

// unitAt returns the word at a position and the unit that it is.
func (s *scanner) unitAt(at int) (string, Unit, bool) {
	for _, sign := range []string{"°", "%"} {
		if strings.HasPrefix(s.text[at:], sign) {
			u, _ := unitNamed(sign)
			return sign, u, true
		}
	}
	word := s.word(at)
	if len(word) > 2 && word[:2] == "ft" && isDigit(word[2]) {
		word = "ft" // 5ft3in
	}
	u, ok := unitNamed(word)
	return word, u, ok
}

// lookAlikeDegree reads a sign that only looks like a degree sign.
func (s *scanner) lookAlikeDegree(at int) bool {
	for _, sign := range []string{"º", "˚", "∘", "ᵒ"} {
		if strings.HasPrefix(s.text[at:], sign) {
			s.pos = at + len(sign)
			s.fail(LookAlike, at, s.pos, "`"+sign+"` only looks like the degree sign", "", "°")
			return true
		}
	}
	return false
}

// strangeWord deals with a word after a number that is no unit.
func (s *scanner) strangeWord(size *big.Rat, word string, at int) {
	glued := at == s.pos
	unit, power, known := meant(word)
	end := at + len(word)
	switch {
	case known && (glued || !s.valueFollows(end)):
		s.pos, s.lit.Power = end, power
		s.fail(UnknownUnit, at, end, "`"+word+"` is not a unit", unitRule(), unit.String()+superscript(power))
		s.afterUnit(size, unit)
	case glued:
		s.pos = end
		s.fail(UnknownUnit, at, end, "`"+word+"` is not a unit", unitRule()+"; a product needs a sign: `"+s.text[:at]+" * "+word+"`", "")
	default:
		s.finish(size, NoUnit)
	}
}

func unitRule() string { return "the units are " + strings.Join(Units(), " ") }

// valueFollows says whether a value stands after position i, so that the word
// before it may be a clause word.
func (s *scanner) valueFollows(i int) bool {
	i += s.blanks(i)
	return i < len(s.text) && (isDigit(s.text[i]) || s.text[i] == '"' || s.text[i] == '(' || s.text[i] == '-')
}

// afterUnit reads what may follow a unit.
func (s *scanner) afterUnit(size *big.Rat, unit Unit) {
	switch unit {
	case Foot:
		if s.inches(size) {
			return
		}
	case Degree:
		if s.minutes(size) {
			return
		}
	}
	if unit.kind() == Length {
		s.power()
	}
	s.finish(size, unit)
}

// power reads a raised 2 or 3 after a unit of length.
func (s *scanner) power() {
	for power, sign := range [4]string{2: "²", 3: "³"} {
		if sign != "" && strings.HasPrefix(s.text[s.pos:], sign) {
			s.lit.Power = power
			s.pos += len(sign)
			return
		}
	}
}

// fraction reads the rest of 3/8 in. It does nothing and returns false when no
// unit follows, for then it is a division.
func (s *scanner) fraction(num *big.Rat) bool {
	return s.fractionAt(s.pos, new(big.Rat), num)
}

// mixed reads the rest of 1 3/8 in; false when no fraction follows.
func (s *scanner) mixed(whole *big.Rat) bool {
	gap := s.blanks(s.pos)
	n := digitRun(s.text[s.pos+gap:])
	slash := s.pos + gap + n
	if gap == 0 || n == 0 || slash+1 >= len(s.text) || s.text[slash] != '/' || !isDigit(s.text[slash+1]) {
		return false
	}
	num := s.digits(s.pos+gap, slash)
	if s.err != nil {
		return true
	}
	if s.fractionAt(slash, whole, num) {
		return true
	}
	end := slash + 1 + digitRun(s.text[slash+1:])
	s.fail(BadFraction, 0, end, "the fraction in `"+s.text[:end]+"` has no unit", fractionRule, "")
	s.pos = end
	return true
}

const fractionRule = "a whole number with a fraction is only for in and ft"

// digits returns the number that the digits from start to end are.
func (s *scanner) digits(start, end int) *big.Rat {
	if end-start > maxFigures {
		s.fail(BadNumber, start, end, "this number is too long", "a number has at most 60 figures", "")
		s.pos = end
		return new(big.Rat)
	}
	r, _ := new(big.Rat).SetString(s.text[start:end])
	return r
}

// fractionAt reads "/8 in" at a position, after the whole part and the numerator.
func (s *scanner) fractionAt(slash int, whole, num *big.Rat) bool {
	if slash+1 >= len(s.text) || s.text[slash] != '/' || !isDigit(s.text[slash+1]) {
		return false
	}
	end := slash + 1 + digitRun(s.text[slash+1:])
	word, unit, ok := s.unitAt(end + s.blanks(end))
	if !ok {
		return false
	}
	denominator := s.digits(slash+1, end)
	s.pos = end + s.blanks(end) + len(word)
	if s.err != nil {
		return true
	}
	if denominator.Sign() == 0 {
		s.fail(BadFraction, 0, end, "`"+s.text[:end]+"` divides by 0", "", "")
		return true
	}
	value := new(big.Rat).Add(whole, new(big.Rat).Quo(num, denominator))
	if !unit.isImperial() {
		s.foreignFraction(whole, num, denominator, word)
		s.finish(value, unit)
		return true
	}
	s.lit.Decimals = 0
	if denominator.Num().IsInt64() {
		s.lit.Denominator = denominator.Num().Int64()
	}
	if unit == Foot && s.inches(value) {
		return true
	}
	s.finish(value, unit)
	return true
}

// foreignFraction reports 50/3 mm and offers 50 mm / 3.
func (s *scanner) foreignFraction(whole, num, denominator *big.Rat, word string) {
	top := new(big.Rat).Add(new(big.Rat).Mul(whole, denominator), num)
	unit := " " + word
	if word == "°" {
		unit = word
	}
	s.fail(BadFraction, 0, s.pos, "fractions are only for in and ft, not for "+word, "",
		top.Num().String()+unit+" / "+denominator.Num().String())
}

// inches reads the inches after feet, if there are any.
func (s *scanner) inches(feet *big.Rat) bool {
	sub := scanner{text: s.text, pos: s.pos + s.blanks(s.pos), lit: Literal{Power: 1, Parts: 1}}
	if !isDigit(sub.peek(0)) {
		return false
	}
	begin := sub.pos
	rest := scanner{text: s.text[begin:], lit: sub.lit}
	size, whole := rest.number()
	if rest.err != nil || !(whole && rest.fraction(size) || whole && rest.mixed(size)) {
		rest.plainInches(size)
	}
	if rest.err != nil || rest.lit.Unit != Inch || rest.lit.Power != 1 {
		return false
	}
	s.pos = begin + rest.pos
	if rest.lit.Value.Float() >= 12*25.4 || !feet.IsInt() {
		s.fail(BadNumber, 0, s.pos, "`"+s.text[:s.pos]+"` is no length in feet and inches", "whole feet, then less than 12 inches", "")
		return true
	}
	s.lit = rest.lit
	s.lit.Parts = 2
	s.lit.Value, _ = Add(fromOwnRat(Length, new(big.Rat).Mul(feet, Foot.size())), rest.lit.Value)
	return true
}

// plainInches reads a unit without anything that could follow it.
func (s *scanner) plainInches(size *big.Rat) {
	at := s.pos + s.blanks(s.pos)
	if word, unit, ok := s.unitAt(at); ok && unit == Inch {
		s.pos = at + len(word)
		s.finish(size, Inch)
	}
}

// isMinuteMark says whether a mark of minutes or seconds stands at a position.
func (s *scanner) isMinuteMark(at int) bool {
	return s.markAt(at, "′", "'", "″", "’") > 0
}

// markAt returns the length of the first of marks that stands at a position.
func (s *scanner) markAt(at int, marks ...string) int {
	for _, m := range marks {
		if strings.HasPrefix(s.text[at:], m) {
			return len(m)
		}
	}
	return 0
}

// bareMark reports 5′ and 5″ without degrees.
func (s *scanner) bareMark(size *big.Rat) {
	n := s.markAt(s.pos, "′", "'", "″", "’")
	start, number := s.pos, s.text[:s.pos]
	mark := s.text[s.pos : s.pos+n]
	s.pos += n
	if mark == "″" {
		s.fail(BadAngle, start, s.pos, "seconds follow degrees and minutes", "write `0°0′"+number+"″` for an angle, `"+number+" in` for inches", "")
		return
	}
	s.fail(BadAngle, start, s.pos, "minutes follow degrees", "write `0°"+number+"′` for an angle, `"+number+" ft` for feet", "")
}

// minutes reads the minutes and seconds after degrees, if there are any.
func (s *scanner) minutes(degrees *big.Rat) bool {
	at := s.pos + s.blanks(s.pos)
	if at >= len(s.text) || !isDigit(s.text[at]) {
		return false
	}
	value, end, decimals := s.part(at)
	if value == nil || s.markAt(end, "′", "'", "’") == 0 {
		return false
	}
	total := new(big.Rat).Add(degrees, new(big.Rat).Quo(value, big.NewRat(60, 1)))
	s.mark(end, "′", "'")
	s.lit.Parts, s.lit.Decimals = 2, decimals
	fine := degrees.IsInt() && value.Cmp(big.NewRat(60, 1)) < 0
	if second, ok := s.seconds(); ok {
		fine = fine && value.IsInt() && second.Cmp(big.NewRat(60, 1)) < 0
		total.Add(total, second.Quo(second, big.NewRat(3600, 1)))
	}
	if !fine {
		s.fail(BadAngle, 0, s.pos, "`"+s.text[:s.pos]+"` is no angle in degrees and minutes",
			"only the last part may have decimals; minutes and seconds are less than 60", "")
	}
	s.finish(total, Degree)
	return true
}

// seconds reads the seconds after minutes.
func (s *scanner) seconds() (*big.Rat, bool) {
	at := s.pos + s.blanks(s.pos)
	if at >= len(s.text) || !isDigit(s.text[at]) {
		return nil, false
	}
	value, end, decimals := s.part(at)
	if value == nil || s.markAt(end, "″", "”", "\"") == 0 {
		return nil, false
	}
	s.mark(end, "″")
	s.lit.Parts, s.lit.Decimals = 3, decimals
	return value, true
}

// part reads a plain number at a position; nil when it is none.
func (s *scanner) part(at int) (value *big.Rat, end, decimals int) {
	sub := scanner{text: s.text[at:]}
	value, _ = sub.number()
	if sub.err != nil {
		return nil, at, 0
	}
	return value, at + sub.pos, sub.lit.Decimals
}

// mark goes past the mark at a position and reports it unless it is a good one.
func (s *scanner) mark(at int, good ...string) {
	s.pos = at
	if n := s.markAt(at, good...); n > 0 {
		s.pos += n
		return
	}
	_, n := utf8.DecodeRuneInString(s.text[at:])
	s.pos += n
	bad := s.text[at:s.pos]
	s.fail(LookAlike, at, s.pos, "`"+bad+"` is not the mark of "+markName(good[0]), "", good[0])
}

func markName(mark string) string {
	if mark == "″" {
		return "seconds"
	}
	return "minutes"
}
