package structure

import (
	"math"

	"wane/sim/num"
)

// dwarf is one cold white dwarf of mu_e = 2: mass (solar masses), radius (km)
// and central density (g/cm3).
type dwarf struct{ mass, radius, centre float64 }

// dwarfs are solutions of Chandrasekhar's equation, recomputed with SciPy to
// nine digits (testdata/structure.py).
var dwarfs = [...]dwarf{
	{0.05, 23971.02, 10409.62}, {0.06, 22523.984, 15091.92}, {0.08, 20398.084, 27229.18},
	{0.1, 18868.713, 43238.86}, {0.125, 17431.815, 69059.1}, {0.15, 16318.654, 101827.9},
	{0.2, 14657.127, 190710.1}, {0.25, 13433.337, 315773.2}, {0.3, 12464.619, 484566.4},
	{0.4, 10968.91, 994703.3}, {0.5, 9810.164, 1836652}, {0.6, 8840.9036, 3206651},
	{0.7, 7985.862, 5452529}, {0.8, 7200.0273, 9226999}, {0.9, 6452.1501, 1.585054e+07},
	{1, 5716.3974, 2.828007e+07}, {1.1, 4966.0905, 5.416189e+07}, {1.2, 4165.0111, 1.181615e+08},
	{1.25, 3726.7759, 1.901679e+08}, {1.3, 3244.6914, 3.382271e+08}, {1.33, 2923.182, 5.158509e+08},
	{1.35, 2689.0977, 7.181926e+08}, {1.37, 2433.0332, 1.060078e+09}, {1.38, 2294.1285, 1.327816e+09},
	{1.39, 2145.8522, 1.709972e+09}, {1.4, 1985.8101, 2.284348e+09}, {1.41, 1810.4514, 3.210597e+09},
	{1.42, 1614.1072, 4.864667e+09}, {1.43, 1386.6772, 8.337766e+09}, {1.44, 1106.54, 1.819836e+10},
}

// Ends of the table, solar masses.
const (
	lightestDwarf = 0.05
	heaviestDwarf = 1.44
)

// LimitingMass returns the mass at which the radius of a cold dwarf of ideal
// electrons reaches zero in Newtonian gravity.
//
//	M = 5.8252/mu_e^2
//
// Units: mu_e nucleons per electron, result in solar masses.
// Error: 2.2e-5 from G; real dwarfs give way earlier (see the package).
// Source: [Chandrasekhar1935]; coefficient recomputed.
func LimitingMass(muE float64) float64 { return 5.8251902 / (muE * muE) }

// WhiteDwarfRadius returns the radius of a cold white dwarf.
//
//	R^2 cubic in M between solutions of Chandrasekhar's equation, mu_e = 2
//	below 0.05: R ~ M^-1/3 [1 + 3.5 (M/m0)^-2/3 + m0/M]^-2/3, m0 = 0.00057
//
// The second line joins on at 0.05 and lets ions win over electron pressure:
// bodies lighter than a few planets shrink as M^1/3.
//
// Units: m in solar masses, result in km.
// Domain: m >= 0. From 1.44 on the radius at 1.44 is held: no such dwarf is
// stable.
// Error: 7e-4 against the equation from 0.05 to 1.44; the model itself 1 % at
// one solar mass and 10 % at 0.05 (see the package), 10 % below.
// Special cases: 0 at m = 0, NaN for m < 0.
// Sources: [Chandrasekhar1935]; below 0.05 the shape of
// [VerbuntRappaport1988], eq. 15. Checked by testdata/published/structure.csv.
func WhiteDwarfRadius(m float64) float64 {
	switch {
	case !(m >= 0):
		return math.NaN()
	case m == 0:
		return 0
	case m < lightestDwarf:
		return dwarfs[0].radius * lightShape(m) / lightShape(lightestDwarf)
	case m >= heaviestDwarf:
		return dwarfs[len(dwarfs)-1].radius
	}
	return math.Sqrt(cubic(m, func(d *dwarf) float64 { return d.radius * d.radius }))
}

// WhiteDwarfRadiusOf is [WhiteDwarfRadius] for other compositions: the
// equation scales exactly, R(M, mu_e) = (2/mu_e) R(M mu_e^2/4, 2).
//
// Units: m in solar masses, mu_e nucleons per electron, result in km.
// Domain and error as for [WhiteDwarfRadius], in the scaled mass.
func WhiteDwarfRadiusOf(m, muE float64) float64 {
	return 2 / muE * WhiteDwarfRadius(m*muE*muE/4)
}

// CentralDensity returns the density at the centre of a cold white dwarf,
// mu_e = 2.
//
// Units: m in solar masses, result in g/cm3.
// Domain: 0.05 <= m <= 1.44; outside, the ratio of central to mean density
// is held.
// Error: 2e-3 against Chandrasekhar's equation.
// Source: [Chandrasekhar1935]. Checked by testdata/published/structure.csv.
func CentralDensity(m float64) float64 {
	inside := math.Min(math.Max(m, lightestDwarf), heaviestDwarf)
	ratio := cubic(inside, func(d *dwarf) float64 { return d.centre / MeanDensity(d.mass, d.radius) })
	return ratio * MeanDensity(m, WhiteDwarfRadius(m))
}

// lightShape is the shape of the radius of cold light bodies.
func lightShape(m float64) float64 {
	const m0 = 0.00057
	x := m / m0
	return num.Pow(m, -1.0/3) * num.Pow(1+3.5*num.Pow(x, -2.0/3)+1/x, -2.0/3)
}

// cubic interpolates y of the table by the cubic through the two nodes on
// either side of m.
func cubic(m float64, y func(*dwarf) float64) float64 {
	i := 1
	for i < len(dwarfs)-3 && m > dwarfs[i+1].mass {
		i++
	}
	sum := 0.0
	for a := i - 1; a <= i+2; a++ {
		p := y(&dwarfs[a])
		for b := i - 1; b <= i+2; b++ {
			if b != a {
				p *= (m - dwarfs[b].mass) / (dwarfs[a].mass - dwarfs[b].mass)
			}
		}
		sum += p
	}
	return sum
}
