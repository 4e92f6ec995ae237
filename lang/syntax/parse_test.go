package syntax

import (
	"bytes"
	"testing"

	"epure/lang/diag"
	"epure/lang/source"
)

// parse reads a text and returns the tree in one line and the diagnostics.
func parse(text string) (tree *File, ds []diag.Diagnostic) {
	var bag diag.Bag
	tree = Parse(source.New("test.epure", []byte(text)), &bag)
	return tree, bag.Sorted()
}

// wording prints diagnostics as a person sees them.
func wording(ds []diag.Diagnostic) string {
	var b bytes.Buffer
	if err := diag.WriteText(&b, ds, diag.Style{}); err != nil {
		return err.Error()
	}
	return b.String()
}

func TestTrees(t *testing.T) {
	tests := []struct{ text, want string }{
		{"a = 1 + 2*3", "(= a (+ 1 (* 2 3)))"},
		{"a = 1 - 2 - 3", "(= a (- (- 1 2) 3))"},
		{"a = 2^3^4", "(= a (^ 2 (^ 3 4)))"},
		{"a = -2^2", "(= a (- (^ 2 2)))"},
		{"a = 2^-3*4", "(= a (* (^ 2 (- 3)) 4))"},
		{"a = 2^-3^-2", "(= a (^ 2 (- (^ 3 (- 2)))))"},
		{"a = -b*c", "(= a (* (- b) c))"},
		{"a = b*-c", "(= a (* b (- c)))"},
		{"a = b/c*d", "(= a (* (/ b c) d))"},
		{"a = (b + c)*d", "(= a (* (paren (+ b c)) d))"},
		{"a = K.generator(180°).length", "(= a (. (call (. K generator) 180°) length))"},
		{"a = round(x, 1/16 in)", "(= a (call round x 1/16 in))"},
		{"a = (1 mm, 2 mm, -3 mm)", "(= a (tuple 1 mm 2 mm (- 3 mm)))"},
		{"K = cone diameter foot height rise", "(= K (thing cone (diameter foot) (height rise)))"},
		{"P = plane through (foot/2 - inset, 0, 0) along K.generator(180°), rearward",
			"(= P (thing plane (through (tuple (- (/ foot 2) inset) 0 0)) (along (call (. K generator) 180°) rearward)))"},
		{"B = part of K above P", "(= B (thing part (of K) (above P)))"},
		{"r = cone radius r -3 mm height 5 mm", "(= r (thing cone (radius (- r 3 mm)) (height 5 mm)))"},
		{"c = point (1, 2)", "(= c (call point 1 2))"},
		{"c = cone at (1, 2, 3) radius 4", "(= c (thing cone (at (tuple 1 2 3)) (radius 4)))"},
		{"given inset = 85 mm \"where\" from 10 mm to 200 mm", "(given inset 85 mm \"where\" (from 10 mm) (to 200 mm))"},
		{"given rise = 260 mm tolerance 2 mm", "(given rise 260 mm (tolerance 2 mm))"},
		{"given title = \"Hood\" \"of the sheet\"", "(given title \"Hood\" \"of the sheet\")"},
		{"verify S.eccentricity = 1", "(verify = (. S eccentricity) 1)"},
		{"verify a/b <= 2 within 0.1 \"why\"", "(verify <= (/ a b) 2 (within 0.1) \"why\")"},
		{"verify S.kind = \"parabola\"", "(verify = (. S kind) \"parabola\")"},
		{"take hood from \"hood.epure\"", "(take hood \"hood.epure\")"},
		{"case \"DN 50\" foot 50 mm rise 60 mm", "(case \"DN 50\" (foot 50 mm) (rise 60 mm))"},
		{"case small foot 50 mm", "(case \"small\" (foot 50 mm))"},
		{"case from \"sizes.csv\"", "(case (from \"sizes.csv\"))"},
		{"table of D", "(= (thing table (of D)))"},
		{"dimension of K.base.diameter on top", "(= (thing dimension (of (. (. K base) diameter)) (on top)))"},
		{"note \"Slant {K.slant nearest 0.1 mm}\\n\\{ok}\"", "(= (thing note \"Slant (hole (. K slant) 0.1 mm)\\n{ok}\"))"},
		{"s = sheet \"Rain hood\" size A3 scale auto projection first {\n    front = elevation of B faint K\n    table of D\n}",
			"(= s (thing sheet \"Rain hood\" (size A3) (scale auto) (projection first)) (block (= front (thing elevation (of B) (faint K))) (= (thing table (of D)))))"},
		{"pattern of D show generators, numbers", "(= (thing pattern (of D) (show generators numbers)))"},
		{"a = b\n  + c\nd = e", "(= a (+ b c)) (= d e)"},
		{"a = (b\n+ c\n)\nd = e", "(= a (paren (+ b c))) (= d e)"},
		{"K = cone diameter 3 mm # dia\n\n# between\n    height 4 mm", "(= K (thing cone (diameter 3 mm) (height 4 mm)))"},
		{"verify\n    a = b", "(verify = a b)"},
		{"\ufeffa = 1\r\nb = 2\rc = 3", "(= a 1) (= b 2) (= c 3)"},
		{"straße = 60\u00a0mm", "(= straße 60\u00a0mm)"},
		{"m = 3 m", "(= m 3 m)"},
		{"a = m", "(= a m)"},
		{"a = 5 ft 3 1/2 in - 1 ft", "(= a (- 5 ft 3 1/2 in 1 ft))"},
		{"o = outline through (0,0), arc((1,1), (2,0)), (5,5)", "(= o (thing outline (through (tuple 0 0) (call arc (tuple 1 1) (tuple 2 0)) (tuple 5 5))))"},
		{"", ""},
		{"# nothing\n", ""},
		{"   a = 1\n   b = 2", "(= a 1) (= b 2)"},
		{"a = 12 first", "(bad a)"},
	}
	for _, tt := range tests {
		tree, ds := parse(tt.text)
		got := Sexpr(tree)[len("(file"):]
		got = got[:len(got)-1]
		want := tt.want
		if want != "" {
			want = " " + want
		}
		if tt.text == "a = 12 first" {
			if len(ds) != 1 {
				t.Errorf("%q: %d diagnostics", tt.text, len(ds))
			}
		} else if len(ds) > 0 {
			t.Errorf("%q:\n%s", tt.text, wording(ds))
		}
		if got != want {
			t.Errorf("%q:\n got %s\nwant %s", tt.text, got, want)
		}
	}
}

func TestExamplesOfCodes(t *testing.T) {
	for _, e := range diag.Examples(diag.StageSyntax) {
		_, ds := parse(e.Example)
		found := false
		for _, d := range ds {
			found = found || d.Code == e.Code
		}
		if !found {
			t.Errorf("%s: its example gives\n%s", e.Code, wording(ds))
		}
		if e.Code != "too-many" && len(ds) != 1 {
			t.Errorf("%s: its example gives %d diagnostics:\n%s", e.Code, len(ds), wording(ds))
		}
	}
}
