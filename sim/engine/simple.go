package engine

import "wane/sim/law"

// simpleEnds tells whether every prospect comes from one wearing law with a
// foretell: no turning, and no two laws wear one kind.
func (m *Model) simpleEnds() bool { return m.simple }

func (m *Model) compileSimple() {
	m.simple = len(m.turning) == 0
	by := make([]int, len(m.Set.Kinds))
	for _, u := range m.wearing {
		for k := range m.Set.Kinds {
			if any, _ := u.SpeaksForKind(uint8(k)); any {
				by[k]++
				m.simple = m.simple && by[k] == 1 && u.Card.Answers("foretell")
			}
		}
	}
}

// simpleProspects is prospects for a run of simple ends, straight into the
// columns.
func (a *asker) simpleProspects(c *columns, r *rows, since func(int) float64) error {
	first := int(r.first)
	end, ended := c.end[first:first+r.n], c.ended[first:first+r.n]
	fill(end, never)
	clear(ended)
	a.linked = a.linked[:0]
	for w, u := range a.m.wearing {
		s, pick := a.spoken(u, r)
		if s.n == 0 {
			continue
		}
		if err := a.wearBoundOf(c, u, s, pick, since); err != nil {
			return err
		}
		s, pick = a.above(w, r, s, pick, func(j int, t *threshold) {
			end[j], ended[j] = since(j), t.cause
			if t.kind != law.NoWord {
				a.linked = append(a.linked, int32(j))
				a.links = append(a.links[:len(a.linked)-1], prospect{date: end[j], mass: r.mass[j], cause: t.cause, kind: t.kind})
			}
		})
		if s.n == 0 {
			continue
		}
		starts, err := a.starts(u, s, pick, since)
		if err != nil {
			return err
		}
		out, err := a.ask(u, "foretell", s, drawU)
		if err != nil {
			return err
		}
		thresholds := a.m.thresholds[w]
		for i, wait := range out.Columns[0].Values {
			t := &thresholds[s.kind[i]]
			if !t.applies || wait == never {
				continue
			}
			j := at(pick, i)
			switch {
			case starts != nil:
				wait = later(starts[i], wait)
			case wait < a.latest+unseen:
				wait = later(since(j), wait)
			}
			end[j], ended[j] = wait, t.cause
			if t.kind != law.NoWord {
				a.linked = append(a.linked, int32(j))
				a.links = append(a.links[:len(a.linked)-1], prospect{date: wait, mass: min(t.mass, s.mass[i]), cause: t.cause, kind: t.kind})
			}
		}
	}
	if len(a.linked) == 0 {
		return nil
	}
	few := newRows(len(a.linked))
	few.gather(r, a.linked, hasAll)
	return a.chains(few, append([]prospect(nil), a.links...), func(i int) uint32 { return few.id[i] }, c)
}
