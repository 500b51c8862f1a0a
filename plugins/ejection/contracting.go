package ejection

import "wane/sim/law"

type contracting struct{}

// Contracting is a galaxy that keeps its energy while it loses objects, and
// so shrinks until its central hole takes the rest.
func Contracting() law.Law { return contracting{} }

// nStop is the place of the parameter on the card.
const nStop = gamma + 1

func (contracting) Describe() law.Card {
	return law.Card{
		Process: "ejection", Name: "contracting", Version: "1",
		Summary: "the galaxy loses objects at constant energy and shrinks as it goes",
		Formula: "hazard of object i = s_i xi/t_rh / mean s, s = (m/solMass)^-beta; t_rh = 0.138 N^(1/2) R^(3/2)/(<m>^(1/2) G^(1/2) ln(gamma N)); " +
			"R = R0 [M/(M + carried off)]^2; v^2 = 0.4 G M/R; pc, km/s, solMass, yr",
		Domain: "N >> 100 and no other mass dominates; a live dark halo is ignored; dates good to a factor of several",
		Sources: []string{
			"Spitzer, L. 1987, Dynamical Evolution of Globular Clusters, eq. 2-63",
			"Binney, J. & Tremaine, S. 2008, Galactic Dynamics, section 7.5.2",
			"Adams, F. C. & Laughlin, G. 1997, Rev. Mod. Phys. 69, 337",
			"Dyson, F. J. 1979, Rev. Mod. Phys. 51, 447",
		},
		Notes: []string{
			"only what ejection and infall carry off contracts the galaxy, not the mass that stars blow off (assumption)",
			"the density diverges at the end: at number <= n_stop of the founded, or when the central hole outweighs what is bound, " +
				"the rest falls to the hole (assumption), so hundredth and last of every bound population may be that one date",
			"heavy objects sink and should interact among themselves; here they follow the same susceptibility",
		},
		Accepts: law.Accepts{},
		Questions: []law.Question{
			{Name: "rate", Inputs: []string{"number", "mass_bound", "sum_ejection", "carried_off", "central_mass", "founded_number", "founded_radius"}},
			{Name: "expose", Inputs: []string{"mass"}},
		},
		Parameters: parameters(law.Parameter{
			Name: "n_stop", Doc: "share of the founded objects at which the rest falls to the centre",
			Low: 1e-3, High: 0.1, Preset: 1e-2, Citation: "assumption",
		}),
		Clocks: []law.Clock{ejectionClock()}, Frame: true,
		StopOutcome: "swallowed", StopFate: law.FateCentral,
	}
}

func (contracting) Answer(question string, in law.Batch) (law.Batch, error) {
	if question == "expose" {
		return in.Answer(law.Numbers(law.ToColumn(clockEjection), expose(in))), nil
	}
	number, mass, sum, carried := in.Values("number"), in.Values("mass_bound"), in.Values("sum_ejection"), in.Values("carried_off")
	central, number0, radius0 := in.Values("central_mass"), in.Values("founded_number"), in.Values("founded_radius")
	rate, radius, dispersion, stop := in.NewValues(), in.NewValues(), in.NewValues(), in.NewValues()
	for i := range rate {
		f := frameOf(galaxy{number[i], mass[i], sum[i], carried[i], radius0[i]}, in.Parameters, 0)
		rate[i], radius[i], dispersion[i], stop[i] = f.log10Ejection, f.radius, f.dispersion, 0
		if number[i] <= in.Parameters[nStop]*number0[i] || central[i] >= mass[i] {
			stop[i] = 1
		}
	}
	return in.Answer(law.Numbers(law.RateColumn(clockEjection), rate),
		law.Numbers("radius", radius), law.Numbers("dispersion", dispersion), law.Numbers("stop", stop)), nil
}
