package build

import (
	"fmt"
	"slices"
	"strconv"
	"time"

	"epure/cmd/internal/host"
	"epure/eval"
	"epure/eval/scene"
	"epure/lang/check"
	"epure/lang/diag"
	"epure/lang/quantity"
	"epure/lang/source"
	"epure/lang/syntax"
	"epure/render/compose"
	"epure/render/drawing"
	"epure/render/pdf"
	"epure/render/png"
	"epure/render/svg"
)

// Extension ends the names of source files.
const Extension = ".epure"

// Job says how far a unit goes.
type Job struct {
	All     bool     // work out every statement
	Names   []string // work out these things
	Compose bool     // lay the output blocks out
	Formats []string // and write them so
}

// Sheet is one drawing of a unit.
type Sheet struct {
	Name string
	At   source.Span // the block
	*drawing.Sheet
}

// front is what the language makes of a file.
type front struct {
	model  *check.Model
	values map[string]quantity.Value
}

// parse is the first half of the pipeline: text to checked model.
func (u *Unit) parse() {
	tree := syntax.Parse(u.File, &u.Bag)
	u.front.model = check.Check(tree, &u.Bag)
	for _, s := range u.front.model.Symbols {
		if s.Given != nil {
			u.Givens = append(u.Givens, Given{Name: s.Name, Kind: s.Kind})
		}
	}
}

// Set sets a given of the file; found is false when it has none of this name.
func (u *Unit) Set(s Setting) (found bool, err error) {
	for _, g := range u.Givens {
		if g.Name != s.Name {
			continue
		}
		v, err := s.For(g)
		if err != nil {
			return true, err
		}
		if u.front.values == nil {
			u.front.values = map[string]quantity.Value{}
		}
		u.front.values[s.Name] = v
		return true, nil
	}
	return false, nil
}

// Names returns the names of the file's statements, those inside blocks left out.
func (u *Unit) Names() []string {
	var out []string
	if u.front.model == nil {
		return nil
	}
	for _, s := range u.front.model.Symbols {
		if s.Parent == nil && s.Name != "" {
			out = append(out, s.Name)
		}
	}
	return out
}

// Run is the second half of the pipeline: checked model to scene, sheets and
// artefacts. A unit with errors has no artefacts.
func (u *Unit) Run(job Job, h *host.Host) {
	if u.front.model == nil {
		return
	}
	u.guard(func() {
		in := eval.Input{Givens: u.front.values, All: job.All, Names: job.Names, Blocks: job.Compose}
		u.Scenes = append(u.Scenes, eval.Evaluate(u.front.model, in, &u.Bag))
	})
	if job.Compose && !u.Failed() {
		u.guard(u.compose)
	}
	if !u.Failed() {
		u.guard(func() { u.write(job.Formats, date(h)) })
	}
}

// compose lays out the blocks of all scenes.
func (u *Unit) compose() {
	for _, sc := range u.Scenes {
		for _, b := range sc.Blocks {
			u.sheet(sc, b)
		}
	}
	Namesakes(u)
}

func (u *Unit) sheet(sc *scene.Scene, b *scene.Block) {
	sheet, problems := compose.Compose(sc, b)
	for _, p := range problems {
		u.Bag.Add(diag.New(diag.Code(p.Code), p.Span, p.Text).Because(p.Reason))
	}
	if sheet == nil {
		return
	}
	u.Sheets = append(u.Sheets, Sheet{Name: sheet.Name, At: b.Span, Sheet: sheet})
}

// writer is one output format.
type writer struct {
	format, mediaType string
	write             func(drawing.Sheet) ([]byte, error)
}

func writers() []writer {
	return []writer{
		{"svg", "image/svg+xml", func(s drawing.Sheet) ([]byte, error) { return svg.Write(s, svg.Options{}) }},
		{"pdf", "application/pdf", pdf.Write},
		{"png", "image/png", func(s drawing.Sheet) ([]byte, error) { return png.Write(s, dotsPerInch) }},
	}
}

// dotsPerInch is the resolution of images: at 200, the narrowest line of a drawing
// (0.18 mm, ISO 128-2) is a dot and a half wide and its lettering (1.8 mm capitals)
// fourteen dots high, which a screen shows and a printer for notes can print.
const dotsPerInch = 200

// Formats returns the output formats, in the order in which they are written.
func Formats() []string {
	var out []string
	for _, w := range writers() {
		out = append(out, w.format)
	}
	return out
}

// write makes the artefacts: for each sheet its formats. A writer refuses only
// what no sheet should hold, so its error is a fault.
func (u *Unit) write(formats []string, date string) {
	for _, s := range u.Sheets {
		page := *s.Sheet
		if page.Date == "" {
			page.Date = date
		}
		for _, w := range writers() {
			if !slices.Contains(formats, w.format) {
				continue
			}
			bytes, err := w.write(page)
			if err != nil {
				panic(fmt.Sprintf("drawing %s: %v", s.Name, err))
			}
			u.Artefacts = append(u.Artefacts, Artefact{Name: s.Name + "." + w.format, MediaType: w.mediaType, Bytes: bytes})
		}
	}
}

// date returns the day of SOURCE_DATE_EPOCH, which is the only date that does not
// come from a source file, or "" when it is not set.
func date(h *host.Host) string {
	seconds, err := strconv.ParseInt(h.Getenv("SOURCE_DATE_EPOCH"), 10, 64)
	if err != nil {
		return ""
	}
	return time.Unix(seconds, 0).UTC().Format(time.DateOnly)
}
