package stars

import (
	"math"

	"wane/sim/num"
)

// SunTemperature is the nominal effective temperature of the Sun, K.
// Source: [IAU2015B3].
const SunTemperature = 5772

// HydrogenBurning is the mass, in solar masses, above which an object of
// solar composition burns hydrogen for good: 0.070 to 0.080 in models.
// Source: [BurrowsEtAl2001].
const HydrogenBurning = 0.075

// Luminosity returns the luminosity of a main-sequence star.
//
//	0.23 m^2.3 (m < 0.43), m^4 (< 2), 1.4 m^3.5 (< 55), 32000 m (>= 55)
//
// Units: m in solar masses, result in nominal solar luminosities.
// Domain: m >= 0; meant for 0.075 .. 120.
// Error: tens of per cent; old stars of 0.1 are a factor 1.5 to 2 fainter.
// The pieces join to 4 % at 0.43, 1 % at 2, 2 % at 55.
// Source: textbook power laws (from memory).
func Luminosity(m float64) float64 {
	switch {
	case m < 0.43:
		return 0.23 * num.Pow(m, 2.3)
	case m < 2:
		return m * m * m * m
	case m < 55:
		return 1.4 * num.Pow(m, 3.5)
	}
	return 32000 * m
}

// Radius returns the radius of a main-sequence star: m^0.8 below one solar
// mass, m^0.57 above.
//
// Units: m in solar masses, result in nominal solar radii.
// Domain: m >= 0; meant for 0.075 .. 120.
// Error: 10 to 20 %.
// Source: textbook power laws (from memory).
func Radius(m float64) float64 {
	if m < 1 {
		return num.Pow(m, 0.8)
	}
	return num.Pow(m, 0.57)
}

// Temperature returns the effective temperature of a main-sequence star.
//
//	T = 5772 K (L/R^2)^(1/4)
//
// Units: m in solar masses, result in K.
// Domain: m > 0; meant for 0.075 .. 120.
// Error: 5 to 10 %, from [Luminosity] and [Radius].
// Source: the Stefan-Boltzmann law in nominal solar units [IAU2015B3].
func Temperature(m float64) float64 {
	r := Radius(m)
	return SunTemperature * math.Sqrt(math.Sqrt(Luminosity(m)/(r*r)))
}
