package ejection

import "wane/sim/law"

type balanced struct{}

// Balanced is a galaxy that binaries or its central hole heat as fast as it
// loses energy: it swells and never quite ends.
func Balanced() law.Law { return balanced{} }

// zeta is the place of the parameter on the card.
const zeta = gamma + 1

func (balanced) Describe() law.Card {
	return law.Card{
		Process: "ejection", Name: "balanced", Version: "1",
		Summary: "the galaxy is heated from within while it loses objects, swells, and ends only after very long",
		Formula: "hazard of object i = s_i xi/t_rh / mean s, s = (m/solMass)^-beta; t_rh = 0.138 N^(1/2) R^(3/2)/(<m>^(1/2) G^(1/2) ln(gamma N)); " +
			"dR = R (2 dlnM + zeta dt/t_rh), so R = R0 [M/(M + carried off)]^2 exp(zeta C), C = int dt/t_rh; v^2 = 0.4 G M/R; pc, km/s, solMass, yr",
		Domain: "N >> 100 and a heat source at the centre that lasts; a live dark halo is ignored",
		Sources: []string{
			"Henon, M. 1965, Ann. Astrophys. 28, 62",
			"Gieles, M., Heggie, D. C. & Zhao, H. 2011, MNRAS 413, 2509",
			"Spitzer, L. 1987, Dynamical Evolution of Globular Clusters, eq. 2-63",
		},
		Notes: []string{
			"C is the reading of the clock relaxation, which advances by 1 per relaxation time and hits nobody",
			"radius stops shrinking at zeta = 2 xi; above zeta = 7 xi/3 there is no end in finite time and N ~ t^-nu, nu = xi/(1.5 zeta - 3.5 xi)",
			"only what ejection and infall carry off contracts the galaxy, not the mass that stars blow off (assumption)",
			"while bound objects wear away the formula contracts it too, although a galaxy that slowly loses mass expands (unresolved)",
		},
		Accepts: law.Accepts{},
		Questions: []law.Question{
			{Name: "rate", Inputs: []string{"number", "mass_bound", "sum_ejection", "carried_off", "founded_radius", "reading_relaxation"}},
			{Name: "expose", Inputs: []string{"mass"}},
		},
		Parameters: parameters(law.Parameter{
			Name: "zeta", Doc: "share of its energy that the galaxy is given per half-mass relaxation time",
			Low: 0, High: 0.1, Preset: 0.1, Citation: "Gieles, Heggie & Zhao 2011",
		}),
		Clocks: []law.Clock{
			ejectionClock(),
			{Name: clockRelaxation, Doc: "counts half-mass relaxation times and hits nobody", Outcome: "ejected", Fate: law.FateAdrift},
		},
		Frame: true,
	}
}

func (balanced) Answer(question string, in law.Batch) (law.Batch, error) {
	if question == "expose" {
		nobody := in.NewValues()
		clear(nobody)
		return in.Answer(law.Numbers(law.ToColumn(clockEjection), expose(in)), law.Numbers(law.ToColumn(clockRelaxation), nobody)), nil
	}
	number, mass, sum, carried := in.Values("number"), in.Values("mass_bound"), in.Values("sum_ejection"), in.Values("carried_off")
	radius0, c := in.Values("founded_radius"), in.Values("reading_relaxation")
	ejection, relaxation, radius, dispersion, stop := in.NewValues(), in.NewValues(), in.NewValues(), in.NewValues(), in.NewValues()
	for i := range ejection {
		f := frameOf(galaxy{number[i], mass[i], sum[i], carried[i], radius0[i]}, in.Parameters, in.Parameters[zeta]*c[i])
		ejection[i], relaxation[i], radius[i], dispersion[i], stop[i] = f.log10Ejection, f.log10Relaxation, f.radius, f.dispersion, 0
	}
	return in.Answer(law.Numbers(law.RateColumn(clockEjection), ejection), law.Numbers(law.RateColumn(clockRelaxation), relaxation),
		law.Numbers("radius", radius), law.Numbers("dispersion", dispersion), law.Numbers("stop", stop)), nil
}
