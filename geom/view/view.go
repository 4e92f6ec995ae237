// Package view projects bodies along a direction and tells which pieces of
// their edges and contours are visible, without a mesh: every candidate curve
// is split where its image meets another's and one ray toward the viewer from
// the middle of each piece decides.
//
// The directions that a drawing office uses are degenerate: along an axis,
// along a face, with an edge lying on a contour, with two bodies that touch.
// There many curves share one image, and a ray may run within a surface for
// its whole length. Two rules make these cases ordinary ones:
//
//   - A ray is covered by a body only where the middle of its interval lies
//     inside by more than rounding. A ray that is off a surface by an error e
//     has its middle about e deep, however long the interval is, so the bound
//     grows with e and not with its square root.
//   - Curves with one image are split at the same places and then only one is
//     drawn for each stretch. A ray that runs within a surface leaves it
//     through an edge or contour with the same image that lies nearer the
//     viewer, so the right verdict is always among those compared.
package view

import (
	"epure/geom/body"
	"epure/geom/curve"
	"epure/geom/vec"
)

// Wire is the Body of a piece that SplitBy made out of an extra curve.
const Wire = -1

// Piece is one piece of an edge, a contour or a wire in a view.
type Piece struct {
	// Image lies in the view frame's x, y. Its ends are the images of the ends
	// of Space in the same order. It has the parameter of Space, except that a
	// conic seen edge-on has a straight image (Form Line, U a unit vector, T0 = 0)
	// with the distance in mm as its parameter; SpaceAt leads from one to the other.
	Image curve.Arc2
	Space curve.Arc
	Body  int // index of the body, or Wire
	A, B  int // faces of the edge; A == B for a contour generator; both the index of the arc for a Wire
	// Visible tells that nothing lies before the piece. A piece that lies in a
	// surface seen edge-on counts as visible when nothing else covers it.
	Visible bool

	flat curve.Curve2 // a straight image's curve with the parameter of Space; Form 0 otherwise
}

// SpaceAt is the parameter of Space that belongs to the parameter t of Image.
func (p Piece) SpaceAt(t float64) float64 {
	return track{p.Image, p.flat, p.Space.T0, p.Space.T1}.space(t)
}

// Lines returns what is seen of the bodies in the view f (f.Z, a unit vector, toward the viewer; X and Y square
// to it but not necessarily to each other, nor unit vectors): every
// visible and hidden piece of their edges and contours. Where images coincide one
// piece is drawn: a visible one before a hidden one, then the one nearest the viewer,
// then the one of the lowest body and edge. Edges seen end-on vanish. Neighbouring pieces of one
// edge are joined when both are visible or both hidden; a whole circle without
// a break is one closed arc (T1 = T0 + 2π). The order is that of bodies and edges, edges before contours.
func Lines(bodies []*body.Body, f vec.Frame) []Piece {
	s := newScene(bodies, f)
	cands := s.candidates()
	return s.draw(cands, len(cands))
}

// SplitBy returns the visible and hidden pieces of extra curves of space that are not edges of
// a body (generators, outlines of sections, axes), in the order of arcs. Coincident images among them are merged
// as in Lines; those that coincide with lines of the bodies stay (see Without).
func SplitBy(arcs []curve.Arc, bodies []*body.Body, f vec.Frame) []Piece {
	s := newScene(bodies, f)
	wires := s.wires(arcs)
	return s.draw(append(wires, s.candidates()...), len(wires))
}
