package massfunction

import (
	"wane/sim/law"
	"wane/sim/physics/imf"
)

// ChabrierSystem returns the law mass-function/chabrier-system: the log-normal
// of systems, in which an unresolved pair is one object.
func ChabrierSystem() law.Law { return chabrierSystem{} }

type chabrierSystem struct{}

func (chabrierSystem) Describe() law.Card {
	c := imf.ChabrierSystem()
	const source = chabrierSource + ", eq. 18"
	return law.Card{
		Process: "mass-function", Name: "chabrier-system", Version: "1",
		Summary: "Chabrier's log-normal for systems, unresolved pairs as one: fewer and heavier objects",
		Formula: "dN/dlog10 m = 0.086 exp(-(log10 m - log10 centre)^2/(2 width^2)) up to 1 solMass, 0.0443 m^-(slope_heavy - 1) above; " +
			"mass = the exact quantile of u (inverse error function below 1 solMass)",
		Domain:  "0.01 .. 120 solMass; mean 0.634, median 0.222 solMass. Good to tens of per cent from 0.1 to 1",
		Sources: []string{source},
		Notes: []string{
			"Coefficients are quoted from memory.",
			"A pair then lives, dies and is thrown out as one star of the pair's light (assumption): good where companions stay together, as in a hard binary.",
			"The two parts as printed meet at 1 solMass to 0.2 % only, and are left so.",
			chabrierStep,
			"The same for all metals and dates (assumption).",
		},
		Questions: []law.Question{{Name: "mass", Inputs: []string{"u"}}},
		Parameters: []law.Parameter{
			chabrierLow:    {Name: "low", Unit: "solMass", Doc: "lightest object", Low: 0.01, High: 0.1, Preset: 0.01, Citation: "assumption"},
			chabrierHigh:   {Name: "high", Unit: "solMass", Doc: "heaviest star", Low: 80, High: 150, Preset: 120, Citation: "assumption: upper end of the stellar models used for lifetimes"},
			chabrierCentre: {Name: "centre", Unit: "solMass", Doc: "mass where the log-normal peaks", Low: 0.18, High: 0.28, Preset: c.Centre, Citation: source + "; range: assumption, as wide as that of single stars"},
			chabrierWidth:  {Name: "width", Doc: "standard deviation of the log-normal, decades of mass", Low: 0.55, High: 0.62, Preset: c.Width, Citation: source + "; range: assumption, as wide as that of single stars"},
			chabrierSlope:  {Name: "slope_heavy", Doc: "exponent of dN/dm above 1 solMass", Low: 2.0, High: 2.6, Preset: c.Slope, Citation: chabrierSource + ", Table 1: 1.3 +- 0.3 per unit logarithm"},
		},
	}
}

func (chabrierSystem) Answer(question string, in law.Batch) (law.Batch, error) {
	return chabrierMasses(in, imf.ChabrierSystem())
}
