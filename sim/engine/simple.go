package engine

import "wane/sim/law"

// simpleEnds tells whether every prospect comes from one wearing law with a
// foretell: no two laws wear one kind. Turning laws are then asked only about
// what wearing leaves them.
func (m *Model) simpleEnds() bool { return m.simple }

func (m *Model) compileSimple() {
	m.simple = true
	for k := range m.wornBy {
		m.wornBy[k] = -1
	}
	for w, u := range m.wearing {
		for k := range m.Set.Kinds {
			if any, all := u.SpeaksForKind(uint8(k)); any {
				m.simple = m.simple && m.wornBy[k] < 0 && u.Card.Answers("foretell")
				m.wornBy[k] = int8(w)
				m.wornInPart = m.wornInPart || !all
			}
		}
	}
}

// compileTurning finds out how soon turning may come at all.
func (m *Model) compileTurning() {
	for k := range m.turns {
		m.turns[k] = never
	}
	for _, u := range m.turning {
		soonest := -never
		if d, ok := u.Law.(law.Distant); ok {
			soonest = d.Soonest()
		}
		m.soonest = append(m.soonest, soonest)
		for k := range m.Set.Kinds {
			if any, _ := u.SpeaksForKind(uint8(k)); any {
				m.turns[k] = min(m.turns[k], soonest)
			}
		}
	}
}

// partition sorts the rows by the wearing law that speaks for them.
func (a *asker) partition(r *rows) {
	a.parts = grown(a.parts, len(a.m.wearing))
	for w := range a.parts {
		a.parts[w] = grown(a.parts[w], r.n)
	}
	// Long runs of rows go to one part: it is held while a run lasts.
	var sizes [256]int
	var part []int32
	now, n := 0, 0
	for i, k := range r.kind[:r.n] {
		w := int(a.m.wornBy[k])
		if w < 0 || a.m.wornInPart && !a.m.wearing[w].Speaks(k, r.mass[i], r.metals[i]) {
			continue
		}
		if part == nil || w != now {
			sizes[now] = n
			now, n, part = w, sizes[w], a.parts[w]
		}
		part[n] = int32(i)
		n++
	}
	sizes[now] = n
	for w := range a.parts {
		a.parts[w] = a.parts[w][:sizes[w]]
	}
}

// part is the rows of the wearing law w, after partition.
func (a *asker) part(w int, r *rows) (*rows, []int32) {
	if len(a.parts[w]) == r.n {
		return r, nil
	}
	a.sub.gather(r, a.parts[w], a.m.voices[a.m.wearing[w]].reads)
	return a.sub, a.parts[w]
}

// simpleProspects is prospects for a run of simple ends, straight into the
// columns.
func (a *asker) simpleProspects(c *columns, r *rows, since func(int) float64) error {
	first := int(r.first)
	end, ended := c.end[first:first+r.n], c.ended[first:first+r.n]
	fill(end, never)
	clear(ended)
	a.linked = a.linked[:0]
	a.partition(r)
	for w, u := range a.m.wearing {
		s, pick := a.part(w, r)
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
	if err := a.simpleTurns(c, r, since); err != nil || len(a.linked) == 0 {
		return err
	}
	few := newRows(len(a.linked))
	few.gather(r, a.linked, hasAll)
	return a.chains(few, append([]prospect(nil), a.links...), func(i int) uint32 { return few.id[i] }, c)
}

// simpleTurns asks turning laws about the rows that wearing has not ended
// before any of them may act, and puts what comes first in its place.
func (a *asker) simpleTurns(c *columns, r *rows, since func(int) float64) error {
	if len(a.m.turning) == 0 {
		return nil
	}
	first := int(r.first)
	end, ended := c.end[first:first+r.n], c.ended[first:first+r.n]
	var late []int32
	for i, k := range r.kind[:r.n] {
		if end[i] > a.m.turns[k] {
			late = append(late, int32(i))
		}
	}
	if len(late) == 0 {
		return nil
	}
	left := newRows(len(late))
	left.gather(r, late, hasAll)
	ps, err := a.prospects(left, func(i int) float64 { return since(int(late[i])) })
	if err != nil {
		return err
	}
	// What wearing has in store for the others stays.
	kept := 0
	for i, j := range a.linked {
		if end[j] > a.m.turns[r.kind[j]] {
			continue
		}
		a.linked[kept], a.links[kept] = j, a.links[i]
		kept++
	}
	a.linked, a.links = a.linked[:kept], a.links[:kept]
	for i, p := range ps {
		j := late[i]
		end[j], ended[j] = p.date, p.cause
		c.noteGas(left.id[i], 0, p)
		if p.cause != 0 && p.kind != law.NoWord {
			a.linked, a.links = append(a.linked, j), append(a.links, p)
		}
	}
	return nil
}
