package evaporation

import (
	"wane/sim/law"
	"wane/sim/physics/hole"
)

type blackBody struct{}

// BlackBody is evaporation as a black body of the size of the horizon: the
// estimate of many textbooks.
func BlackBody() law.Law { return blackBody{} }

func (blackBody) Describe() law.Card {
	return law.Card{
		Process: "evaporation", Name: "black-body", Version: "1",
		Summary: "a hole radiates like a black body of the size and temperature of its horizon",
		Formula: "dM/dt = -hbar c^4/(15360 pi G^2 M^2), lifetime 5120 pi G^2 M^3/(hbar c^4) = 2.0955e67 yr (M/solMass)^3; M in solMass, t in yr",
		Domain: "uncharged holes without spin; 1.8 times too long for photons and gravitons, 18 times too long for three massless neutrinos too, " +
			"because grey-body factors and the number of particles are ignored",
		Sources: []string{"Hawking, S. W. 1975, Commun. Math. Phys. 43, 199"},
		Notes:   []string{"a hole loses nothing while the sky is hotter than it, and radiates as if alone afterwards (assumption)"},
		Accepts: accepts(), Questions: questions(), Thresholds: thresholds(), Wears: "loss",
	}
}

func (blackBody) Answer(question string, in law.Batch) (law.Batch, error) {
	return answer(question, in, horizon{}), nil
}

// horizon radiates as a black body.
type horizon struct{}

func (horizon) alpha(float64) float64           { return hole.BlackBodyAlpha }
func (horizon) log10Lifetime(m float64) float64 { return hole.Log10Lifetime(m, hole.BlackBodyAlpha) }
