package num_test

import (
	"math"
	"math/rand/v2"
	"testing"

	"wane/sim/num"
)

// spread returns n numbers between low and high, evenly spread or, with low
// over 0, half of them evenly in the logarithm; fixed by its arguments.
func spread(low, high float64, n int) []float64 {
	r, xs := rand.New(rand.NewPCG(uint64(n), math.Float64bits(low))), make([]float64, n)
	for i := range xs {
		xs[i] = low + (high-low)*r.Float64()
		if low > 0 && i%2 == 0 {
			xs[i] = low * math.Pow(high/low, r.Float64())
		}
	}
	return xs
}

// Largest error against mpmath in 40 digits, in units of the last place.
func TestErrorAgainstMpmath(t *testing.T) {
	n := 4_000
	if testing.Short() {
		n = 400
	}
	for _, f := range []struct {
		name, expression string
		function         func(float64) float64
		low, high, bound float64
	}{
		{"Exp", "exp(x)", num.Exp, -1, 1, 0.52},
		{"Exp", "exp(x)", num.Exp, -708, 709.7, 0.52},
		{"Exp tiny", "exp(x)", num.Exp, 1e-19, 1e-3, 0.52},
		{"Exp subnormal", "exp(x)", num.Exp, -745, -708.4, 1},
		{"Exp10", "mpf(10)**x", num.Exp10, -1, 1, 0.52},
		{"Exp10", "mpf(10)**x", num.Exp10, -307.6, 308.2, 0.52},
		{"Exp10 subnormal", "mpf(10)**x", num.Exp10, -323.3, -307.7, 1},
		{"Log", "log(x)", num.Log, 0.9, 1.1, 0.53},
		{"Log", "log(x)", num.Log, 0.25, 4, 0.53},
		{"Log", "log(x)", num.Log, 1e-300, 1e300, 0.53},
		{"Log subnormal", "log(x)", num.Log, 5e-324, 2e-308, 0.53},
		{"Log near 1", "log(x)", num.Log, 0.995, 1.005, 0.53},
		{"Log10", "log10(x)", num.Log10, 0.9, 1.1, 0.53},
		{"Log10", "log10(x)", num.Log10, 0.25, 4, 0.53},
		{"Log10", "log10(x)", num.Log10, 1e-300, 1e300, 0.53},
		{"Log10 subnormal", "log10(x)", num.Log10, 5e-324, 2e-308, 0.53},
		{"Log1p", "log1p(x)", num.Log1p, -0.01, 0.01, 0.53},
		{"Log1p", "log1p(x)", num.Log1p, -0.999999, 3, 0.53},
		{"Log1p tiny", "log1p(x)", num.Log1p, 1e-18, 1e-2, 0.53},
		{"Log1p", "log1p(x)", num.Log1p, 1e-3, 1e17, 0.53},
		{"Expm1", "expm1(x)", num.Expm1, -0.3, 0.3, 0.8},
		{"Expm1", "expm1(x)", num.Expm1, -41, 41, 0.8},
		{"Expm1 tiny", "expm1(x)", num.Expm1, 1e-18, 0.3, 0.8},
		{"Expm1", "expm1(x)", num.Expm1, 0.2, 709, 0.8},
		{"Sinh", "sinh(x)", num.Sinh, -1, 1, 0.8},
		{"Sinh", "sinh(x)", num.Sinh, 1e-10, 710.4, 0.8},
		{"Asinh", "asinh(x)", num.Asinh, -2, 2, 1.5},
		{"Asinh", "asinh(x)", num.Asinh, 1e-10, 1e20, 1.5},
		{"Tanh", "tanh(x)", num.Tanh, -2, 2, 2.5},
		{"Tanh", "tanh(x)", num.Tanh, 1e-10, 20, 2.5},
		{"Erf", "erf(x)", num.Erf, -1, 1, 0.8},
		{"Erf", "erf(x)", num.Erf, 1e-20, 6.5, 0.8},
		{"Erfinv", "erfinv(x)", num.Erfinv, -0.9, 0.9, 6},
		{"Erfinv", "erfinv(x)", num.Erfinv, 0.8, 1, 6},
		{"Erfinv tiny", "erfinv(x)", num.Erfinv, 1e-15, 1e-1, 6},
	} {
		xs := spread(f.low, f.high, n)
		worst, at := 0.0, 0.0
		for i, w := range mpmath(t, f.expression, xs) {
			if e := ulps(f.function(xs[i]), w); !(e <= worst) {
				worst, at = e, xs[i]
			}
		}
		t.Logf("%s on %g..%g: %.3f ulp at %x", f.name, f.low, f.high, worst, at)
		if !(worst <= f.bound) {
			t.Errorf("%s(%x) on %g..%g is off by %.3f ulp, want at most %g", f.name, at, f.low, f.high, worst, f.bound)
		}
	}
}

func TestPowAgainstMpmath(t *testing.T) {
	n := 4_000
	if testing.Short() {
		n = 400
	}
	for _, f := range []struct {
		name                     string
		xLow, xHigh, yMax, bound float64
	}{
		{"moderate", 0.01, 100, 20, 0.52},
		{"wide", 1e-300, 1e300, 1, 0.52},
		{"near 1", 0.99, 1.01, 6e4, 0.52},
		{"at 1", 1 - 1e-7, 1 + 1e-7, 6e9, 0.52},
		{"subnormal", 5e-324, 1e-308, 0.95, 0.52},
	} {
		xs, ys := spread(f.xLow, f.xHigh, n), spread(-f.yMax, f.yMax, n+1)[:n]
		worst, at := 0.0, 0
		for i, w := range mpmath(t, "x**y", xs, ys) {
			if e := ulps(num.Pow(xs[i], ys[i]), w); math.Abs(w.value) > 3e-308 && !(e <= worst) {
				worst, at = e, i
			}
		}
		t.Logf("Pow %s: %.3f ulp", f.name, worst)
		if !(worst <= f.bound) {
			t.Errorf("Pow(%x, %x) is off by %.3f ulp, want at most %g", xs[at], ys[at], worst, f.bound)
		}
	}
}
