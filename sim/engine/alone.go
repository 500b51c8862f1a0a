package engine

import "wane/sim/law"

// alone is a chunk of objects about to be put on the clocks: its readings, and
// what comes out, the objects that the lead clock provably takes before any
// other, with their readings of it, and the rest.
type alone struct {
	lead          *float64
	other         [fewClocks - 1]*float64
	now           [fewClocks]float64 // readings at present: the lead's, the others'
	rho           [fewClocks - 1]float64
	place, left   *uint8
	stage         *uint8
	keys          *float64
	ids, rest     *uint32
	first         uint64 // the first object
	taken, remain uint64 // how many came out
	bound, second uint64 // bytes that say so of eight objects
}

// sortAlone sorts the objects first .. first+n-1 into those that the lead
// clock provably takes, whose readings and numbers it appends to the lead's
// list, and the rest, which it returns, with how many of the chunk it has
// sorted.
func (w *Workspace) sortAlone(f *filling, first, n int) (rest []uint32, done int) {
	m, c := w.m, &w.c
	if len(m.Clocks) > fewClocks || n < 1 {
		return nil, 0
	}
	w.sorter.keys, w.sorter.ids = grown(w.sorter.keys, max(len(w.sorter.keys), chunk)), grown(w.sorter.ids, max(len(w.sorter.ids), chunk))
	w.rest = grown(w.rest, chunk)
	a := alone{lead: &f.columns[f.lead][first], place: &c.place[first], left: &c.left[first], stage: &w.stage[first],
		keys: &w.sorter.keys[0], ids: &w.sorter.ids[0], rest: &w.rest[0], first: uint64(first),
		bound: law.Bound * 0x0101010101010101, second: 2 * 0x0101010101010101}
	a.now[0] = f.now[f.lead]
	others := 0
	for k := range m.Clocks {
		if k != f.lead {
			a.other[others], a.now[others+1], a.rho[others] = &f.columns[k][first], f.now[k], w.rho[k][f.lead]
			others++
		}
	}
	for ; others < len(a.other); others++ {
		a.other[others], a.now[others+1] = a.lead, -never // no clock, never first
	}
	done = aloneLanes(&a, n)
	l := &f.lists[f.lead]
	l.keys, l.ids = append(l.keys, w.sorter.keys[:a.taken]...), append(l.ids, w.sorter.ids[:a.taken]...)
	return w.rest[:a.remain], done
}
