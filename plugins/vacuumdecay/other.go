package vacuumdecay

import (
	"wane/sim/law"
	"wane/sim/physics/cosmology"
)

// Other returns the law vacuum-decay/other: the rate of another calculation.
func Other() law.Law { return other{} }

type other struct{}

func (other) Describe() law.Card {
	const chigusa = "Chigusa, S., Moroi, T. & Shoji, Y. 2017, Phys. Rev. Lett. 119, 211801"
	return law.Card{
		Process: "vacuum-decay", Name: "other", Version: "1",
		Summary: "as four-volume, with the rate of another calculation: 10^-577 a Gyr and Gpc3",
		Formula: "cumulative hazard gamma V4(t), V4 the four-volume of the past light cone; mean wait in de Sitter space " +
			"1/(gamma (4 pi/3)(c/H)^3), 10^583.2 yr",
		Domain:  "any sky; the band of the rate is 1170 decades wide",
		Sources: []string{chigusa, "Chigusa, S., Moroi, T. & Shoji, Y. 2018, Phys. Rev. D 97, 116012"},
		Notes: []string{
			"A revision announced in 2024 by one of the authors gives a lifetime of 10^880 yr (conference abstract, from memory).",
			oneEvent,
		},
		Effect:    everythingEnds,
		Questions: []law.Question{{Name: "end", Inputs: []string{"log10_four_volume"}}},
		Parameters: []law.Parameter{{Name: "rate", Unit: "Gyr-1.Gpc-3", Log10: true, Doc: "bubbles per time and volume",
			Low: -1465, High: -295, Preset: -577, Citation: chigusa + ", and the masses' uncertainty"}},
	}
}

func (other) Answer(_ string, in law.Batch) (law.Batch, error) {
	return ofFourVolume(in, cosmology.LogVacuumRate(in.Parameters[0])), nil
}
