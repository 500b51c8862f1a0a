package stars

import (
	"math"

	"wane/sim/num"
)

// BirthDate returns log10 of the date before which the fraction u of all
// objects is born, when the star formation rate falls exponentially.
//
//	psi ~ e^-((t - start)/tau),   t = start - tau ln(1 - u)
//
// Units: log10Start, log10Tau and the result in log10 years.
// Domain: 0 <= u <= 1; u within 2^-53 of 1 is taken there, 36.7 tau after the
// start.
// Error: rounding.
// Source: an exponential history is the usual one-parameter description of a
// galactic disc; start and tau are assumptions.
func BirthDate(u, log10Start, log10Tau float64) float64 {
	e := -num.Log1p(-math.Min(u, 1-0x1p-53))
	if !(e > 0) {
		return log10Start
	}
	return num.Add10(log10Start, log10Tau+num.Log10(e))
}
