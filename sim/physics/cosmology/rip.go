package cosmology

import (
	"math"

	"wane/sim/num"
)

// RipWait returns about how many years from now space tears itself apart if
// dark energy has the pressure w of its density, w < -1.
//
//	t_rip - t0 = 2 / (3 |1+w| H0 sqrt(1-Om))
//
// Units: h0 in km/s/Mpc, result in yr.
// Domain: w < -1; NaN otherwise.
// Error: too long by 0.5 % at w = -1.05, 1 % at -1.1, 3 % at -1.5: matter is
// left out.
//
// Source: Caldwell, Kamionkowski & Weinberg 2003, Phys. Rev. Lett. 91,
// 071301. Checked by testdata/published/cosmology.csv.
func RipWait(h0, om, w float64) float64 {
	if !(w < -1) {
		return math.NaN()
	}
	return 2 / (3 * -(1 + w) * math.Sqrt(1-om)) * num.Exp10(-LogHubbleRate(h0))
}

// StripTime returns how long before a rip a bound system that turns once in
// period is torn apart, in the unit of period.
//
//	t_rip - t = P sqrt(2 |1+3w|) / (6 pi |1+w|)
//
// Domain: w < -1; NaN otherwise. Error: a factor of about two.
//
// Source: Caldwell, Kamionkowski & Weinberg 2003, Phys. Rev. Lett. 91, 071301.
func StripTime(period, w float64) float64 {
	if !(w < -1) {
		return math.NaN()
	}
	return period * math.Sqrt(2*-(1+3*w)) / (6 * math.Pi * -(1 + w))
}
