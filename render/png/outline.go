package png

import (
	"math"

	"epure/geom/vec"
	"epure/render/drawing"
)

// Lines as polygons, in pixels.

// flatness is the largest distance in pixels of a polygon from its curve: too
// little to change a grey by more than a twentieth.
const flatness = 0.05

// flatten turns lines and cubics into the points of a polygon in pixels, without
// repeats. A cubic in n even steps is off by at most 3/4·d/n², d being the larger
// second difference of its points.
func (c *canvas) flatten(strokes []drawing.Stroke) []vec.V2 {
	var out []vec.V2
	add := func(p vec.V2) {
		if q := c.pixel(p); len(out) == 0 || out[len(out)-1] != q {
			out = append(out, q)
		}
	}
	for i, s := range strokes {
		if i == 0 {
			add(s.C[0])
		}
		n := 1
		if !s.Straight {
			d := max(bend(s.C[0], s.C[1], s.C[2]), bend(s.C[1], s.C[2], s.C[3])) * c.scale
			n = int(math.Min(mostSteps, math.Ceil(math.Sqrt(0.75*d/flatness)+1e-9)))
		}
		for j := 1; j < n; j++ {
			add(s.C.At(float64(j) / float64(n)))
		}
		add(s.C[3])
	}
	return out
}

// mostSteps bounds one cubic; a million pixels across need fewer.
const mostSteps = 4096

func bend(a, b, c vec.V2) float64 { return a.Add(c).Along(b, -2).Len() }

// outline returns the polygons round a line: one for an open line, two that turn
// opposite ways for a closed one.
func outline(line []vec.V2, half float64, closed, round bool) [][]vec.V2 {
	if closed && len(line) > 1 && line[0] == line[len(line)-1] {
		line = line[:len(line)-1]
	}
	switch {
	case len(line) == 0:
		return nil
	case len(line) == 1 && round:
		return [][]vec.V2{arc(nil, line[0], half, 0, 2*math.Pi)}
	case len(line) == 1:
		return nil
	case closed && len(line) > 2:
		return [][]vec.V2{side(nil, line, half, true), side(nil, reversed(line), half, true)}
	}
	back := reversed(line)
	out := side(nil, line, half, false)
	out = end(out, line, half, round)
	out = side(out, back, half, false)
	return [][]vec.V2{end(out, back, half, round)}
}

// side adds the line's left offset: at a corner to the right an arc, at one to the
// left the corner itself, which keeps the overlap turning the same way.
func side(out, line []vec.V2, half float64, closed bool) []vec.V2 {
	n := len(line)
	last := n - 1
	if closed {
		last = n
	}
	for i := range last {
		a, b := line[i], line[(i+1)%n]
		d := b.Sub(a).Unit()
		off := d.Left().Scale(half)
		out = append(out, a.Add(off), b.Add(off))
		if i+1 == last && !closed {
			break
		}
		e := line[(i+2)%n].Sub(b).Unit()
		turn := math.Atan2(d.Cross(e), d.Dot(e))
		switch from := math.Atan2(off.Y, off.X); {
		case turn < -smooth:
			out = arc(out, b, half, from, from+turn)
		case turn > smooth:
			out = append(out, b)
		}
	}
	return out
}

// smooth is the turn, radians, under which two pieces count as one curve.
const smooth = 0.2

// end adds the line's end: half a disc, or nothing for a butt end.
func end(out, line []vec.V2, half float64, round bool) []vec.V2 {
	if !round {
		return out
	}
	n := len(line)
	off := line[n-1].Sub(line[n-2]).Left()
	from := math.Atan2(off.Y, off.X)
	return arc(out, line[n-1], half, from, from-math.Pi)
}

// arc adds points of a circle.
func arc(out []vec.V2, c vec.V2, r, from, to float64) []vec.V2 {
	n := max(2, int(math.Ceil(math.Abs(to-from)*math.Sqrt(r/(8*flatness)))))
	for i := range n + 1 {
		out = append(out, c.Along(drawing.Dir(from+(to-from)*float64(i)/float64(n)), r))
	}
	return out
}

func reversed(line []vec.V2) []vec.V2 {
	out := make([]vec.V2, 0, len(line))
	for i := len(line) - 1; i >= 0; i-- {
		out = append(out, line[i])
	}
	return out
}

// cut returns the dashes of a line: the even members of the pattern.
func cut(line []vec.V2, pattern []float64) [][]vec.V2 {
	var out [][]vec.V2
	i, left := 0, pattern[0]
	var now []vec.V2
	if len(line) > 0 {
		now = []vec.V2{line[0]}
	}
	for k := 1; k < len(line); k++ {
		a, b := line[k-1], line[k]
		length := a.Dist(b)
		d := b.Sub(a).Unit()
		for at := 0.0; ; {
			if length-at < left {
				left -= length - at
				if i%2 == 0 {
					now = append(now, b)
				}
				break
			}
			at += left
			p := a.Along(d, at)
			if i%2 == 0 {
				out = append(out, append(now, p))
			}
			now = []vec.V2{p}
			i = (i + 1) % len(pattern)
			left = pattern[i]
		}
	}
	if i%2 == 0 && len(now) > 1 {
		out = append(out, now)
	}
	return out
}
