package syntax

import (
	"testing"

	"epure/lang/diag"
	"epure/lang/quantity"
	"epure/lang/source"
)

// TestNamesAreComposed: a name typed with a combining accent is the same name.
func TestNamesAreComposed(t *testing.T) {
	tree, ds := parse("coupé = 3 mm\na = coupe\u0301 + 1 mm")
	if len(ds) > 0 {
		t.Fatal(wording(ds))
	}
	defined := tree.Statements[0].(*Sentence).Name
	used := tree.Statements[1].(*Sentence).Expr.(*Binary).Left.(*Name)
	if defined.Text != used.Text {
		t.Errorf("%q and %q", defined.Text, used.Text)
	}
	if used.Span().Text() != "coupe\u0301" {
		t.Errorf("the span is %q", used.Span().Text())
	}
}

func TestSpans(t *testing.T) {
	tree, ds := parse("K = cone diameter 2*foot height -rise # right\nn = note \"a {K.slant nearest 0.1 mm} b\"")
	if len(ds) > 0 {
		t.Fatal(wording(ds))
	}
	thing := tree.Statements[0].(*Sentence).Thing
	text := tree.Statements[1].(*Sentence).Thing.Text
	product, minus := thing.Clauses[0].Values[0].(*Binary), thing.Clauses[1].Values[0].(*Unary)
	hole := text.Parts[1].Hole
	for _, tt := range []struct{ got, want string }{
		{tree.Statements[0].Span().Text(), "K = cone diameter 2*foot height -rise"},
		{thing.Span().Text(), "cone diameter 2*foot height -rise"},
		{thing.Form.Span().Text(), "cone"},
		{thing.Clauses[0].Span().Text(), "diameter 2*foot"},
		{product.Span().Text(), "2*foot"}, {product.OpAt.Text(), "*"},
		{minus.Span().Text(), "-rise"}, {minus.OpAt.Text(), "-"},
		{tree.Comments[0].At.Text(), "# right"},
		{text.Span().Text(), "\"a {K.slant nearest 0.1 mm} b\""},
		{text.Parts[0].At.Text(), "a "}, {text.Parts[1].At.Text(), "{K.slant nearest 0.1 mm}"}, {text.Parts[2].At.Text(), " b"},
		{hole.At.Text(), "{K.slant nearest 0.1 mm}"}, {hole.Expr.Span().Text(), "K.slant"}, {hole.Nearest.Span().Text(), "0.1 mm"},
		{hole.Expr.(*Member).Name.Span().Text(), "slant"},
	} {
		if tt.got != tt.want {
			t.Errorf("got %q, want %q", tt.got, tt.want)
		}
	}
	if tree.Comments[0].OwnLine {
		t.Error("the comment stands behind a statement")
	}
}

func TestPlain(t *testing.T) {
	tree, _ := parse("take a from \"x\\\\y.epure\"\nn = note \"{a}\"")
	if path, ok := tree.Statements[0].(*Take).Path.Plain(); path != "x\\y.epure" || !ok {
		t.Errorf("%q, %v", path, ok)
	}
	if _, ok := tree.Statements[1].(*Sentence).Thing.Text.Plain(); ok {
		t.Error("a text with a hole is plain")
	}
	if text, ok := (*TextLit)(nil).Plain(); text != "" || !ok {
		t.Error("no text is not plain")
	}
}

func TestParseExpr(t *testing.T) {
	tests := []struct {
		text, want string
		code       diag.Code
	}{
		{"250 mm", "250 mm", ""}, {" -3 mm/2 ", "(/ (- 3 mm) 2)", ""}, {"\"DN 50\"", "\"DN 50\"", ""},
		{"", "", "missing-value"}, {"3 mm 4", "", "bad-statement"}, {"3 mm +", "", "missing-value"}, {"12 MM", "12 MM", "unknown-unit"},
		{"a = 3", "", "misplaced-equals"}, {"(3", "", "bracket-not-closed"}, {"\x00", "", "not-text"}, {"cone radius 3", "", "bad-statement"},
	}
	for _, tt := range tests {
		var bag diag.Bag
		e := ParseExpr(source.New("--given a", []byte(tt.text)), &bag)
		got := ""
		if e != nil {
			got = Sexpr(e)
		}
		code := diag.Code("")
		if ds := bag.Sorted(); len(ds) == 1 {
			code = ds[0].Code
		} else if len(ds) > 1 {
			t.Errorf("%q:\n%s", tt.text, wording(ds))
		}
		if got != tt.want || code != tt.code {
			t.Errorf("%q: %s, %q; want %s, %q", tt.text, got, code, tt.want, tt.code)
		}
	}
}

// TestLiteralsKeepTheirSpelling: the style of a step comes from how it is spelt.
func TestLiteralsKeepTheirSpelling(t *testing.T) {
	tree, _ := parse("a = 1/16 in")
	lit := tree.Statements[0].(*Sentence).Expr.(*Quantity).Literal
	if lit.Denominator != 16 || lit.Unit != quantity.Inch || !lit.Value.Exact() {
		t.Errorf("%+v", lit)
	}
}
