package nucleon

import (
	"math"

	"wane/sim/num"
	"wane/sim/physics/constant"
)

// protonEnergy is the rest energy of a proton, J.
const protonEnergy = constant.ProtonMass * constant.C * constant.C

// Log10OperatorLife estimates the life of a nucleon that decays through an
// operator of dimension n that is suppressed by the energy scale Lambda:
//
//	tau = hbar/(m_p c^2) (Lambda/m_p c^2)^(2(n-4))
//
// Shapes: scalar to scalar.
// Units: log10Scale log10 of Lambda in GeV; result log10 of years.
// Domain: n > 4. Error: a power of the coupling, some decades.
//
// Source: Adams & Laughlin 1997, section IV (dimensional estimate).
func Log10OperatorLife(n, log10Scale float64) float64 {
	gev := num.Log10(protonEnergy / constant.EV * 1e-9)
	return num.Log10(constant.HBar/protonEnergy/constant.Year) + 2*(n-4)*(log10Scale-gev)
}

// Log10VirtualHoleLife estimates the life of a nucleon that decays when two of
// its quarks meet in a black hole of Planck mass:
//
//	tau = hbar/(m_p c^2) (M_P/m_p)^power
//
// Shapes: scalar to scalar.
// Units: result log10 of years.
// Domain: power > 0; 4 for two quarks in four dimensions, 8 and more where
// further particles must meet. Error: some decades.
//
// Sources: Zeldovich 1976, Phys. Lett. A 59, 254; Adams et al. 2001, Int. J.
// Mod. Phys. A 16, 2399. Checked by testdata/published/nucleon.csv.
func Log10VirtualHoleLife(power float64) float64 {
	planck := math.Sqrt(constant.HBar * constant.C / constant.G) // kg
	return num.Log10(constant.HBar/protonEnergy/constant.Year) + power*num.Log10(planck/constant.ProtonMass)
}

// protonRadius is the charge radius of the proton, m (CODATA 2018).
const protonRadius = 8.414e-16

// Log10TunnelLife estimates the life of a nucleon in a nucleus when baryons
// vanish by tunnelling between the vacua of the electroweak field: once in so
// many crossing times of a proton as 't Hooft's factor says.
//
//	tau = 2 r_p/c exp(4 pi/alpha_W)
//
// Shapes: scalar to scalar.
// Units: inverse is 1/alpha_W; result log10 of years.
// Domain: inverse > 0. Error: what stands before the exponential, ten decades.
//
// Sources: 't Hooft 1976, Phys. Rev. Lett. 37, 8; Adams & Laughlin 1997,
// section IV. Checked by testdata/published/nucleon.csv.
func Log10TunnelLife(inverse float64) float64 {
	return num.Log10(2*protonRadius/constant.C/constant.Year) + float64(4*math.Pi/num.Ln10*inverse)
}
