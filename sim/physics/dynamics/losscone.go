package dynamics

import (
	"math"

	"wane/sim/num"
	"wane/sim/physics/constant"
)

// LossConeAngle returns the half-angle of the cone of velocities, at the radius
// of influence r of a hole, that lead to its loss.
//
//	theta^2 = max[R (M/m)^(1/3), 4 G M/c^2] / r
//
// The first is where tides tear a body of mass m and radius R apart, the second
// the closest approach that a hole lets go again.
//
// Units: hole and mean mass in solar masses, body in km, r in pc; radians, at
// most 1.
// Source: Frank & Rees 1976; the second bound, from orbits of zero energy
// about a hole without spin, keeps large holes from shrinking theirs.
func LossConeAngle(hole, mean, body, r float64) float64 {
	const km = 1e3 / constant.Parsec
	tides := body * km * num.Pow(hole/mean, 1./3)
	plunge := 4 * constant.GMSun / (constant.C * constant.C) / constant.Parsec * hole
	return math.Min(1, math.Sqrt(math.Max(tides, plunge)/r))
}

// Log10LossConeRate returns how many objects a year wander into the loss cone
// of a central hole and are lost to it.
//
//	rate = N_c/[t_r ln(2/theta)],  N_c = 2 M/m,  r = G M/sigma^2
//	t_r = 0.34 sigma^3/(G^2 m rho ln Lambda),  rho = sigma^2/(2 pi G r^2),  Lambda = M/m
//
// The cusp is isothermal, and the rate that of the radius of influence, where
// most come from (assumption).
//
// Units: hole and mean mass in solar masses, sigma the dispersion in one
// dimension, km/s, body the radius of an object in km, number those there are
// at most. Result log10 of objects per year; -Inf without hole or objects.
// Error: a factor of a few to ten.
// Sources: Frank & Rees 1976; Lightman & Shapiro 1977; t_r from Binney &
// Tremaine 2008, eq. 7.106. Checked by dynamics.csv.
func Log10LossConeRate(hole, mean, sigma, body, number float64) float64 {
	if !(hole > 0) || !(mean > 0) || !(sigma > 0) || !(number > 0) {
		return math.Inf(-1)
	}
	r := InfluenceRadius(hole, sigma)
	cusp := math.Min(number, 2*hole/mean)
	coulomb := math.Max(1, num.Log(hole/mean))
	// sigma^3/(G^2 m rho) = 2 pi sigma r^2/(G m), in pc/(km/s), in logarithms:
	// r^2 may be anything.
	relaxation := num.Log10(0.34*2*math.Pi*crossUnit/coulomb) + num.Log10(sigma) + 2*num.Log10(r) - num.Log10(gravity*mean)
	return num.Log10(cusp) - relaxation - num.Log10(num.Log(2/LossConeAngle(hole, mean, body, r)))
}
