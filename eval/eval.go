// Package eval works a checked file out: givens, values, things and blocks, on
// demand and each once, so that only what an output, a verify or a question
// needs is computed. Failures of the geometry become diagnostics at the clause
// to blame; what depends on them is left out without a further word.
package eval

import (
	"epure/eval/forms"
	"epure/eval/scene"
	"epure/lang/catalogue"
	"epure/lang/check"
	"epure/lang/diag"
	"epure/lang/quantity"
	"epure/lang/source"
)

// Input says with which givens a file is worked out and what is wanted of it.
type Input struct {
	Case   string
	Givens map[string]quantity.Value // set from outside, of the kinds of the givens
	All    bool                      // work out every statement
	Blocks bool                      // work out the output blocks and what they need
	Names  []string                  // work out these
}

// Evaluate works a model out. Every verify line is evaluated, at the nominal values and at the
// corners of the tolerances. The scene holds what was wanted, as far as it could be made.
func Evaluate(m *check.Model, in Input, bag *diag.Bag) *scene.Scene {
	e := newEvaluator(m, in.Givens, bag)
	e.checkGivens(in.Givens)
	s := &scene.Scene{File: m.File, Case: in.Case}
	wanted := map[string]bool{}
	for _, n := range in.Names {
		wanted[n] = true
	}
	for _, sym := range m.Symbols {
		switch {
		case sym.Parent != nil:
		case sym.Form != nil && sym.Form.Block:
			if in.All || in.Blocks {
				e.value(sym)
			}
		case in.All || wanted[sym.Name]:
			e.value(sym)
		}
	}
	s.Verify = e.verifyAll(in.Givens)
	e.gather(s)
	return s
}

// gather puts what was worked out into the scene, in file order.
func (e *evaluator) gather(s *scene.Scene) {
	for _, sym := range e.model.Symbols {
		v, ok := e.values[sym]
		if !ok || sym.Parent != nil {
			continue
		}
		if b, ok := v.(*scene.Block); ok {
			s.Blocks = append(s.Blocks, b)
			continue
		}
		if _, none := v.(scene.Unknown); none || sym.Name == "" {
			continue
		}
		s.Things = append(s.Things, e.thing(sym, v))
	}
}

// thing lists a symbol's measures.
func (e *evaluator) thing(sym *check.Symbol, v scene.Value) *scene.Thing {
	t := &scene.Thing{Name: sym.Name, Span: sym.Span, Value: v, Form: "value"}
	switch {
	case sym.Given != nil:
		t.Text = e.text(sym.Given.Text)
	case sym.Form != nil:
		t.Form = sym.Form.Word
	}
	switch v.(type) {
	case scene.Quantity, scene.Text, scene.YesNo, scene.Triple, scene.Pair:
		t.Measures = []scene.Measure{{Name: "value", Value: v}}
	case *scene.Line:
		t.Measures = append([]scene.Measure{{Name: "value", Value: v}}, forms.List(v, sym.Kind)...)
	default:
		t.Measures = forms.List(v, sym.Kind)
	}
	return t
}

// evaluator works one set of givens out.
type evaluator struct {
	model        *check.Model
	bag          *diag.Bag
	givens       map[string]quantity.Value
	values       map[*check.Symbol]scene.Value
	constructors map[string]forms.Constructor
}

func newEvaluator(m *check.Model, givens map[string]quantity.Value, bag *diag.Bag) *evaluator {
	return &evaluator{model: m, bag: bag, givens: givens, values: map[*check.Symbol]scene.Value{}, constructors: forms.Constructors()}
}

// value works a symbol out, once.
func (e *evaluator) value(sym *check.Symbol) scene.Value {
	if v, ok := e.values[sym]; ok {
		return v
	}
	e.values[sym] = scene.Unknown{} // a ring was reported by check; it must not run here
	v := e.make(sym)
	e.values[sym] = v
	return v
}

func (e *evaluator) make(sym *check.Symbol) scene.Value {
	switch {
	case sym.Bad:
		return scene.Unknown{}
	case sym.Given != nil:
		return e.given(sym)
	case sym.Form == nil:
		return e.expr(sym.Expr)
	case sym.Form.Block:
		return e.block(sym)
	case sym.Form.Kind.Class == catalogue.View:
		return e.view(sym)
	case sym.Form.Kind.Class == catalogue.Mark:
		return scene.Unknown{} // made by its block
	}
	return e.construct(sym)
}

// construct runs the constructor of a form.
func (e *evaluator) construct(sym *check.Symbol) scene.Value {
	call, ok := e.call(sym)
	if !ok {
		return scene.Unknown{}
	}
	v, f := e.constructors[sym.Form.Word](call)
	if f != nil {
		e.fail(sym, f)
		return scene.Unknown{}
	}
	return v
}

// call works the clauses of a form out; ok is false when one of them is unknown.
func (e *evaluator) call(sym *check.Symbol) (*forms.Call, bool) {
	c := &forms.Call{Name: sym.Name, Values: map[string][]scene.Value{}, Words: map[string][]string{}}
	ok := true
	for i := range sym.Form.Clauses {
		word := sym.Form.Clauses[i].Word
		b := sym.Clauses[word]
		if b == nil {
			continue
		}
		for _, x := range b.Values {
			v := e.expr(x)
			if _, unknown := v.(scene.Unknown); unknown {
				ok = false
			}
			c.Values[word] = append(c.Values[word], v)
		}
		for _, w := range b.Words {
			c.Words[word] = append(c.Words[word], w.Text)
		}
	}
	return c, ok
}

// fail reports a Fail at its clause.
func (e *evaluator) fail(sym *check.Symbol, f *forms.Fail) {
	span := sym.FormSpan
	if b := sym.Clauses[f.Clause]; b != nil {
		span = b.Span
		switch {
		case f.Index < len(b.Values):
			span = b.Values[f.Index].Span()
		case f.Index < len(b.Words):
			span = b.Words[f.Index].Span
		}
	}
	e.bag.Add(diagnostic(f, span))
}

func diagnostic(f *forms.Fail, span source.Span) diag.Diagnostic {
	d := diag.New(f.Code, span, f.Text).Because(f.Reason)
	if f.Way != "" {
		d = d.WithNote(source.Span{}, f.Way)
	}
	return d
}
