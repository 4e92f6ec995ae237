package forms

import (
	"math"
	"strings"

	"epure/eval/scene"
	"epure/geom/body"
	"epure/geom/surface"
	"epure/geom/vec"
)

// radius reads a radius stated as a radius or a diameter.
func (c *Call) radius(radius, diameter string) (float64, *Fail) {
	if c.Has(radius) {
		return c.positive(radius)
	}
	d, f := c.positive(diameter)
	return d / 2, f
}

func cone(c *Call) (scene.Value, *Fail) {
	r0, f := c.radius("radius", "diameter")
	if f != nil {
		return nil, f
	}
	h, f := c.positive("height")
	if f != nil {
		return nil, f
	}
	r1, word := 0.0, "top_radius"
	if c.Has("top_diameter") {
		word = "top_diameter"
	}
	if c.Has(word) {
		if r1, f = c.radius("top_radius", "top_diameter"); f != nil {
			return nil, f
		}
	}
	if r1 == r0 {
		return nil, fail("not-a-cone", word, "the top is as wide as the base, so this is a cylinder").way("write `cylinder` instead of `cone`")
	}
	base, f := c.baseFrame()
	if f != nil {
		return nil, f
	}
	return solid(&scene.Primitive{Name: c.Name, Form: "cone", Base: base, Radius: r0, TopRadius: r1, Height: h}), nil
}

func cylinder(c *Call) (scene.Value, *Fail) {
	r, f := c.radius("radius", "diameter")
	if f != nil {
		return nil, f
	}
	base, f := c.baseFrame()
	if f != nil {
		return nil, f
	}
	var h float64
	switch {
	case c.Has("height"):
		if h, f = c.positive("height"); f != nil {
			return nil, f
		}
	default:
		l, ok := c.axisLine()
		if !ok || !l.Ends {
			return nil, fail("missing-clause", "", "a cylinder needs a `height`, or an `axis` line with two ends")
		}
		h = l.From.Dist(l.To)
	}
	return solid(&scene.Primitive{Name: c.Name, Form: "cylinder", Cylinder: true, Base: base, Radius: r, TopRadius: r, Height: h}), nil
}

func (c *Call) axisLine() (*scene.Line, bool) {
	if !c.Has("axis") {
		return nil, false
	}
	l, ok := c.Values["axis"][0].(*scene.Line)
	return l, ok
}

// baseFrame is the frame of the base from `at` and `axis`.
func (c *Call) baseFrame() (vec.Frame, *Fail) {
	o, z := vec.V3{}, vec.V3{Z: 1}
	if c.Has("axis") {
		d, f := c.unit("axis", 0)
		if f != nil {
			return vec.Frame{}, f
		}
		z = d
	}
	if l, ok := c.axisLine(); ok {
		o = l.Through
	}
	if c.Has("at") {
		o = c.point("at", 0)
	}
	return baseOn(o, z), nil
}

// baseOn is the frame of a base about o whose Z runs along the unit vector z.
func baseOn(o, z vec.V3) vec.Frame {
	f := vec.AxisFrame(o, z)
	if f.Z.Dot(z) < 0 { // an axis that points down: turn the frame over
		f.Y, f.Z = f.Y.Neg(), f.Z.Neg()
	}
	return f
}

// solid completes a primitive and makes its body.
func solid(p *scene.Primitive) *scene.Solid {
	p.Angles = vec.AxisFrame(p.Base.O, p.Base.Z)
	p.SideFace, p.BaseFace, p.TopFace = p.Name+".side", p.Name+".base", p.Name+".top"
	b := body.Frustum(p.Name, p.Base, p.Angles, p.Radius, p.TopRadius, p.Height)
	p.Side, _ = b.Faces[b.FaceIndex(p.SideFace)].Surface.(surface.Ruled)
	if !p.Cylinder {
		k := p.Radius / (p.Radius - p.TopRadius)
		p.Apex = p.Base.O.Along(p.Base.Z, p.Height*k)
		p.SlantOfWhole = math.Abs(k) * math.Hypot(p.Radius-p.TopRadius, p.Height)
	}
	s := &scene.Solid{Name: p.Name, Body: b, Root: p}
	s.Whole = s
	return s
}

// rim is the point of the base (top: of the top) circle at the angle with the sine and cosine.
func rim(p *scene.Primitive, sin, cos float64, top bool) vec.V3 {
	o, r := p.Base.O, p.Radius
	if top {
		o, r = o.Along(p.Base.Z, p.Height), p.TopRadius
	}
	return o.Along(p.Angles.X, r*cos).Along(p.Angles.Y, r*sin)
}

// generatorOf is the generator of the whole solid, from base to top.
func generatorOf(s *scene.Solid, name string, angle scene.Value) *scene.Line {
	sin, cos := sincos(angle)
	l := segment(name, rim(s.Root, sin, cos, false), rim(s.Root, sin, cos, true))
	l.Generator, l.Theta = s, radians(angle)
	return l
}

// solidFunc lifts a function of a solid.
func solidFunc(f func(s *scene.Solid) (Measured, *Fail)) MeasureFunc {
	return func(v scene.Value, _ []scene.Value) (Measured, *Fail) { return f(v.(*scene.Solid)) }
}

func axisAnchor(s *scene.Solid) scene.Anchor {
	return scene.Linear{A: s.Root.Base.O, B: s.Root.Base.O.Along(s.Root.Base.Z, s.Root.Height)}
}

// end is the round end of an uncut solid.
func end(s *scene.Solid, top bool) *scene.Circle {
	f, r := s.Root.Base, s.Root.Radius
	f.Z, f.Y = f.Z.Neg(), f.Y.Neg() // out of the solid
	if top {
		f, r = s.Root.Base.At(s.Root.Base.O.Along(s.Root.Base.Z, s.Root.Height)), s.Root.TopRadius
	}
	return &scene.Circle{F: f, R: r}
}

// faceArea is the area of the face with the label, 0 when it is gone.
func faceArea(s *scene.Solid, label string) float64 {
	i := s.Body.FaceIndex(label)
	if i < 0 {
		return 0
	}
	return s.Body.FaceArea(i)
}

// lateralArea is the area of the curved face, or of the sides of a prism or pyramid.
func lateralArea(s *scene.Solid) float64 {
	if s.Root.Outline == nil {
		return faceArea(s, s.Root.SideFace)
	}
	sum := 0.0
	for i, f := range s.Body.Faces {
		if strings.HasPrefix(f.Label, s.Root.SideFace+"(") {
			sum += s.Body.FaceArea(i)
		}
	}
	return sum
}

// featureMeasures are the measures that every solid has.
func featureMeasures() map[string]MeasureFunc {
	plain := func(f func(s *scene.Solid) scene.Value) MeasureFunc {
		return solidFunc(func(s *scene.Solid) (Measured, *Fail) { return Measured{Value: f(s)}, nil })
	}
	return map[string]MeasureFunc{
		"volume":       plain(func(s *scene.Solid) scene.Value { return volume(s.Body.Volume()) }),
		"lateral_area": plain(func(s *scene.Solid) scene.Value { return area(lateralArea(s)) }),
		"base_area":    plain(func(s *scene.Solid) scene.Value { return area(faceArea(s, s.Root.BaseFace)) }),
		"top_area":     plain(func(s *scene.Solid) scene.Value { return area(faceArea(s, s.Root.TopFace)) }),
		"area": plain(func(s *scene.Solid) scene.Value {
			sum := 0.0
			for i := range s.Body.Faces {
				sum += s.Body.FaceArea(i)
			}
			return area(sum)
		}),
		"centroid": plain(func(s *scene.Solid) scene.Value { return point(s.Body.Centroid()) }),
		"axis": solidFunc(func(s *scene.Solid) (Measured, *Fail) {
			if s.Root.Form == "sphere" {
				return Measured{}, fail("no-such-measure", "", "a sphere has no one axis")
			}
			l := segment(s.Name+".axis", s.Root.Base.O, s.Root.Base.O.Along(s.Root.Base.Z, s.Root.Height))
			return Measured{l, axisAnchor(s)}, nil
		}),
		"side": solidFunc(func(s *scene.Solid) (Measured, *Fail) {
			if s.Root.Outline != nil {
				return Measured{}, fail("no-such-measure", "", "%s has no curved face", s.Name)
			}
			return Measured{Value: &scene.Face{Name: s.Name + ".side", Solid: s, Label: s.Root.SideFace}}, nil
		}),
		"generator": generatorMeasure,
		"face":      faceMember,
		"edge":      edgeMember,
	}
}

func roundEnd(word string, top bool) MeasureFunc {
	return solidFunc(func(s *scene.Solid) (Measured, *Fail) {
		c := end(s, top)
		if c.R == 0 {
			return Measured{}, fail("no-such-measure", "", "a cone that ends in an apex has no top")
		}
		label := s.Root.BaseFace
		if top {
			label = s.Root.TopFace
		}
		return Measured{Value: &scene.Face{Name: s.Name + "." + word, Solid: s, Label: label, Circle: c}}, nil
	})
}

// dimensions are the stated sizes of cones and cylinders.
func dimensions(ms map[string]MeasureFunc) map[string]MeasureFunc {
	size := func(f func(s *scene.Solid) (float64, scene.Anchor)) MeasureFunc {
		return solidFunc(func(s *scene.Solid) (Measured, *Fail) {
			x, a := f(s)
			return Measured{length(x), a}, nil
		})
	}
	ms["height"] = size(func(s *scene.Solid) (float64, scene.Anchor) { return s.Root.Height, axisAnchor(s) })
	ms["radius"] = size(func(s *scene.Solid) (float64, scene.Anchor) {
		return s.Root.Radius, scene.Radius{Circle: *end(s, false)}
	})
	ms["diameter"] = size(func(s *scene.Solid) (float64, scene.Anchor) {
		return 2 * s.Root.Radius, scene.Diameter{Circle: *end(s, false)}
	})
	ms["base"], ms["top"] = roundEnd("base", false), roundEnd("top", true)
	return ms
}

func cylinderMeasures() map[string]MeasureFunc { return dimensions(featureMeasures()) }

func coneMeasures() map[string]MeasureFunc {
	ms := dimensions(featureMeasures())
	ms["top_radius"] = solidFunc(func(s *scene.Solid) (Measured, *Fail) {
		return Measured{length(s.Root.TopRadius), topAnchor(s, scene.Radius{Circle: *end(s, true)})}, nil
	})
	ms["top_diameter"] = solidFunc(func(s *scene.Solid) (Measured, *Fail) {
		return Measured{length(2 * s.Root.TopRadius), topAnchor(s, scene.Diameter{Circle: *end(s, true)})}, nil
	})
	ms["slant"] = solidFunc(func(s *scene.Solid) (Measured, *Fail) {
		p := s.Root
		x := math.Hypot(p.Height, p.Radius-p.TopRadius)
		return Measured{length(x), scene.Linear{A: rim(p, 0, 1, false), B: rim(p, 0, 1, true)}}, nil
	})
	ms["half_angle"] = solidFunc(func(s *scene.Solid) (Measured, *Fail) {
		p := s.Root
		wide := p.Base.O
		if p.TopRadius > p.Radius {
			wide = wide.Along(p.Base.Z, p.Height)
		}
		edge := rim(p, 0, 1, p.TopRadius > p.Radius)
		a := scene.Angle{Apex: p.Apex, A: wide.Sub(p.Apex).Unit(), B: edge.Sub(p.Apex).Unit()}
		return Measured{degrees(math.Atan2(math.Abs(p.Radius-p.TopRadius), p.Height)), a}, nil
	})
	ms["apex"] = solidFunc(func(s *scene.Solid) (Measured, *Fail) { return Measured{Value: point(s.Root.Apex)}, nil })
	return ms
}

// topAnchor is the anchor of a top that there is.
func topAnchor(s *scene.Solid, a scene.Anchor) scene.Anchor {
	if s.Root.TopRadius == 0 {
		return nil
	}
	return a
}

func circleMeasures() map[string]MeasureFunc {
	of := func(f func(c *scene.Circle) (scene.Value, scene.Anchor)) MeasureFunc {
		return func(v scene.Value, _ []scene.Value) (Measured, *Fail) {
			x, a := f(v.(*scene.Face).Circle)
			return Measured{x, a}, nil
		}
	}
	return map[string]MeasureFunc{
		"diameter":  of(func(c *scene.Circle) (scene.Value, scene.Anchor) { return length(2 * c.R), scene.Diameter{Circle: *c} }),
		"radius":    of(func(c *scene.Circle) (scene.Value, scene.Anchor) { return length(c.R), scene.Radius{Circle: *c} }),
		"centre":    of(func(c *scene.Circle) (scene.Value, scene.Anchor) { return point(c.F.O), nil }),
		"normal":    of(func(c *scene.Circle) (scene.Value, scene.Anchor) { return direction(c.F.Z), nil }),
		"area":      of(func(c *scene.Circle) (scene.Value, scene.Anchor) { return area(math.Pi * c.R * c.R), nil }),
		"perimeter": of(func(c *scene.Circle) (scene.Value, scene.Anchor) { return length(2 * math.Pi * c.R), nil }),
	}
}
