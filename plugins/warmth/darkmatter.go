// Package warmth holds the laws of heat that reaches cold bodies from outside.
// The sky, its horizon and the heat of wearing are not its business: the host
// always adds those.
package warmth

import (
	"wane/sim/law"
	"wane/sim/physics/darkmatter"
)

type darkMatter struct{}

// DarkMatter is the heat of dark matter that bound bodies capture.
func DarkMatter() law.Law { return darkMatter{} }

func accepts() law.Accepts {
	return law.Accepts{Kinds: []string{"brown-dwarf", "white-dwarf", "neutron-star"}}
}

func (darkMatter) Describe() law.Card {
	return law.Card{
		Process: "warmth", Name: "dark-matter", Version: "1",
		Summary: "dark matter annihilates inside bodies that are still bound in the halo",
		Formula: "L = f_cap pi R^2 (1 + v_esc^2/v^2) rho c^2 v, v_esc^2 = 2 G M/R; W",
		Domain:  "bound objects while the halo lasts (1e22-1e25 yr); the efficiency is uncertain by decades",
		Sources: []string{
			"Adams, F. C. & Laughlin, G. 1997, Rev. Mod. Phys. 69, 337, section IV",
			"Baryakhtar, M. et al. 2017, Phys. Rev. Lett. 119, 131801 (neutron stars)",
		},
		Notes: []string{
			"f_cap 4e-4 gives a white dwarf the 1e-12 solar luminosities and 50-60 K of Adams & Laughlin; direct detection now suggests 1e-5 or less, 0 if dark matter is not made of weakly interacting particles",
			"the density is today's at the Sun; it is not lowered as the galaxy contracts or the halo is used up (assumption)",
		},
		Accepts:   accepts(),
		Questions: []law.Question{{Name: "warm", Inputs: []string{"mass", "radius", "place"}}},
		Parameters: []law.Parameter{
			{Name: "f_cap", Doc: "share of what crosses the body that is captured and annihilates",
				Low: 0, High: 1, Preset: 4e-4, Citation: "Adams & Laughlin 1997 (from their 1e-12 solar luminosities, from memory)"},
			{Name: "density", Unit: "GeV.cm-3", Doc: "density of dark matter",
				Low: 0.2, High: 0.6, Preset: 0.3, Citation: "Read 2014, J. Phys. G 41, 063101"},
			{Name: "speed", Unit: "km/s", Doc: "speed of dark matter far from the body",
				Low: 100, High: 300, Preset: 200, Citation: "Adams & Laughlin 1997, section IV"},
		},
	}
}

func (darkMatter) Answer(_ string, in law.Batch) (law.Batch, error) {
	m, r, place, power := in.Values("mass"), in.Values("radius"), in.Words("place"), in.NewValues()
	p := in.Parameters
	for i := range m {
		power[i] = 0
		if place[i] == law.Bound {
			power[i] = darkmatter.Power(m[i], r[i], p[0], p[1], p[2])
		}
	}
	return in.Answer(law.Numbers("power", power)), nil
}
