package flat

import (
	"math"

	"epure/geom/curve"
	"epure/geom/surface"
	"epure/geom/vec"
)

// Proof holds what a pattern proves itself by: each quantity on the pattern
// and in space, by routes that share neither formula nor parameter. The flat
// ones are integrals of the drawn paths over the angle; those in space are
// integrals of the body's own conics over the conic's parameter.
type Proof struct {
	AreaFlat  float64 // mm², half of the integral of x·dy - y·dx round the outline
	AreaSpace float64 // mm², from the edges in space
	Edges     []EdgeProof
	Deviation float64 // mm, see Pattern.Deviation
}

// EdgeProof is the length of the face's edge with the face Label, mm.
type EdgeProof struct {
	Label       string
	Flat, Space float64
}

// Worst is the greatest relative difference between a flat quantity and the same in space.
func (p Proof) Worst() float64 {
	worst := apart(p.AreaFlat, p.AreaSpace)
	for _, e := range p.Edges {
		worst = max(worst, apart(e.Flat, e.Space))
	}
	return worst
}

// apart is the difference of two values relative to the greater.
func apart(a, b float64) float64 {
	if a == b {
		return 0
	}
	return math.Abs(a-b) / max(math.Abs(a), math.Abs(b))
}

// Proof works the proof out. Edges are in the order of the body's faces.
func (p *Pattern) Proof() Proof {
	return Proof{p.areaFlat(), p.areaSpace(), p.edgeProofs(), p.Deviation()}
}

// areaFlat is the area inside the outline by Green's theorem along the pieces as drawn.
func (p *Pattern) areaFlat() float64 {
	sum := 0.0
	for _, l := range p.Loops {
		for _, q := range l {
			if a, ok := q.Arc2(); ok {
				sum += a.Sweep(vec.V2{})
				continue
			}
			lo, hi := min(q.T0, q.T1), max(q.T0, q.T1)
			a := integral(func(t float64) float64 { return q.Path.At(t).Cross(q.Path.Deriv(t, 1)) }, lo, hi) / 2
			if q.T1 < q.T0 {
				a = 0 - a
			}
			sum += a
		}
	}
	return sum
}

// areaSpace is the area of the face from its edges in space. Edges along
// generators add nothing.
func (p *Pattern) areaSpace() float64 {
	sum := 0.0
	for _, m := range p.rims {
		a := p.roll.swept(m.arc)
		if !m.upper {
			a = 0 - a
		}
		sum += a
	}
	return sum
}

// swept is the area of the surface that the generator sweeps between the apex
// and the arc, or between the level of a cylinder's origin and the arc. Every
// element of a cone appears along the axis in the ratio of the sine of the half
// angle, so a cone's is what the arc sweeps in the plan, in closed form; a
// cylinder's is height times radius times angle, and negative below the origin.
func (r roll) swept(a curve.Arc) float64 {
	if r.cone {
		return math.Abs(a.Sweep(r.f.O).Dot(r.f.Z)) / r.sin
	}
	return integral(func(t float64) float64 {
		x := a.At(t).Sub(r.f.O)
		return x.Dot(r.f.Z) * math.Abs(x.Cross(a.Deriv(t, 1)).Dot(r.f.Z)) / r.r
	}, a.T0, a.T1)
}

// edgeProofs compares the length of every edge, pieces of one other face together.
func (p *Pattern) edgeProofs() []EdgeProof {
	var out []EdgeProof
	for j, f := range p.body.Faces {
		e := EdgeProof{Label: f.Label}
		for _, l := range p.Loops {
			for _, q := range l {
				if q.Face == j {
					e.Flat += q.Length()
				}
			}
		}
		for _, m := range p.rims {
			if m.face == j {
				e.Space += m.arc.Length()
			}
		}
		for _, w := range p.walls {
			if w.face == j {
				e.Space += w.hi - w.lo
			}
		}
		if e.Flat != 0 || e.Space != 0 {
			out = append(out, e)
		}
	}
	return out
}

// probes is the number of equal parts into which Deviation divides a piece.
const probes = 48

// Deviation is the greatest distance, mm, by which the pattern misses the part
// when it is folded back: the ends of all stations and 49 points of every piece
// of the outline are rolled up by Fold, which knows the frame and the half
// angle or radius only, and put into the signed distances of the face, of the
// face on the other side of the edge, and, for a station's end, of the
// nearest other face (or a cone's apex).
func (p *Pattern) Deviation() float64 {
	worst := 0.0
	for _, l := range p.Loops {
		for _, q := range l {
			worst = max(worst, p.pieceMiss(q))
		}
	}
	for _, s := range p.Stations {
		for _, x := range s.Spans {
			worst = max(worst, p.endMiss(x.Low), p.endMiss(x.High))
		}
	}
	return worst
}

// pieceMiss is how far the piece, folded back, misses the faces that it lies between.
func (p *Pattern) pieceMiss(q Piece) float64 {
	worst := 0.0
	for k := range probes + 1 {
		x := p.Fold(q.Path.At(q.T0 + float64((q.T1-q.T0)*(float64(k)/probes))))
		worst = max(worst, math.Abs(p.surface().Value(x)))
		if q.Face != Seam {
			worst = max(worst, math.Abs(p.body.Faces[q.Face].Surface.Value(x)))
		}
	}
	return worst
}

// endMiss is how far the end of a station, folded back, misses the face and the nearest other face.
func (p *Pattern) endMiss(q vec.V2) float64 {
	x := p.Fold(q)
	near := math.Inf(1)
	if p.roll.cone {
		near = x.Dist(p.roll.f.O)
	}
	for j, f := range p.body.Faces {
		if j != p.face {
			near = min(near, math.Abs(f.Surface.Value(x)))
		}
	}
	return max(near, math.Abs(p.surface().Value(x)))
}

// surface is the surface that was unrolled.
func (p *Pattern) surface() surface.Surface { return p.body.Faces[p.face].Surface }
