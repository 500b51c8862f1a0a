package evaporation

import "wane/sim/law"

// None is holes that never lose mass.
func None() law.Law {
	return law.NewIdle(law.Card{
		Process: "evaporation", Name: "none", Version: "1",
		Summary: "black holes last for ever",
		Formula: "dM/dt = 0",
		Domain:  "every hole; what general relativity says without quantum fields",
		Sources: []string{"Hawking, S. W. 1972, Commun. Math. Phys. 25, 152 (a horizon never shrinks)"},
		Notes:   []string{"evaporation has not been observed; most physicists expect it"},
		Accepts: accepts(), Questions: questions(), Wears: "loss",
	})
}
