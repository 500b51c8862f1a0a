package lifetime

import (
	"wane/sim/law"
	"wane/sim/physics/stars"
)

// PowerLaw returns the law lifetime/power-law: one power of the mass.
func PowerLaw() law.Law { return powerLaw{} }

type powerLaw struct{}

func (powerLaw) Describe() law.Card {
	return law.Card{
		Process: "lifetime", Name: "power-law", Version: "1",
		Summary: "one power law for all masses through the Sun's ten billion years",
		Formula: "main sequence = 1e10 yr (m/solMass)^-alpha; " + postFormula,
		Domain: "within a factor of two from 0.3 to 5 solMass; with alpha = 2.5 a factor of two short at 0.1 solMass, ten short at 100. " +
			"alpha = 2.807 meets 1.2e13 yr at 0.08 solMass",
		Sources: []string{
			"textbook scaling, from L ~ m^3.5",
			"Adams & Laughlin 1997, Rev. Mod. Phys. 69, 337, section II (alpha 3 .. 4 for light stars, which overshoots their models)",
		},
		Notes: []string{
			"With alpha = 3.5 the lightest stars live 7e13 yr, six times the models (Laughlin, Bodenheimer & Adams 1997): that disagreement cannot be reconciled, and moves the last star by 0.8 dex.",
			"Metals, rotation and companions are left out.",
		},
		Accepts:   law.Accepts{Kinds: []string{"star"}},
		Questions: []law.Question{{Name: "live", Inputs: []string{"mass"}}},
		Parameters: []law.Parameter{
			post(),
			{Name: "alpha", Doc: "power of the mass", Low: 2.5, High: 3.5, Preset: 2.5, Citation: "textbook 2.5; upper end Adams & Laughlin 1997"},
		},
	}
}

func (powerLaw) Answer(question string, in law.Batch) (law.Batch, error) {
	share, alpha := in.Parameters[0], in.Parameters[1]
	mass, wait := in.Values("mass"), in.NewValues()
	for i := range wait {
		wait[i] = stars.WithGiant(stars.PowerLawLife(mass[i], alpha), mass[i], share)
	}
	return in.Answer(law.Numbers("wait", wait)), nil
}
