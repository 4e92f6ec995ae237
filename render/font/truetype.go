package font

import (
	"encoding/binary"
	"sort"

	"epure/geom/vec"
	"epure/render/drawing"
)

// A reader for the part of TrueType that plain lettering needs: character map,
// advance widths and glyph outlines (OpenType specification 1.9: cmap, head,
// hhea, hmtx, loca, glyf). The two files are part of the program, so a damaged
// one is a broken build, not an error to report.

type truetype struct {
	data                   []byte
	tables                 map[string][]byte
	unitsPerEm             float64
	ascender, descender    float64
	numGlyphs, numHMtx     int
	longLoca               bool
	glyf, loca, hmtx       []byte
	groups                 []group
	xMin, yMin, xMax, yMax float64
}

// group is a run of characters with consecutive glyphs (cmap format 12).
type group struct{ first, last, glyph uint32 }

func u16(b []byte, at int) int       { return int(binary.BigEndian.Uint16(b[at:])) }
func i16(b []byte, at int) int       { return int(int16(binary.BigEndian.Uint16(b[at:]))) }
func u32(b []byte, at int) int       { return int(binary.BigEndian.Uint32(b[at:])) }
func fix14(b []byte, at int) float64 { return float64(i16(b, at)) / (1 << 14) }

func parse(data []byte) *truetype {
	t := &truetype{data: data, tables: map[string][]byte{}}
	for i := range u16(data, 4) {
		r := data[12+16*i:]
		t.tables[string(r[:4])] = data[u32(r, 8) : u32(r, 8)+u32(r, 12)]
	}
	head, hhea := t.tables["head"], t.tables["hhea"]
	t.unitsPerEm = float64(u16(head, 18))
	t.xMin, t.yMin = float64(i16(head, 36)), float64(i16(head, 38))
	t.xMax, t.yMax = float64(i16(head, 40)), float64(i16(head, 42))
	t.longLoca = u16(head, 50) == 1
	t.ascender, t.descender = float64(i16(hhea, 4)), float64(i16(hhea, 6))
	t.numHMtx = u16(hhea, 34)
	t.numGlyphs = u16(t.tables["maxp"], 4)
	t.glyf, t.loca, t.hmtx = t.tables["glyf"], t.tables["loca"], t.tables["hmtx"]
	t.groups = parseGroups(t.tables["cmap"])
	return t
}

// parseGroups reads the format 12 map, which holds all characters.
func parseGroups(cmap []byte) []group {
	for i := range u16(cmap, 2) {
		sub := cmap[u32(cmap, 8+8*i):]
		if u16(sub, 0) != 12 {
			continue
		}
		out := make([]group, u32(sub, 12))
		for j := range out {
			g := sub[16+12*j:]
			out[j] = group{uint32(u32(g, 0)), uint32(u32(g, 4)), uint32(u32(g, 8))}
		}
		return out
	}
	return nil
}

// glyph returns the glyph of a character, 0 when there is none.
func (t *truetype) glyph(r rune) int {
	i := sort.Search(len(t.groups), func(i int) bool { return t.groups[i].last >= uint32(r) })
	if i == len(t.groups) || uint32(r) < t.groups[i].first {
		return 0
	}
	return int(t.groups[i].glyph + uint32(r) - t.groups[i].first)
}

// advance returns the advance width of a glyph in font units.
func (t *truetype) advance(g int) float64 { return float64(u16(t.hmtx, 4*min(g, t.numHMtx-1))) }

// bearing returns the left side bearing of a glyph in font units.
func (t *truetype) bearing(g int) int {
	if g < t.numHMtx {
		return i16(t.hmtx, 4*g+2)
	}
	return i16(t.hmtx, 4*t.numHMtx+2*(g-t.numHMtx))
}

// glyphData returns the description of a glyph, empty for a blank.
func (t *truetype) glyphData(g int) []byte {
	if t.longLoca {
		return t.glyf[u32(t.loca, 4*g):u32(t.loca, 4*g+4)]
	}
	return t.glyf[2*u16(t.loca, 2*g) : 2*u16(t.loca, 2*g+2)]
}

// box returns the bounds of a glyph in font units.
func (t *truetype) box(g int) (left, bottom, right, top int) {
	d := t.glyphData(g)
	if len(d) < 10 {
		return
	}
	return i16(d, 2), i16(d, 4), i16(d, 6), i16(d, 8)
}

// Flags of a component of a composite glyph.
const (
	argsAreWords = 1 << 0
	scaled       = 1 << 3
	moreFollow   = 1 << 5
	scaledXY     = 1 << 6
	scaled2x2    = 1 << 7
	instructions = 1 << 8
)

// component is one part of a composite glyph: where its glyph number stands in
// the data, and the map of its points.
type component struct {
	at, glyph      int
	xx, xy, yx, yy float64
	dx, dy         float64
}

// components returns the parts of a composite glyph, and the length of their
// description; nil for a simple glyph. Parts placed by matching points do not
// occur in these fonts and would be placed at their own origin.
func components(d []byte) (out []component, length int) {
	if len(d) < 10 || i16(d, 0) >= 0 {
		return nil, 0
	}
	at := 10
	for {
		flags := u16(d, at)
		c := component{at: at + 2, glyph: u16(d, at+2), xx: 1, yy: 1}
		at += 4
		if flags&argsAreWords != 0 {
			c.dx, c.dy = float64(i16(d, at)), float64(i16(d, at+2))
			at += 4
		} else {
			c.dx, c.dy = float64(int8(d[at])), float64(int8(d[at+1]))
			at += 2
		}
		switch {
		case flags&scaled != 0:
			c.xx, c.yy = fix14(d, at), fix14(d, at)
			at += 2
		case flags&scaledXY != 0:
			c.xx, c.yy = fix14(d, at), fix14(d, at+2)
			at += 4
		case flags&scaled2x2 != 0:
			c.xx, c.xy, c.yx, c.yy = fix14(d, at), fix14(d, at+2), fix14(d, at+4), fix14(d, at+6)
			at += 8
		}
		out = append(out, c)
		if flags&moreFollow == 0 {
			return out, at
		}
	}
}

// Outline returns the closed outlines of a character's glyph, over the font size,
// from the baseline's start, y up. Outer and inner outlines turn opposite ways.
func (f *Face) Outline(r rune) []drawing.Path {
	var out []drawing.Path
	for _, c := range f.contours(f.glyph(r)) {
		for i := range c {
			c[i].p = c[i].p.Scale(1 / f.unitsPerEm)
		}
		out = append(out, trace(c))
	}
	return out
}

// knot is a point of a contour, on the curve or a control point.
type knot struct {
	p  vec.V2
	on bool
}

func (t *truetype) contours(g int) [][]knot {
	d := t.glyphData(g)
	if len(d) < 10 {
		return nil
	}
	parts, _ := components(d)
	if parts == nil {
		return simpleContours(d)
	}
	var out [][]knot
	for _, c := range parts {
		for _, k := range t.contours(c.glyph) {
			for i, q := range k {
				k[i].p = vec.V2{X: c.xx*q.p.X + c.yx*q.p.Y + c.dx, Y: c.xy*q.p.X + c.yy*q.p.Y + c.dy}
			}
			out = append(out, k)
		}
	}
	return out
}

// Flags of a point of a simple glyph.
const (
	onCurve    = 1 << 0
	shortX     = 1 << 1
	shortY     = 1 << 2
	repeatFlag = 1 << 3
	sameX      = 1 << 4
	sameY      = 1 << 5
)

func simpleContours(d []byte) [][]knot {
	n := i16(d, 0)
	ends := d[10:]
	count := u16(ends, 2*(n-1)) + 1
	at := 10 + 2*n + 2 + u16(d, 10+2*n)
	var flags []byte
	for len(flags) < count {
		f := d[at]
		at++
		flags = append(flags, f)
		if f&repeatFlag != 0 {
			for range d[at] {
				flags = append(flags, f)
			}
			at++
		}
	}
	xs, at := coordinates(d, at, flags, shortX, sameX)
	ys, _ := coordinates(d, at, flags, shortY, sameY)
	var out [][]knot
	start := 0
	for i := range n {
		end := u16(ends, 2*i) + 1
		var c []knot
		for j := start; j < end; j++ {
			c = append(c, knot{vec.V2{X: float64(xs[j]), Y: float64(ys[j])}, flags[j]&onCurve != 0})
		}
		out = append(out, c)
		start = end
	}
	return out
}

// coordinates reads one axis of all points: each a difference from the last.
func coordinates(d []byte, at int, flags []byte, short, same byte) ([]int, int) {
	out := make([]int, len(flags))
	v := 0
	for i, f := range flags {
		switch {
		case f&short != 0 && f&same != 0:
			v += int(d[at])
			at++
		case f&short != 0:
			v -= int(d[at])
			at++
		case f&same == 0:
			v += i16(d, at)
			at += 2
		}
		out[i] = v
	}
	return out, at
}

// trace turns a contour into lines and quadratics: between two control points
// lies an unwritten point of the curve, halfway.
func trace(c []knot) drawing.Path {
	p := drawing.Path{Closed: true}
	if len(c) == 0 {
		return p
	}
	mid := func(a, b knot) vec.V2 { return a.p.Add(b.p).Scale(0.5) }
	n := len(c)
	first := 0
	for first < n && !c[first].on {
		first++
	}
	var from vec.V2
	if first == n { // no point on the curve at all
		first = 0
		from = mid(c[n-1], c[0])
	} else {
		from = c[first].p
		first++
	}
	start := from
	for i := 0; i < n; i++ {
		k, next := c[(first+i)%n], c[(first+i+1)%n]
		if k.on {
			p.Pieces = append(p.Pieces, drawing.Line{A: from, B: k.p})
			from = k.p
			continue
		}
		to := next.p
		if !next.on {
			to = mid(k, next)
		} else {
			i++
		}
		p.Pieces = append(p.Pieces, drawing.Quad{P0: from, P1: k.p, P2: to})
		from = to
	}
	if from != start {
		p.Pieces = append(p.Pieces, drawing.Line{A: from, B: start})
	}
	return p
}
