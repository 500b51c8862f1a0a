package collapse

import (
	"math"

	"wane/sim/law"
	"wane/sim/physics/remnants"
)

// AllFailAbove returns the law collapse/all-fail-above: every star above a
// mass at birth falls in whole, unseen.
func AllFailAbove() law.Law { return allFailAbove{} }

type allFailAbove struct{}

// Indices of the parameters; those of neutron-star masses follow.
const (
	failUp = iota
	failLimit
	failThrown
	failNeutron
)

func (allFailAbove) Describe() law.Card {
	const source = "Raithel, Sukhbold & Ozel 2018, ApJ 856, 35"
	return law.Card{
		Process: "collapse", Name: "all-fail-above", Version: "1",
		Summary: "no star above 18 solMass explodes: twice as many holes, and heavier ones",
		Formula: "chance of a neutron star: 1 below limit, 0 from there on. Hole: f M_core + (1 - f) M_all up to 40, M_core = -2.049 + 0.4140 m, " +
			"M_all = 15.52 - 0.3294 x - 0.02121 x^2 + 0.003120 x^3, x = m - 25.97; 5.697 + 7.8598e8 m^-4.858 from 45; linear between. " + neutronFormula,
		Domain: "stars from m_up to 120 solMass at solar metals (above it as at the end). The fits scatter by 1 - 2 solMass",
		Sources: []string{
			"Kochanek et al. 2008, ApJ 684, 1336 (a search for stars that vanish)",
			"Smartt 2009, ARA&A 47, 63 (no star much above 17 solMass seen to explode)",
			source + " (masses of holes)",
			"Antoniadis et al. 2016, arXiv:1605.01665 (double Gaussian)",
		},
		Notes: []string{
			"That all fail, and the edge at 18, are assumptions after those searches; all numbers are quoted from memory.",
			"Falling in whole means f = 0: nothing of the envelope that winds have left is thrown off. Between 40 and 45 solMass the hole is interpolated (assumption).",
			"Mass thrown off goes to the gas. Kicks are left out.",
		},
		Accepts:   heavy(),
		Questions: questions(),
		Parameters: append([]law.Parameter{
			failUp:     upParameter(),
			failLimit:  {Name: "limit", Unit: "solMass", Doc: "least mass at birth of a star that fails", Low: 18, High: 25, Preset: remnants.FailureLimit, Citation: "assumption, after Smartt 2009 and Kochanek et al. 2008"},
			failThrown: {Name: "f", Doc: "share of the envelope thrown off when a hole forms below 40 solMass", Low: 0, High: 1, Preset: 0, Citation: source + " (f_ej); preset: assumption, the whole star"},
		}, neutronParameters()...),
	}
}

func (allFailAbove) Answer(question string, in law.Batch) (law.Batch, error) {
	p := in.Parameters
	if question == "die" {
		return dieAt(in, p[failLimit]), nil
	}
	return remain(in, p[failNeutron:], func(star float64) float64 {
		return math.Min(remnants.Hole(star, p[failThrown]), star)
	}), nil
}
