package spell

import "testing"

func TestNearest(t *testing.T) {
	forms := []string{"cone", "cylinder", "plane", "plan", "section", "sphere", "pattern", "true_shape"}
	tests := []struct{ word, want string }{
		{"conne", "cone"}, {"Cone", "cone"}, {"CYLINDER", "cylinder"}, {"cylnider", "cylinder"},
		{"trueshape", "true_shape"}, {"sectoin", "section"}, {"plam", "plan"}, {"planee", "plane"},
		{"pyramid", ""}, {"x", ""}, {"cone", ""}, {"", ""}, {"zzzz", ""},
	}
	for _, tt := range tests {
		got, ok := Nearest(tt.word, forms)
		if got != tt.want || ok != (tt.want != "") {
			t.Errorf("Nearest(%q) = %q, %v, want %q", tt.word, got, ok, tt.want)
		}
	}
	// "cat" and "cut" are both one letter from "cot": the order given decides.
	if got, _ := Nearest("cot", []string{"cut", "cat"}); got != "cut" {
		t.Errorf("tie: got %q, want the first", got)
	}
}

func TestDistance(t *testing.T) {
	// Counted by hand.
	tests := []struct {
		a, b string
		want int
	}{
		{"", "", 0}, {"", "abc", 3}, {"abc", "", 3}, {"ab", "ba", 1}, {"abcd", "acbd", 1},
		{"kitten", "sitting", 3}, {"längs", "langs", 1}, {"ca", "abc", 3},
	}
	for _, tt := range tests {
		if got := distance([]rune(tt.a), []rune(tt.b)); got != tt.want {
			t.Errorf("distance(%q, %q) = %d, want %d", tt.a, tt.b, got, tt.want)
		}
		if back := distance([]rune(tt.b), []rune(tt.a)); back != tt.want {
			t.Errorf("distance(%q, %q) = %d the other way round", tt.b, tt.a, back)
		}
	}
}
