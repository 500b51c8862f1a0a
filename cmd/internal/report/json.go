package report

import (
	"encoding/json"
	"io"
	"math"

	"wane/sim/ensemble"
)

// Document is the JSON of a run. Schema gives every field's meaning.
type Document struct {
	Schema       string            `json:"schema"`
	Scenario     string            `json:"scenario"`
	Engine       string            `json:"engine"`
	Objects      int64             `json:"objects"`
	StandsFor    float64           `json:"stands_for"`
	Realisations int               `json:"realisations"`
	Requested    int               `json:"requested"`
	Interrupted  bool              `json:"interrupted"`
	Seed         uint64            `json:"seed"`
	Populations  []populationJSON  `json:"populations"`
	Ledger       ledgerJSON        `json:"ledger"`
	Laws         map[string]string `json:"laws"`
	Outside      []outsideJSON     `json:"outside,omitempty"`
	Inactive     []inactiveJSON    `json:"inactive"`
	Evaporation  *float64          `json:"evaporation_starts_log10_yr"`
	Notes        []string          `json:"notes"`
	Events       int64             `json:"events"`
}

type populationJSON struct {
	Name      string             `json:"name"`
	Condition string             `json:"condition"`
	Peak      peakJSON           `json:"peak"`
	Marks     map[string]*mark   `json:"marks"`
	Reasons   map[string]string  `json:"reasons"`
	Causes    map[string]float64 `json:"causes"`
	HangsOn   *string            `json:"last_hangs_on"`
	RealLast  *float64           `json:"real_last_log10_yr"`
}

type peakJSON struct {
	Count float64  `json:"count"`
	Date  *float64 `json:"log10_yr"`
}

type mark struct {
	Date  float64  `json:"log10_yr"`
	Low   *float64 `json:"low"`
	High  *float64 `json:"high"`
	Error *float64 `json:"error"`
	Cut   float64  `json:"cut"`
}

type ledgerJSON struct {
	Mass massJSON `json:"mass"`
}

type massJSON struct {
	ClosesTo float64  `json:"closes_to"`
	Founded  *float64 `json:"founded"`
	Bound    *float64 `json:"bound"`
	Adrift   *float64 `json:"adrift"`
	Central  *float64 `json:"central"`
	Gas      *float64 `json:"gas"`
	Radiated *float64 `json:"radiated"`
}

// outsideJSON is a law that is not built in.
type outsideJSON struct {
	Process string `json:"process"`
	Name    string `json:"name"`
	Version string `json:"version"`
	Path    string `json:"path"`
	Digest  string `json:"digest"`
}

type inactiveJSON struct {
	Process string `json:"process"`
	Law     string `json:"law"`
	Why     string `json:"why"`
}

// JSON writes a summary as one indented JSON document.
func JSON(w io.Writer, s *ensemble.Summary) error {
	e := json.NewEncoder(w)
	e.SetIndent("", "  ")
	e.SetEscapeHTML(false)
	return e.Encode(DocumentOf(s))
}

// DocumentOf is the JSON document of a summary.
func DocumentOf(s *ensemble.Summary) Document {
	d := Document{
		Schema: SchemaID, Scenario: s.Scenario, Engine: s.Engine, Objects: s.Objects, StandsFor: s.StandsFor,
		Realisations: s.Realisations, Requested: s.Requested, Interrupted: s.Interrupted, Seed: s.Seed,
		Populations: []populationJSON{}, Laws: map[string]string{}, Inactive: []inactiveJSON{},
		Evaporation: number(s.EvaporationStarts), Notes: append([]string{}, s.Notes...), Events: s.Events,
		Ledger: ledgerJSON{massJSON{
			ClosesTo: s.LedgerClosesTo, Founded: number(s.Ledger.Founded), Bound: number(s.Ledger.Bound),
			Adrift: number(s.Ledger.Adrift), Central: number(s.Ledger.Central), Gas: number(s.Ledger.Gas),
			Radiated: number(s.Ledger.Radiated),
		}},
	}
	for _, p := range s.Populations {
		d.Populations = append(d.Populations, populationOf(p))
	}
	for _, l := range s.Laws {
		d.Laws[l.Process] = l.Name
		if l.Path != "" {
			d.Outside = append(d.Outside, outsideJSON(l))
		}
	}
	for _, x := range s.Inactive {
		d.Inactive = append(d.Inactive, inactiveJSON(x))
	}
	return d
}

func populationOf(p ensemble.Population) populationJSON {
	out := populationJSON{
		Name: p.Name, Condition: p.Condition, Peak: peakJSON{Count: p.PeakCount, Date: number(p.PeakDate)},
		Marks: map[string]*mark{}, Reasons: map[string]string{}, Causes: map[string]float64{},
		RealLast: number(p.RealLast),
	}
	if p.LastHangsOn != "" {
		out.HangsOn = &p.LastHangsOn
	}
	for name, m := range map[string]ensemble.Mark{"half": p.Half, "hundredth": p.Hundredth, "last": p.Last} {
		if number(m.Date) != nil {
			out.Marks[name] = &mark{m.Date, number(m.Low), number(m.High), number(m.Error), m.Cut}
			continue
		}
		out.Marks[name] = nil
		out.Reasons[name] = reason(m)
		if !everMember(p) && m.Reason == "" {
			out.Reasons[name] = "it never had a member"
		}
	}
	for _, c := range p.Causes {
		out.Causes[c.Outcome] += c.Fraction
	}
	return out
}

// number is v, or nil (null) where JSON has no word for it.
func number(v float64) *float64 {
	if math.IsNaN(v) || math.IsInf(v, 0) {
		return nil
	}
	return &v
}
