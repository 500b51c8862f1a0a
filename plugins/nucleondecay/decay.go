package nucleondecay

import (
	"math"

	"wane/sim/law"
	"wane/sim/physics/nucleon"
)

// decay is a law by which every nucleon has one and the same mean life.
type decay struct {
	card law.Card
	// log10Life is log10 of the mean life, yr, by the law's own parameters.
	log10Life func(own []float64) float64
}

// Places, from the end, of the parameters that every such law has.
const (
	heatShare     = 3
	goneWord      = 2
	expansionMass = 1
	shared        = 3 // how many there are
)

// goneMasses are the masses at which matter counts as gone, by word.
func goneMasses() []float64 {
	return []float64{nucleon.Transparent, nucleon.NonDegenerate, nucleon.LastNucleon()}
}

// newDecay completes a card with what all laws of one mean life share.
func newDecay(card law.Card, log10Life func(own []float64) float64) law.Law {
	matter := func(kind string) law.Threshold {
		return law.Threshold{Kind: kind, Parameter: "gone", ByWord: goneMasses(), Becomes: law.Gone, Outcome: "dissolved"}
	}
	card.Process, card.Wears, card.Accepts = "nucleon-decay", "loss", accepts()
	card.Notes = append(card.Notes,
		"a neutron star below its least mass expands: it becomes a relic, a ball of ordinary matter that dissolves like the rest (assumption)",
		"transparent: thin to its own photons, 1e21 kg; non-degenerate: 1e-3 solMass; last-nucleon: mean date of the last decay, tau (ln N + 0.577)",
		"stars are not asked: they die long before")
	card.Questions = []law.Question{
		{Name: "wear", Inputs: []string{"mass"}},
		{Name: "foretell", Inputs: []string{"kind", "mass"}},
	}
	card.Parameters = append(card.Parameters,
		law.Parameter{Name: "heat_share", Doc: "share of the rest energy that stays as heat; the rest leaves as neutrinos",
			Low: 1. / 3, High: 1, Preset: 2. / 3, Citation: "Adams & Laughlin 1997, section IV"},
		law.Parameter{Name: "gone", Doc: "what counts as dissolved", Words: []string{"transparent", "non-degenerate", "last-nucleon"},
			Citation: "Adams & Laughlin 1997, section IV"},
		law.Parameter{Name: "expansion_mass", Unit: "solMass", Doc: "least mass of a stable neutron star",
			Low: 0.09, High: 0.2, Preset: nucleon.SmallestNeutronStar, Citation: "Adams & Laughlin 1997, section IV; range by equation of state (from memory)"})
	card.Thresholds = []law.Threshold{
		matter("brown-dwarf"), matter("white-dwarf"),
		{Kind: "neutron-star", Parameter: "expansion_mass", Becomes: "relic", Outcome: "expanded"},
		matter("relic"),
	}
	card.Kinds = []law.Kind{{Name: "relic", Doc: "ball of ordinary matter that a neutron star becomes below its least mass", Composition: law.Iron}}
	return decay{card, log10Life}
}

func (d decay) Describe() law.Card { return d.card }

func (d decay) Answer(question string, in law.Batch) (law.Batch, error) {
	m, out := in.Values("mass"), in.NewValues()
	n := len(in.Parameters)
	tau := d.log10Life(in.Parameters[:n-shared])
	if question == "wear" {
		heat := in.NewValues()
		for i := range m {
			out[i], heat[i] = nucleon.Log10LossRate(m[i], tau), in.Parameters[n-heatShare]
		}
		return in.Answer(law.Numbers("log10_rate", out), law.Numbers("heat", heat)), nil
	}
	kind, neutronStar := in.Words("kind"), in.Kind("neutron-star")
	gone := goneMasses()[int(in.Parameters[n-goneWord])]
	for i := range m {
		end := gone
		if kind[i] == neutronStar {
			end = in.Parameters[n-expansionMass]
		}
		out[i] = math.Max(atOnce, nucleon.Log10Wait(m[i], end, tau))
	}
	return in.Answer(law.Numbers("wait", out)), nil
}

// massHistory is the formula that follows from the mean life.
const massHistory = "dM/dt = -M/tau, so M is reached at tau ln(M0/M); M in solMass, tau in yr (mean, not half-life). Heat left: share M c^2/tau"
