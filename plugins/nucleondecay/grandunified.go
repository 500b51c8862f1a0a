package nucleondecay

import "wane/sim/law"

// GrandUnified is the decay of nucleons that grand unified theories expect,
// with one mean life for all.
func GrandUnified() law.Law {
	return newDecay(law.Card{
		Name: "grand-unified", Version: "1",
		Summary: "every nucleon decays with the same mean life, and bodies shrink until they dissolve",
		Formula: massHistory,
		Domain:  "cold bodies of ordinary matter; tau is known only to exceed 2.4e34 yr times the branching ratio; the mass history is exact once tau is given",
		Sources: []string{
			"Adams, F. C. & Laughlin, G. 1997, Rev. Mod. Phys. 69, 337, section IV",
			"Takenaka, A. et al. 2020, Phys. Rev. D 102, 112011 (lower limit, from memory)",
		},
		Parameters: []law.Parameter{{Name: "lifetime", Unit: "yr", Log10: true, Doc: "mean life of a nucleon, bound or free",
			Low: 34.38, High: 41, Preset: 37,
			Citation: "Adams & Laughlin 1997 (reference value 1e37 yr); lower end Takenaka et al. 2020"}},
	}, func(own []float64) float64 { return own[0] })
}
