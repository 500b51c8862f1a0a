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
	n := len(m.Clocks)
	if n == 0 {
		return nil
	}
	for k := range w.clocks {
		w.clocks[k].reset()
	}
	w.setBounds()
	var now, slow [maxClocks]float64 // readings, and years per unit of reading
	for k := range n {
		now[k], slow[k] = w.readingAt(k, w.t), 1/w.env.Rates[k]
	}
	var lists [maxClocks]struct {
		keys []float64
		ids  []uint32
	}
	for k := range n {
		lists[k].keys, lists[k].ids = w.clocks[k].keys, w.clocks[k].ids
	}
	var columns [maxClocks][]float64
	lead := 0
	for k := range n {
		columns[k] = c.reading[k][:c.n]
		if slow[k] < slow[lead] {
			lead = k
		}
	}
	place, stage := c.place[:c.n], w.stage[:c.n]
	for i, at := range place {
		if i == chunk {
			// Room for as many as the first objects let expect, and no more.
			for k := range n {
				l := &lists[k]
				room := len(l.keys)*(len(place)/chunk+1)*33/32 + 64
				l.keys = slices.Grow(l.keys, max(0, room-len(l.keys)))
				l.ids = slices.Grow(l.ids, max(0, room-len(l.ids)))
			}
		}
		if at != law.Bound || c.left[i] != 0 || stage[i] == 0 || stage[i]&waiting != 0 {
			continue
		}
		var left [maxClocks]float64
		if soon := columns[lead][i] - now[lead]; w.alone(i, lead, soon, &columns, &now) {
			l := &lists[lead]
			l.keys, l.ids = append(l.keys, columns[lead][i]), append(l.ids, uint32(i))
			continue
		}
		first, soonest := 0, never
		for k := range n {
			left[k] = columns[k][i] - now[k]
			if d := left[k] * slow[k]; d < soonest {
				first, soonest = k, d
			}
		}
		rho := &w.rho
		for k := range n {
			if x := columns[k][i]; x < never && (k == first || !(left[k] > rho[k][first]*left[first])) {
				l := &lists[k]
				l.keys, l.ids = append(l.keys, x), append(l.ids, uint32(i))
			}
		}
	}
	for k := range n {
		w.clocks[k].keys, w.clocks[k].ids = lists[k].keys, lists[k].ids
	}
	for k := range w.clocks {
		w.clocks[k].sort(&w.sorter)
	}
	return nil
}

// alone tells whether the lead clock provably takes object i before any other,
// when it has soon left to go.
func (w *Workspace) alone(i, lead int, soon float64, columns *[maxClocks][]float64, now *[maxClocks]float64) bool {
	for k := range w.m.Clocks {
		if k != lead && !(columns[k][i]-now[k] > w.rho[k][lead]*soon) {
			return false
		}
	}
	return soon < never
}

// boundSlack is what a bound on a ratio of rates allows beyond the present.
const boundSlack = 1.05

// setBounds chooses the bounds on ratios of rates: the present one with some
// slack where the ratio falls as the number bound falls, none where it rises
// or has broken its bound before.
func (w *Workspace) setBounds() {
	n := len(w.m.Clocks)
	for j := range n {
		for k := range n {
			w.rho[j][k] = never
			if j == k || w.broken[j][k] || w.env.Rates[k] == 0 {
				continue
			}
			w.rho[j][k] = w.ratioBound(j, k) * boundSlack
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
				w.broken[j][k], again = true, true
			}
		}
	}
	if again {
		return w.fillClocks()
	}
	return nil
}
