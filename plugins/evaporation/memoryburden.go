package evaporation

import (
	"math"

	"wane/sim/law"
	"wane/sim/physics/hole"
)

// MemoryBurden is evaporation that the information in a hole slows down once
// it has lost part of its mass.
func MemoryBurden() law.Law {
	reads := []string{"mass", "birth_mass"}
	return newEvaporating(law.Card{
		Name: "memory-burden", Version: "1",
		Summary: "a hole that has lost half its mass is held back by the information it stores",
		Formula: "dM/dt = -alpha hbar c^4/(G^2 M^2) while M > q M0, times S^-k after, S = 4 pi G M^2/(hbar c), M0 the mass at birth. " +
			"Stages: t (1 - q^3), then G^2/(alpha hbar c^4) (4 pi G/(hbar c))^k (q M0)^(3 + 2k)/(3 + 2k); M in solMass, t in yr",
		Domain: "uncharged holes without spin, down to the Planck mass; alpha = 3.7475e-5 of photons and gravitons throughout. " +
			"That the burden sets in by half the mass is argued; what follows (k, or an end of evaporation) is open",
		Sources: []string{
			"Dvali, G., Eisemann, L., Michel, M. & Zell, S. 2020, Phys. Rev. D 102, 103523 (sets in at the latest at half the mass)",
			"Alexandre, A., Dvali, G. & Koutsangelas, E. 2024, Phys. Rev. D 110, 036004 (powers of the entropy; from memory)",
			"Thoss, V., Burkert, A. & Kohri, K. 2024, Mon. Not. R. Astron. Soc. 532, 451 (from memory)",
			page1976,
		},
		Notes: []string{
			"k = 0 is Hawking's rate throughout; under stabilises the rate is zero below q M0 and the hole stays for ever",
			"massive particles join so late that they would change a stellar hole's life by less than 1e-24: left out",
			"a hole that has grown by infall or a merger begins anew with its new mass (assumption)",
		},
		Parameters: []law.Parameter{
			{Name: "part", Doc: "q, the part of its mass at birth at which the burden sets in", Low: 0.1, High: 0.99, Preset: 0.5,
				Citation: "Dvali et al. 2020 (at the latest at one half; range: assumption)"},
			{Name: "power", Doc: "k, the power of the entropy by which evaporation is then slower", Low: 0, High: 3, Preset: 1,
				Citation: "Alexandre, Dvali & Koutsangelas 2024 (1 and 2; from memory)"},
			{Name: "then", Doc: "whether evaporation then slows down or stops", Words: []string{"slows", "stabilises"},
				Citation: "Dvali et al. 2020"},
		},
		Questions: []law.Question{
			{Name: "wear", Inputs: reads}, {Name: "foretell", Inputs: reads}, {Name: "heat", Inputs: []string{"mass"}},
		},
	}, func(p []float64) radiator {
		return burdened{hole.Burden{Alpha: hole.NewEmission(hole.Light()).Massless(), Part: p[0], Power: p[1]}, p[2] == 1}
	})
}

// burdened is a hole that its memory slows down, or stops.
type burdened struct {
	hole.Burden
	stops bool
}

func (b burdened) log10Rate(m, birth float64) float64 {
	if b.stops && m <= b.Part*birth {
		return math.Inf(-1)
	}
	return b.Log10LossRate(m, birth)
}

func (b burdened) log10Wait(m, birth float64) float64 {
	if b.stops {
		return math.Inf(1)
	}
	return b.Log10Lifetime(m, birth)
}
