package ejection

import "wane/sim/law"

type fixedRadius struct{}

// FixedRadius is a galaxy that keeps its size while it loses objects.
func FixedRadius() law.Law { return fixedRadius{} }

func (fixedRadius) Describe() law.Card {
	return law.Card{
		Process: "ejection", Name: "fixed-radius", Version: "1",
		Summary: "the galaxy loses objects and keeps its radius",
		Formula: "hazard of object i = s_i xi/t_rh / mean s, s = (m/solMass)^-beta; t_rh = 0.138 N^(1/2) R^(3/2)/(<m>^(1/2) G^(1/2) ln(gamma N)); " +
			"R constant; v^2 = 0.4 G M/R; pc, km/s, solMass, yr",
		Domain: "N >> 100; a comparison: a galaxy that nothing heats or holds does not keep its radius. Ends after 280 relaxation times at xi = 1/140",
		Sources: []string{
			"Spitzer, L. 1987, Dynamical Evolution of Globular Clusters, eq. 2-63",
			"Binney, J. & Tremaine, S. 2008, Galactic Dynamics, section 7.5.2",
		},
		Notes: []string{
			"for equal masses and a constant logarithm N/N0 = [1 - xi t/(2 t_rh)]^2",
			"that the radius stays is an assumption; the density never diverges, so the last object leaves by itself",
		},
		Accepts: law.Accepts{},
		Questions: []law.Question{
			{Name: "rate", Inputs: []string{"number", "mass_bound", "sum_ejection", "founded_radius"}},
			{Name: "expose", Inputs: []string{"mass"}},
		},
		Parameters: parameters(),
		Clocks:     []law.Clock{ejectionClock()}, Frame: true,
	}
}

func (fixedRadius) Answer(question string, in law.Batch) (law.Batch, error) {
	if question == "expose" {
		return in.Answer(law.Numbers(law.ToColumn(clockEjection), expose(in))), nil
	}
	number, mass, sum, radius0 := in.Values("number"), in.Values("mass_bound"), in.Values("sum_ejection"), in.Values("founded_radius")
	rate, radius, dispersion, stop := in.NewValues(), in.NewValues(), in.NewValues(), in.NewValues()
	for i := range rate {
		f := frameOf(galaxy{number: number[i], mass: mass[i], sum: sum[i], radius0: radius0[i]}, in.Parameters, 0)
		rate[i], radius[i], dispersion[i], stop[i] = f.log10Ejection, f.radius, f.dispersion, 0
	}
	return in.Answer(law.Numbers(law.RateColumn(clockEjection), rate),
		law.Numbers("radius", radius), law.Numbers("dispersion", dispersion), law.Numbers("stop", stop)), nil
}
