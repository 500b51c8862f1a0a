package massfunction

import (
	"fmt"

	"wane/sim/law"
	"wane/sim/physics/imf"
)

// Chabrier returns the law mass-function/chabrier: a log-normal with a power
// law above one solar mass, for single stars.
func Chabrier() law.Law { return chabrier{} }

type chabrier struct{}

// Indices of the parameters, the same for both of Chabrier's forms.
const (
	chabrierLow = iota
	chabrierHigh
	chabrierCentre
	chabrierWidth
	chabrierSlope
)

const chabrierSource = "Chabrier 2003, PASP 115, 763"

// chabrierStep says of both forms what becomes of their seam.
const chabrierStep = "With a centre or width of your own the amplitude follows so that the step at 1 solMass stays as printed (assumption; the published errors go together like that)."

func (chabrier) Describe() law.Card {
	c := imf.ChabrierSingle()
	const source = chabrierSource + ", Table 1 and eq. 17"
	return law.Card{
		Process: "mass-function", Name: "chabrier", Version: "1",
		Summary: "Chabrier's log-normal for single stars: almost every second object is a brown dwarf",
		Formula: "dN/dlog10 m = 0.158 exp(-(log10 m - log10 centre)^2/(2 width^2)) up to 1 solMass, 0.0443 m^-(slope_heavy - 1) above; " +
			"mass = the exact quantile of u (inverse error function below 1 solMass)",
		Domain:  "0.01 .. 120 solMass; mean 0.353, median 0.0956 solMass. Good to tens of per cent from 0.1 to 1, the number of brown dwarfs to a factor of about two",
		Sources: []string{source},
		Notes: []string{
			"Coefficients are quoted from memory.",
			"The two parts as printed meet at 1 solMass to 0.5 % only, and are left so.",
			chabrierStep,
			"Single stars: the members of pairs are counted one by one. chabrier-system counts a pair as one object.",
			"The same for all metals and dates (assumption).",
		},
		Questions: []law.Question{{Name: "mass", Inputs: []string{"u"}}},
		Parameters: []law.Parameter{
			chabrierLow:    {Name: "low", Unit: "solMass", Doc: "lightest object", Low: 0.01, High: 0.1, Preset: 0.01, Citation: "assumption"},
			chabrierHigh:   {Name: "high", Unit: "solMass", Doc: "heaviest star", Low: 80, High: 150, Preset: 120, Citation: "assumption: upper end of the stellar models used for lifetimes"},
			chabrierCentre: {Name: "centre", Unit: "solMass", Doc: "mass where the log-normal peaks", Low: 0.063, High: 0.100, Preset: c.Centre, Citation: source + ": 0.079 +0.021 -0.016"},
			chabrierWidth:  {Name: "width", Doc: "standard deviation of the log-normal, decades of mass", Low: 0.68, High: 0.74, Preset: c.Width, Citation: source + ": 0.69 +0.05 -0.01"},
			chabrierSlope:  {Name: "slope_heavy", Doc: "exponent of dN/dm above 1 solMass", Low: 2.0, High: 2.6, Preset: c.Slope, Citation: source + ": 1.3 +- 0.3 per unit logarithm"},
		},
	}
}

func (chabrier) Answer(question string, in law.Batch) (law.Batch, error) {
	return chabrierMasses(in, imf.ChabrierSingle())
}

func chabrierMasses(in law.Batch, c imf.ChabrierForm) (law.Batch, error) {
	p := in.Parameters
	f, err := c.With(p[chabrierLow], p[chabrierHigh], p[chabrierCentre], p[chabrierWidth], p[chabrierSlope])
	if err != nil {
		return law.Batch{}, fmt.Errorf("massfunction: %w", err)
	}
	return masses(in, f), nil
}
