package tunnelling

import (
	"math"

	"wane/sim/law"
	"wane/sim/physics/coldmatter"
)

type planckSpeck struct{}

// PlanckSpeck is matter any speck of which may tunnel into a hole of the
// Planck mass.
func PlanckSpeck() law.Law { return planckSpeck{} }

func (planckSpeck) Describe() law.Card {
	return law.Card{
		Process: "tunnelling", Name: "planck-speck", Version: "1",
		Summary: "specks of the Planck mass tunnel into holes, which evaporate, until the body is gone",
		Formula: "t = exp[(120 pi^2)^(1/3) N^(4/3)], N = 1.311e19 nucleons, the Planck mass over m_u: log10 t/yr = 1.42e26",
		Domain:  "cold bodies of at least the Planck mass; the first digits of the exponent",
		Sources: []string{"Dyson, F. J. 1979, Rev. Mod. Phys. 51, 447 (10^(10^26) yr; the formula from memory, it reproduces his numbers)"},
		Notes: []string{
			"that so many specks wait at once moves the exponent by tens in 10^26: nothing",
			"the body then drains within an ordinary time and all of its mass is radiated (assumption)",
		},
		Accepts:   accepts(),
		Questions: []law.Question{{Name: "foretell", Inputs: []string{"mass"}}},
		Outcomes:  []law.Outcome{{Word: "drained", Doc: "radiated by holes of the Planck mass", Becomes: law.Gone}},
	}
}

func (planckSpeck) Soonest() float64 { return soonest }

func (planckSpeck) Answer(_ string, in law.Batch) (law.Batch, error) {
	m, wait, chance, mass, gas := in.Values("mass"), in.NewValues(), in.NewValues(), in.NewValues(), in.NewValues()
	speck := coldmatter.PlanckMass()
	t := coldmatter.Log10TunnellingTime(speck)
	for i := range m {
		wait[i], chance[i], mass[i], gas[i] = t, 1, 0, 0
		if m[i] < speck {
			wait[i] = math.Inf(1)
		}
	}
	return in.Answer(law.Numbers("wait", wait), law.Numbers(law.ChanceColumn("drained"), chance),
		law.Numbers("mass", mass), law.Numbers("gas", gas)), nil
}
