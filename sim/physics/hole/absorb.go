package hole

import (
	"math"

	"wane/sim/physics/constant"
)

// AbsorbedPower returns the power that a hole takes in from a sky of
// temperature T, which falls into it from all sides.
//
//	P = 27 pi (G m/c^2)^2 c a T^4,  a = 4 sigma/c
//
// Units: m in solar masses, temperature in K, result in W.
// Domain: m > 0, wavelengths of the sky far below the hole's size: a sky far
// hotter than the hole. At the hole's own temperature this is 3.73 times what
// the hole emits in photons and gravitons, so the two do not join.
// Error: 1e-6 in its domain.
//
// Source: Page 1976 (geometric cross section 27 pi G^2 m^2/c^4). Checked by
// testdata/published/holes.csv.
func AbsorbedPower(m, temperature float64) float64 {
	r := constant.GMSun / (constant.C * constant.C) * m
	t2 := temperature * temperature
	return 27 * math.Pi * r * r * 4 * constant.StefanBoltzmann * t2 * t2
}
