// Package evaporation holds the laws of how black holes lose mass by radiating
// it away. The laws do not see the sky: each answers its own temperature, and
// the host holds the loss back until the sky is colder.
package evaporation

import (
	"math"

	"wane/sim/law"
	"wane/sim/physics/hole"
)

// atOnce is the wait of a hole that has no mass left, log10 yr.
const atOnce = -1000

// thresholds ends a hole of either kind when its mass is gone.
func thresholds() []law.Threshold {
	return []law.Threshold{
		{Kind: "black-hole", Mass: 0, Becomes: law.Gone, Outcome: "evaporated"},
		{Kind: "central-hole", Mass: 0, Becomes: law.Gone, Outcome: "evaporated"},
	}
}

// accepts is what every law of this process speaks for.
func accepts() law.Accepts { return law.Accepts{Kinds: []string{"black-hole", "central-hole"}} }

// questions are those every law of this process answers, from the mass alone.
func questions() []law.Question {
	return []law.Question{
		{Name: "wear", Inputs: []string{"mass"}},
		{Name: "foretell", Inputs: []string{"mass"}},
		{Name: "heat", Inputs: []string{"mass"}},
	}
}

// radiator is what tells one law of this process from another.
type radiator interface {
	alpha(m float64) float64
	log10Lifetime(m float64) float64
}

// answer answers the three questions for holes that emit like r.
func answer(question string, in law.Batch, r radiator) law.Batch {
	m, out := in.Values("mass"), in.NewValues()
	switch question {
	case "wear":
		heat := in.NewValues()
		for i := range m {
			out[i], heat[i] = hole.Log10LossRate(m[i], r.alpha(m[i])), 0
		}
		return in.Answer(law.Numbers("log10_rate", out), law.Numbers("heat", heat))
	case "foretell":
		for i := range m {
			out[i] = math.Max(atOnce, r.log10Lifetime(m[i]))
		}
		return in.Answer(law.Numbers("wait", out))
	}
	for i := range m {
		out[i] = hole.Log10Temperature(m[i])
	}
	return in.Answer(law.Numbers("log10_temperature", out))
}
