package dynamics

import (
	"math"

	"wane/sim/physics/constant"
)

// SwallowMass returns the mass of hole above which it swallows a body whole
// instead of tearing it apart outside the horizon.
//
//	R (M/m)^(1/3) = 2 G M/c^2  =>  M = [R c^2/(2G)]^(3/2) / m^(1/2)
//
// Units: m and result in solar masses, r in km.
// Error: a factor of a few (Newtonian).
// Source: Hills 1975, Nature 254, 295. Checked by dynamics.csv.
func SwallowMass(m, r float64) float64 {
	x := r * 1e3 * constant.C * constant.C / (2 * constant.GMSun)
	return x * math.Sqrt(x/m)
}
