package engine

import (
	"wane/sim/law"
	"wane/sim/num"
)

// scheduled handles a birth, a death or the end of a stage. t is its date, or
// the present where a product of an encounter joined late.
func (w *Workspace) scheduled(s entry, t float64) error {
	i := s.id & idMask
	c := &w.c
	if c.place[i] != law.Bound || w.stage[i]&waiting != 0 {
		return nil
	}
	switch s.id &^ idMask {
	case eventBirth:
		if w.stage[i] != 0 || w.years(c.birth[i]) != s.key {
			return nil
		}
		w.events++
		w.born(i, t)
	case eventDeath:
		if w.stage[i] > 1 || w.years(c.death[i]) != s.key {
			return nil
		}
		w.events++
		return w.enterStage(i, 2, t)
	case eventEnd:
		if w.stage[i] < 2 || w.linear(w.endOf(i)) != s.key {
			return nil
		}
		w.events++
		if next := w.stageOf(i) + 1; w.hasLink(i, next) {
			return w.enterStage(i, next, t)
		}
		return w.vanish(i, t)
	}
	return nil
}

// years decodes a column's date into the present unit of time.
func (w *Workspace) years(coded float64) float64 {
	if coded < 0 {
		return w.linear(-coded)
	}
	if w.env.unit != 0 {
		return w.linear(num.Log10(coded))
	}
	return coded
}

func (w *Workspace) hasLink(i uint32, stage int) bool {
	links := w.c.chain[i]
	return stage-3 < len(links)
}

// born puts a newborn object on the clocks.
func (w *Workspace) born(i uint32, t float64) {
	c := &w.c
	w.stage[i] = 1
	if c.died[i] == 0 {
		w.stage[i] = 2
		w.scheduleEnd(i)
		w.wear.enter(w, i)
	}
	for k := range w.m.Clocks {
		e := c.reading[k][i]
		c.reading[k][i] = over(w.readingAt(k, t), e, w.sus(k, i))
		w.enqueue(k, i)
	}
}

func (w *Workspace) enqueue(k int, i uint32) {
	if x := w.c.reading[k][i]; x < never {
		w.clocks[k].push(x, i)
	}
}

// enterStage moves a bound object to its next stage at date t: galaxy values
// follow, and the part of each threshold not yet spent is rescaled.
func (w *Workspace) enterStage(i uint32, stage int, t float64) error {
	left := w.quiet && !w.isActive[i]
	if !left {
		w.keepUnspent(i, t)
	}
	matters := w.m.deathsMatter
	if matters {
		w.countStuff(i, -1)
	}
	w.stage[i] = uint8(stage)
	if matters {
		w.countStuff(i, +1)
	}
	w.meets.renew(w, i)
	if !left {
		for k := range w.m.Clocks {
			w.respend(k, i, t)
		}
		w.scheduleEnd(i)
		w.wear.enter(w, i)
	}
	if matters {
		return w.changed(t)
	}
	return nil
}

// keepUnspent holds what is left of each threshold as a unit exponential.
func (w *Workspace) keepUnspent(i uint32, t float64) {
	for k := range w.m.Clocks {
		w.unspent[k] = never
		if e, ok := w.spared[k][i]; ok {
			w.unspent[k] = e
		}
		if x := w.c.reading[k][i]; x < never {
			w.unspent[k] = (x - w.readingAt(k, t)) * w.sus(k, i)
		}
	}
}

// respend turns what is left into a reading under the new susceptibility. An
// object that nothing could hit so far brings its whole exponential.
func (w *Workspace) respend(k int, i uint32, t float64) {
	e := w.unspent[k]
	if _, spared := w.spared[k][i]; e == never && !spared {
		e = w.exponential(k, i, w.thresholdGeneration(i))
	}
	if w.sus(k, i) == 0 {
		w.spare(k, i, e)
	} else {
		delete(w.spared[k], i)
	}
	if e == never {
		w.spare(k, i, e)
		w.c.reading[k][i] = never
		return
	}
	w.c.reading[k][i] = over(w.readingAt(k, t), e, w.sus(k, i))
	w.enqueue(k, i)
}

// fire handles the firing of clock k on object i.
func (w *Workspace) fire(k int, i uint32, t float64) error {
	clock := &w.m.Clocks[k]
	if clock.Fate == law.FateMeet {
		return w.meet(k, i, t)
	}
	fate, cause := clock.Fate, clock.cause
	stage := 0
	if w.stageOf(i) >= 2 {
		stage = 1
	}
	turned := w.c.turned != nil && w.c.turned[i]&(1<<(2*k+stage)) != 0
	if s := w.stageOf(i); s > 2 {
		turned = w.c.chain[i][s-3].turned&(1<<k) != 0
	}
	if turned {
		fate, cause = law.FateCentral, w.diverted(k)
	}
	w.remove(i, t, fate, cause)
	return w.changed(t)
}

// spare keeps what is left of an exponential while nothing can hit the object;
// +Inf: nothing ever will.
func (w *Workspace) spare(k int, i uint32, e float64) {
	if w.spared[k] == nil {
		w.spared[k] = map[uint32]float64{}
	}
	w.spared[k][i] = e
}

// vanish ends a bound object whose prospect has come.
func (w *Workspace) vanish(i uint32, t float64) error {
	w.subtract(i)
	w.c.place[i] = placeGone
	w.bound--
	return w.changed(t)
}
