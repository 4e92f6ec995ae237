package forms

import (
	"fmt"
	"math"
	"math/big"

	"epure/eval/scene"
	"epure/geom/body"
	"epure/geom/surface"
	"epure/geom/vec"
	"epure/lang/quantity"
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
	return again(of, c.Name, m), nil
}

// The range of members of a ring or row: more than a drawing can show apart, and few enough to be worked out at once.
const minMembers, maxMembers = 2, 1000

// members reads `count`.
func (c *Call) members() (int, *Fail) {
	n := c.mm("count")
	if n != math.Trunc(n) || n < minMembers || n > maxMembers {
		return 0, fail("out-of-range", "count", "`count` is a whole number from %d to %d", minMembers, maxMembers).because("it is %s", show(c.Values["count"][0]))
	}
	return int(n), nil
}

// ring makes copies evenly round a line; the first stands where the original does.
func ring(c *Call) (scene.Value, *Fail) {
	of, l := c.Values["of"][0].(*scene.Solid), c.Values["about"][0].(*scene.Line)
	n, f := c.members()
	if f != nil {
		return nil, f
	}
	g := &scene.Group{Name: c.Name}
	for i := range n {
		turn := quantity.FromRat(quantity.Angle, big.NewRat(360*int64(i), int64(n)))
		sin, cos := sincos(scene.Quantity{Value: turn})
		g.Solids = append(g.Solids, again(of, memberName(c.Name, i), vec.Turn(l.Through, l.Along, sin, cos)))
	}
	return g, nil
}

// row makes copies step by step; the first stands where the original does.
func row(c *Call) (scene.Value, *Fail) {
	of, step := c.Values["of"][0].(*scene.Solid), c.point("step", 0)
	n, f := c.members()
	if f != nil {
		return nil, f
	}
	if step == (vec.V3{}) {
		return nil, fail("no-direction", "step", "`step` needs a distance, and (0, 0, 0) is none")
	}
	g := &scene.Group{Name: c.Name}
	for i := range n {
		g.Solids = append(g.Solids, again(of, memberName(c.Name, i), vec.Shift(step.Scale(float64(i)))))
	}
	return g, nil
}

func memberName(group string, i int) string { return fmt.Sprintf("%s(%d)", group, i+1) }

// groupMeasures are the measures of rings and rows.
func groupMeasures() map[string]MeasureFunc {
	return map[string]MeasureFunc{
		"count": func(v scene.Value, _ []scene.Value) (Measured, *Fail) {
			return Measured{Value: number(float64(len(v.(*scene.Group).Solids)))}, nil
		},
		"volume": func(v scene.Value, _ []scene.Value) (Measured, *Fail) {
			sum := 0.0
			for _, s := range v.(*scene.Group).Solids {
				sum += s.Body.Volume()
			}
			return Measured{Value: volume(sum)}, nil
		},
	}
}

// again is a solid or part declared and cut anew under another name, moved.
func again(of *scene.Solid, name string, m vec.Motion) *scene.Solid {
	whole := moved(of.Root, name, m)
	if of.Whole == of {
		return whole
	}
	s := &scene.Solid{Name: name, Body: whole.Body, Root: whole.Root, Whole: whole}
	for _, p := range of.Cuts {
		face := of.Body.Faces[of.Body.FaceIndex(p.Name)].Surface.(surface.Plane)
		b, err := s.Body.Cut(surface.Plane{F: m.Frame(face.F)}, p.Name)
		if err != nil {
			panic(err) // what cut the solid cuts its copy
		}
		s.Body, s.Cuts = b, append(s.Cuts, &scene.Plane{Name: p.Name, F: m.Frame(p.F)})
	}
	return s
}

// moved is the uncut solid of a primitive, moved and under a new name.
func moved(p *scene.Primitive, name string, m vec.Motion) *scene.Solid {
	q := &scene.Primitive{Name: name, Form: p.Form, Cylinder: p.Cylinder, Radius: p.Radius, TopRadius: p.TopRadius, Height: p.Height}
	if p.Form == "sphere" {
		q.Base = vec.World.At(m.Point(p.Base.O))
		return ball(q)
	}
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
