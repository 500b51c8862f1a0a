package warmth

import "wane/sim/law"

type none struct{}

// None is no heat from outside.
func None() law.Law { return none{} }

func (none) Describe() law.Card {
	return law.Card{
		Process: "warmth", Name: "none", Version: "1",
		Idle:      true,
		Summary:   "nothing but the sky warms cold bodies from outside",
		Formula:   "L = 0",
		Domain:    "every body; right if dark matter neither scatters nor annihilates",
		Sources:   []string{"assumption"},
		Accepts:   accepts(),
		Questions: []law.Question{{Name: "warm", Inputs: []string{"mass"}}},
	}
}

func (none) Answer(_ string, in law.Batch) (law.Batch, error) {
	power := in.NewValues()
	clear(power)
	return in.Answer(law.Numbers("power", power)), nil
}
