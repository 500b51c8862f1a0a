package num_test

import (
	"math"
	"testing"

	"wane/sim/num"
)

// One value at every place of columns of every length decides.
func TestAllWithin(t *testing.T) {
	const least, greatest = math.SmallestNonzeroFloat64, math.MaxFloat64
	for _, r := range []struct {
		low, high, inside float64
		good, bad         []float64
	}{
		{0, 1, 0.5, []float64{0, negative0, least, 1}, []float64{-least, math.Nextafter(1, 2), inf, -inf, nan, -nan}},
		{-greatest, greatest, 3, []float64{0, negative0, greatest, -greatest}, []float64{inf, -inf, nan}},
		{-greatest, inf, 3, []float64{-greatest, inf}, []float64{-inf, nan}},
		{-inf, greatest, 3, []float64{-inf, greatest}, []float64{inf, nan}},
		{-inf, inf, 3, []float64{-inf, inf}, []float64{nan}},
		{least, greatest, 3, []float64{least}, []float64{0, negative0, -1, inf, nan}},
	} {
		for length := range 35 {
			xs := make([]float64, length)
			for i := range xs {
				xs[i] = r.inside
			}
			if !num.AllWithin(xs, r.low, r.high) {
				t.Errorf("%d times %g are not within %g .. %g", length, r.inside, r.low, r.high)
			}
			for i := range xs {
				for _, v := range r.good {
					if xs[i] = v; !num.AllWithin(xs, r.low, r.high) {
						t.Errorf("%g at %d of %d is not within %g .. %g", v, i, length, r.low, r.high)
					}
				}
				for _, v := range r.bad {
					if xs[i] = v; num.AllWithin(xs, r.low, r.high) {
						t.Errorf("%g at %d of %d is within %g .. %g", v, i, length, r.low, r.high)
					}
				}
				xs[i] = r.inside
			}
		}
	}
}
