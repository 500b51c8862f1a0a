package expansion

import (
	"wane/sim/law"
	"wane/sim/num"
	"wane/sim/physics/cosmology"
)

// DecayingDarkEnergy returns the law expansion/decaying-dark-energy: dark
// energy fades by halves from today on.
func DecayingDarkEnergy() law.Law { return decayingDarkEnergy{} }

type decayingDarkEnergy struct{}

func (decayingDarkEnergy) Describe() law.Card {
	return law.Card{
		Process: "expansion", Name: "decaying-dark-energy", Version: "1",
		Summary: "flat space, dark energy fades by halves from today on: in the end matter alone, and no horizon keeps anything warm",
		Formula: "H^2 = H0^2 [Om a^-3 + Or a^-4 + (1 - Om - Or) 2^(-(t-t0)/t_half)], in the end a ~ t^(2/3), relic temperature ~ t^(-2/3)",
		Domain: "all dates after the first 1e5 yr, half-lives up to 1e16 yr (with longer ones ln a loses its digits before dark energy is gone); " +
			"exact once the half-life is given, which no theory does",
		Sources: []string{
			"assumption: the law of decay; " + planck,
			"Wang, Y., Kratochvil, J. M., Linde, A. & Shmakova, M. 2004, J. Cosmol. Astropart. Phys. 12, 006 (how soon data allow it to go: 24 Gyr at 95 %)",
			fixsen,
		},
		Notes: []string{
			"Constant until today, so that the age is that of lambda-cdm (assumption).",
			"What dark energy turns into is left out: it redshifts away (assumption).",
			"The horizon keeps its temperature while space accelerates, and has none afterwards (assumption).",
			gone,
		},
		Questions: []law.Question{{Name: "density", Inputs: []string{"log10_date", "log10_since"}}},
		Parameters: today(law.Parameter{Name: "half_life", Unit: "yr", Log10: true, Doc: "time in which dark energy loses half its density",
			Low: 10, High: 16, Preset: 11, Citation: "assumption; at least 1e10 yr: Kallosh et al. 2003, J. Cosmol. Astropart. Phys. 10, 015"}),
	}
}

func (decayingDarkEnergy) Answer(question string, in law.Batch) (law.Batch, error) {
	p := in.Parameters
	dark, now, date := logDark(p), num.Log10(cosmology.Age(p[hubble], p[matter], p[radiation])), in.Values("log10_date")
	return flat(in, func(i int) float64 { return cosmology.LogDarkHalving(dark, p[own], now, date[i]) }), nil
}
