package num

import "math"

// Poly is a polynomial by its coefficients, the constant first.
type Poly []float64

// At is the value at x.
func (p Poly) At(x float64) float64 {
	v := 0.0
	for i := len(p) - 1; i >= 0; i-- {
		v = float64(v*x) + p[i]
	}
	return v
}

// Deriv is the derivative.
func (p Poly) Deriv() Poly {
	if len(p) < 2 {
		return nil
	}
	d := make(Poly, len(p)-1)
	for i := range d {
		d[i] = float64(i+1) * p[i+1]
	}
	return d
}

// Mul is the product.
func (p Poly) Mul(q Poly) Poly {
	if len(p) == 0 || len(q) == 0 {
		return nil
	}
	r := make(Poly, len(p)+len(q)-1)
	for i, a := range p {
		for j, b := range q {
			r[i+j] += float64(a * b)
		}
	}
	return r
}

// Plus is p + k·q.
func (p Poly) Plus(k float64, q Poly) Poly {
	r := make(Poly, max(len(p), len(q)))
	copy(r, p)
	for i, b := range q {
		r[i] += float64(k * b)
	}
	return r
}

// Zeros are the zeros strictly between lo and hi, ascending. They are found between the zeros
// of the derivative, where the polynomial is monotone, so that no zero is lost and a
// double one is not torn in two: at a turning point x for which touch(x) holds the
// zero is x, once. touch may be nil.
func (p Poly) Zeros(lo, hi float64, touch func(x float64) bool) []float64 {
	n := len(p)
	for n > 0 && p[n-1] == 0 {
		n--
	}
	p = p[:n]
	if n < 2 {
		return nil
	}
	xs := append([]float64{lo}, p.Deriv().Zeros(lo, hi, nil)...)
	xs = append(xs, hi)
	var out []float64
	last := p.At(lo)
	for i := 1; i < len(xs); i++ {
		v := p.At(xs[i])
		if i < len(xs)-1 && touch != nil && touch(xs[i]) {
			v = 0
		}
		switch {
		case v == 0 && i < len(xs)-1 && (len(out) == 0 || out[len(out)-1] < xs[i]):
			out = append(out, xs[i])
		case last < 0 && v > 0 || last > 0 && v < 0:
			out = append(out, p.between(xs[i-1], xs[i]))
		}
		last = v
	}
	return out
}

// between is the zero between a and b, where p has opposite signs.
func (p Poly) between(a, b float64) float64 {
	d := p.Deriv()
	return Bracket(func(x float64) (float64, float64) { return p.At(x), d.At(x) }, a, b)
}

// Bracket returns the zero between a and b of a function f (value and
// derivative) that has opposite signs there: Newton's step where it stays inside and shrinks fast,
// else halving, down to neighbouring floats.
func Bracket(f func(x float64) (v, d float64), a, b float64) float64 {
	va, _ := f(a)
	if va > 0 {
		a, b = b, a
	}
	x := a + (b-a)/2
	step := math.Abs(b - a)
	for range 200 { // halving alone needs at most 64 + the exponent range
		v, d := f(x)
		switch {
		case v == 0:
			return x
		case v < 0:
			a = x
		default:
			b = x
		}
		next := x - v/d
		if !(next > min(a, b) && next < max(a, b)) || math.Abs(next-x) > step/2 {
			next = a + (b-a)/2
		}
		step = math.Abs(next - x)
		if next == x || next == a || next == b {
			return next
		}
		x = next
	}
	return x
}
