package quantity

import (
	"math"
	"strconv"
	"strings"

	"wane/sim/num"
)

// Shown is a unit as people read it: Msun for solMass.
func Shown(unit string) string {
	for _, r := range [][2]string{
		{"solMass", "Msun"}, {"solLum", "Lsun"}, {"solRad", "Rsun"}, {"jupiterMass", "Mjup"}, {"earthMass", "Mearth"},
	} {
		unit = strings.ReplaceAll(unit, r[0], r[1])
	}
	return unit
}

// Format prints a value with its unit for people, to six digits: "0.6 Msun",
// "1e21 kg". Parse reads it back.
func Format(value float64, unit string) string {
	return withUnit(plain(strconv.FormatFloat(value, 'g', 6, 64)), unit)
}

// FormatLog10 prints 10^log10 with its unit, whatever its size: "1e37 yr",
// "3.98e18 yr", "10^1100.5 yr", "10^(1e26) yr", "0 yr" for -Inf, "never" for
// an infinite time.
func FormatLog10(log10 float64, unit string) string {
	whole := log10 == math.Trunc(log10)
	switch {
	case math.IsInf(log10, -1):
		return withUnit("0", unit)
	case math.IsInf(log10, 1) && strings.HasSuffix(unit, "yr"):
		return "never"
	case math.IsInf(log10, 1) || log10 != log10:
		return withUnit(strconv.FormatFloat(log10, 'g', -1, 64), unit)
	case math.Abs(log10) >= 1e15:
		return withUnit("10^("+plain(strconv.FormatFloat(log10, 'g', 6, 64))+")", unit)
	case math.Abs(log10) >= 300:
		return withUnit("10^"+strconv.FormatFloat(log10, 'f', -1, 64), unit)
	case whole && math.Abs(log10) > 5:
		return withUnit("1e"+strconv.Itoa(int(log10)), unit)
	}
	v := num.Exp10(log10)
	if math.Abs(log10) <= 5 {
		return withUnit(plain(strconv.FormatFloat(v, 'g', 6, 64)), unit)
	}
	return withUnit(plain(strconv.FormatFloat(v, 'e', 3, 64)), unit)
}

// Exact prints a value so that reading it gives the same bits.
func Exact(value float64, unit string) string {
	return withUnit(plain(strconv.FormatFloat(value, 'g', -1, 64)), unit)
}

// ExactLog10 is [Exact] for 10^log10.
func ExactLog10(log10 float64, unit string) string {
	switch {
	case math.IsInf(log10, 1):
		return "never"
	case math.IsInf(log10, -1):
		return withUnit("0", unit)
	}
	return withUnit("10^"+plain(strconv.FormatFloat(log10, 'g', -1, 64)), unit)
}

// plain turns "1e+37" and "2.500e+18" into "1e37" and "2.5e18".
func plain(s string) string {
	mantissa, exponent, ok := strings.Cut(s, "e")
	if strings.Contains(mantissa, ".") {
		mantissa = strings.TrimRight(strings.TrimRight(mantissa, "0"), ".")
	}
	if !ok {
		return mantissa
	}
	sign := ""
	if exponent[0] == '-' {
		sign = "-"
	}
	return mantissa + "e" + sign + strings.TrimLeft(exponent[1:], "0")
}

func withUnit(number, unit string) string {
	if unit == "" {
		return number
	}
	return number + " " + Shown(unit)
}
