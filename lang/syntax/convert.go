package syntax

import (
	"strings"

	"github.com/alecthomas/participle/v2/lexer"

	"epure/lang/diag"
	"epure/lang/quantity"
	"epure/lang/source"
)

// converter turns the rows of one line into the tree, and explains why a line has
// no rows.
type converter struct {
	*parser
	row  []token // the tokens of the line
	what string  // "statement", "hole" or "expression"
}

// at returns the place of a token that participle hands back.
func (c *converter) at(t lexer.Token) source.Span {
	own := c.row[t.Pos.Line]
	return c.span(own.start, own.end)
}

func (c *converter) ident(t lexer.Token) *Ident { return &Ident{Text: t.Value, At: c.at(t)} }

// line converts a statement.
func (c *converter) line(r *rowLine) Statement {
	whole := c.cover(c.row)
	switch {
	case r.Given != nil:
		g := r.Given
		return &Given{At: whole, Name: c.ident(g.Name), Expr: c.expr(g.Expr), Text: c.textOrNil(g.Text), Clauses: c.clauses(g.Clauses)}
	case r.Verify != nil:
		return c.verify(r.Verify, whole)
	case r.Take != nil:
		return &Take{At: whole, Name: c.ident(r.Take.Name), Path: c.plain(&r.Take.Path)}
	case r.Case != nil:
		return c.caseOf(r.Case, whole)
	}
	return c.sentence(r.Sentence, whole)
}

func (c *converter) verify(v *rowVerify, whole source.Span) Statement {
	out := &Verify{At: whole, Left: c.expr(v.Left), Right: c.expr(v.Right), Op: v.Op.Value, OpAt: c.at(v.Op), Text: c.textOrNil(v.Text)}
	if v.Within != nil {
		out.Within = c.expr(v.Within)
	}
	return out
}

func (c *converter) caseOf(r *rowCase, whole source.Span) Statement {
	if r.Path != nil {
		return &Case{At: whole, Path: c.plain(r.Path)}
	}
	out := &Case{At: whole, Clauses: c.clauses(r.Clauses)}
	if r.Name.Type == kindText {
		out.Name = c.plain(r.Name)
		return out
	}
	at := c.at(*r.Name)
	out.Name = &TextLit{At: at, Parts: []Part{{At: at, Literal: r.Name.Value}}}
	return out
}

func (c *converter) sentence(r *rowSentence, whole source.Span) Statement {
	out := &Sentence{At: whole}
	if r.Name != nil {
		out.Name = c.ident(*r.Name)
	}
	if r.Thing != nil {
		out.Thing = c.thing(r.Thing, whole.End)
		return out
	}
	out.Expr = c.expr(r.Expr)
	if r.Name == nil {
		c.noEffect(out.Expr)
		return &Bad{At: whole}
	}
	return out
}

// noEffect reports a value without a name.
func (c *converter) noEffect(e Expr) {
	d := c.error("no-effect", e.Span().Start, e.Span().End, "this line states a value and gives it no name")
	if name, ok := e.(*Name); ok {
		d.Text = "`" + name.Text + "` alone says nothing"
		c.add(d.Because("a statement is a definition, `name = …`, or a form with its clauses, `table of D`"))
		return
	}
	start := e.Span().Start
	c.add(d.WithLabelledFix(c.span(start, start), "name = ", "give it a name, `name = …`"))
}

func (c *converter) thing(r *rowThing, end int) *Thing {
	form := c.ident(r.Form)
	return &Thing{At: c.span(form.At.Start, end), Form: form, Text: c.textOrNil(r.Text), Clauses: c.clauses(r.Clauses)}
}

// clauses converts clauses.
func (c *converter) clauses(rows []*rowClause) []Clause {
	var out []Clause
	for _, r := range rows {
		cl := Clause{Word: c.ident(r.Word)}
		for _, e := range r.Exprs {
			cl.Values = append(cl.Values, c.expr(e))
		}
		cl.At = cl.Word.At.To(cl.Values[len(cl.Values)-1].Span())
		out = append(out, cl)
	}
	return out
}

// precedence of the operators; the minus in front of an operand stands between
// the product and the power.
func precedence(op string) int {
	switch op {
	case "+", "-":
		return 1
	case "*", "/":
		return 2
	case "minus":
		return 3
	}
	return 4
}

// climber puts a flat row of operands and operators in order.
type climber struct {
	operands  []Expr
	operators []lexer.Token // a minus in front has the Value "minus"
}

// expr converts an expression. It calls itself only for what stands in brackets.
func (c *converter) expr(r *rowExpr) Expr {
	if len(r.Rest) == 0 && r.First.Minus == nil {
		return c.operand(r.First)
	}
	var k climber
	c.take(&k, r.First)
	for _, f := range r.Rest {
		level := precedence(f.Op.Value)
		for n := len(k.operators); n > 0; n = len(k.operators) {
			last := precedence(k.operators[n-1].Value)
			if last < level || last == level && f.Op.Value == "^" {
				break
			}
			c.reduce(&k)
		}
		k.operators = append(k.operators, f.Op)
		c.take(&k, f.Operand)
	}
	for len(k.operators) > 0 {
		c.reduce(&k)
	}
	return k.operands[0]
}

// take puts an operand, and the minus in front of it, on the stacks.
func (c *converter) take(k *climber, r *rowOperand) {
	if r.Minus != nil {
		minus := *r.Minus
		minus.Value = "minus"
		k.operators = append(k.operators, minus)
	}
	k.operands = append(k.operands, c.operand(r))
}

// reduce applies the operator on top to its operands.
func (c *converter) reduce(k *climber) {
	n := len(k.operators) - 1
	op, last := k.operators[n], len(k.operands)-1
	k.operators = k.operators[:n]
	right, at := k.operands[last], c.at(op)
	if op.Value == "minus" {
		k.operands[last] = &Unary{At: at.To(right.Span()), OpAt: at, X: right}
		return
	}
	left := k.operands[last-1]
	k.operands = k.operands[:last]
	b := &Binary{At: left.Span().To(right.Span()), Left: left, Op: op.Value, OpAt: at, Right: right}
	c.powerOfQuantity(b)
	k.operands[last-1] = b
}

// powerOfQuantity warns of 50 mm^2, which means 2500 mm².
func (c *converter) powerOfQuantity(b *Binary) {
	q, ok := b.Left.(*Quantity)
	if !ok || b.Op != "^" || q.Literal.Unit == quantity.NoUnit {
		return
	}
	d := diag.Warn("power-of-quantity", b.At, "the power takes the number with it")
	if e, ok := b.Right.(*Quantity); ok {
		if v, err := quantity.Pow(q.Literal.Value, e.Literal.Value); err == nil {
			d.Reason = source.Quote(b.At.Text()) + " is " + quantity.Format(v)
		}
		raised := strings.NewReplacer("2", "²", "3", "³").Replace(e.At.Text())
		if q.Literal.Value.Kind() == quantity.Length && (raised == "²" || raised == "³") {
			unit := q.At.Text() + raised
			d = d.WithLabelledFix(b.At, unit, "write `"+unit+"` for so many "+q.Literal.Unit.String()+raised)
		}
	}
	meant := "(" + q.At.Text() + ")"
	rest := c.src[q.At.End:b.At.End]
	c.add(d.WithLabelledFix(q.At, meant, "write `"+meant+rest+"` if that is meant"))
}

// operand converts an operand with what follows it; the minus is left to expr.
func (c *converter) operand(r *rowOperand) Expr {
	var x Expr
	if r.Leaf != nil {
		x = c.leaf(*r.Leaf)
	} else {
		x = c.group(r.Args)
	}
	for _, s := range r.Suffixes {
		if s.Name != nil {
			name := c.ident(*s.Name)
			x = &Member{At: x.Span().To(name.At), X: x, Name: name}
			continue
		}
		x = c.call(x, s.Args)
	}
	return x
}

func (c *converter) leaf(t lexer.Token) Expr {
	switch t.Type {
	case kindName:
		return &Name{Ident: *c.ident(t)}
	case kindText:
		return c.text(t)
	}
	return &Quantity{At: c.at(t), Literal: c.literals[c.row[t.Pos.Line].literal]}
}

// group converts brackets that are no call.
func (c *converter) group(r *rowArgs) Expr {
	at := c.at(r.Open).To(c.at(r.Close))
	items := c.items(r)
	if len(items) == 1 {
		return &Paren{At: at, X: items[0]}
	}
	return &Tuple{At: at, Items: items}
}

func (c *converter) items(r *rowArgs) []Expr {
	out := make([]Expr, 0, len(r.Exprs))
	for _, e := range r.Exprs {
		out = append(out, c.expr(e))
	}
	return out
}

func (c *converter) call(x Expr, r *rowArgs) Expr {
	switch x.(type) {
	case *Name, *Member:
	default:
		open := c.at(r.Open)
		c.add(c.error("not-callable", open.Start, open.End, "this bracket calls %s, which is not a name", source.Quote(x.Span().Text())).
			Because("an operator, a comma or a clause word is missing before the bracket"))
	}
	return &Call{At: x.Span().To(c.at(r.Close)), X: x, Args: c.items(r)}
}
