package engine

import (
	"math"
	"strings"

	"wane/sim/fade"
	"wane/sim/law"
	"wane/sim/num"
)

// conclude ends the realisation: the central hole's last prospect, the books,
// and the populations.
func (w *Workspace) conclude() (*Outcome, error) {
	m := w.m
	o := &Outcome{End: m.Until, StoppedAt: w.stoppedAt, EvaporationStarts: math.NaN(), HeavyStarts: math.NaN(),
		SkyFloor: math.NaN(), DarkEnergyDecays: never, Fired: map[string]int64{}}
	if o.End < never {
		o.EndCause = "until"
	}
	if w.sky != nil {
		if end, cause := w.sky.End(); end < o.End {
			o.End, o.EndCause = end, cause
		}
		o.EvaporationStarts, o.HeavyStarts = w.evaporationStarts(10), w.evaporationStarts(1e9)
		o.SkyFloor = w.skyFloor()
		if s, ok := w.sky.(interface{ DarkEnergyDecays() float64 }); ok {
			o.DarkEnergyDecays = s.DarkEnergyDecays()
		}
	}
	if err := w.endCentral(o.End); err != nil {
		return nil, err
	}
	w.counts.reset(m, w.plainRun(o.End), w.c.reading)
	if err := w.tally(o.End); err != nil {
		return nil, err
	}
	var err error
	if o.Ledger, err = w.books.ledger(w); err != nil {
		return nil, err
	}
	for code, count := range w.books.fired {
		if code != 0 && count > 0 {
			o.Fired[m.Causes[code].Process] += count
		}
	}
	for i, marks := range w.marks(o.End) {
		o.Populations = append(o.Populations, w.fadeOf(i, marks))
	}
	w.realLasts(o)
	o.Events = w.events
	return o, nil
}

func (w *Workspace) endCentral(end float64) error {
	h := &w.central
	if h.mass == 0 {
		return nil
	}
	if err := h.foretell(w); err != nil {
		return err
	}
	if h.end.date <= end && h.end.date < never {
		w.books.count(h.end.cause)
		h.finish()
	}
	return nil
}

// plainRun tells whether every life is plain: birth, perhaps a death as a star,
// perhaps a leaving, perhaps one end by a prospect after that, all dates of the
// dynamics in years, and no end of the run.
func (w *Workspace) plainRun(end float64) bool {
	c := &w.c
	return w.m.oneFate && c.chain == nil && c.origin == nil && c.gas == nil && end == never && !w.endsScheduled && w.env.unit == 0
}

// tally runs through all histories: books and populations, up to the end.
func (w *Workspace) tally(end float64) error {
	c, n := &w.c, &w.counts
	for _, t := range w.meets.journal {
		if d := w.logDate(t.date); d <= end {
			n.change(d, t.from, t.to, t.cause)
		}
	}
	if n.plain {
		w.tallyPlain()
	} else {
		for first := 0; first < c.n; first += chunk {
			w.tallyChunk(first, min(chunk, c.n-first), end)
		}
	}
	for _, e := range w.central.log {
		date := e.date
		if date > end {
			continue
		}
		if e.exit {
			n.ends(date, centralState, e.cause)
			continue
		}
		if n.plain {
			date = num.Exp10(date)
		}
		n.change(date, stateGone, centralState, 0)
	}
	return w.tallyWarm(end)
}

// tallyChunk tallies objects first .. first+size-1.
func (w *Workspace) tallyChunk(first, size int, end float64) {
	c, n := &w.c, &w.counts
	w.logChunk(first, size)
	for i := range size {
		id := uint32(first + i)
		if c.kind0[id] == law.NoWord {
			continue
		}
		d := [3]float64{n.logs[0][i], n.logs[1][i], n.logs[2][i]}
		if mass, at := w.books.life(w, id, d, end); at != stateGone {
			w.rests(at, mass)
		}
		w.each(id, d, end, n.change)
	}
}

// rests enters what an object still weighs at the end.
func (w *Workspace) rests(at state, mass float64) {
	if at%statesAKind/2 == law.Adrift {
		w.books.adrift.add(mass)
		return
	}
	w.books.bound.add(mass)
}

// logChunk takes the logarithms of a chunk's dates.
func (w *Workspace) logChunk(first, n int) {
	c := &w.c
	for x, src := range [][]float64{c.birth, c.death, c.leave} {
		dst := grown(w.counts.logs[x], n)
		num.Log10Into(dst, src[first:first+n])
		for i, v := range src[first : first+n] {
			if v < 0 {
				dst[i] = -v
			}
		}
		w.counts.logs[x] = dst
	}
}

// fadeOf puts the marks of population p into words.
func (w *Workspace) fadeOf(p int, marks fade.Marks) PopulationOutcome {
	n := &w.counts
	o := PopulationOutcome{Peak: int64(marks.Peak), PeakDate: marks.PeakAt, Half: marks.Half, Hundredth: marks.Hundredth,
		Last: marks.Last, Left: map[string]int64{}, Remaining: int64(marks.Remaining), RealLast: math.NaN()}
	if o.Peak == 0 {
		o.PeakDate = math.NaN()
	}
	o.CutHalf, o.CutHundredth, o.CutLast = o.Half == never, o.Hundredth == never, o.Last == never
	for code, count := range n.left[p] {
		if count > 0 {
			o.Left[w.m.causeWord(uint8(code))] += count
		}
	}
	if len(n.exits[p]) > 0 && marks.Last < never {
		o.Hangs = w.m.lawOf(n.lastWhy[p])
	}
	return o
}

// causeWord is a cause as outcomes name it, "process:outcome".
func (m *Model) causeWord(code uint8) string {
	c := m.Causes[code]
	return c.Process + ":" + c.Outcome
}

// lawOf is the law behind a cause, "process/name".
func (m *Model) lawOf(code uint8) string {
	if strings.HasPrefix(m.Causes[code].Outcome, becameWord) {
		return m.live.ID() // what a star leaves does not set its date
	}
	if u := m.Set.Of(m.Causes[code].Process); u != nil {
		return u.ID()
	}
	return m.Causes[code].Process
}

// evaporationStarts is the date from which a hole of a mass, in solar masses, is
// warmer than the sky, by the run's own law.
func (w *Workspace) evaporationStarts(mass float64) float64 {
	for _, u := range w.m.wearing {
		if u.Card.Process != "evaporation" || !u.Card.Answers("heat") {
			continue
		}
		r := newRows(1)
		r.resize(1)
		r.id[0], r.gen[0], r.kind[0], r.comp[0], r.place[0], r.origin[0] = 0, 0, law.BlackHole, law.Pure, law.Adrift, law.Founded
		r.mass[0], r.birthMass[0], r.metals[0] = mass, mass, 0
		if s, err := w.ask.starts(u, r, nil, func(int) float64 { return -never }); err == nil && s != nil {
			return s[0]
		}
	}
	return math.NaN()
}

// skyFloor is log10 of the temperature that the sky keeps for ever. One that
// falls as any power of the date is far below the last here by then.
func (w *Workspace) skyFloor() float64 {
	const late, coldest = 1e9, -1e6
	if t := w.sky.LogTemperature(late); t > coldest {
		return t
	}
	return math.Inf(-1)
}
