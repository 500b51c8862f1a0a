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

// Largest error against mpmath in 60 digits, in units of the last place.
func TestErrorAgainstMpmath(t *testing.T) {
	n := 20_000
	if testing.Short() {
		n = 2_000
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
