package cosmology

import (
	"math"

	"wane/sim/num"
)

// LogDarkOfW returns log10 of the density of dark energy over today's critical
// density, if the ratio w of its pressure to its density is constant.
//
//	Ode(a) = Ode a^(-3(1+w))
//
// Units: logDark is log10 of today's Ode, x = ln a. Domain: all finite x.
// Error: rounding.
//
// Source: Weinberg 2008, section 1.5.
func LogDarkOfW(logDark, w, x float64) float64 {
	return logDark - 3*(1+w)*x/num.Ln10
}

// LogDarkHalving returns log10 of the density of dark energy over today's
// critical density, if it halves every 10^logHalf years from date from on.
//
//	Ode(t) = Ode 2^(-(t - t_from)/t_half)
//
// Units: dates and logHalf are log10 of yr. Before from it is constant
// (assumption: no date says since when it would decay). Special cases: -Inf
// once it leaves the range of numbers.
func LogDarkHalving(logDark, logHalf, from, date float64) float64 {
	return logDark - math.Log10E*math.Ln2*num.Exp10(num.Sub10(date, from)-logHalf)
}

// Age returns the age of a flat universe of matter, radiation and a
// cosmological constant at a = 1, yr.
//
//	H0 t = int_0^1 2 u^3 du / sqrt(Om u^2 + Or + OL u^8),  a = u^2
//
// Units: h0 in km/s/Mpc. Domain: om > 0, om + or < 1. Error: 2e-6 (Simpson's
// rule; the largest is with or near 1e-4).
//
// Source: Weinberg 2008, section 1.5. Checked by
// testdata/published/cosmology.csv.
func Age(h0, om, or float64) float64 {
	const n = 64
	ol, sum := 1-om-or, 0.0
	for i := 1; i <= n; i++ {
		u := float64(i) / n
		u2 := u * u
		f := 2 * u * u2 / math.Sqrt(om*u2+or+ol*u2*u2*u2*u2)
		switch {
		case i == n:
		case i%2 == 1:
			f *= 4
		default:
			f *= 2
		}
		sum += f
	}
	return sum / (3 * n) * num.Exp10(-LogHubbleRate(h0))
}

// RipDate returns in how many years from now space tears itself apart if dark
// energy has the pressure w < -1 of its density, matter included: the integral
//
//	t_rip - t0 = 1/H0 int_0^inf [Om e^(-3x) + OL e^(-3(1+w)x)]^(-1/2) dx
//
// as its series in r = Om/OL: with p = 2w/(1+w),
//
//	2/(3 |1+w| H0 sqrt OL) sum_n (-1/2 over n) r^n / (1 + n p)
//
// Units: h0 in km/s/Mpc, result in yr.
// Domain: w < -1, 0 <= om < 1/2; NaN otherwise. Error: 1e-15 (om <= 0.4).
//
// Source: Caldwell, Kamionkowski & Weinberg 2003, Phys. Rev. Lett. 91, 071301
// (the integral). Checked by testdata/published/cosmology.csv.
func RipDate(h0, om, w float64) float64 {
	if !(w < -1 && om >= 0 && om < 0.5) {
		return math.NaN()
	}
	r, p := om/(1-om), 2*w/(1+w)
	sum, term := 0.0, 1.0
	for n := 0.0; n < 200; n++ {
		sum += term / (1 + n*p)
		term *= -r * (n + 0.5) / (n + 1)
	}
	return RipWait(h0, om, w) * sum
}
