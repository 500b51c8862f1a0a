package engine

import (
	"math"
	"math/bits"
	"strings"

	"wane/sim/fade"
	"wane/sim/law"
	"wane/sim/num"
)

// counts gathers entries and exits of the populations.
type counts struct {
	mask    [256]uint64 // populations without a condition on warmth, by state
	entries [][]float64
	exits   [][]float64
	causes  [][]uint8
	scratch fade.Scratch
	logs    [3][]float64
}

func (n *counts) reset(m *Model) {
	p := len(m.populations)
	n.entries, n.exits, n.causes = grown(n.entries, p), grown(n.exits, p), grown(n.causes, p)
	n.mask = [256]uint64{}
	for i, pop := range m.populations {
		n.entries[i], n.exits[i], n.causes[i] = n.entries[i][:0], n.exits[i][:0], n.causes[i][:0]
		if pop.Warmth != nil {
			continue
		}
		for s, in := range pop.in {
			if in && state(s) != stateGone {
				n.mask[s] |= 1 << i
			}
		}
	}
}

// change enters one change of state.
func (n *counts) change(date float64, from, to state, cause uint8) {
	before, after := n.mask[from], n.mask[to]
	for x := before &^ after; x != 0; x &= x - 1 {
		p := bits.TrailingZeros64(x)
		n.exits[p], n.causes[p] = append(n.exits[p], date), append(n.causes[p], cause)
	}
	for x := after &^ before; x != 0; x &= x - 1 {
		p := bits.TrailingZeros64(x)
		n.entries[p] = append(n.entries[p], date)
	}
}

// conclude ends the realisation: the central hole's last prospect, the books,
// and the populations.
func (w *Workspace) conclude() (*Outcome, error) {
	m := w.m
	o := &Outcome{End: m.Until, StoppedAt: w.stoppedAt, EvaporationStarts: math.NaN(), Fired: map[string]int64{}}
	if o.End < never {
		o.EndCause = "until"
	}
	if w.sky != nil {
		if end, cause := w.sky.End(); end < o.End {
			o.End, o.EndCause = end, cause
		}
		o.EvaporationStarts = w.evaporationStarts()
	}
	if err := w.endCentral(o.End); err != nil {
		return nil, err
	}
	w.counts.reset(m)
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
	for i := range m.populations {
		o.Populations = append(o.Populations, w.fadeOf(i, o.End))
	}
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

// tally runs through all histories: books and populations, up to the end.
func (w *Workspace) tally(end float64) error {
	c, n := &w.c, &w.counts
	for _, t := range w.meets.journal {
		if d := w.logDate(t.date); d <= end {
			n.change(d, t.from, t.to, t.cause)
		}
	}
	for first := 0; first < c.n; first += chunk {
		size := min(chunk, c.n-first)
		w.logChunk(first, size)
		w.tallyChunk(first, size, end)
	}
	h := stateOf(law.CentralHole, law.Central, law.Founded)
	for _, e := range w.central.log {
		if e.date > end {
			continue
		}
		if e.exit {
			n.change(e.date, h, stateGone, e.cause)
		} else {
			n.change(e.date, stateGone, h, 0)
		}
	}
	return w.tallyWarm(end)
}

// tallyChunk tallies objects first .. first+size-1. Most have lived the plain
// life of birth, death, leaving and end, which plainLife knows by heart; the
// rest go the general way.
func (w *Workspace) tallyChunk(first, size int, end float64) {
	c, n := &w.c, &w.counts
	births, deaths, leaves := n.logs[0][:size], n.logs[1][:size], n.logs[2][:size]
	special := c.chain != nil || c.origin != nil || c.gas != nil || end < never
	for i := range size {
		id := first + i
		if !special && births[i] <= leaves[i] && w.plainLife(id, births[i], deaths[i], leaves[i]) {
			continue
		}
		if c.kind0[id] == law.NoWord {
			continue
		}
		d := [3]float64{births[i], deaths[i], leaves[i]}
		if mass, at := w.books.life(w, uint32(id), d, end); at != stateGone {
			w.rests(at, mass)
		}
		w.each(uint32(id), d, end, n.change)
	}
	w.books.post()
}

// plainLife tallies an object that lives without links, mergers or an end of
// the run: it is born, may die as a star, may leave, and may end by its
// prospect. It must say what books.life and each say.
func (w *Workspace) plainLife(i int, birth, death, leave float64) bool {
	c, n, b := &w.c, &w.counts, &w.books
	now := stateOf(c.kind0[i], law.Bound, law.Founded)
	n.change(birth, stateGone, now, 0)
	mass, died, left := c.mass1[i], c.died[i], c.left[i]
	adrift := c.place[i] == law.Adrift
	if died != 0 {
		if leave < death {
			mass = c.mass0[i]
			b.fired[left]++
			if !adrift {
				n.change(leave, now, stateGone, left)
				b.takes(w, uint32(i), mass)
				return true
			}
			n.change(leave, now, now+2*law.Adrift, left)
			now += 2 * law.Adrift
			leave = never
		}
		if death == never {
			w.rests(now, c.mass0[i])
			return true
		}
		to := stateOf(c.kind1[i], 0, law.Founded) + now%statesAKind
		n.change(death, now, to, died)
		b.fired[died]++
		if b.radiates[died] {
			b.part.radiated += c.mass0[i] - c.mass1[i]
		} else {
			b.part.gas += c.mass0[i] - c.mass1[i]
		}
		now, mass = to, c.mass1[i]
	}
	last, ended := c.end[i], c.ended[i]
	if leave <= last && leave < never {
		b.fired[left]++
		if !adrift {
			n.change(leave, now, stateGone, left)
			b.takes(w, uint32(i), mass)
			return true
		}
		n.change(leave, now, now+2*law.Adrift, left)
		now += 2 * law.Adrift
	}
	if last == never {
		w.rests(now, mass)
		return true
	}
	n.change(last, now, stateGone, ended)
	b.fired[ended]++
	b.part.radiated += mass
	return true
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

// fadeOf finds the marks of population p.
func (w *Workspace) fadeOf(p int, end float64) PopulationOutcome {
	n := &w.counts
	marks := n.scratch.Find(n.entries[p], n.exits[p])
	o := PopulationOutcome{Peak: int64(marks.Peak), PeakDate: marks.PeakAt, Half: marks.Half, Hundredth: marks.Hundredth,
		Last: marks.Last, Left: map[string]int64{}, Remaining: int64(marks.Remaining), RealLast: math.NaN()}
	if o.Peak == 0 {
		o.PeakDate = math.NaN()
	}
	o.CutHalf, o.CutHundredth, o.CutLast = o.Half == never, o.Hundredth == never, o.Last == never
	tally := make([]int64, len(w.m.Causes)+1)
	for _, cause := range n.causes[p] {
		tally[cause]++
	}
	for code, count := range tally {
		if count > 0 {
			o.Left[w.m.causeWord(uint8(code))] += count
		}
	}
	if marks.LastIndex >= 0 && marks.Last < never {
		o.Hangs = w.m.lawOf(n.causes[p][marks.LastIndex])
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

// evaporationStarts is the date from which a hole of ten solar masses is
// warmer than the sky, by the run's own law.
func (w *Workspace) evaporationStarts() float64 {
	for _, u := range w.m.wearing {
		if u.Card.Process != "evaporation" || !u.Card.Answers("heat") {
			continue
		}
		r := newRows(1)
		r.resize(1)
		r.id[0], r.gen[0], r.kind[0], r.comp[0], r.place[0], r.origin[0] = 0, 0, law.BlackHole, law.Pure, law.Adrift, law.Founded
		r.mass[0], r.birthMass[0], r.metals[0] = 10, 10, 0
		if s, err := w.ask.starts(u, r, nil, func(int) float64 { return -never }); err == nil && s != nil {
			return s[0]
		}
	}
	return math.NaN()
}
