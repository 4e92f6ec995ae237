package build

import (
	"strings"

	"epure/lang/diag"
	"epure/lang/source"
)

// Namesakes reports, in the unit of the second, two drawings whose files would
// have one name: the second would silently replace the first. Capitals do not
// tell names apart on every disk. Telling it twice does no harm.
func Namesakes(units ...*Unit) {
	first := map[string]source.Span{}
	for _, u := range units {
		for _, sheet := range u.Sheets {
			name := strings.ToLower(sheet.Name)
			at, taken := first[name]
			if !taken {
				first[name] = sheet.At
				continue
			}
			u.Bag.Add(diag.New("same-output", sheet.At, "two drawings are named "+source.Quote(sheet.Name)).
				Because("the name of a drawing begins the name of its file, and the second would replace the first").
				WithNote(at, "the first one is here"))
		}
	}
}
