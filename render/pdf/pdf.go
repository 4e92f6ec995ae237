// Package pdf writes a sheet as a one-page PDF at true scale.
//
// It is a small writer of its own. The file needs little: a page of lines, cubic
// curves, fills and text with an embedded font. General libraries were off in
// arcs, set ligatures that break a search, took the creation date from the clock
// and could not say "do not scale when printing"; here each of these is one line.
//
// Structure and operators follow ISO 32000-1 (PDF 1.7). Text is set in glyph
// numbers of an embedded subset (Identity-H) with a ToUnicode map, so that it is
// found by a search.
package pdf

import (
	"fmt"

	"epure/render/drawing"
	"epure/render/font"
)

// PointsPerMM turns millimetres into the page's unit of 1/72 inch.
const PointsPerMM = 72 / 25.4

// Write returns the document. The same sheet gives the same bytes. The only
// error is a mark with a coordinate that is not finite, named by its key.
func Write(s drawing.Sheet) ([]byte, error) {
	if err := drawing.Check(s); err != nil {
		return nil, fmt.Errorf("pdf: %w", err)
	}
	f := &file{}
	fonts := embed(f, s.Marks)
	box := fmt.Sprintf("[0 0 %s %s]", num(s.Width*PointsPerMM), num(s.Height*PointsPerMM))
	content := f.stream("", draw(s, fonts))
	pages := f.reserve()
	page := f.add(fmt.Sprintf("<</Type/Page/Parent %s/MediaBox %s/TrimBox %s/Contents %s/Resources<</Font<<%s>>>>>>",
		pages, box, box, content, resources(fonts)))
	f.set(pages, fmt.Sprintf("<</Type/Pages/Kids[%s]/Count 1>>", page))
	catalog := f.add(fmt.Sprintf("<</Type/Catalog/Pages %s/ViewerPreferences<</PrintScaling/None/DisplayDocTitle true>>>>", pages))
	return f.bytes(catalog, f.add(info(s))), nil
}

// info holds the document's metadata. The creation date is the sheet's date, at
// midnight UTC; a sheet without a valid one has none, for the clock is not asked.
func info(s drawing.Sheet) string {
	out := "<</Title" + text(s.Title) + "/Creator" + text("epure") + "/Producer" + text("epure")
	if s.Creator != "" {
		out += "/Author" + text(s.Creator)
	}
	if s.Desc != "" {
		out += "/Subject" + text(s.Desc)
	}
	if d := date(s.Date); d != "" {
		out += "/CreationDate(" + d + ")/ModDate(" + d + ")"
	}
	return out + ">>"
}

// date turns YYYY-MM-DD into a PDF date, and anything else into "".
func date(iso string) string {
	var y, m, d int
	if n, err := fmt.Sscanf(iso, "%4d-%2d-%2d", &y, &m, &d); n != 3 || err != nil {
		return ""
	}
	if fmt.Sprintf("%04d-%02d-%02d", y, m, d) != iso || m < 1 || m > 12 || d < 1 || d > 31 {
		return ""
	}
	return fmt.Sprintf("D:%04d%02d%02d000000+00'00'", y, m, d)
}

// face is one embedded font.
type face struct {
	name, object string // name in the page's resources, reference
	subset       font.Subset
}

// embed writes the fonts in use; an unused weight stays nil.
func embed(f *file, marks []drawing.Mark) [2]*face {
	var out [2]*face
	for i, bold := range []bool{false, true} {
		if texts := drawing.Texts(marks, bold); len(texts) > 0 {
			s := font.Of(bold).Subset(texts)
			out[i] = &face{fmt.Sprintf("/F%d", i+1), embedFace(f, font.Of(bold), s), s}
		}
	}
	return out
}

func resources(fonts [2]*face) string {
	s := ""
	for _, f := range fonts {
		if f != nil {
			s += f.name + " " + f.object
		}
	}
	return s
}
