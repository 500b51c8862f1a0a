package engine

import (
	"wane/sim/galaxy"
	"wane/sim/law"
)

// stay is one object in one state of a population with a condition on warmth.
type stay struct {
	i             uint32
	stage         int
	state         state
	entered       float64 // log10 date at which its kind began, from which its age counts
	enter, leave  float64 // log10 dates of the stay
	cause         uint8   // of leaving
	follows, goes bool    // the stay before, or after, is of the same object without a gap
	mass          float64 // with which its kind began
	comp          uint8
}

// tallyWarm counts the populations with a condition on warmth.
func (w *Workspace) tallyWarm(end float64) error {
	for p, pop := range w.m.populations {
		if pop.Warmth == nil {
			continue
		}
		if err := w.tallyOne(p, &w.m.populations[p], end); err != nil {
			return err
		}
	}
	return nil
}

func (w *Workspace) tallyOne(p int, pop *population, end float64) error {
	stays := w.stays(pop, end)
	for first, last := 0, 0; first < len(stays); first = last {
		last = min(first+w.m.rounds, len(stays))
		for last < len(stays) && stays[last].follows {
			last++ // the stays of one object are looked at together
		}
		part := stays[first:last]
		cross, warmAtStart, err := w.crossings(pop.Warmth, part, end)
		if err != nil {
			return err
		}
		w.enterWarm(p, pop.Warmth, part, cross, warmAtStart, end)
	}
	return nil
}

// enterWarm turns crossings into entries and exits. Above: a member from the
// start of a stay, if it is warm then, to the crossing or the end of the stay.
// Below: from the crossing, or the start if it is cold then, to the end.
func (w *Workspace) enterWarm(p int, x *galaxy.Warmth, stays []stay, cross []float64, warm []bool, end float64) {
	n := &w.counts
	open := false
	for j, s := range stays {
		if !s.follows {
			open = false
		}
		from, to, cause := s.enter, s.leave, s.cause
		if x.Above {
			if !warm[j] {
				from = never
			}
			if cross[j] < to {
				to, cause = cross[j], w.m.coolCause(s.state.kind())
			}
		} else if warm[j] {
			from = cross[j]
		}
		if !(from < to) || from > end {
			if open {
				n.exit(p, s.enter, w.m.coolCause(s.state.kind()))
			}
			open = false
			continue
		}
		if !open {
			n.give(p, from)
		}
		open = s.goes && to == s.leave
		if !open && to <= end && to < never {
			n.exit(p, to, cause)
		}
	}
}

// coolCause is the cause cooledWord of a kind.
func (m *Model) coolCause(kind uint8) uint8 {
	for _, u := range m.cooling {
		if u.Speaks(kind, 1, 0.02) {
			return m.causeOf[Cause{u.Card.Process, cooledWord}]
		}
	}
	return m.causeOf[Cause{"warmth", cooledWord}]
}

// stays lists the stays of all objects in the states of a population.
func (w *Workspace) stays(pop *population, end float64) []stay {
	c := &w.c
	out := w.stayed[:0]
	for _, s := range w.meets.stays { // of lives that a meeting ended
		if pop.in[s.state] {
			out = append(out, s)
		}
	}
	for first := 0; first < c.n; first += chunk {
		size := min(chunk, c.n-first)
		w.logChunk(first, size)
		for k := range size {
			i := uint32(first + k)
			if c.kind0[i] == law.NoWord || !pop.couldHold(c, i) {
				continue
			}
			out = w.staysOf(out, pop, i, [3]float64{w.counts.logs[0][k], w.counts.logs[1][k], w.counts.logs[2][k]}, end)
		}
	}
	w.stayed = out
	return out
}

// couldHold is a quick look whether an object is ever of the population's kinds.
func (p *population) couldHold(c *columns, i uint32) bool {
	for _, kind := range [2]uint8{c.kind0[i], c.kind1[i]} {
		for place := range uint8(3) {
			for origin := range uint8(2) {
				if p.in[stateOf(kind, place, origin)] {
					return true
				}
			}
		}
	}
	_, linked := c.chain[i]
	return linked
}

func (w *Workspace) staysOf(out []stay, pop *population, i uint32, dates [3]float64, end float64) []stay {
	stage, began := 1, dates[0]
	if w.c.died[i] == 0 {
		stage = 2
	}
	last := -1
	enter := func(s state, date float64, follows bool) {
		mass, comp := w.atEntry(i, stage)
		out = append(out, stay{i: i, stage: stage, state: s, entered: began, enter: date, leave: never, follows: follows, mass: mass, comp: comp})
		last = len(out) - 1
	}
	if c := &w.c; c.continued != nil && c.continued[i] {
		// It has been there since the meeting, which is in the journal.
		if s := stateOf(c.kind0[i], law.Bound, w.originOf(i)); pop.in[s] {
			enter(s, dates[0], false)
		}
	}
	w.each(i, dates, end, func(date float64, from, to state, cause uint8) {
		if last >= 0 {
			out[last].leave, out[last].cause = date, cause
		}
		changed := from != stateGone && to != stateGone && from.kind() == to.kind()
		if from != stateGone && to != stateGone && from.kind() != to.kind() {
			stage++
			began = date
		}
		if to != stateGone && pop.in[to] {
			follows := last >= 0 && changed
			if follows {
				out[last].goes = true
			}
			enter(to, date, follows)
			return
		}
		last = -1
	})
	return out
}

// atEntry is the mass with which object i entered a stage, and what it is made
// of.
func (w *Workspace) atEntry(i uint32, stage int) (mass float64, comp uint8) {
	c := &w.c
	switch {
	case stage == 1:
		mass, comp = c.mass0[i], law.Hydrogen
	case stage == 2:
		mass, comp = c.mass1[i], c.comp1[i]
	default:
		l := c.chain[i][stage-3]
		mass, comp = l.mass, l.comp
	}
	for _, x := range w.wear.worn[i] {
		if x.stage >= stage {
			mass += x.mass
		}
	}
	return mass, comp
}
