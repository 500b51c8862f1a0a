package cosmology

import (
	"math"

	"wane/sim/num"
	"wane/sim/physics/constant"
)

// perSecond is 1 km/s/Mpc in 1/s.
const perSecond = 1e3 / (1e6 * constant.Parsec)

// LogHubbleRate returns log10 of the expansion rate in 1/yr.
//
// Units: h0 in km/s/Mpc. Domain: h0 > 0. Error: rounding.
func LogHubbleRate(h0 float64) float64 { return num.Log10(h0 * (perSecond * constant.Year)) }

// critical returns 3 H0^2 / (8 pi G), kg/m3.
func critical(h0 float64) float64 {
	h := h0 * perSecond
	return 3 * h * h / (8 * math.Pi * constant.G)
}

// PhotonDensity returns the density of black-body photons over the critical
// density today.
//
//	Omega = a T^4 / c^2 / rho_crit
//
// Units: h0 in km/s/Mpc, t in K. Domain: h0 > 0, t >= 0. Error: 2.2e-5, from G.
//
// Source: Weinberg 2008, section 2.1. Checked by
// testdata/published/cosmology.csv.
func PhotonDensity(h0, t float64) float64 {
	return constant.Radiation * t * t * t * t / (constant.C * constant.C) / critical(h0)
}

// RadiationDensity adds to [PhotonDensity] n kinds of massless neutrinos.
//
//	Or = Omega_photon (1 + 7/8 (4/11)^(4/3) n)
//
// Units, domain, error: as PhotonDensity; n = 3.046 in the standard model.
//
// Source: Weinberg 2008, section 3.1.
func RadiationDensity(h0, t, n float64) float64 {
	return PhotonDensity(h0, t) * (1 + 0.22710731766*n)
}

// DarkEnergyDensity returns the energy density of dark energy, J/m3.
//
//	rho c^2 = Omega 3 H0^2 c^2 / (8 pi G)
//
// Units: h0 in km/s/Mpc, omega over the critical density. Error: 2.2e-5.
func DarkEnergyDensity(h0, omega float64) float64 {
	return omega * critical(h0) * constant.C * constant.C
}

// CosmologicalConstant returns Lambda = 3 Omega (H0/c)^2, 1/m2.
func CosmologicalConstant(h0, omega float64) float64 {
	h := h0 * perSecond / constant.C
	return 3 * omega * h * h
}

// LogHorizonEntropy returns log10 of the entropy of a horizon of radius c/H,
// in units of Boltzmann's constant.
//
//	S = pi (c/H)^2 / l_Planck^2,  l_Planck^2 = hbar G / c^3
//
// Units: logHubble is log10 of H in 1/yr. Error: 2.2e-5, from G.
//
// Source: Gibbons & Hawking 1977, Phys. Rev. D 15, 2738.
func LogHorizonEntropy(logHubble float64) float64 {
	const c = constant.C
	year := num.Log10(constant.Year)
	return num.Log10(math.Pi*c*c*c*c*c/(constant.HBar*constant.G)) + 2*(year-logHubble)
}

// LogHorizonTemperature returns log10 of the temperature, in K, that an
// object feels from its event horizon.
//
//	T = hbar H / (2 pi k)
//
// Units: logHubble is log10 of H in 1/yr.
// Domain: exact in de Sitter space; with a slowly falling H an assumption.
// Special cases: -Inf to -Inf, +Inf to +Inf.
//
// Source: Gibbons & Hawking 1977, Phys. Rev. D 15, 2738. Checked by
// testdata/published/cosmology.csv.
func LogHorizonTemperature(logHubble float64) float64 {
	return logHubble + num.Log10(constant.HBar/(2*math.Pi*constant.Boltzmann*constant.Year))
}
