package cli

import (
	"encoding/csv"
	"fmt"
	"io"
	"math"
	"strconv"
	"strings"
)

type skyJSON struct {
	Schema      string                 `json:"schema"`
	Scenario    string                 `json:"scenario,omitempty"` // none: a law alone
	Laws        []lawJSON              `json:"laws"`
	Seed        uint64                 `json:"seed"`
	Realisation uint64                 `json:"realisation"`
	Draws       bool                   `json:"draws"` // whether anything of it is drawn
	Units       map[string]string      `json:"units"`
	Dates       []map[string]any       `json:"dates"`
	Special     map[string]skyMarkJSON `json:"special"`
	Cause       string                 `json:"cause,omitempty"` // of the end
}

type skyMarkJSON struct {
	Log10Date *float64 `json:"log10_date"` // null: see why
	Why       string   `json:"why,omitempty"`
	Doc       string   `json:"doc"`
}

func (v *skyView) document() skyJSON {
	_, cause := v.End()
	j := skyJSON{
		Schema: "wane-sky-1", Laws: v.laws(), Seed: v.run.Seed, Realisation: v.realisation, Draws: v.draws,
		Units: map[string]string{}, Dates: []map[string]any{}, Special: map[string]skyMarkJSON{}, Cause: cause,
	}
	if !v.alone {
		j.Scenario = v.run.Name
	}
	for _, c := range skyColumns() {
		j.Units[c.name] = c.unitInLog()
	}
	for _, l := range v.dates {
		row := map[string]any{"log10_date": l}
		if v.over(l) {
			row["over"] = true
		} else {
			for _, c := range skyColumns() {
				row[c.name] = logJSON(c.at(v, l))
			}
		}
		j.Dates = append(j.Dates, row)
	}
	for _, m := range v.marks() {
		d := skyMarkJSON{Why: m.why(), Doc: m.doc}
		if d.Why == "" {
			d.Log10Date = &m.date
		}
		j.Special[m.key] = d
	}
	return j
}

// logJSON is a logarithm in JSON, which knows no infinity: the word for it, and
// null where there is no value.
func logJSON(v float64) any {
	switch {
	case math.IsNaN(v):
		return nil
	case math.IsInf(v, 0):
		return csvNumber(v)
	}
	return v
}

// csv prints the table as ECSV 1.0 (Enhanced Character Separated Values,
// Astropy Proposal for Enhancement 6): a head of YAML in comments, then CSV.
func (v *skyView) csv(w io.Writer) error {
	columns := skyColumns()
	if _, err := io.WriteString(w, "# %ECSV 1.0\n# ---\n# delimiter: ','\n# datatype:\n"); err != nil {
		return err
	}
	head := make([]string, len(columns))
	for i, c := range columns {
		head[i] = c.name
		unit := ""
		if c.unit != "" {
			unit = ", unit: " + strconv.Quote(c.unitInLog())
		}
		fmt.Fprintf(w, "# - {name: %s%s, datatype: float64, description: %q}\n", c.name, unit, c.doc)
	}
	fmt.Fprintf(w, "# meta:\n#   seed: %d\n#   realisation: %d\n#   laws: [%s]\n#   log10_special_dates:\n",
		v.run.Seed, v.realisation, strings.Join(v.lawIDs(), ", "))
	for _, m := range v.marks() {
		fmt.Fprintf(w, "#     %s: %s\n", m.key, yamlNumber(m.date))
	}
	out := csv.NewWriter(w)
	if err := out.Write(head); err != nil {
		return err
	}
	for _, l := range v.dates {
		row := make([]string, len(columns))
		for i, c := range columns {
			if i == 0 || !v.over(l) {
				row[i] = csvNumber(c.at(v, l))
			}
		}
		if err := out.Write(row); err != nil {
			return err
		}
	}
	out.Flush()
	return out.Error()
}

func (v *skyView) lawIDs() []string {
	var out []string
	for _, l := range v.laws() {
		out = append(out, l.Process+"/"+l.Name)
	}
	return out
}

// csvNumber prints all digits; nothing for NaN, inf as every reader knows it.
func csvNumber(v float64) string {
	if math.IsNaN(v) {
		return ""
	}
	return strings.ToLower(strings.TrimPrefix(strconv.FormatFloat(v, 'g', -1, 64), "+"))
}

func yamlNumber(v float64) string {
	switch {
	case math.IsNaN(v):
		return "null"
	case math.IsInf(v, 1):
		return ".inf"
	case math.IsInf(v, -1):
		return "-.inf"
	}
	return csvNumber(v)
}

// laws lists the laws that make the sky.
func (v *skyView) laws() []lawJSON {
	var out []lawJSON
	for _, l := range lawsOf(v.run) {
		if ofSky(l.Process) {
			out = append(out, l)
		}
	}
	return out
}
