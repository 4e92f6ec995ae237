package check

import (
	"fmt"

	"epure/lang/catalogue"
	"epure/lang/diag"
	"epure/lang/source"
	"epure/lang/spell"
	"epure/lang/syntax"
)

// Check checks a file. Diagnostics go into the bag; the model is complete when
// there are none.
func Check(tree *syntax.File, bag *diag.Bag) *Model {
	c := &checker{
		bag:   bag,
		tops:  map[string]*Symbol{},
		scope: map[*Symbol]map[string]*Symbol{},
		model: &Model{File: tree.Source, refs: map[*syntax.Name]*Symbol{}, kinds: map[syntax.Expr]catalogue.Kind{}},
	}
	c.declare(tree.Statements, nil)
	for _, s := range c.model.Symbols {
		c.resolve(s, nil)
	}
	for _, v := range c.model.Verifies {
		c.verify(v)
	}
	return c.model
}

type checker struct {
	bag      *diag.Bag
	model    *Model
	tops     map[string]*Symbol
	scope    map[*Symbol]map[string]*Symbol // the names inside each block
	within   *Symbol                        // whose expressions are being looked at
	topNames []string                       // the names outside of blocks, made when the first is not found
	guesses  int
	path     []link // the symbols being resolved, for cycles
}

type link struct {
	symbol *Symbol
	span   source.Span // where the next one is used
}

func (c *checker) report(code diag.Code, span source.Span, format string, args ...any) diag.Diagnostic {
	return diag.New(code, span, fmt.Sprintf(format, args...))
}

// blame adds a diagnostic and marks the symbol that is being checked.
func (c *checker) blame(d diag.Diagnostic) {
	if c.within != nil {
		c.within.Bad = true
	}
	c.bag.Add(d)
}

// declare makes the symbols of the statements, so that names may be used above
// the line that defines them.
func (c *checker) declare(statements []syntax.Statement, block *Symbol) {
	for _, st := range statements {
		switch st := st.(type) {
		case *syntax.Given:
			c.outside(block, st.Span(), "given")
			c.add(&Symbol{Name: st.Name.Text, NameSpan: st.Name.At, Span: st.Span(), Given: st, Expr: st.Expr}, block)
		case *syntax.Verify:
			c.outside(block, st.Span(), "verify")
			c.model.Verifies = append(c.model.Verifies, &Verify{Verify: st})
		case *syntax.Sentence:
			c.sentence(st, block)
		case *syntax.Bad:
			c.broken(st, block)
		case *syntax.Take:
			c.blame(c.report("not-yet", st.Span(), "`take` is not part of this version"))
		case *syntax.Case:
			c.blame(c.report("not-yet", st.Span(), "`case` is not part of this version"))
		}
	}
}

// broken makes unknown symbols of the names that an unreadable line would have
// defined, so that their uses are not reported again.
func (c *checker) broken(st *syntax.Bad, block *Symbol) {
	var first *Symbol
	for _, n := range st.Names {
		s := &Symbol{Name: n.Text, NameSpan: n.At, Span: st.At, Bad: true, state: done}
		c.add(s, block)
		if first == nil {
			first = s
		}
	}
	if !st.HasBlock {
		return
	}
	if first == nil {
		first = &Symbol{Span: st.At, NameSpan: st.At, Bad: true, state: done}
		c.add(first, block)
	}
	c.declare(st.Block, first)
}

// outside reports a statement word inside a block.
func (c *checker) outside(block *Symbol, span source.Span, word string) {
	if block != nil {
		c.blame(c.report("wrong-place", span, "`%s` stands outside of blocks", word).
			Because("a block only chooses and places what is drawn"))
	}
}

func (c *checker) sentence(st *syntax.Sentence, block *Symbol) {
	s := &Symbol{Span: st.Span(), Expr: st.Expr, sentence: st}
	if st.Name != nil {
		s.Name, s.NameSpan = st.Name.Text, st.Name.Span()
	}
	switch {
	case st.Thing != nil:
		c.form(s, st, block)
	case block != nil:
		c.blame(c.report("wrong-place", st.Span(), "a value stands outside of blocks").Because("a block only chooses and places what is drawn"))
		s.Bad = true
	}
	c.add(s, block)
	if st.HasBlock {
		c.openBlock(s, st)
	}
}

// form looks the form up and checks that it stands where it may.
func (c *checker) form(s *Symbol, st *syntax.Sentence, block *Symbol) {
	t := st.Thing
	s.FormSpan, s.Text = t.Form.Span(), t.Text
	if s.Name == "" {
		s.NameSpan = s.FormSpan
	}
	f, ok := catalogue.FormNamed(t.Form.Text)
	if !ok {
		c.unknownForm(s, t.Form, block)
		return
	}
	s.Form, s.Kind = f, f.Kind
	switch {
	case block != nil && len(f.Within) == 0:
		c.misplaced(s, "`%s` stands outside of blocks", f.Word)
	case block == nil && len(f.Within) > 0:
		c.misplaced(s, "`%s` stands inside a block", f.Word)
	case block == nil && s.Name == "" && !f.Block:
		s.Bad = true
		c.blame(c.report("needs-name", s.FormSpan, "%s outside of blocks needs a name", a(f.Word)).
			WithLabelledFix(source.Span{File: s.FormSpan.File, Start: s.FormSpan.Start, End: s.FormSpan.Start}, "X = ", "write a name and `=` before it"))
	}
}

func (c *checker) misplaced(s *Symbol, format, word string) {
	s.Bad, s.misplaced = true, true
	d := c.report("wrong-place", s.FormSpan, format, word)
	if len(s.Form.Within) > 0 {
		d = d.Because("it belongs to " + ticked(s.Form.Within, "or") + ", between `{` and `}`")
	} else {
		d = d.Because("a block only chooses and places what is drawn")
	}
	c.blame(d)
}

func (c *checker) unknownForm(s *Symbol, form *syntax.Ident, block *Symbol) {
	s.Bad = true
	d := c.report("unknown-form", form.Span(), "there is no form %s", source.Quote(form.Text))
	var words []string
	for _, f := range catalogue.Forms {
		if (len(f.Within) > 0) == (block != nil) {
			words = append(words, f.Word)
		}
	}
	if c.lookup(form.Text) != nil {
		d = d.Because(source.Quote(form.Text) + " is a name; values are joined by operators, and `round(x, step)` rounds")
	} else if w, ok := spell.Nearest(form.Text, words); ok {
		d = d.WithFix(form.Span(), w)
	} else {
		d = d.Because("the forms here are " + list(words, "and"))
	}
	c.blame(d)
}

func (c *checker) openBlock(s *Symbol, st *syntax.Sentence) {
	switch {
	case s.Form != nil && !s.Form.Block:
		s.Bad = true
		c.blame(c.report("not-a-block", s.FormSpan, "%s opens no block", a(s.Form.Word)))
	case s.Form == nil && st.Thing == nil:
		s.Bad = true
		c.blame(c.report("not-a-block", st.Span(), "a value opens no block"))
	}
	c.declare(st.Block, s)
}

// add puts a symbol into its scope.
func (c *checker) add(s *Symbol, block *Symbol) {
	s.Parent = block
	c.model.Symbols = append(c.model.Symbols, s)
	names := c.tops
	if block != nil {
		block.Members = append(block.Members, s)
		if c.scope[block] == nil {
			c.scope[block] = map[string]*Symbol{}
		}
		names = c.scope[block]
	}
	if s.Name == "" {
		return
	}
	if c.allowed(s) && c.unique(s, names) && (block == nil || c.unique(s, c.tops)) {
		names[s.Name] = s
	}
}

// allowed reports built-in and reserved names.
func (c *checker) allowed(s *Symbol) bool {
	if _, ok := catalogue.BuiltinNamed(s.Name); ok {
		c.bag.Add(c.report("name-taken", s.NameSpan, "%s is a built-in name", source.Quote(s.Name)).Because("built-in names keep their meaning in every file"))
		return false
	}
	for _, w := range catalogue.Reserved {
		if w == s.Name {
			c.bag.Add(c.report("name-taken", s.NameSpan, "%s is a word of the language and cannot be a name", source.Quote(s.Name)))
			return false
		}
	}
	return true
}

func (c *checker) unique(s *Symbol, names map[string]*Symbol) bool {
	first, ok := names[s.Name]
	if ok && first.misplaced {
		return false // reported already
	}
	if ok {
		c.bag.Add(c.report("name-taken", s.NameSpan, "%s is defined already", source.Quote(s.Name)).
			Because("a name means one thing in the whole file, inside blocks too").WithNote(first.NameSpan, "the first one is here"))
	}
	return !ok
}

// resolve works out the kind of a symbol and checks its clauses, after the
// symbols that it needs. used is the place that asks for it.
func (c *checker) resolve(s *Symbol, used *source.Span) {
	switch s.state {
	case done:
		return
	case working:
		c.cycle(s, used)
		return
	}
	s.state = working
	saved := c.within
	c.within = s
	c.path = append(c.path, link{symbol: s})
	switch {
	case s.Form != nil:
		c.thing(s)
	case s.Given != nil:
		c.given(s)
	case s.Expr != nil:
		s.Kind = c.expr(s.Expr)
	}
	c.path = c.path[:len(c.path)-1]
	c.within = saved
	s.state = done
	c.model.Order = append(c.model.Order, s)
}

// cycle reports the whole ring, once.
func (c *checker) cycle(s *Symbol, used *source.Span) {
	first := 0
	for i, l := range c.path {
		if l.symbol == s {
			first = i
		}
	}
	ring := c.path[first:]
	reported := false
	for _, l := range ring {
		reported = reported || l.symbol.ringed
	}
	ring[len(ring)-1].span = *used
	d := c.report("cycle", s.NameSpan, "%s depends on itself", source.Quote(s.Name))
	if len(ring) > 1 {
		var names []string
		for _, l := range ring {
			names = append(names, l.symbol.Name)
		}
		d = d.Because("the ring is " + ringText(append(names, s.Name)))
	}
	for _, l := range ring {
		d = d.WithNote(l.span, source.Quote(l.symbol.Name)+" needs "+source.Quote(l.span.Text()))
		l.symbol.Bad, l.symbol.ringed = true, true
	}
	if !reported { // two rings with a name in common are one mistake
		c.bag.Add(d)
	}
}

func ringText(names []string) string {
	out := names[0]
	for _, n := range names[1:] {
		out += " → " + n
	}
	return out
}
