package engine

import (
	"math"

	"wane/sim/law"
	"wane/sim/num"
)

// prospect is the first thing a wearing or turning law has in store for an
// object: when, why, and what it then is.
type prospect struct {
	date  float64 // log10; +Inf: never
	mass  float64 // after
	gas   float64 // mass to gas; the rest of the loss is radiated
	cause uint8   // 0: never
	kind  uint8   // law.NoWord: gone
}

// prospects returns the earliest prospect of every row. since gives the log10
// date at which the row's object entered its kind. The slice is good until
// the next call.
func (a *asker) prospects(r *rows, since func(int) float64) ([]prospect, error) {
	a.offers = grown(a.offers, r.n)
	for i := range r.n {
		a.offers[i] = prospect{date: never, kind: law.NoWord}
	}
	if err := a.worn(r, since); err != nil {
		return nil, err
	}
	for t, u := range a.m.turning {
		if err := a.turned(t, u, r, since); err != nil {
			return nil, err
		}
	}
	return a.offers, nil
}

func (a *asker) offer(i int, p prospect) {
	if p.date < a.offers[i].date {
		a.offers[i] = p
	}
}

// later adds a wait to a date without work where the date can't be seen.
func later(since, wait float64) float64 {
	if wait-since > unseen || since == math.Inf(-1) {
		return wait
	}
	if wait == math.Inf(-1) {
		return since
	}
	return num.Add10(since, wait)
}

// worn finds where wearing takes each row.
func (a *asker) worn(r *rows, since func(int) float64) error {
	if len(a.m.wearing) == 0 {
		return nil
	}
	for w, u := range a.m.wearing {
		if err := a.wornAlone(w, u, r, since); err != nil {
			return err
		}
	}
	return a.wornTogether(r, since)
}

// wornAlone takes the law's foretell for the rows that no other wearing law
// speaks for.
func (a *asker) wornAlone(w int, u *law.Use, r *rows, since func(int) float64) error {
	if !u.Card.Answers("foretell") {
		return nil
	}
	s, pick := a.spokenAlone(w, u, r)
	s, pick = a.above(w, r, s, pick, func(j int, t *threshold) {
		a.offer(j, prospect{date: since(j), mass: r.mass[j], cause: t.cause, kind: t.kind})
	})
	if s.n == 0 {
		return nil
	}
	starts, err := a.starts(u, s, pick, since)
	if err != nil {
		return err
	}
	out, err := a.ask(u, "foretell", s, drawU)
	if err != nil {
		return err
	}
	for i, wait := range out.Columns[0].Values {
		t := a.m.thresholds[w][s.kind[i]]
		if !t.applies || wait == never {
			continue
		}
		j := at(pick, i)
		from := 0.0
		if starts != nil {
			from = starts[i]
		} else if wait < a.latest+unseen {
			from = since(j)
		}
		date := wait
		if wait < a.latest+unseen || starts != nil {
			date = later(from, wait)
		}
		a.offer(j, prospect{date: date, mass: min(t.mass, s.mass[i]), cause: t.cause, kind: t.kind})
	}
	return nil
}

// unseen: a wait this many decades longer than the date it counts from hides
// that date to the last bit, so it need not be looked up.
const unseen = 17

// starts returns the dates from which a law with heat acts, nil for others.
func (a *asker) starts(u *law.Use, s *rows, pick []int32, since func(int) float64) ([]float64, error) {
	if !u.Card.Answers("heat") || a.sky == nil {
		return nil, nil
	}
	out, err := a.ask(u, "heat", s, drawU)
	if err != nil {
		return nil, err
	}
	a.start = grown(a.start, s.n)
	// The sky is colder than the coldest last of all: where that is before any
	// of them began, none has to wait.
	coldest, earliest := never, never
	for i, t := range out.Columns[0].Values {
		a.start[i] = since(at(pick, i))
		coldest, earliest = min(coldest, t), min(earliest, a.start[i])
	}
	if s.n > 0 && a.sky.LogColderSince(coldest) <= earliest {
		return a.start, nil
	}
	for i, t := range out.Columns[0].Values {
		a.start[i] = max(a.start[i], a.sky.LogColderSince(t))
	}
	return a.start, nil
}

// spokenAlone is spoken, less the rows another wearing law speaks for too; the
// rows left out are marked in a.shared.
func (a *asker) spokenAlone(w int, u *law.Use, r *rows) (*rows, []int32) {
	s, pick := a.spoken(u, r)
	if len(a.m.wearing) == 1 {
		return s, pick
	}
	a.pick2 = a.pick2[:0]
	for i := range s.n {
		alone := true
		for v, other := range a.m.wearing {
			if j := at(pick, i); v != w && other.Speaks(r.kind[j], r.mass[j], r.metals[j]) {
				alone = false
			}
		}
		if alone {
			a.pick2 = append(a.pick2, int32(at(pick, i)))
		}
	}
	if len(a.pick2) == s.n {
		return s, pick
	}
	a.alone.gather(r, a.pick2, hasAll)
	return a.alone, a.pick2
}

// above hands those of the spoken rows s of r that are beyond their threshold
// to cross, since they cross it at once, unasked. It returns the others.
func (a *asker) above(w int, r, s *rows, pick []int32, cross func(row int, t *threshold)) (*rows, []int32) {
	thresholds := a.m.thresholds[w]
	beyond := func(i int) bool {
		t := &thresholds[s.kind[i]]
		return t.applies && s.mass[i] <= t.mass
	}
	first := 0
	for first < s.n && !beyond(first) {
		first++
	}
	if first == s.n {
		return s, pick
	}
	a.pick3 = a.pick3[:0]
	for i := range s.n {
		if j := at(pick, i); beyond(i) {
			cross(j, &thresholds[s.kind[i]])
		} else {
			a.pick3 = append(a.pick3, int32(j))
		}
	}
	a.rest.gather(r, a.pick3, hasAll)
	return a.rest, a.pick3
}

// stillThere leaves out of the spoken rows s of r those that are gone before
// turning law t may act.
func (a *asker) stillThere(t int, r, s *rows, pick []int32) (*rows, []int32) {
	soonest := a.m.soonest[t]
	a.pick3 = a.pick3[:0]
	for i := range s.n {
		if j := at(pick, i); a.offers[j].date > soonest {
			a.pick3 = append(a.pick3, int32(j))
		}
	}
	if len(a.pick3) == s.n {
		return s, pick
	}
	a.rest.gather(r, a.pick3, hasAll)
	return a.rest, a.pick3
}

// turned offers each row what turning law t foretells.
func (a *asker) turned(t int, u *law.Use, r *rows, since func(int) float64) error {
	s, pick := a.spoken(u, r)
	s, pick = a.stillThere(t, r, s, pick)
	if s.n == 0 {
		return nil
	}
	out, err := a.ask(u, "foretell", s, drawU)
	if err != nil {
		return err
	}
	words := len(u.Card.Outcomes)
	stream := a.streams[u.Card.Process]
	waits, mass, gas := out.Columns[0].Values, out.Columns[1+words].Values, out.Columns[2+words].Values
	for i, wait := range waits {
		if wait == never {
			continue
		}
		w := 0
		if words > 1 {
			w = pickWord(out, 1, words, i, stream.Uniform(uint64(s.idOf(i)), s.genOf(i), drawPick))
		}
		o := u.Card.Outcomes[w]
		if mass[i]+gas[i] > s.mass[i]*(1+1e-12) {
			return u.Signed(&law.Fault{Question: "foretell", Row: i, Column: "mass", Object: s.describe(i, a.m),
				Got: num1(mass[i]) + " Msun left and " + num1(gas[i]) + " Msun of gas", Want: "no more than it had"})
		}
		kind := uint8(law.NoWord)
		if o.Becomes != law.Gone {
			kind = a.m.Set.Kind(o.Becomes)
		}
		j := at(pick, i)
		a.offer(j, prospect{date: later(since(j), wait), mass: mass[i], gas: gas[i],
			cause: a.m.cause(u.Card.Process, o.Word), kind: kind})
	}
	return nil
}
