package starformation

import "wane/sim/law"

// GasLimited returns the law star-formation/gas-limited: a rate that follows
// the gas there still is, with recycling and infall.
func GasLimited() law.Law { return gasLimited{} }

type gasLimited struct{}

func (gasLimited) Describe() law.Card {
	return law.Card{
		Process: "star-formation", Name: "gas-limited", Version: "1",
		Summary: "stars form out of the gas there still is, which stars give back in part and infall adds to",
		Formula: "dM/dt = -(1 - R) rate + infall e^(-(t - start)/infall_time), rate = (M/depletion) (M/gas)^(n-1), M = gas at the start; " +
			"births go as the rate. Without infall date = start + (S^-(n-1) - 1)/((n-1) k), for n = 1 start - ln(S)/k, with S = 1 - u, k = (1 - R)/depletion; " +
			"with infall the exact root of S = (M + gas still to fall in)/(all gas)",
		Domain: "any u below 1. The rate at any date is good to a factor of two; the date of the last birth hangs on n: of 2e11 objects it is 2e11 yr for n = 1, " +
			"8e14 for 1.4, 2e21 for 2",
		Sources:    gasSources(),
		Notes:      gasNotes(),
		Questions:  []law.Question{{Name: "birth", Inputs: []string{"u"}}},
		Parameters: gasLaw(1),
	}
}

func (gasLimited) Answer(question string, in law.Batch) (law.Batch, error) {
	return gasDates(in, noEnd)
}
