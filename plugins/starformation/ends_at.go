package starformation

import "wane/sim/law"

// EndsAt returns the law star-formation/ends-at: a history that follows the
// gas, cut off at a date.
func EndsAt() law.Law { return endsAt{} }

type endsAt struct{}

// Index of the parameter that gas-limited does not have.
const endsAtEnd = gasParameters

func (endsAt) Describe() law.Card {
	return law.Card{
		Process: "star-formation", Name: "ends-at", Version: "1",
		Summary: "star formation follows the gas and stops for good at a date",
		Formula: "dM/dt = -(1 - R) rate + infall e^(-(t - start)/infall_time), rate = (M/depletion) (M/gas)^(n-1) until end, then 0; " +
			"date = that of gas-limited at 1 - S, S = (1 - u) + u S(end)",
		Domain: "any u. The number of objects stays that of the galaxy: those that would come after the end are born before it, in proportion. " +
			"n = 1 without infall is an exponential history with tau_sf = depletion/(1 - R)",
		Sources: append(gasSources(), "Adams & Laughlin 1997, Rev. Mod. Phys. 69, 337, section II (end at 1e14 yr)"),
		Notes: append(gasNotes(),
			"n is set to 1.4 here (Kennicutt 1998): with n = 1 the last birth comes long before the end, and nothing is cut."),
		Questions: []law.Question{{Name: "birth", Inputs: []string{"u"}}},
		Parameters: append(gasLaw(1.4),
			law.Parameter{Name: "end", Unit: "yr", Doc: "date of the last birth", Log10: true, Low: 11, High: 14, Preset: 14,
				Citation: "Adams & Laughlin 1997: 1e13 .. 1e14 yr; lower end: assumption"}),
	}
}

func (endsAt) Answer(question string, in law.Batch) (law.Batch, error) {
	return gasDates(in, in.Parameters[endsAtEnd])
}
