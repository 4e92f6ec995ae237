package eval

import (
	"fmt"
	"math"
	"strings"

	"epure/eval/forms"
	"epure/eval/scene"
	"epure/lang/check"
	"epure/lang/diag"
	"epure/lang/quantity"
)

type formsCall = forms.Call

func degrees(rad float64) scene.Value { return scene.Quantity{Value: quantity.FromRadians(rad)} }

func mm(x float64) quantity.Value { return quantity.FromFloat(quantity.Length, x) }

// dimension makes one dimension.
func (e *evaluator) dimension(b *scene.Block, m *check.Symbol) {
	on, ok := e.expr(m.Clauses["on"].Values[0]).(*scene.View)
	if !ok {
		return
	}
	d := &scene.Dimension{Name: m.Name, Span: m.Span, On: on}
	var size quantity.Value
	if of := m.Clauses["of"]; of != nil {
		got, ok := e.measured(of.Values[0])
		q, isQ := got.Value.(scene.Quantity)
		if !ok || !isQ {
			return
		}
		if got.Anchor == nil {
			e.bag.Add(diag.New("no-dimension", of.Values[0].Span(), "this measure has no place on a view where a dimension could stand").
				Because("it is not a distance between two points or an angle at one"))
			return
		}
		d.Anchor, size = got.Anchor, q.Value
		if d.Name == "" {
			d.Name = of.Values[0].Span().Text()
		}
	} else if !e.through(m, d, &size) {
		return
	}
	text, ok := e.figure(m, size)
	if !ok {
		return
	}
	d.Text = text
	b.Dimensions = append(b.Dimensions, d)
}

// through makes the anchor of a dimension between two points.
func (e *evaluator) through(m *check.Symbol, d *scene.Dimension, size *quantity.Value) bool {
	c := m.Clauses["through"]
	if len(c.Values) != 2 {
		e.bag.Add(diag.New("wrong-count", c.Span, "a dimension goes through two points, and here is one"))
		return false
	}
	p, ok1 := e.expr(c.Values[0]).(scene.Triple)
	q, ok2 := e.expr(c.Values[1]).(scene.Triple)
	if !ok1 || !ok2 {
		return false
	}
	if p.V == q.V {
		e.bag.Add(diag.New("points-coincide", c.Values[1].Span(), "the two points of the dimension are the same"))
		return false
	}
	d.Anchor, *size = scene.Linear{A: p.V, B: q.V}, mm(p.V.Dist(q.V))
	if d.Name == "" {
		d.Name = c.Values[0].Span().Text() + "–" + c.Values[1].Span().Text()
	}
	return true
}

// Figures are rounded to a tenth of a millimetre or of a degree unless another
// step is asked for, and zeros at the end are left out (common practice, no source).
var (
	usualLength = quantity.FromFloat(quantity.Length, 0.1)
	usualAngle  = quantity.FromFloat(quantity.Angle, 0.1)
)

// figure writes the figure of a dimension: lengths in mm without a unit.
func (e *evaluator) figure(m *check.Symbol, size quantity.Value) (string, bool) {
	n := m.Clauses["nearest"]
	if n == nil {
		return usualFigure(size), true
	}
	step, ok := e.expr(n.Values[0]).(scene.Quantity)
	if !ok {
		return "", false
	}
	style := styleOf(n.Values[0], step.Value)
	style.Bare = style.Unit == quantity.Millimetre
	s, err := quantity.FormatNearest(size, step.Value, style)
	if err != nil {
		e.checked(size, err, n.Values[0].Span())
		return "", false
	}
	return s, true
}

func usualFigure(size quantity.Value) string {
	step := usualLength
	if size.Kind() == quantity.Angle {
		step = usualAngle
	}
	style := quantity.StyleOf(step)
	style.Bare = true
	s, err := quantity.FormatNearest(size, step, style)
	if err != nil {
		return quantity.Format(size)
	}
	if strings.Contains(s, ".") {
		s = strings.TrimRight(strings.TrimRight(s, "0"), ".")
	}
	if size.Kind() == quantity.Angle {
		s += "°"
	}
	return s
}

// table makes a table of the things behind `of`.
func (e *evaluator) table(b *scene.Block, m *check.Symbol) {
	call, ok := e.call(m)
	if !ok {
		return
	}
	of := m.Clauses["of"]
	round := e.rounder(m)
	for _, s := range subjects(of.Values, call.Values["of"]) {
		t := &scene.Table{Name: m.Name, Span: m.Span, Title: e.text(m.Text), Of: []scene.Subject{s}, At: placeAt(call)}
		if d, ok := s.Value.(*scene.Development); ok {
			t.Rows = stationRows(d, round)
			if t.Title == "" {
				t.Title = "True lengths of " + s.Name
			}
		} else {
			t.Rows = e.measureRows(s, m.Clauses["of"], round)
			if t.Title == "" {
				t.Title = s.Name
			}
		}
		b.Tables = append(b.Tables, t)
	}
}

// rounder is how the lengths of a table are written, with the unit for the header.
type rounder struct {
	step  quantity.Value
	style quantity.Style
	unit  string
}

func (e *evaluator) rounder(m *check.Symbol) rounder {
	r := rounder{step: usualLength, style: quantity.StyleOf(usualLength)}
	if n := m.Clauses["nearest"]; n != nil {
		if q, ok := e.expr(n.Values[0]).(scene.Quantity); ok {
			r.step, r.style = q.Value, styleOf(n.Values[0], q.Value)
		}
	}
	r.unit = r.style.Unit.String()
	r.style.Bare = true
	return r
}

func (r rounder) length(x float64) string {
	s, err := quantity.FormatNearest(mm(x), r.step, r.style)
	if err != nil {
		return quantity.Format(mm(x))
	}
	return s
}

// stationRows is the table of true lengths: every station in the order of the
// girth, its running place on the pattern from the seam (an angle at a cone's
// apex, a length along a cylinder's girth), and what of it is inside. Rounding is
// of running values, so that it does not add up.
func stationRows(d *scene.Development, r rounder) [][]string {
	header := []string{"No.", "from seam", "along girth " + r.unit, "true length " + r.unit, "from datum " + r.unit, "to " + r.unit}
	place := func(turn float64) string { return r.length(turn * d.Of.Root.Radius) }
	if !d.Of.Root.Cylinder {
		header[2], header[4] = "on pattern", "from apex "+r.unit
		sine := math.Abs(d.Of.Root.Radius-d.Of.Root.TopRadius) / math.Hypot(d.Of.Root.Radius-d.Of.Root.TopRadius, d.Of.Root.Height)
		place = func(turn float64) string { return figureOf(turn*sine, patternAngle) }
	}
	rows := [][]string{header}
	letters := 0
	for _, s := range d.Stations {
		no := fmt.Sprint(s.Number)
		if s.Number == 0 {
			letters++
			no = scene.Letter(letters)
		}
		turn := s.Theta - d.Seam
		row := []string{no, figureOf(turn, usualAngle), place(turn), r.length(s.Length())}
		if len(s.Spans) == 0 {
			row = append(row, "–", "–")
		} else {
			row = append(row, r.length(s.Spans[0].Lo), r.length(s.Spans[len(s.Spans)-1].Hi))
		}
		rows = append(rows, row)
	}
	return rows
}

// patternAngle is the step of angles at a cone's apex: at a radius of 1 m a
// hundredth of a degree is a sixth of a millimetre.
var patternAngle = quantity.FromFloat(quantity.Angle, 0.01)

// figureOf writes an angle given in radians to a step, with all its decimals.
func figureOf(rad float64, step quantity.Value) string {
	s, err := quantity.FormatNearest(quantity.FromRadians(rad), step, quantity.StyleOf(step))
	if err != nil {
		return quantity.Format(quantity.FromRadians(rad))
	}
	return s
}

// measureRows lists the measures of a thing.
func (e *evaluator) measureRows(s scene.Subject, of *check.Bound, r rounder) [][]string {
	rows := [][]string{{"measure", "value"}}
	kind := e.model.Kind(of.Values[0])
	for _, m := range forms.List(s.Value, kind) {
		if v := r.value(m.Value); v != "" {
			rows = append(rows, []string{strings.ReplaceAll(m.Name, "_", " "), v})
		}
	}
	return rows
}

// value writes a measure for a table; "" for what a table does not show.
func (r rounder) value(v scene.Value) string {
	switch v := v.(type) {
	case scene.Text:
		return string(v)
	case scene.Quantity:
		if v.Kind() == quantity.Length {
			return r.length(v.Float()) + " " + r.unit
		}
		return quantity.Format(quantity.FromFloat(v.Kind(), short(v.Float())))
	case scene.Triple:
		if v.Of == quantity.Length {
			return "(" + r.length(v.V.X) + ", " + r.length(v.V.Y) + ", " + r.length(v.V.Z) + ") " + r.unit
		}
	}
	return ""
}

// short rounds to six significant digits, for tables.
func short(x float64) float64 {
	if x == 0 {
		return 0
	}
	k := math.Pow(10, 5-math.Floor(math.Log10(math.Abs(x))))
	return math.Round(x*k) / k
}
