package furniture

import (
	"strings"
	"unicode/utf8"

	"epure/geom/vec"
	"epure/render/drawing"
	"epure/render/font"
)

// Fitting text into a field: the largest height of ISO 3098 at which the text,
// broken between words, fits; below the smallest it is shrunk further and may
// break inside words. Text never leaves its field and is never cut, short of the
// bound below.

// Heights returns the nominal heights of capitals of ISO 3098-1, mm, from the
// largest down.
func Heights() []float64 { return []float64{20, 14, 10, 7, 5, 3.5, 2.5, 1.8} }

// pitch is the distance of two baselines over the height of capitals: 15/10 of
// type B, for text without accents.
const pitch = 1.5

// shrink is the step by which text gets smaller below the smallest height.
const shrink = 0.9

// mostText bounds the characters set in one field; the rest is replaced by an
// ellipsis. Five hundred are a dozen times what ISO 7200 allows.
const mostText = 500

// Fit breaks the text into lines no wider than width whose room, from the top of
// the first line's capitals to the last baseline, is at most room, with capitals
// of at most most mm. It returns the lines and the height chosen; no lines for
// an empty text.
func Fit(s string, width, room, most float64) (lines []string, height float64) {
	s = shorten(strings.TrimSpace(font.Clean(s)))
	if s == "" || !(width > 0 && room > 0) {
		return nil, 0
	}
	smallest := most
	for _, h := range Heights() {
		if h > most {
			continue
		}
		smallest = h
		if lines, ok := wrap(s, width, h, false); ok && tall(len(lines), h) <= room {
			return lines, h
		}
	}
	for h := smallest; ; h *= shrink {
		if lines, _ := wrap(s, width, h, true); tall(len(lines), h) <= room {
			return lines, h
		}
	}
}

func shorten(s string) string {
	if r := []rune(s); len(r) > mostText {
		return string(r[:mostText]) + "…"
	}
	return s
}

// tall is the room of n lines of height h.
func tall(n int, h float64) float64 { return h * (1 + pitch*float64(n-1)) }

// wrap fills lines with words; with force, a word that is too long is broken. It
// is false when a line is too wide all the same.
func wrap(s string, width, h float64, force bool) ([]string, bool) {
	var lines []string
	ok := true
	for _, word := range strings.Fields(s) {
		if n := len(lines); n > 0 && font.Width(lines[n-1]+" "+word, h, false) <= width {
			lines[n-1] += " " + word
			continue
		}
		for force && font.Width(word, h, false) > width {
			head := prefix(word, width, h)
			lines, word = append(lines, head), word[len(head):]
		}
		ok = ok && font.Width(word, h, false) <= width
		if word != "" {
			lines = append(lines, word)
		}
	}
	return lines, ok
}

// prefix is the longest start of word no wider than width, at least a character.
func prefix(word string, width, h float64) string {
	end := 0
	for i, r := range word {
		next := i + utf8.RuneLen(r)
		if end > 0 && font.Width(word[:next], h, false) > width {
			break
		}
		end = next
	}
	return word[:end]
}

// column places lines one under the other from the baseline of the first.
func column(k drawing.Key, lines []string, first vec.V2, height float64, a drawing.Anchor) []drawing.Mark {
	var out []drawing.Mark
	for i, l := range lines {
		at := vec.V2{X: first.X, Y: first.Y - pitch*height*float64(i)}
		out = append(out, label(numbered(k, i), drawing.Text{At: at, Height: height, Anchor: a, String: l}))
	}
	return out
}
