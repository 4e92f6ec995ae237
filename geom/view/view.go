// Package view projects bodies along a direction and tells which pieces of
// their edges and contours are visible, without a mesh: every candidate curve
// is split where its image meets another's and one ray toward the viewer from
// the middle of each piece decides.
package view

import (
	"epure/geom/body"
	"epure/geom/curve"
	"epure/geom/vec"
)

// Piece is one piece of an edge or contour in a view.
type Piece struct {
	Image   curve.Arc2 // in the view frame's x, y; the same parameter as Space
	Space   curve.Arc
	Body    int // index of the body
	A, B    int // faces of the edge; A == B for a contour generator
	Visible bool
	Layers  int // how many layers of material cover it; 0 when visible
}

// Lines returns what is seen of the bodies in the view f (f.Z toward the viewer): every
// visible and hidden piece, coincident images merged by the precedence visible before hidden,
// joined again where neighbouring pieces of one edge are alike, in the order of bodies and edges.
func Lines(bodies []*body.Body, f vec.Frame) []Piece { panic("todo") }

// Without returns the pieces, or parts of pieces, whose image does not coincide with one of others.
func Without(pieces, others []Piece) []Piece { panic("todo") }
