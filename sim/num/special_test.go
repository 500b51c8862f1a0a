package num_test

import (
	"fmt"
	"math"
	"testing"

	"wane/sim/num"
)

var inf, nan = math.Inf(1), math.NaN()

// same reports equality of values, NaN equal to NaN, 0 unlike -0.
func same(a, b float64) bool {
	return a == b && math.Signbit(a) == math.Signbit(b) || math.IsNaN(a) && math.IsNaN(b)
}

func TestSpecialCases(t *testing.T) {
	const least, greatest = math.SmallestNonzeroFloat64, math.MaxFloat64
	for _, c := range []struct {
		name     string
		function func(float64) float64
		x, want  float64
	}{
		{"Exp", num.Exp, 0, 1}, {"Exp", num.Exp, math.Copysign(0, -1), 1}, {"Exp", num.Exp, inf, inf},
		{"Exp", num.Exp, -inf, 0}, {"Exp", num.Exp, nan, nan}, {"Exp", num.Exp, 710, inf}, {"Exp", num.Exp, 1e300, inf},
		{"Exp", num.Exp, -746, 0}, {"Exp", num.Exp, -1e300, 0}, {"Exp", num.Exp, least, 1},
		{"Exp10", num.Exp10, 0, 1}, {"Exp10", num.Exp10, inf, inf}, {"Exp10", num.Exp10, -inf, 0}, {"Exp10", num.Exp10, nan, nan},
		{"Exp10", num.Exp10, 308.3, inf}, {"Exp10", num.Exp10, 1e76, inf}, {"Exp10", num.Exp10, -324, 0}, {"Exp10", num.Exp10, -1e76, 0},
		{"Log", num.Log, 0, -inf}, {"Log", num.Log, math.Copysign(0, -1), -inf}, {"Log", num.Log, -1, nan}, {"Log", num.Log, -inf, nan},
		{"Log", num.Log, inf, inf}, {"Log", num.Log, nan, nan}, {"Log", num.Log, 1, 0},
		{"Log", num.Log, least, -744.4400719213812}, {"Log", num.Log, greatest, 709.782712893384},
		{"Log10", num.Log10, 0, -inf}, {"Log10", num.Log10, -1, nan}, {"Log10", num.Log10, inf, inf}, {"Log10", num.Log10, nan, nan},
		{"Log10", num.Log10, 1, 0}, {"Log10", num.Log10, least, -323.3062153431158}, {"Log10", num.Log10, greatest, 308.25471555991674},
	} {
		if got := c.function(c.x); !same(got, c.want) {
			t.Errorf("%s(%g) = %.17g, want %.17g", c.name, c.x, got, c.want)
		}
	}
}

// Log10 of the float64 nearest to 10^n is n itself for every n, and Exp10(n)
// is 10^n where a float64 holds it, to 22, and elsewhere the nearest or its neighbour.
func TestPowersOfTenAreExact(t *testing.T) {
	for n := -307; n <= 308; n++ {
		var x float64
		if _, err := fmt.Sscanf(fmt.Sprintf("1e%d", n), "%g", &x); err != nil {
			t.Fatal(err)
		}
		if got := num.Log10(x); got != float64(n) {
			t.Errorf("Log10(1e%d) = %.17g", n, got)
		}
		got := num.Exp10(float64(n))
		if exact := 0 <= n && n <= 22; got != x && (exact || math.Nextafter(got, x) != x) {
			t.Errorf("Exp10(%d) = %.17g, want %.17g", n, got, x)
		}
	}
}

func TestColumnsEqualScalars(t *testing.T) {
	edges := []float64{0, math.Copysign(0, -1), 1, -1, inf, -inf, nan, 5e-324, 1e-310, math.MaxFloat64, 700, -700, 709.9, -745, 304, -310, 1e-61}
	for _, c := range []struct {
		name   string
		into   func(dst, src []float64)
		scalar func(float64) float64
		xs     []float64
	}{
		{"Exp", num.ExpInto, num.Exp, spread(-760, 720, 20_000)},
		{"Exp10", num.Exp10Into, num.Exp10, spread(-330, 310, 20_000)},
		{"Log", num.LogInto, num.Log, spread(1e-320, 1e300, 20_000)},
		{"Log10", num.Log10Into, num.Log10, spread(1e-320, 1e300, 20_000)},
	} {
		xs := append(c.xs, edges...)
		dst := make([]float64, len(xs)+1)
		dst[len(xs)] = 42
		c.into(dst, xs)
		for i, x := range xs {
			if !same(dst[i], c.scalar(x)) {
				t.Errorf("%sInto of %x = %x, scalar %x", c.name, x, dst[i], c.scalar(x))
			}
		}
		if dst[len(xs)] != 42 {
			t.Errorf("%sInto wrote past its source", c.name)
		}
		c.into(xs, xs)
		for i := range xs {
			if !same(xs[i], dst[i]) {
				t.Errorf("%sInto in place differs at %d", c.name, i)
			}
		}
	}
}
