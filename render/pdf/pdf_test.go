package pdf

import (
	"bytes"
	"errors"
	"fmt"
	"math"
	"os"
	"regexp"
	"strconv"
	"strings"
	"testing"
	"unicode/utf16"

	"epure/geom/vec"
	"epure/render/drawing"
)

func at(x, y float64) vec.V2 { return vec.V2{X: x, Y: y} }

func sample() drawing.Sheet {
	g := drawing.Group05()
	return drawing.Sheet{
		Name: "hood", Title: "Hood ⌀ é (1)", Desc: "A cone that is cut.", Width: 420, Height: 297, Date: "2024-02-29", Creator: "N. N.",
		Marks: []drawing.Mark{
			{Role: drawing.VisibleEdge, Pen: g.Visible(), Shape: drawing.Line{A: at(20, 50), B: at(120, 50)}},
			{Role: drawing.HiddenEdge, Pen: g.Hidden(), Shape: drawing.EllipseArc{C: at(200, 200), RX: 60, RY: 30, Rot: 0.4, To: 2 * math.Pi}},
			{Role: drawing.CentreLine, Pen: g.Centre(), Shape: drawing.Line{A: at(130, 200), B: at(270, 200)}},
			{Role: drawing.VisibleEdge, Pen: g.Visible(), Shape: drawing.Quad{P0: at(120, 100), P1: at(150, 180), P2: at(180, 100)}},
			{Role: drawing.Furniture, Pen: g.Symbol(), Fill: drawing.Fill{On: true, Grey: 0.9}, Shape: drawing.BoxAt(at(300, 20), 60, 30).Outline()},
			drawing.ArrowMark(drawing.Key{}, at(120, 60), at(1, 0), 3.5),
			{Role: drawing.Lettering, Shape: drawing.Text{At: at(30, 20), Height: 5, String: "fine ⌀ 35.5° ± 0.2 Åé 漢"}},
			{Role: drawing.Lettering, Shape: drawing.Text{At: at(400, 100), Height: 3.5, Anchor: drawing.Middle, Angle: math.Pi / 2, Bold: true, String: "upright"}},
		},
	}
}

func write(t *testing.T, s drawing.Sheet) []byte {
	t.Helper()
	data, err := Write(s)
	if err != nil {
		t.Fatal(err)
	}
	return data
}

func content(t *testing.T, data []byte) string {
	t.Helper()
	objects := read(t, data)
	for _, o := range objects {
		if m := regexp.MustCompile(`/Contents (\d+) 0 R`).FindStringSubmatch(o); m != nil {
			return objects[m[1]]
		}
	}
	t.Fatal("no page")
	return ""
}

func TestSameBytesEveryRun(t *testing.T) {
	data := write(t, sample())
	if !bytes.Equal(data, write(t, sample())) {
		t.Error("two runs differ")
	}
	if p := os.Getenv("EPURE_LOOK"); p != "" {
		if err := os.WriteFile(p, data, 0o644); err != nil {
			t.Fatal(err)
		}
	}
	if !bytes.Contains(data, []byte("/PrintScaling/None")) {
		t.Error("printing may scale the page")
	}
	// A3: 420 and 297 times 72/25.4
	if !bytes.Contains(data, []byte("/MediaBox [0 0 1190.5512 841.8898]")) {
		t.Error("the page is not A3")
	}
}

var lineRE = regexp.MustCompile(`(?m)^(\S+) (\S+) m\n(\S+) (\S+) l\nS$`)

func TestHundredMillimetresAre2834646Points(t *testing.T) {
	m := lineRE.FindStringSubmatch(content(t, write(t, sample())))
	if m == nil {
		t.Fatal("no line in the content")
	}
	var v [4]float64
	for i := range v {
		v[i], _ = strconv.ParseFloat(m[i+1], 64)
	}
	// 100 · 72 / 25.4; the two ends are rounded to 1e-4 point each
	if l := math.Hypot(v[2]-v[0], v[3]-v[1]); math.Abs(l-283.4646) > 1e-4 {
		t.Errorf("100 mm are %v points", l)
	}
}

// shown decodes the text operators of a page through the fonts' ToUnicode maps.
func shown(t *testing.T, data []byte) []string {
	t.Helper()
	objects := read(t, data)
	var out []string
	for _, m := range regexp.MustCompile(`BT /(F\d) .*<([0-9A-F]*)> Tj ET`).FindAllStringSubmatch(content(t, data), -1) {
		out = append(out, decode(m[2], toRunes(objects, m[1])))
	}
	return out
}

// toRunes follows a font of the page to its map.
func toRunes(objects map[string]string, name string) map[string]string {
	out := map[string]string{}
	for _, o := range objects {
		f := regexp.MustCompile(`/Font<<.*/` + name + ` (\d+) 0 R`).FindStringSubmatch(o)
		if f == nil {
			continue
		}
		u := regexp.MustCompile(`/ToUnicode (\d+) 0 R`).FindStringSubmatch(objects[f[1]])
		for _, m := range regexp.MustCompile(`<([0-9A-F]{4})> <([0-9A-F]+)>\n`).FindAllStringSubmatch(objects[u[1]], -1) {
			var units []uint16
			for h := m[2]; h != ""; h = h[4:] {
				v, _ := strconv.ParseUint(h[:4], 16, 16)
				units = append(units, uint16(v))
			}
			out[m[1]] = string(utf16.Decode(units))
		}
	}
	return out
}

func decode(hex string, runes map[string]string) string {
	var b strings.Builder
	for ; hex != ""; hex = hex[4:] {
		b.WriteString(runes[hex[:4]])
	}
	return b.String()
}

func TestTextIsFoundAsWritten(t *testing.T) {
	s := sample()
	long := ""
	for r := rune(0x21); r < 0x180; r++ { // more characters than one section of the map holds
		if r < 0x7f || r > 0xa0 && r != 0xad {
			long += string(r)
		}
	}
	s.Marks = append(s.Marks, drawing.Mark{Shape: drawing.Text{At: at(1, 1), Height: 1, String: long + "𝔄"}})
	got := shown(t, write(t, s))
	want := []string{"fine ⌀ 35.5° ± 0.2 Åé 漢", "upright", long + "𝔄"}
	if fmt.Sprint(got) != fmt.Sprint(want) {
		t.Errorf("got %q\nwant %q", got, want)
	}
}

// TestEllipseStaysOnItsCurve reads the curves back and puts points of them into
// the ellipse's equation.
func TestEllipseStaysOnItsCurve(t *testing.T) {
	e := drawing.EllipseArc{C: at(200, 150), RX: 180, RY: 70, Rot: 0.4, To: 2 * math.Pi}
	s := drawing.Sheet{Width: 420, Height: 297, Marks: []drawing.Mark{{Pen: drawing.Group05().Visible(), Shape: e}}}
	c := content(t, write(t, s))
	var from vec.V2
	n := 0
	for _, line := range strings.Split(c, "\n") {
		var v [6]float64
		if k, _ := fmt.Sscanf(line, "%f %f m", &v[0], &v[1]); k == 2 && strings.HasSuffix(line, "m") {
			from = at(v[0], v[1])
		}
		if k, _ := fmt.Sscanf(line, "%f %f %f %f %f %f c", &v[0], &v[1], &v[2], &v[3], &v[4], &v[5]); k != 6 {
			continue
		}
		b := drawing.Cubic{from, at(v[0], v[1]), at(v[2], v[3]), at(v[4], v[5])}
		for i := range 10 {
			p := b.At(float64(i) / 9).Scale(1 / PointsPerMM).Sub(e.C)
			sin, cos := math.Sincos(-e.Rot)
			x, y := (p.X*cos-p.Y*sin)/e.RX, (p.X*sin+p.Y*cos)/e.RY
			// rounding to 1e-4 point (3.5e-5 mm) over the short axis, 70 mm
			if off := math.Abs(math.Hypot(x, y) - 1); off > 1e-6 {
				t.Errorf("off by %v of the radius", off)
			}
		}
		from = b[3]
		n++
	}
	if n != 16 {
		t.Errorf("%d curves, want 16 of 22.5°", n)
	}
}

func TestOddSheetsStayValid(t *testing.T) {
	bad := "(\\)<\x00>%\n" + strings.Repeat("x", 3000)
	for _, s := range []drawing.Sheet{
		{Width: 210, Height: 297},
		{Width: 210, Height: 297, Title: bad, Desc: bad, Creator: bad, Date: "2031-13-01",
			Marks: []drawing.Mark{{Shape: drawing.Text{Height: 3, String: bad}}, {Shape: drawing.Path{}}, {Shape: drawing.Text{}}}},
	} {
		data := write(t, s)
		read(t, data)
		if bytes.Contains(data, []byte("/CreationDate")) {
			t.Error("a date out of nothing")
		}
	}
}

func TestNotFiniteIsAnError(t *testing.T) {
	_, err := Write(drawing.Sheet{Marks: []drawing.Mark{{Shape: drawing.Line{B: at(math.NaN(), 0)}}}})
	if !errors.Is(err, drawing.ErrNotFinite) {
		t.Errorf("error %v", err)
	}
}

func BenchmarkWrite(b *testing.B) {
	s := sample()
	for range b.N {
		if _, err := Write(s); err != nil {
			b.Fatal(err)
		}
	}
}
