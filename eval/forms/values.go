package forms

import (
	"math"

	"epure/eval/scene"
	"epure/geom/vec"
	"epure/lang/quantity"
)

// Wrappers from geometry's millimetres and radians to values of the language.

func number(x float64) scene.Value { return sized(quantity.Number, x) }
func length(x float64) scene.Value { return sized(quantity.Length, x) }
func area(x float64) scene.Value   { return sized(quantity.Area, x) }
func volume(x float64) scene.Value { return sized(quantity.Volume, x) }

func sized(k quantity.Kind, x float64) scene.Value {
	return scene.Quantity{Value: quantity.FromFloat(k, x)}
}

// degrees wraps an angle given in radians.
func degrees(rad float64) scene.Value { return scene.Quantity{Value: quantity.FromRadians(rad)} }
func point(p vec.V3) scene.Value      { return scene.Triple{V: p, Of: quantity.Length} }
func direction(d vec.V3) scene.Value  { return scene.Triple{V: d, Of: quantity.Number} }
func place(p vec.V2) scene.Value      { return scene.Pair{V: p, Of: quantity.Length} }

// mm reads a length, a plain number or an angle in degrees.
func mm(v scene.Value) float64 { return v.(scene.Quantity).Float() }

// sincos returns the sine and cosine of an angle, exact where they are rational.
func sincos(v scene.Value) (s, c float64) {
	q := v.(scene.Quantity).Value
	if q.Kind() == quantity.Ratio { // a slope, rise to run
		t := q.Float()
		h := math.Hypot(1, t)
		return t / h, 1 / h
	}
	sin, _ := quantity.Sin(q)
	cos, _ := quantity.Cos(q)
	return sin.Float(), cos.Float()
}

// radians returns an angle in radians.
func radians(v scene.Value) float64 { return mm(v) * (math.Pi / 180) }

// length of the i-th value of a clause in mm.
func (c *Call) mm(clause string) float64 { return mm(c.Values[clause][0]) }

// point returns a point value.
func (c *Call) point(clause string, i int) vec.V3 { return c.Values[clause][i].(scene.Triple).V }

// toward returns the direction (not yet of length one) that a value stands for.
func toward(v scene.Value) vec.V3 {
	switch v := v.(type) {
	case *scene.Line:
		return v.Along
	case scene.Triple:
		return v.V
	}
	return vec.V3{}
}

// unit returns the unit direction of the i-th value of a clause, or a Fail when it has no direction.
func (c *Call) unit(clause string, i int) (vec.V3, *Fail) {
	d := toward(c.Values[clause][i])
	if d == (vec.V3{}) {
		return d, fail("no-direction", clause, "`%s` needs a direction, and (0, 0, 0) has none", clause).at(i)
	}
	return d.Unit(), nil
}

// positive returns the length of a clause, or a Fail when it is not positive.
func (c *Call) positive(clause string) (float64, *Fail) {
	x := c.mm(clause)
	if x > 0 {
		return x, nil
	}
	return 0, fail("not-positive", clause, "`%s` must be greater than zero", clause).
		because("it is %s", show(c.Values[clause][0]))
}

// show writes a value for a message.
func show(v scene.Value) string {
	switch v := v.(type) {
	case scene.Quantity:
		return quantity.Format(v.Value)
	case scene.Text:
		return "“" + string(v) + "”"
	}
	return ""
}

// showMM writes a length in mm for a message.
func showMM(x float64) string { return show(length(x)) }
