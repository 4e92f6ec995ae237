package quantity

import (
	"math/big"
	"strconv"
	"strings"
)

// formatDigits is how many significant digits Format shows at most: more than
// any shop can use, fewer than where the rounding of float64 shows.
const formatDigits = 10

// Format writes v for people, with the unit of its kind (mm, mm², °, %) and the
// fewest digits that tell it, at most ten significant ones.
func Format(v Value) string {
	switch v.kind {
	case Number, Zero:
		return digits(v)
	case Ratio:
		return digits(percentOf(v)) + " %"
	case Angle:
		return digits(v) + "°"
	}
	length, angle := v.kind.Powers()
	unit := "mm" + superscript(length)
	switch {
	case angle == 1 && length == 0:
		unit = "°"
	case angle == 1:
		unit += "·°"
	}
	return digits(v) + " " + unit
}

// percentOf returns 100 times the number that v is.
func percentOf(v Value) Value {
	if v.rat != nil {
		return fromOwnRat(Number, new(big.Rat).Mul(v.rat, big.NewRat(100, 1)))
	}
	return Value{kind: Number, f: v.f * 100}
}

// digits writes the size of v without a unit.
func digits(v Value) string {
	e := strconv.FormatFloat(v.f, 'e', formatDigits-1, 64)
	mantissa, exponent, _ := strings.Cut(e, "e")
	n, _ := strconv.Atoi(exponent)
	mantissa = trimZeros(mantissa)
	switch {
	case v.f == 0:
		return "0"
	case n < -6 || n > 14:
		return mantissa + "e" + strconv.Itoa(n)
	}
	return plainDecimal(mantissa, n)
}

// plainDecimal writes mantissa·10^exponent without an exponent.
func plainDecimal(mantissa string, exponent int) string {
	sign := ""
	if strings.HasPrefix(mantissa, "-") {
		sign, mantissa = "-", mantissa[1:]
	}
	figures := strings.Replace(mantissa, ".", "", 1)
	if exponent < 0 {
		return sign + "0." + strings.Repeat("0", -exponent-1) + figures
	}
	if missing := exponent + 1 - len(figures); missing > 0 {
		figures += strings.Repeat("0", missing)
	}
	whole, part := figures[:exponent+1], figures[exponent+1:]
	if part == "" {
		return sign + whole
	}
	return sign + whole + "." + part
}

func trimZeros(s string) string {
	if !strings.Contains(s, ".") {
		return s
	}
	return strings.TrimSuffix(strings.TrimRight(s, "0"), ".")
}

// Style says how FormatNearest writes: in the unit of the step as it was spelt.
type Style struct {
	Unit        Unit
	Power       int   // of a length unit, 1 or more
	Decimals    int   // digits after the point
	Denominator int64 // of inches or feet: fractions with it instead of decimals; 0 for none
	Parts       int   // of an angle: 2 for minutes, 3 for seconds; else 0 or 1
	Bare        bool  // leave the unit out
}

// StyleOf returns the style for a step that was computed and not written as a
// literal: mm (to its power), degrees or per cent, and as many decimals as the
// step itself needs, at most nine.
func StyleOf(step Value) Style {
	s := Style{Power: 1}
	shown := step
	switch length, _ := step.kind.Powers(); {
	case step.kind == Angle:
		s.Unit = Degree
	case step.kind == Ratio:
		s.Unit, shown = Percent, percentOf(step)
	case length > 0:
		s.Unit, s.Power = Millimetre, length
	}
	if _, part, ok := strings.Cut(digits(shown), "."); ok {
		s.Decimals = min(len(part), formatDigits-1)
	}
	return s
}

// FormatNearest writes v rounded to the nearest multiple of step, halves away
// from zero, in the style of the step. It fails like Round.
func FormatNearest(v, step Value, style Style) (string, error) {
	n, kind, err := steps(v, step)
	if err != nil {
		return "", err
	}
	size := step.rat
	if size == nil {
		size = new(big.Rat).SetFloat64(step.f)
	}
	size = new(big.Rat).Mul(new(big.Rat).SetInt(n), size)
	if style.Unit == Radian {
		f, _ := size.Float64()
		return joinUnit(strconv.FormatFloat(FromFloat(kind, f).Radians(), 'f', style.Decimals, 64), style), nil
	}
	for i := 0; i < max(style.Power, 1); i++ {
		size.Quo(size, style.Unit.size())
	}
	switch {
	case style.Denominator > 0:
		return joinUnit(mixedFraction(size, style.Denominator), style), nil
	case style.Parts > 1:
		return sexagesimal(size, style), nil
	}
	return joinUnit(decimal(size, style.Decimals), style), nil
}

func joinUnit(figures string, style Style) string {
	unit := style.Unit.String()
	switch {
	case style.Bare || unit == "":
		return figures
	case style.Unit == Degree:
		return figures + unit
	}
	return figures + " " + unit + superscript(max(style.Power, 1))
}

// decimal writes r with a number of decimals, halves away from zero, never "-0".
func decimal(r *big.Rat, decimals int) string {
	s := r.FloatString(decimals)
	if strings.Trim(s, "-0.") == "" {
		return strings.TrimPrefix(s, "-")
	}
	return s
}

// mixedFraction writes r as a whole number and a fraction in lowest terms; what
// is finer than the denominator is rounded.
func mixedFraction(r *big.Rat, denominator int64) string {
	n := roundRat(new(big.Rat).Mul(r, big.NewRat(denominator, 1)))
	sign := ""
	if n.Sign() < 0 {
		sign = "-"
		n.Neg(n)
	}
	whole, rest := new(big.Int).QuoRem(n, big.NewInt(denominator), new(big.Int))
	if rest.Sign() == 0 {
		return sign + whole.String()
	}
	part := new(big.Rat).SetFrac(rest, big.NewInt(denominator)).String()
	if whole.Sign() == 0 {
		return sign + part
	}
	return sign + whole.String() + " " + part
}

// sexagesimal writes degrees as degrees and minutes, or with seconds too.
func sexagesimal(r *big.Rat, style Style) string {
	perDegree := big.NewInt(60)
	if style.Parts > 2 {
		perDegree.SetInt64(3600)
	}
	scale := new(big.Int).Exp(big.NewInt(10), big.NewInt(int64(style.Decimals)), nil)
	n := roundRat(new(big.Rat).Mul(r, new(big.Rat).SetInt(new(big.Int).Mul(perDegree, scale))))
	sign := ""
	if n.Sign() < 0 {
		sign = "-"
		n.Neg(n)
	}
	sixty := new(big.Int).Mul(big.NewInt(60), scale)
	rest, last := new(big.Int).QuoRem(n, sixty, new(big.Int))
	lastText := decimal(new(big.Rat).SetFrac(last, scale), style.Decimals)
	if style.Parts == 2 {
		return sign + rest.String() + "°" + lastText + "′"
	}
	degrees, minutes := new(big.Int).QuoRem(rest, big.NewInt(60), new(big.Int))
	return sign + degrees.String() + "°" + minutes.String() + "′" + lastText + "″"
}
