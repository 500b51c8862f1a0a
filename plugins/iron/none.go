package iron

import "wane/sim/law"

// None is matter that keeps its elements.
func None() law.Law {
	return law.NewIdle(law.Card{
		Process: "iron", Name: "none", Version: "1",
		Summary:   "cold matter keeps its elements",
		Formula:   "wait infinite",
		Domain:    "an assumption",
		Sources:   []string{"Dyson, F. J. 1979, Rev. Mod. Phys. 51, 447 (what is left out)"},
		Accepts:   accepts(),
		Questions: []law.Question{{Name: "foretell", Inputs: []string{"mass"}}},
	})
}
