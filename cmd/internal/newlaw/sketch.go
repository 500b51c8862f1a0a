package newlaw

import "wane/sim/law"

// sketch is a simple law of a process: the card and the name of the templates
// with its functions.
type sketch struct {
	file    string
	card    law.Card
	example example
}

// example is a row whose answer is known by hand.
type example struct {
	why      string // how it is known
	question string
	inputs   []input
	column   string
	want     float64
	ask      string // what to ask of it on the command line
}

type input struct {
	Name  string
	Value float64
}

const assumption = "assumption: a simple form to begin with; put your source here"

// sketchOf is the simple law of a process.
func sketchOf(p law.Process, name string) sketch {
	s := map[law.Role]func(law.Process) sketch{
		law.Sky: sky, law.Ending: ending, law.Founding: founding, law.Stellar: stellar, law.Cooling: cooling, law.Warmth: warmth,
		law.Dynamics: dynamics, law.Encounter: encounter, law.TwoBody: twoBody, law.Wearing: wearing, law.Turning: turning,
	}[p.Role](p)
	s.card.Process, s.card.Name, s.card.Version = p.Name, name, "1"
	if len(s.card.Sources) == 0 {
		s.card.Sources = []string{assumption}
	}
	for i := range s.card.Parameters {
		if s.card.Parameters[i].Citation == "" {
			s.card.Parameters[i].Citation = "assumption"
		}
	}
	return s
}

func sky(law.Process) sketch {
	const planck = "Planck Collaboration VI 2020, A&A 641, A6, table 2"
	return sketch{file: "density", card: law.Card{
		Summary:   "flat space, dark energy whose pressure is w times its energy density",
		Formula:   "log10 of dark energy over today's critical density = log10(1 - matter - radiation) - 3 (1 + w) ln a / ln 10",
		Domain:    "flat space; w does not change",
		Sources:   []string{planck, "w: assumption"},
		Notes:     []string{"if an ending makes dark energy decay, it is gone at once (assumption)"},
		Questions: []law.Question{{Name: "density", Inputs: []string{"ln_a", "log10_since"}}},
		Parameters: []law.Parameter{
			{Name: "hubble", Unit: "km/s/Mpc", Doc: "expansion rate today", Low: 66, High: 74, Preset: 67.66, Citation: planck},
			{Name: "matter", Doc: "matter over the critical density today", Low: 0.27, High: 0.34, Preset: 0.3111, Citation: planck},
			{Name: "radiation", Doc: "radiation over the critical density today", Low: 0, High: 2e-4, Preset: 0},
			{Name: "temperature", Unit: "K", Doc: "relic radiation today", Low: 2.7, High: 2.75, Preset: 2.7255, Citation: "Fixsen 2009, ApJ 707, 916"},
			{Name: "w", Doc: "pressure over energy density of dark energy", Low: -1, High: -0.8, Preset: -1},
		},
	}, example: example{why: "today it is 1 - 0.3111 of the critical density", question: "density",
		inputs: []input{{"ln_a", 0}, {"log10_since", minusInf}}, column: "log10_dark", want: -0.16184},
	}
}

func ending(p law.Process) sketch {
	effect := "everything-ends"
	if p.Name == "dark-energy-decay" {
		effect = "dark-energy-decays"
	}
	return sketch{file: "end", card: law.Card{
		Summary:    "the end comes with the same chance in every year",
		Formula:    "cumulative hazard = t/lifetime; yr",
		Domain:     "everywhere, if nothing but time decides",
		Effect:     effect,
		Questions:  []law.Question{{Name: "end", Inputs: []string{"log10_date"}}},
		Parameters: []law.Parameter{{Name: "lifetime", Unit: "yr", Log10: true, Doc: "mean wait for the end", Low: 20, High: 300, Preset: 100}},
	}, example: example{why: "after 10^99 yr of 10^100 the hazard has come to 0.1", question: "end",
		inputs: []input{{"log10_date", 99}}, column: "log10_hazard", want: -1, ask: "date=1e99yr"},
	}
}

func founding(p law.Process) sketch {
	return map[string]func() sketch{
		"mass-function": massFunction, "star-formation": starFormation, "metals": metals, "substellar-limit": substellarLimit,
	}[p.Name]()
}

func massFunction() sketch {
	return sketch{file: "mass", card: law.Card{
		Summary:   "masses at birth follow one power law",
		Formula:   "number ~ mass^-slope from least to heaviest; solMass",
		Domain:    "stars of a tenth to some ten solar masses; too many light ones below",
		Sources:   []string{"Salpeter 1955, ApJ 121, 161 (slope)", "least and heaviest: assumption"},
		Questions: []law.Question{{Name: "mass", Inputs: []string{"u"}}},
		Parameters: []law.Parameter{
			{Name: "slope", Doc: "exponent", Low: 2, High: 2.7, Preset: 2.35, Citation: "Salpeter 1955"},
			{Name: "least", Unit: "solMass", Doc: "lightest object", Low: 0.01, High: 0.2, Preset: 0.05},
			{Name: "heaviest", Unit: "solMass", Doc: "heaviest object", Low: 50, High: 150, Preset: 100},
		},
	}, example: example{why: "half of all lie below (least^-1.35 (1 + 2000^-1.35)/2)^(-1/1.35)", question: "mass",
		inputs: []input{{"u", 0.5}}, column: "mass", want: 0.0835500, ask: "u=0.5"},
	}
}

func starFormation() sketch {
	return sketch{file: "birth", card: law.Card{
		Summary:   "as many objects are born in every year, from a first date to a last",
		Formula:   "t = first + u (last - first); yr since the Big Bang",
		Domain:    "a galaxy with the same supply of gas all the time",
		Questions: []law.Question{{Name: "birth", Inputs: []string{"u"}}},
		Parameters: []law.Parameter{
			{Name: "first", Unit: "yr", Log10: true, Doc: "date of the first birth", Low: 8, High: 9.5, Preset: 9},
			{Name: "last", Unit: "yr", Log10: true, Doc: "date of the last birth", Low: 10, High: 12, Preset: 10},
		},
	}, example: example{why: "the middle between 1e9 and 1e10 yr", question: "birth",
		inputs: []input{{"u", 0.5}}, column: "log10_date", want: 9.740363, ask: "u=0.5"},
	}
}

func metals() sketch {
	return sketch{file: "metals", card: law.Card{
		Summary:   "heavy elements grow as a power of the date, and no further after today",
		Formula:   "metals = today (t/1.38e10 yr)^growth, at most today",
		Domain:    "one galaxy, well mixed",
		Questions: []law.Question{{Name: "metals", Inputs: []string{"log10_date"}}},
		Parameters: []law.Parameter{
			{Name: "today", Doc: "heavy elements by mass of what is born today", Low: 0.001, High: 0.06, Preset: 0.02},
			{Name: "growth", Doc: "exponent", Low: 0, High: 2, Preset: 0.5},
		},
	}, example: example{why: "the value today, long after today", question: "metals",
		inputs: []input{{"log10_date", 12}}, column: "metals", want: 0.02, ask: "date=1e12yr"},
	}
}

func substellarLimit() sketch {
	return sketch{file: "sort", card: law.Card{
		Summary:    "an object lighter than a limit is a brown dwarf",
		Formula:    "star from the limit on, brown dwarf below; solMass",
		Domain:     "solar metals; the limit falls a little with them",
		Questions:  []law.Question{{Name: "sort", Inputs: []string{"mass"}}},
		Parameters: []law.Parameter{{Name: "limit", Unit: "solMass", Doc: "least mass of a star", Low: 0.07, High: 0.09, Preset: 0.08}},
	}, example: example{why: "0.05 solMass is a brown dwarf, code 1", question: "sort",
		inputs: []input{{"mass", 0.05}}, column: "kind", want: law.BrownDwarf, ask: "mass=0.05Msun"},
	}
}
