package check

import (
	"fmt"

	"epure/lang/catalogue"
	"epure/lang/quantity"
	"epure/lang/source"
	"epure/lang/spell"
	"epure/lang/syntax"
)

var unknown = catalogue.Kind{}

// expr works out the kind of an expression and keeps it.
func (c *checker) expr(e syntax.Expr) catalogue.Kind {
	k := c.kindOf(e)
	c.model.kinds[e] = k
	return k
}

func (c *checker) kindOf(e syntax.Expr) catalogue.Kind {
	switch e := e.(type) {
	case *syntax.Quantity:
		return catalogue.Kind{Class: catalogue.Quantity, Of: e.Literal.Value.Kind()}
	case *syntax.TextLit:
		return c.textLit(e)
	case *syntax.Name:
		return c.name(e)
	case *syntax.Paren:
		return c.expr(e.X)
	case *syntax.Tuple:
		return c.tuple(e)
	case *syntax.Unary:
		return c.negated(e)
	case *syntax.Binary:
		return c.binary(e)
	case *syntax.Member:
		return c.member(e, nil, e.Span())
	case *syntax.Call:
		return c.call(e)
	}
	return unknown
}

// textLit checks the holes of a text.
func (c *checker) textLit(t *syntax.TextLit) catalogue.Kind {
	for _, p := range t.Parts {
		if p.Hole == nil {
			continue
		}
		k := c.expr(p.Hole.Expr)
		if p.Hole.Nearest == nil {
			if !fits(k, []catalogue.Kind{catalogue.KText, catalogue.KYesNo}) && k.Class != catalogue.Quantity {
				c.blame(c.report("wrong-kind", p.Hole.Expr.Span(), "a text can hold a quantity or a text").Because(source.Quote(p.Hole.Expr.Span().Text()) + " is " + name(k)))
			}
			continue
		}
		c.nearest(p.Hole, k)
	}
	return catalogue.KText
}

func (c *checker) nearest(h *syntax.Hole, k catalogue.Kind) {
	step := c.expr(h.Nearest)
	if k.Class == catalogue.Unknown || step.Class == catalogue.Unknown {
		return
	}
	if k.Class != catalogue.Quantity || step.Class != catalogue.Quantity {
		c.blame(c.report("wrong-kind", h.Nearest.Span(), "`nearest` rounds a quantity to a step of its own kind").Because(source.Quote(h.Expr.Span().Text()) + " is " + name(k)))
		return
	}
	if _, ok := quantity.Unify(k.Of, step.Of); !ok {
		c.blame(c.report("wrong-kind", h.Nearest.Span(), "the step must be %s", name(k)).Because("it is " + name(step)))
	}
}

// lookup finds a name from where the checker stands.
func (c *checker) lookup(text string) *Symbol {
	if c.within != nil && c.within.Parent != nil {
		if s := c.scope[c.within.Parent][text]; s != nil {
			return s
		}
	}
	return c.tops[text]
}

func (c *checker) name(n *syntax.Name) catalogue.Kind {
	if b, ok := catalogue.BuiltinNamed(n.Text); ok {
		return b.Kind
	}
	s := c.lookup(n.Text)
	if s == nil {
		c.unknownName(n)
		return unknown
	}
	span := n.Span()
	if len(c.path) > 0 {
		c.path[len(c.path)-1].span = span
	}
	c.resolve(s, &span)
	c.model.refs[n] = s
	if s.Bad {
		if c.within != nil {
			c.within.Bad = true
		}
		if s.Form == nil {
			return unknown
		}
	}
	return s.Kind
}

// mostGuesses is how many unknown names of a file get a suggestion: each is compared with every
// name of the file, which would take long in a file that is nothing but mistakes.
const mostGuesses = 200

// namesHere are the names that could have been meant where the checker stands: those of
// the block first.
func (c *checker) namesHere() []string {
	if c.guesses++; c.guesses > mostGuesses {
		return nil
	}
	if c.topNames == nil {
		for _, s := range c.model.Symbols {
			if s.Parent == nil {
				c.topNames = append(c.topNames, s.Name)
			}
		}
		for _, b := range catalogue.Builtins {
			c.topNames = append(c.topNames, b.Name)
		}
	}
	if c.within == nil || c.within.Parent == nil {
		return c.topNames
	}
	var words []string
	for _, m := range c.within.Parent.Members {
		words = append(words, m.Name)
	}
	return append(words, c.topNames...)
}

func (c *checker) unknownName(n *syntax.Name) {
	words := c.namesHere()
	d := c.report("unknown-name", n.Span(), "nothing is called %s here", source.Quote(n.Text))
	switch w, ok := spell.Nearest(n.Text, words); {
	case ok:
		d = d.WithFix(n.Span(), w)
	case isFunction(n.Text):
		d = d.Because(source.Quote(n.Text) + " is a function and needs its arguments in brackets")
	case isForm(n.Text):
		d = d.Because(source.Quote(n.Text) + " is a form and stands after `=` with its clauses; give the thing a name on a line of its own")
	}
	c.blame(d)
}

func isFunction(word string) bool { _, ok := catalogue.FunctionNamed(word); return ok }
func isForm(word string) bool     { _, ok := catalogue.FormNamed(word); return ok }

func (c *checker) tuple(t *syntax.Tuple) catalogue.Kind {
	class := catalogue.Triple
	if len(t.Items) == 2 {
		class = catalogue.Pair
	}
	if len(t.Items) > 3 {
		c.blame(c.report("wrong-count", t.Span(), "a point or direction has two or three coordinates, and here are %d", len(t.Items)))
	}
	of, bad := quantity.Zero, false
	for i, item := range t.Items {
		k := c.expr(item)
		if k.Class == catalogue.Unknown {
			bad = true
			continue
		}
		both, ok := quantity.Unify(of, k.Of)
		if k.Class != catalogue.Quantity || !ok {
			d := c.report("wrong-kind", item.Span(), "the coordinates of a point are lengths, those of a direction plain numbers").
				Because(source.Quote(item.Span().Text()) + " is " + name(k))
			if i > 0 && ok == false && k.Class == catalogue.Quantity {
				d = d.Because(fmt.Sprintf("%s is %s, and those before it are not", source.Quote(item.Span().Text()), name(k)))
			}
			c.blame(d)
			bad = true
			continue
		}
		of = both
	}
	if bad || len(t.Items) > 3 {
		return unknown
	}
	if of != quantity.Zero && of != quantity.Length && of != quantity.Number {
		c.blame(c.report("wrong-kind", t.Span(), "the coordinates of a point are lengths, those of a direction plain numbers").Because("they are of the kind: " + of.String()))
		return unknown
	}
	return catalogue.Kind{Class: class, Of: of}
}

func (c *checker) negated(u *syntax.Unary) catalogue.Kind {
	k := c.expr(u.X)
	switch k.Class {
	case catalogue.Unknown, catalogue.Quantity, catalogue.Triple, catalogue.Pair:
		return k
	}
	c.blame(c.report("wrong-kind", u.Span(), "%s cannot be negated", name(k)))
	return unknown
}

func (c *checker) binary(b *syntax.Binary) catalogue.Kind {
	x, y := c.expr(b.Left), c.expr(b.Right)
	if x.Class == catalogue.Unknown || y.Class == catalogue.Unknown {
		return unknown
	}
	if k, ok := c.combined(b, x, y); ok {
		return k
	}
	d := c.report("wrong-kind", b.OpAt, "%s and %s cannot be %s", name(x), name(y), verbs[b.Op]).
		Because(source.Quote(b.Left.Span().Text()) + " is " + name(x) + ", " + source.Quote(b.Right.Span().Text()) + " is " + name(y))
	c.blame(d)
	return unknown
}

var verbs = map[string]string{"+": "added", "-": "subtracted", "*": "multiplied", "/": "divided", "^": "raised to a power"}

// combined is the kind of an operation, if there is one.
func (c *checker) combined(b *syntax.Binary, x, y catalogue.Kind) (catalogue.Kind, bool) {
	vector := func(k catalogue.Kind) bool { return k.Class == catalogue.Triple || k.Class == catalogue.Pair }
	switch {
	case x.Class == catalogue.Quantity && y.Class == catalogue.Quantity:
		of, ok := c.ofQuantities(b, x.Of, y.Of)
		return catalogue.Kind{Class: catalogue.Quantity, Of: of}, ok
	case vector(x) && x.Class == y.Class && (b.Op == "+" || b.Op == "-"):
		of, ok := quantity.Unify(x.Of, y.Of)
		return catalogue.Kind{Class: x.Class, Of: of}, ok
	case vector(x) && y.Class == catalogue.Quantity && (b.Op == "*" || b.Op == "/"):
		return scaled(x, y, b.Op)
	case x.Class == catalogue.Quantity && vector(y) && b.Op == "*":
		return scaled(y, x, b.Op)
	}
	return unknown, false
}

// scaled is the kind of a triple or pair times or over a quantity.
func scaled(v, q catalogue.Kind, op string) (catalogue.Kind, bool) {
	of, ok := quantity.Times(v.Of, q.Of)
	if op == "/" {
		of, ok = quantity.Over(v.Of, q.Of)
	}
	if of == quantity.Ratio {
		of = quantity.Number
	}
	return catalogue.Kind{Class: v.Class, Of: of}, ok && (of == quantity.Number || of == quantity.Length)
}

func (c *checker) ofQuantities(b *syntax.Binary, x, y quantity.Kind) (quantity.Kind, bool) {
	switch b.Op {
	case "+", "-":
		return quantity.Unify(x, y)
	case "*":
		return quantity.Times(x, y)
	case "/":
		return quantity.Over(x, y)
	}
	if y != quantity.Number && y != quantity.Zero {
		return quantity.Number, false
	}
	if l, a := x.Powers(); l == 0 && a == 0 {
		return quantity.Number, true
	}
	num, den, ok := constant(b.Right)
	if !ok {
		c.blame(c.report("not-constant", b.Right.Span(), "the power of %s must be written as a number", x).Because("the kind of the result depends on it"))
		return quantity.Number, true
	}
	return quantity.Power(x, num, den)
}

// constant reads a written power: a whole number or a fraction of whole numbers, with a sign.
func constant(e syntax.Expr) (num, den int, ok bool) {
	switch e := e.(type) {
	case *syntax.Paren:
		return constant(e.X)
	case *syntax.Quantity:
		r := e.Literal.Value.Rat()
		if r == nil || !r.Num().IsInt64() || !r.Denom().IsInt64() || r.Num().BitLen() > 8 || r.Denom().BitLen() > 8 {
			return 0, 1, false
		}
		return int(r.Num().Int64()), int(r.Denom().Int64()), true
	case *syntax.Unary:
		num, den, ok = constant(e.X)
		return -num, den, ok
	case *syntax.Binary:
		n, d, ok1 := constant(e.Left)
		n2, d2, ok2 := constant(e.Right)
		return n * d2, d * n2, ok1 && ok2 && e.Op == "/" && n2 > 0
	}
	return 0, 1, false
}
