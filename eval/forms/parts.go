package forms

import (
	"errors"
	"fmt"
	"math"
	"slices"
	"strings"

	"epure/eval/scene"
	"epure/geom/body"
	"epure/geom/vec"
)

// sides are the side words of a part: what they keep, and the pair to use
// instead for a plane that is upright to them.
var sides = []struct {
	word, opposite string
	keep           vec.V3
}{
	{"above", "below", vec.V3{Z: 1}},
	{"below", "above", vec.V3{Z: -1}},
	{"left_of", "right_of", vec.V3{X: -1}},
	{"right_of", "left_of", vec.V3{X: 1}},
	{"in_front_of", "behind", vec.V3{Y: -1}},
	{"behind", "in_front_of", vec.V3{Y: 1}},
}

func part(c *Call) (scene.Value, *Fail) {
	of := c.Values["of"][0].(*scene.Solid)
	s := &scene.Solid{Name: c.Name, Body: of.Body, Root: of.Root, Cuts: slices.Clone(of.Cuts), Whole: of.Whole}
	for _, side := range sides {
		for i, v := range c.Values[side.word] {
			if f := cutOff(s, v.(*scene.Plane), side.word, side.keep); f != nil {
				return nil, f.at(i)
			}
		}
	}
	return s, nil
}

// cutOff keeps the part of s on one side of the plane.
func cutOff(s *scene.Solid, p *scene.Plane, word string, keep vec.V3) *Fail {
	lean := p.F.Z.Dot(keep)
	if math.Abs(lean) < vec.LevelSine {
		return fail("no-such-side", word, "`%s` has no meaning for a plane that is upright to it", word).
			because("every place has %s on both sides of %s, or on neither", axisOf(word), p.Name).way("write %s", otherSides(p))
	}
	boundary := p.Surface()
	if lean > 0 { // outward is away from what is kept
		boundary.F.Z, boundary.F.Y = boundary.F.Z.Neg(), boundary.F.Y.Neg()
	}
	b, err := s.Body.Cut(boundary, p.Name)
	var miss *body.CutError
	switch {
	case errors.As(err, &miss) && miss.Nothing:
		return fail("nothing-left", word, "nothing of %s lies %s %s", s.Root.Name, plainly(word), p.Name).
			because("the plane passes the solid by %s", showMM(miss.Miss))
	case errors.As(err, &miss):
		return fail("plane-misses", word, "%s does not cut %s: all of it lies %s the plane", p.Name, s.Root.Name, plainly(word)).
			because("the plane passes the solid by %s", showMM(miss.Miss))
	case err != nil:
		panic(err) // Cut fails in no other way
	}
	s.Body, s.Cuts = b, append(s.Cuts, p)
	return nil
}

func plainly(word string) string { return strings.ReplaceAll(word, "_", " ") }

func axisOf(word string) string {
	switch word {
	case "above", "below":
		return "points"
	case "left_of", "right_of":
		return "the same x"
	}
	return "the same y"
}

// otherSides offers the side words that a plane has.
func otherSides(p *scene.Plane) string {
	var words []string
	for _, side := range sides {
		if math.Abs(p.F.Z.Dot(side.keep)) >= vec.LevelSine {
			words = append(words, "`"+side.word+"`")
		}
	}
	return strings.Join(words, " or ")
}

func partMeasures() map[string]MeasureFunc {
	ms := featureMeasures()
	ms["corner"] = cornerMember
	return ms
}

// generatorMeasure is the generator at an angle: of a part, what is inside it.
func generatorMeasure(v scene.Value, args []scene.Value) (Measured, *Fail) {
	s := v.(*scene.Solid)
	if s.Root.Side == nil {
		return Measured{}, fail("no-such-feature", "", "%s has no generators", s.Name).because("only cones and cylinders have")
	}
	name := fmt.Sprintf("%s.generator(%s)", s.Name, show(args[0]))
	l := generatorOf(s, name, args[0])
	if s.Whole != s {
		pieces := s.Body.Rulings(s.Body.FaceIndex(s.Root.SideFace), l.Theta)
		if len(pieces) == 0 {
			return Measured{}, fail("no-such-feature", "", "nothing is left of the generator at %s", show(args[0]))
		}
		a, b := inside(s, l, pieces[0]), inside(s, l, pieces[len(pieces)-1])
		l.From, l.To = a.A, b.B
		l.Through = l.From
	}
	return Measured{l, scene.Linear{A: l.From, B: l.To}}, nil
}

// inside turns a piece of a ruling into the two points on the generator, from base to top.
func inside(s *scene.Solid, l *scene.Line, in body.Interval) scene.Linear {
	r := s.Root.Side.Ruling(l.Theta)
	a, b := r.O.Along(r.D, in.A), r.O.Along(r.D, in.B)
	if b.Sub(a).Dot(l.Along) < 0 {
		a, b = b, a
	}
	return scene.Linear{A: l.From.Along(l.Along, a.Sub(l.From).Dot(l.Along)), B: l.From.Along(l.Along, b.Sub(l.From).Dot(l.Along))}
}

// origin returns the faces of s that came from v, those that there still are.
func origin(s *scene.Solid, v scene.Value) []int {
	var out []int
	for _, i := range all(s) {
		if solid, ok := v.(*scene.Solid); ok {
			if strings.HasPrefix(s.Body.Faces[i].Label, solid.Root.Name+".") {
				out = append(out, i)
			}
		} else if i == s.Body.FaceIndex(label(v)) {
			out = append(out, i)
		}
	}
	return out
}

// label is the label of the face that lies on a plane or is a face.
func label(v scene.Value) string {
	if f, ok := v.(*scene.Face); ok {
		return f.Label
	}
	return nameOf(v)
}

// nameOf is how the source calls a plane, solid or face.
func nameOf(v scene.Value) string {
	switch v := v.(type) {
	case *scene.Plane:
		return v.Name
	case *scene.Solid:
		return v.Name
	case *scene.Face:
		return v.Name
	}
	return ""
}

func labels(s *scene.Solid, faces []int) string {
	var out []string
	for _, i := range faces {
		out = append(out, s.Body.Faces[i].Label)
	}
	return strings.Join(out, ", ")
}

func faceMember(v scene.Value, args []scene.Value) (Measured, *Fail) {
	s := v.(*scene.Solid)
	found := origin(s, args[0])
	switch len(found) {
	case 0:
		return Measured{}, fail("no-such-feature", "", "%s has no face from %s", s.Name, nameOf(args[0])).because("its faces are %s", labels(s, all(s)))
	case 1:
		label := s.Body.Faces[found[0]].Label
		return Measured{Value: &scene.Face{Name: s.Name + ".face(" + nameOf(args[0]) + ")", Solid: s, Label: label}}, nil
	}
	return Measured{}, fail("several-features", "", "%s has several faces from %s", s.Name, nameOf(args[0])).because("they are %s", labels(s, found))
}

// all are the faces of s that there still are.
func all(s *scene.Solid) []int {
	var out []int
	for i := range s.Body.Faces {
		if len(s.Body.FaceEdges(i)) > 0 {
			out = append(out, i)
		}
	}
	return out
}

func edgeMember(v scene.Value, args []scene.Value) (Measured, *Fail) {
	s := v.(*scene.Solid)
	a, b := origin(s, args[0]), origin(s, args[1])
	var found []body.Edge
	var pairs []string
	for _, e := range s.Body.Edges() {
		if joins(e, a, b) {
			found = append(found, e)
			pair := fmt.Sprintf("edge(%s, %s)", s.Body.Faces[e.A].Label, s.Body.Faces[e.B].Label)
			if !slices.Contains(pairs, pair) {
				pairs = append(pairs, pair)
			}
		}
	}
	name := fmt.Sprintf("%s.edge(%s, %s)", s.Name, nameOf(args[0]), nameOf(args[1]))
	switch len(pairs) {
	case 0:
		return Measured{}, fail("no-such-feature", "", "%s has no edge between %s and %s", s.Name, nameOf(args[0]), nameOf(args[1]))
	case 1:
		return Measured{Value: &scene.Edge{Name: name, Solid: s, Edges: found}}, nil
	}
	return Measured{}, fail("several-features", "", "%s has several edges between %s and %s", s.Name, nameOf(args[0]), nameOf(args[1])).
		because("they are %s", strings.Join(pairs, ", "))
}

func joins(e body.Edge, a, b []int) bool {
	return slices.Contains(a, e.A) && slices.Contains(b, e.B) || slices.Contains(a, e.B) && slices.Contains(b, e.A)
}

// cornerMember is the end that an edge of the first two faces shares with the third.
func cornerMember(v scene.Value, args []scene.Value) (Measured, *Fail) {
	s := v.(*scene.Solid)
	a, b, c := origin(s, args[0]), origin(s, args[1]), origin(s, args[2])
	var found []vec.V3
	for _, e := range s.Body.Edges() {
		if !joins(e, a, b) {
			continue
		}
		for _, p := range []vec.V3{e.Arc.Start(), e.Arc.End()} {
			if onOne(s, p, c) && !near(found, p, s.Body.Size()) {
				found = append(found, p)
			}
		}
	}
	names := fmt.Sprintf("%s, %s and %s", nameOf(args[0]), nameOf(args[1]), nameOf(args[2]))
	switch len(found) {
	case 0:
		return Measured{}, fail("no-such-feature", "", "%s has no corner between %s", s.Name, names)
	case 1:
		return Measured{Value: point(found[0])}, nil
	}
	var places []string
	for _, p := range found {
		places = append(places, fmt.Sprintf("(%s, %s, %s)", showMM(p.X), showMM(p.Y), showMM(p.Z)))
	}
	return Measured{}, fail("several-features", "", "%s has several corners between %s", s.Name, names).because("they lie at %s", strings.Join(places, " and "))
}

// samePlace is the distance, relative to a body's size, within which two ends
// are one corner: ends of edges are worked out to about 1e-13 of the size.
const samePlace = 1e-10

func onOne(s *scene.Solid, p vec.V3, faces []int) bool {
	for _, i := range faces {
		if math.Abs(s.Body.Faces[i].Surface.Value(p)) <= samePlace*s.Body.Size() {
			return true
		}
	}
	return false
}

func near(ps []vec.V3, p vec.V3, size float64) bool {
	for _, q := range ps {
		if q.Dist(p) <= samePlace*size {
			return true
		}
	}
	return false
}

func faceMeasures() map[string]MeasureFunc {
	return map[string]MeasureFunc{"area": func(v scene.Value, _ []scene.Value) (Measured, *Fail) {
		f := v.(*scene.Face)
		return Measured{Value: area(faceArea(f.Solid, f.Label))}, nil
	}}
}

func edgeMeasures() map[string]MeasureFunc {
	return map[string]MeasureFunc{"length": func(v scene.Value, _ []scene.Value) (Measured, *Fail) {
		sum := 0.0
		for _, e := range v.(*scene.Edge).Edges {
			sum += e.Arc.Length()
		}
		return Measured{Value: length(sum)}, nil
	}}
}
