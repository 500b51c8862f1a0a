package ejection

import (
	"math"

	"wane/sim/law"
	"wane/sim/num"
	"wane/sim/physics/dynamics"
)

type fixedHalo struct{}

// FixedHalo is a galaxy in a lasting dark halo, which sets how fast its
// objects move.
func FixedHalo() law.Law { return fixedHalo{} }

// speed is the place of the parameter on the card.
const speed = beta + 1

func (fixedHalo) Describe() law.Card {
	return law.Card{
		Process: "ejection", Name: "fixed-halo", Version: "1",
		Summary: "a lasting dark halo holds the galaxy: its objects keep their speed and scatter ever more slowly",
		Formula: "hazard of object i = s_i xi/t_r / mean s, s = (m/solMass)^-beta; t_r = (N0/N) 0.1 N0/ln N0 R/v; R and v constant; pc, km/s, solMass, yr",
		Domain:  "N >> 100 and a halo that outlasts the galaxy: whether it does is open. N/N0 = 1/(1 + xi t/t_r0): no end in finite time but that of the last object",
		Sources: []string{
			"Binney, J. & Tremaine, S. 2008, Galactic Dynamics, eq. 1.38",
			"Adams, F. C. & Laughlin, G. 1997, Rev. Mod. Phys. 69, 337",
		},
		Notes: []string{
			"t_r ~ v^3/(G^2 m^2 n ln Lambda) goes as 1/N while the halo holds v and R; that the mean mass and the logarithm stay is an assumption",
			"halo particles neither scatter objects nor decay (assumption)",
		},
		Accepts: law.Accepts{},
		Questions: []law.Question{
			{Name: "rate", Inputs: []string{"number", "sum_ejection", "founded_number", "founded_radius"}},
			{Name: "expose", Inputs: []string{"mass"}},
		},
		Parameters: append(parameters()[:gamma:gamma], law.Parameter{
			Name: "speed", Unit: "km/s", Doc: "dispersion that the halo sets", Low: 100, High: 300, Preset: 200,
			Citation: "the Milky Way: Binney & Tremaine 2008; range: assumption",
		}),
		Clocks: []law.Clock{ejectionClock()}, Frame: true,
	}
}

func (fixedHalo) Answer(question string, in law.Batch) (law.Batch, error) {
	if question == "expose" {
		return in.Answer(law.Numbers(law.ToColumn(clockEjection), expose(in))), nil
	}
	number, sum, number0, radius0 := in.Values("number"), in.Values("sum_ejection"), in.Values("founded_number"), in.Values("founded_radius")
	rate, radius, dispersion, stop := in.NewValues(), in.NewValues(), in.NewValues(), in.NewValues()
	v := in.Parameters[speed]
	for i := range rate {
		radius[i], dispersion[i], stop[i], rate[i] = math.Max(smallest, radius0[i]), v, 0, math.Inf(-1)
		if !(number[i] > 0) || !(sum[i] > 0) {
			continue
		}
		founded := math.Max(math.E, number0[i]) // a logarithm of 1 at least
		relaxation := num.Log10(dynamics.RelaxationTime(founded, radius[i], v)) + num.Log10(founded) - num.Log10(number[i])
		rate[i] = num.Log10(in.Parameters[xi]) - relaxation + num.Log10(number[i]) - num.Log10(sum[i])
	}
	return in.Answer(law.Numbers(law.RateColumn(clockEjection), rate),
		law.Numbers("radius", radius), law.Numbers("dispersion", dispersion), law.Numbers("stop", stop)), nil
}
