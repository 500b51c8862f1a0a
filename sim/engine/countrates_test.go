package engine

import (
	"math"
	"testing"

	"pgregory.net/rapid"
)

// TestCountRates: rates worked out ahead are those that update would find one
// by one, and the kernel has the bits of the function.
func TestCountRates(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		first := rapid.IntRange(rateBlock, 10_000_000).Draw(t, "first")
		c := &countRates{series: nearNumbers, weight: rapid.Float64Range(1, 1e7).Draw(t, "weight")}
		c.number = c.weight * float64(first+rapid.IntRange(1, 3).Draw(t, "gone"))
		for k := range fewClocks {
			c.rate0[k] = math.Exp(rapid.Float64Range(-80, 0).Draw(t, "ln rate"))
			c.slope[k] = rapid.Float64Range(-6, 6).Draw(t, "slope") // steep ones need the full exponential
		}
		n := rapid.IntRange(1, rateBlock).Draw(t, "n")
		filled := c.fill(first, n)
		if filled < n || filled > rateBlock {
			t.Fatalf("%d filled of %d", filled, n)
		}
		for i := range filled {
			number := c.weight * float64(first-i)
			x := lnNear((number - c.number) / c.number)
			if x < -1.05*moveToRefresh {
				break // the window has ended
			}
			for k := range fewClocks {
				want := c.rate0[k] * expNear(c.slope[k]*x)
				if c.rate[k][i] != want || c.slow[k][i] != 1/want {
					t.Fatalf("row %d, clock %d: rate %v and %v, want %v and %v", i, k, c.rate[k][i], c.slow[k][i], want, 1/want)
				}
			}
		}
	})
}
