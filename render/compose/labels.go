package compose

import (
	"math"

	"epure/geom/vec"
	"epure/render/drawing"
	"epure/render/font"
	"epure/render/furniture"
)

// Lettering beside points. Every text tries places round its point, near ones
// first, and takes the first that lies on nothing; when all lie on something, the one that
// lies on least.

// place is what a text asks for.
type place struct {
	at     vec.V2 // paper
	prefer vec.V2 // direction, unit; zero: up to the right
	past   float64
	height float64
	text   string
	steps  []float64 // distances to try, paper mm
	turns  []float64 // turns from prefer to try, radians
}

// Costs of a place. One word covered is worse than any number of lines, and a line
// is worse than any detour; many lines count no more than mostLines.
const (
	wordCost  = 1000
	lineCost  = 50
	mostLines = 10
	stepCost  = 2
	turnCost  = 1
)

// settle returns the text in the best place.
func (d *draft) settle(q place) drawing.Text {
	if q.prefer == (vec.V2{}) {
		q.prefer = vec.V2{X: 1, Y: 1}.Unit()
	}
	best, bestCost := drawing.Text{}, math.Inf(1)
	for i, r := range q.steps {
		for j, turn := range q.turns {
			base := float64(i*stepCost + j*turnCost)
			if base >= bestCost {
				continue
			}
			s, c := math.Sincos(turn)
			dir := vec.V2{X: float64(q.prefer.X*c) - float64(q.prefer.Y*s), Y: float64(q.prefer.X*s) + float64(q.prefer.Y*c)}
			t := beside(q, dir, r)
			if cost := base + d.cost(t); cost < bestCost {
				best, bestCost = t, cost
			}
		}
	}
	return best
}

// cost counts what a text would lie on.
func (d *draft) cost(t drawing.Text) float64 {
	lines, words := d.field.count(textRoom(t).grown(lettersClear))
	return float64(words*wordCost + min(lines, mostLines)*lineCost)
}

// beside places a text so that its box is r mm clear of the point, its centre
// in the direction dir.
func beside(q place, dir vec.V2, r float64) drawing.Text {
	w, h := font.Width(q.text, q.height, false)/2, q.height/2
	t := math.Inf(1)
	if dir.X != 0 {
		t = min(t, (w+r)/math.Abs(dir.X))
	}
	if dir.Y != 0 {
		t = min(t, (h+r)/math.Abs(dir.Y))
	}
	c := q.at.Along(dir, q.past+t)
	return drawing.Text{At: vec.V2{X: c.X, Y: c.Y - h}, Height: q.height, Anchor: drawing.Middle, String: q.text}
}

// fan returns turns to try: 0, then n on either side, step radians apart.
func fan(step float64, n int) []float64 {
	out := []float64{0}
	for i := 1; i <= n; i++ {
		out = append(out, float64(i)*step, -float64(i)*step)
	}
	return out
}

// rowGap is the least gap between the numbers of a row, paper mm: what a word
// keeps clear of another, and as much again where the row runs aslant.
const rowGap = 2 * (lettersClear + wordsClear)

// drawTags writes the short texts beside points. Of a crowded row only every
// second, fifth, tenth ... is written.
func (d *draft) drawTags() {
	for _, t := range d.p.tags {
		h := d.ink.text
		if t.small {
			h = d.ink.small
		}
		if t.row > 1 && (t.row-1)%rowStep(t.room*d.scale, font.Width(t.wide, h, false)+rowGap) != 0 {
			continue
		}
		q := place{at: d.at(t.at), prefer: t.away, past: t.past, height: h, text: t.text, steps: []float64{1.5, 3, 5, 7.5, 11, 15}, turns: fan(math.Pi/9, 6)}
		d.write(t.key, d.settle(q))
	}
}

// rowStep is the step at which numbers room mm apart stand at least want apart.
func rowStep(room, want float64) int {
	for decade := 1; decade < 1000; decade *= 10 {
		for _, n := range []int{1, 2, 5} {
			if float64(n*decade)*room >= want {
				return n * decade
			}
		}
	}
	return 1000
}

// nameSpots writes the names of points.
func (d *draft) nameSpots() {
	for _, s := range d.p.spots {
		if s.text == "" {
			continue
		}
		k := s.key
		k.Feature += "/name"
		q := place{at: d.at(s.at), prefer: s.away, height: d.ink.text, text: s.text, steps: []float64{1.2, 2.2, 3.5, 5.5, 8}, turns: fan(math.Pi/8, 8)}
		d.write(k, d.settle(q))
	}
}

// leaderLengths are the lengths of leaders to try, paper mm, and leaderTurns the
// number of directions round the point.
func leaderLengths() []float64 { return []float64{6, 8, 11, 15, 20, 27, 36} }

const leaderTurns = 16

// stemCost is the cost of a line that a leader crosses.
const stemCost = 12

// drawLabels writes the labels of the view, each over the landing of a leader:
// with an arrow at a point of the outline, a dot elsewhere.
func (d *draft) drawLabels() {
	for _, l := range d.p.labels {
		q, ok := d.p.locate(l.At)
		if !ok {
			continue
		}
		at := d.at(q)
		end := furniture.EndDot
		if d.onOutline(at) {
			end = furniture.EndArrow
		}
		away := at.Sub(d.core.Centre()).Unit()
		var best []drawing.Mark
		bestCost := math.Inf(1)
		for i, r := range leaderLengths() {
			for k := range leaderTurns {
				dir := drawing.Dir(2 * math.Pi * (float64(k) + 0.5) / leaderTurns)
				lead := furniture.Leader{Tip: at, Elbow: at.Along(dir, r), End: end, Text: l.Text}
				cost := float64(i*stepCost) + turnCost*4*(1-dir.Dot(away)) + d.grazing(at, dir)
				marks := lead.Marks(d.p.key(l.Name, "label"), d.style())
				if cost += d.leaderCost(marks, at); cost < bestCost {
					best, bestCost = marks, cost
				}
			}
		}
		for _, m := range best {
			d.add(m)
		}
	}
}

// onOutline reports whether a point of the paper lies on a line of the outline.
func (d *draft) onOutline(at vec.V2) bool {
	const touch = 0.15 // paper mm: chords lie off their arcs by less than this
	q := quadrangle{at.Sub(vec.V2{X: touch, Y: touch}), vec.V2{X: 2 * touch}, vec.V2{Y: 2 * touch}}
	for _, l := range d.outline {
		if q.meets(l) {
			return true
		}
	}
	return false
}

// grazing is the cost of a leader that runs along the line it points at.
func (d *draft) grazing(at, dir vec.V2) float64 {
	const touch, flat = 0.15, 0.5 // paper mm; the sine of 30°
	q := quadrangle{at.Sub(vec.V2{X: touch, Y: touch}), vec.V2{X: 2 * touch}, vec.V2{Y: 2 * touch}}
	for _, l := range d.outline {
		if q.meets(l) && math.Abs(l.b.Sub(l.a).Unit().Cross(dir)) < flat {
			return 2 * stemCost
		}
	}
	return 0
}

// leaderCost counts what the text and the stem of a leader would lie on.
func (d *draft) leaderCost(marks []drawing.Mark, tip vec.V2) float64 {
	cost := 0.0
	for _, m := range marks {
		switch s := m.Shape.(type) {
		case drawing.Text:
			cost += d.cost(s)
		case drawing.Line:
			// A thin box round the line, less what lies at the tip, where it must touch.
			a, u := s.A, s.B.Sub(s.A).Unit()
			if a == tip {
				a = a.Along(u, 1)
			}
			n := u.Left().Scale(lettersClear)
			lines, words := d.field.count(quadrangle{a.Sub(n), s.B.Sub(a), n.Scale(2)})
			cost += float64(lines*stemCost + words*wordCost)
		}
	}
	return cost
}
