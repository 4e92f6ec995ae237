package curve

import (
	"math"
	"sort"

	"epure/geom/num"
	"epure/geom/vec"
)

// Crossing is a common point of two arcs, by its parameter on each.
type Crossing struct{ TA, TB float64 }

// Meet returns the common points of the arcs a and b, by ascending TA. Points within tol mm of each other
// are one; arcs that touch within tol give the point of contact once.
//
// Arcs that run along each other give coincident, and the crossings are then the
// ends of one that lie on the other. An arc whose image is
// folded on to a straight line (a circle seen edge on) counts as that line: where it turns
// back is an end too, and a point that it passes twice comes once for each pass.
// An arc that is no longer than tol meets nothing.
func Meet(a, b Arc2, tol float64) (pts []Crossing, coincident bool) {
	la, fa := a.flat(tol)
	lb, fb := b.flat(tol)
	switch {
	case fa == point || fb == point:
		return nil, false
	case fa == straight && fb == straight:
		pts, coincident = meetLines(a, b, la, lb, tol)
	case fa == straight:
		pts = throughLine(b, a, la, tol)
		for i, p := range pts {
			pts[i] = Crossing{p.TB, p.TA}
		}
	case fb == straight:
		pts = throughLine(a, b, lb, tol)
	default:
		pts, coincident = meetConics(a, b, tol)
		if !coincident {
			pts = contacts(a, b, tidy(a, b, pts, tol), tol)
		}
	}
	return tidy(a, b, pts, tol), coincident
}

// tidy sorts the crossings and drops repeats.
func tidy(a, b Arc2, pts []Crossing, tol float64) []Crossing {
	sort.SliceStable(pts, func(i, j int) bool { return pts[i].TA < pts[j].TA })
	var out []Crossing
	for _, p := range pts {
		again := false
		for _, q := range out {
			again = again || near(a, p.TA, q.TA, tol) && near(b, p.TB, q.TB, tol)
		}
		if !again {
			out = append(out, p)
		}
	}
	return out
}

// contacts makes one of crossings between which the curves stay within tol: there they
// touch, and rounding has found the contact more than once. The one where they run most alike stays.
func contacts(a, b Arc2, pts []Crossing, tol float64) []Crossing {
	slant := func(c Crossing) float64 {
		return math.Abs(a.Deriv(c.TA, 1).Unit().Cross(b.Deriv(c.TB, 1).Unit()))
	}
	var out []Crossing
	for _, p := range pts {
		merged := false
		for i, q := range out {
			if !alike(a, b, p, q, tol) {
				continue
			}
			merged = true
			if slant(p) < slant(q) {
				out[i] = p
			}
		}
		if !merged {
			out = append(out, p)
		}
	}
	return out
}

// alike tells whether the arcs stay within tol of each other from p to q.
func alike(a, b Arc2, p, q Crossing, tol float64) bool {
	for _, k := range []float64{0.25, 0.5, 0.75} {
		if a.At(between(a, p.TA, q.TA, k)).Dist(b.At(between(b, p.TB, q.TB, k))) > tol {
			return false
		}
	}
	return true
}

// between is the parameter at the fraction k of the way from s to t, the short way round.
func between(a Arc2, s, t, k float64) float64 {
	d := t - s
	if a.Form.Periodic() {
		d = num.Turn(d, -math.Pi)
	}
	return s + float64(k*d)
}

// near tells whether two parameters of an arc are one place: the points there and
// halfway between lie within tol.
func near(a Arc2, s, t, tol float64) bool {
	p := a.At(s)
	return p.Dist(a.At(t)) <= tol && p.Dist(a.At(between(a, s, t, 0.5))) <= tol
}

// clamp returns t, or the end of the arc that t oversteps by no more than tol.
func (a Arc2) clamp(t, tol float64) (float64, bool) {
	if a.Form.Periodic() {
		t = num.Turn(t, a.T0)
		if t > a.T1 && near(a, t, a.T0+2*math.Pi, tol) {
			t = a.T0
		}
	}
	c := min(max(t, a.T0), a.T1)
	return c, c == t || near(a, t, c, tol)
}

// flatness says how an arc looks.
type flatness uint8

const (
	curved flatness = iota
	straight
	point
)

// track is the straight line that a flat arc runs on, through o along the unit vector e.
type track struct{ o, e vec.V2 }

// flat tells whether all of the arc lies within tol of a straight line.
func (a Arc2) flat(tol float64) (track, flatness) {
	if a.Form == Line {
		if a.U.Len()*(a.T1-a.T0) <= tol {
			return track{}, point
		}
		return track{a.Start(), a.U.Unit()}, straight
	}
	o, far := a.Start(), vec.V2{}
	for i := 1; i <= 4; i++ { // a conic that is not flat is found out below, whatever chord is taken
		d := a.At(a.T0 + float64((a.T1-a.T0)*float64(i)/4)).Sub(o)
		if d.Len() > far.Len() {
			far = d
		}
	}
	if far.Len() <= tol {
		return track{}, point
	}
	l := track{o, far.Unit()}
	n := l.e.Left()
	for _, t := range append(a.Extreme(n), a.T1) {
		if math.Abs(a.At(t).Sub(o).Dot(n)) > tol {
			return track{}, curved
		}
	}
	return l, straight
}

// Straight tells whether the arc lies within tol mm of a straight line, and at
// which parameters between its ends it turns back on it.
func (a Arc2) Straight(tol float64) (folds []float64, ok bool) {
	l, f := a.flat(tol)
	if f == curved {
		return nil, false
	}
	return a.folds(l.e), true
}

// folds are the parameters strictly between the ends at which the arc turns back along e.
func (a Arc2) folds(e vec.V2) []float64 {
	var out []float64
	for _, t := range a.Extreme(e) {
		if t > a.T0 && t < a.T1 {
			out = append(out, t)
		}
	}
	return out
}

// nodes are the ends and folds of an arc along e.
func (a Arc2) nodes(e vec.V2) []float64 {
	return append([]float64{a.T0, a.T1}, a.folds(e)...)
}

// passes are the parameters at which a flat arc along e passes the point p.
func (a Arc2) passes(p, e vec.V2, tol float64) []float64 {
	wide := a
	if !a.Form.Periodic() {
		wide.T0, wide.T1 = math.Inf(-1), math.Inf(1)
	} else {
		wide.T1 = wide.T0 + 2*math.Pi
	}
	var out []float64
	for _, t := range wide.Cross(p, e, tol) {
		if c, ok := a.clamp(t, tol); ok && (len(out) == 0 || c != out[len(out)-1]) {
			out = append(out, c)
		}
	}
	return out
}

// meetLines is Meet for two arcs on straight tracks.
func meetLines(a, b Arc2, la, lb track, tol float64) ([]Crossing, bool) {
	n := lb.e.Left()
	off := func(t float64) float64 { return a.At(t).Sub(lb.o).Dot(n) }
	along := true
	for _, t := range a.nodes(la.e) {
		along = along && math.Abs(off(t)) <= tol
	}
	if along {
		return overlap(a, b, lb.e, tol)
	}
	k := la.e.Dot(n)
	if k == 0 {
		return nil, false
	}
	p := la.o.Along(la.e, -la.o.Sub(lb.o).Dot(n)/k)
	var out []Crossing
	for _, ta := range a.passes(p, la.e, tol) {
		for _, tb := range b.passes(p, lb.e, tol) {
			out = append(out, Crossing{ta, tb})
		}
	}
	return out, false
}

// overlap is the crossings of two arcs on the same track along e, and whether they share more than a point.
func overlap(a, b Arc2, e vec.V2, tol float64) ([]Crossing, bool) {
	var out []Crossing
	lo, hi := math.Inf(1), math.Inf(-1)
	add := func(ta, tb float64) {
		out = append(out, Crossing{ta, tb})
		v := a.At(ta).Dot(e)
		lo, hi = min(lo, v), max(hi, v)
	}
	for _, ta := range a.nodes(e) {
		for _, tb := range b.passes(a.At(ta), e, tol) {
			add(ta, tb)
		}
	}
	for _, tb := range b.nodes(e) {
		for _, ta := range a.passes(b.At(tb), e, tol) {
			add(ta, tb)
		}
	}
	return out, hi-lo > tol
}

// throughLine is the crossings of the curved arc a with the flat arc b on the track l.
func throughLine(a, b Arc2, l track, tol float64) []Crossing {
	wide := a
	if a.Form.Periodic() {
		wide.T1 = wide.T0 + 2*math.Pi
	} else {
		wide.T0, wide.T1 = math.Inf(-1), math.Inf(1)
	}
	var out []Crossing
	for _, t := range wide.Cross(l.o, l.e.Left(), tol) {
		ta, ok := a.clamp(t, tol)
		if !ok {
			continue
		}
		for _, tb := range b.passes(a.At(t), l.e, tol) {
			out = append(out, Crossing{ta, tb})
		}
	}
	return out
}
