package tunnelling

import (
	"wane/sim/law"
	"wane/sim/physics/coldmatter"
)

type wholeStar struct{}

// WholeStar is a body that tunnels into a hole all at once.
func WholeStar() law.Law { return wholeStar{} }

func (wholeStar) Describe() law.Card {
	return law.Card{
		Process: "tunnelling", Name: "whole-star", Version: "1",
		Summary: "a cold body tunnels into a black hole as a whole",
		Formula: "t = exp[(120 pi^2)^(1/3) N^(4/3)], N = M/m_u nucleons: log10 t/yr = 5.843e76 (M/solMass)^(4/3)",
		Domain:  "cold bodies of at least the Planck mass; of the exponent of the exponent only the first two digits mean anything",
		Sources: []string{"Dyson, F. J. 1979, Rev. Mod. Phys. 51, 447 (10^(10^76) yr; the formula from memory, it reproduces his numbers)"},
		Notes: []string{
			"that no lighter hole forms first is an assumption: law planck-speck has the opposite",
			"dates this late are told apart by their exponents alone: half, hundredth and last of equal masses are one number",
		},
		Accepts:   accepts(),
		Questions: []law.Question{{Name: "foretell", Inputs: []string{"mass"}}},
		Outcomes:  []law.Outcome{{Word: "tunnelled", Doc: "all of it is a black hole", Becomes: "black-hole"}},
	}
}

func (wholeStar) Soonest() float64 { return soonest }

func (wholeStar) Answer(_ string, in law.Batch) (law.Batch, error) {
	m, wait, chance, mass, gas := in.Values("mass"), in.NewValues(), in.NewValues(), in.NewValues(), in.NewValues()
	for i := range m {
		wait[i], chance[i], mass[i], gas[i] = coldmatter.Log10TunnellingTime(m[i]), 1, m[i], 0
	}
	return in.Answer(law.Numbers("wait", wait), law.Numbers(law.ChanceColumn("tunnelled"), chance),
		law.Numbers("mass", mass), law.Numbers("gas", gas)), nil
}
