// Package num holds what every exact decision rests on: a sign that may be
// zero or unsure, the constants of error, and root finders.
package num

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
