package evaporation

import (
	"wane/sim/law"
	"wane/sim/physics/hole"
)

// ThreeNeutrinos is evaporation if all three neutrinos had no mass.
func ThreeNeutrinos() law.Law {
	return newEvaporating(law.Card{
		Name: "three-neutrinos", Version: "1",
		Summary: "a hole radiates photons, gravitons and three massless neutrinos",
		Formula: sumOfSpecies + "Lifetime of M with the massless ones alone (alpha = 2.8298e-4): 1.535e66 yr (M/solMass)^3",
		Domain:  isolated + "error 1e-3 in the lifetime of a stellar hole, if no neutrino has mass",
		Sources: []string{page1976, macGibbon1991},
		Notes: []string{
			"the value of textbooks, from before neutrinos were known to have mass. At least two have 0.009 eV and 0.05 eV or more, " +
				"and holes above 1e-8 solMass are too cold for them: page and lightest-neutrino-massless are the laws without them",
			"three neutrinos of two states each",
		},
	}, func([]float64) radiator { return emits(hole.Light(), hole.MasslessNeutrinos(3), hole.Massive()) })
}
