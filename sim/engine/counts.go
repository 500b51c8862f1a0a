package engine

import (
	"math"
	"math/bits"

	"wane/sim/fade"
	"wane/sim/law"
	"wane/sim/num"
)

// counts gathers entries and exits of the populations in one realisation.
//
// Most populations have seen their last member enter before the first leaves.
// Then the number of entries and the last of them are enough, and only exits
// are kept; where they are not, a second run through the histories gathers the
// entries of those populations.
//
// In a plain run (see Workspace.plainRun) birth, death and leaving are in years
// and the end of a remnant in log10 years. A population none of whose members
// ends that way is counted in years, and only its marks are turned into
// logarithms.
type counts struct {
	mask     [256]uint64 // populations without a condition on warmth, by state
	plain    bool        // dates of change are in years
	inLog    uint64      // populations counted in log10 years
	aliased  uint64      // populations whose exits are a flow's
	direct   uint64      // populations whose entries and exits are given, in log10 years
	wanted   uint64      // populations whose entries are being gathered
	entries  [][]float64
	exits    [][]float64
	spare    [][]float64 // memory lent by the dynamics, which has done with it
	entered  []int
	lastIn   []float64 // of entries by change
	flows    flows
	left     [][256]int64
	firstOut []float64
	lastOut  []float64
	lastWhy  []uint8
	scratch  fade.Scratch
	logs     [3][]float64
	states   []state // of a chunk in a plain run
}

func (n *counts) reset(m *Model, plain bool, spare [][]float64) {
	p := len(m.populations)
	n.spare = append(n.spare[:0], spare...)
	defer func() { n.aliased = 0 }()
	n.entries, n.exits, n.entered = grown(n.entries, p), grown(n.exits, p), grown(n.entered, p)
	n.lastIn, n.firstOut, n.lastOut = grown(n.lastIn, p), grown(n.firstOut, p), grown(n.lastOut, p)
	n.left, n.lastWhy = grown(n.left, p), grown(n.lastWhy, p)
	n.mask, n.plain, n.inLog, n.direct, n.wanted = [256]uint64{}, plain, 0, 0, 0
	clear(n.left)
	for i := range m.populations {
		pop := &m.populations[i]
		n.entries[i], n.exits[i] = n.entries[i][:0], n.exits[i][:0]
		if n.aliased>>i&1 != 0 {
			n.exits[i] = nil
		}
		n.entered[i], n.lastIn[i], n.firstOut[i], n.lastOut[i] = 0, -never, never, -never
		if pop.Warmth != nil {
			n.direct |= 1 << i
			n.inLog |= 1 << i
			continue
		}
		if !plain || pop.holdsEnds {
			n.inLog |= 1 << i
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
		v := date
		if n.plain && n.inLog>>p&1 != 0 {
			v = num.Log10(date)
		}
		n.exit(p, v, cause)
	}
	for x := after &^ before; x != 0; x &= x - 1 {
		p := bits.TrailingZeros64(x)
		n.entered[p]++
		n.lastIn[p] = max(n.lastIn[p], date)
	}
}

// ends enters the end of an object at a log10 date.
func (n *counts) ends(date float64, from state, cause uint8) {
	for x := n.mask[from]; x != 0; x &= x - 1 {
		n.exit(bits.TrailingZeros64(x), date, cause)
	}
}

func (n *counts) exit(p int, date float64, cause uint8) {
	n.exits[p] = append(n.exits[p], date)
	n.left[p][cause]++
	n.firstOut[p] = min(n.firstOut[p], date)
	if date >= n.lastOut[p] {
		n.lastOut[p], n.lastWhy[p] = date, cause
	}
}

// enter gathers an entry for the populations that want it.
func (n *counts) enter(date float64, from, to state, _ uint8) {
	for x := n.mask[to] &^ n.mask[from] & n.wanted; x != 0; x &= x - 1 {
		p := bits.TrailingZeros64(x)
		v := date
		if n.plain && n.inLog>>p&1 != 0 {
			v = num.Log10(date)
		}
		n.entries[p] = append(n.entries[p], v)
	}
}

// give enters a member directly, for populations with a condition on warmth.
func (n *counts) give(p int, from float64) { n.entries[p] = append(n.entries[p], from) }

// marks finds the marks of all populations, in log10 years.
func (w *Workspace) marks(end float64) []fade.Marks {
	n := &w.counts
	out := make([]fade.Marks, len(w.m.populations))
	for p := range out {
		if n.direct>>p&1 != 0 {
			out[p] = n.scratch.Find(n.entries[p], n.exits[p])
			continue
		}
		last := n.lastIn[p]
		if n.plain && n.inLog>>p&1 != 0 && n.entered[p] > 0 {
			last = num.Log10(last)
		}
		var ok bool
		if out[p], ok = n.scratch.FindAfter(n.entered[p], last, n.exits[p], n.firstOut[p], n.lastOut[p]); ok {
			continue
		}
		if early, until := before(n.exits[p], last); n.plain && 1000*early < n.entered[p] && w.enterAfter(p, until, early+1) {
			out[p] = n.scratch.FindLate(n.entered[p], last, n.exits[p], n.firstOut[p], n.lastOut[p], early)
			continue
		}
		n.wanted |= 1 << p
	}
	if n.wanted != 0 {
		w.replay(end)
		for p := range out {
			if n.wanted>>p&1 != 0 {
				if n.plain && n.inLog>>p&1 == 0 && w.c.earliest > 0 && n.lastIn[p] <= math.MaxFloat64 && n.lastOut[p] <= math.MaxFloat64 {
					out[p] = n.scratch.FindWithin(n.entries[p], n.exits[p], w.c.earliest, n.lastIn[p], n.lastOut[p])
				} else {
					out[p] = n.scratch.Find(n.entries[p], n.exits[p])
				}
				if n.entered[p] == w.c.n {
					n.entries[p] = nil // it may be the column of births
				}
			}
		}
	}
	for p := range out {
		if n.inLog>>p&1 == 0 {
			for _, x := range []*float64{&out[p].PeakAt, &out[p].Half, &out[p].Hundredth, &out[p].Last} {
				*x = num.Log10(*x)
			}
		}
	}
	return out
}

// before counts the exits up to a date, and finds the last of them.
func before(exits []float64, date float64) (n int, last float64) {
	last = -never
	for _, v := range exits {
		if v <= date {
			n++
			last = max(last, v)
		}
	}
	return n, last
}

// enterAfter tells whether population p has at least so many entries later than
// a date, both in the population's unit. It is a plain run.
func (w *Workspace) enterAfter(p int, date float64, least int) bool {
	n := &w.counts
	wanted := n.wanted
	defer func() { n.wanted, n.entries[p] = wanted, n.entries[p][:0] }()
	n.wanted = 1 << p
	for i, seen := uint32(0), 0; i < uint32(w.c.n); i++ {
		w.plainEntries(i)
		for _, v := range n.entries[p] {
			if v > date {
				seen++
			}
		}
		n.entries[p] = n.entries[p][:0]
		if seen >= least {
			return true
		}
	}
	return false
}

// replay runs through the histories again for the entries that are wanted.
func (w *Workspace) replay(end float64) {
	c, n := &w.c, &w.counts
	for _, t := range w.meets.journal {
		if d := w.logDate(t.date); d <= end {
			n.enter(d, t.from, t.to, t.cause)
		}
	}
	if n.plain && w.replayStars() {
		return
	}
	for i := range uint32(c.n) {
		if n.plain {
			w.plainEntries(i)
			continue
		}
		w.each(i, w.logDates(i), end, n.enter)
	}
	for _, e := range w.central.log {
		if !e.exit && e.date <= end {
			n.enter(e.date, stateGone, centralState, 0)
		}
	}
}

// replayStars is replay where only populations of stars want entries, of stars
// in any place: then births are all there is to gather.
func (w *Workspace) replayStars() bool {
	c, n := &w.c, &w.counts
	for s, mask := range n.mask {
		if state(s)%2 != law.Founded || state(s)%statesAKind/2 == law.Central {
			continue // nothing merges in a plain run, and only a hole is central
		}
		star := state(s).kind() == law.Star
		if star != (mask&n.wanted == n.wanted) || !star && mask&n.wanted != 0 {
			return false
		}
	}
	p := bits.TrailingZeros64(n.wanted)
	if n.inLog&n.wanted != 0 || n.wanted != 1<<p {
		return false
	}
	if n.entered[p] == c.n {
		n.entries[p] = c.birth[:c.n] // everything is a star: no need for a copy
		return true
	}
	for i, kind := range c.kind0[:c.n] {
		if kind == law.Star && !(c.leave[i] < c.birth[i]) {
			n.entries[p] = append(n.entries[p], c.birth[i])
		}
	}
	return true
}

// plainEntries is each in a plain run, for entries alone: its dates are years.
func (w *Workspace) plainEntries(i uint32) {
	c, n := &w.c, &w.counts
	birth, death, leave := c.birth[i], c.death[i], c.leave[i]
	if leave < birth {
		return
	}
	now := stateOf(c.kind0[i], law.Bound, law.Founded)
	n.enter(birth, stateGone, now, 0)
	if leave < death && leave < never {
		if c.place[i] != law.Adrift {
			return
		}
		n.enter(leave, now, now+2*law.Adrift, 0)
		now += 2 * law.Adrift
		leave = never
	}
	if c.died[i] != 0 && death < never {
		to := stateOf(c.kind1[i], 0, law.Founded) + now%statesAKind
		n.enter(death, now, to, 0)
		now = to
	}
	if leave < never && c.place[i] == law.Adrift {
		n.enter(leave, now, now+2*law.Adrift, 0)
	}
}

const centralState = state(law.CentralHole*statesAKind + law.Central*2 + law.Founded)
