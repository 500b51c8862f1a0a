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
