package fade

import (
	"bytes"
	"encoding/json"
	"math"
	"math/rand/v2"
	"os"
	"os/exec"
	"slices"
	"testing"
)

func exponentials(rng *rand.Rand, n int) []float64 {
	x := make([]float64, n)
	for i := range x {
		x[i] = rng.ExpFloat64()
	}
	slices.Sort(x)
	return x
}

// scipyScript answers for each sample: quantiles by numpy.quantile, the
// error of the median by scipy.stats.mstats.mjci, and by mpmath the incomplete
// beta function of a = b = (n+1)/2 at i/n about the middle (scipy's own is
// wrong by 2e-13 at n = 999). mjci takes the beta law of parameters m - 1 and
// n - m, where m = [n/2 + 1/2].
const scipyScript = `
import json, sys
import numpy as np
from scipy.stats import mstats
import mpmath
mpmath.mp.dps = 30
def below(n, i):
    a = mpmath.mpf(n + 1)/2
    return float(mpmath.betainc(a, a, 0, mpmath.mpf(i)/n, regularized=True))
out = []
for x in json.load(sys.stdin):
    n = len(x)
    out.append({'quantiles': list(np.quantile(x, [0, 0.05, 0.5, 0.77, 0.95, 1])),
      'mjci': float(mstats.mjci(np.array(x), [0.5])[0]),
      'beta': {i: below(n, i) for i in range(n//2 - 2, n//2 + 4)}})
print(json.dumps(out))
`

func TestStatisticsAgainstLibraries(t *testing.T) {
	rng := rand.New(rand.NewPCG(3, 4))
	var samples [][]float64
	for _, n := range []int{5, 6, 40, 41, 999} {
		samples = append(samples, exponentials(rng, n))
	}
	in, err := json.Marshal(samples)
	if err != nil {
		t.Fatal(err)
	}
	c := exec.Command("/usr/bin/python3", "-c", scipyScript)
	c.Stdin = bytes.NewReader(in)
	raw, err := c.Output()
	if err != nil {
		if os.Getenv("WANE_REQUIRE") == "1" {
			t.Fatalf("needs python3 with numpy, scipy and mpmath: %v", err)
		}
		t.Skipf("needs python3 with numpy, scipy and mpmath: %v", err)
	}
	var want []struct {
		Quantiles []float64
		Mjci      float64
		Beta      map[int]float64
	}
	if err := json.Unmarshal(raw, &want); err != nil {
		t.Fatal(err)
	}
	for i, x := range samples {
		n := len(x)
		for j, p := range []float64{0, 0.05, 0.5, 0.77, 0.95, 1} {
			if got := Quantile(x, p); math.Abs(got-want[i].Quantiles[j]) > 1e-15*(1+got) {
				t.Errorf("n = %d: quantile %v is %v, numpy says %v", n, p, got, want[i].Quantiles[j])
			}
		}
		m := math.Floor(float64(n)/2 + 0.5)
		if got := spreadUnderBeta(x, m-1, float64(n)-m); math.Abs(got/want[i].Mjci-1) > 1e-10 {
			t.Errorf("n = %d: spread %v, scipy's mjci says %v", n, got, want[i].Mjci)
		}
		law := newBetaLaw(float64(n+1)/2, float64(n+1)/2)
		for j, w := range want[i].Beta {
			if got := law.below(float64(j) / float64(n)); math.Abs(got-w) > 1e-14 {
				t.Errorf("n = %d: I(%d/n) = %v, mpmath says %v", n, j, got, w)
			}
		}
	}
}

// renyi returns mean and variance of the order statistics of n exponentials:
// X_i is a sum of independent exponentials of mean 1/n, 1/(n-1), ..., 1/(n-i+1)
// (Rényi 1953, Acta Math. Hung. 4, 191). The covariance of two is the variance
// of the lower.
func renyi(n int) (mean, variance []float64) {
	mean, variance = make([]float64, n), make([]float64, n)
	m, v := 0.0, 0.0
	for i := range n {
		gap := 1 / float64(n-i)
		m, v = m+gap, v+gap*gap
		mean[i], variance[i] = m, v
	}
	return mean, variance
}

// expectedSquare is the mean of MedianError squared over samples of n
// exponentials, from their exact moments.
func expectedSquare(n int) float64 {
	mean, variance := renyi(n)
	law := newBetaLaw(float64(n+1)/2, float64(n+1)/2)
	w := make([]float64, n)
	for i := range w {
		w[i] = law.below(float64(i+1)/float64(n)) - law.below(float64(i)/float64(n))
	}
	e := 0.0
	for i := range w {
		e += w[i] * (variance[i] + mean[i]*mean[i])
		for j := range w {
			e -= w[i] * w[j] * (variance[min(i, j)] + mean[i]*mean[j])
		}
	}
	return e
}

func TestMedianOfExponentials(t *testing.T) {
	rng := rand.New(rand.NewPCG(5, 6))
	const n, samples = 401, 2000
	means, variances := renyi(n)
	mean, variance := means[n/2], variances[n/2]
	medians, squares, fourths := 0.0, 0.0, 0.0
	for range samples {
		x := exponentials(rng, n)
		medians += Median(x)
		e := MedianError(x)
		squares += e * e
		fourths += e * e * e * e
	}
	medians, squares, fourths = medians/samples, squares/samples, fourths/samples
	if sigma := math.Sqrt(variance / samples); math.Abs(medians-mean) > 5*sigma {
		t.Errorf("median %v, want %v +- %v", medians, mean, sigma)
	}
	want, sigma := expectedSquare(n), math.Sqrt((fourths-squares*squares)/samples)
	if math.Abs(squares-want) > 5*sigma {
		t.Errorf("squared error %v, want %v +- %v", squares, want, sigma)
	}
}

// The squared error tends to the variance as 1/sqrt(n): from 101 to 1601 by a
// factor of 4.
func TestErrorTendsToTheTruth(t *testing.T) {
	off := func(n int) float64 {
		_, variance := renyi(n)
		return expectedSquare(n)/variance[n/2] - 1
	}
	few, many := off(101), off(1601)
	if math.Abs(many) > math.Abs(few)/3 || math.Abs(many) > 0.05 {
		t.Errorf("squared error over variance is off by %v at n = 101, by %v at n = 1601", few, many)
	}
}

// With some realisations cut the error comes from ranks; for the median of an
// exponential it tends to 1/sqrt(n).
func TestErrorWithCuts(t *testing.T) {
	rng := rand.New(rand.NewPCG(7, 8))
	const n, samples = 400, 2000
	sum := 0.0
	for range samples {
		x := exponentials(rng, n)
		for i := n * 9 / 10; i < n; i++ {
			x[i] = inf
		}
		sum += MedianError(x)
	}
	if got := sum / samples * math.Sqrt(n); math.Abs(got-1) > 0.02 {
		t.Errorf("error times sqrt(n): %v, want 1 to 2 %%", got)
	}
}

func TestCutValuesStandBeyond(t *testing.T) {
	x := []float64{1, 2, 3, inf, inf}
	for _, r := range []struct{ p, want float64 }{{0, 1}, {0.25, 2}, {0.5, 3}, {0.51, inf}, {0.75, inf}, {1, inf}} {
		if got := Quantile(x, r.p); got != r.want {
			t.Errorf("quantile %v: got %v, want %v", r.p, got, r.want)
		}
	}
	if got := Median([]float64{inf, inf}); got != inf {
		t.Errorf("all cut: got %v, want +Inf", got)
	}
	if got := MedianError(x); got != inf {
		t.Errorf("error with the upper rank cut: got %v, want +Inf", got)
	}
	for _, few := range [][]float64{nil, {1}} {
		if got := MedianError(few); !math.IsNaN(got) {
			t.Errorf("error of %d values: got %v, want NaN", len(few), got)
		}
	}
	if got := Median(nil); !math.IsNaN(got) {
		t.Errorf("median of nothing: got %v, want NaN", got)
	}
	if got := MedianError([]float64{70, 70, 70}); got != 0 {
		t.Errorf("error of three equal dates: got %v, want 0", got)
	}
}
