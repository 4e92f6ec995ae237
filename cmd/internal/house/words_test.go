package house

import (
	"regexp"
	"testing"
)

// strange are words that have no business in the house: places on somebody's
// machine, and talk about how the house was built. They are put together here so
// that this file does not hold them itself.
var strange = []string{
	`/wo` + `rk/`, `/ro` + `ot/`, `/ho` + `me/`, `C:\\Us` + `ers`,
	`proxy\.gol` + `ang\.org`, `local` + `host`,
	`this ses` + `sion`, `iss` + `ue \d`, `\bhel` + `per\b`, `\bvid` + `eo`, `\bTO` + `DO\b`, `\bFIX` + `ME\b`,
}

func TestNoStrangeWords(t *testing.T) {
	texts, err := Texts(top(t))
	if err != nil {
		t.Fatal(err)
	}
	for _, word := range strange {
		pattern := regexp.MustCompile(word)
		for path, text := range texts {
			if at := pattern.FindIndex(text); at != nil && path != "go.sum" {
				t.Errorf("%s: %q", path, text[max(0, at[0]-30):min(len(text), at[1]+30)])
			}
		}
	}
}
