package cli

import (
	"encoding/csv"
	"io"

	"epure/eval/scene"
)

// The comma-separated form has one number a cell, so that a spreadsheet can
// compute with it: a point takes three rows, focus.x to focus.z, a line six,
// axis.through.x and so on. Lines end as RFC 4180 wants it.

// csvHeader is the first line.
var csvHeader = []string{"file", "case", "thing", "measure", "value", "unit"}

// csvMeasures writes the rows of a scene.
func csvMeasures(w *csv.Writer, file string, s *scene.Scene, want selection) error {
	for _, r := range rowsOf(s, want) {
		for _, c := range cells(r.measure, r.value) {
			if err := w.Write([]string{file, s.Case, r.thing.Name, c[0], c[1], c[2]}); err != nil {
				return err
			}
		}
	}
	return nil
}

func newCSV(w io.Writer) *csv.Writer {
	out := csv.NewWriter(w)
	out.UseCRLF = true
	return out
}

// cells returns measure, value and unit for every number of a reading.
func cells(measure string, r reading) [][3]string {
	switch {
	case r.kind == "text":
		return [][3]string{{measure, r.text, ""}}
	case r.kind == "yes or no":
		return [][3]string{{measure, yesNo(r.yes), ""}}
	case r.coordinates == nil:
		return [][3]string{{measure, decimal(r.number), r.unit}}
	}
	var out [][3]string
	for _, c := range r.coordinates {
		name := measure
		if c.name != "" {
			name += "." + c.name
		}
		for i, d := range c.decimals() {
			out = append(out, [3]string{name + "." + "xyz"[i:i+1], d, c.unit})
		}
	}
	return out
}
