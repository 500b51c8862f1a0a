package nucleondecay

import "wane/sim/law"

// Stable is matter whose nucleons never decay.
func Stable() law.Law {
	return law.NewIdle(law.Card{
		Process: "nucleon-decay", Name: "stable", Version: "1",
		Summary: "nucleons never decay",
		Formula: "dM/dt = 0",
		Domain:  "every body; holds if baryon number is conserved at every energy",
		Sources: []string{"Dyson, F. J. 1979, Rev. Mod. Phys. 51, 447"},
		Accepts: accepts(),
		Questions: []law.Question{
			{Name: "wear", Inputs: []string{"mass"}},
			{Name: "foretell", Inputs: []string{"mass"}},
		},
		Wears: "loss",
	})
}
