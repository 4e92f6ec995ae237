package furniture

import (
	"fmt"
	"math"
)

// Scale is a scale of a drawing, paper over model, in lowest terms: {1, 5} is 1:5,
// {2, 1} is 2:1.
type Scale struct{ Paper, Model int }

// Value returns paper over model.
func (s Scale) Value() float64 { return float64(s.Paper) / float64(s.Model) }

// String returns the scale as ISO 5455 writes it: "1:5".
func (s Scale) String() string { return fmt.Sprintf("%d:%d", s.Paper, s.Model) }

// Scales returns the scales listed in ISO 5455:1979, from the largest down.
func Scales() []Scale {
	return []Scale{
		{50, 1}, {20, 1}, {10, 1}, {5, 1}, {2, 1}, {1, 1}, {1, 2}, {1, 5}, {1, 10}, {1, 20}, {1, 50},
		{1, 100}, {1, 200}, {1, 500}, {1, 1000}, {1, 2000}, {1, 5000}, {1, 10000},
	}
}

// scaleSlack is the part by which a factor may fall short of a scale that it is
// meant to be: it grows a sheet's length by a micrometre at most.
const scaleSlack = 1e-9

// scaleDecades bounds the list extended by powers of ten, as ISO 5455 allows.
const scaleDecades = 9

// NextDown returns the largest standard scale that is not larger than the factor
// fit (paper over model), the list being extended both ways by powers of ten. It
// is false for a factor that is not positive or lies outside 1:10^9 and 5·10^9:1.
func NextDown(fit float64) (Scale, bool) {
	if !(fit > 0) || math.IsInf(fit, 1) {
		return Scale{}, false
	}
	for decade := scaleDecades; decade >= -scaleDecades; decade-- {
		for _, digit := range []int{5, 2, 1} {
			if s, ok := decimal(digit, decade); ok && s.Value() <= fit*(1+scaleSlack) {
				return s, true
			}
		}
	}
	return Scale{}, false
}

// decimal returns the scale digit·10^decade in lowest terms.
func decimal(digit, decade int) (Scale, bool) {
	ten := 1
	for range max(decade, -decade) {
		ten *= 10
	}
	if decade >= 0 {
		return Scale{digit * ten, 1}, true
	}
	return Scale{1, ten / digit}, ten%digit == 0
}
