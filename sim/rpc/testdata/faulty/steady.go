package main

import "wane/sim/law"

// steady is an ending that no built-in law is: the vacuum decays at one rate
// per four-volume.
type steady struct{}

func (steady) Describe() law.Card {
	return law.Card{
		Process: "vacuum-decay", Name: "steady", Version: "1", Summary: "the vacuum decays at one rate", Formula: "rate: 1e-80 yr-4",
		Domain: "made up for a test", Sources: []string{"assumption"}, Effect: "everything-ends",
		Questions: []law.Question{{Name: "end", Inputs: []string{"log10_date", "log10_four_volume"}}},
	}
}

func (steady) Answer(_ string, in law.Batch) (law.Batch, error) {
	hazard := in.NewValues()
	for i, v := range in.Values("log10_four_volume") {
		hazard[i] = v - 80
	}
	return in.Answer(law.Numbers("log10_hazard", hazard)), nil
}
