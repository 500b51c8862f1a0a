package engine

import (
	"cmp"
	"math"
	"slices"

	"wane/sim/num"
)

// refine halves cells until the date at which a number is left is known.
func (l *lot) refine(number float64) error {
	const rounds, aRound = 200, 32
	low, high := never, -never
	var near []int // cells that reach beyond the bracket's lower end
	for i := range l.cells {
		if c := &l.cells[i]; c.most.chance > 0 {
			low, high = min(low, c.least.span-1), max(high, l.dated(c.most.span))
			near = append(near, i)
		}
	}
	high = min(high, 1e300)
	for range rounds {
		early, late, some := l.between(number, near, low, high)
		if !some || late-early < lotResolution {
			return nil
		}
		low, high = early, late
		kept := near[:0]
		var gaps []gap
		for _, i := range near {
			c := &l.cells[i]
			if l.dated(c.most.span) < early {
				continue
			}
			kept = append(kept, i)
			_, most := l.bounds(c, early)
			least, _ := l.bounds(c, late)
			if most > least && c.area > outermost*outermost {
				gaps = append(gaps, gap{i, most - least})
			}
		}
		near = kept
		slices.SortFunc(gaps, func(a, b gap) int { return cmp.Or(cmp.Compare(b.size, a.size), cmp.Compare(a.cell, b.cell)) })
		if len(gaps) > aRound {
			gaps = gaps[:aRound]
		}
		first := len(l.cells)
		if err := l.halve(gaps); err != nil {
			return err
		}
		for i := range len(l.cells) - first {
			near = append(near, first+i)
		}
		// A cell may hold a peak that none of its corners showed.
		for _, i := range near {
			if c := &l.cells[i]; c.most.chance > 0 {
				high = max(high, min(l.dated(c.most.span), 1e300))
			}
		}
	}
	return nil
}

// gap is by how much a cell leaves open how many are left.
type gap struct {
	cell int
	size float64
}

// between brackets the log10 date at which a number is left, by the fewest and
// by the most that the near cells allow, given that it is in low .. high. There
// is none if there are never so many.
func (l *lot) between(number float64, near []int, low, high float64) (early, late float64, some bool) {
	find := func(most bool) (float64, bool) {
		left := func(t float64) float64 {
			sum := 0.0
			for _, i := range near {
				a, b := l.bounds(&l.cells[i], t)
				if most {
					a = b
				}
				sum += a
			}
			return sum
		}
		a, b := low, high
		if !(left(a) > number) {
			return low, false
		}
		for b-a > 0.1*lotResolution {
			mid := a + (b-a)/2
			if mid <= a || mid >= b {
				break
			}
			if left(mid) > number {
				a = mid
			} else {
				b = mid
			}
		}
		if most {
			return b, true
		}
		return a, true
	}
	late, some = find(true)
	early, _ = find(false)
	return early, late, some
}

// dated is the latest log10 date at which an object with that span ends.
func (l *lot) dated(span float64) float64 {
	if l.born != nil && span < spanSeen {
		return later(num.Log10(l.born.last()), span) + lotResolution
	}
	return span
}

// halve halves cells, across the side along which their ends differ more.
func (l *lot) halve(which []gap) error {
	var u, s []float64
	across := make([]int, len(which))
	for k, g := range which {
		c := &l.cells[g.cell]
		if c.differs(1) > c.differs(0) {
			across[k] = 1
			y := c.s[0] + (c.s[1]-c.s[0])/2
			u, s = append(u, c.u[0], c.u[1]), append(s, y, y)
			continue
		}
		x := c.u[0] + (c.u[1]-c.u[0])/2
		u, s = append(u, x, x), append(s, c.s[0], c.s[1])
	}
	middle, err := l.ask(u, s)
	if err != nil {
		return err
	}
	for k, g := range which {
		a := l.cells[g.cell]
		b := a
		p, q := middle[2*k], middle[2*k+1]
		if across[k] == 1 {
			a.s[1], b.s[0] = s[2*k], s[2*k]
			a.at[0][1], a.at[1][1], b.at[0][0], b.at[1][0] = p, q, p, q
		} else {
			a.u[1], b.u[0] = u[2*k], u[2*k]
			a.at[1][0], a.at[1][1], b.at[0][0], b.at[0][1] = p, q, p, q
		}
		l.cells[g.cell] = a.measured()
		l.cells = append(l.cells, b.measured())
	}
	return nil
}

// differs is by how much ends differ along a side: 0 that of mass, 1 of size.
func (c *cell) differs(side int) float64 {
	most := 0.0
	for other := range 2 {
		a, b := c.at[0][other], c.at[1][other]
		if side == 1 {
			a, b = c.at[other][0], c.at[other][1]
		}
		switch {
		case a.chance != b.chance:
			most = max(most, 1+math.Abs(a.chance-b.chance))
		case a.span != b.span && a.chance > 0:
			most = max(most, min(math.Abs(a.span-b.span), 1))
		}
	}
	return most
}

// withPeaks adds nodes of mass about the peaks of the date of the end: between
// two nodes it may rise above both, and the last of all may sit there. (Along
// size it can't: a size is a quantile.)
func withPeaks(mass []float64, ask askCorner) ([]float64, error) {
	const rounds = 12
	mass = slices.Clone(mass)
	at := func(nodes []float64) ([]corner, error) {
		half := make([]float64, len(nodes))
		fill(half, 0.5)
		return ask(nodes, half)
	}
	ends, err := at(mass)
	if err != nil {
		return nil, err
	}
	for range rounds {
		var more []float64
		for i := 1; i+1 < len(mass); i++ {
			before, here, behind := ends[i-1].span, ends[i].span, ends[i+1].span
			if here >= before && here >= behind && (here > before || here > behind) && here < never {
				more = append(more, 0.5*(mass[i-1]+mass[i]), 0.5*(mass[i]+mass[i+1]))
			}
		}
		added, err := at(more)
		if err != nil || len(more) == 0 {
			return mass, err
		}
		where := map[float64]corner{}
		for i, x := range mass {
			where[x] = ends[i]
		}
		for i, x := range more {
			where[x] = added[i]
		}
		mass = append(mass, more...)
		slices.Sort(mass)
		mass = slices.Compact(mass)
		ends = ends[:0]
		for _, x := range mass {
			ends = append(ends, where[x])
		}
	}
	return mass, nil
}
