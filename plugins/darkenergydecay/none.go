// Package darkenergydecay holds the laws of whether and when dark energy decays.
package darkenergydecay

import (
	"math"

	"wane/sim/law"
)

type none struct{}

// None is an ending that never comes: dark energy never decays.
func None() law.Law { return none{} }

func (none) Describe() law.Card {
	return law.Card{
		Process: "dark-energy-decay", Name: "none", Version: "1",
		Idle:      true,
		Summary:   "dark energy never decays",
		Formula:   "cumulative hazard 0",
		Domain:    "exact if dark energy is a constant of nature",
		Sources:   []string{"Krauss, L. M. & Starkman, G. D. 2000, Astrophys. J. 531, 22"},
		Accepts:   law.Accepts{},
		Questions: []law.Question{{Name: "end", Inputs: []string{"log10_date"}}},
	}
}

func (none) Answer(_ string, in law.Batch) (law.Batch, error) {
	hazard := in.NewValues()
	for i := range hazard {
		hazard[i] = math.Inf(-1)
	}
	return in.Answer(law.Numbers("log10_hazard", hazard)), nil
}
