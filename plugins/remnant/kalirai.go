package remnant

import (
	"wane/sim/law"
	"wane/sim/physics/remnants"
)

// Kalirai returns the law remnant/kalirai: one straight line.
func Kalirai() law.Law { return kalirai{} }

type kalirai struct{}

func (kalirai) Describe() law.Card {
	return card(law.Card{
		Name: "kalirai", Version: "1",
		Summary: "white dwarfs by one straight line through clusters old and young",
		Formula: "M_f = M_i below 0.4422 solMass (helium, no scatter); 0.109 M_i + 0.394 above" + relationTail,
		Domain:  "measured for M_i = 1.2 .. 6.5 solMass, carried on to both sides. Slope and offset are good to 0.007 and 0.025",
		Sources: []string{"Kalirai et al. 2008, ApJ 676, 594, eq. 1"},
		Notes:   []string{"Coefficients are quoted from memory."},
	})
}

func (kalirai) Answer(question string, in law.Batch) (law.Batch, error) {
	return answer(question, in, remnants.Kalirai()), nil
}
