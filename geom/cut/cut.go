// Package cut makes plane sections of solids: the whole conic in which the
// plane meets the curved surface, held by its kind and frame, and the outline
// of what lies inside the solid.
//
// The kind is decided once, from the most exact thing that is known: how the plane
// was laid, then the sign of a discriminant within the rounding of its
// inputs, else its value. The outline comes from the solid itself: it is the new face that
// the plane makes when it cuts, so that section and part can never differ.
package cut

import (
	"fmt"
	"math"

	"epure/geom/body"
	"epure/geom/curve"
	"epure/geom/num"
	"epure/geom/surface"
	"epure/geom/vec"
)

// Kind names what a plane and a curved surface have in common.
type Kind string

// The kinds of the contract.
const (
	Circle    Kind = "circle"
	Ellipse   Kind = "ellipse"
	Parabola  Kind = "parabola"
	Hyperbola Kind = "hyperbola"
	Point     Kind = "point"
	Line      Kind = "line"
	TwoLines  Kind = "two lines"
	Polygon   Kind = "polygon"
	Outline   Kind = "outline"
)

// Ground says why a Kind is what it is.
type Ground string

// The grounds.
const (
	ByConstruction Ground = "by construction" // the plane was laid along a generator, square to the axis ...
	ByBound        Ground = "within a bound"  // the discriminant is zero within the rounding of the inputs
	ByValue        Ground = "by value"        // the discriminant is not zero by more than its error
)

// Piece is a piece of a section's outline.
type Piece struct {
	Arc   curve.Arc
	Face  int  // index of the body's face that it lies on
	Chord bool // on a plane face: counted by the perimeter, not by the length
}

// Section is the section of a body by a plane.
type Section struct {
	Plane  vec.Frame
	Kind   Kind
	Ground Ground
	Conic  *Conic        // for circle, ellipse, parabola and hyperbola
	Lines  []curve.Curve // for line and two lines, each pointing away from a cone's apex or along a cylinder's axis
	Apex   *vec.V3       // for point, and for line and two lines of a cone
	Loops  [][]Piece     // closed outlines inside the solid, anticlockwise looking against the plane's normal; none where the plane only touches
	// Area in mm², Length (curved outline only, mm) and Perimeter (with chords, mm) of what lies inside the solid.
	Area, Length, Perimeter float64
	Centroid                vec.V3 // of the area

	body    *body.Body
	surface surface.Traced // nil when the body has no curved face
	tilt    surface.Tilt   // of a cone
}

// MissError says that the plane passes the body by Miss mm.
type MissError struct{ Miss float64 }

// Error says by how much the plane passes the body.
func (e *MissError) Error() string {
	return fmt.Sprintf("the plane misses the solid by %.6g mm", e.Miss)
}

// Of returns the section of b by the plane p. along, which may be empty, holds directions
// that the plane was laid along (unit vectors), as ground for a parabola or for lines by construction.
// The error is a *MissError. A plane that touches the body has a kind but no loops, unless it
// lies in a face: then the face is the section.
func Of(b *body.Body, p surface.Plane, along []vec.V3) (*Section, error) {
	lo, hi := b.Extent(p.F.Z)
	at := p.Value(b.Middle())
	gap := num.OnSurface * b.Size()
	if miss := max(at+lo, -at-hi); miss > gap {
		return nil, &MissError{miss}
	}
	s := &Section{Plane: p.F, Kind: Polygon, Ground: ByValue, body: b}
	for _, f := range b.Faces {
		if t, ok := f.Surface.(surface.Traced); ok {
			s.surface = t
			s.classify(p, along)
			break
		}
		if t, ok := f.Surface.(surface.Sphere); ok {
			s.onSphere(t, p)
		}
	}
	s.outline(p)
	return s, nil
}

// rounding bounds the error, mm, of the distance from the plane to a point of the body.
func (s *Section) rounding(p surface.Plane) float64 {
	m := s.body.Middle()
	return num.Place * (s.body.Size() + p.F.O.Sub(m).Len() + m.Len())
}

// classify fills in what the plane has in common with the whole curved surface.
func (s *Section) classify(p surface.Plane, along []vec.V3) {
	gap := s.rounding(p)
	var t surface.Trace
	laid := false
	switch c := s.surface.(type) {
	case surface.Cone:
		s.tilt, laid = laidAlong(c, p, along)
		t = c.TraceAt(p, gap, s.tilt)
		if t.Shape == surface.PointOnly || len(t.Lines) > 0 {
			s.Apex = &c.F.O
			laid = laid || p.Value(c.F.O) == 0
		}
	case surface.Cylinder:
		t = c.Trace(p, gap)
		for _, d := range along {
			laid = laid || d.Cross(c.F.Z).Len() <= num.Place
		}
	}
	for _, r := range t.Lines {
		s.Lines = append(s.Lines, r.Curve())
	}
	s.Kind = kindOf(t.Shape)
	s.Ground = groundOf(t, laid)
	if s.Kind == Circle || s.Kind == Ellipse || s.Kind == Parabola || s.Kind == Hyperbola {
		s.Conic = &Conic{s.Kind, t.F, t.A, t.B, t.Ecc, t.L, t.Near}
	}
}

// onSphere fills in the circle in which the plane meets a sphere, or the point of contact.
func (s *Section) onSphere(t surface.Sphere, p surface.Plane) {
	f, r, ok := t.Circle(p, s.rounding(p))
	if !ok {
		if math.Abs(p.Value(t.O)) <= t.R+s.rounding(p) {
			at := t.O.Along(p.F.Z, -p.Value(t.O))
			s.Kind, s.Apex = Point, &at
		}
		return
	}
	s.Kind, s.Ground = Circle, ByConstruction
	s.Conic = &Conic{Circle, f, r, r, 0, r, f.O.Along(f.X, -r)}
}

func kindOf(s surface.Shape) Kind {
	switch s {
	case surface.Circle:
		return Circle
	case surface.Ellipse:
		return Ellipse
	case surface.Parabola:
		return Parabola
	case surface.Hyperbola:
		return Hyperbola
	case surface.PointOnly:
		return Point
	case surface.OneLine:
		return Line
	case surface.TwoLines:
		return TwoLines
	}
	return Polygon
}

// groundOf says why: laid is true when the plane was laid along a generator (or lies exactly in the apex).
func groundOf(t surface.Trace, laid bool) Ground {
	switch t.Shape {
	case surface.Ellipse:
		return ByValue
	case surface.Hyperbola:
		if !laid {
			return ByValue
		}
	case surface.Circle:
		laid = t.Sure
	}
	if laid {
		return ByConstruction
	}
	return ByBound
}

// laidAlong is the tilt of p against the cone, and whether one of the directions that p was
// laid along is a generator's. Then the plane leans from the tangent plane there by the angle
// whose sine is n·(tangent), and the discriminant is that sine squared times -sin² of the half
// angle: a parabola if the sine vanishes within its rounding, and a hyperbola however small it
// is otherwise, although in the discriminant itself the square would be lost.
func laidAlong(c surface.Cone, p surface.Plane, along []vec.V3) (surface.Tilt, bool) {
	t := c.Tilt(p)
	for _, g := range along {
		h := g.Dot(c.F.Z)
		out := c.F.X.Scale(g.Dot(c.F.X)).Along(c.F.Y, g.Dot(c.F.Y))
		off := float64(out.Len()*c.Cos) - float64(math.Abs(h)*c.Sin)
		if math.Abs(off) > num.Place || math.Abs(g.Dot(p.F.Z)) > num.Place {
			continue
		}
		sine := c.F.Z.Cross(out.Unit()).Dot(p.F.Z)
		t.Sure = true
		if math.Abs(sine) <= num.Place {
			// the tilt is the complement of the half angle
			t.Cos, t.Sin, t.Minus, t.Plus = c.Sin, c.Cos, 2*c.Sin*c.Cos, 0
			return t, true
		}
		t.Minus = max(t.Minus, num.Eps)
		t.Plus = -(c.Sin * sine) * (c.Sin * sine) / t.Minus
		t.Sin = c.Cos * math.Hypot(1, c.Sin/c.Cos*sine)
		return t, true
	}
	return t, false
}

// outline takes the loops and measures from the face that the plane makes when it cuts.
func (s *Section) outline(p surface.Plane) {
	const label = "\x00section" // no name in a source can be this
	c, err := s.body.Cut(p, label)
	back := false
	if err != nil { // a face with the material on the other side
		c, err = s.body.Cut(p.Flip(), label)
		back = true
	}
	if err != nil {
		return
	}
	face := c.FaceIndex(label)
	for _, edges := range c.FaceEdges(face) {
		loop := make([]Piece, len(edges))
		for k, e := range edges {
			other := e.A + e.B - face
			_, plane := c.Faces[other].Surface.(surface.Plane)
			if back {
				loop[len(edges)-1-k] = Piece{e.Arc.Reverse(), other, plane}
			} else {
				loop[k] = Piece{e.Arc, other, plane}
			}
			l := e.Arc.Length()
			s.Perimeter += l
			if !plane {
				s.Length += l
			}
		}
		s.Loops = append(s.Loops, loop)
	}
	s.Area = c.FaceArea(face)
	s.Centroid, _ = c.FaceCentroid(face)
}

// PointOn is the point of the section on the body's generator at theta (radians, in the curved
// face's frame), and whether there is one: not where the generator runs along the plane, leaves the
// nappe or has been cut away there.
func (s *Section) PointOn(theta float64) (vec.V3, bool) {
	if s.surface == nil {
		return vec.V3{}, false
	}
	r := s.surface.Ruling(theta)
	k := r.D.Dot(s.Plane.Z)
	if math.Abs(k) <= num.Direction {
		return vec.V3{}, false
	}
	u := s.Plane.O.Sub(r.O).Dot(s.Plane.Z) / k
	p := r.O.Along(r.D, u)
	return p, u >= r.Min && s.body.Side(p) == num.Zero
}

// Angle is the angle between the two lines of a section through a cone's apex, radians in [0, π]; zero for
// the two lines of a cylinder, false for anything else.
func (s *Section) Angle() (float64, bool) {
	if len(s.Lines) != 2 {
		return 0, false
	}
	a, b := s.Lines[0].U, s.Lines[1].U
	return math.Atan2(a.Cross(b).Len(), a.Dot(b)), true
}
