package compose

import (
	"math"
	"strconv"

	"epure/eval/scene"
	"epure/geom/body"
	"epure/geom/curve"
	"epure/geom/vec"
	"epure/geom/view"
	"epure/render/drawing"
)

// Lines of a view: the edges and contours of its solids, the uncut solids drawn
// thin, and the other things that a view may be of.

// drawSolids draws what is seen and hidden of the solids, and the faint ones
// where nothing else lies.
func (p *picture) drawSolids() {
	bodies := p.bodies()
	p.pieces = view.Lines(bodies, p.frame)
	count := map[string]int{}
	for _, piece := range p.pieces {
		role := drawing.VisibleEdge
		if !piece.Visible {
			if role = drawing.HiddenEdge; !p.shows("hidden") {
				continue
			}
		}
		s := p.solids[piece.Body]
		p.draw(p.key(s.name, pieceName(piece, bodies, s.name, count)), role, piece.Image)
	}
	p.drawFaint()
	p.addCorners()
}

// pieceName is the feature of a piece of an edge or contour: the first piece of
// an edge bears the edge's name alone, further ones a number.
func pieceName(piece view.Piece, bodies []*body.Body, solid string, count map[string]int) string {
	if piece.A == piece.B {
		count[solid]++
		return ordinal("contour", count[solid])
	}
	faces := bodies[piece.Body].Faces
	name := "edge/" + faces[piece.A].Label + "," + faces[piece.B].Label
	id := solid + " " + name
	count[id]++
	if count[id] == 1 {
		return name
	}
	return ordinal(name, count[id])
}

// drawFaint draws the visible outline of the uncut solids as former shape.
func (p *picture) drawFaint() {
	var bodies []*body.Body
	var names []string
	for _, f := range p.view.Faint {
		if s, ok := f.Value.(*scene.Solid); ok {
			bodies, names = append(bodies, s.Body), append(names, f.Name)
		}
	}
	if len(bodies) == 0 {
		return
	}
	var seen []view.Piece
	for _, l := range view.Lines(bodies, p.frame) {
		if l.Visible {
			seen = append(seen, l)
		}
	}
	count := map[string]int{}
	for _, l := range view.Without(seen, p.pieces) {
		name := pieceName(l, bodies, names[l.Body], count)
		p.draw(p.key(names[l.Body], "faint/"+name), drawing.FormerShape, l.Image)
	}
}

// addCorners collects the corners that projectors start from: the ends of edges.
func (p *picture) addCorners() {
	for _, l := range p.pieces {
		if l.A != l.B && !(l.Space.Form.Periodic() && l.Space.T1-l.Space.T0 >= 2*math.Pi) {
			p.links = append(p.links, l.Space.Start(), l.Space.End())
		}
	}
}

// drawThings draws what a view is of besides solids; planes last, since they give
// way to all other lines.
func (p *picture) drawThings() {
	for _, s := range p.view.Of {
		switch v := s.Value.(type) {
		case *scene.Line:
			p.drawLine(s.Name, v)
		case *scene.Section:
			p.drawSection(s.Name, v)
		case *scene.Sphere:
			p.drawSphere(s.Name, v.FocalSphere)
		case *scene.Edge:
			p.drawWires(s.Name, "edge", drawing.VisibleEdge, edgeArcs(v.Edges))
		case *scene.Face:
			p.drawWires(s.Name, "face", drawing.VisibleEdge, faceArcs(v))
		case scene.Triple:
			p.spots = append(p.spots, spot{key: p.key(s.Name, "point"), at: p.flatten(v.V), cross: true, text: s.Name})
			p.links = append(p.links, v.V)
		}
	}
	for _, s := range p.view.Of {
		if v, ok := s.Value.(*scene.Plane); ok {
			p.drawPlane(s.Name, v, nil)
		}
	}
}

func edgeArcs(edges []body.Edge) []curve.Arc {
	var arcs []curve.Arc
	for _, e := range edges {
		arcs = append(arcs, e.Arc)
	}
	return arcs
}

func faceArcs(f *scene.Face) []curve.Arc {
	var arcs []curve.Arc
	i := f.Solid.Body.FaceIndex(f.Label)
	if i < 0 {
		return nil
	}
	for _, loop := range f.Solid.Body.FaceEdges(i) {
		arcs = append(arcs, edgeArcs(loop)...)
	}
	return arcs
}

// drawWires draws curves of space that are no edges of the solids, visible and
// hidden, in the given role where visible and dashed where hidden. What already
// lies on a line of the view is left out.
func (p *picture) drawWires(thing, stem string, role drawing.Role, arcs []curve.Arc) {
	pieces := view.Without(view.SplitBy(arcs, p.bodies(), p.frame), p.pieces)
	p.wires = append(p.wires, pieces...)
	for i, l := range pieces {
		k := p.key(thing, ordinal(stem, i+1))
		switch {
		case l.Visible:
			p.draw(k, role, l.Image)
		case p.shows("hidden") && role == drawing.VisibleEdge:
			p.draw(k, drawing.HiddenEdge, l.Image)
		case p.shows("hidden"):
			p.draw(k, role, l.Image).pen = drawing.Group.Hidden
		}
	}
}

// drawSection draws the outline of a section that lies in a whole solid.
func (p *picture) drawSection(name string, s *scene.Section) {
	var arcs []curve.Arc
	for _, loop := range s.Loops {
		for _, piece := range loop {
			arcs = append(arcs, piece.Arc)
			p.links = append(p.links, piece.Arc.Start())
		}
	}
	if s.Apex != nil && len(arcs) == 0 {
		p.spots = append(p.spots, spot{key: p.key(name, "point"), at: p.flatten(*s.Apex), cross: true, text: name})
	}
	p.drawWires(name, "outline", drawing.VisibleEdge, arcs)
}

// drawLine draws a line of space: between its ends, or across the view.
func (p *picture) drawLine(name string, l *scene.Line) {
	a, b := l.From, l.To
	if !l.Ends {
		reach := p.reach(l.Through)
		a, b = l.Through.Along(l.Along, -reach), l.Through.Along(l.Along, reach)
	}
	if p.flatten(a).Dist(p.flatten(b)) <= foldSine*a.Dist(b) {
		p.spots = append(p.spots, spot{key: p.key(name, "line"), at: p.flatten(a), cross: true, text: name})
		return
	}
	p.drawWires(name, "line", drawing.VisibleEdge, []curve.Arc{curve.Segment(a, b)})
	p.tags = append(p.tags, tag{key: p.key(name, "name"), at: p.flatten(b), away: p.flatten(b).Sub(p.flatten(a)).Unit(), text: name})
	p.links = append(p.links, a, b)
}

// reach is the distance from o that leads past everything drawn, mm.
func (p *picture) reach(o vec.V3) float64 {
	r := 0.0
	for _, s := range p.solids {
		r = max(r, s.value.Body.Middle().Dist(o)+s.value.Body.Size())
	}
	if r == 0 {
		return defaultReach
	}
	return r
}

// defaultReach is the half length in mm at which an endless line is drawn in a
// view of nothing else.
const defaultReach = 50

func itoa(n int) string { return strconv.Itoa(n) }
