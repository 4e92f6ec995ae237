package flat

import (
	"cmp"
	"math"
	"slices"
	"strings"

	"epure/geom/vec"
)

// Span is one piece of a generator inside the part.
type Span struct {
	Lo, Hi    float64 // u of its ends, mm: distance from a cone's apex, height on a cylinder
	Low, High vec.V2  // its ends on the pattern (at Lo and Hi)
}

// Station is one generator on the pattern.
type Station struct {
	// Number is 1 at the seam and counts the even divisions along the girth.
	// The last station is the seam again, the same generator, and has the
	// number 1 again. It is 0 for a station of its own between the divisions.
	Number int
	Theta  float64 // angle of the generator in the surface's frame, from the seam's to the seam's plus a turn
	Spans  []Span  // what of it is in the part, ascending; none where all is cut away
	// Why says what is there beside the division, joined by ", ": "corner" (two
	// edges meet), "edge" (an edge runs along the generator), "longest" and
	// "shortest" (of all generators that are not cut away whole), "turn" (an
	// edge has an extreme of u).
	Why string
}

// Length is what of the generator is in the part, mm.
func (s Station) Length() float64 {
	sum := 0.0
	for _, x := range s.Spans {
		sum += x.Hi - x.Lo
	}
	return sum
}

// reason is one thing that happens at an angle.
type reason struct {
	phi float64
	why string
}

// rank is the order in which reasons are told.
const rank = "corner edge longest shortest turn"

// stations returns the even divisions and the stations of their own.
func (p *Pattern) stations() []Station {
	n := p.opts.Divisions
	var all []Station
	var at []float64
	for k := 0; k <= n; k++ {
		at = append(at, turn*(float64(k)/float64(n)))
		all = append(all, Station{Number: k%n + 1})
	}
	for _, r := range p.reasons() {
		i := slices.IndexFunc(at, func(phi float64) bool { return math.Abs(phi-r.phi) < sameAngle })
		if i < 0 {
			i, _ = slices.BinarySearch(at, r.phi)
			at = slices.Insert(at, i, r.phi)
			all = slices.Insert(all, i, Station{})
		}
		if all[i].Why != "" {
			r.why = all[i].Why + ", " + r.why
		}
		all[i].Why = r.why
	}
	for i := range all {
		all[i].Theta = p.opts.Seam + at[i]
		all[i].Spans = p.at(at[i])
	}
	return all
}

// reasons returns what happens round the turn, at each angle in the order of
// rank and each thing once. What happens at the seam stands at both its ends.
func (p *Pattern) reasons() []reason {
	all := append(p.corners(), p.turns()...)
	all = append(all, p.longest()...)
	for _, r := range slices.Clone(all) {
		if r.phi < sameAngle || r.phi > turn-sameAngle {
			all = append(all, reason{0, r.why}, reason{turn, r.why})
		}
	}
	slices.SortStableFunc(all, func(a, b reason) int {
		if math.Abs(a.phi-b.phi) >= sameAngle {
			return cmp.Compare(a.phi, b.phi)
		}
		return cmp.Compare(strings.Index(rank, a.why), strings.Index(rank, b.why))
	})
	return slices.CompactFunc(all, func(a, b reason) bool {
		return a.why == b.why && math.Abs(a.phi-b.phi) < sameAngle
	})
}

// corners returns the angles at which edges meet or run along a generator.
func (p *Pattern) corners() []reason {
	var out []reason
	for _, w := range p.walls {
		out = append(out, reason{w.phi, "edge"})
	}
	for i, q := range p.panels {
		if p.isBreak(i) && !slices.ContainsFunc(p.walls, func(w wall) bool { return w.at(q.a) }) {
			out = append(out, reason{q.a, "corner"})
		}
	}
	return out
}

// isBreak tells whether other faces bound the panel i than the one before it:
// always, but for the first panel when the seam runs through smooth edges.
func (p *Pattern) isBreak(i int) bool {
	n := len(p.panels)
	return !p.alike(p.panels[(i+n-1)%n].spans, p.panels[i%n].spans)
}

// alike tells whether the same faces bound the bands.
func (p *Pattern) alike(a, b []band) bool {
	face := func(j int) int {
		if j == apex {
			return Seam
		}
		return p.rims[j].face
	}
	return slices.EqualFunc(a, b, func(x, y band) bool {
		return face(x.lo) == face(y.lo) && face(x.hi) == face(y.hi)
	})
}

// turns returns the extremes of u on every edge.
func (p *Pattern) turns() []reason {
	var out []reason
	for _, m := range p.rims {
		for _, phi := range m.extremes() {
			out = append(out, reason{phi, "turn"})
		}
	}
	return out
}

// extremes returns the angles in [0, turn) at which the rim's u is extreme,
// ends of the rim not counted.
func (m rim) extremes() []float64 {
	from, to := m.from, m.to
	if to-from >= turn {
		return m.profile.turns()
	}
	var in []float64
	for _, t := range within(m.profile.turns(), from+sameAngle, to-sameAngle) {
		in = append(in, snap(wrap(t), sameAngle))
	}
	return in
}

// longest returns the generators with the greatest and the least length in the
// part; none when all are equally long. Candidates are the corners, the
// extremes of the edges, and those of the length between two edges.
func (p *Pattern) longest() []reason {
	var at []float64
	for i, q := range p.panels {
		if len(q.spans) == 0 {
			continue
		}
		at = append(at, p.lengthTurns(q)...)
		if p.isBreak(i) {
			at = append(at, q.a)
		}
		if p.isBreak(i + 1) {
			at = append(at, q.b)
		}
	}
	size, lo, hi := p.join*p.size, math.Inf(1), math.Inf(-1)
	length := func(phi float64) float64 { return Station{Spans: p.at(phi)}.Length() }
	for _, phi := range at {
		l := length(phi)
		hi = max(hi, l)
		if l > size {
			lo = min(lo, l)
		}
	}
	var out []reason
	for _, phi := range at {
		switch l := length(phi); {
		case hi-lo <= size:
		case l >= hi-float64(tie*hi):
			out = append(out, reason{phi, "longest"})
		case l > size && l <= lo+float64(tie*hi):
			out = append(out, reason{phi, "shortest"})
		}
	}
	return out
}

// tie is the share by which two lengths may differ that are equally long: what
// `verify` allows two equal lengths to differ by.
const tie = 1e-9

// scan is the number of parts in which a stretch without a turn of either of
// two edges is searched for a change of sign. On a cylinder the difference of
// two edges is itself a sine wave and needs no search; on a cone it can have
// six roots in a whole turn.
const scan = 48

// lengthTurns returns angles of the panel, among them all at which the length of a span is extreme.
func (p *Pattern) lengthTurns(q panel) []float64 {
	var at []float64
	for _, b := range q.spans {
		hi := p.rims[b.hi].profile
		lo := profile{}
		if b.lo != apex {
			lo = p.rims[b.lo].profile
		}
		switch {
		case lo.square():
			at = append(at, within(hi.turns(), q.a, q.b)...)
		case hi.square():
			at = append(at, within(lo.turns(), q.a, q.b)...)
		case !p.roll.cone:
			d := profile{false, hi.k - lo.k, hi.c - lo.c, hi.s - lo.s}
			at = append(at, within(d.turns(), q.a, q.b)...)
		default:
			at = append(at, between(hi, lo, q)...)
		}
	}
	return at
}

// between returns the extremes of hi - lo in the panel on a cone.
func between(hi, lo profile, q panel) []float64 {
	cuts := append(within(hi.turns(), q.a, q.b), within(lo.turns(), q.a, q.b)...)
	cuts = append(cuts, q.a, q.b)
	slices.Sort(cuts)
	slope := func(phi float64) float64 { return hi.derivs(phi, 1)[1] - lo.derivs(phi, 1)[1] }
	at := slices.Clone(cuts) // a root at a cut may be lost to rounding on both its sides
	for i := 1; i < len(cuts); i++ {
		step := (cuts[i] - cuts[i-1]) / scan
		for k := range scan {
			a := cuts[i-1] + float64(step*float64(k))
			if root, ok := bracket(slope, a, a+step); ok {
				at = append(at, root)
			}
		}
	}
	return at
}

// TrueLength is the length inside the part of the generator at the angle theta
// of the surface's frame, mm; zero where all is cut away.
func (p *Pattern) TrueLength(theta float64) float64 {
	phi := snap(wrap(theta-p.opts.Seam), sameAngle)
	s := p.at(phi)
	if phi == 0 {
		s = union(append(s, p.at(turn)...), p.join*p.size)
	}
	return Station{Spans: s}.Length()
}

// TrueLengthAt is the length inside the part of the generator at the n-th even
// division, mm, 1 at the seam; false when n is not one of 1 to Divisions.
func (p *Pattern) TrueLengthAt(n int) (float64, bool) {
	if n < 1 || n > p.opts.Divisions {
		return 0, false
	}
	return p.TrueLength(p.opts.Seam + turn*(float64(n-1)/float64(p.opts.Divisions))), true
}
