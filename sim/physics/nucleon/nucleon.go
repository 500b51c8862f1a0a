// Package nucleon is the decay of matter when nucleons decay: how the mass of
// a cold body shrinks, what heat that leaves, and when it is dissolved.
//
// All nucleons, bound or free, decay with the same mean life tau, so that
//
//	M(t) = M0 exp(-t/tau)
//
// Masses are in solar masses, times in years as base-10 logarithms. Left out:
// that a bound nucleon's life depends on its nucleus, and that decays in the
// last loose nucleons come singly.
//
// Source: Adams & Laughlin 1997, Rev. Mod. Phys. 69, 337, section IV.
package nucleon

import (
	"math"

	"wane/sim/num"
	"wane/sim/physics/constant"
)

// Masses at which a body of ordinary matter counts as gone, and at which a
// neutron star can no longer hold itself together, in solar masses.
const (
	// Transparent: thin to its own photons, no longer a star: 1e21 kg.
	Transparent = 1e21 / constant.Sun
	// NonDegenerate: below it electrons no longer carry the body: a ball of
	// frozen hydrogen.
	NonDegenerate = 1e-3
	// SmallestNeutronStar is the least mass of a stable neutron star
	// (0.09-0.2 by equation of state).
	SmallestNeutronStar = 0.1
)

// LastNucleon is the mass of threshold, solar masses, that a body reaches when
// its last nucleon decays, in the mean. Of n nucleons the last goes at
// tau (ln n + gamma) in the mean, so the threshold is m_u e^-gamma, whatever
// the mass was: tau ln(M/LastNucleon) = tau (ln n + gamma).
func LastNucleon() float64 { return constant.AtomicMass / constant.Sun * num.Exp(-constant.Euler) }

// Log10LossRate returns how fast a body of mass m loses mass.
//
//	-dm/dt = m/tau
//
// Units: m in solar masses, log10Tau log10 of years; result log10 of solar
// masses per year; -Inf for m <= 0.
func Log10LossRate(m, log10Tau float64) float64 {
	if !(m > 0) {
		return math.Inf(-1)
	}
	return num.Log10(m) - log10Tau
}

// Log10Wait returns how long a body takes from mass m down to mass end.
//
//	t = tau ln(m/end)
//
// Units: masses in solar masses, log10Tau and result log10 of years.
// Domain: end > 0; -Inf for m <= end.
// Error: rounding.
// Checked by testdata/published/nucleon.csv.
func Log10Wait(m, end, log10Tau float64) float64 {
	if !(m > end) {
		return math.Inf(-1)
	}
	// m/end may overflow nothing: 1e20/1e-58. Near end the difference keeps digits.
	if r := (m - end) / end; r < 1 {
		return log10Tau + num.Log10(num.Log1p(r))
	}
	return log10Tau + num.Log10(num.Log(m/end))
}

// Power returns the heat that decay leaves in a body of mass m.
//
//	L = share m c^2 / tau
//
// Units: m in solar masses, log10Tau log10 of years, result in W.
// Domain: share 1/3 .. 1 (the rest leaves as neutrinos).
// Error: 2.2e-5 from G in the solar mass, beside that of share.
//
// Source: Adams & Laughlin 1997, section IV. Checked by nucleon.csv.
func Power(m, share, log10Tau float64) float64 {
	return share * m * constant.Sun * constant.C * constant.C * num.Exp10(-log10Tau-constant.Log10Year)
}

// Temperature returns the surface temperature of a body that radiates power
// from radius r.
//
//	T = [L / (4 pi r^2 sigma)]^(1/4)
//
// Units: power in W, r in km, result in K.
func Temperature(power, r float64) float64 {
	r *= 1e3
	return math.Sqrt(math.Sqrt(power / (4 * math.Pi * r * r * constant.StefanBoltzmann)))
}
