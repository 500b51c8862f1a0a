package stars

import (
	"math"

	"wane/sim/num"
)

// SolarMetals is the Sun's share of elements heavier than helium in the stellar
// models used for lifetimes.
// Source: Anders & Grevesse 1989, Geochim. Cosmochim. Acta 53, 197, as in
// [SchallerEtAl1992].
const SolarMetals = 0.02

// GrowingMetals returns the share of heavy elements in gas that ever more
// stars have enriched: linear in log10 of the date between two dates, constant
// outside.
//
//	Z = sun (1 + (factor - 1) w),   w = (log10 t - from)/(to - from) in 0 .. 1
//
// Units: log10Date, from and to in log10 years; sun and result as fractions of
// the mass.
// Domain: any date, from < to, factor >= 1.
// Error: an assumption. [AdamsLaughlin1997] argue that the gas of galaxies
// ends at several to ten times the Sun's metals.
func GrowingMetals(log10Date, sun, factor, from, to float64) float64 {
	w := math.Min(math.Max((log10Date-from)/(to-from), 0), 1)
	return sun * (1 + (factor-1)*w)
}

// hydrogenBurning is the least mass that burns hydrogen for good by metals in
// units of the Sun's. 1e-4 stands for none.
var hydrogenBurning = [...]struct{ metals, mass float64 }{
	{1e-4, 0.092}, {1, HydrogenBurning}, {5, 0.058}, {10, 0.048}, {20, 0.040},
}

// HydrogenLimit returns the mass above which an object burns hydrogen for
// good.
//
//	0.092 (Z <= 1e-4 suns), 0.075 (1), 0.058 (5), 0.048 (10), 0.040 (>= 20),
//	linear in log Z between
//
// More metals make an atmosphere more opaque, which keeps the centre hot in
// lighter objects.
//
// Units: metals and sun as fractions of the mass, result in solar masses.
// Domain: metals >= 0, sun > 0.
// Error: 0.003 from none to the Sun's metals; beyond, an extrapolation by
// argument.
// Source: [BurrowsEtAl2001] for none and the Sun's (from memory),
// [AdamsLaughlin1997] for 0.040 at ten to twenty suns (from memory); the rest
// is an assumption. Checked by testdata/published/metals.csv.
func HydrogenLimit(metals, sun float64) float64 {
	t := &hydrogenBurning
	z := metals / sun
	if !(z > t[0].metals) {
		return t[0].mass
	}
	for i := 1; i < len(t); i++ {
		if a, b := t[i-1], t[i]; z == b.metals {
			return b.mass // exactly, for the Sun's
		} else if z < b.metals {
			w := num.Log(z/a.metals) / num.Log(b.metals/a.metals)
			return a.mass + w*(b.mass-a.mass)
		}
	}
	return t[len(t)-1].mass
}
