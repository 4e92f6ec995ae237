package compose

import (
	"slices"
	"strings"

	"epure/eval/scene"
	"epure/geom/vec"
	"epure/render/drawing"
	"epure/render/font"
)

// Tables and notes: what stands on the sheet beside the views.

// extra is a table or the block of notes, drafted with its own origin.
type extra struct {
	kind  kind
	marks []drawing.Mark
	room  extent
	at    *vec.V2
}

// noteWidths are the widths to which notes are broken, mm: that of the title
// block, over which they then stand, and narrower ones.
func noteWidths() []float64 { return []float64{180, 120, 80} }

// extras drafts tables and notes; notes are broken to a width.
func (j *job) extras(scale, width float64) []extra {
	out := slices.Clone(j.tables())
	var free []string
	for _, n := range j.block.Notes {
		if n.At == nil {
			free = append(free, n.Text)
			continue
		}
		e := j.notes(n.Name, []string{n.Text}, nil, width)
		e.at = n.At
		out = append(out, e)
	}
	var cautions []string
	if j.block.Form != "figure" {
		cautions = j.cautions(scale)
	}
	if len(free)+len(cautions) > 0 {
		out = append(out, j.notes("notes", free, cautions, width))
	}
	return out
}

// tables drafts the tables, once: they are the same at every scale.
func (j *job) tables() []extra {
	if j.drafted == nil {
		j.drafted = []extra{}
		for _, t := range j.block.Tables {
			if len(t.Rows) > 0 {
				e := j.table(t)
				e.at = t.At
				j.drafted = append(j.drafted, e)
			}
		}
	}
	return j.drafted
}

// notes drafts lines of text from the top down: notes, then cautions in small
// lettering.
func (j *job) notes(name string, texts, cautions []string, width float64) extra {
	e := extra{kind: noteItem}
	y, n := 0.0, 0
	write := func(text string, h float64) {
		for _, l := range wrapped(text, h, width) {
			y -= h
			n++
			e.marks = append(e.marks, drawing.Mark{Key: drawing.Key{View: "notes", Thing: name, Feature: ordinal("line", n)}, Role: drawing.Lettering,
				Shape: drawing.Text{At: vec.V2{Y: y}, Height: h, String: l}})
			y -= h * (linePitch - 1)
		}
	}
	for _, t := range texts {
		write(t, j.ink.text)
	}
	if len(texts) > 0 && len(cautions) > 0 {
		y -= j.ink.small * (linePitch - 1)
	}
	for _, t := range cautions {
		write(t, j.ink.small)
	}
	e.room = marksExtent(e.marks)
	return e
}

// wrapped breaks a text into lines no wider than width, at spaces; a word that
// is wider alone stands alone.
func wrapped(text string, h, width float64) []string {
	var out []string
	for _, para := range strings.Split(text, "\n") {
		l := ""
		for _, w := range strings.Fields(para) {
			next := w
			if l != "" {
				next = l + " " + w
			}
			if l != "" && font.Width(next, h, false) > width {
				out = append(out, l)
				next = w
			}
			l = next
		}
		out = append(out, l)
	}
	return out
}

// cautions are what every sheet with a pattern must say, in few words.
func (j *job) cautions(scale float64) []string {
	var dev *scene.Development
	full := false
	for _, v := range j.block.Views {
		for _, of := range v.Of {
			if d, ok := of.Value.(*scene.Development); ok && v.Form == "pattern" {
				dev = d
				s := v.Scale
				if s == 0 {
					s = scale
				}
				full = full || s == 1
			}
		}
	}
	if dev == nil {
		return nil
	}
	out := []string{
		"Geometry only; follow local codes and licensed practice. Strength, pressure, heat and leakage are not checked.",
		"Patterns are net and without thickness: nothing is added for seams, laps, kerf or forming. Heed which side is up.",
	}
	if full {
		out = append(out, "Full size: print without fitting to the page, and measure both 100 mm bars before cutting.")
	} else {
		out = append(out, "Not full size: do not cut from this print. Lay out from the true lengths.")
	}
	return append(out, "Make one, form it and try it before the rest. Edges are sharp: deburr, wear gloves.")
}
