package compose

import (
	"math"

	"epure/geom/vec"
	"epure/render/drawing"
	"epure/render/font"
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
	leader bool      // a line leads from the point to the text
}

// Costs of a place. One word covered is worse than any number of lines that a
// short text can lie on, and a line is worse than any detour.
const (
	wordCost = 1000
	lineCost = 50
	stepCost = 2
	turnCost = 1
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
			if cost := base + d.cost(q, t); cost < bestCost {
				best, bestCost = t, cost
			}
		}
	}
	return best
}

// cost counts what a text and its leader would lie on.
func (d *draft) cost(q place, t drawing.Text) float64 {
	lines, words := d.field.count(textRoom(t).grown(lettersClear))
	if q.leader {
		a, b := leaderOf(q.at, t)
		for _, w := range d.field.words {
			if w.meets(line{a, b}) {
				words++
			}
		}
	}
	return float64(words*wordCost + lines*lineCost)
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

// leaderGap is the distance between a leader's end and its text, paper mm.
const leaderGap = 1

// leaderOf is the line from a point to the middle of the nearer side of a text.
func leaderOf(at vec.V2, t drawing.Text) (vec.V2, vec.V2) {
	w := font.Width(t.String, t.Height, t.Bold)/2 + leaderGap
	end := vec.V2{X: t.At.X + w, Y: t.At.Y + t.Height/2}
	if at.X < t.At.X {
		end.X = t.At.X - w
	}
	return at, end
}

// crowdedRow is the least distance in heights of lettering between the numbers of a row.
const crowdedRow = 1.6

// drawTags writes the short texts beside points. Of a crowded row only every
// second, fifth, tenth ... is written.
func (d *draft) drawTags() {
	for _, t := range d.p.tags {
		h := d.ink.text
		if t.small {
			h = d.ink.small
		}
		if t.row > 1 && (t.row-1)%rowStep(t.room*d.scale, h*crowdedRow) != 0 {
			continue
		}
		q := place{at: d.at(t.at), prefer: t.away, past: t.past, height: h, text: t.text, steps: []float64{1.5, 3, 5, 7.5}, turns: fan(math.Pi/9, 3)}
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
		q := place{at: d.at(s.at), height: d.ink.text, text: s.text, steps: []float64{1.2, 2.2, 3.5, 5.5}, turns: fan(math.Pi/8, 8)}
		d.write(k, d.settle(q))
	}
}

// drawLabels writes the labels of the view, each with a short leader.
func (d *draft) drawLabels() {
	for _, l := range d.p.labels {
		at := d.at(d.p.flatten(l.At))
		away := at.Sub(d.core.Centre()).Unit()
		q := place{at: at, prefer: away, height: d.ink.text, text: l.Text, steps: []float64{5, 7, 9.5, 13, 18}, turns: fan(math.Pi/8, 8), leader: true}
		t := d.settle(q)
		a, b := leaderOf(at, t)
		d.stroke(d.p.key(l.Name, "label/leader"), drawing.Dimension, drawing.Line{A: a, B: b})
		dot := drawing.DotMark(d.p.key(l.Name, "label/dot"), at, dotSize)
		d.add(dot)
		d.write(d.p.key(l.Name, "label"), t)
	}
}
