package nucleondecay

import (
	"math"

	"wane/sim/law"
)

type stable struct{}

// Stable is matter whose nucleons never decay.
func Stable() law.Law { return stable{} }

func (stable) Describe() law.Card {
	return law.Card{
		Process: "nucleon-decay", Name: "stable", Version: "1",
		Idle:    true,
		Summary: "nucleons never decay",
		Formula: "dM/dt = 0",
		Domain:  "every body; holds if baryon number is conserved at every energy",
		Sources: []string{"Dyson, F. J. 1979, Rev. Mod. Phys. 51, 447"},
		Accepts: accepts(),
		Questions: []law.Question{
			{Name: "wear", Inputs: []string{"mass"}},
			{Name: "foretell", Inputs: []string{"mass"}},
		},
		Wears: "loss",
	}
}

func (stable) Answer(question string, in law.Batch) (law.Batch, error) {
	out := in.NewValues()
	if question == "foretell" {
		for i := range out {
			out[i] = math.Inf(1)
		}
		return in.Answer(law.Numbers("wait", out)), nil
	}
	heat := in.NewValues()
	for i := range out {
		out[i], heat[i] = math.Inf(-1), 0
	}
	return in.Answer(law.Numbers("log10_rate", out), law.Numbers("heat", heat)), nil
}
