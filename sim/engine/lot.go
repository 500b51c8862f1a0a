package engine

import (
	"cmp"
	"slices"
	"sort"

	"wane/sim/num"
	"wane/sim/physics/orderstat"
)

// lot is all real objects of one kind, in cells of the uniforms of mass and
// size: how many have not come to their settled end by a date. The cells are
// halved where the last ones are found, until the date of the last is known to
// lotResolution.
type lot struct {
	cells    []cell
	steps    []fall    // where births don't count: the cells' ends, latest first
	born     *births   // nil: births don't count
	real     float64   // objects of all kinds
	expected float64   // objects of this kind
	earliest float64   // log10 date before which none ends
	latest   float64   // after which none is left
	coldest  float64   // log10 K, of those that wear only under a colder sky; +Inf: none
	untold   bool      // their ends can't be told: a law draws them or does not answer
	ask      askCorner // how corners are asked
}

// lotResolution is how well the date of the last is to be known, dex.
const lotResolution = 1e-4

// corner is one object of a lot: how likely it is of the kind, and log10 of the
// years from its birth to its end.
type corner struct{ chance, span float64 }

// cell holds the objects between two values of either uniform.
type cell struct {
	u, s        [2]float64
	at          [2][2]corner // by u, then s
	area        float64
	least, most corner
}

// askCorner asks for corners at uniforms of mass and of size.
type askCorner func(u, s []float64) ([]corner, error)

// fall is so many objects that end at a date, those that end later included.
type fall struct{ date, left float64 }

// spanSeen: log10 years to the end beyond which the date of birth is not seen
// in that of the end.
const spanSeen = 28

// outermost is the smallest uniform, and 1 less that the largest.
const outermost = 1.0 / (1 << 53)

// uniformNodes divides 0 .. 1 evenly into n, and each end into so many parts a
// decade, down to 10^-decades.
func uniformNodes(n, aDecade, decades int) []float64 {
	nodes := []float64{outermost, 1 - outermost}
	for i := 1; i < n; i++ {
		nodes = append(nodes, float64(i)/float64(n))
	}
	for j := aDecade; j <= aDecade*decades; j++ {
		x := num.Exp10(-float64(j) / float64(aDecade))
		nodes = append(nodes, x, 1-x)
	}
	slices.Sort(nodes)
	return slices.Compact(nodes)
}

// newLot asks for the cells of a lot and refines them.
func newLot(mass, size []float64, real float64, born *births, ask askCorner) (lot, error) {
	l := lot{real: real, born: born, ask: ask}
	mass, err := withPeaks(mass, ask)
	if err != nil {
		return l, err
	}
	var u, s []float64
	for _, x := range mass {
		for _, y := range size {
			u, s = append(u, x), append(s, y)
		}
	}
	all, err := ask(u, s)
	if err != nil {
		return l, err
	}
	for i := 1; i < len(mass); i++ {
		for j := 1; j < len(size); j++ {
			c := cell{u: [2]float64{mass[i-1], mass[i]}, s: [2]float64{size[j-1], size[j]}}
			for x := range 2 {
				for y := range 2 {
					c.at[x][y] = all[(i-1+x)*len(size)+j-1+y]
				}
			}
			l.cells = append(l.cells, c.measured())
		}
	}
	for _, more := range [...]float64{1, 1. / 64, 8, 64} {
		if err := l.refine(orderstat.Target(0.5) * more); err != nil {
			return l, err
		}
	}
	l.sum()
	return l, nil
}

// measured fills in what follows from the corners.
func (c cell) measured() cell {
	c.area = (c.u[1] - c.u[0]) * (c.s[1] - c.s[0])
	c.least, c.most = corner{1, never}, corner{0, -never}
	for x := range 2 {
		for y := range 2 {
			p := c.at[x][y]
			c.least.chance, c.most.chance = min(c.least.chance, p.chance), max(c.most.chance, p.chance)
			if p.chance > 0 {
				c.least.span, c.most.span = min(c.least.span, p.span), max(c.most.span, p.span)
			}
		}
	}
	return c
}

// survives is the chance that an object with a span is left at log10 date t.
func (l *lot) survives(span, t float64) float64 {
	switch {
	case l.born != nil && span < spanSeen:
		if t > 2*spanSeen {
			return 0
		}
		return l.born.after(num.Exp10(t) - num.Exp10(span))
	case span > t:
		return 1
	}
	return 0
}

// bounds are how many are left in a cell at least and at most.
func (l *lot) bounds(c *cell, t float64) (low, high float64) {
	if c.most.chance == 0 {
		return 0, 0
	}
	n := l.real * c.area
	if high = l.survives(c.most.span, t); high > 0 {
		high *= n * c.most.chance
	}
	if c.least.chance > 0 {
		low = n * c.least.chance * l.survives(c.least.span, t)
	}
	return low, high
}

// sum works out what is asked of every realisation.
func (l *lot) sum() {
	l.earliest, l.latest = never, -never
	counts := false
	for i := range l.cells {
		c := &l.cells[i]
		if c.most.chance == 0 {
			continue
		}
		l.earliest, l.latest = min(l.earliest, c.least.span-1), max(l.latest, l.dated(c.most.span))
		counts = counts || c.least.span < spanSeen
		n := 0.5 * l.real * c.area * 0.5 * (c.least.chance + c.most.chance)
		l.expected += 2 * n
		l.steps = append(l.steps, fall{c.most.span, n}, fall{c.least.span, n})
	}
	if counts && l.born != nil {
		slices.SortFunc(l.cells, func(a, b cell) int { return cmp.Compare(b.most.span, a.most.span) })
		l.steps = nil
		return
	}
	l.born = nil
	slices.SortFunc(l.steps, func(a, b fall) int { return cmp.Compare(b.date, a.date) })
	sum := 0.0
	for i := range l.steps {
		sum += l.steps[i].left
		l.steps[i].left = sum
	}
}

// left is how many have not come to their end by log10 date t.
func (l *lot) left(t float64) float64 {
	if l.born == nil {
		i := sort.Search(len(l.steps), func(i int) bool { return l.steps[i].date <= t })
		if i == 0 {
			return 0
		}
		return l.steps[i-1].left
	}
	sum := 0.0
	for i := range l.cells {
		c := &l.cells[i]
		if c.most.chance == 0 {
			continue
		}
		high := l.survives(c.most.span, t)
		if high == 0 {
			if c.most.span < spanSeen {
				break // those that follow end before
			}
			continue
		}
		sum += 0.25 * l.real * c.area * (c.least.chance + c.most.chance) * (high + l.survives(c.least.span, t))
	}
	return sum
}
