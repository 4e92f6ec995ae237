package cli

import (
	"encoding/json"

	"epure/cmd/internal/build"
)

// measure prints the measures of all things or of the named ones. It prints
// what there is even when something is wrong: the rest is how one finds out why.
func (s *session) measure() (int, error) {
	units, err := s.load()
	if err != nil {
		return Usage, err
	}
	want := selection(s.call.Names)
	s.run(units, build.Job{All: len(want) == 0, Names: want.things()})
	status, err := s.report(units, s.words)
	if err != nil || status == Failed {
		return status, err
	}
	if err := s.namesExist(want, units); err != nil {
		return Usage, err
	}
	return status, writing(s.printMeasures(units, want))
}

// namesExist reports a name that no file has. When a file has errors, its things
// are not all known, and nothing is said.
func (s *session) namesExist(want selection, units []*build.Unit) error {
	var known []string
	for _, u := range units {
		if u.Broken() {
			return nil
		}
		known = append(known, u.Names()...)
		for _, sc := range u.Scenes {
			known = append(known, measureNames(sc)...)
		}
	}
	name, near, found := want.unknown(known)
	switch {
	case !found:
		return nil
	case near != "":
		return usage("nothing is named `%s`: write `%s`", name, near)
	}
	return usage("nothing is named `%s` in %s", name, units[0].Name)
}

// printMeasures writes them in the form that was asked for.
func (s *session) printMeasures(units []*build.Unit, want selection) error {
	switch {
	case s.call.JSON:
		return s.printJSON(units, want)
	case s.call.CSV:
		return s.printCSV(units, want)
	}
	for i, u := range units {
		if len(units) > 1 {
			if i > 0 {
				s.data.WriteByte('\n')
			}
			s.data.WriteString("# " + u.Name + "\n")
		}
		for _, sc := range u.Scenes {
			textMeasures(s.data, sc, want)
		}
	}
	return nil
}

func (s *session) printJSON(units []*build.Unit, want selection) error {
	e := json.NewEncoder(s.data)
	e.SetEscapeHTML(false)
	for _, u := range units {
		for _, sc := range u.Scenes {
			if err := e.Encode(jsonScene(u, sc, want)); err != nil {
				return err
			}
		}
	}
	return nil
}

func (s *session) printCSV(units []*build.Unit, want selection) error {
	w := newCSV(s.data)
	if err := w.Write(csvHeader); err != nil {
		return err
	}
	for _, u := range units {
		for _, sc := range u.Scenes {
			if err := csvMeasures(w, u.Name, sc, want); err != nil {
				return err
			}
		}
	}
	w.Flush()
	return w.Error()
}
