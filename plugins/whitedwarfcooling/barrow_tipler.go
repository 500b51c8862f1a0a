package whitedwarfcooling

import (
	"wane/sim/law"
	"wane/sim/physics/cooling"
)

// BarrowTipler returns the law white-dwarf-cooling/barrow-tipler: Mestel's law
// while bright, then down to 5 K at a given date.
func BarrowTipler() law.Law { return barrowTipler{} }

type barrowTipler struct{}

func (barrowTipler) Describe() law.Card {
	return law.Card{
		Process: "white-dwarf-cooling", Name: "barrow-tipler", Version: "1",
		Summary: "white dwarfs reach 5 K at 1e15 yr, the date that much literature has",
		Formula: "down to 1e-4 solLum: t = 8.8e6 yr (12/A) (M/solMass)^5/7 (mu_e/2)^-2/7 (L/solLum)^-5/7; " +
			"below, T ~ t^-p with p such that T = 5 K at the age of the parameter",
		Domain: "a published date, not a theory: all masses reach 5 K at one age. Masses from 0.001 to 1.44 solMass, held outside; no floor of any kind",
		Sources: []string{
			"Barrow, J. D. & Tipler, F. J. 1986, The Anthropic Cosmological Principle, Oxford University Press (from memory)",
			"Iben & Tutukov 1984, ApJ 282, 615 (coefficient of Mestel's law)",
		},
		Notes: []string{
			"The power law between 1e-4 solLum and 5 K, and beyond, is an assumption.",
			"mestel-debye reaches 5 K at 10^13.7 yr (0.6 solMass), mestel-forever at 10^18.2.",
			"Dwarfs younger than Mestel's law at 1e5 K are held there. Hydrogen counts as helium; iron and others as oxygen-neon.",
		},
		Accepts:   law.Accepts{Kinds: []string{"white-dwarf"}},
		Questions: []law.Question{{Name: "shine", Inputs: []string{"mass", "composition", "log10_age"}}},
		Parameters: []law.Parameter{{Name: "age", Unit: "yr", Log10: true, Doc: "age at which a dwarf has cooled to 5 K", Low: 12, High: 19, Preset: 15,
			Citation: "Barrow & Tipler 1986 (from memory); range: assumption"}},
	}
}

func (barrowTipler) Answer(_ string, in law.Batch) (law.Batch, error) {
	mass, composition, age := in.Values("mass"), in.Words("composition"), in.Values("log10_age")
	temperature := in.NewValues()
	for i := range temperature {
		curve := cooling.NewMestelCurve(mass[i], ionsOf(composition[i]))
		temperature[i] = curve.TemperatureThrough(age[i], in.Parameters[0])
	}
	return in.Answer(law.Numbers("log10_temperature", temperature)), nil
}
