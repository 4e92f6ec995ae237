// Package body holds solids as questions: a tree of the half-spaces of natural
// surfaces that answers which points and which intervals of a line are inside.
// Edges, faces, areas and volumes are worked out from those two questions and
// from the curves in which the surfaces meet; no mesh stands anywhere.
package body

import (
	"fmt"
	"math"

	"epure/geom/curve"
	"epure/geom/num"
	"epure/geom/surface"
	"epure/geom/vec"
)

// Face is one boundary surface of a body with the name of its origin.
type Face struct {
	Surface surface.Surface
	Label   string // unique in the body, e.g. "K.side", "K.base", "K.top", "P"
}

// Body is an immutable solid. Its edges are worked out once, when it is made.
type Body struct {
	Faces  []Face
	tree   tree
	alias  []alias
	middle vec.V3
	size   float64
	edges  []Edge
}

// alias is the name of a plane that coincides with a face.
type alias struct {
	label string
	face  int
}

// Edge is a piece of the boundary where two faces meet (A < B, indexes of
// Faces), or with A == B a contour generator.
type Edge struct {
	Arc  curve.Arc
	A, B int
}

// Interval is a piece a <= t <= b of a line inside a body.
type Interval struct{ A, B float64 }

// CutError is a typed failure of Cut: nothing is left, or nothing is taken
// away, because the plane misses the body by Miss mm (zero when it touches).
type CutError struct {
	Nothing bool    // true: nothing left; false: the plane takes nothing away
	Miss    float64 // distance from the plane to the body, mm, >= 0
}

// Error says what is wrong and by how much.
func (e *CutError) Error() string {
	what := "the plane takes nothing away"
	if e.Nothing {
		what = "nothing is left"
	}
	if e.Miss == 0 {
		return what + ": it only touches the solid"
	}
	return fmt.Sprintf("%s: it misses the solid by %.6g mm", what, e.Miss)
}

// Frustum returns the right circular cone, frustum or cylinder between the
// levels z = 0 (radius r0) and z = h (radius r1) of f, h > 0, r0 and r1 >= 0
// and not both zero. name labels its faces name+".side", ".base", ".top"
// (no face where a radius is zero). angles is the frame whose X and Y count
// the angles about the axis (its Z is ±f.Z). Radii that differ by less than
// their rounding make a cylinder.
func Frustum(name string, f, angles vec.Frame, r0, r1, h float64) *Body {
	b := &Body{middle: f.O.Along(f.Z, h/2), size: math.Hypot(h/2, max(r0, r1))}
	b.Faces = append(b.Faces, Face{side(f, angles, r0, r1, h), name + ".side"})
	if r0 > 0 {
		down := vec.Frame{O: f.O, X: f.X, Y: f.Y.Neg(), Z: f.Z.Neg()}
		b.Faces = append(b.Faces, Face{surface.Plane{F: down}, name + ".base"})
	}
	if r1 > 0 {
		b.Faces = append(b.Faces, Face{surface.Plane{F: f.At(f.O.Along(f.Z, h))}, name + ".top"})
	}
	b.tree = allOf(len(b.Faces))
	b.edges = b.allEdges()
	return b
}

// side is the curved surface of a frustum.
func side(f, angles vec.Frame, r0, r1, h float64) surface.Surface {
	taper := r0 - r1
	if math.Abs(taper) <= num.Direction*max(r0, r1) {
		return surface.Cylinder{F: angles.At(f.O), R: r0}
	}
	slant := math.Hypot(taper, h)
	c := surface.Cone{
		F:    angles.At(f.O.Along(f.Z, h*(r0/taper))),
		Side: -math.Copysign(1, taper) * math.Copysign(1, angles.Z.Dot(f.Z)),
		Sin:  math.Abs(taper) / slant, Cos: h / slant,
	}
	return c
}

// Cut returns the part of b on the side where the plane's Value is negative.
// label names the new face. A plane that coincides with a face and has the
// material on the same side leaves the body as it is and gives that face a second name.
// The error is a *CutError.
func (b *Body) Cut(p surface.Plane, label string) (*Body, error) {
	lo, hi := b.Extent(p.F.Z)
	at := p.Value(b.middle)
	lo, hi = at+lo, at+hi
	gap := b.gap()
	if lo >= -gap {
		return nil, &CutError{true, max(lo, 0)}
	}
	c := &Body{Faces: b.Faces[:len(b.Faces):len(b.Faces)], alias: b.alias[:len(b.alias):len(b.alias)], middle: b.middle, size: b.size}
	if i := b.coincident(p); i >= 0 {
		c.tree, c.edges = b.tree, b.edges
		c.alias = append(c.alias, alias{label, i})
		return c, nil
	}
	if hi <= gap {
		return nil, &CutError{false, max(-hi, 0)}
	}
	c.Faces = append(c.Faces, Face{p, label})
	c.tree = tree{op: and, kids: []tree{b.tree, {face: len(b.Faces)}}}
	c.edges = c.allEdges()
	return c, nil
}

// coincident is the index of the face that lies in p with the material on the
// same side, or -1.
func (b *Body) coincident(p surface.Plane) int {
	for i, f := range b.Faces {
		if q, ok := f.Surface.(surface.Plane); ok {
			if in, same := q.Same(p, b.middle, b.gap()); in && same {
				return i
			}
		}
	}
	return -1
}

// gap is the distance under which a point lies on a surface, mm.
func (b *Body) gap() float64 { return num.OnSurface * b.size }

// Size is the radius of a sphere about the body's middle, mm: the scale that
// tolerances are relative to. A part keeps the size of the solid it was cut from.
func (b *Body) Size() float64 { return b.size }

// Middle is the point that lengths within the body are worked out from.
func (b *Body) Middle() vec.V3 { return b.middle }

// Convex tells whether the body is known to be convex: an intersection of half-spaces,
// cones and cylinders, all of which are convex.
func (b *Body) Convex() bool { return b.tree.convex() }

// FaceIndex is the index of the face with the label, or -1. A plane that
// coincided with a face when it cut finds that face.
func (b *Body) FaceIndex(label string) int {
	for i, f := range b.Faces {
		if f.Label == label {
			return i
		}
	}
	for _, a := range b.alias {
		if a.label == label {
			return a.face
		}
	}
	return -1
}

// Edges are the edges of the body, in a fixed order: by the lower face index,
// then the higher, then along the curve.
func (b *Body) Edges() []Edge { return b.edges }
