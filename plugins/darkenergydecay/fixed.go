package darkenergydecay

import (
	"math"

	"wane/sim/law"
)

// Fixed returns the law dark-energy-decay/fixed: dark energy decays at a date
// that is given.
func Fixed() law.Law { return fixed{} }

type fixed struct{}

func (fixed) Describe() law.Card {
	return law.Card{
		Process: "dark-energy-decay", Name: "fixed", Version: "1",
		Summary: "dark energy decays at a given date: afterwards no horizon keeps anything warm",
		Formula: "cumulative hazard 0 before the date, infinite from it on",
		Domain:  "no theory fixes the date: anything from 1e10 yr from now to never",
		Sources: []string{"assumption: to try dates one by one"},
		Notes: []string{
			"Before 10^11.8 yr the sky is still warmer than a hole of 1e9 solMass, which then waits until 10^35 yr; later it has begun to evaporate already (recomputed).",
			after,
		},
		Effect:    decays,
		Questions: []law.Question{{Name: "end", Inputs: []string{"log10_date"}}},
		Parameters: []law.Parameter{{Name: "date", Unit: "yr", Log10: true, Doc: "date since the Big Bang", Low: 10.2, High: 1000, Preset: 11,
			Citation: "assumption"}},
	}
}

func (fixed) Answer(_ string, in law.Batch) (law.Batch, error) {
	return atDate(in, in.Parameters[0]), nil
}

// atDate answers question end for what comes at a date.
func atDate(in law.Batch, l float64) law.Batch {
	date, hazard := in.Values("log10_date"), in.NewValues()
	for i := range hazard {
		hazard[i] = math.Inf(-1)
		if date[i] >= l {
			hazard[i] = math.Inf(1)
		}
	}
	return in.Answer(law.Numbers("log10_hazard", hazard))
}
