package nucleondecay

import (
	"wane/sim/law"
	"wane/sim/physics/nucleon"
)

// VirtualHoles is the decay of nucleons whose quarks meet in a black hole that
// lives for a Planck time.
func VirtualHoles() law.Law {
	return newDecay(law.Card{
		Name: "virtual-holes", Version: "1",
		Summary: "two quarks of a nucleon fall into a black hole of Planck mass, which forgets that they were quarks",
		Formula: "tau = hbar/(m_p c^2) (M_P/m_p)^N, N = 4 (1e44.8 yr) or more; " + massHistory,
		Domain: "cold bodies of ordinary matter; an estimate by dimensions: N depends on how many particles must meet and on the " +
			"theory of gravity, and tau with it, from 1e45 to 1e169 yr",
		Sources: []string{
			"Zeldovich, Ya. B. 1976, Phys. Lett. A 59, 254 (from memory)",
			"Hawking, S. W., Page, D. N. & Pope, C. N. 1979, Phys. Lett. B 86, 175 (from memory)",
			"Adams, F. C., Kane, G. L., Mbonye, M. & Perry, M. J. 2001, Int. J. Mod. Phys. A 16, 2399",
			"Adams, F. C. & Laughlin, G. 1997, Rev. Mod. Phys. 69, 337, section IV (1e46 to 1e169 yr, from memory)",
		},
		Notes: []string{
			"one decade in tau is a step of 0.052 in N: 8 gives 1e121.3 yr, 10.5 1e169 yr",
		},
		Parameters: []law.Parameter{{Name: "power", Doc: "N, the power of Planck mass over nucleon mass", Low: 4, High: 10.5, Preset: 4,
			Citation: "4: Zeldovich 1976; 8: Adams et al. 2001 (from memory); upper end: 1e169 yr of Adams & Laughlin 1997 (from memory)"}},
	}, func(own []float64) float64 { return nucleon.Log10VirtualHoleLife(own[0]) })
}
