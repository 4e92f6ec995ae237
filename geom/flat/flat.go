// Package flat unrolls the developable faces of a body to the plane: outline,
// stations on generators, and the proof that what was unrolled folds back.
package flat

import (
	"epure/geom/body"
	"epure/geom/curve"
	"epure/geom/vec"
)

// Options says how a face is to be unrolled.
type Options struct {
	Seam      float64 // angle of the seam generator in the surface's frame, radians
	Divisions int     // even divisions of the whole turn, >= 3
	Inside    bool    // the inside is up: the exact mirror
}

// Path2 is a smooth curve of the flat plane.
type Path2 interface {
	At(t float64) vec.V2
	Deriv(t float64, n int) vec.V2
}

// Piece is a piece T0 <= t <= T1 (or backwards, T1 < T0) of a pattern's outline. Face is the
// index of the body's other face along this edge, or Seam.
type Piece struct {
	Path   Path2
	T0, T1 float64
	Face   int
}

// Seam stands for the face of a piece that is one side of the seam.
const Seam = -1

// Station is one generator on the pattern.
type Station struct {
	Number    int     // 1 at the seam, then along the girth; 0 for an extreme between divisions; the last one is the seam again
	Theta     float64 // angle of the generator in the surface's frame, radians
	Lo, Hi    float64 // the piece inside the part, as u of the ruling, mm
	Low, High vec.V2  // its ends on the pattern (at Lo and Hi)
	Why       string  // for an extreme: "corner", "longest", "shortest" ...
}

// Pattern is the development of one curved face.
type Pattern struct {
	Loops    [][]Piece // closed outlines, anticlockwise as drawn
	Stations []Station
	curve    curve.Form
}

// Of unrolls the curved face i of b.
func Of(b *body.Body, i int, o Options) (*Pattern, error) { panic("todo") }
