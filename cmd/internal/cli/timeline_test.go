package cli

import (
	"encoding/json"
	"testing"

	"wane/testdata/published"
)

// answered is the part of the JSON of a run that the timeline is about.
type answered struct {
	Starts      float64 `json:"evaporation_starts_log10_yr"`
	Populations []struct {
		Name string
		Peak struct {
			Date float64 `json:"log10_yr"`
		}
		Marks map[string]*struct {
			Date float64 `json:"log10_yr"`
		}
	}
}

func ran(t *testing.T, command string) answered {
	t.Helper()
	var a answered
	if err := json.Unmarshal([]byte(printed(t, command+" --quiet --json")), &a); err != nil {
		t.Fatalf("wane %s: %v", command, err)
	}
	return a
}

// date is a mark of a population, its peak, or, for no population, the date
// from which holes evaporate.
func (a *answered) date(t *testing.T, population, mark string) float64 {
	t.Helper()
	if population == "" {
		return a.Starts
	}
	for _, p := range a.Populations {
		if p.Name != population {
			continue
		}
		if mark == "peak" {
			return p.Peak.Date
		}
		if m := p.Marks[mark]; m != nil {
			return m.Date
		}
	}
	t.Fatalf("the run has no mark %q of %q", mark, population)
	return 0
}

// asked is the date or the wait a law answers with, log10 years.
func asked(t *testing.T, question string) float64 {
	t.Helper()
	var a struct {
		Outputs map[string]struct {
			Value float64
			Unit  string
		}
	}
	if err := json.Unmarshal([]byte(printed(t, "ask "+question+" --json")), &a); err != nil {
		t.Fatalf("wane ask %s: %v", question, err)
	}
	for _, name := range []string{"date", "lifetime", "wait"} {
		if v, ok := a.Outputs[name]; ok {
			if v.Unit != "log(yr)" {
				t.Fatalf("wane ask %s: %s in %q, want log(yr)", question, name, v.Unit)
			}
			return v.Value
		}
	}
	t.Fatalf("wane ask %s: no date, lifetime or wait in %v", question, a.Outputs)
	return 0
}

// TestTimeline holds a run of lantern-reach, and the laws behind it, to the
// order and the dates of the literature.
func TestTimeline(t *testing.T) {
	run := ran(t, "run lantern-reach --objects 100000 --realisations 8")
	earlier, latest, event := 0.0, 0.0, ""
	for _, row := range published.Rows(t, "timeline.csv") {
		got := 0.0
		if question := row.Inputs["ask"]; question != "" {
			got = asked(t, question)
		} else {
			got = run.date(t, row.Inputs["population"], row.Inputs["mark"])
		}
		row.Check(t, got)
		if row.Inputs["event"] != event {
			event, earlier = row.Inputs["event"], latest
		}
		if !(got > earlier) {
			t.Errorf("%s: %s at 10^%.3f yr, when something before it comes at 10^%.3f yr", row.Where(), event, got, earlier)
		}
		latest = max(latest, got)
	}
}
