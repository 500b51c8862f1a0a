package engine

import (
	"context"

	"wane/sim/law"
	"wane/sim/num"
)

// Kinds of scheduled events, in the top bits of a schedule entry's id.
const (
	eventBirth = iota << idBits
	eventDeath
	eventEnd
	idBits = 26
	idMask = 1<<idBits - 1
)

// dynamics runs the bound galaxy until nothing is bound, nothing more can
// happen, or the run or the sky ends.
func (w *Workspace) dynamics(ctx context.Context) error {
	m, c := w.m, &w.c
	if c.n == 0 {
		return nil
	}
	w.compact = m.compactable() && c.chain == nil
	w.endsScheduled = false
	w.endAt, w.wear.at = never, w.linear(c.wearAt)
	for _, l := range c.end {
		if l < w.endAt {
			w.endAt = l
		}
	}
	w.endAt = w.linear(w.endAt)
	clear(w.few)
	if err := w.exposeAll(); err != nil {
		return err
	}
	w.quiet = false
	w.past.begin(len(m.Clocks))
	if err := w.refresh(0); err != nil {
		return err
	}
	w.past.note(w.base, w.reading, w.env.Rates)
	quiet, err := w.enterQuiet()
	if err != nil {
		return err
	}
	if quiet {
		if err := w.quietLeg(ctx); err != nil {
			return err
		}
	} else if err := w.prepare(); err != nil {
		return err
	}
	w.quiet = false
	if err := w.fillClocks(); err != nil {
		return err
	}
	if w.countsDown() {
		if err := w.countdown(ctx); err != nil {
			return err
		}
	}
	return w.loop(ctx, never)
}

// compactable: the rates hang on the number bound alone and nothing else needs
// the susceptibilities again, so they need not be held.
func (m *Model) compactable() bool {
	return !m.deathsMatter && m.encounter == nil
}

// prepare readies a leg in which every object is on the clocks.
func (w *Workspace) prepare() error {
	m, c := w.m, &w.c
	w.schedule.reset()
	if w.compact {
		// Now they are needed after all.
		w.compact = false
		if err := w.exposeAll(); err != nil {
			return err
		}
	}
	for first := 0; first < c.n; first += chunk {
		for k := range m.Clocks {
			w.drawExponentials(k, first, min(chunk, c.n-first))
		}
	}
	for i := range c.n {
		w.stage[i] = 0
		w.schedule.put(c.birth[i], uint32(i)|eventBirth)
	}
	for i := range c.n {
		w.scheduleDeath(uint32(i), w.schedule.put)
	}
	w.schedule.sort(&w.sorter)
	return nil
}

func (w *Workspace) scheduleDeath(i uint32, put func(float64, uint32)) {
	if w.c.died[i] == 0 {
		return
	}
	if t := w.years(w.c.death[i]); t < never {
		put(t, i|eventDeath)
	}
}

// loop takes events one by one until legEnd, or until a cap in a quiet leg.
func (w *Workspace) loop(ctx context.Context, legEnd float64) error {
	for {
		s, ok := w.schedule.head()
		if w.env.Stop && w.bound > 0 {
			w.t = max(w.t, w.central.since*num.Exp10(-w.env.unit)) // no earlier than the galaxy
			if !(ok && s.key <= w.t) {                             // what is due goes first
				return w.stop()
			}
		}
		if w.bound == 0 {
			return w.close()
		}
		k, id, date := w.nextHit()
		limit, what := w.limits(legEnd)
		switch {
		case ok && s.key <= date && s.key <= limit:
			w.schedule.pop()
			w.t = max(w.t, s.key)
			if err := w.scheduled(s, w.t); err != nil {
				return err
			}
		case date <= limit && date < never:
			w.t = max(w.t, date)
			w.clocks[k].pop()
			w.events++
			if err := w.fire(k, id, w.t); err != nil {
				return err
			}
		default:
			if limit == never {
				return w.close()
			}
			w.t = max(w.t, limit)
			done, err := w.reached(what)
			if err != nil || done {
				return err
			}
		}
		if w.env.Refreshes != w.checked {
			w.checked = w.env.Refreshes
			if err := ctx.Err(); err != nil {
				return err
			}
			if err := w.proveBounds(); err != nil {
				return err
			}
			w.grow()
		}
	}
}

// close brings in what still waits when nothing can fire any more.
func (w *Workspace) close() error {
	if w.awaiting > 0 {
		return w.refresh(w.t)
	}
	return nil
}

// nextHit finds the clock that fires next, whom it hits, and when.
func (w *Workspace) nextHit() (clock int, id uint32, date float64) {
	date = never
	for k := range w.clocks {
		q := &w.clocks[k]
		for {
			e, ok := q.head()
			if !ok {
				break
			}
			if w.c.place[e.id] != law.Bound || w.stage[e.id]&waiting != 0 || w.c.reading[k][e.id] != e.key {
				q.pop()
				continue
			}
			if r := w.env.Rates[k]; r > 0 {
				if d := w.base + (e.key-w.reading[k])/r; d < date {
					clock, id, date = k, e.id, d
				}
			}
			break
		}
	}
	return clock, id, date
}
