package report

import (
	"fmt"
	"math"
	"strconv"

	"wane/sim/num"
)

// doubled is the log10 date beyond which only the exponent of the exponent is
// worth printing: 10^(10^x).
const doubled = 1e6

// exponentOnly is the log10 date beyond which a relative step of order one in
// time is below the last bit of the date, so half, hundredth and last are one
// number.
const exponentOnly = 1e15

// finest is how many decimals of a log10 date are ever printed: stellar
// lifetimes, cooling and relaxation are not known to better than 0.001 dex.
const finest = 3

// decimals returns how many decimals of a number are worth printing when its
// error is known: the last one printed is the first one in doubt.
func decimals(err float64) int {
	if math.IsNaN(err) || math.IsInf(err, 0) {
		return 2
	}
	if err <= 0 {
		return finest
	}
	d := int(math.Ceil(-num.Log10(err) - 1e-9))
	return min(max(d, 0), finest)
}

// shown is a log10 date made ready to print: its exponent, or the exponent of
// its exponent, with the decimals that its error leaves.
type shown struct {
	double bool
	places int
	err    float64
}

// show decides how a date of log10 years with the given error is printed.
func show(date, err float64) shown {
	s := shown{err: err}
	if date > doubled {
		s.double = true
		s.err = err / (date * num.Ln10)
	}
	s.places = decimals(s.err)
	return s
}

func (s shown) exponent(date float64) string {
	if s.double {
		date = num.Log10(date)
	}
	return strconv.FormatFloat(date, 'f', s.places, 64)
}

func (s shown) date(date float64) string {
	if s.double {
		return "10^(10^" + s.exponent(date) + ")"
	}
	return "10^" + s.exponent(date)
}

// margin is the error after a ±, or nothing where none is known.
func (s shown) margin() string {
	if math.IsNaN(s.err) || math.IsInf(s.err, 0) {
		return ""
	}
	unit := math.Pow10(-s.places)
	if s.err < unit/2 {
		return " ± <" + strconv.FormatFloat(unit, 'f', s.places, 64)
	}
	return " ± " + strconv.FormatFloat(s.err, 'f', s.places, 64)
}

// interval is a range of exponents in brackets. An end that was not reached is
// open.
func (s shown) interval(low, high float64) string {
	switch {
	case math.IsNaN(low) || math.IsNaN(high) || math.IsInf(low, 1):
		return ""
	case math.IsInf(high, 1):
		return "(from " + s.exponent(low) + " on)"
	}
	a, b := s.exponent(low), s.exponent(high)
	if a == b {
		return "(all " + a + ")"
	}
	return "(" + a + " to " + b + ")"
}

// Date prints a date of log10 years whose error is known (NaN: unknown).
func Date(date, err float64) string {
	switch {
	case math.IsNaN(date):
		return "unknown"
	case math.IsInf(date, 1):
		return "never"
	}
	return show(date, err).date(date)
}

// Count prints a number of objects to the given significant digits; small
// numbers, where all digits count, are printed as whole ones.
func Count(n float64, digits int) string {
	if n < 1e5 && digits >= 3 {
		return strconv.FormatFloat(math.Round(n), 'f', 0, 64)
	}
	return plainExponent(strconv.FormatFloat(n, 'g', digits, 64))
}

// plainExponent turns 1.2e+11 into 1.2e11.
func plainExponent(s string) string {
	for i := 0; i+2 < len(s); i++ {
		if s[i] != 'e' {
			continue
		}
		mantissa, sign, digits := s[:i+1], s[i+1], s[i+2:]
		for len(digits) > 1 && digits[0] == '0' {
			digits = digits[1:]
		}
		if sign == '-' {
			return mantissa + "-" + digits
		}
		return mantissa + digits
	}
	return s
}

// percent prints a share, never as a round 100 or 0 that it is not.
func percent(share float64) string {
	p := 100 * share
	switch {
	case share == 1:
		return "100 %"
	case p > 99.9:
		return ">99.9 %"
	case p > 0 && p < 0.1:
		return "<0.1 %"
	case p >= 10 && p < 99:
		return fmt.Sprintf("%.0f %%", p)
	}
	return fmt.Sprintf("%.1f %%", p)
}
