package engine

import (
	"math"

	"wane/sim/law"
	"wane/sim/num"
)

// wearBound lowers the bounds on when wearing is first felt by what the rows
// lose in their new stage.
func (a *asker) wearBound(c *columns, r *rows, since func(int) float64) error {
	for _, u := range a.m.wearing {
		s, pick := a.spoken(u, r)
		if s.n == 0 {
			continue
		}
		if err := a.wearBoundOf(c, u, s, pick, since); err != nil {
			return err
		}
	}
	return nil
}

// wearBoundOf is wearBound for the rows that one law speaks for.
func (a *asker) wearBoundOf(c *columns, u *law.Use, s *rows, pick []int32, since func(int) float64) error {
	out, err := a.ask(u, "wear", s, drawU)
	if err != nil {
		return err
	}
	share := num.Log10(0.9 * wearToStep / float64(len(a.m.wearing)))
	mass := s.mass[:s.n]
	known := max(c.wearStep, c.wearAt)
	for i, l := range out.Columns[0].Values {
		d := share - l + belowLog10(mass[i])
		if d >= known {
			continue // a bound that lowers neither need not be exact
		}
		if d < c.wearStep {
			c.wearStep = d
		}
		if at := later(since(at(pick, i)), d); at < c.wearAt {
			c.wearAt = at
		}
		known = max(c.wearStep, c.wearAt)
	}
	return nil
}

// belowLog10 is a bound on log10 x from below, by its exponent: less than
// log10 2 off.
func belowLog10(x float64) float64 {
	return float64(int(math.Float64bits(x)>>52)-1023) * (math.Ln2 / math.Ln10)
}

// learnRates asks the rate of every bound object whose stage is new.
func (w *Workspace) learnRates() error {
	x, c := &w.wear, &w.c
	x.ids = x.ids[:0]
	for i := range uint32(c.n) {
		if w.wears(i) && x.known[i] != w.stage[i] {
			x.ids = append(x.ids, i)
		}
	}
	if len(x.ids) == 0 {
		return nil
	}
	for _, i := range x.ids {
		x.born[i], x.known[i] = w.massOf(i), w.stage[i]
	}
	r := w.rowsOf(x.ids)
	rate, start, err := w.wearRates(r, true)
	if err != nil {
		return err
	}
	for j, i := range x.ids {
		x.rate[i] = rate[j]
		x.since[i] = max(w.entered(i), w.linear(start[j]))
	}
	return nil
}

// entered is the date at which object i entered its present stage.
func (w *Workspace) entered(i uint32) float64 {
	switch s := w.stageOf(i); {
	case s == 2:
		return w.years(w.c.death[i])
	case s == 3:
		return w.linear(w.c.end[i])
	default:
		return w.linear(w.c.chain[i][s-4].end)
	}
}

// rowsOf tabulates bound objects as they now are.
func (w *Workspace) rowsOf(ids []uint32) *rows {
	r := newRows(len(ids))
	w.fillRows(r, ids)
	return r
}

// fillRows is rowsOf into a table of its own.
func (w *Workspace) fillRows(r *rows, ids []uint32) {
	c := &w.c
	r.resize(len(ids))
	for j, i := range ids {
		r.id[j], r.gen[j] = i, w.generationOf(i)
		r.kind[j], r.place[j], r.origin[j] = w.kindOf(i), law.Bound, w.originOf(i)
		r.mass[j], r.metals[j] = w.massOf(i), c.metalsOf(int(i))
		r.birthMass[j] = r.mass[j]
		if len(w.wear.known) > 0 && w.wear.known[i] == w.stage[i] {
			r.birthMass[j] = w.wear.born[i]
		}
		switch s := w.stageOf(i); {
		case s <= 1:
			r.comp[j] = law.Hydrogen
		case s == 2:
			r.comp[j] = c.comp1[i]
		default:
			r.comp[j] = c.chain[i][s-3].comp
		}
	}
}

// wearRates sums what the wearing laws take from each row, per unit of time;
// starts are the log10 dates from which they act, when asked for.
func (w *Workspace) wearRates(r *rows, starts bool) (rate, start []float64, err error) {
	rate = make([]float64, r.n)
	start = make([]float64, r.n)
	fill(start, -never)
	for _, u := range w.m.wearing {
		s, pick := w.ask.spoken(u, r)
		if s.n == 0 {
			continue
		}
		if starts {
			from, err := w.ask.starts(u, s, pick, func(int) float64 { return -never })
			if err != nil {
				return nil, nil, err
			}
			for i, d := range from {
				start[at(pick, i)] = max(start[at(pick, i)], d)
			}
		}
		out, err := w.ask.ask(u, "wear", s, drawU)
		if err != nil {
			return nil, nil, err
		}
		for i, l := range out.Columns[0].Values {
			rate[at(pick, i)] += num.Exp10(l + w.env.unit)
		}
	}
	return rate, start, nil
}
