package evaporation

import (
	"wane/sim/law"
	"wane/sim/physics/hole"
)

// relic is the kind that holes become under [Remnant]. It is not the relic of
// matter, which decaying nucleons dissolve.
const relic = "hole-relic"

// Remnant is evaporation that stops at a least mass and leaves a relic which
// stays for ever.
func Remnant() law.Law {
	ends := func(kind string) law.Threshold {
		return law.Threshold{Kind: kind, Parameter: "remnant", Becomes: relic, Outcome: "stopped"}
	}
	return newEvaporating(law.Card{
		Name: "remnant", Version: "1",
		Summary: "as page, but a hole stops at a least mass and stays for ever",
		Formula: sumOfSpecies + "The least mass M_r is reached at t(M) - t(M_r), for one alpha t (1 - (M_r/M)^3); photons and gravitons alone: t = 1.159e67 yr (M/solMass)^3",
		Domain:  isolated + "whether anything stops evaporation, and where, is not known",
		Sources: []string{
			"Adler, R. J., Chen, P. & Santiago, D. I. 2001, Gen. Relativ. Gravit. 33, 2101 (remnants of Planck mass)",
			page1976, macGibbon1991,
		},
		Notes: []string{
			"evaporation is as without a least mass until it stops (assumption); the theories of remnants change its last moments",
			"a relic of a hole is a kind of its own, hole-relic: it is not made of nucleons, nothing wears it, and it is bound or adrift as the hole was",
			"a hole born at or below the least mass is a relic at once",
			"many hold that remnants cannot be, for there would be infinitely many kinds of them (Susskind 1995, hep-th/9501106; from memory)",
		},
		Parameters: []law.Parameter{lightestNeutrino(),
			{Name: "remnant", Unit: "solMass", Doc: "mass at which evaporation stops", Low: hole.PlanckMass, High: 1, Preset: hole.PlanckMass,
				Citation: "preset: the Planck mass, Adler, Chen & Santiago 2001; any other: assumption"}},
		Thresholds: []law.Threshold{ends("black-hole"), ends("central-hole")},
		Kinds:      []law.Kind{{Name: relic, Doc: "what is left of a hole that stopped evaporating", Composition: law.Pure}},
	}, func(p []float64) radiator {
		g := emits(massiveNeutrinos(p[0])...)
		g.end = p[1]
		return g
	})
}
