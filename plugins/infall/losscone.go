package infall

import (
	"math"

	"wane/sim/law"
	"wane/sim/num"
	"wane/sim/physics/constant"
	"wane/sim/physics/dynamics"
)

type lossCone struct{}

// LossCone is a central hole that takes whatever wanders onto an orbit that
// leads too close to it.
func LossCone() law.Law { return lossCone{} }

const clockInfall = "infall"

func (lossCone) Describe() law.Card {
	return law.Card{
		Process: "infall", Name: "loss-cone", Version: "1",
		Summary: "objects near the central hole scatter onto orbits that lead into it, at a rate of their own",
		Formula: "rate = N_c/[t_r ln(2/theta)]; N_c = 2 M/<m>, t_r = 0.34 sigma^3/(G^2 <m> rho ln(M/<m>)), rho = sigma^2/(2 pi G r^2) at r = G M/sigma^2, " +
			"sigma = v/sqrt 3; theta^2 = max[R (M/<m>)^(1/3), 4 G M/c^2]/r; M central hole, v dispersion; solMass, pc, km/s, yr",
		Domain: "a hole lighter than what is bound, in an isothermal cusp that refills; a factor of a few to ten",
		Sources: []string{
			"Frank, J. & Rees, M. J. 1976, Mon. Not. R. Astron. Soc. 176, 633",
			"Lightman, A. P. & Shapiro, S. L. 1977, Astrophys. J. 211, 244",
			"Magorrian, J. & Tremaine, S. 1999, Mon. Not. R. Astron. Soc. 309, 447",
		},
		Notes: []string{
			"nothing is taken of what the galaxy throws out: ejection goes on beside it",
			"all objects are equally likely to be taken; cusp, relaxation time and Lambda = M/<m> are assumptions",
			"what is torn apart outside the horizon counts as swallowed whole (assumption)",
			"a hole keeps a rate of zero while it has no mass: one must be there from the start",
		},
		Accepts: law.Accepts{},
		Questions: []law.Question{
			{Name: "rate", Inputs: []string{"number", "mass_bound", "sum_infall", "central_mass", "galaxy_dispersion"}},
			{Name: "expose", Inputs: []string{"mass"}},
		},
		Parameters: []law.Parameter{{
			Name: "radius", Unit: "solRad", Doc: "radius of the objects that tides tear apart", Low: 0.01, High: 1, Preset: 0.1,
			Citation: "assumption: brown dwarfs and red dwarfs; 0.01 white dwarfs, 1 stars like the Sun",
		}},
		Clocks: []law.Clock{{Name: clockInfall, Doc: "wandered into the loss cone of the central hole", Outcome: "swallowed", Fate: law.FateCentral}},
	}
}

func (lossCone) Answer(question string, in law.Batch) (law.Batch, error) {
	if question == "expose" {
		m, to := in.Values("mass"), in.NewValues()
		for i := range to {
			if to[i] = 0; m[i] > 0 {
				to[i] = 1
			}
		}
		return in.Answer(law.Numbers(law.ToColumn(clockInfall), to)), nil
	}
	number, mass, sum := in.Values("number"), in.Values("mass_bound"), in.Values("sum_infall")
	hole, dispersion, rate := in.Values("central_mass"), in.Values("galaxy_dispersion"), in.NewValues()
	body := in.Parameters[0] * constant.SunR / 1e3
	for i := range rate {
		rate[i] = math.Inf(-1)
		if number[i] > 0 && sum[i] > 0 {
			sigma := dispersion[i] / math.Sqrt(3)
			rate[i] = dynamics.Log10LossConeRate(hole[i], mass[i]/number[i], sigma, body, number[i]) - num.Log10(sum[i])
		}
	}
	return in.Answer(law.Numbers(law.RateColumn(clockInfall), rate)), nil
}
