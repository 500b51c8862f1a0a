package num

import "math"

// logEntry is a reciprocal of 10 bits and minus its logarithm in two parts,
// the high one a multiple of 2^-42; the last number fills 32 bytes.
type logEntry struct{ inverse, high, low, unused float64 }

const (
	// logOffset is where the 128 intervals of a mantissa begin, 0.6836; it
	// makes 1 the centre of one, so that nothing cancels near 1.
	logOffset  = 0x3fe6000000000000 - 1<<44
	leastBits  = 0x0010000000000000 // the least normal number
	normalBits = 0x7ff0000000000000 - leastBits
	highMask   = ^uint64(1<<29 - 1) // the upper 24 bits of a mantissa
)

// Log returns ln x.
//
// Error: under 0.53 ulp.
// Special cases:
//
//	Log(+Inf) = +Inf, Log(0) = -Inf, Log(x < 0) = NaN, Log(NaN) = NaN
//
// Source: table lookup after Tang (1990), ACM Trans. Math. Softw. 16, 378, with
// 128 short reciprocals; checked against mpmath.
func Log(x float64) float64 {
	bits := math.Float64bits(x)
	if bits-leastBits >= normalBits {
		return logFar(x, &logTable, logSum)
	}
	k, index, high, low := logReduce(bits)
	t := &logTable[index]
	a, b := logSplit(t.inverse, high, low)
	return largeAndSmall(float64(k*lnTwoHigh)+t.high, a, logSmall(k, a, b, t))
}

// LogInto sets dst[i] to Log(src[i]), bit for bit.
//
// Shapes: dst at least as long as src; they may be the same slice.
func LogInto(dst, src []float64) {
	dst = dst[:len(src)]
	for len(src) > 0 {
		done, next := logColumn(dst, src)
		for i := done; i < next; i++ {
			dst[i] = Log(src[i])
		}
		dst, src = dst[next:], src[next:]
	}
}

// Log10 returns log10 x; of 10^n, as near as a float64 is to it, exactly n.
//
// Error and special cases as Log.
func Log10(x float64) float64 {
	bits := math.Float64bits(x)
	if bits-leastBits >= normalBits {
		return logFar(x, &log10Table, log10Sum)
	}
	k, index, high, low := logReduce(bits)
	t := &log10Table[index]
	a, b := logSplit(t.inverse, high, low)
	return largeAndSmall(float64(k*log10TwoHigh)+t.high, float64(a*tenHigh), log10Small(k, a, b, t))
}

// Log10Into sets dst[i] to Log10(src[i]), bit for bit.
//
// Shapes: dst at least as long as src; they may be the same slice.
func Log10Into(dst, src []float64) {
	dst = dst[:len(src)]
	for len(src) > 0 {
		done, next := log10Column(dst, src)
		for i := done; i < next; i++ {
			dst[i] = Log10(src[i])
		}
		dst, src = dst[next:], src[next:]
	}
}

// logFar is a logarithm of what is not positive, normal and finite, by
// the table and the sum of its base.
func logFar(x float64, table *[128]logEntry, sum func(k, a, b float64, t *logEntry) float64) float64 {
	switch {
	case x == 0:
		return math.Inf(-1)
	case x < 0:
		return math.NaN()
	case math.IsNaN(x) || math.IsInf(x, 1):
		return x
	}
	k, index, high, low := logReduce(math.Float64bits(x * 0x1p54))
	t := &table[index]
	a, b := logSplit(t.inverse, high, low)
	return sum(k-54, a, b, t)
}

// logReduce writes a normal number as 2^k z with z in [0.6836, 1.3672), z as
// the sum of 24 and 29 bits, and finds the interval of z.
func logReduce(bits uint64) (k float64, index uint64, high, low float64) {
	from := bits - logOffset
	z := bits - from&(0xfff<<52)
	high = math.Float64frombits(z & highMask)
	return float64(int64(from) >> 52), from >> 45 & 127, high, math.Float64frombits(z) - high
}

// logSplit returns z/c - 1 = a + b, both exact: a is a multiple of 2^-34 under
// 2^-7.7, b under 2^-22.
func logSplit(inverse, high, low float64) (a, b float64) {
	return float64(high*inverse) - 1, float64(low * inverse)
}

// logSum returns k ln 2 + ln c + ln(1 + a + b). The first two high parts and a
// are exact and added without loss; all else is small.
func logSum(k, a, b float64, t *logEntry) float64 {
	return largeAndSmall(float64(k*lnTwoHigh)+t.high, a, logSmall(k, a, b, t))
}

func logSmall(k, a, b float64, t *logEntry) float64 {
	return logSeries(a+b) + (b + (float64(k*lnTwoLow) + t.low))
}

// largeAndSmall returns w + a + small, with |a| < |w| or w = 0, and small far
// below both.
func largeAndSmall(w, a, small float64) float64 {
	sum := w + a
	return sum + (((w - sum) + a) + small)
}

// logSeries returns ln(1 + r) - r by its series to r^7/7.
func logSeries(r float64) float64 {
	r2 := float64(r * r)
	return float64(r2 * ((-1.0/2 + float64(r*(1.0/3))) +
		float64(r2*((-1.0/4+float64(r*(1.0/5)))+float64(r2*(-1.0/6+float64(r*(1.0/7))))))))
}

// log10e, and in two parts of which the first has 26 bits.
const (
	tenHigh = 0x1.bcb7b10000000p-2
	tenLow  = 0x1.49b9438ca9aaep-28
	ten     = 0x1.bcb7b1526e50ep-2
)

// log10Sum returns k log10 2 + log10 c + log10(1 + a + b); the product of a
// with the high part of log10 e is exact.
func log10Sum(k, a, b float64, t *logEntry) float64 {
	return largeAndSmall(float64(k*log10TwoHigh)+t.high, float64(a*tenHigh), log10Small(k, a, b, t))
}

func log10Small(k, a, b float64, t *logEntry) float64 {
	return float64((b+logSeries(a+b))*ten) + (float64(a*tenLow) + (float64(k*log10TwoLow) + t.low))
}
