// Package vacuumdecay holds the laws of whether and when the vacuum itself decays.
package vacuumdecay

import "wane/sim/law"

// None is an ending that never comes: the vacuum never decays.
func None() law.Law {
	return law.NewIdle(law.Card{
		Process: "vacuum-decay", Name: "none", Version: "1",
		Summary:   "the vacuum never decays",
		Formula:   "cumulative hazard 0",
		Domain:    "exact if the vacuum is stable, which today's masses of the Higgs boson and the top quark allow at 1-2 sigma",
		Sources:   []string{"Andreassen, A., Frost, W. & Schwartz, M. D. 2018, Phys. Rev. D 97, 056006 (what is left out)"},
		Accepts:   law.Accepts{},
		Questions: []law.Question{{Name: "end", Inputs: []string{"log10_date"}}},
	})
}
