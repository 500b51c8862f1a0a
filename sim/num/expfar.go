package num

import "math"

// expFar is Exp where the argument is tiny, large or special.
func expFar(x float64) float64 {
	switch {
	case math.Abs(x) < expLeast:
		return 1 + x
	case x > expOver:
		return math.Inf(1)
	case x < expUnder:
		return 0
	case math.IsNaN(x):
		return x
	}
	k, r := expReduce(x)
	return scaledFar(k, expSeries(r))
}

// exp10Far is Exp10 where the argument is tiny, large or special.
func exp10Far(x float64) float64 {
	switch {
	case math.Abs(x) < exp10Least:
		return 1 + x
	case x > exp10Over:
		return math.Inf(1)
	case x < exp10Under:
		return 0
	case math.IsNaN(x):
		return x
	}
	k, r := exp10Reduce(x)
	return scaledFar(k, exp10Series(r))
}

// scaledFar is scaled where the result may overflow or be subnormal: it moves
// the exponent towards 0 by 512 and back by a power of two, which rounds once
// more when the result is subnormal.
func scaledFar(k uint64, p float64) float64 {
	const shift = 512
	if int64(k<<13) < 0 {
		return scaled(k+shift<<7, p) * 0x1p-512
	}
	return scaled(k-shift<<7, p) * 0x1p+512
}
