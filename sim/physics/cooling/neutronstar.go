package cooling

import (
	"wane/sim/num"
	"wane/sim/physics/constant"
)

// NeutronStarStart is log10 of the surface temperature, K, that newborn
// neutron stars are held at. Assumption; they stay there for less than a year.
const NeutronStarStart = 7.0

// Neutron-star constants, +-0.5 dex together (from memory).
const (
	neutronRadius  = 11.5    // km, at 1.4 solar masses
	neutronGravity = 1.755   // surface gravity, 1e14 cm/s2
	neutronHeat    = 1e32    // heat capacity over T_b/1e9 K, J/K
	neutrinoLight  = 1e33    // neutrino luminosity over (T_b/1e9 K)^8, W
	envelopeScale  = 1.288e8 // K
	envelopePower  = 0.455
)

// NeutronStarInterior returns the temperature below the envelope of a neutron
// star, and how it changes: d T_b/d ln T.
//
//	T_b = 1.288e8 K (T6^4/g14)^0.455, but at least T
//
// Units: t, the surface temperature, and the results in K.
// Domain: t > 0; the fit holds for 1e5 .. 1e7 K, and below 3.7e3 K T_b = T.
// Source: [GudmundssonEtAl1983].
func NeutronStarInterior(t float64) (interior, slope float64) {
	t6 := t / 1e6
	fit := envelopeScale * num.Pow(t6*t6*t6*t6/neutronGravity, envelopePower)
	if fit > t {
		return fit, 4 * envelopePower * fit
	}
	return t, t
}

// neutronRate is -dt/d ln T of a neutron star, s: minimal cooling.
//
//	C dT_b = -(L_nu + L) dt
//	C = 1e32 J/K T9, L_nu = 1e33 W T9^8, L = 4 pi R^2 sigma T^4
func neutronRate(t float64) float64 {
	interior, slope := NeutronStarInterior(t)
	t9 := interior / 1e9
	t92 := t9 * t9
	t98 := t92 * t92 * t92 * t92
	return neutronHeat * t9 * slope / (neutrinoLight*t98 + watts(neutronRadius, t))
}

// NeutronStars is the cooling curve of neutron stars. It never changes once
// made.
type NeutronStars struct {
	lnT, logAge []float64 // T falling, age rising
}

// The curve's nodes: surface temperatures from 1e7 K to 1e3 K.
const (
	neutronSteps = 4 * 64
	neutronStep  = num.Ln10 / 64
)

// NewNeutronStars works the curve out.
func NewNeutronStars() *NeutronStars {
	n := &NeutronStars{lnT: make([]float64, neutronSteps+1), logAge: make([]float64, neutronSteps+1)}
	// The age at the start, as if it had cooled from any higher temperature by
	// neutrinos: int C dT_b/L_nu = C T_b/(6 L_nu).
	x := NeutronStarStart * num.Ln10
	interior, _ := NeutronStarInterior(num.Exp(x))
	t9 := interior / 1e9
	t92 := t9 * t9
	age := neutronHeat * 1e9 / (6 * neutrinoLight * t92 * t92 * t92)
	n.lnT[0], n.logAge[0] = x, num.Log10(age/constant.Year)
	for i := 1; i <= neutronSteps; i++ {
		age += gauss(neutronRate, x, x-neutronStep)
		x -= neutronStep
		n.lnT[i], n.logAge[i] = x, num.Log10(age/constant.Year)
	}
	return n
}

// Temperature returns log10 of the surface temperature of a neutron star at
// an age: neutrinos first, then photons, at last T ~ t^-1/2.
//
// Units: logAge in log10 years, result in log10 K.
// Domain: any age; falls, or stays, as the age rises.
// Error: +-0.5 dex in age (superfluidity, envelope, mass); curve within 1e-3
// dex of the integral. Rotational or magnetic heat may hold old pulsars near
// 1e5 K for 1e9 yr and more.
// Special cases: 7 at -Inf, -Inf at +Inf.
// Source: minimal cooling with the envelope of [GudmundssonEtAl1983];
// constants from memory. Checked by testdata/published/cooling.csv.
func (n *NeutronStars) Temperature(logAge float64) float64 {
	last := len(n.lnT) - 1
	if !(logAge > n.logAge[0]) {
		return NeutronStarStart
	}
	if logAge >= n.logAge[last] {
		return n.tail(logAge)
	}
	low, high := 0, last
	for high-low > 1 {
		if middle := (low + high) / 2; n.logAge[middle] <= logAge {
			low = middle
		} else {
			high = middle
		}
	}
	w := (logAge - n.logAge[low]) / (n.logAge[high] - n.logAge[low])
	return (n.lnT[low] + w*(n.lnT[high]-n.lnT[low])) / num.Ln10
}

// tail continues the curve where T_b = T and photons carry all:
//
//	t = t1 + k (T^-2 - T1^-2),  k = 1e23 J/K^2/(8 pi R^2 sigma)
func (n *NeutronStars) tail(logAge float64) float64 {
	last := len(n.lnT) - 1
	k := num.Log10(neutronHeat / 1e9 / (2 * watts(neutronRadius, 1)) / constant.Year)
	later := num.Sub10(logAge, n.logAge[last]) // log10(t - t1)
	inverse := num.Add10(later-k, -2*n.lnT[last]/num.Ln10)
	return -inverse / 2
}

// gauss integrates f of T over ln T from high to low, by two-point Gauss.
func gauss(f func(float64) float64, high, low float64) float64 {
	const node = 0.57735026918962576 // 1/sqrt 3
	middle, half := (high+low)/2, (high-low)/2
	return half * (f(num.Exp(middle-node*half)) + f(num.Exp(middle+node*half)))
}
