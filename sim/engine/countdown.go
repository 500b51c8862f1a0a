package engine

import (
	"context"

	"wane/sim/law"
)

// countdown takes hits one by one in a galaxy whose rates hang on the number
// bound alone, where nothing but hits can happen. It must do what loop does; it
// knows what loop has to find out: that the only value to change is a count,
// and that a head of a clock stays its head until its object leaves.
func (w *Workspace) countdown(ctx context.Context) error {
	for w.bound > 0 {
		more, err := w.countWindow()
		if err != nil || !more {
			return err
		}
		if w.bound == 0 {
			return nil
		}
		if err := w.refresh(w.t); err != nil || w.env.Stop {
			return err
		}
		if err := ctx.Err(); err != nil {
			return err
		}
		w.checked = w.env.Refreshes
		if err := w.proveBounds(); err != nil {
			return err
		}
		w.grow()
	}
	return nil
}

// head is the first entry of a clock that still counts, and the clock's
// reading and rate.
type head struct {
	key, reading, rate float64
	id                 uint32
	slope, rate0       float64
	keys               []float64
	ids                []uint32
	pos                int // of the head
}

// advance drops entries of objects no longer bound.
func (h *head) advance(place []uint8) {
	for ; h.pos < len(h.ids); h.pos++ {
		if id := h.ids[h.pos]; place[id] == law.Bound {
			h.key, h.id = h.keys[h.pos], id
			return
		}
	}
	h.key, h.id = never, maxObjects
}

// countWindow takes hits until the rates must be asked again (more), or until
// no hit comes before a limit.
func (w *Workspace) countWindow() (more bool, err error) {
	m, c, e := w.m, &w.c, w.env
	n := len(m.Clocks)
	var heads [maxClocks]head
	place, leave, left := c.place[:c.n], c.leave[:c.n], c.left[:c.n]
	declared := len(m.declared) > 0
	for k := range n {
		q := &w.clocks[k]
		h := &heads[k]
		*h = head{reading: w.reading[k], rate: e.Rates[k], rate0: e.rate0[k], keys: q.keys, ids: q.ids, pos: q.pos}
		if declared {
			h.slope = e.slope[k][0]
		}
		h.advance(place)
	}
	base, weight, bound := w.base, m.Weight, w.bound
	limit, _ := w.limits(never)
	number0 := weight * float64(bound)
	if declared {
		number0 = e.base[0]
	}
	for bound > 0 {
		first, date := -1, never
		for k := range heads[:n] {
			h := &heads[k]
			if d := base + (h.key-h.reading)/h.rate; d < date {
				first, date = k, d
			}
		}
		if first < 0 || date > limit {
			break
		}
		step := date - base
		for k := range heads[:n] {
			heads[k].reading += heads[k].rate * step
		}
		base = date
		i := heads[first].id
		bound--
		w.hitBound(first, i, date)
		leave[i] = date
		left[i] = w.lastCause
		for k := range heads[:n] {
			if heads[k].id == i {
				heads[k].pos++
				heads[k].advance(place)
			}
		}
		number := weight * float64(bound)
		if bound < fewObjects || declared && number0-number > moveToRefresh*number0 {
			more = true
			break
		}
		if declared {
			x := lnNear((number - number0) / number0)
			for k := range heads[:n] {
				heads[k].rate = heads[k].rate0 * expNear(heads[k].slope*x)
			}
		}
	}
	w.events += int64(w.bound - bound)
	w.bound, w.t, w.base = bound, max(w.t, base), base
	e.value[slotNumber], e.lost[slotNumber] = weight*float64(bound), 0
	for k := range n {
		w.reading[k], e.Rates[k], w.clocks[k].pos = heads[k].reading, heads[k].rate, heads[k].pos
	}
	return more, nil
}

// hitBound sends an object where a clock's hit takes it, and leaves the cause
// in lastCause.
func (w *Workspace) hitBound(k int, i uint32, date float64) {
	c, clock := &w.c, &w.m.Clocks[k]
	fate := clock.Fate
	w.lastCause = clock.cause
	if c.turned != nil && c.turned[i]&(2<<(2*k)) != 0 {
		fate, w.lastCause = law.FateCentral, w.diverted(k)
	}
	switch fate {
	case law.FateAdrift:
		c.place[i] = law.Adrift
	case law.FateCentral:
		c.place[i] = law.Central
		mass := w.m.Weight * c.mass1[i]
		w.env.add(slotCentral, mass)
		w.central.swallow(w, date, mass)
	default:
		c.place[i] = placeGone
	}
}

// countsDown tells whether countdown may take over: only hits can happen, in
// years, to objects in their second stage, and only the number bound matters.
func (w *Workspace) countsDown() bool {
	m := w.m
	if m.encounter != nil || m.deathsMatter || len(m.declared) > 1 || w.env.unit != 0 || w.awaiting > 0 || !w.compact {
		return false
	}
	if len(m.declared) == 1 && m.declared[0] != slotNumber {
		return false
	}
	_, scheduled := w.schedule.head()
	return !scheduled
}

// diverted is the cause of a hit that clock k's diverter takes.
func (w *Workspace) diverted(k int) uint8 {
	cause := w.m.Clocks[k].cause
	for _, d := range w.m.diverts {
		if d.clock == k {
			cause = d.cause
		}
	}
	return cause
}
