package num

import (
	"errors"
	"fmt"
	"math"
)

// ErrNoSignChange says that a function has one sign at both ends of a bracket.
var ErrNoSignChange = errors.New("no change of sign")

// ErrNoConvergence says that a root was not narrowed down as far as asked.
var ErrNoConvergence = errors.New("no convergence")

// Bisect returns a root of f between a and b, in any order, by halving until
// the bracket is tolerance wide or its ends are neighbouring float64s. It is
// slow and always works, also where f jumps through 0.
//
// Errors: ErrNoSignChange.
func Bisect(f func(float64) float64, a, b, tolerance float64) (float64, error) {
	fa, fb := f(a), f(b)
	if done, x, err := bracketed(a, b, fa, fb); done {
		return x, err
	}
	for math.Abs(b-a) > tolerance {
		m := a + (b-a)/2
		if m == a || m == b {
			break
		}
		switch fm := f(m); {
		case fm == 0:
			return m, nil
		case (fm > 0) == (fa > 0):
			a = m
		default:
			b = m
		}
	}
	return a + (b-a)/2, nil
}

// Brent returns a root of a continuous f between a and b, in any order, to
// within tolerance and four times the rounding of the root.
//
// Errors: ErrNoSignChange; ErrNoConvergence after 200 steps, with the best root.
//
// Source: Brent (1973), Algorithms for Minimization Without Derivatives, ch. 4:
// secant or inverse quadratic steps, halving whenever they do not pay.
func Brent(f func(float64) float64, a, b, tolerance float64) (float64, error) {
	fa, fb := f(a), f(b)
	if done, x, err := bracketed(a, b, fa, fb); done {
		return x, err
	}
	// b is the best root so far, c the other end, a the b before.
	c, fc := a, fa
	step, before := b-a, b-a
	for range 200 {
		if (fb > 0) == (fc > 0) {
			c, fc = a, fa
			step, before = b-a, b-a
		}
		if math.Abs(fc) < math.Abs(fb) {
			a, b, c = b, c, b
			fa, fb, fc = fb, fc, fb
		}
		near := float64(0x1p-51*math.Abs(b)) + tolerance/2
		half := (c - b) / 2
		if math.Abs(half) <= near || fb == 0 {
			return b, nil
		}
		step, before = brentStep(a, b, c, fa, fb, fc, half, near, step, before)
		a, fa = b, fb
		if math.Abs(step) > near {
			b += step
		} else {
			b += math.Copysign(near, half)
		}
		fb = f(b)
	}
	return b, fmt.Errorf("num: root near %g, f = %g, after 200 steps: %w", b, fb, ErrNoConvergence)
}

// brentStep returns the next step from b and the step it is measured against:
// an interpolation if that lands well inside the bracket and shrinks at least
// as fast as halving every second time, else half the bracket.
func brentStep(a, b, c, fa, fb, fc, half, near, step, before float64) (float64, float64) {
	if math.Abs(before) < near || math.Abs(fa) <= math.Abs(fb) {
		return half, half
	}
	s := fb / fa
	var p, q float64
	if a == c { // secant
		p, q = float64(2*half*s), 1-s
	} else { // inverse quadratic
		t, r := fa/fc, fb/fc
		p = float64(s * (float64(float64(2*half*t)*(t-r)) - float64((b-a)*(r-1))))
		q = float64(float64((t-1)*(r-1)) * (s - 1))
	}
	if p > 0 {
		q = -q
	} else {
		p = -p
	}
	if 2*p < min(float64(3*half*q)-math.Abs(float64(near*q)), math.Abs(float64(before*q))) {
		return p / q, step
	}
	return half, half
}

// bracketed reports whether there is nothing left to do: a root at an end, or
// none between.
func bracketed(a, b, fa, fb float64) (done bool, x float64, err error) {
	switch {
	case fa == 0:
		return true, a, nil
	case fb == 0:
		return true, b, nil
	case !(fa < 0 && fb > 0 || fa > 0 && fb < 0):
		return true, math.NaN(), fmt.Errorf("num: f = %g at %g and %g at %g: %w", fa, a, fb, b, ErrNoSignChange)
	}
	return false, 0, nil
}
