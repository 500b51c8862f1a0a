package nucleondecay

import (
	"wane/sim/law"
	"wane/sim/physics/nucleon"
)

// HigherDimension is the decay of nucleons through an operator that a high
// energy scale suppresses.
func HigherDimension() law.Law {
	return newDecay(law.Card{
		Name: "higher-dimension", Version: "1",
		Summary: "nucleons decay through an operator of dimension six or more, the slower the higher its energy scale",
		Formula: "tau = hbar/(m_p c^2) (Lambda/(m_p c^2))^(2(n - 4)), Lambda in GeV; " + massHistory,
		Domain: "cold bodies of ordinary matter; an estimate by dimensions: couplings and the size of the nucleon, set to 1 here, " +
			"move tau by several decades (published lives for n = 6 at 1e16 GeV are 1e34 to 1e36 yr, this gives 1e32.5)",
		Sources: []string{
			"Adams, F. C. & Laughlin, G. 1997, Rev. Mod. Phys. 69, 337, section IV",
			"Weinberg, S. 1979, Phys. Rev. Lett. 43, 1566 (operators of dimension six; from memory)",
		},
		Notes: []string{
			"dimension 6 at the Planck scale (1.22e19 GeV): 1e44.8 yr, the same as virtual-holes; 7: 1e83.0; 8: 1e121.3; 8 at 1e16 GeV: 1e96.6",
			"with dimension 6, scales below 3.0e16 GeV contradict the measured limit of 2.4e34 yr unless the coupling is small",
			"dimensions between whole numbers mean nothing but a mean life between",
		},
		Parameters: []law.Parameter{
			{Name: "dimension", Doc: "dimension n of the operator, in powers of energy", Low: 6, High: 8, Preset: 6,
				Citation: "Adams & Laughlin 1997, section IV (6 to 8)"},
			{Name: "scale", Unit: "GeV", Log10: true, Doc: "energy scale Lambda at which the operator arises", Low: 15, High: 19.086728, Preset: 19.086728,
				Citation: "preset: the Planck energy, CODATA 2022; lower end: scale of unification without supersymmetry (from memory)"},
		},
	}, func(own []float64) float64 { return nucleon.Log10OperatorLife(own[0], own[1]) })
}
