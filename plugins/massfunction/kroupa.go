package massfunction

import (
	"fmt"

	"wane/sim/law"
	"wane/sim/physics/imf"
)

// Kroupa returns the law mass-function/kroupa: a broken power law with
// slopes 0.3, 1.3 and 2.3.
func Kroupa() law.Law { return kroupa{} }

type kroupa struct{}

// Indices of the parameters.
const (
	kroupaLow = iota
	kroupaHigh
	kroupaBrown
	kroupaRed
	kroupaHeavy
)

func (kroupa) Describe() law.Card {
	slopes := imf.KroupaSlopes()
	const source = "Kroupa 2001, MNRAS 322, 231, eq. 2"
	return law.Card{
		Process: "mass-function", Name: "kroupa", Version: "1",
		Summary: "Kroupa's broken power law: most objects are red dwarfs and brown dwarfs",
		Formula: "dN/dm ~ m^-0.3 below 0.08, m^-1.3 from 0.08 to 0.5, m^-2.3 above 0.5 solMass, continuous; mass = the exact quantile of u",
		Domain: "0.01 .. 120 solMass; mean 0.380, median 0.120 solMass. Slopes are uncertain by 0.7, 0.5 and 0.36: " +
			"the number of brown dwarfs by a factor of about two",
		Sources: []string{source},
		Notes: []string{
			"Every object is counted by itself: no binaries. Corrected for unresolved binaries the slope above 1 solMass is nearer 2.7.",
			"The lower limit is a choice (assumption): it divides the lightest brown dwarfs from planets, and it sets how many objects a galaxy of given mass has.",
			"The same for all metals and dates (assumption).",
		},
		Questions: []law.Question{{Name: "mass", Inputs: []string{"u"}}},
		Parameters: []law.Parameter{
			kroupaLow:   {Name: "low", Unit: "solMass", Doc: "lightest object", Low: 0.01, High: 0.1, Preset: 0.01, Citation: source + "; range: assumption"},
			kroupaHigh:  {Name: "high", Unit: "solMass", Doc: "heaviest star", Low: 80, High: 150, Preset: 120, Citation: "assumption: upper end of the stellar models used for lifetimes"},
			kroupaBrown: {Name: "slope_brown", Doc: "exponent below 0.08 solMass", Low: -0.4, High: 1.0, Preset: slopes[0], Citation: source + ": 0.3 +- 0.7"},
			kroupaRed:   {Name: "slope_red", Doc: "exponent from 0.08 to 0.5 solMass", Low: 0.8, High: 1.8, Preset: slopes[1], Citation: source + ": 1.3 +- 0.5"},
			kroupaHeavy: {Name: "slope_heavy", Doc: "exponent above 0.5 solMass", Low: 1.9, High: 2.8, Preset: slopes[2], Citation: source + ": 2.3 +- 0.36; 2.7 with binaries"},
		},
	}
}

func (kroupa) Answer(question string, in law.Batch) (law.Batch, error) {
	p := in.Parameters
	f, err := imf.Kroupa(p[kroupaLow], p[kroupaHigh], [3]float64{p[kroupaBrown], p[kroupaRed], p[kroupaHeavy]})
	if err != nil {
		return law.Batch{}, fmt.Errorf("massfunction: %w", err)
	}
	return masses(in, f), nil
}
