package engine

import (
	"wane/sim/law"
	"wane/sim/num"
)

// linear is 10^L yr in the present unit of time.
func (w *Workspace) linear(l float64) float64 {
	if l-w.env.unit > 308 {
		return never
	}
	return num.Exp10(l - w.env.unit)
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
