// Package body holds solids as questions: a tree of the half-spaces of natural
// surfaces that answers which points and which intervals of a line are inside.
// Edges, faces, areas and volumes are worked out from those two questions and
// from the curves in which the surfaces meet; no mesh stands anywhere.
package body

import (
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

// Body is an immutable solid.
type Body struct {
	Faces []Face
	tree  tree
	size  float64
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
// away, because the plane misses the body by Miss mm.
type CutError struct {
	Nothing bool    // true: nothing left; false: the plane misses the body
	Miss    float64 // distance from the plane to the body, mm, >= 0
}

func (e *CutError) Error() string { return "" }

type tree struct{}

// Frustum returns the right circular cone, frustum or cylinder between the
// levels z = 0 (radius r0) and z = h (radius r1) of f, h > 0, r0 and r1 >= 0
// and not both zero. name labels its faces name+".side", ".base", ".top"
// (no face where a radius is zero). angles is the frame whose X and Y count
// the angles about the axis (its Z is ±f.Z).
func Frustum(name string, f, angles vec.Frame, r0, r1, h float64) *Body { panic("todo") }

// Cut returns the part of b on the side where the plane's Value is negative.
// label names the new face. A plane that coincides with a face merges with it.
func (b *Body) Cut(p surface.Plane, label string) (*Body, error) { panic("todo") }

// Size is the radius of a sphere about the body's middle, mm: the scale that tolerances are relative to.
func (b *Body) Size() float64 { return b.size }

// Side tells whether p is inside (Negative), on (Zero, within the bound
// num.OnSurface·Size) or outside (Positive) the body.
func (b *Body) Side(p vec.V3) num.Sign { panic("todo") }

// Intervals are the pieces of the line o + t·d (d unit) inside the body,
// ascending; t may be negative. A line that runs within a face is not inside.
func (b *Body) Intervals(o, d vec.V3) []Interval { panic("todo") }

// Edges are the edges of the body, in a fixed order.
func (b *Body) Edges() []Edge { panic("todo") }

// Contour are the contour generators for sight along d (unit), clipped to the boundary.
func (b *Body) Contour(d vec.V3) []Edge { panic("todo") }

// FaceEdges are the edges round face i, oriented anticlockwise looking against the
// outward normal on a plane face, chained into loops.
func (b *Body) FaceEdges(i int) [][]Edge { panic("todo") }

// Rulings are the pieces of the generator at theta of the curved face i that
// belong to the boundary, as intervals of the ruling's u.
func (b *Body) Rulings(i int, theta float64) []Interval { panic("todo") }

// Breaks are the angles in [0, 2π) at which the pieces of generators of the
// curved face i change: corners, and generators along edges.
func (b *Body) Breaks(i int) []float64 { panic("todo") }

// FaceIndex is the index of the face with the label, or -1.
func (b *Body) FaceIndex(label string) int { panic("todo") }

// FaceArea is the area of face i, mm².
func (b *Body) FaceArea(i int) float64 { panic("todo") }

// Volume is mm³.
func (b *Body) Volume() float64 { panic("todo") }

// Centroid is the centre of the volume.
func (b *Body) Centroid() vec.V3 { panic("todo") }

// Bounds are the exact corners of the box round the body in the frame f.
func (b *Body) Bounds(f vec.Frame) (lo, hi vec.V3) { panic("todo") }
