package vacuumdecay

import "wane/sim/law"

// FourVolume returns the law vacuum-decay/four-volume: bubbles form at a
// constant rate per volume and time, and the galaxy ends when the first one in
// its past light cone reaches it.
func FourVolume() law.Law { return fourVolume{} }

type fourVolume struct{}

func (fourVolume) Describe() law.Card {
	return law.Card{
		Process: "vacuum-decay", Name: "four-volume", Version: "1",
		Summary: "bubbles form at a constant rate per volume and time: the wait hangs on how much of space-time the sky lets a world line see",
		Formula: "cumulative hazard V4(t)/tau^4, V4 the four-volume of the past light cone, c = 1. De Sitter: exponential, mean " +
			"tau^4/((4 pi/3)(c/H)^3), 10^524.7 yr; matter alone: V4 = 0.17136 t^4, median 1.418 tau, 10^139.15 yr",
		Domain:  "any sky; the rate is known to 200 decades at best, and today's masses allow a stable vacuum at 1-2 sigma",
		Sources: []string{andreassen},
		Notes: []string{
			"tau is the fourth root of a rate, (Gamma/V)^(-1/4), and no waiting time. From the printed rate, 10^-683 GeV^4, it is 10^139.07 yr " +
				"and the wait in de Sitter space 10^524.9 yr.",
			"Lifetimes of 10^161 yr (earlier version of the source) and 10^880 yr (announced in 2024) have been stated too (from memory).",
			oneEvent,
		},
		Effect:     everythingEnds,
		Questions:  []law.Question{{Name: "end", Inputs: []string{"log10_four_volume"}}},
		Parameters: []law.Parameter{lifetime("fourth root of one over the rate per volume and time, c = 1")},
	}
}

func (fourVolume) Answer(_ string, in law.Batch) (law.Batch, error) {
	return ofFourVolume(in, -4*in.Parameters[0]), nil
}
