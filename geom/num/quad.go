package num

import "math"

// Panel integrates f over [a, b] by the Gauss-Legendre rule of sixteen points.
// It is right to the last digits for polynomials up to the degree 31, and for
// trigonometric and hyperbolic ones of a few periods' fraction.
func Panel(f func(float64) float64, a, b float64) float64 {
	m, h := (a+b)/2, (b-a)/2
	sum := 0.0
	for _, n := range gauss16() {
		d := h * n[0]
		sum += float64(n[1] * (f(m-d) + f(m+d)))
	}
	return h * sum
}

// gauss16 is the positive nodes of the rule with their weights, by Newton's
// method on the Legendre polynomial in forty-five digits.
func gauss16() [8][2]float64 {
	return [8][2]float64{
		{0.09501250983763744051, 0.18945061045506850217},
		{0.28160355077925891543, 0.18260341504492358378},
		{0.45801677765722736968, 0.16915651939500253587},
		{0.61787624440264377057, 0.14959598881657673597},
		{0.75540440835500299865, 0.12462897125553387689},
		{0.86563120238783175520, 0.09515851168249278569},
		{0.94457502307323260027, 0.06225352393864789363},
		{0.98940093499164993851, 0.02715245941175409641},
	}
}

// quadTol is the difference, relative to the integral, between one panel and
// its two halves under which the halves are taken. The error of a panel of
// sixteen points falls by 2^32 on halving, so what is left is rounding.
const quadTol = 0x1p-46

// quadPanels bounds the panels of one Integrate. A kink costs about a hundred;
// an integrand whose own rounding is over the bound stops here instead of halving for ever.
const quadPanels = 2048

// Integrate integrates f over [a, b], halving panels until they agree with
// their halves within quadTol of the integral.
func Integrate(f func(float64) float64, a, b float64) float64 {
	whole := Panel(f, a, b)
	q := quadrature{f, quadTol * math.Abs(whole), quadPanels}
	return q.halve(a, b, whole)
}

type quadrature struct {
	f    func(float64) float64
	tol  float64
	left int // panels that may still be taken
}

func (q *quadrature) halve(a, b, whole float64) float64 {
	m := a + (b-a)/2
	l, r := Panel(q.f, a, m), Panel(q.f, m, b)
	q.left -= 2
	if q.left <= 0 || math.Abs(l+r-whole) <= max(q.tol, quadTol*math.Abs(whole)) {
		return l + r
	}
	return q.halve(a, m, l) + q.halve(m, b, r)
}

// EllipticE is the incomplete elliptic integral of the second kind, the
// integral of sqrt(1 - m·sin²) from 0 to phi, for 0 <= m <= 1 and any phi. mc is 1 - m, which the
// caller may know better. The form is DLMF 19.25.10, all of whose terms
// are positive, so that nothing is lost as m approaches 1.
func EllipticE(phi, m, mc float64) float64 {
	turns := math.Round(phi / math.Pi)
	rest := phi - float64(turns*math.Pi)
	e := firstE(math.Abs(rest), m, mc)
	e = math.Copysign(e, rest)
	if turns != 0 {
		e += float64(2 * turns * firstE(math.Pi/2, m, mc))
	}
	return e
}

// firstE is EllipticE for 0 <= phi <= π/2.
func firstE(phi, m, mc float64) float64 {
	s, c := math.Sincos(phi)
	if phi == math.Pi/2 {
		c = 0
	}
	if s == 0 {
		return 0
	}
	d2 := float64(c*c) + float64(mc*s*s) // 1 - m·sin²
	if mc < 0x1p-60 {                    // E exceeds s by less than mc·ln(4/√mc)/2, under Eps/8
		return s
	}
	rf := s * carlsonF(c*c, d2, 1)
	rd := s * s * s * carlsonD(c*c, 1, d2)
	return float64(mc*rf) + float64(m*mc*rd)/3 + float64(m*s*c)/math.Sqrt(d2)
}

// carlsonTol bounds the spread of the arguments at which the series of Carlson's
// integrals is cut: its first term left out is of the sixth order, (2^-9)^6 = 2^-54.
const carlsonTol = 0x1p-9

// carlsonF is R_F (DLMF 19.36.1) by duplication.
func carlsonF(x, y, z float64) float64 {
	for {
		a := (x + y + z) / 3
		dx, dy, dz := 1-x/a, 1-y/a, 1-z/a
		if max(math.Abs(dx), math.Abs(dy), math.Abs(dz)) < carlsonTol {
			e2 := float64(dx*dy) - float64(dz*dz)
			e3 := dx * dy * dz
			return (1 - e2/10 + e3/14 + float64(e2*e2)/24 - float64(float64(e2*e3)*3)/44) / math.Sqrt(a)
		}
		l := float64(math.Sqrt(x)*math.Sqrt(y)) + float64(math.Sqrt(y)*math.Sqrt(z)) + float64(math.Sqrt(z)*math.Sqrt(x))
		x, y, z = (x+l)/4, (y+l)/4, (z+l)/4
	}
}

// carlsonD is R_D (DLMF 19.36.2) by duplication.
func carlsonD(x, y, z float64) float64 {
	sum, k := 0.0, 1.0
	for {
		a := (x + y + float64(3*z)) / 5
		dx, dy, dz := 1-x/a, 1-y/a, 1-z/a
		if max(math.Abs(dx), math.Abs(dy), math.Abs(dz)) < carlsonTol {
			xy, zz := dx*dy, dz*dz
			e2 := xy - float64(6*zz)
			e3 := (float64(3*xy) - float64(8*zz)) * dz
			e4 := 3 * (xy - zz) * zz
			e5 := xy * zz * dz
			s := 1 - e2*3/14 + e3/6 + float64(e2*e2)*9/88 - e4*3/22 - float64(e2*e3)*9/52 + e5*3/26
			return float64(3*sum) + float64(k*s)/(a*math.Sqrt(a))
		}
		sx, sy, sz := math.Sqrt(x), math.Sqrt(y), math.Sqrt(z)
		l := float64(sx*sy) + float64(sy*sz) + float64(sz*sx)
		sum += k / (sz * (z + l))
		k /= 4
		x, y, z = (x+l)/4, (y+l)/4, (z+l)/4
	}
}
