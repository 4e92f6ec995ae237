// Package flat unrolls the curved face of a part of a cone or cylinder to the
// plane: outline, stations on generators, measures, and the proof that what
// was unrolled folds back.
//
// # Why this way
//
// The face is never sampled. In the natural coordinates (phi, u) of the
// surface, phi the angle about the axis from the seam and u the place on the
// generator, every plane meets a generator once, so that each edge of the face
// is a profile u(phi) with three coefficients, or a piece of a generator. The
// angles at which edges begin and end cut the turn into panels; in a panel the
// profiles have a fixed order, and the material lies between the first and the
// second, the third and the fourth (on a cone with the apex before the first
// when their number is odd). Outline, stations, measures and bounds are read
// from the panels in closed form or by roots that are bracketed for certain.
//
// # The flat plane
//
// A cone has its apex at (0, 0) and the seam along +x; the distance from the
// apex is u and the angle at the apex is phi times the sine of the half angle.
// A cylinder has x = radius times phi and y = u, the height along the
// surface's F.Z over its F.O. Patterns are seen from outside: on a cylinder
// with F.Z up phi grows to the right; on a cone with the apex up it grows
// anticlockwise, on one with the apex down clockwise. With the inside up the
// pattern is the exact mirror: y turns its sign on a cone, x on a cylinder.
package flat

import (
	"fmt"
	"math"

	"epure/geom/body"
	"epure/geom/num"
	"epure/geom/vec"
)

// Options says how a face is to be unrolled.
type Options struct {
	Seam      float64 // angle of the seam generator in the surface's frame, radians
	Divisions int     // even divisions of the whole turn, >= 3
	Inside    bool    // the inside is up: the exact mirror
}

// MinDivisions is the least number of even divisions of a turn: two would be
// one flat plate, laid double.
const MinDivisions = 3

// Pattern is the development of one curved face. It is immutable.
type Pattern struct {
	Loops    [][]Piece // closed outlines, anticlockwise as drawn
	Stations []Station // in the order of the angle from the seam
	body     *body.Body
	face     int
	roll     roll
	rims     []rim
	walls    []wall
	panels   []panel
	opts     Options
	size     float64 // of the body, mm
	join     float64 // share of the size, and angle, within which ends are one corner
}

// FaceError says why a face cannot be unrolled.
type FaceError struct {
	Face   string // label of the face, or its index when there is none
	Reason string
}

// Error names the face and the reason.
func (e *FaceError) Error() string { return e.Face + " cannot be unrolled: " + e.Reason }

// DivisionsError is a number of divisions under MinDivisions.
type DivisionsError struct{ Divisions int }

// Error gives the number and the least one.
func (e *DivisionsError) Error() string {
	return fmt.Sprintf("%d divisions; there must be at least %d", e.Divisions, MinDivisions)
}

// Of unrolls the curved face i of b. It fails with *DivisionsError, or with
// *FaceError when the face is no cone or cylinder, nothing of it is left, it is
// bounded by something else than planes, or its edges do not enclose it.
func Of(b *body.Body, i int, o Options) (*Pattern, error) {
	if o.Divisions < MinDivisions {
		return nil, &DivisionsError{o.Divisions}
	}
	if i < 0 || i >= len(b.Faces) {
		return nil, &FaceError{fmt.Sprintf("face %d", i), "the part has no such face"}
	}
	r, ok := newRoll(b.Faces[i].Surface, o)
	if !ok {
		return nil, &FaceError{b.Faces[i].Label, "it is neither a cone nor a cylinder"}
	}
	var p *Pattern
	var err error
	for _, join := range []float64{finest, num.Join} {
		p = &Pattern{body: b, face: i, roll: r, opts: o, size: b.Size(), join: join}
		if err = p.unroll(); err == nil {
			p.Stations = p.stations()
			return p, nil
		}
	}
	return nil, err
}

// unroll finds edges, panels and outline.
func (p *Pattern) unroll() (err error) {
	if err = p.gather(p.body.Edges()); err != nil {
		return err
	}
	if err = p.divide(); err != nil {
		return err
	}
	p.Loops, err = p.outline()
	return err
}

// Count is the number of pieces of material that the pattern falls into: one,
// or more when the seam runs through a part that is cut away elsewhere.
func (p *Pattern) Count() int { return len(p.Loops) }

// Flat returns where the point q of the face lies on the pattern; a point of
// the seam where phi is zero, if there is material. It fails with *OffError
// when q does not lie on the face.
func (p *Pattern) Flat(q vec.V3) (vec.V2, error) {
	phi, u := p.roll.coords(q)
	off := q.Dist(p.roll.space(phi, u))
	if off > onFace*p.size {
		return vec.V2{}, &OffError{Distance: off}
	}
	if p.roll.cone && u <= onFace*p.size {
		return p.apexFlat(u)
	}
	where, miss := p.nearest(snap(phi, sameAngle), u)
	if miss > onFace*p.size {
		return vec.V2{}, &OffError{Distance: miss, OnSurface: true}
	}
	return p.roll.flat(where, u), nil
}

// nearest is the angle in the material next to (phi, u), and the distance on
// the surface from there to the material, mm; +Inf where there is none.
func (p *Pattern) nearest(phi, u float64) (where, miss float64) {
	miss = math.Inf(1)
	for _, q := range p.panels {
		for _, at := range []float64{phi, phi + turn, phi - turn} {
			in := min(max(at, q.a), q.b)
			round := p.roll.radius(u) * math.Abs(at-in)
			for _, b := range q.spans {
				up := max(0, p.u(b.lo, in)-u, u-p.u(b.hi, in))
				if d := math.Hypot(round, up); d < miss {
					where, miss = in, d
				}
			}
		}
	}
	return where, miss
}

// apexFlat is Flat for a cone's apex, through which all generators go.
func (p *Pattern) apexFlat(u float64) (vec.V2, error) {
	inner, _ := p.InnerRadius()
	if inner-u > onFace*p.size {
		return vec.V2{}, &OffError{Distance: inner - u, OnSurface: true}
	}
	return vec.V2{}, nil
}

// onFace is how far off the face, as a share of the body's size, a point may
// lie that counts as on it: 1e-9 is what `verify` allows two equal lengths to
// differ by, a thousand times the rounding of a point that was worked out from
// a section.
const onFace = 1e-9

// OffError says that a point does not lie on the face.
type OffError struct {
	// Distance is how far it is from the surface, mm; or, when it lies on the
	// surface but beyond the edges, how far from the face, measured round the
	// axis and along the generator.
	Distance  float64
	OnSurface bool
}

// Error gives the distance.
func (e *OffError) Error() string {
	if e.OnSurface {
		return fmt.Sprintf("the point lies %.6g mm beyond the edge of the face", e.Distance)
	}
	return fmt.Sprintf("the point lies %.6g mm off the face", e.Distance)
}

// Fold returns the point of space at which the point q of the pattern comes to
// lie when it is rolled up. It is the inverse of the isometry and knows nothing
// of the outline.
func (p *Pattern) Fold(q vec.V2) vec.V3 { return p.roll.space(p.roll.unflat(q)) }
