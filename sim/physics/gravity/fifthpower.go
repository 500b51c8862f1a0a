package gravity

import (
	"math"

	"wane/sim/num"
	"wane/sim/physics/constant"
)

// Log10FifthPowerTime returns the quick estimate of how long two bodies take
// to merge by gravitational waves.
//
//	t = (c/V)^5 P,  V^2 = G (m1 + m2)/a,  P = 2 pi a/V
//
// It is right for comparable masses only, to a factor of two pi and more: the
// ratio of the masses is missing, and a light companion lasts longer by its
// inverse. See [Log10CircularTime].
//
// Units: masses in solar masses, a in AU; result log10 of yr.
// Domain: all > 0; +Inf when there is no mass, -Inf for a = 0.
// Source: [Dyson1979]. Checked by testdata/published/gravity.csv.
func Log10FifthPowerTime(m1, m2, a float64) float64 {
	if !(m1+m2 > 0) {
		return math.Inf(1)
	}
	const length = constant.GMSun / (constant.C * constant.C) / constant.AU
	// P (c/V)^5 = 2 pi (a/c) (c/V)^6
	return num.Log10(2*math.Pi*constant.AU/constant.C/constant.Year) + num.Log10(a) + 3*(num.Log10(a)-num.Log10(length*(m1+m2)))
}
