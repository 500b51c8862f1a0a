// Package curvature holds the laws of how dense matter might radiate itself
// away without a horizon.
package curvature

import (
	"math"

	"wane/sim/law"
)

type none struct{}

// None is matter that does not evaporate.
func None() law.Law { return none{} }

func (none) Describe() law.Card {
	return law.Card{
		Process: "curvature", Name: "none", Version: "1",
		Idle:    true,
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
	}
}

func (none) Answer(question string, in law.Batch) (law.Batch, error) {
	out := in.NewValues()
	if question == "foretell" {
		for i := range out {
			out[i] = math.Inf(1)
		}
		return in.Answer(law.Numbers("wait", out)), nil
	}
	heat := in.NewValues()
	for i := range out {
		out[i], heat[i] = math.Inf(-1), 0
	}
	return in.Answer(law.Numbers("log10_rate", out), law.Numbers("heat", heat)), nil
}
