package cli

import (
	"encoding/json"
	"slices"

	"epure/cmd/internal/build"
)

// draw writes the output blocks of the files. A file with an error or a verify
// that fails writes nothing, and what it wrote before stays as it was.
func (s *session) draw() (int, error) {
	units, err := s.load()
	if err != nil {
		return Usage, err
	}
	status, written, err := s.drawUnits(units)
	if err != nil || status == Failed {
		return status, err
	}
	s.say("%s", written)
	return status, nil
}

// drawUnits draws loaded units and returns the status and a line that sums up.
func (s *session) drawUnits(units []*build.Unit) (status int, sum string, err error) {
	s.run(units, build.Job{Compose: true, Formats: s.call.Formats})
	build.Namesakes(units...)
	status, err = s.report(units, s.words)
	if err != nil || status == Failed {
		return status, "", err
	}
	drawings, written, kept := 0, 0, 0
	for _, u := range units {
		if u.Failed() {
			continue
		}
		outcomes, err := build.Put(s.Disk, s.call.Folder, u.Artefacts)
		if err != nil {
			return Failed, "", err
		}
		drawings += len(u.Sheets)
		for _, o := range outcomes {
			if o.Changed {
				written++
			} else {
				kept++
			}
			if err := s.announce(u, o); err != nil {
				return Failed, "", writing(err)
			}
		}
	}
	return status, sums(units, drawings, results(drawings, written, kept)), nil
}

// sums is the line at the end.
func sums(units []*build.Unit, drawings int, written string) string {
	if drawings == 0 && !slices.ContainsFunc(units, (*build.Unit).Failed) {
		return "nothing to draw: there is no sheet and no figure"
	}
	failed := 0
	for _, u := range units {
		if u.Failed() {
			failed++
		}
	}
	switch {
	case failed == len(units):
		return "nothing drawn: " + count(failed, "file") + " with errors"
	case failed > 0:
		return written + "; nothing drawn of " + count(failed, "file") + " with errors"
	}
	return written
}

// results counts what was written.
func results(drawings, written, kept int) string {
	text := count(drawings, "drawing") + ": " + count(written, "file") + " written"
	if kept > 0 {
		text += ", " + count(kept, "file") + " unchanged"
	}
	return text
}

// announce prints the name of an output that is now up to date.
// One who watches wants to know what has changed.
func (s *session) announce(u *build.Unit, o build.Outcome) error {
	if s.call.Verb == "watch" && !o.Changed {
		return nil
	}
	if s.call.JSON {
		return json.NewEncoder(s.data).Encode(object{{"file", u.Name}, {"output", o.Path}, {"changed", o.Changed}})
	}
	_, err := s.data.WriteString(o.Path + "\n")
	return err
}
