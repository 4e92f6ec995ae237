package eval

import (
	"testing"

	"epure/eval/scene"
	"epure/geom/vec"
)

// TestCopies: a copy has the volume, areas and generators of what it copies, where the motion
// takes them; the opposite hand has its pattern mirrored.
func TestCopies(t *testing.T) {
	s := clean(t, "copies", `
K = cone radius 60 mm top_radius 20 mm height 90 mm at (10 mm, 20 mm, 30 mm) axis (1, 2, 5)
P = plane through (10 mm, 20 mm, 60 mm) tilt 25° facing 40°
B = part of K below P
L = line through (200 mm, 0, 0) along (1, 1, 3)
T = copy of B turn 73° about L
M = copy of B mirror side
R = outline through (0, 0), (50 mm, 0), (50 mm, 10 mm), (10 mm, 30 mm) on P
A = prism on R height 30 mm along (0, 1, 4)
Q = plane through A.centroid normal (1, 0, 3)
C = part of A above Q
D = copy of C mirror P turn 30° about L at (5 mm, 6 mm, 7 mm)
Y = copy of A mirror side

verify T.volume = B.volume
verify T.lateral_area = B.lateral_area
verify M.volume = B.volume
verify M.area = B.area
verify D.volume = C.volume
verify D.area = C.area
`[1:])

	b, m := value(t, s, "B.centroid").(scene.Triple), value(t, s, "M.centroid").(scene.Triple)
	close(t, "mirrored x", m.V.X, -b.V.X, 1e-11)
	close(t, "mirrored z", m.V.Z, b.V.Z, 1e-11)
}

// TestRingsAndRows: the members have the volume of the original, the first stands where it does, and those of
// a ring have their centre on its line.
func TestRingsAndRows(t *testing.T) {
	s := clean(t, "groups", `C = cylinder diameter 20 mm height 30 mm at (60 mm, 10 mm, 5 mm)
T = plane through (60 mm, 10 mm, 20 mm) tilt 30° facing 10°
B = part of C below T
L = line through (7 mm, 8 mm, 9 mm) along (1, 2, 3)
R = ring of B count 7 about L
W = row of B count 4 step (50 mm, 0, 10 mm)
verify R.volume = 7*B.volume
verify W.volume = 4*B.volume
verify R.count = 7
`)
	for _, th := range s.Things {
		g, ok := th.Value.(*scene.Group)
		if !ok {
			continue
		}
		first := value(t, s, "B.centroid").(scene.Triple).V
		if d := g.Solids[0].Body.Centroid().Dist(first); d > 1e-11 { // a few roundings of 60 mm
			t.Errorf("the first of %s is %g mm off", th.Name, d)
		}
		if th.Name != "R" {
			continue
		}
		var sum vec.V3
		for _, m := range g.Solids {
			sum = sum.Along(m.Body.Centroid(), 1.0/7)
		}
		axis := vec.V3{X: 1, Y: 2, Z: 3}.Unit()
		if off := sum.Sub(vec.V3{X: 7, Y: 8, Z: 9}).Cross(axis).Len(); off > 1e-11 {
			t.Errorf("the middle of the ring is %g mm off its line", off)
		}
	}
}
