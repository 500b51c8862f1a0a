package imf

import (
	"fmt"
	"math"

	"wane/sim/num"
)

// BrokenPowerLaw is a continuous mass function of power-law segments. It is
// a value that never changes; make one with [NewBrokenPowerLaw] or [Kroupa].
type BrokenPowerLaw struct {
	segments []segment
}

// segment is xi = coefficient m^-slope between low and high. below and share
// are the fractions by number of objects lighter than low and inside.
type segment struct {
	low, high, slope float64
	coefficient      float64
	below, share     float64
}

// NewBrokenPowerLaw returns the mass function with xi ~ m^-slopes[i] between
// edges[i] and edges[i+1], continuous at the inner edges and normalised to
// one object.
//
// Shapes: edges: length k+1, strictly increasing, > 0; slopes: length k >= 1.
// Units: edges in solar masses.
// Source: [Kroupa2001], eq. (1), for the form.
func NewBrokenPowerLaw(edges, slopes []float64) (BrokenPowerLaw, error) {
	if len(slopes) == 0 || len(edges) != len(slopes)+1 {
		return BrokenPowerLaw{}, fmt.Errorf("imf: %d edges and %d slopes: want one edge more than slopes", len(edges), len(slopes))
	}
	b := BrokenPowerLaw{segments: make([]segment, len(slopes))}
	coefficient, total := 1.0, 0.0
	for i, slope := range slopes {
		low, high := edges[i], edges[i+1]
		if !(low > 0 && high > low && high < math.Inf(1)) || math.IsNaN(slope) {
			return BrokenPowerLaw{}, fmt.Errorf("imf: segment %v .. %v solMass, slope %v: want 0 < low < high", low, high, slope)
		}
		if i > 0 { // continuity: C_i = C_(i-1) edge^(slope_i - slope_(i-1))
			coefficient *= num.Pow(low, slope-slopes[i-1])
		}
		s := segment{low: low, high: high, slope: slope, coefficient: coefficient}
		s.below = total
		s.share = s.integral(1, high)
		total += s.share
		b.segments[i] = s
	}
	for i := range b.segments {
		b.segments[i].coefficient /= total
		b.segments[i].below /= total
		b.segments[i].share /= total
	}
	return b, nil
}

// integral is the integral of m^(power-1) xi dm from the segment's low end
// to m: power 1 counts objects, power 2 weighs them.
//
//	C low^p (e^(p ln(m/low)) - 1) / p,   p = power - slope
func (s segment) integral(power, m float64) float64 {
	p := power - s.slope
	return s.coefficient * num.Pow(s.low, p) * expm1Over(p, num.Log(m/s.low))
}

// expm1Over is (e^(p x) - 1)/p, and its limit x as p goes to 0.
func expm1Over(p, x float64) float64 {
	if math.Abs(p*x) < 1e-9 {
		return x * (1 + p*x/2)
	}
	return num.Expm1(p*x) / p
}

// Limits returns the lightest and the heaviest mass, in solar masses.
func (b BrokenPowerLaw) Limits() (low, high float64) {
	return b.segments[0].low, b.segments[len(b.segments)-1].high
}

// Quantile returns the mass below which the fraction u of all objects is
// born. Given a uniform u it samples the mass function exactly.
//
//	m = low [1 + w p-hat]^(1/p) with p = 1 - slope on the segment that holds u
//
// Units: u a fraction, result in solar masses.
// Domain: 0 <= u <= 1; outside it the nearer limit.
// Error: rounding; monotone in u.
// Source: inversion of [Kroupa2001], eq. (1).
func (b BrokenPowerLaw) Quantile(u float64) float64 {
	last := len(b.segments) - 1
	i := 0
	for i < last && u > b.segments[i].below+b.segments[i].share {
		i++
	}
	s := b.segments[i]
	return s.quantile((u - s.below) / s.share)
}

// quantile is the mass below which the fraction w of the segment's own objects
// is born; outside 0 .. 1 the nearer end.
func (s segment) quantile(w float64) float64 {
	if !(w > 0) {
		return s.low
	}
	if w >= 1 {
		return s.high
	}
	p, x := 1-s.slope, num.Log(s.high/s.low)
	var y float64 // ln(m/low)
	if math.Abs(p*x) < 1e-9 {
		y = w * x
	} else {
		y = num.Log1p(w*num.Expm1(p*x)) / p
	}
	return math.Min(s.low*num.Exp(y), s.high)
}

// NumberBelow returns the fraction by number of objects lighter than m.
//
// Units: m in solar masses.
// Domain: any m; 0 below the lower limit, 1 above the upper one.
// Error: rounding.
func (b BrokenPowerLaw) NumberBelow(m float64) float64 { return b.below(1, m) }

// MassBelow returns the fraction by mass of objects lighter than m.
//
// Units, domain and error as for [BrokenPowerLaw.NumberBelow].
func (b BrokenPowerLaw) MassBelow(m float64) float64 { return b.below(2, m) / b.Mean() }

// Mean returns the mean mass in solar masses.
func (b BrokenPowerLaw) Mean() float64 {
	_, high := b.Limits()
	return b.below(2, high)
}

// Median returns the mass, in solar masses, that half of all objects are
// lighter than.
func (b BrokenPowerLaw) Median() float64 { return b.Quantile(0.5) }

func (b BrokenPowerLaw) below(power, m float64) float64 {
	sum := 0.0
	for _, s := range b.segments {
		if m <= s.low {
			break
		}
		sum += s.integral(power, math.Min(m, s.high))
	}
	return sum
}
