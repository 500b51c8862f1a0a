package engine

import "wane/sim/num"

// rateBlock is how many rates ahead a countdown works out at a time.
const rateBlock = 256

// countRates is what the clocks of a countdown run at while a galaxy that held
// number objects at the last refresh loses them one by one: the rates and
// years per unit of reading with first, first - 1, ... left in the sample.
type countRates struct {
	rate, slow [fewClocks][rateBlock]float64

	weight, number float64
	first          float64
	rate0, slope   [fewClocks]float64
	series         nearSeries
}

// nearSeries are the coefficients of lnNear and expNear, for the kernel.
type nearSeries struct{ half, third, quarter, fifth, sixth, c24, c120, one float64 }

var nearNumbers = nearSeries{1. / 2, 1. / 3, 1. / 4, 1. / 5, 1. / 6, 1. / 24, 1. / 120, 1}

// fill works out the block whose first rates are those with first objects
// left, n of them or a few more if they fit, and returns how many.
func (c *countRates) fill(first, n int) (filled int) {
	n = min(n, rateBlock)
	c.first = float64(first)
	if c.small() {
		filled = countRatesLanes(c, n)
	}
	for ; filled < n; filled++ {
		number := c.weight * (c.first - float64(filled))
		x := lnNear((number - c.number) / c.number)
		for k := range fewClocks {
			r := c.rate0[k] * expNear(c.slope[k]*x)
			c.rate[k][filled], c.slow[k][filled] = r, 1/r
		}
	}
	return filled
}

// small tells whether expNear is its short series in all of a window.
func (c *countRates) small() bool {
	const most = nearReach / (1.1 * moveToRefresh)
	for _, s := range c.slope {
		if !(s <= most && s >= -most) {
			return false
		}
	}
	return true
}

// lnNear is ln(1 + x) to the fifth order, for the small x of a window (|x| <=
// 0.011, error below 4e-13).
func lnNear(x float64) float64 {
	x2 := x * x
	return x - x2*(1./2-x*(1./3)+x2*(1./4-x*(1./5)))
}

// nearReach is up to where expNear is a short series.
const nearReach = 0.05

// expNear is e^x: to the fifth order for the small x of a window (|x| <= 0.05,
// error below 3e-11), the full function beyond.
func expNear(x float64) float64 {
	if x > nearReach || x < -nearReach {
		return num.Exp(x)
	}
	x2 := x * x
	return 1 + x + x2*(1./2+x*(1./6)+x2*(1./24+x*(1./120)))
}
