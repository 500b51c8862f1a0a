package imf

import (
	"fmt"
	"math"

	"wane/sim/num"
)

// LogNormal is a mass function that is log-normal up to one solar mass and a
// power law above. It is a value that never changes; make one with
// [NewLogNormal] or [ChabrierForm.With].
type LogNormal struct {
	low           float64
	centre, width float64 // ln of the centre; standard deviation in ln m
	first, last   float64 // the error function's argument at low and at the joint
	erfFirst      float64 // and its values there
	erfSpan       float64
	number        float64 // of the log-normal part by (erf - erfFirst)
	share         float64 // of all objects in the log-normal part
	tail          segment
}

// joint is where the log-normal part ends, solar masses.
const joint = 1.0

// NewLogNormal returns the mass function with, per unit log10 m,
//
//	amplitude e^(-(log10 m - log10 centre)^2/(2 width^2))   low < m <= 1
//	tail m^-(slope - 1)                                     1 < m < high
//
// normalised to one object. The two parts need not meet at 1.
//
// Units: low, high, centre in solar masses; width in decades; slope is that
// per unit mass.
// Domain: 0 < low < 1 < high; centre, width, amplitude and tail > 0.
// Source: [Chabrier2003], eqs. 17 and 18, for the form.
func NewLogNormal(low, high, centre, width, amplitude, tail, slope float64) (LogNormal, error) {
	if !(low > 0 && low < joint && high > joint && high < math.Inf(1)) {
		return LogNormal{}, fmt.Errorf("imf: log-normal from %v to %v solMass: want 0 < low < %v < high", low, high, joint)
	}
	if !(centre > 0 && width > 0 && amplitude > 0 && tail > 0) || math.IsNaN(slope) {
		return LogNormal{}, fmt.Errorf("imf: log-normal centre %v solMass, width %v dex, amplitudes %v and %v, slope %v: want numbers > 0",
			centre, width, amplitude, tail, slope)
	}
	l := LogNormal{low: low, centre: num.Log(centre), width: width * num.Ln10}
	l.first, l.last = l.argument(low), l.argument(joint)
	l.erfFirst = num.Erf(l.first)
	l.erfSpan = num.Erf(l.last) - l.erfFirst
	// dN/dln m = (dN/dlog10 m)/ln 10; the tail's C m^-slope dm is that of m^-(slope-1) dln m.
	l.number = amplitude / num.Ln10 * l.width * math.Sqrt(math.Pi/2)
	l.tail = segment{low: joint, high: high, slope: slope, coefficient: tail / num.Ln10}
	l.tail.share = l.tail.integral(1, high)
	total := l.number*l.erfSpan + l.tail.share
	l.number /= total
	l.tail.coefficient /= total
	l.tail.share /= total
	l.share = l.number * l.erfSpan
	l.tail.below = l.share
	return l, nil
}

// argument is z of erf z at mass m: (ln m - ln centre)/(sqrt2 width).
func (l LogNormal) argument(m float64) float64 {
	return (num.Log(m) - l.centre) / (math.Sqrt2 * l.width)
}

// Limits returns the lightest and the heaviest mass, in solar masses.
func (l LogNormal) Limits() (low, high float64) { return l.low, l.tail.high }

// Quantile returns the mass below which the fraction u of all objects is
// born.
//
//	m = centre e^(sqrt2 width erfinv v),  v from erf z(low) to erf z(1),
//
// and the quantile of the power law above.
//
// Units: u a fraction, result in solar masses.
// Domain: 0 <= u <= 1; outside it the nearer limit.
// Error: rounding; monotone in u.
// Source: inversion of [Chabrier2003], eqs. 17 and 18.
func (l LogNormal) Quantile(u float64) float64 {
	if u > l.share {
		return l.tail.quantile((u - l.share) / l.tail.share)
	}
	if !(u > 0) {
		return l.low
	}
	z := num.Erfinv(l.erfFirst + u/l.share*l.erfSpan)
	m := num.Exp(l.centre + math.Sqrt2*l.width*z)
	return math.Min(math.Max(m, l.low), joint)
}

// NumberBelow returns the fraction by number of objects lighter than m.
//
// Units: m in solar masses.
// Domain: any m; 0 below the lower limit, 1 above the upper one.
// Error: rounding.
func (l LogNormal) NumberBelow(m float64) float64 {
	switch {
	case m <= l.low:
		return 0
	case m <= joint:
		return l.number * (num.Erf(l.argument(m)) - l.erfFirst)
	}
	return l.share + l.tail.integral(1, math.Min(m, l.tail.high))
}

// MassBelow returns the fraction by mass of objects lighter than m.
//
// Units, domain and error as for [LogNormal.NumberBelow].
func (l LogNormal) MassBelow(m float64) float64 { return l.weight(m) / l.Mean() }

// Mean returns the mean mass in solar masses.
func (l LogNormal) Mean() float64 { return l.weight(l.tail.high) }

// Median returns the mass, in solar masses, that half of all objects are
// lighter than.
func (l LogNormal) Median() float64 { return l.Quantile(0.5) }

// weight is the integral of m xi dm up to m, in solar masses per object. In
// the log-normal part a factor m moves the centre by width^2 in ln m:
//
//	centre e^(width^2/2) number [erf(z - width/sqrt2)] from low to m
func (l LogNormal) weight(m float64) float64 {
	if m <= l.low {
		return 0
	}
	shift := l.width / math.Sqrt2
	scale := l.number * num.Exp(l.centre+l.width*l.width/2)
	sum := scale * (num.Erf(l.argument(math.Min(m, joint))-shift) - num.Erf(l.first-shift))
	if m > joint {
		sum += l.tail.integral(2, math.Min(m, l.tail.high))
	}
	return sum
}
