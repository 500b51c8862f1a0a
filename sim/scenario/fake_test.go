package scenario

import (
	"testing"
	"testing/fstest"

	"wane/sim/law"
)

// fake is a law that is a card and nothing else.
type fake struct{ card law.Card }

func (f fake) Describe() law.Card { return f.card }

func (f fake) Answer(string, law.Batch) (law.Batch, error) { return law.Batch{}, nil }

func card(process, name string, questions []law.Question, parameters ...law.Parameter) law.Card {
	for i := range parameters {
		parameters[i].Citation = "assumption"
	}
	return law.Card{
		Process: process, Name: name, Version: "1", Summary: "a law for tests", Sources: []string{"assumption"},
		Questions: questions, Parameters: parameters,
	}
}

// registry holds a few laws of each sort that a scenario treats differently.
func registry(t testing.TB) *law.Registry {
	t.Helper()
	wear := []law.Question{{Name: "wear"}}
	grand := card("nucleon-decay", "grand-unified", wear,
		law.Parameter{Name: "lifetime", Unit: "yr", Log10: true, Low: 34.4, High: 41, Preset: 37},
		law.Parameter{Name: "heat_share", Low: 1. / 3, High: 1, Preset: 2. / 3},
		law.Parameter{Name: "gone", Words: []string{"transparent", "last-nucleon"}, Preset: 0})
	grand.Thresholds = []law.Threshold{{Kind: "neutron-star", Mass: 0.1, Becomes: "relic", Outcome: "expanded"}}
	grand.Kinds = []law.Kind{{Name: "relic"}}
	other := card("nucleon-decay", "virtual-holes", wear,
		law.Parameter{Name: "lifetime", Unit: "yr", Log10: true, Low: 45, High: 169, Preset: 45})
	die := card("remnant", "simple", []law.Question{{Name: "die", Words: []string{"white-dwarf"}}, {Name: "remain"}},
		law.Parameter{Name: "scatter", Unit: "solMass", Low: 0, High: 0.1, Preset: 0.06})
	frame := card("ejection", "still", []law.Question{{Name: "rate"}, {Name: "expose"}})
	frame.Frame = true
	frame.Clocks = []law.Clock{{Name: "ejection", Outcome: "ejected", Fate: law.FateAdrift}}
	heavy := die
	heavy.Name, heavy.Accepts = "light-only", law.Accepts{Kinds: []string{"star"}, Column: "mass", High: law.At(8)}
	cool := card("white-dwarf-cooling", "mestel-debye", []law.Question{{Name: "shine"}})
	cool.Accepts.Kinds = []string{"white-dwarf"}
	r, err := law.NewRegistry(
		fake{frame}, fake{heavy},
		fake{card("substellar-limit", "fixed", []law.Question{{Name: "sort"}})},
		fake{card("lifetime", "table", []law.Question{{Name: "live"}})},
		fake{grand}, fake{other}, fake{card("nucleon-decay", "stable", wear)},
		fake{card("evaporation", "page", wear, law.Parameter{Name: "spin", Low: 0, High: 1, Preset: 0.5})},
		fake{die},
		fake{card("infall", "branching", []law.Question{{Name: "divert", Words: []string{"ejection"}}}, law.Parameter{Name: "f_in", Low: 0.01, High: 0.1, Preset: 0.05})},
		fake{cool},
	)
	if err != nil {
		t.Fatal(err)
	}
	return r
}

func defaults() map[string]string {
	return map[string]string{
		"nucleon-decay": "grand-unified", "evaporation": "page", "remnant": "simple", "infall": "branching",
		"white-dwarf-cooling": "mestel-debye", "ejection": "still", "substellar-limit": "fixed", "lifetime": "table",
	}
}

const reach = `
title = "Reach"
question = "When?"
realisations = 40
seed = 7
[galaxy]
objects = 2e11
sample = 100_000
radius = "10 kpc"
central-mass = "4.3e6 Msun"
[parameters.nucleon-decay]
lifetime = "2e37 yr"
`

// files is a file system of scenarios: reach.toml and the given text as x.toml.
func files(text string) fstest.MapFS {
	return fstest.MapFS{
		"reach.toml": {Data: []byte(reach)},
		"x.toml":     {Data: []byte(text)},
	}
}
