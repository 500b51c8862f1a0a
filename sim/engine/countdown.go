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

// head is the first entry of a clock that still counts: how far the reading
// has to go to take it, and the clock's reading and rate.
type head struct {
	left, rate   float64
	reading      float64
	slope, rate0 float64
	id           uint32
	place, cause uint8 // what a plain hit does
	special      bool  // a hit may do something else
	keys         []float64
	ids          []uint32
	pos          int // of the head
}

// advance drops entries of objects no longer bound.
func (h *head) advance(place []uint8) {
	for ; h.pos < len(h.ids); h.pos++ {
		if id := h.ids[h.pos]; place[id] == law.Bound {
			h.left, h.id = h.keys[h.pos]-h.reading, id
			return
		}
	}
	h.left, h.id = never, maxObjects
}

// heads takes the clocks as they stand.
func (w *Workspace) heads(heads *[maxClocks]head) []head {
	m, e := w.m, w.env
	for k := range m.Clocks {
		q, clock, h := &w.clocks[k], &m.Clocks[k], &heads[k]
		*h = head{reading: w.reading[k], rate: e.Rates[k], rate0: e.rate0[k], keys: q.keys, ids: q.ids, pos: q.pos,
			place: placeGone, cause: clock.cause, special: clock.Fate == law.FateCentral || w.c.turned != nil}
		if clock.Fate == law.FateAdrift {
			h.place = law.Adrift
		}
		if len(m.declared) > 0 {
			h.slope = e.slope[k][0]
		}
		h.advance(w.c.place)
	}
	return heads[:len(m.Clocks)]
}

// countWindow takes hits until the rates must be asked again (more), or until
// no hit comes before a limit.
func (w *Workspace) countWindow() (more bool, err error) {
	c, e := &w.c, w.env
	var memory [maxClocks]head
	heads := w.heads(&memory)
	place, leave, left := c.place[:c.n], c.leave[:c.n], c.left[:c.n]
	declared := len(w.m.declared) > 0
	date, weight, bound := w.base, w.m.Weight, w.bound
	limit, _ := w.limits(never)
	number0 := weight * float64(bound)
	if declared {
		number0 = e.base[0]
	}
	for bound > 0 {
		first, step := -1, never
		for k := range heads {
			if d := heads[k].left / heads[k].rate; d < step {
				first, step = k, d
			}
		}
		if first < 0 || date+step > limit {
			break
		}
		date += step
		for k := range heads {
			h := &heads[k]
			by := h.rate * step
			h.left -= by
			h.reading += by
		}
		hit := &heads[first]
		i := hit.id
		bound--
		leave[i] = date
		if hit.special {
			place[i], left[i] = w.hitBound(first, i, date)
		} else {
			place[i], left[i] = hit.place, hit.cause
		}
		for k := range heads {
			if h := &heads[k]; h.id == i {
				h.pos++
				h.advance(place)
			}
		}
		number := weight * float64(bound)
		if bound < fewObjects || declared && number0-number > moveToRefresh*number0 {
			more = true
			break
		}
		if declared {
			x := lnNear((number - number0) / number0)
			for k := range heads {
				heads[k].rate = heads[k].rate0 * expNear(heads[k].slope*x)
			}
		}
	}
	w.events += int64(w.bound - bound)
	w.bound, w.t, w.base = bound, max(w.t, date), date
	e.value[slotNumber], e.lost[slotNumber] = weight*float64(bound), 0
	for k := range heads {
		w.reading[k], e.Rates[k], w.clocks[k].pos = heads[k].reading, heads[k].rate, heads[k].pos
	}
	return more, nil
}

// hitBound tells where a hit takes an object, and why, and feeds the hole at
// the centre.
func (w *Workspace) hitBound(k int, i uint32, date float64) (place, cause uint8) {
	clock := &w.m.Clocks[k]
	fate := clock.Fate
	cause = clock.cause
	if w.c.turned != nil && w.c.turned[i]&(2<<(2*k)) != 0 {
		fate, cause = law.FateCentral, w.diverted(k)
	}
	switch fate {
	case law.FateAdrift:
		return law.Adrift, cause
	case law.FateCentral:
		mass := w.m.Weight * w.c.mass1[i]
		w.env.add(slotCentral, mass)
		w.central.swallow(w, date, mass)
		return law.Central, cause
	}
	return placeGone, cause
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
