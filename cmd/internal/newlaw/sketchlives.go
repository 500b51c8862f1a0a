package newlaw

import (
	"math"

	"wane/sim/law"
)

var minusInf = math.Inf(-1)

func stellar(p law.Process) sketch {
	switch p.Name {
	case "remnant":
		return remnant()
	case "collapse":
		return collapse()
	}
	return sketch{file: "live", card: law.Card{
		Summary:   "a star lives as long as its fuel lasts at a luminosity that is a power of its mass",
		Formula:   "t = sun (m/solMass)^-slope; yr",
		Domain:    "a third to some ten solar masses; heavier stars live longer than this, light ones too",
		Accepts:   law.Accepts{Kinds: []string{"star"}},
		Questions: []law.Question{{Name: "live", Inputs: []string{"mass"}}},
		Parameters: []law.Parameter{
			{Name: "sun", Unit: "yr", Log10: true, Doc: "life of a star of 1 solMass", Low: 9.9, High: 10.1, Preset: 10},
			{Name: "slope", Doc: "exponent", Low: 2, High: 3, Preset: 2.5},
		},
	}, example: example{why: "1e10 yr / 10^2.5", question: "live",
		inputs: []input{{"mass", 10}}, column: "wait", want: 7.5, ask: "mass=10Msun"},
	}
}

func remnant() sketch {
	return sketch{file: "remnant", card: law.Card{
		Summary: "a light star leaves a white dwarf whose mass is a straight line in that of the star",
		Formula: "base + slope m, at most m; solMass",
		Domain:  "stars of 0.5 solMass to the least that collapse",
		Accepts: law.Accepts{Kinds: []string{"star"}, Column: "mass", High: law.AtParameter("collapse.m_up")},
		Questions: []law.Question{
			{Name: "die", Words: []string{"white-dwarf"}},
			{Name: "remain", Inputs: []string{"mass"}},
		},
		Parameters: []law.Parameter{
			{Name: "base", Unit: "solMass", Doc: "white dwarf of a star of no mass", Low: 0.4, High: 0.5, Preset: 0.45},
			{Name: "slope", Doc: "solar masses of white dwarf a solar mass of star", Low: 0.07, High: 0.095, Preset: 0.09},
		},
	}, example: example{why: "0.45 + 0.09", question: "remain",
		inputs: []input{{"mass", 1}}, column: "mass", want: 0.54, ask: "mass=1Msun"},
	}
}

func collapse() sketch {
	return sketch{file: "collapse", card: law.Card{
		Summary: "a heavy star leaves a neutron star, the heaviest a black hole",
		Formula: "neutron star of ns_mass below the mass hole, from there on a hole of share m; solMass",
		Domain:  "stars from m_up on",
		Accepts: law.Accepts{Kinds: []string{"star"}, Column: "mass", Low: law.AtParameter("m_up")},
		Questions: []law.Question{
			{Name: "die", Inputs: []string{"mass"}, Words: []string{"neutron-star", "black-hole"}},
			{Name: "remain", Inputs: []string{"kind", "mass"}},
		},
		Parameters: []law.Parameter{
			{Name: "m_up", Unit: "solMass", Doc: "least mass at birth of a star that collapses", Low: 7, High: 9.5, Preset: 8},
			{Name: "hole", Unit: "solMass", Doc: "least mass of a star that leaves a hole", Low: 15, High: 40, Preset: 25},
			{Name: "ns_mass", Unit: "solMass", Doc: "mass of every neutron star", Low: 1.2, High: 1.6, Preset: 1.4},
			{Name: "share", Doc: "share of the star that ends in the hole", Low: 0.1, High: 1, Preset: 0.3},
		},
	}, example: example{why: "30 solMass is above 25", question: "die",
		inputs: []input{{"mass", 30}}, column: "chance_black_hole", want: 1, ask: "mass=30Msun"},
	}
}

func cooling(p law.Process) sketch {
	fit := map[string]struct {
		kind, source      string
		born, slope, aged float64
		want              float64
	}{
		"white-dwarf-cooling":  {"white-dwarf", "Mestel 1952, MNRAS 112, 583 (T ~ t^-0.35); temperatures: assumption", 1e5, 0.35, 1e4, 3.65},
		"neutron-star-cooling": {"neutron-star", assumption, 1e9, 0.5, 1e4, 3.5},
		"brown-dwarf-cooling":  {"brown-dwarf", "Burrows & Liebert 1993, Rev. Mod. Phys. 65, 301 (T ~ t^-0.32, from memory); temperatures: assumption", 3e3, 0.32, 1500, 2.85609},
	}[p.Name]
	return sketch{file: "shine", card: law.Card{
		Summary:   "temperature falls as a power of age, from what it is at birth",
		Formula:   "T = min(at_birth, at_1_gyr (age/1e9 yr)^-slope); K",
		Domain:    "the mass does not matter here; after crystals form and fuel is gone cooling is faster",
		Sources:   []string{fit.source},
		Accepts:   law.Accepts{Kinds: []string{fit.kind}},
		Questions: []law.Question{{Name: "shine", Inputs: []string{"log10_age"}}},
		Parameters: []law.Parameter{
			{Name: "at_birth", Unit: "K", Doc: "temperature at birth", Low: fit.born / 2, High: fit.born * 2, Preset: fit.born},
			{Name: "at_1_gyr", Unit: "K", Doc: "temperature after 1e9 yr", Low: fit.aged / 2, High: fit.aged * 1.5, Preset: fit.aged},
			{Name: "slope", Doc: "exponent", Low: fit.slope / 2, High: fit.slope * 1.5, Preset: fit.slope},
		},
	}, example: example{why: "ten times as old, by the power of the slope", question: "shine",
		inputs: []input{{"log10_age", 10}}, column: "log10_temperature", want: fit.want, ask: "age=1e10yr"},
	}
}

func warmth(law.Process) sketch {
	return sketch{file: "warm", card: law.Card{
		Summary:    "what is bound in the galaxy is heated by as much for each solar mass",
		Formula:    "power = heating m; W",
		Domain:     "while the source lasts: here for ever",
		Questions:  []law.Question{{Name: "warm", Inputs: []string{"mass", "place"}}},
		Parameters: []law.Parameter{{Name: "heating", Doc: "power, W for each solMass", Low: 0, High: 1e18, Preset: 1e15}},
	}, example: example{why: "1e15 W for each solar mass", question: "warm",
		inputs: []input{{"mass", 2}, {"place", law.Bound}}, column: "power", want: 2e15, ask: "mass=2Msun place=bound"},
	}
}

func twoBody(law.Process) sketch {
	const peters = "Peters 1964, Phys. Rev. 136, B1224, eq. 5.10"
	return sketch{file: "merge", card: law.Card{
		Summary: "two bodies on a circle spiral together by gravitational waves",
		Formula: "t = (5/256) c^5 a^4/(G^3 m1 m2 (m1 + m2)) (1 - e^2)^power; AU, solMass, yr",
		Domain:  "point masses far slower than light; exact for circles, up to 1.8 times too short for long orbits",
		Sources: []string{peters},
		Questions: []law.Question{
			{Name: "merge", Inputs: []string{"mass_1", "mass_2", "separation", "eccentricity"}},
		},
		Parameters: []law.Parameter{{Name: "power", Doc: "exponent of 1 - e^2", Low: 3, High: 4, Preset: 3.5, Citation: "after Peters 1964, eq. 5.14"}},
	}, example: example{why: "two suns 1 AU apart: 5/256 c^5 AU^4/(2 G^3 solMass^3) = 1.606e17 yr", question: "merge",
		inputs: []input{{"mass_1", 1}, {"mass_2", 1}, {"separation", 1}, {"eccentricity", 0}}, column: "wait", want: 17.205666,
		ask: "mass_1=1Msun mass_2=1Msun separation=1AU eccentricity=0"},
	}
}
