package num

import "math"

// expEntry is 2^(i/128): the bits of the nearest float64 less i 2^45, and the
// relative rest.
type expEntry struct {
	bits uint64
	rest float64
}

const (
	// roundShift, added and taken away, rounds to an integer that meanwhile
	// stands in the low bits.
	roundShift = 0x1.8p52

	// ln 2 / 128 and log10 2 / 128 in two parts; the first has 34 bits, so that
	// its product with an index of 18 bits is exact.
	stepHigh, stepLow     = 0x1.62e42fef80000p-8, 0x1.1cf79abc9e3b4p-43
	step10High, step10Low = 0x1.3441350980000p-9, 0x1.de7fbcc47c4adp-43

	stepsPerE   = 0x1.71547652b82fep+7 // 128 / ln 2
	stepsPerTen = 0x1.a934f0979a371p+8 // 128 / log10 2

	// Between these sizes of the argument no result is special or subnormal.
	expLeast, expGreatest     = 0x1p-60, 700
	exp10Least, exp10Greatest = 0x1p-60, 304

	// Above and below these the result is +Inf and 0.
	expOver, expUnder     = 710, -746
	exp10Over, exp10Under = 309, -324

	// (ln 10)^n / n!
	tenC1 = 0x1.26bb1bbb55516p+1
	tenC2 = 0x1.53524c73cea69p+1
	tenC3 = 0x1.0470591de2ca4p+1
	tenC4 = 0x1.2bd7609fd98c4p+0
	tenC5 = 0x1.1429ffd1d4d76p-1
)

// Exp returns e^x.
//
// Error: under 0.52 ulp where the result is normal, under 1 ulp where it is not.
// Special cases:
//
//	Exp(+Inf) = +Inf, Exp(-Inf) = 0, Exp(NaN) = NaN
//	overflow gives +Inf, underflow 0
//
// Source: table lookup after Tang (1989), ACM Trans. Math. Softw. 15, 144, with
// 128 entries; checked against mpmath.
func Exp(x float64) float64 {
	if a := math.Abs(x); !(a >= expLeast && a < expGreatest) {
		return expFar(x)
	}
	k, r := expReduce(x)
	return scaled(k, expSeries(r))
}

// ExpInto sets dst[i] to Exp(src[i]), bit for bit.
//
// Shapes: dst at least as long as src; they may be the same slice.
func ExpInto(dst, src []float64) {
	dst = dst[:len(src)]
	for len(src) > 0 {
		done, next := expColumn(dst, src)
		for i := done; i < next; i++ {
			dst[i] = Exp(src[i])
		}
		dst, src = dst[next:], src[next:]
	}
}

// Exp10 returns 10^x; integer powers that a float64 holds exactly are exact.
//
// Error and special cases as Exp.
func Exp10(x float64) float64 {
	if a := math.Abs(x); !(a >= exp10Least && a < exp10Greatest) {
		return exp10Far(x)
	}
	k, r := exp10Reduce(x)
	return scaled(k, exp10Series(r))
}

// Exp10Into sets dst[i] to Exp10(src[i]), bit for bit.
//
// Shapes: dst at least as long as src; they may be the same slice.
func Exp10Into(dst, src []float64) {
	dst = dst[:len(src)]
	for len(src) > 0 {
		done, next := exp10Column(dst, src)
		for i := done; i < next; i++ {
			dst[i] = Exp10(src[i])
		}
		dst, src = dst[next:], src[next:]
	}
}

// expReduce writes x = k ln 2 / 128 + r with |r| ≤ ln 2 / 256; k counts in two's complement.
func expReduce(x float64) (k uint64, r float64) {
	shifted := float64(x*stepsPerE) + roundShift
	n := shifted - roundShift
	return math.Float64bits(shifted), x - float64(n*stepHigh) - float64(n*stepLow)
}

// exp10Reduce writes x = k log10 2 / 128 + r.
func exp10Reduce(x float64) (k uint64, r float64) {
	shifted := float64(x*stepsPerTen) + roundShift
	n := shifted - roundShift
	return math.Float64bits(shifted), x - float64(n*step10High) - float64(n*step10Low)
}

// expSeries returns e^r - 1 by its Taylor series to r^5/5!; the next term is
// under 2^-60.
func expSeries(r float64) float64 {
	r2 := float64(r * r)
	return r + (float64(r2*(0.5+float64(r*(1.0/6)))) +
		float64(float64(r2*r2)*(1.0/24+float64(r*(1.0/120)))))
}

// exp10Series returns 10^r - 1.
func exp10Series(r float64) float64 {
	r2 := float64(r * r)
	return float64(r*tenC1) + (float64(r2*(tenC2+float64(r*tenC3))) +
		float64(float64(r2*r2)*(tenC4+float64(r*tenC5))))
}

// scaled returns 2^(k/128) (1 + p) for a normal result.
func scaled(k uint64, p float64) float64 {
	t := &expTable[k&127]
	s := math.Float64frombits(t.bits + k<<45)
	return s + float64(s*(t.rest+p))
}
