// Package source holds the text of a file and places in it.
//
// A place is a pair of byte offsets until somebody prints it. Lines and columns
// are looked up then, from a table made once, so that no stage ever has to carry
// them along or guess them again from the text.
package source

import (
	"bytes"
	"sort"
	"strings"
	"unicode/utf8"
)

// BOM is the mark that some editors put in front of UTF-8 text. It is no part
// of the language and counts in no column.
const BOM = "\uFEFF"

// File is a text with the name that the user gave it. It is never changed.
type File struct {
	Name string // as the user spelt it, "-" for standard input
	Text []byte // as read; not necessarily valid UTF-8

	lines []int // offset of the first byte of each line
}

// New makes a File. It keeps text and does not copy it: nobody may write to it
// afterwards. A line ends with "\n", "\r\n" or "\r".
func New(name string, text []byte) *File {
	lines := []int{0}
	for i, b := range text {
		if b == '\n' || b == '\r' && (i+1 == len(text) || text[i+1] != '\n') {
			lines = append(lines, i+1)
		}
	}
	return &File{Name: name, Text: text, lines: lines}
}

// Lines returns the number of lines, at least 1.
func (f *File) Lines() int { return len(f.lines) }

// Position returns the line and the column of a byte offset, both from 1. The
// column counts runes (a byte that is no UTF-8 counts as one). An offset outside
// the text is moved to its nearer end.
func (f *File) Position(offset int) (line, column int) {
	offset = max(0, min(offset, len(f.Text)))
	line = sort.SearchInts(f.lines, offset+1)
	start := f.LineStart(line)
	return line, 1 + utf8.RuneCount(f.Text[min(start, offset):offset])
}

// LineStart returns the offset of the first byte of a line (from 1), after the
// BOM if there is one. A line that does not exist is moved to the nearer end.
func (f *File) LineStart(line int) int {
	line = max(1, min(line, len(f.lines)))
	if line == 1 && bytes.HasPrefix(f.Text, []byte(BOM)) {
		return len(BOM)
	}
	return f.lines[line-1]
}

// LineEnd returns the offset just after the last byte of a line (from 1), its
// line end not counted.
func (f *File) LineEnd(line int) int {
	line = max(1, min(line, len(f.lines)))
	end := len(f.Text)
	if line < len(f.lines) {
		end = f.lines[line]
	}
	for end > f.lines[line-1] && (f.Text[end-1] == '\n' || f.Text[end-1] == '\r') {
		end--
	}
	return end
}

// Line returns the text of a line (from 1) without its line end.
func (f *File) Line(line int) string {
	return string(f.Text[f.LineStart(line):f.LineEnd(line)])
}

// Span returns the span of the bytes from start up to end in f.
func (f *File) Span(start, end int) Span { return Span{File: f, Start: start, End: end} }

// Span is a stretch of a file: the bytes from Start up to, but not with, End.
// The zero Span (no File) means no place.
type Span struct {
	File       *File
	Start, End int
}

// IsZero says whether s is no place.
func (s Span) IsZero() bool { return s.File == nil }

// Position returns line and column of the start of s, 0 and 0 for no place.
func (s Span) Position() (line, column int) {
	if s.File == nil {
		return 0, 0
	}
	return s.File.Position(s.Start)
}

// Text returns the bytes of s as a string, "" for no place.
func (s Span) Text() string {
	if s.File == nil {
		return ""
	}
	size := len(s.File.Text)
	start := max(0, min(s.Start, size))
	return string(s.File.Text[start:max(start, min(s.End, size))])
}

// To returns the span from the start of s to the end of t, which must lie in the
// same file and not begin before s. If either is no place, the other is returned.
func (s Span) To(t Span) Span {
	if s.File == nil {
		return t
	}
	if t.File != s.File {
		return s
	}
	return Span{File: s.File, Start: s.Start, End: max(s.End, t.End)}
}

// Name returns the display name of the file of s, "" for no place.
func (s Span) Name() string {
	if s.File == nil {
		return ""
	}
	return s.File.Name
}

// Contains says whether t lies wholly in s.
func (s Span) Contains(t Span) bool {
	return s.File == t.File && s.Start <= t.Start && t.End <= s.End
}

// Quote returns text in the quotes that diagnostics use for what stands, or
// should stand, in a file. Text of more than 60 runes is cut.
func Quote(text string) string {
	const limit = 60
	if utf8.RuneCountInString(text) > limit {
		text = string([]rune(text[:min(len(text), 4*limit)])[:limit]) + "…"
	}
	return "`" + strings.Map(plainRune, text) + "`"
}

// plainRune replaces what would spoil a line of output.
func plainRune(r rune) rune {
	if r < ' ' || r == 0x7f || r == utf8.RuneError {
		return '·'
	}
	return r
}
