package substellarlimit

import (
	"wane/sim/law"
	"wane/sim/physics/stars"
)

// Fixed returns the law substellar-limit/fixed: one hydrogen-burning limit
// for all objects.
func Fixed() law.Law { return fixed{} }

type fixed struct{}

func (fixed) Describe() law.Card {
	return law.Card{
		Process: "substellar-limit", Name: "fixed", Version: "1",
		Summary: "objects below one fixed mass never become stars",
		Formula: "kind = star when mass >= limit, else brown-dwarf",
		Domain: "any mass. Models put the limit at 0.070 .. 0.080 solMass at solar composition, 0.092 without metals, " +
			"perhaps 0.040 at twenty times the Sun's metals",
		Sources: []string{
			"Burrows et al. 2001, Rev. Mod. Phys. 73, 719",
			"Adams & Laughlin 1997, Rev. Mod. Phys. 69, 337 (metal-rich end)",
		},
		Notes: []string{
			"Does not read the metals (assumption).",
			"Objects within a few per cent of the limit burn for a while and then fade: they are sorted as if the edge were sharp.",
		},
		Questions: []law.Question{{Name: "sort", Inputs: []string{"mass"}}},
		Parameters: []law.Parameter{{Name: "limit", Unit: "solMass", Doc: "least mass that burns hydrogen for good", Low: 0.040, High: 0.092, Preset: stars.HydrogenBurning,
			Citation: "Burrows et al. 2001; lower end Adams & Laughlin 1997"}},
	}
}

func (fixed) Answer(question string, in law.Batch) (law.Batch, error) {
	limit := in.Parameters[0]
	mass, kind := in.Values("mass"), in.NewWords()
	for i := range kind {
		if mass[i] >= limit {
			kind[i] = law.Star
		} else {
			kind[i] = law.BrownDwarf
		}
	}
	return in.Answer(law.Codes("kind", kind)), nil
}
