package remnant

import (
	"wane/sim/law"
	"wane/sim/physics/remnants"
)

// CummingsSecond returns the law remnant/cummings-second: the same measured
// white dwarfs as remnant/cummings with other stellar ages.
func CummingsSecond() law.Law { return cummingsSecond{} }

type cummingsSecond struct{}

func (cummingsSecond) Describe() law.Card {
	return card(law.Card{
		Name: "cummings-second", Version: "1",
		Summary: "white dwarfs by the same clusters with other stellar models: lighter ones from the heaviest stars",
		Formula: "M_f = M_i below 0.5215 solMass (helium, no scatter); 0.0873 M_i + 0.476 below 2.80; 0.181 M_i + 0.210 below 3.65; 0.0835 M_i + 0.565 above" + relationTail,
		Domain:  "measured for M_i = 0.87 .. 8.20 solMass, carried on to both sides. Coefficients (slope, offset) are good to (0.019, 0.033), (0.041, 0.131), (0.014, 0.073)",
		Sources: []string{"Cummings, Kalirai, Tremblay et al. 2018, ApJ 866, 21, eqs. 1-3"},
		Notes: []string{
			"Coefficients are quoted from memory.",
			"The pieces as printed join to 0.004 solMass at 2.80 and 0.001 at 3.65 and are left so.",
			"Half as many white dwarfs above 1.16 solMass as by remnant/cummings: of the same stars, so the two cannot both be right.",
		},
	})
}

func (cummingsSecond) Answer(question string, in law.Batch) (law.Batch, error) {
	return answer(question, in, remnants.CummingsSecond()), nil
}
