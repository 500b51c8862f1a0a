package expansion

import (
	"math"

	"wane/sim/law"
	"wane/sim/num"
)

// LambdaCDM returns the law expansion/lambda-cdm: a flat universe whose dark
// energy is a cosmological constant.
func LambdaCDM() law.Law { return lambdaCDM{} }

type lambdaCDM struct{}

// Indices of the parameters.
const (
	lambdaHubble = iota
	lambdaMatter
	lambdaRadiation
	lambdaTemperature
)

func (lambdaCDM) Describe() law.Card {
	const planck = "Planck Collaboration VI 2020, A&A 641, A6, table 2 (TT,TE,EE+lowE+lensing+BAO)"
	return law.Card{
		Process: "expansion", Name: "lambda-cdm", Version: "1",
		Summary: "flat space, dark energy of constant density: the sky cools to the temperature of its horizon",
		Formula: "H^2 = H0^2 [Om a^-3 + Or a^-4 + 1 - Om - Or]; relic temperature T0/a; horizon temperature hbar H / (2 pi k)",
		Domain: "all dates after the first 1e5 yr (with radiation 0: age short of photons' by 0.17 % at 1e9 yr, under 0.05 % after 6e9 yr); " +
			"no error known in the far future if dark energy is constant, which nobody has shown",
		Sources: []string{
			planck,
			"Fixsen 2009, ApJ 707, 916 (temperature)",
			"Gibbons & Hawking 1977, Phys. Rev. D 15, 2738 (horizon)",
		},
		Notes: []string{
			"Massive neutrinos count as matter, as they do in the future: hence 0.3111 and not the 0.3097 that leaves out one of them.",
			"If an ending makes dark energy decay, it is gone at once and leaves nothing (assumption).",
		},
		Questions: []law.Question{{Name: "density", Inputs: []string{"log10_since"}}},
		Parameters: []law.Parameter{
			lambdaHubble: {Name: "hubble", Unit: "km/s/Mpc", Doc: "expansion rate today", Low: 66, High: 74, Preset: 67.66,
				Citation: planck + "; range: Riess et al. 2022, ApJ 934, L7 (73.0 +- 1.0)"},
			lambdaMatter: {Name: "matter", Doc: "matter over the critical density today, massive neutrinos included",
				Low: 0.27, High: 0.34, Preset: 0.3111, Citation: planck},
			lambdaRadiation: {Name: "radiation", Doc: "radiation over the critical density today: 5.402e-5 photons, 9.139e-5 with massless neutrinos",
				Low: 0, High: 2e-4, Preset: 0, Citation: "assumption: left out, since it matters before 1e9 yr only"},
			lambdaTemperature: {Name: "temperature", Unit: "K", Doc: "relic radiation today", Low: 2.7, High: 2.75, Preset: 2.7255,
				Citation: "Fixsen 2009, ApJ 707, 916 (2.72548 +- 0.00057)"},
		},
	}
}

func (lambdaCDM) Answer(question string, in law.Batch) (law.Batch, error) {
	constant := num.Log10(1 - in.Parameters[lambdaMatter] - in.Parameters[lambdaRadiation])
	since, dark, curvature := in.Values("log10_since"), in.NewValues(), in.NewValues()
	for i := range dark {
		dark[i], curvature[i] = constant, 0
		if since[i] > math.Inf(-1) {
			dark[i] = math.Inf(-1)
		}
	}
	return in.Answer(law.Numbers("log10_dark", dark), law.Numbers("curvature", curvature)), nil
}
