package verify

import (
	"math"
	"strings"

	"wane/sim/num"
)

// The verdicts.
const (
	Agrees  = "agrees"  // within what the digits of the print say
	Within  = "within"  // within the source's own spread
	Differs = "differs" // and the row says why
)

// Kinds say how sure the printed value is.
var Kinds = []string{
	"published",   // printed in the source
	"from-memory", // printed in the source, or said to be, but quoted from memory
	"recomputed",  // worked out independently, from the source's formula
}

// Clocks say what a printed time counts from.
var Clocks = []string{"big-bang", "now", "own"} // own: from when the object became what it is

// EFolding stands for mass over loss rate in place of an answer: the time in
// which a body falls to 1/e of its mass at the rate it begins with.
const EFolding = "e-folding"

// Date is one date of the literature, and how ours comes about.
type Date struct {
	Name    string `toml:"name"`
	Topic   string `toml:"topic"`
	What    string `toml:"what"`
	Printed string `toml:"printed"` // a quantity, as the source has it: "22 Gyr"
	// Span is the source's own spread, lowest and highest; empty: it gives none.
	Span      []string `toml:"span"`
	Tolerance float64  `toml:"tolerance"` // dex, from the digits of the source
	Source    string   `toml:"source"`
	Locator   string   `toml:"locator"`
	Kind      string   `toml:"kind"`
	Clock     string   `toml:"clock"`

	// A question: process/name, key=value, and which answer, or EFolding.
	Law      string   `toml:"law"`
	Question string   `toml:"question"`
	Given    []string `toml:"given"`
	Answer   string   `toml:"answer"`

	// A galaxy or a sky: a scenario with laws and settings put over it; then a
	// mark of a population, or a date of the sky.
	Scenario   string   `toml:"scenario"`
	Laws       []string `toml:"laws"`
	Set        []string `toml:"set"`
	Population string   `toml:"population"`
	Mark       string   `toml:"mark"`
	Sky        string   `toml:"sky"`
	Of         string   `toml:"of"` // a mass or a distance that the date of the sky is about

	// What is recorded. A difference (dex) is wanted where ours differs.
	Verdict    string   `toml:"verdict"`
	Difference *float64 `toml:"difference"`
	Slack      float64  `toml:"slack"` // how far the difference may stray, dex
	Reason     string   `toml:"reason"`

	printed, low, high float64 // log10 yr
}

// LogPrinted is log10 of the printed date in years.
func (d *Date) LogPrinted() float64 { return d.printed }

// LogSpan is log10 of the ends of the source's spread in years, NaN for none.
func (d *Date) LogSpan() (low, high float64) { return d.low, d.high }

// doubled is the log10 date beyond which only the exponent of the exponent is
// printed anywhere: 10^(10^x).
const doubled = 1e6

// Doubled tells whether the difference is one between x of 10^(10^x).
func (d *Date) Doubled() bool { return d.printed > doubled }

// difference of ours from the printed date, dex.
func (d *Date) difference(ours float64) float64 {
	if d.Doubled() {
		return num.Log10(ours) - num.Log10(d.printed)
	}
	return ours - d.printed
}

// verdict on ours.
func (d *Date) verdict(ours float64) string {
	switch {
	case math.Abs(d.difference(ours)) <= d.Tolerance:
		return Agrees
	case d.low <= ours && ours <= d.high:
		return Within
	}
	return Differs
}

// skyWords say in words what each date of a sky is.
var skyWords = map[string]string{
	"end":            "end of everything",
	"horizon-shines": "relic radiation as cold as the horizon",
	"colder":         "sky colder than a hole",
	"lost":           "crossing of the event horizon",
	"vacuum":         "one decay to be expected in the past light cone",
}

// By says in words how ours comes about.
func (d *Date) By() string {
	if d.Law != "" {
		return d.Answer + " in: wane ask " + strings.Join(append([]string{d.Law}, d.Given...), " ")
	}
	text := d.Mark + " of " + d.Population + " in a run"
	if d.Sky != "" {
		text = skyWords[d.Sky]
		if d.Of != "" {
			text += ", for " + d.Of
		}
	}
	text += "; scenario " + d.Scenario
	if with := append(append([]string(nil), d.Laws...), d.Set...); len(with) > 0 {
		text += " with " + strings.Join(with, ", ")
	}
	return text
}
