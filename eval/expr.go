package eval

import (
	"errors"
	"math"
	"strings"

	"epure/eval/forms"
	"epure/eval/scene"
	"epure/geom/vec"
	"epure/lang/diag"
	"epure/lang/quantity"
	"epure/lang/source"
	"epure/lang/syntax"
)

var unknown = scene.Unknown{}

// expr works an expression out.
func (e *evaluator) expr(x syntax.Expr) scene.Value {
	switch x := x.(type) {
	case *syntax.Quantity:
		return scene.Quantity{Value: x.Literal.Value}
	case *syntax.TextLit:
		return scene.Text(e.text(x))
	case *syntax.Name:
		return e.name(x)
	case *syntax.Paren:
		return e.expr(x.X)
	case *syntax.Tuple:
		return e.tuple(x)
	case *syntax.Unary:
		return negated(e.expr(x.X))
	case *syntax.Binary:
		return e.binary(x)
	case *syntax.Member:
		m, _ := e.member(x, nil, x.Name.At)
		return m.Value
	case *syntax.Call:
		return e.callExpr(x)
	}
	return unknown
}

// all works expressions out; ok is false when one is unknown.
func (e *evaluator) all(xs []syntax.Expr) ([]scene.Value, bool) {
	ok := true
	out := make([]scene.Value, len(xs))
	for i, x := range xs {
		out[i] = e.expr(x)
		if _, bad := out[i].(scene.Unknown); bad {
			ok = false
		}
	}
	return out, ok
}

func (e *evaluator) name(n *syntax.Name) scene.Value {
	if sym := e.model.Ref(n); sym != nil {
		return e.value(sym)
	}
	return builtin(n.Text)
}

// builtin is the value of a built-in name.
func builtin(name string) scene.Value {
	dir := func(x, y, z float64) scene.Value {
		return scene.Triple{V: vec.V3{X: x, Y: y, Z: z}, Of: quantity.Number}
	}
	switch name {
	case "pi":
		return scene.Quantity{Value: quantity.FromFloat(quantity.Number, math.Pi)}
	case "yes", "no":
		return scene.YesNo(name == "yes")
	case "rightward":
		return dir(1, 0, 0)
	case "leftward":
		return dir(-1, 0, 0)
	case "rearward":
		return dir(0, 1, 0)
	case "frontward":
		return dir(0, -1, 0)
	case "upward":
		return dir(0, 0, 1)
	case "downward":
		return dir(0, 0, -1)
	}
	if p := forms.Reference(name); p != nil {
		return p
	}
	return unknown
}

// tuple makes a point or a direction.
func (e *evaluator) tuple(t *syntax.Tuple) scene.Value {
	vs, ok := e.all(t.Items)
	if !ok {
		return unknown
	}
	var c [3]float64
	of := quantity.Zero
	for i, v := range vs {
		q, isQ := v.(scene.Quantity)
		if !isQ || i > 2 {
			return unknown
		}
		c[i] = q.Float()
		of, _ = quantity.Unify(of, q.Kind())
	}
	if len(vs) == 2 {
		return scene.Pair{V: vec.V2{X: c[0], Y: c[1]}, Of: of}
	}
	return scene.Triple{V: vec.V3{X: c[0], Y: c[1], Z: c[2]}, Of: of}
}

func negated(v scene.Value) scene.Value {
	switch v := v.(type) {
	case scene.Quantity:
		return scene.Quantity{Value: quantity.Neg(v.Value)}
	case scene.Triple:
		return scene.Triple{V: v.V.Neg(), Of: v.Of}
	case scene.Pair:
		return scene.Pair{V: vec.V2{X: 0 - v.V.X, Y: 0 - v.V.Y}, Of: v.Of}
	}
	return unknown
}

func (e *evaluator) binary(b *syntax.Binary) scene.Value {
	x, y := e.expr(b.Left), e.expr(b.Right)
	switch x := x.(type) {
	case scene.Quantity:
		switch y := y.(type) {
		case scene.Quantity:
			return e.quantities(b, x.Value, y.Value)
		case scene.Triple, scene.Pair:
			return scaled(y, x.Value, "*")
		}
	case scene.Triple:
		switch y := y.(type) {
		case scene.Quantity:
			return scaled(x, y.Value, b.Op)
		case scene.Triple:
			of, _ := quantity.Unify(x.Of, y.Of)
			if b.Op == "+" {
				return scene.Triple{V: x.V.Add(y.V), Of: of}
			}
			return scene.Triple{V: x.V.Sub(y.V), Of: of}
		}
	case scene.Pair:
		switch y := y.(type) {
		case scene.Quantity:
			return scaled(x, y.Value, b.Op)
		case scene.Pair:
			of, _ := quantity.Unify(x.Of, y.Of)
			if b.Op == "+" {
				return scene.Pair{V: x.V.Add(y.V), Of: of}
			}
			return scene.Pair{V: x.V.Sub(y.V), Of: of}
		}
	}
	return unknown
}

// scaled is a triple or pair times, or over, a quantity.
func scaled(v scene.Value, q quantity.Value, op string) scene.Value {
	k := q.Float()
	kind := func(of quantity.Kind) quantity.Kind {
		out, _ := quantity.Times(of, q.Kind())
		if op == "/" {
			out, _ = quantity.Over(of, q.Kind())
		}
		if out == quantity.Ratio {
			return quantity.Number
		}
		return out
	}
	if op == "/" {
		if k == 0 {
			return unknown
		}
		k = 1 / k
	}
	switch v := v.(type) {
	case scene.Triple:
		return scene.Triple{V: v.V.Scale(k), Of: kind(v.Of)}
	case scene.Pair:
		return scene.Pair{V: v.V.Scale(k), Of: kind(v.Of)}
	}
	return unknown
}

func (e *evaluator) quantities(b *syntax.Binary, x, y quantity.Value) scene.Value {
	var v quantity.Value
	var err error
	switch b.Op {
	case "+":
		v, err = quantity.Add(x, y)
	case "-":
		v, err = quantity.Sub(x, y)
	case "*":
		v, err = quantity.Mul(x, y)
	case "/":
		v, err = quantity.Div(x, y)
	case "^":
		v, err = quantity.Pow(x, y)
	}
	return e.checked(v, err, b.OpAt)
}

// checked turns a failure of arithmetic into a diagnostic.
func (e *evaluator) checked(v quantity.Value, err error, span source.Span) scene.Value {
	if err == nil {
		return scene.Quantity{Value: v}
	}
	d := diag.New("bad-arithmetic", span, err.Error())
	var f *quantity.Failure
	if errors.As(err, &f) {
		d = d.Because(f.Why())
	}
	e.bag.Add(d)
	return unknown
}

// member works x.name or x.name(args) out; at is where its failure belongs.
func (e *evaluator) member(m *syntax.Member, args []syntax.Expr, at source.Span) (forms.Measured, bool) {
	none := forms.Measured{Value: unknown}
	x := e.expr(m.X)
	vs, ok := e.all(args)
	if _, bad := x.(scene.Unknown); bad || !ok {
		return none, false
	}
	got, f := forms.Measure(x, m.Name.Text, vs)
	if f != nil {
		e.bag.Add(diagnostic(f, at))
		return none, false
	}
	return got, true
}

// measured works out an expression that is a measure of a thing.
func (e *evaluator) measured(x syntax.Expr) (forms.Measured, bool) {
	switch x := x.(type) {
	case *syntax.Paren:
		return e.measured(x.X)
	case *syntax.Member:
		return e.member(x, nil, x.Name.At)
	case *syntax.Call:
		if m, ok := x.X.(*syntax.Member); ok {
			return e.member(m, x.Args, x.Span())
		}
	}
	return forms.Measured{Value: unknown}, false
}

func (e *evaluator) callExpr(c *syntax.Call) scene.Value {
	switch f := c.X.(type) {
	case *syntax.Member:
		m, _ := e.member(f, c.Args, c.Span())
		return m.Value
	case *syntax.Name:
		if vs, ok := e.all(c.Args); ok {
			return e.function(f.Text, vs, c)
		}
	}
	return unknown
}

// text fills the holes of a text.
func (e *evaluator) text(t *syntax.TextLit) string {
	if t == nil {
		return ""
	}
	var out strings.Builder
	for _, p := range t.Parts {
		if p.Hole == nil {
			out.WriteString(p.Literal)
			continue
		}
		out.WriteString(e.hole(p.Hole))
	}
	return out.String()
}

func (e *evaluator) hole(h *syntax.Hole) string {
	switch v := e.expr(h.Expr).(type) {
	case scene.Text:
		return string(v)
	case scene.YesNo:
		if v {
			return "yes"
		}
		return "no"
	case scene.Quantity:
		if h.Nearest == nil {
			return quantity.Format(v.Value)
		}
		step, ok := e.expr(h.Nearest).(scene.Quantity)
		if !ok {
			return ""
		}
		s, err := quantity.FormatNearest(v.Value, step.Value, styleOf(h.Nearest, step.Value))
		if err != nil {
			e.checked(v.Value, err, h.Nearest.Span())
		}
		return s
	}
	return ""
}

// styleOf is how a figure rounded to a step is written: as the step was.
func styleOf(x syntax.Expr, step quantity.Value) quantity.Style {
	switch x := x.(type) {
	case *syntax.Quantity:
		return x.Literal.Style()
	case *syntax.Paren:
		return styleOf(x.X, step)
	}
	return quantity.StyleOf(step)
}
