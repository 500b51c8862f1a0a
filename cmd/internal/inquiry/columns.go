package inquiry

import (
	"strings"

	"wane/sim/law"
)

// column is one input or answer of a question as people name it.
type column struct {
	raw   string // name in the catalogue
	name  string // plain name
	unit  string
	log10 bool   // the law reads or answers log10 of it
	list  string // for words: which list, "kind", "place", "origin", "composition", "outcome"
}

// plain is a catalogue name as people write it.
func plain(raw string) string { return strings.TrimPrefix(raw, "log10_") }

func inputColumn(question, raw string) column {
	info, _ := law.ColumnNamed(question, raw)
	return column{raw: raw, name: plain(raw), unit: info.Unit, log10: strings.HasPrefix(raw, "log10_"), list: info.Words}
}

// outputColumn names an answer of a card. Answers that share a name with an
// input of the same question get one of their own.
func outputColumn(c law.Card, question, raw string) column {
	out := column{raw: raw, name: plain(raw), log10: strings.HasPrefix(raw, "log10_")}
	switch {
	case raw == "wait":
		out.name, out.unit, out.log10 = waitName(c, question), "yr", true
	case raw == "mass" && question == "remain":
		out.name, out.unit = "remnant_mass", "solMass"
	case raw == "mass" && question == "foretell":
		out.name, out.unit = "mass_after", "solMass"
	case strings.HasPrefix(raw, "mass"), raw == "gas":
		out.unit = "solMass"
	case raw == "log10_date":
		out.unit = "yr"
	case raw == "log10_temperature":
		out.unit = "K"
	case raw == "log10_rate":
		out.name, out.unit = "loss_rate", "solMass/yr"
		if strings.HasPrefix(c.Wears, "gain") {
			out.name = "gain_rate"
		}
	case strings.HasPrefix(raw, "log10_rate_"):
		out.unit = "yr-1"
	case raw == "log10_dark":
		out.name = "dark_energy" // of the critical density today
	case raw == "heat":
		out.name = "heat_share"
	case raw == "radius":
		out.unit = "pc"
	case raw == "dispersion":
		out.unit = "km/s"
	case raw == "power":
		out.unit = "W"
	case strings.HasPrefix(raw, "kind"):
		out.list = "kind"
	case strings.HasPrefix(raw, "composition"):
		out.list = "composition"
	case raw == "outcome":
		out.list = "outcome"
	}
	return out
}

// waitName is what a wait is called: a lifetime, unless the law has a
// parameter of that name.
func waitName(c law.Card, question string) string {
	if question == "merge" {
		return "merger_time"
	}
	for _, p := range c.Parameters {
		if p.Name == "lifetime" {
			return "wait"
		}
	}
	return "lifetime"
}

func (a *asking) outputs(question string) []column {
	raw := a.use.Card.Outputs(question)
	out := make([]column, len(raw))
	for i, r := range raw {
		out[i] = outputColumn(a.use.Card, question, r)
	}
	return out
}

func inputs(q law.Question) []column {
	out := make([]column, len(q.Inputs))
	for i, r := range q.Inputs {
		out[i] = inputColumn(q.Name, r)
	}
	return out
}

// words is the list that the codes of a column index.
func (a *asking) words(list string) []string {
	switch list {
	case "kind":
		return a.kinds
	case "place":
		return law.PlaceWords
	case "origin":
		return law.OriginWords
	case "composition":
		return law.CompositionWords
	case "outcome":
		out := make([]string, len(a.use.Card.Outcomes))
		for i, o := range a.use.Card.Outcomes {
			out[i] = o.Word
		}
		return out
	}
	return nil
}
