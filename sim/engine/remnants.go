package engine

import (
	"bytes"

	"wane/sim/law"
)

// remnantsOf fills the second stage of the stars of r that u speaks for. id
// gives the object of a row; nil: rows are contiguous.
func (a *asker) remnantsOf(c *columns, r *rows, u *law.Use, id func(int) int) error {
	stars, pick := a.spoken(u, r)
	if stars.n == 0 {
		return nil
	}
	words := wordsOf(u, "die")
	var kinds, causes [256]uint8
	for w, word := range words {
		kinds[w], causes[w] = a.m.Set.Kind(word), a.m.cause(u.Card.Process, becameWord+word)
	}
	out, err := a.ask(u, "die", stars, drawU)
	if err != nil {
		return err
	}
	s := a.streams[u.Card.Process]
	a.words, a.kinds = grown(a.words, stars.n), grown(a.kinds, stars.n)
	if unsure := markSure(a.words, out, len(words)); unsure {
		for i, w := range a.words {
			if w == law.NoWord {
				a.words[i] = uint8(pickWord(out, 0, len(words), i, s.Uniform(uint64(stars.idOf(i)), stars.genOf(i), drawPick)))
			}
		}
	}
	for i, w := range a.words {
		a.kinds[i] = kinds[w]
	}
	// The kind asked about in remain is that of the remnant, while the table
	// still says star for the other laws.
	asStars := stars.kind
	stars.kind = a.kinds
	out, err = a.ask(u, "remain", stars, drawSize)
	stars.kind = asStars
	if err == nil && !readsAny(u, "remain", "mass") { // then nobody has seen yet what it makes of the star's
		err = a.lighter(u, stars, out.Columns[0].Values)
	}
	if err != nil {
		return err
	}
	return a.keepRemnants(c, r, u, stars.n, pick, id, out, &causes)
}

// lighter returns a fault if a star leaves more than it weighed.
func (a *asker) lighter(u *law.Use, stars *rows, left []float64) error {
	for i, m := range left {
		if m > stars.mass[i]*(1+1e-12) {
			return u.Signed(&law.Fault{Question: "remain", Row: i, Column: "mass", Object: stars.describe(i, a.m),
				Got: num1(m) + " Msun left", Want: "no more than it had"})
		}
	}
	return nil
}

// keepRemnants puts kinds, masses and causes of death into the columns.
func (a *asker) keepRemnants(c *columns, r *rows, u *law.Use, n int, pick []int32, id func(int) int, out law.Batch, causes *[256]uint8) error {
	mass, comp := out.Columns[0].Values, out.Columns[1].Words
	if pick == nil && id == nil {
		j := int(r.first)
		copy(c.kind1[j:j+n], a.kinds)
		copy(c.mass1[j:j+n], mass)
		copy(c.comp1[j:j+n], comp)
		died := c.died[j : j+n]
		for i, w := range a.words {
			died[i] = causes[w]
		}
		return nil
	}
	for i, k := range a.kinds {
		j := at(pick, i)
		if id != nil {
			j = id(j)
		} else {
			j += int(r.first)
		}
		c.kind1[j], c.mass1[j], c.comp1[j] = k, mass[i], comp[i]
		c.died[j] = causes[a.words[i]]
	}
	return nil
}

// markSure sets each row's word where one word has all the chance, and tells
// whether there are rows, left at NoWord, that have none.
func markSure(dst []uint8, out law.Batch, words int) (unsure bool) {
	for i, chance := range out.Columns[0].Values[:len(dst)] {
		now := uint8(law.NoWord)
		if chance == 1 {
			now = 0
		}
		dst[i] = now
	}
	for w := 1; w < words; w++ {
		word := uint8(w)
		chances := out.Columns[w].Values[:len(dst)]
		for i, now := range dst {
			if chances[i] == 1 {
				now = word
			}
			dst[i] = now
		}
	}
	return bytes.IndexByte(dst, law.NoWord) >= 0
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
