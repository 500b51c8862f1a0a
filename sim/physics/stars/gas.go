package stars

import (
	"fmt"
	"math"

	"wane/sim/num"
)

// Gas is a galaxy that turns its gas into stars at a rate that follows the gas
// it still has:
//
//	dg/dt = -k g^n + i e^-x,   k = (1 - R)/depletion,   x = t/infall time
//
// in units of the gas at the start, t since then; the births go as g^n. Since
// k g^n is all that consumes gas, the share of objects not yet born,
//
//	S(t) = (g + i T e^-x)/(1 + i T),   T the infall time,
//
// is the gas there is and the gas still to come, over all there ever is, and
// births need no integral of their own.
type Gas struct {
	Log10Start     float64 // log10 of the date of the first birth, yr
	Log10Depletion float64 // log10 of gas over star formation rate at the start, yr
	Returned       float64 // R: share of the mass of new stars that is gas again at once
	Exponent       float64 // n of rate ~ gas^n, from 1 on
	Share          float64 // iT: gas that will ever fall in, over gas at the start
	Log10Infall    float64 // log10 of the time in which infall falls by a factor e, yr
	Log10End       float64 // log10 of the date of the last birth, yr; +Inf for no end
}

// Births are the dates of birth in a [Gas]. They never change once made.
type Births struct {
	Gas
	unit   float64 // log10 of the time in which lengths below are measured, yr
	rate   float64 // k in that unit
	steps  []step  // where gas falls in; else none
	tail   step    // the closed form from where infall has ended on
	left   float64 // S at the end
	latest float64 // log10 of the last date
}

// step is a piece of S: its Taylor series from a start on.
type step struct {
	start, length float64
	unborn        series  // of S
	gas           float64 // S at the start
}

// leastUnborn is the share of objects not yet born at which dates end: half
// the distance from 1 to the next number below it.
const leastUnborn = 0x1p-54

// NewBirths returns the dates of birth.
//
// Domain: Returned from 0 to below 1, Exponent from 1 to 3, Share >= 0,
// Log10End > Log10Start.
// Source: a star formation rate that follows the gas: [Schmidt1959]; recycling
// and infall: [AdamsLaughlin1997], section II. Checked by
// testdata/published/births.csv.
func NewBirths(g Gas) (*Births, error) {
	if !(g.Returned >= 0 && g.Returned < 1 && g.Exponent >= 1 && g.Exponent <= 3 && g.Share >= 0 && g.Share < math.Inf(1)) {
		return nil, fmt.Errorf("stars: births with %v of the gas returned, exponent %v, infall of %v of the gas: want 0 .. 1, 1 .. 3, >= 0",
			g.Returned, g.Exponent, g.Share)
	}
	if !(g.Log10End > g.Log10Start) || math.IsNaN(g.Log10Depletion+g.Log10Infall) || math.IsInf(g.Log10Depletion+g.Log10Infall+g.Log10Start, 0) {
		return nil, fmt.Errorf("stars: births from 10^%v to 10^%v yr, depletion 10^%v, infall time 10^%v yr: want the end after the start",
			g.Log10Start, g.Log10End, g.Log10Depletion, g.Log10Infall)
	}
	b := &Births{Gas: g, unit: g.Log10Depletion - num.Log10(1-g.Returned), rate: 1}
	b.tail = step{gas: 1}
	if g.Share > 0 {
		b.unit, b.rate = g.Log10Infall, num.Exp10(g.Log10Infall-b.unit)
		b.integrate()
	}
	if !math.IsInf(g.Log10End, 1) {
		b.left = b.unborn(num.Exp10(num.Sub10(g.Log10End, g.Log10Start) - b.unit))
	}
	b.latest = math.Inf(1)
	b.latest = b.Date(1)
	return b, nil
}

// Date returns log10 of the date before which the fraction u of all objects is
// born.
//
//	n = 1, no infall:  t = -ln(S)/k
//	n > 1, no infall:  t = (S^-(n-1) - 1)/((n-1) k)
//	infall:            the root of S(t)
//
// with S = (1 - u) + u S(end).
//
// Units: u a fraction, result in log10 years.
// Domain: 0 <= u <= 1; u within 2^-53 of 1 is taken there.
// Error: 1e-13 of the time since the start; monotone in u but for rounding.
// Source: as [NewBirths].
func (b *Births) Date(u float64) float64 {
	if !(u > 0) {
		return b.Log10Start
	}
	u = math.Min(u, 1-0x1p-53)
	t := b.when((1 - u) + u*b.left)
	if !(t > 0) {
		return b.Log10Start
	}
	return math.Min(num.Add10(b.Log10Start, b.unit+num.Log10(t)), math.Min(b.latest, b.Log10End))
}

// when returns the time since the start, in the unit, at which the share s of
// objects is still unborn.
func (b *Births) when(s float64) float64 {
	if len(b.steps) == 0 || s <= b.tail.gas {
		return b.tail.start + b.alone(s/b.tail.gas)
	}
	low, high := 0, len(b.steps)-1 // the step that holds s
	for low < high {
		if middle := (low + high + 1) / 2; b.steps[middle].gas >= s {
			low = middle
		} else {
			high = middle - 1
		}
	}
	return b.steps[low].start + b.steps[low].when(s)
}

// alone is the time in which gas that nothing falls into falls to a part of
// what it is where the tail starts.
func (b *Births) alone(part float64) float64 {
	p := b.Exponent - 1
	k := b.tailRate()
	if x := -num.Log(part); p*x < 1e-9 {
		return x * (1 + p*x/2) / k
	} else {
		return num.Expm1(p*x) / (p * k)
	}
}

// tailRate is -d ln g/dt where the tail starts.
func (b *Births) tailRate() float64 {
	return b.rate * num.Pow(b.tail.gas*(1+b.Share), b.Exponent-1)
}

// unborn returns the share of objects not yet born at a time since the start.
func (b *Births) unborn(t float64) float64 {
	for _, s := range b.steps {
		if t < s.start+s.length {
			return s.unborn.at(t - s.start)
		}
	}
	p, x := b.Exponent-1, b.tailRate()*(t-b.tail.start)
	if p*x < 1e-9 {
		return b.tail.gas * num.Exp(-x*(1-p*x/2))
	}
	return b.tail.gas * num.Exp(-num.Log1p(p*x)/p)
}
