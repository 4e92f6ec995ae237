package eval

import "testing"

// TestSpheres: cylinder, sphere and cone of one size stand as 3 : 2 : 1 in volume, cylinder and sphere as 3 : 2 in area
// (Archimedes, On the Sphere and Cylinder); a section has the radius of Pythagoras; a copy is alike.
func TestSpheres(t *testing.T) {
	clean(t, "spheres", `given r = 37 mm
S = sphere radius r centre (10 mm, 20 mm, 30 mm)
C = cylinder radius r height 2*r
K = cone radius r height 2*r
P = plane through (10 mm, 20 mm, 42 mm) tilt 0° facing 0°
X = section of S by P
B = part of S above P
M = copy of B mirror side
verify 3*S.volume = 2*C.volume
verify S.volume = 2*K.volume
verify 3*S.area = 2*C.area
verify X.kind = "circle"
verify X.radius = sqrt(r^2 - (12 mm)^2)
verify X.area = pi*X.radius^2
verify B.lateral_area = 2*pi*r*(r - 12 mm)
verify M.volume = B.volume
`)
}
