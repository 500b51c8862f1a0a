package tunnelling

import "wane/sim/law"

// None is matter that never tunnels.
func None() law.Law {
	return law.NewIdle(law.Card{
		Process: "tunnelling", Name: "none", Version: "1",
		Summary:   "cold matter never tunnels into holes",
		Formula:   "wait infinite",
		Domain:    "an assumption",
		Sources:   []string{"Dyson, F. J. 1979, Rev. Mod. Phys. 51, 447 (what is left out)"},
		Accepts:   accepts(),
		Questions: []law.Question{{Name: "foretell", Inputs: []string{"mass"}}},
	})
}
