// Package orbitaldecay holds the laws of how two bodies on an orbit spiral
// together. It answers questions about pairs; a run has no binaries.
package orbitaldecay

import (
	"math"

	"wane/sim/law"
	"wane/sim/physics/gravity"
)

type peters struct{}

// Peters is decay by gravitational waves at the lowest order.
func Peters() law.Law { return peters{} }

// atOnce is the wait of bodies that touch already, log10 yr.
const atOnce = -1000

func (peters) Describe() law.Card {
	return law.Card{
		Process: "orbital-decay", Name: "peters", Version: "1",
		Summary: "two bodies spiral together by gravitational waves",
		Formula: "t = F(e) (5/256) c^5 a^4/[G^3 m1 m2 (m1 + m2)], " +
			"F = (48/19) g(e)^-4 int_0^e x^(29/19) (1+121x^2/304)^(1181/2299) (1-x^2)^(-3/2) dx, g = e^(12/19) (1+121e^2/304)^(870/2299)/(1-e^2); AU, solMass, yr",
		Domain:  "point masses far slower than light; nothing else in or near the orbit; error 1e-9 but for the last few orbits",
		Sources: []string{"Peters, P. C. 1964, Phys. Rev. 136, B1224, eqs. 5.10, 5.11, 5.14"},
		Notes: []string{
			"the often quoted 1e20 yr (Earth) and 1e24 yr (star in a galaxy) leave out the ratio of the masses",
		},
		Accepts:   law.Accepts{},
		Questions: []law.Question{{Name: "merge", Inputs: []string{"mass_1", "mass_2", "separation", "eccentricity"}}},
	}
}

func (peters) Answer(_ string, in law.Batch) (law.Batch, error) {
	m1, m2, a, e := in.Values("mass_1"), in.Values("mass_2"), in.Values("separation"), in.Values("eccentricity")
	wait := in.NewValues()
	for i := range wait {
		wait[i] = math.Max(atOnce, gravity.Log10MergerTime(m1[i], m2[i], a[i], e[i]))
	}
	return in.Answer(law.Numbers("wait", wait)), nil
}
