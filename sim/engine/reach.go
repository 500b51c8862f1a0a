package engine

import (
	"slices"

	"wane/sim/law"
)

// reach is how far the settled ends of the real number reach, whatever the
// realisation. It hangs on the laws, the number and the metals alone.
type reach struct {
	ok   bool
	born births
	lots []lot // by kind
}

// newReach asks the laws. It is not ok where the engine has no closed form.
func (a *asker) newReach(metal float64) *reach {
	m := a.m
	x := &reach{lots: make([]lot, len(m.Set.Kinds))}
	if !m.simple || readsAny(m.live, "live", "u", "e") {
		return x
	}
	for _, u := range m.wearing {
		if any, _ := u.SpeaksForKind(law.Star); any {
			return x
		}
	}
	decades := 2
	for n := m.Real; n > 1 && decades < 15; n /= 10 {
		decades++
	}
	u := uniformNodes(64, 16, decades)
	out, err := a.askAt(m.birth, "birth", newRowsOf(len(u), metal), u)
	if err != nil || slices.Max(out.Columns[0].Values) > spanSeen {
		return x
	}
	x.ok, x.born = true, newBirths(u, out.Columns[0].Values)
	mass := append(uniformNodes(32, 12, 5), uniformNodes(1, 1, decades)...)
	slices.Sort(mass)
	mass = slices.Compact(mass)
	for kind := range x.lots {
		if m.encounter != nil && kind != law.Star { // whatever merges may be the last
			x.lots[kind] = lot{untold: true, expected: never, latest: never}
			continue
		}
		x.lots[kind] = a.lotOf(uint8(kind), mass, decades, metal, &x.born)
	}
	return x
}

// lotOf is the lot of a kind.
func (a *asker) lotOf(kind uint8, mass []float64, decades int, metal float64, born *births) lot {
	size := []float64{outermost, 1 - outermost}
	for _, u := range a.m.ends {
		if kind != law.Star && slices.Contains(wordsOf(u, "die"), a.m.Set.Kinds[kind]) && readsAny(u, "remain", "u") {
			size = uniformNodes(4, 1, decades)
		}
	}
	coldest := never
	l, err := newLot(mass, size, a.m.Real, born, func(u, s []float64) ([]corner, error) {
		return a.corners(kind, u, s, metal, &coldest)
	})
	l.coldest, l.ask = coldest, nil
	for _, u := range a.m.wearing {
		if some, _ := u.SpeaksForKind(kind); some && readsAny(u, "foretell", "u", "e") {
			l.untold = true
		}
	}
	if err != nil || l.untold || !(l.latest <= a.m.turns[kind]) { // turning may come first
		return lot{untold: true, expected: never, latest: never}
	}
	return l
}

// readsAny tells whether a question reads one of the columns.
func readsAny(u *law.Use, question string, columns ...string) bool {
	for _, in := range inputsOf(u, question) {
		if slices.Contains(columns, in) {
			return true
		}
	}
	return false
}

// newRowsOf is a table of n objects about to be founded.
func newRowsOf(n int, metal float64) *rows {
	r := newRows(n)
	r.resize(n)
	for i := range n {
		r.id[i], r.gen[i], r.kind[i], r.comp[i], r.place[i], r.origin[i] = 0, 0, law.Star, law.Hydrogen, law.Bound, law.Founded
		r.mass[i], r.birthMass[i], r.metals[i] = 0, 0, metal
	}
	return r
}

// askAt is ask with u for the column of that name.
func (a *asker) askAt(use *law.Use, question string, r *rows, u []float64) (law.Batch, error) {
	a.arena.Reset()
	a.columns = a.columns[:0]
	for _, name := range inputsOf(use, question) {
		if name == "u" {
			a.columns = append(a.columns, law.Numbers(name, u))
			continue
		}
		a.columns = append(a.columns, a.column(use, name, name, r, drawU))
	}
	return use.Ask(question, law.Batch{Rows: r.n, Columns: a.columns}.With(a.arena))
}

// corners asks what becomes of objects of given uniforms of mass and size: the
// chance that they are, or become, of a kind, and how long after their birth
// they end as that.
func (a *asker) corners(kind uint8, u, s []float64, metal float64, coldest *float64) ([]corner, error) {
	m := a.m
	out := make([]corner, len(u))
	r := newRowsOf(len(u), metal)
	answer, err := a.askAt(m.mass, "mass", r, u)
	if err != nil {
		return nil, err
	}
	copy(r.mass, answer.Columns[0].Values)
	copy(r.birthMass, r.mass)
	if answer, err = a.askAt(m.sort, "sort", r, u); err != nil {
		return nil, err
	}
	copy(r.kind, answer.Columns[0].Words)
	var stars, same []int32
	for i, k := range r.kind {
		out[i] = corner{0, -never}
		switch {
		case k == law.Star:
			stars = append(stars, int32(i))
		case k == kind:
			same = append(same, int32(i))
			out[i].chance = 1
		}
	}
	ending, which := newRows(0), same
	ending.gather(r, same, hasAll)
	if len(stars) > 0 {
		of := newRows(0)
		of.gather(r, stars, hasAll)
		if answer, err = a.askAt(m.live, "live", of, nil); err != nil {
			return nil, err
		}
		for i, wait := range answer.Columns[0].Values {
			out[stars[i]].span = wait
			if kind == law.Star {
				out[stars[i]].chance = 1
			}
		}
		if kind == law.Star {
			return out, nil
		}
		if ending, which, err = a.remains(kind, of, stars, s, out, ending, which); err != nil {
			return nil, err
		}
	}
	return out, a.endings(kind, ending, which, out, coldest)
}

// remains fills in the chance that stars leave a remnant of a kind, and adds
// the remnants to the table of what is to end.
func (a *asker) remains(kind uint8, of *rows, stars []int32, s []float64, out []corner, ending *rows, which []int32) (*rows, []int32, error) {
	for _, u := range a.m.ends {
		word := slices.Index(wordsOf(u, "die"), a.m.Set.Kinds[kind])
		if word < 0 {
			continue
		}
		spoken, pick := a.spoken(u, of)
		if spoken.n == 0 {
			continue
		}
		die, err := a.askAt(u, "die", spoken, nil)
		if err != nil {
			return nil, nil, err
		}
		var rows0, owner []int32
		var size []float64
		for i, chance := range die.Columns[word].Values {
			if chance > 0 {
				j := stars[at(pick, i)]
				out[j].chance = chance
				rows0, owner, size = append(rows0, int32(i)), append(owner, j), append(size, s[j])
			}
		}
		few := newRows(0)
		few.gather(spoken, rows0, hasAll)
		for i := range few.kind {
			few.kind[i] = kind
		}
		remain, err := a.askAt(u, "remain", few, size)
		if err != nil {
			return nil, nil, err
		}
		before := ending
		ending = newRows(before.n + few.n)
		ending.resize(before.n + few.n)
		for i := range before.n {
			ending.copyRow(i, before, i)
		}
		for i := range few.n {
			k := before.n + i
			ending.copyRow(k, few, i)
			ending.gen[k] = 1
			ending.mass[k], ending.birthMass[k] = remain.Columns[0].Values[i], remain.Columns[0].Values[i]
			ending.comp[k] = remain.Columns[1].Words[i]
		}
		which = append(which, owner...)
	}
	return ending, which, nil
}

// endings adds the wait to the settled end of each row.
func (a *asker) endings(kind uint8, r *rows, which []int32, out []corner, coldest *float64) error {
	waits := make([]float64, r.n)
	fill(waits, never)
	for w, u := range a.m.wearing {
		if !a.m.thresholds[w][kind].applies {
			continue
		}
		spoken, pick := a.spoken(u, r)
		if spoken.n == 0 {
			continue
		}
		answer, err := a.askAt(u, "foretell", spoken, nil)
		if err != nil {
			return err
		}
		for i, wait := range answer.Columns[0].Values {
			waits[at(pick, i)] = wait
		}
		if !u.Card.Answers("heat") {
			continue
		}
		if answer, err = a.askAt(u, "heat", spoken, nil); err != nil {
			return err
		}
		for _, t := range answer.Columns[0].Values {
			*coldest = min(*coldest, t)
		}
	}
	for i, wait := range waits {
		out[which[i]].span = later(out[which[i]].span, wait)
	}
	return nil
}
