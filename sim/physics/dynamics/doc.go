// Package dynamics is the slow collisional evolution of a galaxy of point
// masses: how long stars take to cross it, to exchange energy, and to be
// thrown out, and how its size answers.
//
// Quantities: N objects of mean mass m (solar masses) and total mass M in a
// half-mass radius R (pc) with a three-dimensional velocity dispersion v
// (km/s). Times are in years, as base-10 logarithms where they may be long.
// Valid while N >> 100 and no other mass dominates; a live dark halo is left
// out.
//
// Sources: Spitzer 1987, Dynamical Evolution of Globular Clusters; Binney &
// Tremaine 2008, Galactic Dynamics; Adams & Laughlin 1997, Rev. Mod. Phys.
// 69, 337; Henon 1965; Gieles, Heggie & Zhao 2011, MNRAS 413, 2509.
package dynamics

import "wane/sim/physics/constant"

const (
	// gravity is G, pc (km/s)^2 / Msun, from the nominal GM of the Sun.
	gravity = constant.GMSun / constant.Parsec * 1e-6
	// crossUnit is 1 pc / (1 km/s) in years.
	crossUnit = constant.Parsec / 1e3 / constant.Year
)
