package engine

import (
	"math"

	"wane/sim/law"
	"wane/sim/num"
)

// transition is one change of an object's state.
type transition struct {
	date     float64 // coded: years, or minus log10 years
	id       uint32
	from, to state
	cause    uint8
}

// logDate decodes a column's date to log10 years.
func (w *Workspace) logDate(coded float64) float64 {
	if coded < 0 {
		return -coded
	}
	return num.Log10(coded)
}

// each hands the changes of object i's present life to f in order of date, up
// to limit (log10, inclusive). dates are the log10 of its birth, death and
// leaving. It returns the state it is in then.
func (w *Workspace) each(i uint32, dates [3]float64, limit float64, f func(date float64, from, to state, cause uint8)) state {
	c := &w.c
	if c.kind0[i] == law.NoWord {
		return stateGone
	}
	origin := w.originOf(i)
	leave := dates[2]
	if leave < dates[0] {
		return stateGone // carried off before it was born
	}
	now := stateOf(c.kind0[i], law.Bound, origin)
	if dates[0] > limit {
		return stateGone
	}
	if c.continued == nil || !c.continued[i] {
		f(dates[0], stateGone, now, 0)
	}
	place := uint8(law.Bound)
	stage := 1
	next, cause := dates[1], c.died[i]
	if cause == 0 {
		stage, next, cause = 2, c.end[i], c.ended[i]
	}
	for {
		if leave < next || leave == next && (leave == never || stage >= 2 && !w.passed(i, stage)) {
			if leave > limit || leave == never {
				return now
			}
			to := stateGone
			if c.place[i] == law.Adrift {
				place = law.Adrift
				to = stateOf(now.kind(), place, origin)
			}
			f(leave, now, to, c.left[i])
			if now = to; to == stateGone {
				return now
			}
			leave = never
			continue
		}
		if next > limit {
			return now
		}
		stage++
		kind, after, afterCause, ok := w.enters(i, stage)
		to := stateGone
		if ok {
			to = stateOf(kind, place, origin)
		}
		f(next, now, to, cause)
		if now = to; !ok {
			return now
		}
		next, cause = after, afterCause
	}
}

// passed tells whether object i had left a stage, from the second on, when it
// left the bound galaxy: what is due at a date happens before anything else.
func (w *Workspace) passed(i uint32, stage int) bool { return w.stageOf(i) > stage }

// enters tells what object i is in a stage, when that stage ends and why; ok
// is false when there is no such stage.
func (w *Workspace) enters(i uint32, stage int) (kind uint8, end float64, cause uint8, ok bool) {
	c := &w.c
	if stage == 2 {
		return c.kind1[i], c.end[i], c.ended[i], true
	}
	links := c.chain[i]
	if stage-3 >= len(links) {
		return 0, never, 0, false
	}
	l := links[stage-3]
	return l.kind, l.end, l.ended, true
}

// logDates are the log10 dates of one object.
func (w *Workspace) logDates(i uint32) [3]float64 {
	c := &w.c
	d := [3]float64{w.logDate(c.birth[i]), w.logDate(c.death[i]), never}
	if c.leave[i] != never {
		d[2] = w.logDate(c.leave[i])
	}
	return d
}

// flush writes the present life of object i up to a date into the journal and
// the books, before a meeting overwrites it.
func (w *Workspace) flush(i uint32, at float64, cause uint8) {
	limit := w.logDate(at)
	d := w.logDates(i)
	if w.m.anyWarm {
		all := &w.m.anyState
		before := len(w.meets.stays)
		w.meets.stays = w.staysOf(w.meets.stays, all, i, d, limit)
		if n := len(w.meets.stays); n > before && w.meets.stays[n-1].leave == never {
			w.meets.stays[n-1].leave, w.meets.stays[n-1].cause = limit, cause
		}
	}
	w.each(i, d, limit, func(date float64, from, to state, cause uint8) {
		w.meets.journal = append(w.meets.journal, transition{codedLog(date), i, from, to, cause})
	})
	w.books.life(w, i, d, limit)
}

// codedLog writes a log10 date as columns hold it. Dates under a year, which
// only tests have, are kept as years.
func codedLog(l float64) float64 {
	if l > 0 {
		return -l
	}
	return num.Exp10(l)
}

// centralHole is the hole at the centre. Its mass is real, not of the sample.
type centralHole struct {
	mass    float64
	since   float64 // yr: when the galaxy began
	grown   float64 // date at which it last grew, in the unit of time
	log     []holeEvent
	end     prospect
	looked  float64 // mass at the last look
	evapour float64 // mass it gave off in ending, solMass
}

// holeEvent is an entry or an exit of the central hole.
type holeEvent struct {
	date  float64 // log10
	exit  bool
	cause uint8
}

func (h *centralHole) begin(mass, since float64) {
	if since == never {
		since = 1 // no object dates the galaxy
	}
	*h = centralHole{mass: mass, since: since, log: h.log[:0], end: prospect{date: never}}
	if mass > 0 {
		h.log = append(h.log, holeEvent{date: num.Log10(since)})
		h.grown = since
	}
}

// swallow adds real mass at date t.
func (h *centralHole) swallow(w *Workspace, t, mass float64) {
	if h.mass == 0 {
		h.log = append(h.log, holeEvent{date: num.Log10(t) + w.env.unit})
	}
	h.mass += mass
	h.grown = t
}

// look finds out, at a refresh, whether the hole has ended. The date at which it
// would end if nothing more fell in is a lower bound, since a hole that grows
// later and becomes heavier lasts longer: only once that has passed is the
// law asked anew.
func (h *centralHole) look(w *Workspace, t float64) error {
	if h.mass == 0 {
		return nil
	}
	now := num.Log10(t) + w.env.unit
	if h.mass != h.looked && (h.looked == 0 || h.end.date <= now) {
		if err := h.foretell(w); err != nil {
			return err
		}
	}
	if h.end.date <= now {
		w.env.add(slotCentral, -h.mass)
		w.books.count(h.end.cause)
		h.finish()
	}
	return nil
}

func (h *centralHole) foretell(w *Workspace) error {
	r := newRows(1)
	r.resize(1)
	r.id[0], r.gen[0] = uint32(w.m.Objects), 0
	r.kind[0], r.comp[0], r.place[0], r.origin[0] = law.CentralHole, law.Pure, law.Central, law.Founded
	r.mass[0], r.birthMass[0], r.metals[0] = h.mass, h.mass, 0
	since := num.Log10(h.grown) + w.env.unit
	w.ask.latest = never
	ps, err := w.ask.prospects(r, func(int) float64 { return since })
	if err != nil {
		return err
	}
	h.end, h.looked = ps[0], h.mass
	return nil
}

func (h *centralHole) finish() {
	h.log = append(h.log, holeEvent{date: h.end.date, exit: true, cause: h.end.cause})
	h.evapour += h.mass
	h.mass, h.looked, h.end = 0, 0, prospect{date: never}
}

var _ = math.NaN
