package expansion

import "wane/sim/law"

// LambdaCDM returns the law expansion/lambda-cdm: a flat universe whose dark
// energy is a cosmological constant.
func LambdaCDM() law.Law { return lambdaCDM{} }

type lambdaCDM struct{}

func (lambdaCDM) Describe() law.Card {
	return law.Card{
		Process: "expansion", Name: "lambda-cdm", Version: "1",
		Summary: "flat space, dark energy of constant density: the sky cools to the temperature of its horizon",
		Formula: "H^2 = H0^2 [Om a^-3 + Or a^-4 + 1 - Om - Or]; relic temperature T0/a; horizon temperature hbar H / (2 pi k)",
		Domain: "all dates after the first 1e5 yr (with radiation 0: age short of photons' by 0.17 % at 1e9 yr, under 0.05 % after 6e9 yr); " +
			"no error known in the far future if dark energy is constant, which nobody has shown",
		Sources: []string{
			planck,
			fixsen,
			"Gibbons & Hawking 1977, Phys. Rev. D 15, 2738 (horizon)",
		},
		Notes: []string{
			"Massive neutrinos count as matter, as they do in the future: hence 0.3111 and not the 0.3097 that leaves out one of them.",
			gone,
		},
		Questions:  []law.Question{{Name: "density", Inputs: []string{"log10_since"}}},
		Parameters: today(),
	}
}

func (lambdaCDM) Answer(question string, in law.Batch) (law.Batch, error) {
	constant := logDark(in.Parameters)
	return flat(in, func(int) float64 { return constant }), nil
}
