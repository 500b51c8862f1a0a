package draw_test

import (
	"math"
	"testing"

	"wane/sim/draw"
)

// fiveSigma bounds a normal deviate at a false-alarm rate of about 6e-7.
const fiveSigma = 5

// chiSquareDeviate returns the excess of Pearson's chi-square over its mean
// in standard deviations, for bins of equal probability.
func chiSquareDeviate(counts []int, n int) float64 {
	expected := float64(n) / float64(len(counts))
	sum := 0.0
	for _, c := range counts {
		d := float64(c) - expected
		sum += d * d / expected
	}
	freedom := float64(len(counts) - 1)
	return (sum - freedom) / math.Sqrt(2*freedom)
}

func TestLawOfTheExponential(t *testing.T) {
	n, bins := 1<<24, 4096
	if testing.Short() {
		n = 1 << 21
	}
	counts := make([]int, bins)
	xs := make([]float64, 4096)
	sum, squares := 0.0, 0.0
	s := draw.New(12345, 0, "law")
	for first := 0; first < n; first += len(xs) {
		s.Exps(xs, uint64(first), 0, 0)
		for _, x := range xs {
			counts[min(bins-1, int(-math.Expm1(-x)*float64(bins)))]++
			sum += x
			squares += x * x
		}
	}
	if z := chiSquareDeviate(counts, n); math.Abs(z) > fiveSigma {
		t.Errorf("chi-square of %d bins is off by %.1f sigma", bins, z)
	}
	// Mean 1 with variance 1; second moment 2 with variance 24 - 4.
	root := math.Sqrt(float64(n))
	if z := (sum/float64(n) - 1) * root; math.Abs(z) > fiveSigma {
		t.Errorf("mean is off by %.1f sigma", z)
	}
	if z := (squares/float64(n) - 2) * root / math.Sqrt(20); math.Abs(z) > fiveSigma {
		t.Errorf("second moment is off by %.1f sigma", z)
	}
}

// The ends of the law: the tail beyond the ziggurat's base edge 7.697 (binned
// by its own probability), and the smallest values.
func TestTailAndHeadOfTheExponential(t *testing.T) {
	n := 1 << 24
	if testing.Short() {
		n = 1 << 21
	}
	s, xs := draw.New(99, 1, "ends"), make([]float64, 4096)
	bounds := []struct {
		name  string
		p     float64
		holds func(x float64) bool
	}{
		{"x > 7.69711747013104972", math.Exp(-7.69711747013104972), func(x float64) bool { return x > 7.69711747013104972 }},
		{"x > 9", math.Exp(-9), func(x float64) bool { return x > 9 }},
		{"x > 11", math.Exp(-11), func(x float64) bool { return x > 11 }},
		{"6.94 < x < 7.69", math.Exp(-6.94) - math.Exp(-7.69), func(x float64) bool { return 6.94 < x && x < 7.69 }},
		{"x < 0.01", -math.Expm1(-0.01), func(x float64) bool { return x < 0.01 }},
		{"x < 1e-4", -math.Expm1(-1e-4), func(x float64) bool { return x < 1e-4 }},
	}
	counts := make([]int, len(bounds))
	for first := 0; first < n; first += len(xs) {
		s.Exps(xs, uint64(first), 3, 1)
		for _, x := range xs {
			for k := range bounds {
				if bounds[k].holds(x) {
					counts[k]++
				}
			}
		}
	}
	for k, b := range bounds {
		mean := float64(n) * b.p
		if z := (float64(counts[k]) - mean) / math.Sqrt(mean*(1-b.p)); math.Abs(z) > fiveSigma {
			t.Errorf("%s: %d of %d, off by %.1f sigma", b.name, counts[k], n, z)
		}
	}
}

// The greatest of n exponentials has mean H_n and variance sum 1/k^2; the
// least of n has mean 1/n and standard deviation 1/n (Rényi 1953).
func TestExtremesOfAThousand(t *testing.T) {
	const n, trials = 1000, 4000
	harmonic, variance := 0.0, 0.0
	for k := 1; k <= n; k++ {
		harmonic += 1 / float64(k)
		variance += 1 / float64(k*k)
	}
	xs, greatest, least := make([]float64, n), 0.0, 0.0
	for i := range trials {
		draw.New(2, uint64(i), "extremes").Exps(xs, 0, 0, 0)
		high, low := xs[0], xs[0]
		for _, x := range xs {
			high, low = max(high, x), min(low, x)
		}
		greatest += high
		least += low
	}
	if z := (greatest/trials - harmonic) * math.Sqrt(trials/variance); math.Abs(z) > fiveSigma {
		t.Errorf("mean of the greatest of %d: %.4f, want %.4f, off by %.1f sigma", n, greatest/trials, harmonic, z)
	}
	if z := (least/trials*n - 1) * math.Sqrt(trials); math.Abs(z) > fiveSigma {
		t.Errorf("mean of the least of %d: %.4g, want %.4g, off by %.1f sigma", n, least/trials, 1.0/n, z)
	}
}
