package diag

import (
	"encoding/json"
	"io"

	"epure/lang/source"
)

// The JSON form has one object a line. Its field names are stable: other
// programs read them. Lines and columns count from 1 (columns in runes), offsets
// are bytes from 0; a diagnostic without a place has none of these fields.

type jsonPlace struct {
	File      string `json:"file"`
	Line      int    `json:"line"`
	Column    int    `json:"column"`
	EndLine   int    `json:"endLine"`
	EndColumn int    `json:"endColumn"`
	Start     int    `json:"start"`
	End       int    `json:"end"`
}

type jsonNote struct {
	*jsonPlace
	Text string `json:"text"`
}

type jsonFix struct {
	*jsonPlace
	Text  string `json:"text"`
	Label string `json:"label"`
}

type jsonDiagnostic struct {
	*jsonPlace
	Severity string     `json:"severity"`
	Code     Code       `json:"code"`
	Text     string     `json:"text"`
	Reason   string     `json:"reason,omitempty"`
	Notes    []jsonNote `json:"notes,omitempty"`
	Fixes    []jsonFix  `json:"fixes,omitempty"`
}

// WriteJSON writes one object a line for each diagnostic, in the order given.
func WriteJSON(w io.Writer, ds []Diagnostic) error {
	enc := json.NewEncoder(w)
	enc.SetEscapeHTML(false)
	for _, d := range ds {
		if err := enc.Encode(toJSON(d)); err != nil {
			return err
		}
	}
	return nil
}

func toJSON(d Diagnostic) jsonDiagnostic {
	out := jsonDiagnostic{
		jsonPlace: place(d.Span),
		Severity:  d.Severity.String(),
		Code:      d.Code,
		Text:      d.Text,
		Reason:    d.Reason,
	}
	for _, n := range d.Notes {
		out.Notes = append(out.Notes, jsonNote{place(n.Span), n.Text})
	}
	for _, f := range d.Fixes {
		out.Fixes = append(out.Fixes, jsonFix{place(f.Span), f.Text, fixWords(f)})
	}
	return out
}

func place(s source.Span) *jsonPlace {
	if s.IsZero() {
		return nil
	}
	p := jsonPlace{File: s.File.Name, Start: s.Start, End: s.End}
	p.Line, p.Column = s.File.Position(s.Start)
	p.EndLine, p.EndColumn = s.File.Position(s.End)
	return &p
}
