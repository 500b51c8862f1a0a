package cli

import (
	"math"

	"wane/cmd/internal/verify"
)

// dateJSON is a date of the literature for programs. Dates are log10 years;
// what there is none of is null.
type dateJSON struct {
	Name      string      `json:"name"`
	Topic     string      `json:"topic"`
	What      string      `json:"what"`
	Printed   string      `json:"printed"`
	Date      float64     `json:"printed_log10_yr"`
	Counted   string      `json:"counted_from"`
	Spread    *[2]float64 `json:"spread_log10_yr"`
	Tolerance float64     `json:"tolerance_dex"`
	Kind      string      `json:"kind"`
	Source    string      `json:"source"`
	Locator   string      `json:"locator"`
	By        howJSON     `json:"ours_by"`
	Recorded  string      `json:"recorded_verdict"`
	Expected  *float64    `json:"recorded_difference_dex"`
	Reason    string      `json:"reason,omitempty"`
}

// howJSON is how ours comes about: by a question, or by a scenario.
type howJSON struct {
	Words      string   `json:"in_words"`
	Law        string   `json:"law,omitempty"`
	Question   string   `json:"question,omitempty"`
	Given      []string `json:"given,omitempty"`
	Answer     string   `json:"answer,omitempty"`
	Scenario   string   `json:"scenario,omitempty"`
	Laws       []string `json:"laws,omitempty"`
	Set        []string `json:"set,omitempty"`
	Population string   `json:"population,omitempty"`
	Mark       string   `json:"mark,omitempty"`
	Sky        string   `json:"sky,omitempty"`
	Of         string   `json:"of,omitempty"`
}

// verifiedJSON is a date worked out.
type verifiedJSON struct {
	dateJSON
	Ours       *float64 `json:"ours_log10_yr"`
	Difference *float64 `json:"difference_dex"`
	Scale      string   `json:"difference_of"` // what the difference is one of
	Verdict    string   `json:"verdict"`
	AsRecorded bool     `json:"as_recorded"`
	Why        string   `json:"why_not,omitempty"` // it is not as recorded
}

type verifiedAllJSON struct {
	AsRecorded bool           `json:"as_recorded"`
	Verdicts   map[string]int `json:"verdicts"`
	Dates      []verifiedJSON `json:"dates"`
}

func dateOf(d verify.Date) dateJSON {
	j := dateJSON{
		Name: d.Name, Topic: d.Topic, What: d.What, Printed: d.Printed, Date: d.LogPrinted(), Counted: counted[d.Clock],
		Tolerance: d.Tolerance, Kind: d.Kind, Source: d.Source, Locator: d.Locator,
		By: howJSON{
			Words: d.By(), Law: d.Law, Question: d.Question, Given: d.Given, Answer: d.Answer, Scenario: d.Scenario,
			Laws: d.Laws, Set: d.Set, Population: d.Population, Mark: d.Mark, Sky: d.Sky, Of: d.Of,
		},
		Recorded: d.Verdict, Expected: d.Difference, Reason: d.Reason,
	}
	if low, high := d.LogSpan(); !math.IsNaN(low) {
		j.Spread = &[2]float64{low, high}
	}
	return j
}

// counted says in words what a time counts from.
var counted = map[string]string{
	"big-bang": "the Big Bang", "now": "now", "own": "its own beginning",
}

func verifiedOf(results []verify.Result) verifiedAllJSON {
	out := verifiedAllJSON{AsRecorded: true, Verdicts: map[string]int{}}
	number := func(v float64) *float64 {
		if math.IsNaN(v) || math.IsInf(v, 0) {
			return nil
		}
		return &v
	}
	for _, r := range results {
		j := verifiedJSON{
			dateJSON: dateOf(r.Date), Ours: number(r.Ours), Difference: number(r.Difference), Scale: "log10(t/yr)",
			Verdict: r.Verdict, AsRecorded: r.AsRecorded, Why: r.Stray,
		}
		if r.Date.Doubled() {
			j.Scale = "log10(log10(t/yr))"
		}
		out.AsRecorded = out.AsRecorded && r.AsRecorded
		if r.Verdict != "" {
			out.Verdicts[r.Verdict]++
		}
		out.Dates = append(out.Dates, j)
	}
	return out
}
