package forms

import (
	"errors"
	"math"

	"epure/eval/scene"
	"epure/geom/curve"
	"epure/geom/cut"
	"epure/geom/vec"
)

func section(c *Call) (scene.Value, *Fail) {
	s, f := cutBy(c, "by")
	if f != nil {
		return nil, f
	}
	return s, nil
}

// cutBy makes the section of the solid behind `of` by the plane behind a clause.
func cutBy(c *Call, clause string) (*scene.Section, *Fail) {
	of, p := c.Values["of"][0].(*scene.Solid), c.Values[clause][0].(*scene.Plane)
	s, err := cut.Of(of.Body, p.Surface(), p.Along)
	var miss *cut.MissError
	switch {
	case errors.As(err, &miss):
		return nil, fail("plane-misses", clause, "%s does not meet %s", p.Name, of.Name).
			because("the plane passes the solid by %s", showMM(miss.Miss))
	case err != nil:
		panic(err) // Of fails in no other way
	}
	return &scene.Section{Name: c.Name, Section: s, Of: of, By: p}, nil
}

// sectionFunc lifts a function of a section.
func sectionFunc(f func(s *scene.Section) (Measured, *Fail)) MeasureFunc {
	return func(v scene.Value, _ []scene.Value) (Measured, *Fail) { return f(v.(*scene.Section)) }
}

// conicFunc lifts a function of the conic of a section of one of the kinds.
func conicFunc(what string, kinds []cut.Kind, f func(k *cut.Conic) Measured) MeasureFunc {
	return sectionFunc(func(s *scene.Section) (Measured, *Fail) {
		if s.Conic != nil {
			for _, k := range kinds {
				if s.Conic.Kind == k {
					return f(s.Conic), nil
				}
			}
		}
		return Measured{}, notOfKind(s, what)
	})
}

func notOfKind(s *scene.Section, what string) *Fail {
	return fail("no-such-measure", "", "%s has no %s", s.Name, what).because("its kind is %q", string(s.Kind))
}

var (
	anyConic = []cut.Kind{cut.Circle, cut.Ellipse, cut.Parabola, cut.Hyperbola}
	central  = []cut.Kind{cut.Circle, cut.Ellipse, cut.Hyperbola}
	openEnds = []cut.Kind{cut.Ellipse, cut.Parabola, cut.Hyperbola}
)

func sectionMeasures() map[string]MeasureFunc {
	return map[string]MeasureFunc{
		"kind":      sectionFunc(func(s *scene.Section) (Measured, *Fail) { return Measured{Value: scene.Text(s.Kind)}, nil }),
		"area":      sectionFunc(func(s *scene.Section) (Measured, *Fail) { return Measured{Value: area(s.Area)}, nil }),
		"length":    sectionFunc(func(s *scene.Section) (Measured, *Fail) { return Measured{Value: length(s.Length)}, nil }),
		"perimeter": sectionFunc(func(s *scene.Section) (Measured, *Fail) { return Measured{Value: length(s.Perimeter)}, nil }),
		"centroid": sectionFunc(func(s *scene.Section) (Measured, *Fail) {
			if s.Area == 0 {
				return Measured{}, notOfKind(s, "centroid")
			}
			return Measured{Value: point(s.Centroid)}, nil
		}),
		"eccentricity": conicFunc("eccentricity", anyConic, func(k *cut.Conic) Measured { return Measured{Value: number(k.Eccentricity)} }),
		"centre":       conicFunc("centre", central, func(k *cut.Conic) Measured { return Measured{Value: point(k.F.O)} }),
		"axis": conicFunc("axis", openEnds, func(k *cut.Conic) Measured {
			return Measured{Value: &scene.Line{Name: "axis", Through: k.F.O, Along: k.F.X}}
		}),
		"semi_major": conicFunc("semi-major axis", central, func(k *cut.Conic) Measured { return halfAxis(k.F.O, k.F.X, k.A) }),
		"semi_minor": conicFunc("semi-minor axis", central, func(k *cut.Conic) Measured { return halfAxis(k.F.O, k.F.Y, k.B) }),
		"linear_eccentricity": conicFunc("linear eccentricity", central, func(k *cut.Conic) Measured {
			c, _ := k.LinearEccentricity()
			return halfAxis(k.F.O, k.F.X, c)
		}),
		"focal_length": conicFunc("focal length", []cut.Kind{cut.Parabola}, func(k *cut.Conic) Measured { return halfAxis(k.F.O, k.F.X, k.A) }),
		"latus_rectum": conicFunc("latus rectum", anyConic, func(k *cut.Conic) Measured {
			l, f := k.LatusRectum(), k.Foci()[0]
			return Measured{length(l), scene.Linear{A: f.Along(k.F.Y, -l/2), B: f.Along(k.F.Y, l/2)}}
		}),
		"asymptote_angle": conicFunc("asymptotes", []cut.Kind{cut.Hyperbola}, func(k *cut.Conic) Measured {
			a, _ := k.AsymptoteAngle()
			s, c := math.Sincos(a)
			return Measured{degrees(a), scene.Angle{Apex: k.F.O, A: k.F.X, B: k.F.X.Scale(c).Along(k.F.Y, s)}}
		}),
		"radius": conicFunc("radius", []cut.Kind{cut.Circle}, func(k *cut.Conic) Measured {
			return Measured{length(k.A), scene.Radius{Circle: scene.Circle{F: k.F, R: k.A}}}
		}),
		"angle": sectionFunc(func(s *scene.Section) (Measured, *Fail) {
			if s.Kind != cut.TwoLines || s.Apex == nil {
				return Measured{}, notOfKind(s, "angle between lines")
			}
			a := scene.Angle{Apex: *s.Apex, A: s.Lines[0].U, B: s.Lines[1].U}
			return Measured{degrees(angleBetween(a.A, a.B)), a}, nil
		}),
		"focus":     numbered("focus", "foci", anyConic, func(k *cut.Conic) []scene.Value { return points(k.Foci()) }),
		"vertex":    numbered("vertex", "vertices", openEnds, func(k *cut.Conic) []scene.Value { return points(k.Vertices()) }),
		"directrix": numbered("directrix", "directrices", openEnds, func(k *cut.Conic) []scene.Value { return directrices(k.Directrices()) }),
		"point":     sectionPoint,
	}
}

// halfAxis is a length laid off from o along d.
func halfAxis(o, d vec.V3, l float64) Measured {
	return Measured{length(l), scene.Linear{A: o, B: o.Along(d, l)}}
}

func points(ps []vec.V3) []scene.Value {
	var out []scene.Value
	for _, p := range ps {
		out = append(out, point(p))
	}
	return out
}

func directrices(cs []curve.Curve) []scene.Value {
	var out []scene.Value
	for _, c := range cs {
		out = append(out, &scene.Line{Name: "directrix", Through: c.C, Along: c.U})
	}
	return out
}

// numbered is a measure of which there may be two.
func numbered(one, many string, kinds []cut.Kind, f func(k *cut.Conic) []scene.Value) MeasureFunc {
	return func(v scene.Value, args []scene.Value) (Measured, *Fail) {
		s := v.(*scene.Section)
		var got []scene.Value
		if m, bad := conicFunc(one, kinds, func(k *cut.Conic) Measured { got = f(k); return Measured{} })(v, nil); bad != nil {
			return m, bad
		}
		if len(args) == 0 {
			if len(got) == 1 {
				return Measured{Value: got[0]}, nil
			}
			return Measured{}, fail("needs-number", "", "%s has %d %s, so a number is needed", s.Name, len(got), many).
				way("write `%s(1)` for the higher one, then the one further right", one)
		}
		n := mm(args[0])
		if n != math.Trunc(n) || n < 1 || int(n) > len(got) {
			return Measured{}, fail("out-of-range", "", "%s has no %s number %s", s.Name, one, show(args[0])).because("there %s", isAre(len(got)))
		}
		return Measured{Value: got[int(n)-1]}, nil
	}
}

func isAre(n int) string {
	if n == 1 {
		return "is one"
	}
	return "are two"
}

func sectionPoint(v scene.Value, args []scene.Value) (Measured, *Fail) {
	s := v.(*scene.Section)
	p, ok := s.PointOn(radians(args[0]))
	if !ok {
		return Measured{}, fail("no-such-feature", "", "the plane does not meet the generator at %s", show(args[0]))
	}
	return Measured{Value: point(p)}, nil
}

// angleBetween is the angle between two unit directions, accurate near 0 and π.
func angleBetween(a, b vec.V3) float64 { return math.Atan2(a.Cross(b).Len(), a.Dot(b)) }

func focalSphere(c *Call) (scene.Value, *Fail) {
	s, f := cutBy(c, "touching")
	if f != nil {
		return nil, f
	}
	spheres := s.FocalSpheres()
	which := c.Words["which"]
	switch {
	case len(spheres) == 0:
		return nil, fail("no-focal-sphere", "touching", "no sphere touches %s and %s", s.Of.Name, s.By.Name).because("the section is of the kind %q", string(s.Kind))
	case len(spheres) == 1:
		if len(which) > 0 {
			return nil, fail("clause-conflict", "which", "there is only one focal sphere, so `which` has no meaning").because("the section is of the kind %q", string(s.Kind))
		}
		return &scene.Sphere{Name: c.Name, FocalSphere: spheres[0], Of: s}, nil
	case len(which) == 0:
		return nil, fail("missing-clause", "", "there are two focal spheres").way("add `which upper` or `which lower`")
	}
	i := 0
	if which[0] == "lower" {
		i = 1
	}
	return &scene.Sphere{Name: c.Name, FocalSphere: spheres[i], Of: s}, nil
}

func sphereMeasures() map[string]MeasureFunc {
	of := func(f func(s *scene.Sphere) Measured) MeasureFunc {
		return func(v scene.Value, _ []scene.Value) (Measured, *Fail) { return f(v.(*scene.Sphere)), nil }
	}
	return map[string]MeasureFunc{
		"centre": of(func(s *scene.Sphere) Measured { return Measured{Value: point(s.Centre)} }),
		"radius": of(func(s *scene.Sphere) Measured {
			return Measured{length(s.Radius), scene.Linear{A: s.Centre, B: s.Touch}}
		}),
		"touch": of(func(s *scene.Sphere) Measured { return Measured{Value: point(s.Touch)} }),
		"ring": of(func(s *scene.Sphere) Measured {
			return Measured{Value: &scene.Face{Name: s.Name + ".ring", Circle: &scene.Circle{F: s.Ring, R: s.RingR}}}
		}),
	}
}
