package main

import (
	"wane/sim/law"
	"wane/sim/num"
)

// burden is the law outside the program that the scripts start: holes lose
// mass as a power of it, and stop at a least mass, as embers.
type burden struct{}

func (burden) Describe() law.Card {
	holes := []string{"black-hole", "central-hole"}
	c := law.Card{
		Process: "evaporation", Name: "burden", Version: "7", Summary: "holes stop at a least mass", Formula: "dM/dt = -M0 (M/solMass)^-2/tau",
		Domain: "made up for a test", Sources: []string{"assumption"}, Notes: []string{"an ember lasts"},
		Accepts:   law.Accepts{Kinds: holes},
		Questions: []law.Question{{Name: "wear", Inputs: []string{"mass"}}},
		Parameters: []law.Parameter{
			{Name: "least", Unit: "solMass", Doc: "mass of an ember", Low: 1e-9, High: 1, Preset: 1e-3, Citation: "assumption"},
			{Name: "tau", Unit: "yr", Log10: true, Doc: "time scale", Low: 1, High: 90, Preset: 67, Citation: "assumption"},
		},
		Kinds:     []law.Kind{{Name: "ember", Doc: "what a hole leaves", Composition: law.Pure}},
		Tolerance: 1e-12,
	}
	for _, k := range holes {
		c.Thresholds = append(c.Thresholds, law.Threshold{Kind: k, Parameter: "least", Becomes: "ember", Outcome: "stalled"})
	}
	return c
}

func (burden) Answer(_ string, in law.Batch) (law.Batch, error) {
	rate, heat := in.NewValues(), in.NewValues()
	for i, m := range in.Values("mass") {
		rate[i], heat[i] = -2*num.Log10(m)-in.Parameters[1], 0
	}
	return in.Answer(law.Numbers("log10_rate", rate), law.Numbers("heat", heat)), nil
}
