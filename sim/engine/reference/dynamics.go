package reference

import (
	"container/heap"

	"wane/sim/law"
	"wane/sim/num"
)

// Rules of the model.
const (
	few        = 100
	waitingMax = 0.01
	wearToStep = 0.01
	wearToJoin = 0.005
	wornAway   = 1e-3
)

// dynamics takes events one at a time.
func (g *run) dynamics() error {
	if g.bound == 0 {
		return nil
	}
	if err := g.refresh(); err != nil {
		return err
	}
	for {
		g.coarsen()
		due := g.nextDue()
		if g.env.Stop && g.bound > 0 {
			g.t = max(g.t, g.linear(g.first))
		}
		if g.env.Stop && g.bound > 0 && !(due <= g.t) {
			g.stoppedAt = g.log(g.t)
			return g.castOff(g.frame.Card.StopFate, Cause{g.frame.Card.Process, g.frame.Card.StopOutcome})
		}
		if g.bound == 0 {
			return g.close()
		}
		k, at := g.nextHit()
		horizon, adrift, wear := g.linear(g.horizon), g.linear(g.adriftAt), g.nextWear()
		limit := min(horizon, adrift, g.windowAt, wear)
		var err error
		switch {
		case due < never && due <= at && due <= limit:
			e := heap.Pop(&g.scheduled).(event)
			g.t = max(g.t, e.date)
			err = g.happen(e)
		case at < never && at <= limit:
			g.t = max(g.t, at)
			h := heap.Pop(&g.hits[k]).(hit)
			err = g.fire(k, h.o)
		case limit == never:
			return g.close()
		default:
			g.t = max(g.t, limit)
			switch limit {
			case horizon:
				return g.close()
			case adrift:
				return g.castOff(law.FateAdrift, Cause{"dark-energy-decay", "all-adrift"})
			case g.windowAt:
				g.rebase()
				err = g.refresh()
			default:
				err = g.wearStep()
			}
		}
		if err != nil {
			return err
		}
	}
}

func (g *run) nextDue() float64 {
	for len(g.scheduled) > 0 {
		if g.scheduled[0].holds() {
			return g.scheduled[0].date
		}
		heap.Pop(&g.scheduled)
	}
	return never
}

// nextHit finds the clock that takes an object first, and when.
func (g *run) nextHit() (clock int, date float64) {
	date = never
	for k := range g.clocks {
		h := &g.hits[k]
		for len(*h) > 0 && !((*h)[0].o.available() && (*h)[0].o.takes[k] == (*h)[0].reading) {
			heap.Pop(h)
		}
		if len(*h) > 0 && g.env.Rates[k] > 0 {
			if d := g.base + ((*h)[0].reading-g.reading[k])/g.env.Rates[k]; d < date {
				clock, date = k, d
			}
		}
	}
	return clock, date
}

func (g *run) readingAt(k int) float64 { return g.reading[k] + g.env.Rates[k]*(g.t-g.base) }

func (g *run) rebase() {
	for k := range g.reading {
		g.reading[k] = g.readingAt(k)
	}
	g.base = g.t
}

// changed takes in that galaxy values may have changed.
func (g *run) changed() error {
	g.rebase()
	if g.bound < few || g.env.Moved() || g.waiting > 0 && float64(g.waiting) >= waitingMax*float64(g.bound) {
		return g.refresh()
	}
	g.env.Update()
	return nil
}

func (g *run) refresh() error {
	if err := g.resolve(); err != nil {
		return err
	}
	window, err := g.env.Refresh(max(g.t, g.linear(g.first)), g.reading)
	if err != nil {
		return err
	}
	g.windowAt = g.t + window
	return g.hole.look(g)
}

// coarsen makes the unit of time longer before dates overflow.
func (g *run) coarsen() {
	const decades = 150
	for g.t > 1e150 {
		f := num.Exp10(-decades)
		g.env.Coarsen(decades)
		g.t, g.base, g.windowAt = g.t*f, g.base*f, g.windowAt*f
		for i := range g.wears {
			g.wears[i].date *= f
		}
		g.scheduled = nil
		for _, o := range g.objects {
			o.wearSince, o.wearRate = o.wearSince*f, o.wearRate/f
			if o.place != law.Bound || o.gone || o.waiting {
				continue
			}
			if o.at < 0 {
				g.schedule(o, o.stages[0].from, -1)
			} else {
				g.schedule(o, o.now().end, o.at)
			}
		}
	}
}

// happen is a birth or the end of a stage.
func (g *run) happen(e event) error {
	o := e.o
	switch {
	case e.at < 0:
		g.enter(o, 0)
		g.record(o, o.stages[0].from, false, Cause{})
		return nil
	case e.at+1 == len(o.stages):
		g.count(o, -1)
		g.bound--
		g.finishStage(o)
		return g.changed()
	}
	g.keep(o)
	g.count(o, -1)
	g.finishStage(o)
	g.count(o, +1)
	g.enter(o, o.at)
	if g.matters {
		return g.changed()
	}
	return nil
}

// finishStage ends the present stage of an object, in books and history.
func (g *run) finishStage(o *object) {
	s := o.now()
	g.fired[s.cause.Process]++
	after := 0.0
	if o.at+1 < len(o.stages) {
		after = o.stages[o.at+1].mass
	}
	switch loss := s.mass - after; {
	case s.star:
		g.gas += loss
	case s.turning:
		g.gas += s.gas
		g.light += loss - s.gas
	default:
		g.light += loss
	}
	o.at++
	if o.at == len(o.stages) {
		o.at--
		g.record(o, s.end, true, s.cause)
		o.gone = true
		return
	}
	g.record(o, s.end, false, s.cause)
}

// enter puts an object that has just entered stage at on the clocks, and what
// ends that stage on the schedule.
func (g *run) enter(o *object, at int) {
	o.at = at
	g.spend(o)
	g.schedule(o, o.now().end, at)
	g.learn(o)
}

// keep holds what is left of each exponential.
func (g *run) keep(o *object) {
	for k, x := range o.takes {
		if x < never {
			o.unspent[k] = (x - g.readingAt(k)) * o.now().seeks[k]
		}
	}
}

// spend turns what is left into readings under the present susceptibilities.
func (g *run) spend(o *object) {
	for k, e := range o.unspent {
		o.takes[k] = never
		if s := o.now().seeks[k]; s > 0 && e < never {
			o.takes[k] = g.readingAt(k) + e/s
			heap.Push(&g.hits[k], hit{o.takes[k], o})
		}
	}
}

// fire is the firing of clock k on an object.
func (g *run) fire(k int, o *object) error {
	c := g.clocks[k]
	if c.Fate == law.FateMeet {
		return g.meet(k, o)
	}
	fate, cause := c.Fate, Cause{c.use.Card.Process, c.Outcome}
	if word := o.now().diverted[k]; word != "" {
		fate = law.FateCentral
		for _, d := range g.diverts {
			if d.clock == k {
				cause = Cause{d.use.Card.Process, word}
			}
		}
	}
	g.remove(o, fate, cause)
	return g.changed()
}

// remove takes an object out of the bound galaxy.
func (g *run) remove(o *object, fate law.Fate, cause Cause) {
	g.count(o, -1)
	g.bound--
	g.fired[cause.Process]++
	mass := o.now().mass
	switch fate {
	case law.FateAdrift:
		g.add("carried_off", g.weight*mass)
		o.place = law.Adrift
	case law.FateCentral:
		g.add("carried_off", g.weight*mass)
		g.add("central_mass", g.weight*mass)
		g.hole.swallow(g, g.weight*mass)
		o.place = law.Central
	default:
		g.gas += mass
	}
	adrift := fate == law.FateAdrift
	if o.at >= 0 {
		g.record(o, g.log(g.t), !adrift, cause)
	}
	o.gone = !adrift
	if !adrift || o.at < 0 {
		return
	}
	for !o.gone && o.now().end <= g.end() && o.now().end < never {
		g.finishStage(o)
	}
}

func (g *run) end() float64 { return g.horizon }

// castOff takes everything still bound out of the galaxy at once.
func (g *run) castOff(fate law.Fate, cause Cause) error {
	if err := g.close(); err != nil {
		return err
	}
	for _, o := range g.objects {
		if o.place == law.Bound && !o.gone {
			g.remove(o, fate, cause)
		}
	}
	return nil
}

// close brings in what still waits.
func (g *run) close() error {
	if g.waiting == 0 {
		return nil
	}
	return g.refresh()
}
