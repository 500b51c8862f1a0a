// Package pairs is the wear of bodies that have no horizon, if curved space
// makes pairs of particles around them as it does around black holes: how fast
// a body of some density loses mass, and how long it takes as it swells.
//
// A body of mean density rho loses mass on the time
//
//	tau = kappa c^5/(hbar G^(5/2) rho^(3/2))
//
// Masses are in solar masses, densities in g/cm3, times in years as base-10
// logarithms. That there is such an effect without a horizon is contested.
//
// Sources: Wondrak, van Suijlekom & Falcke 2023, Phys. Rev. Lett. 130, 221502;
// Falcke, Wondrak & van Suijlekom 2025, J. Cosmol. Astropart. Phys. 05, 023.
package pairs

import (
	"math"

	"wane/sim/num"
	"wane/sim/physics/constant"
	"wane/sim/physics/structure"
)

// Kappa is the coefficient of the time, from the statement that whatever is
// denser than 3e53 g/cm3 would be gone in 13.8e9 yr; 2.6 to 4.4 for the one
// digit of that density. The formula's own coefficient has not been used.
const Kappa = 3.5

// PlanetLike is the mass, Msun, below which a body is as dense as its solid or
// liquid matter, whatever its mass.
const (
	PlanetLike      = 1e-3
	log10PlanetLike = -3
)

// Log10Life is the time on which a body of some mean density loses mass.
//
//	tau = kappa c^5/(hbar G^(5/2) rho^(3/2))
//
// Units: density in g/cm3, result log10 of years.
// Domain: density > 0; +Inf for none.
// Error: 25 % from kappa.
//
// Source: Falcke, Wondrak & van Suijlekom 2025 (rho^(-3/2)). Checked by
// testdata/published/pairs.csv.
func Log10Life(density, kappa float64) float64 {
	if !(density > 0) {
		return math.Inf(1)
	}
	c2 := constant.C * constant.C
	si := c2 * c2 * constant.C / constant.HBar / (constant.G * constant.G * math.Sqrt(constant.G))
	return num.Log10(kappa*si) - constant.Log10Year - 1.5*(num.Log10(density)+3)
}

// Body is a body that wears: its time at birth, and how that grows as it
// swells.
//
//	tau = Log10Life (Birth/M)^Power,  constant below PlanetLike
type Body struct {
	Log10Life float64 // of the density at birth, log10 yr
	Birth     float64 // solar masses
	Power     float64 // 0 for a density that stays what it was

	log10Birth float64
}

// How tau grows as mass falls: with rho as M^2 for matter that degenerate
// particles hold up, as M for bodies whose size hardly changes.
const (
	Swelling = 3
	SameSize = 1.5
)

// body has the density of a ball of the mass at birth, and no less than that
// at PlanetLike, below which density does not change.
func body(birth, kappa, power float64, radius func(float64) float64) Body {
	birth = math.Max(birth, PlanetLike)
	return Body{Log10Life(structure.MeanDensity(birth, radius(birth)), kappa), birth, power, num.Log10(birth)}
}

// WhiteDwarf is a cold white dwarf born with a mass.
func WhiteDwarf(birth, kappa float64) Body {
	return body(birth, kappa, Swelling, structure.WhiteDwarfRadius)
}

// NeutronStar is a neutron star born with a mass.
func NeutronStar(birth, kappa float64) Body {
	return body(birth, kappa, Swelling, structure.NeutronStarRadius)
}

// BrownDwarf is a cold brown dwarf born with a mass.
func BrownDwarf(birth, kappa float64) Body {
	return body(birth, kappa, SameSize, structure.BrownDwarfRadius)
}

// IronBall is a cold ball of iron born with a mass.
func IronBall(birth, kappa float64) Body {
	const perElectron = 56. / 26 // nucleons per electron of iron-56
	return body(birth, kappa, Swelling, func(m float64) float64 { return structure.WhiteDwarfRadiusOf(m, perElectron) })
}

// Rigid is the body if its density stays what it was at birth.
func (b Body) Rigid() Body { b.Power = 0; return b }

// swollen is log10 of tau(M) over tau at birth.
func (b Body) swollen(m float64) float64 {
	if b.Power == 0 {
		return 0
	}
	return b.Power * (b.log10Birth - num.Log10(math.Max(m, PlanetLike)))
}

// Log10LossRate returns how fast the body loses mass when it has mass m.
//
//	-dm/dt = m/tau(m)
//
// Units: m in solar masses; result log10 of solar masses per year; -Inf for
// m <= 0.
func (b Body) Log10LossRate(m float64) float64 {
	if !(m > 0) {
		return math.Inf(-1)
	}
	log10M := num.Log10(m)
	if b.Power == 0 {
		return log10M - b.Log10Life
	}
	return log10M - b.Log10Life - b.Power*(b.log10Birth-math.Max(log10M, log10PlanetLike))
}

// Log10Wait returns how long the body takes from mass m to mass end.
//
//	t = tau0/p ((M0/end)^p - (M0/m)^p) down to PlanetLike, then tau ln(PlanetLike/end)
//
// Units: masses in solar masses; result log10 of years; -Inf for m <= end.
// Domain: end > 0. Error: rounding.
// Source: the integral of the loss. Checked by testdata/published/curvature.csv.
func (b Body) Log10Wait(m, end float64) float64 {
	if !(m > end) {
		return math.Inf(-1)
	}
	wait := math.Inf(-1)
	if low := math.Max(end, PlanetLike); m > low {
		fall := lnRatio(m, low)
		if b.Power > 0 {
			fall = num.Expm1(b.Power*fall) / b.Power
		}
		wait = b.Log10Life + b.swollen(m) + num.Log10(fall)
	}
	if end < PlanetLike {
		high := math.Min(m, PlanetLike)
		wait = num.Add10(wait, b.Log10Life+b.swollen(high)+num.Log10(lnRatio(high, end)))
	}
	return wait
}

// lnRatio is ln(m/end) to the last digits, also where the two are close.
func lnRatio(m, end float64) float64 {
	if r := (m - end) / end; r < 1 {
		return num.Log1p(r)
	}
	return num.Log(m / end)
}
