package ejection

import (
	"math"

	"wane/sim/law"
)

type none struct{}

// None is a galaxy that throws nothing out and keeps its radius. It has the
// clock ejection, which stands still, so that what takes shares of it may stay.
func None() law.Law { return none{} }

func (none) Describe() law.Card {
	return law.Card{
		Process: "ejection", Name: "none", Version: "1",
		Summary: "the galaxy throws nothing out and keeps its radius",
		Formula: "hazard 0; R constant; v^2 = 0.4 G M/R = v0^2 M/M0; pc, km/s, solMass",
		Domain:  "an assumption: encounters always throw something out",
		Sources: []string{"Spitzer, L. 1987, Dynamical Evolution of Globular Clusters (what is left out)"},
		Notes:   []string{"objects still decay, collide and fall in where other laws say so"},
		Accepts: law.Accepts{},
		Questions: []law.Question{
			{Name: "rate", Inputs: []string{"mass_bound", "founded_mass", "founded_radius", "founded_dispersion"}},
			{Name: "expose", Inputs: []string{"mass"}},
		},
		Clocks: []law.Clock{ejectionClock()}, Frame: true,
	}
}

func (none) Answer(question string, in law.Batch) (law.Batch, error) {
	if question == "expose" {
		nobody := in.NewValues()
		clear(nobody)
		return in.Answer(law.Numbers(law.ToColumn(clockEjection), nobody)), nil
	}
	mass, mass0 := in.Values("mass_bound"), in.Values("founded_mass")
	radius0, dispersion0 := in.Values("founded_radius"), in.Values("founded_dispersion")
	rate, radius, dispersion, stop := in.NewValues(), in.NewValues(), in.NewValues(), in.NewValues()
	for i := range rate {
		rate[i], radius[i], dispersion[i], stop[i] = math.Inf(-1), math.Max(smallest, radius0[i]), 0, 0
		if mass[i] > 0 && mass0[i] > 0 {
			dispersion[i] = dispersion0[i] * math.Sqrt(mass[i]/mass0[i])
		}
	}
	return in.Answer(law.Numbers(law.RateColumn(clockEjection), rate),
		law.Numbers("radius", radius), law.Numbers("dispersion", dispersion), law.Numbers("stop", stop)), nil
}
