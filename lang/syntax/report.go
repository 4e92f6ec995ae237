package syntax

import (
	"cmp"
	"fmt"
	"slices"
	"unicode/utf8"

	"epure/lang/diag"
	"epure/lang/source"
)

// maxDiagnostics is how many diagnostics of one file are told; what is beyond is
// hardly ever a fault of its own.
const maxDiagnostics = 100

// maxGathered bounds what one stage keeps of a file full of junk.
const maxGathered = 10 * maxDiagnostics

// reporter gathers the diagnostics of one file.
type reporter struct {
	file *source.File
	src  string // its text
	all  []diag.Diagnostic
	told bool // that the file is not UTF-8
}

func (r *reporter) span(start, end int) source.Span { return r.file.Span(start, end) }

// add keeps a diagnostic.
func (r *reporter) add(d diag.Diagnostic) {
	if len(r.all) < maxGathered {
		r.all = append(r.all, d)
	}
}

// error makes an error; the caller adds it.
func (r *reporter) error(code diag.Code, start, end int, format string, args ...any) diag.Diagnostic {
	return diag.New(code, r.span(start, end), fmt.Sprintf(format, args...))
}

// checkUTF8 reports, once a file, the first byte from start to end that is no UTF-8.
func (r *reporter) checkUTF8(start, end int) {
	if r.told || utf8.ValidString(r.src[start:end]) {
		return
	}
	for at := start; at < end; {
		c, size := utf8.DecodeRuneInString(r.src[at:])
		if c == utf8.RuneError && size == 1 {
			r.told = true
			r.add(r.error("not-utf-8", at, at+1, "the byte 0x%02X here is not UTF-8", r.src[at]).
				Because("the file was perhaps saved in another encoding; save it as UTF-8"))
			return
		}
		at += size
	}
}

// flush moves the first diagnostics of the file into a bag.
func (r *reporter) flush(bag *diag.Bag) {
	slices.SortStableFunc(r.all, func(a, b diag.Diagnostic) int { return cmp.Compare(a.Span.Start, b.Span.Start) })
	if len(r.all) <= maxDiagnostics {
		bag.Add(r.all...)
		return
	}
	bag.Add(r.all[:maxDiagnostics]...)
	next := r.all[maxDiagnostics].Span
	bag.Add(diag.New("too-many", next, "the file has more than 100 diagnostics").
		Because("the first 100 are told; mend these first"))
}
