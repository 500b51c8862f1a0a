package engine

import (
	"context"

	"wane/sim/law"
)

// countdown takes hits one by one in a galaxy whose rates hang on the number
// bound alone, where nothing but hits can happen. It must do what loop does; it
// knows what loop has to find out: that the only value to change is a count,
// and that a head of a clock stays its head until its object leaves.
//
// While it runs, an object has left when left says why; place follows at the
// end. So a hit touches one list of bytes, not two.
func (w *Workspace) countdown(ctx context.Context) error {
	defer w.placeLeft()
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

// fewClocks is how many clocks countdown can merge: it has them in registers.
const fewClocks = 3

// head is the first entry of a clock that still counts.
type head struct {
	id          uint32
	cause       uint8
	special     bool // a hit may do more than take its object
	keys        []float64
	ids         []uint32
	pos         int // of the head
	rate, rate0 float64
	slope       float64
	reading     float64
	left        float64 // how far the clock has to go to the head
}

// advance goes on to the next entry of an object still bound and returns how
// far the clock has to go to it.
func (h *head) advance(left []uint8, reading float64) (toGo float64) {
	for h.pos++; h.pos < len(h.ids); h.pos++ {
		if id := h.ids[h.pos]; left[id] == 0 {
			h.id = id
			return h.keys[h.pos] - reading
		}
	}
	h.id = maxObjects
	return never
}

// heads takes the clocks as they stand; those the run lacks never hit.
func (w *Workspace) heads() (heads [fewClocks]head) {
	m, e := w.m, w.env
	for k := range heads {
		h := &heads[k]
		*h = head{left: never, rate: 1, rate0: 1, id: maxObjects}
		if k >= len(m.Clocks) {
			continue
		}
		q, clock := &w.clocks[k], &m.Clocks[k]
		h.keys, h.ids, h.pos = q.keys, q.ids, q.pos-1
		h.rate, h.rate0 = e.Rates[k], e.rate0[k]
		h.cause, h.special = clock.cause, clock.Fate == law.FateCentral || w.c.turned != nil
		if len(m.declared) > 0 {
			h.slope = e.slope[k][0]
		}
		h.reading = w.reading[k]
		h.left = h.advance(w.c.left, h.reading)
	}
	return heads
}

// rates prepares the rates of the coming window.
func (w *Workspace) rates(heads *[fewClocks]head, number float64) *countRates {
	if w.ahead == nil {
		w.ahead = &countRates{series: nearNumbers}
	}
	c := w.ahead
	c.weight, c.number = w.m.Weight, number
	for k := range heads {
		c.rate0[k], c.slope[k] = heads[k].rate0, heads[k].slope
	}
	return c
}

// countWindow takes hits until the rates must be asked again (more), or until
// no hit comes before a limit.
func (w *Workspace) countWindow() (more bool, err error) {
	c, e := &w.c, w.env
	heads := w.heads()
	h0, h1, h2 := &heads[0], &heads[1], &heads[2]
	left0, left1, left2 := h0.left, h1.left, h2.left
	rate0, rate1, rate2 := h0.rate, h1.rate, h2.rate
	reading0, reading1, reading2 := h0.reading, h1.reading, h2.reading
	leave, left := c.leave[:c.n], c.left[:c.n]
	declared := len(w.m.declared) > 0
	date, weight, bound := w.base, w.m.Weight, w.bound
	limit, _ := w.limits(never)
	number0 := weight * float64(bound)
	if declared {
		number0 = e.base[0]
	}
	rates := w.rates(&heads, number0)
	slow0, slow1, slow2 := 1/rate0, 1/rate1, 1/rate2
	ahead, filled := 0, 0 // how far into the block of rates
	for bound > 0 {
		hit, first, step := h0, 0, left0*slow0
		if d := left1 * slow1; d < step {
			hit, first, step = h1, 1, d
		}
		if d := left2 * slow2; d < step {
			hit, first, step = h2, 2, d
		}
		if !(date+step <= limit) || step == never {
			break
		}
		date += step
		by0, by1, by2 := rate0*step, rate1*step, rate2*step
		left0, reading0 = left0-by0, reading0+by0
		left1, reading1 = left1-by1, reading1+by1
		left2, reading2 = left2-by2, reading2+by2
		i := hit.id
		bound--
		leave[i] = date
		if hit.special {
			left[i] = w.hitBound(first, i, date)
		} else {
			left[i] = hit.cause
		}
		if h0.id == i {
			left0 = h0.advance(left, reading0)
		}
		if h1.id == i {
			left1 = h1.advance(left, reading1)
		}
		if h2.id == i {
			left2 = h2.advance(left, reading2)
		}
		if bound < fewObjects || declared && number0-weight*float64(bound) > moveToRefresh*number0 {
			more = true
			break
		}
		if declared {
			if ahead == filled {
				ahead, filled = 0, rates.fill(bound, int(moveToRefresh*float64(bound))+2)
			}
			a := ahead % rateBlock // no bounds to check
			rate0, slow0 = rates.rate[0][a], rates.slow[0][a]
			rate1, slow1 = rates.rate[1][a], rates.slow[1][a]
			rate2, slow2 = rates.rate[2][a], rates.slow[2][a]
			ahead++
		}
	}
	w.events += int64(w.bound - bound)
	w.bound, w.t, w.base = bound, max(w.t, date), date
	e.value[slotNumber], e.lost[slotNumber] = weight*float64(bound), 0
	for k, now := range [fewClocks]struct{ reading, rate float64 }{{reading0, rate0}, {reading1, rate1}, {reading2, rate2}} {
		if k < len(w.m.Clocks) {
			w.reading[k], e.Rates[k], w.clocks[k].pos = now.reading, now.rate, heads[k].pos
		}
	}
	return more, nil
}

// hitBound tells why a hit takes an object, and feeds the hole at the centre.
func (w *Workspace) hitBound(k int, i uint32, date float64) (cause uint8) {
	fate, cause := w.m.Clocks[k].Fate, w.m.Clocks[k].cause
	if w.c.turned != nil && w.c.turned[i]&(2<<(2*k)) != 0 {
		fate, cause = law.FateCentral, w.diverted(k)
	}
	if fate == law.FateCentral {
		mass := w.m.Weight * w.c.mass1[i]
		w.env.add(slotCentral, mass)
		w.central.swallow(w, date, mass)
	}
	return cause
}

// placeLeft puts those that the countdown took where their cause sends them.
func (w *Workspace) placeLeft() {
	var to [256]uint8
	for _, clock := range w.m.Clocks {
		switch clock.Fate {
		case law.FateAdrift:
			to[clock.cause] = law.Adrift
		case law.FateCentral:
			to[clock.cause] = law.Central
		default:
			to[clock.cause] = placeGone
		}
	}
	for _, d := range w.m.diverts {
		to[d.cause] = law.Central
	}
	for i, cause := range w.c.left[:w.c.n] {
		if cause != 0 && w.c.place[i] == law.Bound {
			w.c.place[i] = to[cause]
		}
	}
}

// countsDown tells whether countdown may take over: only hits can happen, in
// years, to objects in their second stage, and only the number bound matters.
func (w *Workspace) countsDown() bool {
	m := w.m
	if len(m.Clocks) > fewClocks || !m.oneFate || m.encounter != nil || m.deathsMatter || len(m.declared) > 1 || w.env.unit != 0 || w.awaiting > 0 || !w.compact {
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
