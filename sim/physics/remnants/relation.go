package remnants

import (
	"math"

	"wane/sim/num"
)

// Relation is a mean relation between the mass of a star and that of the white
// dwarf it leaves: pieces of straight lines, from the lightest star up.
type Relation []Piece

// Piece is M_f = Slope M_i + Offset for stars from a mass on, solar masses.
type Piece struct{ From, Slope, Offset float64 }

// CummingsSecond returns the second relation of [CummingsEtAl2018], with the
// stars' ages from other stellar models than in [CummingsMean].
//
//	0.0873 M_i + 0.476 below 2.80, 0.181 M_i + 0.210 below 3.65, 0.0835 M_i + 0.565
//
// Domain: measured from 0.87 to 8.20.
// Error: coefficients (0.019, 0.033), (0.041, 0.131), (0.014, 0.073); the
// pieces as printed join to 0.004 at 2.80 and 0.001 at 3.65 and are left so.
// Source: [CummingsEtAl2018], eqs. 1-3 (from memory). Checked by
// testdata/published/whitedwarfs.csv.
func CummingsSecond() Relation {
	return Relation{{0, 0.0873, 0.476}, {2.80, 0.181, 0.210}, {3.65, 0.0835, 0.565}}
}

// Kalirai returns the single line 0.109 M_i + 0.394.
//
// Domain: measured from 1.2 to 6.5.
// Error: coefficients (0.007, 0.025).
// Source: [KaliraiEtAl2008], eq. 1 (from memory). Checked by
// testdata/published/whitedwarfs.csv.
func Kalirai() Relation { return Relation{{0, 0.109, 0.394}} }

// Salaris returns two lines, 0.134 M_i + 0.331 below 4 and 0.047 M_i + 0.679
// above, which meet there.
//
// Domain: measured from 1.7 to 8.5.
// Error: about 0.05 solar masses.
// Source: [SalarisEtAl2009] (from memory). Checked by
// testdata/published/whitedwarfs.csv.
func Salaris() Relation { return Relation{{0, 0.134, 0.331}, {4, 0.047, 0.679}} }

// HeliumLimit returns the mass at birth below which a star leaves its own mass
// as helium: where M_f = M_i meets the first line.
//
// Units: solar masses.
func (r Relation) HeliumLimit() float64 { return r[0].Offset / (1 - r[0].Slope) }

// Mean returns the mean mass of the white dwarf that a star leaves.
//
// Units: m and result in solar masses.
// Domain: m >= 0; below [Relation.HeliumLimit] the star's own (assumption, for
// such stars have yet to die).
func (r Relation) Mean(m float64) float64 {
	if m < r.HeliumLimit() {
		return m
	}
	i := len(r) - 1
	for i > 0 && m < r[i].From {
		i--
	}
	return r[i].Slope*m + r[i].Offset
}

// WhiteDwarf returns the mass of the white dwarf below which the fraction u of
// stars of mass m ends, as the function of that name does for [CummingsMean].
//
// Units, domain and error as there.
func (r Relation) WhiteDwarf(m, u, scatter float64) float64 {
	return scattered(r.Mean(m), m, u, scatter, r.HeliumLimit())
}

// scattered adds the Gaussian quantile, cut at 3 sigma, to a mean and keeps it
// within limits. Stars below the helium limit do not scatter.
func scattered(mean, m, u, scatter, helium float64) float64 {
	if m < helium {
		return mean
	}
	z := math.Sqrt2 * num.Erfinv((2*u-1)*threeSigma)
	return math.Min(math.Max(mean+scatter*z, LightestWhiteDwarf), math.Min(m, HeaviestWhiteDwarf))
}
