package warmth

import "wane/sim/law"

// None is no heat from outside.
func None() law.Law {
	return law.NewIdle(law.Card{
		Process: "warmth", Name: "none", Version: "1",
		Summary:   "nothing but the sky warms cold bodies from outside",
		Formula:   "L = 0",
		Domain:    "every body; right if dark matter neither scatters nor annihilates",
		Sources:   []string{"assumption"},
		Accepts:   accepts(),
		Questions: []law.Question{{Name: "warm", Inputs: []string{"mass"}}},
	})
}
