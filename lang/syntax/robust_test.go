package syntax

import (
	"math/rand/v2"
	"strings"
	"testing"
	"time"
)

// big is the size of a line that no person wrote.
const big = 5 << 20

// TestJunk feeds what is no drawing. Each must end with few diagnostics and in a
// time that grows with the length: the limit is thirty times what the slowest
// takes on a slow machine, and a hundredth of what anything quadratic takes.
func TestJunk(t *testing.T) {
	if testing.Short() {
		t.Skip("long lines")
	}
	noise := make([]byte, 1<<18)
	r := rand.New(rand.NewPCG(1, 2))
	for i := range noise {
		noise[i] = byte(1 + r.IntN(255))
	}
	tests := []struct {
		name, text string
		most       int // diagnostics
	}{
		{"brackets", "a = " + strings.Repeat("(", 30000), 1},
		{"closed brackets", "a = " + strings.Repeat("(", 15000) + "1" + strings.Repeat(")", 15000), 1},
		{"closing brackets", "a = " + strings.Repeat(")", 30000), 1},
		{"braces", strings.Repeat("a = b c {\n", 5000), maxDiagnostics + 1},
		{"closing braces", strings.Repeat("}\n", 20000), maxDiagnostics + 1},
		{"braces in a line", strings.Repeat("{", 20000), maxDiagnostics + 1},
		{"minus signs", "a = " + strings.Repeat("-", 30000) + "1", 1},
		{"powers", "a = 2" + strings.Repeat("^2", 15000), 1},
		{"powers of brackets", "a = 2" + strings.Repeat("^(1)", 5000), 1},
		{"sum", "a = 1" + strings.Repeat("+1", 15000), 0},
		{"members", "a = b" + strings.Repeat(".c", 15000), 0},
		{"calls", "a = b" + strings.Repeat(".c(1)", 5000), 0},
		{"list", "a = b c 1" + strings.Repeat(",1", 15000), 0},
		{"names", "a = b" + strings.Repeat(" c", 20000), 0},
		{"one name", strings.Repeat("x", big/4), 1},
		{"one number", "a = " + strings.Repeat("9", big), 1},
		{"one text", "a = \"" + strings.Repeat("x", big), 1},
		{"one comment", "#" + strings.Repeat("x", big), 0},
		{"long line", "a = 1" + strings.Repeat(" + 1", big/4), 1},
		{"long list", "a = (1" + strings.Repeat(",5", 10000), 1},
		{"decimal commas", "a = 1" + strings.Repeat("+1,5", 20000), 1000},
		{"quotes", "a = " + strings.Repeat("“", 20000), 1000},
		{"single quotes", "a = " + strings.Repeat("'", 20000) + "x", 1000},
		{"semicolons", "a = 1" + strings.Repeat(";", 20000) + strings.Repeat(" ", 20000), 1000},
		{"fractions", "a = 1" + strings.Repeat(" 1/2", 20000), 1000},
		{"holes", "a = b \"" + strings.Repeat("{a}", 10000) + "\"", 0},
		{"open holes", "a = b \"" + strings.Repeat("{", 100000) + "\"", 1},
		{"feet", "a = 1" + strings.Repeat(" ft 1", 10000), 1},
		{"indents", indents(1000), maxDiagnostics + 1},
		{"noise", string(noise), 1},
		{"bytes that are no UTF-8", strings.Repeat("\xff", big), 1},
		{"a byte 0", "a = 1\n" + string(make([]byte, big)), 1},
		{"Latin-1", strings.Repeat("# \xe4\xf6\xfc\xdf\n", 1000), 1},
		{"UTF-16", "\xff\xfea\x00=\x001\x00", 1},
		{"blanks", strings.Repeat(" ", big), 0},
		{"line ends", strings.Repeat("\n", big/4), 0},
	}
	for _, tt := range tests {
		start := time.Now()
		tree, ds := parse(tt.text)
		took := time.Since(start)
		if len(ds) > tt.most || tt.most == 1 && len(ds) != 1 {
			t.Errorf("%s: %d diagnostics, first:\n%.500s", tt.name, len(ds), wording(ds))
		}
		if took > 5*time.Second {
			t.Errorf("%s: took %v", tt.name, took)
		}
		checkSpans(t, tree)
	}
}

// indents returns lines that each begin a statement one blank further right.
func indents(n int) string {
	var b strings.Builder
	for i := range n {
		b.WriteString(strings.Repeat(" ", i) + "a = 1\n")
	}
	return b.String()
}
