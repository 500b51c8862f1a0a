package vacuumdecay

import "wane/sim/law"

// Literal returns the law vacuum-decay/literal: the published time read as a
// mean wait.
func Literal() law.Law { return literal{} }

type literal struct{}

func (literal) Describe() law.Card {
	return law.Card{
		Process: "vacuum-decay", Name: "literal", Version: "1",
		Summary: "the published lifetime of the vacuum read as the mean wait, as popular accounts do",
		Formula: "cumulative hazard t/tau",
		Domain:  "a reading that the source does not carry in a sky with a horizon: without one it is right to 0.15 dex",
		Sources: []string{andreassen},
		Notes: []string{
			"The source's time is the fourth root of a rate per four-volume. Taken at its word the rate gives 10^524.7 yr in a de Sitter sky: see four-volume.",
			oneEvent,
		},
		Effect:     everythingEnds,
		Questions:  []law.Question{{Name: "end", Inputs: []string{"log10_date"}}},
		Parameters: []law.Parameter{lifetime("mean wait since the Big Bang")},
	}
}

func (literal) Answer(_ string, in law.Batch) (law.Batch, error) {
	date, hazard := in.Values("log10_date"), in.NewValues()
	for i := range hazard {
		hazard[i] = date[i] - in.Parameters[0]
	}
	return in.Answer(law.Numbers("log10_hazard", hazard)), nil
}
