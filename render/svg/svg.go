// Package svg writes a sheet as an SVG document: millimetres, one group a view
// and one a thing inside it, ids made from names, exact arcs and parabolas, real
// text with the used letters of the font embedded. It is a writer of its own
// because a drawing is read by people and programs who look for names and true
// curves in it, which general writers drop.
//
// Attributes stand on the elements, not in a style sheet, so that many figures
// can stand inline in one page without touching each other: ids and the font's
// family name begin with the sheet's name.
package svg

import (
	"encoding/base64"
	"fmt"
	"strings"

	"epure/render/drawing"
	"epure/render/font"
)

// Options change what Write does; the zero value is the default.
type Options struct {
	Transparent bool // no white paper behind the drawing
}

// Write returns the document. The same sheet gives the same bytes. Control
// characters in texts are dropped. The only error is a mark with a coordinate
// that is not finite, named by its key.
func Write(s drawing.Sheet, o Options) ([]byte, error) {
	if err := drawing.Check(s); err != nil {
		return nil, fmt.Errorf("svg: %w", err)
	}
	w := &writer{height: s.Height, ids: newIDs(s.Name), family: "epure-" + prefix(s.Name)}
	w.head(s, o)
	for _, v := range views(s.Marks) {
		w.view(v)
	}
	w.line("</g>")
	w.line("</svg>")
	return []byte(w.b.String()), nil
}

type writer struct {
	b      strings.Builder
	height float64
	ids    *ids
	family string
}

func (w *writer) line(parts ...string) {
	for _, p := range parts {
		w.b.WriteString(p)
	}
	w.b.WriteByte('\n')
}

// head writes all that comes before the first view.
func (w *writer) head(s drawing.Sheet, o Options) {
	title, desc := w.ids.unique("title"), w.ids.unique("desc")
	wd, ht := num(s.Width), num(s.Height)
	w.line(`<svg xmlns="http://www.w3.org/2000/svg" width="`, wd, `mm" height="`, ht, `mm" viewBox="0 0 `, wd, " ", ht,
		`" role="img" aria-labelledby="`, title, " ", desc, `">`)
	w.line(`<title id="`, title, `">`, escape(s.Title), `</title>`)
	w.line(`<desc id="`, desc, `">`, escape(s.Desc), `</desc>`)
	w.fonts(s.Marks)
	if !o.Transparent {
		w.line(`<rect class="paper" width="`, wd, `" height="`, ht, `" fill="#fff"/>`)
	}
	w.line(`<g fill="none" stroke="#000" stroke-linecap="round" stroke-linejoin="round" font-family="'`, w.family,
		`', 'DejaVu Sans Condensed', 'DejaVu Sans', 'Arial Narrow', sans-serif"`,
		` style="white-space:pre;font-kerning:none;font-variant-ligatures:none">`)
}

// fonts embeds the letters in use, regular and bold.
func (w *writer) fonts(marks []drawing.Mark) {
	var rules []string
	for _, bold := range []bool{false, true} {
		if texts := drawing.Texts(marks, bold); len(texts) > 0 {
			weight := "400"
			if bold {
				weight = "700"
			}
			data := base64.StdEncoding.EncodeToString(font.Of(bold).Subset(texts).Data)
			rules = append(rules, `@font-face{font-family:'`+w.family+`';font-weight:`+weight+
				`;src:url(data:font/ttf;base64,`+data+`) format('truetype')}`)
		}
	}
	if len(rules) > 0 {
		w.line("<style>", strings.Join(rules, "\n"), "</style>")
	}
}

// run is marks of one view or of one thing.
type run struct {
	name  string
	marks []drawing.Mark
}

// views gathers the marks by view, views in the order of their first mark, marks
// in drawing order. Marks of different views lie apart on paper, so that what
// covers what does not change.
func views(marks []drawing.Mark) []run {
	var out []run
	at := map[string]int{}
	for _, m := range marks {
		i, ok := at[m.Key.View]
		if !ok {
			i = len(out)
			at[m.Key.View] = i
			out = append(out, run{name: m.Key.View})
		}
		out[i].marks = append(out[i].marks, m)
	}
	return out
}

// things cuts the marks of a view where the thing changes; drawing order stays.
func things(marks []drawing.Mark) []run {
	var out []run
	for _, m := range marks {
		if n := len(out); n == 0 || out[n-1].name != m.Key.Thing {
			out = append(out, run{name: m.Key.Thing})
		}
		out[len(out)-1].marks = append(out[len(out)-1].marks, m)
	}
	return out
}

func (w *writer) view(v run) {
	w.line(tag("g", []attr{{"id", w.ids.named(v.name)}, {"class", "view"}, {"data-view", v.name}}), ">")
	for _, t := range things(v.marks) {
		w.thing(v.name, t)
	}
	w.line("</g>")
}

// thing writes the marks of one thing in a group that carries what they share.
func (w *writer) thing(view string, t run) {
	var all [][]attr
	for _, m := range t.marks {
		all = append(all, w.style(m))
	}
	common := shared(all)
	group := []attr{{"id", w.ids.named(view, t.name)}, {"data-thing", t.name}}
	w.line(tag("g", append(group, common...)), ">")
	for i, m := range t.marks {
		w.mark(m, without(all[i], common))
	}
	w.line("</g>")
}
