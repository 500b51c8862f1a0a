package evaporation

import (
	"wane/sim/law"
	"wane/sim/num"
	"wane/sim/physics/hole"
)

type page struct{}

// Page is evaporation with grey-body factors: photons and gravitons, and the
// massive particles as the hole grows hot enough for them.
func Page() law.Law { return page{} }

func (page) Describe() law.Card {
	return law.Card{
		Process: "evaporation", Name: "page", Version: "1",
		Summary: "a hole radiates photons and gravitons, and at the very end all that is light enough",
		Formula: "dM/dt = -alpha hbar c^4/(G^2 M^2), alpha = sum over species of alpha_s exp(-8 pi G M m_s b_s/(hbar c)); " +
			"M in solMass, t in yr. Lifetime of M with photons and gravitons alone (alpha = 3.7475e-5): 1.159e67 yr (M/solMass)^3",
		Domain: "uncharged holes without spin, from 1e-19 solMass (below it heavier particles join, for the last hour) to 1e22 solMass (the horizon of the sky); " +
			"error 1e-3 in the lifetime of a stellar hole, if every neutrino has mass",
		Sources: []string{
			"Page, D. N. 1976, Phys. Rev. D 13, 198",
			"MacGibbon, J. H. 1991, Phys. Rev. D 44, 376 (switching on of massive particles; from memory)",
		},
		Notes: []string{
			"a hole loses nothing while the sky is hotter than it, and radiates as if alone afterwards (assumption)",
			"three neutrinos of two states each; kT of one solar mass is 5.3e-12 eV, so they join below 1e-8 solMass",
			"a massless lightest neutrino would shorten the life of a stellar hole by a factor 3.2: another law",
			"no spin: a hole that was born spinning fast lives 2.0 to 2.7 times shorter (Page 1976, Phys. Rev. D 14, 3260)",
		},
		Accepts: accepts(), Questions: questions(), Thresholds: thresholds(), Wears: "loss",
		Parameters: []law.Parameter{{
			Name: "lightest_neutrino", Unit: "eV", Log10: true,
			Doc: "mass of the lightest neutrino; the other two follow from the measured splittings",
			Low: -6, High: -0.3468, Preset: -3,
			Citation: "preset: assumption; upper end, 0.45 eV: KATRIN Collaboration 2025, Science 388, 180 (from memory)",
		}},
	}
}

func (page) Answer(question string, in law.Batch) (law.Batch, error) {
	lightest := num.Exp10(in.Parameters[0])
	e := hole.NewEmission(hole.Light(), hole.Neutrinos(lightest), hole.Massive())
	return answer(question, in, greyBody{e}), nil
}

// greyBody radiates an emission.
type greyBody struct{ emission *hole.Emission }

func (g greyBody) alpha(m float64) float64         { return g.emission.Alpha(m) }
func (g greyBody) log10Lifetime(m float64) float64 { return g.emission.Log10Lifetime(m) }
