package vec

import (
	"testing"

	"pgregory.net/rapid"
)

// TestMotions: distances stay, a turn keeps its axis and turns by its angle, a mirror is its own inverse and reflects.
func TestMotions(t *testing.T) {
	coord := rapid.Float64Range(-100, 100)
	rapid.Check(t, func(t *rapid.T) {
		v := func(name string) V3 {
			return V3{coord.Draw(t, name+"x"), coord.Draw(t, name+"y"), coord.Draw(t, name+"z")}
		}
		o, axis, p, q := v("o"), v("axis"), v("p"), v("q")
		if axis.Len() < 1 {
			t.Skip("no axis")
		}
		axis = axis.Unit()
		const near = 1e-12 * 1000 // some ulps of coordinates up to 1000
		quarter := Turn(o, axis, 1, 0)
		mirror := Mirror(o, axis)
		for _, m := range []Motion{quarter, mirror, quarter.Then(mirror), Shift(o).Then(quarter)} {
			if d := m.Point(p).Dist(m.Point(q)) - p.Dist(q); d > near || d < -near {
				t.Fatalf("the distance changes by %g", d)
			}
		}
		if quarter.Point(o.Along(axis, 7)).Dist(o.Along(axis, 7)) > near {
			t.Fatal("a turn moves its axis")
		}
		four := quarter.Then(quarter).Then(quarter).Then(quarter)
		if four.Point(p).Dist(p) > near || quarter.Reflects() {
			t.Fatal("four quarters are no turn")
		}
		out := p.Sub(o).Along(axis, -p.Sub(o).Dot(axis))
		if got := quarter.Point(p).Sub(o).Dot(axis.Cross(out)); got < out.Len()*out.Len()-near*100 {
			t.Fatal("the turn runs clockwise")
		}
		if mirror.Then(mirror).Point(p).Dist(p) > near || !mirror.Reflects() {
			t.Fatal("a mirror twice is not nothing")
		}
	})
}
