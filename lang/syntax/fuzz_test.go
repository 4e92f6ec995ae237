package syntax

import (
	"os"
	"path/filepath"
	"strings"
	"testing"
	"unicode/utf8"

	"epure/lang/diag"
	"epure/lang/source"
)

// seeds gives a fuzz target the sources that there are.
func seeds(f *testing.F) {
	f.Add(hood)
	for _, pattern := range []string{"../../testdata/errors/*.epure", "../../examples/*.epure"} {
		paths, err := filepath.Glob(pattern)
		if err != nil {
			f.Fatal(err)
		}
		for _, path := range paths {
			text, err := os.ReadFile(path)
			if err != nil {
				f.Fatal(err)
			}
			if len(text) < 1<<14 {
				f.Add(string(text))
			}
		}
	}
	for _, e := range diag.Examples(diag.StageSyntax) {
		if len(e.Example) < 1<<12 {
			f.Add(e.Example)
		}
	}
}

// FuzzLex: tokens and comments follow each other, lie in the file, and leave out
// nothing but blanks, unless a diagnostic speaks of it.
func FuzzLex(f *testing.F) {
	seeds(f)
	f.Fuzz(func(t *testing.T, text string) {
		r := &reporter{file: source.New("f", []byte(text)), src: text}
		out := lex(r, 0, len(text))
		seen := make([]bool, len(text))
		mark := func(start, end int) {
			if start < 0 || end > len(text) || start > end {
				t.Fatalf("%d to %d of %d bytes", start, end, len(text))
			}
			for i := start; i < end; i++ {
				seen[i] = true
			}
		}
		at := 0
		for _, k := range out.tokens {
			if k.start < at && !strings.ContainsAny(text[k.start:k.end], "²³") {
				t.Fatalf("token at %d begins before %d", k.start, at)
			}
			at = k.end
			mark(k.start, k.end)
		}
		for _, c := range out.comments {
			mark(c.At.Start, c.At.End)
		}
		for _, d := range r.all {
			mark(d.Span.Start, d.Span.End)
		}
		for i, c := range text {
			if !seen[i] && strings.TrimSpace(string(c)) != "" && len(r.all) < maxGathered {
				t.Fatalf("%q at %d is in no token", c, i)
			}
		}
	})
}

// FuzzParse: no text ends in a crash; spans are right; statements hold every token
// but the braces; a bad statement has its diagnostic; diagnostics lie in the file.
func FuzzParse(f *testing.F) {
	seeds(f)
	known := map[diag.Code]bool{}
	for _, e := range diag.Codes() {
		known[e.Code] = true
	}
	f.Fuzz(func(t *testing.T, text string) {
		tree, ds := parse(text)
		checkSpans(t, tree)
		if len(ds) > maxDiagnostics+1 {
			t.Fatalf("%d diagnostics", len(ds))
		}
		for _, d := range ds {
			inFile(t, tree.Source, d)
			if !known[d.Code] {
				t.Fatalf("%s is in no table", d.Code)
			}
		}
		covered(t, tree)
		if bad := countBad(tree.Statements); bad > 0 && len(ds) == 0 {
			t.Fatalf("%d bad statements and no diagnostic", bad)
		}
		_ = Sexpr(tree)
		_ = wording(ds)
	})
}

func inFile(t *testing.T, f *source.File, d diag.Diagnostic) {
	t.Helper()
	whole := f.Span(0, len(f.Text))
	spans := []source.Span{d.Span}
	for _, n := range d.Notes {
		spans = append(spans, n.Span)
	}
	for _, x := range d.Fixes {
		spans = append(spans, x.Span)
	}
	for _, s := range spans {
		if !whole.Contains(s) || s.Start > s.End {
			t.Fatalf("%s: %d to %d of %d bytes", d.Code, s.Start, s.End, len(f.Text))
		}
	}
	if d.Text == "" || strings.HasSuffix(d.Text, ".") || !utf8.ValidString(d.Text) && utf8.Valid(f.Text) {
		t.Fatalf("%s: %q", d.Code, d.Text)
	}
}

// covered checks that every token but the braces lies in a statement.
func covered(t *testing.T, tree *File) {
	t.Helper()
	if len(tree.Statements) == 0 && tree.Comments == nil {
		return // not a text, or nothing in it
	}
	p := newParser(tree.Source)
	out := lex(p.reporter, p.start(), len(p.src))
	inside := make([]bool, len(tree.Source.Text)+1)
	var walk func(list []Statement)
	walk = func(list []Statement) {
		for _, s := range list {
			for i := s.Span().Start; i < s.Span().End; i++ {
				inside[i] = true
			}
			switch s := s.(type) {
			case *Sentence:
				walk(s.Block)
			case *Bad:
				walk(s.Block)
			}
		}
	}
	walk(tree.Statements)
	for _, k := range out.tokens {
		if k.kind != kindOpen && k.kind != kindClose && !inside[k.start] {
			t.Fatalf("%q at %d is in no statement", k.text, k.start)
		}
	}
}

func countBad(list []Statement) (n int) {
	for _, s := range list {
		switch s := s.(type) {
		case *Sentence:
			n += countBad(s.Block)
		case *Bad:
			n += 1 + countBad(s.Block)
		}
	}
	return n
}

// TestFixesMend applies the first fix of the examples of the codes: what is left
// has no fault.
func TestFixesMend(t *testing.T) {
	mended := 0
	for _, e := range diag.Examples(diag.StageSyntax) {
		_, ds := parse(e.Example)
		if len(ds) != 1 || len(ds[0].Fixes) == 0 {
			continue
		}
		fix := ds[0].Fixes[0]
		text := e.Example[:fix.Span.Start] + fix.Text + e.Example[fix.Span.End:]
		if _, left := parse(text); len(left) > 0 {
			t.Errorf("%s: %q is mended to %q:\n%s", e.Code, e.Example, text, wording(left))
		}
		mended++
	}
	if mended < 12 {
		t.Errorf("only %d codes have a fix", mended)
	}
}
