package syntax

import (
	"strings"
	"testing"

	"epure/lang/diag"
	"epure/lang/source"
)

// hood is the file that the manual begins with.
const hood = `# Rain hood for a round vent: a right cone cut by a plane parallel to its
# left-hand generator, so that the cut edge is a parabola.

given foot  = 240 mm "diameter at the foot"
given rise  = 260 mm "height to the apex" tolerance 2 mm
given inset = 85 mm  "where the cut meets the ground, in from the right" from 10 mm to 200 mm

K = cone diameter foot height rise
P = plane through (foot/2 - inset, 0, 0) along K.generator(180°), rearward
B = part of K above P
S = section of K by P
D = development of B seam 180° divisions 12 up outside

verify S.eccentricity = 1
verify D.width <= 1000 mm "must come out of a 1000 mm strip"

hood = sheet "Rain hood" size A3 scale auto projection first {
    front = elevation of B faint K
    top   = plan of B from front
    cut   = true_shape of S from front show focus, axis, directrix
    flat  = pattern of D show generators, numbers
    table of D
    dimension of K.height on front
    dimension of K.base.diameter on top
    note "Pattern seen from outside. Slant {K.slant nearest 0.1 mm}."
}
`

func BenchmarkParse(b *testing.B) {
	text := []byte(strings.Repeat(hood, (1<<20)/len(hood)+1))
	f := source.New("big.epure", text)
	b.SetBytes(int64(len(text)))
	b.ReportAllocs()
	for b.Loop() {
		var bag diag.Bag
		Parse(f, &bag)
		if bag.Len() > 0 {
			b.Fatal(wording(bag.Sorted()))
		}
	}
}

func BenchmarkLex(b *testing.B) {
	text := strings.Repeat(hood, (1<<20)/len(hood)+1)
	r := &reporter{file: source.New("big.epure", []byte(text)), src: text}
	b.SetBytes(int64(len(text)))
	for b.Loop() {
		lex(r, 0, len(text))
	}
}

func BenchmarkGrammar(b *testing.B) {
	for b.Loop() {
		newGrammar()
	}
}
