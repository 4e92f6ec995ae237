package furniture

import (
	"fmt"
	"math"
	"reflect"
	"strings"
	"testing"

	"pgregory.net/rapid"

	"epure/geom/vec"
	"epure/render/drawing"
	"epure/render/font"
)

// TestPapers holds the table of ISO 5457 in the reference notes, section 1
// (sources S1, S2; field counts S3): trimmed, drawing space, untrimmed, fields.
func TestPapers(t *testing.T) {
	for _, c := range []struct {
		name                            string
		short, long, spaceW, spaceH     float64
		untrimmedShort, untrimmedLong   float64
		fieldsLong, fieldsShort, fields int
	}{
		{"A0", 841, 1189, 821, 1159, 880, 1230, 24, 16, 80},
		{"A1", 594, 841, 574, 811, 625, 880, 16, 12, 56},
		{"A2", 420, 594, 400, 564, 450, 625, 12, 8, 40},
		{"A3", 297, 420, 277, 390, 330, 450, 8, 6, 28},
		{"A4", 210, 297, 180, 277, 240, 330, 6, 4, 10}, // upright; letters and numerals on two sides
	} {
		p, ok := PaperNamed(c.name)
		if !ok || min(p.Width, p.Height) != c.short || max(p.Width, p.Height) != c.long {
			t.Errorf("%s: %v by %v", c.name, p.Width, p.Height)
		}
		s := p.Space()
		if min(s.Width(), s.Height()) != c.spaceW || max(s.Width(), s.Height()) != c.spaceH {
			t.Errorf("%s: drawing space %v by %v", c.name, s.Width(), s.Height())
		}
		if w, h := p.Untrimmed(); min(w, h) != c.untrimmedShort || max(w, h) != c.untrimmedLong || (w > h) != (p.Width > p.Height) {
			t.Errorf("%s: untrimmed %v by %v", c.name, w, h)
		}
		if x, y := fieldCounts(p); max(x, y) != c.fieldsLong || min(x, y) != c.fieldsShort {
			t.Errorf("%s: grid of %d by %d fields", c.name, x, y)
		}
		if n := gridLabels(Frame(p)); n != c.fields {
			t.Errorf("%s: %d grid labels, want %d", c.name, n, c.fields)
		}
	}
	if _, ok := PaperNamed("A9"); ok {
		t.Error("A9 is a paper")
	}
}

func fieldCounts(p Paper) (x, y int) {
	s := p.Space()
	return len(fields(p.Width, s.Min.X, s.Max.X)) - 1, len(fields(p.Height, s.Min.Y, s.Max.Y)) - 1
}

func gridLabels(marks []drawing.Mark) int {
	n := 0
	for _, m := range marks {
		if _, ok := m.Shape.(drawing.Text); ok {
			n++
		}
	}
	return n
}

func TestGridNames(t *testing.T) {
	got := ""
	for i := range 26 {
		got += gridName(i) + " "
	}
	// ISO 5457 (S3): no I, no O; after Z doubled
	if got != "A B C D E F G H J K L M N P Q R S T U V W X Y Z AA BB " {
		t.Errorf("letters %q", got)
	}
	p, _ := PaperNamed("A3")
	for _, m := range Frame(p) {
		if x, ok := m.Shape.(drawing.Text); ok && m.Key.Feature == "grid/left/A" && x.At.Y < 245 {
			t.Errorf("A is at %v, not at the top", x.At)
		}
	}
}

func TestFrameStaysOnPaper(t *testing.T) {
	for _, p := range append(Papers(), Paper{"A4", 297, 210}) {
		sheet := drawing.BoxAt(vec.V2{}, p.Width, p.Height)
		block := TitleBlock{Title: "T"}.Marks(vec.V2{X: p.Space().Max.X, Y: p.Space().Min.Y}, p.Group())
		for _, m := range append(Frame(p), block...) {
			if !sheet.Holds(font.Bounds(m.Shape)) {
				t.Errorf("%s: %v leaves the sheet", p.Name, m.Key)
			}
		}
		for _, m := range block {
			if !BlockBox(p).Grow(1e-9).Holds(drawing.Bounds(m.Shape)) { // rounding of sums of whole tenths
				t.Errorf("%s: %v leaves the block", p.Name, m.Key)
			}
		}
		for _, m := range Frame(p) {
			if m.Key.Feature != "border" && strings.HasPrefix(m.Key.Feature, "centring") && BlockBox(p).Overlaps(drawing.Bounds(m.Shape)) {
				t.Errorf("%s: %v runs into the title block", p.Name, m.Key)
			}
		}
	}
}

// TestTrimmingMarks: two rectangles of 10 by 5 at each corner (from memory of ISO
// 5457), outside the trimmed sheet.
func TestTrimmingMarks(t *testing.T) {
	p, _ := PaperNamed("A2")
	marks := TrimmingMarks(p)
	if len(marks) != 8 {
		t.Fatalf("%d rectangles", len(marks))
	}
	w, h := p.Untrimmed()
	margin := drawing.BoxAt(vec.V2{}, p.Width, p.Height).Grow((w - p.Width) / 2)
	for _, m := range marks {
		b := drawing.Bounds(m.Shape)
		if b.Width()*b.Height() != 50 || b.Width()+b.Height() != 15 {
			t.Errorf("%v is %v by %v", m.Key, b.Width(), b.Height())
		}
		if drawing.BoxAt(vec.V2{}, p.Width, p.Height).Overlaps(b) || !margin.Holds(b) || h-p.Height < 10 {
			t.Errorf("%v is not in the margin: %v", m.Key, b)
		}
	}
}

// TestScales holds the list of ISO 5455:1979 in the reference notes, section 5
// (S26).
func TestScales(t *testing.T) {
	want := strings.Fields("50:1 20:1 10:1 5:1 2:1 1:1 1:2 1:5 1:10 1:20 1:50 1:100 1:200 1:500 1:1000 1:2000 1:5000 1:10000")
	var got []string
	for _, s := range Scales() {
		got = append(got, s.String())
		if n, ok := NextDown(s.Value()); !ok || n != s {
			t.Errorf("next down from %v is %v", s, n)
		}
	}
	if !reflect.DeepEqual(got, want) {
		t.Errorf("scales %v", got)
	}
	for fit, want := range map[float64]string{0.3: "1:5", 0.19999999999: "1:5", 0.1999: "1:10", 0.4: "1:5", 0.99: "1:2", 3: "2:1", 120: "100:1", 3e-7: "1:5000000"} {
		if s, ok := NextDown(fit); !ok || s.String() != want {
			t.Errorf("next down from %v is %v, want %s", fit, s, want)
		}
	}
	for _, bad := range []float64{0, -1, math.NaN(), math.Inf(1), 1e-12} {
		if s, ok := NextDown(bad); ok {
			t.Errorf("a scale %v for %v", s, bad)
		}
	}
}

// TestTextHeights holds the heights of ISO 3098 in the reference notes, section 3
// (S16).
func TestTextHeights(t *testing.T) {
	if got := fmt.Sprint(Heights()); got != "[20 14 10 7 5 3.5 2.5 1.8]" {
		t.Error(got)
	}
}

// fieldOf finds the field of the block that a text belongs to: the smallest box
// that holds its anchor.
func fieldOf(marks []drawing.Mark, p vec.V2) drawing.Box {
	best := drawing.Box{}
	for _, m := range marks {
		if b := drawing.Bounds(m.Shape); strings.HasSuffix(m.Key.Feature, "field") &&
			b.Holds(drawing.EmptyBox().With(p)) && (best.Width() == 0 || b.Width() < best.Width()) {
			best = b
		}
	}
	return best
}

// TestTextStaysInItsField fills every field with text of every length and checks
// that no text leaves its field or lies on another. The box of a text is that of
// capitals and tails; accents may touch the caption's line.
func TestTextStaysInItsField(t *testing.T) {
	word := rapid.StringMatching(`[A-Za-z0-9ÄÉ⌀°.-]{1,40}`)
	rapid.Check(t, func(t *rapid.T) {
		var b TitleBlock
		v := reflect.ValueOf(&b).Elem()
		for i := range v.NumField() {
			if f := v.Field(i); f.Kind() == reflect.String {
				f.SetString(strings.Join(rapid.SliceOfN(word, 0, 12).Draw(t, "text"), " "))
			}
		}
		marks := b.Marks(vec.V2{X: 410, Y: 10}, drawing.Group05())
		var boxes []drawing.Box
		for _, m := range marks {
			x, ok := m.Shape.(drawing.Text)
			if !ok {
				continue
			}
			w := font.Width(x.String, x.Height, false)
			box := drawing.Box{Min: vec.V2{X: x.At.X, Y: x.At.Y - 0.3*x.Height}, Max: vec.V2{X: x.At.X + w, Y: x.At.Y + x.Height}}
			if f := fieldOf(marks, x.At); !f.Holds(box) {
				t.Fatalf("%v: text %v leaves its field %v: %q", m.Key, box, f, x.String)
			}
			for _, o := range boxes {
				if o.Overlaps(box) {
					t.Fatalf("%v: %q lies on another text", m.Key, x.String)
				}
			}
			boxes = append(boxes, box)
		}
	})
}

func TestFitKeepsEveryWord(t *testing.T) {
	s := "one two three four five six seven eight nine ten"
	lines, h := Fit(s, 20, 8, 5)
	if strings.Join(lines, " ") != s {
		t.Errorf("%q at %v", lines, h)
	}
	if lines, h := Fit("short", 100, 8, 5); h != 5 || len(lines) != 1 {
		t.Errorf("%q at %v", lines, h)
	}
	if lines, _ := Fit(" \x00 ", 100, 8, 5); lines != nil {
		t.Errorf("%q out of nothing", lines)
	}
	lines, _ = Fit(strings.Repeat("ü", 600), 3, 3, 5)
	if got := strings.Join(lines, ""); got != strings.Repeat("ü", mostText)+"…" {
		t.Errorf("a long word comes out as %d characters", len([]rune(got)))
	}
}

func TestTableIsAsLargeAsItSays(t *testing.T) {
	x := Table{Name: "t", Title: "A title", Head: []string{"No.", "Length"}, Rows: [][]string{{"1", "12.5"}, {"2"}, {"3", "1000.25"}}}
	b := drawing.EmptyBox()
	for _, m := range x.Marks(vec.V2{X: 50, Y: 100}, drawing.Group05()) {
		b = b.Union(drawing.Bounds(m.Shape))
		if txt, ok := m.Shape.(drawing.Text); ok && m.Key.Feature == "row/3/2" {
			if txt.Anchor != drawing.End {
				t.Error("lengths are not set to the right")
			}
		}
	}
	w, h := x.Size()
	if math.Abs(b.Width()-w) > 1e-9 || math.Abs(100-h-b.Min.Y) > 1e-9 { // rounding of a dozen sums
		t.Errorf("size %v by %v, marks reach %v", w, h, b)
	}
	if w, h := (Table{}).Size(); w != 0 || h != 0 {
		t.Errorf("an empty table of %v by %v", w, h)
	}
}
