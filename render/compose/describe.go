package compose

import (
	"strings"

	"epure/eval/scene"
)

// Words for readers who cannot see the sheet.

// describe says which views of what there are, how large, and the dimensions.
func (j *job) describe(scale float64) string {
	var views []string
	for _, v := range j.block.Views {
		views = append(views, viewWords(v))
	}
	var out []string
	if len(views) > 0 {
		out = append(out, capital(listed(views))+".")
	}
	if j.block.Form != "figure" {
		out = append(out, "Scale "+scaleText(scale)+".")
	}
	var dims []string
	for _, d := range j.block.Dimensions {
		dims = append(dims, strings.TrimSpace(d.Name+" "+d.Text))
	}
	if len(dims) > 0 {
		out = append(out, "Dimensions: "+strings.Join(dims, ", ")+".")
	}
	return strings.Join(out, " ")
}

// viewWords names one view: "elevation of B", "true shape of S, a parabola".
func viewWords(v *scene.View) string {
	var of []string
	kind := ""
	for _, s := range v.Of {
		of = append(of, s.Name)
		if sec, ok := s.Value.(*scene.Section); ok && sec.Section != nil && v.Form == "true_shape" {
			kind = ", " + string(sec.Kind)
		}
		if d, ok := s.Value.(*scene.Development); ok {
			kind = ", " + sideUp(d) + " up"
		}
	}
	return strings.ReplaceAll(v.Form, "_", " ") + " of " + listed(of) + kind
}

// listed joins words with commas and a last "and".
func listed(words []string) string {
	if len(words) < 2 {
		return strings.Join(words, "")
	}
	return strings.Join(words[:len(words)-1], ", ") + " and " + words[len(words)-1]
}

// capital makes the first letter a capital.
func capital(s string) string {
	if s == "" {
		return s
	}
	r := []rune(s)
	return strings.ToUpper(string(r[0])) + string(r[1:])
}
