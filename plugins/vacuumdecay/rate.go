package vacuumdecay

import "wane/sim/law"

const andreassen = "Andreassen, A., Frost, W. & Schwartz, M. D. 2018, Phys. Rev. D 97, 056006"

// everythingEnds is the effect of every law that lets the vacuum decay.
const everythingEnds = "everything-ends"

// oneEvent is a note of every law.
const oneEvent = "One event for the whole galaxy: it is hit by one wall of bubbles, whose flight through it counts for nothing."

// lifetime is the parameter of the laws that take the published time.
func lifetime(doc string) law.Parameter {
	return law.Parameter{Name: "lifetime", Unit: "yr", Log10: true, Doc: doc, Low: 58, High: 241, Preset: 139,
		Citation: andreassen + ": 10^139 (+102 -51) yr, over 10^58 yr at 95 % (band from memory)"}
}

// ofFourVolume answers question end for a rate of 10^logRate a yr^4.
func ofFourVolume(in law.Batch, logRate float64) law.Batch {
	volume, hazard := in.Values("log10_four_volume"), in.NewValues()
	for i := range hazard {
		hazard[i] = volume[i] + logRate
	}
	return in.Answer(law.Numbers("log10_hazard", hazard))
}
