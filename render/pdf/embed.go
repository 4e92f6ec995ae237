package pdf

import (
	"crypto/sha256"
	"fmt"
	"math"
	"strings"
	"unicode/utf16"

	"epure/render/drawing"
	"epure/render/font"
)

// embedFace writes a subset as a composite font whose codes are glyph numbers
// (ISO 32000-1, 9.7): font file, descriptor, widths, map back to characters.
func embedFace(f *file, face *font.Face, s font.Subset) string {
	name := tag(s) + "+" + face.Name
	data := f.stream(fmt.Sprintf("/Length1 %d", len(s.Data)), s.Data)
	b := face.Box()
	descriptor := f.add(fmt.Sprintf("<</Type/FontDescriptor/FontName/%s/Flags 4/FontBBox[%d %d %d %d]/ItalicAngle 0"+
		"/Ascent %d/Descent %d/CapHeight %d/StemV %d/FontFile2 %s>>", name,
		milli(b.Min.X), milli(b.Min.Y), milli(b.Max.X), milli(b.Max.Y),
		milli(face.Ascent()), milli(-face.Descent()), milli(face.CapHeight()), stem(face), data))
	cid := f.add(fmt.Sprintf("<</Type/Font/Subtype/CIDFontType2/BaseFont/%s/CIDSystemInfo<</Registry(Adobe)/Ordering(Identity)"+
		"/Supplement 0>>/FontDescriptor %s/CIDToGIDMap/Identity/DW 1000/W[0[%s]]>>", name, descriptor, widths(face, s)))
	return f.add(fmt.Sprintf("<</Type/Font/Subtype/Type0/BaseFont/%s/Encoding/Identity-H/DescendantFonts[%s]/ToUnicode %s>>",
		name, cid, f.stream("", []byte(toUnicode(s)))))
}

// milli turns a part of the font size into the thousandths that PDF counts in.
func milli(x float64) int { return int(math.Round(x * 1000)) }

// stem is the width of the letter l's outline, a bare stem, in thousandths.
func stem(face *font.Face) int {
	b := drawing.EmptyBox()
	for _, p := range face.Outline('l') {
		b = b.Union(drawing.Bounds(p))
	}
	return milli(b.Width())
}

// tag is the six capitals that mark a subset, from a hash of its file.
func tag(s font.Subset) string {
	sum := sha256.Sum256(s.Data)
	var b strings.Builder
	for _, v := range sum[:6] {
		b.WriteByte('A' + v%26)
	}
	return b.String()
}

// widths lists the advance widths from glyph 0 on, exact to a hundredth unit so
// that a long line ends where the font says.
func widths(face *font.Face, s font.Subset) string {
	out := []string{num(face.Advance(0) * 1000)}
	for _, r := range s.Runes {
		out = append(out, num(face.Advance(r)*1000))
	}
	return strings.Join(out, " ")
}

// toUnicode is the map from glyph numbers to characters. A section of such a map
// holds a hundred entries at most.
func toUnicode(s font.Subset) string {
	var b strings.Builder
	b.WriteString("/CIDInit /ProcSet findresource begin\n12 dict begin\nbegincmap\n" +
		"/CIDSystemInfo <</Registry (Adobe) /Ordering (UCS) /Supplement 0>> def\n" +
		"/CMapName /Adobe-Identity-UCS def\n/CMapType 2 def\n" +
		"1 begincodespacerange\n<0000> <FFFF>\nendcodespacerange\n")
	const section = 100
	for at := 0; at < len(s.Runes); at += section {
		part := s.Runes[at:min(at+section, len(s.Runes))]
		fmt.Fprintf(&b, "%d beginbfchar\n", len(part))
		for i, r := range part {
			fmt.Fprintf(&b, "<%04X> <", at+i+1)
			for _, u := range utf16.Encode([]rune{r}) {
				fmt.Fprintf(&b, "%04X", u)
			}
			b.WriteString(">\n")
		}
		b.WriteString("endbfchar\n")
	}
	b.WriteString("endcmap\nCMapName currentdict /CMap defineresource pop\nend\nend\n")
	return b.String()
}
