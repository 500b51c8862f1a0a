package neutronstarcooling

import "wane/sim/law"

// None returns the law neutron-star-cooling/none: neutron stars are cold from the start.
func None() law.Law {
	return law.NewIdle(law.Card{
		Process: "neutron-star-cooling", Name: "none", Version: "1",
		Summary:   "neutron stars have no heat of their own",
		Formula:   "T = 0: heat from outside and from wearing alone warms them",
		Domain:    "old objects; an assumption",
		Sources:   []string{"Gudmundsson, Pethick & Epstein 1983, ApJ 272, 286 (what is left out)"},
		Accepts:   law.Accepts{Kinds: []string{"neutron-star"}},
		Questions: []law.Question{{Name: "shine", Inputs: []string{"log10_age"}}},
	})
}
