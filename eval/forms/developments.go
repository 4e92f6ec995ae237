package forms

import (
	"math"

	"epure/eval/scene"
	"epure/geom/flat"
	"epure/geom/surface"
	"epure/geom/vec"
	"epure/lang/quantity"
)

// The range of even divisions: three make a turn, and more than one a degree
// is no help to anybody at the bench.
const minDivisions, maxDivisions, usualDivisions = 3, 360, 12

func development(c *Call) (scene.Value, *Fail) {
	of := c.Values["of"][0].(*scene.Solid)
	d := &scene.Development{Name: c.Name, Of: of, Divisions: usualDivisions, InsideUp: c.Has("up") && c.Words["up"][0] == "inside"}
	if of.Root.Side == nil {
		return nil, fail("cannot-unroll", "of", "%s cannot be unrolled", of.Name).because("this version unrolls cones and cylinders")
	}
	label := of.Root.SideFace
	if c.Has("face") {
		label = c.Values["face"][0].(*scene.Face).Label
	}
	if d.Face = of.Body.FaceIndex(label); d.Face < 0 {
		return nil, fail("no-such-feature", "of", "nothing is left of the curved face of %s", of.Name)
	}
	if _, ok := of.Body.Faces[d.Face].Surface.(surface.Ruled); !ok {
		return nil, fail("not-curved", "face", "%s is flat already", label).way("draw it with `true_shape`, or leave `face` out for the curved face")
	}
	if c.Has("divisions") {
		n := c.mm("divisions")
		if n != math.Trunc(n) || n < minDivisions || n > maxDivisions {
			return nil, fail("out-of-range", "divisions", "`divisions` is a whole number from %d to %d", minDivisions, maxDivisions).because("it is %s", show(c.Values["divisions"][0]))
		}
		d.Divisions = int(n)
	}
	if f := c.seam(d); f != nil {
		return nil, f
	}
	p, err := flat.Of(of.Body, d.Face, flat.Options{Seam: d.Seam, Divisions: d.Divisions, Inside: d.InsideUp})
	if err != nil {
		return nil, fail("cannot-unroll", "of", "the curved face of %s cannot be unrolled", of.Name).because("%v", err)
	}
	d.Pattern = p
	return d, nil
}

// seam reads the seam: an angle, or a generator of the same solid.
func (c *Call) seam(d *scene.Development) *Fail {
	if !c.Has("seam") {
		return nil
	}
	l, ok := c.Values["seam"][0].(*scene.Line)
	switch {
	case !ok:
		d.Seam = radians(c.Values["seam"][0])
	case l.Generator == nil || l.Generator.Whole != d.Of.Whole:
		return fail("not-a-generator", "seam", "the seam must be a generator of %s", d.Of.Name).way("write `seam %s.generator(180°)`, or the angle alone", d.Of.Name)
	default:
		d.Seam = l.Theta
	}
	return nil
}

// patternFunc lifts a function of a development.
func patternFunc(f func(d *scene.Development) Measured) MeasureFunc {
	return func(v scene.Value, _ []scene.Value) (Measured, *Fail) { return f(v.(*scene.Development)), nil }
}

// ofCone lifts a measure that only the development of a cone has.
func ofCone(what string, f func(p *flat.Pattern) (float64, bool), m func(x float64) Measured) MeasureFunc {
	return func(v scene.Value, _ []scene.Value) (Measured, *Fail) {
		x, ok := f(v.(*scene.Development).Pattern)
		if !ok {
			return Measured{}, fail("no-such-measure", "", "the pattern of a cylinder has no %s", what)
		}
		return m(x), nil
	}
}

func developmentMeasures() map[string]MeasureFunc {
	return map[string]MeasureFunc{
		"area": patternFunc(func(d *scene.Development) Measured { return Measured{Value: area(d.Area())} }),
		"width": patternFunc(func(d *scene.Development) Measured {
			lo, hi := d.Bounds()
			return Measured{length(d.Width()), scene.FlatLinear{A: lo, B: vec.V2{X: hi.X, Y: lo.Y}}}
		}),
		"height": patternFunc(func(d *scene.Development) Measured {
			lo, hi := d.Bounds()
			return Measured{length(d.Height()), scene.FlatLinear{A: lo, B: vec.V2{X: lo.X, Y: hi.Y}}}
		}),
		"cut_length": patternFunc(func(d *scene.Development) Measured { return Measured{Value: length(d.CutLength())} }),
		"sector": ofCone("sector", (*flat.Pattern).Sector, func(x float64) Measured {
			return Measured{degrees(x), scene.FlatAngle{From: 0, To: x}}
		}),
		"outer_radius": ofCone("outer radius", (*flat.Pattern).OuterRadius, func(x float64) Measured {
			return Measured{length(x), scene.FlatRadius{R: x}}
		}),
		"inner_radius": ofCone("inner radius", (*flat.Pattern).InnerRadius, func(x float64) Measured {
			return Measured{length(x), scene.FlatRadius{R: x}}
		}),
		"girth": patternFunc(func(d *scene.Development) Measured { return Measured{Value: length(d.Girth())} }),
		"stepped_girth": patternFunc(func(d *scene.Development) Measured {
			return Measured{Value: length(d.SteppedGirth(d.Divisions))}
		}),
		"step_loss": patternFunc(func(d *scene.Development) Measured {
			return Measured{Value: length(d.Girth() - d.SteppedGirth(d.Divisions))}
		}),
		"deviation":   patternFunc(func(d *scene.Development) Measured { return Measured{Value: length(d.Deviation())} }),
		"count":       patternFunc(func(d *scene.Development) Measured { return Measured{Value: number(float64(len(d.Loops)))} }),
		"true_length": trueLength,
		"flat": func(v scene.Value, args []scene.Value) (Measured, *Fail) {
			d, p := v.(*scene.Development), args[0].(scene.Triple).V
			q, err := d.Flat(p)
			if err != nil {
				return Measured{}, fail("not-on-face", "", "the point does not lie on the face that %s unrolls", d.Name).because("%v", err)
			}
			return Measured{Value: place(q)}, nil
		},
	}
}

func trueLength(v scene.Value, args []scene.Value) (Measured, *Fail) {
	d, q := v.(*scene.Development), args[0].(scene.Quantity)
	if q.Kind() == quantity.Angle {
		return Measured{Value: length(d.TrueLength(radians(q)))}, nil
	}
	n := q.Float()
	if n != math.Trunc(n) || n < 1 || int(n) > d.Divisions {
		return Measured{}, fail("out-of-range", "", "%s has the divisions 1 to %d", d.Name, d.Divisions).because("%s was asked for", show(q))
	}
	x, _ := d.TrueLengthAt(int(n))
	m := Measured{Value: length(x)}
	for _, s := range d.Stations {
		if s.Number == int(n) && len(s.Spans) > 0 {
			m.Anchor = scene.FlatLinear{A: s.Spans[0].Low, B: s.Spans[len(s.Spans)-1].High}
			break
		}
	}
	return m, nil
}

func titles(c *Call) (scene.Value, *Fail) {
	text := func(word string) string {
		if !c.Has(word) {
			return ""
		}
		return string(c.Values[word][0].(scene.Text))
	}
	return &scene.Titles{
		Owner: text("owner"), Number: text("number"), Revision: text("revision"), Date: text("date"),
		Department: text("department"), Reference: text("reference"), Creator: text("creator"), Approval: text("approval"),
		DocumentType: text("document_type"), Status: text("status"), Supplement: text("supplement"), Language: text("language"),
		Material: text("material"), Tolerance: text("tolerance"), Sheet: text("sheet"), Sheets: text("sheets"),
	}, nil
}
