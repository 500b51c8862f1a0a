package substellarlimit

import (
	"wane/sim/law"
	"wane/sim/physics/stars"
)

// ByMetals returns the law substellar-limit/by-metals: the more heavy
// elements, the lighter a star may be.
func ByMetals() law.Law { return byMetals{} }

type byMetals struct{}

func (byMetals) Describe() law.Card {
	return law.Card{
		Process: "substellar-limit", Name: "by-metals", Version: "1",
		Summary: "metal-rich objects burn hydrogen at lower mass, down to 0.040 solMass",
		Formula: "kind = star when mass >= limit, else brown-dwarf; limit = 0.092 solMass (up to 1e-4 sun), 0.075 (sun), 0.058 (5), 0.048 (10), 0.040 (20 and more), linear in log metals between",
		Domain:  "any mass and metals. Within 0.003 solMass up to the Sun's metals, an extrapolation by argument beyond",
		Sources: []string{
			"Burrows et al. 2001, Rev. Mod. Phys. 73, 719 (0.092 without metals, 0.075 at the Sun's)",
			"Adams & Laughlin 1997, Rev. Mod. Phys. 69, 337, section II (about 0.04 at ten to twenty times the Sun's: frozen stars of 273 K)",
		},
		Notes: []string{
			"Both sources are quoted from memory; 0.058 and 0.048 and the straight lines between are assumptions.",
			"Late stars of 0.04 .. 0.075 solMass live longer than any today: the laws of lifetime carry their tables on to them.",
			"With metals/solar it is substellar-limit/fixed at 0.075 solMass.",
		},
		Questions: []law.Question{{Name: "sort", Inputs: []string{"mass", "metals"}}},
		Parameters: []law.Parameter{{Name: "sun", Doc: "the Sun's heavy elements by mass, which metals are compared with", Low: 0.0134, High: 0.0201, Preset: stars.SolarMetals,
			Citation: "Anders & Grevesse 1989; lower end Asplund et al. 2009"}},
	}
}

func (byMetals) Answer(question string, in law.Batch) (law.Batch, error) {
	sun := in.Parameters[0]
	mass, metals, kind := in.Values("mass"), in.Values("metals"), in.NewWords()
	for i := range kind {
		if mass[i] >= stars.HydrogenLimit(metals[i], sun) {
			kind[i] = law.Star
		} else {
			kind[i] = law.BrownDwarf
		}
	}
	return in.Answer(law.Codes("kind", kind)), nil
}
