package collapse

import (
	"wane/sim/law"
	"wane/sim/physics/remnants"
)

// Raithel returns the law collapse/raithel: neutron stars and holes by fits
// to a large set of exploding models.
func Raithel() law.Law { return raithel{} }

type raithel struct{}

// Indices of the parameters.
const (
	raithelUp = iota
	raithelThrown
	raithelMasses
	raithelMean
	raithelScatter
	raithelMax
)

func (raithel) Describe() law.Card {
	const source = "Raithel, Sukhbold & Ozel 2018, ApJ 856, 35"
	return law.Card{
		Process: "collapse", Name: "raithel", Version: "1",
		Summary: "neutron star or black hole by islands of explodability",
		Formula: "chance of a neutron star: 1 below 15 solMass, 0.679 to 17.8, 0.833 to 18.5, 0.500 to 21.7, 0 to 25.2, 0.652 to 27.5, 0 to 60, 0.40 above. " +
			"Hole: f M_core + (1 - f) M_all from 15 to 40, M_core = -2.049 + 0.4140 m, M_all = 15.52 - 0.3294 x - 0.02121 x^2 + 0.003120 x^3, x = m - 25.97; " +
			"5.697 + 7.8598e8 m^-4.858 from 45; linear between. Neutron star: Gaussian ns_mean +- ns_scatter, or 1.393 +- 0.064 (57 %) and 1.807 +- 0.177 (43 %), clipped to 1.1 .. ns_max",
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
		Accepts: law.Accepts{Kinds: []string{"star"}, Column: "mass", Low: law.AtParameter("m_up")},
		Questions: []law.Question{
			{Name: "die", Inputs: []string{"mass"}, Words: []string{"neutron-star", "black-hole"}},
			{Name: "remain", Inputs: []string{"kind", "mass", "u"}},
		},
		Parameters: []law.Parameter{
			raithelUp:     {Name: "m_up", Unit: "solMass", Doc: "least mass at birth of a star that collapses", Low: 7, High: 9.5, Preset: remnants.Collapse, Citation: "assumption: models give 7 .. 9.5, electron-capture window 8 .. 10"},
			raithelThrown: {Name: "f", Doc: "share of the envelope thrown off when a hole forms below 40 solMass", Low: 0, High: 1, Preset: 0.9, Citation: source + " (f_ej)"},
			raithelMasses: {Name: "ns_masses", Doc: "distribution of neutron-star masses", Words: []string{"single", "double"}, Citation: "assumption; double: Antoniadis et al. 2016"},
			raithelMean:   {Name: "ns_mean", Unit: "solMass", Doc: "mean of the single Gaussian", Low: 1.25, High: 1.5, Preset: remnants.NeutronStarMean, Citation: "assumption, after measured double neutron stars"},
			raithelScatter: {Name: "ns_scatter", Unit: "solMass", Doc: "scatter of the single Gaussian", Low: 0, High: 0.2, Preset: remnants.NeutronStarScatter,
				Citation: "assumption, after measured double neutron stars"},
			raithelMax: {Name: "ns_max", Unit: "solMass", Doc: "heaviest neutron star; felt by the double Gaussian, and by a wide single one", Low: 2.0, High: 2.4, Preset: remnants.HeaviestNeutronStar,
				Citation: "assumption: heaviest pulsars are near 2.1, models allow 2.0 .. 2.4"},
		},
	}
}

func (raithel) Answer(question string, in law.Batch) (law.Batch, error) {
	if question == "die" {
		return die(in), nil
	}
	p := in.Parameters
	star, u, kind := in.Values("mass"), in.Values("u"), in.Words("kind")
	hole := in.Kind("black-hole")
	mass, composition := in.NewValues(), in.NewWords()
	for i := range mass {
		switch {
		case kind[i] == hole:
			mass[i], composition[i] = remnants.Hole(star[i], p[raithelThrown]), law.Pure
		case p[raithelMasses] == 1:
			mass[i], composition[i] = remnants.DoubleGaussian(u[i], p[raithelMax]), law.Neutrons
		default:
			mass[i], composition[i] = remnants.SingleGaussian(u[i], p[raithelMean], p[raithelScatter], p[raithelMax]), law.Neutrons
		}
	}
	return in.Answer(law.Numbers("mass", mass), law.Codes("composition", composition)), nil
}

func die(in law.Batch) law.Batch {
	star, neutron, hole := in.Values("mass"), in.NewValues(), in.NewValues()
	for i := range neutron {
		neutron[i] = remnants.NeutronStarChance(star[i])
		hole[i] = 1 - neutron[i]
	}
	return in.Answer(law.Numbers(law.ChanceColumn("neutron-star"), neutron), law.Numbers(law.ChanceColumn("black-hole"), hole))
}
