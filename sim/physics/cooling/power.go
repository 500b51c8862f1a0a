package cooling

import (
	"math"

	"wane/sim/num"
	"wane/sim/physics/structure"
)

// Masses, solar masses, outside of which a white dwarf counts as one at the
// end, as in the tables.
const lightest, heaviest = 1e-3, 1.44

// MestelCurve is log10 T against log10 age of a white dwarf by [MestelAge]: a
// straight line.
type MestelCurve struct {
	logAge float64 // log10 yr at 1 solar luminosity
	logT   float64 // log10 K at 1 solar luminosity
}

// NewMestelCurve is the curve of a cold dwarf of mass m, solar masses.
//
// Domain: m >= 0; masses below 1e-3 and above 1.44 count as these.
func NewMestelCurve(m float64, ions Ions) MestelCurve {
	m = math.Min(math.Max(m, lightest), heaviest)
	return MestelCurve{
		logAge: num.Log10(MestelAge(1, m, ions.A, ions.A/ions.Z)),
		logT:   -num.Log10(Luminosity(structure.WhiteDwarfRadius(m), 1)) / 4,
	}
}

// Temperature returns log10 of the effective temperature.
//
//	L = (t/t1)^(-7/5), t1 the age at one solar luminosity;  T ~ L^(1/4)
//
// Units: log10 of years, log10 of K; at most [DwarfStart].
// Domain: any age. Error: right above L = 1e-4 solar luminosities, decades too
// late below (T at 5 K comes at 10^18.2 yr at 0.6 solar masses).
// Special cases: [DwarfStart] at -Inf, -Inf at +Inf.
// Source: [Mestel1952], carried on without end. Checked by cooling.csv.
func (c MestelCurve) Temperature(logAge float64) float64 {
	return math.Min(DwarfStart, c.logT-0.35*(logAge-c.logAge))
}

// age is the log10 age at log10 luminosity l, solar luminosities.
func (c MestelCurve) age(l float64) float64 { return c.logAge - l*5/7 }

// TemperatureThrough is [MestelCurve.Temperature] down to 1e-4 solar
// luminosities; from there T falls as the power of age that brings it to 5 K
// at a given date.
//
// Units: log10 of years, log10 of K.
// Domain: any age; date > 11.
// Error: unknown: only the date is published, the power law is an assumption.
// Source: [BarrowTipler1986]: 5 K at 1e15 yr (from memory). Checked by
// cooling.csv.
func (c MestelCurve) TemperatureThrough(logAge, date float64) float64 {
	const (
		log10Switch = -4
		log10Five   = 0.69897000433601880479
	)
	meet := c.age(log10Switch)
	if logAge <= meet {
		return c.Temperature(logAge)
	}
	if math.IsInf(logAge, 1) {
		return math.Inf(-1)
	}
	from := c.logT + log10Switch/4.
	return from + (log10Five-from)*((logAge-meet)/(date-meet))
}
