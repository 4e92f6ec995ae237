package eval

import (
	"fmt"
	"math"
	"strings"

	"epure/eval/scene"
	"epure/geom/vec"
	"epure/lang/check"
	"epure/lang/diag"
	"epure/lang/syntax"
)

// block makes an output block with its members.
func (e *evaluator) block(sym *check.Symbol) scene.Value {
	call, ok := e.call(sym)
	if !ok {
		return unknown
	}
	b := &scene.Block{
		Form: sym.Form.Word, Name: sym.Name, Title: e.text(sym.Text), Span: sym.Span, Titles: &scene.Titles{},
		ThirdAngle: len(call.Words["projection"]) > 0 && call.Words["projection"][0] == "third",
		Scale:      e.scale(sym, call),
	}
	if b.Name == "" {
		b.Name = stem(b.Title)
	}
	if b.Form == "sheet" {
		b.Size = "A3"
		if w := call.Words["size"]; len(w) > 0 {
			b.Size = w[0]
		}
		b.Portrait = b.Size == "A4"
		if v := call.Values["upright"]; len(v) > 0 {
			b.Portrait = bool(v[0].(scene.YesNo))
		}
	}
	if v := call.Values["titles"]; len(v) > 0 {
		b.Titles = v[0].(*scene.Titles)
	}
	if v := call.Values["width"]; len(v) > 0 {
		if b.Width = v[0].(scene.Quantity).Float(); b.Width <= 0 {
			e.bag.Add(diag.New("not-positive", sym.Clauses["width"].Values[0].Span(), "`width` must be greater than zero"))
			b.Width = 0
		}
	}
	for _, m := range sym.Members {
		e.memberOf(b, m)
	}
	return b
}

// stem makes a file name of a title.
func stem(title string) string {
	var out strings.Builder
	for _, r := range strings.ToLower(title) {
		switch {
		case r >= 'a' && r <= 'z' || r >= '0' && r <= '9' || r > 127:
			out.WriteRune(r)
		case out.Len() > 0 && !strings.HasSuffix(out.String(), "-"):
			out.WriteByte('-')
		}
	}
	if s := strings.Trim(out.String(), "-"); s != "" {
		return s
	}
	return "drawing"
}

// scale reads a scale clause; 0 is auto.
func (e *evaluator) scale(sym *check.Symbol, call *formsCall) float64 {
	v := call.Values["scale"]
	if len(v) == 0 {
		return 0
	}
	s := v[0].(scene.Quantity).Float()
	if s <= 0 {
		e.bag.Add(diag.New("not-positive", sym.Clauses["scale"].Values[0].Span(), "a scale must be greater than zero"))
		return 0
	}
	return s
}

// memberOf puts one member into its block.
func (e *evaluator) memberOf(b *scene.Block, m *check.Symbol) {
	v := e.value(m)
	if view, ok := v.(*scene.View); ok {
		b.Views = append(b.Views, view)
		return
	}
	if m.Bad || m.Form == nil {
		return
	}
	switch m.Form.Word {
	case "dimension":
		e.dimension(b, m)
	case "label":
		e.label(b, m)
	case "note":
		if call, ok := e.call(m); ok {
			b.Notes = append(b.Notes, &scene.Note{Name: m.Name, Span: m.Span, Text: e.text(m.Text), At: placeAt(call)})
		}
	case "table":
		e.table(b, m)
	}
}

func placeAt(call *formsCall) *vec.V2 {
	v := call.Values["at"]
	if len(v) == 0 {
		return nil
	}
	p := v[0].(scene.Pair).V
	return &p
}

// view makes a view, true shape or pattern.
func (e *evaluator) view(sym *check.Symbol) scene.Value {
	call, ok := e.call(sym)
	if !ok {
		return unknown
	}
	v := &scene.View{
		Form: sym.Form.Word, Name: e.viewName(sym), Named: sym.Name != "", Span: sym.Span, Title: e.text(sym.Text),
		Scale: e.scale(sym, call), At: placeAt(call), Show: shown(sym.Form.Word, call),
	}
	if b := sym.Clauses["of"]; b != nil {
		v.Of = subjects(b.Values, call.Values["of"])
	}
	if b := sym.Clauses["faint"]; b != nil {
		v.Faint = subjects(b.Values, call.Values["faint"])
	}
	if v.Form == "section_view" && !e.cutAway(sym, call, v) {
		return unknown
	}
	if from := call.Values["from"]; len(from) > 0 {
		v.From = from[0].(*scene.View)
	}
	if !e.sight(sym, call, v) {
		return unknown
	}
	return v
}

// viewName is the name of a view: its own, or the form's, numbered when the
// block has several of them without a name.
func (e *evaluator) viewName(sym *check.Symbol) string {
	if sym.Name != "" {
		return sym.Name
	}
	n := 1
	for _, m := range sym.Parent.Members {
		if m == sym {
			break
		}
		if m.Form == sym.Form && m.Name == "" {
			n++
		}
	}
	if n == 1 {
		return sym.Form.Word
	}
	return fmt.Sprintf("%s-%d", sym.Form.Word, n)
}

// sight sets the direction of sight.
func (e *evaluator) sight(sym *check.Symbol, call *formsCall, v *scene.View) bool {
	switch v.Form {
	case "plan":
		v.Along = vec.V3{Z: -1}
	case "elevation":
		v.Along = vec.V3{Y: 1}
	case "pictorial":
		kind := "isometric"
		if w := call.Words["as"]; len(w) > 0 {
			kind = w[0]
		}
		f := pictorial(kind)
		v.Image, v.Along = &f, f.Z.Neg()
		if v.Title == "" {
			v.Title = strings.ToUpper(kind[:1]) + kind[1:] + " view"
		}
	case "true_shape":
		v.Along = v.Of[0].Value.(*scene.Section).Plane.Z.Neg()
	}
	along := call.Values["along"]
	if len(along) == 0 {
		return true
	}
	d, _, ok := heading(along[0])
	span := sym.Clauses["along"].Values[0].Span()
	if !ok {
		e.bag.Add(diag.New("no-direction", span, "`along` needs a direction, and (0, 0, 0) has none"))
		return false
	}
	if v.Form == "elevation" && math.Abs(d.Z) > vec.LevelSine {
		e.bag.Add(diag.New("not-level", span, "an elevation looks along a level direction").
			Because(fmt.Sprintf("this one is inclined by %s", showValue(degrees(math.Asin(d.Z))))).
			WithFix(sym.FormSpan, "view"))
		return false
	}
	v.Along = d
	return true
}

// shown is what a view draws besides its subjects: hidden lines and centre
// lines unless taken away, a section view its hatching and no hidden lines, a pictorial
// neither hidden nor centre lines; and what is asked for.
func shown(form string, call *formsCall) map[string]bool {
	show := map[string]bool{"hidden": form != "pictorial" && form != "section_view", "centres": form != "pictorial", "hatching": form == "section_view"}
	for _, w := range call.Words["show"] {
		show[w] = true
	}
	for _, w := range call.Words["without"] {
		show[w] = false
	}
	return show
}

// subjects pairs values with how the source calls them; a ring or row becomes its members.
func subjects(xs []syntax.Expr, vs []scene.Value) []scene.Subject {
	var out []scene.Subject
	for i, x := range xs {
		if g, ok := vs[i].(*scene.Group); ok {
			for _, s := range g.Solids {
				out = append(out, scene.Subject{Name: s.Name, Value: s})
			}
			continue
		}
		out = append(out, scene.Subject{Name: x.Span().Text(), Value: vs[i]})
	}
	return out
}

func (e *evaluator) label(b *scene.Block, m *check.Symbol) {
	call, ok := e.call(m)
	if !ok {
		return
	}
	l := &scene.Label{Name: m.Name, Span: m.Span, Text: e.text(m.Text), At: call.Values["at"][0].(scene.Triple).V}
	for _, v := range call.Values["on"] {
		l.On = append(l.On, v.(*scene.View))
	}
	b.Labels = append(b.Labels, l)
}
