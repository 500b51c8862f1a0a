package darkenergydecay

import "wane/sim/law"

// Recollapse returns the law dark-energy-decay/recollapse: the energy of space
// turns negative, and everything ends in a crunch at a date that is given.
func Recollapse() law.Law { return recollapse{} }

type recollapse struct{}

func (recollapse) Describe() law.Card {
	const kallosh = "Kallosh, R., Kratochvil, J., Linde, A., Linder, E. V. & Shmakova, M. 2003, J. Cosmol. Astropart. Phys. 10, 015"
	const wang = "Wang, Y., Kratochvil, J. M., Linde, A. & Shmakova, M. 2004, J. Cosmol. Astropart. Phys. 12, 006"
	return law.Card{
		Process: "dark-energy-decay", Name: "recollapse", Version: "1",
		Summary: "the energy of space turns negative, and everything ends in a crunch at a given date",
		Formula: "cumulative hazard 0 before the date, infinite from it on",
		Domain:  "the date is an assumption: data exclude a crunch within 24 (42) Gyr from now at 95 (68) % for a linear potential",
		Sources: []string{kallosh, wang},
		Notes: []string{
			"Space expands by the law of process expansion up to the crunch: how it slows down, turns and warms up again is left out.",
		},
		Effect:    "everything-ends",
		Questions: []law.Question{{Name: "end", Inputs: []string{"log10_date"}}},
		Parameters: []law.Parameter{{Name: "date", Unit: "yr", Log10: true, Doc: "date of the crunch since the Big Bang",
			Low: 10.3, High: 11, Preset: 10.69897000433602, Citation: "assumption (5e10 yr); lower end " + kallosh}},
	}
}

func (recollapse) Answer(_ string, in law.Batch) (law.Batch, error) {
	return atDate(in, in.Parameters[0]), nil
}
