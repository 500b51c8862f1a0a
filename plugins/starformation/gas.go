package starformation

import (
	"fmt"
	"math"

	"wane/sim/law"
	"wane/sim/num"
	"wane/sim/physics/stars"
)

// Indices of the parameters of a history that follows the gas.
const (
	gasStart = iota
	gasDepletion
	gasReturned
	gasExponent
	gasInfall
	gasInfallTime
	gasAtStart
	gasParameters // how many there are
)

// gasSources are those of both laws that follow the gas.
func gasSources() []string {
	return []string{
		"Schmidt 1959, ApJ 129, 243 (rate as a power of the gas, n about 2)",
		"Kennicutt 1998, ApJ 498, 541 (n = 1.4 +- 0.15)",
		"Adams & Laughlin 1997, Rev. Mod. Phys. 69, 337, section II (recycling and infall stretch star formation to 1e13 - 1e14 yr)",
	}
}

// gasNotes are those of both laws that follow the gas.
func gasNotes() []string {
	return []string{
		"Instant recycling: R shapes the dates of birth alone. What dying stars give back to the ledger's gas comes from the laws of their ends, and makes no new stars (assumption).",
		"R for stars that live on today is 0.40 .. 0.45; once all are dead it is 0.43 with mass-function/kroupa, 0.45 with chabrier, 0.32 with salpeter (recomputed).",
		"Only the ratios of infall to gas count: the gas at the start is that of a galaxy like ours, and scales with it.",
		"With n near 2 the tail of births falls as 1/date, and the last of 2e11 objects is born at 2e21 yr, after the galaxy is gone: no gas waits that long. Use ends-at.",
	}
}

// gasLaw are the parameters with a preset of n.
func gasLaw(exponent float64) []law.Parameter {
	const assumed = "assumption"
	return []law.Parameter{
		gasStart: {Name: "start", Unit: "yr", Doc: "date of the first birth", Log10: true, Low: 8, High: 10, Preset: 9, Citation: assumed},
		gasDepletion: {Name: "depletion", Unit: "yr", Doc: "gas over star formation rate at the start", Log10: true,
			Low: 9, High: 10.301029995663981, Preset: 9.6989700043360187, Citation: "assumption: 1e9 .. 2e10 yr in discs"},
		gasReturned: {Name: "returned", Doc: "share of the mass of new stars that is gas again at once", Low: 0.2, High: 0.6, Preset: 0.41,
			Citation: "assumption: about 0.40 .. 0.45 for Kroupa's and Chabrier's mass functions"},
		gasExponent: {Name: "n", Doc: "exponent of rate ~ gas^n", Low: 1, High: 2, Preset: exponent, Citation: "assumption within 1 .. 2: Kennicutt 1998 has 1.4 by area, Schmidt 1959 about 2"},
		gasInfall:   {Name: "infall", Unit: "solMass/yr", Doc: "gas that falls in, at the start", Low: 0, High: 1, Preset: 0, Citation: "assumption: about 1 is seen in our galaxy today"},
		gasInfallTime: {Name: "infall_time", Unit: "yr", Doc: "time in which infall falls by a factor e", Log10: true,
			Low: 9, High: 10.301029995663981, Preset: 9.6989700043360187, Citation: assumed},
		gasAtStart: {Name: "gas", Unit: "solMass", Doc: "gas at the start, which infall is compared with", Log10: true, Low: 9, High: 11, Preset: 10, Citation: assumed},
	}
}

// gasDates answers with the dates of births that end at a date.
func gasDates(in law.Batch, log10End float64) (law.Batch, error) {
	p := in.Parameters
	share := 0.0
	if p[gasInfall] > 0 {
		share = num.Exp10(num.Log10(p[gasInfall]) + p[gasInfallTime] - p[gasAtStart])
	}
	b, err := stars.NewBirths(stars.Gas{
		Log10Start: p[gasStart], Log10Depletion: p[gasDepletion], Returned: p[gasReturned], Exponent: p[gasExponent],
		Share: share, Log10Infall: p[gasInfallTime], Log10End: log10End,
	})
	if err != nil {
		return law.Batch{}, fmt.Errorf("starformation: %w", err)
	}
	u, date := in.Values("u"), in.NewValues()
	for i := range date {
		date[i] = b.Date(u[i])
	}
	return in.Answer(law.Numbers("log10_date", date)), nil
}

// noEnd is log10 of the end of a history that has none.
var noEnd = math.Inf(1)
