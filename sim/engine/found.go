package engine

import (
	"fmt"
	"math"

	"wane/sim/law"
	"wane/sim/num"
)

// found makes the objects of one realisation: their births, lives, remnants
// and prospects, whole generations in one batch a question.
func (a *asker) found(c *columns) error {
	m := a.m
	c.resize(m, m.Objects)
	r := newRows(min(chunk, m.Objects))
	for first := 0; first < c.n; first += chunk {
		n := min(chunk, c.n-first)
		if err := a.foundChunk(c, r, first, n); err != nil {
			return err
		}
	}
	return nil
}

func (a *asker) foundChunk(c *columns, r *rows, first, n int) error {
	m := a.m
	r.resize(n)
	for i := range n {
		r.id[i], r.gen[i] = uint32(first+i), 0
		r.kind[i], r.comp[i], r.place[i], r.origin[i] = law.Star, law.Hydrogen, law.Bound, law.Founded
	}
	r.contiguous = true
	out, err := a.ask(m.mass, "mass", r, drawU)
	if err != nil {
		return err
	}
	copy(r.mass, out.Columns[0].Values)
	copy(r.birthMass, r.mass)
	if out, err = a.ask(m.birth, "birth", r, drawU); err != nil {
		return err
	}
	dates := a.arenaCopy(out.Columns[0].Values)
	num.Exp10Into(c.birth[first:first+n], dates)
	if err := a.foundMetals(c, r, first, dates); err != nil {
		return err
	}
	if out, err = a.ask(m.sort, "sort", r, drawU); err != nil {
		return err
	}
	copy(r.kind, out.Columns[0].Words)
	copy(c.kind0[first:], r.kind)
	copy(c.mass0[first:], r.mass)
	return a.foundLives(c, r, first)
}

// arenaCopy keeps an answer beyond the next ask.
func (a *asker) arenaCopy(v []float64) []float64 {
	a.kept = append(a.kept[:0], v...)
	return a.kept
}

func (a *asker) foundMetals(c *columns, r *rows, first int, dates []float64) error {
	r.other = append(r.other[:0], law.Numbers("log10_date", dates))
	out, err := a.ask(a.m.metals, "metals", r, drawU)
	if err != nil {
		return err
	}
	copy(r.metals, out.Columns[0].Values)
	if first == 0 {
		c.metals, c.metal = nil, r.metals[0]
	}
	for i, z := range r.metals {
		if c.metals == nil && z != c.metal {
			c.metals = make([]float64, c.n)
			for j := range first + i {
				c.metals[j] = c.metal
			}
		}
		if c.metals != nil {
			c.metals[first+i] = z
		}
	}
	r.other = r.other[:0]
	return nil
}

// foundLives asks how stars live and what they leave, then the prospects of
// what they leave and of all that never was a star.
func (a *asker) foundLives(c *columns, r *rows, first int) error {
	m := a.m
	n := r.n
	for i := range n {
		j := first + i
		c.death[j], c.died[j] = c.birth[j], 0
		c.leave[j], c.left[j], c.place[j], c.turned[j] = never, 0, law.Bound, 0
	}
	stars, pick := a.spoken(m.live, r)
	if stars.n > 0 {
		out, err := a.ask(m.live, "live", stars, drawU)
		if err != nil {
			return err
		}
		waits := out.Columns[0].Values
		a.kept = grown(a.kept, stars.n)
		num.Exp10Into(a.kept[:stars.n], waits)
		for i := range stars.n {
			j := first + at(pick, i)
			c.death[j] = c.birth[j] + a.kept[i]
		}
	}
	a.starProspect, a.latest = false, never
	for _, u := range a.m.wearing {
		a.starProspect = a.starProspect || u.Speaks(law.Star, 1, 0.02)
	}
	for _, u := range a.m.turning {
		a.starProspect = a.starProspect || u.Speaks(law.Star, 1, 0.02)
	}
	var starEnd []prospect
	if a.starProspect {
		p, err := a.prospects(r, func(i int) float64 { return num.Log10(c.birth[first+i]) })
		if err != nil {
			return err
		}
		starEnd = append(starEnd, p...)
	}
	for _, u := range m.ends {
		if err := a.remnantsOf(c, r, u, func(i int) int { return first + i }); err != nil {
			return err
		}
	}
	for i := range n {
		j := first + i
		if c.kind0[j] == law.Star && c.died[j] == 0 && c.death[j] < never {
			return fmt.Errorf("engine: no law says what a star of %v Msun leaves", c.mass0[j])
		}
	}
	return a.foundProspects(c, r, first, starEnd)
}

// remnantsOf fills the second stage of the stars of r that u speaks for.
func (a *asker) remnantsOf(c *columns, r *rows, u *law.Use, id func(int) int) error {
	stars, pick := a.spoken(u, r)
	if stars.n == 0 {
		return nil
	}
	words := wordsOf(u, "die")
	kinds, causes := make([]uint8, len(words)), make([]uint8, len(words))
	for w, word := range words {
		kinds[w], causes[w] = a.m.Set.Kind(word), a.m.cause(u.Card.Process, becameWord+word)
	}
	out, err := a.ask(u, "die", stars, drawU)
	if err != nil {
		return err
	}
	s := a.streams[u.Card.Process]
	a.words = grown(a.words, stars.n)
	for i := range stars.n {
		w := 0
		if len(words) > 1 {
			w = pickWord(out, 0, len(words), i, s.Uniform(uint64(stars.id[i]), stars.gen[i], drawPick))
		}
		a.words[i] = uint8(w)
	}
	// The kind asked about in remain is that of the remnant, while r still
	// says star for the other laws.
	saved := a.savedKinds(stars)
	for i := range stars.n {
		stars.kind[i] = kinds[a.words[i]]
	}
	if out, err = a.ask(u, "remain", stars, drawSize); err != nil {
		return err
	}
	mass, comp := out.Columns[0].Values, out.Columns[1].Words
	for i := range stars.n {
		j := id(at(pick, i))
		if !(mass[i] <= c.mass0[j]) || mass[i] < 0 {
			return &law.Fault{Law: u.ID(), Question: "remain", Row: i, Column: "mass",
				Object: fmt.Sprintf("star, %.6g Msun", c.mass0[j]), Got: fmt.Sprintf("%v Msun", mass[i]), Want: "0 .. the star's mass"}
		}
		c.kind1[j], c.mass1[j], c.comp1[j] = stars.kind[i], mass[i], comp[i]
		c.died[j] = causes[a.words[i]]
	}
	copy(stars.kind, saved)
	return nil
}

func (a *asker) savedKinds(r *rows) []uint8 {
	a.kinds = append(a.kinds[:0], r.kind[:r.n]...)
	return a.kinds
}

// pickWord picks a word by its chances: the columns from first on, in order.
func pickWord(out law.Batch, first, words, row int, u float64) int {
	sum := 0.0
	for w := range words {
		sum += out.Columns[first+w].Values[row]
		if u < sum {
			return w
		}
	}
	for w := words - 1; w > 0; w-- { // rounding: the last word with a chance
		if out.Columns[first+w].Values[row] > 0 {
			return w
		}
	}
	return 0
}

// foundProspects turns r into the second stage and asks what ends it.
func (a *asker) foundProspects(c *columns, r *rows, first int, starEnd []prospect) error {
	latest := c.lastDeath
	for i := range r.n {
		j := first + i
		if c.kind0[j] != law.Star || c.died[j] == 0 {
			c.kind1[j], c.mass1[j], c.comp1[j] = c.kind0[j], c.mass0[j], law.Hydrogen
		}
		if starEnd != nil && c.kind0[j] == law.Star {
			if p := starEnd[i]; p.cause != 0 && p.date < 300 && num.Exp10(p.date) < c.death[j] {
				if p.kind == law.NoWord {
					return fmt.Errorf("engine: a star of %.6g Msun would be gone before it dies: not supported", c.mass0[j])
				}
				c.death[j], c.died[j] = num.Exp10(p.date), p.cause
				c.kind1[j], c.mass1[j], c.comp1[j] = p.kind, p.mass, a.m.compositionOf(p.kind, r.comp[i])
			}
		}
		if c.death[j] > latest && !math.IsInf(c.death[j], 1) {
			latest = c.death[j]
		}
		if c.birth[j] > latest {
			latest = c.birth[j]
		}
		c.founded += c.mass0[j]
		r.kind[i], r.mass[i], r.comp[i], r.birthMass[i] = c.kind1[j], c.mass1[j], c.comp1[j], c.mass1[j]
		if c.died[j] != 0 {
			r.gen[i] = 1
		}
	}
	r.contiguous = false
	c.lastDeath = latest
	a.latest = num.Log10(latest)
	if err := a.wearBound(c, r, func(i int) float64 { return num.Log10(c.death[first+i]) }); err != nil {
		return err
	}
	ps, err := a.prospects(r, func(i int) float64 { return num.Log10(c.death[first+i]) })
	if err != nil {
		return err
	}
	for i, p := range ps {
		c.end[first+i], c.ended[first+i] = p.date, p.cause
		c.noteGas(uint32(first+i), 0, p)
	}
	return a.foundChains(c, r, first, ps)
}
