package cli

import (
	"epure/lang/manual"
	"epure/lang/spell"
)

// explain prints the reference entry of a word, or the list of all words.
func (s *session) explain() (int, error) {
	if len(s.call.Names) == 0 {
		_, err := s.data.WriteString(manual.List())
		return Done, writing(err)
	}
	word := s.call.Names[0]
	text, ok := manual.Entry(word)
	if !ok {
		if near, found := spell.Nearest(word, manual.Words()); found {
			return Usage, usage("there is no entry for `%s`: write `epure explain %s`", word, near)
		}
		return Usage, usage("there is no entry for `%s`: `epure explain` lists all", word)
	}
	_, err := s.data.WriteString(text)
	return Done, writing(err)
}
