package sky

import (
	"sort"

	"wane/sim/num"
)

// column is one tabulated quantity: values and slopes against s.
type column struct{ value, slope []float64 }

func (c *column) add(value, slope float64) {
	c.value, c.slope = append(c.value, value), append(c.slope, slope)
}

// at interpolates with a cubic that meets values and slopes at both nodes i
// and i+1; u is the way between them, h their distance.
func (c *column) at(i int, u, h float64) float64 {
	y0, y1 := c.value[i], c.value[i+1]
	if y0 == y1 { // also two infinities
		return y0
	}
	m0, m1 := c.slope[i]*h, c.slope[i+1]*h
	d := y1 - y0
	return y0 + u*(m0+u*((3*d-2*m0-m1)+u*(m0+m1-2*d)))
}

// piece is a stretch of sky in which dark energy keeps to one rule: from the
// Big Bang, or from the date when it began to decay.
type piece struct {
	origin float64 // log10 date of since = 0; -Inf for the Big Bang
	s      []float64
	x      column
	logH   column    // 1/yr
	logK   [4]column // K0..K3 of the package comment, yr^1..yr^4
	logEta column    // comoving, ly
	logR   column    // event horizon, ly; +Inf if there is none
	warm   []bool    // whether space accelerates, so that its horizon is warm
	coldAt []float64
	tail   tail
}

// date is log10 of the date at since = 10^s.
func (p *piece) date(s float64) float64 { return num.Add10(p.origin, s) }

// sinceAt is the inverse of date.
func (p *piece) sinceAt(date float64) float64 {
	if p.origin == zero {
		return date
	}
	return num.Sub10(date, p.origin)
}

// find returns the node at or before s and the way to the next, for s inside
// the table.
func (p *piece) find(s float64) (i int, u, h float64) {
	i = sort.SearchFloat64s(p.s, s)
	if i > 0 {
		i--
	}
	if i > len(p.s)-2 {
		i = len(p.s) - 2
	}
	h = p.s[i+1] - p.s[i]
	return i, (s - p.s[i]) / h, h
}

// early tells whether s lies before the table: there the first piece is a
// power law, and a later one has not yet changed.
func (p *piece) early(s float64) bool { return s <= p.s[0] }

func (p *piece) extrapolate(c *column, s float64) float64 {
	if p.origin != zero || c.slope[0] == 0 {
		return c.value[0]
	}
	return c.value[0] + c.slope[0]*(s-p.s[0])
}

func (p *piece) look(c *column, s float64, beyond func(float64) float64) float64 {
	if s >= p.tail.s {
		return beyond(s)
	}
	if p.early(s) {
		return p.extrapolate(c, s)
	}
	i, u, h := p.find(s)
	return c.at(i, u, h)
}

func (p *piece) lnA(s float64) float64        { return p.look(&p.x, s, p.tail.lnA) }
func (p *piece) hubble(s float64) float64     { return p.look(&p.logH, s, p.tail.hubble) }
func (p *piece) fourVolume(s float64) float64 { return p.look(&p.logK[3], s, p.tail.fourVolume) }
func (p *piece) comoving(s float64) float64   { return p.look(&p.logEta, s, p.tail.comoving) }

// accelerates tells whether the horizon is warm.
func (p *piece) accelerates(s float64) bool {
	if s >= p.tail.s {
		return warmAt(p.tail.eps)
	}
	if p.early(s) {
		return p.warm[0]
	}
	i, _, _ := p.find(s)
	return p.warm[i] && p.warm[i+1]
}

// warmAt tells whether space with this eps has a horizon that counts as warm.
// The margin keeps rounding from deciding for skies that coast (eps = 1).
func warmAt(eps float64) bool { return eps > -margin && eps < 1-margin }

const margin = 1e-6

// chain returns log10 K_j, yr^(j+1).
func (p *piece) chain(j int, s float64) float64 {
	return p.look(&p.logK[j], s, func(s float64) float64 { return p.tail.chain(j, s) })
}
