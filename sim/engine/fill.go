package engine

import (
	"slices"

	"wane/sim/law"
	"wane/sim/num"
)

// fillClocks puts every born, bound object on the clocks, less the entries
// that provably cannot fire first: entry j of an object is left out when
//
//	x_j - L_j > rho_jk (x_k - L_k)
//
// for the clock k that would take it first at present rates, rho_jk being a
// bound on rate_j / rate_k. While the bound holds, clock j advances at most
// rho_jk times as far as clock k, so k takes the object first. proveBounds
// checks before every window that the bound will hold through it, and fills
// the clocks anew when it would not.
func (w *Workspace) fillClocks() error {
	m, c := w.m, &w.c
	if len(m.Clocks) == 0 {
		return nil
	}
	for k := range w.clocks {
		w.clocks[k].reset()
	}
	w.setBounds()
	var f filling
	for k := range m.Clocks {
		f.now[k], f.slow[k] = w.readingAt(k, w.t), 1/w.env.Rates[k]
		f.lists[k].keys, f.lists[k].ids = w.clocks[k].keys, w.clocks[k].ids
		f.columns[k] = c.reading[k][:c.n]
		if f.slow[k] < f.slow[f.lead] {
			f.lead = k
		}
	}
	for first := 0; first < c.n; first += chunk {
		n := min(chunk, c.n-first)
		if first == chunk {
			f.makeRoom(c.n/chunk + 1)
		}
		rest, done := w.sortAlone(&f, first, n)
		for _, i := range rest {
			w.fillOne(&f, int(i))
		}
		for i := first + done; i < first+n; i++ {
			w.fillOne(&f, i)
		}
	}
	for k := range m.Clocks {
		w.clocks[k].keys, w.clocks[k].ids = f.lists[k].keys, f.lists[k].ids
		w.clocks[k].sort(&w.sorter)
	}
	return nil
}

// filling is a filling of the clocks in progress.
type filling struct {
	now, slow [maxClocks]float64 // readings, and years per unit of reading
	lead      int                // the fastest clock
	columns   [maxClocks][]float64
	lists     [maxClocks]struct {
		keys []float64
		ids  []uint32
	}
}

// makeRoom makes room for as many entries as the first of so many chunks lets
// expect, and no more.
func (f *filling) makeRoom(chunks int) {
	for k := range f.lists {
		l := &f.lists[k]
		room := len(l.keys)*chunks*33/32 + 64
		l.keys = slices.Grow(l.keys, max(0, room-len(l.keys)))
		l.ids = slices.Grow(l.ids, max(0, room-len(l.ids)))
	}
}

// fillOne puts object i on the clocks that may take it.
func (w *Workspace) fillOne(f *filling, i int) {
	if w.c.place[i] != law.Bound || w.c.left[i] != 0 || w.stage[i] == 0 || w.stage[i]&waiting != 0 {
		return
	}
	n := len(w.m.Clocks)
	var left [maxClocks]float64
	first, soonest := 0, never
	for k := range n {
		left[k] = f.columns[k][i] - f.now[k]
		if d := left[k] * f.slow[k]; d < soonest {
			first, soonest = k, d
		}
	}
	rho := &w.rho
	for k := range n {
		if x := f.columns[k][i]; x < never && (k == first || !(left[k] > rho[k][first]*left[first])) {
			l := &f.lists[k]
			l.keys, l.ids = append(l.keys, x), append(l.ids, uint32(i))
		}
	}
}

// What a bound on a ratio of rates allows beyond the present: little at first,
// more once a bound has been broken, as that of collisions to ejections is
// again and again while a galaxy contracts. After each such stretch fewer
// objects are left to fill the clocks with. A ratio that breaks its bound too
// often gets none.
const (
	boundSlack = 1.05
	moreSlack  = 4
	mostBreaks = 8
)

// setBounds chooses the bounds on ratios of rates: the present one with some
// slack where the ratio falls as the number bound falls, none where it rises
// or has broken its bounds too often.
func (w *Workspace) setBounds() {
	n := len(w.m.Clocks)
	slack := boundSlack
	if w.anyBroken || w.m.encounter != nil {
		slack = moreSlack
	}
	for j := range n {
		for k := range n {
			w.rho[j][k] = never
			if j == k || w.broken[j][k] >= mostBreaks || w.env.Rates[k] == 0 {
				continue
			}
			w.rho[j][k] = w.ratioBound(j, k) * slack
			if w.fallsSlower(j, k) {
				w.rho[j][k] = never
			}
		}
	}
}

// fallsSlower tells whether rate j / rate k rises as the galaxy dissolves.
func (w *Workspace) fallsSlower(j, k int) bool {
	for d, slot := range w.m.declared {
		if slot == slotNumber && w.env.slope[j][d] < w.env.slope[k][d] {
			return true
		}
	}
	return false
}

// ratioBound bounds rate j / rate k from now to the end of the present window:
// no declared value moves by more than 1 % before the next refresh.
func (w *Workspace) ratioBound(j, k int) float64 {
	e := w.env
	span := 0.0
	for d := range w.m.declared {
		if s := e.slope[j][d] - e.slope[k][d]; s > 0 {
			span += s
		} else {
			span -= s
		}
	}
	return e.rate0[j] / e.rate0[k] * num.Exp(span*1.02*moveToRefresh)
}

// proveBounds checks, after a refresh, that the bounds hold through the coming
// window.
func (w *Workspace) proveBounds() error {
	n := len(w.m.Clocks)
	if w.quiet || n < 2 {
		return nil
	}
	again := false
	for j := range n {
		for k := range n {
			if j == k || w.rho[j][k] == never {
				continue
			}
			if w.env.rate0[k] == 0 && w.env.rate0[j] > 0 || w.env.rate0[k] > 0 && w.ratioBound(j, k) > w.rho[j][k] {
				w.broken[j][k]++
				again = true
			}
		}
	}
	if again {
		w.anyBroken = true
		return w.fillClocks()
	}
	return nil
}
