package curvature

import "wane/sim/law"

// None is matter that does not evaporate.
func None() law.Law {
	return law.NewIdle(law.Card{
		Process: "curvature", Name: "none", Version: "1",
		Summary: "only black holes evaporate",
		Formula: "dM/dt = 0",
		Domain:  "every body; the effect without a horizon is contested",
		Sources: []string{"assumption; proposed by Wondrak, van Suijlekom & Falcke 2023, Phys. Rev. Lett. 130, 221502"},
		Accepts: accepts(),
		Questions: []law.Question{
			{Name: "wear", Inputs: []string{"mass"}},
			{Name: "foretell", Inputs: []string{"mass"}},
		},
		Wears: "loss",
	})
}
