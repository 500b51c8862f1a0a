package orderstat

import (
	"fmt"
	"math"
)

// LastDate extrapolates from a sample to the real number: it solves
//
//	sum_i w_i S_i(t) = -ln q
//
// for the q-quantile of the date on which the last real object goes.
//
// expected returns the left side at log10 of t: the survival S_i of each
// sampled object by its law, times the number w_i of real objects it stands
// for. It must not rise with t. The result is log10 of t, in the bracket low
// .. high of log10 dates, to the last bits.
//
// It fails, naming what it found, when expected is not above -ln q at low and
// at or below it at high. A jump across -ln q (lives of fixed length) is a
// solution: the date of the jump.
//
// Source: Gumbel 1958, section 5.2 (characteristic largest value).
func LastDate(expected func(log10Date float64) float64, q, low, high float64) (float64, error) {
	target := Target(q)
	if !(q > 0 && q < 1) {
		return 0, fmt.Errorf("orderstat: quantile %v: want above 0 and below 1", q)
	}
	if n := expected(low); !(n > target) {
		return 0, fmt.Errorf("orderstat: %v expected at 10^%v yr: want more than %v, or an earlier start", n, low, target)
	}
	if n := expected(high); !(n <= target) {
		return 0, fmt.Errorf("orderstat: %v expected at 10^%v yr: want at most %v, or a later end", n, high, target)
	}
	for {
		middle := low + (high-low)/2
		if middle <= low || middle >= high || math.IsNaN(middle) {
			return high, nil
		}
		if expected(middle) > target {
			low = middle
		} else {
			high = middle
		}
	}
}
