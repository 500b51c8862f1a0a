// Package infall holds the laws of how objects fall into the central hole.
package infall

import (
	"math"

	"wane/sim/law"
	"wane/sim/num"
)

type branching struct{}

// Branching sends a share of the objects that leave the galaxy to its central
// hole instead.
func Branching() law.Law { return branching{} }

func (branching) Describe() law.Card {
	return law.Card{
		Process: "infall", Name: "branching", Version: "1",
		Summary: "of the objects that leave the galaxy a share falls into the central hole instead",
		Formula: "share = min(1, f_in (m/solMass)^g) of the hits of the clock ejection",
		Domain:  "a central hole that swallows whole; f_in is 0.01-0.1 in the literature, an estimate",
		Sources: []string{
			"Adams, F. C. & Laughlin, G. 1997, Rev. Mod. Phys. 69, 337 (1-10 %, from memory)",
			"Dyson, F. J. 1979, Rev. Mod. Phys. 51, 447 (from memory)",
		},
		Notes: []string{
			"with g > 0 masses count in solMass, not in the mean mass of what is bound: for a mean of 0.22 solMass raise f_in by 0.22^-g to compare",
			"when the clock ejection fires on an object and its draw is below the share, it falls to the central hole and is swallowed",
		},
		Accepts:   law.Accepts{},
		Questions: []law.Question{{Name: "divert", Inputs: []string{"mass"}, Words: []string{"ejection"}}},
		Parameters: []law.Parameter{
			{Name: "f_in", Doc: "share that falls in, of objects of one solar mass", Low: 0.01, High: 0.10, Preset: 0.05,
				Citation: "Adams & Laughlin 1997; Dyson 1979 (1-10 %, from memory)"},
			{Name: "g", Doc: "how much more readily heavy objects fall in: share ~ mass^g", Low: 0, High: 1, Preset: 0, Citation: "assumption"},
		},
	}
}

func (branching) Answer(_ string, in law.Batch) (law.Batch, error) {
	m, share := in.Values("mass"), in.NewValues()
	f, g := in.Parameters[0], in.Parameters[1]
	for i := range m {
		switch {
		case g == 0:
			share[i] = f
		case !(m[i] > 0):
			share[i] = 0
		default:
			share[i] = math.Min(1, f*num.Pow(m[i], g))
		}
	}
	return in.Answer(law.Numbers(law.ShareColumn("ejection"), share)), nil
}
