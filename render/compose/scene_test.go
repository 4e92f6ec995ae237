package compose

import (
	"math"
	"os"
	"path/filepath"
	"testing"

	"epure/eval/scene"
	"epure/geom/body"
	"epure/geom/cut"
	"epure/geom/flat"
	"epure/geom/surface"
	"epure/geom/vec"
	"epure/render/drawing"
	"epure/render/svg"
)

// Scenes made by hand, as evaluation would make them.

// frustumAt is an upright or leaning cone, frustum or cylinder.
func frustumAt(name string, at, axis vec.V3, r0, r1, h float64) *scene.Solid {
	base := vec.PlaneFrame(at, axis)
	angles := vec.AxisFrame(at, axis)
	b := body.Frustum(name, base, angles, r0, r1, h)
	s := &scene.Solid{Name: name, Body: b}
	s.Root = &scene.Primitive{Name: name, Cylinder: r0 == r1, Base: base, Angles: angles, Radius: r0, TopRadius: r1, Height: h,
		SideFace: name + ".side", BaseFace: name + ".base", TopFace: name + ".top"}
	s.Whole = s
	return s
}

func coneAt(name string, r, h float64) *scene.Solid {
	return frustumAt(name, vec.V3{}, vec.V3{Z: 1}, r, 0, h)
}

// planeAlong is the plane through o along d and e.
func planeAlong(name string, o, d, e vec.V3) *scene.Plane {
	n := d.Cross(e).Unit()
	if n.Z < 0 {
		n = n.Neg()
	}
	return &scene.Plane{Name: name, F: vec.PlaneFrame(o, n), Along: []vec.V3{d.Unit(), e.Unit()}}
}

// partOf cuts a solid; above keeps the side to which the normal points.
func partOf(t testing.TB, name string, s *scene.Solid, p *scene.Plane, above bool) *scene.Solid {
	t.Helper()
	side := surface.Plane{F: p.F}
	if above {
		side = side.Flip()
	}
	b, err := s.Body.Cut(side, p.Name)
	if err != nil {
		t.Fatalf("cut %s: %v", name, err)
	}
	return &scene.Solid{Name: name, Body: b, Root: s.Root, Cuts: append(append([]*scene.Plane(nil), s.Cuts...), p), Whole: s.Whole}
}

func sectionOf(t testing.TB, name string, s *scene.Solid, p *scene.Plane) *scene.Section {
	t.Helper()
	sec, err := cut.Of(s.Body, p.Surface(), p.Along)
	if err != nil {
		t.Fatalf("section %s: %v", name, err)
	}
	return &scene.Section{Name: name, Section: sec, Of: s, By: p}
}

func patternOf(t testing.TB, name string, s *scene.Solid, seam float64, n int, inside bool) *scene.Development {
	t.Helper()
	f := curvedFace(s.Body)
	p, err := flat.Of(s.Body, f, flat.Options{Seam: seam, Divisions: n, Inside: inside})
	if err != nil {
		t.Fatalf("pattern %s: %v", name, err)
	}
	return &scene.Development{Name: name, Pattern: p, Of: s, Face: f, Seam: seam, Divisions: n, InsideUp: inside}
}

// shown is what a view shows: the usual and the words.
func shown(words ...string) map[string]bool {
	m := map[string]bool{"hidden": true, "centres": true}
	for _, w := range words {
		m[w] = true
	}
	return m
}

func subjects(pairs ...any) []scene.Subject {
	var out []scene.Subject
	for i := 0; i+1 < len(pairs); i += 2 {
		out = append(out, scene.Subject{Name: pairs[i].(string), Value: pairs[i+1].(scene.Value)})
	}
	return out
}

func elevation(name string, of []scene.Subject, words ...string) *scene.View {
	return &scene.View{Form: "elevation", Name: name, Named: true, Along: vec.V3{Y: 1}, Of: of, Show: shown(words...)}
}

func plan(name string, of []scene.Subject, from *scene.View, words ...string) *scene.View {
	return &scene.View{Form: "plan", Name: name, Named: true, Along: vec.V3{Z: -1}, Of: of, From: from, Show: shown(words...)}
}

func trueShape(name string, s *scene.Section, from *scene.View, words ...string) *scene.View {
	return &scene.View{Form: "true_shape", Name: name, Named: true, Along: s.Plane.Z.Neg(), Of: subjects(s.Name, s), From: from, Show: shown(words...)}
}

func pattern(name string, d *scene.Development, words ...string) *scene.View {
	return &scene.View{Form: "pattern", Name: name, Named: true, Of: subjects(d.Name, d), Show: shown(words...)}
}

// hood is the rain hood of the language page.
type hood struct {
	K, B *scene.Solid
	P    *scene.Plane
	S    *scene.Section
	D    *scene.Development
}

func rainHood(t testing.TB) hood {
	var h hood
	h.K = coneAt("K", 120, 260)
	h.P = planeAlong("P", vec.V3{X: 35}, vec.V3{X: 120, Z: 260}.Unit(), vec.V3{Y: 1})
	h.B = partOf(t, "B", h.K, h.P, true)
	h.S = sectionOf(t, "S", h.K, h.P)
	h.D = patternOf(t, "D", h.B, math.Pi, 12, false)
	return h
}

// keep writes a sheet for the eye when EPURE_LOOK names a folder.
func keep(t testing.TB, sheet *drawing.Sheet) {
	t.Helper()
	dir := os.Getenv("EPURE_LOOK")
	if dir == "" || sheet == nil {
		return
	}
	data, err := svg.Write(*sheet, svg.Options{})
	if err != nil {
		t.Fatal(err)
	}
	if err := os.WriteFile(filepath.Join(dir, sheet.Name+".svg"), data, 0o644); err != nil {
		t.Fatal(err)
	}
}
