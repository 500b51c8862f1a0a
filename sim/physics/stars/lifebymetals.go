package stars

import (
	"math"

	"wane/sim/num"
)

// Limits of the influence of metals on lifetimes; assumptions but for
// PeakMetals, which is from memory of [AdamsLaughlin1997].
const (
	PeakMetals     = 0.04 // where red dwarfs live longest
	MetalsExponent = 0.3  // of lifetime ~ Z^exponent
	metalsBelow    = 0.5  // solar masses: heavier stars do not feel metals
	leastMetals    = 1e-4 // in suns: what counts as none
)

// MetalsStretch returns log10 of how much longer a star lives with its metals
// than with the Sun's.
//
//	(Z/sun)^e up to Z = peak, (peak/sun)^e (Z/peak)^-e beyond; 1 from 0.5 solar masses on
//
// Metals make the envelope more opaque: the star is dimmer and its fuel lasts
// longer, until so much of it is metals that the fuel itself is less.
//
// Units: m in solar masses; metals, sun and peak as fractions of the mass.
// Domain: metals >= 0, taken as 1e-4 suns below that; sun, peak > 0.
// Error: form and exponent are assumptions; that lifetimes are longest near
// Z = 0.04 is from [AdamsLaughlin1997] (from memory). It jumps at 0.5 solar
// masses, by 23 % at twice the Sun's metals.
// Checked by testdata/published/lifetimes.csv.
func MetalsStretch(m, metals, sun, peak, exponent float64) float64 {
	if m >= metalsBelow {
		return 0
	}
	z := math.Max(metals, leastMetals*sun)
	if z <= peak {
		return exponent * num.Log10(z/sun)
	}
	return exponent * (num.Log10(peak/sun) - num.Log10(z/peak))
}
