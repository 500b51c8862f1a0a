package law

import (
	"math"
	"strings"
	"testing"
)

// cards of each role, faultless.
func goodCards() map[string]Card {
	lifetime := card("lifetime", "table", Question{Name: "live", Inputs: []string{"kind", "mass", "metals", "composition"}})
	lifetime.Parameters = []Parameter{{Name: "m_up", Low: 1, High: 20, Preset: 8, Citation: "assumption"},
		{Name: "mode", Words: []string{"a", "b"}, Preset: 1, Citation: "assumption"}}
	lifetime.Accepts = Accepts{Kinds: []string{"star"}, Column: "mass", Low: At(0.1), High: AtParameter("m_up")}
	remnant := card("remnant", "three-piece", die, remain)
	wear := card("nucleon-decay", "one", Question{Name: "wear", Inputs: []string{"mass", "birth_mass"}}, Question{Name: "foretell", Inputs: []string{"mass"}})
	wear.Parameters = []Parameter{{Name: "gone", Words: []string{"a", "b"}, Citation: "assumption"},
		{Name: "log_life", Log10: true, Low: 30, High: 40, Preset: 37, Citation: "assumption"}}
	wear.Kinds = []Kind{{Name: "ash", Composition: Iron}}
	wear.Thresholds = []Threshold{{Kind: "neutron-star", Mass: 0.1, Becomes: "ash", Outcome: "expanded"},
		{Kind: "neutron-star", Mass: 0, Becomes: Gone, Outcome: "dissolved"},
		{Kind: "ash", Parameter: "gone", ByWord: []float64{1, 2}, Becomes: Gone, Outcome: "dissolved"}}
	wear.Wears = "gain from infalling gas"
	frame := card("ejection", "one", Question{Name: "rate", Inputs: []string{"number", "sum_throw", "number_white_dwarf"}}, Question{Name: "expose", Inputs: []string{"mass"}})
	frame.Frame, frame.Clocks = true, []Clock{{Name: "throw", Outcome: "ejected", Fate: FateAdrift}}
	frame.StopOutcome, frame.StopFate = "swallowed", FateCentral
	turn := card("iron", "one", Question{Name: "foretell", Inputs: []string{"kind", "mass", "u"}})
	turn.Outcomes = []Outcome{{Word: "turned", Becomes: "iron-star"}, {Word: "blown-apart", Becomes: Gone}}
	ending := card("vacuum-decay", "one", Question{Name: "end", Inputs: []string{"log10_date", "log10_four_volume"}})
	ending.Effect = "everything-ends"
	sky := card("expansion", "one", Question{Name: "density", Inputs: []string{"ln_a", "log10_date", "log10_since"}})
	for _, p := range SkyParameters {
		sky.Parameters = append(sky.Parameters, Parameter{Name: p, Citation: "assumption"})
	}
	divert := card("infall", "one", Question{Name: "divert", Inputs: []string{"mass"}, Words: []string{"throw"}})
	merge := card("orbital-decay", "one", Question{Name: "merge", Inputs: []string{"mass_1", "mass_2", "separation", "eccentricity"}})
	warm := card("warmth", "one", Question{Name: "warm", Inputs: []string{"kind", "mass", "radius", "place"}})
	warm.Idle = true
	return map[string]Card{"stellar": lifetime, "remnant": remnant, "wearing": wear, "dynamics": frame, "turning": turn,
		"ending": ending, "sky": sky, "divert": divert, "merge": merge, "warm": warm}
}

func TestCheckCardAcceptsGoodOnes(t *testing.T) {
	for name, c := range goodCards() {
		for _, f := range CheckCard(c) {
			t.Errorf("%s: %v", name, f)
		}
	}
}

func TestCheckCardFindsFaults(t *testing.T) {
	inputs := func(question int, names ...string) func(*Card) {
		return func(c *Card) { c.Questions[question].Inputs = names }
	}
	parameter := func(x Parameter) func(*Card) { return func(c *Card) { c.Parameters[0] = x } }
	accepts := func(a Accepts) func(*Card) { return func(c *Card) { c.Accepts = a } }
	threshold := func(x Threshold) func(*Card) { return func(c *Card) { c.Thresholds[2] = x } }
	for _, x := range []struct {
		card  string
		spoil func(*Card)
		want  string
	}{
		{"stellar", func(c *Card) { c.Process = "weather" }, `unknown process "weather"`},
		{"stellar", func(c *Card) { c.Version = "" }, "name, version and summary"},
		{"stellar", func(c *Card) { c.Name = "Two Words" }, `name "Two Words"`},
		{"stellar", func(c *Card) { c.Summary = "two\nlines" }, "one line"},
		{"stellar", func(c *Card) { c.Sources = nil }, "no source"},
		{"stellar", func(c *Card) { c.Tolerance = 1 }, "tolerance 1"},
		{"stellar", func(c *Card) { c.Questions = nil }, `is asked "live"`},
		{"stellar", func(c *Card) { c.Questions = append(c.Questions, c.Questions[0]) }, `question "live" is there twice`},
		{"stellar", func(c *Card) { c.Questions = append(c.Questions, die) }, `question "die" is not one`},
		{"stellar", inputs(0, "colour"), `question live: unknown column "colour"`},
		{"stellar", inputs(0, "u"), `question live: unknown column "u"`},
		{"stellar", inputs(0, "mass", "mass"), `column "mass" is there twice`},
		{"stellar", func(c *Card) { c.Questions[0].Words = []string{"star"} }, "question live takes no words"},
		{"remnant", func(c *Card) { c.Questions[0].Words = nil }, "question die needs the words"},
		{"remnant", func(c *Card) { c.Questions[0].Words = []string{"ash"} }, `question die: no kind "ash"`},
		{"sky", inputs(0, "log10_four_volume"), "question density: unknown column"},
		{"sky", func(c *Card) { c.Parameters[0].Name = "h" }, `needs the parameter "hubble"`},
		{"ending", inputs(0, "ln_a"), "question end: unknown column"},
		{"ending", func(c *Card) { c.Effect = "boredom" }, `effect "boredom"`},
		{"stellar", func(c *Card) { c.Effect = "everything-ends" }, "of an ending"},
		{"wearing", inputs(0, "u"), "question wear: unknown column"},
		{"wearing", inputs(1, "u"), "question foretell: unknown column"},
		{"dynamics", inputs(0, "mass"), "question rate: unknown column"},
		{"merge", inputs(0, "mass"), "question merge: unknown column"},
		{"merge", inputs(0, "u"), "question merge: unknown column"},
		{"stellar", parameter(Parameter{Name: "m_up", Low: 1, High: 20, Preset: 21, Citation: "assumption"}), "preset 21 outside 1 .. 20"},
		{"stellar", parameter(Parameter{Name: "m_up", Low: 1, High: 20, Preset: math.NaN(), Citation: "assumption"}), "preset NaN"},
		{"stellar", parameter(Parameter{Name: "m_up", Low: 1, High: 20, Preset: 8}), "no citation"},
		{"stellar", parameter(Parameter{Name: "m_up", Words: []string{"a"}, Preset: 0.5, Citation: "assumption"}), "is no index"},
		{"stellar", parameter(Parameter{Name: "m_up", Words: []string{"a", "a"}, Citation: "assumption"}), `word "a" is there twice`},
		{"stellar", parameter(Parameter{Name: "m-up", Citation: "assumption"}), `parameter "m-up"`},
		{"stellar", func(c *Card) { c.Parameters = append(c.Parameters, c.Parameters[0]) }, `parameter "m_up" is there twice`},
		{"stellar", accepts(Accepts{Kinds: []string{"ash"}}), `no kind "ash"`},
		{"stellar", accepts(Accepts{Kinds: []string{"star", "star"}}), `kind "star" is there twice`},
		{"stellar", accepts(Accepts{Column: "radius"}), `column "radius"`},
		{"stellar", accepts(Accepts{Low: At(1)}), "a limit needs a column"},
		{"stellar", accepts(Accepts{Column: "mass", Low: At(2), High: At(2)}), "nothing lies between"},
		{"stellar", accepts(Accepts{Column: "mass", High: At(math.NaN())}), "not a number"},
		{"stellar", accepts(Accepts{Column: "mass", High: AtParameter("m_low")}), `no parameter "m_low"`},
		{"stellar", accepts(Accepts{Column: "mass", High: AtParameter("weather.m_up")}), `unknown process "weather"`},
		{"stellar", func(c *Card) { c.Wears = "loss" }, "only wearing laws"},
		{"wearing", func(c *Card) { c.Wears = "gain" }, `wears "gain"`},
		{"wearing", func(c *Card) { c.Wears = "gain from " }, "wears"},
		{"wearing", threshold(Threshold{Kind: "soot", Becomes: Gone, Outcome: "x"}), `no kind "soot"`},
		{"wearing", threshold(Threshold{Kind: "ash", Becomes: "soot", Outcome: "x"}), `no kind "soot"`},
		{"wearing", threshold(Threshold{Kind: "ash", Becomes: Gone}), `outcome ""`},
		{"wearing", threshold(Threshold{Kind: "ash", Mass: -1, Becomes: Gone, Outcome: "x"}), "mass -1 solMass"},
		{"wearing", threshold(Threshold{Kind: "neutron-star", Mass: 0.05, Becomes: Gone, Outcome: "x"}), "want the largest first"},
		{"wearing", threshold(Threshold{Kind: "ash", Parameter: "least", Becomes: Gone, Outcome: "x"}), `no parameter "least"`},
		{"wearing", threshold(Threshold{Kind: "ash", Parameter: "gone", Becomes: Gone, Outcome: "x"}), "0 masses for the 2 words"},
		{"wearing", threshold(Threshold{Kind: "ash", ByWord: []float64{1}, Becomes: Gone, Outcome: "x"}), "of no parameter"},
		{"wearing", threshold(Threshold{Kind: "ash", Parameter: "log_life", Becomes: Gone, Outcome: "x"}), "is a logarithm"},
		{"wearing", func(c *Card) { c.Kinds[0].Name = "star" }, `kind "star": want a word of its own`},
		{"wearing", func(c *Card) { c.Kinds[0].Composition = NoWord }, "composition 255"},
		{"stellar", func(c *Card) { c.Clocks = []Clock{{Name: "a"}} }, "only laws of dynamics"},
		{"dynamics", func(c *Card) { c.Clocks[0].Fate = FateMeet }, `fate "meet"`},
		{"dynamics", func(c *Card) { c.Clocks[0].Fate = "" }, `fate ""`},
		{"dynamics", func(c *Card) { c.Clocks[0].Outcome = "" }, `outcome ""`},
		{"dynamics", func(c *Card) { c.Clocks[0].Name = "To And Fro" }, `clock "To And Fro"`},
		{"dynamics", func(c *Card) { c.Clocks = append(c.Clocks, c.Clocks[0]) }, `clock "throw" is there twice`},
		{"dynamics", func(c *Card) { c.Questions = c.Questions[:1] }, "must answer rate and expose"},
		{"dynamics", func(c *Card) { c.Frame = false }, "belongs to process ejection"},
		{"divert", func(c *Card) { c.Frame = true }, "belongs to process ejection"},
		{"dynamics", func(c *Card) { c.StopFate = "" }, "has no fate"},
		{"dynamics", func(c *Card) { c.StopFate = FateMeet }, `fate "meet" of the stop`},
		{"dynamics", func(c *Card) { c.StopOutcome = "" }, "needs the frame and a word"},
		{"turning", func(c *Card) { c.Outcomes = nil }, "no outcomes"},
		{"turning", func(c *Card) { c.Outcomes[1].Word = "turned" }, `outcome "turned" is there twice`},
		{"turning", func(c *Card) { c.Outcomes[1].Word = "" }, `outcome ""`},
		{"turning", func(c *Card) { c.Outcomes[1].Becomes = "" }, `no kind ""`},
	} {
		c := goodCards()[x.card]
		x.spoil(&c)
		found := false
		faults := CheckCard(c)
		for _, f := range faults {
			found = found || strings.Contains(f.Error(), x.want)
		}
		if !found {
			t.Errorf("%s: got %v, want a fault with %q", x.card, faults, x.want)
		}
	}
}
