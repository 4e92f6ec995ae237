package forms

import (
	"errors"
	"math"

	"epure/eval/scene"
	"epure/geom/body"
	"epure/geom/vec"
)

// onPlane is the frame of the plane in which an outline lies.
func (c *Call) onPlane() vec.Frame {
	if !c.Has("on") {
		return vec.PlaneFrame(vec.V3{}, vec.V3{Z: 1})
	}
	return c.Values["on"][0].(*scene.Plane).F
}

// centre is the centre of an outline in its plane.
func (c *Call) centre() vec.V2 {
	if !c.Has("centre") {
		return vec.V2{}
	}
	return c.Values["centre"][0].(scene.Pair).V
}

func rectangle(c *Call) (scene.Value, *Fail) {
	w, f := c.positive("width")
	if f != nil {
		return nil, f
	}
	d, f := c.positive("depth")
	if f != nil {
		return nil, f
	}
	o := &scene.Outline{Name: c.Name, F: c.onPlane(), Even: true}
	for _, s := range [4]vec.V2{{X: -1, Y: -1}, {X: 1, Y: -1}, {X: 1, Y: 1}, {X: -1, Y: 1}} {
		o.Corners = append(o.Corners, c.centre().Add(vec.V2{X: float64(s.X * w / 2), Y: float64(s.Y * d / 2)}))
	}
	return o, nil
}

// The range of sides of a regular polygon: with more it is a circle to anybody at the bench.
const minSides, maxSides = 3, 60

func regular(c *Call) (scene.Value, *Fail) {
	n := c.mm("sides")
	if n != math.Trunc(n) || n < minSides || n > maxSides {
		return nil, fail("out-of-range", "sides", "`sides` is a whole number from %d to %d", minSides, maxSides).because("it is %s", show(c.Values["sides"][0]))
	}
	word := "radius"
	if c.Has("across_flats") {
		word = "across_flats"
	}
	r, f := c.positive(word)
	if f != nil {
		return nil, f
	}
	if word == "across_flats" {
		r /= 2 * math.Cos(math.Pi/n)
	}
	sin, cos := 0.0, 1.0
	if c.Has("first") {
		sin, cos = sincos(c.Values["first"][0])
	}
	o := &scene.Outline{Name: c.Name, F: c.onPlane(), Even: true}
	x, y := vec.V2{X: r * cos, Y: r * sin}, vec.V2{X: -r * sin, Y: r * cos}
	for i := range int(n) {
		s, k := math.Sincos(2 * math.Pi * float64(i) / n)
		o.Corners = append(o.Corners, c.centre().Along(x, k).Along(y, s))
	}
	return o, nil
}

func outline(c *Call) (scene.Value, *Fail) {
	o := &scene.Outline{Name: c.Name, F: c.onPlane()}
	for _, v := range c.Values["through"] {
		o.Corners = append(o.Corners, v.(scene.Pair).V)
	}
	if len(o.Corners) < 3 {
		return nil, fail("wrong-count", "through", "an outline needs three corners at least, and there %s", are(len(o.Corners)))
	}
	if f := badOutline(body.CheckOutline(o.Corners), "through"); f != nil {
		return nil, f
	}
	return o, nil
}

// badOutline turns the failure of a polygon into words.
func badOutline(err error, clause string) *Fail {
	var bad *body.OutlineError
	switch {
	case err == nil:
		return nil
	case errors.As(err, &bad):
		return fail("bad-outline", clause, "the outline bounds no area that a solid could stand on").at(bad.Corner).because("%s", bad.Why)
	}
	panic(err) // a polygon fails in no other way
}

// centreOf is the centre of the area of an outline, in its plane.
func centreOf(o *scene.Outline) vec.V2 {
	ps := o.Corners
	var sum vec.V2
	for i := 1; i+1 < len(ps); i++ {
		u, v := ps[i].Sub(ps[0]), ps[i+1].Sub(ps[0])
		sum = sum.Along(u.Add(v), u.Cross(v)/6)
	}
	return ps[0].Along(sum, 1/body.Shoelace(ps))
}

func outlineMeasures() map[string]MeasureFunc {
	of := func(f func(o *scene.Outline) scene.Value) MeasureFunc {
		return func(v scene.Value, _ []scene.Value) (Measured, *Fail) {
			return Measured{Value: f(v.(*scene.Outline))}, nil
		}
	}
	return map[string]MeasureFunc{
		"area": of(func(o *scene.Outline) scene.Value { return area(math.Abs(body.Shoelace(o.Corners))) }),
		"perimeter": of(func(o *scene.Outline) scene.Value {
			sum := 0.0
			for i, p := range o.Corners {
				sum += p.Dist(o.Corners[(i+1)%len(o.Corners)])
			}
			return length(sum)
		}),
		"centroid": of(func(o *scene.Outline) scene.Value { return point(o.F.Lift(centreOf(o))) }),
	}
}

func prism(c *Call) (scene.Value, *Fail) {
	o := c.Values["on"][0].(*scene.Outline)
	h, f := c.positive("height")
	if f != nil {
		return nil, f
	}
	rise := o.F.Z.Scale(h)
	if c.Has("along") {
		d, f := c.unit("along", 0)
		if f != nil {
			return nil, f
		}
		up := d.Dot(o.F.Z)
		if up <= vec.LevelSine {
			return nil, fail("wrong-side", "along", "the edges of a prism leave the plane of its base on the side of the normal").
				because("the direction rises by %s for each mm", showMM(up))
		}
		rise = d.Scale(h / up)
	}
	b, err := body.Prism(c.Name, o.F, o.Corners, rise)
	if f := badOutline(err, "on"); f != nil {
		return nil, f
	}
	return polyhedron(&scene.Primitive{Name: c.Name, Form: "prism", Outline: o, Height: h, Apex: baseCentre(o).Add(rise)}, b), nil
}

func baseCentre(o *scene.Outline) vec.V3 { return o.F.Lift(centreOf(o)) }

func pyramid(c *Call) (scene.Value, *Fail) {
	o := c.Values["on"][0].(*scene.Outline)
	var apex vec.V3
	if c.Has("apex") {
		apex = c.point("apex", 0)
	} else {
		h, f := c.positive("height")
		if f != nil {
			return nil, f
		}
		apex = baseCentre(o).Along(o.F.Z, h)
	}
	high := o.F.Local(apex).Z
	if high <= 0 {
		return nil, fail("wrong-side", "apex", "the apex lies on the side of the plane's normal").
			because("it lies %s behind the plane of the base", showMM(-high))
	}
	cut := 0.0
	if c.Has("top_height") {
		h, f := c.positive("top_height")
		if f != nil {
			return nil, f
		}
		if h >= high {
			return nil, fail("out-of-range", "top_height", "`top_height` must be less than the height of the apex").
				because("it is %s, and the apex is %s high", showMM(h), showMM(high))
		}
		cut = h / high
	}
	b, err := body.Pyramid(c.Name, o.F, o.Corners, apex, cut)
	if f := badOutline(err, "on"); f != nil {
		return nil, f
	}
	p := &scene.Primitive{Name: c.Name, Form: "pyramid", Outline: o, Height: high, Apex: apex}
	if cut > 0 {
		p.Height = high * cut
	}
	return polyhedron(p, b), nil
}

// polyhedron completes a prism or pyramid.
func polyhedron(p *scene.Primitive, b *body.Body) *scene.Solid {
	p.Base = p.Outline.F.At(baseCentre(p.Outline))
	p.Angles = vec.AxisFrame(p.Base.O, p.Base.Z)
	p.SideFace, p.BaseFace, p.TopFace = p.Name+".side", p.Name+".base", p.Name+".top"
	s := &scene.Solid{Name: p.Name, Body: b, Root: p}
	s.Whole = s
	return s
}

// endCentre is the centre of the top, or the apex of a pyramid that has one.
func endCentre(s *scene.Solid) vec.V3 {
	o := s.Root.Base.O
	up := s.Root.Apex.Sub(o)
	return o.Along(up, s.Root.Height/up.Dot(s.Root.Base.Z))
}

func prismMeasures() map[string]MeasureFunc {
	ms := featureMeasures()
	delete(ms, "side")
	delete(ms, "generator")
	delete(ms, "edge")
	flatEnd := func(word string, label func(p *scene.Primitive) string) MeasureFunc {
		return solidFunc(func(s *scene.Solid) (Measured, *Fail) {
			if s.Body.FaceIndex(label(s.Root)) < 0 {
				return Measured{}, fail("no-such-measure", "", "a pyramid that ends in an apex has no top")
			}
			return Measured{Value: &scene.Face{Name: s.Name + "." + word, Solid: s, Label: label(s.Root)}}, nil
		})
	}
	ms["base"] = flatEnd("base", func(p *scene.Primitive) string { return p.BaseFace })
	ms["top"] = flatEnd("top", func(p *scene.Primitive) string { return p.TopFace })
	ms["axis"] = solidFunc(func(s *scene.Solid) (Measured, *Fail) {
		l := segment(s.Name+".axis", s.Root.Base.O, endCentre(s))
		return Measured{l, scene.Linear{A: l.From, B: l.To}}, nil
	})
	ms["height"] = solidFunc(func(s *scene.Solid) (Measured, *Fail) {
		return Measured{length(s.Root.Height), axisAnchor(s)}, nil
	})
	return ms
}

func pyramidMeasures() map[string]MeasureFunc {
	ms := prismMeasures()
	ms["apex"] = solidFunc(func(s *scene.Solid) (Measured, *Fail) { return Measured{Value: point(s.Root.Apex)}, nil })
	return ms
}
