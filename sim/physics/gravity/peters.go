// Package gravity is how two bodies on an orbit spiral together by radiating
// gravitational waves.
//
// Masses are in solar masses, semi-major axes in astronomical units, times in
// years. Left out: spins, tides, and all but the lowest order in v/c: the last
// few orbits.
//
// Source: Peters 1964, Phys. Rev. 136, B1224.
package gravity

import (
	"math"

	"gonum.org/v1/gonum/integrate/quad"

	"wane/sim/num"
	"wane/sim/physics/constant"
)

// Log10CircularTime returns how long two bodies on a circular orbit take to
// merge.
//
//	t = (5/256) c^5 a^4 / [G^3 m1 m2 (m1 + m2)]
//
// Units: masses in solar masses, a in AU; result log10 of yr.
// Domain: all > 0; +Inf when a mass is not, -Inf for a = 0.
// Error: 1e-9 (only GM enters); leading order in v/c.
// Source: Peters 1964, eq. 5.10. Checked by testdata/published/gravity.csv.
func Log10CircularTime(m1, m2, a float64) float64 {
	if !(m1 > 0) || !(m2 > 0) {
		return math.Inf(1)
	}
	const c2 = constant.C * constant.C
	// Each mass as a length in AU keeps every power in range.
	const length = constant.GMSun / c2 / constant.AU
	unit := num.Log10(5./256) + num.Log10(constant.AU/constant.C/constant.Year) - 3*num.Log10(length)
	return unit + 4*num.Log10(a) - num.Log10(m1) - num.Log10(m2) - num.Log10(m1+m2)
}

// panels of a given width in ln tan p, each with some nodes, make the
// quadrature of [Shortening]: what lies below e^-40 of the end adds nothing.
const (
	panels = 80
	width  = 0.5
	nodes  = 10
)

// Shortening returns by what factor an orbit of eccentricity e merges sooner
// than a circular one of the same semi-major axis.
//
//	F = (48/19) g(e)^-4 int_0^e x^(29/19) (1+121x^2/304)^(1181/2299) (1-x^2)^(-3/2) dx
//	g = e^(12/19) (1+121e^2/304)^(870/2299) / (1-e^2)
//
// Shapes: scalar to scalar.
// Domain: 0 <= e <= 1. Special cases: F(0) = 1, F(1) = 0; NaN outside.
// Error: of the quadrature, below 1e-13 relative (measured against mpmath for
// e from 1e-9 to 1 - 1e-12).
// Source: Peters 1964, eqs. 5.11 and 5.14. Checked by gravity.csv.
func Shortening(e float64) float64 {
	switch {
	case !(e >= 0 && e <= 1):
		return math.NaN()
	case e < 1e-9: // 1 - 3.7 e^2
		return 1
	case e == 1:
		return 0
	}
	// In the angle x = sin p the pole is gone, (1-x^2)^(-3/2) dx = d tan p, and
	// in y = ln tan p the powers at both ends become exponentials.
	integrand := func(y float64) float64 {
		t := num.Exp(y)
		x2 := t * t / (1 + t*t)
		return t * num.Pow(x2, 29./38) * num.Pow(1+121./304*x2, 1181./2299)
	}
	var x, w [nodes]float64
	quad.Legendre{}.FixedLocations(x[:], w[:], -width, 0)
	end, integral := num.Log(e/math.Sqrt((1-e)*(1+e))), 0.0
	for range panels {
		part := 0.0
		for i := range x {
			part += w[i] * integrand(end+x[i])
		}
		integral += part
		if part < 1e-18*integral {
			break
		}
		end -= width
	}
	g := num.Pow(e, 12./19) * num.Pow(1+121./304*e*e, 870./2299) / ((1 - e) * (1 + e))
	return 48. / 19 * integral / (g * g * g * g)
}

// Log10MergerTime returns how long two bodies take to merge on an orbit of
// any eccentricity: [Log10CircularTime] shortened by [Shortening].
//
// Units: masses in solar masses, a in AU; result log10 of yr.
// Domain: as there; -Inf for e = 1.
func Log10MergerTime(m1, m2, a, e float64) float64 {
	circular := Log10CircularTime(m1, m2, a)
	if math.IsInf(circular, 1) {
		return circular
	}
	return circular + num.Log10(Shortening(e))
}

// Power returns the power that two bodies on a circular orbit radiate.
//
//	P = (32/5) G^4 (m1 m2)^2 (m1 + m2) / (c^5 a^5)
//
// Units: masses in solar masses, a in AU, result in W.
// Error: 2.2e-5, from G.
// Source: Peters & Mathews 1963, Phys. Rev. 131, 435. Checked by gravity.csv.
func Power(m1, m2, a float64) float64 {
	const c = constant.C
	a *= constant.AU
	l1, l2 := constant.GMSun*m1/(c*c)/a, constant.GMSun*m2/(c*c)/a
	return 32. / 5 * l1 * l1 * l2 * l2 * (l1 + l2) * (c * c * c * c * c / constant.G)
}
