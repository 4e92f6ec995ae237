package source

import "testing"

func TestPosition(t *testing.T) {
	f := New("a.epure", []byte(BOM+"äb\r\n\tc\rd\n\n日本"))
	tests := []struct {
		at           string
		line, column int
	}{
		{"ä", 1, 1}, {"b", 1, 2}, {"c", 2, 2}, {"d", 3, 1}, {"日", 5, 1}, {"本", 5, 2},
	}
	for _, tt := range tests {
		offset := index(t, f, tt.at)
		if line, column := f.Position(offset); line != tt.line || column != tt.column {
			t.Errorf("%q: got %d:%d, want %d:%d", tt.at, line, column, tt.line, tt.column)
		}
	}
	if f.Lines() != 5 {
		t.Errorf("lines = %d, want 5", f.Lines())
	}
	for line, want := range []string{"äb", "\tc", "d", "", "日本"} {
		if got := f.Line(line + 1); got != want {
			t.Errorf("line %d = %q, want %q", line+1, got, want)
		}
	}
	if line, column := f.Position(1 << 30); line != 5 || column != 3 {
		t.Errorf("past the end: %d:%d", line, column)
	}
}

func index(t *testing.T, f *File, s string) int {
	t.Helper()
	for i := range f.Text {
		if i+len(s) <= len(f.Text) && string(f.Text[i:i+len(s)]) == s {
			return i
		}
	}
	t.Fatalf("%q not found", s)
	return 0
}

func TestSpan(t *testing.T) {
	f := New("a.epure", []byte("K = cone"))
	k, cone := f.Span(0, 1), f.Span(4, 8)
	if got := k.To(cone).Text(); got != "K = cone" {
		t.Errorf("joined = %q", got)
	}
	if got := (Span{}).To(cone); got != cone {
		t.Errorf("no place joined = %v", got)
	}
	if !k.To(cone).Contains(cone) || k.Contains(cone) {
		t.Error("Contains is wrong")
	}
	if line, column := (Span{}).Position(); line != 0 || column != 0 || !(Span{}).IsZero() {
		t.Error("the zero span has a place")
	}
	if got := Quote("a\x00b"); got != "`a·b`" {
		t.Errorf("quoted = %s", got)
	}
}
