package collapse

import (
	"wane/sim/law"
	"wane/sim/physics/remnants"
)

// Direct returns the law collapse/direct: stars above a mass at birth fall
// straight into a hole of their core, or of all of them.
func Direct() law.Law { return direct{} }

type direct struct{}

// Indices of the parameters; those of neutron-star masses follow.
const (
	directUp = iota
	directLimit
	directLost
	directNeutron
)

func (direct) Describe() law.Card {
	const source = "Raithel, Sukhbold & Ozel 2018, ApJ 856, 35"
	return law.Card{
		Process: "collapse", Name: "direct", Version: "1",
		Summary: "stars above 20 solMass fall straight into holes that grow with the star",
		Formula: "chance of a neutron star: 1 below limit, 0 from there on. Hole: f M_core + (1 - f) m, M_core = -2.049 + 0.4140 m. " + neutronFormula,
		Domain:  "stars from m_up on. An upper bound for the masses of holes: winds strip stars above 40 solMass at solar metals, which only nearly metal-free ones escape",
		Sources: []string{
			source + " (mass of the core, fitted from 15 to 40 solMass)",
			"Antoniadis et al. 2016, arXiv:1605.01665 (double Gaussian)",
		},
		Notes: []string{
			"The law and the edge at 20 are assumptions, and so is the core's line beyond 40 solMass; its coefficients are quoted from memory.",
			"Cannot be reconciled with collapse/raithel above 45 solMass, where winds leave 6 .. 13 solMass of a star and this law up to 120.",
			"Mass lost goes to the gas. Kicks are left out.",
		},
		Accepts:   heavy(),
		Questions: questions(),
		Parameters: append([]law.Parameter{
			directUp:    upParameter(),
			directLimit: {Name: "limit", Unit: "solMass", Doc: "least mass at birth of a star that leaves a hole", Low: 18, High: 25, Preset: 20, Citation: "assumption"},
			directLost:  {Name: "f", Doc: "share of what lies above the core that is lost: 1 leaves the core, 0 the whole star", Low: 0, High: 1, Preset: 0.9, Citation: source + " (f_ej)"},
		}, neutronParameters()...),
	}
}

func (direct) Answer(question string, in law.Batch) (law.Batch, error) {
	p := in.Parameters
	if question == "die" {
		return dieAt(in, p[directLimit]), nil
	}
	return remain(in, p[directNeutron:], func(star float64) float64 { return remnants.DirectHole(star, p[directLost]) }), nil
}
