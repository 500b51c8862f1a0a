package cooling

import (
	"math"

	"wane/sim/num"
)

// BrownDwarfStart is log10 of the temperature, K, that young brown dwarfs are
// held at: 2800 K, about the hottest seen. Assumption.
const BrownDwarfStart = 3.4471580313422194

// BrownDwarfTemperature returns log10 of the effective temperature of a brown
// dwarf.
//
//	T = 1550 K (1e9 yr/t)^0.32 (M/0.05)^0.83 (kappa/0.01)^0.088, at most 2800 K
//
// Units: m in solar masses; logAge in log10 years; kappa, the mean opacity of
// its atmosphere, in cm2/g; result in log10 K.
// Domain: m >= 0, any age. Valid from 1e7 to 1e10 yr; later an upper bound.
// Error: 10 % in its range.
// Special cases: log10 2800 at -Inf, -Inf at +Inf or m = 0.
// Source: [BurrowsLiebert1993]; [BurrowsEtAl2001], eq. 2 (from memory).
// Checked by testdata/published/cooling.csv.
func BrownDwarfTemperature(m, logAge, kappa float64) float64 {
	if !(m > 0) {
		return math.Inf(-1)
	}
	t := num.Log10(1550) + 0.32*(9-logAge) + 0.83*num.Log10(m/0.05) + 0.088*num.Log10(kappa/0.01)
	return math.Min(t, BrownDwarfStart)
}

// BrownDwarfLuminosity returns log10 of the luminosity of a brown dwarf.
//
//	L = 4e-5 (1e9 yr/t)^1.3 (M/0.05)^2.64 (kappa/0.01)^0.35
//
// Units: as for [BrownDwarfTemperature]; result in log10 solar luminosities.
// Domain: 1e7 .. 1e10 yr. Error: 20 %.
// Source: [BurrowsLiebert1993]; [BurrowsEtAl2001], eq. 1 (from memory).
// Checked by testdata/published/cooling.csv.
func BrownDwarfLuminosity(m, logAge, kappa float64) float64 {
	return num.Log10(4e-5) + 1.3*(9-logAge) + 2.64*num.Log10(m/0.05) + 0.35*num.Log10(kappa/0.01)
}
