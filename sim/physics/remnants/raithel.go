package remnants

import (
	"math"

	"wane/sim/num"
)

// Collapse is the boundary between stars that leave white dwarfs and stars
// that collapse, solar masses at birth (7 to 9.5 in models).
const Collapse = 8.0

// NeutronStarChance returns the probability that a collapsing star of mass m
// explodes and leaves a neutron star; otherwise it fails and leaves a hole.
//
// Units: m in solar masses.
// Domain: stars that collapse, m up to 120; below 15 all explode, above 120
// as from 60 to 120.
// Error: the islands move by solar masses between sets of models; each moves
// the number of holes by tens of per cent.
// Source: [RaithelEtAl2018], from the models of [SukhboldEtAl2016] (values
// from memory).
func NeutronStarChance(m float64) float64 {
	switch {
	case m < 15:
		return 1
	case m < 17.8:
		return 0.679
	case m < 18.5:
		return 0.833
	case m < 21.7:
		return 0.500
	case m < 25.2:
		return 0
	case m < 27.5:
		return 0.652
	case m < 60:
		return 0
	}
	return 0.40
}

// Hole returns the mass of the black hole that a failed star of mass m
// leaves.
//
//	15 .. 40:   f M_core + (1 - f) M_all
//	            M_core = -2.049 + 0.4140 m
//	            M_all  = 15.52 - 0.3294 x - 0.02121 x^2 + 0.003120 x^3,  x = m - 25.97
//	45 and up:  5.697 + 7.8598e8 m^-4.858
//	40 .. 45:   linear between the two
//
// Units: m and result in solar masses; f, the share of the envelope that is
// thrown off, 0 .. 1.
// Domain: 15 <= m <= 120; below 15 as at 15, above 120 the last line goes on.
// Error: the fits scatter by 1 to 2 solar masses about the models.
// Source: [RaithelEtAl2018], eqs. for the black-hole mass (from memory); the
// bridge from 40 to 45 is an assumption. Checked by
// testdata/published/remnants.csv.
func Hole(m, f float64) float64 {
	switch {
	case m < 40:
		return holeBelow40(math.Max(m, 15), f)
	case m < 45:
		w := (m - 40) / 5
		return (1-w)*holeBelow40(40, f) + w*holeAbove45(45)
	}
	return holeAbove45(m)
}

func holeBelow40(m, f float64) float64 {
	x := m - 25.97
	all := 15.52 + x*(-0.3294+x*(-0.02121+x*0.003120))
	return f*core(m) + (1-f)*all
}

// core is the mass of the helium core of a star that is about to collapse.
func core(m float64) float64 { return -2.049 + 0.4140*m }

func holeAbove45(m float64) float64 { return 5.697 + 7.8598e8*num.Pow(m, -4.858) }

// Neutron-star masses, solar masses: mean and scatter of a single Gaussian,
// and the least mass it is clipped to.
const (
	NeutronStarMean     = 1.36
	NeutronStarScatter  = 0.09
	LightestNeutronStar = 1.1
	HeaviestNeutronStar = 2.2
)

// SingleGaussian returns the neutron-star mass below which the fraction u of
// neutron stars is born: a Gaussian clipped to 1.1 .. max.
//
// Units: mean, scatter, max and result in solar masses.
// Domain: 0 <= u <= 1, scatter >= 0, max >= 1.1.
// Error: the real distribution is wider at the heavy end, see
// [DoubleGaussian].
// Source: mean and scatter from memory of measured double neutron stars.
func SingleGaussian(u, mean, scatter, max float64) float64 {
	return clipNeutronStar(mean+scatter*gaussian(u), max)
}

// DoubleGaussian is the same for the mixture of two Gaussians measured in
// recycled pulsars: 1.393 +- 0.064 (57 %) and 1.807 +- 0.177 (43 %).
//
// Units, domain as for [SingleGaussian].
// Error: the quantile is bisected to 1e-12 solar masses.
// Source: [AntoniadisEtAl2016] (values from memory).
func DoubleGaussian(u, max float64) float64 {
	low, high := LightestNeutronStar, max
	for high-low > 1e-12 {
		middle := low + (high-low)/2
		if mixture(middle) < u {
			low = middle
		} else {
			high = middle
		}
	}
	return high
}

// mixture is the cumulative distribution of [DoubleGaussian].
func mixture(m float64) float64 {
	return 0.57*normal((m-1.393)/0.064) + 0.43*normal((m-1.807)/0.177)
}

func normal(z float64) float64 { return (1 + num.Erf(z/math.Sqrt2)) / 2 }

// gaussian is the quantile of the standard normal distribution.
func gaussian(u float64) float64 { return math.Sqrt2 * num.Erfinv(2*u-1) }

func clipNeutronStar(m, max float64) float64 {
	return math.Min(math.Max(m, LightestNeutronStar), max)
}
