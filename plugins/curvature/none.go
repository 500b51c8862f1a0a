// Package curvature holds the laws of how dense matter might radiate itself
// away without a horizon.
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
		Accepts: law.Accepts{Kinds: []string{"white-dwarf", "neutron-star", "brown-dwarf", "relic"}},
		Questions: []law.Question{
			{Name: "wear", Inputs: []string{"mass"}},
			{Name: "foretell", Inputs: []string{"mass"}},
		},
		Wears: "loss",
	})
}
