package ensemble

import (
	"cmp"
	"fmt"
	"math"
	"slices"
	"strings"

	"wane/sim/engine"
	"wane/sim/fade"
)

// Remaining is the outcome word of members that never left.
const Remaining = "remaining"

// neverMember is the reason of marks of a population without members.
const neverMember = "it never had a member"

// markOf reduces one mark. Realisations in which the population never had a
// member have no such date and are left out. Those that did not reach it
// stand beyond every date.
func markOf(outcomes []engine.Outcome, of func(*engine.Outcome) (date float64, cut, member bool)) Mark {
	var dates []float64
	missed := 0
	why := map[string]int{}
	for i := range outcomes {
		date, cut, member := of(&outcomes[i])
		if !member {
			continue
		}
		if cut || math.IsNaN(date) || math.IsInf(date, 1) {
			date = math.Inf(1)
			missed++
			why[outcomes[i].EndCause]++
		}
		dates = append(dates, date)
	}
	nan := math.NaN()
	if len(dates) == 0 {
		return Mark{Date: nan, Low: nan, High: nan, Error: nan, Reason: neverMember}
	}
	slices.Sort(dates)
	m := Mark{
		Date: fade.Median(dates), Low: fade.Quantile(dates, 0.05), High: fade.Quantile(dates, 0.95),
		Error: fade.MedianError(dates), Cut: float64(missed) / float64(len(dates)),
	}
	if math.IsInf(m.Date, 1) {
		m.Date, m.Error = nan, nan
		m.Reason = endWords(mostFrequent(why))
		if missed < len(dates) {
			m.Reason = fmt.Sprintf("in %d of %d realisations %s", missed, len(dates), m.Reason)
		}
	}
	return m
}

// endWords says why a mark was not reached, by what ended the realisation.
func endWords(cause string) string {
	switch cause {
	case "":
		return "nothing takes those who remain"
	case "until":
		return "the run ended first"
	}
	return "everything ended first (" + strings.ReplaceAll(cause, "-", " ") + ")"
}

// cutWord splits "process:outcome".
func cutWord(key string) (process, outcome string) {
	if p, o, ok := strings.Cut(key, ":"); ok {
		return p, o
	}
	return "", key
}

// compareCauses orders by falling share, then by name.
func compareCauses(a, b Cause) int {
	return cmp.Or(cmp.Compare(b.Fraction, a.Fraction), cmp.Compare(a.Process, b.Process), cmp.Compare(a.Outcome, b.Outcome))
}
