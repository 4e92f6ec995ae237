package view

import (
	"math"
	"math/rand/v2"

	"epure/geom/body"
	"epure/geom/surface"
	"epure/geom/vec"
)

// solid is the second route: a frustum cut by planes, told by distances that are written down here
// from its definition and share nothing with the package body.
type solid struct {
	f         vec.Frame // base at f.O, axis along f.Z
	r0, r1, h float64
	cuts      []vec.Frame // material on the side against Z
	ball      bool        // a sphere of radius r0 about f.O instead; r1 and h are zero
}

// value is a convex function of p, negative inside, whose size is the distance from the nearest boundary.
func (s solid) value(p vec.V3) float64 {
	q := s.f.Local(p)
	if s.ball {
		return s.cutBack(p, q.Len()-s.r0)
	}
	slope := (s.r0 - s.r1) / s.h
	v := (math.Hypot(q.X, q.Y) - s.r0 + slope*q.Z) / math.Sqrt(1+slope*slope)
	return s.cutBack(p, max(v, -q.Z, q.Z-s.h))
}

// cutBack is the value v at p with the cuts.
func (s solid) cutBack(p vec.V3, v float64) float64 {
	for _, c := range s.cuts {
		v = max(v, p.Sub(c.O).Dot(c.Z))
	}
	return v
}

// cover is how deep the ray from p along d runs in the solid: the least value on it. A convex function
// on a line is searched by golden section.
func (s solid) cover(p, d vec.V3) float64 {
	m := s.f.Point(vec.V3{Z: s.h / 2})
	if miss := m.Sub(p).Cross(d).Len() - math.Hypot(s.h/2, max(s.r0, s.r1)); miss > 0 {
		return miss
	}
	at := func(t float64) float64 { return s.value(p.Along(d, t)) }
	// everything of the solid lies within this of p
	far := p.Dist(s.f.O) + s.h + s.r0 + s.r1
	lo, hi := 0.0, far
	const g = 0.6180339887498949
	a, b := hi-g*(hi-lo), lo+g*(hi-lo)
	va, vb := at(a), at(b)
	best := min(at(0), va, vb)
	for range 90 {
		if va < vb {
			hi, b, vb = b, a, va
			a = hi - g*(hi-lo)
			va = at(a)
		} else {
			lo, a, va = a, b, vb
			b = lo + g*(hi-lo)
			vb = at(b)
		}
		best = min(best, va, vb)
	}
	return best
}

func (s solid) size() float64 { return math.Hypot(s.h, 2*max(s.r0, s.r1)) }

// body is the solid as the package body makes it; false when a cut leaves nothing.
func (s solid) body() (*body.Body, bool) {
	b := body.Ball("K", s.f.O, s.r0)
	if !s.ball {
		b = body.Frustum("K", s.f, s.f, s.r0, s.r1, s.h)
	}
	for i, c := range s.cuts {
		cut, err := b.Cut(surface.Plane{F: c}, string(rune('P'+i)))
		if err != nil {
			if e, ok := err.(*body.CutError); ok && !e.Nothing {
				continue // takes nothing away
			}
			return nil, false
		}
		b = cut
	}
	return b, true
}

// rim is the points of the edges and contours of the solid for sight along d, n on each curve. They are worked
// out from generators, circles and lines, not from conics.
func (s solid) rim(d vec.V3, n int) []vec.V3 {
	var out []vec.V3
	keep := func(p vec.V3, skip int) {
		for i, c := range s.cuts {
			if i != skip && p.Sub(c.O).Dot(c.Z) > -1e-7*s.size() {
				return
			}
		}
		out = append(out, p)
	}
	if s.ball {
		ring := func(f vec.Frame, r float64, skip int) {
			for k := range n {
				sin, cos := math.Sincos(2 * math.Pi * (float64(k) + 0.37) / float64(n))
				keep(f.Point(vec.V3{X: r * cos, Y: r * sin}), skip)
			}
		}
		ring(vec.PlaneFrame(s.f.O, d), s.r0, -1)
		for i, c := range s.cuts {
			if high := s.f.O.Sub(c.O).Dot(c.Z); math.Abs(high) < s.r0 {
				ring(c.At(s.f.O.Along(c.Z, -high)), math.Sqrt(s.r0*s.r0-high*high), i)
			}
		}
		return append(out, s.chords(n)...)
	}
	radius := func(z float64) float64 { return s.r0 + (s.r1-s.r0)*z/s.h }
	side := func(theta, z float64) vec.V3 {
		sin, cos := math.Sincos(theta)
		return s.f.Point(vec.V3{X: radius(z) * cos, Y: radius(z) * sin, Z: z})
	}
	for k := range n {
		theta := 2 * math.Pi * (float64(k) + 0.37) / float64(n)
		keep(side(theta, 0), -1)
		if s.r1 > 0 {
			keep(side(theta, s.h), -1)
		}
		for i, c := range s.cuts { // the generator from base to top meets the cut
			p, q := side(theta, 0), side(theta, s.h)
			u, v := p.Sub(c.O).Dot(c.Z), q.Sub(c.O).Dot(c.Z)
			if u*v < 0 {
				keep(p.Along(q.Sub(p), u/(u-v)), i)
			}
		}
	}
	for _, theta := range s.outline(d) {
		for k := range n {
			keep(side(theta, s.h*(float64(k)+0.37)/float64(n)), -1)
		}
	}
	return append(out, s.chords(n)...)
}

// outline is the angles of the generators whose normal is square to d.
func (s solid) outline(d vec.V3) []float64 {
	e := s.f.Dir(d)
	k := (s.r0 - s.r1) / s.h * e.Z
	r := math.Hypot(e.X, e.Y)
	if r == 0 || math.Abs(k) > r*(1-1e-9) {
		return nil
	}
	phi, half := math.Atan2(e.Y, e.X), math.Acos(-k/r)
	return []float64{phi - half, phi + half}
}

// chords is points of the straight edges between plane faces.
func (s solid) chords(n int) []vec.V3 {
	type plane struct{ o, z vec.V3 }
	planes := []plane{{s.f.O, s.f.Z.Neg()}, {s.f.Point(vec.V3{Z: s.h}), s.f.Z}}
	if s.r1 == 0 {
		planes = planes[:1]
	}
	if s.ball {
		planes = nil
	}
	for _, c := range s.cuts {
		planes = append(planes, plane{c.O, c.Z})
	}
	var out []vec.V3
	for i, a := range planes {
		for _, b := range planes[i+1:] {
			u := a.z.Cross(b.z)
			if u.Len() < 1e-9 {
				continue
			}
			u = u.Unit()
			// the point of both planes nearest the middle of the axis
			o := s.f.Point(vec.V3{Z: s.h / 2})
			o = o.Along(a.z, a.o.Sub(o).Dot(a.z))
			in := u.Cross(a.z)
			o = o.Along(in, b.o.Sub(o).Dot(b.z)/in.Dot(b.z))
			for k := range n {
				p := o.Along(u, s.size()*(2*(float64(k)+0.37)/float64(n)-1))
				if math.Abs(s.value(p)) < 1e-12*s.size()+1e-13*p.Len() {
					out = append(out, p)
				}
			}
		}
	}
	return out
}

// anywhere is a random unit vector; evenly spread enough.
func anywhere(r *rand.Rand) vec.V3 {
	for {
		v := vec.V3{X: 2*r.Float64() - 1, Y: 2*r.Float64() - 1, Z: 2*r.Float64() - 1}
		if l := v.Len(); l > 0.1 && l < 1 {
			return v.Unit()
		}
	}
}

// along is a direction of the drawing office: along an axis of the model or at 45° or a
// Pythagorean slope between two of them.
func along(r *rand.Rand) vec.V3 {
	axes := [3]vec.V3{{X: 1}, {Y: 1}, {Z: 1}}
	a, b := axes[r.IntN(3)], axes[r.IntN(3)]
	if r.IntN(2) == 0 {
		a = a.Neg()
	}
	switch r.IntN(4) {
	case 0:
		return a.Add(b).Add(a).Unit()
	case 1:
		return a.Scale(0.8).Along(b, 0.6).Unit()
	}
	return a
}

// random is a solid anywhere; with square, on whole numbers and in directions of the drawing office.
func random(r *rand.Rand, square bool) solid {
	turn, num := anywhere, func() float64 { return 20 + 80*r.Float64() }
	at := func() float64 { return 300*r.Float64() - 150 }
	if square {
		turn, num = along, func() float64 { return float64(20 + 20*r.IntN(4)) }
		at = func() float64 { return float64(20 * (r.IntN(15) - 7)) }
	}
	s := solid{f: vec.PlaneFrame(vec.V3{X: at(), Y: at(), Z: at()}, turn(r)), r0: num(), h: num()}
	switch r.IntN(4) {
	case 0:
		s.r1 = s.r0
	case 1:
		s.r1 = num()
	case 2:
		s.ball, s.h = true, 0
	}
	for range r.IntN(3) {
		o := s.f.Point(vec.V3{X: (r.Float64() - 0.5) * s.r0, Y: (r.Float64() - 0.5) * s.r0, Z: s.h * r.Float64()})
		if square {
			o = s.f.Point(vec.V3{Z: s.h * float64(1+r.IntN(3)) / 4})
		}
		s.cuts = append(s.cuts, vec.PlaneFrame(o, turn(r)))
	}
	return s
}
