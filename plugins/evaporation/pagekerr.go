package evaporation

import (
	"wane/sim/law"
	"wane/sim/num"
	"wane/sim/physics/hole"
)

// PageKerr is [Page] for holes that are born with spin.
func PageKerr() law.Law {
	return newEvaporating(law.Card{
		Name: "page-kerr", Version: "1",
		Summary: "as page, and spin at birth makes a hole go sooner",
		Formula: sumOfSpecies + "Lifetime t(a) = t(0)/(1 + 1.2 a^2), a the spin at birth over the greatest there can be; " +
			"photons and gravitons alone: t(0) = 1.159e67 yr (M/solMass)^3",
		Domain: isolated + "the factor at a = 1, 2.2, lies in Page's range of 2.0 to 2.7; its shape between 0 and 1 is a guess",
		Sources: []string{
			"Page, D. N. 1976, Phys. Rev. D 14, 3260 (2.0 to 2.7 at the greatest spin)",
			page1976, macGibbon1991,
		},
		Notes: []string{
			"the shape 1 + 1.2 a^2 is an assumption",
			"a hole sheds its spin before most of its mass, and loses mass up to thousands of times faster meanwhile. Here the loss is hastened " +
				"evenly over the whole life (assumption); the date of the end is the same",
			"the temperature is that of a hole without spin, which decides only when evaporation starts (assumption)",
			"every hole has the same spin at birth, the central one too, which is an assumption: those of stars are measured from 0 to 0.99",
		},
		Parameters: []law.Parameter{lightestNeutrino(),
			{Name: "spin", Doc: "spin of a hole at birth, in units of the greatest there can be, G M^2/c", Low: 0, High: 1, Preset: 0.5,
				Citation: "assumption"}},
	}, func(p []float64) radiator {
		g := emits(massiveNeutrinos(p[0])...)
		g.hastened = num.Log10(hole.SpinHastens(p[1]))
		return g
	})
}
