package evaporation

import (
	"wane/sim/law"
	"wane/sim/physics/hole"
)

// LightestNeutrinoMassless is evaporation if one of the three neutrinos has no
// mass, which measurements allow.
func LightestNeutrinoMassless() law.Law {
	return newEvaporating(law.Card{
		Name: "lightest-neutrino-massless", Version: "1",
		Summary: "a hole radiates photons, gravitons and the one neutrino that may have no mass",
		Formula: sumOfSpecies + "Lifetime of M with the massless ones alone (alpha = 1.1931e-4): 3.64e66 yr (M/solMass)^3",
		Domain:  isolated + "error 1e-3 in the lifetime of a stellar hole, if the lightest neutrino has no mass",
		Sources: []string{page1976, macGibbon1991},
		Notes: []string{
			"the massless neutrino has two states; the other two, 0.0087 eV and 0.05 eV, join below 1e-8 solMass",
			"oscillations fix the differences of the squared masses only; the lightest may have none",
		},
	}, func([]float64) radiator { return emits(hole.Light(), hole.Neutrinos(0), hole.Massive()) })
}
