package compose

import (
	"epure/eval/scene"
	"epure/geom/vec"
	"epure/render/drawing"
)

func (d *draft) linear(k drawing.Key, a, b, n vec.V2, at float64, text string) {
}
func (d *draft) radius(m *scene.Dimension, a scene.Radius)         {}
func (d *draft) angle(m *scene.Dimension, a scene.Angle)           {}
func (d *draft) flatRadius(m *scene.Dimension, a scene.FlatRadius) {}
func (d *draft) flatAngle(m *scene.Dimension, a scene.FlatAngle)   {}
func (j *job) table(t *scene.Table) extra                          { return extra{kind: tableItem} }
