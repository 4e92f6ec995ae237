package drawing

import (
	"math"
	"sort"

	"epure/geom/vec"
)

// Hatching. Parallel lines are cut against the outline's own curves, to the last
// bit of the parameter: no polygon stands in for a conic. Every piece is first split where it runs along the hatch, so that each part
// meets a hatch line at most once, and a crossing is counted by the half-open
// rule (height of one end at or below the line, of the other above it). So a
// line through a corner, or tangent to a curve, is neither missed nor counted
// twice, and no line is moved to avoid it.

// HatchAngle is the slope of hatching to the main outline, radians.
const HatchAngle = math.Pi / 4

// LeastPitch returns the smallest spacing of hatch lines of the given width, mm:
// ISO 128 asks for 0.7 mm clear between lines.
func LeastPitch(width float64) float64 { return 0.7 + width }

// PitchFor returns a spacing chosen by the hatched area's size, mm: a fifteenth
// of the larger side of its box between 1.5 and 4 (common practice, no source).
func PitchFor(b Box) float64 { return min(4, max(1.5, max(b.Width(), b.Height())/15)) }

// Hatch fills the closed outlines, even-odd, with lines at the given angle
// (radians from rightward) and pitch (mm, square to the lines; not over zero: no
// lines). Lines stand at whole multiples of pitch from the paper's origin, so
// that separate areas of one part match. They come in order of their offset,
// and along each line, all running the same way.
func Hatch(outlines []Path, angle, pitch float64) []Line {
	if !(pitch > 0) {
		return nil
	}
	s, c := math.Sincos(angle)
	dir := vec.V2{X: c, Y: s}
	h := hatcher{dir: dir, n: dir.Left()}
	for _, o := range outlines {
		h.outline(o)
	}
	return h.lines(pitch)
}

type hatcher struct {
	dir, n vec.V2
	parts  []monotone
}

// monotone is a part of a piece whose height along n only rises or only falls
// from lo to hi, with a function that finds where it has a given height.
type monotone struct {
	lo, hi float64
	at     func(height float64) vec.V2
}

// outline adds the pieces of one closed outline. The height where one piece ends
// and the next starts is taken once, whatever rounding did to the two points.
func (h *hatcher) outline(p Path) {
	pieces := flatten(p)
	if len(pieces) == 0 {
		return
	}
	first, _, _ := Ends(pieces[0])
	start := first.Dot(h.n)
	at := start
	for i, s := range pieces {
		_, to, _ := Ends(s)
		end := to.Dot(h.n)
		if i == len(pieces)-1 && to.Dist(first) <= FlatAxis {
			end = start
		}
		at = h.piece(s, at, end)
	}
	if at != start {
		_, last, _ := Ends(pieces[len(pieces)-1])
		h.piece(Line{last, first}, at, start)
	}
}

// flatten unfolds paths inside paths, and drops text.
func flatten(p Path) []Shape {
	var out []Shape
	for _, s := range p.Pieces {
		switch s := s.(type) {
		case Path:
			out = append(out, flatten(s)...)
		case Spline:
			for _, c := range s.Cubics() {
				out = append(out, Spline{Points: c[:]})
			}
		case Line, EllipseArc, Quad:
			out = append(out, s)
		}
	}
	return out
}

// piece adds the parts of s between its turning points, from height from to
// height to, and returns to.
func (h *hatcher) piece(s Shape, from, to float64) float64 {
	at, t0, t1, turns := h.split(s)
	ts := append(append([]float64{t0}, turns...), t1)
	for i := 1; i < len(ts); i++ {
		a, b := ts[i-1], ts[i]
		end := to
		if i < len(ts)-1 {
			end = at(b).Dot(h.n)
		}
		h.parts = append(h.parts, monotone{from, end, func(y float64) vec.V2 { return at(h.root(at, a, b, y)) }})
		from = end
	}
	return to
}

// split returns a piece's parametrisation, and its turning points inside: where
// its derivative along n vanishes.
func (h *hatcher) split(s Shape) (at func(float64) vec.V2, t0, t1 float64, turns []float64) {
	switch s := s.(type) {
	case Line:
		return s.At, 0, 1, nil
	case EllipseArc:
		return s.At, s.From, s.To, s.across(h.n)
	case Quad:
		a, b := s.P1.Sub(s.P0).Dot(h.n), s.P2.Sub(s.P1).Dot(h.n)
		return s.At, 0, 1, between(a/(a-b), 0, 1)
	case Spline:
		c := Cubic(s.Points)
		a, b, d := c[1].Sub(c[0]).Dot(h.n), c[2].Sub(c[1]).Dot(h.n), c[3].Sub(c[2]).Dot(h.n)
		for _, t := range quadratic(a-2*b+d, 2*(b-a), a) {
			turns = append(turns, between(t, 0, 1)...)
		}
		return c.At, 0, 1, turns
	}
	return nil, 0, 0, nil
}

// quadratic returns the real roots of a·t² + b·t + c, rising, without
// cancellation; two equal roots are none, for there the sign does not change.
func quadratic(a, b, c float64) []float64 {
	d := b*b - 4*a*c
	if !(d > 0) {
		return nil
	}
	q := -(b + math.Copysign(math.Sqrt(d), b)) / 2
	r := []float64{q / a, c / q}
	sort.Float64s(r)
	return r
}

// rootSteps bounds the search: a bracket of 1 shrinks under 2^-52 in 52 halvings,
// and Newton's steps only shorten that.
const rootSteps = 64

// root finds where at, monotone along n between a and b, has the height y: a
// secant step and a halving in turn, so that the bracket at least halves each
// time. (The closed forms of arc and parabola were weighed: they lose the same
// digits near a tangency, and need a choice of branch that this does not.)
func (h *hatcher) root(at func(float64) vec.V2, a, b, y float64) float64 {
	f := func(t float64) float64 { return at(t).Dot(h.n) - y }
	fa, fb := f(a), f(b)
	if fa == 0 || fb == 0 || fa*fb > 0 { // an end, or an end moved by rounding
		if math.Abs(fa) < math.Abs(fb) {
			return a
		}
		return b
	}
	for range rootSteps {
		t := a + (b-a)*fa/(fa-fb)
		if ft := f(t); ft*fa > 0 {
			a, fa = t, ft
		} else {
			b, fb = t, ft
		}
		m := (a + b) / 2
		if m == a || m == b {
			break
		}
		if fm := f(m); fm*fa > 0 {
			a, fa = m, fm
		} else {
			b, fb = m, fm
		}
		if fa == 0 || fb == 0 {
			break
		}
	}
	if math.Abs(fa) < math.Abs(fb) {
		return a
	}
	return b
}

// lines cuts every hatch line and pairs its crossings.
func (h *hatcher) lines(pitch float64) []Line {
	lo, hi := math.Inf(1), math.Inf(-1)
	for _, m := range h.parts {
		lo, hi = min(lo, m.lo, m.hi), max(hi, m.lo, m.hi)
	}
	var out []Line
	if !((hi-lo)/pitch < mostLines) {
		return nil
	}
	for k := math.Floor(lo / pitch); k*pitch <= hi; k++ {
		hits := h.crossings(k * pitch)
		for i := 0; i+1 < len(hits); i += 2 {
			if l := (Line{hits[i], hits[i+1]}); l.A.Dist(l.B) > FlatAxis {
				out = append(out, l)
			}
		}
	}
	return out
}

// mostLines bounds the work on outlines that are not on any paper: A0's diagonal
// at the least pitch takes under 2000 lines.
const mostLines = 20000

// crossings returns the points where the line of height y meets the outlines,
// sorted along it.
func (h *hatcher) crossings(y float64) []vec.V2 {
	var hits []vec.V2
	for _, m := range h.parts {
		if (m.lo <= y) != (m.hi <= y) {
			hits = append(hits, m.at(y))
		}
	}
	sort.SliceStable(hits, func(i, j int) bool { return hits[i].Dot(h.dir) < hits[j].Dot(h.dir) })
	return hits
}
