package evaporation

import (
	"wane/sim/law"
	"wane/sim/physics/hole"
)

// BlackBody is evaporation as a black body of the size of the horizon: the
// estimate of many textbooks.
func BlackBody() law.Law {
	return newEvaporating(law.Card{
		Name: "black-body", Version: "1",
		Summary: "a hole radiates like a black body of the size and temperature of its horizon",
		Formula: "dM/dt = -hbar c^4/(15360 pi G^2 M^2), lifetime 5120 pi G^2 M^3/(hbar c^4) = 2.0955e67 yr (M/solMass)^3; M in solMass, t in yr",
		Domain: "uncharged holes without spin; 1.8 times too long for photons and gravitons, 18 times too long for three massless neutrinos too, " +
			"because grey-body factors and the number of particles are ignored",
		Sources: []string{"Hawking, S. W. 1975, Commun. Math. Phys. 43, 199"},
	}, func([]float64) radiator { return horizon{} })
}

// horizon radiates as a black body.
type horizon struct{}

func (horizon) log10Rate(m, _ float64) float64 { return hole.Log10LossRate(m, hole.BlackBodyAlpha) }
func (horizon) log10Wait(m, _ float64) float64 { return hole.Log10Lifetime(m, hole.BlackBodyAlpha) }
