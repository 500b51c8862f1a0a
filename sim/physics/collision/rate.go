package collision

import (
	"math"

	"wane/sim/physics/constant"
)

// parsec is in km.
const parsec = constant.Parsec / 1e3

// CrossSection returns the area within which paths lead to a meeting.
//
//	sigma = pi d^2 [1 + 2 G M/(d v^2)]
//
// Units: d in km, mass (of both together) in solar masses, v in km/s, result
// in km^2.
// Domain: d, mass >= 0, v > 0. Error: Newtonian; tens of per cent for the
// spread of speeds.
// Source: Binney & Tremaine 2008, section 7.5.8. Checked by collisions.csv.
func CrossSection(d, mass, v float64) float64 {
	return math.Pi * d * (d + 2*constant.GMSun*1e-9*mass/(v*v))
}

// Time returns how long one body waits on average for a meeting.
//
//	t = 1/(n sigma v)
//
// Units: density in 1/pc^3, sigma in km^2, v in km/s, result in yr.
// Source: Dyson 1979. Checked by collisions.csv.
func Time(density, sigma, v float64) float64 {
	return parsec * parsec * parsec / (density * sigma * v * constant.Year)
}

// MeanDensity returns the density of objects within the half-mass radius.
//
//	n = 3 N/(8 pi R^3)
//
// Half of the objects are taken to lie within it (assumption: no segregation
// of masses), and all to meet others at this density (assumption: the densest
// parts and the halo balance within a factor of a few).
//
// Units: r in pc, result in 1/pc^3. Domain: r > 0.
func MeanDensity(n, r float64) float64 { return 3 * n / (8 * math.Pi * r * r * r) }
