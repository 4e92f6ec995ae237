package drawing

import "math"

// Dash patterns. The elements are those of ISO 128-2 in multiples of the line
// width d: dash 12, long dash 24, gap 3, dot 0.5. A pattern is fitted to the
// length of its line by the method of ISO 128-21: the gaps and dots keep their
// size, the dashes are stretched or shrunk so that the line starts and ends on
// a full dash. (Both standards from memory, as the reference notes say.)

// elements returns, in line widths, the dash of a line type and the pieces that
// follow it up to the next dash, starting and ending with a gap.
func (t LineType) elements() (dash float64, rest []float64) {
	switch t {
	case Dashed:
		return 12, []float64{3}
	case LongDashDot:
		return 24, []float64{3, 0.5, 3}
	case LongDashTwoDot:
		return 24, []float64{3, 0.5, 3, 0.5, 3}
	}
	return 0, nil
}

// countSlack is taken off a number of repeats before it is rounded up, so that
// a line made to hold a whole number of repeats does hold it. A millionth of a
// repeat is under 1e-5 mm of dash, far more than rounding can add to a length.
const countSlack = 1e-6

// Dashes returns the dash array (dash, gap, …; mm) that fits a line of the given
// type and width to the given length (mm), or nil when the line is to be drawn
// continuous: for continuous types, and for lines too short to hold two dashes
// of full size. The array repeats; the line starts and ends on a full dash.
func Dashes(t LineType, width, length float64) []float64 {
	dash, rest := t.elements()
	if rest == nil || width <= 0 {
		return nil
	}
	between := sum(rest) * width
	n := math.Ceil((length-dash*width)/(dash*width+between) - countSlack)
	if !(length >= (2*dash*width+between)*(1-countSlack)) || n < 1 || math.IsInf(n, 1) {
		return nil
	}
	return pattern((length-n*between)/(n+1), rest, width)
}

// DashesClosed is Dashes for a closed line of the given length round: a whole
// number of repeats, so that it joins itself without a seam.
func DashesClosed(t LineType, width, length float64) []float64 {
	dash, rest := t.elements()
	if rest == nil || width <= 0 {
		return nil
	}
	between := sum(rest) * width
	n := math.Ceil(length/(dash*width+between) - countSlack)
	if !(n >= 2) || math.IsInf(n, 1) {
		return nil
	}
	return pattern(length/n-between, rest, width)
}

// DashesFor returns the dash array with which the pen draws the shape, or nil
// for a continuous line. Every writer takes its dashes from here.
func DashesFor(p Pen, s Shape) []float64 {
	if _, rest := p.Type.elements(); rest == nil {
		return nil
	}
	if Closed(s) {
		return DashesClosed(p.Type, p.Width, Length(s))
	}
	return Dashes(p.Type, p.Width, Length(s))
}

// Closed reports whether the shape ends where it starts by construction: a full
// turn of an ellipse, or a closed path.
func Closed(s Shape) bool {
	switch s := s.(type) {
	case EllipseArc:
		return s.Full()
	case Path:
		return s.Closed
	}
	return false
}

// turnSlack is how far, in radians, an arc may fall short of 2π and still be a
// full turn: some units in the last place of 2π times the handful of additions
// that made From and To.
const turnSlack = 1e-13

// Full reports whether the arc is a full turn.
func (e EllipseArc) Full() bool { return math.Abs(e.To-e.From) >= 2*math.Pi-turnSlack }

func pattern(dash float64, rest []float64, width float64) []float64 {
	a := []float64{dash}
	for _, r := range rest {
		a = append(a, r*width)
	}
	return a
}

func sum(a []float64) float64 {
	s := 0.0
	for _, x := range a {
		s += x
	}
	return s
}
