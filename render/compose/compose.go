// Package compose lays out output blocks: it turns the views, patterns, tables
// and notes that a block asks for into one drawing sheet of marks.
//
// The work goes in four steps, each with its own type, so that paper comes in
// as late as it can:
//
//   - A picture is a view worked out in view millimetres: exact curves, points,
//     and what is to be written where. It knows nothing of paper.
//   - A draft is a picture at a scale. Lettering, dimensions and overshoots have
//     fixed sizes on paper, so the room of a view can only be known here. When
//     the scale is open, the scales of ISO 5455 are tried from the largest.
//   - A layout puts the rooms of drafts, tables and notes on the sheet.
//   - The sheet is the marks of all drafts at their places, behind frame and
//     title block.
//
// What cannot be done as asked is a Problem, told with its numbers; the caller
// knows the source and makes a diagnostic of it.
package compose

import (
	"epure/eval/scene"
	"epure/lang/source"
	"epure/render/drawing"
)

// Problem is something that a block asks for and cannot have.
type Problem struct {
	Span   source.Span // the statement at fault
	Code   string      // one of the codes below
	Text   string      // one sentence with the values
	Reason string      // the rule behind it, or what would do, or ""
	// Fatal tells that there is no sheet; otherwise the sheet lacks what the problem is about.
	Fatal bool
}

// The codes of problems.
const (
	SheetFull   = "sheet-full"   // the views do not fit the sheet at the stated scale
	NotTrue     = "not-true"     // a dimension is not seen true on its view
	CannotFold  = "cannot-fold"  // a view cannot be folded from its parent
	OffSheet    = "off-sheet"    // a place given with at leads off the drawing space
	NothingSeen = "nothing-seen" // a view of which nothing can be drawn
)

// job is one block being composed.
type job struct {
	scene    *scene.Scene
	block    *scene.Block
	ink      ink
	problems []Problem
	drafted  []extra // the tables, see tables
}

// Compose lays out the block b of the scene s. The sheet is nil when one of the
// problems is fatal. The same scene gives the same sheet.
func Compose(s *scene.Scene, b *scene.Block) (*drawing.Sheet, []Problem) {
	j := &job{scene: s, block: b}
	var sheet *drawing.Sheet
	if b.Form == "figure" {
		sheet = j.figure()
	} else {
		sheet = j.sheet()
	}
	return sheet, j.problems
}

// report adds a problem once.
func (j *job) report(p Problem) {
	for _, o := range j.problems {
		if o == p {
			return
		}
	}
	j.problems = append(j.problems, p)
}

// finish makes the sheet of its marks.
func (j *job) finish(marks []drawing.Mark, width, height, scale float64) *drawing.Sheet {
	out := &drawing.Sheet{Name: j.block.Name, Title: j.block.Title, Width: width, Height: height, Marks: distinct(marks)}
	if t := j.block.Titles; t != nil {
		out.Date, out.Creator = t.Date, t.Creator
	}
	out.Desc = j.describe(scale)
	return out
}

// distinct numbers marks whose keys would be alike, in drawing order.
func distinct(marks []drawing.Mark) []drawing.Mark {
	seen := map[drawing.Key]int{}
	for i := range marks {
		k := marks[i].Key
		seen[k]++
		for n := seen[k]; n > 1; n++ {
			next := k
			next.Feature = ordinal(k.Feature, n)
			if seen[next] == 0 {
				seen[next]++
				marks[i].Key = next
				break
			}
		}
	}
	return marks
}
