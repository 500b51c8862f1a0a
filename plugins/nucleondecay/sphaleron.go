package nucleondecay

import (
	"wane/sim/law"
	"wane/sim/physics/nucleon"
)

// Sphaleron is the decay of nucleons by tunnelling between the vacua of the
// electroweak field.
func Sphaleron() law.Law {
	return newDecay(law.Card{
		Name: "sphaleron", Version: "1",
		Summary: "nuclei decay as the electroweak field tunnels from one vacuum to the next",
		Formula: "tau = t_p exp(4 pi/alpha_W), t_p = 2 r_p/c the time in which light crosses a proton, 1.8e-31 yr; " + massHistory,
		Domain: "cold bodies of ordinary matter; a rough estimate: one decade of tau is 0.6 per cent of 1/alpha_W, " +
			"and what stands before the exponential is not known to ten decades",
		Sources: []string{
			"'t Hooft, G. 1976, Phys. Rev. Lett. 37, 8",
			"Adams, F. C. & Laughlin, G. 1997, Rev. Mod. Phys. 69, 337, section IV (1e141 yr, from memory)",
		},
		Notes: []string{
			"it needs no theory beyond the standard one, so it is an upper end for the life of nuclei if its exponent holds",
			"a step changes the number of baryons by three, so it takes nuclei: lone nucleons would stay. Here all decay alike (assumption)",
		},
		Parameters: []law.Parameter{{Name: "inverse_coupling", Doc: "1/alpha_W, inverse strength of the weak force", Low: 29.6, High: 32.7, Preset: 31.52,
			Citation: "preset: sin^2 theta_W/alpha with 0.230 and 1/137.04, as Adams & Laughlin 1997 have it (from memory); ends: at the mass of the Z, and at low energy, Particle Data Group 2022"}},
	}, func(own []float64) float64 { return nucleon.Log10TunnelLife(own[0]) })
}
