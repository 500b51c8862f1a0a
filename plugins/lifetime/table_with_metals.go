package lifetime

import (
	"wane/sim/law"
	"wane/sim/physics/stars"
)

// TableWithMetals returns the law lifetime/table-with-metals: the lifetimes of
// lifetime/table, stretched for red dwarfs by their metals.
func TableWithMetals() law.Law { return tableWithMetals{stars.NewLifetimes()} }

type tableWithMetals struct{ lifetimes *stars.Lifetimes }

// Indices of the parameters; post is the first.
const (
	metalsSun = iota + 1
	metalsPeak
	metalsExponent
)

func (tableWithMetals) Describe() law.Card {
	return law.Card{
		Process: "lifetime", Name: "table-with-metals", Version: "1",
		Summary: "lifetimes of stellar models, longer for red dwarfs with more metals up to twice the Sun's, shorter beyond",
		Formula: "lifetime/table times, below 0.5 solMass, (Z/sun)^exponent up to Z = peak and (peak/sun)^exponent (Z/peak)^-exponent beyond; Z below 1e-4 sun counts as that",
		Domain:  "0.04 .. 150 solMass, any metals. As lifetime/table at the Sun's metals, a factor of two elsewhere",
		Sources: []string{
			"Schaller et al. 1992, A&AS 96, 269 (0.8 .. 120 solMass, Z = 0.02)",
			"Laughlin, Bodenheimer & Adams 1997, ApJ 482, 420 (0.08 and 0.10 solMass)",
			"Adams & Laughlin 1997, Rev. Mod. Phys. 69, 337, section II (lifetimes are longest near Z = 0.04, for lack of hydrogen beyond)",
		},
		Notes: []string{
			"Assumptions: the power of Z, its exponent, that it is the same up and down, the edge at 0.5 solMass. The peak is quoted from memory.",
			"Lifetimes jump at 0.5 solMass, by 23 % at twice the Sun's metals.",
			"0.12 .. 0.6 solMass is bridged between the two sources, and 0.075 and below continue them as m^-2.8: assumptions.",
			"Rotation and companions are left out.",
		},
		Accepts:   law.Accepts{Kinds: []string{"star"}},
		Questions: []law.Question{{Name: "live", Inputs: []string{"mass", "metals"}}},
		Parameters: []law.Parameter{
			post(),
			metalsSun: {Name: "sun", Doc: "the Sun's heavy elements by mass, which metals are compared with", Low: 0.0134, High: 0.0201, Preset: stars.SolarMetals,
				Citation: "Anders & Grevesse 1989; lower end Asplund et al. 2009"},
			metalsPeak:     {Name: "peak", Doc: "metals with which red dwarfs live longest", Low: 0.03, High: 0.06, Preset: stars.PeakMetals, Citation: "Adams & Laughlin 1997; range: assumption"},
			metalsExponent: {Name: "exponent", Doc: "power of the metals", Low: 0, High: 0.6, Preset: stars.MetalsExponent, Citation: "assumption"},
		},
	}
}

func (l tableWithMetals) Answer(question string, in law.Batch) (law.Batch, error) {
	p := in.Parameters
	mass, metals, wait := in.Values("mass"), in.Values("metals"), in.NewValues()
	for i := range wait {
		wait[i] = l.lifetimes.Life(mass[i], p[0]) + stars.MetalsStretch(mass[i], metals[i], p[metalsSun], p[metalsPeak], p[metalsExponent])
	}
	return in.Answer(law.Numbers("wait", wait)), nil
}
