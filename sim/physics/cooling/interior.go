package cooling

import (
	"math"

	"wane/sim/num"
	"wane/sim/physics/constant"
	"wane/sim/physics/structure"
)

// Ions are what a white dwarf is made of.
type Ions struct{ Z, A float64 }

// HeliumIons are those of a helium dwarf.
func HeliumIons() Ions { return Ions{2, 4} }

// CarbonOxygenIons stand for the mixture, taken as one kind of ion; elements
// heavier than neon are left out: assumptions.
func CarbonOxygenIons() Ions { return Ions{7, 14} }

// OxygenNeonIons stand for the mixture, taken as one kind of ion: an
// assumption.
func OxygenNeonIons() Ions { return Ions{9, 18} }

// Envelope holds what a cooling white dwarf's surface and freezing are
// described by; see the package for the symbols.
type Envelope struct {
	Ratio    float64 // r0, at 0.6 solar masses and 8841 km: 600 .. 1010
	Exponent float64 // q: 1/7 .. 2
	Freezing float64 // Gamma: 175 .. 230
	Latent   float64 // heat of freezing an ion over k T_melt: 0.77, or 0 for none
}

// DefaultEnvelope is the envelope law of [ShapiroTeukolsky1983] carried on to
// T = 0 without change (assumption), and freezing at Gamma = 175 with a latent
// heat of 0.77 k T_melt an ion (from memory).
func DefaultEnvelope() Envelope {
	return Envelope{Ratio: 1010, Exponent: 1.0 / 7, Freezing: 175, Latent: 0.77}
}

// Dwarf is a white dwarf as its cooling sees it. It never changes once made.
type Dwarf struct {
	mass, radius float64 // solar masses, km
	ions         Ions
	exponent     float64
	ratio        float64 // T_c/T at 5000 K
	debye        float64 // theta, K
	melting      float64 // K
	ionHeat      float64 // 3k for all ions, J/K
	electronHeat float64 // heat capacity of all electrons over T_c, J/K^2
	latentHeat   float64 // of all ions over T_melt, J/K
}

// knee is where the two pieces of the envelope law meet, K.
const knee = 5000

// densityOverMean is the density that stands for the whole dwarf, over its
// mean density: assumption, about the mass-weighted mean.
const densityOverMean = 2.2

// debyeOverPlasma is theta over the ion plasma temperature: assumption, from
// the mean phonon frequencies of a Coulomb crystal.
const debyeOverPlasma = 0.45

// latentSpread is the factor in interior temperature, on either side of the
// melting temperature, within which a dwarf freezes: from the centre outwards,
// as the density falls. Assumption; dates below 1000 K do not feel it.
const latentSpread = 1.1

// fineStructure is e^2/(4 pi eps0 hbar c). Source: CODATA 2022.
const fineStructure = 7.2973525643e-3

// NewDwarf returns the dwarf of mass m.
//
//	n      = rho/(A m_u), rho = 2.2 x mean density
//	C_ions = 3k Debye(theta/T_c) an ion
//	C_el   = Z pi^2 k^2 T_c sqrt(1+x^2)/(m_e c^2 x^2) an ion, x = p_F/(m_e c)
//	r      = r0 [(R/8841 km)^2 (0.6/M)]^2/7
//
// Units: m in solar masses.
// Domain: 0.001 <= m <= 1.44; radius of [structure.WhiteDwarfRadius].
// Error: one density for the whole dwarf and one kind of ion: 10 to 20 % in
// heat.
// Source: [ShapiroTeukolsky1983], chs. 3 and 4.
func NewDwarf(m float64, ions Ions, env Envelope) Dwarf {
	const kB, c = constant.Boltzmann, constant.C
	r := structure.WhiteDwarfRadius(m)
	rho := densityOverMean * structure.MeanDensity(m, r)
	d := Dwarf{mass: m, radius: r, ions: ions, exponent: env.Exponent}
	d.ratio = env.Ratio * num.Pow(r/8841*(r/8841)*0.6/m, 2.0/7)
	d.debye, d.melting = ions.DebyeTemperature(rho), ions.MeltingTemperature(rho, env.Freezing)
	x := constant.HBar * num.Pow(3*math.Pi*math.Pi*ions.density(rho)*ions.Z, 1.0/3) / (constant.ElectronMass * c)
	count := m * constant.Sun / (ions.A * constant.AtomicMass)
	d.ionHeat, d.latentHeat = 3*kB*count, env.Latent*kB*count
	d.electronHeat = count * ions.Z * math.Pi * math.Pi * kB * kB * math.Sqrt(1+x*x) / (constant.ElectronMass * c * c * x * x)
	return d
}

// density is the number of ions in a cubic metre.
func (i Ions) density(rho float64) float64 { return rho * 1000 / (i.A * constant.AtomicMass) }

// squaredCharge is Z^2 e^2/(4 pi eps0), J m.
func (i Ions) squaredCharge() float64 {
	return i.Z * i.Z * fineStructure * constant.HBar * constant.C
}

// DebyeTemperature returns theta of the ion crystal.
//
//	theta = 0.45 T_p, T_p = (hbar/k) sqrt(4 pi n Z^2 e^2/m_ion) (Gaussian units)
//
// Units: rho in g/cm3, result in K.
// Domain: rho > 0. Error: 0.45 is an assumption.
// Source: [ShapiroTeukolsky1983], sec. 4.3, for T_p.
func (i Ions) DebyeTemperature(rho float64) float64 {
	plasma := math.Sqrt(4 * math.Pi * i.density(rho) * i.squaredCharge() / (i.A * constant.AtomicMass))
	return debyeOverPlasma * constant.HBar / constant.Boltzmann * plasma
}

// MeltingTemperature returns the temperature at which the Coulomb parameter
// of the ions reaches gamma.
//
//	T = Z^2 e^2/(gamma a k), a = (3/(4 pi n))^1/3 (Gaussian units)
//
// Units: rho in g/cm3, result in K.
// Domain: rho, gamma > 0. Error: rounding.
// Source: [ShapiroTeukolsky1983], sec. 4.3.
func (i Ions) MeltingTemperature(rho, gamma float64) float64 {
	a := num.Pow(3/(4*math.Pi*i.density(rho)), 1.0/3)
	return i.squaredCharge() / (a * constant.Boltzmann * gamma)
}

// Interior returns the interior temperature behind an effective temperature,
// and how it changes: d T_c/d ln T.
//
//	T_c/T = r (T/5000)^1/7 above 5000 K, 1 + (r - 1)(T/5000)^q below
//
// Units: K.
// Domain: t > 0.
// Error: 0.2 to 0.3 dex at 5000 K between envelopes; not known far below.
// Source: [ShapiroTeukolsky1983], eq. 4.1.11, above the knee; below it an
// assumption that r0 and q span.
func (d Dwarf) Interior(t float64) (core, slope float64) { return d.interior(num.Log(t), t) }

// lnKnee is ln 5000.
const lnKnee = 8.517193191416238

func (d Dwarf) interior(lnT, t float64) (core, slope float64) {
	if t > knee {
		core = t * d.ratio * num.Exp((lnT-lnKnee)/7)
		return core, core * 8 / 7
	}
	excess := (d.ratio - 1) * num.Exp((lnT-lnKnee)*d.exponent)
	return t * (1 + excess), t * (1 + (1+d.exponent)*excess)
}

// HeatCapacity returns the heat capacity of the whole dwarf, J/K, at interior
// temperature core, K: ions, electrons, and the heat of freezing, given off
// smoothly within a factor 1.1 of the melting temperature.
func (d Dwarf) HeatCapacity(core float64) float64 {
	heat := d.ionHeat*Debye(d.debye/core) + d.electronHeat*core
	const width = latentSpread - 1/latentSpread
	u := (latentSpread - core/d.melting) / width
	if u > 0 && u < 1 { // the integral of 30 u^2 (1-u)^2 is 1
		heat += d.latentHeat / width * 30 * u * u * (1 - u) * (1 - u)
	}
	return heat
}
