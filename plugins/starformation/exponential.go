package starformation

import (
	"wane/sim/law"
	"wane/sim/physics/stars"
)

// Exponential returns the law star-formation/exponential: a rate that falls
// by a factor e every tau_sf.
func Exponential() law.Law { return exponential{} }

type exponential struct{}

// Indices of the parameters.
const (
	exponentialStart = iota
	exponentialTau
)

// log10Of7e9 is log10(7e9).
const log10Of7e9 = 9.845098040014257

func (exponential) Describe() law.Card {
	return law.Card{
		Process: "star-formation", Name: "exponential", Version: "1",
		Summary: "star formation falls exponentially from its start on",
		Formula: "rate ~ exp(-(t - start)/tau_sf); date = start - tau_sf ln(1 - u)",
		Domain: "any u below 1. One number for a whole history: good to a factor of two in the rate at any date; " +
			"the last of 2e11 births falls at 1.9e11 yr",
		Sources: []string{
			"assumption: the usual one-parameter history of a galactic disc",
			"Licquia & Newman 2015, ApJ 806, 96 (today's rate 1.65 +- 0.19 solMass/yr, which tau_sf = 7e9 yr meets for 2e11 objects)",
		},
		Notes: []string{
			"No recycling of gas and no infall: laws that have them stretch star formation to 1e13 - 1e14 yr (Adams & Laughlin 1997).",
			"No bursts and no mergers with other galaxies.",
		},
		Questions: []law.Question{{Name: "birth", Inputs: []string{"u"}}},
		Parameters: []law.Parameter{
			exponentialStart: {Name: "start", Unit: "yr", Doc: "date of the first birth", Log10: true, Low: 8, High: 10, Preset: 9, Citation: "assumption"},
			exponentialTau: {Name: "tau_sf", Unit: "yr", Doc: "time in which the rate falls by a factor e", Log10: true,
				Low: 9.4771212547196624, High: 10.301029995663981, Preset: log10Of7e9, Citation: "assumption: 3e9 .. 2e10 yr fit today's rate and mass"},
		},
	}
}

func (exponential) Answer(question string, in law.Batch) (law.Batch, error) {
	start, tau := in.Parameters[exponentialStart], in.Parameters[exponentialTau]
	u, date := in.Values("u"), in.NewValues()
	for i := range date {
		date[i] = stars.BirthDate(u[i], start, tau)
	}
	return in.Answer(law.Numbers("log10_date", date)), nil
}
