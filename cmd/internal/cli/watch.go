package cli

import (
	"epure/cmd/internal/build"
	"epure/cmd/internal/watch"
)

// watch draws, and draws again whenever a file that was read has other contents,
// until it is interrupted. A file with errors keeps its last good drawings. What
// goes wrong in the first round ends the command as it would end `draw`, unless
// it is a mistake in a file: that is what one watches for.
func (s *session) watch() (int, error) {
	ctx, stop := s.Interruptible()
	defer stop()
	follower := watch.New(s.Disk)
	defer follower.Close()
	for round := 0; ; round++ {
		units, err := s.redraw()
		if err != nil && round == 0 {
			return Failed, err
		}
		if err != nil {
			s.stop(err)
		}
		follower.Set(inputs(units))
		if follower.Wait(ctx) != nil {
			return Done, nil
		}
	}
}

// redraw draws once and says how long it took.
func (s *session) redraw() ([]*build.Unit, error) {
	start := s.Now()
	units, err := s.load()
	if err != nil {
		return units, err
	}
	status, sum, err := s.drawUnits(units)
	if err != nil {
		return units, err
	}
	if err := s.data.Flush(); err != nil {
		return units, writing(err)
	}
	if status != Failed {
		s.say("%s; redrawn in %d ms", sum, s.Now().Sub(start).Milliseconds())
	}
	return units, nil
}

func inputs(units []*build.Unit) []watch.Input {
	var all []watch.Input
	for _, u := range units {
		all = append(all, u.Read...)
	}
	return all
}
