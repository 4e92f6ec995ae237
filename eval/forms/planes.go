package forms

import (
	"math"

	"epure/eval/scene"
	"epure/geom/vec"
)

// Reference returns the reference plane with the name, or nil.
func Reference(name string) *scene.Plane {
	switch name {
	case "ground":
		return &scene.Plane{Name: name, F: vec.PlaneFrame(vec.V3{}, vec.V3{Z: 1})}
	case "frontal":
		return &scene.Plane{Name: name, F: vec.PlaneFrame(vec.V3{}, vec.V3{Y: -1})}
	case "side":
		return &scene.Plane{Name: name, F: vec.PlaneFrame(vec.V3{}, vec.V3{X: 1})}
	}
	return nil
}

func plane(c *Call) (scene.Value, *Fail) {
	points := len(c.Values["through"])
	alone := !c.Has("normal") && !c.Has("along") && !c.Has("tilt")
	switch {
	case alone && points != 3:
		return nil, fail("wrong-count", "through", "a plane by points needs three of them, and there %s", are(points)).
			way("give three points, or add `normal`, `along` or `tilt … facing …` to one point")
	case !alone && points != 1:
		return nil, fail("wrong-count", "through", "`through` takes one point beside `normal`, `along` or `tilt`, and there %s", are(points))
	}
	a := c.point("through", 0)
	switch {
	case c.Has("normal"):
		n, f := c.unit("normal", 0)
		if f != nil {
			return nil, f
		}
		return &scene.Plane{Name: c.Name, F: vec.PlaneFrame(a, n)}, nil
	case c.Has("along"):
		return planeAlong(c, a)
	case c.Has("tilt"):
		return planeTilted(c, a)
	}
	return planeThrough(c, a)
}

func are(n int) string {
	switch n {
	case 1:
		return "is one"
	case 2:
		return "are two"
	}
	return "are three"
}

func planeThrough(c *Call, a vec.V3) (scene.Value, *Fail) {
	u, v := c.point("through", 1).Sub(a), c.point("through", 2).Sub(a)
	n := u.Cross(v)
	if n.Len() <= inLine*u.Len()*v.Len() {
		return nil, fail("points-in-line", "through", "the three points lie in one line, so they fix no plane").at(2)
	}
	return &scene.Plane{Name: c.Name, F: vec.PlaneFrame(a, climbing(n.Unit()))}, nil
}

// inLine is the sine of the angle under which two directions count as one:
// rounding of coordinates entered as decimals leaves about 1e-15.
const inLine = 1e-13

func planeAlong(c *Call, a vec.V3) (scene.Value, *Fail) {
	if len(c.Values["along"]) != 2 {
		return nil, fail("wrong-count", "along", "a plane needs two directions after `along`, and there is one").
			way("add a second direction, as in `along d, e`")
	}
	d, f := c.unit("along", 0)
	if f != nil {
		return nil, f
	}
	e, f := c.unit("along", 1)
	if f != nil {
		return nil, f
	}
	n := d.Cross(e)
	if n.Len() <= inLine {
		return nil, fail("directions-parallel", "along", "the two directions are parallel, so they fix no plane").at(1)
	}
	return &scene.Plane{Name: c.Name, F: vec.PlaneFrame(a, climbing(n.Unit())), Along: []vec.V3{d, e}}, nil
}

func planeTilted(c *Call, a vec.V3) (scene.Value, *Fail) {
	st, ct := sincos(c.Values["tilt"][0])
	if st < 0 || ct < 0 {
		return nil, fail("out-of-range", "tilt", "`tilt` is an angle from 0° to 90°").because("it is %s", show(c.Values["tilt"][0])).
			way("turn `facing` by 180° for a plane that falls the other way")
	}
	sf, cf := sincos(c.Values["facing"][0])
	return &scene.Plane{Name: c.Name, F: vec.PlaneFrame(a, vec.V3{X: st * cf, Y: st * sf, Z: ct})}, nil
}

// climbing turns a normal upward, and leaves that of an upright plane.
func climbing(n vec.V3) vec.V3 {
	if n.Z < -vec.LevelSine {
		return n.Neg()
	}
	return n
}

func planeMeasures() map[string]MeasureFunc {
	of := func(f func(p *scene.Plane) (Measured, *Fail)) MeasureFunc {
		return func(v scene.Value, _ []scene.Value) (Measured, *Fail) { return f(v.(*scene.Plane)) }
	}
	return map[string]MeasureFunc{
		"normal": of(func(p *scene.Plane) (Measured, *Fail) { return Measured{Value: direction(p.F.Z)}, nil }),
		"tilt": of(func(p *scene.Plane) (Measured, *Fail) {
			return Measured{Value: degrees(math.Atan2(math.Hypot(p.F.Z.X, p.F.Z.Y), math.Abs(p.F.Z.Z)))}, nil
		}),
		"facing": of(func(p *scene.Plane) (Measured, *Fail) {
			n := climbing(p.F.Z)
			if vertical(n) {
				return Measured{}, fail("no-such-measure", "", "a level plane falls nowhere, so it faces nowhere")
			}
			return Measured{Value: degrees(turn(math.Atan2(n.Y, n.X)))}, nil
		}),
		"horizontal_trace": of(func(p *scene.Plane) (Measured, *Fail) { return trace(p, vec.V3{Z: 1}, "ground") }),
		"vertical_trace":   of(func(p *scene.Plane) (Measured, *Fail) { return trace(p, vec.V3{Y: 1}, "frontal plane") }),
	}
}

// trace is the line in which p meets the reference plane through the origin with normal m.
func trace(p *scene.Plane, m vec.V3, name string) (Measured, *Fail) {
	d := p.F.Z.Cross(m)
	if d.Len() < vec.LevelSine {
		return Measured{}, fail("no-such-measure", "", "the plane is parallel to the %s, so it has no trace there", name)
	}
	// The foot of the plane's origin on the trace, within the plane.
	down := p.F.Z.Cross(d.Unit())
	s := down.Dot(m)
	o := p.F.O.Along(down, -p.F.O.Dot(m)/s)
	return Measured{Value: &scene.Line{Name: p.Name + " trace", Through: o.Along(m, -o.Dot(m)), Along: d.Unit()}}, nil
}
