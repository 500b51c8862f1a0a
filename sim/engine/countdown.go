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
//
// One clock leads: the one whose head comes first. Of the others it is enough
// to know a date before which none can hit, from the fastest they can run in
// this window; they are brought up to date when that comes, or at the end.
func (w *Workspace) countWindow() (more bool, err error) {
	c, e := &w.c, w.env
	var memory [maxClocks]head
	heads := w.heads(&memory)
	lag := lagging{heads: heads, steps: w.lag.steps[:0], logs: w.lag.logs[:0], lead: -1}
	place, leave, left := c.place[:c.n], c.leave[:c.n], c.left[:c.n]
	declared := len(w.m.declared) > 0
	date, weight, bound := w.base, w.m.Weight, w.bound
	limit, _ := w.limits(never)
	number0 := weight * float64(bound)
	if declared {
		number0 = e.base[0]
	}
	log := 0.0
	if declared {
		log = lnNear((weight*float64(bound) - number0) / number0)
	}
	var lead *head
	for bound > 0 {
		if lead == nil {
			if lead = lag.choose(date, declared); lead == nil {
				break
			}
		}
		step := lead.left / lead.rate
		if next := date + step; next > limit {
			break
		} else if next >= lag.safe {
			if lag.catchUp(log); !lag.leads() {
				lead = nil
				continue
			}
			lag.look(date, declared)
			if next >= lag.safe { // close behind, yet later
				lag.safe = next
			}
		}
		date += step
		lead.reading += lead.rate * step
		lag.steps, lag.logs = append(lag.steps, step), append(lag.logs, log)
		i := lead.id
		bound--
		leave[i] = date
		if lead.special {
			place[i], left[i] = w.hitBound(lag.lead, i, date)
		} else {
			place[i], left[i] = lead.place, lead.cause
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
			log = lnNear((number - number0) / number0)
			lead.rate = lead.rate0 * expNear(lead.slope*log)
		}
		if lead.left >= never {
			lag.catchUp(log)
			lead = nil
		}
	}
	lag.catchUp(log)
	w.lag = lag
	w.events += int64(w.bound - bound)
	w.bound, w.t, w.base = bound, max(w.t, date), date
	e.value[slotNumber], e.lost[slotNumber] = weight*float64(bound), 0
	for k := range heads {
		w.reading[k], e.Rates[k], w.clocks[k].pos = heads[k].reading, heads[k].rate, heads[k].pos
	}
	return more, nil
}

// lagging is the clocks of a window: one leads, the rest are some steps behind.
type lagging struct {
	heads []head
	lead  int
	safe  float64   // date before which no other clock hits
	steps []float64 // that the lead has taken since, and
	logs  []float64 // ln of the number bound, over that at the refresh, in each
}

// choose makes the clock that hits first the lead; all are up to date.
func (l *lagging) choose(date float64, declared bool) *head {
	l.lead = l.first()
	if l.lead < 0 {
		return nil
	}
	l.look(date, declared)
	return &l.heads[l.lead]
}

func (l *lagging) first() int {
	first, soonest := -1, never
	for k := range l.heads {
		if d := l.heads[k].left / l.heads[k].rate; d < soonest {
			first, soonest = k, d
		}
	}
	return first
}

// leads tells whether the lead still hits first; all are up to date.
func (l *lagging) leads() bool { return l.first() == l.lead }

// look sets the date before which no other clock hits.
func (l *lagging) look(date float64, declared bool) {
	l.safe = never
	for k := range l.heads {
		h := &l.heads[k]
		if k == l.lead {
			continue
		}
		fastest := h.rate
		if declared && h.slope < 0 {
			// It runs faster as the number falls, by 1 % at most.
			fastest = h.rate0 * expNear(h.slope*lnNear(-1.01*moveToRefresh)) * (1 + 1e-9)
		}
		if d := date + h.left/fastest; d < l.safe {
			l.safe = d
		}
	}
}

// catchUp brings all clocks to the last step, and their rates to the number
// bound now.
func (l *lagging) catchUp(log float64) {
	for k := range l.heads {
		h := &l.heads[k]
		if k == l.lead || l.lead < 0 {
			continue
		}
		reading, left, rate := h.reading, h.left, h.rate
		for e, step := range l.steps {
			if h.slope != 0 {
				rate = h.rate0 * expNear(h.slope*l.logs[e])
			}
			by := rate * step
			left -= by
			reading += by
		}
		if h.slope != 0 {
			rate = h.rate0 * expNear(h.slope*log)
		}
		h.reading, h.left, h.rate = reading, left, rate
	}
	l.steps, l.logs = l.steps[:0], l.logs[:0]
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
