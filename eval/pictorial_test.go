package eval

import (
	"math"
	"testing"

	"epure/geom/vec"
)

// TestPictorials: the angles of the axes on paper to the horizontal and the scales along them, ISO 5456-3
// (isometric 30°/30°, 1:1:1; dimetric 7°/42°, exactly 7.18° and 41.41°, 1:1:½; cavalier 0°/45°, 1:1:1; cabinet
// 0°/45°, 1:1:½; planometric 45°/45°, 1:1:1; facts of a German course page on axonometry and an
// illustration note, exact dimetric angles recomputed), and sight that no point is moved along.
func TestPictorials(t *testing.T) {
	for _, c := range []struct {
		kind                   string
		angleX, angleY         float64 // degrees, x downward positive, y upward positive
		scaleX, scaleY, scaleZ float64
		within                 float64 // degrees: half a unit of the last digit printed
	}{
		{"isometric", 30, 30, 1, 1, 1, 1e-9},
		{"dimetric", 7.18, 41.41, 1, 0.5, 1, 0.005},
		{"cavalier", 0, 45, 1, 1, 1, 1e-9},
		{"cabinet", 0, 45, 1, 0.5, 1, 1e-9},
		{"planometric", 45, 45, 1, 1, 1, 1e-9},
	} {
		f := pictorial(c.kind)
		x, y, z := f.Flat(vec.V3{X: 1}), f.Flat(vec.V3{Y: 1}), f.Flat(vec.V3{Z: 1})
		angle := func(v vec.V2) float64 { return math.Atan2(v.Y, v.X) * 180 / math.Pi }
		for _, d := range []float64{angle(x) + c.angleX, angle(y) - c.angleY, angle(z) - 90} {
			if math.Abs(d) > c.within {
				t.Errorf("%s: an axis is off by %g°", c.kind, d)
			}
		}
		for _, d := range []float64{x.Len() - c.scaleX, y.Len() - c.scaleY, z.Len() - c.scaleZ} {
			if math.Abs(d) > 1e-12 { // a few roundings
				t.Errorf("%s: a scale is off by %g", c.kind, d)
			}
		}
		if p := f.Flat(f.Z); p.Len() > 1e-12 || f.Z.X <= 0 || f.Z.Y >= 0 || f.Z.Z <= 0 {
			t.Errorf("%s: sight along %v lands at %v", c.kind, f.Z, p)
		}
	}
}
