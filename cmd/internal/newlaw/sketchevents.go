package newlaw

import "wane/sim/law"

func dynamics(p law.Process) sketch {
	if p.Name == "infall" {
		return sketch{file: "divert", card: law.Card{
			Summary:    "of the objects that leave the galaxy a share falls into the central hole instead",
			Formula:    "share of the hits of the clock ejection",
			Domain:     "a central hole that swallows whole; every object alike",
			Questions:  []law.Question{{Name: "divert", Words: []string{"ejection"}}},
			Parameters: []law.Parameter{{Name: "share", Doc: "share that falls in", Low: 0, High: 0.2, Preset: 0.05}},
		}, example: example{why: "the preset", question: "divert", column: "share_ejection", want: 0.05, ask: "share=0.05"}}
	}
	return sketch{file: "ejection", card: law.Card{
		Summary: "every object is thrown out with the same chance in every year; the galaxy keeps its size",
		Formula: "rate = 1/lifetime for each object; yr",
		Domain:  "none really: encounters slow down or speed up as a galaxy empties",
		Questions: []law.Question{
			{Name: "rate", Inputs: []string{"founded_radius", "founded_dispersion"}},
			{Name: "expose"},
		},
		Parameters: []law.Parameter{{Name: "lifetime", Unit: "yr", Log10: true, Doc: "mean stay in the galaxy", Low: 17, High: 21, Preset: 19}},
		Clocks:     []law.Clock{{Name: "ejection", Doc: "counts mean stays", Outcome: "ejected", Fate: law.FateAdrift}},
		Frame:      true,
	}, example: example{why: "once in 10^19 yr", question: "rate",
		inputs: []input{{"founded_radius", 1e4}, {"founded_dispersion", 200}}, column: "log10_rate_ejection", want: -19}}
}

func encounter(law.Process) sketch {
	return sketch{file: "encounter", card: law.Card{
		Summary: "two objects that pass within a set distance meet: holes swallow, else the lighter one is torn to gas",
		Formula: "rate of one seeking one other = (3/4) reach^2 v/R^3 / 2; AU, km/s, pc, yr",
		Domain:  "straight paths through a sphere of even density: no focusing by gravity",
		Notes:   []string{"each of two objects seeks the other: hence the half"},
		Questions: []law.Question{
			{Name: "rate", Inputs: []string{"galaxy_radius", "galaxy_dispersion"}},
			{Name: "expose"},
			{Name: "meet", Inputs: []string{"kind_1", "mass_1", "composition_1", "kind_2", "mass_2", "composition_2"}},
		},
		Parameters: []law.Parameter{{Name: "reach", Unit: "AU", Doc: "distance within which two objects meet", Low: 0.001, High: 1, Preset: 0.01}},
		Clocks:     []law.Clock{{Name: "collision", Doc: "counts meetings of one object with one other", Fate: law.FateMeet}},
		Outcomes: []law.Outcome{
			{Word: "swallowed", Doc: "a hole takes the other whole"},
			{Word: "torn", Doc: "the lighter one becomes gas"},
		},
	}, example: example{why: "0.375 (0.01 AU)^2 200 km/s/(1e4 pc)^3, with 1 pc = 206264.8 AU and 1 km/s = 0.2109 AU/yr", question: "rate",
		inputs: []input{{"galaxy_radius", 1e4}, {"galaxy_dispersion", 200}}, column: "log10_rate_collision", want: -30.744045}}
}

func wearing(p law.Process) sketch {
	if p.Name == "evaporation" {
		return evaporation()
	}
	kinds, life := []string{"brown-dwarf", "white-dwarf", "neutron-star"}, 37.0
	if p.Name == "curvature" {
		kinds, life = []string{"white-dwarf", "neutron-star"}, 78
	}
	s := sketch{file: "matter", card: law.Card{
		Summary: "matter decays with the same mean life everywhere, and bodies shrink until they count as gone",
		Formula: "dM/dt = -M/lifetime, so a mass is reached at lifetime ln(M0/M); yr, solMass. Heat left: heat_share of the mass lost",
		Domain:  "cold bodies",
		Accepts: law.Accepts{Kinds: kinds},
		Questions: []law.Question{
			{Name: "wear", Inputs: []string{"mass"}},
			{Name: "foretell", Inputs: []string{"mass"}},
		},
		Parameters: []law.Parameter{
			{Name: "lifetime", Unit: "yr", Log10: true, Doc: "mean life of matter", Low: life - 3, High: life + 4, Preset: life},
			{Name: "gone", Unit: "solMass", Doc: "mass at which a body counts as gone", Low: 1e-10, High: 1e-3, Preset: 5e-10},
			{Name: "heat_share", Doc: "share of the energy that stays as heat", Low: 0, High: 1, Preset: 0.5},
		},
		Wears: "loss",
	}, example: example{why: "10^life ln(1/5e-10) = 10^life 21.416", question: "foretell",
		inputs: []input{{"mass", 1}}, column: "wait", want: life + 1.330747, ask: "mass=1Msun"}}
	for _, kind := range kinds {
		s.card.Thresholds = append(s.card.Thresholds, law.Threshold{Kind: kind, Parameter: "gone", Becomes: law.Gone, Outcome: "dissolved"})
	}
	return s
}

func evaporation() sketch {
	s := sketch{file: "evaporation", card: law.Card{
		Summary: "a hole loses mass as 1/M^2",
		Formula: "dM/dt = -(solMass)^3/(3 lifetime M^2), so all is lost after lifetime (M/solMass)^3; yr. Temperature 6.170e-8 K solMass/M",
		Domain:  "holes without charge and spin, and far from the last moments",
		Sources: []string{"Hawking 1975, Commun. Math. Phys. 43, 199 (1/M^2, temperature)", "Page 1976, Phys. Rev. D 13, 198 (about the preset)"},
		Accepts: law.Accepts{Kinds: []string{"black-hole", "central-hole"}},
		Questions: []law.Question{
			{Name: "wear", Inputs: []string{"mass"}},
			{Name: "foretell", Inputs: []string{"mass"}},
			{Name: "heat", Inputs: []string{"mass"}},
		},
		Parameters: []law.Parameter{{Name: "lifetime", Unit: "yr", Log10: true, Doc: "life of a hole of 1 solMass", Low: 60, High: 75, Preset: 67}},
		Wears:      "loss",
	}, example: example{why: "1e67 yr times 10^3", question: "foretell",
		inputs: []input{{"mass", 10}}, column: "wait", want: 70, ask: "mass=10Msun"}}
	for _, kind := range s.card.Accepts.Kinds {
		s.card.Thresholds = append(s.card.Thresholds, law.Threshold{Kind: kind, Becomes: law.Gone, Outcome: "evaporated"})
	}
	return s
}

func turning(p law.Process) sketch {
	of := map[string]struct {
		kinds []string
		turns law.Outcome
		life  float64
	}{
		"supernova":  {[]string{"white-dwarf"}, law.Outcome{Word: "exploded", Doc: "all of it becomes gas", Becomes: law.Gone}, 1500},
		"iron":       {[]string{"white-dwarf"}, law.Outcome{Word: "turned", Doc: "into a ball of iron", Becomes: "iron-star"}, 1500},
		"tunnelling": {[]string{"white-dwarf", "neutron-star"}, law.Outcome{Word: "collapsed", Doc: "into a hole", Becomes: "black-hole"}, 1e26},
	}[p.Name]
	file := "turning"
	if of.turns.Becomes == law.Gone {
		file = "exploding"
	}
	s := sketch{file: file, card: law.Card{
		Summary:    "it happens to each object with the same chance in every year",
		Formula:    "wait = lifetime e, e a unit exponential; yr",
		Domain:     "if nothing but chance decides: age and mass do not",
		Accepts:    law.Accepts{Kinds: of.kinds},
		Outcomes:   []law.Outcome{of.turns},
		Questions:  []law.Question{{Name: "foretell", Inputs: []string{"mass", "e"}}},
		Parameters: []law.Parameter{{Name: "lifetime", Unit: "yr", Log10: true, Doc: "mean wait", Low: of.life / 2, High: of.life * 2, Preset: of.life}},
	}, example: example{why: "at e = 1 the wait is the mean", question: "foretell",
		inputs: []input{{"mass", 1}, {"e", 1}}, column: "wait", want: of.life, ask: "mass=1Msun e=1"}}
	if of.turns.Becomes == "iron-star" {
		s.card.Kinds = []law.Kind{{Name: "iron-star", Doc: "ball of cold iron", Composition: law.Iron}}
	}
	return s
}
