package collapse

import (
	"math"

	"wane/sim/law"
	"wane/sim/physics/remnants"
)

// Step returns the law collapse/step: neutron stars below a mass at birth,
// holes above, each of one mass.
func Step() law.Law { return step{} }

type step struct{}

// Indices of the parameters.
const (
	stepUp = iota
	stepLimit
	stepNeutron
	stepHoles
	stepHole
)

func (step) Describe() law.Card {
	return law.Card{
		Process: "collapse", Name: "step", Version: "1",
		Summary: "neutron stars of one mass up to 20 solMass at birth, holes of one mass above",
		Formula: "chance of a neutron star: 1 below limit, 0 from there on. Neutron star: ns_mass. Hole: the mass hole, or a third of the star's",
		Domain:  "stars from m_up on, at any metals. Real masses scatter by a factor of two, and the edge is no edge",
		Sources: []string{"assumption: the textbook picture, with numbers near the means of those measured"},
		Notes: []string{
			"Limit and masses are assumptions. Models have islands instead of an edge: see collapse/raithel.",
			"Mass thrown off goes to the gas. Kicks are left out.",
		},
		Accepts: heavy(),
		Questions: []law.Question{
			{Name: "die", Inputs: []string{"mass"}, Words: []string{"neutron-star", "black-hole"}},
			{Name: "remain", Inputs: []string{"kind", "mass"}},
		},
		Parameters: []law.Parameter{
			stepUp:      upParameter(),
			stepLimit:   {Name: "limit", Unit: "solMass", Doc: "least mass at birth of a star that leaves a hole", Low: 15, High: 30, Preset: 20, Citation: "assumption"},
			stepNeutron: {Name: "ns_mass", Unit: "solMass", Doc: "mass of every neutron star", Low: 1.1, High: 2.0, Preset: remnants.StepNeutronStar, Citation: "assumption, after measured double neutron stars"},
			stepHoles:   {Name: "holes", Doc: "one mass for all holes, or a third of the star's", Words: []string{"one", "third"}, Citation: "assumption"},
			stepHole:    {Name: "hole", Unit: "solMass", Doc: "mass of every hole where it is one", Low: 3, High: 15, Preset: remnants.StepHole, Citation: "assumption, after measured holes in X-ray binaries"},
		},
	}
}

func (step) Answer(question string, in law.Batch) (law.Batch, error) {
	p := in.Parameters
	if question == "die" {
		return dieAt(in, p[stepLimit]), nil
	}
	star, kind, hole := in.Values("mass"), in.Words("kind"), in.Kind("black-hole")
	mass, composition := in.NewValues(), in.NewWords()
	for i := range mass {
		switch {
		case kind[i] != hole:
			mass[i], composition[i] = p[stepNeutron], law.Neutrons
		case p[stepHoles] == 1:
			mass[i], composition[i] = star[i]/3, law.Pure
		default: // never more than the star, wherever somebody asks
			mass[i], composition[i] = math.Min(p[stepHole], star[i]), law.Pure
		}
	}
	return in.Answer(law.Numbers("mass", mass), law.Codes("composition", composition)), nil
}
