package dynamics

import "wane/sim/num"

// ContractedRadius returns the half-mass radius of a galaxy that has lost
// objects which carry no energy away, and has been heated for a while.
//
//	R = R0 [M/(M + carried)]^2 exp(zeta C),  C = int dt/t_rh
//
// It solves dR/R = 2 dM/M + zeta dt/t_rh exactly when M changes by what is
// carried off alone (E = -0.2 G M^2/R constant but for dE = zeta |E| dC). Mass
// that stars blow off does not contract the galaxy (assumption): it leaves the
// ratio alone until something is carried off.
//
// Units: r0 and result in pc, masses in solar masses, heating = zeta C pure.
// Domain: mass + carried > 0; heating is held below 600 so that R stays
// finite (N/N0 is then below 1e-370).
// Source: Henon 1965; Gieles, Heggie & Zhao 2011.
func ContractedRadius(r0, mass, carried, heating float64) float64 {
	f := mass / (mass + carried)
	return r0 * f * f * num.Exp(min(heating, 600))
}

// The closed forms below hold for equal masses and a constant Coulomb
// logarithm. Times are in units of the relaxation time at the start; xi is the
// share of objects lost per relaxation time.

// ContractingTime returns when a share x of the objects is left while energy
// is conserved, so that R ~ N^2 and t_rh ~ N^(7/2).
//
//	t = 2 (1 - x^(7/2)) / (7 xi)
func ContractingTime(x, xi float64) float64 { return 2 * (1 - num.Pow(x, 3.5)) / (7 * xi) }

// FixedRadiusTime is [ContractingTime] for a constant radius: t_rh ~ N^(1/2).
//
//	t = 2 (1 - x^(1/2)) / xi
func FixedRadiusTime(x, xi float64) float64 { return 2 * (1 - num.Pow(x, 0.5)) / xi }

// FixedHaloTime is [ContractingTime] for a dispersion that a dark halo sets:
// t_r ~ 1/N.
//
//	t = (1/x - 1) / xi
func FixedHaloTime(x, xi float64) float64 { return (1/x - 1) / xi }

// BalancedTime is [ContractingTime] when binaries or a central hole heat the
// galaxy by zeta of its energy per relaxation time, so that N ~ t^-nu with
// nu = xi/(1.5 zeta - 3.5 xi).
//
//	t = (x^(-1/nu) - 1) nu / xi
//
// Domain: zeta > 7 xi/3; else the galaxy ends in a finite time and the formula
// still holds with nu < 0.
func BalancedTime(x, xi, zeta float64) float64 {
	nu := BalancedExponent(xi, zeta)
	return (num.Pow(x, -1/nu) - 1) * nu / xi
}

// BalancedExponent is nu of [BalancedTime].
func BalancedExponent(xi, zeta float64) float64 { return xi / (1.5*zeta - 3.5*xi) }
