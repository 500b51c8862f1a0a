package num_test

import (
	"fmt"
	"math"
	"math/rand/v2"
	"testing"

	"wane/sim/num"
)

var inf, nan, negative0 = math.Inf(1), math.NaN(), math.Copysign(0, -1)

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
		{"Log", num.Log, 0, -inf}, {"Log", num.Log, negative0, -inf}, {"Log", num.Log, -1, nan}, {"Log", num.Log, -inf, nan},
		{"Log", num.Log, inf, inf}, {"Log", num.Log, nan, nan}, {"Log", num.Log, 1, 0},
		{"Log", num.Log, least, -744.4400719213812}, {"Log", num.Log, greatest, 709.782712893384},
		{"Log10", num.Log10, 0, -inf}, {"Log10", num.Log10, -1, nan}, {"Log10", num.Log10, inf, inf}, {"Log10", num.Log10, nan, nan},
		{"Log10", num.Log10, 1, 0}, {"Log10", num.Log10, least, -323.3062153431158}, {"Log10", num.Log10, greatest, 308.25471555991674},
		{"Log1p", num.Log1p, 0, 0}, {"Log1p", num.Log1p, negative0, negative0}, {"Log1p", num.Log1p, -1, -inf}, {"Log1p", num.Log1p, -1.5, nan},
		{"Log1p", num.Log1p, -inf, nan}, {"Log1p", num.Log1p, inf, inf}, {"Log1p", num.Log1p, nan, nan}, {"Log1p", num.Log1p, least, least},
		{"Log1p", num.Log1p, greatest, 709.782712893384},
		{"Expm1", num.Expm1, 0, 0}, {"Expm1", num.Expm1, negative0, negative0}, {"Expm1", num.Expm1, -inf, -1}, {"Expm1", num.Expm1, -1e300, -1},
		{"Expm1", num.Expm1, inf, inf}, {"Expm1", num.Expm1, 710, inf}, {"Expm1", num.Expm1, nan, nan}, {"Expm1", num.Expm1, least, least},
		{"Sinh", num.Sinh, negative0, negative0}, {"Sinh", num.Sinh, inf, inf}, {"Sinh", num.Sinh, -inf, -inf}, {"Sinh", num.Sinh, nan, nan},
		{"Sinh", num.Sinh, 711, inf}, {"Sinh", num.Sinh, -1e5, -inf}, {"Sinh", num.Sinh, least, least},
		{"Asinh", num.Asinh, negative0, negative0}, {"Asinh", num.Asinh, inf, inf}, {"Asinh", num.Asinh, -inf, -inf}, {"Asinh", num.Asinh, nan, nan},
		{"Tanh", num.Tanh, negative0, negative0}, {"Tanh", num.Tanh, inf, 1}, {"Tanh", num.Tanh, -inf, -1}, {"Tanh", num.Tanh, nan, nan},
		{"Erf", num.Erf, negative0, negative0}, {"Erf", num.Erf, inf, 1}, {"Erf", num.Erf, -inf, -1}, {"Erf", num.Erf, -7, -1}, {"Erf", num.Erf, nan, nan},
		{"Erfinv", num.Erfinv, negative0, negative0}, {"Erfinv", num.Erfinv, 1, inf}, {"Erfinv", num.Erfinv, -1, -inf}, {"Erfinv", num.Erfinv, 1.1, nan},
		{"Erfinv", num.Erfinv, inf, nan}, {"Erfinv", num.Erfinv, nan, nan},
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

// A column is its scalar function element by element, whichever instructions
// either uses, wherever in a block of lanes an element stands and whatever
// stands beside it.
func TestColumnsEqualScalars(t *testing.T) {
	n := 1 << 21
	if testing.Short() {
		n = 1 << 16
	}
	edges := []float64{0, negative0, 1, -1, inf, -inf, nan, 5e-324, 1e-310, 0x1p-1022, 0x0.fffffffffffffp-1022, math.MaxFloat64,
		700, -700, math.Nextafter(700, 0), 709.9, 710, 710.5, -745, -746, -747, 304, -304, -310, 308.9, 309, 309.1, -324, -325, 1e-61, -1e-61, 0x1p-60}
	for _, c := range []struct {
		name      string
		into      func(dst, src []float64)
		scalar    func(float64) float64
		low, high float64
	}{
		{"Exp", num.ExpInto, num.Exp, -760, 720},
		{"Exp10", num.Exp10Into, num.Exp10, -330, 310},
		{"Log", num.LogInto, num.Log, 1e-320, 1e300},
		{"Log10", num.Log10Into, num.Log10, 1e-320, 1e300},
	} {
		r, xs := rand.New(rand.NewPCG(1, 2)), spread(c.low, c.high, n)
		for i := range xs {
			switch {
			case i&7 == 7 && i&8 == 0:
				xs[i] = math.Float64frombits(r.Uint64()) // any number at all
			case r.IntN(64) == 0:
				xs[i] = edges[r.IntN(len(edges))]
			}
		}
		dst := make([]float64, len(xs)+1)
		dst[len(xs)] = 42
		c.into(dst, xs)
		for i, x := range xs {
			if !same(dst[i], c.scalar(x)) {
				t.Fatalf("%sInto of %x = %x, scalar %x", c.name, x, dst[i], c.scalar(x))
			}
		}
		if dst[len(xs)] != 42 {
			t.Errorf("%sInto wrote past its source", c.name)
		}
		for length := range 40 {
			short := make([]float64, length+1)
			c.into(short, xs[:length])
			for i := range length {
				if !same(short[i], dst[i]) {
					t.Errorf("%sInto of %d differs at %d", c.name, length, i)
				}
			}
			if short[length] != 0 {
				t.Errorf("%sInto of %d wrote past its source", c.name, length)
			}
		}
		c.into(xs, xs)
		for i := range xs {
			if !same(xs[i], dst[i]) {
				t.Fatalf("%sInto in place differs at %d", c.name, i)
			}
		}
	}
}

// The special cases of Pow are those of IEEE 754 and C, which the standard
// library follows; its answer is exact there on every machine.
func TestPowSpecialCases(t *testing.T) {
	values := []float64{0, negative0, 1, -1, 2, -2, 3, -3, 0.5, -0.5, 1.5, -2.5, inf, -inf, nan, 1e300, -1e300, 1e-300, 1 << 53, 1<<53 - 1, -(1<<53 - 1), 5e-324}
	for _, x := range values {
		for _, y := range values {
			got, want := num.Pow(x, y), math.Pow(x, y)
			if same(got, want) || want != 0 && math.Abs(got/want-1) < 1e-14 && !math.IsInf(want, 0) {
				continue
			}
			t.Errorf("Pow(%g, %g) = %g, want %g", x, y, got, want)
		}
	}
	for n := range 23 {
		if got, want := num.Pow(10, float64(n)), num.Exp10(float64(n)); got != want {
			t.Errorf("Pow(10, %d) = %.17g, want %.17g", n, got, want)
		}
	}
}

func TestEvenAndOdd(t *testing.T) {
	for name, f := range map[string]func(float64) float64{"Sinh": num.Sinh, "Asinh": num.Asinh, "Tanh": num.Tanh, "Erf": num.Erf, "Erfinv": num.Erfinv} {
		for _, x := range spread(1e-20, 1, 500) {
			if f(-x) != -f(x) {
				t.Errorf("%s(-%g) = %g, want %g", name, x, f(-x), -f(x))
			}
		}
	}
}
