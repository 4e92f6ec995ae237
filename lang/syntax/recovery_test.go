package syntax

import "testing"

// TestRecovery looks at what is left of a file with a fault: the statements round
// it, each in the block where it belongs, and nothing said twice.
func TestRecovery(t *testing.T) {
	tests := []struct{ name, text, want string }{
		{"a bracket left open", "a = (1 +\nb = 2", "(bad a) (= b 2)"},
		{"a bracket left open before a form", "a = f(1,\ntable of D\nb = 2", "(bad a) (= (thing table (of D))) (= b 2)"},
		{"a bracket left open in a block", "s = sheet \"x\" {\n  a = f(1\n  b = plan of K\n}\nc = 3",
			"(= s (thing sheet \"x\") (block (bad a) (= b (thing plan (of K))))) (= c 3)"},
		{"a bracket left open before a brace", "s = sheet \"x\" at (1, 2 {\n  b = plan of K\n}\nc = 3",
			"(bad s (block (= b (thing plan (of K))))) (= c 3)"},
		{"a brace left out", "s = sheet \"x\"\n  a = plan of K\n  table of D\n}\nb = 2",
			"(= s (thing sheet \"x\") (block (= a (thing plan (of K))) (= (thing table (of D))))) (= b 2)"},
		{"a brace on its own line", "s = sheet \"x\"\n{\n  a = plan of K\n}\nb = 2",
			"(= s (thing sheet \"x\") (block (= a (thing plan (of K))))) (= b 2)"},
		{"a block in a line", "s = sheet \"x\" { a = plan of K }\nb = 2",
			"(= s (thing sheet \"x\") (block (= a (thing plan (of K))))) (= b 2)"},
		{"a block left open", "s = sheet \"x\" {\n  a = plan of K\nb = 2\nc = 3",
			"(= s (thing sheet \"x\") (block (= a (thing plan (of K))))) (= b 2) (= c 3)"},
		{"a block left open at the end", "s = sheet \"x\" {\n  a = plan of K\n",
			"(= s (thing sheet \"x\") (block (= a (thing plan (of K)))))"},
		{"a brace too many", "}\na = 1", "(= a 1)"},
		{"a wrong indentation", "a = 1\n  b = 2\n  c = 3\nd = 4", "(= a 1) (= b 2) (= c 3) (= d 4)"},
		{"a block of a given", "given a = 1 {\n  b = 2\n}\nc = 3", "(given a 1) (= b 2) (= c 3)"},
		{"a text left open", "a = note \"x\nb = 2", "(bad a) (= b 2)"},
		{"a bad line in a block", "s = sheet \"x\" {\n  a = plan of\n  b = plan of K\n}",
			"(= s (thing sheet \"x\") (block (bad a) (= b (thing plan (of K)))))"},
		{"a bad line with a block", "s = sheet \"x\" size {\n  b = plan of K\n}", "(bad s (block (= b (thing plan (of K)))))"},
		{"a decimal comma", "a = 12,5 mm + b", "(= a (+ 12,5 mm b))"},
		{"look-alikes", "a = 3 − 2\nb = “x”", "(= a (- 3 2)) (= b \"x\")"},
		{"a bad hole", "a = note \"x {} y {b}\"", "(= a (thing note \"x  y (hole b)\"))"},
		{"a bad given", "given a 3\nb = 2", "(bad a) (= b 2)"},
		{"a bad take", "take hood \"hood.epure\"", "(bad hood)"},
	}
	for _, tt := range tests {
		tree, ds := parse(tt.text)
		if got, want := Sexpr(tree), "(file "+tt.want+")"; got != want {
			t.Errorf("%s:\n got %s\nwant %s", tt.name, got, want)
		}
		if len(ds) != 1 && tt.name != "look-alikes" && tt.name != "a block in a line" {
			t.Errorf("%s: %d diagnostics:\n%s", tt.name, len(ds), wording(ds))
		}
		checkSpans(t, tree)
	}
}
