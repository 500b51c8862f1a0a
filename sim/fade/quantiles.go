package fade

import "math"

// Quantile returns the p-quantile of sorted values: with h = (n-1) p, the
// value at h between neighbours, linearly interpolated.
//
// Shapes: sorted: length n, ascending; +Inf (a mark that was not reached)
// stands beyond every date, so it must not be left out.
// Domain: 0 <= p <= 1.
// Special cases: NaN for n = 0; +Inf as soon as the upper neighbour of h is
// +Inf and has any weight.
//
// Source: Hyndman & Fan 1996, American Statistician 50, 361, definition 7.
func Quantile(sorted []float64, p float64) float64 {
	return atRank(sorted, float64(float64(len(sorted)-1)*p))
}

// Median is the middle value, or the mean of the middle two.
func Median(sorted []float64) float64 { return Quantile(sorted, 0.5) }

// atRank interpolates at a rank counted from 0; ranks beyond the ends are the
// ends.
func atRank(sorted []float64, h float64) float64 {
	n := len(sorted)
	if n == 0 {
		return math.NaN()
	}
	h = min(max(h, 0), float64(n-1))
	i := int(h)
	part := h - float64(i)
	if part == 0 || sorted[i] == sorted[min(i+1, n-1)] {
		return sorted[i]
	}
	return sorted[i] + float64(part*(sorted[i+1]-sorted[i]))
}

// MedianError returns the Monte Carlo standard error of [Median] over n
// independent realisations, whatever their distribution.
//
// Where all values are finite it is the estimate of Maritz and Jarrett: the
// median of n values drawn from the sample itself is a weighted one of the
// order statistics, with the weights
//
//	W_i = I(i/n) - I((i-1)/n)
//
// where I is the incomplete beta function of a = b = (n+1)/2, and the error is
// the spread under these weights, sqrt(sum W x^2 - (sum W x)^2). It is what
// endless resampling would give, without the resampling. For even n, where the
// median is no order statistic, half-odd a stands between its neighbours'.
//
// With +Inf among the values no such sum exists. Then it is half the distance
// between the order statistics half a standard deviation of the binomial law,
// sqrt(n)/2, below and above the middle rank: +Inf if the upper one is +Inf,
// meaning that the error cannot be told.
//
// Shapes: sorted: length n, ascending.
// Special cases: NaN for n < 2.
// Error: for few realisations the estimate itself scatters, by 43 % at n = 10,
// 30 % at n = 40, 24 % at n = 100, and is large by 22, 10, 4 % as a root mean
// square (recomputed for the exponential law).
//
// Source: Maritz & Jarrett 1978, JASA 73, 194.
func MedianError(sorted []float64) float64 {
	n := len(sorted)
	switch {
	case n < 2:
		return math.NaN()
	case math.IsInf(sorted[n-1], 1):
		middle, reach := float64(n-1)/2, math.Sqrt(float64(n))/2
		upper := atRank(sorted, middle+reach)
		if math.IsInf(upper, 1) {
			return inf
		}
		return (upper - atRank(sorted, middle-reach)) / 2
	}
	half := float64(n+1) / 2
	return spreadUnderBeta(sorted, half, half)
}

// spreadUnderBeta is the standard deviation of sorted values weighted by the
// beta law of parameters a and b over their ranks.
func spreadUnderBeta(sorted []float64, a, b float64) float64 {
	n := len(sorted)
	law := newBetaLaw(a, b)
	middle := sorted[n/2] // from here, lest the squares cancel
	mean, square, below := 0.0, 0.0, 0.0
	for i, x := range sorted {
		upTo := law.below(float64(i+1) / float64(n))
		w, d := upTo-below, x-middle
		mean += float64(w * d)
		square += float64(float64(w*d) * d)
		below = upTo
	}
	return math.Sqrt(max(square-float64(mean*mean), 0))
}
