package drawing

import (
	"math"

	"epure/geom/vec"
)

// Terminators of dimension and leader lines, after ISO 129-1: the filled arrow
// of 15° whose length is the height of the figures, the dot, and the bare end.

// ArrowAngle is the included angle of the arrowhead's tip, radians.
const ArrowAngle = 15 * math.Pi / 180

// Arrowhead returns the closed outline of an arrowhead with its tip at tip,
// pointing along dir (any length but zero), length mm long.
func Arrowhead(tip, dir vec.V2, length float64) Path {
	d := dir.Unit()
	half := length * math.Tan(ArrowAngle/2)
	base := tip.Along(d, -length)
	a, b := base.Along(d.Left(), half), base.Along(d.Left(), -half)
	return Path{Pieces: []Shape{Line{tip, a}, Line{a, b}, Line{b, tip}}, Closed: true}
}

// ArrowMark returns a black arrowhead as a mark of the dimension role.
func ArrowMark(k Key, tip, dir vec.V2, length float64) Mark {
	return Mark{Key: k, Role: Dimension, Fill: Fill{On: true}, Shape: Arrowhead(tip, dir, length)}
}

// DotMark returns a black dot of the given diameter as a mark of the dimension
// role: the end of a leader inside a face.
func DotMark(k Key, at vec.V2, diameter float64) Mark {
	c := EllipseArc{C: at, RX: diameter / 2, RY: diameter / 2, To: 2 * math.Pi}
	return Mark{Key: k, Role: Dimension, Fill: Fill{On: true}, Shape: c}
}
