package darkenergydecay

import (
	"math"

	"wane/sim/law"
	"wane/sim/num"
)

// decays is the effect of the laws after which dark energy is gone.
const decays = "dark-energy-decays"

// after says what follows, in every law of that effect.
const after = "What follows is said by the law of process expansion: of built-in laws, dark energy is gone at once and leaves nothing."

// Drawn returns the law dark-energy-decay/drawn: dark energy may decay at any
// time from today on, with a half-life.
func Drawn() law.Law { return drawn{} }

type drawn struct{}

func (drawn) Describe() law.Card {
	return law.Card{
		Process: "dark-energy-decay", Name: "drawn", Version: "1",
		Summary: "dark energy decays at a date that chance draws, with a half-life: afterwards no horizon keeps anything warm",
		Formula: "cumulative hazard ln 2 (t - t0)/t_half, t0 today",
		Domain:  "no theory fixes the half-life: anything from 1e10 yr to never",
		Sources: []string{
			"assumption: a Poisson event",
			"Kallosh, R., Kratochvil, J., Linde, A., Linder, E. V. & Shmakova, M. 2003, J. Cosmol. Astropart. Phys. 10, 015 (not within 1e10 yr)",
		},
		Notes: []string{
			"It has not happened yet, so the wait counts from today.",
			after,
		},
		Effect:    decays,
		Questions: []law.Question{{Name: "end", Inputs: []string{"log10_date"}}},
		Parameters: []law.Parameter{
			{Name: "half_life", Unit: "yr", Log10: true, Doc: "half-life of dark energy", Low: 10, High: 1000, Preset: 11,
				Citation: "assumption; lower end: Kallosh et al. 2003"},
			{Name: "today", Unit: "yr", Log10: true, Doc: "date from which on it may decay", Low: 10, High: 10.2, Preset: 10.1396,
				Citation: "Planck Collaboration VI 2020, A&A 641, A6 (13.787e9 yr)"},
		},
	}
}

func (drawn) Answer(_ string, in law.Batch) (law.Batch, error) {
	mean, date, hazard := in.Parameters[0]-num.Log10(math.Ln2), in.Values("log10_date"), in.NewValues()
	for i := range hazard {
		hazard[i] = num.Sub10(date[i], in.Parameters[1]) - mean
	}
	return in.Answer(law.Numbers("log10_hazard", hazard)), nil
}
