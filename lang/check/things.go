package check

import (
	"fmt"
	"slices"

	"epure/lang/catalogue"
	"epure/lang/diag"
	"epure/lang/quantity"
	"epure/lang/source"
	"epure/lang/spell"
	"epure/lang/syntax"
)

// thing checks the text and the clauses of a form against the catalogue.
func (c *checker) thing(s *Symbol) {
	s.Clauses, s.meant = map[string]*Bound{}, map[string]bool{}
	c.text(s)
	for _, cl := range s.thing().Clauses {
		c.clause(s, &cl)
	}
	c.present(s)
	if b := s.Clauses[s.Form.KindOf]; b != nil && len(b.Values) > 0 {
		s.Kind = c.model.kinds[b.Values[0]]
	}
}

// thing is the form behind a symbol as written.
func (s *Symbol) thing() *syntax.Thing { return s.sentence.Thing }

func (c *checker) text(s *Symbol) {
	switch {
	case s.Text == nil && s.Form.Text == catalogue.Must:
		c.blame(c.report("missing-text", after(s.FormSpan), "%s needs a text in quotes", a(s.Form.Word)).
			WithLabelledFix(after(s.FormSpan), ` "…"`, "write it after the word, as "+s.Form.Word+` "…"`))
	case s.Text != nil && s.Form.Text == catalogue.Never:
		c.blame(c.report("unexpected-text", s.Text.Span(), "%s takes no text", a(s.Form.Word)).
			Because("a remark can stand after #").WithFix(s.Text.Span(), ""))
	case s.Text != nil:
		c.expr(s.Text)
	}
}

// after is the empty place behind a span.
func after(s source.Span) source.Span { return source.Span{File: s.File, Start: s.End, End: s.End} }

func (c *checker) clause(s *Symbol, cl *syntax.Clause) {
	word := cl.Word.Text
	spec, ok := s.Form.ClauseNamed(word)
	if !ok {
		c.unknownClause(s, cl)
		return
	}
	b := s.Clauses[word]
	switch {
	case b == nil:
		b = &Bound{Clause: spec, Span: cl.Word.Span()}
		s.Clauses[word] = b
	case !spec.Repeat:
		c.blame(c.report("repeated-clause", cl.Word.Span(), "`%s` stands twice", word).WithNote(b.Span, "the first one is here"))
		return
	}
	for i, v := range cl.Values {
		if spec.Max > 0 && i == spec.Max {
			c.blame(c.report("too-many-values", v.Span(), "`%s` takes %s", word, atMost(spec.Max)))
			break
		}
		c.value(s, b, v)
	}
}

func atMost(n int) string {
	if n == 1 {
		return "one value"
	}
	return fmt.Sprintf("at most %d values", n)
}

// unknownClause reports a clause that the form does not have.
func (c *checker) unknownClause(s *Symbol, cl *syntax.Clause) {
	for _, v := range cl.Values {
		c.quietly(v)
	}
	var words []string
	for i := range s.Form.Clauses {
		words = append(words, s.Form.Clauses[i].Word)
	}
	d := c.report("unknown-clause", cl.Word.Span(), "%s has no clause %s", a(s.Form.Word), source.Quote(cl.Word.Text))
	if w, ok := spell.Nearest(cl.Word.Text, words); ok {
		d = d.WithFix(cl.Word.Span(), w)
		s.meant[w] = true
	} else {
		d = d.Because("its clauses are " + list(words, "and"))
	}
	c.blame(d)
}

// quietly looks at an expression whose clause is wrong, for the mistakes in itself;
// a bare name may have been meant as a word.
func (c *checker) quietly(e syntax.Expr) {
	if _, bare := e.(*syntax.Name); !bare {
		c.expr(e)
	}
}

// value binds one value of a clause: a word, or an expression of a kind that it takes.
func (c *checker) value(s *Symbol, b *Bound, e syntax.Expr) {
	spec := b.Clause
	if n, ok := e.(*syntax.Name); ok && len(spec.Words) > 0 {
		if slices.Contains(spec.Words, n.Text) {
			b.Words = append(b.Words, Word{n.Text, n.Span()})
			return
		}
		if len(spec.Takes) == 0 || c.lookup(n.Text) == nil {
			c.unknownWord(spec, n)
			return
		}
	}
	if len(spec.Takes) == 0 {
		c.blame(c.report("wrong-kind", e.Span(), "`%s` takes a word", spec.Word).Because("the words are " + list(spec.Words, "and")))
		return
	}
	k := c.expr(e)
	if !fits(k, spec.Takes) {
		c.wrongKind(spec, e, k)
		return
	}
	if spec.Measured && !isMember(e) {
		c.blame(c.report("not-a-measure", e.Span(), "`%s` takes a measure of a thing, as K.height", spec.Word).
			Because("a dimension shows what it measures, so it needs to know the thing"))
	}
	b.Values = append(b.Values, e)
}

// isMember tells whether an expression is a member of a thing, as K.height or S.focus(1).
func isMember(e syntax.Expr) bool {
	switch e := e.(type) {
	case *syntax.Member:
		return true
	case *syntax.Call:
		_, ok := e.X.(*syntax.Member)
		return ok
	case *syntax.Paren:
		return isMember(e.X)
	}
	return false
}

func (c *checker) unknownWord(spec *catalogue.Clause, n *syntax.Name) {
	d := c.report("unknown-word", n.Span(), "`%s` does not take %s", spec.Word, source.Quote(n.Text))
	if w, ok := spell.Nearest(n.Text, spec.Words); ok {
		d = d.WithFix(n.Span(), w)
	} else {
		d = d.Because("it takes " + names(spec.Takes, spec.Words))
	}
	c.blame(d)
}

func (c *checker) wrongKind(spec *catalogue.Clause, e syntax.Expr, k catalogue.Kind) {
	d := c.report("wrong-kind", e.Span(), "`%s` takes %s", spec.Word, names(spec.Takes, spec.Words)).
		Because(source.Quote(e.Span().Text()) + " is " + name(k))
	c.blame(c.unitHint(d, e, k, spec.Takes))
}

// unitHint adds the way out when a plain number stands for a length or an angle:
// the unit at a written number, the definition of a name.
func (c *checker) unitHint(d diag.Diagnostic, e syntax.Expr, k catalogue.Kind, takes []catalogue.Kind) diag.Diagnostic {
	units := missingUnits(takes)
	if k.Class != catalogue.Quantity || k.Of != quantity.Number || len(units) == 0 {
		return d
	}
	switch e := e.(type) {
	case *syntax.Quantity:
		for _, u := range units {
			d = d.WithLabelledFix(after(e.Span()), u, "write the unit, as "+e.Span().Text()+u)
		}
	case *syntax.Name:
		if s := c.model.refs[e]; s != nil && s.Expr != nil {
			d = d.WithNote(s.Expr.Span(), "it is defined here, without a unit")
		}
	}
	return d
}

// missingUnits are the units that a plain number may lack.
func missingUnits(takes []catalogue.Kind) []string {
	var units []string
	for _, k := range takes {
		switch k {
		case catalogue.KLength:
			units = append(units, " mm")
		case catalogue.KAngle:
			units = append(units, "°")
		}
	}
	return units
}

// present checks that what is needed is there and what excludes each other is not.
func (c *checker) present(s *Symbol) {
	for i := range s.Form.Clauses {
		if cl := &s.Form.Clauses[i]; cl.Needed && s.Clauses[cl.Word] == nil && !s.meant[cl.Word] {
			c.blame(c.report("missing-clause", after(s.FormSpan), "%s needs `%s`", a(s.Form.Word), cl.Word).Because(cl.Help))
		}
	}
	for _, ch := range s.Form.Choices {
		if !slices.ContainsFunc(ch.Ways, func(w []string) bool { return slices.ContainsFunc(w, func(x string) bool { return s.meant[x] }) }) {
			c.choice(s, ch)
		}
	}
}

// choice checks that exactly one way of a choice is there.
func (c *checker) choice(s *Symbol, ch catalogue.Choice) {
	var there []*Bound // in the order of the catalogue
	for i := range s.Form.Clauses {
		word := s.Form.Clauses[i].Word
		if b := s.Clauses[word]; b != nil && slices.ContainsFunc(ch.Ways, func(w []string) bool { return slices.Contains(w, word) }) {
			there = append(there, b)
		}
	}
	switch {
	case ch.Any && len(there) > 0, slices.ContainsFunc(ch.Ways, func(w []string) bool { return same(w, there) }):
		return
	case len(there) == 0:
		c.blame(c.report("missing-clause", after(s.FormSpan), "%s needs %s", a(s.Form.Word), ways(ch.Ways)))
		return
	}
	for _, w := range ch.Ways { // part of one way: the rest is missing
		if missing := lacks(w, there); missing != "" {
			c.blame(c.report("missing-clause", after(s.FormSpan), "`%s` needs `%s` beside it", there[0].Clause.Word, missing))
			return
		}
	}
	last := slices.MaxFunc(there, func(a, b *Bound) int { return a.Span.Start - b.Span.Start })
	other := there[0]
	if other == last {
		other = there[1]
	}
	c.blame(c.report("clause-conflict", last.Span, "`%s` and `%s` exclude each other", other.Clause.Word, last.Clause.Word).
		Because(a(s.Form.Word)+" takes "+ways(ch.Ways)).WithNote(other.Span, "the other one is here"))
}

func same(way []string, there []*Bound) bool {
	return len(way) == len(there) && lacks(way, there) == "" && !slices.ContainsFunc(there, func(b *Bound) bool { return !slices.Contains(way, b.Clause.Word) })
}

// lacks returns the first word of the way that is not there, when all that is there belongs to the way.
func lacks(way []string, there []*Bound) string {
	for _, b := range there {
		if !slices.Contains(way, b.Clause.Word) {
			return ""
		}
	}
	for _, w := range way {
		if !slices.ContainsFunc(there, func(b *Bound) bool { return b.Clause.Word == w }) {
			return w
		}
	}
	return ""
}

// ways lists the ways of a choice: `radius` or `diameter`.
func ways(ws [][]string) string {
	var out []string
	for _, w := range ws {
		if len(w) > 0 {
			out = append(out, ticked(w, "and"))
		}
	}
	return list(out, "or")
}
