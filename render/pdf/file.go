package pdf

import (
	"bytes"
	"compress/zlib"
	"crypto/sha256"
	"encoding/hex"
	"fmt"
	"strconv"
	"strings"
	"unicode/utf16"

	"epure/render/drawing"
	"epure/render/font"
)

// file gathers the objects of a document.
type file struct{ objects [][]byte }

// add writes an object and returns its reference.
func (f *file) add(body string) string {
	f.objects = append(f.objects, []byte(body))
	return fmt.Sprintf("%d 0 R", len(f.objects))
}

// reserve returns the reference of an object to be set later.
func (f *file) reserve() string { return f.add("") }

// set writes a reserved object.
func (f *file) set(ref, body string) {
	n, _ := strconv.Atoi(strings.TrimSuffix(ref, " 0 R"))
	f.objects[n-1] = []byte(body)
}

// stream writes a compressed stream with more entries for its dictionary.
func (f *file) stream(entries string, data []byte) string {
	var b bytes.Buffer
	z := zlib.NewWriter(&b)
	z.Write(data) // writing to a buffer does not fail
	z.Close()
	head := fmt.Sprintf("<</Length %d/Filter/FlateDecode%s>>\nstream\n", b.Len(), entries)
	return f.add(head + b.String() + "\nendstream")
}

// bytes puts the document together: objects, table of their places, trailer. Its
// identifier is a hash of the objects, so that it needs neither clock nor chance.
func (f *file) bytes(catalog, info string) []byte {
	var b bytes.Buffer
	b.WriteString("%PDF-1.7\n%\xe2\xe3\xcf\xd3\n")
	places := make([]int, len(f.objects))
	for i, o := range f.objects {
		places[i] = b.Len()
		fmt.Fprintf(&b, "%d 0 obj\n%s\nendobj\n", i+1, o)
	}
	sum := sha256.Sum256(b.Bytes())
	id := hex.EncodeToString(sum[:16])
	xref := b.Len()
	fmt.Fprintf(&b, "xref\n0 %d\n0000000000 65535 f \n", len(places)+1)
	for _, p := range places {
		fmt.Fprintf(&b, "%010d 00000 n \n", p)
	}
	fmt.Fprintf(&b, "trailer\n<</Size %d/Root %s/Info %s/ID[<%s><%s>]>>\nstartxref\n%d\n%%%%EOF\n",
		len(places)+1, catalog, info, id, id, xref)
	return b.Bytes()
}

// text writes a text string: UTF-16 with a byte order mark, in hexadecimal.
func text(s string) string {
	var b strings.Builder
	b.WriteString("<FEFF")
	for _, u := range utf16.Encode([]rune(font.Clean(s))) {
		fmt.Fprintf(&b, "%04X", u)
	}
	return b.String() + ">"
}

// num writes a number of points: 35 nanometres are kept.
func num(x float64) string { return drawing.Decimal(x) }
