package browndwarfcooling

import "wane/sim/law"

// None returns the law brown-dwarf-cooling/none: brown dwarfs are cold from the start.
func None() law.Law {
	return law.NewIdle(law.Card{
		Process: "brown-dwarf-cooling", Name: "none", Version: "1",
		Summary:   "brown dwarfs have no heat of their own",
		Formula:   "T = 0: heat from outside and from wearing alone warms them",
		Domain:    "old objects; an assumption",
		Sources:   []string{"Burrows & Liebert 1993, Rev. Mod. Phys. 65, 301 (what is left out)"},
		Accepts:   law.Accepts{Kinds: []string{"brown-dwarf"}},
		Questions: []law.Question{{Name: "shine", Inputs: []string{"log10_age"}}},
	})
}
