package cli

import (
	"encoding/json"
	"fmt"

	"epure/cmd/internal/build"
	"epure/eval/scene"
	"epure/lang/diag"
)

// check finds all mistakes, runs every verify, composes every block, and writes
// nothing. What it found right is printed, with the numbers that show it. With
// --json the diagnostics are what was asked for and go to standard output.
func (s *session) check() (int, error) {
	units, err := s.load()
	if err != nil {
		return Usage, err
	}
	s.run(units, build.Job{All: true, Compose: true})
	out := s.words
	if s.call.JSON {
		out = func(ds []diag.Diagnostic) error { return writing(diag.WriteJSON(s.data, ds)) }
	}
	status, err := s.report(units, out)
	if err != nil || status == Failed {
		return status, err
	}
	for _, u := range units {
		if s.call.JSON {
			err = s.checkedJSON(u)
		} else {
			s.checkedText(u)
		}
	}
	return status, writing(err)
}

// checkedText prints what was checked in a file that is right.
func (s *session) checkedText(u *build.Unit) {
	if u.Failed() {
		s.say("%s: %s", u.Name, tally(u))
		return
	}
	for _, sc := range u.Scenes {
		fmt.Fprintf(s.data, "%s: right: %s\n", withCase(u.Name, sc), census(sc))
		for _, v := range sc.Verify {
			fmt.Fprintf(s.data, "  %s\n", verdict(v))
		}
		for _, p := range proofs(sc) {
			fmt.Fprintf(s.data, "  %s\n", p)
		}
	}
}

func withCase(name string, sc *scene.Scene) string {
	if sc.Case == "" {
		return name
	}
	return name + " (" + sc.Case + ")"
}

// tally counts what is wrong in a file.
func tally(u *build.Unit) string {
	errors, warnings := 0, 0
	for _, d := range u.Bag.Sorted() {
		if d.Severity == diag.Error {
			errors++
		} else {
			warnings++
		}
	}
	if warnings == 0 {
		return count(errors, "error")
	}
	return count(errors, "error") + ", " + count(warnings, "warning")
}

// census counts what a scene holds.
func census(sc *scene.Scene) string {
	return count(len(sc.Things), "thing") + ", " + count(len(sc.Verify), "condition") + ", " + count(len(sc.Blocks), "drawing")
}

// verdict writes a condition that holds with both its values.
func verdict(v scene.Verify) string {
	text := v.Source
	left, okLeft := read(v.Left)
	right, okRight := read(v.Right)
	if okLeft && okRight {
		text += "    " + left.String() + " " + v.Op + " " + right.String()
	}
	return text
}

// checkedJSON prints the same as data, one object for each case.
func (s *session) checkedJSON(u *build.Unit) error {
	e := json.NewEncoder(s.data)
	e.SetEscapeHTML(false)
	for _, sc := range u.Scenes {
		o := object{{"file", u.Name}, {"case", sc.Case}, {"right", !u.Failed()}, {"verify", jsonVerifies(sc)}, {"developments", jsonProofs(sc)}}
		if err := e.Encode(o); err != nil {
			return err
		}
	}
	return nil
}
