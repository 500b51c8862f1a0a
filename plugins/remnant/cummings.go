package remnant

import (
	"wane/sim/law"
	"wane/sim/physics/remnants"
)

// Cummings returns the law remnant/cummings: white dwarfs by the measured
// relation between birth mass and final mass.
func Cummings() law.Law { return cummings{} }

type cummings struct{}

func (cummings) Describe() law.Card {
	return law.Card{
		Process: "remnant", Name: "cummings", Version: "1",
		Summary: "white dwarfs by the three-piece relation measured in star clusters, with scatter",
		Formula: "M_f = M_i below 0.5315 solMass (helium, no scatter); 0.080 M_i + 0.489 below 2.85; 0.187 M_i + 0.184 below 3.60; 0.107 M_i + 0.471 above; " +
			"plus scatter x the Gaussian quantile of u cut at 3 sigma; kept in 0.10 .. min(M_i, 1.40). Carbon-oxygen, above 1.05 oxygen-neon",
		Domain: "measured for M_i = 0.83 .. 7.20 solMass, carried on to both sides. Coefficients (slope, offset) are good to (0.016, 0.030), (0.061, 0.199), (0.016, 0.077)",
		Sources: []string{
			"Cummings, Kalirai, Tremblay et al. 2018, ApJ 866, 21, eqs. 4-6",
		},
		Notes: []string{
			"Low end (assumption): stars below 0.5315 solMass, none of which has died yet, leave their whole mass as helium.",
			"The pieces as printed join to 0.001 solMass at 2.85 and 3.60 and are left so.",
			"Assumptions: the scatter is Gaussian, the same for all masses, cut at 3 sigma; no white dwarf above 1.40 solMass; oxygen-neon above 1.05.",
			"Extrapolated from 7.20 to collapse.m_up, which bounds this law from above.",
			"Companions and metals are left out.",
		},
		Accepts: law.Accepts{Kinds: []string{"star"}, Column: "mass", High: law.AtParameter("collapse.m_up")},
		Questions: []law.Question{
			{Name: "die", Words: []string{"white-dwarf"}},
			{Name: "remain", Inputs: []string{"mass", "u"}},
		},
		Parameters: []law.Parameter{{Name: "scatter", Unit: "solMass", Doc: "scatter of white-dwarf masses between like stars", Low: 0, High: 0.1, Preset: 0.06,
			Citation: "assumption: about the residual of Cummings et al. 2018"}},
	}
}

func (cummings) Answer(question string, in law.Batch) (law.Batch, error) {
	if question == "die" {
		chance := in.NewValues()
		for i := range chance {
			chance[i] = 1
		}
		return in.Answer(law.Numbers(law.ChanceColumn("white-dwarf"), chance)), nil
	}
	scatter := in.Parameters[0]
	star, u := in.Values("mass"), in.Values("u")
	mass, composition := in.NewValues(), in.NewWords()
	for i := range mass {
		mass[i] = remnants.WhiteDwarf(star[i], u[i], scatter)
		switch {
		case star[i] < remnants.HeliumLimit:
			composition[i] = law.Helium
		case mass[i] > remnants.OxygenNeonMass:
			composition[i] = law.OxygenNeon
		default:
			composition[i] = law.CarbonOxygen
		}
	}
	return in.Answer(law.Numbers("mass", mass), law.Codes("composition", composition)), nil
}
