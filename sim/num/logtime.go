package num

import "math"

// Ln10 is ln 10.
const Ln10 = 2.302585092994045684017991454684364208

const log10E = 1 / Ln10

// Add10 returns log10(10^a + 10^b), the date of one wait after another.
// Numbers that do not fit 10^a do no harm: above a = 1e16 or so the larger one
// is the answer.
//
// Error: half a unit in the last place of the larger argument and 3e-16.
// Special cases:
//
//	Add10(a, -Inf) = a, Add10(a, +Inf) = +Inf, Add10(a, NaN) = NaN
func Add10(a, b float64) float64 {
	if a < b {
		a, b = b, a
	}
	if math.IsInf(b, -1) || math.IsInf(a, 1) && b == b {
		return a
	}
	return a + float64(Log1p(Exp10(b-a))*log10E)
}

// Sub10 returns log10(10^a - 10^b), the age at date a of what was born at b;
// -Inf, no age, where a ≤ b. The date of birth is invisible once a - b exceeds
// about 15 less log10 a; age equals date is then right.
//
// Error: half a unit in the last place of a, and of the difference a - b as
// far as the arguments themselves say it.
// Special cases:
//
//	Sub10(a, -Inf) = a, Sub10(+Inf, b < +Inf) = +Inf, Sub10 of NaN = NaN
func Sub10(a, b float64) float64 {
	if a <= b {
		return math.Inf(-1)
	}
	return a + float64(Log(-Expm1(float64((b-a)*Ln10)))*log10E)
}

// Sum10 returns log10 of the sum of 10^x over all terms; -Inf of none.
//
// Error: as Add10, with the rounding of a sum of as many terms.
// Special cases: +Inf if a term is, NaN if one is NaN.
func Sum10(xs ...float64) float64 {
	greatest := math.Inf(-1)
	for _, x := range xs {
		greatest = max(greatest, x) // NaN stays
	}
	if math.IsInf(greatest, 0) || math.IsNaN(greatest) {
		return greatest
	}
	sum := 0.0
	for _, x := range xs {
		sum += Exp10(x - greatest)
	}
	return greatest + Log10(sum)
}
