package hole

import (
	"math"

	"wane/sim/num"
	"wane/sim/physics/constant"
)

// lossUnit is hbar c^4 / G^2 for masses in solar masses and times in years,
// Msun^3/yr: hbar c^4 G / (GM_sun)^3 per second. It carries G's error once.
const lossUnit = constant.HBar * constant.C * constant.C * constant.C * constant.C * constant.G /
	(constant.GMSun * constant.GMSun * constant.GMSun) * constant.Year

// BlackBodyAlpha is alpha of a black body with the horizon's area and
// temperature: 1/(15360 pi).
const BlackBodyAlpha = 1 / (15360 * math.Pi)

// Log10LossRate returns how fast a hole of mass m that emits with alpha loses
// mass.
//
//	-dm/dt = alpha hbar c^4 / (G^2 m^2)
//
// Units: m in solar masses; result log10 of solar masses per year.
// Domain: m > 0, alpha >= 0; -Inf for m <= 0 or alpha = 0.
// Error: 2.2e-5, all from G, beside that of alpha.
//
// Source: Page 1976.
func Log10LossRate(m, alpha float64) float64 {
	if !(m > 0) || !(alpha > 0) {
		return math.Inf(-1)
	}
	return num.Log10(alpha) + num.Log10(lossUnit) - 2*num.Log10(m)
}

// Log10Lifetime returns how long a hole of mass m lasts that emits with the
// same alpha all its life.
//
//	t = G^2 m^3 / (3 alpha hbar c^4)
//
// Units: m in solar masses; result log10 of years.
// Domain: m > 0, alpha > 0; -Inf for m <= 0, +Inf for alpha = 0.
// Error: 2.2e-5 in t, all from G, beside that of alpha.
//
// Source: Page 1976; with [BlackBodyAlpha] 5120 pi G^2 m^3/(hbar c^4).
// Checked by testdata/published/holes.csv.
func Log10Lifetime(m, alpha float64) float64 { return Log10Wait(m, 0, alpha) }

// Log10Wait returns how long a hole that emits with the same alpha all the
// while takes from mass m to mass end.
//
//	t = G^2 (m^3 - end^3) / (3 alpha hbar c^4)
//
// Units, domain, error and source as for [Log10Lifetime]; -Inf for m <= end.
func Log10Wait(m, end, alpha float64) float64 {
	switch {
	case !(m > end):
		return math.Inf(-1)
	case !(alpha > 0):
		return math.Inf(1)
	}
	whole := 3*num.Log10(m) - num.Log10(3*alpha*lossUnit)
	if !(end > 0) {
		return whole
	}
	return whole + num.Log10(-num.Expm1(-3*logRatio(m, end)))
}

// logRatio is ln(m/end), good to the last digits where the two are close and
// finite where their ratio is not.
func logRatio(m, end float64) float64 {
	if r := (m - end) / end; r < 1 {
		return num.Log1p(r)
	}
	return num.Log(m) - num.Log(end)
}
