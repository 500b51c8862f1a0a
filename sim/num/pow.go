package num

import "math"

// Pow returns x^y; exact where x^y is a float64.
//
// Error: under 0.52 ulp where the result is normal, under 1 ulp where it is not.
// Special cases, in this order:
//
//	Pow(x, 0) = 1, Pow(1, y) = 1, and NaN if either is NaN
//	Pow(±0, y) = ±Inf for odd y < 0, +Inf for other y < 0, ±0 for odd y > 0, 0 for other y > 0
//	Pow(-1, ±Inf) = 1, and ±Inf as y or x goes to infinity by the sizes
//	Pow(x, y) = NaN for finite x < 0 and y not an integer
//
// The logarithm is carried to 2^-68 of itself, for y multiplies its error.
func Pow(x, y float64) float64 {
	switch {
	case y == 0 || x == 1:
		return 1
	case math.IsNaN(x) || math.IsNaN(y):
		return math.NaN()
	}
	odd := isOdd(y)
	a := math.Abs(x)
	switch {
	case math.IsInf(y, 0) && a == 1:
		return 1
	case a == 0 || math.IsInf(a, 1) || math.IsInf(y, 0):
		return powFar(x, y, odd)
	case x < 0 && math.Floor(y) != y:
		return math.NaN()
	}
	if x < 0 && odd {
		return -powPositive(a, y)
	}
	return powPositive(a, y)
}

// powFar is Pow where x is 0 or infinite or y is infinite: the result is 0 or
// infinite, with the sign of x for odd y.
func powFar(x, y float64, odd bool) float64 {
	result := 0.0
	if math.Abs(x) > 1 == (y > 0) {
		result = math.Inf(1)
	}
	if odd && math.Signbit(x) {
		return -result
	}
	return result
}

func isOdd(y float64) bool {
	return math.Abs(y) < 0x1p53 && math.Floor(y) == y && int64(y)&1 == 1
}

// powPositive returns x^y for finite x > 0 and finite y.
func powPositive(x, y float64) float64 {
	exponent := 0.0
	if x < 0x1p-1022 {
		x, exponent = x*0x1p54, -54
	}
	high, low := logWide(math.Float64bits(x), exponent)
	switch p := float64(y * high); {
	case p > 710:
		return math.Inf(1)
	case p < -746:
		return 0
	case math.Abs(p) < 0x1p-60:
		return 1 + p
	}
	// y (high + low), the product of the upper halves being exact.
	yHigh, hHigh := upperHalf(y), upperHalf(high)
	main := float64(yHigh * hHigh)
	rest := float64(yHigh*((high-hHigh)+low)) + float64((y-yHigh)*(high+low))
	e := main + rest
	k, r := expReduce(e)
	p := expSeries(r + ((main - e) + rest))
	if math.Abs(e) < expGreatest {
		return scaled(k, p)
	}
	return scaledFar(k, p)
}

// upperHalf returns x cut to the upper 26 bits of its mantissa.
func upperHalf(x float64) float64 {
	return math.Float64frombits(math.Float64bits(x) &^ (1<<27 - 1))
}

// logWide returns the logarithm of a normal number of given bits times
// 2^exponent in two parts, good to about 2^-68 of itself.
func logWide(bits uint64, exponent float64) (high, low float64) {
	k, index, zHigh, zLow := logReduce(bits)
	k += exponent
	t := &logTable[index]
	a, b := logSplit(t.inverse, zHigh, zLow)
	// k ln 2 + ln c + a - a²/2 + b: each term exact and smaller than the sum
	// before, so each rounding is recovered.
	s0 := float64(k*lnTwoHigh) + t.high
	s1 := s0 + a
	lost1 := (s0 - s1) + a
	square := float64(float64(a*a) * -0.5)
	s2, lost2 := twoSum(s1, square)
	s3, lost3 := twoSum(s2, b)
	r := a + b
	p := 1.0 / 9
	for _, c := range [...]float64{-1.0 / 8, 1.0 / 7, -1.0 / 6, 1.0 / 5, -1.0 / 4, 1.0 / 3} {
		p = c + float64(r*p)
	}
	cubic := float64(float64(float64(r*r)*r) * p)
	small := (lost1 + lost2 + lost3) + (float64(k*lnTwoLow) + t.low) + (cubic - float64(b*(a+b/2)))
	high = s3 + small
	return high, (s3 - high) + small
}

// twoSum returns a + b rounded and what the rounding lost (Knuth).
func twoSum(a, b float64) (sum, lost float64) {
	sum = a + b
	back := sum - a
	return sum, (a - (sum - back)) + (b - back)
}
