package evaporation

import "wane/sim/law"

// Page is evaporation with grey-body factors: photons and gravitons, and the
// massive particles as the hole grows hot enough for them.
func Page() law.Law {
	return newEvaporating(law.Card{
		Name: "page", Version: "1",
		Summary: "a hole radiates photons and gravitons, and at the very end all that is light enough",
		Formula: sumOfSpecies + "Lifetime of M with photons and gravitons alone (alpha = 3.7475e-5): 1.159e67 yr (M/solMass)^3",
		Domain:  isolated + "error 1e-3 in the lifetime of a stellar hole, if every neutrino has mass",
		Sources: []string{page1976, macGibbon1991},
		Notes: []string{
			"three neutrinos of two states each; kT of one solar mass is 5.3e-12 eV, so they join below 1e-8 solMass",
			"a massless lightest neutrino would shorten the life of a stellar hole by a factor 3.2: another law",
			"no spin: a hole that was born spinning fast lives 2.0 to 2.7 times shorter (Page 1976, Phys. Rev. D 14, 3260)",
		},
		Parameters: []law.Parameter{lightestNeutrino()},
	}, func(p []float64) radiator { return emits(massiveNeutrinos(p[0])...) })
}
