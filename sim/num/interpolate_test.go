package num_test

import (
	"fmt"
	"math"
	"slices"
	"strings"
	"testing"

	"wane/sim/num"
)

func list(xs []float64) string {
	return strings.ReplaceAll(strings.Trim(fmt.Sprintf("%.17g", xs), "[]"), " ", ",")
}

var tables = map[string]struct{ x, y []float64 }{
	"two":     {[]float64{1, 4}, []float64{2, -1}},
	"three":   {[]float64{0, 1, 10}, []float64{0, 5, 5.5}},
	"uneven":  {[]float64{-3, -2.9, 0, 1e-3, 4, 5, 5.1, 100}, []float64{0, 1, 1, 2, -5, -5.5, -6, -6}},
	"peak":    {[]float64{0, 1, 2, 3, 4}, []float64{0, 3, 1, 7, 7}},
	"rising":  {[]float64{0, 1, 2, 4, 8, 16, 32}, []float64{0, 0.1, 3, 3.1, 9, 9.5, 20}},
	"overend": {[]float64{0, 1, 1.5}, []float64{0, 1, -9}},
}

// Between the knots against SciPy's PchipInterpolator, the same slopes in
// another code, and numpy's interp.
func TestInterpolationAgainstSciPy(t *testing.T) {
	for name, c := range tables {
		at := spread(c.x[0], c.x[len(c.x)-1], 300)
		at = append(at, c.x...)
		xs, ys := list(c.x), list(c.y)
		m, err := num.NewMonotone(c.x, c.y)
		if err != nil {
			t.Fatal(err)
		}
		l, err := num.NewLinear(c.x, c.y)
		if err != nil {
			t.Fatal(err)
		}
		// mpf goes in and out; SciPy works in float64.
		cubic := "mpf(float(__import__('scipy.interpolate').interpolate.PchipInterpolator([" + xs + "],[" + ys + "])(float(x))))"
		straight := "mpf(float(__import__('numpy').interp(float(x),[" + xs + "],[" + ys + "])))"
		for i, w := range mpmath(t, cubic, at) {
			if got := m.At(at[i]); !(math.Abs(got-w.value) <= 1e-13) {
				t.Errorf("%s: monotone at %g = %.17g, SciPy %.17g", name, at[i], got, w.value)
			}
		}
		for i, w := range mpmath(t, straight, at) {
			if got := l.At(at[i]); !(math.Abs(got-w.value) <= 1e-13) {
				t.Errorf("%s: linear at %g = %.17g, numpy %.17g", name, at[i], got, w.value)
			}
		}
	}
}

func TestInterpolationIsMonotoneAndMeetsItsKnots(t *testing.T) {
	for name, c := range tables {
		m, _ := num.NewMonotone(c.x, c.y)
		l, _ := num.NewLinear(c.x, c.y)
		for i, x := range c.x {
			if m.At(x) != c.y[i] || l.At(x) != c.y[i] {
				t.Errorf("%s: at knot %g: %g and %g, want %g", name, x, m.At(x), l.At(x), c.y[i])
			}
		}
		for i := range len(c.x) - 1 {
			low, high := min(c.y[i], c.y[i+1]), max(c.y[i], c.y[i+1])
			const slack = 1e-14
			before := c.y[i]
			for j := range 1001 {
				y := m.At(c.x[i] + (c.x[i+1]-c.x[i])*float64(j)/1000)
				if y < low-slack || y > high+slack || (y-before)*(c.y[i+1]-c.y[i]) < -slack {
					t.Fatalf("%s: interval %d turns at step %d: %g after %g", name, i, j, y, before)
				}
				before = y
			}
		}
		n := len(c.x) - 1
		for _, f := range []func(float64) float64{m.At, l.At} {
			if f(c.x[0]-1) != c.y[0] || f(-inf) != c.y[0] || f(c.x[n]+1) != c.y[n] || f(inf) != c.y[n] || !math.IsNaN(f(nan)) {
				t.Errorf("%s: not constant outside, or not NaN at NaN", name)
			}
		}
	}
}

// A lookup with the guide finds what a plain search finds, over knots that
// crowd together by ten orders of magnitude.
func TestLookupInCrowdedKnots(t *testing.T) {
	x := append([]float64{0, 10}, spread(1e-9, 10, 500)...)
	slices.Sort(x)
	x = slices.Compact(x)
	l, err := num.NewLinear(x, x)
	if err != nil {
		t.Fatal(err)
	}
	for _, at := range spread(1e-10, 10, 20_000) {
		if got := l.At(at); math.Abs(got-at) > 1e-14 {
			t.Fatalf("identity at %g = %g", at, got)
		}
	}
}

func TestBadTables(t *testing.T) {
	for name, c := range map[string]struct{ x, y []float64 }{
		"empty":   {nil, nil},
		"one":     {[]float64{1}, []float64{1}},
		"lengths": {[]float64{1, 2}, []float64{1}},
		"equal":   {[]float64{1, 1}, []float64{1, 2}},
		"falling": {[]float64{2, 1}, []float64{1, 2}},
		"NaN":     {[]float64{1, nan}, []float64{1, 2}},
		"value":   {[]float64{1, 2}, []float64{1, inf}},
	} {
		_, m := num.NewMonotone(c.x, c.y)
		_, l := num.NewLinear(c.x, c.y)
		if m == nil || l == nil {
			t.Errorf("%s: accepted", name)
		}
	}
}
