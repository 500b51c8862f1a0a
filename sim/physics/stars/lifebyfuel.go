package stars

import (
	"math"

	"wane/sim/num"
)

// SunLife is log10 of the Sun's time on the main sequence, years, in textbook
// scalings.
const SunLife = 10

// PowerLawLife returns log10 of the years on the main sequence by a single
// power law.
//
//	t = 1e10 yr m^-alpha
//
// Units: m in solar masses, result log10 years.
// Domain: m > 0.
// Error: 2.5 holds near the Sun; 2.807 meets 1.2e13 yr at 0.08, 3 to 4 as for
// lighter stars in [AdamsLaughlin1997] overshoots that. Stars above 20 live
// up to ten times longer than this.
// Special cases: +Inf at m = 0.
// Source: textbook scaling. Checked by testdata/published/lifetimes.csv.
func PowerLawLife(m, alpha float64) float64 { return SunLife - alpha*num.Log10(m) }

// FuelLife returns log10 of the years on the main sequence from how much
// hydrogen a star burns and how brightly.
//
//	t = 1e10 yr (m/L) (f/0.1),   L of [Luminosity],
//	f = core above 0.5, rising linearly in log m to 1 at 0.25 and below
//
// Units: m in solar masses, core a fraction, result log10 years.
// Domain: m > 0, 0 < core <= 1.
// Error: as the luminosity, tens of per cent, with its steps at 0.43, 2 and
// 55; above 20 too short by up to ten.
// Special cases: +Inf at m = 0.
// Source: textbook scaling; that stars under 0.25 burn nearly all hydrogen is
// from [LaughlinEtAl1997], the path between an assumption. Checked by
// testdata/published/lifetimes.csv.
func FuelLife(m, core float64) float64 {
	const low, high = 0.25, 0.5
	x := num.Log10(m)
	w := math.Min(math.Max((num.Log10(high)-x)/num.Log10(high/low), 0), 1)
	return SunLife + massToLight(m, x) + num.Log10((core+(1-core)*w)/0.1)
}

// massToLight is log10 of m over [Luminosity], in solar units, for any m > 0;
// x is log10 m.
func massToLight(m, x float64) float64 {
	switch {
	case m < 0.43:
		return -1.3*x - num.Log10(0.23)
	case m < 2:
		return -3 * x
	case m < 55:
		return -2.5*x - num.Log10(1.4)
	}
	return -num.Log10(32000)
}

// WithGiant returns log10 of a whole life from log10 of the main sequence: a
// share more for stars that become giants, as in [Lifetimes.Life].
func WithGiant(mainSequence, m, share float64) float64 {
	w := math.Min(math.Max((m-0.25)/(0.5-0.25), 0), 1)
	return mainSequence + num.Log1p(share*w)/num.Ln10
}
