package vec

import (
	"math"
	"testing"

	"pgregory.net/rapid"
)

// Frames must be square and right-handed to rounding, for axes as near to the vertical or the level as
// can be: eight units in the last place are two normalisations and a product.
func TestFramesAreSquare(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		tilt := math.Pow(10, rapid.Float64Range(-14, 0).Draw(t, "log tilt"))
		phi := rapid.Float64Range(0, 2*math.Pi).Draw(t, "turn")
		s, c := math.Sincos(phi)
		d := V3{tilt * c, tilt * s, 1}
		if rapid.Bool().Draw(t, "level") {
			d = V3{c, s, tilt}
		}
		if rapid.Bool().Draw(t, "down") {
			d = d.Neg()
		}
		for _, f := range []Frame{PlaneFrame(V3{}, d), AxisFrame(V3{}, d)} {
			for _, e := range []float64{f.X.Dot(f.Y), f.Y.Dot(f.Z), f.Z.Dot(f.X), f.X.Len() - 1, f.Y.Len() - 1, f.Z.Len() - 1, f.X.Cross(f.Y).Dist(f.Z)} {
				if math.Abs(e) > 8*0x1p-52 {
					t.Fatalf("%v: off by %g in %v", d, e, f)
				}
			}
		}
	})
}

// The conventions of the language, written out.
func TestFrameConventions(t *testing.T) {
	for _, c := range []struct {
		name    string
		f       Frame
		x, y, z V3
	}{
		{"axis up", AxisFrame(V3{}, V3{Z: 2}), V3{X: 1}, V3{Y: 1}, V3{Z: 1}},
		{"axis down counts as seen from above", AxisFrame(V3{}, V3{Z: -1}), V3{X: 1}, V3{Y: 1}, V3{Z: 1}},
		{"axis to the right starts at its top line", AxisFrame(V3{}, V3{X: 1}), V3{Z: 1}, V3{Y: -1}, V3{X: 1}},
		{"front view", ViewFrame(V3{Y: 1}), V3{X: 1}, V3{Z: 1}, V3{Y: -1}},
		{"view from above", ViewFrame(V3{Z: -1}), V3{X: 1}, V3{Y: 1}, V3{Z: 1}},
		{"plane facing up", PlaneFrame(V3{}, V3{Z: 1}), V3{X: 1}, V3{Y: 1}, V3{Z: 1}},
		{"plane facing down", PlaneFrame(V3{}, V3{Z: -1}), V3{X: 1}, V3{Y: -1}, V3{Z: -1}},
	} {
		for i, d := range []float64{c.f.X.Dist(c.x), c.f.Y.Dist(c.y), c.f.Z.Dist(c.z)} {
			if d != 0 {
				t.Errorf("%s: vector %d is off by %g: %v", c.name, i, d, c.f)
			}
		}
	}
}
