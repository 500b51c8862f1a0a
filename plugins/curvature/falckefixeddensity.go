package curvature

import (
	"wane/sim/law"
	"wane/sim/physics/pairs"
)

// FalckeFixedDensity is [Falcke] for bodies that stay as dense as they were,
// as published lifetimes have it.
func FalckeFixedDensity() law.Law {
	return newThinning(law.Card{
		Name: "falcke-fixed-density", Version: "1",
		Summary: "dense matter makes pairs of particles without a horizon, and stays as dense as it was",
		Formula: "dM/dt = -M/tau0, t(M) = tau0 ln(M0/M), " + timeOfRho + "; M in solMass, tau in yr, rho in g/cm3",
		Domain:  "cold bodies of matter; 25 per cent in kappa; mean density for the whole body. Real dwarfs swell: see falcke",
		Notes: []string{
			"one density for the whole life is how lifetimes are quoted; it makes them 1e6 times too short for a swelling dwarf (assumption)",
		},
	}, pairs.Body.Rigid)
}
