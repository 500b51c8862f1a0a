package cosmology

import (
	"math"

	"wane/sim/num"
	"wane/sim/physics/constant"
)

// LogVacuumTau returns log10 of the time, in yr, that is the fourth root of a
// decay rate of the vacuum per volume and time.
//
//	tau = (Gamma/V)^(-1/4)
//
// It is no waiting time: a world line waits for its light cone to hold
// tau^4, see [LogVacuumWait].
//
// Units: logRate is log10 of Gamma/V in GeV^4 (hbar = c = 1).
// Error: rounding.
//
// Source: Andreassen, Frost & Schwartz 2018, Phys. Rev. D 97, 056006.
func LogVacuumTau(logRate float64) float64 {
	return -logRate/4 + num.Log10(constant.HBar/(1e9*constant.EV)) - constant.Log10Year
}

// LogVacuumRate returns log10 of a decay rate in yr^-4 (c = 1) from its log10
// in Gyr^-1 Gpc^-3.
func LogVacuumRate(perGyrGpc3 float64) float64 {
	lightYear := constant.C * constant.Year
	return perGyrGpc3 - 9 - 3*num.Log10(1e9*constant.Parsec/lightYear)
}

// LogVacuumWait returns log10 of the mean wait, in yr, for the vacuum to decay
// at a point of de Sitter space, whose light cone grows by (4 pi/3)(c/H)^3 a
// year.
//
//	t = tau^4 / ((4 pi/3) H^-3)
//
// Units: logTau of yr, logHubble of 1/yr.
//
// Source: by hand from Gamma V4 = 1; four-volume of Andreassen, Frost &
// Schwartz 2018.
func LogVacuumWait(logTau, logHubble float64) float64 {
	return 4*logTau + 3*logHubble - num.Log10(4*math.Pi/3)
}
