package hole

import (
	"math"

	"wane/sim/num"
	"wane/sim/physics/constant"
)

// Spin of a kind of particle, in halves of hbar.
type Spin int

// The spins whose emission is tabulated.
const (
	Scalar   Spin = 0
	Half     Spin = 1
	Vector   Spin = 2
	Graviton Spin = 4
)

// StateAlpha returns alpha of one helicity state of massless particles of a
// spin: 7.438e-5, 4.0917e-5, 1.6819e-5, 1.918e-6 for spin 0, 1/2, 1, 2.
//
// Error: 1e-3 against the totals that Page prints for spin 1/2, 1, 2. The
// values come from integrating the radial wave equation for l <= 6.
//
// Source: Page 1976 (totals), recomputed.
func StateAlpha(s Spin) float64 {
	switch s {
	case Scalar:
		return 7.438e-5
	case Half:
		return 4.0917e-5
	case Vector:
		return 1.6819e-5
	case Graviton:
		return 1.9185e-6
	}
	return math.NaN()
}

// threshold is b in the switch-on exp(-b m c^2 / kT) of massive particles.
func threshold(s Spin) float64 {
	switch s {
	case Scalar:
		return 0.376
	case Half:
		return 0.221
	case Vector:
		return 0.166
	}
	return 0.105
}

// Species is one kind of particle that a hole radiates.
type Species struct {
	Name   string
	Spin   Spin
	States float64 // helicities, particles and antiparticles counted
	EV     float64 // rest energy, eV; 0 for massless
}

// Alpha of the species when the hole is far hotter than its mass.
func (s Species) Alpha() float64 { return s.States * StateAlpha(s.Spin) }

// SwitchMass is the mass of hole, solar masses, at which emission is down by a
// factor e because the particle has mass: kT = b m c^2. +Inf when massless.
//
// The switch exp(-b m c^2/kT) = exp(-M/SwitchMass) is the form of MacGibbon
// 1991 (b = 0.376, 0.221, 0.166, 0.105 for spin 0, 1/2, 1, 2; from memory).
func (s Species) SwitchMass() float64 {
	kT := sunTemperature * constant.Boltzmann / constant.EV // eV at one solar mass
	return kT / (threshold(s.Spin) * s.EV)
}

// Rest energies, eV (Particle Data Group 2022), and the squared splittings of
// the neutrinos' masses, eV^2 (normal order).
const (
	electronEV     = 510998.95
	muonEV         = 105.6583755e6
	chargedPionEV  = 139.57039e6
	neutralPionEV  = 134.9768e6
	solarSplitting = 7.5e-5
	atmosSplitting = 2.5e-3
)

// Light returns photons and gravitons: all that a hole of stellar mass emits
// if every neutrino has mass.
func Light() []Species {
	return []Species{
		{"photon", Vector, 2, 0},
		{"graviton", Graviton, 2, 0},
	}
}

// MasslessNeutrinos returns n flavours of massless neutrinos, two states each.
func MasslessNeutrinos(n int) []Species {
	return []Species{{"massless neutrino", Half, 2 * float64(n), 0}}
}

// Neutrinos returns three massive neutrinos, two states each, of which the
// lightest has the given mass in eV and the others follow from the measured
// splittings in the normal order.
func Neutrinos(lightest float64) []Species {
	heavier := func(splitting float64) float64 { return math.Sqrt(lightest*lightest + splitting) }
	return []Species{
		{"lightest neutrino", Half, 2, lightest},
		{"second neutrino", Half, 2, heavier(solarSplitting)},
		{"heaviest neutrino", Half, 2, heavier(atmosSplitting)},
	}
}

// Massive returns the particles that join in the last moments of a life:
// electrons, muons and pions. Heavier ones join below 1e11 kg, for the last
// hour, and are left out.
func Massive() []Species {
	return []Species{
		{"electron", Half, 4, electronEV},
		{"muon", Half, 4, muonEV},
		{"charged pion", Scalar, 2, chargedPionEV},
		{"neutral pion", Scalar, 1, neutralPionEV},
	}
}

// Emission is what a hole radiates: a sum over species, each with its switch.
// It is immutable and safe for concurrent use. Make it with [NewEmission].
type Emission struct {
	always   float64 // alpha of the massless species
	alpha    []float64
	switches []float64 // switch masses, solar masses
	heaviest float64   // largest of switches
	complete float64   // alpha with everything switched on
}

// NewEmission adds up species.
func NewEmission(lists ...[]Species) *Emission {
	e := &Emission{}
	for _, list := range lists {
		for _, s := range list {
			e.complete += s.Alpha()
			if s.EV == 0 {
				e.always += s.Alpha()
				continue
			}
			e.alpha = append(e.alpha, s.Alpha())
			e.switches = append(e.switches, s.SwitchMass())
			e.heaviest = max(e.heaviest, s.SwitchMass())
		}
	}
	return e
}

// Massless returns alpha of a hole too cold for any massive particle.
func (e *Emission) Massless() float64 { return e.always }

// Alpha returns alpha of a hole of mass m, solar masses.
//
//	alpha = sum over species of alpha_s exp(-m/SwitchMass_s)
//
// Error: 1e-3 far from a switch, not known near one.
func (e *Emission) Alpha(m float64) float64 {
	sum := e.always
	for i, a := range e.alpha {
		if x := m / e.switches[i]; x < 700 {
			sum += a * num.Exp(-x)
		}
	}
	return sum
}
