package engine

import (
	"sort"

	"wane/sim/num"
)

// births is when objects are born: the share born after a date, years.
type births struct{ years, logAfter []float64 }

// newBirths tabulates births by their quantiles: log10 dates at uniforms u.
func newBirths(u, date []float64) births {
	var b births
	for i, x := range u {
		y := num.Exp10(date[i])
		if k := len(b.years); k > 0 && y <= b.years[k-1] {
			b.logAfter[k-1] = num.Log1p(-x)
			continue
		}
		b.years, b.logAfter = append(b.years, y), append(b.logAfter, num.Log1p(-x))
	}
	return b
}

func (b *births) last() float64 { return b.years[len(b.years)-1] }

// after is the share born after a date, between the nodes by its logarithm.
func (b *births) after(years float64) float64 {
	i := sort.SearchFloat64s(b.years, years)
	switch i {
	case 0:
		return 1
	case len(b.years):
		return 0
	}
	x0, x1 := b.years[i-1], b.years[i]
	y0, y1 := b.logAfter[i-1], b.logAfter[i]
	return num.Exp(y0 + (y1-y0)*(years-x0)/(x1-x0))
}
