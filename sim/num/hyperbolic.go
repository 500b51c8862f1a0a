package num

import "math"

// Sinh returns the hyperbolic sine of x.
//
// Error: under 0.8 ulp.
// Special cases:
//
//	Sinh(±0) = ±0, Sinh(±Inf) = ±Inf, Sinh(NaN) = NaN
func Sinh(x float64) float64 {
	a := math.Abs(x)
	switch {
	case a < nearZero:
		if a < 0x1p-28 {
			return x
		}
		x2 := float64(x * x)
		p := 1.0 / 6227020800 // x^13/13!
		for _, c := range [...]float64{1.0 / 39916800, 1.0 / 362880, 1.0 / 5040, 1.0 / 120, 1.0 / 6} {
			p = c + float64(x2*p)
		}
		return x + float64(float64(x*x2)*p)
	case a < 40:
		s, p := expWide(a)
		m, q := expWide(-a)
		// s > m, so their rounded difference and what it lost.
		d := s - m
		lost := (s - d) - m
		return math.Copysign((d+(p-q+lost))/2, x)
	case a < 711:
		k, r := expReduce(a)
		return math.Copysign(scaledFar(k-128, expSeries(r)), x) // k - 128 halves
	}
	return x * math.MaxFloat64
}

// Asinh returns the inverse hyperbolic sine of x.
//
// Error: under 1.5 ulp.
// Special cases:
//
//	Asinh(±0) = ±0, Asinh(±Inf) = ±Inf, Asinh(NaN) = NaN
func Asinh(x float64) float64 {
	a := math.Abs(x)
	switch {
	case a < 0x1p-28:
		return x
	case !(a < 0x1p28):
		return math.Copysign(Log(a)+ln2, x)
	}
	a2 := float64(a * a)
	return math.Copysign(Log1p(a+a2/(1+math.Sqrt(1+a2))), x)
}

// Tanh returns the hyperbolic tangent of x.
//
// Error: under 2.5 ulp.
// Special cases:
//
//	Tanh(±0) = ±0, Tanh(±Inf) = ±1, Tanh(NaN) = NaN
func Tanh(x float64) float64 {
	a := math.Abs(x)
	switch {
	case a < 0x1p-28:
		return x
	case a < 0.55:
		e := Expm1(2 * a)
		return math.Copysign(e/(e+2), x)
	}
	return math.Copysign(1-2/(Exp(2*a)+1), x)
}
