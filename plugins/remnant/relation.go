package remnant

import (
	"wane/sim/law"
	"wane/sim/physics/remnants"
)

// card completes the card of a law that leaves white dwarfs by a relation
// between birth mass and final mass.
func card(c law.Card) law.Card {
	c.Process = "remnant"
	c.Notes = append(c.Notes,
		"Low end (assumption): stars below the mass where the first line meets M_f = M_i, none of which has died yet, leave their whole mass as helium.",
		"Assumptions: the scatter is Gaussian, the same for all masses, cut at 3 sigma; no white dwarf above 1.40 solMass; oxygen-neon above 1.05.",
		"Extrapolated to collapse.m_up, which bounds this law from above. Companions and metals are left out.",
	)
	c.Accepts = law.Accepts{Kinds: []string{"star"}, Column: "mass", High: law.AtParameter("collapse.m_up")}
	c.Questions = []law.Question{
		{Name: "die", Words: []string{"white-dwarf"}},
		{Name: "remain", Inputs: []string{"mass", "u"}},
	}
	c.Parameters = []law.Parameter{{Name: "scatter", Unit: "solMass", Doc: "scatter of white-dwarf masses between like stars", Low: 0, High: 0.1, Preset: 0.06,
		Citation: "assumption: about the residual of Cummings et al. 2018"}}
	return c
}

// relationTail is how the formulas of these laws end.
const relationTail = "; plus scatter x the Gaussian quantile of u cut at 3 sigma; kept in 0.10 .. min(M_i, 1.40). Carbon-oxygen, above 1.05 oxygen-neon"

// answer answers both questions by a relation.
func answer(question string, in law.Batch, r remnants.Relation) law.Batch {
	if question == "die" {
		chance := in.NewValues()
		for i := range chance {
			chance[i] = 1
		}
		return in.Answer(law.Numbers(law.ChanceColumn("white-dwarf"), chance))
	}
	scatter, helium := in.Parameters[0], r.HeliumLimit()
	star, u := in.Values("mass"), in.Values("u")
	mass, composition := in.NewValues(), in.NewWords()
	for i := range mass {
		mass[i] = r.WhiteDwarf(star[i], u[i], scatter)
		switch {
		case star[i] < helium:
			composition[i] = law.Helium
		case mass[i] > remnants.OxygenNeonMass:
			composition[i] = law.OxygenNeon
		default:
			composition[i] = law.CarbonOxygen
		}
	}
	return in.Answer(law.Numbers("mass", mass), law.Codes("composition", composition))
}
