package hole

import (
	"math"

	"wane/sim/num"
	"wane/sim/physics/constant"
)

// PlanckMass is the square root of hbar c/G, solar masses: 2.176434e-8 kg.
const PlanckMass = 1.0945602e-38

// entropyUnit is the entropy of a hole of one solar mass over Boltzmann's
// constant, 4 pi G Msun^2/(hbar c) = 1.049e77.
const entropyUnit = 4 * math.Pi / (constant.HBar * constant.C) * constant.GMSun * (constant.GMSun / constant.G)

// Log10Entropy returns log10 of the entropy of a hole of mass m, over
// Boltzmann's constant.
//
//	S = 4 pi G m^2/(hbar c) = 1.049e77 (m/Msun)^2
//
// Units: m in solar masses.
// Domain: m > 0; -Inf for m <= 0. Error: 2.2e-5 in S, from G.
//
// Source: Hawking 1975. Checked by testdata/published/holes.csv.
func Log10Entropy(m float64) float64 {
	if !(m > 0) {
		return math.Inf(-1)
	}
	return num.Log10(entropyUnit) + 2*num.Log10(m)
}

// Burden is how memory slows a hole's evaporation: as Hawking has it down to
// Part of its mass at birth, and slower by the entropy to the power Power
// below. It emits with Alpha throughout.
type Burden struct {
	Alpha, Part, Power float64
}

// Log10LossRate is [Log10LossRate] of a hole under the burden of its memory.
//
//	-dm/dt = alpha hbar c^4/(G^2 m^2)             m > part birth
//	-dm/dt = alpha hbar c^4/(G^2 m^2) S(m)^-k     below
//
// Units: masses in solar masses; result log10 of solar masses per year.
//
// Source: Alexandre, Dvali & Koutsangelas 2024, Phys. Rev. D 110, 036004.
func (b Burden) Log10LossRate(m, birth float64) float64 {
	free := Log10LossRate(m, b.Alpha)
	if m > b.Part*birth || !(m > 0) {
		return free
	}
	return free - b.Power*Log10Entropy(m)
}

// Log10Lifetime is how long such a hole lasts.
//
//	t = G^2 (m^3 - x^3)/(3 alpha hbar c^4) + S(x)^k G^2 x^3/((3 + 2k) alpha hbar c^4),  x = min(m, part birth)
//
// Units: masses in solar masses; result log10 of years; -Inf for m <= 0.
//
// Source: the integral of the loss. Checked by testdata/published/evaporation.csv.
func (b Burden) Log10Lifetime(m, birth float64) float64 {
	x := math.Min(m, b.Part*birth)
	slow := math.Inf(-1)
	if x > 0 {
		slow = 3*num.Log10(x) + b.Power*Log10Entropy(x) - num.Log10((3+2*b.Power)*b.Alpha*lossUnit)
	}
	return num.Add10(Log10Wait(m, x, b.Alpha), slow)
}
