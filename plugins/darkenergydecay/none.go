// Package darkenergydecay holds the laws of whether and when dark energy decays.
package darkenergydecay

import "wane/sim/law"

// None is an ending that never comes: dark energy never decays.
func None() law.Law {
	return law.NewIdle(law.Card{
		Process: "dark-energy-decay", Name: "none", Version: "1",
		Summary:   "dark energy never decays",
		Formula:   "cumulative hazard 0",
		Domain:    "exact if dark energy is a constant of nature",
		Sources:   []string{"Krauss, L. M. & Starkman, G. D. 2000, Astrophys. J. 531, 22"},
		Accepts:   law.Accepts{},
		Questions: []law.Question{{Name: "end", Inputs: []string{"log10_date"}}},
	})
}
