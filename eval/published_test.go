package eval

import (
	"fmt"
	"testing"

	"epure/eval/scene"
)

// Values printed elsewhere, asked for in the language. The tolerance of each is
// half a unit of the last digit printed, or the rounding of π that the source
// names; prints that were recomputed and found wrong are not here.
var published = []struct {
	source  string
	file    string
	measure string // as thing.measure
	want    float64
	within  float64
}{
	{
		"Longfield, Sheet Metal Drafting, 1921: lateral area of a cone, diameter 5 in, slant 12 in, printed as 5 × 3.1416 × 6 square inches",
		"K = cone diameter 5 in height sqrt((12 in)^2 - (2.5 in)^2)\na = K.lateral_area/(1 in)^2\n", "a.value", 5 * 3.1416 * 6, 5 * 6 * 0.00001,
	},
	{
		"Longfield, Sheet Metal Drafting, 1921: a sector with an arc of 14 in on a radius of 7 in has 49 square inches",
		"K = cone radius 14 in/(2*pi) height sqrt((7 in)^2 - (14 in/(2*pi))^2)\nD = development of K\na = D.area/(1 in)^2\n", "a.value", 49, 1e-9,
	},
	{
		"Atkins, Practical Sheet and Plate Metal Work, 1908: conical cap, diameter 3, slant 2, pattern radius 2",
		"K = cone diameter 3 in height sqrt((2 in)^2 - (1.5 in)^2)\nD = development of K\nr = D.outer_radius/1 in\n", "r.value", 2, 1e-12,
	},
	{
		"TAFE NSW fabrication unit: shell of mean diameter 640, plate length 2010.624 with π = 3.1416",
		"C = cylinder diameter 640 mm height 1000 mm\nD = development of C\n", "D.girth", 2010.624, 640 * 0.00001,
	},
	{
		"Solved problems by H. Hajjir, 2014-2018: cone of semi-angle 20°, apex at the origin, cut by 3x + 4y + 5z = 500; the sum of the semi-axes",
		"K = cone radius 1000 mm*tan(20°) height 1000 mm at (0, 0, 1000 mm) axis downward\nP = plane through (0, 0, 100 mm) normal (3, 4, 5)\nS = section of K by P\na = (S.semi_major + S.semi_minor)/1 mm\n", "a.value", 98.41, 0.005,
	},
	{
		"Textbook problem in a maths forum: tower frustum, diameters 20 and 12 ft, height 30 ft, lateral area in square feet",
		"F = cone diameter 20 ft top_diameter 12 ft height 30 ft\na = F.lateral_area/(1 ft)^2\n", "a.value", 1521.3, 0.05,
	},
	{
		"19th-century school mensuration: frustum, diameters 5 ft 4 in and 8 ft 3 in, slant 10 ft 6 in, 224 square feet",
		"F = cone diameter 8 ft 3 in top_diameter 5 ft 4 in height sqrt((10 ft 6 in)^2 - (8 ft 3 in/2 - 5 ft 4 in/2)^2)\na = F.lateral_area/(1 ft)^2\n", "a.value", 224, 0.5,
	},
	{
		"19th-century school mensuration: frustum, diameters 15 ft 4 in and 26 ft 8 in, depth 23 ft 9 in, 1611 square feet",
		"F = cone diameter 26 ft 8 in top_diameter 15 ft 4 in height 23 ft 9 in\na = F.lateral_area/(1 ft)^2\n", "a.value", 1611, 0.5,
	},
	{
		"19th-century school mensuration: cone, diameter 19 ft 2 in, altitude 21 ft, 695 square feet nearly",
		"K = cone diameter 19 ft 2 in height 21 ft\na = K.lateral_area/(1 ft)^2\n", "a.value", 695, 0.5,
	},
	{
		"Blacksmith's notes on cones, 1999: a cone with 90° at the apex has a sector of 254.6°",
		"K = cone radius 30 mm height 30 mm\nD = development of K\n", "D.sector", 254.6, 0.05,
	},
	{
		"Civil-engineering review: frustum R 5, r 2, h 6 m, volume 245.04 cubic metres",
		"F = cone radius 5 m top_radius 2 m height 6 m\nv = F.volume/(1 m)^3\n", "v.value", 245.04, 0.005,
	},
}

func TestPublishedValues(t *testing.T) {
	for _, p := range published {
		t.Run(p.source, func(t *testing.T) {
			s := clean(t, "published", p.file)
			got := value(t, s, p.measure).(scene.Quantity).Float()
			if diff := got - p.want; diff > p.within || diff < -p.within {
				t.Errorf("%s is %.10g, printed is %.10g", p.measure, got, p.want)
			}
		})
	}
}

// TestEllipsePerimeters asks for the perimeter of a section of a cylinder whose
// plane is tilted so that sin² of the tilt is m: it is 4·A·E(m). E(m) is table
// 17.1 of Abramowitz & Stegun (DLMF 19 defines it), ten digits.
func TestEllipsePerimeters(t *testing.T) {
	table := []struct{ m, e float64 }{
		{0.1, 1.5307576369}, {0.2, 1.4890350581}, {0.25, 1.4674622093}, {0.3, 1.4453630644}, {0.4, 1.3993921389},
		{0.5, 1.3506438810}, {0.6, 1.2984280350}, {0.7, 1.2416705680}, {0.75, 1.2110560276}, {0.8, 1.1784899243},
		{0.9, 1.1047747327}, {0.99, 1.0159935450},
	}
	for _, row := range table {
		file := fmt.Sprintf("C = cylinder radius 25 mm height 1000 mm at (0, 0, -500 mm)\nP = plane through (0, 0, 0) tilt asin(sqrt(%g)) facing 20°\nS = section of C by P\ne = S.perimeter/(4*S.semi_major)\n", row.m)
		got := value(t, clean(t, "ellipse", file), "e.value").(scene.Quantity).Float()
		if diff := got - row.e; diff > 0.6e-10 || diff < -0.6e-10 {
			t.Errorf("E(%g) is %.12f, tabulated is %.10f", row.m, got, row.e)
		}
	}
}
