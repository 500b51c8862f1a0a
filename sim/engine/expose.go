package engine

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
	for first := 0; first < c.n; first += m.batch {
		n := min(m.batch, c.n-first)
		s0, s1, err := w.exposeChunk(first, n)
		if err != nil {
			return err
		}
		for k := range m.Clocks {
			copy(w.s[0][k][first:], s0[k][:n])
			copy(w.s[1][k][first:], s1[k][:n])
		}
	}
	w.meets.plant(w)
	for k := range m.Clocks {
		for i := range c.n {
			if m.sums[k] {
				w.env.add(m.slotSum(k), m.Weight*w.s[0][k][i])
			}
			if m.soughts[k] {
				w.env.add(m.slotSought(k), m.Weight*w.meets.sought(w, k, uint32(i)))
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
