package hole

import (
	"math"

	"wane/sim/num"
	"wane/sim/physics/constant"
)

// sunTemperature is the temperature of a hole of one solar mass, K:
// hbar c^3 / (8 pi GM k), with the nominal GM.
const sunTemperature = constant.HBar * constant.C * constant.C * constant.C /
	(8 * math.Pi * constant.GMSun * constant.Boltzmann)

// Temperature returns the temperature of a black hole of mass m.
//
//	T = hbar c^3 / (8 pi G m k) = 6.1703e-8 K (Msun/m)
//
// Units: m in solar masses, result in K.
// Domain: m > 0.
// Error: 1e-9 (only GM enters, nominal).
// Special cases: Temperature(0) = +Inf; NaN for m < 0.
//
// Source: Hawking 1975, Commun. Math. Phys. 43, 199. Checked by
// testdata/published/holes.csv.
func Temperature(m float64) float64 {
	if m < 0 {
		return math.NaN()
	}
	return sunTemperature / m
}

// Log10Temperature is log10 of [Temperature], safe for any m; -Inf for m <= 0,
// a hole that is gone.
func Log10Temperature(m float64) float64 {
	if !(m > 0) {
		return math.Inf(-1)
	}
	return num.Log10(sunTemperature) - num.Log10(m)
}
