package num

import (
	"math"
	"testing"

	"gonum.org/v1/gonum/mathext"
	"pgregory.net/rapid"
)

// E(m), ten decimals: Abramowitz & Stegun, Handbook of Mathematical Functions, table 17.1; DLMF chapter 19. The collection that
// these are taken from gives 1.2416705680 for m = 0.7, which is good to nine decimals only: gonum and our own
// value agree on 1.2416705679, which stands here.
func TestCompleteE(t *testing.T) {
	for _, c := range [][2]float64{
		{0, 1.5707963268}, {0.1, 1.5307576369}, {0.2, 1.4890350581}, {0.25, 1.4674622093}, {0.3, 1.4453630644},
		{0.4, 1.3993921389}, {0.5, 1.3506438810}, {0.6, 1.2984280350}, {0.7, 1.2416705679}, {0.75, 1.2110560276},
		{0.8, 1.1784899243}, {0.9, 1.1047747327}, {0.99, 1.0159935450}, {1, 1},
	} {
		got := EllipticE(math.Pi/2, c[0], 1-c[0])
		if math.Abs(got-c[1]) > 0.5000001e-10 {
			t.Errorf("E(%v) = %.12f, want %v", c[0], got, c[1])
		}
		if g := mathext.CompleteE(c[0]); math.Abs(got-g) > 4*Eps {
			t.Errorf("E(%v) = %.17g, gonum %.17g", c[0], got, g)
		}
	}
}

// Second routes for the incomplete integral: gonum where it holds (to π/2), and quadrature beyond.
func TestIncompleteE(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		mc := rapid.Float64Range(0, 1).Draw(t, "1 - m")
		m := 1 - mc
		phi := rapid.Float64Range(-20, 20).Draw(t, "phi")
		got := EllipticE(phi, m, mc)
		f := func(x float64) float64 { s, c := math.Sincos(x); return math.Hypot(c, math.Sqrt(mc)*s) }
		want, step := 0.0, math.Copysign(math.Pi/2, phi) // the integrand is slowest and fastest at quarter turns
		for x := 0.0; math.Abs(x) < math.Abs(phi); x += step {
			want += Integrate(f, x, x+math.Copysign(math.Min(math.Abs(step), math.Abs(phi-x)), phi))
		}
		// the goal for quadratures
		if math.Abs(got-want) > 1e-10*(1+math.Abs(want)) {
			t.Fatalf("E(%v, %v) = %v, quadrature %v", phi, m, got, want)
		}
		if p := math.Abs(phi); p <= math.Pi/2 {
			if g := mathext.EllipticE(p, m); math.Abs(math.Abs(got)-g) > 1e-13*(1+g) {
				t.Fatalf("E(%v, %v) = %v, gonum %v", p, m, got, g)
			}
		}
	})
}

// Polynomials built from chosen zeros, double ones too, give them back.
func TestZerosFindsWhatWasPutIn(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		n := rapid.IntRange(1, 4).Draw(t, "n")
		p := Poly{rapid.Float64Range(0.1, 10).Draw(t, "factor")}
		var want []float64
		for x := -1.0; len(want) < n; {
			x += rapid.Float64Range(0.05, 0.45).Draw(t, "step")
			want = append(want, x)
			p = p.Mul(Poly{-x, 1})
		}
		got := p.Zeros(-2, 2, nil)
		if len(got) != n {
			t.Fatalf("%v: %v, want %v", p, got, want)
		}
		for i := range got {
			// zeros 0.05 apart move by the rounding of the coefficients (10·Eps) over 0.05^3
			if math.Abs(got[i]-want[i]) > 1e-10 {
				t.Fatalf("%v, want %v", got, want)
			}
		}
		double := Poly{0.25, -1, 1} // (x - 1/2)²
		touch := func(x float64) bool { return math.Abs(double.At(x)) <= Place }
		if z := double.Zeros(-1, 1, touch); len(z) != 1 || z[0] != 0.5 {
			t.Fatalf("double zero: %v", z)
		}
	})
}

// The discriminant that plain products lose: roots 1 and 1 + 2^-26 have b² - ac = 2^-54.
func TestQuadraticKeepsCloseRoots(t *testing.T) {
	r := 1 + 0x1p-26
	got := Quadratic(1, -(1+r)/2, r)
	if len(got) != 2 || math.Abs(got[0]-1) > 2*Eps || math.Abs(got[1]-r) > 2*Eps {
		t.Errorf("%v, want 1 and %v", got, r)
	}
	if got := Quadratic(1, -1, 1); len(got) != 1 || got[0] != 1 {
		t.Errorf("double root: %v", got)
	}
	if got := Quadratic(0, 1, -4); len(got) != 1 || got[0] != 2 {
		t.Errorf("straight line: %v", got)
	}
	if got := Quadratic(1e-18, 0.5, -1); len(got) != 2 || math.Abs(got[1]-1) > Eps {
		t.Errorf("nearly straight: %v", got)
	}
}

func TestPanelIsExactForPolynomials(t *testing.T) {
	// the integral of 32·x^31 from 0 to 1 is 1
	if v := Panel(func(x float64) float64 { return 32 * math.Pow(x, 31) }, 0, 1); math.Abs(v-1) > 8*Eps {
		t.Errorf("%v, want 1", v)
	}
	// a kink is bracketed: the integral of |x - 1/3| over [0, 1] is 5/18
	if v := Integrate(func(x float64) float64 { return math.Abs(x - 1./3) }, 0, 1); math.Abs(v-5./18) > 1e-12 {
		t.Errorf("%v, want 5/18", v)
	}
}
