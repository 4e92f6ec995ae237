package compose

import (
	"math"

	"epure/geom/vec"
)

// Projection: the frame of every view and the line along which it stands to the
// one that it was folded from.
//
// A folded view is turned on paper until its projectors from the parent run
// straight: the direction square to the fold is shared by both views, the other
// one is the parent's depth. That frame is the same in first and third angle;
// only the side on which the view is put changes, and the symbol.
//
// All frames of space have their origin at the model's, so that two aligned
// views agree in the shared coordinate without any further work.

// foldSine is the sine of the angle by which a line of sight may lean toward
// the parent's and still count as square to it: 1e-9 shifts a projector 10 m
// long by 1e-5 mm, which no writer prints, and is far over the rounding of a
// normal that was worked out from three points.
const foldSine = 1e-9

// relation says how a view stands to its parent.
type relation uint8

const (
	apart    relation = iota // it cannot be folded from the parent
	folded                   // square to the parent: projectors run straight
	opposite                 // the rear view of the parent
	same                     // the same direction of sight
)

// fold returns the frame of a view whose Z (toward its viewer) is z, folded from
// the parent frame, and the direction on paper from the parent toward that
// viewer: for folded the viewer's own, for opposite and same rightward.
func fold(parent vec.Frame, z vec.V3) (vec.Frame, vec.V2, relation) {
	lean := z.Dot(parent.Z)
	if math.Abs(lean) <= foldSine {
		u := snapped(vec.V2{X: z.Dot(parent.X), Y: z.Dot(parent.Y)})
		return turned(parent, u), u, folded
	}
	right := vec.V2{X: 1}
	if math.Hypot(z.Dot(parent.X), z.Dot(parent.Y)) > foldSine {
		return vec.Frame{}, vec.V2{}, apart
	}
	if lean > 0 {
		return parent, right, same
	}
	return vec.Frame{O: parent.O, X: parent.X.Neg(), Y: parent.Y, Z: parent.Z.Neg()}, right, opposite
}

// turned is the frame of the view whose viewer stands at u (unit, on the
// parent's paper). With w = u turned left, paper directions u and w stand in the
// parent for the model vectors z and W, and in the child for -Z of the parent and W.
func turned(parent vec.Frame, u vec.V2) vec.Frame {
	w := u.Left()
	z := parent.X.Scale(u.X).Along(parent.Y, u.Y)
	wide := parent.X.Scale(w.X).Along(parent.Y, w.Y)
	far := parent.Z.Neg()
	return vec.Frame{
		O: parent.O,
		X: clean(far.Scale(u.X).Along(wide, w.X)),
		Y: clean(far.Scale(u.Y).Along(wide, w.Y)),
		Z: clean(z),
	}
}

// snapped makes a direction a unit vector, exactly level or upright when it is
// so within LevelSine.
func snapped(u vec.V2) vec.V2 {
	u = u.Unit()
	switch {
	case math.Abs(u.X) <= vec.LevelSine:
		return vec.V2{Y: math.Copysign(1, u.Y)}
	case math.Abs(u.Y) <= vec.LevelSine:
		return vec.V2{X: math.Copysign(1, u.X)}
	}
	return u
}

// clean drops negative zeros.
func clean(v vec.V3) vec.V3 { return vec.V3{X: v.X + 0, Y: v.Y + 0, Z: v.Z + 0} }

// side is the direction in which a folded view is put: toward its viewer in
// third angle, away from him in first. Rear views and views that are only
// aligned go to the right in both.
func side(u vec.V2, r relation, thirdAngle bool) vec.V2 {
	if r == folded && !thirdAngle {
		return vec.V2{X: 0 - u.X, Y: 0 - u.Y}
	}
	return u
}

// oblique tells that u is neither level nor upright.
func oblique(u vec.V2) bool { return u.X != 0 && u.Y != 0 }
