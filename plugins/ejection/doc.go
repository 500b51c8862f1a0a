// Package ejection holds the laws of how a galaxy throws its objects out, one
// slow encounter at a time. The law of this process is also the run's frame:
// it answers how large and how fast the galaxy is.
//
// Every law here lets a share xi of the objects go per half-mass relaxation
// time. Object i has the susceptibility s_i = (m_i/solMass)^-beta; the rate of
// the clock is that of one unit of susceptibility,
//
//	rate = xi/t_rh  number/sum_ejection
//
// so that the hazards s_i rate average to xi/t_rh at every moment.
package ejection

import (
	"math"

	"wane/sim/law"
	"wane/sim/num"
	"wane/sim/physics/dynamics"
)

// The clocks: one that throws out, and one that hits nobody and only counts
// relaxation times.
const (
	clockEjection   = "ejection"
	clockRelaxation = "relaxation"
)

func ejectionClock() law.Clock {
	return law.Clock{Name: clockEjection, Doc: "thrown out by slow encounters", Outcome: "ejected", Fate: law.FateAdrift}
}

// Parameters every law here has, first on its card and in this order.
const (
	xi = iota
	beta
	gamma
)

func parameters(more ...law.Parameter) []law.Parameter {
	return append([]law.Parameter{
		{Name: "xi", Doc: "share of the objects lost per half-mass relaxation time",
			Low: 1. / 300, High: 0.05, Preset: 1. / 140,
			Citation: "Binney & Tremaine 2008, section 7.5.2 (e-folds in 140); Spitzer 1987: 7.4e-3; upper end with a mass spectrum, van Putten 2011"},
		{Name: "beta", Doc: "how much more readily light objects go: susceptibility ~ mass^-beta",
			Low: 0, High: 1, Preset: 0.5, Citation: "assumption"},
		{Name: "gamma", Doc: "the Coulomb logarithm is ln(gamma number), at least 1",
			Low: 0.02, High: 0.4, Preset: 0.11, Citation: "Giersz & Heggie 1994, MNRAS 268, 257 (0.02 with a mass spectrum; 0.4 Spitzer 1987)"},
	}, more...)
}

// lightest is a mass below that of any nucleon, solar masses: lighter objects
// are as susceptible as one of that mass, so that none is so without bound.
const lightest = 1e-60

// expose answers the susceptibilities. What has no mass cannot be thrown.
func expose(in law.Batch) []float64 {
	m, out := in.Values("mass"), in.NewValues()
	for i := range m {
		switch {
		case !(m[i] > 0):
			out[i] = 0
		case in.Parameters[beta] == 0:
			out[i] = 1
		default:
			out[i] = num.Pow(math.Max(m[i], lightest), -in.Parameters[beta])
		}
	}
	return out
}

// galaxy is one row of galaxy values.
type galaxy struct {
	number, mass, sum, carried, radius0 float64
}

// frame is the galaxy's answer to one row.
type frame struct {
	log10Ejection, log10Relaxation float64 // log10 of 1/yr
	radius, dispersion             float64 // pc, km/s
}

// smallest keeps the radius of a galaxy that has lost nearly all above zero, pc.
const smallest = 1e-100

// frameOf works out the rates of a galaxy heated by zeta C = heating. An empty
// galaxy has no rate and keeps its first radius.
func frameOf(g galaxy, p []float64, heating float64) frame {
	if !(g.mass > 0) || !(g.number > 0) {
		return frame{math.Inf(-1), math.Inf(-1), math.Max(smallest, g.radius0), 0}
	}
	r := math.Max(smallest, dynamics.ContractedRadius(g.radius0, g.mass, g.carried, heating))
	coulomb := dynamics.CoulombLogarithm(g.number, p[gamma])
	f := frame{
		log10Ejection:   math.Inf(-1),
		log10Relaxation: -dynamics.Log10HalfMassRelaxation(g.number, g.mass, r, coulomb),
		radius:          r,
		dispersion:      dynamics.Dispersion(g.mass, r),
	}
	if g.sum > 0 {
		f.log10Ejection = num.Log10(p[xi]) + f.log10Relaxation + num.Log10(g.number) - num.Log10(g.sum)
	}
	return f
}
