package eval

import (
	"math"

	"epure/geom/vec"
)

// pictorial is the frame of a pictorial representation of ISO 5456-3, seen from the right, in front and
// above. X and Y are the rows that take a point to the paper, not unit vectors: a length along
// an axis of the model keeps its size, or in the dimetric and the cabinet view half of it along y. Z points at the viewer.
//
// Isometric and dimetric views are parallel projections square to the paper, enlarged until the full
// axes are true: the direction of sight follows from the shares, since with the unit
// vector v at the viewer an axis is shortened by √(1 - v²).
func pictorial(kind string) vec.Frame {
	half := math.Sqrt2 / 2
	switch kind {
	case "dimetric":
		return square(vec.V3{X: 1, Y: -math.Sqrt(7), Z: 1}, 3/(2*math.Sqrt2))
	case "cavalier":
		return rows(vec.V3{X: 1, Y: half}, vec.V3{Y: half, Z: 1})
	case "cabinet":
		return rows(vec.V3{X: 1, Y: half / 2}, vec.V3{Y: half / 2, Z: 1})
	case "planometric":
		return rows(vec.V3{X: half, Y: half}, vec.V3{X: -half, Y: half, Z: 1})
	}
	return square(vec.V3{X: 1, Y: -1, Z: 1}, math.Sqrt(1.5))
}

// square is the frame of a view from v, enlarged.
func square(v vec.V3, factor float64) vec.Frame {
	f := vec.ViewFrame(v.Neg())
	f.X, f.Y = f.X.Scale(factor), f.Y.Scale(factor)
	return f
}

// rows is the frame that takes points to the paper by the rows x and y.
func rows(x, y vec.V3) vec.Frame { return vec.Frame{X: x, Y: y, Z: x.Cross(y).Unit()} }
