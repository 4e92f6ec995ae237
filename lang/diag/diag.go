// Package diag holds what the program has to say about a source file.
//
// A diagnostic is data: a code, a place, one sentence in the user's words, the
// reason, further places and edits that would mend it. The text on a terminal,
// the JSON and an editor are three printings of the same value, so none of them
// can know something that the others do not.
package diag

import (
	"cmp"
	"slices"

	"epure/lang/source"
)

// Severity says how grave a diagnostic is. The zero value is invalid.
type Severity int8

// The severities. Only an Error stops an output from being written.
const (
	Error Severity = iota + 1
	Warning
)

// String returns the word printed before the sentence.
func (s Severity) String() string {
	switch s {
	case Error:
		return "error"
	case Warning:
		return "warning"
	}
	return "invalid"
}

// Diagnostic is one finding about a source file.
type Diagnostic struct {
	Code     Code        // a row of the table in codes.go
	Severity Severity    // zero is invalid
	Span     source.Span // the tightest text at fault, or where the missing thing belongs
	Text     string      // one sentence in the user's words and values, no full stop
	Reason   string      // the rule, or the values that broke it; may be ""
	Notes    []Note      // other places: the first definition, every link of a cycle
	Fixes    []Fix       // the nearest spelling and other edits
}

// Note is a sentence about another place. Its Span may be no place.
type Note struct {
	Span source.Span
	Text string
}

// Fix is an edit that would mend the fault: Span is replaced by Text (an empty
// Span inserts, an empty Text deletes). Label says so in words; when it is "",
// the writers make the words.
type Fix struct {
	Span  source.Span
	Text  string
	Label string
}

// New makes an error.
func New(code Code, span source.Span, text string) Diagnostic {
	return Diagnostic{Code: code, Severity: Error, Span: span, Text: text}
}

// Warn makes a warning.
func Warn(code Code, span source.Span, text string) Diagnostic {
	return Diagnostic{Code: code, Severity: Warning, Span: span, Text: text}
}

// Because returns d with a reason.
func (d Diagnostic) Because(reason string) Diagnostic {
	d.Reason = reason
	return d
}

// WithNote returns d with one more note.
func (d Diagnostic) WithNote(span source.Span, text string) Diagnostic {
	d.Notes = append(slices.Clip(d.Notes), Note{Span: span, Text: text})
	return d
}

// WithFix returns d with one more fix whose words the writers make.
func (d Diagnostic) WithFix(span source.Span, replacement string) Diagnostic {
	return d.WithLabelledFix(span, replacement, "")
}

// WithLabelledFix returns d with one more fix that says itself what it does.
func (d Diagnostic) WithLabelledFix(span source.Span, replacement, label string) Diagnostic {
	d.Fixes = append(slices.Clip(d.Fixes), Fix{Span: span, Text: replacement, Label: label})
	return d
}

// Bag gathers the diagnostics of a run. The zero Bag is empty and ready.
type Bag struct {
	all []Diagnostic
}

// Add puts diagnostics into b.
func (b *Bag) Add(ds ...Diagnostic) { b.all = append(b.all, ds...) }

// Len returns how many diagnostics were added, repeats counted.
func (b *Bag) Len() int { return len(b.all) }

// HasErrors says whether one of the diagnostics is an Error.
func (b *Bag) HasErrors() bool {
	return slices.ContainsFunc(b.all, func(d Diagnostic) bool { return d.Severity == Error })
}

// Sorted returns the diagnostics by file name, offset and code, those of equal
// rank in the order of their texts, and exact repeats once. Those without a
// place come first.
func (b *Bag) Sorted() []Diagnostic {
	out := slices.Clone(b.all)
	slices.SortStableFunc(out, compare)
	return slices.CompactFunc(out, same)
}

// compare is the order of Sorted.
func compare(a, b Diagnostic) int {
	return cmp.Or(
		cmp.Compare(a.Span.Name(), b.Span.Name()),
		cmp.Compare(a.Span.Start, b.Span.Start),
		cmp.Compare(a.Code, b.Code),
		cmp.Compare(a.Span.End, b.Span.End),
		cmp.Compare(a.Text, b.Text),
		cmp.Compare(a.Reason, b.Reason),
		cmp.Compare(len(a.Notes), len(b.Notes)),
	)
}

// same says whether two neighbours in the order say exactly the same.
func same(a, b Diagnostic) bool {
	return compare(a, b) == 0 && a.Severity == b.Severity &&
		slices.Equal(a.Notes, b.Notes) && slices.Equal(a.Fixes, b.Fixes)
}
