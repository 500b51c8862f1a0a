package nucleondecay

import (
	"math"

	"wane/sim/law"
	"wane/sim/physics/nucleon"
)

type grandUnified struct{}

// GrandUnified is the decay of nucleons that grand unified theories expect,
// with one mean life for all.
func GrandUnified() law.Law { return grandUnified{} }

// Places of the parameters on the card.
const (
	lifetime = iota
	heatShare
	goneWord
	expansionMass
)

// goneMasses are the masses at which matter counts as gone, by word.
func goneMasses() []float64 {
	return []float64{nucleon.Transparent, nucleon.NonDegenerate, nucleon.LastNucleon()}
}

func (grandUnified) Describe() law.Card {
	matter := func(kind string) law.Threshold {
		return law.Threshold{Kind: kind, Parameter: "gone", ByWord: goneMasses(), Becomes: law.Gone, Outcome: "dissolved"}
	}
	return law.Card{
		Process: "nucleon-decay", Name: "grand-unified", Version: "1",
		Summary: "every nucleon decays with the same mean life, and bodies shrink until they dissolve",
		Formula: "dM/dt = -M/tau, so M is reached at tau ln(M0/M); M in solMass, tau in yr (mean, not half-life). Heat left: share M c^2/tau",
		Domain:  "cold bodies of ordinary matter; tau is known only to exceed 2.4e34 yr times the branching ratio; the mass history is exact once tau is given",
		Sources: []string{
			"Adams, F. C. & Laughlin, G. 1997, Rev. Mod. Phys. 69, 337, section IV",
			"Takenaka, A. et al. 2020, Phys. Rev. D 102, 112011 (lower limit, from memory)",
		},
		Notes: []string{
			"a neutron star below its least mass expands: it becomes a relic, a ball of ordinary matter that dissolves like the rest (assumption)",
			"transparent: thin to its own photons, 1e21 kg; non-degenerate: 1e-3 solMass; last-nucleon: mean date of the last decay, tau (ln N + 0.577)",
			"stars are not asked: they die long before",
		},
		Accepts: accepts(),
		Questions: []law.Question{
			{Name: "wear", Inputs: []string{"mass"}},
			{Name: "foretell", Inputs: []string{"kind", "mass"}},
		},
		Parameters: []law.Parameter{
			{Name: "lifetime", Unit: "yr", Log10: true, Doc: "mean life of a nucleon, bound or free",
				Low: 34.38, High: 41, Preset: 37,
				Citation: "Adams & Laughlin 1997 (reference value 1e37 yr); lower end Takenaka et al. 2020"},
			{Name: "heat_share", Doc: "share of the rest energy that stays as heat; the rest leaves as neutrinos",
				Low: 1. / 3, High: 1, Preset: 2. / 3, Citation: "Adams & Laughlin 1997, section IV"},
			{Name: "gone", Doc: "what counts as dissolved", Words: []string{"transparent", "non-degenerate", "last-nucleon"},
				Citation: "Adams & Laughlin 1997, section IV"},
			{Name: "expansion_mass", Unit: "solMass", Doc: "least mass of a stable neutron star",
				Low: 0.09, High: 0.2, Preset: nucleon.SmallestNeutronStar, Citation: "Adams & Laughlin 1997, section IV; range by equation of state (from memory)"},
		},
		Thresholds: []law.Threshold{
			matter("brown-dwarf"), matter("white-dwarf"),
			{Kind: "neutron-star", Parameter: "expansion_mass", Becomes: "relic", Outcome: "expanded"},
			matter("relic"),
		},
		Wears: "loss",
		Kinds: []law.Kind{{Name: "relic", Doc: "ball of ordinary matter that a neutron star becomes below its least mass", Composition: law.Iron}},
	}
}

func (grandUnified) Answer(question string, in law.Batch) (law.Batch, error) {
	m, out := in.Values("mass"), in.NewValues()
	tau := in.Parameters[lifetime]
	if question == "wear" {
		heat := in.NewValues()
		for i := range m {
			out[i], heat[i] = nucleon.Log10LossRate(m[i], tau), in.Parameters[heatShare]
		}
		return in.Answer(law.Numbers("log10_rate", out), law.Numbers("heat", heat)), nil
	}
	kind, neutronStar := in.Words("kind"), in.Kind("neutron-star")
	gone := goneMasses()[int(in.Parameters[goneWord])]
	for i := range m {
		end := gone
		if kind[i] == neutronStar {
			end = in.Parameters[expansionMass]
		}
		out[i] = math.Max(atOnce, nucleon.Log10Wait(m[i], end, tau))
	}
	return in.Answer(law.Numbers("wait", out)), nil
}
