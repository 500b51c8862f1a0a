// Package orderstat is when the first and the last of many go. The last of a
// sample is not the last of what the sample stands for: of N independent lives
// with survival S(t) the last ends by t with the chance (1 - S)^N.
//
// Lives of exponential law are in units of their mean tau.
//
// Sources: David & Nagaraja 2003, Order Statistics; Gumbel 1958, Statistics of
// Extremes.
package orderstat

import (
	"math"

	"wane/sim/num"
	"wane/sim/physics/constant"
)

// exactSum is the largest N whose harmonic number is summed term by term.
const exactSum = 32

// MeanLast returns the mean date of the last of n exponential lives.
//
//	H_n = 1 + 1/2 + ... + 1/n = ln n + gamma + 1/(2n) - 1/(12n^2) + ...
//
// Units: of tau. Domain: n >= 1, a whole number. Error: below 1e-14.
// Special cases: 0 for n = 0, NaN for n < 0.
// Source: Abramowitz & Stegun 1964, 6.3.2 and 6.3.18. Checked by orderstat.csv.
func MeanLast(n float64) float64 {
	if n < 0 {
		return math.NaN()
	}
	if n <= exactSum {
		h := 0.0
		for k := n; k >= 1; k-- {
			h += 1 / k
		}
		return h
	}
	i := 1 / n
	return num.Log(n) + constant.Euler + i*(0.5-i*(1./12-i*i*(1./120-i*i/252)))
}

// SpreadLast is the standard deviation of the last of many exponential lives:
// pi/sqrt 6 tau in the limit of large n.
const SpreadLast = 1.2825498301618640955440363596713

// MeanFirst returns the mean date of the first of n exponential lives: 1/n.
func MeanFirst(n float64) float64 { return 1 / n }

// QuantileLast returns the date by which the last of n exponential lives has
// ended with chance q.
//
//	(1 - e^-t)^n = q  =>  t = -ln(1 - q^(1/n))
//
// Units: of tau. Domain: n > 0, 0 < q < 1. Error: below 1e-14 for any n.
func QuantileLast(n, q float64) float64 {
	return -num.Log(-num.Expm1(num.Log(q) / n))
}

// Target returns the expected number of survivors N S(t) at the q-quantile of
// the last date of very many independent lives, -ln q: ln 2 at the median.
func Target(q float64) float64 { return -num.Log(q) }

// ThresholdTime returns when a share p of exponential lives is left, in tau.
//
//	t = -ln p
func ThresholdTime(p float64) float64 { return -num.Log(p) }

// ThresholdError returns the standard deviation of ln t, where t is the date
// at which a share p of n lives is left.
//
//	sd(ln t) = sqrt(p(1-p)/n) / (p |dlnS/dlnt|)
//
// Domain: 0 < p < 1, n >> 1/p; slope is dlnS/dlnt there (ln p for exponential
// lives). Divide by ln 10 for dex.
func ThresholdError(p, n, slope float64) float64 {
	return math.Sqrt(p*(1-p)/n) / (p * math.Abs(slope))
}

// EdgeDeficit returns by what fraction of its date the last of n falls short,
// in the mean, when lives are set by mass, t ~ m^-p, and end at the edge of
// the mass distribution, whose density there is xi per solar mass.
//
//	mean gap 1/(n xi), date deficit p/(m n xi)
//
// Units: m in solar masses. Domain: n xi m >> p.
func EdgeDeficit(n, xi, m, p float64) float64 { return p / (m * n * xi) }

// LargestOfTail returns the q-quantile of the largest of n masses whose
// density is xi1 m^-s up to the edge.
//
//	n xi1/(s-1) [m^(1-s) - edge^(1-s)] = -ln q
//
// Units: solar masses; xi1 per solar mass at one solar mass. Domain: s > 1,
// many masses in the tail.
func LargestOfTail(n, xi1, s, edge, q float64) float64 {
	return num.Pow(num.Pow(edge, 1-s)+Target(q)*(s-1)/(n*xi1), 1/(1-s))
}
