package quantity

import "testing"

func TestScan(t *testing.T) {
	tests := []struct {
		text  string
		n     int
		value string // Format, then ~ when not exact
	}{
		{"12", 2, "12"},
		{"1.2e3", 5, "1200"},
		{"1.5e-3 x", 6, "0.0015"},
		{"60 mm", 5, "60 mm"},
		{"60mm", 4, "60 mm"},
		{"2.5 cm", 6, "25 mm"},
		{"3m", 2, "3000 mm"},
		{"1 3/8 in", 8, "34.925 mm"},
		{"3/8 in", 6, "9.525 mm"},
		{"9 3/16in,", 8, "233.3625 mm"},
		{"1/2 ft", 6, "152.4 mm"},
		{"5 ft 3 1/2 in", 13, "1612.9 mm"},
		{"5 ft 3/4 in", 11, "1543.05 mm"},
		{"5ft3in", 6, "1600.2 mm"},
		{"5 ft 3.5 in", 11, "1612.9 mm"},
		{"5 ft", 4, "1524 mm"},
		{"5 ft - 3 in", 4, "1524 mm"},
		{"5 ft from", 4, "1524 mm"},
		{"35.5°", 6, "35.5°"},
		{"35 °", 5, "35°"},
		{"35°30′15″", 14, "35.50416667°"},
		{"35°30'", 7, "35.5°"},
		{"35° 30′", 10, "35.5°"},
		{"35°30.5′", 11, "35.50833333°"},
		{"35 deg", 6, "35°"},
		{"1 rad", 5, "57.29577951°~"},
		{"0 rad", 5, "0°"},
		{"20 %", 4, "20 %"},
		{"1:2", 3, "50 %"},
		{"1:2.5", 5, "40 %"},
		{"0", 1, "0"},
		{"50/3", 2, "50"},
		{"50/x", 2, "50"},
		{"50 / 3 mm", 2, "50"},
		{"6 first 30°", 1, "6"},
		{"12 M 30 mm", 2, "12"},
		{"250 mm²", 8, "250 mm²"},
		{"2 m²", 5, "2000000 mm²"},
		{"1 cm³", 6, "1000 mm³"},
		{"2 mm 3 mm", 4, "2 mm"},
	}
	for _, tt := range tests {
		lit, n, err := Scan(tt.text)
		got := Format(lit.Value)
		if !lit.Value.Exact() {
			got += "~"
		}
		if err != nil || n != tt.n || got != tt.value {
			t.Errorf("Scan(%q) = %s, %d, %v; want %s, %d", tt.text, got, n, err, tt.value, tt.n)
		}
	}
}
