package font

import (
	"encoding/binary"
	"slices"
)

// Subset is a small TrueType file with the glyphs of some characters, and no
// hinting: lettering on a drawing is large or printed.
type Subset struct {
	Data  []byte // a whole TrueType file, fit for web pages and for PDF
	Runes []rune // rising; glyph i+1 is the glyph of Runes[i], glyph 0 the missing-glyph box
	face  *Face
}

// Subset returns the subset for the characters of the texts, as cleaned. A
// character that the face lacks has a glyph of its own that shows the missing
// glyph box, so that the text stays searchable. The same characters give the
// same bytes.
func (f *Face) Subset(texts []string) Subset {
	var runes []rune
	for _, s := range texts {
		runes = append(runes, []rune(Clean(s))...)
	}
	slices.Sort(runes)
	s := Subset{Runes: slices.Compact(runes), face: f}
	s.Data = s.build()
	return s
}

// Glyph returns the glyph number of a character of the subset, 0 for others.
func (s Subset) Glyph(r rune) int {
	i, ok := slices.BinarySearch(s.Runes, r)
	if !ok {
		return 0
	}
	return i + 1
}

// build gathers the glyphs, the parts of composite glyphs after the rest.
func (s Subset) build() []byte {
	old := []int{0}
	for _, r := range s.Runes {
		old = append(old, s.face.glyph(r))
	}
	place := map[int]int{}
	for i, g := range old {
		if _, ok := place[g]; !ok {
			place[g] = i
		}
	}
	var glyf, loca []byte
	for i := 0; i < len(old); i++ { // old grows by the parts met
		loca = binary.BigEndian.AppendUint32(loca, uint32(len(glyf)))
		d := slices.Clone(s.face.glyphData(old[i]))
		parts, length := components(d)
		for _, c := range parts {
			if _, ok := place[c.glyph]; !ok {
				place[c.glyph] = len(old)
				old = append(old, c.glyph)
			}
			binary.BigEndian.PutUint16(d[c.at:], uint16(place[c.glyph]))
			d[c.at-2] &^= instructions >> 8
		}
		if parts != nil {
			d = d[:length]
		} else {
			d = unhinted(d)
		}
		glyf = append(glyf, d...)
		for len(glyf)%4 != 0 {
			glyf = append(glyf, 0)
		}
	}
	loca = binary.BigEndian.AppendUint32(loca, uint32(len(glyf)))
	return s.face.file(glyf, loca, s.face.metrics(old), s.cmap(), len(old))
}

// unhinted takes the instructions out of a simple glyph.
func unhinted(d []byte) []byte {
	if len(d) < 10 {
		return nil
	}
	at := 10 + 2*i16(d, 0)
	n := u16(d, at)
	d[at], d[at+1] = 0, 0
	return append(d[:at+2], d[at+2+n:]...)
}

func (t *truetype) metrics(glyphs []int) []byte {
	var b []byte
	for _, g := range glyphs {
		b = binary.BigEndian.AppendUint16(b, uint16(t.advance(g)))
		b = binary.BigEndian.AppendUint16(b, uint16(t.bearing(g)))
	}
	return b
}

// cmap writes a format 12 character map. Characters that the face lacks are left
// out of it, so that a browser looks for them in its own fonts.
func (s Subset) cmap() []byte {
	var groups []byte
	n := 0
	for i, r := range s.Runes {
		if s.face.glyph(r) == 0 {
			continue
		}
		for _, v := range [3]uint32{uint32(r), uint32(r), uint32(i + 1)} {
			groups = binary.BigEndian.AppendUint32(groups, v)
		}
		n++
	}
	b := []byte{0, 0, 0, 1, 0, 3, 0, 10, 0, 0, 0, 12, 0, 12, 0, 0}
	for _, v := range [3]uint32{uint32(16 + 12*n), 0, uint32(n)} {
		b = binary.BigEndian.AppendUint32(b, v)
	}
	return append(b, groups...)
}

// file puts the tables together. Those not rewritten are the face's own, cut to
// what stays true without hints and glyph names.
func (t *truetype) file(glyf, loca, hmtx, cmap []byte, glyphs int) []byte {
	head := slices.Clone(t.tables["head"])
	binary.BigEndian.PutUint32(head[8:], 0) // the checksum, set at the end
	binary.BigEndian.PutUint16(head[50:], 1)
	hhea := slices.Clone(t.tables["hhea"])
	binary.BigEndian.PutUint16(hhea[34:], uint16(glyphs))
	maxp := slices.Clone(t.tables["maxp"])
	binary.BigEndian.PutUint16(maxp[4:], uint16(glyphs))
	post := slices.Clone(t.tables["post"][:32])
	binary.BigEndian.PutUint32(post, 0x00030000)
	return assemble([]table{ // in the order of the tags, as readers demand
		{"OS/2", t.tables["OS/2"]}, {"cmap", cmap}, {"glyf", glyf}, {"head", head}, {"hhea", hhea},
		{"hmtx", hmtx}, {"loca", loca}, {"maxp", maxp}, {"name", []byte{0, 0, 0, 0, 0, 6}}, {"post", post},
	})
}

type table struct {
	tag  string
	data []byte
}

// assemble writes the directory and the tables, and the checksums of both.
func assemble(tables []table) []byte {
	n := len(tables)
	entry := 0
	for 2<<entry <= n {
		entry++
	}
	out := []byte{0, 1, 0, 0}
	for _, v := range [4]int{n, 16 << entry, entry, 16*n - 16<<entry} {
		out = binary.BigEndian.AppendUint16(out, uint16(v))
	}
	at, headAt := 12+16*n, 0
	var body []byte
	for _, t := range tables {
		if t.tag == "head" {
			headAt = at + len(body)
		}
		out = append(out, t.tag...)
		for _, v := range [3]uint32{checksum(t.data), uint32(at + len(body)), uint32(len(t.data))} {
			out = binary.BigEndian.AppendUint32(out, v)
		}
		body = append(body, t.data...)
		for len(body)%4 != 0 {
			body = append(body, 0)
		}
	}
	out = append(out, body...)
	binary.BigEndian.PutUint32(out[headAt+8:], 0xB1B0AFBA-checksum(out))
	return out
}

// checksum adds the big-endian words of b, the last filled with zeros.
func checksum(b []byte) uint32 {
	var s uint32
	for ; len(b) >= 4; b = b[4:] {
		s += binary.BigEndian.Uint32(b)
	}
	var last [4]byte
	copy(last[:], b)
	return s + binary.BigEndian.Uint32(last[:])
}
