package view

import (
	"math"

	"epure/geom/curve"
	"epure/geom/vec"
)

// track is an image without a turn in it, and the way between its parameter
// and that of the space curve. They are the same unless the curve is seen
// edge-on: its image is then straight, covered once between two turns.
type track struct {
	image  curve.Arc2
	flat   curve.Curve2 // the curve whose straight part image is; Form 0 when image is itself
	t0, t1 float64      // ends in space
}

// steps bounds the search of a parameter: a halving gains one bit, so that 64
// of them exhaust a float64 whatever Newton's rule does.
const steps = 64

// along is the distance of the image of t from the start of a straight image.
func (k track) along(t float64) float64 { return k.flat.At(t).Sub(k.image.C).Dot(k.image.U) }

// space is the space parameter of the image parameter s. A straight image is
// inverted by Newton's rule, kept within an interval that halves.
func (k track) space(s float64) float64 {
	if k.flat.Form == 0 {
		return s
	}
	switch {
	case s <= 0:
		return k.t0
	case s >= k.image.T1:
		return k.t1
	}
	lo, hi := k.t0, k.t1
	t := (lo + hi) / 2
	for range steps {
		d := k.along(t) - s
		switch {
		case d > 0:
			hi = t
		case d < 0:
			lo = t
		default:
			return t
		}
		next := t - d/k.flat.Deriv(t, 1).Dot(k.image.U)
		if !(next > lo && next < hi) {
			next = (lo + hi) / 2
		}
		if next == t {
			return t
		}
		t = next
	}
	return t
}

// part is the image between the space parameters t0 and t1.
func (k track) part(t0, t1 float64) curve.Arc2 {
	if k.flat.Form == 0 {
		return curve.Arc2{Curve2: k.image.Curve2, T0: t0, T1: t1}
	}
	from := k.flat.At(t0)
	return curve.Arc2{
		Curve2: curve.Curve2{Form: curve.Line, C: from, U: k.image.U},
		T1:     k.flat.At(t1).Sub(from).Dot(k.image.U),
	}
}

// point is the image of the space parameter t.
func (k track) point(t float64) vec.V2 {
	if k.flat.Form == 0 {
		return k.image.At(t)
	}
	return k.flat.At(t)
}

// tracks projects the arc and cuts its image at the turns; none when all of it
// falls on one point. err is the rounding error of a point, mm.
func tracks(a curve.Arc, f vec.Frame, err float64) []track {
	flat := a.Project(f)
	if flat.Form == curve.Line {
		if float64(flat.U.Len()*(a.T1-a.T0)) <= err {
			return nil
		}
		return []track{{image: flat, t0: a.T0, t1: a.T1}}
	}
	e, straight := edgeOn(flat, err)
	if !straight {
		return []track{{image: flat, t0: a.T0, t1: a.T1}}
	}
	var out []track
	from := a.T0
	for _, t := range append(turns(flat, e), a.T1) {
		if k, ok := straightTrack(flat.Curve2, from, t, err); ok {
			out = append(out, k)
			from = t
		}
	}
	return out
}

// straightTrack is the straight image of the part from t0 to t1 of an edge-on
// curve; false when it has no length.
func straightTrack(c curve.Curve2, t0, t1, err float64) (track, bool) {
	p, q := c.At(t0), c.At(t1)
	if !(t1 > t0) || p.Dist(q) <= err {
		return track{}, false
	}
	return track{curve.Segment2(p, q), c, t0, t1}, true
}

// edgeOn tells whether the image of a conic stays within err of a straight
// line, and along which direction.
func edgeOn(a curve.Arc2, err float64) (vec.V2, bool) {
	u, w := weightBounds(a.Form, a.T0, a.T1)
	long, short, k := a.U, a.W, w
	if float64(w*a.W.Len()) > float64(u*a.U.Len()) {
		long, short, k = a.W, a.U, u
	}
	e := long.Unit()
	return e, float64(k*math.Abs(e.Cross(short))) <= err
}

// turns are the parameters inside the arc at which the image of a curve seen
// edge-on along e turns back, ascending.
func turns(a curve.Arc2, e vec.V2) []float64 {
	var ts []float64
	for _, t := range a.Extreme(e) {
		if t > a.T0 && t < a.T1 {
			ts = append(ts, t)
		}
	}
	return ts
}

// boxOf is the exact box of an image.
func boxOf(a curve.Arc2) box {
	b := box{a.Start(), a.Start()}
	take := func(p vec.V2) { b = b.with(box{p, p}) }
	take(a.End())
	for _, e := range [2]vec.V2{{X: 1}, {Y: 1}} {
		for _, t := range a.Extreme(e) {
			take(a.At(t))
		}
	}
	return b
}

// depths are the exact least and greatest of the arc's points along f.Z.
func depths(a curve.Arc, f vec.Frame) (lo, hi float64) {
	p, q := f.Local(a.Start()).Z, f.Local(a.End()).Z
	lo, hi = min(p, q), max(p, q)
	for _, t := range a.Extreme(f.Z) {
		z := f.Local(a.At(t)).Z
		lo, hi = min(lo, z), max(hi, z)
	}
	return lo, hi
}
