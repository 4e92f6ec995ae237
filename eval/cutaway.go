package eval

import (
	"errors"
	"fmt"

	"epure/eval/forms"
	"epure/eval/scene"
	"epure/geom/body"
	"epure/geom/cut"
	"epure/lang/check"
)

// cutAway makes the section view: of each solid what lies behind the plane for someone who looks
// against its normal, and the cut face. A solid that lies in front of the plane is left out, one that lies behind it is whole; a plane
// that cuts none of the solids is a mistake.
func (e *evaluator) cutAway(sym *check.Symbol, call *formsCall, v *scene.View) bool {
	v.By = call.Values["by"][0].(*scene.Plane)
	v.Along = v.By.F.Z.Neg()
	var kept []scene.Subject
	nearest := -1.0
	for _, s := range v.Of {
		of := s.Value.(*scene.Solid)
		b, err := of.Body.Cut(v.By.Surface(), v.By.Name)
		var nothing *body.CutError
		inFront := errors.As(err, &nothing) && nothing.Nothing
		face, err := cut.Of(of.Body, v.By.Surface(), v.By.Along)
		var miss *cut.MissError
		if errors.As(err, &miss) && (nearest < 0 || miss.Miss < nearest) {
			nearest = miss.Miss
		}
		switch {
		case inFront:
			continue
		case miss != nil || nothing != nil:
			kept = append(kept, s)
			continue
		}
		part := &scene.Solid{Name: of.Name, Body: b, Root: of.Root, Cuts: append(of.Cuts[:len(of.Cuts):len(of.Cuts)], v.By), Whole: of.Whole}
		kept = append(kept, scene.Subject{Name: s.Name, Value: part})
		v.Cut = append(v.Cut, scene.Subject{Name: s.Name, Value: &scene.Section{Name: s.Name, Section: face, Of: of, By: v.By}})
	}
	v.Of = kept
	if len(v.Cut) > 0 {
		return true
	}
	f := &forms.Fail{Code: "plane-misses", Text: fmt.Sprintf("%s cuts nothing of what the view shows", v.By.Name),
		Reason: "the plane passes the nearest solid by " + showValue(scene.Quantity{Value: mm(nearest)})}
	e.bag.Add(diagnostic(f, sym.Clauses["by"].Values[0].Span()))
	return false
}
