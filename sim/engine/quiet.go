package engine

import (
	"context"

	"wane/sim/law"
)

// quietLeg runs to the death of the last star, or to where a clock could reach
// an object that was left out, with only the active objects on the clocks.
func (w *Workspace) quietLeg(ctx context.Context) error {
	m, c := w.m, &w.c
	w.quiet = true
	w.schedule.reset()
	for k := range w.clocks {
		w.clocks[k].reset()
	}
	for _, i := range w.active {
		w.schedule.put(c.birth[i], i|eventBirth)
		w.scheduleDeath(i, w.schedule.put)
	}
	if m.deathsMatter {
		next := 0
		for i := range uint32(c.n) {
			if next < len(w.active) && w.active[next] == i {
				next++
				continue
			}
			w.scheduleDeath(i, w.schedule.put)
		}
	}
	w.schedule.sort(&w.sorter)
	if len(w.isActive) < c.n {
		w.isActive = make([]bool, c.n)
	}
	clear(w.isActive)
	for _, i := range w.active {
		w.isActive[i] = true
	}
	if err := w.loop(ctx, c.lastDeath); err != nil {
		return err
	}
	t := w.t
	if err := w.settle(t); err != nil {
		return err
	}
	// What is still to come of the schedule, for all.
	w.schedule.reset()
	if t < c.lastDeath && w.compact {
		// Now they are needed after all.
		w.compact = false
		if err := w.exposeAll(); err != nil {
			return err
		}
	}
	if t < c.lastDeath || m.encounter != nil {
		for i := range uint32(c.n) {
			if c.place[i] != law.Bound {
				continue
			}
			if w.stage[i] == 0 {
				w.schedule.put(c.birth[i], i|eventBirth)
			}
			if w.stage[i] <= 1 {
				w.scheduleDeath(i, w.schedule.put)
			}
		}
		w.schedule.sort(&w.sorter)
	}
	return nil
}
