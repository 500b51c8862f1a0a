package supernova

import "wane/sim/law"

// None is white dwarfs that never explode.
func None() law.Law {
	return law.NewIdle(law.Card{
		Process: "supernova", Name: "none", Version: "1",
		Summary:   "cold white dwarfs never explode",
		Formula:   "wait infinite",
		Domain:    "white dwarfs below the limiting mass of iron, 1.16 solMass; an assumption above",
		Sources:   []string{"Caplan, M. E. 2020, Mon. Not. R. Astron. Soc. 497, 4357 (what is left out)"},
		Accepts:   law.Accepts{Kinds: []string{"white-dwarf"}},
		Questions: []law.Question{{Name: "foretell", Inputs: []string{"mass"}}},
	})
}
