package iron

import "wane/sim/law"

type dyson struct{}

// Dyson is the tunnelling of nuclei through their mutual repulsion.
func Dyson() law.Law { return dyson{} }

func (dyson) Describe() law.Card {
	return law.Card{
		Process: "iron", Name: "dyson", Version: "1",
		Summary: "nuclei tunnel together and apart until all of a cold body is iron: it becomes an iron star",
		Formula: "t = t_nuc exp(30 A^(1/2) Z^(5/6) y^(1/2)), t_nuc = 1e-21 s; 10^1444 yr for iron (A = 56, Z = 26, y = 1), which is quoted as 10^1500 yr",
		Domain:  "cold bodies of ordinary density below 1.16 solMass; the quoted date is a constant, good to tens of decades, less in dense matter",
		Sources: []string{"Dyson, F. J. 1979, Rev. Mod. Phys. 51, 447"},
		Notes: []string{
			"the preset is the quoted date, not the formula's 1444 decades",
			"heavier dwarfs belong to process supernova, although this time alone would turn most of them earlier. Unresolved",
			"t_nuc from memory. The mass that binding energy carries away, below 1 %, is left out (assumption)",
		},
		Accepts:   accepts(),
		Questions: []law.Question{{Name: "foretell", Inputs: []string{"mass"}}},
		Parameters: []law.Parameter{{
			Name: "lifetime", Unit: "yr", Log10: true, Doc: "how long matter takes to turn to iron",
			Low: 500, High: 1500, Preset: 1500, Citation: "Dyson 1979; lower end: A = 28, Z = 14 and dense matter (assumption)",
		}},
		Outcomes: []law.Outcome{{Word: "turned-to-iron", Doc: "all of it is iron", Becomes: "iron-star"}},
		Kinds:    []law.Kind{{Name: "iron-star", Doc: "cold body all of iron", Composition: law.Iron}},
	}
}

// Soonest is the least that the parameter allows.
func (dyson) Soonest() float64 { return 500 }

func (dyson) Answer(_ string, in law.Batch) (law.Batch, error) {
	m, wait, chance, mass, gas := in.Values("mass"), in.NewValues(), in.NewValues(), in.NewValues(), in.NewValues()
	for i := range m {
		wait[i], chance[i], mass[i], gas[i] = in.Parameters[0], 1, m[i], 0
	}
	return in.Answer(law.Numbers("wait", wait), law.Numbers(law.ChanceColumn("turned-to-iron"), chance),
		law.Numbers("mass", mass), law.Numbers("gas", gas)), nil
}
