package engine

import (
	"slices"
)

// passage is the pieces of the history in which an object was born and died as
// a star, the latter only where it has by now.
type passage struct{ birth, death int }

func (w *Workspace) passageOf(j int, t float64) passage {
	p := passage{birth: w.past.find(w.c.birth[j])}
	if w.c.died[j] != 0 && !(w.c.death[j] > t) {
		p.death = w.past.find(w.c.death[j])
	}
	return p
}

// readingOf is where clock k takes an object that brought e, under the history
// of the leg, given that it has come to date t unhurt.
func (w *Workspace) readingOf(k, j int, p passage, e, s0, s1, t float64) float64 {
	c := &w.c
	b := w.past.in(p.birth, k, c.birth[j])
	if c.died[j] == 0 {
		return over(b, e, s1)
	}
	if c.death[j] > t {
		return over(b, e, s0)
	}
	d := w.past.in(p.death, k, c.death[j])
	return over(d, e-s0*(d-b), s1)
}

// spareOf keeps what is left to an object that nothing can hit at date t.
func (w *Workspace) spareOf(k, j int, p passage, e, s0, s1 float64) {
	c := &w.c
	if s1 != 0 || w.stage[j] != 2 || c.died[j] == 0 || s0 == 0 {
		return
	}
	b, d := w.past.in(p.birth, k, c.birth[j]), w.past.in(p.death, k, c.death[j])
	w.spare(k, uint32(j), e-s0*(d-b))
}

// over is reading + e/s, never when nothing can hit it.
func over(reading, e, s float64) float64 {
	if s == 0 {
		return never
	}
	return reading + e/s
}

// enterQuiet splits the objects: those that no clock can reach before the last
// star has died are left out of the leg, the rest are listed. It reports
// whether that is worth while.
func (w *Workspace) enterQuiet() (bool, error) {
	m, c := w.m, &w.c
	w.active = w.active[:0]
	last := c.lastDeath
	for k := range m.Clocks {
		w.caps[k] = 2 * w.env.Rates[k] * last
	}
	if last >= w.horizon || last >= w.adriftAt || last >= w.endAt || last >= w.wear.at {
		return false, nil
	}
	most := c.n/8 + 16
	for first := 0; first < c.n; first += m.batch {
		n := min(m.batch, c.n-first)
		s0, s1, err := w.susceptibilities(first, n)
		if err != nil {
			return false, err
		}
		from := len(w.active)
		for k := range m.Clocks {
			w.drawExponentials(k, first, n)
			if w.compact {
				w.active = w.enterSteady(w.active, k, first, s0[k][:n], s1[k][:n])
			} else {
				w.active = appendReached(w.active, first, c.reading[k][first:first+n], s0[k], s1[k], w.caps[k])
			}
		}
		if len(w.active) > from {
			w.listActive(from, first, s0, s1)
		}
		if len(w.active) > most {
			return false, nil
		}
	}
	return true, nil
}

// appendReached lists the objects that a clock can reach before its cap, in
// either stage.
func appendReached(list []uint32, first int, e, s0, s1 []float64, limit float64) []uint32 {
	s0, s1 = s0[:len(e)], s1[:len(e)]
	for i, x := range e {
		if x <= s0[i]*limit || x <= s1[i]*limit {
			list = append(list, uint32(first+i))
		}
	}
	return list
}

// listActive orders what a chunk has added to the active objects and, in a
// compact run, keeps their susceptibilities and gives them their exponentials
// back.
func (w *Workspace) listActive(from, first int, s0, s1 [][]float64) {
	added := w.active[from:]
	slices.Sort(added)
	added = slices.Compact(added)
	w.active = w.active[:from+len(added)]
	if !w.compact {
		return
	}
	for _, j := range added {
		w.hurt(int(j), s0, s1, int(j)-first)
		for k := range w.m.Clocks {
			w.c.reading[k][j] = w.exponential(k, j, 0)
		}
	}
}

// susceptibilities of a chunk, held or asked anew.
func (w *Workspace) susceptibilities(first, n int) (s0, s1 [][]float64, err error) {
	if w.compact {
		return w.exposeChunk(first, n)
	}
	w.view[0], w.view[1] = w.view[0][:0], w.view[1][:0]
	for k := range w.m.Clocks {
		w.view[0] = append(w.view[0], w.s[0][k][first:first+n])
		w.view[1] = append(w.view[1], w.s[1][k][first:first+n])
	}
	return w.view[0], w.view[1], nil
}

func (w *Workspace) drawExponentials(k, first, n int) {
	clock := &w.m.Clocks[k]
	w.ask.clocks[k].Exps(w.c.reading[k][first:first+n], uint64(first), 0, drawClock+uint32(clock.index))
}

// hurt keeps the susceptibilities of an object that is on the clocks in a
// compact run.
func (w *Workspace) hurt(j int, s0, s1 [][]float64, i int) {
	var f few
	for k := range w.m.Clocks {
		f[0][k], f[1][k] = s0[k][i], s1[k][i]
	}
	w.few[uint32(j)] = f
}

// few holds susceptibilities of both stages of one object.
type few [2][maxClocks]float64
