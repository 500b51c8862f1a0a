package coldmatter

import (
	"wane/sim/num"
	"wane/sim/physics/constant"
)

// Nuclei that fuse in pairs: charge, nucleons, and log10 of the astrophysical
// factor at zero energy, MeV barn (orders of magnitude, from memory).
type Nuclei struct{ Z, A, Log10S float64 }

// Carbon is carbon-12.
func Carbon() Nuclei { return Nuclei{6, 12, 16} }

// Oxygen is oxygen-16.
func Oxygen() Nuclei { return Nuclei{8, 16, 24} }

// Silicon is silicon-28.
func Silicon() Nuclei { return Nuclei{14, 28, 40} }

// Log10LatticeTime returns how long nuclei on a lattice at zero temperature
// last until they have fused in pairs by their zero-point motion.
//
//	tau = n/(2 R)
//	R = 1e46 C rho A Z^4 S lambda^(3-1.25) exp(-2.638/sqrt lambda)  cm^-3 s^-1
//	lambda = [rho/(1.3574e11 A)]^(1/3) / (A Z^2),  C = 3.90
//
// so that log tau goes as Z A^(2/3) rho^(-1/6).
//
// Units: rho in g/cm3, result log10 of years.
// Domain: rho > 0, static body-centred lattice of one element, electrons that
// do not screen beyond the lattice. Error: decades, mainly from S.
// Sources: [SalpeterVanHorn1969]; [GasquesEtAl2005], static lattice (from
// memory). Checked by testdata/published/coldmatter.csv.
func (n Nuclei) Log10LatticeTime(rho float64) float64 {
	const (
		prefactor = 3.90
		penetrate = 2.638
		power     = 3 - 1.25
		scale     = 1.3574e11 // g/cm3 per nucleon
		log10E    = 1 / num.Ln10
	)
	log10Lambda := (num.Log10(rho)-num.Log10(scale*n.A))/3 - num.Log10(n.A*n.Z*n.Z)
	perGram := 46 + num.Log10(prefactor*n.A) + 4*num.Log10(n.Z) + n.Log10S +
		power*log10Lambda - penetrate*log10E*num.Exp10(-log10Lambda/2)
	ions := -num.Log10(n.A * constant.AtomicMass * 1e3) // per gram
	return ions - num.Log10(2) - perGram - constant.Log10Year
}
