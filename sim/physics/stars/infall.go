package stars

import (
	"math"

	"wane/sim/num"
)

// integrate lays out the steps of S while gas falls in: Taylor series of high
// order, each as long as its last terms allow, which are their own dense
// output. It ends where what still falls in no longer counts, or nobody is
// left to be born.
//
// Time is in units of the infall time: g' = -k g^n + J e^-x.
func (b *Births) integrate() {
	all := 1 + b.Share
	for x, g := 0.0, 1.0; ; {
		coming := b.Share * num.Exp(-x)
		s := step{start: x, gas: (g + coming) / all}
		if coming < 0x1p-56*g || s.gas < leastUnborn {
			b.tail = s
			return
		}
		gas := b.expand(&s, g, coming)
		s.length = reachOf(&gas)
		b.steps = append(b.steps, s)
		x, g = x+s.length, gas.at(s.length)
	}
}

// expand fills the series of S from a start on and returns that of the gas.
func (b *Births) expand(s *step, gas, coming float64) series {
	var g, power, fall series
	g[0], power[0], fall[0] = gas, num.Pow(gas, b.Exponent), coming
	s.unborn[0] = s.gas
	for j := 0; j < taylorOrder; j++ {
		if j > 0 {
			nextPower(&power, &g, b.Exponent, j)
		}
		g[j+1] = (fall[j] - b.rate*power[j]) / float64(j+1)
		fall[j+1] = -fall[j] / float64(j+1)
		s.unborn[j+1] = -b.rate * power[j] / float64(j+1) / (1 + b.Share)
	}
	return g
}

// reachOf is how far a series of gas holds: where its last two terms fall
// below 1e-17 of the gas. Infall shortens it below one infall time, so that
// it holds for that, too.
func reachOf(g *series) float64 {
	h := 0.5
	for j := taylorOrder - 1; j <= taylorOrder; j++ {
		if g[j] != 0 {
			h = math.Min(h, num.Exp(num.Log(1e-17*g[0]/math.Abs(g[j]))/float64(j)))
		}
	}
	return h
}

// when is the time since the step's start at which the share s is unborn:
// Newton's method, kept inside a bracket that it narrows.
func (p *step) when(s float64) float64 {
	low, high := 0.0, p.length
	t := high * math.Min(math.Max((s-p.gas)/(p.unborn.at(high)-p.gas), 0), 1)
	for range 60 {
		miss := p.unborn.at(t) - s
		if miss > 0 {
			low = t
		} else {
			high = t
		}
		next := t - miss/p.unborn.slopeAt(t)
		if !(next > low && next < high) {
			next = low + (high-low)/2
		}
		if math.Abs(next-t) <= 0x1p-52*high {
			return next
		}
		t = next
	}
	return t
}
