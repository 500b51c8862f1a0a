package law

import (
	"math"
	"testing"
)

// What each rule allows, among numbers at its edges, at any place of columns
// of a few lengths.
func TestRulesAtTheirEdges(t *testing.T) {
	inf, nan, negative0 := math.Inf(1), math.NaN(), math.Copysign(0, -1)
	const least, greatest = math.SmallestNonzeroFloat64, math.MaxFloat64
	all := []float64{-inf, -greatest, -1, -least, negative0, 0, least, 0.5, 1, math.Nextafter(1, 2), greatest, inf, nan, math.Copysign(nan, -1)}
	for _, c := range []struct {
		rule rule
		good []float64
	}{
		{finite, all[1:11]},
		{wait, all[1:12]},
		{logZero, all[:11]},
		{hazard, all[:12]},
		{positive, all[6:11]},
		{atLeast0, all[4:11]},
		{chance, all[4:9]},
		{share, all[4:9]},
		{yesNo, []float64{negative0, 0, 1}},
	} {
		for _, v := range all {
			want := false
			for _, g := range c.good {
				want = want || g == v
			}
			for _, length := range []int{1, 2, 8, 19} {
				for at := range length {
					column := make([]float64, length)
					for i := range column {
						column[i] = 1
					}
					column[at] = v
					wantRow := at
					if want {
						wantRow = -1
					}
					if row := firstBad(c.rule, column); row != wantRow {
						t.Errorf("%v: %g in row %d of %d: found row %d, want %d", c.rule, v, at, length, row, wantRow)
					}
				}
			}
		}
	}
}
