package remnant

import (
	"wane/sim/law"
	"wane/sim/physics/remnants"
)

// Salaris returns the law remnant/salaris: two straight lines that meet.
func Salaris() law.Law { return salaris{} }

type salaris struct{}

func (salaris) Describe() law.Card {
	return card(law.Card{
		Name: "salaris", Version: "1",
		Summary: "white dwarfs by two straight lines: hardly any near the limit of 1.4 solMass",
		Formula: "M_f = M_i below 0.3822 solMass (helium, no scatter); 0.134 M_i + 0.331 below 4; 0.047 M_i + 0.679 above" + relationTail,
		Domain:  "measured for M_i = 1.7 .. 8.5 solMass, carried on to lighter stars. Good to about 0.05 solMass",
		Sources: []string{"Salaris, Serenelli, Weiss & Miller Bertolami 2009, ApJ 692, 1013"},
		Notes: []string{
			"Coefficients are quoted from memory.",
			"A star of 8 solMass leaves 1.055, where remnant/cummings has 1.327: what becomes of the heaviest dwarfs differs in kind.",
		},
	})
}

func (salaris) Answer(question string, in law.Batch) (law.Batch, error) {
	return answer(question, in, remnants.Salaris()), nil
}
