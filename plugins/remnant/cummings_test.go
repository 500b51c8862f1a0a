package remnant

import (
	"testing"

	"wane/sim/law"
	"wane/sim/law/lawtest"
)

func TestCummings(t *testing.T) { lawtest.Run(t, Cummings(), lawtest.Among(boundary{})) }

// boundary is a law of collapse with nothing but the parameter that bounds
// remnant/cummings from above.
type boundary struct{}

func (boundary) Describe() law.Card {
	return law.Card{
		Process: "collapse", Name: "boundary", Version: "1", Summary: "all holes", Formula: "hole", Domain: "all", Sources: []string{"assumption"},
		Accepts: law.Accepts{Kinds: []string{"star"}, Column: "mass", Low: law.AtParameter("m_up")},
		Questions: []law.Question{
			{Name: "die", Words: []string{"black-hole"}},
			{Name: "remain", Inputs: []string{"mass"}},
		},
		Parameters: []law.Parameter{{Name: "m_up", Unit: "solMass", Low: 7, High: 9.5, Preset: 8, Citation: "assumption"}},
	}
}

func (boundary) Answer(question string, in law.Batch) (law.Batch, error) {
	return law.Batch{}, nil
}
