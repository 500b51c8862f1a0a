package engine

import (
	"fmt"
	"strconv"

	"wane/sim/law"
	"wane/sim/physics/structure"
)

// foundChains follows prospects that change an object rather than end it: a
// neutron star that becomes a relic, which then dissolves.
func (a *asker) foundChains(c *columns, r *rows, first int, ps []prospect) error {
	return a.chains(r, ps, func(i int) uint32 { return uint32(first + i) }, c)
}

const longestChain = 16

func (a *asker) chains(r *rows, ps []prospect, id func(int) uint32, c *columns) error {
	n := 0
	for _, p := range ps {
		if p.cause != 0 && p.kind != law.NoWord {
			n++
		}
	}
	if n == 0 {
		return nil
	}
	next := newRows(n)
	next.resize(n)
	owner, dates := make([]uint32, 0, n), make([]float64, 0, n)
	for i, p := range ps {
		if p.cause == 0 || p.kind == law.NoWord {
			continue
		}
		k := len(owner)
		next.copyRow(k, r, i)
		a.enter(next, k, p)
		owner, dates = append(owner, id(i)), append(dates, p.date)
	}
	if c.chain == nil {
		c.chain = make(map[uint32][]link, n)
	}
	for depth := 0; len(owner) > 0; depth++ {
		if depth == longestChain {
			return fmt.Errorf("engine: object %d changes more than %d times by itself", owner[0], longestChain)
		}
		if err := a.linkUp(next, &owner, &dates, c); err != nil {
			return err
		}
	}
	return nil
}

// enter makes row k what prospect p makes of it.
func (a *asker) enter(r *rows, k int, p prospect) {
	r.kind[k], r.mass[k], r.birthMass[k] = p.kind, p.mass, p.mass
	r.comp[k] = a.m.compositionOf(p.kind, r.comp[k])
	r.gen[k]++
}

// linkUp adds one link for every row and shrinks the table to those that have
// a further one.
func (a *asker) linkUp(r *rows, owner *[]uint32, dates *[]float64, c *columns) error {
	a.latest = never
	d := *dates
	found, err := a.prospects(r, func(i int) float64 { return d[i] })
	if err != nil {
		return err
	}
	ps := append([]prospect(nil), found...)
	if err := a.wearBound(c, r, func(i int) float64 { return d[i] }); err != nil {
		return err
	}
	turned := make([]uint8, r.n)
	if err := a.divert(r, func(i, clock int) { turned[i] |= 1 << clock }); err != nil {
		return err
	}
	s, err := a.exposures(r)
	if err != nil {
		return err
	}
	kept := 0
	for i, p := range ps {
		l := link{mass: r.mass[i], kind: r.kind[i], comp: r.comp[i], end: p.date, ended: p.cause, turned: turned[i]}
		for k := range a.m.Clocks {
			l.s[k] = s[k][i]
			if a.m.encounter != nil {
				l.sought[k] = a.soughts[k][i]
			}
		}
		last := p.cause == 0 || p.kind == law.NoWord
		links := c.chain[(*owner)[i]]
		if links == nil && !last {
			links = make([]link, 0, 2)
		}
		links = append(links, l)
		c.chain[(*owner)[i]] = links
		c.noteGas((*owner)[i], len(links), p)
		if last {
			continue
		}
		r.copyRow(kept, r, i)
		a.enter(r, kept, p)
		(*owner)[kept], (*dates)[kept] = (*owner)[i], p.date
		kept++
	}
	r.resize(kept)
	*owner, *dates = (*owner)[:kept], (*dates)[:kept]
	return nil
}

// exposures asks every susceptibility of every row, one column a clock. For
// encounter clocks it is what the object seeks; what is sought of it is in
// a.soughts. Good until the call after the next; a.soughts until the next.
func (a *asker) exposures(r *rows) ([][]float64, error) {
	a.turn = 1 + a.turn%2
	arena := &a.arenas[a.turn]
	arena.Reset()
	exposed := grown(a.exposed[a.turn-1], len(a.m.Clocks))
	a.exposed[a.turn-1] = exposed
	clear(exposed)
	a.soughts = grown(a.soughts, len(a.m.Clocks))
	clear(a.soughts)
	a.arena = arena
	defer func() { a.arena = &a.arenas[0] }()
	for _, x := range a.m.exposing {
		s, pick := a.spoken(x.use, r)
		n := len(x.use.Card.Clocks)
		if s.n == 0 {
			continue
		}
		out, err := a.askKeeping(x.use, "expose", s, drawU)
		if err != nil {
			return nil, err
		}
		for k := range n {
			exposed[x.first+k] = spread(arena, out.Columns[k].Values, pick, r.n)
			if x.use == a.m.encounter {
				a.soughts[x.first+k] = spread(arena, out.Columns[n+k].Values, pick, r.n)
			}
		}
	}
	for k := range exposed {
		if exposed[k] == nil {
			exposed[k] = arena.Values(r.n)
			clear(exposed[k])
		}
		if a.soughts[k] == nil && a.m.encounter != nil {
			a.soughts[k] = arena.Values(r.n)
			clear(a.soughts[k])
		}
	}
	return exposed, nil
}

// spread puts the answers for picked rows in their places, 0 in the others.
func spread(arena *law.Arena, v []float64, pick []int32, n int) []float64 {
	if pick == nil {
		return v
	}
	dst := arena.Values(n)
	clear(dst)
	for i, j := range pick {
		dst[j] = v[i]
	}
	return dst
}

// compositionOf is what an object of a kind is made of when a law does not
// say: a relic is what it was, or what the law that adds it says.
func (m *Model) compositionOf(kind, before uint8) uint8 {
	switch kind {
	case law.NeutronStar:
		return law.Neutrons
	case law.BlackHole, law.CentralHole:
		return law.Pure
	}
	if c := m.made[kind]; c != law.NoWord {
		return c
	}
	return before
}

// compileMade lists what objects of the kinds that laws add are made of.
func (m *Model) compileMade() {
	for k := range m.made {
		m.made[k] = law.NoWord
	}
	for _, u := range m.Set.All() {
		for _, k := range u.Card.Kinds {
			if code := m.Set.Kind(k.Name); m.made[code] == law.NoWord {
				m.made[code] = k.Composition
			}
		}
	}
}

// radiusOf is the radius of an object in km.
func radiusOf(kind uint8, mass float64) float64 {
	switch kind {
	case law.Star:
		return structure.MainSequenceRadius(mass)
	case law.WhiteDwarf:
		return structure.WhiteDwarfRadius(mass)
	case law.NeutronStar:
		return structure.NeutronStarRadius(mass)
	case law.BlackHole, law.CentralHole:
		return structure.HoleRadius(mass)
	}
	return structure.BrownDwarfRadius(mass)
}

func num1(v float64) string { return strconv.FormatFloat(v, 'g', 6, 64) }

// describe puts a row into words, for messages.
func (r *rows) describe(i int, m *Model) string {
	return fmt.Sprintf("%s, %.6g Msun", m.Set.Kinds[r.kind[i]], r.mass[i])
}
