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

// linear is 10^L yr in the present unit of time.
func (w *Workspace) linear(l float64) float64 {
	if l-w.env.unit > 308 {
		return never
	}
	return num.Exp10(l - w.env.unit)
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

// What may interrupt the events.
const (
	atLegEnd = iota
	atHorizon
	atAdrift
	atWindow
	atEnds
	atWear
)

func (w *Workspace) limits(legEnd float64) (float64, int) {
	limit, what := w.horizon, atHorizon
	for _, x := range [...]struct {
		at   float64
		what int
	}{{w.adriftAt, atAdrift}, {w.windowAt, atWindow}, {w.endAt, atEnds}, {w.wear.at, atWear}, {legEnd, atLegEnd}} {
		if x.at < limit {
			limit, what = x.at, x.what
		}
	}
	if w.quiet {
		if what == atEnds || what == atWear {
			what = atLegEnd // they are for all objects
		}
		for k, r := range w.env.Rates {
			if r > 0 {
				if d := w.base + (w.caps[k]-w.reading[k])/r; d < limit {
					limit, what = d, atLegEnd
				}
			}
		}
	}
	return limit, what
}

// reached handles a limit; done ends the loop.
func (w *Workspace) reached(what int) (done bool, err error) {
	switch what {
	case atHorizon:
		return true, w.close()
	case atAdrift:
		w.adriftAt = never
		return true, w.castOff(law.FateAdrift, w.m.allAdrift)
	case atWindow:
		w.rebase(w.t)
		return false, w.refresh(w.t)
	case atEnds:
		w.endAt = never
		return false, w.scheduleEnds()
	case atWear:
		return false, w.wearDown()
	}
	w.rebase(w.t)
	return true, nil
}

// stop ends the dynamics because the ejection law says so.
func (w *Workspace) stop() error {
	w.stoppedAt = w.logNow()
	return w.castOff(w.m.stopFate, w.m.stopCause)
}

// castOff takes everything still bound out of the galaxy at once.
func (w *Workspace) castOff(fate law.Fate, cause uint8) error {
	if w.awaiting > 0 {
		if err := w.refresh(w.t); err != nil {
			return err
		}
	}
	if err := w.settle(w.t); err != nil {
		return err
	}
	for i := range uint32(w.c.n) {
		if w.c.place[i] == law.Bound {
			w.remove(i, w.t, fate, cause)
		}
	}
	return nil
}

// scheduleEnds puts the prospects of all bound objects on the schedule; from
// then on each object's next prospect goes there as it enters a stage.
func (w *Workspace) scheduleEnds() error {
	w.endsScheduled = true
	for i := range uint32(w.c.n) {
		if w.c.place[i] == law.Bound && w.stageOf(i) >= 2 {
			w.scheduleEnd(i)
		}
	}
	return nil
}

func (w *Workspace) scheduleEnd(i uint32) {
	if !w.endsScheduled {
		return
	}
	if t := w.linear(w.endOf(i)); t < never {
		w.schedule.push(t, i|eventEnd)
	}
}

// endOf is the log10 date at which the present stage (from the second on) ends.
func (w *Workspace) endOf(i uint32) float64 {
	if s := w.stageOf(i); s > 2 {
		return w.c.chain[i][s-3].end
	}
	return w.c.end[i]
}

func (w *Workspace) logNow() float64 { return num.Log10(w.t) + w.env.unit }

// grow changes the unit of time before dates overflow.
func (w *Workspace) grow() {
	const step = 150
	for w.t > 1e150 {
		f := num.Exp10(-step)
		w.env.unit += step
		for _, x := range []*float64{&w.t, &w.base, &w.windowAt} {
			*x *= f
		}
		for k := range w.env.Rates {
			w.env.Rates[k] *= num.Exp10(step)
			w.env.rate0[k] *= num.Exp10(step)
		}
		w.central.grown *= f
		w.reschedule()
		w.meets.scale(f)
		w.wear.scale(f)
		w.relimit()
	}
}

// reschedule puts everything still to come on the schedule anew, in the present
// unit of time.
func (w *Workspace) reschedule() {
	w.schedule.reset()
	for i := range uint32(w.c.n) {
		if w.c.place[i] != law.Bound || w.stage[i]&waiting != 0 {
			continue
		}
		if w.stage[i] == 0 {
			w.schedule.push(w.years(w.c.birth[i]), i|eventBirth)
		}
		if w.stage[i] <= 1 {
			w.scheduleDeath(i, w.schedule.push)
		} else {
			w.scheduleEnd(i)
		}
	}
}

// relimit computes anew the limits that are fixed dates.
func (w *Workspace) relimit() {
	w.horizon = w.linear(w.m.Until)
	if w.sky != nil {
		end, _ := w.sky.End()
		w.horizon = min(w.horizon, w.linear(end))
		if w.adriftAt < never || w.adriftPending {
			w.adriftAt = w.linear(w.sky.Adrift())
		}
	}
	if len(w.wear.known) == 0 {
		w.wear.at = w.linear(w.c.wearAt)
	}
	if !w.endsScheduled {
		w.endAt = never
		for i := range uint32(w.c.n) {
			if w.c.place[i] == law.Bound {
				w.endAt = min(w.endAt, w.linear(w.endOf(i)))
			}
		}
	}
}
