package law

import "strings"

// Role groups the processes that are asked the same questions.
type Role string

// The roles.
const (
	Sky       Role = "sky"
	Ending    Role = "ending"
	Founding  Role = "founding"
	Stellar   Role = "stellar"
	Dynamics  Role = "dynamics"
	Encounter Role = "encounter"
	Turning   Role = "turning"
	Wearing   Role = "wearing"
	Cooling   Role = "cooling"
	TwoBody   Role = "two-body"
	Warmth    Role = "warmth"
)

// Process is one thing that happens, served by exactly one law in a run.
type Process struct {
	Name     string
	Role     Role
	Doc      string
	Optional bool // a run may do without
}

// Processes is every process Wane knows, in the order in which it prints them.
var Processes = []Process{
	{"expansion", Sky, "how space expands and what the sky's temperature is", false},
	{"vacuum-decay", Ending, "whether and when the vacuum itself decays", true},
	{"dark-energy-decay", Ending, "whether and when dark energy decays", true},
	{"mass-function", Founding, "the masses objects are born with", false},
	{"star-formation", Founding, "when objects are born", false},
	{"metals", Founding, "the heavy elements objects are born with", false},
	{"substellar-limit", Founding, "the mass below which a newborn object is a brown dwarf", false},
	{"lifetime", Stellar, "how long a star lives", false},
	{"remnant", Stellar, "what light stars leave", false},
	{"collapse", Stellar, "what heavy stars leave", false},
	{"white-dwarf-cooling", Cooling, "how white dwarfs cool", false},
	{"neutron-star-cooling", Cooling, "how neutron stars cool", false},
	{"brown-dwarf-cooling", Cooling, "how brown dwarfs cool", false},
	{"warmth", Warmth, "heat from outside, such as dark matter", true},
	{"ejection", Dynamics, "how the galaxy throws its objects out", false},
	{"infall", Dynamics, "how objects fall into the central hole", true},
	{"encounter", Encounter, "how objects meet, and what comes of it", true},
	{"orbital-decay", TwoBody, "how two objects spiral together", true},
	{"nucleon-decay", Wearing, "how nucleons decay", true},
	{"evaporation", Wearing, "how black holes evaporate", true},
	{"curvature", Wearing, "how dense matter might evaporate without a horizon", true},
	{"supernova", Turning, "how cold dwarfs explode or collapse", true},
	{"iron", Turning, "how cold matter turns to iron", true},
	{"tunnelling", Turning, "how cold matter tunnels to a hole", true},
}

// ProcessNamed returns the process of that name.
func ProcessNamed(name string) (Process, bool) {
	for _, p := range Processes {
		if p.Name == name {
			return p, true
		}
	}
	return Process{}, false
}

// asked lists, per process, the questions its laws may answer; those in
// required they must.
type asked struct{ required, optional []string }

func questionsOf(p Process) asked {
	switch p.Role {
	case Sky:
		return asked{required: []string{"density"}}
	case Ending:
		return asked{required: []string{"end"}}
	case Founding:
		return asked{required: []string{map[string]string{
			"mass-function": "mass", "star-formation": "birth", "metals": "metals", "substellar-limit": "sort",
		}[p.Name]}}
	case Stellar:
		if p.Name == "lifetime" {
			return asked{required: []string{"live"}}
		}
		return asked{required: []string{"die", "remain"}}
	case Dynamics:
		return asked{optional: []string{"rate", "expose", "divert"}}
	case Encounter:
		return asked{optional: []string{"rate", "expose", "meet"}}
	case Turning:
		return asked{required: []string{"foretell"}}
	case Wearing:
		return asked{required: []string{"wear"}, optional: []string{"foretell", "heat"}}
	case Cooling:
		return asked{required: []string{"shine"}}
	case TwoBody:
		return asked{required: []string{"merge"}}
	case Warmth:
		return asked{required: []string{"warm"}}
	}
	return asked{}
}

// ChanceColumn is the name of the column of chances for a word.
func ChanceColumn(word string) string { return "chance_" + underscored(word) }

// RateColumn is the name of the column of a clock's rate, log10 per year.
func RateColumn(clock string) string { return "log10_rate_" + underscored(clock) }

// ToColumn is the name of the column of susceptibilities to a clock.
func ToColumn(clock string) string { return "to_" + underscored(clock) }

// ShareColumn is the name of the column of shares that are taken of a clock.
func ShareColumn(clock string) string { return "share_" + underscored(clock) }

// SeeksColumn is the name of the column of how eagerly objects seek others on
// a clock of encounters.
func SeeksColumn(clock string) string { return "seeks_" + underscored(clock) }

// SoughtColumn is the name of the column of how readily objects are found on a
// clock of encounters.
func SoughtColumn(clock string) string { return "sought_" + underscored(clock) }

func underscored(word string) string { return strings.ReplaceAll(word, "-", "_") }

// Outputs lists the columns of the answer to a question, in order. They
// follow from the role, and from the words and clocks on the card.
func (c Card) Outputs(question string) []string {
	p, _ := ProcessNamed(c.Process)
	switch question {
	case "density":
		return []string{"log10_dark", "curvature"}
	case "end":
		return []string{"log10_hazard"}
	case "mass":
		return []string{"mass"}
	case "birth":
		return []string{"log10_date"}
	case "metals":
		return []string{"metals"}
	case "sort":
		return []string{"kind"}
	case "live", "merge":
		return []string{"wait"}
	case "die":
		return each(c.question(question).Words, ChanceColumn)
	case "remain":
		return []string{"mass", "composition"}
	case "rate":
		out := c.clocks(RateColumn)
		if c.Frame {
			out = append(out, "radius", "dispersion", "stop")
		}
		return out
	case "expose":
		if p.Role == Encounter {
			return append(c.clocks(SeeksColumn), c.clocks(SoughtColumn)...)
		}
		return c.clocks(ToColumn)
	case "divert":
		return each(c.question(question).Words, ShareColumn)
	case "meet":
		return []string{"outcome", "kind_1", "mass_1", "composition_1", "kind_2", "mass_2", "composition_2", "gas"}
	case "foretell":
		if p.Role == Turning {
			words := make([]string, len(c.Outcomes))
			for i, o := range c.Outcomes {
				words[i] = o.Word
			}
			return append(append([]string{"wait"}, each(words, ChanceColumn)...), "mass", "gas")
		}
		return []string{"wait"}
	case "wear":
		return []string{"log10_rate", "heat"}
	case "heat", "shine":
		return []string{"log10_temperature"}
	case "warm":
		return []string{"power"}
	}
	return nil
}

func (c Card) clocks(column func(string) string) []string {
	out := make([]string, len(c.Clocks))
	for i, k := range c.Clocks {
		out[i] = column(k.Name)
	}
	return out
}

func (c Card) question(name string) Question {
	for _, q := range c.Questions {
		if q.Name == name {
			return q
		}
	}
	return Question{}
}

// Answers tells whether the card declares the question.
func (c Card) Answers(question string) bool { return c.question(question).Name != "" }

func each(words []string, f func(string) string) []string {
	out := make([]string, len(words))
	for i, w := range words {
		out[i] = f(w)
	}
	return out
}
