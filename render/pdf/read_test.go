package pdf

import (
	"bytes"
	"compress/zlib"
	"io"
	"regexp"
	"strconv"
	"strings"
	"testing"
)

// read walks a document the way a viewer does: from its end to the table of
// places, from there to every object. It returns the objects by number, streams
// inflated, and fails where the table, a length or a number is wrong.
func read(t *testing.T, data []byte) map[string]string {
	t.Helper()
	m := regexp.MustCompile(`startxref\n(\d+)\n%%EOF\n$`).FindSubmatch(data)
	if m == nil {
		t.Fatal("no end of file")
	}
	at, _ := strconv.Atoi(string(m[1]))
	lines := strings.SplitAfter(string(data[at:]), "\n")
	count, err := strconv.Atoi(strings.TrimSpace(strings.TrimPrefix(lines[1], "0 ")))
	if lines[0] != "xref\n" || err != nil {
		t.Fatalf("no table of places at %d", at)
	}
	out := map[string]string{}
	for n := 1; n < count; n++ {
		place, err := strconv.Atoi(lines[2+n][:10])
		if err != nil || len(lines[2+n]) != 20 {
			t.Fatalf("place of object %d: %q", n, lines[2+n])
		}
		name := strconv.Itoa(n)
		body, ok := bytes.CutPrefix(data[place:], []byte(name+" 0 obj\n"))
		if !ok {
			t.Fatalf("object %d is not at its place", n)
		}
		out[name] = object(t, body)
	}
	return out
}

var lengthRE = regexp.MustCompile(`^<</Length (\d+)/Filter/FlateDecode.*>>\nstream\n`)

// object returns the text of an object, or the inflated data of a stream.
func object(t *testing.T, body []byte) string {
	t.Helper()
	m := lengthRE.FindSubmatch(body)
	if m == nil {
		end := bytes.Index(body, []byte("\nendobj\n"))
		return string(body[:end])
	}
	n, _ := strconv.Atoi(string(m[1]))
	data := body[len(m[0]):]
	if !bytes.HasPrefix(data[n:], []byte("\nendstream\nendobj\n")) {
		t.Fatal("a stream is not as long as it says")
	}
	z, err := zlib.NewReader(bytes.NewReader(data[:n]))
	if err != nil {
		t.Fatal(err)
	}
	b, err := io.ReadAll(z)
	if err != nil {
		t.Fatal(err)
	}
	return string(b)
}
