package expansion

import "wane/sim/law"

// Phantom returns the law expansion/phantom: flat space whose dark energy
// grows denser as space expands, until all is torn apart.
func Phantom() law.Law { return phantom{} }

type phantom struct{}

func (phantom) Describe() law.Card {
	const caldwell = "Caldwell, R. R., Kamionkowski, M. & Weinberg, N. N. 2003, Phys. Rev. Lett. 91, 071301"
	return law.Card{
		Process: "expansion", Name: "phantom", Version: "1",
		Summary: "flat space, dark energy that grows denser: a rip ends everything at one date",
		Formula: "H^2 = H0^2 [Om a^-3 + Or a^-4 + (1 - Om - Or) a^(-3(1+w))], w < -1; " +
			"t_rip - t0 = 1/H0 int_0^inf [Om e^(-3x) + OL e^(-3(1+w)x)]^(-1/2) dx, about 2/(3 |1+w| H0 sqrt(1-Om))",
		Domain:  "-1.5 <= w <= -1.001, all dates after the first 1e5 yr up to the rip; exact for constant w",
		Sources: []string{caldwell, planck, fixsen},
		Notes: []string{
			"Everything ends at the rip itself. Bound systems of period P are torn apart P sqrt(2 |1+3w|)/(6 pi |1+w|) earlier: " +
				"for w = -1.5 galaxies 60 Myr, solar systems some months (same paper); that much earlier is not resolved.",
			"While H rises no temperature is given to the horizon (assumption).",
			gone,
		},
		Questions: []law.Question{{Name: "density", Inputs: []string{"ln_a", "log10_since"}}},
		Parameters: today(law.Parameter{Name: "w", Doc: "pressure of dark energy over its density", Low: -1.5, High: -1.001, Preset: -1.5,
			Citation: caldwell + " (their example)"}),
	}
}

func (phantom) Answer(question string, in law.Batch) (law.Batch, error) { return constantW(in) }
