package engine

import "slices"

// exposeAll asks the susceptibilities of both stages of every object and
// fills the sums. In a compact run nothing is held: see enterQuiet.
func (w *Workspace) exposeAll() error {
	m, c := w.m, &w.c
	if len(m.Clocks) == 0 || w.compact {
		return nil
	}
	for stage := range 2 {
		if w.s[stage] == nil {
			w.s[stage] = make([][]float64, len(m.Clocks))
		}
		for k := range m.Clocks {
			w.s[stage][k] = grown(w.s[stage][k], c.n)
		}
	}
	w.meets.grow(w)
	for first := 0; first < c.n; first += chunk {
		n := min(chunk, c.n-first)
		s0, s1, err := w.exposeChunk(first, n)
		if err != nil {
			return err
		}
		for k := range m.Clocks {
			copy(w.s[0][k][first:], s0[k][:n])
			copy(w.s[1][k][first:], s1[k][:n])
		}
	}
	for k := range m.Clocks {
		if m.sums[k] {
			for i := range c.n {
				w.env.add(m.slotSum(k), m.Weight*w.s[0][k][i])
				if m.encounter != nil {
					w.env.add(m.slotSought(k), m.Weight*w.meets.sought(w, k, uint32(i)))
				}
			}
		}
	}
	return nil
}

// exposeChunk asks for objects first .. first+n-1: susceptibilities in the
// first and in the second stage, and which way their hits are diverted.
func (w *Workspace) exposeChunk(first, n int) (s0, s1 [][]float64, err error) {
	c, a := &w.c, w.ask
	stars := false
	for _, d := range c.died[first : first+n] {
		stars = stars || d != 0
	}
	r := a.firstStage(c, first, n)
	if s0, err = a.exposures(r); err != nil {
		return nil, nil, err
	}
	w.meets.take(w, 0, first, r)
	if err := w.divertChunk(0, first, r); err != nil {
		return nil, nil, err
	}
	if !stars {
		w.meets.take(w, 1, first, r)
		return s0, s0, w.divertChunk(1, first, r)
	}
	r = a.secondStage(c, first, n)
	if s1, err = a.exposures(r); err != nil {
		return nil, nil, err
	}
	w.meets.take(w, 1, first, r)
	return s0, s1, w.divertChunk(1, first, r)
}

// divertChunk is divert for objects first .. first+n-1.
func (w *Workspace) divertChunk(stage, first int, r *rows) error {
	if len(w.m.diverts) == 0 {
		return nil
	}
	return w.divert(stage, r, func(i int) int { return first + i })
}

// divert decides for each object and clock whether a hit in this stage would
// be taken by a diverting law. The draw is the same for both stages.
func (w *Workspace) divert(stage int, r *rows, id func(int) int) error {
	return w.ask.divert(r, func(i, clock int) { w.c.turned[id(i)] |= 1 << (2*clock + stage) })
}

// divert hands f each row and clock whose hit would be taken.
func (a *asker) divert(r *rows, f func(row, clock int)) error {
	for _, d := range a.m.diverts {
		s, pick := a.spoken(d.use, r)
		if s.n == 0 {
			continue
		}
		out, err := a.ask(d.use, "divert", s, drawU)
		if err != nil {
			return err
		}
		stream := a.streams[d.use.Card.Process]
		for i, share := range out.Columns[d.column].Values {
			u := stream.Uniform(uint64(s.idOf(i)), s.genOf(i)&^(mergerGeneration-1), drawDivert+uint32(d.column))
			if u < share {
				f(at(pick, i), d.clock)
			}
		}
	}
	return nil
}

// exponential is the unit exponential that object i brings to clock k.
func (w *Workspace) exponential(k int, i uint32, gen uint32) float64 {
	clock := &w.m.Clocks[k]
	return w.ask.clocks[k].Exp(uint64(i), gen, drawClock+uint32(clock.index))
}

// readingOf is where clock k takes an object that brought e, under the history
// of the leg, given that it has come to date t unhurt.
func (w *Workspace) readingOf(k int, j int, e, s0, s1, t float64) float64 {
	c := &w.c
	b := w.past.at(k, c.birth[j])
	if c.died[j] == 0 {
		return over(b, e, s1)
	}
	if c.death[j] > t {
		return over(b, e, s0)
	}
	d := w.past.at(k, c.death[j])
	return over(d, e-s0*(d-b), s1)
}

// spareOf keeps what is left to an object that nothing can hit at date t.
func (w *Workspace) spareOf(k int, j int, e, s0, s1, t float64) {
	c := &w.c
	if s1 != 0 || w.stage[j] != 2 || c.died[j] == 0 || s0 == 0 {
		return
	}
	b, d := w.past.at(k, c.birth[j]), w.past.at(k, c.death[j])
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
	for first := 0; first < c.n; first += chunk {
		n := min(chunk, c.n-first)
		s0, s1, err := w.susceptibilities(first, n)
		if err != nil {
			return false, err
		}
		from := len(w.active)
		for k := range m.Clocks {
			w.drawExponentials(k, first, n)
			w.active = appendReached(w.active, first, c.reading[k][first:first+n], s0[k], s1[k], w.caps[k])
			if w.compact {
				w.steadyReadings(k, first, n, s0[k], s1[k])
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

// steadyReadings is readingOf for a chunk, under the first piece of the
// history and to the end of the leg. What is born and stays in its second
// stage has its death at its birth.
func (w *Workspace) steadyReadings(k, first, n int, s0, s1 []float64) {
	c := &w.c
	t0, r0, r := w.past.piece(0, k)
	x, birth, death := c.reading[k][first:first+n], c.birth[first:first+n], c.death[first:first+n]
	s0, s1 = s0[:n], s1[:n]
	for i, e := range x {
		b := r0 + r*(birth[i]-t0)
		d := r0 + r*(death[i]-t0)
		x[i] = d + (e-s0[i]*(d-b))/s1[i]
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

// settle ends a quiet leg at date t: every object left out gets the readings
// it would have had.
func (w *Workspace) settle(t float64) error {
	m, c := w.m, &w.c
	if !w.quiet {
		return nil
	}
	w.quiet = false
	w.isActive = nil // as large as the galaxy, and done with
	w.past.index()
	steady := w.compact && len(w.past.t) == 1 && t >= c.lastDeath && !c.immortal
	if w.compact && t >= c.lastDeath && !c.immortal {
		return w.settleCompact(steady)
	}
	isActive := 0
	for first := 0; first < c.n; first += chunk {
		n := min(chunk, c.n-first)
		var s0, s1 [][]float64
		if !steady {
			var err error
			if s0, s1, err = w.susceptibilities(first, n); err != nil {
				return err
			}
		}
		for i := range n {
			j := first + i
			if isActive < len(w.active) && w.active[isActive] == uint32(j) {
				isActive++
				continue
			}
			w.stage[j] = w.stageAt(j, t)
			if steady || w.stage[j] == 0 && !w.compact {
				continue
			}
			for k := range m.Clocks {
				e := c.reading[k][j]
				if w.compact {
					e = w.exponential(k, uint32(j), 0)
				}
				if w.stage[j] != 0 {
					if m.encounter != nil || c.chain != nil {
						w.spareOf(k, j, e, s0[k][i], s1[k][i], t)
					}
					e = w.readingOf(k, j, e, s0[k][i], s1[k][i], t)
				}
				c.reading[k][j] = e
			}
		}
	}
	return nil
}

// settleCompact settles a compact leg that has seen the last star die. Where
// the rates changed on the way, the readings are made anew, from the same
// draws and susceptibilities.
func (w *Workspace) settleCompact(steady bool) error {
	c := &w.c
	active := w.active
	for first := 0; first < c.n; first += chunk {
		n := min(chunk, c.n-first)
		here := 0
		for here < len(active) && int(active[here]) < first+n {
			here++
		}
		stage := w.stage[first : first+n]
		w.kept = w.kept[:0]
		for _, j := range active[:here] {
			w.kept = append(w.kept, float64(w.stage[j]))
			for k := range w.m.Clocks {
				w.kept = append(w.kept, c.reading[k][j])
			}
		}
		for i := range stage {
			stage[i] = 2
		}
		if !steady {
			s0, s1, err := w.exposeChunk(first, n)
			if err != nil {
				return err
			}
			for k := range w.m.Clocks {
				w.drawExponentials(k, first, n)
				w.laterReadings(k, first, n, s0[k], s1[k])
			}
		}
		kept := w.kept
		for _, j := range active[:here] {
			w.stage[j] = uint8(kept[0])
			for k := range w.m.Clocks {
				c.reading[k][j] = kept[1+k]
			}
			kept = kept[1+len(w.m.Clocks):]
		}
		active = active[here:]
	}
	return nil
}

// laterReadings is steadyReadings under the whole history of the leg.
func (w *Workspace) laterReadings(k, first, n int, s0, s1 []float64) {
	c := &w.c
	t0, r0, r := w.past.piece(0, k)
	t1, _, _ := w.past.piece(1, k)
	x, birth, death := c.reading[k][first:first+n], c.birth[first:first+n], c.death[first:first+n]
	s0, s1 = s0[:n], s1[:n]
	for i, e := range x {
		b := r0 + r*(birth[i]-t0)
		d := r0 + r*(death[i]-t0)
		if death[i] > t1 {
			b, d = w.past.at(k, birth[i]), w.past.at(k, death[i])
		}
		x[i] = d + (e-s0[i]*(d-b))/s1[i]
	}
}

// stageAt is the stage of an object that nothing has hit by date t.
func (w *Workspace) stageAt(j int, t float64) uint8 {
	c := &w.c
	switch {
	case c.birth[j] > t:
		return 0
	case c.died[j] != 0 && c.death[j] > t:
		return 1
	}
	return 2
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
