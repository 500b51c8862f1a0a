package curvature

import (
	"wane/sim/law"
	"wane/sim/physics/pairs"
)

// Falcke is matter that makes pairs of particles by its curvature alone, and
// swells as it loses mass.
func Falcke() law.Law {
	return newThinning(law.Card{
		Name: "falcke", Version: "1",
		Summary: "dense matter makes pairs of particles without a horizon, and thins out as it swells",
		Formula: "dM/dt = -M^4/(tau0 M0^3), t(M) = (tau0/3) ((M0/M)^3 - 1), " + timeOfRho +
			"; below 1e-3 solMass exponential. Brown dwarfs keep their size: dM/dt = -M^(5/2)/(tau0 M0^(3/2)). M in solMass, tau in yr, rho in g/cm3",
		Domain: "cold bodies of matter; 25 per cent in kappa; mean density for the whole body (the centre is up to 50 times denser, its time 1/350)",
		Notes: []string{
			"density falls as M^2 in white dwarfs, neutron stars and relics, as M in brown dwarfs, and is that of a planet below 1e-3 solMass (assumption)",
		},
	}, func(b pairs.Body) pairs.Body { return b })
}
