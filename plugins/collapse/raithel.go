package collapse

import (
	"wane/sim/law"
	"wane/sim/physics/remnants"
)

// Raithel returns the law collapse/raithel: neutron stars and holes by fits
// to a large set of exploding models.
func Raithel() law.Law { return raithel{} }

type raithel struct{}

// Indices of the parameters; those of neutron-star masses follow.
const (
	raithelUp = iota
	raithelThrown
	raithelNeutron
)

func (raithel) Describe() law.Card {
	const source = "Raithel, Sukhbold & Ozel 2018, ApJ 856, 35"
	return law.Card{
		Process: "collapse", Name: "raithel", Version: "1",
		Summary: "neutron star or black hole by islands of explodability",
		Formula: "chance of a neutron star: 1 below 15 solMass, 0.679 to 17.8, 0.833 to 18.5, 0.500 to 21.7, 0 to 25.2, 0.652 to 27.5, 0 to 60, 0.40 above. " +
			"Hole: f M_core + (1 - f) M_all from 15 to 40, M_core = -2.049 + 0.4140 m, M_all = 15.52 - 0.3294 x - 0.02121 x^2 + 0.003120 x^3, x = m - 25.97; " +
			"5.697 + 7.8598e8 m^-4.858 from 45; linear between. " + neutronFormula,
		Domain: "stars from m_up to 120 solMass at solar metals (above it as at the end). The fits scatter by 1 - 2 solMass; " +
			"m_up, the islands from 15 to 25 and metals each move the ratio of neutron stars to holes by about two",
		Sources: []string{
			source,
			"Sukhbold et al. 2016, ApJ 821, 38 (the models)",
			"Antoniadis et al. 2016, arXiv:1605.01665 (double Gaussian)",
		},
		Notes: []string{
			"Coefficients and chances are quoted from memory.",
			"Between 40 and 45 solMass the hole is interpolated (assumption).",
			"No electron-capture explosions apart: every star from m_up to 15 leaves a neutron star.",
			"Mass thrown off goes to the gas. Kicks are left out.",
		},
		Accepts:   heavy(),
		Questions: questions(),
		Parameters: append([]law.Parameter{
			raithelUp:     upParameter(),
			raithelThrown: {Name: "f", Doc: "share of the envelope thrown off when a hole forms below 40 solMass", Low: 0, High: 1, Preset: 0.9, Citation: source + " (f_ej)"},
		}, neutronParameters()...),
	}
}

func (raithel) Answer(question string, in law.Batch) (law.Batch, error) {
	if question == "die" {
		return die(in), nil
	}
	p := in.Parameters
	return remain(in, p[raithelNeutron:], func(star float64) float64 { return remnants.Hole(star, p[raithelThrown]) }), nil
}

func die(in law.Batch) law.Batch {
	star, neutron, hole := in.Values("mass"), in.NewValues(), in.NewValues()
	for i := range neutron {
		neutron[i] = remnants.NeutronStarChance(star[i])
		hole[i] = 1 - neutron[i]
	}
	return in.Answer(law.Numbers(law.ChanceColumn("neutron-star"), neutron), law.Numbers(law.ChanceColumn("black-hole"), hole))
}
