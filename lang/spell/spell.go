// Package spell finds the word that was probably meant.
package spell

import (
	"strings"
	"unicode/utf8"
)

// maxLength is the number of runes above which a word is taken for no slip of
// the pen; it bounds the work on junk.
const maxLength = 64

// Nearest returns the candidate nearest to word, and whether one is near enough.
// The distance is that of Damerau and Levenshtein (insert, delete, replace, swap
// two neighbours) with capitals and small letters taken as alike; at most a third
// of the letters of word, rounded, may differ. Of equally near candidates the
// first is returned, one that differs in nothing but capitals before any other.
// The word itself is never returned.
func Nearest(word string, candidates []string) (string, bool) {
	n := utf8.RuneCountInString(word)
	if n > maxLength {
		return "", false
	}
	best, bestDistance := "", (n+1)/3+1
	folded := []rune(strings.ToLower(word))
	for _, c := range candidates {
		if c == word || utf8.RuneCountInString(c) > maxLength {
			continue
		}
		if d := distance(folded, []rune(strings.ToLower(c))); d < bestDistance {
			best, bestDistance = c, d
		}
	}
	return best, best != ""
}

// distance is the optimal string alignment distance of a and b.
func distance(a, b []rune) int {
	older, old, row := make([]int, len(b)+1), make([]int, len(b)+1), make([]int, len(b)+1)
	for j := range old {
		old[j] = j
	}
	for i := range a {
		row[0] = i + 1
		for j := range b {
			row[j+1] = min(old[j+1]+1, row[j]+1, old[j]+cost(a[i], b[j]))
			if i > 0 && j > 0 && a[i] == b[j-1] && a[i-1] == b[j] {
				row[j+1] = min(row[j+1], older[j-1]+1)
			}
		}
		older, old, row = old, row, older
	}
	return old[len(b)]
}

func cost(a, b rune) int {
	if a == b {
		return 0
	}
	return 1
}
