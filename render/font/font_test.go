package font

import (
	"math"
	"testing"

	"golang.org/x/image/font"
	"golang.org/x/image/font/sfnt"
	"golang.org/x/image/math/fixed"

	"epure/render/drawing"
)

// signs are characters that drawings use; the second route for all of them is
// the reader of golang.org/x/image.
const signs = "HAgÉÅñß 0123456789.,:;-−×·/()[]=+±°′″⌀∠⊥∥□αβγδθλφωΩ≤≥√²³½¼“”"

func second(t *testing.T, data []byte) (*sfnt.Font, *sfnt.Buffer) {
	t.Helper()
	f, err := sfnt.Parse(data)
	if err != nil {
		t.Fatal(err)
	}
	return f, &sfnt.Buffer{}
}

func TestAdvancesAgreeWithSecondReader(t *testing.T) {
	for _, f := range []*Face{Regular(), Bold()} {
		g, buf := second(t, f.data)
		for _, r := range signs {
			if !f.Has(r) {
				t.Errorf("%s lacks %q", f.Name, r)
			}
			i, err := g.GlyphIndex(buf, r)
			if err != nil || int(i) != f.glyph(r) {
				t.Errorf("%q: glyph %d, second reader %d (%v)", r, f.glyph(r), i, err)
			}
			a, err := g.GlyphAdvance(buf, i, fixed.I(int(f.unitsPerEm)), font.HintingNone)
			if err != nil || float64(a)/64 != f.advance(int(i)) {
				t.Errorf("%q: advance %v, second reader %v (%v)", r, f.advance(int(i)), float64(a)/64, err)
			}
		}
	}
}

// outlinePoints lists the on-curve points and controls in reading order.
func outlinePoints(f *Face, r rune) []float64 {
	var out []float64
	for _, p := range f.Outline(r) {
		from, _, _ := drawing.Ends(p)
		out = append(out, from.X, from.Y)
		for _, s := range p.Pieces {
			switch s := s.(type) {
			case drawing.Line:
				out = append(out, s.B.X, s.B.Y)
			case drawing.Quad:
				out = append(out, s.P1.X, s.P1.Y, s.P2.X, s.P2.Y)
			}
		}
	}
	return out
}

func secondPoints(t *testing.T, f *sfnt.Font, buf *sfnt.Buffer, r rune, em float64) []float64 {
	i, err := f.GlyphIndex(buf, r)
	if err != nil {
		t.Fatal(err)
	}
	segs, err := f.LoadGlyph(buf, i, fixed.I(int(em)), nil)
	if err != nil {
		t.Fatal(err)
	}
	var out []float64
	for _, s := range segs {
		n := map[sfnt.SegmentOp]int{sfnt.SegmentOpMoveTo: 1, sfnt.SegmentOpLineTo: 1, sfnt.SegmentOpQuadTo: 2}[s.Op]
		for _, p := range s.Args[:n] {
			out = append(out, float64(p.X)/64/em, -float64(p.Y)/64/em)
		}
	}
	return out
}

// The second reader rounds the unwritten points halfway between two controls to
// whole font units: half a unit, over 2048 units to the em.
const halfUnit = 0.5 / 2048

func TestOutlinesAgreeWithSecondReader(t *testing.T) {
	f := Regular()
	g, buf := second(t, f.data)
	for _, r := range signs {
		got, want := outlinePoints(f, r), secondPoints(t, g, buf, r, f.unitsPerEm)
		compare(t, r, got, want)
	}
}

func compare(t *testing.T, r rune, got, want []float64) {
	t.Helper()
	if len(got) != len(want) {
		t.Errorf("%q: %d numbers, second reader %d", r, len(got), len(want))
		return
	}
	for i := range got {
		if math.Abs(got[i]-want[i]) > halfUnit {
			t.Errorf("%q: number %d is %v, second reader %v", r, i, got[i], want[i])
			return
		}
	}
}

func TestSubsetKeepsGlyphs(t *testing.T) {
	f := Regular()
	s := f.Subset([]string{signs, "missing: 漢"})
	g, buf := second(t, s.Data)
	for _, r := range signs {
		i, err := g.GlyphIndex(buf, r)
		if err != nil || int(i) != s.Glyph(r) {
			t.Errorf("%q: glyph %d in the file, %d stated (%v)", r, i, s.Glyph(r), err)
		}
		compare(t, r, secondPoints(t, g, buf, r, f.unitsPerEm), outlinePoints(f, r))
	}
	if i, _ := g.GlyphIndex(buf, '漢'); i != 0 || s.Glyph('漢') == 0 {
		t.Errorf("a missing character maps to %d in the file and %d in text", i, s.Glyph('漢'))
	}
	if sum := checksum(s.Data); sum != 0xB1B0AFBA { // OpenType: the whole file adds to this
		t.Errorf("file checksum %x", sum)
	}
}

func TestHeightIsThatOfCapitals(t *testing.T) {
	for _, f := range []*Face{Regular(), Bold()} {
		top := 0.0
		for _, p := range f.Outline('H') {
			top = max(top, drawing.Bounds(p).Max.Y)
		}
		if h := top * f.Size(3.5); math.Abs(h-3.5) > 1e-12 { // rounding of three operations
			t.Errorf("%s: H is %v mm high at 3.5", f.Name, h)
		}
	}
}

func TestCleanLeavesOnlyDrawableText(t *testing.T) {
	got := Clean("a\x00b\tc\nd\u200be\xfff\u202eg\uffffh⌀")
	if got != "ab c defgh⌀" {
		t.Errorf("got %q", got)
	}
}

func BenchmarkLoad(b *testing.B) {
	for range b.N {
		load("x", Regular().data)
	}
}
