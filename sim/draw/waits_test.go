package draw_test

import (
	"math"
	"slices"
	"testing"

	"wane/sim/draw"
	"wane/testdata/published"
)

// TestPublishedWaits checks the logarithm of the waits that are drawn: its
// mean, its spread and its median, over 2^24 draws. A wait is tau E, so this
// is how a date scatters about the mean life.
func TestPublishedWaits(t *testing.T) {
	const n = 1 << 24
	// The median lies in this window, and so few draws beside it that they
	// can be sorted.
	const low, high = -0.40, -0.33
	var sum, squares float64
	below, near := 0, []float64{}
	s, xs := draw.New(2024, 0, "waits"), make([]float64, 4096)
	for first := 0; first < n; first += len(xs) {
		s.Exps(xs, uint64(first), 0, 0)
		for _, x := range xs {
			l := math.Log(x)
			sum += l
			squares += l * l
			switch {
			case l < low:
				below++
			case l < high:
				near = append(near, l)
			}
		}
	}
	slices.Sort(near)
	middle := n/2 - below
	if middle < 0 || middle >= len(near) {
		t.Fatalf("the median is not within %v .. %v", low, high)
	}
	mean := sum / n
	deviation := math.Sqrt(squares/n - mean*mean)
	for _, row := range published.Rows(t, "waits.csv") {
		switch q := row.Inputs["quantity"]; q {
		case "mean":
			row.Check(t, mean)
		case "deviation":
			if row.Unit == "dex" {
				row.Check(t, deviation/math.Ln10)
			} else {
				row.Check(t, deviation)
			}
		case "median":
			row.Check(t, near[middle])
		default:
			t.Errorf("%s: unknown quantity %q", row.Where(), q)
		}
	}
}
