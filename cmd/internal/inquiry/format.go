package inquiry

import (
	"math"
	"strconv"
	"strings"

	"wane/sim/num"
	"wane/sim/scenario/quantity"
)

// Symbol is the unit of a value in files: VOUnits, in which log is the
// logarithm to base 10.
func Symbol(v Value) string {
	if v.Log10 {
		return "log(" + v.Unit + ")"
	}
	return v.Unit
}

// atOnce is the log10 of a time in years below which it is none: laws answer
// 10^-1000 yr for what has happened already.
const atOnce = -300

// Format prints a value with its unit, for people.
func Format(v Value) string {
	unit := quantity.Shown(v.Unit)
	switch {
	case v.Word != "":
		return v.Word
	case v.Log10 && math.IsInf(v.Number, 1):
		return "never"
	case v.Log10 && math.IsInf(v.Number, -1):
		return strings.TrimSpace("0 " + unit)
	case v.Log10 && v.Unit == "yr" && v.Number <= atOnce:
		return "at once"
	case v.Log10 && v.Number < -1e6:
		return strings.TrimSpace("10^(" + short(v.Number, 5) + ") " + unit)
	case v.Log10 && v.Number > 1e6:
		return strings.TrimSpace("10^(10^" + strconv.FormatFloat(num.Log10(v.Number), 'f', 3, 64) + ") " + unit)
	case v.Log10:
		s := "10^" + strconv.FormatFloat(v.Number, 'f', 3, 64) + " " + unit
		if math.Abs(v.Number) < 15 {
			s += " (" + short(power(v.Number), 4) + " " + unit + ")"
		}
		return strings.TrimSpace(s)
	}
	return strings.TrimSpace(short(v.Number, 5) + " " + unit)
}

// short prints a number to some digits, 1.5e-9 rather than 1.5e-09.
func short(v float64, digits int) string {
	s := strconv.FormatFloat(v, 'g', digits, 64)
	s = strings.Replace(s, "e+0", "e", 1)
	s = strings.Replace(s, "e+", "e", 1)
	return strings.Replace(s, "e-0", "e-", 1)
}
