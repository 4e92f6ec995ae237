package quantity

import (
	"math/big"
	"strings"
)

// Unit is what a quantity was written in.
type Unit int8

// The units. NoUnit is a plain number, Slope the form 1:2.
const (
	NoUnit Unit = iota
	Millimetre
	Centimetre
	Metre
	Inch
	Foot
	Degree
	Radian
	Percent
	Slope
)

// Units returns the spellings of the units, in the order of the manual.
func Units() []string { return []string{"mm", "cm", "m", "in", "ft", "°", "deg", "rad", "%"} }

// unitNamed returns the unit with an exact spelling.
func unitNamed(word string) (Unit, bool) {
	switch word {
	case "mm":
		return Millimetre, true
	case "cm":
		return Centimetre, true
	case "m":
		return Metre, true
	case "in":
		return Inch, true
	case "ft":
		return Foot, true
	case "°", "deg":
		return Degree, true
	case "rad":
		return Radian, true
	case "%":
		return Percent, true
	}
	return NoUnit, false
}

// String returns how Format spells the unit; "" for NoUnit and Slope.
func (u Unit) String() string {
	switch u {
	case Millimetre:
		return "mm"
	case Centimetre:
		return "cm"
	case Metre:
		return "m"
	case Inch:
		return "in"
	case Foot:
		return "ft"
	case Degree:
		return "°"
	case Radian:
		return "rad"
	case Percent:
		return "%"
	}
	return ""
}

// kind returns what one unit measures.
func (u Unit) kind() Kind {
	switch u {
	case NoUnit:
		return Number
	case Degree, Radian:
		return Angle
	case Percent, Slope:
		return Ratio
	}
	return Length
}

// size returns the exact size of one unit in mm, degrees or as a number. A
// radian has none: its size is given by FromRadians.
func (u Unit) size() *big.Rat {
	switch u {
	case Centimetre:
		return big.NewRat(10, 1)
	case Metre:
		return big.NewRat(1000, 1)
	case Inch:
		return big.NewRat(254, 10) // exact since the inch of 1959
	case Foot:
		return big.NewRat(3048, 10)
	case Percent:
		return big.NewRat(1, 100)
	}
	return big.NewRat(1, 1)
}

// isImperial says whether fractions may be written with the unit.
func (u Unit) isImperial() bool { return u == Inch || u == Foot }

// meant returns the unit, and its power, that a word which is none was surely
// meant for: other capitals, the word in full, mm2 for mm². ok is false when
// there is no telling.
func meant(word string) (u Unit, power int, ok bool) {
	if n := len(word) - 1; n > 0 && (word[n] == '2' || word[n] == '3') {
		u, ok = unitNamed(word[:n])
		return u, int(word[n] - '0'), ok && u.kind() == Length
	}
	u, ok = meantPlainly(word)
	return u, 1, ok
}

// meantPlainly is meant for the first power.
func meantPlainly(word string) (u Unit, ok bool) {
	lower := strings.ToLower(word)
	if u, ok := unitNamed(lower); ok && lower != word {
		return u, true
	}
	switch lower {
	case "mms", "millimetre", "millimetres", "millimeter", "millimeters":
		return Millimetre, true
	case "cms", "centimetre", "centimetres", "centimeter", "centimeters":
		return Centimetre, true
	case "metre", "metres", "meter", "meters":
		return Metre, true
	case "ins", "inch", "inches":
		return Inch, true
	case "feet", "foot":
		return Foot, true
	case "degs", "degree", "degrees":
		return Degree, true
	case "rads", "radian", "radians":
		return Radian, true
	case "percent", "pct":
		return Percent, true
	}
	return NoUnit, false
}

// superscript returns a power as raised digits: "" for 1, "²" for 2.
func superscript(power int) string {
	if power == 1 {
		return ""
	}
	var b strings.Builder
	if power < 0 {
		b.WriteRune('⁻')
		power = -power
	}
	b.WriteRune([]rune("⁰¹²³⁴⁵⁶⁷⁸⁹")[power%10])
	return b.String()
}
