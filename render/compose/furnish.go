package compose

import (
	"strings"

	"epure/eval/scene"
	"epure/render/drawing"
	"epure/render/furniture"
)

// Frame and title block.

// notIssued stands in the status field of a sheet without a status.
const notIssued = "NOT ISSUED"

// furnish draws the frame and the title block of the sheet.
func (j *job) furnish(p furniture.Paper, a *attempt) []drawing.Mark {
	space := p.Space()
	corner := space.Min
	corner.X = space.Max.X
	return append(furniture.Frame(p), j.titleBlock(p, a).Marks(corner, j.ink.pens)...)
}

func (j *job) titleBlock(p furniture.Paper, a *attempt) furniture.TitleBlock {
	t := j.block.Titles
	if t == nil {
		t = &scene.Titles{}
	}
	b := furniture.TitleBlock{
		Owner: t.Owner, Number: t.Number, Revision: t.Revision, Date: t.Date, Sheet: t.Sheet, Sheets: t.Sheets,
		Language: t.Language, Title: j.block.Title, Supplement: t.Supplement, Department: t.Department,
		Reference: t.Reference, Approved: t.Approval, Creator: t.Creator, DocumentType: t.DocumentType,
		Status: t.Status, PaperSize: p.Name, Scale: scaleText(a.scale), Units: "mm", Tolerance: t.Tolerance,
	}
	if b.Status == "" {
		b.Status = notIssued
	}
	if a.projections() > 1 {
		b.Projection = furniture.FirstAngle
		if j.block.ThirdAngle {
			b.Projection = furniture.ThirdAngle
		}
	}
	return b
}

// projections counts the orthographic views: with more than one the method must be stated.
func (a *attempt) projections() int {
	n := 0
	for _, d := range a.drafts {
		if d.p.view.Form != "pattern" && d.p.view.Form != "true_shape" && d.p.view.Form != "pictorial" {
			n++
		}
	}
	return n
}

// centringClear is how near, paper mm, things may come to the centring marks.
const centringClear = 2

// keepOut is what lies in the drawing space before anything is placed: the title
// block and the centring marks. The marks need less room round them than views
// do, so their extents are taken in by the difference, to less than nothing.
func keepOut(p furniture.Paper) []extent {
	out := []extent{boxExtent(furniture.BlockBox(p))}
	for _, m := range furniture.Frame(p) {
		if strings.HasPrefix(m.Key.Feature, "centring/") {
			out = append(out, shapeExtent(m.Shape).grown(centringClear-leastGap))
		}
	}
	return out
}
