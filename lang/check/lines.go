package check

import (
	"epure/lang/catalogue"
	"epure/lang/quantity"
	"epure/lang/source"
	"epure/lang/syntax"
)

// given checks the value of a given and its range and tolerance.
func (c *checker) given(s *Symbol) {
	s.Kind = c.expr(s.Expr)
	switch s.Kind.Class {
	case catalogue.Unknown, catalogue.Quantity, catalogue.Text, catalogue.YesNo, catalogue.Triple:
	default:
		c.blame(c.report("wrong-kind", s.Expr.Span(), "a given is a quantity, a text, yes or no, a point or a direction").
			Because(source.Quote(s.Expr.Span().Text()) + " is " + name(s.Kind)))
	}
	if s.Given.Text != nil {
		c.expr(s.Given.Text)
	}
	s.Clauses = map[string]*Bound{}
	for i := range s.Given.Clauses {
		c.givenClause(s, &s.Given.Clauses[i])
	}
	from, to := s.Clauses["from"] != nil, s.Clauses["to"] != nil
	if from != to {
		b, missing := s.Clauses["from"], "to"
		if to {
			b, missing = s.Clauses["to"], "from"
		}
		c.blame(c.report("missing-clause", b.Span, "`%s` needs `%s` beside it", b.Clause.Word, missing).Because("a range has two ends"))
	}
}

// givenClauses are the clauses of a given.
var givenClauses = []string{"from", "to", "tolerance"}

func (c *checker) givenClause(s *Symbol, cl *syntax.Clause) {
	word := cl.Word.Text
	spec := &catalogue.Clause{Word: word, Takes: []catalogue.Kind{s.Kind}, Max: 1}
	known := false
	for _, w := range givenClauses {
		known = known || w == word
	}
	switch {
	case !known:
		c.blame(c.report("unknown-clause", cl.Word.Span(), "a given has no clause %s", source.Quote(word)).Because("its clauses are from, to and tolerance"))
	case s.Clauses[word] != nil:
		c.blame(c.report("repeated-clause", cl.Word.Span(), "`%s` stands twice", word).WithNote(s.Clauses[word].Span, "the first one is here"))
	case s.Kind.Class == catalogue.Unknown:
		for _, v := range cl.Values {
			c.expr(v)
		}
	case s.Kind.Class != catalogue.Quantity:
		c.blame(c.report("wrong-kind", cl.Word.Span(), "only a quantity has a range or a tolerance").Because(source.Quote(s.Name) + " is " + name(s.Kind)))
	default:
		b := &Bound{Clause: spec, Span: cl.Word.Span()}
		s.Clauses[word] = b
		for i, v := range cl.Values {
			if i == 1 {
				c.blame(c.report("too-many-values", v.Span(), "`%s` takes one value", word))
				break
			}
			c.value(s, b, v)
		}
	}
}

// verify checks that both sides can be compared.
func (c *checker) verify(v *Verify) {
	holder := &Symbol{Name: "verify"}
	c.within = holder
	defer func() { c.within = nil; v.Bad = holder.Bad }()
	x, y := c.expr(v.Left), c.expr(v.Right)
	if v.Text != nil {
		c.expr(v.Text)
	}
	within := catalogue.Kind{Class: catalogue.Unknown}
	if v.Within != nil {
		within = c.expr(v.Within)
	}
	if x.Class == catalogue.Unknown || y.Class == catalogue.Unknown {
		return
	}
	d := c.report("wrong-kind", v.OpAt, "%s and %s cannot be compared", name(x), name(y)).
		Because(source.Quote(v.Left.Span().Text()) + " is " + name(x) + ", " + source.Quote(v.Right.Span().Text()) + " is " + name(y))
	switch {
	case x.Class != y.Class:
		c.blame(d)
	case x.Class == catalogue.Quantity:
		if !quantity.Comparable(x.Of, y.Of) {
			c.blame(d)
		} else {
			c.allowance(v, x, y, within)
		}
	case x.Class == catalogue.Text, x.Class == catalogue.YesNo, x.Class == catalogue.Triple:
		if v.Op != "=" {
			c.blame(c.report("wrong-kind", v.OpAt, "%s can only be compared with `=`", name(x)))
		}
		if x.Class == catalogue.Triple {
			c.allowance(v, catalogue.Kind{Class: catalogue.Quantity, Of: x.Of}, catalogue.Kind{Class: catalogue.Quantity, Of: y.Of}, within)
		}
	default:
		c.blame(d)
	}
}

// allowance checks the kind behind `within`.
func (c *checker) allowance(v *Verify, x, y, within catalogue.Kind) {
	if v.Within == nil || within.Class == catalogue.Unknown {
		return
	}
	if v.Op != "=" {
		c.blame(c.report("clause-conflict", v.Within.Span(), "`within` goes with `=`").Because("a limit has no allowance; write the limit that is meant"))
		return
	}
	if !fits(within, []catalogue.Kind{x, y}) {
		c.blame(c.report("wrong-kind", v.Within.Span(), "the allowance must be %s", name(x)).Because("it is " + name(within)))
	}
}
