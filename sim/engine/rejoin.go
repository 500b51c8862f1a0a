package engine

import (
	"wane/sim/law"
	"wane/sim/num"
)

// rejoin founds the lives of products and puts them on the clocks at date t.
func (w *Workspace) rejoin(ids []uint32, t float64) error {
	c, a := &w.c, w.ask
	r := &w.meets.products
	w.fillRows(r, ids)
	for j, i := range ids {
		r.kind[j], r.mass[j], r.comp[j], r.birthMass[j] = c.kind0[i], c.mass0[i], c.comp1[i], c.mass0[i]
		r.gen[j] = c.generation[i]
	}
	if err := w.resort(ids, r); err != nil {
		return err
	}
	s0, err := a.exposures(r)
	if err != nil {
		return err
	}
	w.keepSusceptibilities(0, ids, s0)
	if err := w.divertRows(0, ids, r); err != nil {
		return err
	}
	if err := w.reliveStars(ids, r); err != nil {
		return err
	}
	s1, err := a.exposures(r)
	if err != nil {
		return err
	}
	w.keepSusceptibilities(1, ids, s1)
	if err := w.divertRows(1, ids, r); err != nil {
		return err
	}
	if err := w.reprospect(ids, r); err != nil {
		return err
	}
	for _, i := range ids {
		w.count(i, +1)
		w.meets.renew(w, i)
		for k := range w.m.Clocks {
			delete(w.spared[k], i)
			c.reading[k][i] = over(w.readingAt(k, t), w.exponential(k, i, c.generation[i]), w.sus(k, i))
			w.enqueue(k, i)
		}
		if c.died[i] != 0 {
			w.scheduleDeath(i, w.schedule.push)
		} else {
			w.scheduleEnd(i)
		}
		w.wear.enter(w, i)
		if !w.endsScheduled {
			w.endAt = min(w.endAt, w.linear(c.end[i]))
		}
	}
	w.wear.at = min(w.wear.at, w.linear(c.wearAt))
	return nil
}

// resort lets sort tell stars from brown dwarfs among products.
func (w *Workspace) resort(ids []uint32, r *rows) error {
	out, err := w.ask.ask(w.m.sort, "sort", r, drawU)
	if err != nil {
		return err
	}
	for j, i := range ids {
		if k := r.kind[j]; k != law.Star && k != law.BrownDwarf {
			continue
		}
		kind := out.Columns[0].Words[j]
		if kind != r.kind[j] {
			w.meets.rename(i, kind)
		}
		r.kind[j] = kind
		w.c.kind0[i], w.c.kind1[i] = kind, kind
		if kind == law.Star {
			w.stage[i], r.comp[j] = 1, law.Hydrogen
		}
	}
	return nil
}

// rename mends the kind in the journal's last entry of object i.
func (x *meetings) rename(i uint32, kind uint8) {
	for n := len(x.journal) - 1; n >= 0; n-- {
		if t := &x.journal[n]; t.id == i {
			t.to = stateOf(kind, law.Bound, uint8(t.to)%2)
			return
		}
	}
}

// reliveStars asks how the stars among products live and what they leave; r
// becomes the table of second stages.
func (w *Workspace) reliveStars(ids []uint32, r *rows) error {
	c, a, m := &w.c, w.ask, w.m
	stars, pick := a.spoken(m.live, r)
	if stars.n > 0 {
		out, err := a.ask(m.live, "live", stars, drawU)
		if err != nil {
			return err
		}
		for i, wait := range out.Columns[0].Values {
			id := ids[at(pick, i)]
			c.death[id] = addCoded(c.birth[id], wait)
		}
		for _, u := range m.ends {
			if err := a.remnantsOf(c, r, u, func(i int) int { return int(ids[i]) }); err != nil {
				return err
			}
		}
	}
	if err := w.cutShort(ids, r); err != nil {
		return err
	}
	for j, i := range ids {
		if c.died[i] != 0 {
			r.kind[j], r.mass[j], r.comp[j], r.birthMass[j] = c.kind1[i], c.mass1[i], c.comp1[i], c.mass1[i]
			r.gen[j]++
		}
	}
	return nil
}

// cutShort ends the lives of stars among products by prospects that come
// before their deaths.
func (w *Workspace) cutShort(ids []uint32, r *rows) error {
	c, a := &w.c, w.ask
	if !a.m.starsEnd() {
		return nil
	}
	a.latest = never
	ps, err := a.prospects(r, func(j int) float64 { return w.logDate(c.birth[ids[j]]) })
	if err != nil {
		return err
	}
	for j, i := range ids {
		if p := ps[j]; r.kind[j] == law.Star && p.cause != 0 && p.date < w.logDate(c.death[i]) {
			if err := a.becomes(c, int(i), p); err != nil {
				return err
			}
			c.death[i] = codedLog(p.date)
		}
	}
	return nil
}

// addCoded adds a log10 wait to a coded date.
func addCoded(date, wait float64) float64 {
	if date < 0 {
		return -later(-date, wait)
	}
	if d := date + num.Exp10(wait); d < 1e300 {
		return d
	}
	return -later(num.Log10(date), wait)
}

func (w *Workspace) keepSusceptibilities(stage int, ids []uint32, s [][]float64) {
	for k := range w.m.Clocks {
		for j, i := range ids {
			w.s[stage][k][i] = s[k][j]
			w.meets.set(stage, k, i, w.ask.soughts[k][j])
		}
	}
}

func (w *Workspace) divertRows(stage int, ids []uint32, r *rows) error {
	for j := range ids {
		for _, d := range w.m.diverts {
			w.c.turned[ids[j]] &^= 1 << (2*d.clock + stage)
		}
	}
	return w.divert(stage, r, func(i int) int { return int(ids[i]) })
}

// reprospect asks what ends the second stage of products.
func (w *Workspace) reprospect(ids []uint32, r *rows) error {
	c, a := &w.c, w.ask
	since := func(j int) float64 { return w.logDate(c.death[ids[j]]) }
	a.latest = never
	if err := a.wearBound(c, r, since); err != nil {
		return err
	}
	ps, err := a.prospects(r, since)
	if err != nil {
		return err
	}
	ps = append(w.meets.prospects[:0], ps...)
	w.meets.prospects = ps
	for j, p := range ps {
		c.end[ids[j]], c.ended[ids[j]] = p.date, p.cause
		c.noteGas(ids[j], 0, p)
	}
	return a.chains(r, ps, func(j int) uint32 { return ids[j] }, c)
}
