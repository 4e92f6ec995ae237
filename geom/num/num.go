// Package num holds what every exact decision rests on: a sign that may be
// zero or unsure, the constants of error, and root finders.
package num

import "math"

// Sign is the verdict of a predicate.
type Sign int8

// The verdicts. Zero is an answer, with a ground (by construction or within a
// stated bound), never a tie to be broken.
const (
	Negative Sign = -1
	Zero     Sign = 0
	Positive Sign = 1
)

// SignOf returns the sign of v, zero when |v| <= bound (bound >= 0).
func SignOf(v, bound float64) Sign {
	switch {
	case v > bound:
		return Positive
	case v < -bound:
		return Negative
	}
	return Zero
}

// The constants of error. Each bounds a rounding error, relative to what its
// comment names; no other tolerance stands in geom without its own derivation.
const (
	// Eps is the distance from 1 to the next float64.
	Eps = 0x1p-52

	// Direction bounds the error of a sine or cosine between two unit vectors
	// that were each normalised once from a product of unit vectors: a scalar
	// product of three terms errs by 3/2·Eps, each vector by Eps, a half angle
	// of a cone by Eps; 8·Eps is their sum rounded up.
	Direction = 8 * Eps

	// Place bounds the error of a distance in a point that was worked out by a
	// few dozen operations from coordinates of the size it is relative to.
	Place = 64 * Eps

	// OnSurface, times the size of a body, is the distance under which a point
	// is on a surface (1.5e-11). It leaves room for a body ten thousand times
	// its own size away from the origin, where coordinates err by 1e4·Eps
	// sizes, and for the loss of three digits in a long conic.
	OnSurface = 0x1p-36

	// Join, times the size of a body, is the distance within which the ends of
	// two edges are one corner (2.4e-7). Two edges that cross under a small
	// angle find their common point only to the square root of OnSurface.
	Join = 0x1p-22
)

// Det returns a·d - b·c to within two units in the last place, by the error
// terms of both products (Kahan's scheme with a fused multiply-add, which Go
// rounds once on every machine).
func Det(a, b, c, d float64) float64 {
	p := b * c
	e := math.FMA(-b, c, p)
	f := math.FMA(a, d, -p)
	return f + e
}

// Quadratic returns the real roots of a·x² + 2·b·x + c, ascending. An a of zero
// gives the root of the straight line; a discriminant of zero gives one root.
func Quadratic(a, b, c float64) []float64 {
	if a == 0 {
		if b == 0 {
			return nil
		}
		return []float64{-c / (2 * b)}
	}
	d := Det(b, a, c, b)
	if d < 0 {
		return nil
	}
	if d == 0 {
		return []float64{-b / a}
	}
	q := -(b + math.Copysign(math.Sqrt(d), b))
	x, y := q/a, c/q
	if x > y {
		x, y = y, x
	}
	return []float64{x, y}
}

// Turn returns t shifted by whole turns into [lo, lo+2π).
func Turn(t, lo float64) float64 {
	t -= 2 * math.Pi * math.Floor((t-lo)/(2*math.Pi))
	if t < lo || t >= lo+2*math.Pi {
		return lo
	}
	return t
}
