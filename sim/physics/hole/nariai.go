package hole

import (
	"math"

	"wane/sim/physics/constant"
)

// LargestMass is the largest mass of a black hole in a space that expands for
// ever at a rate: its horizon then meets the cosmic one.
//
//	M = c^3/(3 sqrt(3) G H)
//
// Units: hubble in 1/s, result in solar masses (2.15e22 today's dark energy).
// Domain: hubble > 0. Error: rounding.
//
// Source: Nariai 1950, Sci. Rep. Tohoku Univ. 34, 160. Checked by
// testdata/published/holes.csv.
func LargestMass(hubble float64) float64 {
	return constant.C * constant.C * constant.C / (3 * math.Sqrt(3) * constant.GMSun * hubble)
}
