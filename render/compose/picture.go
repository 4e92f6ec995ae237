package compose

import (
	"strconv"

	"epure/eval/scene"
	"epure/geom/body"
	"epure/geom/curve"
	"epure/geom/vec"
	"epure/geom/view"
	"epure/render/drawing"
)

// picture is one view worked out in view millimetres, before it has a scale and
// a place: what is to be drawn, and what is to be written where. It holds
// nothing that depends on paper, so that scales can be tried on it.
type picture struct {
	view      *scene.View
	name      string // the View of its keys
	frame     vec.Frame
	parent    *picture
	rel       relation
	toward    vec.V2 // the direction from the parent in which it is put; zero when it stands free
	solids    []solid
	flat      *scene.Development // of a pattern
	pieces    []view.Piece       // what is seen and hidden of the solids
	wires     []view.Piece       // and of other curves in it
	strokes   []stroke
	spots     []spot
	tags      []tag
	hatched   []hatched  // the areas to be hatched
	planes    []sighting // section views that look at this one; their planes are drawn
	points    []pointer
	signs     []sign   // lettering along lines: seams
	faces     []sign   // places for the words that say which side is up; one is used
	bars      bool     // bars of 100 mm to check the print
	links     []vec.V3 // points that projectors join
	dims      []*scene.Dimension
	labels    []*scene.Label
	caption   []string
	size      vec.V2     // width and height of all lines, view mm
	sightings []sighting // auxiliary views that look at this one
	rays      []vec.V2   // the directions in which projectors run
	beside    []vec.V2   // the directions in which views in projection stand
}

// solid is a body with its name in the source.
type solid struct {
	name  string
	value *scene.Solid
}

// stroke is a line to be drawn. Its pieces chain; all but outlines have one.
type stroke struct {
	key    drawing.Key
	role   drawing.Role
	pen    func(drawing.Group) drawing.Pen // nil: that of the role
	pieces []track
	closed bool
	over   float64 // paper mm by which a straight line is drawn out at both ends
	tip    vec.V2  // if not zero: of a straight line only its end, X paper mm back from it to Y beyond
	title  string
}

// hatched is an area to be hatched: closed outlines, even-odd, the lines leaning
// at turn times the usual angle.
type hatched struct {
	key      drawing.Key
	outlines []stroke
	turn     float64
}

// pointer is an arrow at a cutting plane's end: the tip at (view mm) and past (paper mm) further along away,
// the tail toward from.
type pointer struct {
	key        drawing.Key
	at         vec.V2
	away, from vec.V2
	past       float64
}

// track is a piece of a smooth curve of the view.
type track struct {
	path   drawing.Path2
	t0, t1 float64
}

// spot is a marked point: a focus, a contact point, a named point.
type spot struct {
	key   drawing.Key
	at    vec.V2
	cross bool   // a cross, else a dot
	away  vec.V2 // the side on which its name stands best; zero: any
	text  string
}

// tag is a short text beside a point, on the side of away (unit) if there is room.
type tag struct {
	key   drawing.Key
	at    vec.V2
	away  vec.V2
	text  string
	small bool
	row   int     // its number in the row of texts that it belongs to; 0: none
	room  float64 // view mm to the next text of its row
	wide  string  // the widest text of its row
	past  float64 // paper mm beyond at, along away, from which the distance counts
}

// sign is lettering along a line of the view: centred on mid, along dir (unit),
// written only when there is room.
type sign struct {
	key  drawing.Key
	mid  vec.V2
	dir  vec.V2
	side float64 // 0: centred on the line; +1, -1: beside it, to the left or right of dir
	room float64 // length free for it, view mm
	tall float64 // room across, view mm; 0: any
	// atSeam tells that the place is between a seam and its neighbour.
	atSeam bool
	text   string
}

// bodies are the solids of the picture as geometry wants them.
func (p *picture) bodies() []*body.Body {
	var b []*body.Body
	for _, s := range p.solids {
		b = append(b, s.value.Body)
	}
	return b
}

// key names a mark of this view.
func (p *picture) key(thing, feature string) drawing.Key {
	return drawing.Key{View: p.name, Thing: thing, Feature: feature}
}

// shows reports whether a word of show is wanted.
func (p *picture) shows(word string) bool { return p.view.Show[word] }

// draw adds a plane curve.
func (p *picture) draw(k drawing.Key, r drawing.Role, a curve.Arc2) *stroke {
	p.strokes = append(p.strokes, stroke{key: k, role: r, pieces: []track{{a.Curve2, a.T0, a.T1}}})
	return &p.strokes[len(p.strokes)-1]
}

// straight adds a straight line; nothing when it is seen end-on.
func (p *picture) straight(k drawing.Key, r drawing.Role, a, b vec.V2) *stroke {
	p.strokes = append(p.strokes, stroke{key: k, role: r, pieces: []track{segment(a, b)}})
	return &p.strokes[len(p.strokes)-1]
}

// segment is the straight track from a to b.
func segment(a, b vec.V2) track {
	return track{curve.Curve2{Form: curve.Line, C: a, U: b.Sub(a)}, 0, 1}
}

// flatten drops a point of space on to the view.
func (p *picture) flatten(q vec.V3) vec.V2 { return p.frame.Flat(q) }

// locate is where a point of space lies in the view; on a pattern where it comes
// to lie, false when it does not lie on the face that is unrolled.
func (p *picture) locate(q vec.V3) (vec.V2, bool) {
	if p.flat == nil {
		return p.flatten(q), true
	}
	at, err := p.flat.Flat(q)
	return at, err == nil
}

// drawnBox is the box in view mm of the strokes whose role satisfies which.
func (p *picture) drawnBox(which func(drawing.Role) bool) drawing.Box {
	b := drawing.EmptyBox()
	for _, s := range p.strokes {
		if which(s.role) {
			b = b.Union(shapeExtent(s.shape(1)).box())
		}
	}
	return b
}

// outlineRole tells the roles that make up the thing itself, from which
// dimensions and overshoots are counted.
func outlineRole(r drawing.Role) bool {
	switch r {
	case drawing.VisibleEdge, drawing.HiddenEdge, drawing.PatternEdge, drawing.FormerShape:
		return true
	}
	return false
}

// shape places the stroke at a scale with the view's origin at (0, 0) of the paper.
func (s stroke) shape(scale float64) drawing.Shape {
	if len(s.pieces) == 1 && !s.closed {
		return s.drawnOut(s.pieces[0].shape(scale))
	}
	path := drawing.Path{Closed: s.closed}
	for _, t := range s.pieces {
		path.Pieces = append(path.Pieces, t.shape(scale))
	}
	return path
}

func (t track) shape(scale float64) drawing.Shape {
	return drawing.FromPath2(t.path, t.t0, t.t1, scale, vec.V2{}, drawing.PaperTolerance)
}

// drawnOut lengthens a straight line by over at both ends, or leaves its tip only.
func (s stroke) drawnOut(shape drawing.Shape) drawing.Shape {
	l, ok := shape.(drawing.Line)
	if !ok {
		return shape
	}
	d := l.B.Sub(l.A).Unit()
	if s.tip != (vec.V2{}) {
		return drawing.Line{A: l.B.Along(d, -s.tip.X), B: l.B.Along(d, s.tip.Y)}
	}
	return drawing.Line{A: l.A.Along(d, -s.over), B: l.B.Along(d, s.over)}
}

// ordinal writes a count behind a stem: "contour/1".
func ordinal(stem string, n int) string { return stem + "/" + strconv.Itoa(n) }
