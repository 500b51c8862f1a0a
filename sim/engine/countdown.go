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
	m, c, e := w.m, &w.c, w.env
	n := len(m.Clocks)
	weight := m.Weight
	base := w.base
	var reading, rate, slope, rate0 [maxClocks]float64
	var key [maxClocks]float64
	var id [maxClocks]uint32
	load := func() {
		base = w.base
		for k := range n {
			reading[k], rate[k], rate0[k] = w.reading[k], e.Rates[k], e.rate0[k]
			slope[k] = 0
			if len(m.declared) > 0 {
				slope[k] = e.slope[k][0]
			}
			key[k], id[k] = w.clocks[k].next(c.place)
		}
	}
	// unload gives the heads back to the clocks.
	unload := func() {
		for k := range n {
			if key[k] < never {
				w.clocks[k].pos--
			}
		}
		copy(w.reading, reading[:n])
	}
	load()
	var limit float64
	limit, _ = w.limits(never)
	number0 := e.value[slotNumber]
	if len(m.declared) > 0 {
		number0 = e.base[0]
	}
	for w.bound > 0 {
		first, date := -1, never
		for k := range n {
			if d := base + (key[k]-reading[k])/rate[k]; d < date {
				first, date = k, d
			}
		}
		if first < 0 || date > limit {
			break
		}
		i := id[first]
		for k := range n {
			reading[k] += rate[k] * (date - base)
		}
		base = date
		w.events++
		clock := &m.Clocks[first]
		fate, cause := clock.Fate, clock.cause
		if turned := c.turned[i]; turned != 0 && turned&(2<<(2*first)) != 0 {
			fate, cause = law.FateCentral, w.diverted(first)
		}
		w.bound--
		c.leave[i], c.left[i] = date, cause
		switch fate {
		case law.FateAdrift:
			c.place[i] = law.Adrift
		case law.FateCentral:
			c.place[i] = law.Central
			w.t = date
			e.add(slotCentral, weight*c.mass1[i])
			w.central.swallow(w, date, weight*c.mass1[i])
		default:
			c.place[i] = placeGone
		}
		for k := range n {
			if id[k] == i {
				key[k], id[k] = w.clocks[k].next(c.place)
			}
		}
		number := weight * float64(w.bound)
		e.value[slotNumber], e.lost[slotNumber] = number, 0
		x := (number - number0) / number0
		if w.bound < fewObjects || x < -moveToRefresh {
			w.t, w.base = date, base
			unload()
			if err := w.countdownRefresh(ctx); err != nil || e.Stop {
				return err
			}
			load()
			limit, _ = w.limits(never)
			if len(m.declared) > 0 {
				number0 = e.base[0]
			}
			continue
		}
		if len(m.declared) > 0 {
			x = lnNear(x)
			for k := range n {
				rate[k] = rate0[k] * expNear(slope[k]*x)
			}
		}
	}
	w.t, w.base = max(w.t, base), base
	unload()
	copy(e.Rates, rate[:n])
	return nil
}

func (w *Workspace) countdownRefresh(ctx context.Context) error {
	if w.bound == 0 {
		return nil
	}
	if err := w.refresh(w.t); err != nil {
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
	return nil
}

// countsDown tells whether countdown may take over: only hits can happen, in
// years, and only the number bound matters.
func (w *Workspace) countsDown() bool {
	m := w.m
	if m.encounter != nil || m.deathsMatter || len(m.declared) > 1 || w.env.unit != 0 || w.awaiting > 0 || w.compact == false {
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
