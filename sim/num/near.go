package num

import "math"

// nearZero is the size of the argument under which Expm1 and Sinh use their
// own series, since e^x - 1 would cancel.
const nearZero = 0.25

// Log1p returns ln(1 + x) without loss for small x.
//
// Error: under 0.53 ulp.
// Special cases:
//
//	Log1p(±0) = ±0, Log1p(-1) = -Inf, Log1p(x < -1) = NaN, Log1p(+Inf) = +Inf
//
// Source: the correction for the rounding of 1 + x is Kahan's.
func Log1p(x float64) float64 {
	switch {
	case math.Abs(x) <= 0x1p-8:
		if math.Abs(x) < 0x1p-54 {
			return x
		}
		return x + logSeries(x)
	case !(x > -1 && x < 0x1p54):
		return Log(1 + x)
	}
	u := 1 + x
	lost := x - (u - 1)
	if x > 1 {
		lost = 1 - (u - x)
	}
	k, index, high, low := logReduce(math.Float64bits(u))
	t := &logTable[index]
	a, b := logSplit(t.inverse, high, low)
	// The lost part in units of z/c, 1 + a + b of which stand for u.
	return logSum(k, a, b+float64(lost/u*(1+(a+b))), t)
}

// Expm1 returns e^x - 1 without loss for small x.
//
// Error: under 0.8 ulp.
// Special cases:
//
//	Expm1(±0) = ±0, Expm1(-Inf) = -1, Expm1(+Inf) = +Inf, Expm1(NaN) = NaN
func Expm1(x float64) float64 {
	switch {
	case math.Abs(x) < nearZero:
		if math.Abs(x) < 0x1p-54 {
			return x
		}
		x2 := float64(x * x)
		return x + (x2/2 + float64(float64(x2*x)*expm1Series(x)))
	case !(x < 45): // 1 is less than the rounding of e^x
		return Exp(x)
	case x < -40:
		return -1
	}
	s, p := expWide(x)
	// s - 1 and what its rounding lost, by Knuth's two-sum.
	d := s - 1
	back := d - s
	lost := (s - (d - back)) + (-1 - back)
	return d + (p + lost)
}

// expm1Series returns (e^x - 1 - x - x^2/2) / x^3 to x^11/14!.
func expm1Series(x float64) float64 {
	p := 1.0 / 87178291200
	for _, c := range [...]float64{1.0 / 6227020800, 1.0 / 479001600, 1.0 / 39916800, 1.0 / 3628800, 1.0 / 362880,
		1.0 / 40320, 1.0 / 5040, 1.0 / 720, 1.0 / 120, 1.0 / 24, 1.0 / 6} {
		p = c + float64(x*p)
	}
	return p
}

// expWide returns e^x for |x| < 700 as the sum of a table value and a
// correction under 0.3 per cent of it, together good to 2^-61.
func expWide(x float64) (s, correction float64) {
	k, r := expReduce(x)
	t := &expTable[k&127]
	s = math.Float64frombits(t.bits + k<<45)
	return s, float64(s * (t.rest + expSeries(r)))
}
