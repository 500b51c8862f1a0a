package starformation

import "wane/sim/law"

// Burst returns the law star-formation/burst: everything is born at once.
func Burst() law.Law { return burst{} }

type burst struct{}

func (burst) Describe() law.Card {
	return law.Card{
		Process: "star-formation", Name: "burst", Version: "1",
		Summary:   "all objects are born at one date",
		Formula:   "date = start",
		Domain:    "a limiting case; good for a globular cluster, and for seeing what else spreads dates",
		Sources:   []string{"assumption: no spread at all"},
		Notes:     []string{"Real clusters form within 1e6 to 1e7 yr, which no date beyond 1e9 yr feels."},
		Questions: []law.Question{{Name: "birth"}},
		Parameters: []law.Parameter{{Name: "start", Unit: "yr", Doc: "date of all births", Log10: true, Low: 8, High: 14, Preset: 9,
			Citation: "assumption"}},
	}
}

func (burst) Answer(question string, in law.Batch) (law.Batch, error) {
	date := in.NewValues()
	for i := range date {
		date[i] = in.Parameters[0]
	}
	return in.Answer(law.Numbers("log10_date", date)), nil
}
