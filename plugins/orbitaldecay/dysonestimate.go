package orbitaldecay

import (
	"math"

	"wane/sim/law"
	"wane/sim/physics/gravity"
)

type dysonEstimate struct{}

// DysonEstimate is decay by gravitational waves without the ratio of the
// masses, which much literature has.
func DysonEstimate() law.Law { return dysonEstimate{} }

func (dysonEstimate) Describe() law.Card {
	return law.Card{
		Process: "orbital-decay", Name: "dyson-estimate", Version: "1",
		Summary: "two bodies spiral together after a time that ignores how much lighter one of them is",
		Formula: "t = (c/V)^5 P, V^2 = G (m1 + m2)/a, P = 2 pi a/V; AU, solMass, yr",
		Domain:  "comparable masses on a circular orbit, order of magnitude; for a light companion too short by the ratio of the masses",
		Sources: []string{"Dyson, F. J. 1979, Rev. Mod. Phys. 51, 447"},
		Notes: []string{
			"gives the often quoted 1e20 yr (Earth) and 1e24 yr (star in a galaxy); with the ratio of the masses these are 1e23.0 and 1e32.8 yr (law peters)",
			"the literature has it as an order of magnitude; eccentricity is ignored",
		},
		Accepts:   law.Accepts{},
		Questions: []law.Question{{Name: "merge", Inputs: []string{"mass_1", "mass_2", "separation"}}},
	}
}

func (dysonEstimate) Answer(_ string, in law.Batch) (law.Batch, error) {
	m1, m2, a := in.Values("mass_1"), in.Values("mass_2"), in.Values("separation")
	wait := in.NewValues()
	for i := range wait {
		wait[i] = math.Max(atOnce, gravity.Log10FifthPowerTime(m1[i], m2[i], a[i]))
	}
	return in.Answer(law.Numbers("wait", wait)), nil
}
