package drawing

import (
	"errors"
	"fmt"
	"math"
	"strconv"
	"strings"
)

// What all writers do alike: refuse numbers that are none, write the others.

// ErrNotFinite says that a mark has a coordinate that is not a finite number.
var ErrNotFinite = errors.New("coordinate is not finite")

// Check returns an error that wraps ErrNotFinite and names the first mark with a
// coordinate, width or grey that is not finite, or the sheet's size. Writers call it first.
func Check(s Sheet) error {
	if !finite(s.Width, s.Height) {
		return fmt.Errorf("sheet %q, size: %w", s.Name, ErrNotFinite)
	}
	for _, m := range s.Marks {
		if !Finite(m.Shape) || !finite(m.Pen.Width, m.Fill.Grey) {
			return fmt.Errorf("sheet %q, mark %q %q %q: %w", s.Name, m.Key.View, m.Key.Thing, m.Key.Feature, ErrNotFinite)
		}
	}
	return nil
}

// Decimal writes a finite number with four decimals at most, without trailing
// zeros and never as -0.
func Decimal(x float64) string {
	s := strconv.FormatFloat(x, 'f', 4, 64)
	s = strings.TrimRight(strings.TrimRight(s, "0"), ".")
	if s == "-0" {
		return "0"
	}
	return s
}

// Finite reports whether every number of a shape is finite.
func Finite(s Shape) bool {
	switch s := s.(type) {
	case Text:
		return finite(s.At.X, s.At.Y, s.Height, s.Angle)
	case EllipseArc:
		return finite(s.C.X, s.C.Y, s.RX, s.RY, s.Rot, s.From, s.To)
	case Path:
		for _, p := range s.Pieces {
			if !Finite(p) {
				return false
			}
		}
		return true
	}
	b := Bounds(s) // NaN passes through min and max, infinities stay
	return b == EmptyBox() || finite(b.Min.X, b.Min.Y, b.Max.X, b.Max.Y)
}

func finite(xs ...float64) bool {
	for _, x := range xs {
		if math.IsNaN(x) || math.IsInf(x, 0) {
			return false
		}
	}
	return true
}
