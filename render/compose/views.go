package compose

import (
	"strconv"
	"strings"

	"epure/eval/scene"
	"epure/geom/vec"
	"epure/render/drawing"
)

// Pictures of the block's views. A view needs its parent's frame first, so a
// parent is made before its children whatever their order in the file.

// pictures makes the pictures of all views in file order. With stand, views that
// would be folded along a sloping line stand upright and free instead.
func (j *job) pictures(stand bool) []*picture {
	made := map[*scene.View]*picture{}
	names := map[string]int{}
	var out []*picture
	for _, v := range j.block.Views {
		out = append(out, j.picture(v, made, stand, 0))
	}
	for _, p := range out {
		if names[p.name]++; names[p.name] > 1 {
			p.name += "-" + itoa(names[p.name])
		}
		j.fill(p)
	}
	j.checkDimensions(out)
	return out
}

// picture makes the bare picture of a view: its name, frame and parent. depth
// guards against a circle of parents.
func (j *job) picture(v *scene.View, made map[*scene.View]*picture, stand bool, depth int) *picture {
	if p := made[v]; p != nil {
		return p
	}
	p := &picture{view: v, name: v.Name, frame: viewFrame(v)}
	made[v] = p
	if v.From != nil && v.Form != "pattern" && depth < len(j.block.Views) {
		j.foldFrom(p, j.picture(v.From, made, stand, depth+1), stand)
	}
	return p
}

// viewFrame is the frame of a view that stands free: the section's plane for a true shape.
func viewFrame(v *scene.View) vec.Frame {
	if v.Image != nil {
		return *v.Image
	}
	if v.Along == (vec.V3{}) {
		for _, s := range v.Of {
			if sec, ok := s.Value.(*scene.Section); ok && sec.Section != nil {
				return vec.PlaneFrame(vec.V3{}, sec.Plane.Z)
			}
		}
		return vec.World
	}
	return vec.ViewFrame(v.Along)
}

// foldFrom gives a picture the frame that is folded from its parent. A true
// shape that cannot be folded stands free; any other view that cannot is a
// problem, and stands free too.
func (j *job) foldFrom(p, parent *picture, stand bool) {
	if parent == p {
		return
	}
	frame, u, rel := fold(parent.frame, p.frame.Z)
	if parent.view.Form == "pattern" {
		rel = apart
	}
	if rel == apart {
		if p.view.Form != "true_shape" {
			j.report(Problem{Span: p.view.Span, Code: CannotFold,
				Text:   "the view " + p.name + " cannot be folded from " + parent.name,
				Reason: "a view is folded along a line square to both directions of sight; these two are neither square to each other nor parallel"})
		}
		return
	}
	if p.view.Form == "section_view" && rel == folded {
		parent.planes = append(parent.planes, sighting{p, u})
	}
	if p.view.Form == "view" && rel == folded {
		parent.sightings = append(parent.sightings, sighting{p, u})
	}
	if stand && rel == folded && oblique(u) {
		p.parent = parent
		return
	}
	p.parent, p.frame, p.rel = parent, frame, rel
	p.toward = side(u, rel, j.block.ThirdAngle)
	p.beside = append(p.beside, p.toward.Scale(-1))
	parent.beside = append(parent.beside, p.toward)
	if rel == folded && (p.shows("projectors") || parent.shows("projectors")) {
		p.rays = append(p.rays, p.toward.Scale(-1))
		parent.rays = append(parent.rays, p.toward)
	}
}

// fill draws what the view is of.
func (j *job) fill(p *picture) {
	v := p.view
	for _, s := range v.Of {
		if b, ok := s.Value.(*scene.Solid); ok && b.Body != nil {
			p.solids = append(p.solids, solid{s.Name, b})
		}
	}
	if v.Title != "" {
		p.caption = strings.Split(v.Title, "\n")
	}
	switch v.Form {
	case "pattern":
		for _, s := range v.Of {
			if d, ok := s.Value.(*scene.Development); ok && d.Pattern != nil {
				p.drawPattern(s.Name, d)
			}
		}
	case "true_shape":
		j.fillTruth(p)
	default:
		j.fillView(p)
	}
	if p.parent != nil && p.rel == apart && len(p.caption) > 0 {
		p.caption = append(p.caption, "(turned upright, not in projection with "+p.parent.name+")")
	}
	for _, d := range j.block.Dimensions {
		if d.On == v {
			p.dims = append(p.dims, d)
		}
	}
	for _, l := range j.block.Labels {
		for _, on := range l.On {
			if on == v {
				p.labels = append(p.labels, l)
			}
		}
	}
	if b := p.drawnBox(func(drawing.Role) bool { return true }); !b.Empty() {
		p.size = vec.V2{X: b.Width(), Y: b.Height()}
	}
	if len(p.strokes)+len(p.spots) == 0 {
		j.report(Problem{Span: v.Span, Code: NothingSeen, Text: "the view " + p.name + " has nothing to draw"})
	}
}

func (j *job) fillTruth(p *picture) {
	var names []string
	for _, s := range p.view.Of {
		if sec, ok := s.Value.(*scene.Section); ok && sec.Section != nil {
			names = append(names, s.Name)
		}
	}
	if len(p.caption) == 0 {
		p.caption = []string{"True shape of " + strings.Join(names, ", ")}
	}
	for _, s := range p.view.Of {
		if sec, ok := s.Value.(*scene.Section); ok && sec.Section != nil {
			p.drawTruth(s.Name, sec)
		}
	}
}

func (j *job) fillView(p *picture) {
	p.drawSolids()
	p.drawThings()
	if p.shows("centres") {
		p.drawCentres()
	}
	if p.shows("cutting_planes") {
		p.drawCuttingPlanes()
	}
	if p.shows("generators") {
		p.drawGenerators(j.block)
	}
	for _, s := range p.planes {
		p.drawSightedPlane(s)
	}
	p.drawCutFaces()
	p.drawConstruction(j.scene)
	if len(p.caption) == 0 && p.view.Form == "section_view" {
		p.caption = []string{p.view.By.Name + "–" + p.view.By.Name}
	}
	if len(p.caption) == 0 && p.view.Form == "view" {
		p.caption = []string{"View"}
		if p.view.Named {
			p.caption[0] += " " + p.name
		}
	}
}

// scaleText writes a scale as ISO 5455 does: "1:5", "2:1".
func scaleText(s float64) string {
	num := func(x float64) string { return strconv.FormatFloat(x, 'g', 4, 64) }
	if s >= 1 {
		return num(s) + ":1"
	}
	return "1:" + num(1/s)
}
