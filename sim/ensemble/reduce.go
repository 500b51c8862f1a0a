package ensemble

import (
	"math"
	"slices"

	"wane/sim/engine"
	"wane/sim/fade"
)

// Summarise reduces the outcomes of realisations, in their order, to the
// answer of a run. Each outcome has the populations of info, in their order.
func Summarise(outcomes []engine.Outcome, info Info) Summary {
	s := Summary{
		Engine: info.Engine, Objects: info.Objects, StandsFor: info.StandsFor, Whole: info.Whole,
		Realisations: len(outcomes), Requested: info.Requested, Interrupted: info.Interrupted,
		Seed: info.Seed, Scenario: info.Scenario, Laws: info.Laws,
		EvaporationStarts: medianOf(outcomes, func(o *engine.Outcome) float64 { return o.EvaporationStarts }),
	}
	for i := range info.Populations {
		s.Populations = append(s.Populations, summarisePopulation(outcomes, &info, i))
	}
	for i := range outcomes {
		o := &outcomes[i]
		s.Events += o.Events
		if c := o.Ledger.Closes(); c > s.LedgerClosesTo || math.IsNaN(c) {
			s.LedgerClosesTo = c
		}
	}
	s.Ledger = meanLedger(outcomes)
	s.Inactive = inactive(outcomes, &info)
	s.Notes = notes(outcomes, &info, s.Populations)
	return s
}

func meanLedger(outcomes []engine.Outcome) LedgerMeans {
	var m LedgerMeans
	n := float64(len(outcomes))
	for i := range outcomes {
		l := &outcomes[i].Ledger
		m.Founded += l.Founded / n
		m.Bound += l.Bound / n
		m.Adrift += l.Adrift / n
		m.Central += l.Central / n
		m.Gas += l.Gas / n
		m.Radiated += l.Radiated / n
	}
	return m
}

func summarisePopulation(outcomes []engine.Outcome, info *Info, which int) Population {
	of := func(o *engine.Outcome) *engine.PopulationOutcome { return &o.Populations[which] }
	var peaks, dates []float64
	left, exits, remaining := map[string]int64{}, int64(0), int64(0)
	hangs := map[string]int{}
	for i := range outcomes {
		o := of(&outcomes[i])
		peaks = append(peaks, float64(o.Peak))
		if o.Peak > 0 {
			dates = append(dates, o.PeakDate)
		}
		for word, n := range o.Left {
			left[word] += n
			exits += n
		}
		remaining += o.Remaining
		if o.Hangs != "" {
			hangs[o.Hangs]++
		}
	}
	slices.Sort(peaks)
	slices.Sort(dates)
	population := info.Populations[which]
	p := Population{
		Name: population.Name, Condition: Words(population.Condition),
		PeakDate:    fade.Median(dates),
		Causes:      causes(left, exits, remaining),
		LastHangsOn: mostFrequent(hangs),
		RealLast:    medianOf(outcomes, func(o *engine.Outcome) float64 { return of(o).RealLast }),
	}
	if len(peaks) > 0 {
		p.PeakCount = fade.Median(peaks) * info.weight(population)
	}
	p.Half = markOf(outcomes, func(o *engine.Outcome) (float64, bool, bool) {
		return of(o).Half, of(o).CutHalf, of(o).Peak > 0
	})
	p.Hundredth = markOf(outcomes, func(o *engine.Outcome) (float64, bool, bool) {
		return of(o).Hundredth, of(o).CutHundredth, of(o).Peak > 0
	})
	p.Last = markOf(outcomes, func(o *engine.Outcome) (float64, bool, bool) {
		return of(o).Last, of(o).CutLast, of(o).Peak > 0
	})
	return p
}

// medianOf is the median over the outcomes whose value is not NaN, NaN if
// there are none.
func medianOf(outcomes []engine.Outcome, value func(*engine.Outcome) float64) float64 {
	var values []float64
	for i := range outcomes {
		if v := value(&outcomes[i]); !math.IsNaN(v) {
			values = append(values, v)
		}
	}
	slices.Sort(values)
	return fade.Median(values)
}

// causes are shares of all that were ever members, those who remain included.
func causes(left map[string]int64, exits, remaining int64) []Cause {
	var list []Cause
	members := float64(exits + remaining)
	for key, n := range left {
		if n > 0 {
			c := Cause{Outcome: key, Fraction: float64(n) / members}
			c.Process, c.Outcome = cutWord(key)
			list = append(list, c)
		}
	}
	if remaining > 0 {
		list = append(list, Cause{Outcome: Remaining, Fraction: float64(remaining) / members})
	}
	slices.SortFunc(list, compareCauses)
	return list
}

func mostFrequent(counts map[string]int) string {
	best, most := "", 0
	for word, n := range counts {
		if n > most || n == most && word < best {
			best, most = word, n
		}
	}
	return best
}
