package cli

import (
	"bufio"
	"strings"
	"unicode/utf8"

	"epure/eval/scene"
)

// row is one measure of one thing, ready to print.
type row struct {
	thing   *scene.Thing
	measure string
	value   reading
}

// label is the measure as a file would spell it. A value, which has the one
// measure "value", goes by its name.
func (r row) label() string {
	if r.measure == valueMeasure {
		return r.thing.Name
	}
	return r.thing.Name + "." + r.measure
}

// bare says whether the row is all there is of its thing: a value or a given.
func (r row) bare() bool { return r.thing.Form == "value" }

// valueMeasure is the one measure of a value or a given.
const valueMeasure = "value"

// rowsOf returns the measures of a scene that were asked for, in file order.
func rowsOf(s *scene.Scene, want selection) []row {
	var rows []row
	for _, t := range s.Things {
		for _, m := range t.Measures {
			if r, ok := read(m.Value); ok && want.measure(t.Name, m.Name) {
				rows = append(rows, row{t, m.Name, r})
			}
		}
	}
	return rows
}

// textMeasures prints names and values in two columns, an empty line between things.
func textMeasures(w *bufio.Writer, s *scene.Scene, want selection) {
	rows := rowsOf(s, want)
	wide := 0
	for _, r := range rows {
		wide = max(wide, utf8.RuneCountInString(r.label()))
	}
	for i, r := range rows {
		if i > 0 && rows[i-1].thing != r.thing && !(r.bare() && rows[i-1].bare()) {
			w.WriteByte('\n')
		}
		pad := strings.Repeat(" ", wide-utf8.RuneCountInString(r.label()))
		w.WriteString(r.label() + pad + "  " + r.value.String() + "\n")
	}
}
