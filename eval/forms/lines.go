package forms

import (
	"math"

	"epure/eval/scene"
	"epure/geom/vec"
)

func line(c *Call) (scene.Value, *Fail) {
	a := c.point("through", 0)
	two := len(c.Values["through"]) == 2
	switch {
	case two && c.Has("along"):
		return nil, fail("clause-conflict", "along", "a line through two points takes no `along`")
	case !two && !c.Has("along"):
		return nil, fail("missing-clause", "through", "a line needs a second point after `through`, or `along` and a direction")
	}
	if !two {
		d, f := c.unit("along", 0)
		if f != nil {
			return nil, f
		}
		return &scene.Line{Name: c.Name, Through: a, Along: d}, nil
	}
	b := c.point("through", 1)
	if a == b {
		return nil, fail("points-coincide", "through", "the two points of the line are the same").at(1)
	}
	return segment(c.Name, a, b), nil
}

// segment is the line from a to b, with ends.
func segment(name string, a, b vec.V3) *scene.Line {
	return &scene.Line{Name: name, Through: a, Along: b.Sub(a).Unit(), Ends: true, From: a, To: b}
}

func lineMeasures() map[string]MeasureFunc {
	of := func(f func(l *scene.Line) (Measured, *Fail)) MeasureFunc {
		return func(v scene.Value, _ []scene.Value) (Measured, *Fail) { return f(v.(*scene.Line)) }
	}
	return map[string]MeasureFunc{
		"true_length": of(func(l *scene.Line) (Measured, *Fail) {
			if !l.Ends {
				return Measured{}, fail("no-such-measure", "", "a line along a direction has no ends, so it has no true length")
			}
			return Measured{length(l.From.Dist(l.To)), scene.Linear{A: l.From, B: l.To}}, nil
		}),
		"inclination": of(func(l *scene.Line) (Measured, *Fail) {
			return Measured{Value: degrees(math.Atan2(math.Abs(l.Along.Z), math.Hypot(l.Along.X, l.Along.Y)))}, nil
		}),
		"bearing": of(func(l *scene.Line) (Measured, *Fail) {
			if vertical(l.Along) {
				return Measured{}, fail("no-such-measure", "", "an upright line has no bearing")
			}
			return Measured{Value: degrees(turn(math.Atan2(l.Along.Y, l.Along.X)))}, nil
		}),
		"horizontal_trace": of(func(l *scene.Line) (Measured, *Fail) {
			return pierce(l, vec.V3{Z: 1}, "ground")
		}),
		"vertical_trace": of(func(l *scene.Line) (Measured, *Fail) {
			return pierce(l, vec.V3{Y: 1}, "frontal plane")
		}),
	}
}

// pierce is where the line meets the reference plane through the origin with normal n.
func pierce(l *scene.Line, n vec.V3, name string) (Measured, *Fail) {
	s := l.Along.Dot(n)
	if math.Abs(s) < vec.LevelSine {
		return Measured{}, fail("no-such-measure", "", "the line is parallel to the %s and does not meet it", name)
	}
	p := l.Through.Along(l.Along, -l.Through.Dot(n)/s)
	return Measured{Value: point(p.Along(n, -p.Dot(n)))}, nil
}

// vertical tells whether a unit direction is upright.
func vertical(d vec.V3) bool { return math.Hypot(d.X, d.Y) < vec.LevelSine }

// turn brings an angle in radians into [0, 2π).
func turn(a float64) float64 {
	if a < 0 {
		a += 2 * math.Pi
	}
	if a >= 2*math.Pi {
		a = 0
	}
	return a
}
