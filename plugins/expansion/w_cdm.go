package expansion

import (
	"wane/sim/law"
	"wane/sim/physics/cosmology"
)

// WCDM returns the law expansion/w-cdm: flat space whose dark energy has a
// constant ratio w >= -1 of pressure to density.
func WCDM() law.Law { return wCDM{} }

type wCDM struct{}

func (wCDM) Describe() law.Card {
	return law.Card{
		Process: "expansion", Name: "w-cdm", Version: "1",
		Summary: "flat space, dark energy that thins out: space goes on accelerating, and the horizon's temperature falls as 1/t",
		Formula: "H^2 = H0^2 [Om a^-3 + Or a^-4 + (1 - Om - Or) a^(-3(1+w))]; in the end a ~ t^(2/(3(1+w))), H t = 2/(3(1+w))",
		Domain:  "-1 <= w <= -0.7, all dates after the first 1e5 yr; exact for constant w, which is a fit and no theory",
		Sources: []string{
			"Turner, M. S. & White, M. 1997, Phys. Rev. D 56, R4439 (constant w; from memory)",
			planck,
			fixsen,
			"Gibbons & Hawking 1977, Phys. Rev. D 15, 2738 (horizon)",
		},
		Notes: []string{
			"The horizon's temperature is taken as hbar H / (2 pi k) with the H of the date, as in de Sitter space (assumption): no constant floor.",
			"w = -1 is lambda-cdm; the preset -0.9 is an assumption within what fits of evolving dark energy allow (from memory).",
			gone,
		},
		Questions: []law.Question{{Name: "density", Inputs: []string{"ln_a", "log10_since"}}},
		Parameters: today(law.Parameter{Name: "w", Doc: "pressure of dark energy over its density", Low: -1, High: -0.7, Preset: -0.9,
			Citation: "assumption; range: fits to supernovae and galaxies with w0 and wa (from memory)"}),
	}
}

func (wCDM) Answer(question string, in law.Batch) (law.Batch, error) { return constantW(in) }

// constantW is the answer of the laws whose first own parameter is w.
func constantW(in law.Batch) (law.Batch, error) {
	dark, w, x := logDark(in.Parameters), in.Parameters[own], in.Values("ln_a")
	return flat(in, func(i int) float64 { return cosmology.LogDarkOfW(dark, w, x[i]) }), nil
}
