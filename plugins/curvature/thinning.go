package curvature

import (
	"math"

	"wane/sim/law"
	"wane/sim/physics/nucleon"
	"wane/sim/physics/pairs"
)

// thinning is a law by which matter loses mass by its density.
type thinning struct {
	card law.Card
	// shape is how a body's density follows its mass.
	shape func(pairs.Body) pairs.Body
}

// Places of the parameters on the cards.
const (
	kappa = iota
	goneWord
	expansionMass
)

// goneMasses are the masses at which matter counts as gone, by word.
func goneMasses() []float64 {
	return []float64{nucleon.Transparent, nucleon.NonDegenerate, nucleon.LastNucleon()}
}

// Sources and words that the cards share.
const (
	wondrak2023 = "Wondrak, M. F., van Suijlekom, W. D. & Falcke, H. 2023, Phys. Rev. Lett. 130, 221502"
	falcke2025  = "Falcke, H., Wondrak, M. F. & van Suijlekom, W. D. 2025, J. Cosmol. Astropart. Phys. 05, 023 (abstract)"
	timeOfRho   = "tau0 = kappa c^5/(hbar G^(5/2) rho^(3/2)) with the mean density rho at birth"
)

// newThinning completes a card with what the laws share.
func newThinning(card law.Card, shape func(pairs.Body) pairs.Body) law.Law {
	matter := func(kind string) law.Threshold {
		return law.Threshold{Kind: kind, Parameter: "gone", ByWord: goneMasses(), Becomes: law.Gone, Outcome: "thinned-out"}
	}
	reads := []string{"kind", "mass", "birth_mass"}
	card.Process, card.Wears, card.Accepts = "curvature", "loss", accepts()
	card.Sources = []string{wondrak2023, falcke2025}
	card.Notes = append(card.Notes,
		"the effect without a horizon is contested (several comments of 2023 and 2024)",
		"kappa follows from the statement that whatever is denser than 3e53 g/cm3 would be gone in 13.8e9 yr; the formula's own coefficient was not read",
		"the published 1e78 yr of white dwarfs belongs to 2e8 g/cm3, the dense end; mean densities of real masses give 1e79 to 1e82 yr",
		"a neutron star below its least mass becomes a relic, a ball of iron, which thins as white dwarfs do (assumption)",
		"beside decaying nucleons the losses add up, and a body is gone at the larger of the two laws' masses for gone: change both together",
		"nothing stays as heat (assumption)")
	card.Questions = []law.Question{{Name: "wear", Inputs: reads}, {Name: "foretell", Inputs: reads}}
	card.Parameters = []law.Parameter{
		{Name: "kappa", Doc: "coefficient of the time", Low: 2.6, High: 4.4, Preset: pairs.Kappa,
			Citation: "derived from Falcke, Wondrak & van Suijlekom 2025 (3e53 g/cm3, one digit)"},
		{Name: "gone", Doc: "what counts as gone", Words: []string{"transparent", "non-degenerate", "last-nucleon"},
			Citation: "Adams & Laughlin 1997, Rev. Mod. Phys. 69, 337, section IV"},
		{Name: "expansion_mass", Unit: "solMass", Doc: "least mass of a stable neutron star", Low: 0.09, High: 0.2, Preset: nucleon.SmallestNeutronStar,
			Citation: "Adams & Laughlin 1997, section IV; range by equation of state (from memory)"},
	}
	card.Thresholds = []law.Threshold{
		matter("brown-dwarf"), matter("white-dwarf"),
		{Kind: "neutron-star", Parameter: "expansion_mass", Becomes: "relic", Outcome: "expanded"},
		matter("relic"),
	}
	card.Kinds = []law.Kind{{Name: "relic", Doc: "ball of ordinary matter that a neutron star becomes below its least mass", Composition: law.Iron}}
	return thinning{card, shape}
}

func (l thinning) Describe() law.Card { return l.card }

func (l thinning) Answer(question string, in law.Batch) (law.Batch, error) {
	kind, m, birth, out := in.Words("kind"), in.Values("mass"), in.Values("birth_mass"), in.NewValues()
	neutronStar := in.Kind("neutron-star")
	gone := goneMasses()[int(in.Parameters[goneWord])]
	var body pairs.Body
	for i := range m {
		if i == 0 || kind[i] != kind[i-1] || birth[i] != birth[i-1] {
			body = l.shape(bodyOf(in, kind[i], birth[i]))
		}
		switch {
		case question == "wear":
			out[i] = body.Log10LossRate(m[i])
		case kind[i] == neutronStar:
			out[i] = math.Max(atOnce, body.Log10Wait(m[i], in.Parameters[expansionMass]))
		default:
			out[i] = math.Max(atOnce, body.Log10Wait(m[i], gone))
		}
	}
	if question == "wear" {
		heat := in.NewValues()
		for i := range heat {
			heat[i] = 0
		}
		return in.Answer(law.Numbers("log10_rate", out), law.Numbers("heat", heat)), nil
	}
	return in.Answer(law.Numbers("wait", out)), nil
}

// bodyOf is the body of a kind.
func bodyOf(in law.Batch, kind uint8, birth float64) pairs.Body {
	switch kind {
	case in.Kind("white-dwarf"):
		return pairs.WhiteDwarf(birth, in.Parameters[kappa])
	case in.Kind("neutron-star"):
		return pairs.NeutronStar(birth, in.Parameters[kappa])
	case in.Kind("brown-dwarf"):
		return pairs.BrownDwarf(birth, in.Parameters[kappa])
	}
	return pairs.IronBall(birth, in.Parameters[kappa])
}
