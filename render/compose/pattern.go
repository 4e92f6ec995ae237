package compose

import (
	"math"
	"sort"

	"epure/eval/scene"
	"epure/geom/flat"
	"epure/geom/vec"
	"epure/render/drawing"
)

// Patterns: the outline to cut, the generators with their numbers at both ends,
// the stations of their own with letters, and in words the seam and the side
// that is up. Lettering is never mirrored, whichever side that is.

// drawPattern draws a development.
func (p *picture) drawPattern(name string, d *scene.Development) {
	p.bars, p.flat = true, d
	count := map[string]int{}
	for _, loop := range d.Loops {
		for _, piece := range loop {
			stem := "edge/" + piece.Label
			if piece.Face == flat.Seam {
				stem = "seam"
			}
			count[stem]++
			k := p.key(name, ordinal(stem, count[stem]))
			p.strokes = append(p.strokes, stroke{key: k, role: drawing.PatternEdge, pieces: []track{{piece.Path, piece.T0, piece.T1}}})
			if piece.Face == flat.Seam {
				p.addSeamSign(k, piece)
			}
		}
	}
	p.drawStations(name, d)
	p.addFaceSigns(name, d)
	if len(p.caption) == 0 {
		p.caption = []string{"Pattern of " + patternSubject(name, d)}
	}
	p.caption[0] += ", " + sideUp(d) + " up"
}

// patternSubject is the solid whose pattern it is.
func patternSubject(name string, d *scene.Development) string {
	if d.Of != nil && d.Of.Name != "" {
		return d.Of.Name
	}
	return name
}

func sideUp(d *scene.Development) string {
	if d.InsideUp {
		return "inside"
	}
	return "outside"
}

// addSeamSign writes the word along a seam edge, on the material's side.
func (p *picture) addSeamSign(k drawing.Key, piece flat.Piece) {
	a, b := piece.Start(), piece.End()
	d := b.Sub(a).Unit()
	s := sign{key: drawing.Key{View: k.View, Thing: k.Thing, Feature: k.Feature + "/word"}, mid: a.Along(b.Sub(a), 0.5), dir: d, side: 1, room: a.Dist(b), text: "seam"}
	if r := readable(d); r != d {
		s.dir, s.side = r, -1
	}
	p.signs = append(p.signs, s)
}

// readable turns a direction so that lettering along it is read from below or
// from the right.
func readable(d vec.V2) vec.V2 {
	if d.X < -vec.LevelSine || math.Abs(d.X) <= vec.LevelSine && d.Y < 0 {
		return vec.V2{X: 0 - d.X, Y: 0 - d.Y}
	}
	return d
}

// drawStations draws the generators between the seams and marks their ends.
func (p *picture) drawStations(name string, d *scene.Development) {
	letters := 0
	for i, st := range d.Stations {
		feature := ordinal("generator", st.Number)
		text := itoa(st.Number)
		seam := i == 0 || i == len(d.Stations)-1
		if st.Number == 0 {
			letters++
			feature, text = ordinal("extreme", letters), scene.Letter(letters)
		} else if i > 0 && seam {
			feature += "/end"
		}
		if p.shows("generators") && !seam {
			p.drawSpans(p.key(name, feature), st)
		}
		if p.shows("numbers") && len(st.Spans) > 0 {
			p.tagStation(p.key(name, feature+"/mark"), d, i, text)
		}
	}
}

func (p *picture) drawSpans(k drawing.Key, st flat.Station) {
	for j, span := range st.Spans {
		key := k
		if j > 0 {
			key.Feature = ordinal(k.Feature, j+1)
		}
		p.strokes = append(p.strokes, stroke{key: key, role: drawing.Generator, pieces: []track{segment(span.Low, span.High)}, title: st.Why})
	}
}

// tagStation writes the mark of a station at both ends, clear of the outline.
// At a cone's apex all meet, so there only the outer end is marked; where nothing but a
// point of the generator is left, that is marked once.
func (p *picture) tagStation(k drawing.Key, d *scene.Development, i int, text string) {
	st := d.Stations[i]
	low, high := st.Spans[0], st.Spans[len(st.Spans)-1]
	away := high.High.Sub(low.Low)
	if away.Len() <= sameLine*d.Of.Body.Size() {
		lo, hi := d.Bounds()
		p.tags = append(p.tags, tag{key: k, at: high.High, away: high.High.Sub(lo.Add(hi).Scale(0.5)).Unit(), text: text, small: true})
		return
	}
	away = away.Unit()
	outer, inner := k, k
	inner.Feature += "/inner"
	p.tags = append(p.tags, tag{key: outer, at: high.High, away: away, text: text, small: true, room: rowRoom(d, i, true), row: st.Number, wide: itoa(d.Divisions)})
	if room := rowRoom(d, i, false); room > 0 {
		p.tags = append(p.tags, tag{key: inner, at: low.Low, away: vec.V2{X: 0 - away.X, Y: 0 - away.Y}, text: text, small: true, room: room, row: st.Number, wide: itoa(d.Divisions)})
	}
}

// rowRoom is the distance on the pattern from one end of a station's generator to the
// same end of the nearest even division beside it, mm.
func rowRoom(d *scene.Development, i int, high bool) float64 {
	end := func(s flat.Station) vec.V2 {
		if high {
			return s.Spans[len(s.Spans)-1].High
		}
		return s.Spans[0].Low
	}
	room := math.Inf(1)
	for j, s := range d.Stations {
		if j != i && s.Number > 0 && len(s.Spans) > 0 && (j-i)*(j-i) <= 4 {
			room = min(room, end(s).Dist(end(d.Stations[i])))
		}
	}
	return room
}

// addFaceSigns lists the places where the words for the side that is up may
// stand: between two neighbouring generators, along them, the most level first.
func (p *picture) addFaceSigns(name string, d *scene.Development) {
	words := "OUTSIDE UP"
	if d.InsideUp {
		words = "INSIDE UP"
	}
	var even []flat.Station
	for _, s := range d.Stations {
		if len(s.Spans) > 0 {
			even = append(even, s)
		}
	}
	for i := 1; i < len(even); i++ {
		a, b := widest(even[i-1]), widest(even[i])
		dir := a.High.Sub(a.Low).Add(b.High.Sub(b.Low)).Unit()
		length := min(a.Hi-a.Lo, b.Hi-b.Lo)
		for _, share := range faceShares() {
			pa, pb := a.Low.Along(a.High.Sub(a.Low), share), b.Low.Along(b.High.Sub(b.Low), share)
			p.faces = append(p.faces, sign{key: p.key(name, "side"), mid: pa.Along(pb.Sub(pa), 0.5), dir: readable(dir),
				room: length * 2 * (1 - share), tall: math.Abs(pb.Sub(pa).Cross(dir)), text: words, atSeam: i == 1 || i == len(even)-1})
		}
	}
	sort.SliceStable(p.faces, func(i, j int) bool {
		return p.faces[i].awkward() < p.faces[j].awkward()-sameLine
	})
}

// awkward is the slope of the lettering, and a little more beside a seam, where
// the seam's own word stands.
func (s sign) awkward() float64 {
	const beside = 0.25
	if s.atSeam {
		return math.Abs(s.dir.Y) + beside
	}
	return math.Abs(s.dir.Y)
}

// faceShares are the places along a generator, from the narrow end of a cone,
// at which the words may be centred.
func faceShares() []float64 { return []float64{0.6, 0.68, 0.76} }

// widest is the longest span of a station.
func widest(s flat.Station) flat.Span {
	best := s.Spans[0]
	for _, x := range s.Spans[1:] {
		if x.Hi-x.Lo > best.Hi-best.Lo {
			best = x
		}
	}
	return best
}
