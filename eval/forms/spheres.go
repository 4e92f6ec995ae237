package forms

import (
	"epure/eval/scene"
	"epure/geom/body"
	"epure/geom/vec"
)

func sphere(c *Call) (scene.Value, *Fail) {
	r, f := c.radius("radius", "diameter")
	if f != nil {
		return nil, f
	}
	o := vec.V3{}
	if c.Has("centre") {
		o = c.point("centre", 0)
	}
	return ball(&scene.Primitive{Name: c.Name, Form: "sphere", Base: vec.World.At(o), Radius: r}), nil
}

// ball completes a sphere.
func ball(p *scene.Primitive) *scene.Solid {
	p.Angles = p.Base
	p.SideFace, p.BaseFace, p.TopFace = p.Name+".side", p.Name+".base", p.Name+".top"
	s := &scene.Solid{Name: p.Name, Body: body.Ball(p.Name, p.Base.O, p.Radius), Root: p}
	s.Whole = s
	return s
}

func sphereSolidMeasures() map[string]MeasureFunc {
	all := featureMeasures()
	ms := map[string]MeasureFunc{}
	for _, name := range []string{"volume", "area", "centroid", "side"} {
		ms[name] = all[name]
	}
	// Seen from anywhere a sphere shows a circle: the one that faces the front stands for it.
	front := func(s *scene.Solid) scene.Circle {
		return scene.Circle{F: vec.PlaneFrame(s.Root.Base.O, vec.V3{Y: -1}), R: s.Root.Radius, Sphere: true}
	}
	ms["radius"] = solidFunc(func(s *scene.Solid) (Measured, *Fail) {
		return Measured{length(s.Root.Radius), scene.Radius{Circle: front(s)}}, nil
	})
	ms["diameter"] = solidFunc(func(s *scene.Solid) (Measured, *Fail) {
		return Measured{length(2 * s.Root.Radius), scene.Diameter{Circle: front(s)}}, nil
	})
	ms["centre"] = solidFunc(func(s *scene.Solid) (Measured, *Fail) { return Measured{Value: point(s.Root.Base.O)}, nil })
	return ms
}
