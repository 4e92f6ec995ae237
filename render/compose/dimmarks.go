package compose

import (
	"math"

	"epure/eval/scene"
	"epure/geom/vec"
	"epure/render/drawing"
	"epure/render/furniture"
)

// The marks of dimensions: lengths where the chain put them; radii and angles
// where their figures lie on least.

// style is how dimensions are drawn on this sheet.
func (d *draft) style() furniture.DimStyle {
	return furniture.DimStyle{Height: d.ink.text, Pen: d.ink.pens.Thin()}
}

// addDimension appends the marks of one dimension.
func (d *draft) addDimension(marks []drawing.Mark) {
	for _, m := range marks {
		d.add(m)
	}
}

// linear draws a length from a to b with its line at the distance at along n.
func (d *draft) linear(k drawing.Key, a, b, n vec.V2, at float64, text string) {
	dir := n.Left().Scale(-1)
	if b.Sub(a).Dot(dir) < 0 {
		a, b = b, a
	}
	l := furniture.Linear{From: a, To: b, Dir: dir, Offset: at - max(a.Dot(n), b.Dot(n)), Text: text}
	d.addDimension(l.Marks(k, d.style()))
}

// cheapest is the first of the options whose lettering lies on least.
func (d *draft) cheapest(options [][]drawing.Mark) []drawing.Mark {
	var best []drawing.Mark
	bestCost := math.Inf(1)
	for _, marks := range options {
		cost := 0.0
		for _, m := range marks {
			if t, ok := m.Shape.(drawing.Text); ok {
				cost += d.cost(t)
			}
		}
		if cost < bestCost {
			best, bestCost = marks, cost
		}
	}
	return best
}

// radius draws the radius of a circle seen true, at one of the slopes in use.
func (d *draft) radius(m *scene.Dimension, a scene.Radius) {
	var options [][]drawing.Mark
	for _, deg := range []float64{45, 30, 60, 135, 150, 120, 225, 315} {
		r := furniture.Radius{Centre: d.at(d.p.flatten(a.Circle.F.O)), Radius: a.Circle.R * d.scale, Angle: deg * math.Pi / 180, Text: withSign(sphereSign(a.Circle)+"R", m.Text)}
		options = append(options, r.Marks(d.dimKey(m), d.style()))
	}
	d.addDimension(d.cheapest(options))
}

// angle draws an angle between two directions seen true, anticlockwise the
// shorter way.
func (d *draft) angle(m *scene.Dimension, a scene.Angle) {
	v := d.at(d.p.flatten(a.Apex))
	u, w := d.p.flatten(a.Apex.Add(a.A)).Sub(d.p.flatten(a.Apex)), d.p.flatten(a.Apex.Add(a.B)).Sub(d.p.flatten(a.Apex))
	if u.Cross(w) < 0 {
		u, w = w, u
	}
	legs := [2]float64{d.leg(v, u), d.leg(v, w)}
	var options [][]drawing.Mark
	for _, r := range []float64{14, 18, 22, 27, 33, 40, 11} {
		g := furniture.Angle{Vertex: v, From: math.Atan2(u.Y, u.X), To: math.Atan2(w.Y, w.X), Radius: r, Legs: legs, Text: m.Text}
		options = append(options, g.Marks(d.dimKey(m), d.style()))
	}
	d.addDimension(d.cheapest(options))
}

// leg is how far the outline runs from v along u already.
func (d *draft) leg(v, u vec.V2) float64 {
	const onLine = 0.01 // paper mm; the narrowest line is 25 times as wide
	far := 0.0
	u = u.Unit()
	for _, l := range d.outline {
		for _, q := range [2]vec.V2{l.a, l.b} {
			if math.Abs(u.Cross(q.Sub(v))) < onLine {
				far = max(far, u.Dot(q.Sub(v)))
			}
		}
	}
	return far
}

// flatRadius draws a radius about the origin of a pattern: between two generators
// where there is room, else pointed at from outside.
func (d *draft) flatRadius(m *scene.Dimension, a scene.FlatRadius) {
	text := withSign("R", m.Text)
	var options [][]drawing.Mark
	angles := append([]float64{a.At}, d.between(a)...)
	for _, at := range angles {
		r := furniture.Radius{Radius: a.R * d.scale, Angle: at, Text: text}
		options = append(options, r.Marks(d.dimKey(m), d.style()))
	}
	for _, at := range angles {
		tip := drawing.Dir(at).Scale(a.R * d.scale)
		for _, stem := range []float64{9, 13, 18} {
			l := furniture.Leader{Tip: tip, Elbow: tip.Along(drawing.Dir(at), stem), Text: text}
			options = append(options, l.Marks(d.dimKey(m), d.style()))
		}
	}
	d.addDimension(d.cheapest(options))
}

// between are the polar angles half way between neighbouring stations that both
// reach the radius.
func (d *draft) between(a scene.FlatRadius) []float64 {
	if d.p.flat == nil {
		return nil
	}
	var out []float64
	last := math.NaN()
	for _, s := range d.p.flat.Stations {
		angle := math.NaN()
		for _, x := range s.Spans {
			for _, q := range [2]vec.V2{x.Low, x.High} {
				if math.Abs(q.Len()-a.R) <= sameLine*a.R {
					angle = math.Atan2(q.Y, q.X)
				}
			}
		}
		if mid := (last + angle) / 2; !math.IsNaN(mid) {
			out = append(out, mid)
		}
		last = angle
	}
	return out
}

// flatAngle draws an angle about the origin of a pattern, outside its outline.
func (d *draft) flatAngle(m *scene.Dimension, a scene.FlatAngle) {
	far := 0.0
	for _, l := range d.outline {
		far = max(far, l.a.Len(), l.b.Len())
	}
	from, to := min(a.From, a.To), max(a.From, a.To)
	legs := [2]float64{d.leg(vec.V2{}, drawing.Dir(from)), d.leg(vec.V2{}, drawing.Dir(to))}
	g := furniture.Angle{From: from, To: to, Radius: far + firstDimension, Legs: legs, Text: m.Text}
	d.addDimension(g.Marks(d.dimKey(m), d.style()))
}

// table drafts a table.
func (j *job) table(t *scene.Table) extra {
	f := furniture.Table{Name: t.Name, Title: t.Title, Head: t.Rows[0], Rows: t.Rows[1:], Height: j.ink.small}
	if f.Name == "" {
		f.Name = "table"
	}
	w, h := f.Size()
	return extra{kind: tableItem, marks: f.Marks(vec.V2{Y: h}, j.ink.pens), room: boxExtent(drawing.BoxAt(vec.V2{}, w, h))}
}
