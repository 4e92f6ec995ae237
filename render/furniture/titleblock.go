package furniture

import (
	"fmt"
	"strings"

	"epure/geom/vec"
	"epure/render/drawing"
)

// TitleBlock holds the data fields of ISO 7200:2004 and those that stand beside
// them by custom. An empty field is drawn empty. Whether a drawing may be issued
// with what is given is for the caller to say, in Status.
type TitleBlock struct {
	Owner        string // legal owner
	Number       string // identification number
	Revision     string
	Date         string // date of issue, YYYY-MM-DD
	Sheet        string // sheet number, "1"
	Sheets       string // number of sheets; "1/3" is written
	Language     string // ISO 639
	Title        string
	Supplement   string // supplementary title
	Department   string // responsible department
	Reference    string // technical reference: whom to ask
	Approved     string // approval person
	Creator      string
	DocumentType string
	Status       string
	PaperSize    string
	Scale        string // main scale, "1:5"
	Units        string // "mm"
	Tolerance    string // general tolerance
	Projection   Projection
}

// BlockWidth is the width of the title block, mm, on every sheet (ISO 7200), and
// BlockHeight its height, which the standard leaves free.
const (
	BlockWidth  = 180.0
	BlockHeight = 37.0
)

// BlockBox returns where the title block lies on a paper: the lower right corner
// of the drawing space, which on upright A4 is its whole width.
func BlockBox(p Paper) drawing.Box {
	s := p.Space()
	return drawing.BoxAt(vec.V2{X: s.Max.X - BlockWidth, Y: s.Min.Y}, BlockWidth, BlockHeight)
}

// field is one box of the title block: place in mm from its lower left, caption,
// text, and the largest height of the text.
type field struct {
	x, y, w, h float64
	name       string
	text       string
	most       float64
}

// fields is the arrangement: who made it above, whose it is at the left, what it
// is in the middle, and at the right what it is filed by.
func (b TitleBlock) fields() []field {
	return []field{
		{0, 28, 46, 9, "Responsible department", b.Department, 2.5},
		{46, 28, 40, 9, "Technical reference", b.Reference, 2.5},
		{86, 28, 36, 9, "General tolerance", b.Tolerance, 2.5},
		{122, 28, 20, 9, "Scale", b.Scale, 3.5},
		{142, 28, 12, 9, "Units", b.Units, 3.5},
		{154, 28, 26, 9, "", "", 0},
		{0, 20, 46, 8, "Created by", b.Creator, 2.5},
		{46, 20, 40, 8, "Approved by", b.Approved, 2.5},
		{86, 20, 50, 8, "Document type", b.DocumentType, 2.5},
		{136, 20, 44, 8, "Document status", b.Status, 2.5},
		{0, 0, 46, 20, "Legal owner", b.Owner, 5},
		{122, 9, 58, 11, "Identification number", b.Number, 5},
		{122, 0, 10, 9, "Rev.", b.Revision, 3.5},
		{132, 0, 20, 9, "Date of issue", b.Date, 2.5},
		{152, 0, 8, 9, "Lang.", b.Language, 2.5},
		{160, 0, 12, 9, "Sheet", b.sheet(), 2.5},
		{172, 0, 8, 9, "Size", b.PaperSize, 2.5},
	}
}

// The title's field, and where its supplementary title begins (mm above the
// block's foot).
const (
	titleX, titleWidth, titleTop = 46.0, 76.0, 20.0
	supplementTop                = 8.2
	titleGap                     = 1.4 // between the title's last baseline and the supplementary title
)

func (b TitleBlock) sheet() string {
	if b.Sheet != "" && b.Sheets != "" {
		return b.Sheet + "/" + b.Sheets
	}
	return b.Sheet
}

// The captions and the air inside a field, mm.
const (
	captionHeight = 1.8
	inset         = 0.9
	footing       = 1.65 // of the last baseline above the field's foot: tails of 5 mm text, 3/10 h, stay inside
)

// Marks returns the title block with its lower right corner at corner.
func (b TitleBlock) Marks(corner vec.V2, g drawing.Group) []drawing.Mark {
	o := vec.V2{X: corner.X - BlockWidth, Y: corner.Y}
	out := []drawing.Mark{b.border(o, g)}
	for _, f := range b.fields() {
		out = append(out, f.marks(o, g)...)
	}
	out = append(out, b.title(o, g)...)
	at := vec.V2{X: o.X + 167, Y: o.Y + 32.5}
	return append(out, Symbol(b.Projection, at, 2.8, g)...)
}

// border is the block's own outline, as wide as the frame that it leans on.
func (b TitleBlock) border(o vec.V2, g drawing.Group) drawing.Mark {
	pen := drawing.Pen{Width: frameWidth, Type: drawing.Continuous}
	return drawing.Mark{Key: named("title block", "border"), Role: drawing.Furniture, Pen: pen,
		Shape: drawing.BoxAt(o, BlockWidth, BlockHeight).Outline()}
}

// marks draws a field: its box, its caption at the upper left, its text on the
// lower edge.
func (f field) marks(o vec.V2, g drawing.Group) []drawing.Mark {
	k := named("title block", strings.ToLower(f.name))
	p := vec.V2{X: o.X + f.x, Y: o.Y + f.y}
	out := []drawing.Mark{{Key: named(k.Thing, strings.TrimSpace(k.Feature+" field")), Role: drawing.Furniture,
		Pen: drawing.Pen{Width: g.Narrow, Type: drawing.Continuous}, Shape: drawing.BoxAt(p, f.w, f.h).Outline()}}
	out = append(out, caption(k, f.name, p, f.h)...)
	lines, h := Fit(f.text, f.w-2*inset, f.h-captionHeight-2*inset-footing, f.most)
	base := p.Y + footing + pitch*h*float64(len(lines)-1)
	return append(out, column(k, lines, vec.V2{X: p.X + inset, Y: base}, h, drawing.Start)...)
}

func caption(k drawing.Key, name string, p vec.V2, h float64) []drawing.Mark {
	if name == "" {
		return nil
	}
	at := vec.V2{X: p.X + inset, Y: p.Y + h - inset - captionHeight}
	k.Feature += " caption"
	return []drawing.Mark{label(k, drawing.Text{At: at, Height: captionHeight, String: name})}
}

// title draws the title under its caption, and the supplementary title below; a
// title without a supplementary one has the whole field.
func (b TitleBlock) title(o vec.V2, g drawing.Group) []drawing.Mark {
	k := named("title block", "title")
	p := vec.V2{X: o.X + titleX, Y: o.Y}
	out := []drawing.Mark{{Key: named(k.Thing, "title field"), Role: drawing.Furniture,
		Pen: drawing.Pen{Width: g.Narrow, Type: drawing.Continuous}, Shape: drawing.BoxAt(p, titleWidth, titleTop).Outline()}}
	out = append(out, caption(k, "Title", p, titleTop)...)
	top := titleTop - captionHeight - 2.5*inset
	foot := supplementTop + titleGap
	if strings.TrimSpace(b.Supplement) == "" {
		foot = footing
	}
	lines, h := Fit(b.Title, titleWidth-2*inset, top-foot, 5)
	below, h2 := Fit(b.Supplement, titleWidth-2*inset, supplementTop-footing, min(2.5, max(h, captionHeight)))
	out = append(out, column(k, lines, vec.V2{X: p.X + inset, Y: p.Y + top - h}, h, drawing.Start)...)
	return append(out, column(named(k.Thing, "supplementary title"), below,
		vec.V2{X: p.X + inset, Y: p.Y + supplementTop - h2}, h2, drawing.Start)...)
}

// numbered is the key of one line of several: the first keeps the name.
func numbered(k drawing.Key, i int) drawing.Key {
	if i > 0 {
		k.Feature = fmt.Sprintf("%s/%d", k.Feature, i+1)
	}
	return k
}
