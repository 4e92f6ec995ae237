package compose

import (
	"math"

	"epure/geom/vec"
	"epure/render/drawing"
	"epure/render/font"
)

// A draft is a picture at a scale: its marks on paper with the view's origin at
// (0, 0), the room that they take, and the field that keeps lettering apart.
// Only its place on the sheet is still open.

type draft struct {
	p       *picture
	scale   float64
	ink     ink
	marks   []drawing.Mark
	core    drawing.Box // the outline, paper mm
	outline []line      // the outline in short chords
	room    extent      // everything, paper mm
	field   field
}

// ink holds the pens of the sheet and its heights of lettering.
type ink struct {
	pens    drawing.Group
	text    float64 // dimensions, labels, captions, notes
	small   float64 // numbers of generators
	caption float64 // captions of views
}

// inkFor returns pens and lettering for a line group: ISO 3098 heights, 3.5 on
// sheets up to A2 and 5 over it.
func inkFor(g drawing.Group) ink {
	if g == drawing.Group07() {
		return ink{g, 5, 3.5, 5}
	}
	return ink{g, 3.5, 2.5, 3.5}
}

// newDraft draws a picture at a scale. note is a line that follows the caption,
// such as the view's own scale.
func newDraft(p *picture, scale float64, k ink, note string) *draft {
	d := &draft{p: p, scale: scale, ink: k}
	d.drawStrokes()
	d.core = d.coreBox()
	d.outline = d.outlineChords()
	d.keepRays()
	d.drawSpots()
	d.drawSigns()
	d.drawPointers()
	d.dimension()
	d.drawTags()
	d.nameSpots()
	d.drawLabels()
	d.drawSightings()
	d.drawHatching()
	d.room = marksExtent(d.marks)
	if d.room.empty() {
		d.room = nothing().with(vec.V2{})
	}
	d.drawBars()
	d.drawCaption(note)
	return d
}

// add appends a mark and keeps later lettering clear of it.
func (d *draft) add(m drawing.Mark) {
	d.marks = append(d.marks, m)
	d.field.add(m.Shape)
}

// stroke appends a line with the pen of its role.
func (d *draft) stroke(k drawing.Key, r drawing.Role, s drawing.Shape) {
	d.add(drawing.Mark{Key: k, Role: r, Pen: d.ink.pens.Pen(r), Shape: s})
}

// write appends a line of lettering.
func (d *draft) write(k drawing.Key, t drawing.Text) {
	d.add(drawing.Mark{Key: k, Role: drawing.Lettering, Shape: t})
}

// at places a point of the view on paper.
func (d *draft) at(q vec.V2) vec.V2 { return q.Scale(d.scale) }

// drawStrokes draws all lines, the lesser ones first so that outlines lie on top.
func (d *draft) drawStrokes() {
	for rank := range lineRanks {
		for _, s := range d.p.strokes {
			if lineRank(s.role) != rank {
				continue
			}
			pen := d.ink.pens.Pen(s.role)
			if s.pen != nil {
				pen = s.pen(d.ink.pens)
			}
			d.add(drawing.Mark{Key: s.key, Role: s.role, Pen: pen, Shape: s.shape(d.scale), Title: s.title})
		}
	}
}

const lineRanks = 4

// lineRank orders lines from the ground up.
func lineRank(r drawing.Role) int {
	switch r {
	case drawing.VisibleEdge, drawing.PatternEdge:
		return lineRanks - 1
	case drawing.HiddenEdge:
		return 2
	case drawing.CentreLine, drawing.CuttingPlane:
		return 1
	}
	return 0
}

// coreBox is the box of the outline, or of all that is drawn when there is none.
func (d *draft) coreBox() drawing.Box {
	e, all := nothing(), nothing()
	for _, m := range d.marks {
		x := shapeExtent(m.Shape)
		if all = all.union(x); outlineRole(m.Role) {
			e = e.union(x)
		}
	}
	switch {
	case !e.empty():
		return e.box()
	case !all.empty():
		return all.box()
	}
	return drawing.BoxAt(vec.V2{}, 0, 0)
}

// outlineChords are the chords of the outline.
func (d *draft) outlineChords() []line {
	var f field
	for _, m := range d.marks {
		if outlineRole(m.Role) {
			f.add(m.Shape)
		}
	}
	return f.lines
}

// rayLength is how far lettering keeps clear of projectors that will leave the
// view, paper mm.
const rayLength = 30

// keepRays keeps lettering clear of the projectors.
func (d *draft) keepRays() {
	for _, u := range d.p.rays {
		for _, q := range d.p.links {
			a := d.at(d.p.flatten(q))
			d.field.lines = append(d.field.lines, line{a, a.Along(u, rayLength)})
		}
	}
}

// Sizes of point marks, paper mm.
const (
	dotSize  = 1.2 // diameter
	crossArm = 1.5 // half the length of each stroke
)

// drawSpots draws the dots and crosses of points.
func (d *draft) drawSpots() {
	for _, s := range d.p.spots {
		at := d.at(s.at)
		if !s.cross {
			m := drawing.DotMark(s.key, at, dotSize)
			m.Role = drawing.Construction
			d.add(m)
			continue
		}
		x, y := vec.V2{X: crossArm}, vec.V2{Y: crossArm}
		level, up := s.key, s.key
		level.Feature, up.Feature = level.Feature+"/level", up.Feature+"/upright"
		d.stroke(level, drawing.Construction, drawing.Line{A: at.Sub(x), B: at.Add(x)})
		d.stroke(up, drawing.Construction, drawing.Line{A: at.Sub(y), B: at.Add(y)})
	}
}

// drawSigns writes the words along lines that have room, and one of the words
// for the side that is up.
func (d *draft) drawSigns() {
	for _, s := range d.p.signs {
		if t, ok := d.signText(s, d.ink.small); ok {
			d.write(s.key, t)
		}
	}
	for _, h := range []float64{d.ink.text, d.ink.small} {
		for _, s := range d.p.faces {
			t, ok := d.signText(s, h)
			if !ok {
				continue
			}
			if lines, words := d.field.count(textRoom(t).grown(lettersClear)); lines+words == 0 {
				d.write(s.key, t)
				return
			}
		}
	}
}

// lettersClear is the least distance between lettering and lines, paper mm.
const lettersClear = 0.6

// signText places lettering of the height h along a line of the view, false when it has no room.
func (d *draft) signText(s sign, h float64) (drawing.Text, bool) {
	if font.Width(s.text, h, false)+2*h > s.room*d.scale || s.tall > 0 && s.tall*d.scale < 2*h {
		return drawing.Text{}, false
	}
	base := s.side*(h/2+1) - h/2 // from the line to the baseline, to the left of dir
	at := d.at(s.mid).Along(s.dir.Left(), base)
	return drawing.Text{At: at, Height: h, Anchor: drawing.Middle, Angle: math.Atan2(s.dir.Y, s.dir.X), String: s.text}, true
}

// barLength is the length of the bars that prove the print, mm.
const barLength = 100

// drawBars draws the bars of 100 mm, level and upright, beside a pattern at full size.
func (d *draft) drawBars() {
	if !d.p.bars || d.scale != 1 {
		return
	}
	b := d.room.box()
	o := vec.V2{X: b.Min.X - 8, Y: b.Min.Y - 8}
	for _, bar := range []struct {
		name string
		dir  vec.V2
	}{{"level", vec.V2{X: 1}}, {"upright", vec.V2{Y: 1}}} {
		a, e := o.Along(bar.dir, 8), o.Along(bar.dir, 8+barLength)
		k := d.p.key("bar", bar.name)
		d.stroke(k, drawing.Dimension, drawing.Line{A: a, B: e})
		for i, q := range []vec.V2{a, e} {
			end := d.p.key("bar", ordinal(bar.name+"/end", i+1))
			d.stroke(end, drawing.Dimension, drawing.Line{A: q.Along(bar.dir.Left(), -1.5), B: q.Along(bar.dir.Left(), 1.5)})
		}
		text := drawing.Text{At: a.Along(bar.dir, barLength/2).Along(bar.dir.Left(), 1), Height: d.ink.small, Anchor: drawing.Middle, Angle: math.Atan2(bar.dir.Y, bar.dir.X), String: "100 mm"}
		d.write(d.p.key("bar", bar.name+"/text"), text)
	}
	d.room = d.room.union(marksExtent(d.marks))
}

// Distances of captions, paper mm, and of their lines in heights of lettering.
const (
	captionGap = 4
	linePitch  = 1.6
)

// drawCaption writes the words under the view, centred on its outline; over it
// when projectors leave the view downward.
func (d *draft) drawCaption(note string) {
	lines := d.p.caption
	if note != "" {
		lines = append(lines[:len(lines):len(lines)], note)
	}
	h := d.ink.caption
	y := d.room.box().Min.Y - captionGap - h
	if d.raysDown() {
		y = d.room.box().Max.Y + captionGap + h*linePitch*float64(len(lines)-1)
	}
	for i, s := range lines {
		t := drawing.Text{At: vec.V2{X: d.core.Centre().X, Y: y}, Height: h, Anchor: drawing.Middle, String: s, Bold: i == 0}
		d.write(d.p.key("caption", ordinal("line", i+1)), t)
		d.room = d.room.union(shapeExtent(t))
		y -= h * linePitch
	}
}

// raysDown reports whether projectors leave the view downward.
func (d *draft) raysDown() bool {
	for _, u := range d.p.rays {
		if u.Y < 0 {
			return true
		}
	}
	return false
}
