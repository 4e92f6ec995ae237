package eval

import (
	"math"

	"epure/eval/scene"
	"epure/geom/vec"
	"epure/lang/diag"
	"epure/lang/quantity"
	"epure/lang/source"
	"epure/lang/syntax"
)

// function works a built-in function out; check has seen to number and kinds of the arguments.
func (e *evaluator) function(name string, vs []scene.Value, c *syntax.Call) scene.Value {
	switch name {
	case "distance", "angle", "midpoint", "unit", "dot", "cross":
		return e.ofSpace(name, vs, c.Span())
	case "count":
		return scene.Quantity{Value: quantity.Whole(quantity.Number, int64(len(vs)))}
	}
	qs := make([]quantity.Value, len(vs))
	for i, v := range vs {
		qs[i] = v.(scene.Quantity).Value
	}
	v, err := ofQuantities(name, qs)
	return e.checked(v, err, c.Span())
}

func ofQuantities(name string, qs []quantity.Value) (quantity.Value, error) {
	switch name {
	case "sin":
		return quantity.Sin(qs[0])
	case "cos":
		return quantity.Cos(qs[0])
	case "tan":
		return quantity.Tan(qs[0])
	case "asin":
		return quantity.Asin(qs[0])
	case "acos":
		return quantity.Acos(qs[0])
	case "atan":
		return quantity.Atan(qs[0])
	case "atan2":
		return quantity.Atan2(qs[0], qs[1])
	case "sqrt":
		return quantity.Sqrt(qs[0])
	case "abs":
		return quantity.Abs(qs[0]), nil
	case "min":
		return quantity.Min(qs...)
	case "max":
		return quantity.Max(qs...)
	case "sum":
		return quantity.Sum(qs...)
	}
	return quantity.Round(qs[0], qs[1])
}

// ofSpace works the functions of points, directions, lines and planes out.
func (e *evaluator) ofSpace(name string, vs []scene.Value, span source.Span) scene.Value {
	size := func(k quantity.Kind, x float64) scene.Value {
		return scene.Quantity{Value: quantity.FromFloat(k, x)}
	}
	switch name {
	case "distance":
		return size(quantity.Length, distance(vs[0], vs[1]))
	case "angle":
		a, flatA, ok := heading(vs[0])
		b, flatB, ok2 := heading(vs[1])
		if !ok || !ok2 {
			return e.noDirection(span)
		}
		return scene.Quantity{Value: quantity.FromRadians(angle(a, b, flatA, flatB, folded(vs[0]) || folded(vs[1])))}
	case "unit":
		d, _, ok := heading(vs[0])
		if !ok {
			return e.noDirection(span)
		}
		return scene.Triple{V: d, Of: quantity.Number}
	}
	a, b := vs[0].(scene.Triple), vs[1].(scene.Triple)
	switch name {
	case "midpoint":
		return scene.Triple{V: a.V.Add(b.V).Scale(0.5), Of: quantity.Length}
	case "dot":
		k, _ := quantity.Times(a.Of, b.Of)
		return size(k, a.V.Dot(b.V))
	}
	return scene.Triple{V: a.V.Cross(b.V), Of: quantity.Number}
}

func (e *evaluator) noDirection(span source.Span) scene.Value {
	e.bag.Add(diag.New("no-direction", span, "(0, 0, 0) has no direction"))
	return unknown
}

// heading is the unit direction of a direction, line or plane (its normal); flat
// is true for a plane.
func heading(v scene.Value) (d vec.V3, flat, ok bool) {
	switch v := v.(type) {
	case *scene.Line:
		return v.Along, false, true
	case *scene.Plane:
		return v.F.Z, true, true
	case scene.Triple:
		return v.V.Unit(), false, v.V != vec.V3{}
	}
	return d, false, false
}

// folded tells whether a value has no sense, so that angles with it end at 90°.
func folded(v scene.Value) bool {
	switch v.(type) {
	case *scene.Line, *scene.Plane:
		return true
	}
	return false
}

// angle is the angle between two headings, in radians, accurate near 0 and π.
func angle(a, b vec.V3, flatA, flatB, fold bool) float64 {
	s, c := a.Cross(b).Len(), a.Dot(b)
	if flatA != flatB {
		return math.Atan2(math.Abs(c), s)
	}
	if fold {
		c = math.Abs(c)
	}
	return math.Atan2(s, c)
}

// parallel is the sine of the angle under which two lines or planes count as
// parallel: rounding of unit vectors leaves about 1e-15.
const parallel = 1e-12

// distance is the shortest distance between points, unbounded lines and planes, mm.
func distance(a, b scene.Value) float64 {
	if rank(a) > rank(b) {
		a, b = b, a
	}
	p, d := place(a)
	switch b := b.(type) {
	case scene.Triple:
		return p.Dist(b.V)
	case *scene.Plane:
		off := b.F.Local(p).Z
		if rank(a) > 0 && math.Abs(crossing(a, d, b)) > parallel {
			return 0
		}
		return math.Abs(off)
	case *scene.Line:
		to := b.Through.Sub(p)
		if rank(a) == 0 {
			return to.Cross(b.Along).Len()
		}
		n := d.Cross(b.Along)
		if n.Len() <= parallel {
			return to.Cross(b.Along).Len()
		}
		return math.Abs(to.Dot(n.Unit()))
	}
	return math.NaN()
}

// crossing is the sine of the angle at which a line or plane cuts the plane b; 0 when parallel.
func crossing(a scene.Value, d vec.V3, b *scene.Plane) float64 {
	if _, ok := a.(*scene.Plane); ok {
		return d.Cross(b.F.Z).Len()
	}
	return d.Dot(b.F.Z)
}

func rank(v scene.Value) int {
	switch v.(type) {
	case *scene.Line:
		return 1
	case *scene.Plane:
		return 2
	}
	return 0
}

// place is a point of a value and its direction.
func place(v scene.Value) (p, d vec.V3) {
	switch v := v.(type) {
	case scene.Triple:
		return v.V, d
	case *scene.Line:
		return v.Through, v.Along
	case *scene.Plane:
		return v.F.O, v.F.Z
	}
	return p, d
}
