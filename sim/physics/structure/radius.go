package structure

import (
	"math"

	"wane/sim/physics/constant"
	"wane/sim/physics/stars"
)

// JupiterRadius is the nominal equatorial radius of Jupiter, km.
// Source: [IAU2015B3].
const JupiterRadius = 71492

// MeanDensity returns the mean density of a sphere.
//
//	rho = 3 M/(4 pi R^3)
//
// Units: m in solar masses, r in km, result in g/cm3.
// Domain: r > 0. Error: 2.2e-5 (G, through the solar mass).
func MeanDensity(m, r float64) float64 {
	// 1 kg/km3 = 1e-12 g/cm3
	return 3 * m * constant.Sun / (4 * math.Pi * r * r * r) * 1e-12
}

// MainSequenceRadius returns the radius of a star on the main sequence.
//
// Units: m in solar masses, result in km.
// Domain, error and source: [stars.Radius].
func MainSequenceRadius(m float64) float64 { return stars.Radius(m) * constant.SunR / 1000 }

// BrownDwarfRadius returns the radius of a cold brown dwarf: 0.9 Jupiter
// radii whatever its mass, since electron pressure and the pull between ions
// nearly balance.
//
// Units: m in solar masses (not used), result in km.
// Domain: 0.01 .. 0.08 solar masses, cold.
// Error: 10 %; up to twice as large when young.
// Source: assumption, after the plateau in [BurrowsLiebert1993].
func BrownDwarfRadius(m float64) float64 { return 0.9 * JupiterRadius }

// NeutronStarRadius returns the radius of a neutron star: 11.5 km whatever
// its mass.
//
// Units: m in solar masses (not used), result in km.
// Domain: 1.1 .. 2.2 solar masses.
// Error: 1 km.
// Source: assumption; measured radii lie between 11 and 13 km.
func NeutronStarRadius(m float64) float64 { return 11.5 }

// HoleRadius returns the horizon radius of a black hole without spin.
//
//	R = 2 G M/c^2
//
// Units: m in solar masses, result in km (2.953 km at one solar mass).
// Domain: m >= 0. Error: rounding (nominal solar mass).
// Source: Schwarzschild's solution; constants [IAU2015B3].
func HoleRadius(m float64) float64 {
	return 2 * constant.GMSun / (constant.C * constant.C) / 1000 * m
}
