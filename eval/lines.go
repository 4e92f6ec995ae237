package eval

import (
	"fmt"
	"math"
	"strings"

	"epure/eval/scene"
	"epure/lang/check"
	"epure/lang/diag"
	"epure/lang/quantity"
	"epure/lang/source"
	"epure/lang/syntax"
)

// given is the value of a given: from outside, or as written.
func (e *evaluator) given(sym *check.Symbol) scene.Value {
	if v, ok := e.givens[sym.Name]; ok {
		return scene.Quantity{Value: v}
	}
	return e.expr(sym.Expr)
}

// checkGivens reports givens outside their range.
func (e *evaluator) checkGivens(outside map[string]quantity.Value) {
	for _, sym := range e.model.Symbols {
		if sym.Given == nil || sym.Bad || sym.Clauses["from"] == nil {
			continue
		}
		v, ok := e.value(sym).(scene.Quantity)
		lo, ok1 := e.bound(sym, "from")
		hi, ok2 := e.bound(sym, "to")
		if !ok || !ok1 || !ok2 {
			continue
		}
		below, _ := quantity.Compare(v.Value, lo)
		above, _ := quantity.Compare(v.Value, hi)
		if below >= 0 && above <= 0 {
			continue
		}
		text := fmt.Sprintf("`%s` is %s, outside of its range", sym.Name, quantity.Format(v.Value))
		if _, set := outside[sym.Name]; set {
			text = fmt.Sprintf("`%s` was set to %s, outside of its range", sym.Name, quantity.Format(v.Value))
		}
		e.bag.Add(diag.New("out-of-range", sym.Expr.Span(), text).
			Because(fmt.Sprintf("it runs from %s to %s", quantity.Format(lo), quantity.Format(hi))))
	}
}

func (e *evaluator) bound(sym *check.Symbol, word string) (quantity.Value, bool) {
	b := sym.Clauses[word]
	if b == nil || len(b.Values) == 0 {
		return quantity.Value{}, false
	}
	q, ok := e.expr(b.Values[0]).(scene.Quantity)
	return q.Value, ok
}

// relativeEqual is what `=` without `within` allows, relative to the larger
// side: the contract of the language.
const relativeEqual = 1e-9

// outcome works one verify line out; ok is false when a side is unknown.
func (e *evaluator) outcome(v *check.Verify) (scene.Verify, bool) {
	r := scene.Verify{Span: v.Span(), Source: v.Span().Text(), Text: e.text(v.Text), Op: v.Op}
	sides, ok := e.all([]syntax.Expr{v.Left, v.Right})
	r.Left, r.Right = sides[0], sides[1]
	if !ok {
		return r, false
	}
	if v.Within != nil {
		q, ok := e.expr(v.Within).(scene.Quantity)
		if !ok {
			return r, false
		}
		r.Within = &q.Value
	}
	switch x := r.Left.(type) {
	case scene.Text:
		r.Holds = x == r.Right.(scene.Text)
	case scene.YesNo:
		r.Holds = x == r.Right.(scene.YesNo)
	case scene.Triple:
		y := r.Right.(scene.Triple)
		of, _ := quantity.Unify(x.Of, y.Of)
		d := quantity.FromFloat(of, x.V.Dist(y.V))
		r.Difference = &d
		r.Holds = d.Float() <= allowance(r.Within, x.V.Len(), y.V.Len())
	case scene.Quantity:
		return r, e.compare(&r, x.Value, r.Right.(scene.Quantity).Value)
	}
	return r, true
}

func allowance(within *quantity.Value, x, y float64) float64 {
	if within != nil {
		return within.Float()
	}
	return relativeEqual * math.Max(math.Abs(x), math.Abs(y))
}

// compare fills in the outcome for two quantities.
func (e *evaluator) compare(r *scene.Verify, x, y quantity.Value) bool {
	c, err := quantity.Compare(x, y)
	if err != nil {
		return false
	}
	if d, err := quantity.Sub(x, y); err == nil {
		r.Difference = &d
	}
	switch r.Op {
	case "=":
		r.Holds = c == 0 || math.Abs(x.Float()-y.Float()) <= allowance(r.Within, x.Float(), y.Float())
	case "<":
		r.Holds = c < 0
	case "<=":
		r.Holds = c <= 0
	case ">":
		r.Holds = c > 0
	case ">=":
		r.Holds = c >= 0
	}
	return true
}

// maxCorners bounds the corners of the tolerances that are tried: ten givens
// with a tolerance.
const maxCorners = 1 << 10

// verifyAll works every verify line out, at the nominal values and at every
// corner of the tolerances, and reports those that fail.
func (e *evaluator) verifyAll(givens map[string]quantity.Value) []scene.Verify {
	out := make([]scene.Verify, len(e.model.Verifies))
	known := make([]bool, len(out))
	for i, v := range e.model.Verifies {
		if v.Bad {
			continue
		}
		out[i], known[i] = e.outcome(v)
		if known[i] && !out[i].Holds {
			e.bag.Add(broken(out[i], v))
		}
	}
	for _, c := range e.corners() {
		at := newEvaluator(e.model, c.givens(givens), &diag.Bag{})
		for i, v := range e.model.Verifies {
			if !known[i] || !out[i].Holds || v.Bad {
				continue
			}
			r, ok := at.outcome(v)
			switch {
			case !ok:
				out[i].Holds, out[i].Corner = false, c.String()
				e.bag.Add(diag.New("verify-fails", condition(v), "this cannot be worked out at a corner of the tolerances").Because("at " + c.String() + firstOf(at.bag)))
			case !r.Holds:
				r.Corner = c.String()
				out[i] = r
				e.bag.Add(broken(r, v))
			}
		}
	}
	var kept []scene.Verify
	for i := range out {
		if known[i] {
			kept = append(kept, out[i])
		}
	}
	return kept
}

func firstOf(b *diag.Bag) string {
	ds := b.Sorted()
	if len(ds) == 0 {
		return ""
	}
	return ": " + ds[0].Text
}

// corner is one choice of the ends of the tolerances.
type corner []setting

type setting struct {
	name  string
	value quantity.Value
}

func (c corner) givens(base map[string]quantity.Value) map[string]quantity.Value {
	out := map[string]quantity.Value{}
	for n, v := range base {
		out[n] = v
	}
	for _, s := range c {
		out[s.name] = s.value
	}
	return out
}

func (c corner) String() string {
	var parts []string
	for _, s := range c {
		parts = append(parts, s.name+" = "+quantity.Format(s.value))
	}
	return strings.Join(parts, ", ")
}

// corners lists the corners of the tolerances; none when there is nothing to verify.
func (e *evaluator) corners() []corner {
	if len(e.model.Verifies) == 0 {
		return nil
	}
	out := []corner{nil}
	for _, sym := range e.model.Symbols {
		if sym.Given == nil || sym.Bad || sym.Clauses["tolerance"] == nil {
			continue
		}
		v, ok := e.value(sym).(scene.Quantity)
		t, ok2 := e.bound(sym, "tolerance")
		if !ok || !ok2 || t.Sign() == 0 {
			continue
		}
		lo, err1 := quantity.Sub(v.Value, quantity.Abs(t))
		hi, err2 := quantity.Add(v.Value, quantity.Abs(t))
		if err1 != nil || err2 != nil {
			continue
		}
		if 2*len(out) > maxCorners {
			e.bag.Add(diag.New("too-many-tolerances", sym.Clauses["tolerance"].Span, "there are too many tolerances to try all their corners").
				Because("ten givens with a tolerance have 1024 corners, and each is worked out"))
			return nil
		}
		var next []corner
		for _, c := range out {
			next = append(next, append(c[:len(c):len(c)], setting{sym.Name, lo}), append(c[:len(c):len(c)], setting{sym.Name, hi}))
		}
		out = next
	}
	if len(out) == 1 {
		return nil
	}
	return out
}

// condition is the place of the condition without the word verify.
func condition(v *check.Verify) source.Span { return v.Left.Span().To(v.Right.Span()) }

// broken is the diagnostic of a verify line that fails.
func broken(r scene.Verify, v *check.Verify) diag.Diagnostic {
	text := r.Text
	if text == "" {
		text = "`" + condition(v).Text() + "` does not hold"
	}
	reason := fmt.Sprintf("%s is %s", v.Left.Span().Text(), showValue(r.Left))
	if _, literal := v.Right.(*syntax.Quantity); !literal {
		reason += fmt.Sprintf(", %s is %s", v.Right.Span().Text(), showValue(r.Right))
	} else {
		reason += ", and the limit is " + showValue(r.Right)
	}
	if r.Difference != nil {
		reason += ", a difference of " + quantity.Format(quantity.Abs(*r.Difference))
	}
	if r.Within != nil {
		reason += ", and " + quantity.Format(*r.Within) + " is allowed"
	}
	if r.Corner != "" {
		reason = "at the corner " + r.Corner + " of the tolerances: " + reason
	}
	return diag.New("verify-fails", condition(v), text).Because(reason)
}

// showValue writes a value for a message.
func showValue(v scene.Value) string {
	switch v := v.(type) {
	case scene.Quantity:
		return quantity.Format(v.Value)
	case scene.Text:
		return `"` + string(v) + `"`
	case scene.YesNo:
		if v {
			return "yes"
		}
		return "no"
	case scene.Triple:
		of := func(x float64) string { return quantity.Format(quantity.FromFloat(v.Of, x)) }
		return "(" + of(v.V.X) + ", " + of(v.V.Y) + ", " + of(v.V.Z) + ")"
	}
	return ""
}
