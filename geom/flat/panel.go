package flat

import (
	"cmp"
	"fmt"
	"math"
	"slices"

	"epure/geom/body"
	"epure/geom/curve"
	"epure/geom/num"
	"epure/geom/surface"
)

// rim is an edge across the generators, from the angle from in [0, turn) to the
// angle to, from < to <= from + turn.
type rim struct {
	profile
	face     int // the body's other face
	from, to float64
	arc      curve.Arc
	upper    bool // the material ends here for someone who goes along the generator
}

// wall is an edge along a generator.
type wall struct {
	face   int
	phi    float64 // [0, turn)
	lo, hi float64
}

// panel is a part a <= phi <= b of the turn in which the edges have a fixed order.
type panel struct {
	a, b  float64
	spans []band
}

// band is the material of a panel between two rims; lo may be apex.
type band struct{ lo, hi int }

// apex stands for the rim at u = 0.
const apex = -1

// sameAngle is the angle in radians under which something lies at the seam, at
// a division or at a corner: 1e-10 is 1e-5 mm on a radius of 100 m, and a
// thousand times angleError.
const sameAngle = 1e-10

// angleError bounds the rounding of an angle of the order of a turn after some
// frame changes and a root, radians: 64 units in the last place of 1.
const angleError = num.Place

// gather takes the edges round the face out of all edges of the body.
func (p *Pattern) gather(edges []body.Edge) error {
	for _, e := range edges {
		other := e.A
		switch p.face {
		case e.A:
			other = e.B
		case e.B:
		default:
			continue
		}
		if other == p.face {
			continue
		}
		if e.Arc.Form == curve.Line {
			p.walls = append(p.walls, p.roll.wallOf(e.Arc, other))
			continue
		}
		pl, ok := p.body.Faces[other].Surface.(surface.Plane)
		if !ok {
			return p.fail("%s is not a plane", p.body.Faces[other].Label)
		}
		prof, ok := p.roll.profileOf(pl)
		if !ok {
			return p.fail("its edge on %s is curved and yet along generators", p.body.Faces[other].Label)
		}
		m := rim{profile: prof, face: other, arc: e.Arc}
		m.from, m.to = p.roll.sweep(e.Arc)
		p.rims = append(p.rims, m)
	}
	return nil
}

func (p *Pattern) fail(format string, args ...any) error {
	return &FaceError{p.body.Faces[p.face].Label, fmt.Sprintf(format, args...)}
}

// wallOf returns the generator edge that the straight arc a is.
func (r roll) wallOf(a curve.Arc, face int) wall {
	phi, _ := r.coords(a.Mid())
	_, lo := r.coords(a.Start())
	_, hi := r.coords(a.End())
	return wall{face, phi, min(lo, hi), max(lo, hi)}
}

// sweep returns the range of phi over an arc across the generators. phi is
// monotone along it, since a plane meets a generator once.
func (r roll) sweep(a curve.Arc) (from, to float64) {
	if a.Form.Periodic() && a.T1-a.T0 > turn-sameAngle {
		return 0, turn
	}
	t := (a.T0 + a.T1) / 2
	first, last := a.Start(), a.End()
	if r.f.Z.Dot(a.At(t).Sub(r.f.O).Cross(a.Deriv(t, 1))) < 0 {
		first, last = last, first
	}
	from, _ = r.coords(first)
	end, _ := r.coords(last)
	return from, from + wrap(end-from)
}

// covers tells whether the rim has a point at phi in [0, turn].
func (m rim) covers(phi float64) bool {
	return m.from <= phi && phi <= m.to || phi+turn <= m.to
}

// divide cuts the turn into panels and finds the material of each.
func (p *Pattern) divide() error {
	at := p.settle()
	for i := 1; i < len(at); i++ {
		q := panel{a: at[i-1], b: at[i]}
		mid := (q.a + q.b) / 2
		var cross []int
		if p.roll.cone {
			cross = append(cross, apex)
		}
		for j, m := range p.rims {
			if m.covers(mid) {
				cross = append(cross, j)
			}
		}
		slices.SortStableFunc(cross, func(a, b int) int {
			return cmp.Compare(p.order(a, q), p.order(b, q))
		})
		if p.roll.cone && len(cross)%2 == 1 {
			cross = cross[1:] // an even number of edges: the apex is not in the part
		}
		if len(cross)%2 == 1 {
			return p.fail("its edges leave it open at %.6g°", (p.roll.seam+mid)*180/math.Pi)
		}
		for j := 0; j < len(cross); j += 2 {
			q.spans = append(q.spans, band{cross[j], cross[j+1]})
			p.rims[cross[j+1]].upper = true
		}
		p.panels = append(p.panels, q)
	}
	return nil
}

// order is what the rims of a panel are sorted by. They may touch in it but
// not cross, so the sum of u at two places puts them in order.
func (p *Pattern) order(j int, q panel) float64 {
	d := (q.b - q.a) / 3
	return p.u(j, q.a+d) + p.u(j, q.b-d)
}

// u returns u on the rim j, or 0 for the apex.
func (p *Pattern) u(j int, phi float64) float64 {
	if j == apex {
		return 0
	}
	return p.rims[j].u(phi)
}

// near returns the panels that hold phi: two at a break.
func (p *Pattern) near(phi float64) []panel {
	var in []panel
	for _, q := range p.panels {
		if q.a-sameAngle < phi && phi < q.b+sameAngle {
			in = append(in, q)
		}
	}
	return in
}

// at returns the spans of material on the generator at phi in [0, turn],
// ascending. Where an edge lies along the generator both its sides count; at 0
// and at turn only the side within the pattern.
func (p *Pattern) at(phi float64) []Span {
	var s []Span
	for _, q := range p.near(phi) {
		for _, b := range q.spans {
			lo, hi := p.u(b.lo, phi), p.u(b.hi, phi)
			s = append(s, Span{Lo: lo, Hi: max(lo, hi)})
		}
	}
	s = union(s, p.join*p.size)
	for i := range s {
		s[i].Low, s[i].High = p.roll.flat(phi, s[i].Lo), p.roll.flat(phi, s[i].Hi)
	}
	return s
}

// union joins spans that overlap or touch within tol.
func union(s []Span, tol float64) []Span {
	slices.SortStableFunc(s, func(a, b Span) int { return cmp.Compare(a.Lo, b.Lo) })
	var out []Span
	for _, x := range s {
		if n := len(out); n > 0 && x.Lo <= out[n-1].Hi+tol {
			out[n-1].Hi = max(out[n-1].Hi, x.Hi)
			continue
		}
		out = append(out, x)
	}
	return out
}
