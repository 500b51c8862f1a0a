package engine

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
	for first := 0; first < c.n; first += w.m.batch {
		n := min(w.m.batch, c.n-first)
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
			var p passage
			if w.stage[j] != 0 {
				p = w.passageOf(j, t)
			}
			for k := range m.Clocks {
				e := c.reading[k][j]
				if w.compact {
					e = w.exponential(k, uint32(j), 0)
				}
				if w.stage[j] != 0 {
					if m.encounter != nil || c.chain != nil {
						w.spareOf(k, j, p, e, s0[k][i], s1[k][i])
					}
					e = w.readingOf(k, j, p, e, s0[k][i], s1[k][i], t)
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
	for first := 0; first < c.n; first += w.m.batch {
		n := min(w.m.batch, c.n-first)
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

// laterReadings is enterSteady under the whole history of the leg.
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
