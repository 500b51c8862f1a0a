package cli

import (
	"fmt"
	"io"
	"math"
	"strconv"
	"strings"

	"wane/sim/law"
	"wane/sim/scenario"
	"wane/sim/scenario/quantity"
)

// cardJSON is a law's card for programs.
type cardJSON struct {
	Process    string          `json:"process"`
	Name       string          `json:"name"`
	Version    string          `json:"version"`
	Default    bool            `json:"default"`
	Summary    string          `json:"summary"`
	Formula    string          `json:"formula"`
	Domain     string          `json:"domain"`
	Accepts    acceptsJSON     `json:"accepts"`
	Questions  []questionJSON  `json:"questions"`
	Parameters []parameterJSON `json:"parameters"`
	Thresholds []thresholdJSON `json:"thresholds"`
	Clocks     []clockJSON     `json:"clocks"`
	Outcomes   []outcomeJSON   `json:"outcomes"`
	Kinds      []kindJSON      `json:"kinds"`
	Effect     string          `json:"effect,omitempty"`
	Wears      string          `json:"wears,omitempty"`
	Tolerance  float64         `json:"tolerance"` // 0: the same bits everywhere
	Notes      []string        `json:"notes"`
	Sources    []string        `json:"sources"`
	Outside    *outsideJSON    `json:"outside,omitempty"`
}

type acceptsJSON struct {
	Kinds  []string `json:"kinds"`
	Column string   `json:"column,omitempty"`
	Low    string   `json:"low,omitempty"`
	High   string   `json:"high,omitempty"`
}

type thresholdJSON struct {
	Kind      string   `json:"kind"`
	Mass      *float64 `json:"mass"` // solMass; null: Parameter says it
	Parameter string   `json:"parameter,omitempty"`
	Becomes   string   `json:"becomes"`
	Outcome   string   `json:"outcome"`
}

type clockJSON struct {
	Name    string `json:"name"`
	Outcome string `json:"outcome"`
	Fate    string `json:"fate"`
	Doc     string `json:"doc"`
}

type outcomeJSON struct {
	Word    string `json:"word"`
	Becomes string `json:"becomes,omitempty"`
	Doc     string `json:"doc"`
}

type kindJSON struct {
	Name        string `json:"name"`
	Composition string `json:"composition"`
	Doc         string `json:"doc"`
}

type questionJSON struct {
	Name    string   `json:"name"`
	Inputs  []string `json:"inputs"`
	Outputs []string `json:"outputs"`
}

type parameterJSON struct {
	Name     string   `json:"name"`
	Unit     string   `json:"unit"`
	Log10    bool     `json:"log10"`
	Low      *float64 `json:"low"`
	High     *float64 `json:"high"`
	Preset   any      `json:"preset"`
	Words    []string `json:"words,omitempty"`
	Doc      string   `json:"doc"`
	Citation string   `json:"citation"`
}

func cardOf(c law.Card, isDefault bool) cardJSON {
	out := cardJSON{
		Process: c.Process, Name: c.Name, Version: c.Version, Default: isDefault, Summary: c.Summary, Formula: c.Formula,
		Domain: c.Domain, Questions: []questionJSON{}, Parameters: []parameterJSON{},
		Notes: append([]string{}, c.Notes...), Sources: append([]string{}, c.Sources...),
		Accepts: acceptsJSON{Kinds: append([]string{}, c.Accepts.Kinds...), Column: c.Accepts.Column,
			Low: limit(c.Accepts.Low), High: limit(c.Accepts.High)},
	}
	for _, q := range c.Questions {
		out.Questions = append(out.Questions, questionJSON{q.Name, append([]string{}, q.Inputs...), c.Outputs(q.Name)})
	}
	out.doings(c)
	for _, x := range c.Parameters {
		j := parameterJSON{Name: x.Name, Unit: x.Unit, Log10: x.Log10, Words: x.Words, Doc: x.Doc, Citation: x.Citation}
		if len(x.Words) > 0 {
			j.Preset = scenario.Show(x, x.Preset)
		} else {
			j.Low, j.High, j.Preset = finite(x.Low), finite(x.High), finite(x.Preset)
		}
		out.Parameters = append(out.Parameters, j)
	}
	return out
}

// doings fills in what a law does beside answering.
func (out *cardJSON) doings(c law.Card) {
	out.Thresholds, out.Clocks, out.Outcomes, out.Kinds = []thresholdJSON{}, []clockJSON{}, []outcomeJSON{}, []kindJSON{}
	out.Effect, out.Wears, out.Tolerance = c.Effect, c.Wears, c.Tolerance
	for _, x := range c.Thresholds {
		j := thresholdJSON{Kind: x.Kind, Parameter: x.Parameter, Becomes: x.Becomes, Outcome: x.Outcome}
		if x.Parameter == "" {
			j.Mass = finite(x.Mass)
		}
		out.Thresholds = append(out.Thresholds, j)
	}
	for _, x := range c.Clocks {
		out.Clocks = append(out.Clocks, clockJSON{x.Name, x.Outcome, string(x.Fate), x.Doc})
	}
	for _, x := range c.Outcomes {
		out.Outcomes = append(out.Outcomes, outcomeJSON{x.Word, x.Becomes, x.Doc})
	}
	for _, x := range c.Kinds {
		j := kindJSON{Name: x.Name, Doc: x.Doc}
		if int(x.Composition) < len(law.CompositionWords) {
			j.Composition = law.CompositionWords[x.Composition]
		}
		out.Kinds = append(out.Kinds, j)
	}
}

// finite is v, or nil (null) where JSON has no word for it.
func finite(v float64) *float64 {
	if math.IsNaN(v) || math.IsInf(v, 0) {
		return nil
	}
	return &v
}

func limit(l law.Limit) string {
	switch {
	case !l.Set:
		return ""
	case l.Parameter != "":
		return l.Parameter
	}
	return strconv.FormatFloat(l.Value, 'g', -1, 64)
}

func printCard(w io.Writer, c law.Card, isDefault bool) {
	const column = 12
	title := c.Process + "/" + c.Name + ", version " + c.Version
	if isDefault {
		title += " (default)"
	}
	fmt.Fprintln(w, title)
	fmt.Fprintln(w)
	field(w, 2, column, "says", c.Summary)
	field(w, 2, column, "formula", c.Formula)
	field(w, 2, column, "holds", c.Domain)
	field(w, 2, column, "speaks for", speaksFor(c.Accepts))
	for _, q := range c.Questions {
		in := strings.Join(q.Inputs, ", ")
		if in == "" {
			in = "nothing"
		}
		field(w, 2, column, "answers", fmt.Sprintf("%s: %s from %s", q.Name, strings.Join(c.Outputs(q.Name), ", "), in))
	}
	for _, t := range c.Thresholds {
		mass := quantity.Format(t.Mass, "solMass")
		if t.Parameter != "" {
			mass = t.Parameter
		}
		field(w, 2, column, "ends", fmt.Sprintf("%s at %s: %s, becomes %s", t.Kind, mass, t.Outcome, t.Becomes))
	}
	for _, line := range doings(c) {
		field(w, 2, column, line[0], line[1])
	}
	if len(c.Parameters) > 0 {
		fmt.Fprintln(w, "\n  parameters")
		for _, x := range c.Parameters {
			field(w, 4, 20, x.Name, fmt.Sprintf("%s (%s): %s", scenario.Show(x, x.Preset), scenario.Range(x), x.Doc))
			field(w, 4, 20, "", x.Citation)
		}
	}
	list := func(title string, lines []string) {
		if len(lines) == 0 {
			return
		}
		fmt.Fprintln(w, "\n  "+title)
		for _, l := range lines {
			field(w, 4, 2, "-", l)
		}
	}
	list("notes", c.Notes)
	list("sources", c.Sources)
}

// doings says what else a law does: what its rates add up to, the words it
// picks, what it makes and how exact it is.
func doings(c law.Card) [][2]string {
	var out [][2]string
	add := func(name, text, doc string) {
		if doc != "" {
			text += ": " + doc
		}
		out = append(out, [2]string{name, text})
	}
	for _, x := range c.Clocks {
		add("clock", fmt.Sprintf("%s (%s, %s)", x.Name, x.Outcome, x.Fate), x.Doc)
	}
	if c.StopOutcome != "" {
		add("in the end", fmt.Sprintf("all still bound are %s (%s)", c.StopOutcome, c.StopFate), "")
	}
	for _, x := range c.Outcomes {
		text := x.Word
		if x.Becomes != "" {
			text += ", becomes " + x.Becomes
		}
		add("outcome", text, x.Doc)
	}
	for _, x := range c.Kinds {
		add("makes", x.Name, x.Doc)
	}
	if c.Effect != "" {
		add("effect", c.Effect, "")
	}
	if c.Wears != "" && c.Wears != "loss" {
		add("wears", c.Wears, "")
	}
	if c.Tolerance > 0 {
		add("repeats", fmt.Sprintf("to one part in %.3g", 1/c.Tolerance), "")
	}
	return out
}

// speaksFor puts what a law accepts into words.
func speaksFor(a law.Accepts) string {
	out := "every kind"
	if len(a.Kinds) > 0 {
		out = strings.Join(a.Kinds, ", ")
	}
	if a.Column == "" {
		return out
	}
	info, _ := law.ColumnNamed("", a.Column)
	unit := ""
	if info.Unit != "" {
		unit = " " + quantity.Shown(info.Unit)
	}
	side := func(l law.Limit) string {
		if l.Parameter != "" {
			return l.Parameter
		}
		return limit(l) + unit
	}
	if a.Low.Set {
		out += ", " + a.Column + " from " + side(a.Low)
	}
	if a.High.Set {
		out += ", " + a.Column + " below " + side(a.High)
	}
	return out
}
