package body

import (
	"epure/geom/num"
	"epure/geom/surface"
	"epure/geom/vec"
)

// FaceArea is the area of face i, mm²: closed forms round its edges. A plane face
// is measured by Green's theorem about the foot of the body's middle.
//
// On a cone the line from the apex to an edge sweeps over the face itself, along
// its generators, and the vector of that area has the constant share sin(half angle) along the axis;
// on a cylinder the area under an edge is the integral of its height over the girth.
func (b *Body) FaceArea(i int) float64 {
	if s, ok := b.Faces[i].Surface.(surface.Sphere); ok {
		return b.sphereArea(s, i)
	}
	sum := 0.0
	for _, loop := range b.FaceEdges(i) {
		for _, e := range loop {
			switch s := b.Faces[i].Surface.(type) {
			case surface.Plane:
				sum += e.Arc.Sweep(s.Near(b.middle).O).Dot(s.F.Z)
			case surface.Cone:
				sum -= e.Arc.Sweep(s.F.O).Dot(s.Opens()) / s.Sin
			case surface.Cylinder:
				sum -= b.underEdge(s, e)
			}
		}
	}
	return sum
}

// underEdge is the integral of height over girth along an edge on a cylinder,
// mm²: heights along the axis from the middle, girth counted with the angles.
func (b *Body) underEdge(s surface.Cylinder, e Edge) float64 {
	return e.Arc.Integrate(func(t float64) float64 {
		p, d := e.Arc.At(t), e.Arc.Deriv(t, 1)
		out := p.Sub(s.F.O)
		turn := out.Cross(d).Dot(s.F.Z) / s.R
		return p.Sub(b.middle).Dot(s.F.Z) * turn
	})
}

// moments are the area of a plane face and the integrals over it of the first and second powers of
// the coordinates s, t of its frame.
type moments struct{ area, s, t, ss, st, tt float64 }

// faceMoments is the moments of the plane face i in the frame f of its plane, by Green's
// theorem: a homogeneous power of degree k integrates to its integral over s·dt - t·ds divided by k + 2.
func (b *Body) faceMoments(i int, f vec.Frame) moments {
	var m moments
	for _, loop := range b.FaceEdges(i) {
		for _, e := range loop {
			arc := e.Arc.Project(f)
			over := func(power func(p vec.V2) float64, degree float64) float64 {
				return e.Arc.Integrate(func(t float64) float64 {
					p := arc.At(t)
					return power(p) * p.Cross(arc.Deriv(t, 1))
				}) / (degree + 2)
			}
			m.area += arc.Sweep(vec.V2{})
			m.s += over(func(p vec.V2) float64 { return p.X }, 1)
			m.t += over(func(p vec.V2) float64 { return p.Y }, 1)
			m.ss += over(func(p vec.V2) float64 { return p.X * p.X }, 2)
			m.st += over(func(p vec.V2) float64 { return p.X * p.Y }, 2)
			m.tt += over(func(p vec.V2) float64 { return p.Y * p.Y }, 2)
		}
	}
	return m
}

// FaceCentroid is the centre of the area of the plane face i; false for a curved face.
func (b *Body) FaceCentroid(i int) (vec.V3, bool) {
	p, ok := b.Faces[i].Surface.(surface.Plane)
	if !ok {
		return vec.V3{}, false
	}
	f := p.Near(b.middle)
	m := b.faceMoments(i, f)
	return f.Lift(vec.V2{X: m.s / m.area, Y: m.t / m.area}), m.area > 0
}

// Volume is mm³.
func (b *Body) Volume() float64 { v, _ := b.mass(); return v }

// Centroid is the centre of the volume.
func (b *Body) Centroid() vec.V3 { _, c := b.mass(); return c }

// mass is the volume and its centre by Gauss's theorem on the plane faces alone: seen from its apex a
// cone's own face subtends nothing, and nothing flows through a cylinder's face along its axis.
func (b *Body) mass() (float64, vec.V3) {
	for _, f := range b.Faces {
		switch s := f.Surface.(type) {
		case surface.Cone:
			return b.fromPole(s.F.O)
		case surface.Cylinder:
			return b.alongAxis(s.F.Z)
		case surface.Sphere:
			return b.fromCentre(s)
		}
	}
	return b.fromPole(b.middle)
}

// fromPole adds up the pyramids from the pole to the plane faces.
func (b *Body) fromPole(pole vec.V3) (float64, vec.V3) {
	vol, sum := 0.0, vec.V3{}
	for i, f := range b.Faces {
		p, ok := f.Surface.(surface.Plane)
		if !ok {
			continue
		}
		near := p.Near(b.middle)
		m := b.faceMoments(i, near)
		high := -p.Value(pole) / 3
		v := float64(m.area * high)
		vol += v
		// the centre of a pyramid is at 3/4 of the way to that of its base
		first := near.O.Sub(pole).Scale(m.area).Along(near.X, m.s).Along(near.Y, m.t)
		sum = sum.Along(first, high*0.75)
	}
	return vol, pole.Add(sum.Scale(1 / vol))
}

// alongAxis adds up the columns along the axis a under the plane faces, from the
// level of the middle.
func (b *Body) alongAxis(a vec.V3) (float64, vec.V3) {
	vol, sum := 0.0, vec.V3{}
	for i, f := range b.Faces {
		p, ok := f.Surface.(surface.Plane)
		k := 0.0
		if ok {
			k = p.F.Z.Dot(a)
		}
		if num.SignOf(k, num.Direction) == num.Zero {
			continue
		}
		near := p.Near(b.middle)
		m := b.faceMoments(i, near)
		o := near.O.Sub(b.middle)
		// height z = zo + zs·s + zt·t over the face; its integral and first moments
		zo, zs, zt := o.Dot(a), near.X.Dot(a), near.Y.Dot(a)
		z := float64(zo*m.area) + float64(zs*m.s) + float64(zt*m.t)
		zx := float64(zo*m.s) + float64(zs*m.ss) + float64(zt*m.st)
		zy := float64(zo*m.t) + float64(zs*m.st) + float64(zt*m.tt)
		vol += float64(k * z)
		first := o.Scale(z).Along(near.X, zx).Along(near.Y, zy) // integral of z·(p - middle)
		h := first.Dot(a)
		sum = sum.Along(first, k).Along(a, -k*h/2) // half of the share along the axis: columns start at the middle
	}
	return vol, b.middle.Add(sum.Scale(1 / vol))
}
