package coldmatter

import (
	"math"

	"wane/sim/num"
	"wane/sim/physics/constant"
)

// Log10FusionTime returns how long two halves of a nucleus of charge z and a
// nucleons stay apart in ordinary matter, until they tunnel together.
//
//	t = t_nuc exp(30 A^(1/2) Z^(5/6) y^(1/2)),  t_nuc = 1e-21 s,  y = 1
//
// Units: result log10 of years.
// Domain: matter of ordinary density. Error: Dyson rounds the 1444 decades of
// iron to 1500; y, the height of the barrier in units of its own, is near 1.
// Source: [Dyson1979], section on iron. Checked by coldmatter.csv.
func Log10FusionTime(z, a float64) float64 {
	const (
		log10Nuclear = -21
		log10E       = 1 / num.Ln10
	)
	return log10Nuclear + 30*math.Sqrt(a)*num.Pow(z, 5./6)*log10E - constant.Log10Year
}

// PlanckMass is the mass of the lightest hole, sqrt(hbar c/G), solar masses.
func PlanckMass() float64 {
	return math.Sqrt(constant.HBar*constant.C/constant.G) / constant.Sun
}

// Log10TunnellingTime returns how long a body of mass m takes to tunnel into a
// black hole as a whole.
//
//	t = exp[(120 pi^2)^(1/3) N^(4/3)],  N = m/m_u
//
// Units: m in solar masses; result log10 of years, up to 10^77 and more. The
// unit of t cannot be seen.
// Domain: m of at least the Planck mass, which gives 10^26; +Inf below it: there
// is no hole that light.
// Error: of the exponent, a factor of order one.
// Source: [Dyson1979], tunnelling of matter into black holes; the formula is
// from memory and reproduces his 10^(10^76) and 10^(10^26) yr. Checked by
// coldmatter.csv.
func Log10TunnellingTime(m float64) float64 {
	if !(m >= PlanckMass()) {
		return math.Inf(1)
	}
	const log10E = 1 / num.Ln10
	n := m * (constant.Sun / constant.AtomicMass)
	return num.Pow(120*math.Pi*math.Pi, 1./3) * num.Pow(n, 4./3) * log10E
}
