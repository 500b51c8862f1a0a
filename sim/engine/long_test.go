package engine_test

import (
	"math"
	"testing"

	"wane/sim/engine"
	"wane/sim/engine/enginetest"
	"wane/sim/law"
)

// Clocks so slow, and ends so late, that years overflow a float64.
func TestLongDates(t *testing.T) {
	for _, rate := range []float64{-160, -250, -400} {
		f := enginetest.Frame{
			Clocks:  []law.Clock{{Name: "slow", Outcome: "went", Fate: law.FateAdrift}, {Name: "fall", Outcome: "fell", Fate: law.FateCentral}},
			Rates:   []enginetest.Rates{{Log10: rate, Number: 1.5}, {Log10: rate - 1, Mass: -1}},
			Touches: []enginetest.Touch{{Scale: 1, Power: 0.5}, {Scale: 1, Power: 1}},
		}
		holes := enginetest.Wearing{Process: "evaporation", Kinds: []string{"black-hole", "central-hole"}, Log10: rate - 0.5, Power: -1, Closed: true,
			Thresholds: []law.Threshold{
				{Kind: "black-hole", Mass: 0, Becomes: law.Gone, Outcome: "evaporated"},
				{Kind: "central-hole", Mass: 0, Becomes: law.Gone, Outcome: "evaporated"},
			}}
		relics := enginetest.Turning{Process: "tunnelling", Kinds: []string{"neutron-star"}, Log10: -rate - 1, Keeps: 1,
			Outcomes: []law.Outcome{{Word: "tunnelled", Becomes: "black-hole"}}}
		s := set(t, enginetest.Masses(0.5, 30), enginetest.Births(1, 2), enginetest.Metals(false), enginetest.Sort(0.6),
			enginetest.Lifetimes(3, 1, 0), enginetest.Remnants(), f.Law(), holes.Law(), relics.Law())
		compare(t, engine.Setup{Set: s, Objects: 300, Real: 300, Radius: 1, CentralMass: 3, Until: math.Inf(1), Seed: 5,
			Populations: populations()[:9]}, 0)
	}
}
