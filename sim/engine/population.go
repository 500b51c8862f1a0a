package engine

import (
	"fmt"

	"wane/sim/galaxy"
	"wane/sim/law"
)

// State of an object in one byte: kind, place and origin. Populations without
// a condition on warmth are sets of states.
type state uint8

const stateGone state = 255 // or not yet born

const (
	statesAKind = 6 // places x origins
	maxKinds    = 40
)

func stateOf(kind, place, origin uint8) state { return state(kind*statesAKind + place*2 + origin) }

func (s state) kind() uint8 { return uint8(s) / statesAKind }

// mostPopulations: a state knows its populations by the bits of one word.
const mostPopulations = 64

// population is a compiled population: its states as a bit set, and the
// warmth its members must have.
type population struct {
	galaxy.Population
	in        [256]bool
	holdsEnds bool // a member may be adrift, or central, and no star: it ends by a prospect
}

func (m *Model) compilePopulations() error {
	if len(m.Populations) > mostPopulations {
		return fmt.Errorf("engine: %d populations: at most %d", len(m.Populations), mostPopulations)
	}
	for s := range m.anyState.in {
		m.anyState.in[s] = state(s) != stateGone
	}
	for _, p := range m.Populations {
		m.anyWarm = m.anyWarm || p.Warmth != nil
	}
	if len(m.Set.Kinds) > maxKinds {
		return fmt.Errorf("engine: %d kinds: at most %d", len(m.Set.Kinds), maxKinds)
	}
	for _, p := range m.Populations {
		c := population{Population: p}
		for kind := range uint8(len(m.Set.Kinds)) {
			for place := range uint8(3) {
				for origin := range uint8(2) {
					c.in[stateOf(kind, place, origin)] = matches(p.Kinds, m.Set.Kinds[kind]) &&
						matches(p.Places, law.PlaceWords[place]) && matches(p.Origins, law.OriginWords[origin])
					if c.in[stateOf(kind, place, origin)] && place != law.Bound && kind != law.Star {
						c.holdsEnds = true
					}
				}
			}
		}
		m.populations = append(m.populations, c)
	}
	return nil
}

func matches(words []string, word string) bool {
	if len(words) == 0 {
		return true
	}
	for _, w := range words {
		if w == word {
			return true
		}
	}
	return false
}
