package dynamics

import (
	"math"

	"wane/sim/num"
)

// CrossingTime returns the time to cross the galaxy.
//
//	t_c = R / v
//
// Units: r in pc, v in km/s, result in yr.
func CrossingTime(r, v float64) float64 { return r / v * crossUnit }

// RelaxationTime returns the time in which encounters change a star's velocity
// by its own size.
//
//	t_r = 0.1 N / ln N  R/v
//
// Units: r in pc, v in km/s, result in yr. Domain: n > 1. Error: tens of per cent.
// Source: Binney & Tremaine 2008, eq. 1.38. Checked by dynamics.csv.
func RelaxationTime(n, r, v float64) float64 {
	return 0.1 * n / num.Log(n) * CrossingTime(r, v)
}

// RelaxationTimeAL is [RelaxationTime] as Adams & Laughlin 1997 have it.
//
//	t_r = N / (12 ln(N/2))  R/v
func RelaxationTimeAL(n, r, v float64) float64 {
	return n / (12 * num.Log(n/2)) * CrossingTime(r, v)
}

// CoulombLogarithm returns ln(gamma N), at least 1.
//
// gamma is 0.11 for equal masses, near 0.02 with a mass spectrum, 0.4 in older
// texts (Giersz & Heggie 1994). The floor keeps a rate finite for the last few.
func CoulombLogarithm(n, gamma float64) float64 {
	return math.Max(1, num.Log(gamma*n))
}

// Log10HalfMassRelaxation returns the relaxation time at the half-mass radius.
//
//	t_rh = 0.138 N^(1/2) R^(3/2) / [ m^(1/2) G^(1/2) ln Lambda ],  m = M/N
//
// Units: n objects, mass M in solar masses, r in pc; result log10 of yr.
// Domain: n, mass, r > 0.
// Error: tens of per cent (a mean over the half-mass sphere); -Inf never.
// Source: Spitzer 1987, eq. 2-63. Checked by dynamics.csv.
func Log10HalfMassRelaxation(n, mass, r, coulomb float64) float64 {
	return num.Log10(0.138*crossUnit/coulomb) + num.Log10(n) + 1.5*num.Log10(r) - 0.5*(num.Log10(mass)+num.Log10(gravity))
}

// Dispersion returns the velocity dispersion of a galaxy in virial balance.
//
//	v^2 = 0.4 G M / R
//
// Units: mass in solar masses, r in pc; result in km/s, three-dimensional
// (one-dimensional: divide by sqrt 3).
// Error: a few per cent by density profile (0.4 from E = -0.2 G M^2/R).
// Source: Spitzer 1987, eq. 1-10. Checked by dynamics.csv.
func Dispersion(mass, r float64) float64 { return math.Sqrt(0.4 * gravity * mass / r) }

// InfluenceRadius returns the radius within which a central mass rules.
//
//	r = G M / v^2
//
// Units: mass in solar masses, v in km/s, result in pc.
func InfluenceRadius(mass, v float64) float64 { return gravity * mass / (v * v) }
