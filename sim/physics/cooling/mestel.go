package cooling

import (
	"wane/sim/num"
	"wane/sim/physics/constant"
)

// MestelAge returns the age at which a white dwarf has faded to luminosity l
// while its ions are an ideal gas.
//
//	t = 8.8e6 yr (A/12)^-1 M^5/7 (mu_e/2)^-2/7 L^-5/7
//
// Units: l in nominal solar luminosities, m in solar masses, result in years.
// Domain: 1e-1 > l > 10^-3.5, carried on to 1e-4; below it the ions are a
// crystal and the answer is decades too late.
// Error: coefficients of textbooks differ by a factor of two; at 0.6 solar
// masses and A = 12 within 10 % of evolutionary sequences at 10^-4.5.
// Source: [Mestel1952]; coefficient as in [IbenTutukov1984] (from memory).
// Checked by testdata/published/cooling.csv.
func MestelAge(l, m, a, muE float64) float64 {
	return 8.8e6 * 12 / a * num.Pow(m, 5.0/7) * num.Pow(muE/2, -2.0/7) * num.Pow(l, -5.0/7)
}

// Luminosity returns the luminosity of a sphere.
//
//	L = 4 pi R^2 sigma T^4
//
// Units: r in km, t in K, result in nominal solar luminosities.
// Domain: r, t >= 0. Error: rounding.
func Luminosity(r, t float64) float64 { return watts(r, t) / constant.SunL }

// watts is the same in W.
func watts(r, t float64) float64 {
	const fourPi = 12.566370614359172
	metres := r * 1000
	return fourPi * metres * metres * constant.StefanBoltzmann * (t * t) * (t * t)
}
