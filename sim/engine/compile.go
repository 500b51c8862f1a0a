package engine

import (
	"fmt"

	"wane/sim/law"
)

// compileCauses lists the words that laws answer with, so that none is new in
// a run: workers share the list.
func (m *Model) compileCauses() {
	for _, u := range m.ends {
		for _, word := range wordsOf(u, "die") {
			m.cause(u.Card.Process, becameWord+word)
		}
	}
	for _, u := range append(actives(m.Set.OfRole(law.Encounter)), m.turning...) {
		for _, o := range u.Card.Outcomes {
			m.cause(u.Card.Process, o.Word)
		}
	}
	for _, u := range m.cooling {
		m.coolsByMetals = m.coolsByMetals || reads(u)&^(hasKind|hasMass|hasComposition|hasDraws) != 0
		m.cause(u.Card.Process, cooledWord)
	}
	m.cause("warmth", cooledWord)
}

const (
	becameWord = "became "
	cooledWord = "cooled"
)

func (m *Model) compileClocks() error {
	var dynamics []*law.Use
	for _, role := range []law.Role{law.Dynamics, law.Encounter} {
		for _, u := range actives(m.Set.OfRole(role)) {
			dynamics = append(dynamics, u)
			if u.Card.Frame {
				m.frame, m.stopFate = u, u.Card.StopFate
				m.stopCause = m.cause(u.Card.Process, u.Card.StopOutcome)
			}
			if role == law.Encounter {
				m.encounter = u
				m.deathsMatter = true
			}
			for i, c := range u.Card.Clocks {
				m.Clocks = append(m.Clocks, Clock{Clock: c, Process: u.Card.Process, use: u, index: i,
					cause: m.cause(u.Card.Process, c.Outcome)})
			}
		}
	}
	if len(m.Clocks) > maxClocks {
		return fmt.Errorf("engine: the laws of this run have %d clocks: at most %d", len(m.Clocks), maxClocks)
	}
	m.allAdrift = m.cause("dark-energy-decay", "all-adrift")
	first := 0
	for _, u := range dynamics {
		if u.Card.Answers("expose") && len(u.Card.Clocks) > 0 {
			m.exposing = append(m.exposing, exposer{u, first})
		}
		if err := m.compileDiverts(u); err != nil {
			return err
		}
		first += len(u.Card.Clocks)
	}
	m.compileFates()
	return m.compileRates(dynamics)
}

// compileFates finds out whether each cause of leaving sends objects one way
// only, so that the cause alone tells where they are.
func (m *Model) compileFates() {
	m.oneFate = true
	fates := map[uint8]law.Fate{m.allAdrift: law.FateAdrift}
	claim := func(cause uint8, fate law.Fate) {
		if before, ok := fates[cause]; ok && before != fate {
			m.oneFate = false
		}
		fates[cause] = fate
	}
	for _, c := range m.Clocks {
		claim(c.cause, c.Fate)
	}
	for _, d := range m.diverts {
		claim(d.cause, law.FateCentral)
	}
	if m.frame != nil {
		claim(m.stopCause, m.stopFate)
	}
}

func (m *Model) compileDiverts(u *law.Use) error {
	if !u.Card.Answers("divert") {
		return nil
	}
	for i, word := range wordsOf(u, "divert") {
		clock := -1
		for k, c := range m.Clocks {
			if c.Name == word {
				clock = k
			}
		}
		if clock < 0 {
			continue // that clock's law is not in this run
		}
		outcome := "swallowed"
		if i < len(u.Card.Outcomes) {
			outcome = u.Card.Outcomes[i].Word
		}
		m.diverts = append(m.diverts, diverter{u, clock, i, m.cause(u.Card.Process, outcome)})
	}
	return nil
}

func (m *Model) compileRates(dynamics []*law.Use) error {
	first := 0
	m.sums, m.soughts = make([]bool, len(m.Clocks)), make([]bool, len(m.Clocks))
	declare := func(slot int) {
		for _, d := range m.declared {
			if d == slot {
				return
			}
		}
		m.declared = append(m.declared, slot)
		timed := m.movesWithTime(slot)
		m.timed = append(m.timed, timed)
		if timed {
			m.timedSlots = append(m.timedSlots, slot)
		}
		if slot == slotMass || slot == slotCarried || slot >= slotKinds && !timed {
			m.deathsMatter = true
		}
		for k := range m.Clocks {
			m.sums[k] = m.sums[k] || slot == m.slotSum(k)
			m.soughts[k] = m.soughts[k] || slot == m.slotSought(k) && m.Clocks[k].Fate == law.FateMeet
		}
		m.kindsCount = m.kindsCount || slot >= slotKinds && slot < m.slotSum(0)
	}
	// The frame's law is asked first: the others may read its radius.
	for pass := range 2 {
		first = 0
		for _, u := range dynamics {
			if u.Card.Answers("rate") && u.Card.Frame == (pass == 0) {
				a := rateAsk{use: u, first: first}
				for _, name := range inputsOf(u, "rate") {
					ref, err := m.resolveValue(u, name)
					if err != nil {
						return err
					}
					if ref.slot >= 0 {
						declare(ref.slot)
					}
					a.inputs = append(a.inputs, ref)
				}
				m.rateAsks = append(m.rateAsks, a)
			}
			first += len(u.Card.Clocks)
		}
	}
	if len(m.declared) > 16 {
		return fmt.Errorf("engine: the rates hang on %d galaxy values: at most 16", len(m.declared))
	}
	return nil
}

func (m *Model) compileThresholds() error {
	for _, u := range m.wearing {
		row := make([]threshold, len(m.Set.Kinds))
		for _, t := range u.Card.Thresholds {
			k := m.Set.Kind(t.Kind)
			if k == law.NoWord {
				continue // no law of this run makes that kind
			}
			if row[k].applies {
				return fmt.Errorf("engine: law %s: two thresholds for kind %s; the second can't be reached", u.ID(), t.Kind)
			}
			becomes := uint8(law.NoWord)
			if t.Becomes != law.Gone {
				if becomes = m.Set.Kind(t.Becomes); becomes == law.NoWord || becomes == law.Star {
					return fmt.Errorf("engine: law %s: threshold of %s: it can't become %q", u.ID(), t.Kind, t.Becomes)
				}
			}
			row[k] = threshold{u.ThresholdMass(t), becomes, m.cause(u.Card.Process, t.Outcome), true}
		}
		m.thresholds = append(m.thresholds, row)
		if w := u.Card.Wears; w != "" && w != "loss" {
			return fmt.Errorf("engine: law %s: wears by %q: the engine runs losses only", u.ID(), w)
		}
		for _, q := range []string{"wear", "foretell", "heat"} {
			for _, in := range inputsOf(u, q) {
				if in == "place" {
					return fmt.Errorf("engine: law %s: question %s reads place: a wearing law may not hang on it", u.ID(), q)
				}
			}
		}
	}
	return nil
}
