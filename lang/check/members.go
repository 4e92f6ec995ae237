package check

import (
	"fmt"

	"epure/lang/catalogue"
	"epure/lang/quantity"
	"epure/lang/source"
	"epure/lang/spell"
	"epure/lang/syntax"
)

// member is the kind of x.name, or of x.name(args); whole is the place of all of it.
func (c *checker) member(m *syntax.Member, args []syntax.Expr, whole source.Span) catalogue.Kind {
	x := c.expr(m.X)
	if x.Class == catalogue.Unknown {
		return unknown
	}
	spec, ok := catalogue.MeasureNamed(x, m.Name.Text)
	if !ok {
		c.unknownMember(m, x)
		return unknown
	}
	needed := 0
	for _, a := range spec.Args {
		if !a.Optional {
			needed++
		}
	}
	switch {
	case args == nil && needed > 0:
		c.blame(c.report("wrong-count", m.Name.Span(), "`%s` needs %s in brackets", spec.Name, arguments(spec.Args)).
			Because(spec.Help))
		return spec.Kind
	case len(args) > len(spec.Args):
		c.blame(c.report("wrong-count", args[len(spec.Args)].Span(), "`%s` takes %s", spec.Name, orNothing(spec.Args)))
		return spec.Kind
	case args != nil && len(args) < needed:
		c.blame(c.report("wrong-count", whole, "`%s` needs %s", spec.Name, arguments(spec.Args)))
		return spec.Kind
	}
	for i, a := range args {
		c.argument(spec.Name, a, c.model.kinds[a], spec.Args[i].Takes)
	}
	return spec.Kind
}

func (c *checker) argument(of string, e syntax.Expr, k catalogue.Kind, takes []catalogue.Kind) {
	if fits(k, takes) {
		return
	}
	d := c.report("wrong-kind", e.Span(), "`%s` takes %s here", of, names(takes, nil)).
		Because(source.Quote(e.Span().Text()) + " is " + name(k))
	c.blame(c.unitHint(d, e, k, takes))
}

// arguments lists what a measure needs: "an angle", "a plane, a solid or a face, and …".
func arguments(args []catalogue.Arg) string {
	var out []string
	for _, a := range args {
		out = append(out, names(a.Takes, nil))
	}
	if len(out) == 1 {
		return out[0]
	}
	return fmt.Sprintf("%d things", len(out))
}

func orNothing(args []catalogue.Arg) string {
	if len(args) == 0 {
		return "nothing in brackets"
	}
	return arguments(args) + " and no more"
}

func (c *checker) unknownMember(m *syntax.Member, x catalogue.Kind) {
	var words []string
	for _, ms := range catalogue.MeasuresOf(x) {
		words = append(words, ms.Name)
	}
	d := c.report("unknown-measure", m.Name.Span(), "%s has no %s", whatHas(x), source.Quote(m.Name.Text))
	switch w, ok := spell.Nearest(m.Name.Text, words); {
	case ok:
		d = d.WithFix(m.Name.Span(), w)
	case len(words) > 0:
		d = d.Because("its measures are " + list(words, "and"))
	}
	c.blame(d)
}

// whatHas names a kind by its form where it has one.
func whatHas(k catalogue.Kind) string {
	if k.Type != "" {
		return a(k.Type)
	}
	return name(k)
}

// call is the kind of f(args) or x.measure(args).
func (c *checker) call(e *syntax.Call) catalogue.Kind {
	args := make([]syntax.Expr, 0, len(e.Args))
	for _, a := range e.Args {
		c.expr(a)
		args = append(args, a)
	}
	switch x := e.X.(type) {
	case *syntax.Member:
		return c.member(x, args, e.Span())
	case *syntax.Name:
		if f, ok := catalogue.FunctionNamed(x.Text); ok {
			return c.function(f, e, args)
		}
		if c.lookup(x.Text) == nil {
			c.unknownFunction(x)
			return unknown
		}
	}
	if k := c.expr(e.X); k.Class != catalogue.Unknown {
		c.blame(c.report("not-a-function", e.Span(), "%s takes nothing in brackets", source.Quote(e.X.Span().Text())).
			Because("it is " + name(k)))
	}
	return unknown
}

func (c *checker) unknownFunction(n *syntax.Name) {
	var words []string
	for _, f := range catalogue.Functions {
		words = append(words, f.Name)
	}
	d := c.report("unknown-function", n.Span(), "there is no function %s", source.Quote(n.Text))
	if w, ok := spell.Nearest(n.Text, words); ok {
		d = d.WithFix(n.Span(), w)
	} else {
		d = d.Because("the functions are " + list(words, "and"))
	}
	c.blame(d)
}

func (c *checker) function(f *catalogue.Function, e *syntax.Call, args []syntax.Expr) catalogue.Kind {
	if len(args) < len(f.Params) || len(args) > len(f.Params) && !f.Many {
		c.blame(c.report("wrong-count", e.Span(), "`%s` takes %s", f.Name, parameters(f)))
		return f.Kind
	}
	ks := make([]catalogue.Kind, len(args))
	for i, a := range args {
		ks[i] = c.model.kinds[a]
		p := f.Params[min(i, len(f.Params)-1)]
		switch {
		case len(p.Takes) > 0:
			c.argument(f.Name, a, ks[i], p.Takes)
		case ks[i].Class != catalogue.Quantity && ks[i].Class != catalogue.Unknown:
			c.blame(c.report("wrong-kind", a.Span(), "`%s` takes a quantity here", f.Name).Because(source.Quote(a.Span().Text()) + " is " + name(ks[i])))
			ks[i] = unknown
		}
	}
	return c.result(f, args, ks)
}

func parameters(f *catalogue.Function) string {
	n := fmt.Sprint(len(f.Params), " arguments")
	if len(f.Params) == 1 {
		n = "one argument"
	}
	if f.Many {
		n += " or more"
	}
	return n
}

// result is the kind of a function's value.
func (c *checker) result(f *catalogue.Function, args []syntax.Expr, ks []catalogue.Kind) catalogue.Kind {
	for _, k := range ks {
		if k.Class == catalogue.Unknown {
			return f.Kind // the zero Kind unless it is fixed
		}
	}
	switch f.Rule {
	case catalogue.Same:
		return c.alike(f, args, ks)
	case catalogue.HalfPower:
		of, ok := quantity.Power(ks[0].Of, 1, 2)
		if !ok {
			c.blame(c.report("wrong-kind", args[0].Span(), "%s has no square root", name(ks[0])))
			return unknown
		}
		return catalogue.Kind{Class: catalogue.Quantity, Of: of}
	case catalogue.OfTriples:
		of, ok := quantity.Times(ks[0].Of, ks[1].Of)
		if !ok {
			return unknown
		}
		return catalogue.Kind{Class: catalogue.Quantity, Of: of}
	}
	if f.Name == "atan2" {
		c.alike(f, args, ks)
	}
	return f.Kind
}

// alike checks that all arguments are of one kind and returns it.
func (c *checker) alike(f *catalogue.Function, args []syntax.Expr, ks []catalogue.Kind) catalogue.Kind {
	of := ks[0].Of
	for i := range ks {
		both, ok := quantity.Unify(of, ks[i].Of)
		if !ok {
			c.blame(c.report("wrong-kind", args[i].Span(), "the arguments of `%s` must be of one kind", f.Name).
				Because(source.Quote(args[i].Span().Text()) + " is " + name(ks[i]) + ", and the first is " + name(ks[0])))
			return unknown
		}
		of = both
	}
	return catalogue.Kind{Class: catalogue.Quantity, Of: of}
}
