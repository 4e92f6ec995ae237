package drawing

import (
	"math"

	"epure/geom/vec"
)

// Cubics for writers without arcs (PDF, pixels). They are made here, once, and
// not by a library: the one tried was off by 2e-3 of the radius.

// cubicTurn is the largest turn of one cubic that stands for an arc. At 22.5° the
// error of the handle 4/3·tan(δ/4) is under 7e-8 of the radius (tested), so that
// writers without arcs lose less than they round.
const cubicTurn = 22.5

// Lowered returns the pieces of a shape as Lines and Cubics alone, in order: what
// writers without arcs draw. A closed
// path with a gap gets its closing line. A Text has none.
func Lowered(s Shape) []Stroke {
	switch s := s.(type) {
	case Line:
		return []Stroke{straight(s.A, s.B)}
	case EllipseArc:
		return s.lowered()
	case Quad:
		return []Stroke{{Cubic{s.P0, third(s.P0, s.P1), third(s.P2, s.P1), s.P2}, false}}
	case Spline:
		var out []Stroke
		for _, c := range s.Cubics() {
			out = append(out, Stroke{c, false})
		}
		return out
	case Path:
		var out []Stroke
		for _, p := range s.Pieces {
			out = append(out, Lowered(p)...)
		}
		if n := len(out); s.Closed && n > 0 && out[n-1].C[3] != out[0].C[0] {
			out = append(out, straight(out[n-1].C[3], out[0].C[0]))
		}
		return out
	}
	return nil
}

// Stroke is one cubic, or a line when Straight.
type Stroke struct {
	C        Cubic
	Straight bool
}

func straight(a, b vec.V2) Stroke { return Stroke{Cubic{a, third(a, b), third(b, a), b}, true} }

// third is the point a third of the way back from b to a's side: a + 2/3(b - a)
// raises the degree of a quadratic, and the same places serve a line.
func third(a, b vec.V2) vec.V2 { return a.Along(b.Sub(a), 2.0/3) }

// lowered cuts the arc into pieces of at most cubicTurn of its parameter. An
// affine map keeps a Bézier curve, so the ellipse is the circle's cubic mapped.
func (e EllipseArc) lowered() []Stroke {
	turn := e.To - e.From
	n := max(1, int(math.Ceil(math.Abs(turn)/(cubicTurn*math.Pi/180)-countSlack)))
	d := turn / float64(n)
	k := 4.0 / 3 * math.Tan(d/4)
	out := make([]Stroke, n)
	for i := range out {
		a, b := e.From+d*float64(i), e.From+d*float64(i+1)
		p, q := e.At(a), e.At(b)
		out[i] = Stroke{C: Cubic{p, p.Along(e.Tangent(a), k), q.Along(e.Tangent(b), -k), q}}
	}
	if e.Full() {
		out[n-1].C[3] = out[0].C[0]
	}
	return out
}
