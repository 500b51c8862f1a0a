package evaporation

import (
	"wane/sim/law"
	"wane/sim/num"
	"wane/sim/physics/hole"
)

// ExtraLightSpecies is [Page] with light particles that have not been seen.
func ExtraLightSpecies() law.Law {
	return newEvaporating(law.Card{
		Name: "extra-light-species", Version: "1",
		Summary: "as page, and a hole also radiates light particles that nobody has seen yet",
		Formula: sumOfSpecies + "n more states of alpha_s = 7.438e-5, 4.092e-5, 1.682e-5, 1.918e-6 for spin 0, 1/2, 1, 2. " +
			"Massless ones divide the lifetime by 1 + n alpha_s/3.7475e-5, one scalar by 2.985",
		Domain:  isolated + "error 1e-3 in the lifetime far from the switch of the added species",
		Sources: []string{page1976, macGibbon1991},
		Notes: []string{
			"such as axions, dark photons or mirror particles; a hole radiates whatever there is, however weakly it acts otherwise",
			"states are helicities, particles and antiparticles counted: 1 for a scalar, 2 for a massless particle with spin",
			"1e-30 eV counts as massless for every hole of a galaxy: kT of 1e12 solMass is 5e-24 eV",
		},
		Parameters: []law.Parameter{lightestNeutrino(),
			{Name: "states", Doc: "helicity states of the added species", Low: 0, High: 1e6, Preset: 1, Citation: "assumption"},
			{Name: "spin", Doc: "spin of the added species, in hbar", Words: []string{"zero", "half", "one", "two"}, Citation: "Page 1976 (the spins with known factors)"},
			{Name: "mass", Unit: "eV", Log10: true, Doc: "mass of the added species: it joins as kT nears it", Low: -30, High: 8, Preset: -30,
				Citation: "assumption"},
		},
	}, func(p []float64) radiator {
		spin := [...]hole.Spin{hole.Scalar, hole.Half, hole.Vector, hole.Graviton}[int(p[2])]
		added := []hole.Species{{Name: "added", Spin: spin, States: p[1], EV: num.Exp10(p[3])}}
		return emits(append(massiveNeutrinos(p[0]), added)...)
	})
}
