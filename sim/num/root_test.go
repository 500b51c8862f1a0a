package num_test

import (
	"errors"
	"math"
	"testing"

	"wane/sim/num"
)

func TestRoots(t *testing.T) {
	step := func(x float64) float64 {
		if x < 0.3 {
			return -1
		}
		return 1
	}
	for _, c := range []struct {
		name    string
		f       func(float64) float64
		a, b, x float64
	}{
		// Dottie's number, OEIS A003957.
		{"cos x = x", func(x float64) float64 { return math.Cos(x) - x }, 0, 1, 0.739085133215160641655},
		{"x e^x = 1, omega constant, OEIS A030178", func(x float64) float64 { return x*num.Exp(x) - 1 }, 2, 0, 0.567143290409783872999},
		{"cube root of 2, OEIS A002580", func(x float64) float64 { return x*x*x - 2 }, -5, 1e3, 1.259921049894873164767},
		{"jump", step, -1, 2, 0.3},
		{"flat", func(x float64) float64 { return num.Pow(x-1, 9) }, 0, 2.5, 1},
		{"steep", func(x float64) float64 { return num.Exp(50*x) - 1 }, -10, 10, 0},
		{"root at an end", func(x float64) float64 { return x - 4 }, 4, 9, 4},
		{"root at the other end", func(x float64) float64 { return x - 4 }, 1, 4, 4},
	} {
		for name, find := range map[string]func(func(float64) float64, float64, float64, float64) (float64, error){"Brent": num.Brent, "Bisect": num.Bisect} {
			calls := 0
			x, err := find(func(x float64) float64 { calls++; return c.f(x) }, c.a, c.b, 1e-14)
			if err != nil || math.Abs(x-c.x) > 2e-14 && math.Abs(c.f(x)) > 0x1p-1000 {
				t.Errorf("%s, %s: %.17g, %v, want %.17g", name, c.name, x, err, c.x)
			}
			if calls > 150 {
				t.Errorf("%s, %s: %d calls", name, c.name, calls)
			}
		}
	}
	calls := 0
	if _, err := num.Brent(func(x float64) float64 { calls++; return math.Cos(x) - x }, 0, 1, 1e-14); err != nil || calls > 10 {
		t.Errorf("Brent needs %d calls for a smooth root, %v", calls, err)
	}
}

func TestRootsWithoutBracket(t *testing.T) {
	for _, f := range []func(float64) float64{
		func(x float64) float64 { return x*x + 1 },
		func(x float64) float64 { return nan },
	} {
		for _, find := range []func(func(float64) float64, float64, float64, float64) (float64, error){num.Brent, num.Bisect} {
			if x, err := find(f, -1, 1, 0); !errors.Is(err, num.ErrNoSignChange) || !math.IsNaN(x) {
				t.Errorf("%g, %v, want NaN and %v", x, err, num.ErrNoSignChange)
			}
		}
	}
	noisy, turn := func(x float64) float64 { return math.Cos(x) - x }, 0
	if _, err := num.Brent(func(x float64) float64 {
		if turn++; turn > 2 {
			return nan
		}
		return noisy(x)
	}, 0, 1, 0); !errors.Is(err, num.ErrNoConvergence) {
		t.Errorf("a function that turns NaN: %v, want %v", err, num.ErrNoConvergence)
	}
}
