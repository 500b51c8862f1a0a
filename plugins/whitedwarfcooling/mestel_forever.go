package whitedwarfcooling

import (
	"wane/sim/law"
	"wane/sim/physics/cooling"
)

// MestelForever returns the law white-dwarf-cooling/mestel-forever: Mestel's
// law, carried on without end.
func MestelForever() law.Law { return mestelForever{} }

type mestelForever struct{}

func (mestelForever) Describe() law.Card {
	return law.Card{
		Process: "white-dwarf-cooling", Name: "mestel-forever", Version: "1",
		Summary: "Mestel's law at every age, as if ions never froze",
		Formula: "t = 8.8e6 yr (12/A) (M/solMass)^5/7 (mu_e/2)^-2/7 (L/solLum)^-5/7; L = 4 pi R^2 sigma T^4",
		Domain: "bright dwarfs, above 1e-4 solLum; later decades too late, since frozen ions hold less heat: the date of 5 K at 0.6 solMass is 10^18.2 yr. " +
			"Masses from 0.001 to 1.44 solMass, held outside; no floor of any kind",
		Sources: []string{
			"Mestel 1952, MNRAS 112, 583",
			"Iben & Tutukov 1984, ApJ 282, 615 (coefficient of Mestel's law)",
			"Chandrasekhar 1935, MNRAS 95, 207 (radii)",
		},
		Notes: []string{
			"A comparison with literature that extrapolates; mestel-debye has the heat of a crystal.",
			"Dwarfs younger than Mestel's law at 1e5 K are held there. Hydrogen counts as helium; iron and others as oxygen-neon.",
		},
		Accepts:   law.Accepts{Kinds: []string{"white-dwarf"}},
		Questions: []law.Question{{Name: "shine", Inputs: []string{"mass", "composition", "log10_age"}}},
	}
}

func (mestelForever) Answer(_ string, in law.Batch) (law.Batch, error) {
	mass, composition, age := in.Values("mass"), in.Words("composition"), in.Values("log10_age")
	temperature := in.NewValues()
	for i := range temperature {
		temperature[i] = cooling.NewMestelCurve(mass[i], ionsOf(composition[i])).Temperature(age[i])
	}
	return in.Answer(law.Numbers("log10_temperature", temperature)), nil
}
