package engine

import (
	"bytes"
	"fmt"
	"math"

	"wane/sim/law"
	"wane/sim/num"
)

// found makes the objects of one realisation: their births, lives, remnants
// and prospects, whole generations in one batch a question.
func (a *asker) found(c *columns) error {
	c.resize(a.m, a.m.Objects)
	for first := 0; first < c.n; first += a.m.batch {
		if err := a.foundChunk(c, first, min(a.m.batch, c.n-first)); err != nil {
			return err
		}
	}
	return nil
}

func (a *asker) foundChunk(c *columns, first, n int) error {
	m := a.m
	kind := c.kind0[first : first+n]
	for i := range kind {
		kind[i] = law.Star
	}
	r := a.firstStage(c, first, n)
	out, err := a.ask(m.mass, "mass", r, drawU)
	if err != nil {
		return err
	}
	if err := m.mass.Rises("mass", law.Batch{Columns: a.columns}, out); err != nil {
		return err
	}
	copy(c.mass0[first:first+n], out.Columns[0].Values)
	if out, err = a.ask(m.birth, "birth", r, drawU); err != nil {
		return err
	}
	if err := m.birth.Rises("birth", law.Batch{Columns: a.columns}, out); err != nil {
		return err
	}
	a.kept = append(a.kept[:0], out.Columns[0].Values...)
	num.Exp10Into(c.birth[first:first+n], a.kept)
	if err := a.foundMetals(c, r, a.kept); err != nil {
		return err
	}
	if out, err = a.ask(m.sort, "sort", r, drawU); err != nil {
		return err
	}
	copy(kind, out.Columns[0].Words)
	j := first + n
	copy(c.death[first:j], c.birth[first:j])
	clear(c.died[first:j])
	clear(c.left[first:j])
	if c.turned != nil {
		clear(c.turned[first:j])
	}
	fill(c.leave[first:j], never)
	place := c.place[first:j]
	for i := range place {
		place[i] = law.Bound
	}
	return a.foundLives(c, r)
}

func (a *asker) foundMetals(c *columns, r *rows, dates []float64) error {
	first := int(r.first)
	r.other = append(r.other[:0], law.Numbers("log10_date", dates))
	out, err := a.ask(a.m.metals, "metals", r, drawU)
	if err != nil {
		return err
	}
	if err := a.m.metals.Rises("metals", law.Batch{Columns: a.columns}, out); err != nil {
		return err
	}
	z := out.Columns[0].Values
	if first == 0 {
		c.metals, c.metal = nil, z[0]
	}
	if c.metals == nil {
		same := true
		for _, v := range z {
			same = same && v == c.metal
		}
		if !same {
			c.metals = make([]float64, c.n)
			fill(c.metals[:first], c.metal)
		}
	}
	if c.metals != nil {
		copy(c.metals[first:], z)
	}
	r.metals = a.metalColumn(c, first, r.n)
	r.other = r.other[:0]
	return nil
}

// foundLives asks how stars live and what they leave, then the prospects of
// what they leave and of all that never was a star.
func (a *asker) foundLives(c *columns, r *rows) error {
	m, first, n := a.m, int(r.first), r.n
	stars, pick := a.spoken(m.live, r)
	if stars.n > 0 {
		out, err := a.ask(m.live, "live", stars, drawU)
		if err != nil {
			return err
		}
		a.kept = grown(a.kept, stars.n)
		num.Exp10Into(a.kept, out.Columns[0].Values)
		death, birth := c.death[first:first+n], c.birth[first:first+n]
		if pick == nil {
			for i, wait := range a.kept {
				death[i] = birth[i] + wait
			}
		}
		for i, j := range pick {
			death[j] = birth[j] + a.kept[i]
		}
	}
	a.latest = never
	starEnd, err := a.starProspects(c, r)
	if err != nil {
		return err
	}
	for _, u := range m.ends {
		if err := a.remnantsOf(c, r, u, nil); err != nil {
			return err
		}
	}
	if bytes.IndexByte(c.died[first:first+n], 0) >= 0 { // not all are stars with an end
		for i, k := range c.kind0[first : first+n] {
			if j := first + i; k == law.Star && c.died[j] == 0 && c.death[j] < never {
				return fmt.Errorf("engine: no law says what a star of %v Msun leaves", c.mass0[j])
			}
		}
	}
	return a.foundProspects(c, first, n, starEnd)
}

// starProspects asks what wearing and turning laws have in store for stars, if
// any speaks for them; else nil.
func (a *asker) starProspects(c *columns, r *rows) ([]prospect, error) {
	first := int(r.first)
	if !a.m.starsEnd() {
		return nil, nil
	}
	p, err := a.prospects(r, func(i int) float64 { return num.Log10(c.birth[first+i]) })
	return append([]prospect(nil), p...), err
}

// starsEnd tells whether a wearing or turning law speaks for stars.
func (m *Model) starsEnd() bool {
	for _, uses := range [2][]*law.Use{m.wearing, m.turning} {
		for _, u := range uses {
			if any, _ := u.SpeaksForKind(law.Star); any {
				return true
			}
		}
	}
	return false
}

// foundProspects completes the second stage and asks what ends it.
func (a *asker) foundProspects(c *columns, first, n int, starEnd []prospect) error {
	kind0, died := c.kind0[first:first+n], c.died[first:first+n]
	if bytes.IndexByte(died, 0) >= 0 {
		kind1, mass1, comp1 := c.kind1[first:first+n], c.mass1[first:first+n], c.comp1[first:first+n]
		for i, why := range died {
			if why == 0 {
				kind1[i], mass1[i], comp1[i] = kind0[i], c.mass0[first+i], law.Hydrogen
			}
		}
	}
	for i, p := range starEnd {
		if kind0[i] == law.Star {
			if err := a.cutShort(c, first+i, p); err != nil {
				return err
			}
		}
	}
	latest := c.founding(first, n)
	r := a.secondStage(c, first, n)
	since := func(i int) float64 { return num.Log10(c.death[first+i]) }
	a.latest = num.Log10(latest)
	if a.m.simpleEnds() {
		return a.simpleProspects(c, r, since)
	}
	if err := a.wearBound(c, r, since); err != nil {
		return err
	}
	ps, err := a.prospects(r, since)
	if err != nil {
		return err
	}
	for i, p := range ps {
		c.end[first+i], c.ended[first+i] = p.date, p.cause
		c.noteGas(uint32(first+i), 0, p)
	}
	return a.foundChains(c, r, first, ps)
}

// founding takes the mass of objects first .. first+n-1 and the earliest of
// their births into account, and returns the latest date so far at which one
// entered its second stage.
func (c *columns) founding(first, n int) (latest float64) {
	latest = c.lastDeath
	for i, d := range c.death[first : first+n] {
		if d > latest {
			if d <= math.MaxFloat64 {
				latest = d
			} else {
				c.immortal = true
				latest = max(latest, c.birth[first+i])
			}
		}
	}
	c.lastDeath = latest
	for _, b := range c.birth[first : first+n] {
		if b < c.earliest {
			c.earliest = b
		}
	}
	for to := first + n; first < to; first += chunk {
		c.founded.add(sumOf(c.mass0[first:min(first+chunk, to)]))
	}
	return latest
}

// sumOf adds in four sums side by side, since each has to wait for its last
// addition.
func sumOf(x []float64) float64 {
	var part [4]float64
	for ; len(x) >= 4; x = x[4:] {
		part[0] += x[0]
		part[1] += x[1]
		part[2] += x[2]
		part[3] += x[3]
	}
	for _, v := range x {
		part[0] += v
	}
	return (part[0] + part[1]) + (part[2] + part[3])
}

// cutShort ends a star's life by a prospect that comes before its death.
func (a *asker) cutShort(c *columns, j int, p prospect) error {
	if p.cause == 0 || p.date > 300 || num.Exp10(p.date) >= c.death[j] {
		return nil
	}
	c.death[j] = num.Exp10(p.date)
	return a.becomes(c, j, p)
}

// becomes makes a star's second stage what a prospect makes of it.
func (a *asker) becomes(c *columns, j int, p prospect) error {
	if p.kind == law.NoWord {
		return fmt.Errorf("engine: law %s: a star of %.6g Msun would be gone before it dies: the engine has no place for that",
			a.m.lawOf(p.cause), c.mass0[j])
	}
	c.died[j] = p.cause
	c.noteGas(uint32(j), starStep, p)
	c.kind1[j], c.mass1[j], c.comp1[j] = p.kind, p.mass, a.m.compositionOf(p.kind, law.Hydrogen)
	return nil
}
