package engine

import (
	"fmt"
	"slices"
	"strings"

	"wane/sim/law"
)

// meetings are the encounters of one realisation.
type meetings struct {
	s       [2][][]float64 // what is sought of each object, by stage and clock
	tree    soughtTree     // of the bound objects as they are
	clocks  []int          // of encounters, by column of the tree
	column  [maxClocks]int // the other way round
	pairs   []pair
	journal []transition
	stays   []stay // of lives that are in the journal

	// Memory of resolve.
	resolved  []pair
	ids       [2][]uint32
	both      [2]rows
	columns   []law.Column
	arena     law.Arena
	back      []uint32
	products  rows
	prospects []prospect
}

// pair is two objects waiting for a refresh.
type pair struct {
	seeker, partner uint32
	clock           int
	date            float64
}

// maxTries bounds the search for a partner: when nearly all that was sought
// has left, nobody is met.
const maxTries = 4096

func (x *meetings) begin() {
	x.pairs, x.journal, x.stays = x.pairs[:0], x.journal[:0], x.stays[:0]
}

func (x *meetings) scale(f float64) {
	for i := range x.pairs {
		x.pairs[i].date *= f
	}
}

func (x *meetings) grow(w *Workspace) {
	if w.m.encounter == nil {
		return
	}
	for stage := range x.s {
		x.s[stage] = grown(x.s[stage], len(w.m.Clocks))
		for k := range x.s[stage] {
			x.s[stage][k] = grown(x.s[stage][k], w.c.n)
			if w.m.Clocks[k].Fate != law.FateMeet {
				clear(x.s[stage][k]) // nobody is sought on it
			}
		}
	}
}

// take keeps what is sought of a chunk, from the last exposures.
func (x *meetings) take(w *Workspace, stage, first int, r *rows) {
	if w.m.encounter == nil || x.s[stage] == nil {
		return
	}
	for k := range w.m.Clocks {
		if w.m.Clocks[k].Fate == law.FateMeet {
			copy(x.s[stage][k][first:first+r.n], w.ask.soughts[k][:r.n])
		}
	}
}

func (x *meetings) set(stage, k int, i uint32, sought float64) {
	if x.s[stage] != nil {
		x.s[stage][k][i] = sought
	}
}

// sought is how much clock k seeks object i as it now is.
func (x *meetings) sought(w *Workspace, k int, i uint32) float64 {
	switch s := w.stageOf(i); {
	case s <= 1:
		return x.s[0][k][i]
	case s == 2:
		return x.s[1][k][i]
	default:
		return w.c.chain[i][s-3].sought[k]
	}
}

// counted is sought for an object that is about to change or leave (sign -1), or
// has changed: the tree still holds what it was.
func (x *meetings) counted(w *Workspace, k int, i uint32, sign float64) float64 {
	if sign < 0 {
		return x.tree.of(i, x.column[k])
	}
	return x.sought(w, k, i)
}

// plant readies the tree before the first event: all are bound, and sought as
// in their first stage. Who is not born when it is picked is passed over.
func (x *meetings) plant(w *Workspace) {
	if w.m.encounter == nil || w.c.n == 0 {
		return
	}
	x.clocks = x.clocks[:0]
	for k := range w.m.Clocks {
		if w.m.Clocks[k].Fate == law.FateMeet {
			x.column[k] = len(x.clocks)
			x.clocks = append(x.clocks, k)
		}
	}
	n := len(x.clocks)
	if n == 0 {
		return
	}
	x.tree.resize(w.c.n, n)
	for column, k := range x.clocks {
		for i, v := range x.s[0][k] {
			x.tree.levels[0][i*n+column] = v
		}
	}
	x.tree.build()
}

// renew takes in that object i, which is bound, has changed.
func (x *meetings) renew(w *Workspace, i uint32) {
	for column, k := range x.clocks {
		x.tree.set(i, column, x.sought(w, k, i))
	}
}

// bornBy tells whether object i exists; in a quiet leg objects off the clocks
// are looked up by date.
func (w *Workspace) bornBy(i uint32) bool {
	if w.quiet && !w.isActive[i] {
		return w.c.birth[i] <= w.t
	}
	return w.stage[i] != 0
}

// meet lets object i, whose clock k has fired, find a partner.
func (w *Workspace) meet(k int, i uint32, t float64) error {
	x := &w.meets
	column := x.column[k]
	gen := w.generationOf(i)
	if total := x.tree.total(column); total > 0 && w.bound > 1 {
		stream := w.ask.streams[w.m.Clocks[k].Process]
		for try := range uint32(maxTries) {
			j, ok := x.tree.pick(column, stream.Uniform(uint64(i), gen, drawSeek+try)*total)
			if !ok || j == i || w.stage[j]&waiting != 0 || !w.bornBy(j) {
				continue
			}
			if w.quiet && !w.isActive[j] {
				w.settleOne(j)
			}
			w.stage[i] |= waiting
			w.stage[j] |= waiting
			x.pairs = append(x.pairs, pair{i, j, k, t})
			w.awaiting += 2
			return w.changed(t)
		}
	}
	// Nobody left to meet: the clock has nothing more for this object.
	w.spare(k, i, never)
	w.c.reading[k][i] = never
	for other := range w.m.Clocks { // one of which may have been left out for this one
		w.enqueue(other, i)
	}
	return nil
}

// settleOne puts an object that a quiet leg left out into its stage, so that
// it can be met.
func (w *Workspace) settleOne(j uint32) {
	w.isActive[j] = true
	at, _ := slices.BinarySearch(w.active, j)
	w.active = slices.Insert(w.active, at, j)
	w.stage[j] = w.stageAt(int(j), w.t)
	p := w.passageOf(int(j), w.t)
	for k := range w.m.Clocks {
		e := w.c.reading[k][j]
		w.c.reading[k][j] = w.readingOf(k, int(j), p, e, w.s[0][k][j], w.s[1][k][j], w.t)
	}
}

// resolve asks meet about all waiting pairs and brings in what comes of them.
func (w *Workspace) resolve(t float64) error {
	x := &w.meets
	pairs := append(x.resolved[:0], x.pairs...)
	x.resolved, x.pairs, w.awaiting = pairs, x.pairs[:0], 0
	out, err := w.askMeet(pairs)
	if err != nil {
		return err
	}
	u := w.m.encounter
	back := x.back[:0]
	for p, pr := range pairs {
		word := u.Card.Outcomes[out.Columns[0].Words[p]].Word
		cause := w.m.cause(u.Card.Process, word)
		before := w.massOf(pr.seeker) + w.massOf(pr.partner)
		gas := out.Columns[7].Values[p]
		after := gas
		var kinds, comps [2]uint8
		var masses [2]float64
		for s := range 2 {
			kinds[s], masses[s], comps[s] = out.Columns[1+3*s].Words[p], out.Columns[2+3*s].Values[p], out.Columns[3+3*s].Words[p]
			if kinds[s] != law.NoWord {
				after += masses[s]
			}
		}
		if after > before*(1+1e-12) {
			return u.Signed(&law.Fault{Question: "meet", Row: p, Column: "mass_1",
				Object: fmt.Sprintf("%s and %s", w.words(pr.seeker), w.words(pr.partner)),
				Got:    num1(after) + " Msun in all", Want: "no more than " + num1(before) + " Msun"})
		}
		w.books.met(w.m, gas, before-after)
		w.books.count(cause)
		for s, i := range [2]uint32{pr.seeker, pr.partner} {
			if w.meetOne(i, pr.date, cause, kinds[s], masses[s], comps[s]) {
				back = append(back, i)
			}
		}
	}
	x.back = back
	if len(back) == 0 {
		return nil
	}
	slices.Sort(back)
	return w.rejoin(back, t)
}

func (w *Workspace) words(i uint32) string {
	return fmt.Sprintf("%s of %.6g Msun", w.m.Set.Kinds[w.kindOf(i)], w.massOf(i))
}

// askMeet asks about pairs, one row each.
func (w *Workspace) askMeet(pairs []pair) (law.Batch, error) {
	u := w.m.encounter
	x := &w.meets
	x.ids[0], x.ids[1] = x.ids[0][:0], x.ids[1][:0]
	for _, p := range pairs {
		x.ids[0], x.ids[1] = append(x.ids[0], p.seeker), append(x.ids[1], p.partner)
	}
	for side := range x.both {
		w.fillRows(&x.both[side], x.ids[side])
	}
	w.ask.arena.Reset()
	x.arena.Reset()
	x.columns = x.columns[:0]
	for _, name := range inputsOf(u, "meet") {
		base, side := name, 0
		if s, ok := strings.CutSuffix(name, "_1"); ok {
			base = s
		} else if s, ok := strings.CutSuffix(name, "_2"); ok {
			base, side = s, 1
		}
		x.columns = append(x.columns, w.ask.column(u, name, base, &x.both[side], drawMeet))
	}
	return u.Ask("meet", law.Batch{Rows: len(pairs), Columns: x.columns}.With(&x.arena))
}

// meetOne ends the present life of an object that has met another, and begins
// the next if it survives.
func (w *Workspace) meetOne(i uint32, date float64, cause, kind uint8, mass float64, comp uint8) bool {
	c := &w.c
	w.subtract(i)
	from := stateOf(w.kindOf(i), law.Bound, w.originOf(i))
	at := w.coded(date)
	w.flush(i, at, cause)
	w.stage[i] &^= waiting
	if kind == law.NoWord {
		w.meets.journal = append(w.meets.journal, transition{at, i, from, stateGone, cause})
		c.place[i] = placeGone
		c.consume(i)
		w.bound--
		return false
	}
	if kind != from.kind() || mass > w.massOf(i)*(1+1e-12) {
		c.origin[i] = law.Merged
	}
	delete(w.wear.worn, i)
	if len(c.gas) > 0 {
		for step := range uint32(longestChain + 2) {
			delete(c.gas, [2]uint32{i, step})
		}
	}
	c.generation[i] = (w.generationOf(i)/mergerGeneration + 1) * mergerGeneration
	c.kind0[i], c.mass0[i] = kind, mass
	c.kind1[i], c.mass1[i], c.comp1[i] = kind, mass, comp
	c.birth[i], c.death[i], c.died[i] = at, at, 0
	delete(c.chain, i)
	c.continued[i] = true
	w.stage[i] = 2
	to := stateOf(kind, law.Bound, c.origin[i])
	w.meets.journal = append(w.meets.journal, transition{at, i, from, to, cause})
	return true
}
