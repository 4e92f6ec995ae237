package vec

// Motion is a rigid motion of space: P ↦ O + x·X + y·Y + z·Z. X, Y and Z are unit vectors square to
// each other; for a reflection they are left-handed.
type Motion struct{ O, X, Y, Z V3 }

// Still is the motion that moves nothing.
var Still = Motion{V3{}, V3{X: 1}, V3{Y: 1}, V3{Z: 1}}

// Shift moves everything by d.
func Shift(d V3) Motion { m := Still; m.O = d; return m }

// Turn turns everything about the line through o along the unit vector axis, anticlockwise looking against
// it, by the angle with this sine and cosine.
func Turn(o, axis V3, sin, cos float64) Motion {
	turn := func(v V3) V3 { // Rodrigues' formula
		along := axis.Dot(v)
		return v.Scale(cos).Along(axis.Cross(v), sin).Along(axis, along*(1-cos))
	}
	m := Motion{X: turn(V3{X: 1}), Y: turn(V3{Y: 1}), Z: turn(V3{Z: 1})}
	m.O = o.Sub(m.Dir(o))
	return m
}

// Mirror reflects everything in the plane through o with the unit normal n.
func Mirror(o, n V3) Motion {
	back := func(v V3) V3 { return v.Along(n, -2*n.Dot(v)) }
	m := Motion{X: back(V3{X: 1}), Y: back(V3{Y: 1}), Z: back(V3{Z: 1})}
	m.O = n.Scale(2 * n.Dot(o))
	return m
}

// Dir returns where the motion takes the vector d.
func (m Motion) Dir(d V3) V3 { return m.X.Scale(d.X).Along(m.Y, d.Y).Along(m.Z, d.Z) }

// Point returns where the motion takes the point p.
func (m Motion) Point(p V3) V3 { return m.O.Add(m.Dir(p)) }

// Then returns the motion m followed by n.
func (m Motion) Then(n Motion) Motion {
	return Motion{n.Point(m.O), n.Dir(m.X), n.Dir(m.Y), n.Dir(m.Z)}
}

// Reflects tells whether the motion turns right hands into left hands.
func (m Motion) Reflects() bool { return m.X.Cross(m.Y).Dot(m.Z) < 0 }

// Frame returns where the motion takes a frame; a reflection turns its Y back so that it stays right-handed.
func (m Motion) Frame(f Frame) Frame {
	g := Frame{m.Point(f.O), m.Dir(f.X).Unit(), m.Dir(f.Y).Unit(), m.Dir(f.Z).Unit()}
	if m.Reflects() {
		g.Y = g.Y.Neg()
	}
	return g
}
