package massfunction

import (
	"fmt"

	"wane/sim/law"
	"wane/sim/physics/imf"
)

// Salpeter returns the law mass-function/salpeter: one power law.
func Salpeter() law.Law { return salpeter{} }

type salpeter struct{}

// Indices of the parameters.
const (
	salpeterLow = iota
	salpeterHigh
	salpeterSlope
)

func (salpeter) Describe() law.Card {
	const source = "Salpeter 1955, ApJ 121, 161"
	return law.Card{
		Process: "mass-function", Name: "salpeter", Version: "1",
		Summary: "Salpeter's single power law: ever more light stars down to the lower limit, and no brown dwarfs",
		Formula: "dN/dm ~ m^-2.35; mass = the exact quantile of u, [low^(1-slope) + u (high^(1-slope) - low^(1-slope))]^(1/(1-slope))",
		Domain: "0.1 .. 120 solMass; mean 0.353, median 0.167 solMass. Measured from 0.4 to 10 solMass; " +
			"below 0.5 real stars are fewer than this by a factor that grows to five at 0.1",
		Sources: []string{source},
		Notes: []string{
			"Everything hangs on the lower limit: with 0.1 solMass there are no brown dwarfs, with 0.01 the median object has 0.017 solMass.",
			"Every object is counted by itself: no binaries. The same for all metals and dates (assumption).",
		},
		Questions: []law.Question{{Name: "mass", Inputs: []string{"u"}}},
		Parameters: []law.Parameter{
			salpeterLow:   {Name: "low", Unit: "solMass", Doc: "lightest object", Low: 0.01, High: 0.4, Preset: 0.1, Citation: "assumption: about the lightest star; 0.4 is the end of the data of " + source},
			salpeterHigh:  {Name: "high", Unit: "solMass", Doc: "heaviest star", Low: 80, High: 150, Preset: 120, Citation: "assumption: upper end of the stellar models used for lifetimes"},
			salpeterSlope: {Name: "slope", Doc: "exponent", Low: 1.9, High: 2.8, Preset: imf.SalpeterSlope, Citation: source + "; range: assumption, that of Kroupa 2001 for stars above 1 solMass"},
		},
	}
}

func (salpeter) Answer(question string, in law.Batch) (law.Batch, error) {
	p := in.Parameters
	f, err := imf.Salpeter(p[salpeterLow], p[salpeterHigh], p[salpeterSlope])
	if err != nil {
		return law.Batch{}, fmt.Errorf("massfunction: %w", err)
	}
	return masses(in, f), nil
}
