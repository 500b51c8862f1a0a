package browndwarfcooling

import (
	"wane/sim/law"
	"wane/sim/physics/cooling"
)

// BurrowsLiebert returns the law brown-dwarf-cooling/burrows-liebert: power
// laws in age, mass and opacity.
func BurrowsLiebert() law.Law { return burrowsLiebert{} }

type burrowsLiebert struct{}

func (burrowsLiebert) Describe() law.Card {
	return law.Card{
		Process: "brown-dwarf-cooling", Name: "burrows-liebert", Version: "1",
		Summary: "brown dwarfs fade as power laws of age, mass and opacity",
		Formula: "T = 1550 K (1e9 yr/t)^0.32 (M/0.05 solMass)^0.83 (kappa/0.01 cm2/g)^0.088, at most 2800 K",
		Domain:  "1e7 .. 1e10 yr within 10 %; later an upper bound; no floor of any kind",
		Sources: []string{
			"Burrows & Liebert 1993, Rev. Mod. Phys. 65, 301",
			"Burrows et al. 2001, Rev. Mod. Phys. 73, 719, eq. 2 (coefficients from memory)",
		},
		Notes: []string{
			"Carried on beyond 1e10 yr without change (assumption).",
			"Young brown dwarfs are held at 2800 K (assumption). Deuterium burning is left out.",
		},
		Accepts:   law.Accepts{Kinds: []string{"brown-dwarf"}},
		Questions: []law.Question{{Name: "shine", Inputs: []string{"mass", "log10_age"}}},
		Parameters: []law.Parameter{{Name: "kappa", Unit: "cm2/g", Doc: "mean opacity of the atmosphere", Low: 0.001, High: 0.1, Preset: 0.01,
			Citation: "Burrows et al. 2001; range: assumption"}},
	}
}

func (burrowsLiebert) Answer(question string, in law.Batch) (law.Batch, error) {
	kappa := in.Parameters[0]
	mass, age, temperature := in.Values("mass"), in.Values("log10_age"), in.NewValues()
	for i := range temperature {
		temperature[i] = cooling.BrownDwarfTemperature(mass[i], age[i], kappa)
	}
	return in.Answer(law.Numbers("log10_temperature", temperature)), nil
}
