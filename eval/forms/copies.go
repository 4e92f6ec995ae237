package forms

import (
	"epure/eval/scene"
	"epure/geom/body"
	"epure/geom/surface"
	"epure/geom/vec"
)

// copyOf makes a solid or part again somewhere else: mirrored first, then turned, then moved. It is
// declared and cut anew, so that its angles start where those of any solid do and its faces carry its own name.
func copyOf(c *Call) (scene.Value, *Fail) {
	of := c.Values["of"][0].(*scene.Solid)
	m := vec.Still
	if c.Has("mirror") {
		p := c.Values["mirror"][0].(*scene.Plane)
		m = vec.Mirror(p.F.O, p.F.Z)
	}
	if c.Has("turn") {
		l := c.Values["about"][0].(*scene.Line)
		sin, cos := sincos(c.Values["turn"][0])
		m = m.Then(vec.Turn(l.Through, l.Along, sin, cos))
	}
	if c.Has("at") {
		m = m.Then(vec.Shift(c.point("at", 0).Sub(m.Point(of.Root.Base.O))))
	}
	whole := moved(of.Root, c.Name, m)
	if of.Whole == of {
		return whole, nil
	}
	s := &scene.Solid{Name: c.Name, Body: whole.Body, Root: whole.Root, Whole: whole}
	for _, p := range of.Cuts {
		face := of.Body.Faces[of.Body.FaceIndex(p.Name)].Surface.(surface.Plane)
		b, err := s.Body.Cut(surface.Plane{F: m.Frame(face.F)}, p.Name)
		if err != nil {
			panic(err) // what cut the solid cuts its copy
		}
		s.Body, s.Cuts = b, append(s.Cuts, &scene.Plane{Name: p.Name, F: m.Frame(p.F)})
	}
	return s, nil
}

// moved is the uncut solid of a primitive, moved and under a new name.
func moved(p *scene.Primitive, name string, m vec.Motion) *scene.Solid {
	q := &scene.Primitive{Name: name, Form: p.Form, Cylinder: p.Cylinder, Radius: p.Radius, TopRadius: p.TopRadius, Height: p.Height}
	if p.Outline == nil {
		q.Base = baseOn(m.Point(p.Base.O), m.Dir(p.Base.Z))
		return solid(q)
	}
	q.Outline = &scene.Outline{Name: p.Outline.Name, F: m.Frame(p.Outline.F), Even: p.Outline.Even}
	for _, corner := range p.Outline.Corners {
		if m.Reflects() {
			corner.Y = 0 - corner.Y
		}
		q.Outline.Corners = append(q.Outline.Corners, corner)
	}
	q.Apex = m.Point(p.Apex)
	var b *body.Body
	var err error
	if p.Form == "prism" {
		b, err = body.Prism(name, q.Outline.F, q.Outline.Corners, m.Dir(p.Apex.Sub(p.Base.O)))
	} else {
		high, cut := p.Outline.F.Local(p.Apex).Z, 0.0
		if p.Height < high {
			cut = p.Height / high
		}
		b, err = body.Pyramid(name, q.Outline.F, q.Outline.Corners, q.Apex, cut)
	}
	if err != nil {
		panic(err) // the outline stood before
	}
	return polyhedron(q, b)
}
